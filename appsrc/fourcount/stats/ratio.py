"""Intervals of the risk ratio R = p1/p2 (a, b: index events and non-events; c, d: reference events and non-events)."""

from __future__ import annotations

import math

from fourcount.stats.estimates import without_people
from fourcount.stats.log_scale import limits_around
from fourcount.stats.normal import quantile
from fourcount.stats.results import FractionalCounts, Gap, Interval
from fourcount.stats.roots import increasing_root
from fourcount.stats.score import mirrored, multiplier, target


def koopman(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The asymptotic score interval (Koopman 1984, Biometrics 40:513), without the factor N/(N-1).

    The lower limit is 0 where the index group has no event, the upper infinite where the reference group has none.
    """
    return _score(counts, level, finite=False)


def miettinen_nurminen(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The score interval with the variance times N/(N-1) (Miettinen and Nurminen 1985, Stat Med 4:213)."""
    return _score(counts, level, finite=True)


def katz(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The log interval R exp(-+ z sqrt(b/(a n1) + d/(c n2))) (Katz and others 1978, Biometrics 34:469).

    Where a group has no event it does not exist, and Walter's, which adds 1/2, takes its place and says so.
    Where everybody had the event its width would be zero: a gap.
    """
    gap = without_people(counts)
    if gap is not None:
        return gap
    if counts.non_events == 0:
        return Gap("zero-width")
    a, c = counts.index_events, counts.reference_events
    if a == 0 or c == 0:
        return walter(counts, level)
    n1, n2 = counts.index_total, counts.reference_total
    spread = math.sqrt(counts.index_non_events / (a * n1) + counts.reference_non_events / (c * n2))
    return limits_around((a * n2) / (c * n1), quantile(level) * spread)


def walter(counts: FractionalCounts, level: float) -> Interval | Gap:
    """The adjusted log interval: 1/2 added to the events and to the people of each group, centre included.

    Source: Walter 1975.
    """
    gap = without_people(counts)
    if gap is not None:
        return gap
    if counts.non_events == 0:
        return Gap("zero-width")
    a, c = 2 * counts.index_events + 1, 2 * counts.reference_events + 1
    n1, n2 = 2 * counts.index_total + 1, 2 * counts.reference_total + 1
    spread = math.sqrt(2 * (n1 - a) / (a * n1) + 2 * (n2 - c) / (c * n2))
    return limits_around((a * n2) / (c * n1), quantile(level) * spread, adjusted="half")


def _score(counts: FractionalCounts, level: float, *, finite: bool) -> Interval | Gap:
    gap = without_people(counts)
    if gap is not None:
        return gap
    reach = target(counts, level, finite=finite)
    if isinstance(reach, Gap):
        return reach
    below = _lower(mirrored(counts), reach)
    return Interval(low=_lower(counts, reach), high=1.0 / below if below > 0.0 else math.inf)


def _lower(counts: FractionalCounts, reach: float) -> float:
    """The R below the estimate at which u^2 [b/(n1(a-u)) + d/(n2(c+u))] is the square of ``reach``.

    There P1 = (a-u)/(n1-u) and P2 = (c+u)/(n2+u).
    """
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    n1, n2 = counts.index_total, counts.reference_total
    if a == 0:
        return 0.0
    if b == 0 and n1 * n1 * d <= reach * reach * n2 * (c + n1):
        return _lower_from_everybody(counts, reach)

    def spread(u: float) -> tuple[float, float]:
        index, reference = n1 * (a - u), n2 * (c + u)
        return b / index + d / reference, b * n1 / (index * index) - d * n2 / (reference * reference)

    at_estimate = b / (n1 * a) + (d / (n2 * c) if c else 0.0)
    u = multiplier(spread, a, reach, reach / math.sqrt(at_estimate) if at_estimate else a / 2.0)
    index_risk = (a - u) / (n1 - u) if b else 1.0
    return index_risk * ((n2 + u) / (c + u))


def _lower_from_everybody(counts: FractionalCounts, reach: float) -> float:
    """The lower limit where everybody in the index group had the event and the fitted P1 leaves 1 before the limit.

    As long as P1 stays 1 the multiplier rises to n1; from there it stays, P2 stays m/N, and P1 = R P2 falls until
    n1 (1-P1)/P1 + n1^2 d/(n2 m) is the square of ``reach``.
    """
    n1, n2, m = counts.index_total, counts.reference_total, counts.events
    odds_against = reach * reach / n1 - n1 * counts.reference_non_events / (n2 * m)
    return counts.total / (m * (1.0 + odds_against))


def statistic_at(counts: FractionalCounts, margin: float) -> float:
    """The square of the statistic under a ratio above 0 and below the estimate, without the finite factor.

    The multiplier is found at which (a-u)/(n1-u) is the ratio times (c+u)/(n2+u).
    """
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    n1, n2, m = counts.index_total, counts.reference_total, counts.events
    if b == 0 and margin * m <= counts.total:
        index_risk = margin * m / counts.total
        return n1 * (1.0 - index_risk) / index_risk + n1 * n1 * d / (n2 * m)

    def curve(u: float) -> tuple[float, float]:
        index = (a - u) / (n1 - u) if b else 1.0
        reference = (c + u) / (n2 + u)
        slope = (b / ((n1 - u) * (n1 - u))) + margin * d / ((n2 + u) * (n2 + u))
        return margin * reference - index, slope

    u = increasing_root(curve, 0.0, a, a / 2.0)
    return u * u * (b / (n1 * (a - u)) + d / (n2 * (c + u)))
