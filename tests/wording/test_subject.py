"""Of whom a patient's words speak where carrying an effect turns the groups round, or where they are times."""

from __future__ import annotations

import msgspec
import pytest

from carried_patients import carried, effect, findings_with
from forms import paired
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices
from fourcount.wording.patient import missing, patient_words
from fourcount.wording.patient_sentence import patient_sentence
from fourcount.wording.subject import subject


def typed(text="12%", **more):
    return Patient(starting_risk_text=text, **more)


def words_of(outcome, patient):
    return patient_words(outcome, findings_with(outcome, patient), Choices(), 100)


def test_a_matched_study_is_turned_to_those_who_had_the_exposure():
    """Cases and controls were compared by exposure; a patient asks what the exposure does."""
    words = {"left_words_text": "took the drug", "right_words_text": "did not take the drug"}
    outcome = paired("matched", first_label_text="", second_label_text="", patient=typed("2%"), **words)
    patient = carried("odds_ratio", effect(2.0, 1.3, 3.2), 0.02, measure="pair_odds_ratio")
    found = words_of(outcome, patient)
    assert (found.without_title, found.with_title) == ("People who did not take the drug", "People who took the drug")
    assert found.picture_sentence.startswith(
        "Of 100 people who did not take the drug 2 (2%) became cases within 12 months and 98 did not; of 100 who took "
        "the drug 4 (4%) became cases and 96 did not: 2 more in 100"
    )
    turned = msgspec.structs.replace(outcome, index_group="second")
    assert words_of(turned, patient).with_title == "People who did not take the drug"
    assert words_of(msgspec.structs.replace(turned, counted="right"), patient).with_title == "People who took the drug"


@pytest.mark.parametrize(
    ("label", "event"),
    [
        ("", "became cases"),
        ("Cases", "became cases"),
        ("Hip fractures", "had hip fractures"),
        ("Stroke cases", "had the event “stroke”"),
        ("Cases of stroke", "had the event “stroke”"),
    ],
)
def test_cases_are_called_after_what_they_had(label, event):
    """By the label that the reader gave them."""
    outcome = paired("matched", first_label_text=label, second_label_text="", left_words_text="took the drug")
    assert subject(outcome).left_words_text == event


def test_a_matched_study_has_to_name_the_exposure_and_the_event():
    """ "Became cases" says nothing to a patient, nor "were exposed"."""
    bare = {"first_label_text": "", "second_label_text": "", "left_words_text": "", "right_words_text": ""}
    assert missing(paired("matched", **bare)) == ("the event", "the reference group", "the index group")
    named = {**bare, "first_label_text": "Hip fractures", "left_words_text": "was treated"}
    assert missing(paired("matched", **named)) == ()
    spoken = subject(paired("matched", **named))
    assert (spoken.first_label_text, spoken.second_label_text) == (
        "people who were treated",
        "people who were not treated",
    )


def test_before_and_after_are_times():
    """Nobody is without or with anything."""
    outcome = paired("before-after", first_label_text="after", second_label_text="before", patient=typed("30%"))
    patient = carried("risk_ratio", effect(0.71, 0.5, 0.98), 0.3, measure="pair_ratio", gap="design-before-after")
    words = words_of(outcome, patient)
    assert (words.without_title, words.with_title) == ("Before", "After")
    assert words.picture_sentence.startswith(
        "Of 100 people 30 (30%) fell at least once within 12 months before and 70 "
    )
    said = patient_sentence(outcome, findings_with(outcome, patient), Choices())
    assert said.startswith(
        "Of 100 people 30 fell at least once within 12 months before and 21 (95% interval 15 to 29) after"
    )
