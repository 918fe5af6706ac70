"""Fisher's exact test, one-sided, two-sided and mid-P."""

from __future__ import annotations

import math
from fractions import Fraction

import mpmath as mp
import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from scipy.stats import fisher_exact

from fourcount.stats.central import log_probability
from fourcount.stats.conditional import fisher, fisher_greater, fisher_less, fisher_mid_p
from fourcount.stats.results import Gap
from tables import counts_of

Table = tuple[int, int, int, int]

TESTS = (fisher, fisher_mid_p, fisher_less, fisher_greater)


def has_both_margins(table: Table) -> bool:
    """Whether both groups and both columns hold somebody."""
    a, b, c, d = table
    return bool(a + b and c + d and a + c and b + d)


SMALL = st.tuples(*[st.integers(0, 40)] * 4).filter(has_both_margins)
ANY = st.tuples(*[st.one_of(st.integers(0, 12), st.integers(0, 300), st.integers(0, 10**9))] * 4).filter(
    has_both_margins
)

HUGE: tuple[Table, ...] = (
    (1_000_500, 999_500, 10**6, 10**6),
    (10_010, 9990, 10_000, 10_002),
    (600, 400, 100, 900),
    (30, 10**9, 1, 10**9),
    (3, 10**9, 1, 10**9),
    (0, 10**9, 40, 10**9),
    (640, 10**9, 580, 10**9),
    (20, 10**9, 10**4, 10**9),
    (10**9, 7, 10**6, 2),
)


def exact_probabilities(table: Table) -> dict[int, Fraction]:
    """The probability of every table with these margins, by its index events."""
    a, b, c, d = table
    weights = {
        k: math.comb(a + b, k) * math.comb(c + d, a + c - k) for k in range(max(0, a - d), min(a + b, a + c) + 1)
    }
    total = sum(weights.values())
    return {k: Fraction(weight, total) for k, weight in weights.items()}


def log_own(table: Table) -> mp.mpf:
    """ln of the observed table's probability from the factorials, at 60 digits."""
    a, b, c, d = table
    above, below = (a + b, c + d, a + c, b + d), (a, b, c, d, a + b + c + d)
    return sum(mp.loggamma(n + 1) for n in above) - sum(mp.loggamma(n + 1) for n in below)


def over_own(table: Table, away: int) -> mp.mpf:
    """The sum of the probabilities beyond the observed table, over its own."""
    a, b, c, d = table
    falling, rising = ((b, c), (a, d)) if away > 0 else ((a, d), (b, c))
    weight, total = mp.mpf(1), mp.mpf(0)
    for step in range(min(falling)):
        weight *= mp.mpf((falling[0] - step) * (falling[1] - step)) / ((rising[0] + step + 1) * (rising[1] + step + 1))
        total += weight
        if weight < mp.mpf("1e-25") * total:
            break
    return total


@pytest.mark.parametrize(
    ("test", "table", "p", "tolerance"),
    [
        # Fisher's tea drinker: the figure of R's documentation of fisher.test (Agresti 1990, p. 61).
        (fisher_greater, (3, 1, 1, 3), 0.2429, 5e-5),
        # Convictions of twins (Fisher 1962, 1970): R 4.2.2, fisher.test.
        (fisher_less, (2, 15, 10, 3), 0.0004651809, 5e-11),
        (fisher, (2, 15, 10, 3), 0.0005367241, 5e-11),
        # Doll R, Hill AB (1950) BMJ 2:739, Table IV, one-sided; from memory.
        (fisher_greater, (647, 2, 622, 27), 0.00000064, 5e-9),
        # Walsh M et al (2014) J Clin Epidemiol 67:622: 1/100 v 9/100, and after one change; numbers from memory.
        (fisher, (1, 99, 9, 91), 0.02, 5e-3),
        (fisher, (2, 98, 9, 91), 0.06, 5e-3),
        # 600/1000 against 100/1000: R 4.2.2, fisher.test.
        (fisher, (600, 400, 100, 900), 1.57970064916521e-130, 2e-142),
    ],
)
def test_known_figures(test, table: Table, p: float, tolerance: float) -> None:
    """Printed figures and those of R are met to their digits."""
    assert test(counts_of(table)) == pytest.approx(p, abs=tolerance)


def test_below_the_smallest_double() -> None:
    """1000/1000 against 0/1000: 9.8e-601 is 0 in doubles; a p among the smallest doubles is still given."""
    table = counts_of((1000, 0, 0, 1000))
    assert log_probability(table) == pytest.approx(math.log(9.7649020396977825 / 2) - 601 * math.log(10), rel=1e-14)
    assert [test(table) for test in TESTS] == [0.0, 0.0, 1.0, 0.0]
    assert fisher(counts_of((515, 0, 0, 515))) == pytest.approx(
        float(exact_probabilities((515, 0, 0, 515))[515] * 2), rel=1e-9
    )
    assert 0 < fisher(counts_of((535, 0, 0, 535))) < 1e-319


