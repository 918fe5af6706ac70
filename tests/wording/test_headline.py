"""The headline: whole people that add up, and words for every design."""

from __future__ import annotations

import re

import msgspec
import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.appraisal.findings import Gap, Interval, Range
from fourcount.record.outcome import EventsAndOthers
from fourcount.record.paper import Choices
from fourcount.wording import numbers
from fourcount.wording.headline import DO_NOT_ADD_UP, choose
from fourcount.wording.patient import patient_words
from fourcount.wording.sentence import headline

cells = st.integers(min_value=0, max_value=10**9) | st.integers(min_value=0, max_value=60)
PEOPLE = re.compile(
    r"Of (?P<of>[\d,]+) people .*? (?:about )?(?P<reference>[\d,]+|none|all) fell .*?; "
    r"of (?P=of) .*? (?:about )?(?P<index>[\d,]+|none|all)\. "
    r"(?:That is (?P<difference>[\d,]+|under 1) (?P<side>fewer|more))?"
)


def test_the_headline_reads_as_a_sentence_about_people(outcome_of, findings_of):
    """Reference first; the difference is rounded from itself: 17.1 and 9.2 are 7.9 apart."""
    outcome = outcome_of(left_words_text="fell")
    assert headline(outcome, findings_of(outcome), Choices()) == (
        "Of 100 people with usual care about 17 fell within 12 months; of 100 with night lights about 9. "
        "That is 8 fewer, and could be as few as 3 or as many as 13 (95% interval)."
    )


def test_through_no_effect_both_sides_are_said(outcome_of, findings_of):
    """Compatible with both, and no verdict."""
    outcome = outcome_of((12, 88, 10, 90))
    text = headline(outcome, findings_of(outcome), Choices())
    assert text.endswith("That is 2 more, and could be anything from 7 fewer to 11 more (95% interval).")


def test_the_interval_says_its_level(outcome_of, findings_of):
    """Another level is another interval, in the headline and in the patient's sentences."""
    outcome, choices = outcome_of((12, 88, 10, 90)), Choices(level=0.9)
    findings = findings_of(outcome, choices)
    assert "(90% interval)" in headline(outcome, findings, choices)
    words = patient_words(outcome, findings, choices, 100)
    assert words.summary.startswith("over 12 months, 90% interval ")
    assert ", 90% interval " in words.picture_sentence


def test_an_interval_past_everybody_is_not_put_into_people(outcome_of, findings_of):
    """Nobody is told of "as many as 106" of 100 people: the clause is left out, and why is said."""
    outcome, choices = outcome_of((9, 1, 1, 9)), Choices(family="textbook")
    assert headline(outcome, findings_of(outcome, choices), choices).endswith(
        "That is 80 more. The bare formula’s 95% interval reaches past 100 in 100, so it is not put into people."
    )


def test_equal_risks_are_said_to_be_equal(outcome_of, findings_of):
    """The same number, and still an interval."""
    outcome = outcome_of((10, 90, 10, 90))
    assert headline(outcome, findings_of(outcome), Choices()) == (
        "Of 100 people with usual care about 10 fell at least once within 12 months; of 100 with night lights also "
        "about 10. The difference could be anything from 9 fewer to 9 more (95% interval)."
    )


def test_a_cohort_and_a_survey_name_their_groups(outcome_of, findings_of):
    """In the group of that name; a survey without "within"."""
    cohort = outcome_of(design="cohort", first_label_text="Smokers", second_label_text="Non-smokers")
    text = headline(cohort, findings_of(cohort), Choices())
    assert text.startswith("Of 100 people in the group “Non-smokers” about 17 fell at least once within 12 months; ")
    survey = outcome_of(design="survey", left_words_text="had asthma", span_text="in 2019")
    text = headline(survey, findings_of(survey), Choices())
    assert text.startswith("Of 100 people in the group “Usual care” about 17 had asthma in 2019; of 100 in the group ")


def test_a_case_control_study_speaks_of_odds_only(outcome_of, findings_of):
    """Its totals are those of cases and controls."""
    outcome = outcome_of(design="case-control")
    assert headline(outcome, findings_of(outcome), Choices()) == (
        "The odds that a person in the group “Night lights” fell at least once within 12 months were 0.49 times those "
        "in the group “Usual care” (95% interval 0.32 to 0.75)."
    )


def test_an_empty_table_asks_for_its_counts(outcome_of, findings_of):
    """One quiet instruction."""
    outcome = outcome_of()
    empty = type(outcome)(table=EventsAndOthers())
    assert headline(empty, findings_of(empty), Choices()) == "Type the four counts of the table."


def test_a_group_of_nobody_is_said(outcome_of, findings_of):
    """No sentence about risks that are not there."""
    outcome = outcome_of((0, 0, 3, 4))
    assert headline(outcome, findings_of(outcome), Choices()) == "There is nobody in the index group."


@pytest.mark.parametrize(
    ("counts", "of"),
    [
        ((38, 374, 70, 339), 100),
        ((26, 974, 24, 976), 1_000),  # 2.6 and 2.4 would both round near 2 to 3 and say 1 for 0.2
        ((1, 9999, 3, 9997), 10_000),
        ((1, 999_999_999, 3, 999_999_997), 1_000_000_000),
        ((150, 850, 150, 850), 100),
        ((0, 50, 7, 43), 100),
    ],
)
def test_the_denominator_is_the_smallest_that_tells_the_truth(outcome_of, findings_of, counts, of):
    """Finer where 100 people would hide or invent a difference."""
    outcome = outcome_of(counts)
    assert headline(outcome, findings_of(outcome), Choices()).startswith(f"Of {numbers.whole(of)} people")


