"""Intervals of the risk difference and the risk ratio of matched pairs (letters: see ``pairs``)."""

from __future__ import annotations

import math

from fourcount.stats.normal import quantile
from fourcount.stats.pairs import index_events, reference_events, without_pairs
from fourcount.stats.results import Gap, Interval, PairCounts
from fourcount.stats.risk import score_distances, score_limits
from fourcount.stats.roots import increasing_root


def newcombe_paired(pairs: PairCounts, level: float) -> Interval | Gap:
    """The hybrid score interval of pairs (Newcombe 1998, Stat Med 17:2635, method 10).

    The distances from each side's risk to its Wilson limits, squared and added less twice their product times phi,
    the correlation of the two sides, which is corrected for continuity by n/2 where it is positive.
    """
    gap = without_pairs(pairs)
    if gap is not None:
        return gap
    z = quantile(level)
    index_below, index_above = score_distances(index_events(pairs), pairs.total, z)
    reference_below, reference_above = score_distances(reference_events(pairs), pairs.total, z)
    estimate, apart = _difference(pairs), _one_less_correlation(pairs)
    return Interval(
        low=estimate - _across(index_below, reference_above, apart),
        high=estimate + _across(index_above, reference_below, apart),
    )


def _across(one: float, other: float, apart: float) -> float:
    """sqrt(a^2 - 2 phi a b + b^2), from 1 - phi so that it keeps its digits near a phi of 1."""
    return math.hypot(one - other, math.sqrt(2.0 * apart * one * other))


def _one_less_correlation(pairs: PairCounts) -> float:
    """1 - phi, where phi = (eh - fg) / sqrt((e+f)(g+h)(e+g)(f+h)), and 0 where that is 0/0.

    A positive eh - fg is made smaller by n/2, but not below 0.
    """
    index, reference = index_events(pairs), reference_events(pairs)
    margins = index * (pairs.total - index) * reference * (pairs.total - reference)
    twice = 2 * (pairs.both * pairs.neither - pairs.index_only * pairs.reference_only)
    if twice > 0:
        twice = max(twice - pairs.total, 0)
    if margins == 0 or twice == 0:
        return 1.0
    root = 2.0 * math.sqrt(margins)
    if twice < 0:
        return 1.0 - twice / root
    # Whole-number arithmetic: 1 - phi is as small as 1/n, and phi a double next to 1.
    return (4 * margins - twice * twice) / (root * (root + twice))


def tango(pairs: PairCounts, level: float) -> Interval | Gap:
    """The asymptotic score interval (Tango 1998, Stat Med 17:891).

    The differences D0 at which (f - g - n D0) / sqrt(n (2q + D0(1 - D0))) is z and -z, q being the likeliest share
    of pairs with the event on the reference side only. At D0 = 0 the statistic is McNemar's, so that the two agree
    about no effect. Without discordance the limits are -+ z^2 / (n + z^2).
    """
    gap = without_pairs(pairs)
    if gap is not None:
        return gap
    z = quantile(level)
    low = _tango_lower(pairs.index_only, pairs.reference_only, pairs.total, z)
    return Interval(low=low, high=-_tango_lower(pairs.reference_only, pairs.index_only, pairs.total, z))


def _tango_lower(index_only: int, reference_only: int, total: int, z: float) -> float:
    """The estimate less the distance at which the statistic is z."""
    estimate = (index_only - reference_only) / total
    if reference_only == total:
        return -1.0
    root_of_total = math.sqrt(total)

    def curve(distance: float) -> tuple[float, float]:
        variance, rise = _pair_variance(index_only, reference_only, total, estimate - distance)
        if variance <= 0.0:
            return math.inf, 0.0
        root = math.sqrt(variance)
        return distance * root_of_total / root - z, root_of_total / root * (1.0 + distance * rise / (2.0 * variance))

    variance, _rise = _pair_variance(index_only, reference_only, total, estimate)
    distance = increasing_root(curve, 0.0, 1.0 + estimate, z * math.sqrt(variance) / root_of_total)
    return max(estimate - distance, -1.0)  # only the last bit can lie beyond -1


