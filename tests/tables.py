"""Tables of four counts for many tests: how to draw them, how to write them, and what their intervals have to keep."""

from __future__ import annotations

import itertools
from collections.abc import Iterable

from hypothesis import strategies as st

from fourcount.stats.results import Counts, Gap, Interval

LEVELS = (0.8, 0.9, 0.95, 0.99, 0.999)
"""Confidence levels from the lowest to the highest that the program takes."""

CELL = st.integers(0, 60) | st.sampled_from([10**5, 10**9])
CELLS = st.tuples(CELL, CELL, CELL, CELL).filter(lambda cells: cells[0] + cells[1] > 0 < cells[2] + cells[3])
"""Tables with somebody in both groups, small cells beside the largest."""

EXTREMES = [
    cells
    for cells in itertools.product((0, 1, 3, 10**5, 10**9), repeat=4)
    if cells[0] + cells[1] and cells[2] + cells[3]
]
"""Every combination of nobody, single events and very large counts."""


def counts_of(table: Iterable[int]) -> Counts:
    """The counts a, b, c, d: index events and non-events, then the reference group's."""
    a, b, c, d = table
    return Counts(index_events=a, index_non_events=b, reference_events=c, reference_non_events=d)


def given_interval(found: Interval | Gap) -> Interval:
    """The interval, where one has to be given."""
    assert isinstance(found, Interval), found
    return found


def assert_nested(found: Iterable[Interval | Gap]) -> None:
    """Each interval lies within the next one; where one is withheld nothing is asked of its neighbour."""
    for inner, outer in itertools.pairwise(found):
        if isinstance(inner, Gap):
            continue
        assert given_interval(outer).low <= inner.low
        assert inner.high <= given_interval(outer).high
