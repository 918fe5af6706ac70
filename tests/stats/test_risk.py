"""Intervals of one risk: against 50-digit arithmetic, put back into their tails, and by their properties."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any

import mpmath
import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from statsmodels.discrete.discrete_model import Logit

from fourcount.stats import risk
from fourcount.stats.results import Gap, Interval
from tables import LEVELS, assert_nested, given_interval

METHODS = (
    risk.wilson,
    risk.wilson_continuity,
    risk.clopper_pearson,
    risk.mid_p,
    risk.wald,
    risk.logit,
    risk.agresti_coull,
    risk.jeffreys,
)
NONE_AT_THE_ENDS = (risk.wald, risk.logit)
WITH_LIMITS_AT_THE_ENDS = tuple(method for method in METHODS if method not in NONE_AT_THE_ENDS)
Method = Callable[[int, int, float], Interval | Gap]

GROUPS = st.tuples(
    st.integers(0, 80) | st.sampled_from([10**5, 10**9]), st.integers(0, 80) | st.sampled_from([10**5, 10**9])
).filter(any)
"""Events and others, somebody in the group."""


def _wilson(x: Any, n: Any, z: Any) -> tuple[Any, Any]:
    root = z * mpmath.sqrt(z * z + 4 * x * (1 - x / n))
    return (2 * x + z * z - root) / (2 * (n + z * z)), (2 * x + z * z + root) / (2 * (n + z * z))


def _wilson_continuity(x: Any, n: Any, z: Any) -> tuple[Any, Any]:
    p, scale = x / n, 2 * (n + z * z)
    low = (2 * x + z * z - 1 - z * mpmath.sqrt(z * z - 2 - 1 / n + 4 * p * (n * (1 - p) + 1))) / scale if x else 0
    high = (2 * x + z * z + 1 + z * mpmath.sqrt(z * z + 2 - 1 / n + 4 * p * (n * (1 - p) - 1))) / scale if x < n else 1
    return low, high


def _wald(x: Any, n: Any, z: Any) -> tuple[Any, Any]:
    half_width = z * mpmath.sqrt(x / n * (1 - x / n) / n)
    return x / n - half_width, x / n + half_width


def _logit(x: Any, n: Any, z: Any) -> tuple[Any, Any]:
    factor = mpmath.exp(z * mpmath.sqrt(1 / x + 1 / (n - x)))
    low, high = x / (n - x) / factor, x / (n - x) * factor
    return low / (1 + low), high / (1 + high)


def _agresti_coull(x: Any, n: Any, z: Any) -> tuple[Any, Any]:
    p = (x + z * z / 2) / (n + z * z)
    half_width = z * mpmath.sqrt(p * (1 - p) / (n + z * z))
    return max(0, p - half_width), min(1, p + half_width)


@pytest.mark.parametrize(
    ("method", "printed"),
    [
        (risk.wilson, _wilson),
        (risk.wilson_continuity, _wilson_continuity),
        (risk.wald, _wald),
        (risk.logit, _logit),
        (risk.agresti_coull, _agresti_coull),
    ],
)
@pytest.mark.parametrize("level", LEVELS)
def test_closed_forms_keep_every_digit(
    method: Method, printed: Callable[..., Any], level: float, exact_z: Callable[[float], Any]
) -> None:
    """Equal to the printed formula in 50 digits, from single events to 10^9 of 2 x 10^9, to 1e-12 of each limit."""
    z = exact_z(level)
    for events in (0, 1, 2, 7, 100, 10**5, 10**9 - 1, 10**9):
        for others in (0, 1, 3, 100, 10**9):
            interval = method(events, events + others, level) if events + others else Gap("empty-group")
            if isinstance(interval, Gap):
                continue
            with mpmath.workdps(50):
                low, high = printed(mpmath.mpf(events), mpmath.mpf(events + others), z)
            assert interval.low == pytest.approx(float(low), rel=1e-12, abs=1e-30)
            assert interval.high == pytest.approx(float(high), rel=1e-12)


def _at_most(x: int, n: int, p: float) -> Any:
    """P(X <= x) and P(X = x) of a binomial, summed in 50 digits."""
    q = mpmath.mpf(p)
    terms = [mpmath.binomial(n, k) * q**k * (1 - q) ** (n - k) for k in range(x + 1)]
    return mpmath.fsum(terms), terms[-1]


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
@pytest.mark.parametrize(("events", "total"), [(1, 1), (1, 10), (5, 100), (50, 100), (99, 100), (30, 2 * 10**9)])
def test_exact_limits_put_back_into_their_tails(events: int, total: int, level: float) -> None:
    """At each limit the binomial tail holds half of what the level leaves to 1, with or without half of P(X = x)."""
    half = (1 - level) / 2
    exact, middle = (
        given_interval(risk.clopper_pearson(events, total, level)),
        given_interval(risk.mid_p(events, total, level)),
    )
    with mpmath.workdps(50):
        at_most, equal = _at_most(events, total, exact.low)
        assert float(1 - at_most + equal) == pytest.approx(half, rel=1e-12)
        at_most, equal = _at_most(events, total, middle.low)
        assert float(1 - at_most + equal / 2) == pytest.approx(half, rel=1e-12)
        if events < total:
            at_most, equal = _at_most(events, total, exact.high)
            assert float(at_most) == pytest.approx(half, rel=1e-12)
            at_most, equal = _at_most(events, total, middle.high)
            assert float(at_most - equal / 2) == pytest.approx(half, rel=1e-12)


STORED = (
    (risk.clopper_pearson, 682, 925, 0.707668264079039, 0.7654065582415253),
    (risk.mid_p, 682, 925, 0.7082057643753055, 0.7649058354679316),
    (risk.jeffreys, 682, 925, 0.7082258165034296, 0.7648864606853041),
    (risk.clopper_pearson, 10, 100000, 4.795489513901142e-05, 0.0001838958453766498),
    (risk.mid_p, 10, 100000, 5.079629977542232e-05, 0.00017824124285956472),
    (risk.jeffreys, 10, 100000, 5.141560942296516e-05, 0.00017738707141990833),
    (risk.clopper_pearson, 1, 1000000000, 2.5317807983969402e-11, 5.571643378203114e-09),
    (risk.mid_p, 1, 1000000000, 5.0020344835275936e-11, 4.931860514595369e-09),
    (risk.jeffreys, 1, 1000000000, 1.0789764133310246e-10, 4.674201792492542e-09),
    (risk.clopper_pearson, 30, 2000000000, 1.0120437032872005e-08, 2.141343262873703e-08),
    (risk.mid_p, 30, 2000000000, 1.0305761095421596e-08, 2.1143069345257516e-08),
    (risk.jeffreys, 30, 2000000000, 1.0325784492168368e-08, 2.111910929344731e-08),
    (risk.clopper_pearson, 1000, 1000000000, 9.38973046589561e-07, 1.0639521019952884e-06),
    (risk.mid_p, 1000, 1000000000, 9.394499272061598e-07, 1.0634444734728836e-06),
    (risk.jeffreys, 1000, 1000000000, 9.394575523478543e-07, 1.0634366115602348e-06),
    (risk.clopper_pearson, 100000, 1000000, 0.09941266986603788, 0.10058964818742552),
    (risk.mid_p, 100000, 1000000, 0.0994131677423566, 0.10058914769993582),
    (risk.jeffreys, 100000, 1000000, 0.09941316855795058, 0.10058914688223707),
    (risk.clopper_pearson, 999999999, 1000000000, 0.9999999944283566, 0.9999999999746821),
    (risk.mid_p, 999999999, 1000000000, 0.9999999950681395, 0.9999999999499797),
    (risk.jeffreys, 999999999, 1000000000, 0.9999999953257982, 0.9999999998921023),
    (risk.clopper_pearson, 1000000000, 2000000000, 0.49997808668649885, 0.5000219133135011),
    (risk.mid_p, 1000000000, 2000000000, 0.49997808693649337, 0.5000219130635066),
    (risk.jeffreys, 1000000000, 2000000000, 0.49997808693649887, 0.5000219130635012),
)
"""Limits at 95%: (method, events, total, low, high), rounded from 40 digits.

