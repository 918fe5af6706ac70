"""At which risk a patient starts: as it was typed, over the study's own time, and the low and high ones beside it."""

from __future__ import annotations

from collections.abc import Callable

from msgspec.structs import replace

from fourcount.record.outcome import Patient
from fourcount.wording.plain_outcome import PlainWords
from patient_outcomes import AT_TWELVE, TRIAL, WELCOME


def test_the_people_shown_are_those_at_this_starting_risk(say: Callable[..., PlainWords]) -> None:
    """They are like the study's only where the starting risk is the study's own."""
    assert say(TRIAL).lead == "These people are like those in the study."
    assert say(AT_TWELVE).lead == "These people start at a risk of 12 in 100."
    assert say(TRIAL).who == "for people like those in the study"
    assert say(AT_TWELVE).who == "for people who start at 12 in 100"


def test_low_and_high_starting_risks_are_said(say: Callable[..., PlainWords]) -> None:
    """Three starting risks give the usual one's page and a sentence for each of the others."""
    three = Patient(start_kind="three", low_risk_text="6%", starting_risk_text="12%", high_risk_text="24%")
    words = say(replace(TRIAL, patient=three))
    assert words.without.number == "12 in 100"
    assert words.other_starts == (
        "For people who start at 6 in 100, it is 3 in 100 with night lights.",
        "For people who start at 24 in 100, it is 13 in 100 with night lights.",
    )


def test_another_span_is_said_in_the_title(say: Callable[..., PlainWords]) -> None:
    """Risks carried to another time say that time, and that this is an assumption."""
    words = say(replace(AT_TWELVE, patient=Patient(starting_risk_text="12%", other_span_text="2 years")))
    assert words.title == "Falls in 2 years"
    assert words.study == "The study ran for 12 months. For 2 years, we assume that the risk goes on as before."


def test_starting_risks_are_told_over_the_studys_own_time(say: Callable[..., PlainWords]) -> None:
    """Nobody starts at a risk that is worked out over five years: starts are over the study's time."""
    other = {"other_span_text": "5 years"}
    words = say(replace(AT_TWELVE, patient=Patient(starting_risk_text="12%", **other)))
    assert words.lead == "These people start at a risk of 12 in 100 over 12 months."
    assert words.who == "for people who start at 12 in 100 over 12 months"
    assert words.without.number == "47 in 100"
    three = Patient(start_kind="three", low_risk_text="5%", starting_risk_text="12%", high_risk_text="25%", **other)
    assert say(replace(TRIAL, patient=three)).other_starts == (
        "For people who start at 5 in 100 over 12 months, it is 23 in 100 with usual care and 13 with night lights.",
        "For people who start at 25 in 100 over 12 months, it is 76 in 100 with usual care and 51 with night lights.",
    )
    assert say(replace(TRIAL, patient=Patient(**other))).lead.endswith("of 17 in 100 over 12 months.")


def test_a_welcome_start_is_told_as_it_was_typed(say: Callable[..., PlainWords]) -> None:
    """60% who heal is told as 60 who heal, also where 40 who do not are drawn."""
    three = Patient(start_kind="three", low_risk_text="20%", starting_risk_text="60%", high_risk_text="70%")
    words = say(replace(WELCOME, patient=three))
    assert words.lead == "These people start at 60 in 100 who heal."
    assert words.who == "for people who start at 60 in 100 who heal"
    assert words.without.number == "40 in 100"
    assert words.other_starts[0] == "For people who start at 20 in 100 who heal, it is 27 in 100 with night lights."


def test_a_start_too_small_for_the_picture_is_told_of_more_people(say: Callable[..., PlainWords]) -> None:
    """0.2% over the study's time is 2 in 1,000, whatever the picture over a longer time shows."""
    words = say(replace(AT_TWELVE, patient=Patient(starting_risk_text="0.2%", other_span_text="20 years")))
    assert words.lead == "These people start at a risk of 2 in 1,000 over 12 months."


def test_a_start_over_the_studys_time_has_its_own_number_of_people(say: Callable[..., PlainWords]) -> None:
    """60% is 60 in 100 also where the picture over a longer time shows 1,000."""
    words = say(replace(WELCOME, patient=Patient(starting_risk_text="60%", other_span_text="1 year")), 1_000)
    assert words.lead == "These people start at 60 in 100 who heal over 12 weeks."
    assert words.without.number == "19 in 1,000"
