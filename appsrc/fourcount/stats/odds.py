"""Unconditional intervals of the odds ratio psi = ad/bc."""

from __future__ import annotations

import math

from fourcount.stats.estimates import without_people
from fourcount.stats.log_scale import limits_around
from fourcount.stats.normal import quantile
from fourcount.stats.results import FractionalCounts, Gap, Interval
from fourcount.stats.roots import increasing_root
from fourcount.stats.score import mirrored, multiplier, target


def miettinen_nurminen(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The score interval with the variance times N/(N-1) (Miettinen and Nurminen 1985, Stat Med 4:213).

    The lower limit is 0 where a or d is 0, the upper infinite where b or c is 0.
    """
    return _score(counts, level, finite=True)


def cornfield(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The score interval without that factor: Cornfield's (1956), without a correction for continuity."""
    return _score(counts, level, finite=False)


def woolf(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The logit interval psi exp(-+ z sqrt(1/a + 1/b + 1/c + 1/d)) (Woolf 1955).

    With a count of 0 it does not exist, and Gart's, which adds 1/2, takes its place and says so.
    """
    gap = without_people(counts)
    if gap is not None:
        return gap
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    if 0 in (a, b, c, d):
        return gart(counts, level)
    half_width = quantile(level) * math.sqrt(1 / a + 1 / b + 1 / c + 1 / d)
    centre = (a * d) / (b * c)
    return limits_around(centre, half_width)


def gart(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The logit interval with 1/2 added to all four counts, centre included (Gart 1966)."""
    gap = without_people(counts)
    if gap is not None:
        return gap
    a, b = 2 * counts.index_events + 1, 2 * counts.index_non_events + 1
    c, d = 2 * counts.reference_events + 1, 2 * counts.reference_non_events + 1
    half_width = quantile(level) * math.sqrt(2 / a + 2 / b + 2 / c + 2 / d)
    centre = (a * d) / (b * c)
    return limits_around(centre, half_width, adjusted="half")


def _score(counts: FractionalCounts, level: float, *, finite: bool) -> Interval | Gap:
    gap = without_people(counts)
    if gap is not None:
        return gap
    reach = target(counts, level, finite=finite)
    if isinstance(reach, Gap):
        return reach
    below = _lower(mirrored(counts), reach)
    return Interval(low=_lower(counts, reach), high=1.0 / below if below > 0.0 else math.inf)


def _lower(counts: FractionalCounts, reach: float) -> float:
    """The psi below the estimate at which u^2 [n1/((a-u)(b+u)) + n2/((c+u)(d-u))] is the square of ``reach``.

    There the fitted counts are a-u, b+u, c+u and d-u: the margins of the table do not move.
    """
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    n1, n2 = counts.index_total, counts.reference_total
    if a == 0 or d == 0:
        return 0.0

    def spread(u: float) -> tuple[float, float]:
        index, reference = (a - u) * (b + u), (c + u) * (d - u)
        slope = n1 * (b - a + 2.0 * u) / (index * index) + n2 * (c - d + 2.0 * u) / (reference * reference)
        return n1 / index + n2 / reference, slope

    high = min(a, d)
    start = reach / math.sqrt(n1 / (a * b) + n2 / (c * d)) if b and c else high / 2.0
    u = multiplier(spread, high, reach, start)
    return ((a - u) / (b + u)) * ((d - u) / (c + u))


def statistic_at(counts: FractionalCounts, margin: float) -> float:
    """The square of the statistic under an odds ratio above 0 and below the estimate, without the finite factor.

    The multiplier is found at which (a-u)(d-u) is the odds ratio times (b+u)(c+u).
    """
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events

    def curve(u: float) -> tuple[float, float]:
        slope = a + d - 2.0 * u + margin * (b + c + 2.0 * u)
        return margin * (b + u) * (c + u) - (a - u) * (d - u), slope

    u = increasing_root(curve, 0.0, min(a, d), min(a, d) / 2.0)
    n1, n2 = counts.index_total, counts.reference_total
    return u * u * (n1 / ((a - u) * (b + u)) + n2 / ((c + u) * (d - u)))
