"""What is kept constant for a patient, over which time, and what its relative figure is of; all figures invented."""

from __future__ import annotations

import pytest

from carried_patients import carried, effect, findings_with
from forms import of_total, paired
from fourcount.appraisal.appraise import appraise
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.basis import basis
from fourcount.wording.effects import carriable_words
from fourcount.wording.lines import measure_lines
from fourcount.wording.patient import missing_fields, patient_words
from fourcount.wording.patient_sentence import patient_sentence
from fourcount.wording.sentence import headline

RR, OR, HR = effect(0.54, 0.37, 0.78), effect(0.49, 0.32, 0.75), effect(0.72, 0.55, 0.92)
YEAR, FIVE_YEARS = Duration(value=12, unit="month"), Duration(value=5, unit="year")


def typed(**more):
    return Patient(starting_risk_text="12%", **more)


def words_of(outcome, patient):
    return patient_words(outcome, findings_with(outcome, patient), Choices(), 100)


@pytest.mark.parametrize(
    ("patient", "said"),
    [
        (carried("risk_ratio", RR, 0.12), "In relative words 46% lower ("),
        (carried("odds_ratio", OR, 0.12), "In relative words the risk (not the odds) is 48% lower ("),
        (carried("hazard_ratio", HR, 0.2), "In relative words the risk (not the hazard) is 26% lower ("),
        (
            carried("risk_ratio", RR, 0.12, study_span=YEAR, other_span=FIVE_YEARS),
            "In relative words the risk over 5 years is 46% lower (",
        ),
    ],
)
def test_the_relative_figure_says_what_it_is_of_where_that_is_not_what_is_kept(patient, said):
    """Of risks, at the span in use: a ratio of odds or hazards, or one over another time, has another size."""
    assert said in words_of(of_total(patient=typed()), patient).detail


def test_an_effect_is_kept_over_the_studys_time_where_another_is_asked_for():
    """A ratio of risks is; one of hazards is the same over any time."""
    outcome = of_total(span_text="12 months", patient=typed(other_span_text="5 years"))
    rr = carried("risk_ratio", RR, 0.12, study_span=YEAR, other_span=FIVE_YEARS)
    hr = carried("hazard_ratio", HR, 0.12, study_span=YEAR, other_span=FIVE_YEARS)
    (one,), (other,) = findings_with(outcome, rr).carriable, findings_with(outcome, hr).carriable
    assert carriable_words(outcome, one) == "risk ratio 0.54 over 12 months, kept constant"
    assert carriable_words(outcome, other) == "hazard ratio 0.72, kept constant"
    assert "risk ratio 0.54 (0.37 to 0.78) kept constant over 12 months, carried to 5 years" in basis(outcome, rr)
    assert carriable_words(of_total(patient=typed()), one) == "risk ratio 0.54, kept constant"


def test_an_interval_of_altered_counts_says_so_beside_the_patient():
    """Nobody of 100 had the event: half was added for the interval alone, which then misses the estimate of 0."""
    outcome = of_total(counts=(0, 100, 10, 100), patient=typed())
    choices = Choices(family="textbook")
    found = appraise(outcome, choices)
    said = "The interval comes from counts with a half added, so it need not hold the estimate."
    assert said in patient_words(outcome, found, choices, 100).detail
    assert said in patient_sentence(outcome, found, choices)
    assert "half" not in patient_words(outcome, appraise(outcome, Choices()), Choices(), 100).detail


def test_the_studys_own_figures_by_an_adjusted_effect_are_told_from_its_crude_ones():
    """Beside the sentence of the counts they look like another answer to the same question."""
    adjusted = {"design": "cohort", "adjusted_text": "OR 0.60 (0.40 to 0.90)", "adjusted_for_text": "age"}
    said = "These rest on the adjusted odds ratio, not on the table’s crude counts alone."
    for start, told in ((Patient(), True), (typed(), False)):
        outcome = of_total(patient=start, **adjusted)
        assert (said in patient_words(outcome, appraise(outcome, Choices()), Choices(), 100).detail) == told


def test_no_effect_has_no_cause():
    """A number needed of infinity supposes nothing."""
    outcome = of_total(counts=(10, 100, 10, 100), design="cohort", patient=typed())
    detail = patient_words(outcome, appraise(outcome, Choices()), Choices(), 100).detail
    assert "NNT at this starting risk ∞" in detail
    assert "caused" not in detail


def test_pairs_without_names_are_the_sides_of_their_table():
    """People who are their own controls are neither an index group nor with or without anything."""
    outcome = paired(first_label_text="", second_label_text="")
    found = appraise(outcome, Choices())
    words = patient_words(outcome, found, Choices(), 100)
    assert (words.without_title, words.with_title) == ("Second side", "First side")
    assert "group" not in f"{words.picture_sentence} {headline(outcome, found, Choices())}"
    assert "on the second side" in headline(outcome, found, Choices())


def test_a_matched_study_asks_for_its_own_names():
    """What the cases have is their name, and what people were exposed to is what the table counts."""
    nothing = {"left_words_text": "", "right_words_text": "", "left_heading_text": "", "right_heading_text": ""}
    outcome = paired("matched", first_label_text="", second_label_text="", span_text="", **nothing)
    assert missing_fields(outcome) == (
        "the name of the cases, by what they have",
        "what people were exposed to (“People who”)",
        "“Time span”",
    )


@pytest.mark.parametrize(("start", "offered"), [("70%", True), ("100%", False)])
def test_odds_are_offered_where_they_would_help(start, offered):
    """Of everybody no odds ratio makes more or fewer; the mark says so, and nothing beside it says otherwise."""
    outcome = of_total(index_group="second", patient=Patient(starting_risk_text=start))
    detail = patient_words(outcome, appraise(outcome, Choices()), Choices(), None).detail
    assert detail.startswith("The risk would pass 100% here")
    assert ("odds ratio" in detail) == offered


def test_a_survey_was_done_at_a_time_and_over_none():
    """Its time stands under a figure as it is typed."""
    outcome = of_total(design="survey", span_text="2019", patient=typed())
    assert patient_words(outcome, appraise(outcome, Choices()), Choices(), 100).summary == "2019, 95% interval 3 to 8"


def test_where_everybody_has_it_the_risk_with_it_is_the_overall_one():
    """It then has no interval, whatever effect is kept, and the sentence is that of an overall risk."""
    start = {"start_kind": "overall", "overall_risk_text": "2%", "exposed_share_text": "100%"}
    for effect_used in ("risk_ratio", "risk_difference"):
        outcome = of_total(patient=Patient(effect=effect_used, **start))
        words = patient_words(outcome, appraise(outcome, Choices()), Choices(), None)
        assert words.with_interval == ""
        assert "The interval takes the overall risk and the share of people who have it as certain." in words.detail


def test_a_starting_risk_that_is_worked_out_has_no_digits_that_it_does_not_carry():
    """An overall risk of 12% gives no risk to the second decimal, in column three or beside the odds ratio."""
    outcome = of_total(patient=Patient(start_kind="overall", overall_risk_text="12%", exposed_share_text="31%"))
    found = appraise(outcome, Choices())
    note = next(line.note for line in measure_lines(outcome, found, Choices()) if line.key == "odds_ratio")
    assert note.startswith("as a risk ratio at 14.0%: ")
    assert patient_words(outcome, found, Choices(), 100).basis.startswith("Starting risk 14.0% (")
