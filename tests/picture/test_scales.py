"""The scales of the drawn strips: they hold what they show, on round ends, and never clip in silence."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.picture.scales import (
    DIFFERENCE_ENDS,
    RATIO_ENDS,
    RISK_ENDS,
    Scale,
    difference_scale,
    rate_difference_scale,
    rate_scale,
    ratio_scale,
    risk_scale,
)

RISK_LISTS = st.lists(st.floats(0, 1), min_size=1, max_size=6)
DIFFERENCE_LISTS = st.lists(st.floats(-1, 1), min_size=1, max_size=6)
RATIO_LISTS = st.lists(st.floats(0.01, 100), min_size=1, max_size=6)


@pytest.mark.parametrize(
    ("values", "high"),
    [([], 0.001), ([0.0], 0.001), ([0.092, 0.171, 0.211], 0.25), ([0.1], 0.1), ([0.1000001], 0.25), ([1.0], 1.0)],
)
def test_a_risk_scale_runs_from_0_to_the_least_round_risk(values: list[float], high: float) -> None:
    """Risks share a scale that starts at 0 and marks no effect nowhere."""
    assert risk_scale(values) == Scale(low=0.0, high=high)


@pytest.mark.parametrize(
    ("values", "end"),
    [([], 0.001), ([-0.126, -0.033], 0.15), ([0.02, -0.2], 0.25), ([-0.15], 0.15), ([-1.0, 1.0], 1.0)],
)
def test_a_difference_scale_has_no_difference_in_its_middle(values: list[float], end: float) -> None:
    """Fewer and more get the same room."""
    assert difference_scale(values) == Scale(low=-end, high=end, no_effect=0.0)


@pytest.mark.parametrize(
    ("values", "end"),
    [
        ([], 2.0),
        ([1.0], 2.0),
        ([0.49, 0.75], 4.0),
        ([2.0, 0.5], 2.0),
        ([0.32, 0.9], 4.0),
        ([11.0], 50.0),
        ([0.001], 100.0),
        ([5_000.0], 100.0),
        ([0.0, 0.7], 2.0),
        ([0.7, math.inf], 2.0),
    ],
)
def test_a_ratio_scale_is_logarithmic_and_symmetric_about_1(values: list[float], end: float) -> None:
    """Halving and doubling get the same room; 0 and infinity do not stretch the scale."""
    assert ratio_scale(values) == Scale(low=1 / end, high=end, logarithmic=True, no_effect=1.0)


@given(RISK_LISTS)
def test_a_risk_scale_holds_its_values_and_is_the_least(values: list[float]) -> None:
    """Every value lies on the scale, and the next smaller round end would not hold them all."""
    scale = risk_scale(values)
    assert all(0 <= scale.place(value) <= 1 for value in values)
    assert all(end < max(values) for end in RISK_ENDS if end < scale.high)


@given(DIFFERENCE_LISTS)
def test_a_difference_scale_holds_its_values_and_is_the_least(values: list[float]) -> None:
    """Every value lies on the scale, and the next smaller round end would not hold them all."""
    scale = difference_scale(values)
    assert all(0 <= scale.place(value) <= 1 for value in values)
    assert all(end < max(map(abs, values)) for end in DIFFERENCE_ENDS if end < scale.high)


@given(RATIO_LISTS)
def test_a_ratio_scale_holds_its_values_and_is_the_least(values: list[float]) -> None:
    """Every ratio from 1/100 to 100 lies on the scale, and the next smaller round end would not hold them all."""
    scale = ratio_scale(values)
    assert all(-1e-12 <= scale.place(value) <= 1 + 1e-12 for value in values)
    assert all(end < max(max(value, 1 / value) for value in values) for end in RATIO_ENDS if end < scale.high)


@pytest.mark.parametrize("scale", [risk_scale([0.2]), difference_scale([0.2]), ratio_scale([3.0])])
def test_the_ends_are_at_0_and_1(scale: Scale) -> None:
    """A value at an end of the scale stands at the end of the strip."""
    assert scale.place(scale.low) == pytest.approx(0, abs=1e-12)
    assert scale.place(scale.high) == pytest.approx(1)


@pytest.mark.parametrize("scale", [difference_scale([0.2]), ratio_scale([3.0])])
def test_no_effect_is_in_the_middle(scale: Scale) -> None:
    """No effect stands halfway along the strip."""
    assert scale.no_effect is not None
    assert scale.place(scale.no_effect) == pytest.approx(0.5)


@given(st.floats(1.0001, 1e6))
def test_a_ratio_and_its_reciprocal_mirror_each_other(ratio: float) -> None:
    """Twice as many and half as many are equally far from the middle."""
    scale = ratio_scale([ratio])
    assert scale.place(ratio) - 0.5 == pytest.approx(0.5 - scale.place(1 / ratio), abs=1e-9)


@given(st.floats(0.005, 200), st.floats(0.005, 200))
def test_a_larger_ratio_never_stands_left_of_a_smaller(one: float, other: float) -> None:
    """Places keep the order of values, on and off the scale."""
    scale = ratio_scale([2.0])
    assert (scale.place(min(one, other))) <= scale.place(max(one, other))


@pytest.mark.parametrize(("value", "place"), [(0.0, "before"), (math.inf, "after"), (1e-9, "before"), (1e9, "after")])
def test_a_ratio_beyond_the_scale_falls_outside(value: float, place: str) -> None:
    """0, infinity and extreme ratios are said to lie off the strip's ends, never moved onto it."""
    at = ratio_scale([value]).place(value)
    assert at < 0 if place == "before" else at > 1


@pytest.mark.parametrize(
    ("values", "high"),
    [
        ([], 1.0),
        ([0.0], 1.0),
        ([9.2, 17.1, 21.6], 25.0),
        ([1.0], 1.0),
        ([1.01], 1.5),
        ([0.0031], 0.005),
        ([8400.0], 10_000.0),
        ([math.inf, 3.0], 5.0),
    ],
)
def test_a_rate_scale_runs_from_0_to_the_least_round_rate(values: list[float], high: float) -> None:
    """Whatever the unit in which rates are shown."""
    scale = rate_scale(values)
    assert (scale.low, scale.no_effect) == (0.0, None)
    assert scale.high == pytest.approx(high)


@pytest.mark.parametrize(
    ("values", "end"), [([], 1.0), ([-7.9, -13.1, -3.0], 15.0), ([0.2, -0.12], 0.25), ([-40.0], 50.0)]
)
def test_a_scale_of_rate_differences_has_no_difference_in_its_middle(values: list[float], end: float) -> None:
    """Fewer and more get the same room."""
    scale = rate_difference_scale(values)
    assert (scale.low, scale.no_effect) == (-scale.high, 0.0)
    assert scale.high == pytest.approx(end)


@given(st.lists(st.floats(0, 1e9), min_size=1, max_size=6))
def test_a_rate_scale_holds_what_it_shows(values: list[float]) -> None:
    """Nothing runs off its end, and at least a tenth of it is used."""
    scale = rate_scale(values)
    assert all(0 <= scale.place(value) <= 1 + 1e-9 for value in values)
    assert max(values) == 0 or max(values) < 1e-300 or scale.place(max(values)) >= 0.1 - 1e-9
