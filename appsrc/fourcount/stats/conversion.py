"""Effects carried to a starting risk, and the odds ratio seen as a risk ratio there."""

from __future__ import annotations

import math
from typing import Literal

from fourcount.stats.results import Gap

Effect = Literal["risk_ratio", "odds_ratio"]

_ROUNDING = 1e-12


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
    """The risk with the index treatment at a starting risk: P0 RR, or the risk whose odds are OR times those of P0.

    A risk ratio can ask for more than 100%: a gap, never cut to 100%. 0 times infinity is a gap too: an infinite
    effect at a starting risk of 0, an odds ratio of 0 at a starting risk of 1. Source: Cochrane Handbook 15.4.4.
    """
    if (baseline == 0.0 and math.isinf(value)) or (effect == "odds_ratio" and baseline == 1.0 and value == 0.0):
        return Gap("undetermined-at-baseline")
    if effect == "odds_ratio":
        return _risk_at_odds(value, baseline)
    risk = value * baseline
    if risk <= 1.0:
        return risk
    # 100% itself can come out a last bit above 1: 11/9 times 9/11 does.
    return 1.0 if risk <= 1.0 + _ROUNDING else Gap("beyond-one")


def _risk_at_odds(odds_ratio: float, baseline: float) -> float:
    if baseline == 1.0 or math.isinf(odds_ratio):
        return 1.0
    raised = baseline * odds_ratio
    return raised / (1.0 - baseline + raised)
