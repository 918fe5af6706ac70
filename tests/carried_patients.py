"""A patient's findings built by hand from an effect and a starting risk, for the words' tests."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import (
    Carriable,
    CarriedEffect,
    Figure,
    Gap,
    Interval,
    OutcomeFindings,
    PatientFindings,
    Range,
)
from fourcount.appraisal.measures import number_needed_from
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.conversion import risk_with
from fourcount.stats.normal import quantile
from fourcount.stats.propagation import StartLimits, limits_of_counts, propagated

BARE = Gap("bare-starting-risk")


def effect(estimate: float, low: float, high: float) -> Figure:
    """A printed effect with its limits."""
    return Figure(estimate=estimate, interval=Interval(low=low, high=high), method="printed")


def carried(
    kind: CarriedEffect, figure: Figure, start: float, *, welcome: bool = False, gap: str = "", **changes: object
) -> PatientFindings:
    """The effect at a bare starting risk; ``gap`` withholds the number needed."""

    def at(value: float | Gap) -> float | Gap:
        return value if isinstance(value, Gap) else risk_with(kind, value, start)

    def apart(risk: float | Gap) -> float | Gap:
        return risk if isinstance(risk, Gap) else risk - start

    def over(risk: float | Gap) -> float | Gap:
        return risk if isinstance(risk, Gap) else risk / (start or 1.0)

    limits = figure.interval
    low, high = (limits.low, limits.high) if isinstance(limits, Interval) else (Gap("x"), Gap("x"))
    with_ = _figure(at(figure.estimate), at(low), at(high))
    difference = _figure(apart(with_.estimate), apart(at(low)), apart(at(high)))
    ratio = _figure(over(with_.estimate), over(at(low)), over(at(high)))
    found = PatientFindings(
        baseline=start,
        baseline_from="given",
        effect=kind,
        carried=figure,
        without=Figure(estimate=start, interval=BARE, method=""),
        with_=with_,
        difference=difference,
        number_needed=Gap(gap) if gap else number_needed_from(difference, welcome=welcome),
        risk_ratio=ratio,
        range_from="effect",
        measure=kind,
        start_from="typed",
    )
    return msgspec.structs.replace(found, **changes)


def with_counts(kind: CarriedEffect, figure: Figure, events: int, total: int) -> PatientFindings:
    """The effect at a starting risk of other people, counted: both imprecise."""
    start = limits_of_counts(events, total)
    assert isinstance(start, StartLimits)
    assert isinstance(figure.interval, Interval)
    assert not isinstance(figure.estimate, Gap)
    both = propagated(kind, figure.estimate, figure.interval, 0.95, start)
    assert not isinstance(both, Gap)
    bare = carried(kind, figure, events / total)
    z = quantile(0.95)
    without = Interval(low=start.at(-z), high=start.at(z))
    return msgspec.structs.replace(
        bare,
        without=Figure(estimate=events / total, interval=without, method="wilson"),
        with_=_figure(bare.with_.estimate, both.with_.low, both.with_.high),
        difference=_figure(bare.difference.estimate, both.difference.low, both.difference.high),
        risk_ratio=_figure(bare.risk_ratio.estimate, both.risk_ratio.low, both.risk_ratio.high),
        range_from="both",
        start_interval=without,
    )


def findings_with(outcome: Outcome, patient: PatientFindings, *odds: Figure) -> OutcomeFindings:
    """The outcome's findings with this patient; ``odds`` is an odds ratio that could be carried instead."""
    one = Carriable(effect=patient.effect, measure=patient.measure, figure=patient.carried)
    others = tuple(Carriable(effect="odds_ratio", measure="odds_ratio", figure=figure) for figure in odds)
    return msgspec.structs.replace(appraise(outcome, Choices()), patient=patient, carriable=(one, *others))


def _figure(estimate: float | Gap, low: float | Gap, high: float | Gap) -> Figure:
    interval: Interval | Range | Gap
    if not isinstance(low, Gap) and not isinstance(high, Gap):
        interval = Interval(low=low, high=high)
    elif isinstance(low, Gap) and isinstance(high, Gap):
        interval = low
    else:
        interval = Range(low=low, high=high)
    return Figure(estimate=estimate, interval=interval, method="printed")
