"""The difference of two risks at 50 digits."""

from __future__ import annotations

from mpmath import acos, cos, mpf, pi, sign, sqrt

from fifty_digits.common import Limits, bisect, quantile
from fifty_digits.risk import wilson, wilson_continuity


def wald_difference(a: int, b: int, c: int, d: int, level: float) -> Limits | None:
    """The bare formula; none where it would have no width."""
    n1, n2 = a + b, c + d
    p1, p2 = mpf(a) / n1, mpf(c) / n2
    half = quantile(level) * sqrt(p1 * (1 - p1) / n1 + p2 * (1 - p2) / n2)
    return (p1 - p2 - half, p1 - p2 + half) if half else None


def agresti_caffo(a: int, b: int, c: int, d: int, level: float) -> Limits | None:
    """Agresti and Caffo (2000) Am Stat 54:280, not kept inside -1 to 1."""
    return wald_difference(a + 1, b + 1, c + 1, d + 1, level)


def _square_and_add(a: int, b: int, c: int, d: int, first: Limits, second: Limits) -> Limits:
    p1, p2 = mpf(a) / (a + b), mpf(c) / (c + d)
    low = p1 - p2 - sqrt((p1 - first[0]) ** 2 + (second[1] - p2) ** 2)
    return low, p1 - p2 + sqrt((first[1] - p1) ** 2 + (p2 - second[0]) ** 2)


def newcombe(a: int, b: int, c: int, d: int, level: float) -> Limits:
    """Newcombe (1998) Stat Med 17:873, method 10."""
    return _square_and_add(a, b, c, d, wilson(a, a + b, level), wilson(c, c + d, level))


def newcombe_continuity(a: int, b: int, c: int, d: int, level: float) -> Limits:
    """Newcombe (1998) Stat Med 17:873, method 11."""
    first, second = (
        wilson_continuity(a, a + b, level),
        wilson_continuity(c, c + d, level),
    )
    return _square_and_add(a, b, c, d, first, second)


def restricted_risk(a: int, b: int, c: int, d: int, value: mpf) -> mpf:
    """The reference group's risk that is likeliest where the difference is ``value``: the root of a cubic."""
    n1, n2 = a + b, c + d
    total, events = mpf(n1 + n2), a + c
    l2 = (n1 + 2 * n2) * value - total - events
    l1 = (n2 * value - total - 2 * c) * value + events
    l0 = c * value * (1 - value)
    q = l2**3 / (27 * total**3) - l1 * l2 / (6 * total**2) + l0 / (2 * total)
    p = sqrt(max(l2**2 / (9 * total**2) - l1 / (3 * total), mpf(0))) * (sign(q) or 1)
    angle = (pi + acos(max(min(q / p**3, mpf(1)), mpf(-1)))) / 3 if p else mpf(0)
    risk = 2 * p * cos(angle) - l2 / (3 * total)
    return min(max(risk, mpf(0), -value), mpf(1), 1 - value)


def slope_of_likelihood(a: int, b: int, c: int, d: int, value: mpf, risk: mpf) -> mpf:
    """The derivative of the log likelihood: 0 at the restricted risk, by no use of the cubic."""
    terms = ((c, risk), (-d, 1 - risk), (a, risk + value), (-b, 1 - risk - value))
    return sum((count / share for count, share in terms if count), mpf(0))


def difference_statistic(a: int, b: int, c: int, d: int, value: mpf, factor: bool) -> mpf:
    """Miettinen and Nurminen (1985) Stat Med 4:213; without the factor N/(N-1) Mee (1984)."""
    n1, n2 = a + b, c + d
    total = n1 + n2
    p2 = restricted_risk(a, b, c, d, value)
    p1 = p2 + value
    variance = p1 * (1 - p1) / n1 + p2 * (1 - p2) / n2
    if factor:
        variance *= mpf(total) / (total - 1)
    top = mpf(a) / n1 - mpf(c) / n2 - value
    if variance <= mpf(10) ** -48:
        return mpf(0) if abs(top) < mpf(10) ** -40 else sign(top) * mpf(10) ** 20
    return top / sqrt(variance)


def score_difference(a: int, b: int, c: int, d: int, level: float, factor: bool) -> Limits:
    z, estimate = quantile(level), mpf(a) / (a + b) - mpf(c) / (c + d)

    def statistic(value: mpf) -> mpf:
        return difference_statistic(a, b, c, d, value, factor)

    low = mpf(-1) if estimate == -1 else bisect(lambda v: statistic(v) - z, mpf(-1), estimate)
    high = mpf(1) if estimate == 1 else bisect(lambda v: statistic(v) + z, estimate, mpf(1))
    _check_root(a, b, c, d, low)
    _check_root(a, b, c, d, high)
    return low, high


def _check_root(a: int, b: int, c: int, d: int, value: mpf) -> None:
    """The cubic's root is the likeliest risk: inside its range the likelihood has no slope there."""
    risk, tiny = restricted_risk(a, b, c, d, value), mpf(10) ** -15
    if max(mpf(0), -value) + tiny < risk < min(mpf(1), 1 - value) - tiny:
        around = [slope_of_likelihood(a, b, c, d, value, risk + shift) for shift in (-tiny, tiny)]
        assert around[0] > 0 > around[1], (a, b, c, d, value)