@settings(max_examples=80)
@given(table=SMALL)
def test_any_small_table(table: Table) -> None:
    """All four figures in exact fractions: ties within 1e-7 count, mid-P takes off half of the table's own."""
    probabilities = exact_probabilities(table)
    a = table[0]
    own = probabilities[a]
    two_sided = sum(p for p in probabilities.values() if p <= own * (1 + Fraction(1, 10**7)))
    assert fisher(counts_of(table)) == pytest.approx(float(two_sided), rel=1e-12)
    assert fisher_mid_p(counts_of(table)) == pytest.approx(float(two_sided - own / 2), rel=1e-12)
    assert fisher_less(counts_of(table)) == pytest.approx(
        float(sum(p for k, p in probabilities.items() if k <= a)), rel=1e-12
    )
    assert fisher_greater(counts_of(table)) == pytest.approx(
        float(sum(p for k, p in probabilities.items() if k >= a)), rel=1e-12
    )


def test_tied_tables_count_in_full_but_for_the_own_half() -> None:
    """9/12 against 3/12: the mirrored table is tied; p counts both, mid-P takes off half of one."""
    own = float(exact_probabilities((9, 3, 3, 9))[9])
    greater = fisher_greater(counts_of((9, 3, 3, 9)))
    assert fisher(counts_of((9, 3, 3, 9))) == pytest.approx(2 * greater, rel=1e-13)
    assert fisher_mid_p(counts_of((9, 3, 3, 9))) == pytest.approx(2 * greater - own / 2, rel=1e-13)


@pytest.mark.parametrize("table", HUGE)
def test_huge_tables(table: Table) -> None:
    """Both tails have twelve digits against 60-digit arithmetic, at any size."""
    with mp.workdps(60), np.errstate(over="raise", invalid="raise", divide="raise"):
        own = mp.exp(log_own(table))
        a, b, c, d = table
        if a * d > b * c:
            far, near_test, far_test = own * over_own(table, 1), fisher_greater, fisher_less
        else:
            far, near_test, far_test = own * over_own(table, -1), fisher_less, fisher_greater
        assert near_test(counts_of(table)) == pytest.approx(float(own + far), rel=1e-12)
        assert far_test(counts_of(table)) == pytest.approx(float(1 - far), rel=1e-12)


@pytest.mark.parametrize(
    "table", [(10_010_000, 9_999_000, 10_000_000, 10_002_000), (10**9 + 60_000, 10**9 - 60_000, 10**9, 10**9)]
)
def test_two_sided_at_the_largest_counts(table: Table) -> None:
    """The figures of 60-digit arithmetic over all tables, computed once with mpmath 1.4.1."""
    known = {10_010_000: 0.0398904268142314, 10**9 + 60_000: 0.057783741832558785}
    assert fisher(counts_of(table)) == pytest.approx(known[table[0]], rel=1e-12)


def test_nearly_tied_neighbours_at_the_largest_counts() -> None:
    """Near the likeliest table neighbours differ by less than the tie rule sees, and count."""
    assert fisher(counts_of((10**9 + 3, 10**9, 10**9 + 7, 10**9))) == 1.0
    assert fisher(counts_of((10**9 + 100, 10**9, 10**9 + 7, 10**9))) == pytest.approx(0.998889822063539, rel=1e-12)


@settings(max_examples=60)
@given(table=ANY.filter(lambda t: sum(t) < 10**6))
def test_agrees_with_scipy(table: Table) -> None:
    """The two-sided and one-sided figures are those of scipy.stats.fisher_exact."""
    a, b, c, d = table
    matrix = [[a, b], [c, d]]
    assert fisher(counts_of(table)) == pytest.approx(fisher_exact(matrix).pvalue, rel=1e-7, abs=1e-300)
    assert fisher_less(counts_of(table)) == pytest.approx(fisher_exact(matrix, "less").pvalue, rel=1e-7, abs=1e-300)
    assert fisher_greater(counts_of(table)) == pytest.approx(
        fisher_exact(matrix, "greater").pvalue, rel=1e-7, abs=1e-300
    )


@settings(max_examples=80)
@given(table=ANY)
def test_probabilities_and_mirrors(table: Table) -> None:
    """All figures lie from 0 to 1, mid-P below p; swapped groups or outcomes leave them, and swap the one-sided."""
    a, b, c, d = table
    p, mid, less, greater = (test(counts_of(table)) for test in TESTS)
    assert 0 <= mid <= p <= 1
    assert 0 <= less <= 1
    assert 0 <= greater <= 1
    for other in ((c, d, a, b), (b, a, d, c)):
        its_p, its_mid, its_less, its_greater = (test(counts_of(other)) for test in TESTS)
        assert (its_p, its_mid, its_greater, its_less) == pytest.approx((p, mid, less, greater), rel=1e-11, abs=1e-300)


@pytest.mark.parametrize(
    ("table", "key"),
    [
        ((0, 0, 0, 0), "empty-table"),
        ((0, 0, 3, 4), "empty-index-group"),
        ((3, 4, 0, 0), "empty-reference-group"),
        ((0, 10, 0, 20), "no-events"),
        ((0, 10**9, 0, 10**9), "no-events"),
        ((10, 0, 20, 0), "no-non-events"),
    ],
)
def test_an_empty_margin_is_a_gap(table: Table, key: str) -> None:
    """Without people in both groups, or with only one table possible, nothing is tested, and the reason is told."""
    assert [test(counts_of(table)) for test in TESTS] == [Gap(key)] * 4
