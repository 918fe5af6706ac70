"""The study's time span, and another one that its risks are carried to."""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.appraisal.findings import Gap, Mark
from fourcount.record.entry.duration import read_duration
from fourcount.record.entry.readings import Blank, Duration, Unreadable
from fourcount.record.outcome import EffectOnly, Outcome, PersonTime, RiskAtTime

ALIKE = 1e-9
AT_ONE_TIME = (RiskAtTime, EffectOnly, PersonTime)
"""Prints that follow-up of different lengths does not touch: they have dealt with it."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Spans:
    """``study`` is None where it cannot be read as a time, ``other`` where no other one is asked for."""

    study: Duration | None = None
    other: Duration | None = None

    @property
    def ratio(self) -> float:
        """How many times the study's span the other one is; 1 where none is asked for."""
        if self.other is None or self.study is None:
            return 1.0
        return self.other.years / self.study.years

    @property
    def of_a_rate(self) -> Duration | None:
        """The span over which a rate gives the starting risk: the study's, else the one asked for."""
        return self.study or self.other


def mark_of_span(outcome: Outcome) -> tuple[Mark, ...]:
    """The mark of the field of the other span, where it holds text that gives no time."""
    reading = read_duration(outcome.patient.other_span_text)
    if not isinstance(reading, Unreadable):
        return ()
    return (Mark(field="other_span_text", key=reading.key, facts=reading.facts),)


def spans_of(outcome: Outcome, *, any_span: bool, any_follow_up: bool = False) -> Spans | Gap:
    """The spans in use, or why the one asked for cannot be had.

    ``any_span`` says that the effect holds whatever the time (a hazard or a rate ratio) and the starting risk comes
    from a rate, so that the study's own span need not be known. ``any_follow_up`` says that neither the effect nor the
    starting risk comes from shares of raw counts.
    """
    study, other = read_duration(outcome.span_text), read_duration(outcome.patient.other_span_text)
    own = study if isinstance(study, Duration) and study.years > 0.0 else None
    if isinstance(other, Blank):
        return Spans(study=own)
    if isinstance(other, Unreadable):
        return Gap("span-unreadable")
    if outcome.design == "survey":
        return Gap("other-span-survey")
    if outcome.follow_up_varied and not any_follow_up and not isinstance(outcome.table, AT_ONE_TIME):
        return Gap("other-span-varied")
    if own is None:
        return Spans(other=other) if any_span else Gap("other-span-needs-study-span")
    if abs(other.years / own.years - 1.0) < ALIKE:
        return Spans(study=own)
    return Spans(study=own, other=other)
