"""One risk at 50 digits."""

from __future__ import annotations

from math import comb

from mpmath import betainc, mpf, sqrt

from fifty_digits.common import HALF, Limits, bisect, quantile


def wald_risk(x: int, n: int, level: float) -> Limits | None:
    """The bare formula; none where it would have no width."""
    if x in (0, n):
        return None
    p, z = mpf(x) / n, quantile(level)
    half = z * sqrt(p * (1 - p) / n)
    return p - half, p + half


def wilson(x: int, n: int, level: float) -> Limits:
    """Wilson (1927) JASA 22:209."""
    z = quantile(level)
    root = z * sqrt(z**2 + 4 * x * (1 - mpf(x) / n))
    bottom = 2 * (n + z**2)
    low, high = (2 * x + z**2 - root) / bottom, (2 * x + z**2 + root) / bottom
    return (mpf(0) if x == 0 else low), (mpf(1) if x == n else high)


def wilson_continuity(x: int, n: int, level: float) -> Limits:
    """Newcombe (1998) Stat Med 17:857, method 4."""
    p, z = mpf(x) / n, quantile(level)
    bottom = 2 * (n + z**2)
    low, high = mpf(0), mpf(1)
    if x > 0:
        low = (2 * x + z**2 - 1 - z * sqrt(z**2 - 2 - mpf(1) / n + 4 * p * (n * (1 - p) + 1))) / bottom
    if x < n:
        high = (2 * x + z**2 + 1 + z * sqrt(z**2 + 2 - mpf(1) / n + 4 * p * (n * (1 - p) - 1))) / bottom
    return max(low, mpf(0)), min(high, mpf(1))


def agresti_coull(x: int, n: int, level: float) -> Limits:
    """Agresti and Coull (1998) Am Stat 52:119, kept inside 0 to 1."""
    z = quantile(level)
    total = n + z**2
    p = (x + z**2 / 2) / total
    half = z * sqrt(p * (1 - p) / total)
    return max(p - half, mpf(0)), min(p + half, mpf(1))


def _binomial_limits(x: int, n: int, level: float, observed_weight: mpf) -> Limits:
    """Limits from the two binomial tails, the observed count with the given weight."""
    tail = (1 - mpf(level)) / 2
    coefficients = [comb(n, k) for k in range(n + 1)]

    def mass(p: mpf, first: int, last: int) -> mpf:
        odds, total = p / (1 - p), mpf(0)
        for k in range(last, first - 1, -1):
            total = total * odds + coefficients[k]
        return total * odds**first * (1 - p) ** n

    def below(p: mpf) -> mpf:
        return mass(p, 0, x - 1) if x else mpf(0)

    low, high = mpf(0), mpf(1)
    if x > 0:
        low = bisect(
            lambda p: tail - (1 - below(p) - (1 - observed_weight) * mass(p, x, x)),
            mpf(0),
            mpf(1),
        )
    if x < n:
        high = bisect(lambda p: below(p) + observed_weight * mass(p, x, x) - tail, mpf(0), mpf(1))
    return low, high


def clopper_pearson(x: int, n: int, level: float) -> Limits:
    """Clopper and Pearson (1934) Biometrika 26:404."""
    return _binomial_limits(x, n, level, mpf(1))


def mid_p(x: int, n: int, level: float) -> Limits:
    return _binomial_limits(x, n, level, HALF)


def jeffreys(x: int, n: int, level: float) -> Limits:
    """Brown, Cai and DasGupta (2001) Stat Sci 16:101: lower 0 at x = 0, upper 1 at x = n."""
    tail = (1 - mpf(level)) / 2

    def limit(share: mpf) -> mpf:
        low, high = mpf(0), mpf(1)
        for _ in range(70):  # bisection, then Newton's method from a bracket of 1e-21
            middle = (low + high) / 2
            if betainc(x + HALF, n - x + HALF, 0, middle, regularized=True) < share:
                low = middle
            else:
                high = middle
        return (low + high) / 2

    return (mpf(0) if x == 0 else limit(tail)), (mpf(1) if x == n else limit(1 - tail))
