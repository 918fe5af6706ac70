"""The design effect, and the methods on what it leaves of the counts."""

from __future__ import annotations

import math
from collections.abc import Callable

import pytest
from hypothesis import assume, given
from hypothesis import strategies as st

from fourcount.stats import association, difference, estimates, odds, ratio, risk
from fourcount.stats.clusters import design_effect, effective
from fourcount.stats.methods import METHODS, TESTS, Method
from fourcount.stats.normal import quantile
from fourcount.stats.results import Counts, FractionalCounts, Gap, Interval
from tables import CELLS, EXTREMES, LEVELS, assert_nested, counts_of, given_interval

Table = Callable[..., Counts]
TwoGroups = Callable[[FractionalCounts, float], Interval | Gap]
OneGroup = Callable[[float, float, float], Interval | Gap]

INNER = st.tuples(*[st.integers(1, 5000)] * 4)
EFFECT = st.sampled_from((1.25, 1.6, 2.2, 3.0))
EXACT = ("clopper-pearson", "mid-p", "baptista-pike-mid-p", "conditional-exact", "conditional-mid-p")


def _key(value: object) -> str:
    assert isinstance(value, Gap), value
    return value.key


def _interval(method: Method, counts: FractionalCounts, level: float) -> Interval | Gap:
    if method.measure == "risk":
        return method.interval(counts.index_events, counts.index_total, level)
    return method.interval(counts, level)


def test_design_effect() -> None:
    """1 + (m - 1) ICC; clusters of one person, or people who are no more alike than others, have 1."""
    assert design_effect(25.0, 0.05) == pytest.approx(2.2)
    assert design_effect(1.0, 0.3) == design_effect(40.0, 0.0) == 1.0
    assert design_effect(40.0, 1.0) == 40.0


def test_design_effect_out_of_range() -> None:
    """A correlation outside 0 to 1 and a cluster of less than one person are gaps, with the value typed."""
    for icc in (-0.01, 1.01, math.nan, math.inf):
        assert _key(design_effect(20.0, icc)) == "icc-out-of-range"
    for size in (0.9, 0.0, -3.0, math.nan, math.inf):
        assert _key(design_effect(size, 0.05)) == "cluster-below-one"
    found = design_effect(20.0, 1.5)
    assert isinstance(found, Gap)
    assert found.facts["icc"] == 1.5


def test_effect_of_one_changes_nothing(table: Table) -> None:
    """Counts without clusters stay the whole counts they are, and so keep their exact methods."""
    counts = table(38, 374, 70, 339)
    assert effective(counts, 1.0) is counts


@given(cells=CELLS, effect=EFFECT)
def test_estimates_stay(cells: tuple[int, ...], effect: float) -> None:
    """Risks, difference, ratio and odds ratio do not move when all counts are divided alike."""
    counts = counts_of(cells)
    fewer = effective(counts, effect)
    assert fewer.total == pytest.approx(counts.total / effect)
    for estimate in (estimates.risk_difference, estimates.risk_ratio, estimates.odds_ratio):
        whole, part = estimate(counts), estimate(fewer)
        if isinstance(whole, Gap):
            assert part == whole
        else:
            assert part == pytest.approx(whole, rel=1e-9, abs=1e-12)


def _wider_level(level: float, effect: float) -> float:
    """The level whose z is sqrt(effect) times that of this one."""
    return math.erf(quantile(level) * math.sqrt(effect / 2))


@pytest.mark.parametrize(
    "method",
    [difference.mee, difference.newcombe, difference.wald, ratio.koopman, ratio.katz, odds.cornfield, odds.woolf],
)
@given(cells=INNER, level=st.sampled_from((0.8, 0.9, 0.95)), effect=EFFECT)
def test_dividing_counts_is_widening_z(method: TwoGroups, cells: tuple[int, ...], level: float, effect: float) -> None:
    """Where the statistic is proportional to the people, the interval is that of the whole counts at sqrt(effect) z.

    The whole counts' intervals are held to printed and library figures; this ties the fractions to them.
    """
    counts = counts_of(cells)
    found = given_interval(method(effective(counts, effect), level))
    whole = given_interval(method(counts, _wider_level(level, effect)))
    assert (found.low, found.high) == pytest.approx((whole.low, whole.high), rel=1e-9, abs=1e-11)


@pytest.mark.parametrize("method", [risk.wilson, risk.wald, risk.logit, risk.agresti_coull])
@given(cells=INNER, level=st.sampled_from((0.8, 0.9, 0.95)), effect=EFFECT)
def test_likewise_for_one_risk(method: OneGroup, cells: tuple[int, ...], level: float, effect: float) -> None:
    """The same of the intervals of one risk that need no whole numbers."""
    counts = counts_of(cells)
    fewer = effective(counts, effect)
    found = given_interval(method(fewer.index_events, fewer.index_total, level))
    whole = given_interval(method(counts.index_events, counts.index_total, _wider_level(level, effect)))
    assert (found.low, found.high) == pytest.approx((whole.low, whole.high), rel=1e-9, abs=1e-11)


