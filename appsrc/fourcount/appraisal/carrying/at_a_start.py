"""One effect at one starting risk: both risks, their difference and ratio, and what their ranges hold.

A starting risk with limits of its own has both imprecisions propagated. At a bare value the ranges are the effect's
limits at that value (Cochrane Handbook 5.1, 12.5.4.5). A starting risk solved from an overall risk is solved anew at
each limit of the effect. Nothing is cut off at 100%: what would pass it is withheld by itself.
"""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING, Literal

import msgspec

from fourcount.appraisal.carrying.starts import BARE, Start
from fourcount.appraisal.conversion import converted_figure, mapped
from fourcount.appraisal.findings import Carriable, Figure, Gap, Interval, Range
from fourcount.stats.conversion import risk_with
from fourcount.stats.hazards import over_spans

if TYPE_CHECKING:
    from fourcount.stats.propagation import Limits

Value = Callable[[float], float | Gap]


class Carried(msgspec.Struct, frozen=True, kw_only=True):
    """Figures at one starting risk; ``baseline`` is that risk over the study's own span."""

    baseline: float | Gap
    without: Figure
    with_: Figure
    difference: Figure
    risk_ratio: Figure
    range_from: Literal["effect", "both"]


def carried_to(one: Carriable, start: Start, spans: float = 1.0) -> Carried:
    """The effect at a starting risk, over so many times the study's time span."""
    if start.share is not None:
        return _from_overall(one, start.value, start.share, spans)
    bare = _at_a_value(one, start.value, spans)
    if start.limits is None:
        return bare
    if not isinstance(one.figure.interval, Interval) or isinstance(one.figure.estimate, Gap):
        return msgspec.structs.replace(bare, without=_without(start, one.level, spans), range_from="both")
    return _propagated(one, start, spans, bare, one.figure.estimate, one.figure.interval)


def _at_a_value(one: Carriable, start: float, spans: float) -> Carried:
    """The effect's estimate and limits at a starting risk that is taken as it stands."""
    without = _over(start, spans)

    def risk(value: float) -> float | Gap:
        return _over_or_gap(risk_with(one.effect, value, start), spans)

    def apart(value: float) -> float | Gap:
        found = risk(value)
        return found if isinstance(found, Gap) else found - without

    return Carried(
        baseline=start,
        without=Figure(estimate=without, interval=BARE, method=""),
        with_=mapped(one.figure, risk),
        difference=mapped(one.figure, apart),
        risk_ratio=_ratio_at(one, start, without, spans, risk),
        range_from="effect",
    )


def _ratio_at(one: Carriable, start: float, without: float, spans: float, risk: Value) -> Figure:
    """The relative figure: the risk ratio carried, the odds ratio converted, or one risk over the other."""
    if spans == 1.0 and one.effect == "risk_ratio":
        return one.figure
    if spans == 1.0 and one.effect == "odds_ratio":
        return converted_figure(one.figure, start)

    def ratio(value: float) -> float | Gap:
        found = risk(value)
        if isinstance(found, Gap):
            return found
        return _times(one, value, found, without)

    return mapped(one.figure, ratio)


def _times(one: Carriable, value: float, with_: float, without: float) -> float | Gap:
    """One risk over the other. It has an end where the starting risk goes to 0; a difference has none there."""
    if without > 0.0:
        return with_ / without
    return Gap("undetermined-at-baseline") if one.effect == "risk_difference" else value


def _from_overall(one: Carriable, overall: float, share: float, spans: float) -> Carried:
    """The starting risk of the unexposed at which all together have the overall risk, solved at each limit."""
    from fourcount.stats.overall_risk import starting_risk_from_overall  # few start from one

    def start(value: float) -> float | Gap:
        return starting_risk_from_overall(one.effect, value, overall, share)

    def without(value: float) -> float | Gap:
        return _over_or_gap(start(value), spans)

    def risk(value: float) -> float | Gap:
        found = start(value)
        if isinstance(found, Gap):
            return found
        # Where all are exposed theirs is the overall risk, to the last bit.
        return _over_or_gap(overall if share == 1.0 else risk_with(one.effect, value, found), spans)

    def apart(value: float) -> float | Gap:
        return _together(risk(value), without(value), lambda with_, none: with_ - none)

    def ratio(value: float) -> float | Gap:
        if spans == 1.0 and one.effect == "risk_ratio":
            return value
        return _together(risk(value), without(value), lambda with_, none: _times(one, value, with_, none))

    estimate = one.figure.estimate
    return Carried(
        baseline=estimate if isinstance(estimate, Gap) else start(estimate),
        without=_falling(one.figure, without) if share else _without_share(one.figure, without),
        with_=mapped(one.figure, risk),
        difference=mapped(one.figure, apart),
        risk_ratio=mapped(one.figure, ratio),
        range_from="effect",
    )


