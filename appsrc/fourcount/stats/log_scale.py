"""Limits that lie symmetrically about an estimate on the log scale."""

from __future__ import annotations

import math

from fourcount.stats.results import Interval


def exponential(power: float) -> float:
    """e to the power; infinite past the largest double, which small fractions of people do reach."""
    try:
        return math.exp(power)
    except OverflowError:
        return math.inf


def limits_around(centre: float, half_width: float, adjusted: str | None = None) -> Interval:
    """The centre divided and multiplied by e to the half width."""
    return Interval(low=centre * math.exp(-half_width), high=centre * exponential(half_width), adjusted=adjusted)
