"""What a pasted sentence says its effect was adjusted for. All sentences are invented."""

from __future__ import annotations

import pytest

from fourcount.record import editing
from fourcount.record.entry.paste import read_paste
from fourcount.record.entry.pasted.adjusted_for import adjusted_for
from fourcount.record.outcome import EffectOnly, Outcome

EFFECT = "(adjusted odds ratio, 0.49; 95% CI, 0.32 to 0.75)"


@pytest.mark.parametrize(
    ("text", "told"),
    [
        (
            f"After adjustment for age, sex and centre, night lights went with fewer falls {EFFECT}.",
            "age, sex and centre",
        ),
        ("Night lights v usual care: OR 0.49 [0.32, 0.75], adjusted for age and sex.", "age and sex"),
        ("Adjusted for age the odds ratio was 0.49 (0.32 to 0.75).", "age"),
        ("HR 0.72 (0.55 to 0.92), controlling for age, smoking, and ward", "age, smoking, and ward"),
        ("The odds ratio was 0.49 (0.32 to 0.75), unadjusted.", ""),
        ("It was adjusted for 12 months of follow-up.", ""),
        ("adjusted for ", ""),
        ("adjusted for " + "age, " * 10_000, "age" + ", age" * 39),
    ],
)
def test_the_list_ends_where_the_sentence_goes_on(text: str, told: str) -> None:
    """Items of a few words, parted by commas, to the last one behind "and"."""
    assert adjusted_for(text) == told


def test_a_pasted_effect_brings_what_it_was_adjusted_for() -> None:
    """In the field beside it."""
    pasted = read_paste(f"After adjustment for age and sex, night lights went with fewer falls {EFFECT}.")
    assert pasted is not None
    after = editing.take_paste(Outcome(), pasted)
    assert isinstance(after.table, EffectOnly)
    assert after.adjusted_for_text == "age and sex"


@pytest.mark.parametrize(
    "text",
    [
        "\tControls exposed\tControls not exposed\nCases exposed\t27\t29\nCases not exposed\t3\t44",
        "Of 27 pairs, both case and control were exposed in 9, only the case in 8, only the control in 3, neither in 7",
    ],
)
def test_pairs_of_cases_and_controls_are_a_matched_study(text: str) -> None:
    """Whatever the study was said to be before."""
    pasted = read_paste(text)
    assert pasted is not None
    assert editing.take_paste(Outcome(), pasted).design == "matched"
