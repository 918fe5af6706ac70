"""Limits of the bare textbook formula where no risk, and no difference of risks, can lie.

Wald's formula knows no bounds. In a study's row its limits stand as they are, since papers print them so; a patient is
told of none that cannot be.
"""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, Interval, Range

UNBOUNDED = "wald"
"""The method whose limits can lie outside what is possible; those of the other families cannot."""

ROUNDING = 1e-12


def risk_within_reach(risk: Figure) -> Figure:
    """A risk without the limits below 0 or above 100%."""
    return _bounded(risk, (0.0, 1.0), (Gap("beyond-zero"), Gap("formula-beyond-one")))


def within_everybody(difference: Figure) -> Figure:
    """A difference without the limits beyond 100 in 100, whose reciprocal would be less than one person."""
    return _between(difference, -1.0, 1.0)


def within_reach(difference: Figure, index: Figure, reference: Figure) -> Figure:
    """A difference without the limits that the two risks cannot reach, each inside its own interval and 0 to 100%.

    2/50 v 500/5000 has 6.0 fewer per 100, at most 11.5 fewer by Wald, which is more than the reference group had.
    """
    if difference.method != UNBOUNDED:
        return difference
    (index_low, index_high), (reference_low, reference_high) = _ends(index), _ends(reference)
    return _between(difference, index_low - reference_high, index_high - reference_low)


def _between(difference: Figure, least: float, most: float) -> Figure:
    gap = Gap("formula-beyond-risks")
    return _bounded(difference, (least - ROUNDING, most + ROUNDING), (gap, gap))


def _ends(risk: Figure) -> tuple[float, float]:
    """The limits of a risk, cut to what a risk can be; where the formula gives no width it may be any."""
    if not isinstance(risk.interval, Interval):
        return 0.0, 1.0
    return max(0.0, risk.interval.low), min(1.0, risk.interval.high)


def _bounded(figure: Figure, bounds: tuple[float, float], gaps: tuple[Gap, Gap]) -> Figure:
    interval = figure.interval
    if figure.method != UNBOUNDED or not isinstance(interval, Interval):
        return figure
    below, above = interval.low < bounds[0], interval.high > bounds[1]
    if not (below or above):
        return figure
    bounded: Range | Gap = (
        gaps[0]
        if below and above
        else Range(low=gaps[0] if below else interval.low, high=gaps[1] if above else interval.high)
    )
    return Figure(estimate=figure.estimate, interval=bounded, method=figure.method)