def _falling(figure: Figure, function: Value) -> Figure:
    """A figure through a decreasing function: the starting risk is the lower, the more the effect adds."""
    found = mapped(figure, function)
    interval = figure.interval
    if isinstance(interval, Gap):
        return Figure(estimate=found.estimate, interval=interval, method=figure.method)
    low = interval.high if isinstance(interval.high, Gap) else function(interval.high)
    high = interval.low if isinstance(interval.low, Gap) else function(interval.low)
    return Figure(estimate=found.estimate, interval=_interval(low, high, None), method=figure.method)


def _without_share(figure: Figure, function: Value) -> Figure:
    """Nobody has the exposure, so that the overall risk is the starting risk and no limit of the effect moves it."""
    return Figure(estimate=mapped(figure, function).estimate, interval=BARE, method="")


def _propagated(
    one: Carriable, start: Start, spans: float, bare: Carried, estimate: float, interval: Interval
) -> Carried:
    """The bare estimates, with the limits that hold the imprecision of the effect and of the starting risk."""
    from fourcount.stats.propagation import propagated  # few start from a risk with limits

    assert start.limits is not None
    found = propagated(one.effect, estimate, interval, one.level, start.limits, spans)
    without = _without(start, one.level, spans)
    if isinstance(found, Gap):
        return msgspec.structs.replace(
            bare,
            without=without,
            with_=_with_interval(bare.with_, found),
            difference=_with_interval(bare.difference, found),
            risk_ratio=_with_interval(bare.risk_ratio, found),
            range_from="both",
        )

    def limited(figure: Figure, limits: Limits) -> Figure:
        return _with_interval(figure, _interval(limits.low, limits.high, interval.adjusted))

    return Carried(
        baseline=bare.baseline,
        without=without,
        with_=limited(bare.with_, found.with_),
        difference=limited(bare.difference, found.difference),
        risk_ratio=limited(bare.risk_ratio, found.risk_ratio),
        range_from="both",
    )


def _without(start: Start, level: float, spans: float) -> Figure:
    """The starting risk with its own limits at the level of the effect's, whatever the level of typed ones."""
    own = start.own_limits(level)
    interval = own if isinstance(own, Gap) else Interval(low=_over(own.low, spans), high=_over(own.high, spans))
    method = "typed" if start.typed is not None else "wilson"
    return Figure(estimate=_over(start.value, spans), interval=interval, method=method)


def _with_interval(figure: Figure, interval: Interval | Range | Gap) -> Figure:
    return Figure(estimate=figure.estimate, interval=interval, method=figure.method)


def _interval(low: float | Gap, high: float | Gap, adjusted: str | None) -> Interval | Range | Gap:
    """Both limits, the one that can be given, or the reason for neither."""
    if isinstance(low, Gap) and isinstance(high, Gap):
        return low
    if isinstance(low, Gap) or isinstance(high, Gap):
        return Range(low=low, high=high, adjusted=adjusted)
    return Interval(low=min(low, high), high=max(low, high), adjusted=adjusted)


def _together(one: float | Gap, other: float | Gap, compute: Callable[[float, float], float | Gap]) -> float | Gap:
    if isinstance(one, Gap):
        return one
    return other if isinstance(other, Gap) else compute(one, other)


def _over(risk: float, spans: float) -> float:
    return risk if spans == 1.0 else over_spans(risk, spans)


def _over_or_gap(risk: float | Gap, spans: float) -> float | Gap:
    return risk if isinstance(risk, Gap) else _over(risk, spans)
