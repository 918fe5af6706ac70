"""Differences and ratios of rates: against statsmodels, put back into their statistics, and by their properties."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any

import mpmath
import pytest
from hypothesis import assume, example, given, settings
from hypothesis import strategies as st
from scipy.stats import binom
from statsmodels.stats.rates import confint_poisson_2indep
from statsmodels.stats.rates import test_poisson_2indep as library_test

from fourcount.stats import rates
from fourcount.stats.results import Gap, Interval, Rates
from paired_tables import EXTREME_RATES, RATES, random_rates, rates_of
from tables import LEVELS, assert_nested, given_interval

Method = Callable[[Rates, float], Interval | Gap]
Table = tuple[int, float, int, float]

DIFFERENCE = (rates.miettinen_nurminen_difference, rates.wald_difference)
RATIO = (rates.exact_ratio, rates.mid_p_ratio, rates.score_ratio, rates.log_ratio)
TESTS = (rates.binomial_exact, rates.binomial_mid_p, rates.rate_score)
SOME = random_rates(5, 200)


def _given(value: float | Gap) -> float:
    assert isinstance(value, float), value
    return value


def test_estimates() -> None:
    """11 in 800 against 21 in 3011, the example of R's poisson.test: ratio 1.971488."""
    counts = rates_of((11, 800.0, 21, 3011.0))
    assert rates.rate_ratio(counts) == pytest.approx(1.971488, abs=5e-7)
    assert rates.rate_difference(counts) == 11 / 800 - 21 / 3011
    assert rates.rate(11, 800.0) == 0.01375


def test_estimates_at_zeros() -> None:
    """No time: a gap. No event at all: no ratio, and a difference of 0. None on one side: 0 or infinity."""
    for table in ((3, 0.0, 2, 5.0), (3, 5.0, 2, 0.0)):
        assert rates.rate_ratio(rates_of(table)) == rates.rate_difference(rates_of(table)) == Gap("no-time")
    nothing = rates_of((0, 4.0, 0, 5.0))
    assert (rates.rate_ratio(nothing), rates.rate_difference(nothing)) == (Gap("no-events"), 0)
    assert rates.rate_ratio(rates_of((0, 4.0, 2, 5.0))) == 0
    assert rates.rate_ratio(rates_of((2, 4.0, 0, 5.0))) == math.inf


@pytest.mark.parametrize(
    ("method", "compare", "name", "digits"),
    [
        (rates.wald_difference, "diff", "wald", 1e-10),
        (rates.log_ratio, "ratio", "wald-log", 1e-10),
        (rates.score_ratio, "ratio", "score", 2e-4),  # its root-finding stops early
    ],
)
def test_statsmodels_agrees_about_intervals(method: Method, compare: str, name: str, digits: float) -> None:
    """200 random tables without zeros."""
    for table in SOME:
        if 0 in table:
            continue
        low, high = confint_poisson_2indep(*table, method=name, compare=compare)
        interval = given_interval(method(rates_of(table), 0.95))
        room = digits * (high - low) if compare == "diff" else 0.0
        assert (interval.low, interval.high) == pytest.approx((low, high), rel=digits, abs=room), table


def test_statsmodels_agrees_about_score_limits_of_the_difference() -> None:
    """Its own score test of either limit has the p 0.05.

    Its interval is no oracle: for 17 in 2281.6 against 3 in 20.1, where its own test of equal rates gives a p of 1e-11,
    its interval in 0.15.0 has limits on both sides of 0.
    """
    for table in SOME:
        if 0 in table:
            continue
        interval = given_interval(rates.miettinen_nurminen_difference(rates_of(table), 0.95))
        for limit in (interval.low, interval.high):
            p = library_test(*table, value=limit, method="score", compare="diff").pvalue
            assert p == pytest.approx(0.05, rel=1e-8), (table, limit)


