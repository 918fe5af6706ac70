"""What a relative figure sounds like, beside the same two risks as shares of all people."""

from __future__ import annotations

from dataclasses import dataclass
from math import isinf

from fourcount.picture.plan import Plan


@dataclass(frozen=True, kw_only=True, slots=True)
class RelativePlan:
    """Lengths of two pairs of bars, as shares of the full length.

    ``sounds`` measures both groups by the one with the larger risk, whose bar is full: with a ratio below 1 that is
    the reference. ``people`` measures both by all people, as it is.
    """

    sounds: tuple[float, float]
    people: tuple[float, float]


def relative_plan(plan: Plan) -> RelativePlan | None:
    """Both pairs, without before with; None where there is no relative figure: nobody, or next to nobody, without."""
    without, with_ = plan.without_risk, plan.with_risk
    if not without or isinf(with_ / without):
        return None
    most = max(without, with_)
    return RelativePlan(sounds=(without / most, with_ / most), people=(without, with_))
