"""Probabilities of one table when the odds ratio is 1, all margins held fixed.

The log probability is put together as Loader does it for the binomial (Loader C 2000, Fast and accurate
computation of binomial probabilities): deviances of the cells from their expectations, which are small and
free of cancellation, and the rounding-free remainder of Stirling's formula. Logs of factorials of 10^9 would
leave six digits of the probability.
"""

from __future__ import annotations

import math
from functools import lru_cache

import numpy as np

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
    own = sum(_log_poisson(cell, product / total, away / total) for cell, product, away in cells)
    return own + _log_peak(total) - sum(map(_log_peak, (n1, n2, events, others)))


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


def _log_poisson(count: int, mean: float, away: float) -> float:
    """ln of the Poisson probability of a count, ``away`` being the count less the mean."""
    if count == 0:
        return -mean
    return _log_peak(count) - _deviance(count, mean, away)


def _log_peak(count: int) -> float:
    """ln of the Poisson probability of a count at its own mean, e^-n n^n / n!."""
    return -0.5 * math.log(2 * math.pi * count) - _stirling_remainder(count) if count else 0.0


def _deviance(count: int, mean: float, away: float) -> float:
    """count ln(count / mean) - count + mean, without cancellation where they are close."""
    if abs(away) > 0.1 * (count + mean):
        return count * math.log(count / mean) - away
    v = away / (count + mean)
    total = away * v
    term = 2 * count * v
    for odd in range(3, 200, 2):
        term *= v * v
        following = total + term / odd
        if following == total:
            break
        total = following
    return total


def _stirling_remainder(count: int) -> float:
    """ln n! less Stirling's formula for it."""
    if count < 16:
        return math.log(math.factorial(count)) - (count + 0.5) * math.log(count) + count - 0.5 * math.log(2 * math.pi)
    x = 1 / (count * count)
    return (1 / 12 - x * (1 / 360 - x * (1 / 1260 - x * (1 / 1680 - x * (1 / 1188 - x * 691 / 360360))))) / count
