"""Intervals of one rate: against statsmodels and 40 digits, put back into the Poisson distribution, by properties."""

from __future__ import annotations

import math
from collections.abc import Callable

import mpmath
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from statsmodels.stats.rates import confint_poisson

from fourcount.stats import one_rate
from fourcount.stats.rates import rate
from fourcount.stats.results import Gap, Interval
from paired_tables import CELL, TIME, random_rates
from tables import LEVELS, assert_nested, given_interval

Method = Callable[[int, float, float], Interval | Gap]

METHODS = (one_rate.exact, one_rate.mid_p, one_rate.score, one_rate.wald)
LIBRARY = {one_rate.exact: "exact-c", one_rate.score: "score", one_rate.wald: "wald"}


@pytest.mark.parametrize("method", LIBRARY)
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_statsmodels_agrees(method: Method, level: float) -> None:
    """300 random counts of 0 to 80 in 1 to 5,000 units of time; no event: Wald's width would be zero."""
    for events, time, _, _ in random_rates(3, 300):
        found = method(events, time, level)
        if events == 0 and method is one_rate.wald:
            assert found == Gap("zero-width")
            continue
        low, high = confint_poisson(events, time, method=LIBRARY[method], alpha=1 - level)
        interval = given_interval(found)
        assert interval.high == pytest.approx(high, rel=1e-9)
        if events:
            assert max(interval.low, 0.0) == pytest.approx(low, rel=1e-9, abs=1e-12)  # statsmodels cuts at 0


def _at_most(events: int, mean: float, own: float) -> float:
    """P(X < x) + own share of P(X = x) of a Poisson count, term by term at 40 digits."""
    with mpmath.workdps(40):
        exactly = mpmath.mpf(mean)
        term, total = mpmath.mpf(1), mpmath.mpf(own)
        for count in range(events, 0, -1):
            term *= count / exactly
            total += term
            if term < total * mpmath.mpf(10) ** -25:
                break
        return float(total * mpmath.exp(events * mpmath.log(exactly) - exactly - mpmath.loggamma(events + 1)))


def _at_least(events: int, mean: float, own: float) -> float:
    """P(X > x) + own share of P(X = x), likewise."""
    with mpmath.workdps(40):
        exactly = mpmath.mpf(mean)
        term, total, count = mpmath.mpf(1), mpmath.mpf(own), events
        while term >= total * mpmath.mpf(10) ** -25:
            count += 1
            term *= exactly / count
            total += term
        return float(total * mpmath.exp(events * mpmath.log(exactly) - exactly - mpmath.loggamma(events + 1)))


@pytest.mark.parametrize(("method", "own"), [(one_rate.exact, 1.0), (one_rate.mid_p, 0.5)])
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
@pytest.mark.parametrize("events", [1, 2, 7, 40, 1000, 10**6, 10**7])
def test_limits_put_back_into_the_poisson_distribution(method: Method, own: float, level: float, events: int) -> None:
    """At either limit the tail from the observed count outwards holds half of what the level leaves."""
    interval = given_interval(method(events, 1.0, level))
    assert _at_least(events, interval.low, own) == pytest.approx((1 - level) / 2, rel=1e-9)
    assert _at_most(events, interval.high, own) == pytest.approx((1 - level) / 2, rel=1e-9)


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_no_event_in_closed_form(level: float) -> None:
    """From exactly 0 to -ln(alpha/2)/t exact, -ln(alpha)/t mid-P, z^2/t by score; 3/n is the rule of thumb at 95%."""
    tail = (1 - level) / 2
    assert given_interval(one_rate.exact(0, 20.0, level)) == Interval(low=0.0, high=pytest.approx(-math.log(tail) / 20))
    assert given_interval(one_rate.mid_p(0, 20.0, level)).high == pytest.approx(-math.log(2 * tail) / 20, rel=1e-13)
    assert given_interval(one_rate.score(0, 20.0, level)).low == 0
    assert given_interval(one_rate.score(0, 20.0, 0.95)).high == pytest.approx(1.959963984540054**2 / 20)


@pytest.mark.parametrize("method", METHODS)
def test_no_time_has_no_rate(method: Method) -> None:
    """No person-time: a gap, also for the estimate."""
    assert method(3, 0.0, 0.95) == rate(3, 0.0) == Gap("no-time")


@settings(max_examples=200)
@given(events=CELL, time=TIME, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate(events: int, time: float, level: float) -> None:
    """low <= rate <= high with a width above 0; only Wald's falls below 0."""
    estimate = rate(events, time)
    assert isinstance(estimate, float)
    for method in METHODS:
        found = method(events, time, level)
        if isinstance(found, Gap):
            assert (method, events) == (one_rate.wald, 0)
            continue
        assert found.low <= estimate <= found.high
        assert found.low < found.high
        assert found.low >= 0 or method is one_rate.wald


@settings(max_examples=100)
@given(events=CELL, time=TIME)
def test_a_higher_level_is_never_narrower_and_mid_p_lies_within_exact(events: int, time: float) -> None:
    """Each interval lies within the next higher level's, and the mid-P interval within the exact one."""
    for method in METHODS:
        assert_nested(method(events, time, level) for level in LEVELS)
    assert_nested(method(events, time, 0.95) for method in (one_rate.mid_p, one_rate.exact))
