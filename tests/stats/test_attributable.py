"""Attributable fractions and their intervals."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any

import mpmath
import pytest
from hypothesis import assume, example, given
from hypothesis import strategies as st

from fourcount.stats import attributable, ratio
from fourcount.stats.clusters import effective
from fourcount.stats.estimates import risk_ratio
from fourcount.stats.results import Counts, Gap, Interval
from tables import CELLS, LEVELS, assert_nested, counts_of, given_interval

Table = Callable[..., Counts]


def _number(value: float | Gap) -> float:
    assert isinstance(value, float), value
    return value


def _key(value: object) -> str:
    assert isinstance(value, Gap), value
    return value.key


def _gap_of_ratio(counts: Counts) -> bool:
    estimate = risk_ratio(counts)
    return isinstance(estimate, Gap) or not 1.0 <= estimate < math.inf


@given(cells=CELLS, level=st.sampled_from(LEVELS))
def test_exposed_fraction_inverts_back_to_the_ratio(cells: tuple[int, ...], level: float) -> None:
    """1/(1 - F) gives back the risk ratio and both limits, whatever the interval's method."""
    counts = counts_of(cells)
    assume(not _gap_of_ratio(counts))
    estimate, interval = _number(risk_ratio(counts)), given_interval(ratio.miettinen_nurminen(counts, level))
    fraction = _number(attributable.exposed_fraction(estimate))
    found = given_interval(attributable.exposed_fraction_interval(estimate, interval))
    assert 1 - fraction == pytest.approx(1 / estimate, rel=1e-12)
    assert found.low <= fraction <= found.high
    assert 1 - found.high == pytest.approx(1 / interval.high if interval.high else math.inf, rel=1e-12)
    assert found.low == -math.inf if interval.low == 0 else 1 - found.low == pytest.approx(1 / interval.low, rel=1e-9)


def test_exposed_fraction_keeps_what_the_ratio_says_of_itself(table: Table) -> None:
    """An interval adjusted for a zero still says so; a fraction of 0 belongs to a ratio of 1."""
    interval = given_interval(ratio.walter(table(5, 5, 1, 9), 0.95))
    found = given_interval(attributable.exposed_fraction_interval(5.0, interval))
    assert found.adjusted == "half"
    assert attributable.exposed_fraction(1.0) == 0.0
    assert given_interval(attributable.prevented_fraction_interval(0.5, interval)).adjusted == "half"


def test_where_no_fraction_makes_sense(table: Table) -> None:
    """A ratio below 1, an infinite one, no event at all, an empty group: each is a gap with its own reason."""
    wide = Interval(low=0.0, high=math.inf)
    for value, key in ((0.5, "ratio-below-one"), (0.0, "ratio-below-one"), (math.inf, "no-reference-events")):
        assert _key(attributable.exposed_fraction(value)) == key
        assert _key(attributable.exposed_fraction_interval(value, wide)) == key
        assert _key(attributable.levin(0.3, value)) == key
        assert _key(attributable.levin_interval(0.3, value, wide)) == key
    for value in (-1.0, math.nan):
        assert _key(attributable.exposed_fraction(value)) == "not-positive"
        assert _key(attributable.prevented_fraction(value)) == "not-positive"
    assert _key(attributable.prevented_fraction(1.5)) == "ratio-above-one"
    assert _key(attributable.prevented_fraction_interval(1.5, wide)) == "ratio-above-one"
    for cells, key in (
        ((5, 95, 10, 90), "ratio-below-one"),
        ((0, 95, 10, 90), "ratio-below-one"),
        ((5, 95, 0, 90), "no-reference-events"),
        ((0, 95, 0, 90), "no-events"),
        ((0, 0, 4, 90), "empty-index-group"),
        ((3, 4, 0, 0), "empty-reference-group"),
    ):
        assert _key(attributable.population_fraction(table(*cells))) == key
        assert _key(attributable.population_fraction_interval(table(*cells), 0.95)) == key
    assert attributable.population_fraction(table(10, 0, 20, 0)) == 0.0
    assert _key(attributable.population_fraction_interval(table(10, 0, 20, 0), 0.95)) == "zero-width"
    for prevalence in (-0.1, 1.1, math.nan):
        assert _key(attributable.levin(prevalence, 2.0)) == "prevalence-out-of-range"


def test_prevented_fraction_is_the_relative_reduction() -> None:
    """1 - R, the limits changing places; at R = 1 both fractions are 0."""
    interval = given_interval(attributable.prevented_fraction_interval(0.5, Interval(low=0.25, high=1.5)))
    assert (interval.low, interval.high) == (-0.5, 0.75)
    assert attributable.prevented_fraction(0.25) == 0.75
    assert attributable.prevented_fraction(1.0) == attributable.exposed_fraction(1.0) == 0.0


