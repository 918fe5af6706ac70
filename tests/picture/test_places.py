"""Where names find room: beside their point, clear of texts and lines, in as many lines of text as there are."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.picture.places import Drawn, crosses, meet, place_beside, shared

ROOM = (0.0, 0.0, 100.0, 100.0)


@pytest.mark.parametrize(
    ("path", "through"),
    [
        (((0, 5), (20, 5)), True),
        (((0, 0), (20, 20)), True),
        (((12, 12), (13, 13)), True),
        (((0, 30), (30, 30)), False),
        (((0, 20), (40, 60)), False),
        (((5, 0), (5, 40)), False),
        (((12, -9), (12, 40)), True),
        (((0, 40), (5, 30), (11, 30), (19, 9), (30, 9)), True),
        (((0, 40), (5, 30), (11, 30), (19, 25), (30, 9)), False),
        (((12, 15),), False),
    ],
)
def test_lines_go_through_boxes_or_pass_them(path: tuple[tuple[float, float], ...], through: bool) -> None:
    """A box from 10 to 20 across and 2 to 18 up."""
    assert crosses((10, 2, 20, 18), path) is through


def test_a_name_keeps_clear_of_a_line() -> None:
    """It stands below the line that goes on above its point, and out of the way of another name."""
    line = [(0.0, 50.0), (100.0, 60.0)]
    at = (50.0, 55.0)
    first = place_beside(at, (20, 10), 5, upwards=True, drawn=Drawn(ROOM, (), [line]))
    second = place_beside(at, (20, 10), 5, upwards=True, drawn=Drawn(ROOM, [first], [line]))
    assert not crosses(first, line)
    assert not crosses(second, line)
    assert not meet(first, second)


@given(st.floats(0, 100), st.floats(0, 100), st.floats(5, 40), st.booleans())
def test_a_name_stays_in_its_room(x: float, y: float, wide: float, upwards: bool) -> None:
    """At whatever place its point is, and crowded or not."""
    crowd = [(x - 30, y - 30, x + 30, y + 30)]
    left, low, right, high = place_beside((x, y), (wide, 8), 2, upwards=upwards, drawn=Drawn(ROOM, crowd, ()))
    assert -1e-9 <= left < right <= 100 + 1e-9
    assert -1e-9 <= low < high <= 100 + 1e-9


@given(st.lists(st.integers(1, 40), max_size=6), st.integers(-5, 60))
def test_lines_of_text_are_shared(wanted: list[int], most: int) -> None:
    """As many as there are, the longest gives way first, and each keeps one."""
    given_ = shared(wanted, most)
    assert all(1 <= got <= asked for got, asked in zip(given_, wanted, strict=True))
    assert sum(given_) <= max(most, len(wanted))
    if sum(wanted) <= most:
        assert given_ == wanted
