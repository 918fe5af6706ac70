"""Tables of pairs and of person-time for many tests: how to write them and how to draw them."""

from __future__ import annotations

import itertools
import random
from collections.abc import Iterable

from hypothesis import strategies as st

from fourcount.stats.results import PairCounts, Rates

CELL = st.integers(0, 40) | st.sampled_from([10**5, 100_700, 10**9])
PAIRS = st.tuples(CELL, CELL, CELL, CELL).filter(any)
"""Tables with at least one pair, small cells beside the largest."""

EXTREME_PAIRS = [cells for cells in itertools.product((0, 1, 3, 10**5, 10**9), repeat=4) if any(cells)]
"""Every combination of no pair, single pairs and very many."""

TIME = st.floats(0.5, 2000.0) | st.sampled_from([1e-9, 1.0, 1000.0, 1e12])
RATES = st.tuples(CELL, TIME, CELL, TIME)

EXTREME_RATES = list(itertools.product((0, 1, 3, 10**5, 10**9), (1e-40, 1e-9, 17.5, 1e12), repeat=2))
"""Every combination of no event, single events and very many with tiny and huge person-time."""


def pairs_of(cells: Iterable[int]) -> PairCounts:
    """The pairs e, f, g, h: event on both sides, index only, reference only, neither."""
    both, index_only, reference_only, neither = cells
    return PairCounts(both=both, index_only=index_only, reference_only=reference_only, neither=neither)


def rates_of(table: tuple[int, float, int, float]) -> Rates:
    """Events and person-time of the index group, then of the reference group."""
    return Rates(index_events=table[0], index_time=table[1], reference_events=table[2], reference_time=table[3])


def random_pairs(seed: int, tables: int, largest: int = 60) -> list[tuple[int, int, int, int]]:
    """Tables of pairs, a third of them with few pairs, so that zeros are among them."""
    draw = random.Random(seed)
    tops = [draw.choice((3, largest, largest)) for _ in range(tables)]
    return [(draw.randint(0, top), draw.randint(0, top), draw.randint(0, top), draw.randint(1, top)) for top in tops]


def random_rates(seed: int, tables: int, largest: int = 80) -> list[tuple[int, float, int, float]]:
    """Tables of rates with 0 to ``largest`` events in 1 to 5,000 units of time."""
    draw = random.Random(seed)
    return [
        (
            draw.randint(0, draw.choice((3, largest))),
            round(draw.uniform(1, 5000), 1),
            draw.randint(0, draw.choice((3, largest))),
            round(draw.uniform(1, 5000), 1),
        )
        for _ in range(tables)
    ]