def test_libraries_agree_about_p() -> None:
    """200 random tables: statsmodels' score test, and twice the smaller tail of scipy's binomial distribution."""
    for table in SOME:
        x1, t1, x2, t2 = table
        if x1 + x2 == 0:
            assert [test(rates_of(table)) for test in TESTS] == [Gap("no-events")] * 3
            continue
        counts, split = rates_of(table), binom(x1 + x2, t1 / (t1 + t2))
        if x1 and x2:  # else statsmodels divides by zero
            p = library_test(*table, value=1, method="score").pvalue
            assert _given(rates.rate_score(counts)) == pytest.approx(p, rel=1e-9, abs=1e-300)
        below, above, own = split.cdf(x1), split.sf(x1 - 1), split.pmf(x1)
        assert _given(rates.binomial_exact(counts)) == pytest.approx(min(1, 2 * min(below, above)), rel=1e-9)
        assert _given(rates.binomial_mid_p(counts)) == pytest.approx(2 * min(below, above) - own, rel=1e-9)


STORED = (
    ((10**9, 1e9, 10**9, 1_000_100_000.0), 0.02535610650908777, 0.02535464164469346),
    ((10**6, 3.0, 2_003_000, 6.0), 0.2211202483967909, 0.2208893624338727),
    ((12, 1e-9, 10**9, 0.1), 0.6064477108058785, 0.5116673799558682),
    ((40, 7.5, 10, 3.25), 0.1477013042348873, 0.1111815619330139),
)
"""Rates, exact p, mid-P p: the binomial tail term by term in mpmath at 40 digits, which takes seconds for the first."""


@pytest.mark.parametrize(("table", "exact", "mid_p"), STORED)
def test_p_among_very_many_events(table: Table, exact: float, mid_p: float) -> None:
    """Two thousand million events keep eleven digits of p."""
    assert _given(rates.binomial_exact(rates_of(table))) == pytest.approx(exact, rel=1e-11)
    assert _given(rates.binomial_mid_p(rates_of(table))) == pytest.approx(mid_p, rel=1e-11)


def _difference_statistic(table: Table) -> Callable[[Any], Any]:
    """The published statistic; the likeliest reference rate is the root of a quadratic equation."""
    x1, t1, x2, t2 = (mpmath.mpf(value) for value in table)

    def at(d0: Any) -> Any:
        # x1/(R+d0) + x2/R = t1 + t2
        middle = d0 * (t1 + t2) - x1 - x2
        reference = (mpmath.sqrt(middle**2 + 4 * (t1 + t2) * x2 * d0) - middle) / (2 * (t1 + t2))
        return (x1 / t1 - x2 / t2 - d0) / mpmath.sqrt((reference + d0) / t1 + reference / t2)

    return at


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_score_limits_of_the_difference_put_back_into_the_statistic(
    level: float, exact_z: Callable[[float], Any], distance_from_root: Callable[..., float]
) -> None:
    """At each limit the published statistic is z, from no event to 10^9 in tiny and huge person-time."""
    z = exact_z(level)
    for table in [*EXTREME_RATES, *SOME]:
        interval = given_interval(rates.miettinen_nurminen_difference(rates_of(table), level))
        for limit, target in ((interval.low, z), (interval.high, -z)):
            distance = distance_from_root(_difference_statistic(table), limit, target)
            assert distance <= max(1e-13 * abs(limit), 1e-13 * (interval.high - interval.low)), (table, limit)


