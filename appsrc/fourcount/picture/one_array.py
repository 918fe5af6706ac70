"""One array for both groups: who has the event anyway, whom the change concerns, and who is not affected."""

from __future__ import annotations

from fourcount.picture.plan import Array, Plan


def one_array(plan: Plan) -> Array:
    """The array with all three states: affected either way, avoided or added on balance, affected in neither.

    It is the second group's array, in which the first group's icons are the affected and the avoided, or the affected
    alone. That the same people are meant is a way of speaking: only the totals are known.
    """
    return plan.with_
