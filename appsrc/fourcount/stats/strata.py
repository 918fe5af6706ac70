"""Several tables of one outcome pooled by Mantel and Haenszel's weights, and tests of them.

Letters as in the table of methods: in each stratum a, b are the index group's events and non-events, c, d the
reference group's; n1 = a+b, n2 = c+d, m = a+c, N = n1+n2. A stratum in which a group is empty compares nothing and
adds nothing, whatever is pooled; one without events, or with nothing else, adds nothing to the odds ratio and the
tests. Sums are those of ``math.fsum``, so that the order of the strata cannot matter.
"""

from __future__ import annotations

import math
from collections.abc import Sequence
from fractions import Fraction

from fourcount.stats.chi_square import upper_tail
from fourcount.stats.normal import quantile, two_sided_p
from fourcount.stats.results import Counts, Gap, HomogeneityTest, Interval


def pooled_odds_ratio(strata: Sequence[Counts]) -> float | Gap:
    """The odds ratio that the strata share: sum(ad/N) / sum(bc/N); ``inf`` where only the latter is 0.

    Source: Mantel and Haenszel 1959, J Natl Cancer Inst 22:719.
    """
    compared = _compared(strata)
    towards, against = _cross_products(compared)
    if towards == 0.0 and against == 0.0:
        return _nothing_to_compare(compared)
    return towards / against if against else math.inf


def robins_breslow_greenland(strata: Sequence[Counts], level: float) -> Interval | Gap:
    """The log interval of the pooled odds ratio, valid for few large strata and for many small ones.

    With one stratum it is Woolf's. Where the pooled odds ratio is 0 or infinite its logarithm has no standard error,
    and no limits are given: the formula would know of one side only, and (0, inf) on the other says nothing.
    Source: Robins, Breslow and Greenland 1986, Biometrics 42:311.
    """
    compared = _compared(strata)
    towards, against = _cross_products(compared)
    if towards == 0.0 and against == 0.0:
        return _nothing_to_compare(compared)
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
    compared = _compared(strata)
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
    compared = _compared(strata)
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
    if parts == 0.0:
        return Gap("zero-width")
    return _around_ratio(index / reference, quantile(level) * math.sqrt(parts / index / reference))


def pooled_risk_difference(strata: Sequence[Counts]) -> float | Gap:
    """The risk difference that the strata share: sum((a n2 - c n1)/N) / sum(n1 n2/N).

    Source: Mantel and Haenszel's weights; Greenland and Robins 1985, Biometrics 41:55.
    """
    compared = _compared(strata)
    if not compared:
        return Gap("no-strata")
    return math.fsum(_excess(t) for t in compared) / _weight(compared)


def sato_difference(strata: Sequence[Counts], level: float) -> Interval | Gap:
    """Wald's interval of the pooled risk difference with Sato's variance, for few large strata and many small ones.

    The variance is formed in whole numbers and fractions: where risks lie near 0 and 1 its two parts all but cancel.
    The limits can pass -1 and 1 and are given so. Source: Sato 1989, Biometrics 45:1323.
    """
    compared = _compared(strata)
    if not compared:
        return Gap("no-strata")
    weight = sum((_ratio(t.index_total * t.reference_total, t.total) for t in compared), Fraction())
    difference = (
        sum(
            (
                _ratio(t.index_events * t.reference_total - t.reference_events * t.index_total, t.total)
                for t in compared
            ),
            Fraction(),
        )
        / weight
    )
    tilts = sum((_sato_tilt(t) for t in compared), Fraction())
    spreads = sum(
        (
            _ratio(
                t.index_events * t.reference_non_events + t.reference_events * t.index_non_events,
                2 * t.total,
            )
            for t in compared
        ),
        Fraction(),
    )
    variance = (difference * tilts + spreads) / (weight * weight)
    return _around_difference(float(difference), float(variance), level)


def greenland_robins_difference(strata: Sequence[Counts], level: float) -> Interval | Gap:
    """Wald's interval of the pooled risk difference with Greenland and Robins's variance, for few large strata.

    With one stratum it is Wald's own. The limits can pass -1 and 1 and are given so. Source: Greenland and Robins
    1985, Biometrics 41:55.
    """
    compared = _compared(strata)
    if not compared:
        return Gap("no-strata")
    weight = _weight(compared)
    parts = math.fsum(
        (
            t.index_events * t.index_non_events * t.reference_total**3
            + t.reference_events * t.reference_non_events * t.index_total**3
        )
        / (t.index_total * t.reference_total * t.total * t.total)
        for t in compared
    )
    difference = math.fsum(_excess(t) for t in compared) / weight
    return _around_difference(difference, parts / weight / weight, level)


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


def breslow_day(strata: Sequence[Counts]) -> HomogeneityTest | Gap:
    """Whether the strata may share the pooled odds ratio: the distances from the counts that it fits, squared.

    Degrees of freedom are the strata that tell something of an odds ratio, less one. Source: Breslow and Day 1980,
    Statistical Methods in Cancer Research I, IARC, section 4.4 (from memory).
    """
    return _homogeneity(strata, tarone=False)


def breslow_day_tarone(strata: Sequence[Counts]) -> HomogeneityTest | Gap:
    """Breslow and Day's test less what the pooled odds ratio, which is not the likeliest one, adds to it.

    Source: Tarone 1985, Biometrika 72:91.
    """
    return _homogeneity(strata, tarone=True)


