"""Tests of every method at once."""

from __future__ import annotations

import pytest

from fourcount.appraisal.every import conditional_odds_ratio, every_method, every_test
from fourcount.appraisal.findings import Counts, Gap, Interval
from fourcount.record.outcome import DESIGNS
from fourcount.stats.methods import FAMILIES, METHODS, TESTS

COUNTS = Counts(index_events=38, index_non_events=374, reference_events=70, reference_non_events=339)
MEASURES = ["risk_index", "risk_reference", "risk_difference", "risk_ratio", "odds_ratio"]


@pytest.mark.parametrize("design", DESIGNS)
def test_every_measure_has_every_method_in_every_design(design):
    """No method is ever missing: a withheld one is a gap in its place."""
    every = every_method(COUNTS, design, 0.95)
    assert list(every) == MEASURES
    for measure, intervals in every.items():
        kind = "risk" if measure.startswith("risk_") and measure[5:] in ("index", "reference") else measure
        assert [method.key for method in METHODS if method.measure == kind] == list(intervals)


def test_a_trial_has_an_interval_by_every_method():
    """With four counts above 0 nothing is withheld."""
    every = every_method(COUNTS, "trial", 0.95)
    assert all(isinstance(interval, Interval) for intervals in every.values() for interval in intervals.values())


def test_a_case_control_study_has_methods_for_the_odds_ratio_only():
    """What the design withholds is withheld by every method."""
    every = every_method(COUNTS, "case-control", 0.95)
    assert all(isinstance(interval, Interval) for interval in every.pop("odds_ratio").values())
    assert all(gap == Gap("design-case-control") for intervals in every.values() for gap in intervals.values())


@pytest.mark.parametrize("family", ["score", "textbook", "exact"])
def test_the_familys_own_methods_are_among_them(appraised, family):
    """The interval on screen is the one that the list gives under its key."""
    findings = appraised(38, 374, 70, 339, family=family)
    every = every_method(COUNTS, "trial", 0.95)
    for measure in MEASURES:
        figure = findings.measures[measure]
        assert every[measure][figure.method] == figure.interval
    assert FAMILIES[family].test == findings.test.method
    assert every_test(COUNTS)[findings.test.method] == findings.test.p


def test_every_test_has_a_p():
    """The four tests of no association, in the order of their table."""
    tests = every_test(COUNTS)
    assert [test.key for test in TESTS] == list(tests)
    assert all(0 < p < 0.01 for p in tests.values())


def test_the_conditional_odds_ratio_is_nearer_to_1():
    """The conditional estimate lies between 1 and the sample odds ratio."""
    assert 38 * 339 / (374 * 70) < conditional_odds_ratio(COUNTS) < 1


def test_the_conditional_odds_ratio_of_an_empty_table_is_a_gap():
    """Nobody in the table: no estimate."""
    empty = Counts(index_events=0, index_non_events=0, reference_events=0, reference_non_events=0)
    assert isinstance(conditional_odds_ratio(empty), Gap)
