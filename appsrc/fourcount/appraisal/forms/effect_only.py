"""What follows from an effect that is printed without counts."""

from __future__ import annotations

from fourcount.appraisal.carrying.carry import marks_of
from fourcount.appraisal.carrying.effects import of_print
from fourcount.appraisal.carrying.study import Study
from fourcount.appraisal.case import Case
from fourcount.appraisal.extras.e_values import e_values
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
    EValues,
    Extras,
    Figure,
    Gap,
    Interval,
    OutcomeFindings,
    PrintedFigure,
    Probability,
    Recovered,
)
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import for_the_reader, line_of, whole
from fourcount.appraisal.gating import OBSERVATIONAL, SUPPORT, withheld_of_effects
from fourcount.appraisal.postponing import Pace
from fourcount.appraisal.turning import oriented_effect
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.recovery import from_limits, from_p

RECOVERED = "recovered"
"""The method of a p that was worked out from a printed interval or from itself."""


def appraise_effect(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:  # noqa: ARG001 - one way in
    """The printed effect as it stands, its standard error and p, and what it says at a typed starting risk.

    Its limits stay those of the print, whatever level the record has. Where only a p is printed, they are rebuilt
    from it at the usual level, which is approximate.
    """
    read, typed = read_effect(outcome.paper_text, outcome.paper_measure, "paper_text"), read_start(outcome.patient)
    marks = read.marks + marks_of(outcome, typed)
    printed = read.effect
    figure = printed if isinstance(printed, Gap) else _figure(printed, outcome)
    if isinstance(printed, Gap):
        return nothing_yet(printed, form="effect-only", measures=(outcome.paper_measure,), marks=marks)
    if isinstance(figure, Gap):
        line, line_marks = line_of(outcome, {printed.measure: figure}, None, level_of(printed))
        marks += line_marks
        return nothing_yet(
            figure, form="effect-only", measures=(printed.measure,), marks=marks, given=printed, line=line
        )
    figure, recovered = _with_interval(figure, printed)
    study = _study(printed, figure, outcome)
    p = recovered if isinstance(recovered, Gap) else recovered.p
    figures: dict[str, Figure] = {printed.measure: figure}
    case = Case(
        outcome=outcome,
        form="effect-only",
        given=printed,
        choices=choices,
        figures=figures,
        test=Probability(p=p, method=RECOVERED),
        reader=for_the_reader(study, typed, figures, level_of(printed)),
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
    figure = as_figure(printed)
    return figure if isinstance(figure, Gap) else oriented_effect(figure, printed.measure, outcome)


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


def _study(printed: PrintedFigure, figure: Figure, outcome: Outcome) -> Study:
    """The printed effect itself, at a starting risk that has to be typed."""
    one = of_print(printed, figure, outcome, adjusted=is_adjusted(printed, outcome))
    needed = SUPPORT[outcome.design].patient_number_needed
    counted_events = printed.measure == "rate_ratio" and outcome.counting == "events"
    return Study(
        outcome=outcome,
        carriable=() if one is None else (one,),
        needs="difference-needs-baseline" if printed.measure == "risk_difference" else "effect-needs-baseline",
        odds_ratio=one if one is not None and one.effect == "odds_ratio" else None,
        nothing=Gap("rate-difference-not-carried" if printed.measure == "rate_difference" else "not-carried"),
        number_needed="design-before-after" if outcome.design == "before-after" else needed,
        refused=Gap("events-not-people") if counted_events else None,
    )
