"""The one-sided p of a margin: its score equation, its agreement with the interval, and a library for the ratios.

statsmodels' score test of a difference is no oracle here (0.15.0 gives none of the printed figures): for differences
the likeliest risks are found anew in 40 digits, as they are for the ratios.
"""

from __future__ import annotations

import math
from collections.abc import Callable

import mpmath
import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st
from statsmodels.stats.proportion import test_proportions_2indep as library_test

from fourcount.stats import difference, odds, ratio
from fourcount.stats.association import n_minus_1
from fourcount.stats.estimates import odds_ratio, risk_difference, risk_ratio
from fourcount.stats.margins import MarginMeasure, margin_p, margin_p_from_interval
from fourcount.stats.recovery import from_limits
from fourcount.stats.results import Counts, FractionalCounts, Gap, Interval
from fourcount.stats.score import mirrored
from tables import CELLS, LEVELS, counts_of

library_test.__test__ = False
MEASURES: tuple[MarginMeasure, ...] = ("risk_difference", "risk_ratio", "odds_ratio")
INTERVALS: dict[MarginMeasure, Callable[[Counts, float], Interval | Gap]] = {
    "risk_difference": difference.miettinen_nurminen,
    "risk_ratio": ratio.miettinen_nurminen,
    "odds_ratio": odds.miettinen_nurminen,
}
ESTIMATES = {"risk_difference": risk_difference, "risk_ratio": risk_ratio, "odds_ratio": odds_ratio}
NO_EFFECT: dict[MarginMeasure, float] = {"risk_difference": 0.0, "risk_ratio": 1.0, "odds_ratio": 1.0}
SMALL = st.tuples(*[st.integers(0, 60)] * 4).filter(lambda cells: cells[0] + cells[1] > 0 < cells[2] + cells[3])
PER = st.floats(0.001, 0.999)


def likeliest(measure: MarginMeasure, counts: FractionalCounts, margin: float) -> tuple[mpmath.mpf, mpmath.mpf]:
    """The two risks of greatest likelihood under the margin, by bisection on the likelihood's slope in 40 digits."""
    a, b, c, d = (mpmath.mpf(x) for x in (counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events))  # fmt: skip  # noqa: E501
    m = mpmath.mpf(margin)

    def first(p2: mpmath.mpf) -> tuple[mpmath.mpf, mpmath.mpf]:
        """P1 and its slope in P2."""
        if measure == "risk_difference":
            return p2 + m, mpmath.mpf(1)
        if measure == "risk_ratio":
            return p2 * m, m
        below = 1 + p2 * (m - 1)
        return m * p2 / below, m / below**2

    def slope(p2: mpmath.mpf) -> mpmath.mpf:
        p1, by = first(p2)
        return (
            ((a / p1 if a else 0) - (b / (1 - p1) if b else 0)) * by + (c / p2 if c else 0) - (d / (1 - p2) if d else 0)
        )

    low, high = mpmath.mpf(0), mpmath.mpf(1)
    if measure == "risk_difference":
        low, high = max(low, -m), min(high, 1 - m)
    if measure == "risk_ratio":
        high = min(high, 1 / m)
    for _ in range(200):
        middle = (low + high) / 2
        low, high = (middle, high) if slope(middle) > 0 else (low, middle)
    return first((low + high) / 2)[0], (low + high) / 2


def score(measure: MarginMeasure, counts: FractionalCounts, margin: float) -> float:
    """Miettinen and Nurminen's statistic as their paper writes it, below 0 where the estimate lies below the margin."""
    with mpmath.workdps(40):
        p1, p2 = likeliest(measure, counts, margin)
        n1, n2 = mpmath.mpf(counts.index_total), mpmath.mpf(counts.reference_total)
        r1, r2, m = counts.index_events / n1, counts.reference_events / n2, mpmath.mpf(margin)
        one, two = p1 * (1 - p1), p2 * (1 - p2)
        factor = (n1 + n2) / (n1 + n2 - 1)
        if measure == "risk_difference":
            return float((r1 - r2 - m) / mpmath.sqrt((one / n1 + two / n2) * factor))
        if measure == "risk_ratio":
            return float((r1 - m * r2) / mpmath.sqrt((one / n1 + m * m * two / n2) * factor))
        spread = 1 / (n1 * one) + 1 / (n2 * two)
        return float((counts.index_events - n1 * p1) * mpmath.sqrt(spread / factor))


