"""The risk that a patient starts from: the reference group's own, typed, from a rate, or from an overall risk."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING

from fourcount.appraisal.carrying.spans import Spans
from fourcount.appraisal.findings import Gap, Interval, Mark
from fourcount.appraisal.findings.patient import Rank, StartFrom
from fourcount.record.entry.digits import specimen
from fourcount.record.entry.readings import DAYS_IN, Blank, Proportion, RateReading, RiskReading, Unreadable
from fourcount.record.entry.starts import StartReading
from fourcount.record.outcome import Outcome
from fourcount.stats.hazards import risk_over
from fourcount.stats.normal import quantile

if TYPE_CHECKING:
    from fourcount.stats.propagation import StartLimits

BARE = Gap("bare-starting-risk")
UNREADABLE = Gap("baseline-unreadable")
OUT_OF_ORDER = ("low-above-usual", "high-below-usual", "low-above-high", "high-below-low")
"""Why one of three starting risks that can be read is not used."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Start:
    """A starting risk over the study's time span.

    ``limits`` tells how precise it is, where it has limits of its own; ``typed`` are those that were typed, at
    ``typed_level``. With ``share`` the value is the risk of all
    people, of whom that share has the exposure: the starting risk then depends on the effect.
    """

    value: float
    origin: StartFrom
    rank: Rank = ""
    limits: StartLimits | None = None
    typed: Interval | None = None
    typed_level: float | None = None
    share: float | None = None

    def given(self, level: float) -> tuple[Interval | Gap, float | None]:
        """Its limits and their level, as they are told: as typed; of counts, Wilson's at a level."""
        if self.typed is not None:
            return self.typed, self.typed_level
        own = self.own_limits(level)
        return own, None if isinstance(own, Gap) else level

    def own_limits(self, level: float) -> Interval | Gap:
        """Its own limits at a level; typed ones of another level go there along Wilson's scale."""
        if self.limits is None:
            return BARE
        if self.typed is not None and self.typed_level == level:
            return self.typed
        z = quantile(level)
        return Interval(low=self.limits.at(-z), high=self.limits.at(z))


@dataclass(frozen=True, kw_only=True, slots=True)
class Starts:
    """The usual starting risk, or why there is none; the low and the high one of three, None where none is typed."""

    usual: Start | Gap
    low: Start | Gap | None = None
    high: Start | Gap | None = None
    marks: tuple[Mark, ...] = ()


def starts_of(
    outcome: Outcome, reading: StartReading, own: float | Gap | None, needs: str, spans: Spans | Gap
) -> Starts:
    """The starting risks of the chosen kind.

    ``own`` is the reference group's risk, None where the form or the design has none; ``needs`` is then the key of
    the reason why a risk has to be typed.
    """
    kind = outcome.patient.start_kind
    if kind == "rate":
        return Starts(usual=_from_rate(reading, outcome, spans))
    if kind == "overall":
        return Starts(usual=_from_overall(reading))
    if kind == "one":
        return Starts(usual=_usual(reading.usual, own, needs, ""))
    usual = _usual(reading.usual, own, needs, "usual")
    low, high = _side(reading.low, "low"), _side(reading.high, "high")
    if isinstance(usual, Start) and usual.origin == "reference":
        return _beside_the_studys(outcome, usual, low, high)
    return Starts(usual=usual, low=low, high=high)


def _usual(reading: RiskReading | Blank | Unreadable, own: float | Gap | None, needs: str, rank: Rank) -> Start | Gap:
    if isinstance(reading, Unreadable):
        return UNREADABLE
    if isinstance(reading, RiskReading):
        return _typed(reading, rank)
    if own is None:
        return Gap(needs)
    return Gap("no-starting-risk") if isinstance(own, Gap) else Start(value=own, origin="reference", rank=rank)


def _typed(reading: RiskReading, rank: Rank) -> Start:
    """A typed risk with the precision that was typed with it: limits before counts."""
    if reading.low is None and reading.events is None:
        return Start(value=reading.value, origin="typed", rank=rank)
    from fourcount.stats.propagation import limits_as_typed, limits_of_counts  # few start from a risk with limits

    if reading.low is not None and reading.high is not None:
        limits = limits_as_typed(reading.value, reading.low, reading.high, reading.level)
        if not isinstance(limits, Gap):
            typed = Interval(low=reading.low, high=reading.high)
            return Start(
                value=reading.value,
                origin="typed",
                rank=rank,
                limits=limits,
                typed=typed,
                typed_level=reading.level,
            )
    elif reading.events is not None and reading.total is not None:
        limits = limits_of_counts(reading.events, reading.total)
        if not isinstance(limits, Gap):
            return Start(value=limits.value, origin="typed", rank=rank, limits=limits)
    return Start(value=reading.value, origin="typed", rank=rank)


def _side(reading: Proportion | Blank | Unreadable, rank: Rank) -> Start | Gap | None:
    if isinstance(reading, Blank):
        return None
    if isinstance(reading, Unreadable):
        return Gap(reading.key) if reading.key in OUT_OF_ORDER else UNREADABLE
    return Start(value=reading.value, origin="typed", rank=rank)


def _beside_the_studys(outcome: Outcome, usual: Start, low: Start | Gap | None, high: Start | Gap | None) -> Starts:
    """Three risks whose usual one is the study's: only here is it known whether the two lie on their sides of it."""
    marks: list[Mark] = []
    patient = outcome.patient
    if isinstance(low, Start) and low.value > usual.value:
        low = Gap("low-above-usual")
        marks.append(_wrong("low_risk_text", "low-above-usual", patient.low_risk_text))
    if isinstance(high, Start) and high.value < usual.value:
        high = Gap("high-below-usual")
        marks.append(_wrong("high_risk_text", "high-below-usual", patient.high_risk_text))
    return Starts(usual=usual, low=low, high=high, marks=tuple(marks))


def _wrong(field: str, key: str, text: str) -> Mark:
    return Mark(field=field, key=key, facts={"text": specimen(text)})


def _from_rate(reading: StartReading, outcome: Outcome, spans: Spans | Gap) -> Start | Gap:
    """1 - exp(-r t), the rate being constant over the study's time span."""
    rate = reading.rate
    if not isinstance(rate, RateReading):
        return Gap("rate-not-typed" if isinstance(rate, Blank) else "rate-unreadable")
    if outcome.design == "survey":
        return Gap("design-no-rates")
    span = None if isinstance(spans, Gap) else spans.of_a_rate
    if span is None:
        return Gap("rate-needs-span")
    a_year = rate.value * DAYS_IN["year"] / DAYS_IN[rate.unit] if rate.unit != "month" else rate.value * 12.0
    return Start(value=risk_over(a_year, span.years), origin="rate")


def _from_overall(reading: StartReading) -> Start | Gap:
    overall, share = reading.overall, reading.share
    if isinstance(overall, Proportion) and isinstance(share, Proportion):
        return Start(value=overall.value, origin="overall", share=share.value)
    unreadable = isinstance(overall, Unreadable) or isinstance(share, Unreadable)
    return Gap("overall-unreadable" if unreadable else "overall-not-typed")
