"""The chi-square distribution of whole degrees of freedom."""

from __future__ import annotations

import math


def upper_tail(chi_square: float, degrees: int) -> float:
    """The probability of a chi-square at least this large; 0.0 where it underflows.

    With whole degrees the incomplete gamma function is a finite sum: for an even number e^(-h) sum h^j/j! from j = 0,
    for an odd one erfc(sqrt h) plus the same sum over half-integers j, with h half of the chi-square. Each term is
    formed through its logarithm, so that none passes the range of a double. Source: Abramowitz and Stegun 1964,
    Handbook of Mathematical Functions, 26.4.4 and 26.4.5.
    """
    if degrees < 1 or not chi_square >= 0.0:
        raise ValueError(f"no chi-square of {degrees} degrees of freedom: {chi_square!r}")
    half = chi_square / 2.0
    if half == 0.0:
        return 1.0
    first = 0.5 if degrees % 2 else 0.0
    terms = [math.erfc(math.sqrt(half))] if degrees % 2 else []
    terms += [
        math.exp(power * math.log(half) - half - math.lgamma(power + 1.0))
        for power in (first + step for step in range(degrees // 2))
    ]
    return min(1.0, math.fsum(terms))
