"""The share of a cohort's events that the exposure explains, or prevents, taken as their cause."""

from __future__ import annotations

from collections.abc import Callable

from fourcount.appraisal.findings import Figure, Gap, Interval
from fourcount.stats.attributable import (
    exposed_fraction,
    exposed_fraction_interval,
    population_fraction,
    population_fraction_interval,
    prevented_fraction,
    prevented_fraction_interval,
)
from fourcount.stats.results import FractionalCounts

POPULATION_METHOD = "attributable-population"
"""The key of the population fraction's own interval, which is that of its entry among the calculations."""


def of_exposed(ratio: Figure | Gap) -> Figure | Gap:
    """(R - 1)/R with the limits of the ratio turned likewise, by the ratio's method; a Gap where R is below 1."""
    return _fraction(ratio, exposed_fraction, exposed_fraction_interval)


def prevented(ratio: Figure | Gap) -> Figure | None:
    """1 - R in the same way where the exposed fare better, and have no attributable fraction; None elsewhere."""
    exposed = of_exposed(ratio)
    if not isinstance(exposed, Gap) or exposed.key != "ratio-below-one":
        return None
    found = _fraction(ratio, prevented_fraction, prevented_fraction_interval)
    return None if isinstance(found, Gap) else found


def of_population(counts: FractionalCounts, behind: FractionalCounts | Gap, level: float) -> Figure | Gap:
    """Miettinen's fraction of all events, with its log interval."""
    estimate = population_fraction(counts)
    if isinstance(estimate, Gap):
        return estimate
    interval = behind if isinstance(behind, Gap) else population_fraction_interval(behind, level)
    return Figure(estimate=estimate, interval=interval, method=POPULATION_METHOD)


def _fraction(
    ratio: Figure | Gap,
    estimate: Callable[[float], float | Gap],
    limits: Callable[[float, Interval], Interval | Gap],
) -> Figure | Gap:
    if isinstance(ratio, Gap):
        return ratio
    if isinstance(ratio.estimate, Gap):
        return ratio.estimate
    fraction, interval = estimate(ratio.estimate), ratio.interval
    if isinstance(fraction, Gap):
        return fraction
    turned = limits(ratio.estimate, interval) if isinstance(interval, Interval) else interval
    return Figure(estimate=fraction, interval=turned, method=ratio.method)
