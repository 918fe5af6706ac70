"""Two-sided p values of no association, from the chi-square statistic without a correction for continuity."""

from __future__ import annotations

import math

from fourcount.stats.estimates import without_a_contrast
from fourcount.stats.normal import two_sided_p
from fourcount.stats.results import FractionalCounts, Gap


def pearson(counts: FractionalCounts) -> float | Gap:
    """Pearson's chi-square test: N (ad - bc)^2 / (n1 n2 m (N - m)), one degree of freedom.

    Where everybody had the event, or nobody, there is nothing to test: a gap. Source: Pearson 1900.
    """
    return _chi_square_p(counts, counts.total)


def n_minus_1(counts: FractionalCounts) -> float | Gap:
    """The (N-1) chi-square test: Pearson's statistic times (N-1)/N.

    It is the square of the Miettinen-Nurminen statistics of the difference, the ratio and the odds ratio at no
    effect, so that it agrees with their intervals. Source: E. S. Pearson 1947; Campbell 2007, Stat Med 26:3661
    (from memory). One person or fewer, as a design effect can leave, is a gap.
    """
    return _chi_square_p(counts, counts.total - 1)


def _chi_square_p(counts: FractionalCounts, weight: float) -> float | Gap:
    gap = without_a_contrast(counts)
    if gap is not None:
        return gap
    if weight <= 0:
        return Gap("too-few-left")
    across = counts.index_events * counts.reference_non_events - counts.index_non_events * counts.reference_events
    margins = counts.index_total * counts.reference_total * counts.events * counts.non_events
    return two_sided_p(math.sqrt(weight * across * across / margins))
