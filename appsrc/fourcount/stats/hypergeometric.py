"""The noncentral hypergeometric distribution of the first cell, near the table that was observed.

With all margins held fixed, the index events K have weights C(n1, k) C(n2, m - k) psi^k, where n1 and n2 are
the groups' sizes, m the events of both and psi the odds ratio. Neighbouring weights are in the ratio
(n1 - k)(m - k) psi / ((k + 1)(n2 - m + k + 1)) (R. A. Fisher 1935, J R Stat Soc 98:39), so the whole
distribution follows from one table's weight. It is log-concave; a window a few standard deviations wide
therefore holds all that a double can see of it, and what it leaves out is bounded by a geometric series.
"""

from __future__ import annotations

import math
from dataclasses import dataclass
from functools import lru_cache

import numpy as np
from numpy.typing import NDArray

from fourcount.stats.results import Counts

Array = NDArray[np.float64]

NEGLIGIBLE = 1e-17
"""Share of a sum below which what lies outside the window is left out."""

_WHOLE_SUPPORT = 256
"""A support up to this long is always taken whole."""

_PIECE = 8192
_REACH = 9.0
_MARGIN = 40.0
_FARTHEST_Z = 3.5
"""Standard errors by which a limit at the 99.9% level may stand off the estimate, rounded up."""


@dataclass(frozen=True, slots=True, eq=False)
class Window:
    """Log weights of the tables near the observed one, relative to it, at the odds ratio ``centre``.

    ``steps`` are whole numbers from ``-observed`` upwards: index events more than observed. The odds ratio
    is spoken of as a tilt t: psi = centre * exp(t) adds t times the step to each log weight. Tilts stay
    small near the data, where ln psi times a count of 10^9 would lose seven digits. ``spread`` is the
    standard deviation of the steps at the centre, roughly.
    """

    centre: float
    spread: float
    steps: Array
    log_weights: Array
    observed: int
    whole_below: bool
    whole_above: bool

    def weights(self, tilt: float, out: Array | None = None) -> Array:
        """Weights at the odds ratio centre * exp(tilt), the greatest of them 1; written into ``out`` if given."""
        weights = np.multiply(self.steps, tilt, out=out)
        weights += self.log_weights
        weights -= weights.max()
        return np.exp(weights, out=weights)

    def mirrored(self) -> Window:
        """The same distribution with the groups swapped: every step and every tilt changes its sign."""
        return Window(
            centre=1.0 / self.centre,
            spread=self.spread,
            steps=np.ascontiguousarray(-self.steps[::-1]),
            log_weights=np.ascontiguousarray(self.log_weights[::-1]),
            observed=len(self.steps) - 1 - self.observed,
            whole_below=self.whole_above,
            whole_above=self.whole_below,
        )

    def holds(self, weights: Array, total: float) -> bool:
        """Whether what the window leaves out beside these weights is negligible against their total."""
        enough = NEGLIGIBLE * total
        below = self.whole_below or _rest(float(weights[0]), float(weights[1])) <= enough
        return below and (self.whole_above or _rest(float(weights[-1]), float(weights[-2])) <= enough)


def _rest(edge: float, before: float) -> float:
    """A bound of the sum of all weights beyond the edge of a log-concave sequence."""
    if edge == 0.0:
        return 0.0
    return edge * edge / (before - edge) if before > edge else math.inf


def product_sum(left: Array, right: Array) -> float:
    """The sum of products, in pieces too short for the linear algebra library to start threads for them.

    Threads wake slowly on a busy machine, and sums of pieces also round less.
    """
    if len(left) <= _PIECE:
        return float(left @ right)
    return math.fsum(float(left[at : at + _PIECE] @ right[at : at + _PIECE]) for at in range(0, len(left), _PIECE))


def support(counts: Counts) -> tuple[int, int]:
    """Least and greatest step from the observed table that the margins allow."""
    return (
        -min(counts.index_events, counts.reference_non_events),
        min(counts.index_non_events, counts.reference_events),
    )


