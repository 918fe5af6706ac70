"""Intervals of the risk ratio."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any

import mpmath
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats import ratio
from fourcount.stats.estimates import risk_ratio
from fourcount.stats.results import Counts, Gap, Interval
from tables import CELLS, EXTREMES, LEVELS, assert_nested, given_interval

Table = Callable[..., Counts]
Method = Callable[[Counts, float], Interval | Gap]

SCORE = (ratio.koopman, ratio.miettinen_nurminen)
METHODS = (*SCORE, ratio.katz, ratio.walter)


def _statistic(cells: tuple[int, ...], *, finite: bool) -> Callable[[Any], Any]:
    """The published statistic, the likeliest risks from their quadratic equation."""
    a, b, c, d = cells
    n1, n2, people = a + b, c + d, sum(cells)
    factor = mpmath.mpf(people) / (people - 1) if finite else 1

    def at(r0: Any) -> Any:
        middle = -(n1 * r0 + a + n2 + c * r0)
        p2 = (-middle - mpmath.sqrt(middle**2 - 4 * people * r0 * (a + c))) / (2 * people * r0)
        p1 = r0 * p2
        variance = (p1 * (1 - p1) / n1 + r0**2 * p2 * (1 - p2) / n2) * factor
        return (mpmath.mpf(a) / n1 - r0 * c / n2) / mpmath.sqrt(variance)

    return at


@pytest.mark.parametrize("method", SCORE)
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_score_limits_put_back_into_the_statistic(
    method: Method, level: float, distances_at_limits: Callable[..., Any]
) -> None:
    """At each limit the published statistic is z, to 1e-14 of the limit, from single events to 10^9 a cell."""
    finite = method is ratio.miettinen_nurminen
    found = distances_at_limits(
        method, level, lambda cells: _statistic(cells, finite=finite), lambda limit: limit in (0, math.inf)
    )
    for cells, _, limit, distance in found:
        assert distance <= 1e-14 * limit, (cells, limit)


def test_koopmans_example(table: Table) -> None:
    """36/40 v 16/80: 2.940 to 7.152 (Koopman 1984, as given by Nam 1995)."""
    interval = given_interval(ratio.koopman(table(36, 4, 16, 64), 0.95))
    assert (interval.low, interval.high) == pytest.approx((2.940, 7.152), abs=5e-4)


@pytest.mark.parametrize("method", SCORE)
def test_score_limits_without_events(method: Method, table: Table) -> None:
    """No index event: from 0. No reference event: to infinity. Neither: everything, and the estimate is a gap."""
    few = given_interval(method(table(0, 10, 3, 7), 0.95))
    assert few.low == 0
    assert 0 < few.high < math.inf
    many = given_interval(method(table(3, 7, 0, 10), 0.95))
    assert 0 < many.low < math.inf
    assert many.high == math.inf
    assert given_interval(method(table(0, 10, 0, 20), 0.95)) == Interval(low=0.0, high=math.inf)


def test_everybody_on_both_sides(table: Table) -> None:
    """10/10 v 20/20: the statistic is n1 (1 - R)/R below 1, so Koopman's lower limit is 1/(1 + z^2/10)."""
    interval = given_interval(ratio.koopman(table(10, 0, 20, 0), 0.95))
    assert interval.low == pytest.approx(1 / (1 + 1.959963984540054**2 / 10), rel=1e-14)
    assert interval.high == pytest.approx(1 + 1.959963984540054**2 / 20, rel=1e-14)


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_log_intervals_keep_every_digit(level: float, table: Table, exact_z: Callable[[float], Any]) -> None:
    """Equal to the printed formulas in 50 digits, Katz's and Walter's."""
    z = exact_z(level)
    for cells in EXTREMES:
        for method, added in ((ratio.katz, 0.0), (ratio.walter, 0.5)):
            if cells[1] == cells[3] == 0 or (method is ratio.katz and 0 in (cells[0], cells[2])):
                continue
            interval = given_interval(method(table(*cells), level))
            with mpmath.workdps(50):
                a, b, c, d = (mpmath.mpf(cell) for cell in cells)
                a, n1, c, n2 = a + added, a + b + added, c + added, c + d + added
                centre, spread = (a / n1) / (c / n2), z * mpmath.sqrt(1 / a - 1 / n1 + 1 / c - 1 / n2)
                low, high = centre * mpmath.exp(-spread), centre * mpmath.exp(spread)
            assert interval.low == pytest.approx(float(low), rel=1e-14)
            assert interval.high == pytest.approx(float(high), rel=1e-14)


def test_katz_without_events_is_walters_and_says_so(table: Table) -> None:
    """A group without events takes 1/2, named in the interval; with events nothing is added."""
    for cells in ((0, 10, 3, 7), (3, 7, 0, 10), (0, 10, 0, 20), (0, 10, 20, 0)):
        interval = given_interval(ratio.katz(table(*cells), 0.95))
        assert interval == ratio.walter(table(*cells), 0.95)
        assert interval.adjusted == "half"
    assert given_interval(ratio.katz(table(3, 7, 5, 5), 0.95)).adjusted is None


def test_katz_has_no_width_where_everybody_had_the_event(table: Table) -> None:
    """b = d = 0: a gap, Katz's and Walter's."""
    assert ratio.katz(table(10, 0, 20, 0), 0.95) == ratio.walter(table(10, 0, 20, 0), 0.95) == Gap("zero-width")


@pytest.mark.parametrize("method", METHODS)
def test_an_empty_group_has_no_ratio(method: Method, table: Table) -> None:
    """Nobody in a group: a gap that names it."""
    assert method(table(0, 0, 3, 7), 0.95) == Gap("empty-index-group")
    assert method(table(3, 7, 0, 0), 0.95) == Gap("empty-reference-group")
    assert method(table(0, 0, 0, 0), 0.95) == Gap("empty-table")


@settings(max_examples=150)
@given(cells=CELLS, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate(table: Table, cells: tuple[int, ...], level: float) -> None:
    """low <= R <= high, where nothing was added and R is determined."""
    counts = table(*cells)
    estimate = risk_ratio(counts)
    for method in METHODS:
        interval = method(counts, level)
        if isinstance(interval, Gap):
            continue
        assert 0 <= interval.low < interval.high
        if interval.adjusted is None and not isinstance(estimate, Gap):
            assert interval.low <= estimate <= interval.high


@settings(max_examples=80)
@given(cells=CELLS)
def test_a_higher_level_is_never_narrower(table: Table, cells: tuple[int, ...]) -> None:
    """Each interval lies within the one of the next higher level."""
    for method in METHODS:
        assert_nested(method(table(*cells), level) for level in LEVELS)


@settings(max_examples=80)
@given(cells=CELLS, level=st.sampled_from(LEVELS))
def test_swapped_groups_give_the_reciprocal(table: Table, cells: tuple[int, ...], level: float) -> None:
    """The ratio the other way round has the reciprocal limits. (Counting the other outcome gives another ratio.)"""
    a, b, c, d = cells
    for method in METHODS:
        one, other = method(table(a, b, c, d), level), method(table(c, d, a, b), level)
        if isinstance(one, Gap):
            assert other == one
            continue
        for limit, turned in ((one.low, given_interval(other).high), (one.high, given_interval(other).low)):
            assert limit == pytest.approx(1 / turned if turned else math.inf, rel=1e-14)
