"""Two risks that are printed with limits (Kaplan-Meier, cumulative incidence), compared by square-and-add."""

from __future__ import annotations

import math

from fourcount.stats.log_scale import exponential
from fourcount.stats.results import Gap, Interval, LimitedRisk, TimedRisks

_LAST_BITS = 1e-12


def timed_difference(timed: TimedRisks) -> float:
    """The index group's risk less the reference group's."""
    return timed.index.risk - timed.reference.risk


def timed_ratio(timed: TimedRisks) -> float | Gap:
    """The index group's risk over the reference group's; ``inf`` where only the reference group's is 0."""
    if timed.reference.risk == 0.0:
        return math.inf if timed.index.risk > 0.0 else Gap("no-events")
    return timed.index.risk / timed.reference.risk


def square_and_add(timed: TimedRisks, level: float | None = None) -> Interval | Gap:
    """The interval of the difference from the two printed intervals, at their own level.

    D - sqrt((p1-l1)^2 + (u2-p2)^2) to D + sqrt((u1-p1)^2 + (p2-l2)^2). It never passes -1 or 1. A level other than the
    printed one has no figure here. Source: Newcombe 1998, Stat Med 17:873, method 10; Zou and Donner 2008, Stat Med
    27:1693 (from memory).
    """
    gap = _unsound(timed, level)
    if gap is not None:
        return gap
    one, two = timed.index, timed.reference
    difference = timed_difference(timed)
    below = math.hypot(one.risk - one.low, two.high - two.risk)
    above = math.hypot(one.high - one.risk, two.risk - two.low)
    if below == 0.0 and above == 0.0:
        return Gap("no-width")
    return Interval(low=_apart(difference, below), high=0.0 - _apart(-difference, above))


def square_and_add_ratio(timed: TimedRisks, level: float | None = None) -> Interval | Gap:
    """The interval of the ratio by the same construction on the log scale, at the printed level.

    R exp(-sqrt(ln(p1/l1)^2 + ln(u2/p2)^2)) to R exp(sqrt(ln(u1/p1)^2 + ln(p2/l2)^2)). A printed limit of 0 makes that
    side 0 or infinite; a risk of 0 has no logarithm, and no limits are given. Source: Zou and Donner 2008, Stat Med
    27:1693 (from memory).
    """
    gap = _unsound(timed, level)
    if gap is not None:
        return gap
    one, two = timed.index, timed.reference
    ratio = timed_ratio(timed)
    if isinstance(ratio, Gap):
        return ratio
    if ratio == 0.0 or math.isinf(ratio):
        return Gap("endless-log")
    below = math.hypot(_log_ratio(one.risk, one.low), _log_ratio(two.high, two.risk))
    above = math.hypot(_log_ratio(one.high, one.risk), _log_ratio(two.risk, two.low))
    if below == 0.0 and above == 0.0:
        return Gap("no-width")
    return Interval(low=ratio * math.exp(-below), high=ratio * exponential(above))


def _apart(difference: float, distance: float) -> float:
    """The difference less a distance, 0 where they are the same but for a last bit: sqrt(3^2 + 4^2) is 5."""
    return 0.0 if math.isclose(difference, distance, rel_tol=_LAST_BITS) else difference - distance


def _log_ratio(greater: float, lesser: float) -> float:
    return math.log(greater / lesser) if lesser > 0.0 else math.inf


def _unsound(timed: TimedRisks, level: float | None) -> Gap | None:
    for limited in (timed.index, timed.reference):
        if not _ordered(limited):
            return Gap("limits-disordered")
        if limited.low < 0.0:
            return Gap("beyond-zero")
        if limited.high > 1.0:
            return Gap("beyond-one")
    return Gap("level-not-printed") if level is not None and level != timed.level else None


def _ordered(limited: LimitedRisk) -> bool:
    return limited.low <= limited.risk <= limited.high