@lru_cache(maxsize=2)
def window(counts: Counts, widening: int = 1) -> Window:
    """The window round the observed table, wide enough for limits at the 99.9% level; ``widening`` doubles it.

    The last two are kept, since the methods for one table follow each other.
    """
    least, greatest = support(counts)
    centre = _middle_odds_ratio(counts)
    if greatest - least > _WHOLE_SUPPORT:
        below, above = _reach(counts, centre)
        least, greatest = max(least, -below * widening), min(greatest, above * widening)
    steps = np.arange(least, greatest + 1, dtype=np.float64)
    log_weights = np.empty_like(steps)
    log_weights[-least] = 0.0
    log_ratios = _log_ratios(counts, centre, steps[:-1])
    # Summed outwards from the observed table: the rounding of a sum then grows with the distance from it.
    np.cumsum(log_ratios[-least:], out=log_weights[1 - least :])
    log_weights[:-least] = -np.cumsum(log_ratios[:-least][::-1])[::-1]
    steps.setflags(write=False)
    log_weights.setflags(write=False)
    return Window(
        centre=centre,
        spread=1 / _standard_error(counts),
        steps=steps,
        log_weights=log_weights,
        observed=-least,
        whole_below=least == support(counts)[0],
        whole_above=greatest == support(counts)[1],
    )


def _log_ratios(counts: Counts, odds_ratio: float, steps: Array) -> Array:
    """ln of the weight one step farther over the weight here; all factors are whole and exact below 2^53."""
    ratios = counts.index_non_events - steps
    ratios *= counts.reference_events - steps
    ratios *= odds_ratio
    below = steps + (counts.index_events + 1)
    below *= steps + (counts.reference_non_events + 1)
    ratios /= below
    return np.log(ratios, out=ratios)


def _middle_odds_ratio(counts: Counts) -> float:
    """An odds ratio at which the observed table is among the likeliest."""
    return (
        (counts.index_events + 0.5)
        * (counts.reference_non_events + 0.5)
        / ((counts.index_non_events + 0.5) * (counts.reference_events + 0.5))
    )


def _standard_error(counts: Counts) -> float:
    """Of the log odds ratio, roughly, half a person being added to every cell."""
    cells = (
        counts.index_events,
        counts.index_non_events,
        counts.reference_events,
        counts.reference_non_events,
    )
    return math.sqrt(sum(1 / (cell + 0.5) for cell in cells))


def _reach(counts: Counts, centre: float) -> tuple[int, int]:
    """Steps below and above the observed table that the window takes in."""
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    swing = _FARTHEST_Z * _standard_error(counts)
    above = _farthest(a, b, c, d, centre * math.exp(swing))
    below = _farthest(c, d, a, b, math.exp(swing) / centre)
    return below, above


def _farthest(a: int, b: int, c: int, d: int, odds_ratio: float) -> int:
    """Steps above a that hold the upper tail at an odds ratio greater than the observed one."""
    n1, n2, m = a + b, c + d, a + c
    # The likeliest table solves (psi - 1) k^2 - (psi (n1 + m + 2) + n2 - m) k + psi (n1 + 1)(m + 1) = 0.
    middle = odds_ratio * (n1 + m + 2) + n2 - m
    inner = middle * middle - 4 * (odds_ratio - 1) * odds_ratio * (n1 + 1) * (m + 1)
    mode = 2 * odds_ratio * (n1 + 1) * (m + 1) / (middle + math.sqrt(max(inner, 0.0)))
    cells = (mode, n1 - mode, m - mode, n2 - m + mode)
    spread = 1 / math.sqrt(sum(1 / (max(cell, 0.0) + 1) for cell in cells))
    return math.ceil(max(mode - a, 0.0) + _REACH * spread + _MARGIN)
