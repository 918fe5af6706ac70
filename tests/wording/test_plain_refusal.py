"""No page for a patient before outcome, groups and time span have names and there are risks."""

from __future__ import annotations

from collections.abc import Callable

import pytest
from msgspec.structs import replace

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.record.outcome import Outcome, Patient
from fourcount.wording import plain_texts
from fourcount.wording.plain_refusal import why_not
from patient_outcomes import CASE_CONTROL, SHOWN, TRIAL, WELCOME

FindingsOf = Callable[[Outcome], OutcomeFindings]


@pytest.mark.parametrize("name", SHOWN)
def test_every_kind_of_outcome_can_be_shown(name: str, findings_of: FindingsOf) -> None:
    """Nothing is missing from a whole outcome, whatever its form."""
    assert why_not(SHOWN[name], findings_of(SHOWN[name])) == ""


@pytest.mark.parametrize(
    ("changes", "item"),
    [
        ({"span_text": ""}, "“Time span”"),
        ({"first_label_text": " "}, "the name of the index group"),
        ({"second_label_text": ""}, "the name of the reference group"),
        ({"left_words_text": "", "left_heading_text": ""}, "what happens to them (“People who”)"),
    ],
)
def test_what_is_missing_is_named(changes: dict[str, str], item: str, findings_of: FindingsOf) -> None:
    """Without outcome, groups or time span nothing is shown, and the sentence names what to fill in."""
    outcome = replace(TRIAL, **changes)
    why = why_not(outcome, findings_of(outcome))
    assert why == f"Before a patient is shown this, fill in {item}."


def test_plain_words_stand_in_for_the_event(findings_of: FindingsOf) -> None:
    """An event that is only named for patients is named."""
    outcome = replace(TRIAL, left_words_text="", left_heading_text="", plain_event_text="fall")
    assert why_not(outcome, findings_of(outcome)) == ""


def test_a_welcome_outcome_needs_words_for_the_others(findings_of: FindingsOf) -> None:
    """Where the drawn side has no words and none follow from the other's, they are asked for."""
    outcome = replace(WELCOME, left_words_text="転倒した", right_words_text="")
    assert plain_texts.OTHER_OUTCOME in why_not(outcome, findings_of(outcome))


def test_a_case_control_study_without_a_starting_risk_is_refused(findings_of: FindingsOf) -> None:
    """No risks, no page; the sentence asks for the starting risk."""
    outcome = replace(CASE_CONTROL, patient=Patient())
    assert "starting risk" in why_not(outcome, findings_of(outcome))