def _share_statistic(table: Table, ratio: float) -> float:
    """How far x1 lies from its share under a ratio, in standard deviations."""
    with mpmath.workdps(50):
        x1, t1, x2, t2 = (mpmath.mpf(value) for value in table)
        index, reference = mpmath.mpf(ratio) * t1, t2
        return float((x1 * reference - x2 * index) / mpmath.sqrt((x1 + x2) * index * reference))


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_score_limits_of_the_ratio_put_back_into_the_statistic(level: float, exact_z: Callable[[float], Any]) -> None:
    """At each limit the split of the events lies z standard deviations off its expectation."""
    z = float(exact_z(level))
    for table in [*EXTREME_RATES, *SOME]:
        if table[0] + table[2] == 0:
            continue
        interval = given_interval(rates.score_ratio(rates_of(table), level))
        if table[0]:
            assert _share_statistic(table, interval.low) == pytest.approx(z, rel=1e-9), table
        if table[2]:
            assert _share_statistic(table, interval.high) == pytest.approx(-z, rel=1e-9), table
        assert (interval.low == 0, interval.high == math.inf) == (table[0] == 0, table[2] == 0)


@pytest.mark.parametrize(("method", "off"), [(rates.exact_ratio, 0), (rates.mid_p_ratio, 0.5)])
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_conditional_limits_put_back_into_the_binomial(method: Method, off: float, level: float) -> None:
    """At either limit the tail of x1 from the observed split outwards holds half of what the level leaves."""
    for x1, t1, x2, t2 in ((11, 800.0, 21, 3011.0), (1, 2.0, 9, 0.5), (30, 1e-3, 60, 7.0), (1, 1.0, 1, 1.0)):
        interval = given_interval(method(rates_of((x1, t1, x2, t2)), level))
        below, above = (binom(x1 + x2, odds / (1 + odds)) for odds in (interval.low * t1 / t2, interval.high * t1 / t2))
        assert below.sf(x1 - 1) - off * below.pmf(x1) == pytest.approx((1 - level) / 2, rel=1e-9)
        assert above.cdf(x1) - off * above.pmf(x1) == pytest.approx((1 - level) / 2, rel=1e-9)


def test_no_event_at_all() -> None:
    """The difference keeps a score interval, -z^2/t2 to z^2/t1; the ratio and the tests have nothing to say."""
    counts = rates_of((0, 10.0, 0, 20.0))
    square = 1.959963984540054**2
    interval = given_interval(rates.miettinen_nurminen_difference(counts, 0.95))
    assert (interval.low, interval.high) == pytest.approx((-square / 20, square / 10))
    assert rates.wald_difference(counts, 0.95) == Gap("zero-width")
    assert {method(counts, 0.95).key for method in RATIO} == {"no-events"}  # type: ignore[union-attr]


def test_one_group_without_events_has_no_log_interval() -> None:
    """0 against 5: the log of the ratio is infinite; all other methods answer."""
    counts = rates_of((0, 10.0, 5, 20.0))
    assert rates.log_ratio(counts, 0.95) == Gap("zero-count")
    for method in (*RATIO[:3], *DIFFERENCE):
        assert isinstance(method(counts, 0.95), Interval)


@pytest.mark.parametrize("answer", [*(lambda r, m=m: m(r, 0.95) for m in (*DIFFERENCE, *RATIO)), *TESTS])
def test_without_time_there_is_nothing(answer: Callable[[Rates], object]) -> None:
    """No person-time in a group: a gap."""
    assert answer(rates_of((3, 0.0, 2, 5.0))) == answer(rates_of((3, 5.0, 2, 0.0))) == Gap("no-time")


