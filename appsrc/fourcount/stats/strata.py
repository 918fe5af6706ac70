"""Several tables of one outcome pooled by Mantel and Haenszel's weights, and tests of them.

Letters as in the table of methods: in each stratum a, b are the index group's events and non-events, c, d the
reference group's; n1 = a+b, n2 = c+d, m = a+c, N = n1+n2. A stratum in which a group is empty compares nothing and
adds nothing, whatever is pooled; one without events, or with nothing else, adds nothing to the odds ratio and the
tests. Sums are those of ``math.fsum``, so that the order of the strata cannot matter.
"""

from __future__ import annotations

import math
from collections.abc import Sequence

from fourcount.stats.log_scale import limits_around
from fourcount.stats.normal import quantile, two_sided_p
from fourcount.stats.results import Counts, Gap, Interval
from fourcount.stats.strata_sums import cross_products, excess, informative, nothing_to_compare, with_both_groups


def pooled_odds_ratio(strata: Sequence[Counts]) -> float | Gap:
    """The odds ratio that the strata share: sum(ad/N) / sum(bc/N); ``inf`` where only the latter is 0.

    Source: Mantel and Haenszel 1959, J Natl Cancer Inst 22:719.
    """
    compared = with_both_groups(strata)
    towards, against = cross_products(compared)
    if towards == 0.0 and against == 0.0:
        return nothing_to_compare(compared)
    return towards / against if against else math.inf


def robins_breslow_greenland(strata: Sequence[Counts], level: float) -> Interval | Gap:
    """The log interval of the pooled odds ratio, valid for few large strata and for many small ones.

    With one stratum it is Woolf's. Where the pooled odds ratio is 0 or infinite its logarithm has no standard error,
    and no limits are given: the formula would know of one side only, and (0, inf) on the other says nothing.
    Source: Robins, Breslow and Greenland 1986, Biometrics 42:311.
    """
    compared = with_both_groups(strata)
    towards, against = cross_products(compared)
    if towards == 0.0 and against == 0.0:
        return nothing_to_compare(compared)
    if towards == 0.0 or against == 0.0:
        return Gap("endless-log")
    same_way, mixed, other_way = [], [], []
    for t in compared:
        agreeing = (t.index_events + t.reference_non_events) / t.total
        differing = (t.index_non_events + t.reference_events) / t.total
        r = t.index_events * t.reference_non_events / t.total
        s = t.index_non_events * t.reference_events / t.total
        same_way.append(agreeing * r)
        mixed += [agreeing * s, differing * r]
        other_way.append(differing * s)
    variance = (
        math.fsum(same_way) / (2.0 * towards * towards)
        + math.fsum(mixed) / (2.0 * towards * against)
        + math.fsum(other_way) / (2.0 * against * against)
    )
    return _around_ratio(towards / against, quantile(level) * math.sqrt(variance))


def pooled_risk_ratio(strata: Sequence[Counts]) -> float | Gap:
    """The risk ratio that the strata share: sum(a n2/N) / sum(c n1/N); ``inf`` where only the latter is 0.

    Source: Mantel and Haenszel's weights; Greenland and Robins 1985, Biometrics 41:55.
    """
    compared = with_both_groups(strata)
    index, reference = _weighted_events(compared)
    if index == 0.0 and reference == 0.0:
        return Gap("no-events") if compared else Gap("no-strata")
    return index / reference if reference else math.inf


def greenland_robins_ratio(strata: Sequence[Counts], level: float) -> Interval | Gap:
    """The log interval of the pooled risk ratio; with one stratum it is Katz's.

    Each stratum's part of the variance, (m n1 n2 - a c N)/N^2, is formed as (a n1 d + c n2 b)/N^2, which subtracts
    nothing. No limits where the pooled risk ratio is 0 or infinite. Source: Greenland and Robins 1985,
    Biometrics 41:55.
    """
    compared = with_both_groups(strata)
    index, reference = _weighted_events(compared)
    if index == 0.0 and reference == 0.0:
        return Gap("no-events") if compared else Gap("no-strata")
    if index == 0.0 or reference == 0.0:
        return Gap("endless-log")
    parts = math.fsum(
        (
            t.index_events * t.index_total * t.reference_non_events
            + t.reference_events * t.reference_total * t.index_non_events
        )
        / (t.total * t.total)
        for t in compared
    )
    return _around_ratio(index / reference, quantile(level) * math.sqrt(parts / index / reference))


def pooled_risk_difference(strata: Sequence[Counts]) -> float | Gap:
    """The risk difference that the strata share: sum((a n2 - c n1)/N) / sum(n1 n2/N).

    Source: Mantel and Haenszel's weights; Greenland and Robins 1985, Biometrics 41:55.
    """
    compared = with_both_groups(strata)
    if not compared:
        return Gap("no-strata")
    return math.fsum(excess(t) for t in compared) / _weight(compared)


