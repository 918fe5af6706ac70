"""Pooled measures and tests of several strata at 90 digits, from the published formulas as they are printed.

Each stratum is (a, b, c, d): index events and non-events, reference events and non-events, both groups with somebody.
"""

from __future__ import annotations

from collections.abc import Sequence

from mpmath import erfc, erfinv, exp, fsum, gammainc, mpf, sqrt, workdps

Stratum = tuple[int, int, int, int]
Limits = tuple[mpf, mpf]
DIGITS = 90


def odds_ratio(strata: Sequence[Stratum]) -> mpf:
    """Mantel and Haenszel (1959) J Natl Cancer Inst 22:719."""
    with workdps(DIGITS):
        return fsum(mpf(a * d) / (a + b + c + d) for a, b, c, d in strata) / fsum(
            mpf(b * c) / (a + b + c + d) for a, b, c, d in strata
        )


def robins_breslow_greenland(strata: Sequence[Stratum], level: float) -> Limits:
    """Robins, Breslow and Greenland (1986) Biometrics 42:311."""
    with workdps(DIGITS):
        parts = [(mpf(a + d) / n, mpf(b + c) / n, mpf(a * d) / n, mpf(b * c) / n) for a, b, c, d, n in _with_n(strata)]
        r, s = fsum(part[2] for part in parts), fsum(part[3] for part in parts)
        variance = fsum(
            p * rk / (2 * r**2) + (p * sk + q * rk) / (2 * r * s) + q * sk / (2 * s**2) for p, q, rk, sk in parts
        )
        half = _quantile(level) * sqrt(variance)
        return r / s * exp(-half), r / s * exp(half)


def risk_ratio(strata: Sequence[Stratum]) -> mpf:
    with workdps(DIGITS):
        index, reference = _weighted_events(strata)
        return index / reference


def greenland_robins_ratio(strata: Sequence[Stratum], level: float) -> Limits:
    """Greenland and Robins (1985) Biometrics 41:55."""
    with workdps(DIGITS):
        index, reference = _weighted_events(strata)
        top = fsum(mpf((a + c) * (a + b) * (c + d) - a * c * n) / mpf(n) ** 2 for a, b, c, d, n in _with_n(strata))
        half = _quantile(level) * sqrt(top / (index * reference))
        return index / reference * exp(-half), index / reference * exp(half)


def risk_difference(strata: Sequence[Stratum]) -> mpf:
    with workdps(DIGITS):
        return fsum(mpf(a * (c + d) - c * (a + b)) / n for a, b, c, d, n in _with_n(strata)) / _weight(strata)


def sato_difference(strata: Sequence[Stratum], level: float) -> Limits:
    """Sato (1989) Biometrics 45:1323."""
    with workdps(DIGITS):
        centre = risk_difference(strata)
        p = fsum(
            ((a + b) ** 2 * c - (c + d) ** 2 * a + mpf((a + b) * (c + d) * (c + d - a - b)) / 2) / mpf(n) ** 2
            for a, b, c, d, n in _with_n(strata)
        )
        q = fsum(mpf(a * d + b * c) / (2 * n) for a, b, c, d, n in _with_n(strata))
        half = _quantile(level) * sqrt(centre * p + q) / _weight(strata)
        return centre - half, centre + half


def greenland_robins_difference(strata: Sequence[Stratum], level: float) -> Limits:
    """Greenland and Robins (1985) Biometrics 41:55."""
    with workdps(DIGITS):
        centre = risk_difference(strata)
        top = fsum(
            mpf(a * b * (c + d) ** 3 + c * d * (a + b) ** 3) / ((a + b) * (c + d) * n**2)
            for a, b, c, d, n in _with_n(strata)
        )
        half = _quantile(level) * sqrt(top) / _weight(strata)
        return centre - half, centre + half


def cochran_mantel_haenszel(strata: Sequence[Stratum], correction: float) -> mpf:
    """The two-sided p. Mantel and Haenszel (1959) J Natl Cancer Inst 22:719."""
    with workdps(DIGITS):
        distance = abs(fsum(a - mpf((a + b) * (a + c)) / n for a, b, c, d, n in _with_n(strata)))
        variance = fsum(
            mpf((a + b) * (c + d) * (a + c) * (b + d)) / (n**2 * (n - 1)) for a, b, c, d, n in _with_n(strata)
        )
        return erfc(max(mpf(0), distance - correction) / sqrt(2 * variance))


def breslow_day(strata: Sequence[Stratum], tarone: bool) -> tuple[mpf, mpf]:
    """The chi-square and its p. Breslow and Day (1980); Tarone (1985) Biometrika 72:91."""
    with workdps(DIGITS):
        told = [t for t in strata if (t[0] + t[2]) and (t[1] + t[3])]
        o = odds_ratio(told)
        fitted = [_fitted(o, *t) for t in told]
        chi_square = fsum((t[0] - count) ** 2 / v for t, (count, v) in zip(told, fitted, strict=True))
        if tarone:
            apart = fsum(t[0] - count for t, (count, _) in zip(told, fitted, strict=True))
            chi_square -= apart**2 / fsum(v for _, v in fitted)
        return chi_square, gammainc(mpf(len(told) - 1) / 2, chi_square / 2, regularized=True)


def _quantile(level: float) -> mpf:
    return sqrt(mpf(2)) * erfinv(mpf(level))


def _fitted(o: mpf, a: int, b: int, c: int, d: int) -> tuple[mpf, mpf]:
    n1, n2, m = a + b, c + d, a + c
    if o == 1:
        count = mpf(n1 * m) / (n1 + n2)
    else:
        linear = o * (n1 + m) + n2 - m
        root = sqrt(linear**2 - 4 * (o - 1) * o * n1 * m)
        count = (linear - root) / (2 * (o - 1))
    cells = (count, n1 - count, m - count, n2 - m + count)
    assert min(cells) > 0
    return count, 1 / fsum(1 / cell for cell in cells)


def _with_n(strata: Sequence[Stratum]) -> list[tuple[int, int, int, int, int]]:
    return [(*t, sum(t)) for t in strata]


def _weighted_events(strata: Sequence[Stratum]) -> tuple[mpf, mpf]:
    index = fsum(mpf(a * (c + d)) / n for a, _b, c, d, n in _with_n(strata))
    return index, fsum(mpf(c * (a + b)) / n for a, b, c, _d, n in _with_n(strata))


def _weight(strata: Sequence[Stratum]) -> mpf:
    return fsum(mpf((a + b) * (c + d)) / n for a, b, c, d, n in _with_n(strata))
