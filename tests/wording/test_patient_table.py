"""The patient's figures as a table: low, usual and high on one number of people, at one level."""

from __future__ import annotations

import msgspec

from carried_patients import carried, effect, findings_with
from forms import effect_only, of_total
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.patient import patient_words
from fourcount.wording.patient_table import patient_table, patient_table_head, rows_sentence

RR, OR, HR = effect(0.54, 0.37, 0.78), effect(0.49, 0.32, 0.75), effect(0.72, 0.55, 0.92)
UP = effect(1.86, 1.29, 2.69)
AT_OWN = {"baseline_from": "reference", "start_from": "reference"}


def typed(text="12%", **more):
    return Patient(starting_risk_text=text, **more)


def test_one_head_names_one_level():
    """The study's own risk has its interval at the chosen level, so beside a print's other level it has none here."""
    outcome = of_total(design="cohort", adjusted_text="OR 0.47 (90% CI 0.30 to 0.72)", adjusted_for_text="age")
    found = appraise(outcome, Choices())
    words = patient_words(outcome, found, Choices(), 100)
    assert (words.without_interval, words.with_interval) == ("", "90% interval 6 to 13")
    (row,) = patient_table(found, Choices(), 100)
    assert (row.without, row.with_) == ("17", "9 (6 to 13)")
    same = patient_words(outcome, appraise(outcome, Choices(level=0.9)), Choices(level=0.9), 100)
    assert same.without_interval.startswith("90% interval ")


def test_a_table_over_another_span_names_both_spans():
    """The starting risk is one of the study's span, and the figures are over the other."""
    outcome = of_total(patient=typed(other_span_text="5 years"))
    found = appraise(outcome, Choices())
    assert patient_table(found, Choices())[0].label == "12% over 12 months"
    assert (
        patient_table_head(outcome, found, Choices()).with_ == "With: night lights, over 5 years, in 100 (95% interval)"
    )


LOW, HIGH = carried("risk_ratio", RR, 0.05, rank="low"), carried("risk_ratio", RR, 0.25, rank="high")
THREE = of_total(patient=typed(start_kind="three", low_risk_text="5%", high_risk_text="25%"))


def test_low_usual_and_high_stand_in_one_table_on_one_number_of_people():
    """Without, with, difference and number needed, each with its range."""
    patient = carried("risk_ratio", RR, 0.12, rank="usual", low=LOW, high=HIGH)
    found = findings_with(THREE, patient)
    assert patient_table(found, Choices(), 100) == [
        ("Low, 5%", "5", "3 (2 to 4)", "2 fewer (1 to 3)", "NNTB 44 (32 to 91)"),
        ("Usual, 12%", "12", "6 (4 to 9)", "6 fewer (3 to 8)", "NNTB 19 (14 to 38)"),
        ("High, 25%", "25", "14 (9 to 20)", "12 fewer (6 to 16)", "NNTB 9 (7 to 19)"),
    ]
    assert patient_table_head(THREE, found, Choices(), 100) == (
        "Starting risk",
        "Without: usual care, in 100 (95% interval)",
        "With: night lights, in 100 (95% interval)",
        "Difference, in 100 (95% interval)",
        "Number needed (95% interval)",
    )


def test_one_starting_risk_is_one_row():
    """Its label is the risk; the study's own is said to be."""
    outcome = of_total(patient=typed())
    (row,) = patient_table(findings_with(outcome, carried("risk_ratio", RR, 0.12)), Choices())
    assert row == ("12%", "12", "6 (4 to 9)", "6 fewer (3 to 8)", "NNTB 19 (14 to 38)")
    own = carried("risk_ratio", RR, 0.171, range_from="table", **AT_OWN)
    assert patient_table(findings_with(of_total(), own), Choices())[0].label == "The study’s own, 17.1%"


def test_a_table_takes_more_people_only_where_somebody_would_be_nobody():
    """0.4% of 100 would be nobody."""
    low = carried("risk_ratio", RR, 0.004, rank="low")
    found = findings_with(THREE, carried("risk_ratio", RR, 0.12, rank="usual", low=low, high=HIGH))
    rows = patient_table(found, Choices(), 100)
    assert [row.without for row in rows] == ["4", "120", "250"]
    assert "in 1,000" in patient_table_head(THREE, found, Choices(), 100).without


def test_a_rank_that_gives_nothing_says_why():
    """In its row, and in its line."""
    high = carried("risk_ratio", UP, 0.6, rank="high")
    patient = carried("risk_ratio", UP, 0.12, rank="usual", low=Gap("baseline-unreadable"), high=high)
    outcome = msgspec.structs.replace(THREE, index_group="second")
    found = findings_with(outcome, patient, OR)
    rows = patient_table(found, Choices())
    assert rows[0] == ("Low", "The starting risk cannot be read; 12% or 12 in 100 would do.", "", "", "")
    assert rows[2].with_ == "The risk would pass 100% here; the odds ratio can be carried instead."
    assert patient_words(outcome, found, Choices(), 100).ranks == (
        "At the low starting risk: the starting risk cannot be read; 12% or 12 in 100 would do.",
        "At the high starting risk of 60%: the risk would pass 100% here; the odds ratio can be carried instead.",
    )


def test_no_patient_has_no_table():
    """Nothing carried, nothing to list; the heads stand."""
    outcome = effect_only()
    found = msgspec.structs.replace(findings_with(outcome, carried("hazard_ratio", HR, 0.2)), patient=Gap("not-typed"))
    assert patient_table(found, Choices()) == []
    assert patient_table_head(outcome, found, Choices()).without == "Without: usual care"


def test_a_table_read_out_has_one_full_stop_a_row():
    """A row without figures is its reason, which is a sentence by itself; the others go on."""
    patient = carried("risk_ratio", RR, 0.12, rank="usual", low=Gap("low-above-usual"), high=HIGH)
    found = findings_with(THREE, patient)
    rows, head = patient_table(found, Choices(), 100), patient_table_head(THREE, found, Choices(), 100)
    said = rows_sentence(rows, head)
    assert said.startswith("Low: The low risk lies above the usual one; check which is which. Usual, 12%: Without: ")
    assert ".." not in said
    assert said.endswith("Number needed (95% interval): NNTB 9 (7 to 19).")
