"""Tests of every method at once."""

from __future__ import annotations

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.every import conditional_odds_ratio, every_interval, every_p
from fourcount.appraisal.findings import PAIR_MEASURES, POOLED_MEASURES, RATE_MEASURES, Counts, Gap, Interval
from fourcount.record.outcome import (
    CELLS,
    DESIGNS,
    EffectOnly,
    EventsAndOthers,
    Outcome,
    Pairs,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
)
from fourcount.record.paper import Choices
from fourcount.stats.methods import FAMILIES, METHODS, PAIR_TESTS, RATE_TESTS, STRATA_TESTS, TESTS

CELLS_OF_COUNTS = (38, 374, 70, 339)
COUNTS = Counts(index_events=38, index_non_events=374, reference_events=70, reference_non_events=339)
MEASURES = ["risk_index", "risk_reference", "risk_difference", "risk_ratio", "odds_ratio"]


def intervals_and_tests(outcome):
    """Every interval and every p of an outcome."""
    findings = appraise(outcome, Choices())
    return every_interval(outcome, findings, 0.95), every_p(outcome, findings)


@pytest.mark.parametrize("design", DESIGNS)
def test_every_measure_has_every_method_in_every_design(study, design):
    """No method is ever missing: a withheld one is a gap in its place."""
    every, _tests = intervals_and_tests(study(*CELLS_OF_COUNTS, design=design))
    assert list(every) == MEASURES
    for measure, intervals in every.items():
        kind = "risk" if measure.startswith("risk_") and measure[5:] in ("index", "reference") else measure
        assert [method.key for method in METHODS if method.measure == kind] == list(intervals)


def test_a_trial_has_an_interval_by_every_method(study):
    """With four counts above 0 nothing is withheld."""
    every, _tests = intervals_and_tests(study(*CELLS_OF_COUNTS))
    assert all(isinstance(interval, Interval) for intervals in every.values() for interval in intervals.values())


def test_a_case_control_study_has_methods_for_the_odds_ratio_only(study):
    """What the design withholds is withheld by every method."""
    every, _tests = intervals_and_tests(study(*CELLS_OF_COUNTS, design="case-control"))
    assert all(isinstance(interval, Interval) for interval in every.pop("odds_ratio").values())
    assert all(gap == Gap("design-case-control") for intervals in every.values() for gap in intervals.values())


@pytest.mark.parametrize("family", ["score", "textbook", "exact"])
def test_the_familys_own_methods_are_among_them(appraised, study, family):
    """The interval on screen is the one that the list gives under its key."""
    findings = appraised(*CELLS_OF_COUNTS, family=family)
    every, tests = intervals_and_tests(study(*CELLS_OF_COUNTS))
    for measure in MEASURES:
        figure = findings.measures[measure]
        assert every[measure][figure.method] == figure.interval
    assert FAMILIES[family].test == findings.test.method
    assert tests[findings.test.method] == findings.test.p


def test_every_test_has_a_p(study):
    """The four tests of no association, in the order of their table."""
    _every, tests = intervals_and_tests(study(*CELLS_OF_COUNTS))
    assert [test.key for test in TESTS] == list(tests)
    assert all(0 < p < 0.01 for p in tests.values())


def test_the_conditional_odds_ratio_is_nearer_to_1():
    """The conditional estimate lies between 1 and the sample odds ratio."""
    assert 38 * 339 / (374 * 70) < conditional_odds_ratio(COUNTS) < 1


def test_the_conditional_odds_ratio_of_an_empty_table_is_a_gap():
    """Nobody in the table: no estimate."""
    empty = Counts(index_events=0, index_non_events=0, reference_events=0, reference_non_events=0)
    assert isinstance(conditional_odds_ratio(empty), Gap)


def printed(table, **rest):
    """An outcome with its findings under the default choices."""
    outcome = Outcome(table=table, **rest)
    return outcome, appraise(outcome, Choices())


CELL_TEXTS = dict(zip(CELLS, ("12", "30", "9", "49"), strict=True))
RISKS_AT_TIME = dict(zip(CELLS, ("9%", "6 to 12", "17%", "13 to 21"), strict=True))
ROWS = (Stratum(**CELL_TEXTS), Stratum(**CELL_TEXTS))


@pytest.mark.parametrize(
    ("table", "rest", "measures", "tests"),
    [
        (EventsAndOthers(**CELL_TEXTS), {}, MEASURES, TESTS),
        (
            Pairs(**CELL_TEXTS),
            {"design": "paired"},
            [key for key in PAIR_MEASURES if key != "number_needed"],
            PAIR_TESTS,
        ),
        (PersonTime(**CELL_TEXTS), {}, RATE_MEASURES, RATE_TESTS),
        (RiskAtTime(**RISKS_AT_TIME), {}, ("risk_difference", "risk_ratio"), ()),
        (Strata(strata=ROWS, of_total=False), {}, (*MEASURES, *POOLED_MEASURES), STRATA_TESTS),
        (EffectOnly(), {"paper_text": "RR 0.5 (0.4 to 0.8)"}, (), ()),
        (EventsAndOthers(), {}, (), ()),
    ],
)
def test_every_form_has_every_method_and_every_test(table, rest, measures, tests):
    """By measure and by test; the form's own figures are among them."""
    outcome, findings = printed(table, **rest)
    intervals = every_interval(outcome, findings, 0.95)
    assert tuple(intervals) == tuple(measures)
    assert list(every_p(outcome, findings)) == [test.key for test in tests]
    for measure, methods in intervals.items():
        pooled = findings.strata.pooled if measure.startswith("pooled_") else findings.measures
        assert methods[pooled[measure].method] == pooled[measure].interval


def test_clusters_reach_every_method(study):
    """A design effect of 2 leaves half the people to every method, and none to those that count whole people."""
    clusters = {"icc_text": "0.05", "cluster_size_text": "21"}
    outcome, single = study(39, 375, 71, 339, **clusters), study(38, 374, 70, 339)
    intervals = every_interval(outcome, appraise(outcome, Choices()), 0.95)
    assert Gap("cluster-no-exact") == intervals["odds_ratio"]["conditional-exact"]
    assert Gap("cluster-no-exact") == every_p(outcome, appraise(outcome, Choices()))["fisher"]
    doubled = study(76, 748, 140, 678, **clusters)
    of_doubled = every_interval(doubled, appraise(doubled, Choices()), 0.95)
    of_single = every_interval(single, appraise(single, Choices()), 0.95)
    assert of_doubled["risk_ratio"] == of_single["risk_ratio"]
    half = study(38, 374, 70, 339, cluster_size_text="21")
    unknown = every_interval(half, appraise(half, Choices()), 0.95).values()
    assert {found.key for methods in unknown for found in methods.values()} == {"cluster-without-icc"}


def test_what_is_refused_has_no_method(study):
    """Counts of events are no people, and unpaired counts no pairs."""
    for outcome in (study(38, 374, 70, 339, counting="events"), study(38, 374, 70, 339, design="paired")):
        findings = appraise(outcome, Choices())
        intervals = every_interval(outcome, findings, 0.95)
        assert {found.key for methods in intervals.values() for found in methods.values()} == {findings.test.key}
        assert every_p(outcome, findings) == {}
