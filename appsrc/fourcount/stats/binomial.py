"""Limits of one risk from the beta distribution: binomial tails inverted by our own root-finding.

scipy's inverse of the incomplete beta function is not used: ``betaincinv(1000, 999999001, 0.025)`` of scipy 1.17 is
twice the true value. Its ``betainc`` and ``betaincc`` were right to 2e-11 or better at all sizes tried against
40-digit arithmetic. An error in a tail reaches the limit divided by some z sqrt(events), so that it is harmless
among many events; for a few events the upper tail is summed here, term by term.
"""

from __future__ import annotations

import math

from scipy.special import betainc, betaincc

from fourcount.stats.normal import quantile
from fourcount.stats.risk import score_limits
from fourcount.stats.roots import increasing_root

Limits = tuple[float, float]
Shape = tuple[float, float]

_FEW = 50  # below some 40 events scipy's upper tail of a beta distribution with whole numbers keeps only 11 digits


def clopper_pearson_limits(events: int, total: int, level: float) -> Limits:
    """P(X >= x) = (1-level)/2 at the lower limit, P(X <= x) = (1-level)/2 at the upper; in closed form at 0 and n."""
    tail = (1.0 - level) / 2.0
    others = total - events
    if events == 0:
        return 0.0, _no_events_high(tail, total)
    if others == 0:
        return _all_events_low(tail, total), 1.0
    low_start, high_start = _starts(events, total, level)
    low = _lower(((events, others + 1),), tail, low_start)
    return low, _upper(((events + 1, others),), tail, high_start)


def mid_p_limits(events: int, total: int, level: float) -> Limits:
    """P(X > x) + P(X = x)/2 = (1-level)/2 at the lower limit, P(X < x) + P(X = x)/2 likewise at the upper."""
    tail = (1.0 - level) / 2.0
    others = total - events
    if events == 0:
        return 0.0, _no_events_high(2.0 * tail, total)
    if others == 0:
        return _all_events_low(2.0 * tail, total), 1.0
    low_start, high_start = _starts(events, total, level)
    # The mean of P(X >= x) and P(X > x) holds half of P(X = x).
    shapes = ((events, others + 1), (events + 1, others))
    return _lower(shapes, tail, low_start), _upper(shapes, tail, high_start)


def jeffreys_limits(events: float, total: float, level: float) -> Limits:
    """The (1-level)/2 and (1+level)/2 quantiles of the beta distribution with x + 1/2 and n - x + 1/2."""
    tail = (1.0 - level) / 2.0
    low_start, high_start = _starts(events, total, level)
    shapes = ((events + 0.5, total - events + 0.5),)
    low = _lower(shapes, tail, low_start) if events > 0 else 0.0
    return low, _upper(shapes, tail, high_start) if events < total else 1.0


def _starts(events: float, total: float, level: float) -> Limits:
    near = score_limits(events, total, quantile(level))
    return near.low, near.high


def _no_events_high(tail: float, total: int) -> float:
    return -math.expm1(math.log(tail) / total)


def _all_events_low(tail: float, total: int) -> float:
    return math.exp(math.log(tail) / total)


def _density(shape: Shape, risk: float) -> float:
    """The beta density; good to 1e-6 at 10^9 people, which is enough for the slope of a Newton step."""
    a, b = shape
    scale = math.lgamma(a) + math.lgamma(b) - math.lgamma(a + b)
    return math.exp((a - 1.0) * math.log(risk) + (b - 1.0) * math.log1p(-risk) - scale)


def _at_most(shape: Shape, risk: float) -> float:
    """P(X <= a-1) of a binomial X of a+b-1 people: the upper tail of the beta distribution."""
    a, b = shape
    if a > _FEW or a != int(a):
        return float(betaincc(a, b, risk))
    people, odds = a + b - 1, risk / (1.0 - risk)
    term, total = math.exp(people * math.log1p(-risk)), 0.0
    for events in range(int(a)):
        total += term
        term *= (people - events) / (events + 1) * odds
    return total


def _lower(shapes: tuple[Shape, ...], tail: float, start: float) -> float:
    def curve(risk: float) -> tuple[float, float]:
        below = sum(float(betainc(a, b, risk)) for a, b in shapes) / len(shapes)
        if below == 0.0:
            return -math.inf, 0.0
        density = sum(_density(shape, risk) for shape in shapes) / len(shapes)
        return math.log(below / tail), density / below

    return increasing_root(curve, 0.0, 1.0, start)


def _upper(shapes: tuple[Shape, ...], tail: float, start: float) -> float:
    def curve(risk: float) -> tuple[float, float]:
        above = sum(_at_most(shape, risk) for shape in shapes) / len(shapes)
        if above == 0.0:
            return math.inf, 0.0
        density = sum(_density(shape, risk) for shape in shapes) / len(shapes)
        return -math.log(above / tail), density / above

    return increasing_root(curve, 0.0, 1.0, start)
