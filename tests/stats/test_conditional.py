"""The exact intervals of the odds ratio with all margins held fixed."""

from __future__ import annotations

import math
from collections.abc import Iterator
from fractions import Fraction

import mpmath as mp
import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from scipy.stats.contingency import odds_ratio as scipy_odds_ratio

from fourcount.stats import hypergeometric
from fourcount.stats.conditional import (
    baptista_pike_mid_p,
    conditional_exact,
    conditional_mid_p,
    conditional_odds_ratio,
)
from fourcount.stats.hypergeometric import Window, product_sum, window
from fourcount.stats.results import Gap, Interval
from tables import counts_of, given_interval

Table = tuple[int, int, int, int]
Sums = tuple[mp.mpf, mp.mpf, mp.mpf]

METHODS = [pytest.param(conditional_exact, 1.0, id="exact"), pytest.param(conditional_mid_p, 0.5, id="mid-p")]

SMALL = st.tuples(*[st.integers(0, 40)] * 4)
ANY = st.tuples(*[st.one_of(st.integers(0, 12), st.integers(0, 300), st.integers(0, 10**6))] * 4)

EXTREME: tuple[Table, ...] = (
    (0, 1000, 10, 990),
    (1, 999_999, 0, 10**6),
    (0, 7, 10**6, 3 * 10**6),
    (1, 0, 0, 10**6),
    (1, 10**6, 10**6, 1),
    (3, 10**9, 1, 10**9),
    (0, 10**9, 4, 10**9),
    (10**9, 4, 10**9, 0),
    (1, 10**9, 10**9, 1),
    (20, 10**9, 10**9, 30),
    (10**9, 30, 10**9 - 5, 80),
    (5000, 10**9, 3, 10**6),
    (500, 10**5, 80_000, 10),
    (10**9, 0, 0, 40),
    (600, 10**9, 580, 10**9),
    (1010, 990, 1000, 1000),
    (12_000, 8_000, 900, 700),
)


def side(table: Table, psi: mp.mpf, away: int) -> Sums:
    """Sums over the tables on one side of the observed one: weights, weights by steps, weights by squared steps."""
    a, b, c, d = table
    falling, rising = ((b, c), (a, d)) if away > 0 else ((a, d), (b, c))
    tilt = psi if away > 0 else 1 / psi
    weight, total, first, second = mp.mpf(1), mp.mpf(0), mp.mpf(0), mp.mpf(0)
    for step in range(min(falling)):
        following = weight * ((falling[0] - step) * (falling[1] - step)) * tilt
        following /= (rising[0] + step + 1) * (rising[1] + step + 1)
        total += following
        first += following * (step + 1) * away
        second += following * (step + 1) ** 2
        if following < weight and following < mp.mpf("1e-25") * min(total, 1):
            break
        weight = following
    return total, first, second


def error_of_limit(table: Table, limit: float, level: float, own: float, *, upper: bool) -> float:
    """Relative error of a limit: Newton's step from it in 50-digit arithmetic, on the log of the tail."""
    with mp.workdps(50):
        above, below = side(table, mp.mpf(limit), 1), side(table, mp.mpf(limit), -1)
        total = 1 + above[0] + below[0]
        mean = (above[1] + below[1]) / total
        outer = below if upper else above
        tail = outer[0] + mp.mpf(own)
        goal = mp.log((1 - mp.mpf(level)) / 2)
        return float((goal - mp.log(tail / total)) / (outer[1] / tail - mean))


def limits(table: Table, found: Interval) -> Iterator[tuple[float, bool]]:
    """The limits that are not at the end of the support; those that are, are checked to be 0 and infinite."""
    a, b, c, d = table
    if min(a, d) == 0:
        assert found.low == 0.0
    else:
        yield found.low, False
    if min(b, c) == 0:
        assert found.high == math.inf
    else:
        yield found.high, True


