"""The relative figure beside what it is in people."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.picture.plan import plan
from fourcount.picture.relative import RelativePlan, relative_plan

SOME = st.floats(1e-6, 1)


def test_a_reduction_makes_the_reference_bar_full() -> None:
    """12% against 6%: it sounds like all and half; in people it is 12 and 6 of 100."""
    assert relative_plan(plan(0.12, 0.06)) == RelativePlan(sounds=(1.0, 0.5), people=(0.12, 0.06))


def test_an_increase_makes_the_other_bar_full() -> None:
    """6% against 12%: no bar is longer than its scale."""
    assert relative_plan(plan(0.06, 0.12)) == RelativePlan(sounds=(0.5, 1.0), people=(0.06, 0.12))


@pytest.mark.parametrize(("without", "with_"), [(0.0, 0.0), (0.0, 0.3), (5e-324, 0.3)])
def test_nobody_affected_without_gives_no_relative_figure(without: float, with_: float) -> None:
    """0 against 30% has no ratio that is a number, and 0 against 0 has none: nothing is drawn in its place."""
    assert relative_plan(plan(without, with_)) is None


@given(SOME, st.floats(0, 1))
def test_both_pairs_say_the_same_ratio(without: float, with_: float) -> None:
    """Both pairs of bars stand in the same ratio; what sounds so much more is the scale alone."""
    result = relative_plan(plan(without, with_))
    assert result is not None
    assert result.people == (without, with_)
    assert max(result.sounds) == 1
    assert result.sounds[1] * without == pytest.approx(result.sounds[0] * with_)


@given(SOME)
def test_equal_risks_are_two_full_bars(risk: float) -> None:
    """No change sounds like no change."""
    result = relative_plan(plan(risk, risk))
    assert result is not None
    assert result.sounds == (1.0, 1.0)
