"""Where texts find room in a drawing: beside a point and clear of lines, and in how many lines of text."""

from __future__ import annotations

import math
from bisect import bisect_left, bisect_right
from collections.abc import Iterator, Sequence
from operator import itemgetter
from typing import NamedTuple

Box = tuple[float, float, float, float]
"""Left, lower, right and upper end."""

Value = tuple[float, float]

NEAREST, STEP, STEPS = 1.0, 0.6, 16
"""How far above or below its point a name may stand, in its own heights."""

SHIFTS = (0.0, 0.5, 1.0, 1.5)
"""How far aside of its point it may stand, in its own widths."""

OVER = (0.25, 0.5, 0.75)
"""How much of its width may lie left of its point."""


class Drawn(NamedTuple):
    """What a name keeps clear of: texts and points as boxes, and lines from left to right; ``room`` is where it may be.

    Lines are crossed by none if that can be, texts and points by none before that.
    """

    room: Box
    taken: Sequence[Box]
    paths: Sequence[Sequence[Value]]


def place_beside(at: Value, size: Value, gap: float, *, upwards: bool, drawn: Drawn) -> Box:
    """The nearest place for a name of a point that is in the room and, as far as there is one, clear of all else."""
    places = sorted(_places(at, size, gap, upwards=upwards), key=lambda place: _distance(at, place))
    best, fewest = places[0], (True, 0, 0)
    for number, place in enumerate(places):
        faults = _faults(at, place, drawn)
        if not any(faults):
            return place
        if number == 0 or faults < fewest:
            best, fewest = place, faults
    return best


def leads_to(at: Value, place: Box) -> Value:
    """Where a leader from a point reaches its name: the nearest place at its edge."""
    return min(max(at[0], place[0]), place[2]), min(max(at[1], place[1]), place[3])


def _faults(at: Value, place: Box, drawn: Drawn) -> tuple[bool, int, int]:
    left, low, right, high = drawn.room
    outside = place[0] < left or place[1] < low or place[2] > right or place[3] > high
    leader = sorted((at, leads_to(at, place)))
    others = [other for other in drawn.taken if not other[0] <= at[0] <= other[2] or not other[1] <= at[1] <= other[3]]
    hidden = sum(meet(place, other) for other in drawn.taken) + sum(crosses(other, leader) for other in others)
    return outside, hidden, sum(crosses(place, path) for path in drawn.paths)


def _places(at: Value, size: Value, gap: float, *, upwards: bool) -> Iterator[Box]:
    """Places at both sides of the point, on the side that is asked for first."""
    (wide, tall), way = size, 1 if upwards else -1
    lefts = [left for shift in SHIFTS for left in (at[0] + gap + shift * wide, at[0] - gap - (1 + shift) * wide)]
    lefts += [at[0] - over * wide for over in OVER]
    for step in range(STEPS):
        for sign in (way, -way):
            middle = at[1] + sign * (NEAREST + STEP * step) * tall
            for left in lefts:
                yield left, middle - tall / 2, left + wide, middle + tall / 2


def _distance(at: Value, place: Box) -> float:
    x, y = leads_to(at, place)
    return round(math.hypot(x - at[0], y - at[1]), 6)


def meet(one: Box, other: Box) -> bool:
    """Whether two boxes share any room."""
    return one[0] < other[2] and other[0] < one[2] and one[1] < other[3] and other[1] < one[3]


def crosses(box: Box, path: Sequence[Value]) -> bool:
    """Whether a line from left to right through places goes through a box."""
    first = bisect_left(path, box[0], key=itemgetter(0))
    last = bisect_right(path, box[2], key=itemgetter(0))
    return any(_passes(box, path[place - 1], path[place]) for place in range(max(first, 1), min(last + 1, len(path))))


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
