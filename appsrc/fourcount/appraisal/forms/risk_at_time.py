"""What follows from two risks at one time that are printed with their limits."""

from __future__ import annotations

from fourcount.appraisal.carrying.carry import marks_of
from fourcount.appraisal.carrying.studies import study_of_risks
from fourcount.appraisal.case import Case
from fourcount.appraisal.extras.of_ratio import extras_of_ratio
from fourcount.appraisal.extras.printed import PRINTED, adjusted_of
from fourcount.appraisal.findings import (
    TIMED_MEASURES,
    Figure,
    Gap,
    Interval,
    OutcomeFindings,
    TimedRisks,
)
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import Measure, for_the_reader, given_or_why, whole
from fourcount.appraisal.gating import withheld_of_timed
from fourcount.appraisal.measures import number_needed_from
from fourcount.appraisal.postponing import Pace
from fourcount.record.entry.readings import PrintedRisk, RiskAtTimeReading
from fourcount.record.entry.risk_at_time import read_risk_at_time
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import Outcome, RiskAtTime
from fourcount.record.paper import USUAL_LEVEL, Choices
from fourcount.stats import timed as stats
from fourcount.stats.methods import method
from fourcount.stats.results import LimitedRisk

SQUARE_AND_ADD = "square-and-add"


def appraise_timed(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:  # noqa: ARG001 - one way in
    """The printed risks, their difference, number needed and ratio, at the level at which the limits are printed."""
    table = outcome.table
    reading = read_risk_at_time(table) if isinstance(table, RiskAtTime) else _BLANK
    adjusted, typed = adjusted_of(outcome), read_start(outcome.patient)
    marks = reading.marks + marks_of(outcome, typed) + adjusted.marks
    index, reference = _oriented(reading, outcome)
    lacking = _lacking(reading, index, reference)
    if lacking is not None:
        return nothing_yet(lacking, form="risk-at-time", measures=TIMED_MEASURES, marks=marks)
    withheld = withheld_of_timed(outcome.design)
    timed = _timed(index, reference, reading.level)
    figures = {key: figure for key, figure in _figures(index, reference, timed).items() if key not in withheld}
    nothing = Gap(withheld.get("risk_ratio", "not-counts"))
    study = study_of_risks(outcome, figures, withheld, adjusted, reading.level)
    measures: dict[str, Measure] = {}
    for key in TIMED_MEASURES:
        measures[key] = Gap(withheld[key]) if key in withheld else _measure(key, figures, welcome=outcome.welcome)
    case = Case(
        outcome=outcome,
        form="risk-at-time",
        given=timed,
        choices=choices,
        figures=figures,
        test=nothing,
        reader=for_the_reader(study, typed, measures, reading.level),
        marks=marks,
        extras=extras_of_ratio(outcome, figures.get("risk_ratio"), "risk_ratio", adjusted),
    )
    return whole(case, measures)


def _lacking(reading: RiskAtTimeReading, index: PrintedRisk, reference: PrintedRisk) -> Gap | None:
    if any(not mark.used for mark in reading.marks):
        return Gap("unreadable")
    return Gap("risks-not-typed") if index.risk is None or reference.risk is None else None


_BLANK = RiskAtTimeReading(first=PrintedRisk(), second=PrintedRisk(), level=USUAL_LEVEL)


def _oriented(reading: RiskAtTimeReading, outcome: Outcome) -> tuple[PrintedRisk, PrintedRisk]:
    first, second = (
        (reading.first, reading.second)
        if outcome.counted == "left"
        else (_other_outcome(reading.first), _other_outcome(reading.second))
    )
    return (first, second) if outcome.index_group == "first" else (second, first)


def _other_outcome(printed: PrintedRisk) -> PrintedRisk:
    """The risk of not having the event; the lower limit becomes the upper one."""
    risk, low, high = (None if value is None else 1.0 - value for value in (printed.risk, printed.high, printed.low))
    return PrintedRisk(risk=risk, low=low, high=high)


def _limited(printed: PrintedRisk) -> LimitedRisk | None:
    if printed.risk is None or printed.low is None or printed.high is None:
        return None
    return LimitedRisk(risk=printed.risk, low=printed.low, high=printed.high)


def _timed(index: PrintedRisk, reference: PrintedRisk, level: float) -> TimedRisks | Gap:
    one, other = _limited(index), _limited(reference)
    if one is None or other is None:
        return Gap("limits-not-printed")
    return TimedRisks(index=one, reference=other, level=level)


def _figures(index: PrintedRisk, reference: PrintedRisk, timed: TimedRisks | Gap) -> dict[str, Figure]:
    """Risks as printed; difference and ratio by square-and-add, without an interval where limits are missing."""
    bare = TimedRisks(index=_bare(index), reference=_bare(reference), level=USUAL_LEVEL)
    return {
        "risk_index": _printed(index),
        "risk_reference": _printed(reference),
        "risk_difference": Figure(
            estimate=stats.timed_difference(bare),
            interval=_interval("timed_difference", timed),
            method=SQUARE_AND_ADD,
        ),
        "risk_ratio": Figure(
            estimate=stats.timed_ratio(bare), interval=_interval("timed_ratio", timed), method=SQUARE_AND_ADD
        ),
    }


def _bare(printed: PrintedRisk) -> LimitedRisk:
    risk = 0.0 if printed.risk is None else printed.risk
    return LimitedRisk(risk=risk, low=risk, high=risk)


def _printed(printed: PrintedRisk) -> Figure:
    limited = _limited(printed)
    interval = Gap("limits-not-printed") if limited is None else Interval(low=limited.low, high=limited.high)
    return Figure(estimate=_bare(printed).risk, interval=interval, method=PRINTED)


def _interval(measure: str, timed: TimedRisks | Gap) -> Interval | Gap:
    return timed if isinstance(timed, Gap) else method(measure, SQUARE_AND_ADD).interval(timed, timed.level)


def _measure(key: str, figures: dict[str, Figure], *, welcome: bool) -> Measure:
    if key == "number_needed":
        return number_needed_from(figures["risk_difference"], welcome=welcome)
    return given_or_why(figures[key])