@pytest.mark.parametrize(
    ("table", "level", "low", "high", "tolerance"),
    [
        # Twins' convictions, data of R's fisher.test; limits by scipy 1.17.1, contingency.odds_ratio.
        ((2, 15, 10, 3), 0.95, 0.0033171639506573611, 0.36318960235668056, 1e-12),
        # SciPy documentation, scipy.stats.contingency.odds_ratio; digits by scipy 1.17.1.
        ((7, 15, 58, 472), 0.95, 1.2514829132266099, 10.363493716700856, 1e-12),
        # No event in one group, and the 99.9% level: 50-digit arithmetic from the published formula.
        ((0, 1000, 10, 990), 0.95, 0.0, 0.44334342950249456, 1e-12),
        ((7, 27, 1, 33), 0.999, 0.36265324261569376, 20142.198681274971, 1e-12),
        # Ten million in a group: likewise.
        ((5_001_000, 4_999_000, 5_000_000, 5_000_000), 0.95, 0.99864747048074076, 1.0021557653494761, 1e-12),
    ],
)
def test_exact_limits_are_the_known_ones(table: Table, level: float, low: float, high: float, tolerance: float) -> None:
    """Known exact limits are met."""
    found = given_interval(conditional_exact(counts_of(table), level))
    assert found.low == pytest.approx(low, rel=tolerance)
    assert found.high == pytest.approx(high, rel=tolerance)


def test_mid_p_limits_are_the_printed_ones() -> None:
    """7/34 against 1/34, mid-P ("Cornfield mid-P"): 1.19 to 200.

    Fagerland, Lydersen and Laake 2015, Stat Methods Med Res 24:224, as the tests of statsmodels 0.15 quote it.
    """
    found = given_interval(conditional_mid_p(counts_of((7, 27, 1, 33)), 0.95))
    assert found.low == pytest.approx(1.19, abs=0.005)
    assert found.high == pytest.approx(200, abs=0.5)


@pytest.mark.parametrize(
    ("table", "low", "high"),
    [
        ((2, 15, 10, 3), 0.0048246116690190864, 0.29586620459150104),
        ((10_200, 989_800, 10_000, 990_000), 0.99231229851058744, 1.0488859056242741),
    ],
)
def test_mid_p_limits_are_those_of_long_arithmetic(table: Table, low: float, high: float) -> None:
    """The 95% mid-P limits are those computed with mpmath at 50 digits."""
    found = given_interval(conditional_mid_p(counts_of(table), 0.95))
    assert (found.low, found.high) == pytest.approx((low, high), rel=1e-12)


@pytest.mark.parametrize(
    ("table", "estimate"),
    [
        # Twins' convictions (R prints 0.04693661, since its search stops early); scipy 1.17.1 gives these digits.
        ((2, 15, 10, 3), 0.046936639049679964),
        # SciPy documentation, scipy.stats.contingency.odds_ratio; digits by scipy 1.17.1.
        ((7, 15, 58, 472), 3.7836687705550038),
    ],
)
def test_estimate_is_the_known_one(table: Table, estimate: float) -> None:
    """Known conditional estimates are met."""
    assert conditional_odds_ratio(counts_of(table)) == pytest.approx(estimate, rel=1e-12)


@pytest.mark.parametrize(("method", "own"), METHODS)
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_tails_at_the_limits_of_small_tables(method, own: float, level: float) -> None:
    """Put back into the distribution, each limit leaves (1 - level)/2 in its tail, in exact fractions."""
    for table in ((7, 27, 1, 33), (2, 15, 10, 3), (0, 9, 4, 5), (12, 0, 3, 9), (1, 1, 1, 1), (30, 2, 11, 25)):
        a, b, c, d = table
        for limit, upper in limits(table, given_interval(method(counts_of(table), level))):
            psi = Fraction(limit)
            weights = {
                k: math.comb(a + b, k) * math.comb(c + d, a + c - k) * psi**k
                for k in range(max(0, a - d), min(a + b, a + c) + 1)
            }
            outer = sum(weight for k, weight in weights.items() if (k < a if upper else k > a))
            tail = (outer + weights[a] * Fraction(own)) / sum(weights.values())
            assert float(tail) == pytest.approx((1 - level) / 2, rel=1e-11)


@pytest.mark.parametrize(("method", "own"), METHODS)
@pytest.mark.parametrize("table", EXTREME)
def test_limits_of_extreme_tables(method, own: float, table: Table) -> None:
    """Zeros, rare events and huge groups: limits to twelve digits against 50-digit arithmetic, without a warning."""
    with np.errstate(over="raise", invalid="raise", divide="raise"):
        for level in (0.95, 0.999):
            for limit, upper in limits(table, given_interval(method(counts_of(table), level))):
                assert abs(error_of_limit(table, limit, level, own, upper=upper)) < 1e-12


