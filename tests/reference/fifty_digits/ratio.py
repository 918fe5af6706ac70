"""The ratio of two risks at 50 digits."""

from __future__ import annotations

from mpmath import exp, inf, log, mpf, sign, sqrt

from fifty_digits.common import HALF, Limits, log_scale, quantile


def katz(a: int, b: int, c: int, d: int, level: float) -> Limits | None:
    """Katz (1978) Biometrics 34:469; Walter (1975), half to events and totals, where a or c is 0."""
    if b == d == 0:
        return None
    more = HALF if 0 in (a, c) else 0
    x1, n1, x2, n2 = a + more, a + b + more, c + more, c + d + more
    half = quantile(level) * sqrt(1 / mpf(x1) - 1 / mpf(n1) + 1 / mpf(x2) - 1 / mpf(n2))
    centre = log(mpf(x1) * n2 / (mpf(x2) * n1))
    return exp(centre - half), exp(centre + half)


def ratio_statistic(a: int, b: int, c: int, d: int, value: mpf, factor: bool) -> mpf:
    """Koopman (1984) Biometrics 40:513 as a score; with the factor N/(N-1) Miettinen and Nurminen."""
    n1, n2 = a + b, c + d
    total, events = n1 + n2, a + c
    middle = n1 * value + a + n2 + c * value
    p2 = 2 * events / (middle + sqrt(middle**2 - 4 * total * value * events))
    p1 = value * p2
    variance = p1 * (1 - p1) / n1 + value**2 * p2 * (1 - p2) / n2
    if factor:
        variance *= mpf(total) / (total - 1)
    top = mpf(a) / n1 - value * mpf(c) / n2
    return top / sqrt(variance) if variance > 0 else sign(top) * mpf(10) ** 20


def score_ratio(a: int, b: int, c: int, d: int, level: float, factor: bool) -> Limits:
    if a == c == 0:
        return mpf(0), inf
    return log_scale(lambda v: ratio_statistic(a, b, c, d, v, factor), a == 0, c == 0, level)
