"""Limits of a Poisson mean from the gamma distribution: Poisson tails inverted by our own root-finding."""

from __future__ import annotations

import math

from scipy.special import gammainc, gammaincc

from fourcount.stats.normal import quantile
from fourcount.stats.one_rate import count_score_limits
from fourcount.stats.poisson import log_poisson
from fourcount.stats.roots import increasing_root

Limits = tuple[float, float]


def exact_limits(events: int, level: float) -> Limits:
    """P(X >= x) = (1-level)/2 at the lower limit, P(X <= x) = (1-level)/2 at the upper; from 0 at no events."""
    tail = (1.0 - level) / 2.0
    if events == 0:
        return 0.0, -math.log(tail)
    low, high = count_score_limits(events, quantile(level))
    return _lower((events,), tail, low), _upper((events + 1,), tail, high)


def mid_p_limits(events: int, level: float) -> Limits:
    """P(X > x) + P(X = x)/2 = (1-level)/2 at the lower limit, P(X < x) + P(X = x)/2 likewise at the upper."""
    tail = (1.0 - level) / 2.0
    if events == 0:
        return 0.0, -math.log(2.0 * tail)
    low, high = count_score_limits(events, quantile(level))
    # The mean of P(X >= x) and P(X > x) holds half of P(X = x).
    shapes = (events, events + 1)
    return _lower(shapes, tail, low), _upper(shapes, tail, high)


def _density(shape: int, mean: float) -> float:
    """The gamma density, which is P(X = shape - 1)."""
    return math.exp(log_poisson(shape - 1, mean, shape - 1 - mean))


def _lower(shapes: tuple[int, ...], tail: float, start: float) -> float:
    def curve(mean: float) -> tuple[float, float]:
        above = sum(float(gammainc(shape, mean)) for shape in shapes) / len(shapes)
        if above == 0.0:
            return -math.inf, 0.0
        density = sum(_density(shape, mean) for shape in shapes) / len(shapes)
        return math.log(above / tail), density / above

    return increasing_root(curve, 0.0, 2.0 * start + 1.0 + 2.0 * shapes[-1], start)


def _upper(shapes: tuple[int, ...], tail: float, start: float) -> float:
    def curve(mean: float) -> tuple[float, float]:
        below = sum(float(gammaincc(shape, mean)) for shape in shapes) / len(shapes)
        if below == 0.0:
            return math.inf, 0.0
        density = sum(_density(shape, mean) for shape in shapes) / len(shapes)
        return -math.log(below / tail), density / below

    return increasing_root(curve, 0.0, 10.0 * start + 1000.0, start)
