"""One array for both groups: three states, and the totals of both in them."""

from __future__ import annotations

from hypothesis import given
from hypothesis import strategies as st

from fourcount.picture.one_array import one_array
from fourcount.picture.plan import Array, plan

RISKS = st.floats(0, 1)


def test_avoided_events_are_a_state_of_their_own() -> None:
    """12% against 6%: six have it either way, six do not on balance, 88 in neither group."""
    assert one_array(plan(0.12, 0.06)) == Array(affected=6, avoided=6, added=0, others=88)


def test_added_events_are_a_state_of_their_own() -> None:
    """6% against 12%: six have it either way, six more on balance."""
    assert one_array(plan(0.06, 0.12)) == Array(affected=6, avoided=0, added=6, others=88)


def test_without_a_change_there_are_two_states() -> None:
    """Equal risks show nobody for whom anything changes."""
    assert one_array(plan(0.12, 0.12)) == Array(affected=12, avoided=0, added=0, others=88)


@given(RISKS, RISKS)
def test_both_totals_can_be_counted_in_it(without: float, with_: float) -> None:
    """Affected and avoided are those of the first group, affected and added those of the second."""
    result = plan(without, with_)
    array = one_array(result)
    assert array.affected + array.avoided == result.without.affected
    assert array.affected + array.added == result.with_.affected + result.with_.added
    assert array.affected + array.avoided + array.added + array.others == (result.denominator or 0)
