"""Probabilities of one table when the odds ratio is 1, all margins held fixed.

The log probability is put together from those of Poisson counts, as Loader does it for the binomial (Loader C 2000,
Fast and accurate computation of binomial probabilities).
"""

from __future__ import annotations

from functools import lru_cache

import numpy as np

from fourcount.stats.poisson import log_peak, log_poisson
from fourcount.stats.results import Counts

_FIRST_CHUNK = 256


@lru_cache(maxsize=256)
def log_probability(counts: Counts) -> float:
    """ln of the probability of this table among all with its margins, at the odds ratio 1."""
    n1, n2, events, others, total = (
        counts.index_total,
        counts.reference_total,
        counts.events,
        counts.non_events,
        counts.total,
    )
    # Whole-number arithmetic: the distance of a cell from its expectation, times the total.
    distance = counts.index_events * total - n1 * events
    cells = (
        (counts.index_events, n1 * events, distance),
        (counts.index_non_events, n1 * others, -distance),
        (counts.reference_events, n2 * events, -distance),
        (counts.reference_non_events, n2 * others, distance),
    )
    own = sum(log_poisson(cell, product / total, away / total) for cell, product, away in cells)
    return own + log_peak(total) - sum(map(log_peak, (n1, n2, events, others)))


def tail(counts: Counts, away: int) -> float:
    """The sum of the probabilities from this table on, index events growing (1) or shrinking (-1), over its own.

    To be asked only where probabilities fall from this table on.
    """
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    falling, rising = ((b, c), (a, d)) if away > 0 else ((a, d), (b, c))
    length = min(falling)
    done, last, total, chunk = 0, 1.0, 1.0, _FIRST_CHUNK
    while done < length:
        steps = np.arange(done, min(done + chunk, length), dtype=np.float64)
        ratios = (falling[0] - steps) * (falling[1] - steps) / ((rising[0] + 1 + steps) * (rising[1] + 1 + steps))
        following = last * np.cumprod(ratios)
        total += float(following.sum())
        last, ratio = float(following[-1]), float(ratios[-1])
        if last * ratio <= 1e-17 * total * (1 - ratio):
            break
        done, chunk = done + len(steps), chunk * 2
    return total


def moved(counts: Counts, steps: int) -> Counts:
    """The table with so many more index events and the same margins."""
    return Counts(
        index_events=counts.index_events + steps,
        index_non_events=counts.index_non_events - steps,
        reference_events=counts.reference_events - steps,
        reference_non_events=counts.reference_non_events + steps,
    )