def _pair_variance(index_only: int, reference_only: int, total: int, under: float) -> tuple[float, float]:
    """2q + D0(1 - D0) and its slope in D0, at the likeliest q of the difference D0."""
    if under < 0.0:
        variance, rise = _pair_variance(reference_only, index_only, total, -under)
        return variance, -rise
    a = 2.0 * total
    b_rise = 2 * total - index_only + reference_only
    b = b_rise * under - (index_only + reference_only)
    c = -reference_only * under * (1.0 - under)  # at most 0 on this side of 0: nothing cancels under the root
    root = math.sqrt(b * b - 4.0 * a * c)
    likeliest = (root - b) / (2.0 * a) if b <= 0.0 else -2.0 * c / (b + root)
    c_rise = -reference_only * (1.0 - 2.0 * under)
    likeliest_rise = -(b_rise * likeliest + c_rise) / root if root > 0.0 else 0.0
    return 2.0 * likeliest + under * (1.0 - under), 2.0 * likeliest_rise + 1.0 - 2.0 * under


def wald_paired(pairs: PairCounts, level: float) -> Interval | Gap:
    """The textbook interval D -+ z sqrt(f + g - (f - g)^2 / n) / n, given as it is where it leaves -1 to 1.

    Its width is zero where all pairs agree, or all disagree the same way: a gap.
    """
    gap = without_pairs(pairs)
    if gap is not None:
        return gap
    total, across = pairs.total, pairs.index_only - pairs.reference_only
    spread = pairs.discordant * total - across * across
    if spread == 0:
        return Gap("zero-width")
    half_width = quantile(level) * math.sqrt(spread / total) / total
    return Interval(low=_difference(pairs) - half_width, high=_difference(pairs) + half_width)


def _difference(pairs: PairCounts) -> float:
    return (pairs.index_only - pairs.reference_only) / pairs.total


def bonett_price(pairs: PairCounts, level: float) -> Interval | Gap:
    """The hybrid score interval of the ratio (Bonett and Price 2006, Stat Med 25:3039, from memory).

    Wilson limits of each side's share among the pairs with any event, with a z made smaller so that their quotients
    have the level. The lower limit is 0 with no event on the index side, the upper infinite with none on the other.
    """
    gap = without_events(pairs)
    if gap is not None:
        return gap
    index, reference = index_events(pairs), reference_events(pairs)
    some = pairs.both + pairs.discordant
    joint = math.sqrt((pairs.discordant + 2) / ((index + 1) * (reference + 1)))
    index_spread = math.sqrt((pairs.reference_only + 1) / ((some + 2) * (index + 1)))
    reference_spread = math.sqrt((pairs.index_only + 1) / ((some + 2) * (reference + 1)))
    z = quantile(level) * joint / (index_spread + reference_spread)
    first, second = score_limits(index, some, z), score_limits(reference, some, z)
    return Interval(low=first.low / second.high, high=first.high / second.low if reference else math.inf)


def wald_log_paired_ratio(pairs: PairCounts, level: float) -> Interval | Gap:
    """The textbook interval R exp(-+ z sqrt((f + g) / ((e+f)(e+g)))).

    Where one side has no event it does not exist, and where all pairs agree its width would be zero: gaps.
    """
    gap = without_events(pairs)
    if gap is not None:
        return gap
    index, reference = index_events(pairs), reference_events(pairs)
    if index == 0 or reference == 0:
        return Gap("zero-count")
    if pairs.discordant == 0:
        return Gap("zero-width")
    factor = math.exp(quantile(level) * math.sqrt(pairs.discordant / (index * reference)))
    return Interval(low=index / reference / factor, high=index / reference * factor)


def without_events(pairs: PairCounts) -> Gap | None:
    """The gap of pairs without an event on either side, whose ratio is 0/0; None where there is one."""
    gap = without_pairs(pairs)
    if gap is None and pairs.total == pairs.neither:
        return Gap("no-events")
    return gap
