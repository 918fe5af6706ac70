"""Pooled estimates, their intervals and Cochran-Mantel-Haenszel's tests."""

from __future__ import annotations

import math
from collections.abc import Callable, Sequence

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.stats import association, difference, estimates, odds, ratio
from fourcount.stats import strata as pooled
from fourcount.stats.normal import quantile
from fourcount.stats.results import Counts, Gap, Interval
from tables import CELLS, LEVELS, assert_nested, counts_of, given_interval

Estimate = Callable[[Sequence[Counts]], float | Gap]
Pooling = Callable[[Sequence[Counts], float], Interval | Gap]

RATIOS: dict[Pooling, Estimate] = {
    pooled.robins_breslow_greenland: pooled.pooled_odds_ratio,
    pooled.greenland_robins_ratio: pooled.pooled_risk_ratio,
}
DIFFERENCES: dict[Pooling, Estimate] = {
    pooled.sato_difference: pooled.pooled_risk_difference,
    pooled.greenland_robins_difference: pooled.pooled_risk_difference,
}
POOLED = RATIOS | DIFFERENCES
TESTS = (pooled.cochran_mantel_haenszel, pooled.cochran_mantel_haenszel_corrected)

LIVE = st.tuples(*[st.integers(1, 60)] * 4).map(counts_of)
ANY = CELLS.map(counts_of)
STRATA = st.lists(LIVE, min_size=1, max_size=6)
SOME = st.lists(ANY, min_size=1, max_size=5)
WITHOUT_ANYTHING = [counts_of(cells) for cells in ((0, 0, 0, 0), (3, 4, 0, 0), (0, 0, 7, 2))]


def _swapped(counts: Counts) -> Counts:
    return Counts(
        index_events=counts.reference_events,
        index_non_events=counts.reference_non_events,
        reference_events=counts.index_events,
        reference_non_events=counts.index_non_events,
    )


def _of_other_outcome(counts: Counts) -> Counts:
    return Counts(
        index_events=counts.index_non_events,
        index_non_events=counts.index_events,
        reference_events=counts.reference_non_events,
        reference_non_events=counts.reference_events,
    )


def _close(found: Interval | Gap, expected: Interval | Gap) -> None:
    if isinstance(found, Gap) or isinstance(expected, Gap):
        assert found == expected
        return
    assert (found.low, found.high) == pytest.approx((expected.low, expected.high), rel=1e-9, abs=1e-12)


@given(LIVE)
def test_one_stratum_gives_the_crude_measures(counts: Counts) -> None:
    """With one stratum the pooled odds ratio, risk ratio and difference are the table's own."""
    for estimate, crude in (
        (pooled.pooled_odds_ratio, estimates.odds_ratio),
        (pooled.pooled_risk_ratio, estimates.risk_ratio),
        (pooled.pooled_risk_difference, estimates.risk_difference),
    ):
        assert estimate([counts]) == pytest.approx(crude(counts), rel=1e-13, abs=1e-15)


@given(LIVE, st.sampled_from(LEVELS))
def test_one_stratum_gives_the_textbook_intervals(counts: Counts, level: float) -> None:
    """With one stratum the intervals are Woolf's, Katz's and, for both variances of the difference, Wald's."""
    _close(pooled.robins_breslow_greenland([counts], level), odds.woolf(counts, level))
    _close(pooled.greenland_robins_ratio([counts], level), ratio.katz(counts, level))
    _close(pooled.greenland_robins_difference([counts], level), difference.wald(counts, level))
    _close(pooled.sato_difference([counts], level), difference.wald(counts, level))


@given(ANY)
def test_one_stratum_gives_the_n_minus_1_test(counts: Counts) -> None:
    """With one stratum Cochran-Mantel-Haenszel's p is that of the (N-1) chi-square."""
    found, expected = pooled.cochran_mantel_haenszel([counts]), association.n_minus_1(counts)
    if isinstance(expected, Gap):
        assert isinstance(found, Gap)
    else:
        assert found == pytest.approx(expected, rel=1e-9, abs=1e-300)


