"""Intervals and tests that papers print and that are recognised there, but that are shown to no reader as ours.

Corrections for continuity make an interval too wide and a p too large; test-based limits are right only near no
effect. They are here so that a printed figure can be told.
"""

from __future__ import annotations

import math

from fourcount.stats import difference, risk
from fourcount.stats.estimates import odds_ratio, risk_ratio, without_a_contrast, without_people
from fourcount.stats.log_scale import exponential
from fourcount.stats.normal import quantile, two_sided_p
from fourcount.stats.results import FractionalCounts, Gap, Interval


def wald_continuity(counts: FractionalCounts, level: float) -> Interval | Gap:
    """Wald's interval of the difference with (1/n1 + 1/n2)/2 more on either side (Fleiss; from memory)."""
    found = difference.wald(counts, level)
    if isinstance(found, Gap):
        return found
    step = (1 / counts.index_total + 1 / counts.reference_total) / 2
    return Interval(low=found.low - step, high=found.high + step)


def risk_wald_continuity(events: int, total: int, level: float) -> Interval | Gap:
    """Wald's interval of one risk with 1/(2n) more on either side (Newcombe 1998, Stat Med 17:857, method 2)."""
    found = risk.wald(events, total, level)
    if isinstance(found, Gap):
        return found
    return Interval(low=found.low - 0.5 / total, high=found.high + 0.5 / total)


def test_based_risk_ratio(counts: FractionalCounts, level: float) -> Interval | Gap:
    """R to the power of 1 -+ z/chi, chi being the root of the (N-1) chi-square (Miettinen 1976; from memory)."""
    return _test_based(counts, risk_ratio(counts), level)


def test_based_odds_ratio(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The same for the odds ratio."""
    return _test_based(counts, odds_ratio(counts), level)


test_based_risk_ratio.__test__ = test_based_odds_ratio.__test__ = False  # type: ignore[attr-defined]  # no tests of ours


def _test_based(counts: FractionalCounts, estimate: float | Gap, level: float) -> Interval | Gap:
    if isinstance(estimate, Gap):
        return estimate
    if counts.total <= 1:
        return Gap("too-few-left")
    chi = _chi(counts, counts.total - 1, 0.0)
    if chi == 0.0:
        return Gap("zero-width")
    if not 0.0 < estimate < math.inf:
        return Gap("not-positive")
    size, step = abs(math.log(estimate)), quantile(level) / chi
    centre = math.log(estimate)
    return Interval(low=exponential(centre - size * step), high=exponential(centre + size * step))


def yates(counts: FractionalCounts) -> float | Gap:
    """The chi-square test with a correction for continuity: N (|ad - bc| - N/2)^2 / (n1 n2 m (N - m)).

    Where the correction would take off more than there is, the statistic is 0. Source: Yates 1934, Suppl J R Stat
    Soc 1:217 (from memory).
    """
    gap = without_a_contrast(counts)
    return two_sided_p(_chi(counts, counts.total, counts.total / 2)) if gap is None else gap


def likelihood_ratio(counts: FractionalCounts) -> float | Gap:
    """The likelihood ratio chi-square test: twice the sum of count times ln(count / expected); common practice."""
    gap = without_a_contrast(counts)
    if gap is not None:
        return gap
    cells = (
        (counts.index_events, counts.index_total, counts.events),
        (counts.index_non_events, counts.index_total, counts.non_events),
        (counts.reference_events, counts.reference_total, counts.events),
        (counts.reference_non_events, counts.reference_total, counts.non_events),
    )
    total = sum(cell * math.log(cell * counts.total / (row * column)) for cell, row, column in cells if cell)
    return two_sided_p(math.sqrt(max(2.0 * total, 0.0)))


def log_odds_ratio_z(counts: FractionalCounts) -> float | Gap:
    """Wald's test of a log odds ratio, as logistic regression prints it: the z of Woolf's interval."""
    if 0 in (counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events):
        return without_people(counts) or Gap("one-outcome")
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    return two_sided_p(math.log((a / b) * (d / c)) / math.sqrt(1 / a + 1 / b + 1 / c + 1 / d))


def log_risk_ratio_z(counts: FractionalCounts) -> float | Gap:
    """Wald's test of a log risk ratio: the z of Katz's interval."""
    a, c = counts.index_events, counts.reference_events
    if a == 0 or c == 0 or counts.non_events == 0:
        return without_people(counts) or Gap("zero-width")
    n1, n2 = counts.index_total, counts.reference_total
    spread = math.sqrt(counts.index_non_events / (a * n1) + counts.reference_non_events / (c * n2))
    return two_sided_p(math.log((a / n1) * (n2 / c)) / spread)


def _chi(counts: FractionalCounts, weight: float, correction: float) -> float:
    """The root of the chi-square statistic with a factor in place of N and |ad - bc| made smaller."""
    across = counts.index_events * counts.reference_non_events - counts.index_non_events * counts.reference_events
    margins = counts.index_total * counts.reference_total * counts.events * counts.non_events
    return max(abs(across) - correction, 0.0) * math.sqrt(weight / margins) if margins else 0.0
