"""The E-value: how strong an unmeasured confounder would have to be to explain a ratio away.

It is the least risk ratio that such a confounder would need with both the exposure and the outcome, beyond what was
measured. Source: VanderWeele and Ding 2017, Ann Intern Med 167:268.
"""

from __future__ import annotations

import math

from fourcount.stats.results import Gap


def e_value(ratio: float) -> float | Gap:
    """R + sqrt(R (R - 1)) of a risk ratio, R being the ratio or its reciprocal, whichever is above 1.

    1 at a ratio of 1; infinite at 0 and at infinity. Other effects are converted first, by the functions below.
    """
    if not ratio >= 0.0:
        return Gap("not-positive", {"value": ratio})
    if ratio >= 1.0:
        return ratio + math.sqrt(ratio) * math.sqrt(ratio - 1.0)
    # With R = 1/r, R (R - 1) is (1 - r) / r^2, which keeps the digits of a ratio near 1.
    return (1.0 + math.sqrt(1.0 - ratio)) / ratio if ratio > 0.0 else math.inf


def e_value_of_limit(low: float, high: float) -> float | Gap:
    """The E-value of the limit nearest to 1; exactly 1 where the interval holds 1."""
    if not low <= high:
        return Gap("limits-disordered", {"low": low, "high": high})
    if not low >= 0.0:
        return Gap("not-positive", {"value": low})
    if low <= 1.0 <= high:
        return 1.0
    return e_value(low if low > 1.0 else high)


def ratio_of_common_odds(odds_ratio: float) -> float | Gap:
    """The risk ratio that an odds ratio of a common outcome is about: its square root (VanderWeele 2017)."""
    return math.sqrt(odds_ratio) if odds_ratio >= 0.0 else Gap("not-positive", {"value": odds_ratio})


def ratio_of_common_hazards(hazard_ratio: float) -> float | Gap:
    """The risk ratio that a hazard ratio of a common outcome is about: (1 - 0.5^sqrt(h)) / (1 - 0.5^sqrt(1/h)).

    0 at 0 and infinite at infinity. Source: VanderWeele and Ding 2017 (from memory).
    """
    if not hazard_ratio >= 0.0:
        return Gap("not-positive", {"value": hazard_ratio})
    if hazard_ratio == 0.0 or math.isinf(hazard_ratio):
        return hazard_ratio
    root = math.sqrt(hazard_ratio)
    return math.expm1(-math.log(2.0) * root) / math.expm1(-math.log(2.0) / root)
