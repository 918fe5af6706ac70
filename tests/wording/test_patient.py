"""The patient's words: whole people, both frames, the absolute first, and what is missing."""

from __future__ import annotations

import re

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.outcome import Outcome, Patient
from fourcount.record.paper import Choices, Record
from fourcount.wording.example import worked_example
from fourcount.wording.patient import DO_NOT_ADD_UP, patient_words, picture_heading
from fourcount.wording.sentence import headline


def words_of(outcome, findings_of, denominator=100):
    return patient_words(outcome, findings_of(outcome), Choices(), denominator)


def at(starting_risk, effect="risk_ratio"):
    return Patient(starting_risk_text=starting_risk, effect=effect)


def test_the_example_at_twelve_per_cent(outcome_of, findings_of):
    """Every text of the picture, from the risks themselves."""
    words = words_of(outcome_of(patient=at("12%")), findings_of)
    assert (words.without_title, words.with_title) == ("Without: usual care", "With: night lights")
    assert (words.without_count, words.without_percent) == ("12 in 100", "12%")
    assert (words.with_count, words.with_percent) == ("6 in 100", "6%")
    assert (words.summary_bold, words.summary) == (
        "6 fewer in 100 fell at least once",
        "over 12 months, 95% interval 3 to 8",
    )
    assert words.detail == (
        "NNTB at this starting risk 19 (14 to 38). In relative words 46% lower (22% to 63%). "
        "The interval leaves out that 12% is itself uncertain."
    )
    assert words.missing == ()
    assert words.picture_sentence == (
        "Of 100 people with usual care 12 (12%) fell at least once within 12 months and 88 did not fall; of 100 with "
        "night lights 6 (6%) fell at least once and 94 did not fall: 6 fewer in 100, 95% interval 3 to 8. "
        "We cannot say which people."
    )


def test_the_studys_own_risk_has_the_tables_range(outcome_of, findings_of):
    """Nothing is left out of it, so nothing is said to be."""
    words = words_of(outcome_of(), findings_of)
    assert words.without_title == "Without: usual care"
    assert words.without_count == "17 in 100"
    assert words.detail == "NNTB at this starting risk 13 (8 to 31). In relative words 46% lower (22% to 63%)."


@pytest.mark.parametrize(
    ("changes", "basis"),
    [
        ({}, "At the study’s own starting risk."),
        ({"design": "survey"}, "At the study’s own starting prevalence."),
        ({"patient": at("12%")}, "Starting risk 12%, risk ratio 0.54 (0.37 to 0.78) kept constant."),
        (
            {"patient": at("12%", "odds_ratio"), "design": "case-control"},
            "Starting risk 12%, odds ratio 0.49 (0.32 to 0.75) kept constant.",
        ),
        (
            {"patient": at("12%"), "design": "survey"},
            "Starting risk 12%, prevalence ratio 0.54 (0.37 to 0.78) kept constant.",
        ),
    ],
)
def test_the_figures_say_what_they_rest_on(outcome_of, findings_of, changes, basis):
    """The starting risk and the effect carried to it, by the name that the design gives it."""
    assert words_of(outcome_of(**changes), findings_of).basis == basis


@pytest.mark.parametrize(
    ("denominator", "count", "percent"),
    [
        (100, "under 1 in 100", "0.3%"),
        (1_000, "3 in 1,000", "0.3%"),
        (10_000, "25 in 10,000", "0.25%"),
    ],
)
def test_counts_and_percentages_say_the_same(outcome_of, findings_of, denominator, count, percent):
    """The percentage has the digits of the count, and somebody is never nobody."""
    words = words_of(outcome_of(patient=at("0.25%")), findings_of, denominator)
    assert (words.without_count, words.without_percent) == (count, percent)


def test_what_cannot_be_drawn_is_still_said(outcome_of, findings_of):
    """Text on the smallest number of people that tells the two risks apart."""
    words = words_of(outcome_of(patient=at("0.01%")), findings_of, None)
    assert (words.without_count, words.with_count) == ("10 in 100,000", "5 in 100,000")
    assert words.summary_bold == "5 fewer in 100,000 fell at least once"


def test_a_risk_beyond_everybody_is_withheld_and_the_odds_offered(outcome_of, findings_of):
    """Nothing is cut off at 100%, and no relative figure stands alone."""
    words = words_of(outcome_of(patient=at("70%"), index_group="second"), findings_of, None)
    assert words.with_count == "not given"
    assert words.detail == "The risk would pass 100% here; the odds ratio can be carried instead."
    assert (words.summary_bold, words.summary) == ("", "")
    assert "the odds ratio can be carried instead" in words.picture_sentence


