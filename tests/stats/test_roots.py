"""Roots inside a bracket."""

from __future__ import annotations

import math

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats.roots import increasing_root


@settings(max_examples=150)
@given(root=st.floats(1e-12, 1e12), start=st.floats(0.0, 1e13))
def test_a_cube_root_is_found_from_anywhere(root: float, start: float) -> None:
    """The start decides how long it takes, never what is found."""
    found = increasing_root(lambda x: (x**3 - root**3, 3 * x * x), 0.0, 1e13, start)
    assert found == pytest.approx(root, rel=1e-14)


def test_a_curve_may_be_infinite_at_both_ends() -> None:
    """Neither end of the bracket is evaluated: the logit of x is -2 at 1/(1 + e^2)."""
    found = increasing_root(lambda x: (math.log(x / (1 - x)) + 2, 1 / (x * (1 - x))), 0.0, 1.0, 0.999999)
    assert found == pytest.approx(1 / (1 + math.exp(2)), rel=1e-15)


def test_a_flat_stretch_before_the_root_is_crossed() -> None:
    """A slope of 0 gives way to halving: flat up to 10^9, the root just behind."""
    found = increasing_root(lambda x: (max(x - 1e9, 0.0) - 4.0, 1.0 if x > 1e9 else 0.0), 0.0, 4e9, math.inf)
    assert found == pytest.approx(1e9 + 4.0, rel=1e-15)


@pytest.mark.parametrize("slope", [1e-3, 0.5, 100.0])
def test_a_wrong_slope_costs_steps_only(slope: float) -> None:
    """Steps that leave the bracket, go to and fro or creep give way to halving."""
    assert increasing_root(lambda x: (x - 0.3, slope), 0.0, 1.0, 0.9) == pytest.approx(0.3, rel=1e-12)


def test_an_infinite_value_tells_only_the_side() -> None:
    """A tail that underflowed is minus infinity on a log scale: the bracket still closes."""

    def curve(x: float) -> tuple[float, float]:
        return (-math.inf, 0.0) if x < 0.5 else (math.log(x / 0.6), 1 / x)

    assert increasing_root(curve, 0.0, 1.0, 0.001) == pytest.approx(0.6, rel=1e-15)


def test_a_root_that_is_met_exactly_is_returned_at_once() -> None:
    """No step follows a value of exactly 0."""
    assert increasing_root(lambda x: (x - 0.5, 1.0), 0.0, 1.0, 0.5) == 0.5


def test_a_root_far_below_its_bracket_is_reached() -> None:
    """1e-250 between 0 and 1, without a slope: halving alone gets there."""
    assert increasing_root(lambda x: (x - 1e-250, 0.0), 0.0, 1.0, 0.5) == pytest.approx(1e-250, rel=1e-14)