def _compared(strata: Sequence[Counts]) -> tuple[Counts, ...]:
    return tuple(t for t in strata if t.index_total and t.reference_total)


def _informative(strata: Sequence[Counts]) -> tuple[Counts, ...]:
    """The strata in which both groups and both outcomes have somebody, and whose margins leave more than one table."""
    return tuple(t for t in _compared(strata) if t.events and t.non_events and t.total > 1)


def _nothing_to_compare(compared: Sequence[Counts]) -> Gap:
    if compared and not any(t.events for t in compared):
        return Gap("no-events")
    if compared and not any(t.non_events for t in compared):
        return Gap("no-non-events")
    return Gap("no-strata")


def _cross_products(compared: Sequence[Counts]) -> tuple[float, float]:
    towards = math.fsum(t.index_events * t.reference_non_events / t.total for t in compared)
    against = math.fsum(t.index_non_events * t.reference_events / t.total for t in compared)
    return towards, against


def _weighted_events(compared: Sequence[Counts]) -> tuple[float, float]:
    index = math.fsum(t.index_events * t.reference_total / t.total for t in compared)
    reference = math.fsum(t.reference_events * t.index_total / t.total for t in compared)
    return index, reference


def _weight(compared: Sequence[Counts]) -> float:
    return math.fsum(t.index_total * t.reference_total / t.total for t in compared)


def _excess(t: Counts) -> float:
    """Observed index events less those expected with no effect, rounded once from the exact fraction."""
    return (t.index_events * t.reference_total - t.reference_events * t.index_total) / t.total


def _sato_tilt(t: Counts) -> Fraction:
    n1, n2 = t.index_total, t.reference_total
    twice = 2 * (n1 * n1 * t.reference_events - n2 * n2 * t.index_events) + n1 * n2 * (n2 - n1)
    return _ratio(twice, 2 * t.total * t.total)


def _ratio(above: float, below: float) -> Fraction:
    return Fraction(above) / Fraction(below)


def _around_ratio(centre: float, log_half_width: float) -> Interval:
    return Interval(low=centre * math.exp(-log_half_width), high=centre * math.exp(log_half_width))


def _around_difference(centre: float, variance: float, level: float) -> Interval | Gap:
    if variance <= 0.0:
        return Gap("zero-width")
    half_width = quantile(level) * math.sqrt(variance)
    return Interval(low=centre - half_width, high=centre + half_width)


def _common_association(strata: Sequence[Counts], *, correction: float) -> float | Gap:
    told = _informative(strata)
    if not told:
        return _nothing_to_compare(_compared(strata))
    distance = abs(math.fsum(_excess(t) for t in told))
    variance = math.fsum(
        t.index_total * t.reference_total * t.events * t.non_events / (t.total * t.total * (t.total - 1)) for t in told
    )
    return two_sided_p(max(0.0, distance - correction) / math.sqrt(variance))


def _homogeneity(strata: Sequence[Counts], *, tarone: bool) -> HomogeneityTest | Gap:
    told = _informative(strata)
    if not told:
        return _nothing_to_compare(_compared(strata))
    if len(told) == 1:
        return Gap("one-stratum")
    towards, against = _cross_products(told)
    if towards == 0.0 or against == 0.0:
        return Gap("endless-log")
    distances, variances = zip(*(_from_fitted(t, towards / against) for t in told), strict=True)
    shared = math.fsum(distances) / math.fsum(variances) if tarone else 0.0
    chi_square = math.fsum(
        (distance - variance * shared) ** 2 / variance for distance, variance in zip(distances, variances, strict=True)
    )
    degrees = len(told) - 1
    return HomogeneityTest(chi_square=chi_square, degrees=degrees, p=upper_tail(chi_square, degrees))


def _from_fitted(t: Counts, odds_ratio: float) -> tuple[float, float]:
    """The observed index events less those fitted with this odds ratio and the table's margins, and their variance.

    All four fitted counts lie equally far from the observed ones; the smallest of them tells that distance best.
    """
    n1, n2, m, others = t.index_total, t.reference_total, t.events, t.non_events
    fitted = (
        (_fitted(odds_ratio, n1, m, n2 - m), t.index_events, 1.0),
        (_fitted(1.0 / odds_ratio, n1, others, n2 - others), t.index_non_events, -1.0),
        (_fitted(1.0 / odds_ratio, n2, m, n1 - m), t.reference_events, -1.0),
        (_fitted(odds_ratio, n2, others, n1 - others), t.reference_non_events, 1.0),
    )
    smallest, observed, sign = min(fitted)
    return sign * (observed - smallest), 1.0 / math.fsum(1.0 / count for count, _, _ in fitted)


def _fitted(odds_ratio: float, row: float, column: float, rest: float) -> float:
    """The count in a row and a column of these totals with this odds ratio; ``rest`` is the other row less the column.

    The admissible root A of (o-1)A^2 - (o(row+column)+rest)A + o row column = 0, in a form that subtracts nothing: the
    discriminant is a sum of parts of which none is below 0.
    """
    linear = odds_ratio * (row + column) + rest
    other_row = rest + column
    across = row * other_row + column * (row + other_row - column)
    root = math.sqrt((odds_ratio * (row - column)) ** 2 + 2.0 * odds_ratio * across + rest * rest)
    if linear >= 0.0:
        return 2.0 * odds_ratio * row * column / (linear + root)
    return (root - linear) / (2.0 * (1.0 - odds_ratio))
