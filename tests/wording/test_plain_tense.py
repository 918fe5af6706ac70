"""What happens to people in the present tense, and its lack, from the paper's words in the past."""

from __future__ import annotations

import pytest
from msgspec.structs import replace

from fourcount.record.outcome import PersonTime
from fourcount.wording.plain import negated, plain_hint, present
from patient_outcomes import TRIAL


@pytest.mark.parametrize(
    ("typed", "said"),
    [
        ("fell at least once", "fall at least once"),
        ("was readmitted", "are readmitted"),
        ("Died within 30 days", "die within 30 days"),
        ("did not fall or die", "do not fall or die"),
        ("developed pneumonia, died or were readmitted", "develop pneumonia, die or are readmitted"),
        ("had a stroke or heart attack", "have a stroke or heart attack"),
        ("had no falls", "have no falls"),
        ("had been admitted", "had been admitted"),
        ("fell and limped", "fell and limped"),
        ("転倒した", "転倒した"),
        ("", ""),
    ],
)
def test_the_past_is_said_in_the_present(typed: str, said: str) -> None:
    """Known verbs are turned, in every part of a phrase; a phrase with an unknown one stays whole as typed."""
    assert present(typed) == said


@pytest.mark.parametrize(
    "typed",
    [
        "lost to follow-up",
        "left leg ulcer",
        "left ventricular failure",
        "used to smoke",
        "missed miscarriage",
        "fractured neck of femur",
        "relapsed disease",
        "healed ulcer",
        "worsened pain",
    ],
)
def test_what_only_looks_like_a_verb_stays_as_typed(typed: str) -> None:
    """Words of the table that are no verb of these people in this phrase are left alone."""
    assert present(typed) == typed


@pytest.mark.parametrize(
    ("typed", "said"),
    [
        ("lost weight", "lose weight"),
        ("left the trial", "leave the trial"),
        ("used a stick", "use a stick"),
        ("missed an appointment", "miss an appointment"),
        ("fractured a hip", "fracture a hip"),
        ("relapsed within a year", "relapse within a year"),
        ("healed completely", "heal completely"),
        ("survived 5 years", "survive 5 years"),
    ],
)
def test_the_same_words_as_verbs_are_turned(typed: str, said: str) -> None:
    """Where what follows shows a verb it is put into the present."""
    assert present(typed) == said


@pytest.mark.parametrize(
    ("said", "lack"),
    [
        ("fall at least once", "do not fall at least once"),
        ("are readmitted", "are not readmitted"),
        ("do not heal", "heal"),
        ("have no falls", "have falls"),
        ("die or are readmitted", ""),
        ("転倒した", ""),
    ],
)
def test_the_lack_is_said_only_where_it_is_plain(said: str, lack: str) -> None:
    """A known verb is negated; a phrase of several parts or without a known verb is not."""
    assert negated(said) == lack


def test_a_column_without_a_name_is_said_by_the_other_one() -> None:
    """The hint of an unnamed column is the lack of the named one, in the fewest words beside it."""
    bare = replace(TRIAL, right_words_text="", right_heading_text="", left_heading_text="")
    assert plain_hint(bare, "right") == "do not"
    assert plain_hint(bare, "left") == "fall at least once"


def test_person_time_has_words_for_the_others_too() -> None:
    """Its table has events alone; the others are said as typed, else as the lack of the event."""
    rates = replace(TRIAL, table=PersonTime(unit_text="person-years"))
    assert plain_hint(rates, "right") == "do not fall"
    assert plain_hint(replace(rates, right_words_text="", right_heading_text=""), "right") == "do not"
