"""What every method at 50 digits shares: the normal quantile and a plain bisection.

A limit is found by bisection, a slow way that cannot land on a wrong root of a monotone function.
"""

from __future__ import annotations

from collections.abc import Callable

from mpmath import erfinv, exp, inf, mp, mpf, sqrt

mp.dps = 50
Limits = tuple[mpf, mpf]
HALVINGS = 130
HALF = mpf(1) / 2


def quantile(level: float) -> mpf:
    return sqrt(mpf(2)) * erfinv(mpf(level))


def bisect(falling: Callable[[mpf], mpf], low: mpf, high: mpf) -> mpf:
    """Where a falling function crosses 0 between ``low`` and ``high``."""
    for _ in range(HALVINGS):
        middle = (low + high) / 2
        if falling(middle) > 0:
            low = middle
        else:
            high = middle
    return (low + high) / 2


def log_scale(statistic: Callable[[mpf], mpf], zero: bool, infinite: bool, level: float) -> Limits:
    """Both limits of a statistic that falls in the ratio, found on the log scale."""
    z, reach = quantile(level), mpf(40)
    low = mpf(0) if zero else exp(bisect(lambda t: statistic(exp(t)) - z, -reach, reach))
    high = inf if infinite else exp(bisect(lambda t: statistic(exp(t)) + z, -reach, reach))
    return low, high