@given(LIVE, st.integers(2, 9))
def test_identical_strata_share_their_own_measures(counts: Counts, how_many: int) -> None:
    """Strata all alike pool to what each of them says; the half-width shrinks by the root of their number."""
    strata = [counts] * how_many
    assert pooled.pooled_odds_ratio(strata) == pytest.approx(estimates.odds_ratio(counts), rel=1e-13)
    assert pooled.pooled_risk_ratio(strata) == pytest.approx(estimates.risk_ratio(counts), rel=1e-13)
    assert pooled.pooled_risk_difference(strata) == pytest.approx(
        estimates.risk_difference(counts), rel=1e-12, abs=1e-15
    )
    for pooling in RATIOS:
        one, all_of_them = (given_interval(pooling(some, 0.95)) for some in ([counts], strata))
        shrunk = math.log(one.high / one.low) / math.sqrt(how_many)
        assert math.log(all_of_them.high / all_of_them.low) == pytest.approx(shrunk, rel=1e-9)


@pytest.mark.parametrize("pooling", POOLED)
@given(SOME, st.sampled_from(LEVELS))
def test_an_interval_holds_its_estimate(pooling: Pooling, strata: list[Counts], level: float) -> None:
    """Where there is an interval it is ordered and its pooled estimate lies within."""
    found = pooling(strata, level)
    if not isinstance(found, Gap):
        estimate = POOLED[pooling](strata)
        assert not isinstance(estimate, Gap)
        assert found.low <= estimate <= found.high


@pytest.mark.parametrize("pooling", POOLED)
@given(SOME)
def test_a_higher_level_gives_an_interval_around_the_lower_one(pooling: Pooling, strata: list[Counts]) -> None:
    """Each interval lies within that of the next level."""
    assert_nested([pooling(strata, level) for level in LEVELS])


@pytest.mark.parametrize("pooling", RATIOS)
@given(STRATA)
def test_swapping_the_groups_mirrors_a_ratio(pooling: Pooling, strata: list[Counts]) -> None:
    """The reciprocal estimate, its limits the reciprocal ones in turn."""
    there, back = (given_interval(pooling(some, 0.9)) for some in (strata, [_swapped(t) for t in strata]))
    assert (back.low, back.high) == pytest.approx((1 / there.high, 1 / there.low), rel=1e-11)


@pytest.mark.parametrize("pooling", DIFFERENCES)
@given(STRATA)
def test_swapping_the_groups_or_the_outcomes_mirrors_a_difference(pooling: Pooling, strata: list[Counts]) -> None:
    """The difference changes its sign, and so do its limits in turn."""
    there = given_interval(pooling(strata, 0.9))
    for mirrored in ([_swapped(t) for t in strata], [_of_other_outcome(t) for t in strata]):
        back = given_interval(pooling(mirrored, 0.9))
        assert (back.low, back.high) == pytest.approx((-there.high, -there.low), rel=1e-11, abs=1e-14)


@given(STRATA)
def test_swapping_the_outcomes_mirrors_the_odds_ratio(strata: list[Counts]) -> None:
    """The odds ratio of not having the event is the reciprocal."""
    there = given_interval(pooled.robins_breslow_greenland(strata, 0.9))
    back = given_interval(pooled.robins_breslow_greenland([_of_other_outcome(t) for t in strata], 0.9))
    assert (back.low, back.high) == pytest.approx((1 / there.high, 1 / there.low), rel=1e-11)


@given(SOME, st.randoms(use_true_random=False))
def test_the_order_of_the_strata_does_not_matter(strata: list[Counts], source: object) -> None:
    """Every figure is the same to the last digit whatever the order."""
    shuffled = list(strata)
    source.shuffle(shuffled)  # type: ignore[attr-defined]
    for pooling, estimate in POOLED.items():
        assert pooling(strata, 0.95) == pooling(shuffled, 0.95)
        assert estimate(strata) == estimate(shuffled)
    for test in TESTS:
        assert test(strata) == test(shuffled)


