"""Tests of the measures of one table."""

from __future__ import annotations

import math

import pytest

from fourcount.appraisal.findings import Figure, Gap, Interval, NumberNeeded
from fourcount.appraisal.measures import number_needed_from, other_outcome
from fourcount.stats import difference, odds, ratio, risk
from fourcount.stats.results import Counts

TABLE = (38, 374, 70, 339)
COUNTS = Counts(index_events=38, index_non_events=374, reference_events=70, reference_non_events=339)


def test_estimates_by_hand(appraised):
    """38/412 v 70/409: each estimate from the four counts."""
    measures = appraised(*TABLE).measures
    for key, expected in {
        "risk_index": 38 / 412,
        "risk_reference": 70 / 409,
        "odds_index": 38 / 374,
        "odds_reference": 70 / 339,
        "risk_difference": 38 / 412 - 70 / 409,
        "risk_ratio": (38 / 412) / (70 / 409),
        "other_risk_ratio": (374 / 412) / (339 / 409),
        "odds_ratio": 38 * 339 / (374 * 70),
        "number_needed": 1 / (70 / 409 - 38 / 412),
    }.items():
        assert math.isclose(expected, measures[key].estimate, rel_tol=1e-12), key


@pytest.mark.parametrize(
    ("family", "methods"),
    [
        ("score", ("wilson", "miettinen-nurminen", "miettinen-nurminen", "miettinen-nurminen", "n-minus-1")),
        ("textbook", ("wald", "wald", "katz", "woolf", "pearson")),
        ("exact", ("clopper-pearson", "miettinen-nurminen", "miettinen-nurminen", "conditional-exact", "fisher")),
    ],
)
def test_each_family_names_its_methods(appraised, family, methods):
    """Every figure names the method of its interval, and the p its test."""
    findings = appraised(*TABLE, family=family)
    keys = ("risk_index", "risk_difference", "risk_ratio", "odds_ratio")
    assert methods == (*(findings.measures[key].method for key in keys), findings.test.method)
    odds_method = "logit" if family == "textbook" else methods[0]
    assert odds_method == findings.measures["odds_reference"].method
    assert methods[2] == findings.measures["other_risk_ratio"].method


def test_the_level_reaches_every_interval(appraised):
    """At another level each interval is the method's at that level."""
    measures = appraised(*TABLE, level=0.9).measures
    assert risk.wilson(38, 412, 0.9) == measures["risk_index"].interval
    assert difference.miettinen_nurminen(COUNTS, 0.9) == measures["risk_difference"].interval
    assert ratio.miettinen_nurminen(COUNTS, 0.9) == measures["risk_ratio"].interval
    assert ratio.miettinen_nurminen(other_outcome(COUNTS), 0.9) == measures["other_risk_ratio"].interval
    assert odds.miettinen_nurminen(COUNTS, 0.9) == measures["odds_ratio"].interval


def test_odds_take_the_limits_of_the_risk(appraised):
    """Each limit of the odds is p/(1-p) of the risk's."""
    measures = appraised(*TABLE).measures
    for group in ("index", "reference"):
        risks, limits = measures[f"risk_{group}"].interval, measures[f"odds_{group}"].interval
        assert risks.low / (1 - risks.low) == limits.low
        assert risks.high / (1 - risks.high) == limits.high


def test_odds_are_infinite_where_everybody_has_the_event(appraised):
    """20/20: the odds and their upper limit are infinite."""
    figure = appraised(20, 0, 3, 17).measures["odds_index"]
    assert (math.inf, math.inf) == (figure.estimate, figure.interval.high)


@pytest.mark.parametrize("cells", [(1, 9, 5, 5), (9, 1, 5, 5)])
def test_textbook_odds_have_limits_where_the_risks_are_impossible(appraised, cells):
    """Wald's limit of 1/10 is below 0 and that of 9/10 above 100%; the odds have the logit limits, by hand."""
    figure = appraised(*cells, family="textbook").measures["odds_index"]
    odds, half_width = cells[0] / cells[1], 1.959963984540054 * math.sqrt(1 / cells[0] + 1 / cells[1])
    assert figure.method == "logit"
    assert odds == figure.estimate
    assert math.isclose(odds * math.exp(-half_width), figure.interval.low, rel_tol=1e-12)
    assert math.isclose(odds * math.exp(half_width), figure.interval.high, rel_tol=1e-12)


