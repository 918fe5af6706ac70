"""The starting risk of people without an exposure, from the risk of all and the share who have it.

The risk of all is P = (1 - e) p0 + e p1, with p1 the risk of the exposed. It is solved for p0, the effect of the
exposure being given; at each limit of the effect it has to be solved again.
"""

from __future__ import annotations

import math

from fourcount.stats.conversion import Effect, a_risk, unbounded_risk, undetermined
from fourcount.stats.results import Gap
from fourcount.stats.roots import increasing_root

_MOST = 1e300  # a hazard under which nobody is left, to the last bit


def starting_risk_from_overall(measure: Effect, effect: float, overall: float, exposed_share: float) -> float | Gap:
    """The risk of the unexposed at which the unexposed and the exposed together have the overall risk.

    Closed forms for the odds ratio, the risk ratio and the difference; a hazard ratio, and a rate ratio carried alike,
    is solved. A gap where the unexposed, or the exposed at that starting risk, would have a risk below 0 or above 1,
    and where an effect without end leaves the starting risk open. Source: algebra of the mixture.
    """
    if not 0.0 <= exposed_share <= 1.0:
        return Gap("prevalence-out-of-range")
    start = _start(measure, effect, overall, exposed_share)
    if isinstance(start, Gap) or exposed_share == 0.0:
        return start
    if undetermined(measure, effect, start):
        return Gap("undetermined-at-baseline")
    with_ = a_risk(unbounded_risk(measure, effect, start))
    return with_ if isinstance(with_, Gap) else start


def _start(measure: Effect, effect: float, overall: float, share: float) -> float | Gap:
    if share == 0.0:
        return overall
    if effect == 0.0 and share == 1.0 and measure != "risk_difference":
        return Gap("undetermined-at-baseline") if overall == 0.0 else Gap("beyond-one")
    if measure == "risk_difference":
        return a_risk(overall - share * effect)
    if measure == "risk_ratio":
        return a_risk(overall / (1.0 - share + share * effect))
    if math.isinf(effect):
        return _under_certainty(overall, share)
    return _from_odds(effect, overall, share) if measure == "odds_ratio" else _from_hazards(effect, overall, share)


def _under_certainty(overall: float, share: float) -> float | Gap:
    """All the exposed have the event: what is left of the overall risk belongs to the unexposed."""
    if overall <= share:
        return Gap("undetermined-at-baseline")
    return (overall - share) / (1.0 - share)


def _from_odds(odds_ratio: float, overall: float, share: float) -> float | Gap:
    """2P / (b + sqrt(b^2 + 4 a P)), a = (1-e)(o-1), b = e o + 1 - e - P(o-1): the one root from 0 to 1.

    With o = 0 it is P/(1-e), which must not pass 1.
    """
    if odds_ratio == 0.0:
        return a_risk(overall / (1.0 - share))
    if overall in (0.0, 1.0):
        return overall
    a = (1.0 - share) * (odds_ratio - 1.0)
    b = share * odds_ratio + 1.0 - share - overall * (odds_ratio - 1.0)
    root = math.sqrt(max(b * b + 4.0 * a * overall, 0.0))
    # With b below 0 the same root has to be taken from the other side, or its digits would cancel.
    return 2.0 * overall / (b + root) if b >= 0.0 else (root - b) / (2.0 * a)


def _from_hazards(hazard_ratio: float, overall: float, share: float) -> float | Gap:
    """The p0 at which (1-e) p0 + e (1 - (1-p0)^h) is the overall risk, found on the scale of ln(1 - p0)."""
    if hazard_ratio == 0.0:
        return a_risk(overall / (1.0 - share))
    if overall in (0.0, 1.0):
        return overall

    def curve(hazard: float) -> tuple[float, float]:
        left, left_exposed = math.exp(-hazard), math.exp(-hazard * hazard_ratio)
        risk = -(1.0 - share) * math.expm1(-hazard) - share * math.expm1(-hazard * hazard_ratio)
        return risk - overall, (1.0 - share) * left + share * hazard_ratio * left_exposed

    whole = -math.log1p(-overall)
    # The hazard of all lies between that of the unexposed and that of the exposed.
    low, high = sorted((whole, min(whole / hazard_ratio, _MOST)))
    start = -math.expm1(-increasing_root(curve, low * (1.0 - 1e-9), high * (1.0 + 1e-9), whole))
    # So near to everybody that no digit is left to carry the effect from.
    return start if start < 1.0 else Gap("next-to-certain")
