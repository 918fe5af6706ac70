"""The standard normal distribution, as far as intervals and p values need it."""

from __future__ import annotations

import math
from functools import lru_cache

_ROOT_TWO = math.sqrt(2.0)
_LEAST_P = 1e-300  # below it doubles lose digits, and nobody prints such a p


@lru_cache(maxsize=64)
def quantile(level: float) -> float:
    """The z of a two-sided interval at this confidence level: 1.95996... at 0.95.

    The start is the rational approximation 26.2.23 of Abramowitz and Stegun (1964, Handbook of Mathematical
    Functions; absolute error under 4.5e-4); Halley's method on ``erfc`` then gives full precision. 1 - level is
    exact in binary for any level from 0.5 on, so the tail loses nothing.
    """
    if not 0.0 < level < 1.0:
        raise ValueError(f"a confidence level lies between 0 and 1: {level!r}")
    return z_of_p(1.0 - level)


def z_of_p(p: float) -> float:
    """The z, above 0, of which this is the two-sided p; it tells tails apart that are far too small for a level."""
    if not 0.0 < p < 1.0:
        raise ValueError(f"a p lies between 0 and 1: {p!r}")
    both_tails = max(p, _LEAST_P)
    t = math.sqrt(-2.0 * math.log(both_tails / 2.0))
    z = t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1.0 + t * (1.432788 + t * (0.189269 + t * 0.001308)))
    for _ in range(4):
        density = math.sqrt(2.0 / math.pi) * math.exp(-z * z / 2.0)
        step = (math.erfc(z / _ROOT_TWO) - both_tails) / density
        z += step / (1.0 - z * step / 2.0)
    return max(0.0, z)


def two_sided_p(z: float) -> float:
    """The probability of a standard normal value at least as far from 0 as z; 0.0 where it underflows (|z| > 38)."""
    return math.erfc(abs(z) / _ROOT_TWO)