def sato_difference(strata: Sequence[Counts], level: float) -> Interval | Gap:
    """Wald's interval of the pooled risk difference with Sato's variance, for few large strata and many small ones.

    Sato's variance (D sum P + sum Q)/W^2 is that of Greenland and Robins plus sum((D - Dk) Pk)/W^2 over the strata's
    own differences Dk. It is formed so, with every difference taken from the nearest of -1, 0 and 1: where risks lie
    near 0 and 1 its two parts all but cancel. The limits can pass -1 and 1 and are given so. Source: Sato 1989,
    Biometrics 45:1323.
    """
    compared = with_both_groups(strata)
    if not compared:
        return Gap("no-strata")
    weight = _weight(compared)
    difference = math.fsum(excess(t) for t in compared) / weight
    whole = round(difference)
    beyond = math.fsum(_excess_over(t, whole) / t.total for t in compared) / weight
    unlike = math.fsum(
        (beyond - _excess_over(t, whole) / (t.index_total * t.reference_total)) * _tilt(t) for t in compared
    )
    return _around_difference(difference, (_spread(compared) + unlike) / weight / weight, level)


def greenland_robins_difference(strata: Sequence[Counts], level: float) -> Interval | Gap:
    """Wald's interval of the pooled risk difference with Greenland and Robins's variance, for few large strata.

    With one stratum it is Wald's own. The limits can pass -1 and 1 and are given so. Source: Greenland and Robins
    1985, Biometrics 41:55.
    """
    compared = with_both_groups(strata)
    if not compared:
        return Gap("no-strata")
    weight = _weight(compared)
    difference = math.fsum(excess(t) for t in compared) / weight
    return _around_difference(difference, _spread(compared) / weight / weight, level)


def cochran_mantel_haenszel(strata: Sequence[Counts]) -> float | Gap:
    """The two-sided p of no association within any stratum, one degree of freedom, no continuity correction.

    With one stratum it is the (N-1) chi-square's. Source: Mantel and Haenszel 1959, J Natl Cancer Inst 22:719;
    Cochran 1954, Biometrics 10:417.
    """
    return _common_association(strata, correction=0.0)


def cochran_mantel_haenszel_corrected(strata: Sequence[Counts]) -> float | Gap:
    """The same with 1/2 taken off the distance between observed and expected index events, never below 0.

    Source: Mantel and Haenszel 1959, J Natl Cancer Inst 22:719.
    """
    return _common_association(strata, correction=0.5)


def _weighted_events(compared: Sequence[Counts]) -> tuple[float, float]:
    index = math.fsum(t.index_events * t.reference_total / t.total for t in compared)
    reference = math.fsum(t.reference_events * t.index_total / t.total for t in compared)
    return index, reference


def _weight(compared: Sequence[Counts]) -> float:
    return math.fsum(t.index_total * t.reference_total / t.total for t in compared)


def _excess_over(t: Counts, whole: int) -> float:
    """n1 n2 times what this stratum's risk difference has beyond a whole number: exact for whole counts."""
    across = t.index_events * t.reference_total - t.reference_events * t.index_total
    return across - whole * t.index_total * t.reference_total


def _tilt(t: Counts) -> float:
    """Sato's P: how fast this stratum's part of the variance grows with the common difference."""
    n1, n2 = t.index_total, t.reference_total
    twice = 2 * (n1 * n1 * t.reference_events - n2 * n2 * t.index_events) + n1 * n2 * (n2 - n1)
    return twice / (2 * t.total * t.total)


def _spread(compared: Sequence[Counts]) -> float:
    """The variance of Greenland and Robins, times the square of the weights' sum."""
    return math.fsum(
        (
            t.index_events * t.index_non_events * t.reference_total**3
            + t.reference_events * t.reference_non_events * t.index_total**3
        )
        / (t.index_total * t.reference_total * t.total * t.total)
        for t in compared
    )


def _around_ratio(centre: float, log_half_width: float) -> Interval | Gap:
    """Limits beyond the range of doubles (strata of 10^9 that contradict each other) are 0 and ``inf``."""
    found = limits_around(centre, log_half_width)
    return _with_width(found.low, found.high)


def _around_difference(centre: float, variance: float, level: float) -> Interval | Gap:
    half_width = quantile(level) * math.sqrt(max(0.0, variance))
    return _with_width(centre - half_width, centre + half_width)


def _with_width(low: float, high: float) -> Interval | Gap:
    """A width of 0, or one that is lost in the last digit of a double, is no interval."""
    return Interval(low=low, high=high) if low < high else Gap("no-width")


def _common_association(strata: Sequence[Counts], *, correction: float) -> float | Gap:
    told = informative(strata)
    if not told:
        return nothing_to_compare(with_both_groups(strata))
    distance = abs(math.fsum(excess(t) for t in told))
    variance = math.fsum(
        t.index_total * t.reference_total * t.events * t.non_events / (t.total * t.total * (t.total - 1)) for t in told
    )
    return two_sided_p(max(0.0, distance - correction) / math.sqrt(variance))
