"""Estimates of pairs and the intervals of their odds ratio."""

from __future__ import annotations

import math
from collections.abc import Callable

import mpmath
import numpy as np
import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st
from scipy.stats import beta
from statsmodels.discrete.conditional_models import ConditionalLogit

from fourcount.stats import mcnemar, pairs
from fourcount.stats.results import Gap, Interval, PairCounts
from paired_tables import CELL, pairs_of, random_pairs
from tables import LEVELS, assert_nested, given_interval

Method = Callable[[PairCounts, float], Interval | Gap]

METHODS = (pairs.exact_discordant, pairs.mid_p_discordant, pairs.log_discordant)
CONDITIONAL = METHODS[:2]
DISCORDANT = st.tuples(CELL, CELL).filter(any)


def _of(index_only: int, reference_only: int) -> PairCounts:
    return pairs_of((4, index_only, reference_only, 5))


def test_estimates() -> None:
    """27 both, 29 index only, 3 reference only, 4 neither: risks 56/63 and 30/63 and what follows from them."""
    counts = pairs_of((27, 29, 3, 4))
    assert (pairs.risk_index(counts), pairs.risk_reference(counts)) == (56 / 63, 30 / 63)
    assert (pairs.difference(counts), pairs.ratio(counts), pairs.odds_ratio(counts)) == (26 / 63, 56 / 30, 29 / 3)


def test_estimates_at_zeros() -> None:
    """Without a pair nothing, without an event no ratio, without discordance no odds ratio; else 0 or infinity."""
    nobody = pairs_of((0, 0, 0, 0))
    for estimate in (pairs.risk_index, pairs.risk_reference, pairs.difference, pairs.ratio, pairs.odds_ratio):
        assert estimate(nobody) == Gap("empty-pairs")
    agreeing, without_events = pairs_of((3, 0, 0, 2)), pairs_of((0, 0, 0, 2))
    assert (pairs.odds_ratio(agreeing), pairs.ratio(without_events)) == (Gap("no-discordant-pairs"), Gap("no-events"))
    assert (pairs.difference(agreeing), pairs.ratio(agreeing), pairs.risk_index(without_events)) == (0, 1, 0)
    index_only, reference_only = pairs_of((0, 3, 0, 2)), pairs_of((0, 0, 3, 2))
    assert (pairs.odds_ratio(index_only), pairs.ratio(index_only)) == (math.inf, math.inf)
    assert (pairs.odds_ratio(reference_only), pairs.ratio(reference_only)) == (0, 0)


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_exact_limits_are_those_of_the_beta_distribution(level: float) -> None:
    """300 random tables: scipy's quantiles of the beta distribution, turned into odds."""
    tail = (1 - level) / 2
    for cells in random_pairs(7, 300):
        _, f, g, _ = cells
        if f + g == 0:
            continue
        interval = given_interval(pairs.exact_discordant(pairs_of(cells), level))
        low = beta.ppf(tail, f, g + 1) if f else 0.0
        high = beta.isf(tail, f + 1, g) if g else 1.0
        assert interval.low == pytest.approx(low / (1 - low), rel=1e-10)
        assert interval.high == (pytest.approx(high / (1 - high), rel=1e-10) if g else math.inf)


def _tail_at_least(f: int, g: int, odds: float, own: float) -> float:
    """P(X > f) + own share of P(X = f), X binomial of f + g at the risk of these odds, term by term at 40 digits."""
    with mpmath.workdps(40):
        exactly = mpmath.mpf(odds)
        log_split = mpmath.loggamma(f + g + 1) - mpmath.loggamma(f + 1) - mpmath.loggamma(g + 1)
        term, total = mpmath.mpf(1), mpmath.mpf(own)
        for step in range(g):
            term *= mpmath.mpf(g - step) / (f + 1 + step) * exactly
            total += term
            if term < total * mpmath.mpf(10) ** -25:
                break
        return float(total * mpmath.exp(log_split + f * mpmath.log(exactly) - (f + g) * mpmath.log1p(exactly)))


SPLITS = (
    (1, 7),
    (29, 3),
    (5, 0),
    (0, 9),
    (1, 1),
    (40, 40),
    (0, 1),
    (2, 70),
    (10**6, 1_002_000),
    (10**9, 1),
    (3, 10**9),
)


