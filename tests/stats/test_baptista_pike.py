"""Baptista and Pike's interval of the odds ratio."""

from __future__ import annotations

import itertools
import math
from fractions import Fraction
from functools import lru_cache

import mpmath as mp
import numpy as np
import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st

from fourcount.stats.conditional import baptista_pike, baptista_pike_mid_p, conditional_exact, conditional_odds_ratio
from fourcount.stats.results import Gap, Interval
from tables import counts_of, given_interval

Table = tuple[int, int, int, int]

METHODS = [pytest.param(baptista_pike, 1.0, id="plain"), pytest.param(baptista_pike_mid_p, 0.5, id="mid-p")]

SMALL = st.tuples(*[st.integers(0, 14)] * 4).filter(lambda t: t[0] + t[1] and t[2] + t[3])
ANY = st.tuples(*[st.one_of(st.integers(0, 12), st.integers(0, 300), st.integers(0, 10**6))] * 4).filter(
    lambda t: t[0] + t[1] and t[2] + t[3] and t[0] + t[2] and t[1] + t[3]
)


@lru_cache(maxsize=8)
def weights(table: Table) -> dict[int, int]:
    """Weights of all tables with these margins, by their index events."""
    a, b, c, d = table
    return {k: math.comb(a + b, k) * math.comb(c + d, a + c - k) for k in range(max(0, a - d), min(a + b, a + c) + 1)}


def exact_sum(table: Table, odds_ratio: float, own: float) -> float:
    """The sum of the probabilities of all tables no likelier than the observed one, in whole numbers."""
    top, bottom = odds_ratio.as_integer_ratio()
    tables = weights(table)
    last = max(tables)
    tilted = {k: weight * top**k * bottom ** (last - k) for k, weight in tables.items()}
    seen = tilted[table[0]]
    unlikely = sum(weight for weight in tilted.values() if weight <= seen)
    return float((unlikely - (1 - Fraction(own)) * seen) / sum(tilted.values()))


def jumps(table: Table) -> list[float]:
    """The odds ratios at which another table becomes as likely as the observed one, from 50-digit arithmetic."""
    a, tables = table[0], weights(table)
    with mp.workdps(50):
        return sorted(float((mp.mpf(tables[k]) / tables[a]) ** (mp.mpf(1) / (a - k))) for k in tables if k != a)


def outside(table: Table, limit: float, way: int) -> list[float]:
    """A fine grid of odds ratios beyond a limit, and both sides of every jump there."""
    grid = [limit * math.exp(way * step) for step in np.geomspace(1e-9, 12, 150)]
    for jump in jumps(table):
        grid += [near for near in (jump * (1 - 1e-9), jump * (1 + 1e-9)) if (near - limit) * way > 1e-10 * limit]
    return grid


@pytest.mark.parametrize(
    ("method", "low", "high"),
    [
        pytest.param(baptista_pike, 1.0, 195.49211395464274, id="plain"),
        pytest.param(baptista_pike_mid_p, 1.3276536402307, 98.8359386753804, id="mid-p"),
    ],
)
def test_adrenaline_trial(method, low: float, high: float) -> None:
    """7/34 against 1/34 at 95%.

    Printed for the plain interval: 1.00 to 195, Fagerland, Lydersen and Laake 2015, Stat Methods Med Res 24:224, as the
    tests of statsmodels 0.15 quote it; its digits here come from mpmath at 50 digits. The mid-P digits are this
    program's own, kept against change; the tests below verify what they mean.
    """
    found = given_interval(method(counts_of((7, 27, 1, 33)), 0.95))
    assert (found.low, found.high) == pytest.approx((low, high), rel=1e-12)


def test_a_jump_at_no_effect_is_exact() -> None:
    """Groups of one size can put a limit at an odds ratio of exactly 1, free of rounding, seen from each side."""
    assert given_interval(baptista_pike(counts_of((7, 27, 1, 33)), 0.95)).low == 1.0
    assert given_interval(baptista_pike(counts_of((1, 33, 7, 27)), 0.95)).high == 1.0
    assert given_interval(baptista_pike(counts_of((7, 1, 27, 33)), 0.95)).low == 1.0


