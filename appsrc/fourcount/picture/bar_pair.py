"""Two risks as bars on one scale, as shares of the bars' full length."""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.picture.plan import Plan
from fourcount.picture.scales import risk_scale


@dataclass(frozen=True, kw_only=True, slots=True)
class Bar:
    """A bar's length, and the stretch that its interval leaves open, if it is drawn."""

    length: float
    low: float | None = None
    high: float | None = None


@dataclass(frozen=True, kw_only=True, slots=True)
class BarPair:
    """Both bars on a scale from 0 to the risk ``top``."""

    top: float
    without: Bar
    with_: Bar


def bar_pair(plan: Plan) -> BarPair:
    """Both bars on the least round scale that holds the two risks and the interval."""
    top = risk_scale((plan.without_risk, plan.with_risk, plan.high or 0.0)).high
    low = None if plan.low is None else plan.low / top
    high = None if plan.high is None else plan.high / top
    return BarPair(
        top=top, without=Bar(length=plan.without_risk / top), with_=Bar(length=plan.with_risk / top, low=low, high=high)
    )
