"""Standard error, z and p of a printed interval; the interval of a printed p; Altman and Bland's approximations."""

from __future__ import annotations

import math

import pytest
from hypothesis import assume, given
from hypothesis import strategies as st

from fourcount.stats import difference, odds, ratio, recovery
from fourcount.stats.estimates import odds_ratio, risk_difference, risk_ratio
from fourcount.stats.normal import quantile, two_sided_p, z_of_p
from fourcount.stats.recovery import Recovery, approximate_from_p, approximate_p, approximate_z, from_limits, from_p
from fourcount.stats.results import GAP_KEYS, Gap, Interval
from tables import LEVELS, counts_of, given_interval

LEVEL = st.sampled_from(LEVELS)
RATIO = st.floats(1e-3, 1e3).filter(lambda value: abs(math.log(value)) > 1e-3)
DIFFERENCE = st.floats(-1, 1).filter(lambda value: abs(value) > 1e-3)
ERROR = st.floats(0.01, 3)


def _given(found: Recovery | Gap) -> Recovery:
    assert isinstance(found, Recovery), found
    return found


@given(RATIO, ERROR, LEVEL)
def test_a_ratio_goes_to_its_error_and_p_and_back(estimate: float, error: float, level: float) -> None:
    """An interval of known standard error tells it again, and its p gives the interval again, at any level."""
    reach = quantile(level) * error
    low, high = estimate * math.exp(-reach), estimate * math.exp(reach)
    found = _given(from_limits(estimate, low, high, level, log_scale=True))
    assert found.standard_error == pytest.approx(error, rel=1e-9)
    assert found.z == pytest.approx(math.log(estimate) / error, rel=1e-9)
    assume(1e-250 < found.p < 0.999)
    again = given_interval(from_p(estimate, found.p, level, log_scale=True))
    assert (again.low, again.high) == pytest.approx((low, high), rel=1e-6)


@given(DIFFERENCE, ERROR, LEVEL, LEVEL)
def test_a_difference_goes_to_its_error_and_p_and_back(estimate: float, error: float, level: float, to: float) -> None:
    """The same for a difference, the interval rebuilt at a level of choice."""
    reach = quantile(level) * error
    found = _given(from_limits(estimate, estimate - reach, estimate + reach, level, log_scale=False))
    assert (found.standard_error, found.z) == pytest.approx((error, estimate / error), rel=1e-9)
    assume(1e-250 < found.p < 0.999)
    again = given_interval(from_p(estimate, found.p, to, log_scale=False))
    reach = quantile(to) * error
    assert (again.low, again.high) == pytest.approx((estimate - reach, estimate + reach), rel=1e-6, abs=1e-9)


def test_textbook_intervals_tell_the_error_of_their_formula() -> None:
    """Woolf's, Katz's and Wald's intervals give back the root that their formulas take."""
    counts = counts_of((38, 374, 70, 339))
    cases = (
        (odds_ratio, odds.woolf, True, math.sqrt(1 / 38 + 1 / 374 + 1 / 70 + 1 / 339)),
        (risk_ratio, ratio.katz, True, math.sqrt(1 / 38 - 1 / 412 + 1 / 70 - 1 / 409)),
        (risk_difference, difference.wald, False, math.sqrt(38 * 374 / 412**3 + 70 * 339 / 409**3)),
    )
    for estimate_of, method, log_scale, error in cases:
        estimate, interval = estimate_of(counts), given_interval(method(counts, 0.9))
        assert not isinstance(estimate, Gap)
        found = _given(from_limits(estimate, interval.low, interval.high, 0.9, log_scale))
        assert found.standard_error == pytest.approx(error, rel=1e-11)


@given(RATIO, ERROR, LEVEL)
def test_p_and_interval_agree_about_no_effect(estimate: float, error: float, level: float) -> None:
    """The p lies below 1 - level just where the interval leaves 1 out."""
    reach = quantile(level) * error
    assume(abs(reach - abs(math.log(estimate))) > 1e-6)
    low, high = estimate * math.exp(-reach), estimate * math.exp(reach)
    found = _given(from_limits(estimate, low, high, level, log_scale=True))
    assert (found.p < 1 - level) == (not low <= 1 <= high)