@pytest.mark.parametrize(("method", "own"), [(pairs.exact_discordant, 1.0), (pairs.mid_p_discordant, 0.5)])
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_limits_put_back_into_the_binomial(method: Method, own: float, level: float) -> None:
    """At either limit the tail from the observed split outwards holds half of what the level leaves."""
    tail = (1 - level) / 2
    for f, g in SPLITS:
        interval = given_interval(method(_of(f, g), level))
        if f:
            assert _tail_at_least(f, g, interval.low, own) == pytest.approx(tail, rel=1e-9), (f, g)
        if g:
            assert _tail_at_least(g, f, 1 / interval.high, own) == pytest.approx(tail, rel=1e-9), (f, g)
        assert (interval.low == 0, interval.high == math.inf) == (f == 0, g == 0)


@pytest.mark.parametrize("method", CONDITIONAL)
def test_the_way_for_many_begins_where_that_for_few_ends(method: Method) -> None:
    """Twenty thousand discordant pairs and one more: the limits' distances from the estimate shrink as 1/sqrt."""
    few, more = (given_interval(method(_of(12_000, rest), 0.95)) for rest in (8_000, 8_001))
    assert math.log(few.low / more.low) == pytest.approx(math.log(8_001 / 8_000), rel=0.02)
    assert math.log(few.high / more.high) == pytest.approx(math.log(8_001 / 8_000), rel=0.02)


def test_log_limits_are_those_of_a_conditional_logistic_regression() -> None:
    """29 against 3 discordant pairs: statsmodels' estimate and limits, to its optimiser's 3 digits."""
    outcomes = np.tile([1, 0], 32)
    exposed = np.array([1, 0] * 29 + [0, 1] * 3)[:, None]
    fitted = ConditionalLogit(outcomes, exposed, groups=np.repeat(np.arange(32), 2)).fit(disp=False)
    low, high = (math.exp(limit) for limit in fitted.conf_int(alpha=0.05)[0])
    interval = given_interval(pairs.log_discordant(_of(29, 3), 0.95))
    assert math.exp(fitted.params[0]) == pytest.approx(29 / 3, rel=1e-3)
    assert (interval.low, interval.high) == pytest.approx((low, high), rel=1e-3)


@settings(max_examples=200)
@given(discordant=DISCORDANT, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate_and_mirror(discordant: tuple[int, int], level: float) -> None:
    """low <= f/g <= high; exchanging the sides turns the limits upside down."""
    f, g = discordant
    estimate = pairs.odds_ratio(_of(f, g))
    assert isinstance(estimate, float)
    for method in METHODS:
        one, other = method(_of(f, g), level), method(_of(g, f), level)
        if isinstance(one, Gap):
            assert one == other == Gap("zero-count")
            assert 0 in discordant
            continue
        mirrored = given_interval(other)
        assert one.low <= estimate <= one.high
        assert one.low < one.high
        assert one.low == pytest.approx(1 / mirrored.high, rel=1e-11)
        assert one.high == (pytest.approx(1 / mirrored.low, rel=1e-11) if mirrored.low else math.inf)


@settings(max_examples=100)
@given(discordant=DISCORDANT)
def test_a_higher_level_is_never_narrower_and_mid_p_lies_within_exact(discordant: tuple[int, int]) -> None:
    """Each interval lies within the next higher level's, and the mid-P interval within the exact one."""
    counts = _of(*discordant)
    for method in METHODS:
        assert_nested(method(counts, level) for level in LEVELS)
    assert_nested(method(counts, 0.95) for method in reversed(CONDITIONAL))


@settings(max_examples=400)
@given(discordant=DISCORDANT, level=st.sampled_from(LEVELS))
def test_conditional_intervals_and_their_tests_agree_about_no_effect(discordant: tuple[int, int], level: float) -> None:
    """An interval leaves 1 out exactly where the p of its own test is below what the level leaves."""
    counts = _of(*discordant)
    for method, test in zip(CONDITIONAL, (mcnemar.mcnemar_exact, mcnemar.mcnemar_mid_p), strict=True):
        p = test(counts)
        assert isinstance(p, float)
        assume(abs(p - (1 - level)) > 1e-9)  # on the border itself a last bit decides
        interval = given_interval(method(counts, level))
        assert (not interval.low <= 1 <= interval.high) == (p < 1 - level)


@pytest.mark.parametrize("method", METHODS)
def test_without_discordance_there_is_no_interval(method: Method) -> None:
    """All pairs agree, or there is none: a gap that says which."""
    assert method(pairs_of((3, 0, 0, 5)), 0.95) == Gap("no-discordant-pairs")
    assert method(pairs_of((0, 0, 0, 0)), 0.95) == Gap("empty-pairs")
