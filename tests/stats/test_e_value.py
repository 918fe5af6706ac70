"""The E-value and the conversions before it."""

from __future__ import annotations

import math

import mpmath
import pytest
from hypothesis import example, given
from hypothesis import strategies as st

from fourcount.stats.e_value import e_value, e_value_of_limit, ratio_of_common_hazards, ratio_of_common_odds
from fourcount.stats.results import Gap

RATIO = st.floats(1e-12, 1e12) | st.floats(0.5, 2.0)


def _plain(ratio: float) -> float:
    """R + sqrt(R (R - 1)) as printed, at 50 digits."""
    with mpmath.workdps(50):
        least = max(mpmath.mpf(ratio), 1 / mpmath.mpf(ratio))
        return float(least + mpmath.sqrt(least * (least - 1)))


def _number(value: float | Gap) -> float:
    assert isinstance(value, float), value
    return value


@given(ratio=RATIO)
@example(ratio=1.0)
@example(ratio=1 + 2**-52)
@example(ratio=1 - 2**-53)
@example(ratio=1e300)
@example(ratio=1e-300)
def test_is_the_published_formula(ratio: float) -> None:
    """To 1e-14 of the formula in 50-digit arithmetic, from near 1 to very far off, on either side."""
    assert _number(e_value(ratio)) == pytest.approx(_plain(ratio), rel=1e-14)


@given(ratio=RATIO)
def test_solves_the_bounding_factor(ratio: float) -> None:
    """A confounder that strong with both sides has the joint bounding factor E*E/(2E - 1), which is R itself."""
    value = _number(e_value(ratio))
    assert value * (value / (2 * value - 1)) == pytest.approx(max(ratio, 1 / ratio), rel=1e-9)


def test_at_the_ends() -> None:
    """1 where there is nothing to explain, infinite at 0 and infinity, a gap for what is no ratio."""
    assert e_value(1.0) == 1.0
    assert e_value(0.0) == e_value(math.inf) == math.inf
    for no_ratio in (-0.5, -math.inf, math.nan):
        found = e_value(no_ratio)
        assert isinstance(found, Gap)
        assert found.key == "not-positive"


@given(low=RATIO, high=RATIO)
def test_limit_nearest_one(low: float, high: float) -> None:
    """The E-value of the limit is that of the one nearer to 1, and exactly 1 where the interval holds 1."""
    low, high = sorted((low, high))
    found = e_value_of_limit(low, high)
    assert found == (1.0 if low <= 1.0 <= high else min(_number(e_value(low)), _number(e_value(high))))


def test_limits_at_the_ends() -> None:
    """A limit of 0 or infinity does no harm; 1 itself as a limit is held; disorder and negative limits are gaps."""
    assert e_value_of_limit(0.0, math.inf) == 1.0
    assert e_value_of_limit(1.0, 3.0) == e_value_of_limit(0.2, 1.0) == 1.0
    assert e_value_of_limit(0.0, 0.5) == e_value(0.5)
    assert e_value_of_limit(2.0, math.inf) == e_value(2.0)
    assert e_value_of_limit(0.0, 0.0) == math.inf
    for limits, key in (((2.0, 1.0), "limits-disordered"), ((math.nan, 2.0), "limits-disordered")):
        found = e_value_of_limit(*limits)
        assert isinstance(found, Gap)
        assert found.key == key
    negative = e_value_of_limit(-0.1, 0.5)
    assert isinstance(negative, Gap)
    assert negative.key == "not-positive"


@given(first=RATIO, second=RATIO)
def test_conversions_keep_order_and_sides(first: float, second: float) -> None:
    """Both conversions rise with the effect, keep 1, stay on its side, and turn a reciprocal into a reciprocal."""
    for convert in (ratio_of_common_odds, ratio_of_common_hazards):
        low, high = sorted((first, second))
        assert _number(convert(low)) <= _number(convert(high))
        assert _number(convert(1.0)) == 1.0
        assert (_number(convert(high)) - 1.0) * (high - 1.0) >= 0.0
        assert _number(convert(first)) * _number(convert(1 / first)) == pytest.approx(1.0, rel=1e-9)


@given(ratio=st.floats(1e-6, 1e6))
def test_hazard_ratio_converted_as_printed(ratio: float) -> None:
    """(1 - 0.5^sqrt(h)) / (1 - 0.5^sqrt(1/h)) in 50-digit arithmetic."""
    with mpmath.workdps(50):
        half, hazards = mpmath.mpf("0.5"), mpmath.mpf(ratio)
        plain = (1 - half ** mpmath.sqrt(hazards)) / (1 - half ** mpmath.sqrt(1 / hazards))
    assert _number(ratio_of_common_hazards(ratio)) == pytest.approx(float(plain), rel=1e-14)


def test_conversions_at_the_ends() -> None:
    """0 stays 0 and infinity infinity; a negative effect is a gap."""
    for convert in (ratio_of_common_odds, ratio_of_common_hazards):
        assert convert(0.0) == 0.0
        assert convert(math.inf) == math.inf
        assert isinstance(convert(-1.0), Gap)
        assert isinstance(convert(math.nan), Gap)
    assert ratio_of_common_odds(4.0) == 2.0
