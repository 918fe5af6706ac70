"""From what a form gives of a study to its patient's findings."""

from __future__ import annotations

from dataclasses import dataclass

import msgspec

from fourcount.appraisal.carrying.at_a_start import carried_to
from fourcount.appraisal.carrying.direct import at_span, direct, over_another_span
from fourcount.appraisal.carrying.effects import chosen
from fourcount.appraisal.carrying.spans import ALIKE, Spans, mark_of_span, spans_of
from fourcount.appraisal.carrying.starts import BARE, Start, Starts, starts_of
from fourcount.appraisal.carrying.study import OwnRisks, Study
from fourcount.appraisal.case import no_effect_of
from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Carriable,
    Conversion,
    Figure,
    Gap,
    Interval,
    Mark,
    PatientFindings,
    Range,
)
from fourcount.appraisal.measures import number_needed_alone, number_needed_from
from fourcount.appraisal.reach import risk_within_reach
from fourcount.appraisal.turning import welcome_of_effects
from fourcount.record.entry.duration import marks_of_study_span
from fourcount.record.entry.readings import RiskReading
from fourcount.record.entry.starts import StartReading
from fourcount.record.outcome import Outcome

ANY_SPAN = ("hazard_ratio", "rate_ratio")
"""Effects that say the same over any time span, hazards being constant."""


@dataclass(frozen=True, kw_only=True, slots=True)
class ForAPatient:
    """The two parts that hang on a starting risk, and marks that only the study's own risk tells."""

    patient: PatientFindings | Gap
    conversion: Conversion | Gap
    marks: tuple[Mark, ...] = ()


def for_a_patient(study: Study, reading: StartReading) -> ForAPatient:
    """The chosen effect at the chosen starting risk, and the odds ratio as a risk ratio there."""
    if study.refused is not None:
        return ForAPatient(patient=study.refused, conversion=study.refused)
    one = chosen(study.carriable, study.outcome.patient.effect)
    hazards = one is not None and one.effect in ANY_SPAN
    spans = spans_of(
        study.outcome,
        any_span=hazards and study.outcome.patient.start_kind == "rate",
        any_follow_up=hazards and (study.outcome.patient.start_kind != "one" or isinstance(reading.usual, RiskReading)),
    )
    own = None if study.own is None else study.own.reference.estimate
    starts = starts_of(study.outcome, reading, own, study.needs, spans)
    patient = _patient(study, one, starts, spans)
    return ForAPatient(patient=patient, conversion=_conversion(study, starts.usual, patient), marks=starts.marks)


def marks_of(outcome: Outcome, reading: StartReading) -> tuple[Mark, ...]:
    """The marks of the patient's fields and of the study's span, whether or not anything is carried."""
    return reading.marks + mark_of_span(outcome) + marks_of_study_span(outcome.span_text)


def _patient(study: Study, one: Carriable | None, starts: Starts, spans: Spans | Gap) -> PatientFindings | Gap:
    if one is None:
        return study.nothing
    usual = _at(study, one, starts.usual, spans)
    if isinstance(usual, Gap) or (starts.low is None and starts.high is None):
        return usual
    low, high = (None if start is None else _at(study, one, start, spans) for start in (starts.low, starts.high))
    return msgspec.structs.replace(usual, low=low, high=high)


def _at(study: Study, one: Carriable, start: Start | Gap, spans: Spans | Gap) -> PatientFindings | Gap:
    """The effect at one starting risk, by the table itself or by the effect."""
    if isinstance(start, Gap):
        return start
    if isinstance(spans, Gap):
        return spans
    if study.own is not None and _the_tables_own(study, one, start):
        return _by_the_table(study, study.own, one, start, spans)
    return _by_the_effect(study, one, start, spans)


def _the_tables_own(study: Study, one: Carriable, start: Start) -> bool:
    """Whether the figures are the table's: its own risk, and an effect of its own."""
    return start.origin == "reference" and study.own is not None and not one.adjusted


def _by_the_table(study: Study, own: OwnRisks, one: Carriable, start: Start, spans: Spans) -> PatientFindings | Gap:
    if isinstance(own.index.estimate, Gap):
        return Gap("carried-gap")
    found = direct(own) if spans.ratio == 1.0 else over_another_span(own, spans.ratio)
    return PatientFindings(
        baseline=start.value,
        baseline_from="reference",
        effect=one.effect,
        carried=one.figure,
        without=found.reference,
        with_=found.index,
        difference=found.difference,
        number_needed=_number_needed(study, one, start, found.difference),
        risk_ratio=found.ratio,
        range_from="table",
        measure=one.measure,
        start_from="reference",
        start_interval=_whole(own.reference),
        start_level=own.level if isinstance(own.reference.interval, Interval) else None,
        study_span=spans.study,
        other_span=spans.other,
        rank=start.rank,
        level=own.level,
    )


