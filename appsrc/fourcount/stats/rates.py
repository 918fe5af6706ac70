"""Rates of events in person-time, and intervals of their difference and ratio.

Letters: x1 events in t1 of person-time of the index group, x2 in t2 of the reference group. All takes an event to be
as likely at any moment of a group's time, whatever went before (Poisson). A group without person-time is a gap.
"""

from __future__ import annotations

import math
from collections.abc import Callable

from fourcount.stats import two_counts
from fourcount.stats.normal import quantile, two_sided_p
from fourcount.stats.results import Gap, Interval, Rates
from fourcount.stats.roots import increasing_root


def without_time(rates: Rates) -> Gap | None:
    """The gap of rates of which one has no person-time; None where both have some."""
    return None if rates.index_time > 0.0 and rates.reference_time > 0.0 else Gap("no-time")


def without_rate_events(rates: Rates) -> Gap | None:
    """The gap of rates without person-time or without any event; None where there is something to divide."""
    gap = without_time(rates)
    if gap is None and rates.index_events == rates.reference_events == 0:
        return Gap("no-events")
    return gap


def rate(events: int, time: float) -> float | Gap:
    """Events for each unit of person-time."""
    return events / time if time > 0.0 else Gap("no-time")


def rate_difference(rates: Rates) -> float | Gap:
    """The index group's rate minus the reference group's."""
    return without_time(rates) or _difference(rates)


def rate_ratio(rates: Rates) -> float | Gap:
    """The index group's rate over the reference group's; ``inf`` where only the reference group has no event."""
    gap = without_rate_events(rates)
    if gap is not None:
        return gap
    if rates.reference_events == 0:
        return math.inf
    return rates.index_events / rates.reference_events * (rates.reference_time / rates.index_time)


def wald_difference(rates: Rates, level: float) -> Interval | Gap:
    """The textbook interval D -+ z sqrt(x1/t1^2 + x2/t2^2); without any event its width would be zero, a gap."""
    gap = without_time(rates)
    if gap is not None:
        return gap
    if rates.index_events == rates.reference_events == 0:
        return Gap("zero-width")
    half_width = quantile(level) * math.hypot(
        math.sqrt(rates.index_events) / rates.index_time, math.sqrt(rates.reference_events) / rates.reference_time
    )
    return Interval(low=_difference(rates) - half_width, high=_difference(rates) + half_width)


def miettinen_nurminen_difference(rates: Rates, level: float) -> Interval | Gap:
    """The score interval (Miettinen and Nurminen 1985, Stat Med 4:213, from memory).

    The differences D0 at which (r1 - r2 - D0) / sqrt(R1/t1 + R2/t2) is z and -z, R1 and R2 being the likeliest
    rates with R1 - R2 = D0. Without any event the limits are -z^2/t2 and z^2/t1.
    """
    gap = without_time(rates)
    if gap is not None:
        return gap
    z = quantile(level)
    return Interval(low=_score_lower(rates, z), high=-_score_lower(_swapped(rates), z))


def _score_lower(rates: Rates, z: float) -> float:
    """The difference below the estimate at which the statistic is z.

    With a multiplier u of the constraint R1 = x1/(t1+u) and R2 = x2/(t2-u); the statistic is u sqrt(R1/t1 + R2/t2),
    which rises in u, and the difference is D - z^2/u. Without an event R2 stays 0 until u reaches t2, then u stays.
    Here u is counted in units of t2.
    """
    x1, x2 = rates.index_events, rates.reference_events
    longer = rates.reference_time / rates.index_time

    def curve(share: float) -> tuple[float, float]:
        index, reference = 1.0 + longer * share, 1.0 - share
        stretched = longer * share
        square = x1 * stretched * stretched / index + x2 * share * share / reference
        root = math.sqrt(square)
        slope = x1 * longer * stretched * (2.0 + stretched) / (index * index)
        slope += x2 * share * (2.0 - share) / (reference * reference)
        return root - z, slope / (2.0 * root) if root > 0.0 else 0.0

    share = 1.0
    if x2 > 0 or _statistic_at_reach(x1, longer) > z:
        share = increasing_root(curve, 0.0, 1.0, z / math.sqrt(x1 * longer * longer + x2))
    return _difference(rates) - z * z / (share * rates.reference_time)


def _statistic_at_reach(index_events: int, longer: float) -> float:
    """The statistic where the multiplier reaches t2 and the reference group has no event."""
    return longer * math.sqrt(index_events / (1.0 + longer))


def exact_ratio(rates: Rates, level: float) -> Interval | Gap:
    """Clopper and Pearson's limits of x1 / (x1+x2), p turned into p/(1-p) t2/t1."""
    return _scaled(rates, level, two_counts.exact)


def mid_p_ratio(rates: Rates, level: float) -> Interval | Gap:
    """The mid-P limits of x1 / (x1+x2), p turned into p/(1-p) t2/t1."""
    return _scaled(rates, level, two_counts.mid_p)


def score_ratio(rates: Rates, level: float) -> Interval | Gap:
    """Wilson's limits of x1 / (x1+x2), p turned into p/(1-p) t2/t1."""
    return _scaled(rates, level, two_counts.score)


def log_ratio(rates: Rates, level: float) -> Interval | Gap:
    """The textbook interval R exp(-+ z sqrt(1/x1 + 1/x2)); none where a group has no event."""
    return _scaled(rates, level, two_counts.log)


def rate_score(rates: Rates) -> float | Gap:
    """The score test of equal rates: (x1 t2 - x2 t1) / sqrt((x1+x2) t1 t2) is a standard normal value.

    It agrees about no effect with the score intervals of the difference and of the ratio.
    """
    gap = without_rate_events(rates)
    if gap is not None:
        return gap
    spread = math.sqrt(rates.index_events + rates.reference_events)
    root = math.sqrt(rates.reference_time / rates.index_time)
    return two_sided_p((rates.index_events * root - rates.reference_events / root) / spread)


def binomial_exact(rates: Rates) -> float | Gap:
    """Twice the smaller tail of x1 among x1+x2 at the share t1/(t1+t2), at most 1: the exact interval's own test."""
    gap = without_rate_events(rates)
    if gap is not None:
        return gap
    tail = _tails(rates)
    return min(1.0, 2.0 * min(tail.below, tail.above))


def binomial_mid_p(rates: Rates) -> float | Gap:
    """The same with half of the observed split's own probability in either tail: the mid-P interval's own test."""
    gap = without_rate_events(rates)
    if gap is not None:
        return gap
    tail = _tails(rates)
    return 2.0 * min(tail.below, tail.above) - tail.own


def _tails(rates: Rates) -> two_counts.Tails:
    return two_counts.tails(rates.index_events, rates.reference_events, (rates.index_time, rates.reference_time))


def _scaled(rates: Rates, level: float, shared: Callable[[int, int, float], Interval | Gap]) -> Interval | Gap:
    gap = without_rate_events(rates)
    if gap is not None:
        return gap
    found = shared(rates.index_events, rates.reference_events, level)
    if isinstance(found, Gap):
        return found
    scale = rates.reference_time / rates.index_time
    return Interval(low=found.low * scale, high=found.high * scale)


def _difference(rates: Rates) -> float:
    return rates.index_events / rates.index_time - rates.reference_events / rates.reference_time


def _swapped(rates: Rates) -> Rates:
    return Rates(
        index_events=rates.reference_events,
        index_time=rates.reference_time,
        reference_events=rates.index_events,
        reference_time=rates.index_time,
    )
