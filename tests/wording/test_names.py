"""The reader's own words inside our sentences."""

from __future__ import annotations

import pytest

from fourcount.wording import names


@pytest.mark.parametrize(
    ("text", "inside"),
    [
        ("Usual care", "usual care"),
        ("ACE inhibitor", "ACE inhibitor"),
        ("Vitamin D", "vitamin D"),
        ("X", "X"),
        ("mRNA vaccine", "mRNA vaccine"),
        ("Non-smokers", "non-smokers"),
        ("5-FU", "5-FU"),
        ("Beta-blocker", "beta-blocker"),
        ("", ""),
    ],
)
def test_a_label_loses_its_capital_only_if_it_is_an_ordinary_word(text, inside):
    """One capital followed by small letters, and nothing else."""
    assert names.mid_sentence(text) == inside


def test_a_group_is_with_its_treatment_in_a_trial_and_by_name_elsewhere(outcome_of):
    """Any noun fits: smokers are not something one is "with"."""
    trial = outcome_of(first_label_text="Night lights")
    cohort = outcome_of(first_label_text="Smokers", design="cohort")
    assert names.in_group(trial, "index") == "with night lights"
    assert names.in_group(cohort, "index") == "in the group “Smokers”"


@pytest.mark.parametrize(
    ("typed", "text"),
    [(" fell. ", "fell"), ("aspirin b.i.d.", "aspirin b.i.d."), (".", ""), ("St.\n John", "St. John")],
)
def test_a_closing_full_stop_does_not_end_our_sentence(outcome_of, typed, text):
    """It goes, unless the name has another one and so is an abbreviation."""
    assert names.bare(typed) == text
    assert names.label(outcome_of(first_label_text=typed), "index") == (text or "index group")
    assert names.event_words(outcome_of(left_words_text=typed)) == (text or "had the event “fell”")


def test_a_group_without_a_label_has_a_stand_in(outcome_of):
    """The index group and the reference group, in every design."""
    outcome = outcome_of(first_label_text=" ", second_label_text="", design="cohort")
    assert names.in_group(outcome, "index") == "in the index group"
    assert names.label(outcome, "reference") == "reference group"


@pytest.mark.parametrize(
    ("span", "within", "over"),
    [
        ("12 months", "within 12 months", "over 12 months"),
        ("at 5 years", "within 5 years", "over 5 years"),
        ("30-day", "within 30 days", "over 30 days"),
        ("Over 1 y.", "within 1 year", "over 1 year"),
        ("median 2 years", "within median 2 years", "over median 2 years"),
        ("at discharge", "at discharge", "at discharge"),
        ("0 days", "", ""),
        ("-3 days", "", ""),
        ("1000000 years", "", ""),
        ("During the stay", "During the stay", "During the stay"),
        ("inpatient stay", "within inpatient stay", "over inpatient stay"),
        ("  ", "", ""),
    ],
)
def test_a_span_takes_a_preposition_unless_it_has_one(outcome_of, span, within, over):
    """Within after a verb, over under a figure; a time is said in one form, and what is no time is not said."""
    outcome = outcome_of(span_text=span)
    assert (names.within_span(outcome), names.over_span(outcome)) == (within, over)


def test_a_survey_has_no_within(outcome_of):
    """People have a condition at a time, not within it."""
    assert names.within_span(outcome_of(design="survey", span_text="2019")) == "(2019)"


def test_the_event_falls_back_on_what_else_was_typed(outcome_of):
    """The words, else the heading in quotes, else a stand-in."""
    assert names.event_words(outcome_of()) == "fell at least once"
    assert names.event_words(outcome_of(left_words_text="")) == "had the event “fell”"
    nothing = dict.fromkeys(("left_words_text", "left_heading_text", "right_words_text", "right_heading_text"), "")
    assert names.event_words(outcome_of(**nothing)) == "had the event"
    assert names.event_words(outcome_of(left_words_text="", left_heading_text="Was moved")) == "Was moved"


@pytest.mark.parametrize(
    ("counted", "left", "right", "event", "other"),
    [
        ("left", "", "", "had the event", "did not have the event"),
        ("right", "", "", "did not have the event", "had the event"),
        ("left", "fell", "", "fell", "did not"),
        ("right", "fell", "", "did not have the outcome “fell”", "fell"),
        ("left", "", "healed", "did not have the outcome “healed”", "healed"),
        ("right", "", "healed", "healed", "did not"),
    ],
)
def test_a_column_without_a_name_keeps_its_own_words(outcome_of, counted, left, right, event, other):
    """Counting the other outcome changes what is counted, never what an unnamed column is called."""
    headings = {"left_heading_text": "", "right_heading_text": ""}
    outcome = outcome_of(counted=counted, left_words_text=left, right_words_text=right, **headings)
    assert (names.event_words(outcome), names.other_words(outcome)) == (event, other)
    assert names.event_key(outcome) == event
    assert names.other_key(outcome) == ("all others" if other == "did not" else other)


def test_the_other_outcome_follows_what_is_counted(outcome_of):
    """Counting the other outcome swaps the two."""
    outcome = outcome_of(counted="right")
    assert names.event_words(outcome) == "did not fall"
    assert names.other_words(outcome) == "fell at least once"


@pytest.mark.parametrize(
    ("effect", "name"),
    [
        ("risk_ratio", "prevalence ratio"),
        ("risk_difference", "prevalence difference"),
        ("odds_ratio", "odds ratio"),
        ("hazard_ratio", "hazard ratio"),
        ("rate_ratio", "rate ratio"),
    ],
)
def test_an_effect_is_called_what_its_design_allows(outcome_of, effect, name):
    """A survey has prevalences; odds, hazards and rates are called the same everywhere."""
    assert names.effect_name(outcome_of(design="survey"), effect) == name


def test_people_who_did_something_are_no_group_to_be_with(outcome_of):
    """A label that begins with them stands behind "people" as it is."""
    outcome = outcome_of(design="cohort", first_label_text="People who smoked")
    assert names.in_group(outcome, "index") == "who smoked"