@settings(max_examples=200)
@given(table=RATES, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate_and_mirror(table: Table, level: float) -> None:
    """low <= estimate <= high; exchanging the groups changes the sign of differences, turns ratios upside down."""
    x1, t1, x2, t2 = table
    counts, other = rates_of(table), rates_of((x2, t2, x1, t1))
    for methods, estimate in ((DIFFERENCE, rates.rate_difference(counts)), (RATIO, rates.rate_ratio(counts))):
        for method in methods:
            found, swapped = method(counts, level), method(other, level)
            if isinstance(found, Gap):
                assert found == swapped
                continue
            mirrored = given_interval(swapped)
            assert found.low <= _given(estimate) <= found.high
            assert found.low < found.high
            if method in DIFFERENCE:
                assert (found.low, found.high) == pytest.approx((-mirrored.high, -mirrored.low), rel=1e-12)
                continue
            assert found.low == pytest.approx(1 / mirrored.high, rel=1e-11)
            assert found.high == (pytest.approx(1 / mirrored.low, rel=1e-11) if mirrored.low else math.inf)
    for test in TESTS:
        p = test(counts)
        if isinstance(p, float):
            assert 0 <= p <= 1
            assert p == pytest.approx(_given(test(other)), rel=1e-9, abs=1e-300)


@settings(max_examples=100)
@given(table=RATES)
def test_a_higher_level_is_never_narrower_and_mid_p_lies_within_exact(table: Table) -> None:
    """Each interval lies within the next higher level's, and the mid-P interval within the exact one."""
    counts = rates_of(table)
    for method in (*DIFFERENCE, *RATIO):
        assert_nested(method(counts, level) for level in LEVELS)
    assert_nested(method(counts, 0.95) for method in (rates.mid_p_ratio, rates.exact_ratio))


@settings(max_examples=100)
@given(table=RATES, unit=st.sampled_from([1e-5, 12.0, 365.25, 1e6]))
def test_another_unit_of_time_changes_no_ratio_and_no_p(table: Table, unit: float) -> None:
    """Person-years into person-months: ratios and p stay, differences shrink by the unit."""
    x1, t1, x2, t2 = table
    counts, other = rates_of(table), rates_of((x1, t1 * unit, x2, t2 * unit))
    for method in RATIO:
        found, same = method(counts, 0.95), method(other, 0.95)
        if isinstance(found, Interval):
            limits = given_interval(same)
            assert (found.low, found.high) == pytest.approx((limits.low, limits.high), rel=1e-11)
    difference = given_interval(rates.miettinen_nurminen_difference(counts, 0.95))
    smaller = given_interval(rates.miettinen_nurminen_difference(other, 0.95))
    room = 1e-12 * (difference.high - difference.low)
    limits = (difference.low, difference.high)
    assert (smaller.low * unit, smaller.high * unit) == pytest.approx(limits, rel=1e-12, abs=room)


@settings(max_examples=400)
@given(table=RATES, level=st.sampled_from(LEVELS))
@example(table=(5, 10.0, 0, 20.0), level=0.95)
@example(table=(0, 10.0, 0, 20.0), level=0.95)
def test_the_three_score_methods_agree_about_no_effect(table: Table, level: float) -> None:
    """The score intervals of difference and ratio leave no effect out together, and just where the score p says so."""
    counts = rates_of(table)
    p = rates.rate_score(counts)
    assume(isinstance(p, Gap) or abs(p - (1 - level)) > 1e-9)  # on the border itself a last bit decides
    difference = given_interval(rates.miettinen_nurminen_difference(counts, level))
    apart = [not difference.low <= 0 <= difference.high]
    ratio = rates.score_ratio(counts, level)
    if isinstance(ratio, Interval):
        apart.append(not ratio.low <= 1 <= ratio.high)
    assert set(apart) == {isinstance(p, float) and p < 1 - level}


@settings(max_examples=300)
@given(table=RATES, level=st.sampled_from(LEVELS))
def test_conditional_intervals_and_their_tests_agree_about_no_effect(table: Table, level: float) -> None:
    """An interval leaves 1 out exactly where the p of its own test is below what the level leaves."""
    counts = rates_of(table)
    for method, test in ((rates.exact_ratio, rates.binomial_exact), (rates.mid_p_ratio, rates.binomial_mid_p)):
        p = test(counts)
        if isinstance(p, Gap):
            assert method(counts, level) == p
            continue
        assume(abs(p - (1 - level)) > 1e-9)
        interval = given_interval(method(counts, level))
        assert (not interval.low <= 1 <= interval.high) == (p < 1 - level)
