"""Baptista and Pike's interval: the odds ratios at which the observed table is not among the unlikely ones.

At an odds ratio, add the probabilities of all tables that are no likelier than the observed one; the interval
runs from the least to the greatest odds ratio at which this sum exceeds 1 - level. The mid-P version
counts half of the observed table's own probability. Source: Baptista J, Pike MC (1977) Appl Stat 26:214; the
mid-P version: Fagerland MW, Lydersen S, Laake P (2015) Stat Methods Med Res 24:224.

The sum jumps wherever a table on the far side becomes no likelier than the observed one, at the odds
ratio (w_k / w_a)^(1 / (a - k)). Between two jumps the set of tables is fixed, and the probability of the rest is
log-concave, so the sum falls and then rises: it is greatest at an end of the piece. The lower limit is
therefore the first jump whose top exceeds 1 - level, or the crossing in the piece that leads to it. The tops
rise from jump to jump (seen in every table tried, not proven), which lets the first be found by halving.
Some odds ratios within the interval may be rejected; the interval given is the hull.
"""

from __future__ import annotations

import math
from collections.abc import Callable
from functools import partial

import numpy as np

from fourcount.stats.estimates import without_people
from fourcount.stats.hypergeometric import Array, Window, product_sum, support
from fourcount.stats.results import Counts, Gap, Interval
from fourcount.stats.tails import first_guess, rising_root, widened


def baptista_pike(counts: Counts, level: float) -> Interval | Gap:
    """Baptista and Pike's exact interval of the odds ratio."""
    return _interval(counts, level, own=1.0)


def baptista_pike_mid_p(counts: Counts, level: float) -> Interval | Gap:
    """Baptista and Pike's interval with half of the observed table's own probability."""
    return _interval(counts, level, own=0.5)


def _interval(counts: Counts, level: float, own: float) -> Interval | Gap:
    gap = without_people(counts)
    if gap is not None:
        return gap
    least, greatest = support(counts)
    lower = partial(_lower_tilt, unlikely=1 - level, own=own)
    return Interval(
        low=_exact_one(counts, widened(counts, lower, upper=False)) if least < 0 else 0.0,
        high=_exact_one(counts, widened(counts, lower, upper=True)) if greatest > 0 else math.inf,
    )


def _exact_one(counts: Counts, limit: float) -> float:
    """The limit, rid of rounding where equal margins put a jump at an odds ratio of exactly 1."""
    symmetric = counts.index_total == counts.reference_total or counts.events == counts.non_events
    return 1.0 if symmetric and abs(limit - 1) < 1e-13 else limit


def _lower_tilt(near: Window, unlikely: float, own: float) -> float | None:
    """The least tilt at which the sum exceeds ``unlikely``; None if the window proves too narrow."""
    # Tilts at which the tables below the observed one join the sum: they rise with the table.
    jumps = near.log_weights[: near.observed] / -near.steps[: near.observed]
    room = np.empty_like(near.steps)
    at = _first_top(near, jumps, unlikely, own, room)
    if at == 0 and not near.whole_below:
        return None
    tilt = float(jumps[at])
    top = _Sum(near, tilt, own, room)
    if not top.held:
        return None
    if top.value(at) <= unlikely:
        return tilt
    goal = math.log(unlikely)

    def log_sum(tilt: float) -> tuple[float, float]:
        looked_at = _Sum(near, tilt, own, room)
        value = looked_at.value(at)
        return (math.log(value) - goal, looked_at.slope(at) / value) if value > 0 else (-math.inf, 0.0)

    return rising_root(log_sum, tilt, below=float(jumps[at - 1]) if at > 0 else -math.inf)


def _first_top(near: Window, jumps: Array, unlikely: float, own: float, room: Array) -> int:
    """The place of the first jump at whose top the sum exceeds ``unlikely``, found from a guess outwards."""
    last = len(jumps) - 1
    guess = min(int(jumps.searchsorted(first_guess(near.spread, unlikely / 2))), last)
    top = _Sum(near, float(jumps[guess]), own, room)
    value = top.value(guess + 1)
    # On the tops, both tails shrink alike: the upper one's slope tells how many jumps are between.
    rise = top.upper_slope() * float(jumps[guess] - jumps[guess - 1]) if 0 < guess < last else 0.0
    if rise > 0:
        guess = max(0, min(last, guess + math.ceil((math.log(unlikely) - math.log(value)) / rise)))
    return _halved(lambda at: _Sum(near, float(jumps[at]), own, room).value(at + 1) > unlikely, guess, last)


def _halved(exceeds: Callable[[int], bool], guess: int, last: int) -> int:
    """The least place from 0 to ``last`` that exceeds, known to do so at ``last``; fast if near the guess."""
    stride = 1
    if exceeds(guess):
        above, below = guess, guess - 1
        while below >= 0 and exceeds(below):
            stride *= 2
            above, below = below, max(below - stride, -1)
    else:
        below, above = guess, min(guess + 1, last)
        while above < last and not exceeds(above):
            stride *= 2
            below, above = above, min(above + stride, last)
    while above - below > 1:
        middle = (above + below) // 2
        above, below = (middle, below) if exceeds(middle) else (above, middle)
    return above


class _Sum:
    """The probabilities at one tilt, asked for the sum over the observed table, those above and the lowest ones."""

    def __init__(self, near: Window, tilt: float, own: float, room: Array) -> None:
        self._steps = near.steps
        self._observed = near.observed
        self._weights = near.weights(tilt, room)
        self._total = float(self._weights.sum())
        self.held = near.holds(self._weights, self._total)
        self._mean = product_sum(self._weights, near.steps) / self._total
        self._weights[near.observed] *= own
        self._upper = float(self._weights[near.observed :].sum())

    def value(self, lowest: int) -> float:
        """The sum with this many of the lowest tables in it."""
        return (self._upper + float(self._weights[:lowest].sum())) / self._total

    def slope(self, lowest: int) -> float:
        """Its derivative by the tilt, while the tables in it stay the same."""
        inner = product_sum(self._weights[:lowest], self._steps[:lowest]) + self._upper_moment()
        return inner / self._total - self._mean * self.value(lowest)

    def upper_slope(self) -> float:
        """Derivative by the tilt of the log of the upper tail; 0 where that is below the smallest double."""
        return self._upper_moment() / self._upper - self._mean if self._upper > 0 else 0.0

    def _upper_moment(self) -> float:
        return product_sum(self._weights[self._observed :], self._steps[self._observed :])
