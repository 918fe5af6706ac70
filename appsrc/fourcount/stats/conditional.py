"""Exact intervals for the odds ratio with all margins held fixed, and the conditional estimate.

Lower limit: the odds ratio at which this many index events or more have probability (1 - level)/2; upper
limit: this many or fewer. The mid-P limits count half of the observed table's own probability. At the end of
the support a limit is 0 or infinite. Sources: Cornfield J (1956) Proc Third Berkeley Symp 4:135, after
R. A. Fisher (1935); mid-P: Lancaster HO (1961) J Am Stat Assoc 56:223. The estimate maximises the
conditional likelihood: under it the expected index events are those observed.
"""

from __future__ import annotations

import math
from functools import partial

import numpy as np

from fourcount.stats.baptista_pike import baptista_pike, baptista_pike_mid_p
from fourcount.stats.estimates import without_people
from fourcount.stats.fisher import fisher, fisher_greater, fisher_less, fisher_mid_p
from fourcount.stats.hypergeometric import Array, Window, product_sum, support, window
from fourcount.stats.results import Counts, Gap, Interval
from fourcount.stats.tails import odds_ratio_at_tail, rising_root

__all__ = [
    "baptista_pike",
    "baptista_pike_mid_p",
    "conditional_exact",
    "conditional_mid_p",
    "conditional_odds_ratio",
    "fisher",
    "fisher_greater",
    "fisher_less",
    "fisher_mid_p",
]


def conditional_exact(counts: Counts, level: float) -> Interval | Gap:
    """Cornfield's exact conditional interval of the odds ratio."""
    return _interval(counts, level, own=1.0)


def conditional_mid_p(counts: Counts, level: float) -> Interval | Gap:
    """The conditional interval with half of the observed table's own probability in each tail."""
    return _interval(counts, level, own=0.5)


def conditional_odds_ratio(counts: Counts) -> float | Gap:
    """The conditional maximum likelihood estimate of the odds ratio; 0 or infinite at the support's ends."""
    gap = without_people(counts)
    if gap is not None:
        return gap
    least, greatest = support(counts)
    if least == greatest:
        return Gap("no-events" if counts.events == 0 else "no-non-events")
    if least == 0:
        return 0.0
    if greatest == 0:
        return math.inf
    near = window(counts)
    return near.centre * math.exp(rising_root(partial(_mean_step, near, np.empty_like(near.steps)), 0.0))


def _interval(counts: Counts, level: float, own: float) -> Interval | Gap:
    gap = without_people(counts)
    if gap is not None:
        return gap
    least, greatest = support(counts)
    return Interval(
        low=odds_ratio_at_tail(counts, (1 - level) / 2, own, upper=False) if least < 0 else 0.0,
        high=odds_ratio_at_tail(counts, (1 - level) / 2, own, upper=True) if greatest > 0 else math.inf,
    )


def _mean_step(near: Window, room: Array, tilt: float) -> tuple[float, float]:
    """The mean distance from the observed table and its derivative, both in standard deviations."""
    weights = near.weights(tilt, room)
    total = float(weights.sum())
    mean = product_sum(weights, near.steps) / total
    weights *= near.steps
    spread = math.sqrt(max(product_sum(weights, near.steps) / total - mean * mean, 0.0))
    return (mean / spread, spread) if spread > 0 else (math.copysign(1.0, mean), 0.0)
