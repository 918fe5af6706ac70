"""The patient's words where the effect is not that of four counts: whose it is, at which level, and what would help."""

from __future__ import annotations

import pytest

from copies import letter
from forms import at_time, effect_only, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.record.paper import Choices
from fourcount.wording.patient import patient_words


def words_of(outcome):
    return patient_words(outcome, appraise(outcome, Choices()), Choices(), 100)


@pytest.mark.parametrize(
    ("outcome", "basis"),
    [
        (strata(risk="12%"), "Starting risk 12%, pooled risk ratio 0.55 (0.38 to 0.79) kept constant."),
        (
            effect_only("odds_ratio", risk="12%", adjusted_for_text="age"),
            "Starting risk 12%, adjusted odds ratio 0.72 (0.55 to 0.92) kept constant.",
        ),
        (
            effect_only("risk_ratio", risk="12%"),
            "Starting risk 12%, risk ratio 0.72 (0.55 to 0.92) kept constant.",
        ),
    ],
)
def test_the_basis_says_whose_effect_is_carried(outcome, basis):
    """Pooled, adjusted, or as printed."""
    assert words_of(outcome).basis == basis


def test_a_printed_effect_is_carried_to_whole_people():
    """Without, with, and the difference, at the typed starting risk."""
    words = words_of(effect_only("risk_ratio", risk="12%"))
    assert (words.without_count, words.with_count) == ("12 in 100", "9 in 100")
    assert words.summary_bold == "3 fewer in 100 fell at least once"


def test_an_interval_of_a_patient_has_the_level_of_the_print():
    """The record's own level does not change printed limits, in the window or in a letter."""
    outcome = effect_only("risk_ratio", "0.72; 90% CI 0.55 to 0.92", risk="12%")
    assert "90% interval" in words_of(outcome).summary
    assert "95% interval" not in letter(outcome)


@pytest.mark.parametrize(
    ("outcome", "help_"),
    [
        (person_time(), "Type a starting risk, or a rate and the time: person-time itself gives no risk."),
        (effect_only(), "Type a starting risk: the paper’s ratio alone does not give one."),
        (
            effect_only("rate_difference", "-2 (-4 to -1) per 1,000"),
            "A rate difference cannot be turned into a risk here.",
        ),
        (effect_only("risk_ratio"), "Type a starting risk: the paper’s ratio alone does not give one."),
        (strata(), "Each stratum has its own starting risk: type the patient’s."),
        (paired("matched"), "Type a starting risk from another source: a case-control study has none."),
    ],
)
def test_where_nobody_is_carried_one_sentence_says_why_or_what_would_help(outcome, help_):
    """In place of a picture."""
    words = words_of(outcome)
    assert help_ in words.detail
    assert words.detail.endswith(".")
    assert not words.without_count


def test_printed_risks_are_carried_as_they_stand():
    """With the level of their print."""
    words = words_of(at_time(level="90%"))
    assert (words.without_count, words.with_count) == ("17 in 100", "9 in 100")
    assert words.summary.endswith("90% interval 3 to 13")


def test_a_printed_effect_is_carried_in_the_digits_of_its_print():
    """What everything rests on is named as the paper prints it."""
    assert (
        "odds ratio 9.7 (2.9 to 31.7) kept constant"
        in words_of(effect_only("odds_ratio", "9.7 (2.9-31.7)", "12%")).basis
    )