@given(STRATA)
def test_strata_that_compare_nothing_add_nothing(strata: list[Counts]) -> None:
    """Empty strata, and those in which a group is empty, leave every figure as it is."""
    for pooling, estimate in POOLED.items():
        assert pooling([*strata, *WITHOUT_ANYTHING], 0.95) == pooling(strata, 0.95)
        assert estimate([*strata, *WITHOUT_ANYTHING]) == estimate(strata)
    for test in TESTS:
        assert test([*strata, *WITHOUT_ANYTHING]) == test(strata)


@given(STRATA)
def test_strata_with_one_outcome_tell_nothing_of_the_odds_ratio(strata: list[Counts]) -> None:
    """Strata in which nobody, or everybody, had the event leave the odds ratio and the tests as they are."""
    more = [*strata, counts_of((0, 6, 0, 4)), counts_of((5, 0, 9, 0))]
    assert pooled.pooled_odds_ratio(more) == pooled.pooled_odds_ratio(strata)
    assert pooled.robins_breslow_greenland(more, 0.95) == pooled.robins_breslow_greenland(strata, 0.95)
    for test in TESTS:
        assert test(more) == test(strata)


@given(STRATA, st.sampled_from(LEVELS))
def test_a_limit_put_back_lies_z_standard_errors_from_the_estimate(strata: list[Counts], level: float) -> None:
    """The log distance of each limit over the error that the 50% interval tells is z of the level."""
    for pooling, estimate in RATIOS.items():
        centre = estimate(strata)
        assert not isinstance(centre, Gap)
        error = math.log(given_interval(pooling(strata, 0.5)).high / centre) / quantile(0.5)
        found = given_interval(pooling(strata, level))
        assert math.log(found.high / centre) / error == pytest.approx(quantile(level), rel=1e-9)
        assert math.log(centre / found.low) / error == pytest.approx(quantile(level), rel=1e-9)


@given(st.lists(st.integers(1, 40), min_size=2, max_size=6), st.integers(1, 5))
def test_strata_without_effect_pool_to_no_effect(sizes: list[int], odds_of_event: int) -> None:
    """Equal risks in every stratum: ratios of 1, a difference of 0, p of 1, and 1 or 0 in the middle of the limits."""
    strata = [counts_of((odds_of_event * k, k, odds_of_event * (k + 3), k + 3)) for k in sizes]
    assert (pooled.pooled_odds_ratio(strata), pooled.pooled_risk_ratio(strata)) == pytest.approx((1, 1))
    assert pooled.pooled_risk_difference(strata) == 0
    assert pooled.cochran_mantel_haenszel(strata) == 1
    assert pooled.cochran_mantel_haenszel_corrected(strata) == 1
    found = given_interval(pooled.robins_breslow_greenland(strata, 0.95))
    assert found.low * found.high == pytest.approx(1)


@given(STRATA)
def test_the_corrected_p_is_never_the_smaller_one(strata: list[Counts]) -> None:
    """The correction takes from the distance, never more than there is."""
    plain, corrected = (test(strata) for test in TESTS)
    assert not isinstance(plain, Gap)
    assert not isinstance(corrected, Gap)
    assert plain <= corrected <= 1


@pytest.mark.parametrize(
    ("cells", "odds_ratio", "risk_ratio"),
    [
        ([(0, 5, 3, 4), (0, 9, 1, 9)], 0.0, 0.0),
        ([(3, 4, 0, 5), (1, 9, 0, 9)], math.inf, math.inf),
    ],
)
def test_a_pooled_ratio_of_0_or_infinity_stands_without_an_interval(
    cells: list[tuple[int, ...]], odds_ratio: float, risk_ratio: float
) -> None:
    """Events in one group alone: the estimates stand, their logarithms have no standard error."""
    strata = [counts_of(t) for t in cells]
    assert (pooled.pooled_odds_ratio(strata), pooled.pooled_risk_ratio(strata)) == (odds_ratio, risk_ratio)
    assert pooled.robins_breslow_greenland(strata, 0.95) == Gap("endless-log")
    assert pooled.greenland_robins_ratio(strata, 0.95) == Gap("endless-log")
    assert isinstance(pooled.sato_difference(strata, 0.95), Interval)


