"""The odds ratio as a risk ratio at a starting risk, and figures through a function."""

from __future__ import annotations

from collections.abc import Callable

from fourcount.appraisal.findings import Conversion, Figure, Gap, Interval, Range
from fourcount.appraisal.measures import Figures
from fourcount.appraisal.starting_risk import StartingRisk
from fourcount.stats.conversion import risk_ratio_from_odds_ratio


def convert(figures: Figures, start: StartingRisk) -> Conversion:
    """Zhang and Yu's risk ratio (1998, JAMA 280:1690) of the estimate and of each limit at one starting risk.

    At the table's own reference risk that is the table's own risk ratio, so its direct interval stands there. Limits
    converted at an estimated risk as if it were certain can cover far too seldom: at 95%, with 50 people a group and
    true risks of 90% v 60%, only 59% of the time (by enumeration of all tables).
    """
    odds_ratio = figures["odds_ratio"]
    ratio = _direct(odds_ratio, figures) if start.origin == "reference" else converted_figure(odds_ratio, start.value)
    return Conversion(baseline=start.value, baseline_from=start.origin, risk_ratio=ratio)


def _direct(odds_ratio: Figure, figures: Figures) -> Figure:
    """The table's risk ratio; without an odds ratio there is nothing to see as one."""
    ratio = figures["risk_ratio"]
    if isinstance(odds_ratio.estimate, Gap):
        return Figure(estimate=odds_ratio.estimate, interval=odds_ratio.estimate, method=ratio.method)
    return ratio


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