@given(cells=CELLS)
@example(cells=(84, 2916, 87, 4913))
def test_three_forms_of_the_population_fraction_agree(cells: tuple[int, ...]) -> None:
    """Miettinen's form from the cases, Levin's from the people, and 1 - (unexposed risk)/(overall risk)."""
    counts = counts_of(cells)
    assume(not _gap_of_ratio(counts))
    estimate, found = _number(risk_ratio(counts)), _number(attributable.population_fraction(counts))
    share = counts.index_events / counts.events
    overall = counts.events / counts.total
    assert found == pytest.approx(share * (estimate - 1) / estimate, abs=1e-12)
    assert found == pytest.approx(_number(attributable.levin(counts.index_total / counts.total, estimate)), abs=1e-12)
    assert found == pytest.approx(1 - counts.reference_events / counts.reference_total / overall, abs=1e-12)


def _standard_error_by_slopes(cells: tuple[int, ...]) -> Any:
    """Of ln(1 - F), by the delta method for multinomial counts, the slopes taken numerically at 50 digits."""

    def log_left(*counts: Any) -> Any:
        a, b, c, d = counts
        return mpmath.log(c * (a + b + c + d) / ((c + d) * (a + c)))

    with mpmath.workdps(50):
        people = mpmath.mpf(sum(cells))
        slopes = []
        for at in range(4):
            step = mpmath.mpf(10) ** -20
            raised = [mpmath.mpf(cell) + (step if place == at else 0) for place, cell in enumerate(cells)]
            slopes.append((log_left(*raised) - log_left(*map(mpmath.mpf, cells))) / step)
        mean = sum(cell * slope for cell, slope in zip(cells, slopes, strict=True)) / people
        return mpmath.sqrt(sum(cell * (slope - mean) ** 2 for cell, slope in zip(cells, slopes, strict=True)))


@pytest.mark.parametrize(
    "cells", [(84, 2916, 87, 4913), (20, 80, 10, 90), (7, 3, 2, 40), (30, 1, 5, 900), (9, 0, 1, 1)]
)
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_population_limits_are_those_of_the_delta_method(cells: tuple[int, ...], level: float) -> None:
    """The closed standard error of Fleiss is the multinomial delta method's, taken without it at 50 digits."""
    counts = counts_of(cells)
    found = given_interval(attributable.population_fraction_interval(counts, level))
    left = mpmath.mpf(1) - mpmath.mpf(_number(attributable.population_fraction(counts)))
    reach = mpmath.sqrt(2) * mpmath.erfinv(mpmath.mpf(level)) * _standard_error_by_slopes(cells)
    assert found.low == pytest.approx(float(1 - left * mpmath.exp(reach)), abs=1e-12)
    assert found.high == pytest.approx(float(1 - left * mpmath.exp(-reach)), abs=1e-12)


@given(cells=CELLS)
def test_population_interval_holds_its_fraction_and_grows_with_the_level(cells: tuple[int, ...]) -> None:
    """The upper limit stays below 1, and a higher level never narrows the interval."""
    counts = counts_of(cells)
    assume(not _gap_of_ratio(counts) and counts.non_events > 0)
    fraction = _number(attributable.population_fraction(counts))
    intervals = [attributable.population_fraction_interval(counts, level) for level in LEVELS]
    assert_nested(intervals)
    for interval in map(given_interval, intervals):
        assert interval.low <= fraction + 1e-15
        assert fraction - 1e-15 <= interval.high <= 1.0


@given(cells=CELLS | st.tuples(st.integers(1, 40), st.integers(1, 40)).map(lambda group: (*group, *group)))
def test_fractions_of_people_leave_the_fraction_and_widen_its_interval(cells: tuple[int, ...]) -> None:
    """A design effect leaves the population fraction where it was, also at a ratio of exactly 1."""
    counts = counts_of(cells)
    assume(not _gap_of_ratio(counts) and counts.non_events > 0)
    fewer = effective(counts, 2.7)
    whole, part = attributable.population_fraction(counts), attributable.population_fraction(fewer)
    assert _number(part) == pytest.approx(_number(whole), abs=1e-12)
    narrow = given_interval(attributable.population_fraction_interval(counts, 0.95))
    wide = given_interval(attributable.population_fraction_interval(fewer, 0.95))
    assert wide.low <= narrow.low + 1e-12
    assert narrow.high <= wide.high + 1e-12


def test_levin_between_its_ends() -> None:
    """Nobody exposed: 0. Everybody: the fraction among the exposed. Limits follow those of the ratio."""
    interval = Interval(low=0.0, high=math.inf)
    assert attributable.levin(0.0, 3.0) == 0.0
    assert attributable.levin(1.0, 3.0) == pytest.approx(2 / 3)
    assert attributable.levin_interval(0.0, 3.0, interval) == Interval(low=0.0, high=0.0)
    assert attributable.levin_interval(1.0, 3.0, interval) == Interval(low=-math.inf, high=1.0)
    found = given_interval(attributable.levin_interval(0.25, 3.0, Interval(low=0.5, high=9.0, adjusted="half")))
    assert (found.low, found.high, found.adjusted) == (pytest.approx(-1 / 7), pytest.approx(2 / 3), "half")
