"""The log probability of a count under a Poisson distribution, to full precision among many events.

As Loader has it (Loader C 2000, Fast and accurate computation of binomial probabilities): the deviance of the count
from its mean, which is small and free of cancellation, and the rounding-free remainder of Stirling's formula. Logs of
factorials of 10^9 would leave six digits of the probability.
"""

from __future__ import annotations

import math


def log_poisson(count: int, mean: float, away: float) -> float:
    """ln of the Poisson probability of a count, ``away`` being the count less the mean."""
    if count == 0:
        return -mean
    return log_peak(count) - _deviance(count, mean, away)


def log_peak(count: int) -> float:
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