@pytest.mark.parametrize(("method", "own"), METHODS)
@settings(max_examples=25)
@given(table=SMALL.filter(lambda t: t[0] + t[1] and t[2] + t[3]), level=st.floats(0.8, 0.999))
def test_limits_of_any_small_table(method, own: float, table: Table, level: float) -> None:
    """Limits to twelve digits against 50-digit arithmetic."""
    for limit, upper in limits(table, given_interval(method(counts_of(table), level))):
        assert abs(error_of_limit(table, limit, level, own, upper=upper)) < 1e-12


def test_limits_at_a_million_a_cell() -> None:
    """With a window of thousands of tables, the limits still have twelve digits."""
    table = (1_000_500, 999_500, 10**6, 10**6)
    found = given_interval(conditional_exact(counts_of(table), 0.95))
    assert abs(error_of_limit(table, found.low, 0.95, 1.0, upper=False)) < 1e-12


@pytest.mark.parametrize("table", [t for t in EXTREME if min(t[0], t[3]) > 0 and min(t[1], t[2]) > 0])
def test_estimate_expects_what_was_seen(table: Table) -> None:
    """At the estimate the expected index events are the observed ones, in 50-digit arithmetic."""
    found = conditional_odds_ratio(counts_of(table))
    with mp.workdps(50):
        above, below = side(table, mp.mpf(found), 1), side(table, mp.mpf(found), -1)
        total = 1 + above[0] + below[0]
        mean = (above[1] + below[1]) / total
        spread = (above[2] + below[2]) / total - mean**2
        assert abs(float(mean / spread)) < 1e-12


def test_estimate_at_the_ends_of_the_support() -> None:
    """0 and infinite where the table is the most extreme that its margins allow."""
    assert conditional_odds_ratio(counts_of((0, 10, 4, 6))) == 0.0
    assert conditional_odds_ratio(counts_of((4, 6, 0, 10))) == math.inf
    assert conditional_odds_ratio(counts_of((10, 0, 4, 6))) == math.inf
    assert conditional_odds_ratio(counts_of((4, 6, 10, 0))) == 0.0


def test_one_outcome_only() -> None:
    """With one possible table the odds ratio is not determined: the intervals run from 0 to infinity."""
    for table in ((0, 10, 0, 20), (10, 0, 20, 0), (0, 10**9, 0, 10**9)):
        for method in (conditional_exact, conditional_mid_p):
            assert method(counts_of(table), 0.95) == Interval(low=0.0, high=math.inf)
    assert conditional_odds_ratio(counts_of((0, 10, 0, 20))) == Gap("no-events")
    assert conditional_odds_ratio(counts_of((10, 0, 20, 0))) == Gap("no-non-events")


@pytest.mark.parametrize(
    ("table", "key"),
    [((0, 0, 0, 0), "empty-table"), ((0, 0, 3, 4), "empty-index-group"), ((3, 4, 0, 0), "empty-reference-group")],
)
def test_empty_groups_are_gaps(table: Table, key: str) -> None:
    """Without people in both groups nothing is computed, and the reason is told."""
    found = (
        conditional_exact(counts_of(table), 0.95),
        conditional_mid_p(counts_of(table), 0.95),
        conditional_odds_ratio(counts_of(table)),
    )
    assert found == (Gap(key),) * 3


@settings(max_examples=30)
@given(table=SMALL.filter(lambda t: min(t) > 0), level=st.floats(0.8, 0.999))
def test_agrees_with_scipy(table: Table, level: float) -> None:
    """Estimate and limits are those of scipy.stats.contingency.odds_ratio where it gives any.

    Its root finder stops at a relative error of about 1e-10 in the odds ratio or its reciprocal.
    """
    a, b, c, d = table
    theirs = scipy_odds_ratio(np.array([[a, b], [c, d]]))
    low, high = theirs.confidence_interval(level)
    found = given_interval(conditional_exact(counts_of(table), level))
    assert conditional_odds_ratio(counts_of(table)) == pytest.approx(theirs.statistic, rel=1e-8)
    assert (found.low, found.high) == pytest.approx((low, high), rel=1e-8)


