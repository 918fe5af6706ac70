"""The share of a cohort's events that the exposure explains, taken as their cause."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, Interval
from fourcount.stats.attributable import (
    exposed_fraction,
    exposed_fraction_interval,
    population_fraction,
    population_fraction_interval,
)
from fourcount.stats.results import FractionalCounts

POPULATION_METHOD = "population-fraction"
"""The key of the population fraction's own interval."""


def of_exposed(ratio: Figure | Gap) -> Figure | Gap:
    """(R - 1)/R with the limits of the ratio turned likewise, by the ratio's method; a Gap where R is below 1."""
    if isinstance(ratio, Gap):
        return ratio
    if isinstance(ratio.estimate, Gap):
        return ratio.estimate
    estimate = exposed_fraction(ratio.estimate)
    if isinstance(estimate, Gap):
        return estimate
    interval = ratio.interval
    limits = exposed_fraction_interval(ratio.estimate, interval) if isinstance(interval, Interval) else interval
    return Figure(estimate=estimate, interval=limits, method=ratio.method)


def of_population(counts: FractionalCounts, behind: FractionalCounts | Gap, level: float) -> Figure | Gap:
    """Miettinen's fraction of all events, with its log interval."""
    estimate = population_fraction(counts)
    if isinstance(estimate, Gap):
        return estimate
    interval = behind if isinstance(behind, Gap) else population_fraction_interval(behind, level)
    return Figure(estimate=estimate, interval=interval, method=POPULATION_METHOD)
