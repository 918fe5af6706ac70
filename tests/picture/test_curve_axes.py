"""Where a curve's axes have their marks, and how names at the ends of lines keep apart."""

from __future__ import annotations

from itertools import pairwise

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.picture.curve_axes import apart, even_marks, ratio_ends, ratio_marks, reach_for, top_of


@pytest.mark.parametrize(
    ("reach", "marks"),
    [
        (1.0, (0, 0.2, 0.4, 0.6, 0.8, 1.0)),
        (0.5, (0, 0.1, 0.2, 0.3, 0.4, 0.5)),
        (0.02, (0, 0.005, 0.01, 0.015, 0.02)),
        (0.2, (0, 0.05, 0.1, 0.15, 0.2)),
    ],
)
def test_marks_are_round_and_even(reach: float, marks: tuple[float, ...]) -> None:
    """From 0 to the end in steps of 1, 2, 2.5 or 5 and a power of ten."""
    assert even_marks(reach) == pytest.approx(marks)


@given(st.floats(1e-7, 1.0), st.integers(3, 8))
def test_marks_stay_on_the_axis_and_are_few(reach: float, most: int) -> None:
    """No mark lies beyond the end, and no more than asked for are there."""
    marks = even_marks(reach, most)
    assert marks[0] == 0.0
    assert marks[-1] <= reach * (1 + 1e-9)
    assert 2 <= len(marks) <= most


@given(st.floats(1e-9, 1.0))
def test_the_top_holds_the_highest_value(highest: float) -> None:
    """The axis ends at a round value above the highest one, never above 100%."""
    assert highest * (1 - 1e-9) <= top_of(highest) <= min(1.0, 2.01 * highest)


@pytest.mark.parametrize(
    ("highest", "reach"),
    [(0.0, 1.0), (0.001, 0.002), (0.12, 0.3), (70 / 409, 0.4), (0.51, 1.0), (1.0, 1.0)],
)
def test_an_axis_of_starting_risks_holds_twice_the_highest(highest: float, reach: float) -> None:
    """So that what is marked stands in its nearer half; 100% at most, and all of it where nothing is marked."""
    assert reach_for(highest) == pytest.approx(reach)


def test_nothing_but_zeros_has_the_whole_axis() -> None:
    """Where every risk is 0 the axis goes to 100%."""
    assert top_of(0.0) == 1.0


@given(st.floats(1e-6, 1e6), st.floats(1e-6, 1e6))
def test_marks_of_ratios_lie_inside_and_are_few(one: float, other: float) -> None:
    """The ends hold both values and 1; the marks lie between them and hold 1."""
    low, high = ratio_ends(one, other)
    assert low < min(one, other, 1.0)
    assert max(one, other, 1.0) < high
    marks = ratio_marks(low, high)
    assert 1 <= len(marks) <= 8
    assert 1.0 in marks
    assert all(low <= mark * (1 + 1e-9) and mark <= high * (1 + 1e-9) for mark in marks)


@given(st.lists(st.tuples(st.floats(0, 100), st.floats(5, 30)), min_size=1, max_size=8))
def test_names_never_lie_on_one_another(names: list[tuple[float, float]]) -> None:
    """Any two of them are at least half of both heights apart, and they keep the order that was wanted."""
    wanted, heights = [y for y, _ in names], [height for _, height in names]
    found = apart(wanted, heights, 0.0, 100.0)
    order = sorted(range(len(names)), key=lambda place: wanted[place])
    for below, above in pairwise(order):
        assert found[above] - found[below] >= (heights[above] + heights[below]) / 2 - 1e-9
    assert all(found[place] >= heights[place] / 2 - 1e-6 for place in order)


def test_names_with_room_stay_where_they_are_wanted() -> None:
    """Nothing moves that does not have to."""
    assert apart([10, 50, 90], [10, 10, 10], 0, 100) == [10, 50, 90]