def test_a_limit_beyond_everybody_leaves_the_estimate(outcome_of, findings_of):
    """The range says that it has no upper limit, and why."""
    words = words_of(outcome_of(patient=at("45%"), index_group="second"), findings_of)
    assert words.with_count == "84 in 100"
    assert words.summary == "over 12 months, 95% interval 13 to an open end"
    assert words.detail.count("100%") == 2
    assert words.detail.endswith(
        "The upper limit of the risk would pass 100%, so the interval is open there; carrying the odds ratio avoids "
        "it. The interval leaves out that 45% is itself uncertain."
    )


def test_without_a_starting_risk_a_case_control_study_says_what_it_needs(outcome_of, findings_of):
    """Titles stay, figures do not appear."""
    words = words_of(outcome_of(design="case-control"), findings_of)
    assert words.detail.startswith("Type a starting risk from another source")
    assert (words.with_count, words.picture_sentence) == ("", "")


def test_what_is_not_named_yet_is_listed(findings_of, outcome_of):
    """Event, both groups and time, as their fields are called, before any patient sees a picture."""
    bare = Outcome(table=outcome_of().table)
    words = words_of(bare, findings_of)
    assert words.missing == (
        "what happens to them (“People who”)",
        "the name of the reference group",
        "the name of the index group",
        "“Time span”",
    )
    assert words.without_title == "Without: reference group"


def test_a_welcome_event_is_said_as_it_is_counted(outcome_of, findings_of):
    """Sentence and rows count the same people; fewer of a good event are a harm."""
    words = words_of(outcome_of(left_welcome=True, name_text="Recovery"), findings_of)
    assert (words.without_count, words.with_count) == ("17 in 100", "9 in 100")
    assert words.summary_bold == "8 fewer in 100 fell at least once"
    assert words.detail.startswith("NNTH at this starting risk 13")
    assert "In relative words 46% lower" in words.detail


def test_where_the_other_outcome_is_counted_the_name_is_not_its_own(outcome_of):
    """ "Falls" names the left column, and what travels says so."""
    outcome = outcome_of(counted="right")
    assert picture_heading(Record(outcomes=(outcome,)), outcome) == "Not “falls”"


def test_a_welcome_event_alone_has_to_be_named(outcome_of, findings_of):
    """The other outcome's words follow from it."""
    named = {"left_heading_text": "", "right_heading_text": "", "right_words_text": "", "left_words_text": "healed"}
    words = words_of(outcome_of((60, 40, 51, 49), left_welcome=True, **named), findings_of)
    assert words.missing == ()
    assert words.summary_bold == "9 more in 100 healed"
    assert words.without_percent == "51%"


@pytest.mark.parametrize("welcome", [True, False])
@pytest.mark.parametrize("turned", [True, False])
@pytest.mark.parametrize("effect", ["risk_ratio", "odds_ratio"])
def test_summary_range_and_caution_look_the_same_way(outcome_of, findings_of, welcome, turned, effect):
    """The side on which a range reaches further is named in the terms of the range beside it."""
    for counts in ((10, 90, 12, 88), (52, 48, 50, 50), (90, 10, 88, 12)):
        for risk in ("12%", "50%", "95%"):
            outcome = outcome_of(
                counts, left_welcome=welcome, counted="right" if turned else "left", patient=at(risk, effect)
            )
            leaning = [caution for caution in findings_of(outcome).cautions if caution.key == "leans"]
            words = words_of(outcome, findings_of, 10_000)
            ends = re.search(r"interval (?:([\d,]+) fewer) to (?:([\d,]+) more|an open end)$", words.summary)
            side = re.match(r"[\d,]+ (fewer|more) ", words.summary_bold)
            if side is None or ends is None:
                assert not leaning
                continue
            fewer, more = (int((end or "99999").replace(",", "")) for end in ends.groups())
            further = "fewer" if fewer > more else "more"
            assert (leaning != []) == (further != side[1])
            assert all(caution.facts == {"side": further} for caution in leaning)


def test_more_events_are_more(outcome_of, findings_of):
    """The change follows the direction."""
    words = words_of(outcome_of(index_group="second", name_text=""), findings_of)
    assert words.summary_bold == "8 more in 100 fell at least once"


def test_a_picture_that_travels_says_what_it_is_about():
    """Name, title and source, as far as they were typed."""
    record = worked_example()
    assert picture_heading(record, record.outcomes[0]) == (
        "Falls · Night lights on a rehabilitation ward · invented example · table 2"
    )
    assert picture_heading(Record(), Outcome()) == ""


