"""The ratio of two ratios and the difference of two differences."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.stats.homogeneity import breslow_day
from fourcount.stats.interaction import (
    Estimate,
    Interaction,
    difference_of_differences,
    ratio_of_ratios,
)
from fourcount.stats.normal import quantile, two_sided_p
from fourcount.stats.odds import woolf
from fourcount.stats.results import Gap, HomogeneityTest
from tables import LEVELS, counts_of, given_interval

LEVEL = st.sampled_from(LEVELS)
ERROR = st.floats(0.01, 2)
RATIO = st.tuples(st.floats(0.05, 20), ERROR)
DIFFERENCE = st.tuples(st.floats(-1, 1), ERROR)


def _ratio(drawn: tuple[float, float], level: float) -> Estimate:
    centre, reach = drawn[0], quantile(level) * drawn[1]
    return centre, centre * math.exp(-reach), centre * math.exp(reach)


def _difference(drawn: tuple[float, float], level: float) -> Estimate:
    return drawn[0], drawn[0] - quantile(level) * drawn[1], drawn[0] + quantile(level) * drawn[1]


@given(RATIO, RATIO, LEVEL)
def test_two_ratios_of_known_errors(first: tuple[float, float], second: tuple[float, float], level: float) -> None:
    """The standard errors add in squares on the log scale; z, p and the interval follow."""
    found = ratio_of_ratios(_ratio(first, level), _ratio(second, level), level)
    assert isinstance(found, Interaction)
    error = math.hypot(first[1], second[1])
    z = math.log(first[0] / second[0]) / error
    assert (found.standard_error, found.estimate) == pytest.approx((error, first[0] / second[0]), rel=1e-9)
    assert (found.z, found.p) == pytest.approx((z, two_sided_p(z)), rel=1e-6, abs=1e-9)
    assert math.log(found.high / found.estimate) == pytest.approx(quantile(level) * error, rel=1e-9)
    assert found.low * found.high == pytest.approx(found.estimate**2, rel=1e-9)


@given(DIFFERENCE, DIFFERENCE, LEVEL)
def test_two_differences_of_known_errors(first: tuple[float, float], second: tuple[float, float], level: float) -> None:
    """The same without logarithms."""
    found = difference_of_differences(_difference(first, level), _difference(second, level), level)
    assert isinstance(found, Interaction)
    error = math.hypot(first[1], second[1])
    assert found.estimate == first[0] - second[0]
    assert found.z == pytest.approx(found.estimate / error, rel=1e-7)
    assert found.p == two_sided_p(found.z)
    assert (found.low + found.high) / 2 == pytest.approx(found.estimate, abs=1e-12)
    assert found.high - found.low == pytest.approx(2 * quantile(level) * error, rel=1e-7)


@given(RATIO, RATIO)
def test_swapping_the_two_mirrors(first: tuple[float, float], second: tuple[float, float]) -> None:
    """The reciprocal ratio and limits, the opposite z, the same p."""
    one, two = _ratio(first, 0.95), _ratio(second, 0.95)
    there, back = ratio_of_ratios(one, two, 0.95), ratio_of_ratios(two, one, 0.95)
    assert isinstance(there, Interaction)
    assert isinstance(back, Interaction)
    assert (back.estimate, back.low, back.high) == pytest.approx((1 / there.estimate, 1 / there.high, 1 / there.low))
    assert (back.z, back.p, back.standard_error) == (-there.z, there.p, there.standard_error)


@given(RATIO)
def test_a_ratio_does_not_differ_from_itself(drawn: tuple[float, float]) -> None:
    """Equal ratios: 1, z of 0 and p of 1."""
    found = ratio_of_ratios(_ratio(drawn, 0.95), _ratio(drawn, 0.95), 0.95)
    assert isinstance(found, Interaction)
    assert (found.estimate, found.z, found.p) == (1, 0, 1)


def test_two_large_strata_differ_as_breslow_and_day_find_them_to() -> None:
    """The p of two Woolf odds ratios lies near that of Breslow and Day's test of the same two strata."""
    strata = [counts_of((380, 3740, 700, 3390)), counts_of((410, 3600, 600, 3500))]
    limits = [given_interval(woolf(t, 0.95)) for t in strata]
    ratios = [t.index_events * t.reference_non_events / (t.index_non_events * t.reference_events) for t in strata]
    first, second = ((r, interval.low, interval.high) for r, interval in zip(ratios, limits, strict=True))
    found, expected = ratio_of_ratios(first, second, 0.95), breslow_day(strata)
    assert isinstance(found, Interaction)
    assert isinstance(expected, HomogeneityTest)
    assert found.p == pytest.approx(expected.p, rel=0.01)


@pytest.mark.parametrize(
    ("second", "key"),
    [
        ((0.5, 0.0, 0.9), "not-positive"),
        ((0.5, 0.9, 0.2), "limits-disordered"),
        ((0.5, 0.2, math.inf), "endless-limit"),
        ((0.5, 0.5, 0.5), "no-width"),
    ],
)
def test_an_interval_that_tells_no_error_is_a_reason(second: Estimate, key: str) -> None:
    """Whichever of the two it is."""
    sound = (0.7, 0.5, 0.98)
    assert ratio_of_ratios(sound, second, 0.95) == ratio_of_ratios(second, sound, 0.95) == Gap(key)


def test_a_difference_without_width_is_a_reason() -> None:
    """Whichever of the two it is."""
    sound, flat = (0.1, 0.05, 0.15), (0.1, 0.1, 0.1)
    assert difference_of_differences(sound, flat, 0.95) == Gap("no-width")
    assert difference_of_differences(flat, sound, 0.95) == Gap("no-width")


WIDE = st.floats(1e-300, 1e300)
ANY_ESTIMATE = st.tuples(WIDE, WIDE, WIDE).map(sorted).map(lambda t: (t[1], t[0], t[2]))


@given(ANY_ESTIMATE, ANY_ESTIMATE, LEVEL)
def test_every_two_ratios_have_an_answer(first: Estimate, second: Estimate, level: float) -> None:
    """From one end of the doubles to the other: limits in order, 0 and infinity allowed, never nan, or a gap."""
    found = ratio_of_ratios(first, second, level)
    if isinstance(found, Gap):
        assert found == Gap("no-width")
    else:
        assert 0 <= found.low <= found.high
        assert 0 <= found.p <= 1
        assert math.isfinite(found.z)