@pytest.mark.parametrize(("method", "own"), METHODS)
@settings(max_examples=50)
@given(table=SMALL, level=st.sampled_from([0.8, 0.9, 0.95, 0.99, 0.999]))
def test_limits_bound_what_is_not_rejected(method, own: float, table: Table, level: float) -> None:
    """At a limit the sum is 1 - level, or jumps across it; beyond the limit it never exceeds 1 - level."""
    found = given_interval(method(counts_of(table), level))
    for limit, way in ((found.low, -1), (found.high, 1)):
        if limit in (0.0, math.inf):
            assert min(table[0], table[3]) == 0 if way < 0 else min(table[1], table[2]) == 0
            continue
        at_limit = exact_sum(table, limit, own)
        if at_limit != pytest.approx(1 - level, rel=1e-10):
            assert any(jump == pytest.approx(limit, rel=1e-13) for jump in jumps(table))
            assert exact_sum(table, limit * (1 - way * 1e-10), own) > 1 - level
            assert exact_sum(table, limit * (1 + way * 1e-10), own) < 1 - level
        for odds_ratio in outside(table, limit, way):
            assert exact_sum(table, odds_ratio, own) <= (1 - level) * (1 + 1e-11)


@pytest.mark.parametrize(("method", "own"), METHODS)
def test_every_table_of_small_groups(method, own: float) -> None:
    """All tables of 7 against 5 people: just beyond each limit the sum is too small, just within large enough."""
    for a, c in itertools.product(range(8), range(6)):
        table = (a, 7 - a, c, 5 - c)
        found = given_interval(method(counts_of(table), 0.95))
        for limit, way in ((found.low, -1), (found.high, 1)):
            if 0 < limit < math.inf:
                assert exact_sum(table, limit * (1 + way * 1e-9), own) <= 0.05
                assert exact_sum(table, limit * (1 - way * 1e-9), own) > 0.05 - 1e-12
                assert all(exact_sum(table, beyond, own) <= 0.05 + 1e-12 for beyond in outside(table, limit, way))


@settings(max_examples=60)
@given(groups=st.tuples(st.integers(1, 60), st.integers(1, 60)), share=st.floats(0, 1), own=st.sampled_from([0.5, 1.0]))
def test_tops_of_the_jumps_rise(groups: tuple[int, int], share: float, own: float) -> None:
    """From the lowest table up to the observed one, the sums at the jumps grow: the search by halving relies on it."""
    n1, n2 = groups
    events = round(share * (n1 + n2))
    k = np.arange(max(0, events - n2), min(n1, events) + 1.0)
    logs = np.array([math.log(math.comb(n1, int(x)) * math.comb(n2, events - int(x))) for x in k])
    for a in range(1, len(k)):
        at_jumps = (logs[:a] - logs[a]) / (k[a] - k[:a])
        tilted = logs + at_jumps[:, None] * k
        tilted = np.exp(tilted - tilted.max(axis=1, keepdims=True))
        tilted /= tilted.sum(axis=1, keepdims=True)
        lowest = np.tril(np.ones((a, len(k))))
        tops = (tilted * lowest).sum(axis=1) + tilted[:, a:].sum(axis=1) - (1 - own) * tilted[:, a]
        assert np.all(np.diff(tops) >= -1e-9 * tops[1:])


def long_sums(table: Table, limit: float, own: float, lowest: float) -> tuple[mp.mpf, mp.mpf, float]:
    """50-digit arithmetic for long tables: the sum with and without the farthest unlikely table.

    The tables from the observed one away from the limit's side are all in; on the far side those not heavier than
    ``lowest`` times the observed one. Third, the distance of that table's jump from the limit.
    """
    a, b, c, d = table
    psi = mp.mpf(limit)
    total, upper, far = mp.mpf(1), mp.mpf(own), mp.mpf(0)
    weight = mp.mpf(1)
    for step in range(min(b, c)):
        weight *= psi * ((b - step) * (c - step))
        weight /= (a + step + 1) * (d + step + 1)
        total, upper = total + weight, upper + weight
        if weight < mp.mpf("1e-22"):
            break
    weight, edge, place = mp.mpf(1), mp.mpf(0), 0
    for step in range(min(a, d)):
        weight *= (a - step) * (d - step)
        weight /= psi * ((b + step + 1) * (c + step + 1))
        total += weight
        if weight <= 1 + lowest:
            if edge == 0 and step > 0:
                edge, place = weight, step + 1
            far += weight if edge else 0
        if weight < mp.mpf("1e-22"):
            break
    return (upper + far) / total, (upper + far - edge) / total, float(mp.log(edge) / place)


