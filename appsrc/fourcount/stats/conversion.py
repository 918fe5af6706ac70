"""Effects carried to a starting risk, and the odds ratio seen as a risk ratio there."""

from __future__ import annotations

import math
from typing import Literal

from fourcount.stats.hazards import risk_with_hazard
from fourcount.stats.results import Gap

Effect = Literal["risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio", "risk_difference"]

_ROUNDING = 1e-12
_LAST_BITS = 1e-15


def risk_ratio_from_odds_ratio(odds_ratio: float, baseline: float) -> float:
    """The risk ratio that this odds ratio means at a starting risk: OR / (1 - P0 + P0 OR).

    An infinite odds ratio means a certain event, so 1/P0 (infinite at P0 = 0). At a starting risk of 1 it is 1,
    whatever the odds ratio. Source: Zhang and Yu 1998, JAMA 280:1690; Grant 2014.
    """
    if baseline == 1.0:
        return 1.0
    if math.isinf(odds_ratio):
        return 1.0 / baseline if baseline > 0.0 else math.inf
    return odds_ratio / (1.0 - baseline + baseline * odds_ratio)


def risk_with(effect: Effect, value: float, baseline: float) -> float | Gap:
    """The risk with the index treatment at a starting risk, the effect being the same there.

    P0 RR; the risk whose odds are OR times those of P0; 1 - (1 - P0)^HR; P0 + RD. A rate ratio is carried as a hazard
    ratio is, the rates being constant. A risk ratio or a difference can ask for more than 100% or less than 0: a gap,
    never cut. 0 times infinity is a gap too: an infinite effect at a starting risk of 0, an odds or hazard ratio of 0
    at a starting risk of 1. Source: Cochrane Handbook 15.4.4; Altman and Andersen 1999, BMJ 319:1492.
    """
    if undetermined(effect, value, baseline):
        return Gap("undetermined-at-baseline")
    return a_risk(unbounded_risk(effect, value, baseline))


def undetermined(effect: Effect, value: float, baseline: float) -> bool:
    """Whether an effect without end meets nobody, or one of nothing everybody, so that no risk follows."""
    if baseline == 0.0 and math.isinf(value):
        return True
    return effect in ("odds_ratio", "hazard_ratio", "rate_ratio") and baseline == 1.0 and value == 0.0


def unbounded_risk(effect: Effect, value: float, baseline: float) -> float:
    """The same formula's figure whether or not it is a risk; not for what is undetermined."""
    if effect == "risk_ratio":
        return _everybody(value * baseline)
    if effect == "risk_difference":
        return _everybody(baseline + value)
    if effect == "odds_ratio":
        return _risk_at_odds(value, baseline)
    return risk_with_hazard(baseline, value)


def a_risk(figure: float) -> float | Gap:
    """The figure where it is a risk, else the gap that says which end it passes."""
    if 0.0 <= figure <= 1.0:
        return figure
    # 0 and 100% themselves can come out a last bit beyond: 11/9 times 9/11 does.
    if figure > 1.0:
        return 1.0 if figure <= 1.0 + _ROUNDING else Gap("beyond-one")
    return 0.0 if figure >= -_ROUNDING else Gap("carried-beyond-zero")


def _everybody(figure: float) -> float:
    """1 where only last bits are missing to it or beyond it: over a shorter span they would be no trifle."""
    return 1.0 if abs(figure - 1.0) < _LAST_BITS else figure


def _risk_at_odds(odds_ratio: float, baseline: float) -> float:
    if baseline == 1.0 or math.isinf(odds_ratio):
        return 1.0
    raised = baseline * odds_ratio
    return raised / (1.0 - baseline + raised)
