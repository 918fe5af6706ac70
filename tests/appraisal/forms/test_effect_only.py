"""A printed effect without counts. All figures are invented unless a test names a source."""

from __future__ import annotations

import math

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Figure, Gap, Interval, Recovered
from fourcount.record.outcome import EffectOnly, Outcome, Patient
from fourcount.record.paper import Choices


def found(text, baseline="", level=0.95, **rest):
    """The findings of a printed text, at a starting risk."""
    patient = Patient(starting_risk_text=baseline)
    return appraise(Outcome(table=EffectOnly(), paper_text=text, patient=patient, **rest), Choices(level=level))


def only(findings):
    """The one measure."""
    (figure,) = findings.measures.values()
    return figure


def limits(figure):
    """Estimate, low and high."""
    return figure.estimate, figure.interval.low, figure.interval.high


def facts(findings):
    """The facts of the cautions by key."""
    return {caution.key: caution.facts for caution in findings.cautions}


def test_the_effect_stands_as_it_is_printed():
    """Its measure is the only one, and nothing of it can be checked."""
    findings = found("OR 0.49 (0.32 to 0.75)")
    assert findings.measures == {
        "odds_ratio": Figure(estimate=0.49, interval=Interval(low=0.32, high=0.75), method="printed")
    }
    assert "cannot-be-checked" in facts(findings)
    assert Gap("not-counts") == findings.counts
    assert findings.given.measure == "odds_ratio"


def test_standard_error_and_p_come_back_from_the_limits():
    """0.81 (0.70 to 0.94) has a z of -2.79 and a p of 0.005 (Altman and Bland 2011, BMJ 343:d2304)."""
    findings = found("RR 0.81 (0.70 to 0.94)")
    recovered = findings.extras.recovered
    assert isinstance(recovered, Recovered)
    assert (round(recovered.standard_error, 4), round(recovered.z, 2)) == (0.0752, -2.8)
    assert round(findings.test.p, 3) == 0.005
    assert (findings.test.method, recovered.from_p) == ("recovered", False)


def test_an_interval_is_rebuilt_from_a_p_and_said_to_be():
    """At the usual level, whatever the record's is; a p that is only below something rebuilds nothing."""
    findings = found("RR 0.54, P = 0.001")
    assert limits(only(findings)) == pytest.approx((0.54, 0.3741, 0.7795), abs=1e-4)
    assert findings.extras.recovered.from_p
    assert facts(findings)["interval-rebuilt"] == {"p": 0.001}
    assert only(found("RR 0.54, P = 0.001", level=0.8)) == only(findings)
    assert facts(found("RR 0.54, P = 0.001", level=0.8))["printed-level"] == {"level": 0.95, "chosen": 0.8}
    for text in ("RR 0.54, P < 0.001", "RR 0.54"):
        assert Gap("no-interval-printed") == only(found(text)).interval == found(text).extras.recovered


@pytest.mark.parametrize(
    ("text", "turned"),
    [
        ("RR 0.5 (0.4 to 0.8)", (2, 1.25, 2.5)),
        ("OR 0.5 (0.4 to 0.8)", (2, 1.25, 2.5)),
        ("HR 0.5 (0.4 to 0.8)", (2, 1.25, 2.5)),
        ("OR 0.5 (0 to 0.8)", (2, 1.25, math.inf)),
        ("risk difference 7.9 percentage points (3.3 to 12.6)", (-0.079, -0.126, -0.033)),
    ],
)
def test_swapping_the_groups_turns_the_effect(text, turned):
    """1/x of a ratio, the other sign of a difference; z changes its sign and p stays."""
    findings = found(text, index_group="second")
    assert limits(only(findings)) == pytest.approx(turned)
    if isinstance(findings.test.p, float):
        assert findings.test.p == pytest.approx(found(text).test.p)


def test_the_other_outcome_turns_odds_ratio_and_difference_only():
    """A risk ratio says nothing of the other outcome; both turns of an odds ratio leave it as it was."""
    assert limits(only(found("OR 0.5 (0.4 to 0.8)", counted="right"))) == pytest.approx((2, 1.25, 2.5))
    both = found("OR 0.5 (0.4 to 0.8)", counted="right", index_group="second")
    assert only(both) == only(found("OR 0.5 (0.4 to 0.8)"))
    assert only(found("RD -8% (-13% to -3%)", counted="right")).estimate == pytest.approx(0.08)
    for text in ("RR 0.5 (0.4 to 0.8)", "HR 0.5 (0.4 to 0.8)", "rate ratio 2.1 (1.1 to 4.0)"):
        findings = found(text, baseline="12%", counted="right")
        assert Gap("other-outcome-unknown") == only(findings) == findings.patient
        assert findings.given.estimate is not None


def test_the_level_of_the_print_stays():
    """A 90% interval is not stretched to the record's 95%; that is said, and p counts with its own level."""
    findings = found("OR 2.3; 90% CI 1.1, 4.8")
    assert limits(only(findings)) == (2.3, 1.1, 4.8)
    assert facts(findings)["printed-level"] == {"level": 0.9, "chosen": 0.95}
    assert "printed-level" not in facts(found("OR 2.3 (1.1 to 4.8)"))
    assert facts(found("OR 2.3 (1.1 to 4.8)", level=0.99))["printed-level"] == {"level": 0.95, "chosen": 0.99}


