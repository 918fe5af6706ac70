"""Intervals of the risk difference D = p1 - p2, index minus reference."""

from __future__ import annotations

import math

from fourcount.stats.estimates import difference_of_risks, without_people
from fourcount.stats.normal import quantile
from fourcount.stats.results import FractionalCounts, Gap, Interval
from fourcount.stats.risk import score_distances
from fourcount.stats.roots import increasing_root
from fourcount.stats.score import mirrored, target


def miettinen_nurminen(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The score interval with the variance times N/(N-1) (Miettinen and Nurminen 1985, Stat Med 4:213).

    The lower limit is exactly -1 where the difference is -1, the upper exactly 1 where it is 1.
    """
    return _score(counts, level, finite=True)


def mee(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The score interval without that factor (Mee 1984; Newcombe's method 5)."""
    return _score(counts, level, finite=False)


def newcombe(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The hybrid score interval (Newcombe 1998, Stat Med 17:873, method 10).

    The distances from each risk to its Wilson limits, squared and added.
    """
    return _square_and_add(counts, level, correction=0.0)


def newcombe_continuity(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The same from Wilson limits with a correction for continuity (Newcombe's method 11)."""
    return _square_and_add(counts, level, correction=0.5)


def wald(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The textbook interval D -+ z sqrt(p1(1-p1)/n1 + p2(1-p2)/n2), given as it is where it leaves -1 to 1.

    Its width is zero where each group has a risk of 0 or 1: a gap.
    """
    gap = without_people(counts)
    if gap is not None:
        return gap
    return _plain(counts, level) if _plain_variance(counts) > 0.0 else Gap("zero-width")


def agresti_caffo(counts: FractionalCounts, level: float) -> Interval | Gap:
    """Wald's interval after adding one to each of the four counts (Agresti and Caffo 2000, Am Stat 54:280).

    It can leave -1 to 1, and then does not hold a difference of -1 or 1; it is given as it is.
    """
    gap = without_people(counts)
    if gap is not None:
        return gap
    added = FractionalCounts(
        index_events=counts.index_events + 1,
        index_non_events=counts.index_non_events + 1,
        reference_events=counts.reference_events + 1,
        reference_non_events=counts.reference_non_events + 1,
    )
    return _plain(added, level)


def _plain_variance(counts: FractionalCounts) -> float:
    index = counts.index_events * counts.index_non_events / counts.index_total**3
    return index + counts.reference_events * counts.reference_non_events / counts.reference_total**3


def _plain(counts: FractionalCounts, level: float) -> Interval:
    half_width = quantile(level) * math.sqrt(_plain_variance(counts))
    estimate = difference_of_risks(counts)
    return Interval(low=estimate - half_width, high=estimate + half_width)


def _square_and_add(counts: FractionalCounts, level: float, *, correction: float) -> Interval | Gap:
    gap = without_people(counts)
    if gap is not None:
        return gap
    z = quantile(level)
    index_below, index_above = score_distances(counts.index_events, counts.index_total, z, correction)
    reference_below, reference_above = score_distances(counts.reference_events, counts.reference_total, z, correction)
    estimate = difference_of_risks(counts)
    return Interval(
        low=estimate - math.hypot(index_below, reference_above),
        high=estimate + math.hypot(index_above, reference_below),
    )


def _score(counts: FractionalCounts, level: float, *, finite: bool) -> Interval | Gap:
    gap = without_people(counts)
    if gap is not None:
        return gap
    reach = target(counts, level, finite=finite)
    if isinstance(reach, Gap):
        return reach
    return Interval(low=_lower(counts, reach), high=-_lower(mirrored(counts), reach))


def _lower(counts: FractionalCounts, reach: float) -> float:
    """The difference below the estimate at which u sqrt(V) is ``reach``, u being the multiplier of the constraint.

    The difference is D - u V, and u^2 V is known at the limit, so that only u itself must be exact.
    """
    if counts.index_events == 0 and counts.reference_non_events == 0:
        return -1.0

    def curve(u: float) -> tuple[float, float]:
        square, slope = _statistic(counts, u)
        root = math.sqrt(square)
        return root - reach, slope / (2.0 * root) if root > 0.0 else 0.0

    low, high = 0.0, float(counts.total)
    while curve(high)[0] < 0.0:
        low, high = high, 2.0 * high
    u = increasing_root(curve, low, high, _first_guess(counts, reach))
    return max(difference_of_risks(counts) - reach * reach / u, -1.0)  # only the last bit can lie beyond -1


def statistic_at(counts: FractionalCounts, margin: float) -> float:
    """The square of the statistic under a difference between -1 and the estimate, without the finite factor.

    The multiplier is found at which D - u V is that difference.
    """
    away = difference_of_risks(counts) - margin

    def curve(u: float) -> tuple[float, float]:
        square, slope = _statistic(counts, u)
        return square / u - away, (slope - square / u) / u

    low, high = 0.0, float(counts.total)
    while curve(high)[0] < 0.0:
        low, high = high, 2.0 * high
    u = increasing_root(curve, low, high, away / variance if (variance := _plain_variance(counts)) else math.inf)
    return u * away


def _first_guess(counts: FractionalCounts, reach: float) -> float:
    """The multiplier if the fitted risks stayed where the estimates are; infinite where both of those are 0 or 1."""
    variance = _plain_variance(counts)
    return reach / math.sqrt(variance) if variance > 0.0 else math.inf


def _statistic(counts: FractionalCounts, u: float) -> tuple[float, float]:
    """u^2 V and its slope."""
    index, index_slope = _share(counts.index_events, counts.index_non_events, u)
    reference, reference_slope = _share(counts.reference_non_events, counts.reference_events, u)
    return index + reference, index_slope + reference_slope


def _share(drawn_off: float, drawn_to: float, u: float) -> tuple[float, float]:
    """u^2 P(1-P)/n and its slope, for a group that the multiplier draws off one outcome and to the other.

    Of the first outcome P = 2x/(n+u+S), of the second 1-P = 2y/(n-u+S), with S^2 = (u+y-x)^2 + 4xy; once u has
    passed n the latter is (u-n+S)/(2u). dP/du is -P(1-P)/S. With no x, P stays 0; with no y, P stays 1 up to u = n.
    """
    people = drawn_off + drawn_to
    if drawn_off == 0 or (drawn_to == 0 and u <= people):
        return 0.0, 0.0
    stiffness = math.hypot(u + (drawn_to - drawn_off), 2.0 * math.sqrt(drawn_off * drawn_to))
    first = 2.0 * drawn_off / (people + u + stiffness)
    passed = u - people
    second = (passed + stiffness) / (2.0 * u) if passed > 0.0 else 2.0 * drawn_to / (stiffness - passed)
    spread = first * second
    return u * u * (spread / people), u * spread * (1.0 / people + 1.0 / stiffness)
