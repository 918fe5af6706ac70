"""The working of one patient's figures: each formula with the reader's numbers in it, and where it is from."""

from __future__ import annotations

import pytest

from carried_patients import carried, effect, findings_with, with_counts
from forms import effect_only, of_total, person_time
from fourcount.appraisal.appraise import appraise
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.working import PATIENT, working

RR, HR = effect(0.54, 0.37, 0.78), effect(0.72, 0.55, 0.92)
FIVE_YEARS = {"study_span": Duration(value=12, unit="month"), "other_span": Duration(value=5, unit="year")}


def rows_of(outcome, patient):
    return working(PATIENT, outcome, findings_with(outcome, patient), Choices()).rows


@pytest.mark.parametrize(
    ("kind", "value", "formula"),
    [
        ("risk_ratio", 0.54, "0.1200 × 0.5400 = 0.0648"),
        ("odds_ratio", 0.49, "0.1200 × 0.4900/(1 − 0.1200 + 0.1200 × 0.4900) = 0.0626"),
        ("hazard_ratio", 0.72, "1 − (1 − 0.1200)^0.7200 = 0.0879"),
        ("rate_ratio", 0.72, "1 − (1 − 0.1200)^0.7200 = 0.0879"),
        ("risk_difference", -0.05, "0.1200 + (−0.0500) = 0.0700"),
    ],
)
def test_each_effect_has_its_formula_with_the_numbers(kind, value, formula):
    """From the starting risk to the risk with, as a reader could follow it."""
    outcome = of_total(patient=Patient(starting_risk_text="12%"))
    figure = effect(value, value - 0.01, value + 0.01)
    rows = dict(rows_of(outcome, carried(kind, figure, 0.12))[:6])
    assert rows["With"] == formula
    assert rows["Starting risk"] == "0.1200"


def test_difference_and_number_needed_follow_from_the_risks():
    """One from the other."""
    rows = rows_of(of_total(), carried("risk_ratio", RR, 0.12))
    assert ("Difference", "0.0648 − 0.1200 = −0.0552") in rows
    assert ("Number needed", "1/0.0552 = 18.12, rounded up 19") in rows
    assert ("Difference, per 100", "5.5 fewer (2.6 to 7.6)") in rows


def test_a_rate_is_turned_into_a_risk():
    """By its exponential, in years."""
    outcome = person_time(patient=Patient(start_kind="rate", rate_text="1 per 1,000 person-months"))
    patient = carried("rate_ratio", RR, 0.1130795, start_from="rate", study_span=Duration(value=10, unit="year"))
    rows = rows_of(outcome, patient)
    assert ("Starting risk", "1 − exp(−0.0120 × 10) = 0.1131, the rate and the time in years") in rows
    assert ("Method", "Starting risk from a rate") in rows


def test_an_overall_risk_is_solved():
    """With the letters of its formula."""
    start = Patient(start_kind="overall", overall_risk_text="12%", exposed_share_text="30%")
    rows = rows_of(of_total(design="cohort", patient=start), carried("risk_ratio", RR, 0.1392, start_from="overall"))
    assert ("Solved from", "P = 0.1200, s = 0.3000") in rows
    assert ("Method", "Starting risk from an overall risk") in rows


def test_another_span_has_its_power():
    """The starting risk first, at the study's span."""
    rows = rows_of(effect_only(risk="20%"), carried("hazard_ratio", HR, 0.2, **FIVE_YEARS))
    assert ("Method", "Risks over another time span") in rows
    assert dict(rows[:3])["Without"].startswith("1 − (1 − 0.2000)^(5/1) = ")


@pytest.mark.parametrize(
    ("patient", "title"),
    [
        (with_counts("risk_ratio", RR, 24, 200), "Propagated imprecision of effect and starting risk"),
        (carried("odds_ratio", RR, 0.12), "Odds ratio as a risk ratio at a starting risk"),
        (carried("risk_difference", effect(-0.05, -0.06, -0.04), 0.12), "Risk difference at a starting risk"),
    ],
)
def test_every_calculation_is_named_with_its_source(patient, title):
    """Its title, its formula and where it is from."""
    rows = rows_of(of_total(), patient)
    place = rows.index(("Method", title))
    assert [label for label, _ in rows[place : place + 3]] == ["Method", "Formula", "Source"]


def test_without_a_patient_the_reason_is_all():
    """No rows of nothing."""
    outcome = effect_only()
    found = working(PATIENT, outcome, appraise(outcome, Choices()), Choices())
    assert found.rows == ()
    assert found.sentence.endswith(".")


def test_the_studys_own_figures_are_said_to_be():
    """No formula of an effect, since none was carried."""
    own = carried("risk_ratio", RR, 0.171, baseline_from="reference", start_from="reference", range_from="table")
    rows = rows_of(of_total(), own)
    assert rows[0] == ("Starting risk", "0.1710, the study’s own")
    assert not any("kept constant" in text or label == "Method" for label, text in rows)