def test_textbook_odds_of_nobody_or_everybody_have_no_interval(appraised):
    """0/20: the odds are 0, and the logit interval does not exist."""
    figure = appraised(0, 20, 3, 17, family="textbook").measures["odds_index"]
    assert (0.0, Gap("one-outcome")) == (figure.estimate, figure.interval)


def test_an_estimate_can_be_a_gap_while_the_interval_stands(appraised):
    """0/20 v 0/30 has no ratio, and its interval says that nothing is ruled out."""
    figure = appraised(0, 20, 0, 30).measures["risk_ratio"]
    assert Gap("no-events") == figure.estimate
    assert Interval(low=0.0, high=math.inf) == figure.interval


def test_an_interval_can_be_a_gap_while_the_estimate_stands(appraised):
    """0/20 by Wald: the risk is 0, and an interval of zero width is withheld."""
    figure = appraised(0, 20, 3, 17, family="textbook").measures["risk_index"]
    assert (0.0, Gap("zero-width")) == (figure.estimate, figure.interval)


def test_a_measure_with_neither_is_a_gap(appraised):
    """Nobody in the index group: what needs it is a gap as a whole, the other group's risk stands."""
    measures = appraised(0, 0, 3, 17).measures
    assert Gap("empty-index-group") == measures["risk_difference"] == measures["number_needed"]
    assert Gap("empty-group") == measures["risk_index"] == measures["odds_index"]
    assert measures["risk_reference"].estimate == 0.15


def test_an_empty_table_gives_reasons_everywhere(appraised):
    """Four typed zeros are a table without people, not an untyped one."""
    findings = appraised(0, 0, 0, 0)
    assert isinstance(findings.counts, Counts)
    assert all(isinstance(measure, Gap) for measure in findings.measures.values())


def test_the_number_needed_comes_from_the_difference_shown(appraised):
    """Its limits are the reciprocals of the limits of the difference."""
    measures = appraised(*TABLE).measures
    shown, needed = measures["risk_difference"].interval, measures["number_needed"]
    assert (needed.kind, needed.low.kind, needed.high.kind) == ("NNTB", "NNTB", "NNTB")
    assert math.isclose(-1 / shown.low, needed.low.value, rel_tol=1e-12)
    assert math.isclose(-1 / shown.high, needed.high.value, rel_tol=1e-12)


def test_a_welcome_event_makes_fewer_a_harm(appraised):
    """Whether the event is welcome turns the kind and nothing else."""
    unwelcome, welcome = appraised(*TABLE), appraised(*TABLE, left_welcome=True)
    assert welcome.measures["number_needed"].kind == "NNTH"
    assert unwelcome.measures["risk_difference"] == welcome.measures["risk_difference"]


def test_counting_a_column_takes_its_own_welcome(appraised):
    """Where the left outcome is welcome the right one is not: more of it is harm."""
    assert appraised(60, 40, 50, 50, left_welcome=True).measures["number_needed"].kind == "NNTB"
    counted_right = appraised(60, 40, 50, 50, left_welcome=True, counted="right")
    assert counted_right.measures["number_needed"].kind == "NNTB"


def test_no_number_needed_without_an_interval(appraised):
    """The textbook difference of 0/20 v 0/20 has no interval, and a number needed never stands without one."""
    findings = appraised(0, 20, 0, 20, family="textbook")
    assert Gap("zero-width") == findings.measures["number_needed"]


def test_a_number_needed_of_a_plain_difference():
    """A difference of -0.1 (-0.2 to -0.05) is 10 (5 to 20)."""
    figure = Figure(estimate=-0.1, interval=Interval(low=-0.2, high=-0.05), method="wald")
    needed = number_needed_from(figure, welcome=False)
    assert isinstance(needed, NumberNeeded)
    assert (needed.estimate, needed.low.value, needed.high.value) == (10, 5, 20)


# Newcombe 1998 (Stat Med 17:873), Table II, from memory: 56/70 v 48/80 by Miettinen and Nurminen is 0.0528 to 0.3382.
def test_a_published_interval_of_the_difference(appraised):
    """The default family's difference is the published one, to its digits."""
    interval = appraised(56, 14, 48, 32).measures["risk_difference"].interval
    assert (f"{interval.low:.4f}", f"{interval.high:.4f}") == ("0.0528", "0.3382")