def normal_tail(z: float) -> float:
    """P(Z <= z)."""
    return math.erfc(-z / math.sqrt(2)) / 2


@settings(max_examples=150, deadline=None)
@given(cells=SMALL, measure=st.sampled_from(MEASURES), share=PER)
def test_the_statistic_is_that_of_the_likeliest_risks(
    cells: tuple[int, ...], measure: MarginMeasure, share: float
) -> None:
    """At any margin, p is the normal tail of the paper's own formula with restricted risks found in 40 digits."""
    counts = counts_of(cells)
    margin = 2 * share - 1 if measure == "risk_difference" else share / (1 - share)
    found = margin_p(measure, counts, margin, "more")
    assume(isinstance(found, float) and margin != ESTIMATES[measure](counts))
    assert isinstance(found, float)
    statistic = score(measure, counts, margin)
    assume(abs(statistic) < 30)
    assert found == pytest.approx(normal_tail(statistic), rel=1e-7, abs=1e-12)


@settings(max_examples=300, deadline=None)
@given(
    cells=CELLS, measure=st.sampled_from(MEASURES), share=PER, level=st.sampled_from(LEVELS),
    side=st.sampled_from(("fewer", "more")),
)  # fmt: skip
def test_p_and_the_interval_agree(cells: tuple[int, ...], measure: MarginMeasure, share: float, level: float, side: str) -> None:  # fmt: skip  # noqa: E501
    """p is below half of what a level leaves exactly where that level's limit lies short of the margin."""
    counts = counts_of(cells)
    margin = 2 * share - 1 if measure == "risk_difference" else share / (1 - share)
    interval = INTERVALS[measure](counts, level)
    p = margin_p(measure, counts, margin, side)  # type: ignore[arg-type]
    assume(isinstance(p, float) and isinstance(interval, Interval))
    assert isinstance(p, float)
    assert isinstance(interval, Interval)
    limit = interval.high if side == "more" else interval.low
    assume(not math.isclose(limit, margin, rel_tol=1e-9, abs_tol=1e-9))
    assert (p < (1 - level) / 2) == (limit < margin if side == "more" else limit > margin)


@settings(max_examples=200, deadline=None)
@given(cells=CELLS, measure=st.sampled_from(MEASURES), level=st.sampled_from(LEVELS))
def test_at_a_limit_p_is_half_of_what_the_level_leaves(
    cells: tuple[int, ...], measure: MarginMeasure, level: float
) -> None:
    """The limits put back as margins give the tail they were made from."""
    counts = counts_of(cells)
    interval = INTERVALS[measure](counts, level)
    assume(isinstance(interval, Interval))
    assert isinstance(interval, Interval)
    ends = (-1.0, 1.0) if measure == "risk_difference" else (0.0, math.inf)
    for limit, side in ((interval.low, "fewer"), (interval.high, "more")):
        # Within a billionth of the end of its scale a limit has lost the digits that would give its tail again.
        if limit in ends or (measure == "risk_difference" and 1 - abs(limit) < 1e-6):
            continue
        p = margin_p(measure, counts, limit, side)  # type: ignore[arg-type]
        if isinstance(p, float) and abs(limit) > 1e-7 and limit < 1e7:
            assert p == pytest.approx((1 - level) / 2, rel=1e-4), (limit, side)


@settings(max_examples=150)
@given(cells=CELLS, measure=st.sampled_from(MEASURES))
def test_at_no_effect_it_is_half_the_own_test(cells: tuple[int, ...], measure: MarginMeasure) -> None:
    """At no effect the three statistics are one, and both tails together are the (N-1) chi-square's p."""
    counts = counts_of(cells)
    both = n_minus_1(counts)
    found = [margin_p(measure, counts, NO_EFFECT[measure], side) for side in ("fewer", "more")]
    assume(isinstance(both, float) and all(isinstance(one, float) for one in found))
    assert isinstance(both, float)
    assert 2 * min(found) == pytest.approx(both, rel=1e-6, abs=1e-300)  # type: ignore[type-var, operator]


