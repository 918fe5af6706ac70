"""Names of events as sentences say them of people."""

from __future__ import annotations

import pytest

from fourcount.wording import names
from fourcount.wording.event_names import lacked_by, of_people, without_unit


@pytest.mark.parametrize(
    ("printed", "name"),
    [
        ("Falls, %", "Falls"),
        ("Falls, n (%)", "Falls"),
        ("Falls, no. (%)", "Falls"),
        ("Falls (%)", "Falls"),
        ("Falls (n)", "Falls"),
        ("Falls %", "Falls"),
        ("Falls: number", "Falls"),
        ("Weight loss of 5%", "Weight loss of 5%"),
        ("Stage n", "Stage n"),
        ("%", "%"),
        ("Falls", "Falls"),
    ],
)
def test_a_name_stands_without_the_unit_of_its_row(printed, name):
    """What a table's row counts in is no part of what it counts."""
    assert without_unit(printed) == name


@pytest.mark.parametrize(
    ("typed", "said", "lack"),
    [
        ("falls", "had falls", "had no falls"),
        ("Falls, %", "had falls", "had no falls"),
        ("serious adverse events", "had serious adverse events", "had no serious adverse events"),
        ("Falls at night", "had falls at night", "had no falls at night"),
        ("Death", "died", "did not die"),
    ],
)
def test_a_plural_noun_takes_a_verb(typed, said, lack):
    """So that the sentence is one."""
    assert (of_people(typed), lacked_by(typed)) == (said, lack)


@pytest.mark.parametrize(
    "typed",
    ["fell at least once", "died", "needs dialysis", "kept appointments", "did not fall", "sepsis", "improved nights",
     "5 falls", "was moved", "relapse", "illness", "Ängste"],
)  # fmt: skip
def test_what_is_not_known_for_a_plural_noun_stays_as_typed(typed):
    """A wrong verb is worse than none."""
    assert of_people(typed) == ""


def test_the_reader_s_noun_is_said_of_people(outcome_of):
    """As words, and as a heading alone; the other outcome is its lack."""
    outcome = outcome_of(left_words_text="falls", right_words_text="", left_heading_text="", right_heading_text="")
    assert (names.event_words(outcome), names.event_key(outcome)) == ("had falls", "had falls")
    other = outcome_of(
        left_words_text="",
        left_heading_text="Falls, n (%)",
        right_words_text="",
        right_heading_text="",
        counted="right",
    )
    assert names.event_words(other) == "had no falls"
    assert names.other_words(other) == "had falls"


@pytest.mark.parametrize(
    ("typed", "said"),
    [("Relapse, n (%)", "had the event “Relapse”"), ("Falls, %", "had falls"), ("relapsed", "relapsed")],
)
def test_the_name_of_a_row_typed_as_words_is_no_sentence(outcome_of, typed, said):
    """A paste may bring it there."""
    assert names.event_words(outcome_of(left_words_text=typed)) == said


def test_an_outcome_is_named_without_its_unit(outcome_of):
    """Above a picture and in a letter."""
    outcome = outcome_of(name_text="Falls, %")
    assert names.outcome_name(outcome) == "Falls"
