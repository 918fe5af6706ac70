"""The ratio of two odds at 50 digits."""

from __future__ import annotations

from mpmath import exp, inf, log, mpf, sqrt

from fifty_digits.common import HALF, Limits, log_scale, quantile


def woolf(a: int, b: int, c: int, d: int, level: float, more: mpf | int = 0) -> Limits:
    """Woolf (1955); Gart (1966), half added to all four, where one of the four is 0."""
    if 0 in (a, b, c, d):
        more = HALF
    cells = [mpf(count) + more for count in (a, b, c, d)]
    half = quantile(level) * sqrt(sum(1 / cell for cell in cells))
    centre = log(cells[0] * cells[3] / (cells[1] * cells[2]))
    return exp(centre - half), exp(centre + half)


def gart(a: int, b: int, c: int, d: int, level: float) -> Limits:
    return woolf(a, b, c, d, level, HALF)


def odds_statistic(a: int, b: int, c: int, d: int, value: mpf, factor: bool) -> mpf:
    """Cornfield's score without continuity; with the factor N/(N-1) Miettinen and Nurminen."""
    n1, n2, events = a + b, c + d, a + c
    first, second = n2 * (value - 1), n1 * value + n2 - events * (value - 1)
    p2 = 2 * events / (second + sqrt(second**2 + 4 * first * events))
    p1 = value * p2 / (1 + p2 * (value - 1))
    inverse = 1 / (n1 * p1 * (1 - p1)) + 1 / (n2 * p2 * (1 - p2))
    statistic = (a - n1 * p1) * sqrt(inverse)
    return statistic / sqrt(mpf(n1 + n2) / (n1 + n2 - 1)) if factor else statistic


def score_odds(a: int, b: int, c: int, d: int, level: float, factor: bool) -> Limits:
    if a == c == 0 or b == d == 0:
        return mpf(0), inf
    return log_scale(lambda v: odds_statistic(a, b, c, d, v, factor), 0 in (a, d), 0 in (b, c), level)
