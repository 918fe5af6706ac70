"""Intervals of one rate: x events in t of person-time, x being a Poisson count with the mean rate times t."""

from __future__ import annotations

import math

from fourcount.stats.normal import quantile
from fourcount.stats.results import Gap, Interval


def exact(events: int, time: float, level: float) -> Interval | Gap:
    """The exact interval of Garwood (1936, Biometrika 28:437, from memory): each Poisson tail holds (1-level)/2."""
    if not time > 0.0:
        return Gap("no-time")
    from fourcount.stats.gamma import exact_limits

    low, high = exact_limits(events, level)
    return Interval(low=low / time, high=high / time)


def mid_p(events: int, time: float, level: float) -> Interval | Gap:
    """The exact interval with half of the observed count's own probability in each tail; from 0 at no events."""
    if not time > 0.0:
        return Gap("no-time")
    from fourcount.stats.gamma import mid_p_limits

    low, high = mid_p_limits(events, level)
    return Interval(low=low / time, high=high / time)


def score(events: int, time: float, level: float) -> Interval | Gap:
    """The roots of (x - m)^2 = z^2 m over t: Wilson's interval for a count (Rao's score; common practice)."""
    if not time > 0.0:
        return Gap("no-time")
    low, high = count_score_limits(events, quantile(level))
    return Interval(low=low / time, high=high / time)


def wald(events: int, time: float, level: float) -> Interval | Gap:
    """The textbook interval (x -+ z sqrt(x)) / t, given as it is where it falls below 0; at no events a gap."""
    if not time > 0.0:
        return Gap("no-time")
    if events == 0:
        return Gap("zero-width")
    half_width = quantile(level) * math.sqrt(events)
    return Interval(low=(events - half_width) / time, high=(events + half_width) / time)


def count_score_limits(events: int, z: float) -> tuple[float, float]:
    """The means m at which (x - m) / sqrt(m) is z and -z."""
    high = events + z * z / 2.0 + z * math.sqrt(events + z * z / 4.0)
    return events * (events / high), high  # the product of the roots is x^2