@pytest.mark.parametrize("method", [conditional_exact, conditional_mid_p])
@settings(max_examples=60)
@given(
    table=ANY.filter(lambda t: t[0] + t[1] and t[2] + t[3] and t[0] + t[2] and t[1] + t[3]), level=st.floats(0.8, 0.99)
)
def test_ordered_around_the_estimate_and_wider_with_the_level(method, table: Table, level: float) -> None:
    """low <= estimate <= high, and a higher level never gives a narrower interval."""
    estimate = conditional_odds_ratio(counts_of(table))
    inner, outer = (
        given_interval(method(counts_of(table), level)),
        given_interval(method(counts_of(table), level + 0.009)),
    )
    assert isinstance(estimate, float)
    assert 0.0 <= outer.low <= inner.low <= estimate <= inner.high <= outer.high


@pytest.mark.parametrize("method", [conditional_exact, conditional_mid_p])
@settings(max_examples=60)
@given(
    table=ANY.filter(lambda t: t[0] + t[1] and t[2] + t[3] and t[0] + t[2] and t[1] + t[3]), level=st.floats(0.8, 0.999)
)
def test_mirrored(method, table: Table, level: float) -> None:
    """Swapped groups, or swapped outcomes, turn the interval and the estimate into their reciprocals."""
    a, b, c, d = table
    found, estimate = given_interval(method(counts_of(table), level)), conditional_odds_ratio(counts_of(table))
    for other in ((c, d, a, b), (b, a, d, c)):
        swapped, its_estimate = (
            given_interval(method(counts_of(other), level)),
            conditional_odds_ratio(counts_of(other)),
        )
        assert swapped.low * found.high == pytest.approx(1, rel=1e-12) or (swapped.low, found.high) == (0, math.inf)
        assert swapped.high * found.low == pytest.approx(1, rel=1e-12) or (found.low, swapped.high) == (0, math.inf)
        assert its_estimate * estimate == pytest.approx(1, rel=1e-12) or {estimate, its_estimate} == {0, math.inf}


@settings(max_examples=60)
@given(table=ANY.filter(lambda t: t[0] + t[1] and t[2] + t[3]), level=st.floats(0.8, 0.999))
def test_mid_p_lies_within_exact(table: Table, level: float) -> None:
    """Half of the observed table's probability taken off both tails, the interval is never longer."""
    exact, mid = (
        given_interval(conditional_exact(counts_of(table), level)),
        given_interval(conditional_mid_p(counts_of(table), level)),
    )
    assert exact.low <= mid.low
    assert mid.high <= exact.high


def test_too_narrow_a_window_is_seen() -> None:
    """A window that leaves out part of what matters says that it does not hold it; the widened one does."""
    near, far = window(counts_of((1010, 990, 1000, 1000))), window(counts_of((1010, 990, 1000, 1000)), 2)
    inside = slice(near.observed - 60, near.observed + 60)
    cut = Window(
        centre=near.centre,
        spread=near.spread,
        steps=near.steps[inside],
        log_weights=near.log_weights[inside],
        observed=60,
        whole_below=False,
        whole_above=False,
    )
    assert len(far.steps) > len(near.steps)
    for seen, holds in ((cut, False), (near, True), (far, True)):
        weights = seen.weights(0.0)
        assert seen.holds(weights, float(weights.sum())) is holds


def test_a_window_begun_too_narrow_is_widened(monkeypatch: pytest.MonkeyPatch) -> None:
    """However narrow the first window, the limits are the same; a support known to its ends is left alone."""
    tables = [
        counts_of((1010, 990, 1000, 1000)),
        counts_of((400, 10**6, 300, 10**6)),
        counts_of((3, 10**6, 900, 10**6)),
    ]
    methods = (conditional_exact, conditional_mid_p, baptista_pike_mid_p)
    expected = [given_interval(method(table, 0.999)) for table in tables for method in methods]
    for name, narrow in (("_REACH", 1.0), ("_MARGIN", 0.0), ("_FARTHEST_Z", 0.5)):
        monkeypatch.setattr(hypergeometric, name, narrow)
    window.cache_clear()
    found = [given_interval(method(table, 0.999)) for table in tables for method in methods]
    window.cache_clear()
    for narrow_start, wide in zip(found, expected, strict=True):
        assert (narrow_start.low, narrow_start.high) == pytest.approx((wide.low, wide.high), rel=1e-13)


def test_sums_in_pieces_are_the_sums() -> None:
    """A sum of products taken in pieces is that of the whole."""
    numbers = np.arange(1.0, 30_001.0)
    assert product_sum(numbers, numbers) == 30_000 * 30_001 * 60_001 / 6
