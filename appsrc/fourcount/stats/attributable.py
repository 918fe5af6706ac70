"""Attributable fractions: the share of events that would not have happened without the exposure.

All of them take the ratio as causal, and say nothing where the exposed fare better: a ratio below 1 has a prevented
fraction instead. A lower limit may lie below 0, or be minus infinity; it is given as it is.
"""

from __future__ import annotations

import math

from fourcount.stats.estimates import risk_ratio
from fourcount.stats.log_scale import exponential
from fourcount.stats.normal import quantile
from fourcount.stats.results import FractionalCounts, Gap, Interval

_LAST_BITS = 1e-15


def exposed_fraction(ratio: float) -> float | Gap:
    """The share of the exposed people's events: (R - 1)/R.

    An infinite ratio is a gap: it only says that the unexposed had no event yet. Source: common practice.
    """
    if not ratio >= 0.0:
        return Gap("not-positive", {"value": ratio})
    if math.isinf(ratio):
        return Gap("no-reference-events")
    # Counts divided by a design effect can turn a ratio of exactly 1 into one a last bit below.
    return max(_of_ratio(ratio), 0.0) if ratio >= 1.0 - _LAST_BITS else Gap("ratio-below-one", {"ratio": ratio})


def exposed_fraction_interval(ratio: float, interval: Interval) -> Interval | Gap:
    """The limits of a ratio, by any method, each turned into the fraction (L - 1)/L."""
    estimate = exposed_fraction(ratio)
    if isinstance(estimate, Gap):
        return estimate
    return Interval(low=_of_ratio(interval.low), high=_of_ratio(interval.high), adjusted=interval.adjusted)


def prevented_fraction(ratio: float) -> float | Gap:
    """The share of the events, otherwise expected among the exposed, that the exposure prevents: 1 - R."""
    if not ratio >= 0.0:
        return Gap("not-positive", {"value": ratio})
    return 1.0 - ratio if ratio <= 1.0 else Gap("ratio-above-one", {"ratio": ratio})


def prevented_fraction_interval(ratio: float, interval: Interval) -> Interval | Gap:
    """The limits of a ratio, each turned into the fraction 1 - L."""
    estimate = prevented_fraction(ratio)
    if isinstance(estimate, Gap):
        return estimate
    return Interval(low=1.0 - interval.high, high=1.0 - interval.low, adjusted=interval.adjusted)


def population_fraction(counts: FractionalCounts) -> float | Gap:
    """The share of all events in people who are exposed as the population is: pc (R - 1)/R, pc = a/m.

    Miettinen's form (1974, from memory); with the table's own exposure it equals Levin's, and 1 - (c/n2)/(m/N). Only a
    cohort that was chosen neither by exposure nor by outcome holds this share; a trial, whose groups somebody sized,
    does not.
    """
    ratio = risk_ratio(counts)
    fraction = ratio if isinstance(ratio, Gap) else exposed_fraction(ratio)
    if isinstance(fraction, Gap):
        return fraction
    a, b, c, d = _cells(counts)
    return max((a * d - b * c) / (counts.reference_total * counts.events), 0.0)


def population_fraction_interval(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The log interval: 1 - (1 - F) exp(z s) to 1 - (1 - F) exp(-z s), s^2 = (b + F(a + d))/(N c).

    s is the standard error of ln(1 - F) among people sampled without regard to exposure and outcome; where the sizes of
    the groups were fixed it is too wide. Source: Walter 1975; Fleiss 1979, Am J Epidemiol 110:103 (from memory).
    """
    fraction = population_fraction(counts)
    if isinstance(fraction, Gap):
        return fraction
    a, b, c, d = _cells(counts)
    variance = (b + fraction * (a + d)) / (counts.total * c)
    if variance == 0.0:
        return Gap("zero-width")
    left = c * counts.total / (counts.reference_total * counts.events)
    half_width = quantile(level) * math.sqrt(variance)
    return Interval(low=1.0 - left * exponential(half_width), high=1.0 - left * math.exp(-half_width))


def levin(prevalence: float, ratio: float) -> float | Gap:
    """The population fraction from a given prevalence of the exposure: p (R - 1)/(1 + p (R - 1)) (Levin 1953)."""
    if not 0.0 <= prevalence <= 1.0:
        return Gap("prevalence-out-of-range", {"prevalence": prevalence})
    fraction = exposed_fraction(ratio)
    return fraction if isinstance(fraction, Gap) else _levin(prevalence, ratio)


def levin_interval(prevalence: float, ratio: float, interval: Interval) -> Interval | Gap:
    """The same at each limit of the ratio, the prevalence being taken as known."""
    estimate = levin(prevalence, ratio)
    if isinstance(estimate, Gap):
        return estimate
    low, high = _levin(prevalence, interval.low), _levin(prevalence, interval.high)
    return Interval(low=low, high=high, adjusted=interval.adjusted)


def _cells(counts: FractionalCounts) -> tuple[float, float, float, float]:
    return counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events


def _of_ratio(ratio: float) -> float:
    if ratio == 0.0:
        return -math.inf
    return (ratio - 1.0) / ratio if math.isfinite(ratio) else 1.0


def _levin(prevalence: float, ratio: float) -> float:
    if math.isinf(ratio):
        return 1.0 if prevalence > 0.0 else 0.0
    excess = prevalence * (ratio - 1.0)
    return excess / (1.0 + excess) if excess > -1.0 else -math.inf