@settings(max_examples=150)
@given(cells=CELLS, measure=st.sampled_from(MEASURES), share=PER)
def test_both_sides_sum_to_one_and_mirror(cells: tuple[int, ...], measure: MarginMeasure, share: float) -> None:
    """The two sides' p sum to 1; swapped groups give the other side's at the margin turned round."""
    counts = counts_of(cells)
    margin = 2 * share - 1 if measure == "risk_difference" else share / (1 - share)
    turned = -margin if measure == "risk_difference" else 1 / margin
    fewer, more = (margin_p(measure, counts, margin, side) for side in ("fewer", "more"))
    assume(isinstance(fewer, float) and isinstance(more, float))
    assert isinstance(fewer, float)
    assert isinstance(more, float)
    assert fewer + more == pytest.approx(1, abs=1e-15)
    assert margin_p(measure, mirrored(counts), turned, "more") == pytest.approx(fewer, rel=1e-6, abs=1e-12)


@pytest.mark.parametrize("measure", MEASURES)
@pytest.mark.parametrize("cells", [(38, 374, 70, 340), (7, 27, 1, 33), (150, 50, 140, 60), (3, 97, 0, 100)])
def test_p_falls_as_the_margin_moves_away(measure: MarginMeasure, cells: tuple[int, ...]) -> None:
    """The farther a margin on the side of more, the smaller its p."""
    margins = (-0.2, -0.05, 0.0, 0.05, 0.1, 0.3) if measure == "risk_difference" else (0.5, 0.9, 1.0, 1.25, 2.0, 8.0)
    found = [margin_p(measure, counts_of(cells), margin, "more") for margin in margins]
    assert all(isinstance(one, float) for one in found)
    assert found == sorted(found, reverse=True)  # type: ignore[type-var]


@pytest.mark.parametrize("cells", [(38, 374, 70, 340), (86, 14, 80, 20), (12, 188, 15, 185), (45, 55, 40, 60)])
@pytest.mark.parametrize("margin", [0.6, 0.95, 1.1, 1.5])
@pytest.mark.parametrize(("measure", "compare"), [("risk_ratio", "ratio"), ("odds_ratio", "odds-ratio")])
def test_ratios_as_the_library_has_them(
    cells: tuple[int, ...], margin: float, measure: MarginMeasure, compare: str
) -> None:
    """statsmodels' score tests of a ratio and of an odds ratio, one-sided, with the factor N/(N-1), at a margin."""
    counts = counts_of(cells)
    for side, alternative in (("more", "smaller"), ("fewer", "larger")):
        expected = library_test(
            counts.index_events, counts.index_total, counts.reference_events, counts.reference_total,
            value=margin, method="score", compare=compare, alternative=alternative, correction=True,
        ).pvalue  # fmt: skip
        assert margin_p(measure, counts, margin, side) == pytest.approx(expected, rel=1e-8)  # type: ignore[arg-type]


def test_at_the_estimate_p_is_a_half() -> None:
    """An estimate on the margin speaks for neither side, with and without a correction."""
    counts = counts_of((10, 90, 20, 80))
    assert margin_p("risk_ratio", counts, 0.5, "more") == margin_p("risk_ratio", counts, 0.5, "fewer") == 0.5
    assert margin_p("risk_difference", counts_of((0, 9, 0, 9)), 0.0, "more") == 0.5
    assert margin_p_from_interval(1.2, 0.9, 1.6, 0.95, 1.2, "more", "log") == 0.5


@pytest.mark.parametrize(("measure", "margin"), [("risk_difference", 1.0), ("risk_difference", -1.0), ("risk_ratio", 0.0), ("risk_ratio", math.inf), ("odds_ratio", -2.0)])  # fmt: skip  # noqa: E501
def test_a_margin_that_no_effect_can_have_is_a_gap(measure: MarginMeasure, margin: float) -> None:
    """A difference of everybody, and a ratio of nothing or without end, are no margins."""
    assert margin_p(measure, counts_of((3, 7, 5, 5)), margin, "more") == Gap("margin-out-of-range")