def _by_the_effect(study: Study, one: Carriable, start: Start, spans: Spans) -> PatientFindings | Gap:
    if isinstance(one.figure.estimate, Gap):
        return Gap("carried-gap")
    found = carried_to(one, start, spans.ratio)
    if isinstance(found.baseline, Gap):
        return found.baseline if start.share is None else _unsolved(found.baseline, one, study.carriable)
    own = study.own if start.origin == "reference" else None
    given, given_level = start.given(one.level) if own is None else (_whole(own.reference), own.level)
    return PatientFindings(
        baseline=found.baseline,
        baseline_from="given" if own is None else "reference",
        effect=one.effect,
        carried=one.figure,
        without=found.without if own is None else _own_start(own, one.level, spans),
        with_=found.with_,
        difference=found.difference,
        number_needed=_number_needed(study, one, start, found.difference),
        risk_ratio=found.risk_ratio,
        range_from=found.range_from,
        measure=one.measure,
        adjusted=one.adjusted,
        adjusted_for=one.adjusted_for,
        start_from=start.origin,
        start_interval=given,
        start_level=None if isinstance(given, Gap) else given_level,
        study_span=spans.study,
        other_span=spans.other,
        rank=start.rank,
        level=one.level,
    )


def _unsolved(gap: Gap, one: Carriable, carriable: tuple[Carriable, ...]) -> Gap:
    """Why no starting risk gives the overall risk; the odds ratio, which can do so, is named where there is one."""
    key = {"beyond-one": "solved-beyond-one", "carried-beyond-zero": "solved-beyond-zero"}.get(gap.key)
    if key is None:
        return gap
    instead = (other for other in carriable if other.effect == "odds_ratio" != one.effect)
    odds = any(not isinstance(other.figure.estimate, Gap) for other in instead)
    return Gap(f"{key}-odds" if odds else key)


def _own_start(own: OwnRisks, level: float, spans: Spans) -> Figure:
    """The study's own starting risk beside an effect; its interval only where that has the level of the effect's."""
    risk = at_span(risk_within_reach(own.reference), spans.ratio)
    alike = abs(own.level - level) < ALIKE or isinstance(risk.interval, Gap)
    return risk if alike else Figure(estimate=risk.estimate, interval=Gap("other-level"), method=risk.method)


def _whole(own: Figure) -> Interval | Gap:
    return own.interval if isinstance(own.interval, Interval) else BARE


def _number_needed(study: Study, one: Carriable, start: Start, difference: Figure) -> AnyNumberNeeded | Gap:
    """The patient's number needed; where only its range cannot be given, the estimate stands.

    Follow-up of different lengths touches effects of raw counts and the table's own risks, and no hazards.
    """
    apart = study.number_needed == "follow-up-varied" and one.effect in ANY_SPAN and start.origin != "reference"
    if study.number_needed is not None and not apart:
        return Gap(study.number_needed)
    interval, estimate = difference.interval, difference.estimate
    if (
        isinstance(interval, Gap)
        and not isinstance(estimate, Gap)
        and estimate
        and not _the_tables_own(study, one, start)
    ):
        return number_needed_alone(estimate, interval, welcome=welcome_of_effects(study.outcome))
    return number_needed_from(
        difference, welcome=welcome_of_effects(study.outcome), beside=_stays_on_its_side(one, interval)
    )


def _stays_on_its_side(one: Carriable, interval: Interval | Range | Gap) -> bool:
    """Whether the limit withheld lies on the side of the other one, since the effect's own limit does.

    Of an effect without a logarithm nothing can be propagated on one side, where its limit may exclude no effect.
    """
    effect, none = one.figure.interval, no_effect_of(one.effect)
    if not isinstance(interval, Range) or isinstance(effect, Gap):
        return False
    gap, limit, sign = (
        (interval.low, effect.low, -1.0) if isinstance(interval.low, Gap) else (interval.high, effect.high, 1.0)
    )
    open_side = isinstance(gap, Gap) and gap.key in ("endless-log", "undetermined-at-baseline")
    return open_side and not isinstance(limit, Gap) and sign * (limit - none) <= 0.0


def _conversion(study: Study, start: Start | Gap, patient: PatientFindings | Gap) -> Conversion | Gap:
    """The odds ratio as a risk ratio at the starting risk (Zhang and Yu 1998, JAMA 280:1690).

    At the table's own reference risk that is the table's own risk ratio, so its direct interval stands there. Limits
    converted at an estimated risk as if it were certain can cover far too seldom: at 95%, with 50 people a group and
    true risks of 90% v 60%, only 59% of the time (by enumeration of all tables).
    """
    odds_ratio = study.odds_ratio
    if odds_ratio is None:
        return study.no_conversion
    if isinstance(start, Gap):
        return start
    if start.origin == "reference" and study.own is not None:
        return Conversion(
            baseline=start.value, baseline_from="reference", risk_ratio=_direct(odds_ratio.figure, study.own)
        )
    if isinstance(patient, PatientFindings) and patient.carried is odds_ratio.figure and patient.other_span is None:
        return Conversion(baseline=patient.baseline, baseline_from="given", risk_ratio=patient.risk_ratio)
    of_the_patient = isinstance(patient, PatientFindings) and patient.carried is odds_ratio.figure
    if start.share is not None and isinstance(patient, PatientFindings) and not of_the_patient:
        # Each effect solves for a starting risk of its own, and the patient has one.
        start = Start(value=patient.baseline, origin="overall")
    found = carried_to(odds_ratio, start)
    if isinstance(found.baseline, Gap):
        return found.baseline
    return Conversion(baseline=found.baseline, baseline_from="given", risk_ratio=found.risk_ratio)


def _direct(odds_ratio: Figure, own: OwnRisks) -> Figure:
    """The table's risk ratio; without an odds ratio there is nothing to see as one."""
    if isinstance(odds_ratio.estimate, Gap):
        return Figure(estimate=odds_ratio.estimate, interval=odds_ratio.estimate, method=own.ratio.method)
    return own.ratio