The incomplete beta function by its continued fraction (DLMF 8.17.22) in mpmath at 40 digits, and Newton's method
from the double's neighbourhood until the step was under 1e-25.
"""


@pytest.mark.parametrize(("method", "events", "total", "low", "high"), STORED)
def test_limits_of_large_groups(method: Method, events: int, total: int, low: float, high: float) -> None:
    """Among them 1000 of 10^9, where scipy 1.17's own inverse of the beta distribution is wrong by a factor of 2."""
    interval = given_interval(method(events, total, 0.95))
    assert interval.low == pytest.approx(low, rel=1e-12)
    assert interval.high == pytest.approx(high, rel=1e-12)


def test_no_event_in_closed_form() -> None:
    """0 of 20: 1 - 0.025^(1/20) exact, 1 - 0.05^(1/20) mid-P (printed in Newcombe 1998, table I, from memory)."""
    assert given_interval(risk.clopper_pearson(0, 20, 0.95)).high == pytest.approx(0.1684, abs=5e-5)
    assert given_interval(risk.mid_p(0, 20, 0.95)).high == pytest.approx(0.1391, abs=5e-5)
    assert given_interval(risk.clopper_pearson(20, 20, 0.95)).low == pytest.approx(1 - 0.1684, abs=5e-5)
    assert given_interval(risk.clopper_pearson(0, 10**9, 0.95)).high == pytest.approx(-math.log(0.025) * 1e-9, rel=1e-8)


