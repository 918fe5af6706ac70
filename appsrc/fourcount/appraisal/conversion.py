"""The odds ratio as a risk ratio at a starting risk, and figures through a function."""

from __future__ import annotations

from collections.abc import Callable

from fourcount.appraisal.findings import Figure, Gap, Interval, Range
from fourcount.stats.conversion import risk_ratio_from_odds_ratio


def converted_figure(odds_ratio: Figure, baseline: float) -> Figure:
    """The figure of the risk ratio that an odds ratio means at a starting risk, by the odds ratio's method."""

    def converted(value: float) -> float | Gap:
        # Where everybody has the event, odds times an odds ratio of 0 are 0 times infinity.
        if value == 0 and baseline == 1:
            return Gap("undetermined-at-baseline")
        return risk_ratio_from_odds_ratio(value, baseline)

    return mapped(odds_ratio, converted)


def mapped(figure: Figure, function: Callable[[float], float | Gap]) -> Figure:
    """A figure through an increasing function of its estimate and limits; each may become a gap by itself."""
    estimate = figure.estimate if isinstance(figure.estimate, Gap) else function(figure.estimate)
    return Figure(estimate=estimate, interval=_mapped_interval(figure.interval, function), method=figure.method)


def _mapped_interval(
    interval: Interval | Range | Gap, function: Callable[[float], float | Gap]
) -> Interval | Range | Gap:
    if isinstance(interval, Gap):
        return interval
    low = interval.low if isinstance(interval.low, Gap) else function(interval.low)
    high = interval.high if isinstance(interval.high, Gap) else function(interval.high)
    if isinstance(low, Gap):
        return low if isinstance(high, Gap) else Range(low=low, high=high, adjusted=interval.adjusted)
    if isinstance(high, Gap):
        return Range(low=low, high=high, adjusted=interval.adjusted)
    # Limits that agree to the last bit or two can come out of the function in the other order.
    return Interval(low=min(low, high), high=max(low, high), adjusted=interval.adjusted)
