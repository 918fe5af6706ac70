"""The one-sided p of a margin: how far the data speak against an effect at the margin or beyond it.

A margin lies to one side of no effect, "fewer" or "more". The hypothesis is that the effect is at the margin or
farther to that side; a small p speaks for an effect short of it. It is below half of what a level leaves to 1 exactly
where the limit of that level lies short of the margin.
"""

from __future__ import annotations

import math
from typing import Literal

from fourcount.stats import difference, odds, ratio
from fourcount.stats.estimates import odds_ratio, risk_difference, risk_ratio
from fourcount.stats.normal import quantile
from fourcount.stats.results import FractionalCounts, Gap
from fourcount.stats.score import mirrored

MarginMeasure = Literal["risk_difference", "risk_ratio", "odds_ratio"]
MarginSide = Literal["fewer", "more"]
MarginScale = Literal["log", "plain"]


def margin_p(measure: MarginMeasure, counts: FractionalCounts, margin: float, side: MarginSide) -> float | Gap:
    """The p of Miettinen and Nurminen's score statistic with the two risks fitted under the margin.

    The same statistic, with the factor N/(N-1), as the interval of the measure. Source: Miettinen and Nurminen 1985,
    Stat Med 4:213; for margins Farrington and Manning 1990, Stat Med 9:1447 (from memory).
    """
    estimate = _ESTIMATES[measure](counts)
    if isinstance(estimate, Gap):
        return estimate
    if not _can_be(measure, margin):
        return Gap("margin-out-of-range")
    if counts.total <= 1:
        return Gap("too-few-left")
    if estimate == margin:
        return 0.5
    # A margin above the estimate is one below it with the groups swapped.
    above = margin > estimate
    seen, limit = (mirrored(counts), _mirror(measure, margin)) if above else (counts, margin)
    distance = math.sqrt((counts.total - 1) / counts.total * _STATISTICS[measure](seen, limit))
    return _tail(distance, short=above == (side == "more"))


def margin_p_from_interval(
    estimate: float, low: float, high: float, level: float, margin: float, side: MarginSide, scale: MarginScale
) -> float | Gap:
    """The normal p of a margin from an estimate with limits, on the log scale for a ratio.

    The standard error is that of the side on which the margin lies, (limit - estimate)/z of the level, so that p and
    the limit agree even where an interval is not symmetric. Source: Altman and Bland 2011, BMJ 343:d2304, at another
    value than no effect.
    """
    if scale == "log" and (min(estimate, margin) <= 0.0 or math.isinf(estimate)):
        return Gap("endless-log")
    if not low <= estimate <= high:
        return Gap("limits-disordered")
    if estimate == margin:
        return 0.5
    above = margin > estimate
    limit = high if above else low
    if math.isinf(limit) or (scale == "log" and limit <= 0.0):
        return Gap("endless-limit")
    if limit == estimate:
        return Gap("no-width")
    if scale == "log":
        away = math.log(margin / estimate) / math.log(limit / estimate)
    else:
        away = (margin - estimate) / (limit - estimate)
    return _tail(quantile(level) * away, short=above == (side == "more"))


def _tail(distance: float, *, short: bool) -> float:
    """The normal tail beyond a distance in standard errors; the small one where the estimate is short of the margin."""
    return math.erfc(distance / math.sqrt(2.0) if short else -distance / math.sqrt(2.0)) / 2.0


def _can_be(measure: MarginMeasure, margin: float) -> bool:
    """A difference of all people or more, and a ratio of nothing or without end, are no margins."""
    return -1.0 < margin < 1.0 if measure == "risk_difference" else 0.0 < margin < math.inf


def _mirror(measure: MarginMeasure, margin: float) -> float:
    return -margin if measure == "risk_difference" else 1.0 / margin


_ESTIMATES = {"risk_difference": risk_difference, "risk_ratio": risk_ratio, "odds_ratio": odds_ratio}
_STATISTICS = {
    "risk_difference": difference.statistic_at,
    "risk_ratio": ratio.statistic_at,
    "odds_ratio": odds.statistic_at,
}
