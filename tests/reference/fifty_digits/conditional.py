"""The odds ratio with the margins fixed, at 50 digits, and the tests of no association, as exact fractions."""

from __future__ import annotations

from collections.abc import Callable
from fractions import Fraction
from itertools import pairwise
from math import comb

import numpy as np
from mpmath import erfc, exp, inf, log, mpf, sqrt

from fifty_digits.common import HALF, Limits, bisect


class Hypergeometric:
    """The count of index events with the margins fixed: weights C(n1, k) C(n2, m - k) psi^k."""

    def __init__(self, a: int, b: int, c: int, d: int) -> None:
        n1, n2, events = a + b, c + d, a + c
        self.first = max(0, events - n2)
        self.last = min(n1, events)
        self.observed = a
        self.support = range(self.first, self.last + 1)
        self.weights = [comb(n1, k) * comb(n2, events - k) for k in self.support]
        self.weight = self.weights[a - self.first]

    def share(self, value: mpf, chosen: Callable[[int], mpf | int]) -> mpf:
        top = bottom = mpf(0)
        for k, weight in zip(reversed(self.support), reversed(self.weights), strict=True):
            top = top * value + chosen(k) * weight
            bottom = bottom * value + weight
        return top / bottom

    def limits(self, level: float, observed_weight: mpf) -> Limits:
        """Fisher and Cornfield (1956): each tail, the observed count weighted, holds half of what is left."""
        if self.first == self.last:
            return mpf(0), inf
        a, tail, reach = self.observed, (1 - mpf(level)) / 2, mpf(40)

        def above(value: mpf) -> mpf:
            return self.share(value, lambda k: 1 if k > a else observed_weight if k == a else 0)

        def below(value: mpf) -> mpf:
            return self.share(value, lambda k: 1 if k < a else observed_weight if k == a else 0)

        low = mpf(0) if a == self.first else exp(bisect(lambda t: tail - above(exp(t)), -reach, reach))
        high = inf if a == self.last else exp(bisect(lambda t: below(exp(t)) - tail, -reach, reach))
        return low, high

    def estimate(self) -> mpf | None:
        """The conditional maximum of the likelihood: the odds ratio at which the mean is the observed count."""
        if self.first == self.last:
            return None
        if self.observed in (self.first, self.last):
            return mpf(0) if self.observed == self.first else inf
        return exp(
            bisect(
                lambda t: self.observed - self.share(exp(t), lambda k: k),
                mpf(-40),
                mpf(40),
            )
        )


def conditional_exact(a: int, b: int, c: int, d: int, level: float) -> Limits:
    return Hypergeometric(a, b, c, d).limits(level, mpf(1))


def conditional_mid_p(a: int, b: int, c: int, d: int, level: float) -> Limits:
    return Hypergeometric(a, b, c, d).limits(level, HALF)


def baptista_pike_mid_p(a: int, b: int, c: int, d: int, level: float) -> Limits:
    """Baptista and Pike (1977) Appl Stat 26:214, mid-P: the hull of the odds ratios with p above 1 - level.

    By brute force: p jumps where another count becomes as likely as the observed one, and is smooth between. Each
    piece is scanned at 40 points in doubles, and the crossing found is bisected at 50 digits.
    """
    model = Hypergeometric(a, b, c, d)
    if model.first == model.last:
        return mpf(0), inf
    low = mpf(0) if a == model.first else _first_crossing(model, level, upward=True)
    high = inf if a == model.last else _first_crossing(model, level, upward=False)
    return low, high


def _first_crossing(model: Hypergeometric, level: float, upward: bool) -> mpf:
    alpha = 1 - mpf(level)
    others = [k for k in model.support if k != model.observed]
    jumps = sorted(
        (log(mpf(model.weights[k - model.first])) - log(mpf(model.weight))) / (model.observed - k) for k in others
    )
    edges = [jumps[0] - 60, *jumps, jumps[-1] + 60]
    pieces = list(pairwise(edges))
    if not upward:
        pieces = [(right, left) for left, right in reversed(pieces)]
    for start, end in pieces:
        if start == end:
            continue
        middle = exp((start + end) / 2)
        members = _as_unlikely(model, middle)

        def excess(t: mpf, members: dict[int, mpf] = members) -> mpf:
            return model.share(exp(t), lambda k: members.get(k, 0)) - alpha

        if excess(start) > 0:
            return exp(start)
        grid = _grid_in_doubles(model, members, float(start), float(end))
        above = np.flatnonzero(grid > float(alpha))
        if above.size:
            at = int(above[0])
            step = (end - start) / (len(grid) - 1)
            inner, outer = start + at * step, start + max(at - 1, 0) * step
            return exp(bisect(lambda t: -excess(t), outer, inner))
    raise ArithmeticError("no odds ratio is accepted")


def _as_unlikely(model: Hypergeometric, value: mpf) -> dict[int, mpf]:
    """The counts no likelier than the observed one, and the weight of each (a half for the observed)."""
    limit = model.weight * value**model.observed
    members: dict[int, mpf] = {
        k: mpf(1) for k, weight in zip(model.support, model.weights, strict=True) if weight * value**k <= limit
    }
    members[model.observed] = HALF
    return members


def _grid_in_doubles(model: Hypergeometric, members: dict[int, mpf], start: float, end: float) -> np.ndarray:
    logs = np.array([float(log(mpf(weight))) for weight in model.weights])
    chosen = np.array([float(members.get(k, 0)) for k in model.support])
    points = np.linspace(start, end, 40)[:, None]
    exponents = logs + points * np.array(model.support, dtype=float)
    weights = np.exp(exponents - exponents.max(axis=1, keepdims=True))
    return (weights * chosen).sum(axis=1) / weights.sum(axis=1)


# Tests of no association


def fisher(a: int, b: int, c: int, d: int) -> Fraction:
    """Fisher's two-sided p, exactly: every table no likelier than the observed one, ties within 1e-7."""
    model = Hypergeometric(a, b, c, d)
    limit = model.weight * (1 + Fraction(1, 10**7))
    return Fraction(sum(weight for weight in model.weights if weight <= limit), sum(model.weights))


def fisher_mid_p(a: int, b: int, c: int, d: int) -> Fraction:
    """Lydersen, Fagerland and Laake (2009) Stat Med 28:1159: half of the observed table's own probability off."""
    model = Hypergeometric(a, b, c, d)
    return fisher(a, b, c, d) - Fraction(model.weight, 2 * sum(model.weights))


def pearson(a: int, b: int, c: int, d: int, n_minus_1: bool = False) -> mpf:
    """Pearson's chi-square without correction, times (N-1)/N where asked; 1 where a column is empty."""
    margins = (a + b) * (c + d) * (a + c) * (b + d)
    if margins == 0:
        return mpf(1)
    total = a + b + c + d
    chi_square = mpf((a * d - b * c) ** 2 * (total - 1 if n_minus_1 else total)) / margins
    return erfc(sqrt(chi_square / 2))
