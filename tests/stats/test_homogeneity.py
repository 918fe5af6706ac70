"""Breslow and Day's test of one odds ratio in all strata, and the chi-square's tail that it rests on."""

from __future__ import annotations

import math

import mpmath
import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.stats import chi_square
from fourcount.stats.homogeneity import breslow_day, breslow_day_tarone
from fourcount.stats.normal import two_sided_p
from fourcount.stats.results import Counts, Gap, HomogeneityTest
from tables import counts_of

LIVE = st.tuples(*[st.integers(1, 60)] * 4).map(counts_of)
STRATA = st.lists(LIVE, min_size=2, max_size=6)


def _given(found: HomogeneityTest | Gap) -> HomogeneityTest:
    assert isinstance(found, HomogeneityTest), found
    return found


@pytest.mark.parametrize("degrees", [1, 2, 3, 4, 7, 20, 51, 400])
@pytest.mark.parametrize("value", [1e-9, 0.3, 1.0, 3.841, 18.8, 60.0, 700.0])
def test_the_tail_is_that_of_the_incomplete_gamma_function(value: float, degrees: int) -> None:
    """The finite sum agrees with mpmath's regularised incomplete gamma function to 1e-12."""
    with mpmath.workdps(40):
        expected = float(mpmath.gammainc(mpmath.mpf(degrees) / 2, mpmath.mpf(value) / 2, regularized=True))
    assert chi_square.upper_tail(value, degrees) == pytest.approx(expected, rel=1e-12)


@given(st.floats(0, 38))
def test_one_degree_of_freedom_is_a_squared_normal_value(z: float) -> None:
    """With one degree the tail is the two-sided p of the root."""
    assert chi_square.upper_tail(z * z, 1) == pytest.approx(two_sided_p(z), rel=1e-9, abs=1e-300)


def test_the_ends_of_the_tail() -> None:
    """All of it at 0, none of it far out, and no degrees below 1 or values below 0."""
    assert chi_square.upper_tail(0.0, 5) == 1.0
    assert chi_square.upper_tail(1e5, 5) == 0.0
    for value, degrees in ((1.0, 0), (-1.0, 2), (math.nan, 2)):
        with pytest.raises(ValueError, match="no chi-square"):
            chi_square.upper_tail(value, degrees)


@given(
    st.lists(st.tuples(st.integers(1, 10**4), st.integers(1, 10**4)), min_size=2, max_size=6),
    st.integers(1, 50),
    st.integers(1, 50),
)
def test_strata_that_share_the_odds_ratio_exactly_have_no_distance(
    sizes: list[tuple[int, int]], above: int, below: int
) -> None:
    """Strata of other sizes and risks with one odds ratio: a chi-square of 0 but for rounding, and a p of 1."""
    strata = [counts_of((above * first, first, below * second, second)) for first, second in sizes]
    for found in (_given(breslow_day(strata)), _given(breslow_day_tarone(strata))):
        assert found.chi_square < 1e-20
        assert found.p > 0.999999
        assert found.degrees == len(sizes) - 1


@given(STRATA)
def test_tarone_takes_off_and_never_goes_below_0(strata: list[Counts]) -> None:
    """Tarone's chi-square lies from 0 to Breslow and Day's."""
    plain, corrected = _given(breslow_day(strata)), _given(breslow_day_tarone(strata))
    assert 0 <= corrected.chi_square <= plain.chi_square * (1 + 1e-12) + 1e-12
    assert plain.p <= corrected.p + 1e-12


@given(STRATA, st.randoms(use_true_random=False))
def test_order_groups_and_outcomes_do_not_matter(strata: list[Counts], source: object) -> None:
    """Another order of the strata, swapped groups or the other outcome give the same chi-square."""
    shuffled = list(strata)
    source.shuffle(shuffled)  # type: ignore[attr-defined]
    turned = [
        counts_of((t.reference_events, t.reference_non_events, t.index_events, t.index_non_events)) for t in strata
    ]
    other = [
        counts_of((t.index_non_events, t.index_events, t.reference_non_events, t.reference_events)) for t in strata
    ]
    for test in (breslow_day, breslow_day_tarone):
        expected = _given(test(strata))
        assert test(shuffled) == expected
        for strata_seen_otherwise in (turned, other):
            found = _given(test(strata_seen_otherwise))
            assert found.chi_square == pytest.approx(expected.chi_square, rel=1e-9, abs=1e-12)


@given(STRATA)
def test_only_strata_that_tell_something_count_as_degrees(strata: list[Counts]) -> None:
    """Strata without events, with nothing else, or with an empty group change neither chi-square nor degrees."""
    more = [*strata, *(counts_of(t) for t in ((0, 6, 0, 4), (5, 0, 9, 0), (0, 0, 3, 4), (0, 0, 0, 0)))]
    for test in (breslow_day, breslow_day_tarone):
        assert test(more) == test(strata)


def test_what_cannot_be_tested_has_a_reason() -> None:
    """One stratum that tells something, none, or a pooled odds ratio without a logarithm."""
    live, idle = counts_of((3, 4, 5, 6)), counts_of((0, 6, 0, 4))
    assert breslow_day([live, idle]) == Gap("one-stratum")
    assert breslow_day([idle, idle]) == Gap("no-events")
    assert breslow_day([counts_of((6, 0, 4, 0))]) == Gap("no-non-events")
    assert breslow_day([counts_of((0, 5, 3, 4)), counts_of((0, 9, 1, 9))]) == Gap("endless-log")
    assert breslow_day_tarone([counts_of((3, 4, 0, 4)), counts_of((5, 9, 0, 9))]) == Gap("endless-log")