@given(st.tuples(cells, cells, cells, cells))
def test_the_printed_numbers_add_up(outcome_of, findings_of, counts):
    """The printed difference is the printed parts' own, or is said not to be; nobody and everybody are who they are.

    Nobody has to picture more than 10,000 people, but where fewer would hide somebody.
    """
    a, b, c, d = counts
    if a + b == 0 or c + d == 0:
        return
    outcome = outcome_of(counts)
    text = headline(outcome, findings_of(outcome), Choices())
    match = PEOPLE.match(text)
    assert match is not None
    of = int(match["of"].replace(",", ""))
    words = {"none": "0", "all": str(of)}
    reference, index = (int(words.get(match[g], match[g]).replace(",", "")) for g in ("reference", "index"))
    assert (match["reference"] == "none", match["index"] == "none") == (c == 0, a == 0)
    assert (match["reference"] == "all", match["index"] == "all") == (d == 0, b == 0)
    if of > 10_000:
        assert any(0 < cell * 20_000 < n or 0 < (n - cell) * 20_000 <= n for cell, n in ((a, a + b), (c, c + d)))
    if a * d == b * c:
        assert reference == index
        assert match["difference"] is None
        return
    assert match["side"] == ("fewer" if a * d < b * c else "more")
    difference = 0 if match["difference"] == "under 1" else int(match["difference"].replace(",", ""))
    assert (difference == abs(index - reference)) != (DO_NOT_ADD_UP in text)
    if of < 10_000:
        assert difference == abs(index - reference) > 0


@pytest.mark.parametrize(
    ("counts", "ending"),
    [
        # 50.000% v 50.001% of ten million each: neither a million people nor a clause without an end.
        (
            (5_000_100, 4_999_900, 5_000_000, 5_000_000),
            "That is under 1 more, and could be anything from 4 fewer to 4 more (95% interval).",
        ),
        # Both limits are 200 of 10,000: "as few as 2 or as many as 2" would say nothing, of 100 as of 10,000.
        (
            (20_000_000, 980_000_000, 0, 1_000_000_000),
            "of 100 with night lights about 2. That is 2 more.",
        ),
        # 0.9 of 10,000, and in truth from 0.03 on.
        (
            (99_900, 9_900_100, 99_000, 9_901_000),
            "about 100. That is 1 more, and could be from under 1 to 2 (95% interval).",
        ),
    ],
)
def test_a_clause_that_whole_people_cannot_tell_is_left_out(outcome_of, findings_of, counts, ending):
    """Limits of 10,000 people that fall together, or onto no effect, are not said as if they did."""
    outcome = outcome_of(counts)
    assert headline(outcome, findings_of(outcome), Choices()).endswith(ending)


def test_two_small_risks_are_told_apart():
    """10 and 5.4 in 100,000 are not both "1 in 10,000"; risks of many people may be told alike."""
    small = choose(0.000054, 0.0001, 0.000046)
    assert (small.denominator, small.reference, small.index, small.difference) == (100_000, 5, 10, 5)
    assert choose(0.0008, 0.00083, 0.00003).denominator == 100_000
    assert choose(0.0015, 0.00151, 0.00001).denominator == 10_000
    assert choose(0.5, 0.5000001, 0.0000001).denominator == 10_000
    assert choose(0.000001, 0.000001, 0.0).denominator == 1_000_000


def test_without_an_interval_the_headline_says_why(outcome_of, findings_of):
    """The textbook gives none where nobody had the event, nor where its width would be zero."""
    choices = Choices(family="textbook")
    none, parted = outcome_of((0, 50, 0, 50)), outcome_of((0, 50, 50, 0))
    reason = "An interval of zero width is withheld; the score family gives a real one."
    assert headline(none, findings_of(none, choices), choices).endswith(f"also none. There is no interval. {reason}")
    assert headline(parted, findings_of(parted, choices), choices).endswith(f"none. That is 100 fewer. {reason}")


@pytest.mark.parametrize(
    ("low", "high", "ending"),
    [
        (0.0, 0.02, "anything from none to 2 more (95% interval)."),
        (-0.02, 0.0, "anything from 2 fewer to none (95% interval)."),
        (-0.02, 0.03, "anything from 2 fewer to 3 more (95% interval)."),
    ],
)
def test_a_limit_of_no_effect_is_none(outcome_of, findings_of, low, high, ending):
    """It has no side, and is compatible with one side only."""
    outcome = outcome_of((12, 88, 10, 90))
    findings = findings_of(outcome)
    difference = msgspec.structs.replace(findings.measures["risk_difference"], interval=Interval(low=low, high=high))
    touching = msgspec.structs.replace(findings, measures={**findings.measures, "risk_difference": difference})
    assert headline(outcome, touching, Choices()).endswith(ending)


def test_less_than_one_person_is_not_one():
    """0.6 of 100 people are not told as 1 of 100, even where the rounded parts would add up."""
    people = choose(0.016, 0.010, 0.006)
    assert (people.denominator, people.reference, people.index, people.difference) == (1_000, 16, 10, 6)


@pytest.mark.parametrize(
    ("interval", "denominator"),
    [
        (Interval(low=0.01, high=0.05), 100),
        (Interval(low=-0.026, high=0.034), 100),
        (Interval(low=0.004, high=0.056), 1_000),
        (Interval(low=0.026, high=0.034), 1_000),
        (Range(low=0.004, high=Gap("beyond-one")), 1_000),
        (Range(low=0.01, high=Gap("beyond-one")), 100),
    ],
)
def test_finer_people_tell_the_limits_apart(interval, denominator):
    """A limit that 100 people would round to no effect, or to the other limit, takes more people."""
    assert choose(0.02, 0.05, 0.03, interval).denominator == denominator
