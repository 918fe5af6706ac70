"""Two counts x and y compared by how their sum is shared: given x + y, x is binomial.

The odds of that binomial's risk are the ratio of the two means: of the discordant pairs of either kind it is the
conditional odds ratio, of the events in two stretches of person-time it is the rate ratio times t1/t2. Each limit is
the limit of x's share over the opposite limit of y's share, which sums to 1 with it: neither loses digits near 1.
"""

from __future__ import annotations

import math
from typing import NamedTuple

from fourcount.stats.normal import quantile
from fourcount.stats.poisson import log_peak, log_poisson
from fourcount.stats.results import Gap, Interval
from fourcount.stats.risk import score_limits
from fourcount.stats.roots import increasing_root

_PLAIN_TERMS = 4096  # more of them are summed in chunks
_ENOUGH = 1e-17
_FEW = 20_000  # up to so many the limits are found here, term by term; among more scipy's beta distribution is quicker


class Tails(NamedTuple):
    """P(X <= x), P(X = x) and P(X >= x)."""

    below: float
    own: float
    above: float


def exact(first: int, second: int, level: float) -> Interval:
    """Clopper and Pearson's limits of the share (1934, Biometrika 26:404), as odds; not for no counts at all."""
    return _conditional(first, second, level, own=1.0)


def mid_p(first: int, second: int, level: float) -> Interval:
    """The mid-P limits of the share, as odds; not for no counts at all."""
    return _conditional(first, second, level, own=0.5)


def score(first: int, second: int, level: float) -> Interval:
    """Wilson's limits of the share (1927, JASA 22:209), as odds; not for no counts at all."""
    limits = score_limits(first, first + second, quantile(level))
    high = limits.high / limits.to_one_from_high if second else math.inf
    return Interval(low=limits.low / limits.to_one_from_low, high=high)


def log(first: int, second: int, level: float) -> Interval | Gap:
    """x/y exp(-+ z sqrt(1/x + 1/y)); a gap where either is 0, since the log of their ratio is infinite there."""
    if first == 0 or second == 0:
        return Gap("zero-count")
    factor = math.exp(quantile(level) * math.sqrt(1 / first + 1 / second))
    return Interval(low=first / second / factor, high=first / second * factor)


def _conditional(first: int, second: int, level: float, own: float) -> Interval:
    """Limits at which a tail of x, with this share of P(X = x), holds half of what the level leaves."""
    if first and second and first + second > _FEW:
        return _conditional_of_many(first, second, level, own)
    tail = (1.0 - level) / 2.0
    near = score(first, second, level)
    low = _lower(first, second, tail, own, near.low)
    other = _lower(second, first, tail, own, 1.0 / near.high)
    return Interval(low=low, high=1.0 / other if other > 0.0 else math.inf)


def _conditional_of_many(first: int, second: int, level: float, own: float) -> Interval:
    from fourcount.stats.binomial import clopper_pearson_limits, mid_p_limits

    limits = clopper_pearson_limits if own == 1.0 else mid_p_limits
    low, high = limits(first, first + second, level)
    other_low, other_high = limits(second, first + second, level)
    return Interval(low=low / other_high, high=high / other_low)


def _lower(first: int, second: int, tail: float, own: float, start: float) -> float:
    """The odds at which P(X > x) + own P(X = x) is ``tail``; 0 for no x, in closed form for no y."""
    if first == 0:
        return 0.0
    if second == 0:
        return 1.0 / math.expm1(-math.log(tail / own) / first)
    goal = math.log(tail)

    def curve(odds: float) -> tuple[float, float]:
        share, other_share = odds / (1.0 + odds), 1.0 / (1.0 + odds)
        total, beyond, term = own, 0.0, 1.0
        for step in range(1, second + 1):
            term *= (second + 1 - step) / (first + step) * odds
            total += term
            beyond += step * term
            if step * term <= _ENOUGH * total:
                break
        away = first * other_share - second * share
        # d ln P(tail) / d ln odds is the mean of the tail less the mean of all.
        slope = (away + beyond / total) / odds
        return _log_probability(first, second, share, other_share, away) + math.log(total) - goal, slope

    return increasing_root(curve, 0.0, 16.0 * first / second, start)


def _log_probability(first: int, second: int, share: float, other_share: float, away: float) -> float:
    """ln P(X = x), ``away`` being x less its expectation."""
    whole = first + second
    parts = log_poisson(first, whole * share, away) + log_poisson(second, whole * other_share, -away)
    return parts - log_peak(whole)


def tails(first: int, second: int, weights: tuple[float, float] = (1.0, 1.0)) -> Tails:
    """Both binomial tails of x among x + y, its share under the hypothesis being w1 / (w1 + w2)."""
    weight = weights[0] + weights[1]
    share, other_share = weights[0] / weight, weights[1] / weight
    away = first * other_share - second * share
    own = math.exp(_log_probability(first, second, share, other_share, away))
    if away <= 0.0:
        below = min(1.0, own * _sum_over_own(first, second, other_share / share))
        return Tails(below=below, own=own, above=min(1.0, 1.0 - below + own))
    above = min(1.0, own * _sum_over_own(second, first, share / other_share))
    return Tails(below=min(1.0, 1.0 - above + own), own=own, above=above)


def _sum_over_own(falling: int, rising: int, odds: float) -> float:
    """The sum of the probabilities of ``falling`` and fewer over its own, where it is not above its mean.

    ``odds`` are those against an event of the falling kind. Each probability is the one before times
    falling / (rising + 1) times the odds.
    """
    term = total = 1.0
    for step in range(min(falling, _PLAIN_TERMS)):
        term *= (falling - step) / (rising + 1 + step) * odds
        total += term
        if term <= _ENOUGH * total:
            return total
    if falling <= _PLAIN_TERMS:
        return total
    return total + term * _rest(falling - _PLAIN_TERMS, rising + _PLAIN_TERMS, odds)


def _rest(falling: int, rising: int, odds: float) -> float:
    """The same sum without its first term, by whole chunks."""
    import numpy as np

    done, last, total, chunk = 0, 1.0, 0.0, 4 * _PLAIN_TERMS
    while done < falling and last > _ENOUGH * (1.0 + total):
        steps = np.arange(done, min(done + chunk, falling), dtype=np.float64)
        following = last * np.cumprod((falling - steps) / (rising + 1 + steps) * odds)
        total += float(following.sum())
        last, done, chunk = float(following[-1]), done + len(steps), 2 * chunk
    return total
