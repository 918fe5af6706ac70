"""An effect carried to a starting risk of other people, the imprecision of both being propagated.

Newcombe (2011, Commun Stat Theory Methods 40:3154) moves the two estimates together along z1 = z sin t and
z2 = z cos t, over the full circle, each on its own scale, and takes the least and the greatest figure met there. The
starting risk moves on the scale of Wilson's limits, a ratio on the log scale, a difference on its own. Only for a
starting risk that comes from other people than the effect: for the table's own reference risk it is wrong, and the
table's direct intervals hold.

All figures here grow with the effect at any starting risk. So the greatest lies on the half circle above the effect's
estimate, the least on the half below it, and neither inside the circle.
"""

from __future__ import annotations

import math
from collections.abc import Callable
from dataclasses import dataclass
from typing import NamedTuple

from fourcount.stats.conversion import Effect, a_risk, risk_ratio_from_odds_ratio, unbounded_risk, undetermined
from fourcount.stats.hazards import over_spans
from fourcount.stats.normal import quantile
from fourcount.stats.results import Gap, Interval

_STEPS = 16  # of a quarter circle, before the best of them is refined
_GOLDEN = (math.sqrt(5.0) - 1.0) / 2.0
_BESIDE = 1e-6  # of an angle
_LAST_BIT = 1e-15  # a cosine below it is that of a right angle
_NARROW = 1e-8  # of an angle: at a smooth extreme the figure is then known to its last bits


@dataclass(frozen=True, kw_only=True, slots=True)
class Limits:
    """Two limits of which each can be a gap by itself."""

    low: float | Gap
    high: float | Gap


@dataclass(frozen=True, kw_only=True, slots=True)
class StartLimits:
    """A starting risk and how precise it is: the number of people whose Wilson limits lie as far below, and above.

    The two numbers are the same where the risk was counted, and differ where limits were printed. They need not be
    whole; infinite means that the risk is certain on that side, 0 that nothing is known there.
    """

    value: float
    below: float
    above: float

    def at(self, z: float) -> float:
        """Wilson's limit z standard errors away, the lower one for a z below 0; the value itself at 0."""
        people = self.above if z > 0.0 else self.below
        if z == 0.0 or math.isinf(people) or (self.value == 1.0 and z > 0.0):
            return self.value
        if people == 0.0:
            return 1.0 if z > 0.0 else 0.0
        p, share = self.value, z * z / people
        root = math.sqrt(share * (share + 4.0 * p * (1.0 - p)))
        if z > 0.0:
            return min((2.0 * p + share + root) / (2.0 * (1.0 + share)), 1.0)
        return 2.0 * p * p / (2.0 * p + share + root)


@dataclass(frozen=True, kw_only=True, slots=True)
class Propagated:
    """The limits of what follows at a starting risk.

    ``with_`` is the risk with, ``difference`` with minus without, and ``risk_ratio`` with over without, whatever effect
    was carried.
    """

    with_: Limits
    difference: Limits
    risk_ratio: Limits


class _Point(NamedTuple):
    """The figures at one point of the circle; ``risk`` is the risk with over the effect's own span, maybe none."""

    risk: float
    with_: float
    difference: float
    risk_ratio: float


def limits_of_counts(events: int, total: int) -> StartLimits | Gap:
    """The precision of a risk that was counted."""
    if total == 0:
        return Gap("empty-group")
    return StartLimits(value=events / total, below=total, above=total)


def limits_as_typed(value: float, low: float, high: float, level: float) -> StartLimits | Gap:
    """The precision of a risk that is printed with limits, at the level of those limits.

    A Wilson limit L solves (p - L)^2 = z^2 L(1 - L)/n: each side has the n whose Wilson limit is the printed one. So
    a smooth and monotone scale runs through all three, and it is that of the counts where the limits are Wilson's.
    A printed limit of 0 or of 1 is no limit of any n: the whole side then stands at it, which is cautious.
    """
    if not 0.0 <= low <= value <= high <= 1.0:
        return Gap("limits-disordered")
    if low == high:
        return Gap("no-width")
    z = quantile(level)
    return StartLimits(value=value, below=_people(value, low, z), above=_people(value, high, z))


def _people(value: float, limit: float, z: float) -> float:
    away = value - limit
    return z * z * limit * (1.0 - limit) / (away * away) if away else math.inf


def propagated(
    effect: Effect, estimate: float, interval: Interval, level: float, start: StartLimits, spans: float = 1.0
) -> Propagated | Gap:
    """The limits of the risk with, the difference and the risk ratio at a starting risk of other people.

    ``interval`` is the effect's at ``level``; it need not be symmetric, since each of its sides has its own standard
    error. Where a correction moved its centre (1/2 added), that centre is moved along, not the plain estimate. With
    ``spans`` other than 1 both risks are seen over so many times the span, by constant hazards, before they are
    compared. A limit at which the risk with would pass 0 or 100% is a gap, and so is each limit on a side that an
    estimate of 0 or without end leaves open. Of a difference kept constant the limits are the effect's own over the
    effect's own span, whatever the starting risk. Source: Newcombe 2011, Commun Stat Theory Methods 40:3154; Newcombe
    and Bender 2014, Evid Based Med 19:6.
    """
    centre = math.sqrt(interval.low * interval.high) if _moved(effect, interval) else estimate
    if not interval.low <= centre <= interval.high:
        return Gap("limits-disordered")
    z = quantile(level)
    carry = _Carry(effect=effect, centre=centre, interval=interval, z=z, start=start, spans=spans)
    low, high = carry.extremes(-1.0), carry.extremes(1.0)
    own = effect == "risk_ratio" and spans == 1.0
    ratio = Limits(low=interval.low, high=interval.high) if own else Limits(low=low[2], high=high[2])
    return Propagated(
        with_=Limits(low=low[0], high=high[0]),
        difference=Limits(low=low[1], high=high[1]),
        risk_ratio=ratio,
    )


