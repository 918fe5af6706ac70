"""Intervals of one risk that need nothing but square roots, and the door to those that need the beta distribution.

Every function takes the events, the people and the confidence level; a group of nobody is a gap. Events and people
may be fractions, as what a design effect leaves of counts, but not for the exact intervals, which count whole people.
"""

from __future__ import annotations

import math
from dataclasses import dataclass

from fourcount.stats.log_scale import exponential
from fourcount.stats.normal import quantile
from fourcount.stats.results import Gap, Interval


@dataclass(frozen=True, slots=True)
class ScoreLimits:
    """Wilson's limits and what is left of them to 1, each to full relative precision."""

    low: float
    to_one_from_low: float
    high: float
    to_one_from_high: float


def score_limits(events: float, total: float, z: float) -> ScoreLimits:
    """The two roots P of (p - P)^2 = z^2 P (1 - P) / n; the events may be a fraction (correction for continuity)."""
    low, high = _score_roots(events, total, z)
    complement_low, complement_high = _score_roots(total - events, total, z)
    return ScoreLimits(low=low, to_one_from_low=complement_high, high=high, to_one_from_high=complement_low)


def _score_roots(events: float, total: float, z: float) -> tuple[float, float]:
    others = total - events
    reach = 2.0 * events + z * z + z * math.sqrt(z * z + 4.0 * events * others / total)
    # The product of the roots gives the lower one without a difference of nearly equal numbers.
    return 2.0 * (events / total) * events / reach, reach / (2.0 * (total + z * z))


def score_distances(events: float, total: float, z: float, correction: float = 0.0) -> tuple[float, float]:
    """How far Wilson's limits lie below and above the risk; ``correction`` is that for continuity, in events.

    A limit L solves |p - L| = z sqrt(L(1-L)/n), plus 1/(2n) where continuity is corrected for; taking the right
    side keeps the digits that p - L would lose in a large group.
    """
    step = correction / total
    below, above = events / total, (total - events) / total
    if events > correction:
        low = score_limits(events - correction, total, z)
        below = step + z * math.sqrt(low.low * low.to_one_from_low / total)
    if total - events > correction:
        high = score_limits(events + correction, total, z)
        above = step + z * math.sqrt(high.high * high.to_one_from_high / total)
    return below, above


def wilson(events: float, total: float, level: float) -> Interval | Gap:
    """Wilson's score interval (1927, JASA 22:209): the risks that a two-sided z test at this level keeps."""
    if total == 0:
        return Gap("empty-group")
    limits = score_limits(events, total, quantile(level))
    return Interval(low=limits.low, high=1.0 if events == total else limits.high)


def wilson_continuity(events: float, total: float, level: float) -> Interval | Gap:
    """Wilson's interval with a correction for continuity of half an event (Newcombe 1998, Stat Med 17:857, method 4).

    The lower limit is Wilson's for half an event less, the upper Wilson's for half an event more; 0 at no events
    and 1 at no others, by definition.
    """
    if total == 0:
        return Gap("empty-group")
    z = quantile(level)
    low = score_limits(events - 0.5, total, z).low if events > 0.5 else 0.0
    high = score_limits(events + 0.5, total, z).high if total - events > 0.5 else 1.0
    return Interval(low=low, high=high)


def wald(events: float, total: float, level: float) -> Interval | Gap:
    """The textbook interval p -+ z sqrt(p(1-p)/n); it can leave 0 to 1 and is given as it is.

    At no events and at no others its width is zero, which says nothing: a gap.
    """
    if total == 0:
        return Gap("empty-group")
    if events in (0, total):
        return Gap("zero-width")
    half_width = quantile(level) * math.sqrt(events / total * ((total - events) / total) / total)
    return Interval(low=events / total - half_width, high=events / total + half_width)


def logit(events: float, total: float, level: float) -> Interval | Gap:
    """The textbook interval of odds, o exp(-+ z sqrt(1/x + 1/(n-x))), each limit turned into the risk o/(1+o).

    It stays between 0 and 1, where Wald's does not. At no events and at no others it does not exist: a gap. Source:
    one group's part of Woolf's interval (1955); Newcombe 2001, Am Stat 55:200 (from memory).
    """
    if total == 0:
        return Gap("empty-group")
    if events in (0, total):
        return Gap("one-outcome")
    others = total - events
    factor = exponential(quantile(level) * math.sqrt(1 / events + 1 / others))
    if math.isinf(factor):
        return Interval(low=0.0, high=1.0)
    return Interval(low=events / (events + others * factor), high=events * factor / (events * factor + others))


def agresti_coull(events: float, total: float, level: float) -> Interval | Gap:
    """Agresti and Coull's interval (1998, Am Stat 52:119): Wald's after adding z^2/2 events and z^2/2 others.

    The method itself cuts the limits to 0 and 1.
    """
    if total == 0:
        return Gap("empty-group")
    z = quantile(level)
    return Interval(
        low=max(0.0, _added_lower(events, total, z)),
        high=min(1.0, _added_upper(events, total, z)),
    )


def _added_lower(events: float, total: float, z: float) -> float:
    added, people = events + z * z / 2.0, total + z * z
    others_share = (total - events + z * z / 2.0) / people
    # (x - y) = (x^2 - y^2) / (x + y), and x^2 - y^2 shares a factor: few digits are lost for a handful of events.
    return added * (added - z * z * others_share) / (added + z * math.sqrt(added * others_share)) / people


def _added_upper(events: float, total: float, z: float) -> float:
    added, people = events + z * z / 2.0, total + z * z
    others_share = (total - events + z * z / 2.0) / people
    return (added + z * math.sqrt(added * others_share)) / people


def clopper_pearson(events: float, total: float, level: float) -> Interval | Gap:
    """The exact interval of Clopper and Pearson (1934, Biometrika 26:404): each binomial tail holds (1-level)/2."""
    if total == 0:
        return Gap("empty-group")
    if not (isinstance(events, int) and isinstance(total, int)):
        return Gap("not-whole")
    from fourcount.stats.binomial import clopper_pearson_limits

    low, high = clopper_pearson_limits(events, total, level)
    return Interval(low=low, high=high)


def mid_p(events: float, total: float, level: float) -> Interval | Gap:
    """The exact interval with half of the observed count's own probability in each tail.

    0 and 1 are limits at no events and at no others. Source: Newcombe 1998, Stat Med 17:857.
    """
    if total == 0:
        return Gap("empty-group")
    if not (isinstance(events, int) and isinstance(total, int)):
        return Gap("not-whole")
    from fourcount.stats.binomial import mid_p_limits

    low, high = mid_p_limits(events, total, level)
    return Interval(low=low, high=high)


def jeffreys(events: float, total: float, level: float) -> Interval | Gap:
    """The central interval of the beta distribution with x + 1/2 and n - x + 1/2 (Brown, Cai, DasGupta 2001).

    0 and 1 are limits at no events and at no others, as the source advises (Stat Sci 16:101).
    """
    if total == 0:
        return Gap("empty-group")
    from fourcount.stats.binomial import jeffreys_limits

    low, high = jeffreys_limits(events, total, level)
    return Interval(low=low, high=high)
