"""Where texts find room in a drawing: beside a point and clear of lines, and in how many lines of text."""

from __future__ import annotations

from collections.abc import Iterator, Sequence
from typing import NamedTuple

Box = tuple[float, float, float, float]
"""Left, lower, right and upper end."""

Value = tuple[float, float]

NEAREST, STEP, STEPS = 1.0, 0.6, 14
"""How far above or below its point a name may stand, in its own heights."""

SHIFTS = (0.0, 0.5, 1.0, 1.5)
"""How far aside it may be moved, in its own widths."""


class Drawn(NamedTuple):
    """What a name keeps clear of: other texts and points as boxes, and lines; ``room`` is where it may stand."""

    room: Box
    taken: Sequence[Box]
    paths: Sequence[Sequence[Value]]


def place_beside(at: Value, size: Value, gap: float, *, upwards: bool, drawn: Drawn) -> Box:
    """The nearest place for a name of a point that is in the room and, as far as there is one, clear of all else."""

    def faults(place: Box) -> tuple[bool, int, int]:
        left, low, right, high = drawn.room
        outside = place[0] < left or place[1] < low or place[2] > right or place[3] > high
        return outside, sum(meet(place, other) for other in drawn.taken), sum(crosses(place, p) for p in drawn.paths)

    return min(_places(at, size, gap, upwards=upwards), key=faults)


def _places(at: Value, size: Value, gap: float, *, upwards: bool) -> Iterator[Box]:
    """Places from the nearest on, at both sides of the point."""
    (wide, tall), way = size, 1 if upwards else -1
    for step in range(STEPS):
        for sign in (way, -way):
            middle = at[1] + sign * (NEAREST + STEP * step) * tall
            for shift in SHIFTS:
                for left in (at[0] + gap + shift * wide, at[0] - gap - (1 + shift) * wide):
                    yield left, middle - tall / 2, left + wide, middle + tall / 2


def meet(one: Box, other: Box) -> bool:
    """Whether two boxes share any room."""
    return one[0] < other[2] and other[0] < one[2] and one[1] < other[3] and other[1] < one[3]


def crosses(box: Box, path: Sequence[Value]) -> bool:
    """Whether a line through places goes through a box."""
    return any(_passes(box, path[place - 1], path[place]) for place in range(1, len(path)))


def _passes(box: Box, begin: Value, end: Value) -> bool:
    """Whether a straight line does: the stretch of it between all four sides (Liang and Barsky 1984, from memory)."""
    enters, leaves = 0.0, 1.0
    across, up = end[0] - begin[0], end[1] - begin[1]
    for speed, distance in (
        (-across, begin[0] - box[0]),
        (across, box[2] - begin[0]),
        (-up, begin[1] - box[1]),
        (up, box[3] - begin[1]),
    ):
        if speed < 0:
            enters = max(enters, distance / speed)
        elif speed > 0:
            leaves = min(leaves, distance / speed)
        elif distance < 0:
            return False
    return enters <= leaves


def shared(wanted: Sequence[int], most: int) -> list[int]:
    """How many lines of text each gets, ``most`` of them together: the longest gives way, to one line at least."""
    given = list(wanted)
    while sum(given) > most and max(given, default=1) > 1:
        given[given.index(max(given))] -= 1
    return given
