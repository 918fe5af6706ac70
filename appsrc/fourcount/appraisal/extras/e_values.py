"""How strong a confounder would have to be to explain a ratio away."""

from __future__ import annotations

from fourcount.appraisal.findings import EValues, Figure, Gap, Interval
from fourcount.stats.e_value import e_value, e_value_of_limit, ratio_of_common_hazards, ratio_of_common_odds

COMMON = 0.15
"""An outcome that more people than this have is common here (VanderWeele and Ding 2017, Ann Intern Med 167:268)."""

_CONVERSIONS = {"odds_ratio": ratio_of_common_odds, "hazard_ratio": ratio_of_common_hazards}


def e_values(ratio: Figure | Gap, measure: str, *, common: bool, adjusted: bool = False) -> EValues | Gap:
    """The E-value of a ratio and of its limit nearest to 1; odds and hazards of a common outcome are converted."""
    if isinstance(ratio, Gap):
        return ratio
    if isinstance(ratio.estimate, Gap):
        return ratio.estimate
    convert = _CONVERSIONS.get(measure) if common else None
    estimate = ratio.estimate if convert is None else convert(ratio.estimate)
    if isinstance(estimate, Gap):
        return estimate
    of_estimate = e_value(estimate)
    if isinstance(of_estimate, Gap):
        return of_estimate
    return EValues(
        ratio=estimate,
        estimate=of_estimate,
        limit=_of_limit(ratio, measure, common=common),
        converted=measure if convert is not None else "",
        measure=measure,
        adjusted=adjusted,
    )


def _of_limit(ratio: Figure, measure: str, *, common: bool) -> float | Gap:
    if not isinstance(ratio.interval, Interval):
        return ratio.interval if isinstance(ratio.interval, Gap) else Gap("no-interval-printed")
    convert = _CONVERSIONS.get(measure) if common else None
    low, high = (limit if convert is None else convert(limit) for limit in (ratio.interval.low, ratio.interval.high))
    if isinstance(low, Gap):
        return low
    return high if isinstance(high, Gap) else e_value_of_limit(low, high)