def test_equal_risks_have_a_range(outcome_of, findings_of):
    """The same number, and what the interval leaves open on both sides."""
    words = words_of(outcome_of((10, 90, 10, 90)), findings_of)
    assert words.summary_bold == "The same number in 100 fell at least once"
    assert words.summary == "over 12 months, 95% interval 9 fewer to 9 more"


@given(st.tuples(*[st.integers(min_value=1, max_value=500)] * 4))
def test_the_change_is_the_counts_own_or_is_said_not_to_add_up(outcome_of, findings_of, counts):
    """The difference is rounded from itself; where that shows, it is said."""
    words = words_of(outcome_of(counts), findings_of, 10_000)
    without, with_ = (int(text.split(" in ")[0].replace(",", "")) for text in (words.without_count, words.with_count))
    change = words.summary_bold.split(" ")[0].replace(",", "")
    said = 0 if change == "The" else int(change)
    assert (said == abs(with_ - without)) != (DO_NOT_ADD_UP in words.detail)


COLUMNS_OF_WORDS = {
    "had the event": "left",
    "did not have the event": "right",
    "leftish": "left",
    "did not have the outcome “leftish”": "right",
    "rightish": "right",
    "did not have the outcome “rightish”": "left",
}


@given(
    st.sampled_from(("", "leftish")),
    st.sampled_from(("", "rightish")),
    st.sampled_from(("left", "right")),
    st.booleans(),
    st.tuples(*[st.integers(min_value=1, max_value=400)] * 4),
)
def test_headline_and_patient_speak_of_the_same_people(outcome_of, findings_of, left, right, counted, welcome, counts):
    """Whatever is named, each number stands beside the words of the column that it was counted from."""
    headings = {"left_heading_text": "", "right_heading_text": ""}
    outcome = outcome_of(
        counts, left_words_text=left, right_words_text=right, counted=counted, left_welcome=welcome, **headings
    )
    findings = findings_of(outcome)
    words = patient_words(outcome, findings, Choices(), 1_000)
    event = re.search(r"about [\d,]+ (.*?) within", headline(outcome, findings, Choices()))[1]
    assert COLUMNS_OF_WORDS[event] == counted
    assert words.summary_bold.endswith(f" {event}")
    first = re.match(r"Of 1,000 people with usual care ([\d,]+) \(.*?\) (.*?) within", words.picture_sentence)
    n, said = first.groups()
    assert COLUMNS_OF_WORDS[said] == counted
    share = counts[2 if counted == "left" else 3] / (counts[2] + counts[3])
    assert int(n) == pytest.approx(1_000 * share, abs=0.51)


@pytest.mark.parametrize("starting_risk", ["", "12%"])
def test_an_interval_of_altered_counts_is_left_out_of_the_relative_words(outcome_of, findings_of, starting_risk):
    """0/50 v 7/50 by the textbook: "100% lower (99% lower to 12% higher)" would not hold its own estimate."""
    outcome = outcome_of((0, 50, 7, 43), patient=Patient(starting_risk_text=starting_risk))
    choices = Choices(family="textbook")
    assert "In relative words 100% lower." in patient_words(outcome, findings_of(outcome, choices), choices, 100).detail


def test_an_endless_ratio_has_no_relative_words(outcome_of, findings_of):
    """3/10 v 0/10: nothing can be so many per cent higher than nobody, and at 0% nothing follows."""
    own = words_of(outcome_of((3, 7, 0, 10)), findings_of)
    assert (own.without_count, own.with_count) == ("0 in 100", "30 in 100")
    assert "relative words" not in own.detail
    typed = words_of(outcome_of((3, 7, 0, 10), patient=at("0%")), findings_of)
    assert typed.detail.startswith("An infinite effect says nothing at a starting risk of 0%")


def test_a_risk_beyond_everybody_leaves_the_other_on_its_own_people(outcome_of, findings_of):
    """0.4% without is 4 of the fewest people that can say so, and no interval is spoken of where there is none."""
    words = words_of(outcome_of((50, 50, 1, 999), patient=at("0.4%")), findings_of, None)
    assert (words.without_count, words.with_count) == ("4 in 1,000", "not given")
    assert "uncertain" not in words.detail


def test_an_interval_that_is_withheld_says_why(outcome_of, findings_of):
    """The textbook gives nobody v everybody no interval."""
    outcome, choices = outcome_of((0, 50, 50, 0)), Choices(family="textbook")
    words = patient_words(outcome, findings_of(outcome, choices), choices, 100)
    assert "An interval of zero width is withheld; the score family gives a real one." in words.detail
    assert words.summary == "over 12 months"
