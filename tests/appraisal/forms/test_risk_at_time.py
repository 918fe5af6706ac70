"""Two printed risks with their limits. All tables are invented."""

from __future__ import annotations

import math

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import TIMED_MEASURES, Gap, Interval, NumberNeeded, TimedRisks
from fourcount.record.outcome import CELLS, Outcome, Patient, RiskAtTime
from fourcount.record.paper import Choices
from fourcount.stats.results import LimitedRisk

TEXTS = ("9%", "6 to 12", "17%", "13 to 21")


def found(*texts, level="", chosen=0.95, baseline="", **rest):
    """The findings of four texts, of the level at which their limits are printed, and at a starting risk."""
    table = RiskAtTime(**dict(zip(CELLS, texts or TEXTS, strict=True)), limits_level_text=level)
    outcome = Outcome(table=table, patient=Patient(starting_risk_text=baseline, effect="odds_ratio"), **rest)
    return appraise(outcome, Choices(level=chosen))


def withheld(findings):
    """The measures that are gaps, with the keys of the reasons."""
    return {key: figure.key for key, figure in findings.measures.items() if isinstance(figure, Gap)}


def test_the_difference_is_squared_and_added():
    """-8 points, with limits from how far each risk's own lie (Newcombe's construction)."""
    findings = found()
    index, reference = LimitedRisk(risk=0.09, low=0.06, high=0.12), LimitedRisk(risk=0.17, low=0.13, high=0.21)
    assert findings.given == TimedRisks(index=index, reference=reference, level=0.95)
    difference = findings.measures["risk_difference"]
    assert difference.estimate == pytest.approx(-0.08)
    assert difference.interval.low == pytest.approx(-0.08 - math.hypot(0.03, 0.04))
    assert findings.measures["risk_index"].interval == Interval(low=0.06, high=0.12)
    assert findings.measures["risk_index"].method == "printed"
    assert isinstance(findings.measures["number_needed"], NumberNeeded)


def test_varied_follow_up_is_what_this_form_is_for():
    """Risks at one time have a number needed where raw counts have none."""
    assert withheld(found(follow_up_varied=True)) == {}
    assert "follow-up-varied" not in {caution.key for caution in found(follow_up_varied=True).cautions}


def test_risks_without_limits_have_no_interval():
    """The estimates stand."""
    findings = found("9%", "", "17%", "13 to 21")
    assert Gap("limits-not-printed") == findings.given == findings.measures["risk_difference"].interval
    assert findings.measures["risk_difference"].estimate == pytest.approx(-0.08)
    assert findings.measures["risk_reference"].interval == Interval(low=0.13, high=0.21)


def test_the_other_outcome_and_the_other_group():
    """1 less each risk, with the limits changed over; the difference changes its sign with each turn."""
    turned = found(counted="right").given
    assert (turned.index.risk, turned.index.low, turned.index.high) == pytest.approx((0.91, 0.88, 0.94))
    for rest in ({"counted": "right"}, {"index_group": "second"}):
        assert found(**rest).measures["risk_difference"].estimate == pytest.approx(0.08)
    both = found(counted="right", index_group="second").measures["risk_difference"]
    assert both.estimate == pytest.approx(-0.08)


@pytest.mark.parametrize(
    ("design", "reasons"),
    [
        ("trial", {}),
        ("survey", {"number_needed": "design-survey-nnt"}),
        ("case-control", dict.fromkeys(TIMED_MEASURES, "design-case-control")),
        ("paired", dict.fromkeys(TIMED_MEASURES, "design-needs-pairs")),
    ],
)
def test_what_each_design_gives(design, reasons):
    """As for counts."""
    assert withheld(found(design=design)) == reasons


def test_limits_keep_the_level_they_are_printed_at():
    """Another level is said, since no other limits can be worked out."""
    cautions = {caution.key: caution.facts for caution in found(level="90%").cautions}
    assert cautions["printed-level"] == {"level": 0.9, "chosen": 0.95}
    assert found(level="90%").measures["risk_difference"] == found(level="90%", chosen=0.8).measures["risk_difference"]
    assert "printed-level" not in {caution.key for caution in found().cautions}


def test_what_cannot_be_read_is_marked():
    """A level, limits in the wrong order, a risk that may be a fraction."""
    assert [mark.key for mark in found(level="high").marks] == ["not-a-level"]
    assert Gap("unreadable") == found(level="high").given
    assert [mark.key for mark in found("9%", "12 to 6", "17%", "13 to 21").marks] == ["limits-disordered"]
    assert [mark.key for mark in found("0.09", "", "17%", "").marks] == ["percent-or-fraction"]
    assert Gap("risks-not-typed") == found("9%", "6 to 12", "", "").given


def test_a_patient_takes_the_printed_risks_or_their_ratio():
    """At the reference group's own risk the printed limits stand; at another one the ratio is carried, never odds."""
    own = found().patient
    assert (own.without.interval, own.with_.interval) == (Interval(low=0.13, high=0.21), Interval(low=0.06, high=0.12))
    assert own.difference == found().measures["risk_difference"]
    assert own.number_needed == found().measures["number_needed"]
    assert (own.effect, own.range_from, own.baseline_from) == ("risk_ratio", "table", "reference")
    carried = found(baseline="34%")
    assert carried.patient.with_.estimate == pytest.approx(0.18)
    assert carried.patient.range_from == "effect"
    assert "effect-kept-constant" in {caution.key for caution in carried.cautions}
    assert "baseline-far" in {caution.key for caution in found(baseline="35%").cautions}
    assert Gap("baseline-unreadable") == found(baseline="often").patient
    assert Gap("design-survey-nnt") == found(baseline="20%", design="survey").patient.number_needed


def test_a_cohorts_ratio_has_an_e_value():
    """As a ratio of counts has."""
    values = found("17%", "13 to 21", "9%", "6 to 12", design="cohort").extras
    assert values.e_value.measure == "risk_ratio"
    assert values.attributable_exposed.estimate == pytest.approx(8 / 17)
    assert found().extras.e_value is None
