"""The odds ratio at which a tail of the first cell's distribution has a given probability."""

from __future__ import annotations

import math
from collections.abc import Callable
from functools import partial

import numpy as np

from fourcount.stats.hypergeometric import Window, product_sum, window
from fourcount.stats.results import Counts

_ENOUGH = 1e-15
_ROUNDS = 200
_LONGEST_MOVE = 50.0


def odds_ratio_at_tail(counts: Counts, tail: float, own: float, *, upper: bool) -> float:
    """The odds ratio at which the tail from the observed table outwards has this probability.

    ``own`` is the share of the observed table's own probability that counts (1, or 1/2 for mid-P). The
    lower limit takes the tail upwards; the upper limit is the lower one of the table with its groups swapped.
    """
    return widened(counts, partial(_lower_tilt, tail=tail, own=own), upper=upper)


def widened(counts: Counts, lower: Callable[[Window], float | None], *, upper: bool) -> float:
    """The odds ratio at the tilt that ``lower`` finds, in a window widened until it holds what matters."""
    widening = 1
    while True:
        near = window(counts, widening)
        tilt = lower(near.mirrored() if upper else near)
        if tilt is not None:
            return near.centre * math.exp(-tilt if upper else tilt)
        widening *= 2


def rising_root(function: Callable[[float], tuple[float, float]], start: float, below: float = -math.inf) -> float:
    """The root of a function that rises through it, by Newton's method kept between bounds that close in.

    The function gives its value and its derivative, of the size of a standard deviation: the error left after
    a move is about that times the move squared, so that no last look is spent on a root already found.
    """
    above = math.inf
    tilt = start
    for _ in range(_ROUNDS):
        value, slope = function(tilt)
        below, above = (tilt, above) if value < 0 else (below, tilt)
        move = -value / slope if slope > 0 else math.copysign(_LONGEST_MOVE, -value)
        following = tilt + max(-_LONGEST_MOVE, min(_LONGEST_MOVE, move))
        if not below <= following <= above:
            following = (below + above) / 2
        move, tilt = following - tilt, following
        if move * move * max(slope, 1.0) <= _ENOUGH * _ENOUGH or (move * move * slope <= _ENOUGH and abs(move) < 1e-6):
            break
    return tilt


def first_guess(spread: float, tail: float) -> float:
    """About where a lower limit lies: the tilt that moves a normal mean by its quantile.

    The quantile is good to 5 in 10,000, enough for a start (Abramowitz M, Stegun IA 1964, 26.2.23, from memory).
    """
    t = math.sqrt(-2 * math.log(tail))
    z = t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)))
    return -z / spread


def _lower_tilt(near: Window, tail: float, own: float) -> float | None:
    """Solve ln(P(K > a) + own share of P(K = a)) = ln tail; None if the window proves too narrow.

    The derivative of the log of the tail is E(K | tail) - E(K). The log is concave and rises, so that from
    below Newton's steps never pass the root, and from above the first one lands below it.
    """
    goal = math.log(tail)
    held = False
    room = np.empty_like(near.steps)
    outer_steps = near.steps[near.observed :]

    def log_tail(tilt: float) -> tuple[float, float]:
        nonlocal held
        weights = near.weights(tilt, room)
        total = float(weights.sum())
        held = near.holds(weights, total)
        mean = product_sum(weights, near.steps) / total
        weights[near.observed] *= own
        outer = weights[near.observed :]
        outer_total = float(outer.sum())
        if outer_total == 0.0:
            return -math.inf, 0.0
        outer_mean = product_sum(outer, outer_steps) / outer_total
        return math.log(outer_total / total) - goal, outer_mean - mean

    tilt = rising_root(log_tail, first_guess(near.spread, tail))
    return tilt if held else None