@pytest.mark.parametrize(
    ("text", "key"),
    [
        ("", "effect-not-typed"),
        ("no figure", "effect-unreadable"),
        ("P = 0.03", "effect-unreadable"),
        ("risk difference -300%", "effect-out-of-range"),
    ],
)
def test_what_gives_no_effect_is_said(text, key):
    """Every figure has the reason."""
    findings = found(text)
    assert Gap(key) == only(findings)
    assert list(findings.measures) in (["risk_ratio"], ["risk_difference"])


@pytest.mark.parametrize(
    ("design", "text", "key"),
    [
        ("case-control", "RR 0.54 (0.37 to 0.78)", "design-case-control"),
        ("survey", "HR 0.54 (0.37 to 0.78)", "design-no-rates"),
        ("matched", "RR 0.54 (0.37 to 0.78)", "design-matched"),
    ],
)
def test_a_design_has_not_every_effect(design, text, key):
    """A case-control study has no risk ratio, a survey no rates, matched pairs only their odds ratio."""
    assert Gap(key) == only(found(text, design=design))
    assert isinstance(only(found("OR 0.54 (0.37 to 0.78)", design=design)), Figure)


def test_an_odds_ratio_is_carried_to_a_typed_starting_risk():
    """At 20% an odds ratio of 0.49 leaves 10.9%; without a starting risk nothing is carried."""
    findings = found("OR 0.49 (0.32 to 0.75)", baseline="20%")
    assert findings.patient.with_.estimate == pytest.approx(0.098 / 0.898)
    assert findings.patient.range_from == "effect"
    assert findings.conversion.risk_ratio.estimate == pytest.approx(0.49 / 0.898)
    assert facts(findings)["effect-kept-elsewhere"] == {"effect": "odds_ratio", "value": 0.49, "baseline": 0.2}
    assert Gap("effect-needs-baseline") == found("OR 0.49 (0.32 to 0.75)").patient
    assert Gap("baseline-unreadable") == found("OR 0.49 (0.32 to 0.75)", baseline="often").patient
    assert found("RR 0.5 (0.4 to 0.8)", baseline="20%").patient.with_.estimate == pytest.approx(0.1)


def test_a_rate_difference_is_not_carried():
    """No risk follows from a difference of rates alone."""
    assert Gap("rate-difference-not-carried") == found("rate difference -0.8 (-1.3 to -0.3)", baseline="20%").patient


def test_a_survey_at_a_starting_risk_has_no_number_needed():
    """As with counts."""
    findings = found("OR 0.49 (0.32 to 0.75)", baseline="20%", design="survey")
    assert Gap("design-survey-nnt") == findings.patient.number_needed


def test_cautions_of_an_adjusted_effect():
    """It is adjusted for what was measured, and its conversion is approximate, which takes the place of the other."""
    findings = found("OR 0.49 (0.32 to 0.75)", baseline="20%", design="cohort", adjusted_for_text=" age,  sex ")
    assert facts(findings)["adjusted-effect"] == {"design": "cohort", "adjusted_for": "age, sex"}
    assert "observational" not in facts(findings)
    assert facts(findings)["adjusted-converted"] == {"baseline": 0.2}
    crude = found("OR 0.49 (0.32 to 0.75)", baseline="20%", design="cohort")
    assert facts(crude)["observational"] == {"design": "cohort", "effect": "odds_ratio", "baseline": 0.2}
    assert "adjusted-converted" not in facts(crude)
    assert "adjusted-effect" in facts(found("aOR 0.49 (0.32 to 0.75)", design="cohort"))


def test_a_hazard_ratio_is_no_ratio_of_risks():
    """The caution names it as it is shown."""
    assert facts(found("HR 0.5 (0.4 to 0.8)"))["hazard-ratio"] == {"value": 0.5}
    assert facts(found("HR 0.5 (0.4 to 0.8)", index_group="second"))["hazard-ratio"] == {"value": 2}
    assert "hazard-ratio" not in facts(found("RR 0.5 (0.4 to 0.8)"))


def test_e_values_of_printed_ratios():
    """A risk ratio of 3.9 has 7.26, its limit of 1.8 has 3.0 (VanderWeele and Ding 2017, Ann Intern Med 167:268)."""
    findings = found("RR 3.9 (1.8 to 8.7)", design="case-control", paper_measure="odds_ratio")
    assert Gap("design-case-control") == only(findings)
    values = found("OR 3.9 (1.8 to 8.7)", design="case-control").extras.e_value
    assert (round(values.estimate, 2), values.limit, values.converted) == (7.26, pytest.approx(3.0), "")
    common = found("OR 3.9 (1.8 to 8.7)", design="case-control", baseline="30%").extras.e_value
    assert common.converted == "odds_ratio"
    assert common.estimate < values.estimate
    assert found("OR 3.9 (1.8 to 8.7)").extras.e_value is None


def test_limits_that_do_not_hold_their_estimate_carry_nothing():
    """The estimate stands and is marked; neither the patient nor p rests on limits that belong to something else."""
    findings = found("OR 5 (1 to 2)", baseline="12%")
    assert only(findings) == Figure(estimate=5.0, interval=Gap("limits-disordered"), method="printed")
    assert isinstance(findings.patient.difference.interval, Gap)
    assert isinstance(findings.conversion.risk_ratio.interval, Gap)
    assert isinstance(findings.extras.recovered, Gap)


def test_limits_printed_the_other_way_round_are_put_in_order():
    """A difference is often printed from the larger size to the smaller."""
    figure = only(found("RD -7.9% (-3.3 to -12.6)", paper_measure="risk_difference"))
    assert limits(figure) == pytest.approx((-0.079, -0.126, -0.033))
