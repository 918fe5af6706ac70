"""Where the axes of a curve have their marks, and where names stand at the ends of lines."""

from __future__ import annotations

import math
from collections.abc import Sequence

STEPS = (1.0, 2.0, 2.5, 5.0, 10.0)
ROUNDING = 1e-9
SIZES = (1.0, 1.5, 2.0, 3.0, 4.0, 5.0, 6.0, 8.0, 10.0)
"""Where an axis of risks may end, times a power of ten."""

RATIO_MARKS = (1.0, 1.5, 2.0, 3.0, 5.0, 7.0)
"""Between two powers of ten, where a ratio's axis may have a mark."""


def even_marks(reach: float, most: int = 6) -> tuple[float, ...]:
    """Round values from 0 to ``reach``, evenly spaced, ``most`` of them at most."""
    rough = reach / (most - 1)
    decade = 10.0 ** math.floor(math.log10(rough))
    step = next((size * decade for size in STEPS if size * decade >= rough * (1 - ROUNDING)), 10 * decade)
    return tuple(round(step * place, 12) for place in range(math.floor(reach / step * (1 + ROUNDING)) + 1))


def top_of(highest: float) -> float:
    """The upper end of an axis of risks: the first round value that holds the highest one, 100% at most."""
    if highest <= 0.0:
        return 1.0
    decade = 10.0 ** math.floor(math.log10(highest))
    return min(1.0, next(size * decade for size in SIZES if size * decade >= highest * (1 - ROUNDING)))


def reach_for(highest: float) -> float:
    """How far an axis of starting risks runs: the first round value that is at least twice the highest one marked."""
    return top_of(2 * highest)


def ratio_marks(low: float, high: float, most: int = 7) -> tuple[float, ...]:
    """Round ratios from ``low`` to ``high``, 1 among them where it lies there; fewer where they would crowd."""
    decades = range(math.floor(math.log10(low)), math.ceil(math.log10(high)) + 1)
    for sizes in (RATIO_MARKS, (1.0, 2.0, 5.0), (1.0, 3.0), (1.0,)):
        found = [round(size * 10.0**decade, 12) for decade in decades for size in sizes]
        inside = [mark for mark in found if low * (1 - ROUNDING) <= mark <= high * (1 + ROUNDING)]
        if len(inside) <= most:
            return tuple(inside)
    every = math.ceil(len(inside) / most)
    return tuple(mark for mark in inside if round(math.log10(mark)) % every == 0)


def ratio_ends(low: float, high: float) -> tuple[float, float]:
    """Both ends of a ratio's axis: a little room beyond the lowest and the highest, and never all at one place."""
    low, high = min(low, high, 1.0), max(low, high, 1.0)
    room = max((high / low) ** 0.08, 1.05)
    return low / room, high * room


def apart(wanted: Sequence[float], heights: Sequence[float], low: float, high: float) -> list[float]:
    """Middles of texts that stand one above the other: as near to the wanted ones as their heights let them.

    Whoever wants the lower place gets it. Where they do not all fit between ``low`` and ``high``, they go on above.
    """
    order = sorted(range(len(wanted)), key=lambda place: wanted[place])
    found = [0.0] * len(wanted)
    floor = low
    for place in order:
        found[place] = max(wanted[place], floor + heights[place] / 2)
        floor = found[place] + heights[place] / 2
    ceiling = max(high, low + sum(heights))
    for place in reversed(order):
        found[place] = min(found[place], ceiling - heights[place] / 2)
        ceiling = found[place] - heights[place] / 2
    return found
