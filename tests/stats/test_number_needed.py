"""Numbers needed to treat, with the edges of their intervals."""

from __future__ import annotations

import math
from collections.abc import Callable
from fractions import Fraction

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats.number_needed import NumberNeeded, NumberNeededLimit, number_needed, whole_number_needed
from fourcount.stats.results import Counts, Interval

Table = Callable[..., Counts]


def _needed(difference: float, low: float, high: float, *, unwelcome: bool = True) -> NumberNeeded:
    return number_needed(difference, Interval(low=low, high=high), unwelcome)


def _limit(value: float, kind: str) -> NumberNeededLimit:
    return NumberNeededLimit(value=value, kind=kind)  # type: ignore[arg-type]


def test_altman_passes_through_infinity() -> None:
    """Altman 1998, BMJ 317:1309: a reduction of 10% (-5% to 25%) is NNTB 10, NNTB 4 to infinity to NNTH 20."""
    needed = _needed(-0.10, -0.25, 0.05)
    assert (needed.estimate, needed.kind) == (10.0, "NNTB")
    assert needed.low == _limit(4.0, "NNTB")
    assert needed.high == _limit(20.0, "NNTH")
    assert needed.through_infinity


def test_benefit_that_is_sure() -> None:
    """An interval on one side runs from the smaller to the greater number of one kind."""
    needed = _needed(-0.2, -0.4, -0.1)
    assert (needed.estimate, needed.kind) == (5.0, "NNTB")
    assert (needed.low, needed.high) == (_limit(2.5, "NNTB"), _limit(10.0, "NNTB"))
    assert not needed.through_infinity


def test_harm_counts_from_its_own_side() -> None:
    """More of an unwelcome event is harm: low is the limit farthest into harm."""
    needed = _needed(0.2, -0.1, 0.4)
    assert (needed.estimate, needed.kind) == (5.0, "NNTH")
    assert (needed.low, needed.high) == (_limit(2.5, "NNTH"), _limit(10.0, "NNTB"))
    assert needed.through_infinity


def test_a_welcome_event_turns_the_kinds() -> None:
    """More of a welcome event is benefit, with the same numbers."""
    needed = _needed(0.2, -0.1, 0.4, unwelcome=False)
    assert (needed.estimate, needed.kind) == (5.0, "NNTB")
    assert (needed.low, needed.high) == (_limit(2.5, "NNTB"), _limit(10.0, "NNTH"))


@pytest.mark.parametrize("zero", [0.0, -0.0])
def test_an_interval_that_touches_no_difference(zero: float) -> None:
    """A limit of exactly 0 is infinite, of the other limit's kind, and infinity is not passed."""
    needed = _needed(-0.1, -0.2, zero)
    assert needed.high == _limit(math.inf, "NNTB")
    assert needed.low == _limit(5.0, "NNTB")
    assert not needed.through_infinity
    harm = _needed(0.1, zero, 0.2)
    assert (harm.low, harm.high) == (_limit(5.0, "NNTH"), _limit(math.inf, "NNTH"))


@pytest.mark.parametrize("unwelcome", [True, False])
def test_no_difference_at_all(unwelcome: bool) -> None:
    """D = 0: infinite, neither kind, and low lies on the side of benefit."""
    needed = _needed(0.0, -0.25, 0.5, unwelcome=unwelcome)
    assert (needed.estimate, needed.kind, needed.through_infinity) == (math.inf, "neither", True)
    assert needed.low.kind == "NNTB"
    assert needed.high.kind == "NNTH"
    assert (needed.low.value, needed.high.value) == ((4.0, 2.0) if unwelcome else (2.0, 4.0))


def test_no_difference_in_an_interval_that_touches_it() -> None:
    """D = 0 at the end of its own interval: both limits are of the one kind there is."""
    needed = _needed(0.0, 0.0, 0.5)
    assert (needed.low, needed.high) == (_limit(math.inf, "NNTH"), _limit(2.0, "NNTH"))
    assert not needed.through_infinity


def test_nothing_but_zero_is_neither() -> None:
    """Both limits 0: infinite and neither."""
    needed = _needed(0.0, 0.0, 0.0)
    assert needed.low == needed.high == _limit(math.inf, "neither")


@settings(max_examples=100)
@given(ends=st.lists(st.floats(-1, 1), min_size=3, max_size=3).map(sorted), unwelcome=st.booleans())
def test_numbers_are_positive_and_turn_with_the_welcome(ends: list[float], unwelcome: bool) -> None:
    """Every value is positive, and a turned difference with a turned welcome is the same number needed."""
    low, difference, high = ends
    needed = _needed(difference, low, high, unwelcome=unwelcome)
    assert min(needed.estimate, needed.low.value, needed.high.value) >= 1
    assert needed.through_infinity == (low < 0 < high)
    assert needed == _needed(-difference, -high, -low, unwelcome=not unwelcome)


def test_whole_numbers_come_from_the_counts(table: Table) -> None:
    """30/100 v 25/100 is 20, though 1/(0.30 - 0.25) in doubles rounds up to 21."""
    assert whole_number_needed(table(25, 75, 30, 70)) == 20
    assert math.ceil(1 / (0.30 - 0.25)) == 21


def test_whole_numbers_round_up(table: Table) -> None:
    """Cook and Sackett 1995, BMJ 310:452 (from memory): 20% v 12% needs 13, 1.5% v 0.9% needs 167."""
    assert whole_number_needed(table(12, 88, 20, 80)) == 13
    assert whole_number_needed(table(9, 991, 15, 985)) == 167


def test_no_whole_number_without_a_difference(table: Table) -> None:
    """Equal risks and empty groups need no number."""
    for cells in ((3, 7, 6, 14), (0, 5, 0, 9), (0, 0, 3, 7), (0, 0, 0, 0)):
        assert whole_number_needed(table(*cells)) is None


@settings(max_examples=100)
@given(cells=st.tuples(*[st.integers(0, 10**9)] * 4))
def test_whole_numbers_are_the_least_that_reach_one_person(table: Table, cells: tuple[int, ...]) -> None:
    """n |D| reaches one person and (n-1) |D| does not, in exact fractions."""
    a, b, c, d = cells
    whole = whole_number_needed(table(*cells))
    if whole is None:
        assert a * (c + d) == c * (a + b)
        return
    difference = abs(Fraction(a, a + b) - Fraction(c, c + d))
    assert whole * difference >= 1 > (whole - 1) * difference
