"""What follows from an effect that is printed without counts."""

from __future__ import annotations

import math

from fourcount.appraisal.case import Case
from fourcount.appraisal.conversion import converted_figure
from fourcount.appraisal.extras.e_values import OBSERVATIONAL, e_values
from fourcount.appraisal.extras.of_ratio import outcome_is_common
from fourcount.appraisal.extras.printed import (
    DIFFERENCES,
    PRINTED,
    RATIOS,
    as_figure,
    is_adjusted,
    level_of,
    read_effect,
)
from fourcount.appraisal.findings import (
    Conversion,
    EValues,
    Extras,
    Figure,
    Gap,
    Interval,
    OutcomeFindings,
    PatientFindings,
    PrintedFigure,
    Probability,
    Recovered,
)
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import whole
from fourcount.appraisal.gating import SUPPORT, withheld_of_effects
from fourcount.appraisal.patient import carry_effect
from fourcount.appraisal.postponing import Pace
from fourcount.appraisal.starting_risk import StartingRisk, Typed, marks_of, typed_risk
from fourcount.record.entry.readings import Proportion, Unreadable
from fourcount.record.outcome import Effect, Outcome
from fourcount.record.paper import Choices
from fourcount.stats.recovery import from_limits, from_p

RECOVERED = "recovered"
"""The method of a p that was worked out from a printed interval or from itself."""

_CARRIED: dict[str, Effect] = {"risk_ratio": "risk_ratio", "odds_ratio": "odds_ratio"}
_TURNED = ("odds_ratio", "risk_difference")
"""The effects that say the same of the other outcome: an odds ratio turned over, a difference with its sign changed."""


def appraise_effect(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:  # noqa: ARG001 - one way in
    """The printed effect as it stands, its standard error and p, and what it says at a typed starting risk.

    Its limits stay those of the print, whatever level the record has. Where only a p is printed, they are rebuilt
    from it at the usual level, which is approximate.
    """
    read, typed = read_effect(outcome.paper_text, outcome.paper_measure, "paper_text"), typed_risk(outcome)
    marks = read.marks + marks_of(typed)
    printed = read.effect
    figure = printed if isinstance(printed, Gap) else _figure(printed, outcome)
    if isinstance(printed, Gap):
        return nothing_yet(printed, form="effect-only", measures=(outcome.paper_measure,), marks=marks)
    if isinstance(figure, Gap):
        return nothing_yet(figure, form="effect-only", measures=(printed.measure,), marks=marks, given=printed)
    figure, recovered = _with_interval(figure, printed)
    start = _start(typed)
    p = recovered if isinstance(recovered, Gap) else recovered.p
    figures: dict[str, Figure] = {printed.measure: figure}
    case = Case(
        outcome=outcome,
        form="effect-only",
        given=printed,
        choices=choices,
        figures=figures,
        test=Probability(p=p, method=RECOVERED),
        conversion=_conversion(printed, figure, start),
        patient=_patient(printed, figure, start, outcome),
        marks=marks,
        extras=Extras(e_value=_e_value(printed, figure, outcome), recovered=recovered),
    )
    return whole(case, figures)


def _e_value(printed: PrintedFigure, figure: Figure, outcome: Outcome) -> EValues | Gap | None:
    """Of a printed ratio outside trials."""
    if outcome.design not in OBSERVATIONAL or printed.measure not in RATIOS:
        return None
    common = outcome_is_common(outcome, None)
    return e_values(figure, printed.measure, common=common, adjusted=is_adjusted(printed, outcome))


def _figure(printed: PrintedFigure, outcome: Outcome) -> Figure | Gap:
    """The effect of the index group and the counted outcome, or why this design or outcome has none."""
    withheld = withheld_of_effects(outcome.design)
    if printed.measure in withheld:
        return Gap(withheld[printed.measure])
    if outcome.counted == "right" and printed.measure not in _TURNED:
        return Gap("other-outcome-unknown")
    figure = as_figure(printed)
    turns = (outcome.index_group == "second") + (outcome.counted == "right")
    return figure if isinstance(figure, Gap) or turns != 1 else _turned(figure, printed.measure)


def _turned(figure: Figure, measure: str) -> Figure:
    """The other way round: 1/x of a ratio, the other sign of a difference. Twice is as before."""
    turn = _negative if measure in DIFFERENCES else _reciprocal
    estimate, interval = figure.estimate, figure.interval
    if isinstance(interval, Interval):
        interval = Interval(low=turn(interval.high), high=turn(interval.low))
    return Figure(
        estimate=estimate if isinstance(estimate, Gap) else turn(estimate), interval=interval, method=figure.method
    )


def _negative(value: float) -> float:
    return 0.0 - value


def _reciprocal(value: float) -> float:
    return math.inf if value == 0 else 1.0 / value


def _with_interval(figure: Figure, printed: PrintedFigure) -> tuple[Figure, Recovered | Gap]:
    """The figure with the limits of the print, or those that its p gives; and what both give for its standard error."""
    log_scale = printed.measure not in DIFFERENCES
    estimate = figure.estimate
    if isinstance(estimate, Gap):
        return figure, estimate
    rebuilt, level = isinstance(figure.interval, Gap), level_of(printed)
    if rebuilt and printed.p is not None and printed.p_relation == "=":
        interval = from_p(estimate, printed.p.value, level, log_scale)
        figure = Figure(estimate=estimate, interval=interval, method=PRINTED)
    if not isinstance(figure.interval, Interval):
        return figure, figure.interval if isinstance(figure.interval, Gap) else Gap("no-interval-printed")
    found = from_limits(estimate, figure.interval.low, figure.interval.high, level, log_scale)
    if isinstance(found, Gap):
        return figure, found
    recovered = Recovered(
        standard_error=found.standard_error, z=found.z, p=found.p, log_scale=log_scale, from_p=rebuilt
    )
    return figure, recovered


def _start(typed: Typed) -> StartingRisk | Gap:
    if isinstance(typed, Unreadable):
        return Gap("baseline-unreadable")
    if isinstance(typed, Proportion):
        return StartingRisk(value=typed.value, origin="given")
    return Gap("effect-needs-baseline")


def _conversion(printed: PrintedFigure, figure: Figure, start: StartingRisk | Gap) -> Conversion | Gap:
    """The odds ratio as a risk ratio at the typed starting risk."""
    if printed.measure != "odds_ratio":
        return Gap("not-counts")
    if isinstance(start, Gap):
        return start
    ratio = converted_figure(figure, start.value)
    return Conversion(baseline=start.value, baseline_from=start.origin, risk_ratio=ratio)


def _patient(
    printed: PrintedFigure, figure: Figure, start: StartingRisk | Gap, outcome: Outcome
) -> PatientFindings | Gap:
    """A ratio of risks or of odds at the typed starting risk; other effects are not carried."""
    support = SUPPORT[outcome.design]
    effect = _CARRIED.get(printed.measure)
    if effect is None or effect not in support.carries:
        return Gap("carried-later")
    return start if isinstance(start, Gap) else carry_effect(figure, start, effect, support, welcome=outcome.welcome)