def test_altman_and_bland_s_worked_p() -> None:
    """0.81 (0.70 to 0.94): z about -2.80 and p about 0.005 (Altman and Bland 2011, BMJ 343:d2304, from memory)."""
    found = _given(from_limits(0.81, 0.70, 0.94, 0.95, log_scale=True))
    assert found.z == pytest.approx(-2.80, abs=0.01)
    assert round(approximate_p(found.z), 3) == round(found.p, 3) == 0.005


@given(st.floats(0.2, 3))
def test_the_approximate_p_is_near_the_true_one(z: float) -> None:
    """Altman and Bland's p lies within 3% of the normal tail for z from 0.2 to 3."""
    assert approximate_p(z) == approximate_p(-z)
    assert approximate_p(z) == pytest.approx(two_sided_p(z), rel=0.03)


@given(st.floats(1e-3, 0.9))
def test_the_approximate_z_is_near_the_true_one(p: float) -> None:
    """Altman and Bland's z lies within 0.03 of the normal quantile down to a p of 0.001."""
    assert approximate_z(p) == pytest.approx(z_of_p(p), abs=0.03)


def test_the_approximate_z_of_a_p_of_1_is_not_below_0() -> None:
    """The formula gives -0.00002 there; 0 is given."""
    assert approximate_z(1.0) == 0.0


@pytest.mark.parametrize(
    ("estimate", "low", "high", "log_scale", "key"),
    [
        (0.5, 0.0, 0.9, True, "not-positive"),
        (-0.5, 0.2, 0.9, True, "not-positive"),
        (0.5, 0.9, 0.2, True, "limits-disordered"),
        (0.1, 0.2, 0.9, True, "limits-disordered"),
        (0.5, 0.5, 0.5, True, "no-width"),
        (0.5, 0.2, math.inf, True, "endless-limit"),
        (0.1, -math.inf, 0.2, False, "endless-limit"),
        (0.3, -0.1, 0.2, False, "limits-disordered"),
        (0.0, 0.0, 0.0, False, "no-width"),
    ],
)
def test_limits_that_tell_no_error_have_a_reason(
    estimate: float, low: float, high: float, log_scale: bool, key: str
) -> None:
    """Limits of 0, in the wrong order, without width or without end."""
    assert from_limits(estimate, low, high, 0.95, log_scale) == Gap(key)
    assert key in GAP_KEYS


@pytest.mark.parametrize("function", [from_p, approximate_from_p])
@pytest.mark.parametrize(
    ("estimate", "p", "log_scale", "key"),
    [
        (0.0, 0.03, True, "not-positive"),
        (math.inf, 0.03, True, "endless-limit"),
        (0.5, 0.0, True, "p-out-of-range"),
        (0.5, 1.0, True, "estimate-at-no-effect"),
        (0.5, 1.1, True, "p-out-of-range"),
        (0.5, -0.2, False, "p-out-of-range"),
        (1.0, 0.98, True, "estimate-at-no-effect"),
        (0.0, 0.98, False, "estimate-at-no-effect"),
    ],
)
def test_a_p_that_tells_no_interval_has_a_reason(
    function: object, estimate: float, p: float, log_scale: bool, key: str
) -> None:
    """A p of 0 or 1, an estimate at no effect, or one that has no logarithm."""
    assert callable(function)
    assert function(estimate, p, 0.95, log_scale) == Gap(key)
    assert key in GAP_KEYS


@given(st.floats(1e-3, 1e3), st.floats(0, 1, exclude_min=True, exclude_max=True), st.booleans())
def test_every_p_gives_an_ordered_interval_or_a_reason(estimate: float, p: float, log_scale: bool) -> None:
    """From the smallest double to the one below 1: limits in order, 0 and infinity allowed, never nan."""
    for function in (from_p, approximate_from_p):
        found = function(estimate, p, 0.95, log_scale)
        if isinstance(found, Interval):
            assert found.low <= estimate <= found.high
        else:
            assert found.key == "estimate-at-no-effect"


def test_a_huge_p_of_a_large_ratio_reaches_from_0_to_infinity() -> None:
    """Beyond the range of doubles the limits are 0 and infinite."""
    assert recovery.from_p(50.0, 0.999, 0.95, log_scale=True) == Interval(low=0.0, high=math.inf)