def _moved(effect: Effect, interval: Interval) -> bool:
    return interval.adjusted is not None and effect != "risk_difference"


@dataclass(frozen=True, kw_only=True, slots=True)
class _Carry:
    """One effect and one starting risk on their circle."""

    effect: Effect
    centre: float
    interval: Interval
    z: float
    start: StartLimits
    spans: float

    def extremes(self, side: float) -> tuple[float | Gap, float | Gap, float | Gap]:
        """Risk with, difference and risk ratio at their least (``side`` -1) or greatest (1)."""
        limit = self.interval.high if side > 0.0 else self.interval.low
        gap = self._open(limit)
        if gap is not None:
            return gap, gap, gap
        angles = [math.pi / 2.0 * step / _STEPS for step in range(-_STEPS, _STEPS + 1)]
        points = [self._point(limit, angle) for angle in angles]

        def extreme(place: int) -> float | Gap:
            def height(angle: float) -> float:
                return side * self._point(limit, angle)[place]

            best = _highest(height, angles, [side * point[place] for point in points])
            found = self._point(limit, best)
            # What lies where risks end says where they end, and not how far the figure reaches.
            beside = (best,) if self.spans == 1.0 else (best, best - _BESIDE, best + _BESIDE)
            risks = (a_risk(self._point(limit, angle).risk) for angle in beside)
            return next((risk for risk in risks if isinstance(risk, Gap)), found[place])

        return extreme(1), extreme(2), extreme(3)

    def _open(self, limit: float) -> Gap | None:
        """Why nothing can be said on the side of this limit."""
        if self.effect != "risk_difference" and (self.centre == 0.0 or math.isinf(self.centre)):
            return Gap("endless-log") if limit != self.centre else self._unmet(limit)
        return self._unmet(limit)

    def _unmet(self, limit: float) -> Gap | None:
        met = (self.start.at(-self.z), self.start.value, self.start.at(self.z))
        if any(undetermined(self.effect, limit, risk) for risk in met):
            return Gap("undetermined-at-baseline")
        return None

    def _point(self, limit: float, angle: float) -> _Point:
        start = self.start.at(self.z * math.sin(angle))
        share = math.cos(angle)
        value = self._value(limit, share if share > _LAST_BIT else 0.0)
        risk = unbounded_risk(self.effect, value, start)
        if self.spans == 1.0:
            return _Point(risk, risk, risk - start, self._ratio(value, start, risk))
        # Beyond 0 and 1 the figure only has to go on growing: it is withheld in the end.
        with_ = over_spans(risk, self.spans) if 0.0 <= risk <= 1.0 else risk
        without = over_spans(start, self.spans)
        ratio = with_ / without if without > 0.0 else self._ratio(value, start, risk)
        return _Point(risk, with_, with_ - without, ratio)

    def _value(self, limit: float, share: float) -> float:
        """The effect this share of the way to its limit, in standard errors; a limit without end is met at once."""
        if share == 1.0 or limit == self.centre:
            return limit
        if self.effect == "risk_difference":
            return self.centre + (limit - self.centre) * share
        if limit == 0.0 or math.isinf(limit):
            return limit
        return self.centre * math.exp(math.log(limit / self.centre) * share)

    def _ratio(self, value: float, start: float, risk: float) -> float:
        if self.effect == "risk_ratio":
            return value
        if self.effect == "odds_ratio":
            return risk_ratio_from_odds_ratio(value, start)
        if start > 0.0:
            return risk / start
        if self.effect == "risk_difference":
            return math.copysign(math.inf, value) if value else 1.0
        return value


def _highest(height: Callable[[float], float], angles: list[float], heights: list[float]) -> float:
    """The angle of the greatest height: every hill of the grid is climbed by golden section."""
    best = max(range(len(angles)), key=heights.__getitem__)
    top, top_height = angles[best], heights[best]
    last = len(angles) - 1
    for place, own in enumerate(heights):
        before, after = max(place - 1, 0), min(place + 1, last)
        if own < heights[before] or own < heights[after] or heights[before] == heights[after] == own:
            continue
        for found in _climbed(height, angles[before], angles[after]):
            if (reached := height(found)) > top_height:
                top, top_height = found, reached
    return top


def _climbed(height: Callable[[float], float], low: float, high: float) -> tuple[float, float]:
    """The two last angles of a golden section that climbs one hill."""
    left, right = high - _GOLDEN * (high - low), low + _GOLDEN * (high - low)
    at_left, at_right = height(left), height(right)
    while high - low > _NARROW:
        if at_left >= at_right:
            high, right, at_right = right, left, at_left
            left = high - _GOLDEN * (high - low)
            at_left = height(left)
        else:
            low, left, at_left = left, right, at_right
            right = low + _GOLDEN * (high - low)
            at_right = height(right)
    return left, right