def test_tables_without_an_estimate_have_no_p() -> None:
    """Nobody in a group, no event, too few people left: each with its own reason."""
    assert margin_p("risk_difference", counts_of((0, 0, 1, 1)), 0.1, "more") == Gap("empty-index-group")
    assert margin_p("risk_ratio", counts_of((0, 9, 0, 9)), 1.2, "more") == Gap("no-events")
    assert margin_p("odds_ratio", counts_of((9, 0, 9, 0)), 1.2, "more") == Gap("no-non-events")
    few = FractionalCounts(index_events=0.1, index_non_events=0.2, reference_events=0.2, reference_non_events=0.3)
    assert margin_p("risk_ratio", few, 1.2, "more") == Gap("too-few-left")


@given(estimate=st.floats(0.1, 10), error=st.floats(0.01, 2), level=st.sampled_from(LEVELS), margin=st.floats(0.1, 10))
def test_a_printed_interval_gives_the_normal_tail(estimate: float, error: float, level: float, margin: float) -> None:
    """From symmetric limits the p at any margin is the normal tail of (ln estimate - ln margin)/error."""
    z = float(mpmath.sqrt(2) * mpmath.erfinv(level))
    low, high = estimate * math.exp(-z * error), estimate * math.exp(z * error)
    assume(abs(math.log(margin / estimate)) > 1e-6)
    p = margin_p_from_interval(estimate, low, high, level, margin, "more", "log")
    expected = normal_tail(math.log(estimate / margin) / error)
    assert p == pytest.approx(expected, rel=1e-6, abs=1e-12)


def test_at_no_effect_a_printed_interval_gives_half_its_p() -> None:
    """At no effect it is half the two-sided p that Altman and Bland (2011, BMJ 343:d2304) get from the limits."""
    whole = from_limits(0.81, 0.70, 0.94, 0.95, log_scale=True)
    assert not isinstance(whole, Gap)
    p = margin_p_from_interval(0.81, 0.70, 0.94, 0.95, 1.0, "more", "log")
    assert p == pytest.approx(whole.p / 2, rel=0.1)
    whole = from_limits(-3.0, -5.0, -1.0, 0.95, log_scale=False)
    assert not isinstance(whole, Gap)
    assert margin_p_from_interval(-3.0, -5.0, -1.0, 0.95, 0.0, "more", "plain") == pytest.approx(whole.p / 2)


@given(
    low=st.floats(0.05, 0.9), above=st.floats(1.1, 20), below=st.floats(1.1, 20), margin=st.floats(0.05, 20),
    level=st.sampled_from(LEVELS), side=st.sampled_from(("fewer", "more")),
)  # fmt: skip
def test_a_printed_limit_and_its_p_agree(low: float, above: float, below: float, margin: float, level: float, side: str) -> None:  # fmt: skip  # noqa: E501
    """However uneven the interval, p is below half of what the level leaves where the limit is short of the margin."""
    estimate, high = low * below, low * below * above
    p = margin_p_from_interval(estimate, low, high, level, margin, side, "log")  # type: ignore[arg-type]
    limit = high if side == "more" else low
    assume(isinstance(p, float) and not math.isclose(limit, margin, rel_tol=1e-9))
    assert isinstance(p, float)
    assert (p < (1 - level) / 2) == (limit < margin if side == "more" else limit > margin)


def test_what_a_printed_interval_cannot_tell() -> None:
    """Limits without end, in the wrong order or of no width, and a ratio of 0, give no p."""
    assert margin_p_from_interval(2.0, 1.0, math.inf, 0.95, 3.0, "more", "log") == Gap("endless-limit")
    assert margin_p_from_interval(2.0, 0.0, 3.0, 0.95, 1.0, "more", "log") == Gap("endless-limit")
    assert margin_p_from_interval(0.0, 0.0, 3.0, 0.95, 1.0, "more", "log") == Gap("endless-log")
    assert margin_p_from_interval(math.inf, 2.0, math.inf, 0.95, 1.0, "more", "log") == Gap("endless-log")
    assert margin_p_from_interval(2.0, 3.0, 4.0, 0.95, 1.0, "more", "log") == Gap("limits-disordered")
    assert margin_p_from_interval(2.0, 1.0, 2.0, 0.95, 3.0, "more", "plain") == Gap("no-width")
