"""Unconditional intervals of the odds ratio."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any

import mpmath
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats import odds
from fourcount.stats.estimates import odds_ratio
from fourcount.stats.results import Counts, Gap, Interval
from tables import CELLS, EXTREMES, LEVELS, assert_nested, given_interval

Table = Callable[..., Counts]
Method = Callable[[Counts, float], Interval | Gap]

SCORE = (odds.miettinen_nurminen, odds.cornfield)
METHODS = (*SCORE, odds.woolf, odds.gart)


def _statistic(cells: tuple[int, ...], *, finite: bool) -> Callable[[Any], Any]:
    """The published statistic, the likeliest risks from their quadratic equation."""
    a, b, c, d = cells
    n1, n2, m, people = a + b, c + d, a + c, sum(cells)
    factor = mpmath.mpf(people) / (people - 1) if finite else 1

    def at(psi: Any) -> Any:
        middle = n1 * psi + n2 - m * (psi - 1)
        p2 = 2 * m / (middle + mpmath.sqrt(middle**2 + 4 * n2 * (psi - 1) * m))
        p1 = psi * p2 / (1 + p2 * (psi - 1))
        information = 1 / (n1 * p1 * (1 - p1)) + 1 / (n2 * p2 * (1 - p2))
        return (a - n1 * p1) * mpmath.sqrt(information / factor)

    return at


@pytest.mark.parametrize("method", SCORE)
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_score_limits_put_back_into_the_statistic(
    method: Method, level: float, distances_at_limits: Callable[..., Any]
) -> None:
    """At each limit the published statistic is z, to 1e-14 of the limit, from single events to 10^9 a cell."""
    finite = method is odds.miettinen_nurminen
    found = distances_at_limits(
        method, level, lambda cells: _statistic(cells, finite=finite), lambda limit: limit in (0, math.inf)
    )
    for cells, _, limit, distance in found:
        assert distance <= 1e-14 * limit, (cells, limit)


def test_adrenaline_in_cardiac_arrest(table: Table) -> None:
    """7/34 v 1/34 (Fagerland and others 2015): Woolf 0.99 to 74, Gart 0.98 to 38."""
    counts = table(7, 27, 1, 33)
    plain, adjusted = given_interval(odds.woolf(counts, 0.95)), given_interval(odds.gart(counts, 0.95))
    assert plain.low == pytest.approx(0.99, abs=0.005)
    assert plain.high == pytest.approx(74, abs=0.5)
    assert adjusted.low == pytest.approx(0.98, abs=0.005)
    assert adjusted.high == pytest.approx(38, abs=0.5)


@pytest.mark.parametrize("method", SCORE)
def test_score_limits_at_counts_of_zero(method: Method, table: Table) -> None:
    """a or d at 0: from 0. b or c at 0: to infinity. A whole column at 0: everything."""
    for cells in ((0, 10, 3, 7), (3, 7, 10, 0)):
        interval = given_interval(method(table(*cells), 0.95))
        assert interval.low == 0
        assert 0 < interval.high < math.inf
    for cells in ((10, 0, 3, 7), (3, 7, 0, 10), (10, 0, 0, 10)):
        interval = given_interval(method(table(*cells), 0.95))
        assert 0 < interval.low < math.inf
        assert interval.high == math.inf
    for cells in ((0, 10, 0, 20), (10, 0, 20, 0)):
        assert given_interval(method(table(*cells), 0.95)) == Interval(low=0.0, high=math.inf)


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_logit_intervals_keep_every_digit(level: float, table: Table, exact_z: Callable[[float], Any]) -> None:
    """Equal to the printed formulas in 50 digits, Woolf's and Gart's."""
    z = exact_z(level)
    for cells in EXTREMES:
        for method, added in ((odds.woolf, 0.0), (odds.gart, 0.5)):
            if method is odds.woolf and 0 in cells:
                continue
            interval = given_interval(method(table(*cells), level))
            with mpmath.workdps(50):
                a, b, c, d = (mpmath.mpf(cell) + added for cell in cells)
                spread = z * mpmath.sqrt(1 / a + 1 / b + 1 / c + 1 / d)
                low, high = a * d / (b * c) * mpmath.exp(-spread), a * d / (b * c) * mpmath.exp(spread)
            assert interval.low == pytest.approx(float(low), rel=1e-14)
            assert interval.high == pytest.approx(float(high), rel=1e-14)


def test_woolf_at_a_count_of_zero_is_garts_and_says_so(table: Table) -> None:
    """A zero cell takes 1/2 in all four, named in the interval; without one nothing is added."""
    for cells in ((0, 10, 3, 7), (3, 7, 10, 0), (0, 10, 0, 20), (10, 0, 0, 20)):
        interval = given_interval(odds.woolf(table(*cells), 0.95))
        assert interval == odds.gart(table(*cells), 0.95)
        assert interval.adjusted == "half"
    assert given_interval(odds.woolf(table(3, 7, 5, 5), 0.95)).adjusted is None


@pytest.mark.parametrize("method", METHODS)
def test_an_empty_group_has_no_odds_ratio(method: Method, table: Table) -> None:
    """Nobody in a group: a gap that names it."""
    assert method(table(0, 0, 3, 7), 0.95) == Gap("empty-index-group")
    assert method(table(3, 7, 0, 0), 0.95) == Gap("empty-reference-group")
    assert method(table(0, 0, 0, 0), 0.95) == Gap("empty-table")


@settings(max_examples=150)
@given(cells=CELLS, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate(table: Table, cells: tuple[int, ...], level: float) -> None:
    """low <= OR <= high, where nothing was added and the odds ratio is determined."""
    counts = table(*cells)
    estimate = odds_ratio(counts)
    for method in METHODS:
        interval = given_interval(method(counts, level))
        assert 0 <= interval.low < interval.high
        if interval.adjusted is None and not isinstance(estimate, Gap):
            assert interval.low <= estimate <= interval.high


@settings(max_examples=80)
@given(cells=CELLS)
def test_a_higher_level_is_never_narrower(table: Table, cells: tuple[int, ...]) -> None:
    """Each interval lies within the one of the next higher level."""
    for method in METHODS:
        assert_nested(given_interval(method(table(*cells), level)) for level in LEVELS)


@settings(max_examples=80)
@given(cells=CELLS, level=st.sampled_from(LEVELS))
def test_swapped_groups_and_outcomes_give_the_reciprocal(table: Table, cells: tuple[int, ...], level: float) -> None:
    """Either swap turns the odds ratio upside down, and its limits with it."""
    a, b, c, d = cells
    for method in METHODS:
        one = given_interval(method(table(a, b, c, d), level))
        for swapped in (table(c, d, a, b), table(b, a, d, c)):
            other = given_interval(method(swapped, level))
            for limit, turned in ((one.low, other.high), (one.high, other.low)):
                assert limit == pytest.approx(1 / turned if turned else math.inf, rel=1e-14)