@pytest.mark.parametrize(
    ("finite", "plain"),
    [
        (difference.miettinen_nurminen, difference.mee),
        (ratio.miettinen_nurminen, ratio.koopman),
        (odds.miettinen_nurminen, odds.cornfield),
    ],
)
@given(cells=INNER, effect=EFFECT)
def test_finite_factor_is_that_of_the_people_left(
    finite: TwoGroups, plain: TwoGroups, cells: tuple[int, ...], effect: float
) -> None:
    """Miettinen and Nurminen's interval is the plain one at z sqrt(N/(N-1)), N being the people that are left."""
    fewer = effective(counts_of(cells), effect)
    assume(fewer.total > 2)
    found = given_interval(finite(fewer, 0.9))
    like = given_interval(plain(fewer, math.erf(quantile(0.9) * math.sqrt(fewer.total / (fewer.total - 1) / 2))))
    assert (found.low, found.high) == pytest.approx((like.low, like.high), rel=1e-9, abs=1e-11)


@given(cells=INNER, effect=EFFECT)
def test_chi_square_is_divided(cells: tuple[int, ...], effect: float) -> None:
    """Pearson's statistic is the whole counts' over the effect, and the (N-1) one that of the people left."""
    counts = counts_of(cells)
    fewer = effective(counts, effect)
    assume(fewer.total > 1)
    across = counts.index_events * counts.reference_non_events - counts.index_non_events * counts.reference_events
    margins = counts.index_total * counts.reference_total * counts.events * counts.non_events
    chi_square = counts.total * across**2 / margins / effect
    for test, share in ((association.pearson, 1.0), (association.n_minus_1, 1 - 1 / fewer.total)):
        assert test(fewer) == pytest.approx(math.erfc(math.sqrt(chi_square * share / 2)), rel=1e-9, abs=1e-300)


@given(cells=INNER, effect=EFFECT, level=st.sampled_from(LEVELS))
def test_adjusted_intervals_add_whole_halves(cells: tuple[int, ...], effect: float, level: float) -> None:
    """Gart's and Agresti and Caffo's are the plain intervals of the fractions with 1/2 or 1 added to each."""
    fewer = effective(counts_of(cells), effect)

    def raised(by: float) -> FractionalCounts:
        return FractionalCounts(
            index_events=fewer.index_events + by,
            index_non_events=fewer.index_non_events + by,
            reference_events=fewer.reference_events + by,
            reference_non_events=fewer.reference_non_events + by,
        )

    for found, plain in (
        (odds.gart(fewer, level), odds.woolf(raised(0.5), level)),
        (difference.agresti_caffo(fewer, level), difference.wald(raised(1.0), level)),
    ):
        one, other = given_interval(found), given_interval(plain)
        assert (one.low, one.high) == pytest.approx((other.low, other.high), rel=1e-12, abs=1e-14)


@given(cells=CELLS, effect=EFFECT)
def test_intervals_of_fractions_are_nested(cells: tuple[int, ...], effect: float) -> None:
    """Every score interval of fractions grows with the level, as that of whole counts does."""
    fewer = effective(counts_of(cells), effect)
    for method in (difference.miettinen_nurminen, difference.newcombe, ratio.koopman, odds.cornfield):
        assert_nested(method(fewer, level) for level in LEVELS)


def test_whole_numbers_written_as_fractions_give_the_same(table: Table) -> None:
    """FractionalCounts of 38.0 people and Counts of 38 give one interval, by every method that takes both."""
    whole = table(38, 374, 70, 339)
    same = FractionalCounts(
        index_events=38.0, index_non_events=374.0, reference_events=70.0, reference_non_events=339.0
    )
    for method in METHODS:
        if method.key not in EXACT:
            one, other = given_interval(_interval(method, whole, 0.95)), given_interval(_interval(method, same, 0.95))
            assert (one.low, one.high) == pytest.approx((other.low, other.high), rel=1e-14)


def test_exact_methods_say_that_they_count_whole_people(table: Table) -> None:
    """No exact interval or p is made up for fractions; all the other methods give theirs."""
    fewer = effective(table(38, 374, 70, 339), 1.7)
    for method in METHODS:
        found = _interval(method, fewer, 0.95)
        if method.key in EXACT:
            assert _key(found) == "not-whole"
        else:
            given_interval(found)
    for test in TESTS:
        p = test.p(fewer)
        assert _key(p) == "not-whole" if test.key.startswith("fisher") else isinstance(p, float)


@pytest.mark.parametrize("effect", [1 + 1e-9, 7.3, 1e4, 1e9, 1e15])
def test_nothing_breaks_at_the_extremes(effect: float) -> None:
    """From fractions of a billionth of a person upwards every method gives ordered limits or a gap, never an error."""
    for cells in EXTREMES:
        fewer = effective(counts_of(cells), effect)
        for method in METHODS:
            found = _interval(method, fewer, 0.95)
            assert isinstance(found, Gap) or found.low <= found.high, (cells, method.key)
        for test in TESTS:
            p = test.p(fewer)
            assert isinstance(p, Gap) or 0.0 <= p <= 1.0, (cells, test.key)


def test_one_person_left_is_too_few(table: Table) -> None:
    """With a person or less the factor N/(N-1) has no meaning: the intervals and the test that use it are gaps."""
    fewer = effective(table(3, 7, 5, 5), 20.0)
    for method in (difference.miettinen_nurminen, ratio.miettinen_nurminen, odds.miettinen_nurminen):
        assert _key(method(fewer, 0.95)) == "too-few-left"
    assert _key(association.n_minus_1(fewer)) == "too-few-left"
    given_interval(difference.newcombe(fewer, 0.95))