@pytest.mark.parametrize("method", WITH_LIMITS_AT_THE_ENDS)
@pytest.mark.parametrize("total", [1, 2, 20, 10**6, 2 * 10**9])
def test_nobody_and_everybody_have_a_limit_of_their_own(method: Method, total: int) -> None:
    """No event: from exactly 0. Nothing but events: up to exactly 1."""
    nobody, everybody = given_interval(method(0, total, 0.95)), given_interval(method(total, total, 0.95))
    assert (nobody.low, everybody.high) == (0.0, 1.0)
    assert 0 < nobody.high <= 1
    assert 0 <= everybody.low < 1


def test_the_bare_textbook_formula_gives_no_zero_width() -> None:
    """Wald at 0 and at n is withheld; where it leaves 0 to 1 it is given as it is (1/29: below 0, Newcombe 1998)."""
    assert risk.wald(0, 20, 0.95) == risk.wald(20, 20, 0.95) == Gap("zero-width")
    assert given_interval(risk.wald(1, 29, 0.95)).low < 0
    assert given_interval(risk.wald(28, 29, 0.95)).high > 1


@pytest.mark.parametrize(("events", "total"), [(1, 29), (38, 412), (70, 409), (9, 10)])
def test_the_logit_interval_is_that_of_a_logistic_regression(events: int, total: int) -> None:
    """statsmodels' logistic regression on nothing but an intercept has the same limits of the log odds."""
    outcomes = np.repeat([1.0, 0.0], [events, total - events])
    fitted = Logit(outcomes, np.ones(total)).fit(disp=False, tol=1e-14)
    low, high = (1 / (1 + math.exp(-limit)) for limit in fitted.conf_int(alpha=0.05)[0])
    interval = given_interval(risk.logit(events, total, 0.95))
    assert (interval.low, interval.high) == pytest.approx((low, high), rel=1e-9)


def test_the_logit_interval_does_not_exist_where_all_share_an_outcome() -> None:
    """0/20 and 20/20: the log odds are infinite."""
    assert risk.logit(0, 20, 0.95) == risk.logit(20, 20, 0.95) == Gap("one-outcome")


@pytest.mark.parametrize("method", METHODS)
def test_an_empty_group_has_no_interval(method: Method) -> None:
    """Nobody in the group: a gap."""
    assert method(0, 0, 0.95) == Gap("empty-group")


@settings(max_examples=120)
@given(group=GROUPS, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate_and_keep_to_0_and_1(group: tuple[int, int], level: float) -> None:
    """low <= p <= high; all but Wald's lie within 0 to 1."""
    events, total = group[0], sum(group)
    for method in METHODS:
        interval = method(events, total, level)
        if isinstance(interval, Gap):
            assert method in NONE_AT_THE_ENDS
            continue
        assert interval.low <= events / total <= interval.high
        assert interval.low < interval.high
        if method is not risk.wald:
            assert 0 <= interval.low <= interval.high <= 1


@settings(max_examples=80)
@given(group=GROUPS)
def test_a_higher_level_is_never_narrower(group: tuple[int, int]) -> None:
    """Each interval lies within the one of the next higher level."""
    events, total = group[0], sum(group)
    for method in METHODS:
        assert_nested(method(events, total, level) for level in LEVELS)


@settings(max_examples=80)
@given(group=GROUPS, level=st.sampled_from(LEVELS))
def test_the_other_outcome_mirrors(group: tuple[int, int], level: float) -> None:
    """Counting the other outcome turns the limits round 1/2."""
    events, others = group
    for method in METHODS:
        one, other = method(events, events + others, level), method(others, events + others, level)
        if isinstance(one, Gap):
            assert one == other
            continue
        assert one.low == pytest.approx(1 - given_interval(other).high, abs=1e-13)
        assert one.high == pytest.approx(1 - given_interval(other).low, abs=1e-13)