@pytest.mark.parametrize(("method", "own"), METHODS)
@pytest.mark.parametrize(
    "table",
    [
        (1010, 990, 1000, 1010),
        (15_000, 85_000, 9000, 91_000),
        (160, 10**9, 90, 10**9),
        (3 * 10**5, 10**6, 10**6, 10**6),
    ],
)
def test_limits_of_large_tables(method, own: float, table: Table) -> None:
    """To a million a cell, at each limit the sum is 5% or a jump leads across it, in 50-digit arithmetic."""
    found = given_interval(method(counts_of(table), 0.95))
    a, b, c, d = table
    for seen, limit in ((table, found.low), ((c, d, a, b), 1 / found.high)):
        with mp.workdps(50):
            after, before, to_jump = long_sums(seen, limit, own, 1e-12)
            if abs(to_jump) < 1e-13:
                assert before <= 0.05 <= after
            else:
                assert float(after) == pytest.approx(0.05, rel=1e-10)


def test_large_tables_near_the_other_exact_interval() -> None:
    """With a thousand million a cell all exact intervals nearly agree: to a millionth of the odds ratio here."""
    table = counts_of((1_000_010_000, 999_990_000, 1_000_000_000, 1_000_020_000))
    exact, found = given_interval(conditional_exact(table, 0.95)), given_interval(baptista_pike_mid_p(table, 0.95))
    assert (found.low, found.high) == pytest.approx((exact.low, exact.high), rel=1e-6)


@pytest.mark.parametrize("method", [baptista_pike, baptista_pike_mid_p])
@settings(max_examples=60)
@given(table=ANY, level=st.floats(0.8, 0.99))
def test_ordered_around_the_estimate_and_wider_with_the_level(method, table: Table, level: float) -> None:
    """low <= conditional estimate <= high, and a higher level never gives a narrower interval."""
    estimate = conditional_odds_ratio(counts_of(table))
    inner, outer = (
        given_interval(method(counts_of(table), level)),
        given_interval(method(counts_of(table), level + 0.009)),
    )
    assert isinstance(estimate, float)
    assert 0.0 <= outer.low <= inner.low * (1 + 1e-13)
    assert inner.low <= estimate <= inner.high
    assert inner.high <= outer.high * (1 + 1e-13)


@pytest.mark.parametrize("method", [baptista_pike, baptista_pike_mid_p])
@settings(max_examples=60)
@given(table=ANY, level=st.floats(0.8, 0.999))
def test_mirrored(method, table: Table, level: float) -> None:
    """Swapped groups, or swapped outcomes, turn the interval into its reciprocal."""
    a, b, c, d = table
    found = given_interval(method(counts_of(table), level))
    for other in ((c, d, a, b), (b, a, d, c)):
        swapped = given_interval(method(counts_of(other), level))
        assert swapped.low * found.high == pytest.approx(1, rel=1e-12) or (swapped.low, found.high) == (0, math.inf)
        assert swapped.high * found.low == pytest.approx(1, rel=1e-12) or (found.low, swapped.high) == (0, math.inf)


@settings(max_examples=60)
@given(table=ANY, level=st.floats(0.8, 0.999))
def test_mid_p_lies_within_the_plain_interval(table: Table, level: float) -> None:
    """Half of the observed table's probability less never makes the interval longer."""
    plain, mid = (
        given_interval(baptista_pike(counts_of(table), level)),
        given_interval(baptista_pike_mid_p(counts_of(table), level)),
    )
    assert plain.low <= mid.low * (1 + 1e-13)
    assert mid.high <= plain.high * (1 + 1e-13)


@settings(max_examples=40)
@given(table=ANY, level=st.floats(0.8, 0.999))
def test_plain_interval_lies_within_the_one_of_equal_tails_in_total(table: Table, level: float) -> None:
    """The sum is at least the tail beyond the observed table: one-sided limits at 1 - level lie within."""
    assume(level >= 0.9)
    plain = given_interval(baptista_pike(counts_of(table), level))
    one_sided = given_interval(conditional_exact(counts_of(table), 2 * level - 1))
    assert plain.low <= one_sided.low * (1 + 1e-12)
    assert one_sided.high <= plain.high * (1 + 1e-12)


def test_one_outcome_only_and_empty_groups() -> None:
    """With one possible table all odds ratios are in; without people in both groups the reason is told."""
    for method in (baptista_pike, baptista_pike_mid_p):
        assert method(counts_of((0, 10, 0, 20)), 0.95) == Interval(low=0.0, high=math.inf)
        assert method(counts_of((10, 0, 10**9, 0)), 0.95) == Interval(low=0.0, high=math.inf)
        assert method(counts_of((0, 0, 0, 0)), 0.95) == Gap("empty-table")
        assert method(counts_of((0, 0, 1, 2)), 0.95) == Gap("empty-index-group")
        assert method(counts_of((1, 2, 0, 0)), 0.95) == Gap("empty-reference-group")