@pytest.mark.parametrize(
    ("cells", "key"),
    [([(0, 5, 0, 4), (0, 9, 0, 9)], "no-events"), ([(5, 0, 4, 0), (9, 0, 2, 0)], "no-non-events")],
)
def test_one_outcome_throughout_is_a_reason(cells: list[tuple[int, ...]], key: str) -> None:
    """Nobody, or everybody, had the event in every stratum: no odds ratio and no test, and it is said why."""
    strata = [counts_of(t) for t in cells]
    assert pooled.pooled_odds_ratio(strata) == Gap(key)
    assert pooled.robins_breslow_greenland(strata, 0.95) == Gap(key)
    assert pooled.cochran_mantel_haenszel(strata) == Gap(key)
    assert pooled.pooled_risk_difference(strata) == 0
    assert pooled.sato_difference(strata, 0.95) == Gap("no-width")
    assert pooled.greenland_robins_difference(strata, 0.95) == Gap("no-width")


def test_everybody_had_the_event_gives_a_risk_ratio_without_width() -> None:
    """All risks 100%: the risk ratio is 1 and its interval would have no width."""
    strata = [counts_of((5, 0, 4, 0)), counts_of((9, 0, 2, 0))]
    assert pooled.pooled_risk_ratio(strata) == 1
    assert pooled.greenland_robins_ratio(strata, 0.95) == Gap("no-width")


def test_strata_that_each_tell_nothing_of_an_odds_ratio_are_none() -> None:
    """One stratum without events and one with nothing else: together no odds ratio, yet a risk ratio."""
    strata = [counts_of((0, 5, 0, 4)), counts_of((5, 0, 4, 0))]
    assert pooled.pooled_odds_ratio(strata) == Gap("no-strata")
    assert pooled.cochran_mantel_haenszel(strata) == Gap("no-strata")
    assert pooled.pooled_risk_ratio(strata) == 1


def test_confounding_that_pooling_takes_away() -> None:
    """Invented: the index group is sicker; the crude risk ratio is 2.3, in each stratum and pooled it is 0.8."""
    strata = [counts_of((160, 240, 50, 50)), counts_of((4, 96, 20, 380))]
    assert pooled.pooled_risk_ratio(strata) == pytest.approx(0.8)
    crude = counts_of((164, 336, 70, 430))
    assert estimates.risk_ratio(crude) == pytest.approx(2.343, abs=5e-4)


def test_a_thousand_strata_of_the_largest_counts() -> None:
    """Sums keep their digits: 1,000 strata of 10^9 a cell pool to no effect, with an interval of little width."""
    strata = [counts_of((10**9, 10**9, 10**9, 10**9))] * 1000
    found = given_interval(pooled.robins_breslow_greenland(strata, 0.95))
    expected = quantile(0.95) * math.sqrt(4 / 10**12)
    assert math.log(found.high) == pytest.approx(expected, rel=1e-9)


def test_counts_with_fractions_pool_as_whole_ones_do() -> None:
    """Strata halved by a design effect keep their measures; a pooled log interval is wider by the root of 2."""
    whole = [counts_of((3, 4, 5, 6)), counts_of((7, 4, 2, 9))]
    halved = [counts_of((1.5, 2, 2.5, 3)), counts_of((3.5, 2, 1, 4.5))]  # type: ignore[arg-type]
    for pooling, estimate in RATIOS.items():
        assert estimate(halved) == pytest.approx(estimate(whole))
        narrow, wide = given_interval(pooling(whole, 0.95)), given_interval(pooling(halved, 0.95))
        assert math.log(wide.high / wide.low) == pytest.approx(math.sqrt(2) * math.log(narrow.high / narrow.low))
