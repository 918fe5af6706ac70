"""Whether several tables may share one odds ratio: Breslow and Day's test, without and with Tarone's correction.

Letters as in the table of methods: n1, n2 the groups of a stratum, m its events.
"""

from __future__ import annotations

import math
from collections.abc import Sequence

from fourcount.stats.chi_square import upper_tail
from fourcount.stats.results import Counts, Gap, HomogeneityTest
from fourcount.stats.strata_sums import cross_products, informative, nothing_to_compare, with_both_groups


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


def _homogeneity(strata: Sequence[Counts], *, tarone: bool) -> HomogeneityTest | Gap:
    told = informative(strata)
    if not told:
        return nothing_to_compare(with_both_groups(strata))
    if len(told) == 1:
        return Gap("one-stratum")
    towards, against = cross_products(told)
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
