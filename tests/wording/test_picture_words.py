"""The words inside a picture: from the risks, in both frames, and never without their number."""

from __future__ import annotations

import re
from collections.abc import Callable
from typing import NamedTuple

import pytest
from hypothesis import given
from hypothesis import strategies as st
from msgspec import structs

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.record.outcome import Outcome, PersonTime, Table
from fourcount.record.paper import Choices
from fourcount.wording.picture_words import USUAL_WORDS, PictureWords, Said, picture_words
from fourcount.wording.relative_words import RelativeWords, relative_words

CHOICES = Choices()
RISKS = st.floats(0, 1)


class Drawn(NamedTuple):
    """Two risks on a denominator, as a plan has them."""

    without_risk: float
    with_risk: float
    denominator: int | None = 100
    low: float | None = None
    high: float | None = None


class Asked(NamedTuple):
    """How the picture is asked for."""

    arrangement: str = "two"
    uncertainty: bool = False


TWO = Asked()


@pytest.fixture(scope="module")
def words_of(
    outcome_of: Callable[..., Outcome], findings_of: Callable[..., OutcomeFindings]
) -> Callable[..., PictureWords]:
    """The words of a picture of the worked example's outcome."""

    def make(
        drawn: Drawn,
        asked: Asked = TWO,
        said: Said = USUAL_WORDS,
        bar_top: float = 0.25,
        table: Table | None = None,
        **changes: object,
    ) -> PictureWords:
        outcome = outcome_of(**changes)
        outcome = outcome if table is None else structs.replace(outcome, table=table)
        return picture_words(outcome, findings_of(outcome), CHOICES, drawn, asked, said, bar_top)

    return make


@pytest.fixture(scope="module")
def relative_of(outcome_of: Callable[..., Outcome]) -> Callable[..., RelativeWords]:
    """The words of a relative figure of the worked example's outcome."""
    return lambda drawn, said=USUAL_WORDS: relative_words(outcome_of(), drawn, said)


def test_captions_of_a_group(words_of: Callable[..., PictureWords]) -> None:
    """Group, "12 in 100 (12%)", and the other frame."""
    words = words_of(Drawn(0.12, 0.06))
    assert words.without == ("Without: usual care", "12 in 100", "(12%)", "88 did not fall")
    assert words.with_ == ("With: night lights", "6 in 100", "(6%)", "94 did not fall")
    assert words.note == ""


@pytest.mark.parametrize(
    ("drawn", "numbers", "percents"),
    [
        (Drawn(0.024, 0.026, 1_000), ("24 in 1,000", "26 in 1,000"), ("(2.4%)", "(2.6%)")),
        (Drawn(0.044, 0.056, 1_000), ("44 in 1,000", "56 in 1,000"), ("(4.4%)", "(5.6%)")),
        (Drawn(0.0002, 0.0001, 10_000), ("2 in 10,000", "1 in 10,000"), ("(0.02%)", "(0.01%)")),
        (Drawn(0.0, 0.3), ("0 in 100", "30 in 100"), ("(0%)", "(30%)")),
        (Drawn(0.004, 0.3, 1_000), ("4 in 1,000", "300 in 1,000"), ("(0.4%)", "(30.0%)")),
        (Drawn(0.95, 0.97), ("95 in 100", "97 in 100"), ("(95%)", "(97%)")),
        (Drawn(0.12, 0.12), ("12 in 100", "12 in 100"), ("(12%)", "(12%)")),
    ],
)
def test_captions_come_from_the_risks(
    words_of: Callable[..., PictureWords], drawn: Drawn, numbers: tuple[str, str], percents: tuple[str, str]
) -> None:
    """Both groups are said of the same number of people, with a percentage of the same digits."""
    words = words_of(drawn)
    assert (words.without.number, words.with_.number) == numbers
    assert (words.without.percent, words.with_.percent) == percents


@given(RISKS, RISKS, st.sampled_from([100, 1_000, 10_000]))
def test_both_frames_make_the_whole(
    words_of: Callable[..., PictureWords], without: float, with_: float, people: int
) -> None:
    """So many have it, so many have not, and the two add up to everybody; never 1 in so many."""
    words = words_of(Drawn(without, with_, people))
    for side in (words.without, words.with_):
        number, total = side.number.replace(",", "").split(" in ")
        assert int(total) == people
        rest = side.other.replace(",", "")
        if number.isdigit():
            assert int(number) + int(rest.split(" ")[0]) == people
        else:
            assert {number.split(" ")[0], rest.split(" ")[0]} == {"under", "over"}
        assert re.fullmatch(r"\([<>]?\d+(\.\d+)?%\)", side.percent)


def test_a_change_of_denominator_is_said(words_of: Callable[..., PictureWords]) -> None:
    """More people than a hundred are a notice on the picture, one array or two; bars show no people."""
    drawn = Drawn(0.024, 0.026, 1_000)
    assert words_of(drawn).note == "Each picture shows 1,000 people, not 100."
    assert words_of(drawn, Asked("one")).note.startswith("The picture shows 1,000 people")
    assert "people" not in words_of(drawn, Asked("bars")).note


@pytest.mark.parametrize(
    ("drawn", "asked", "said", "told"),
    [
        (Drawn(0.3, 0.304, 1_000), TWO, USUAL_WORDS, True),
        (Drawn(0.004, 0.1, 1_000), Asked("one"), USUAL_WORDS, True),
        (Drawn(0.024, 0.026, 1_000), TWO, USUAL_WORDS, False),
        (Drawn(0.3, 0.304, 1_000), Asked("bars"), USUAL_WORDS, False),
        (Drawn(0.3, 0.2), TWO, USUAL_WORDS, False),
        (Drawn(0.5, 0.5004, 10_000), TWO, USUAL_WORDS, False),
        (Drawn(0.3, 0.304, 1_000), TWO, Said("fall"), False),
    ],
)
def test_bars_are_named_where_they_are_read_with_fewer_errors(
    words_of: Callable[..., PictureWords], drawn: Drawn, asked: Asked, said: Said, told: bool
) -> None:
    """From 100 of 1,000 on, as McCaffery and colleagues tried it (2012), and never on a page for patients."""
    assert words_of(drawn, asked, said).note.endswith("So many of 1,000 are read more exactly as bars.") == told


def test_too_small_to_draw_is_said(words_of: Callable[..., PictureWords]) -> None:
    """Without a denominator the words speak of as many people as make the risks whole numbers."""
    words = words_of(Drawn(0.00001, 0.00002, None), bar_top=0.001)
    assert words.note == "Too small to draw as people. The bars run to 0.1%, not to 100%."
    assert words.without.number == "1 in 100,000"
    assert words_of(Drawn(0.5, 0.50001, None), bar_top=1.0).note == "A difference too small to draw as people."


def test_bars_name_their_ends(words_of: Callable[..., PictureWords]) -> None:
    """A scale that does not show everybody says so; a whole one need not."""
    words = words_of(Drawn(0.12, 0.06), Asked("bars"))
    assert words.bar_ends == ("0", "25%")
    assert words.note == "The bars run to 25%, not to 100%."
    assert words_of(Drawn(0.95, 0.97), Asked("bars"), bar_top=1.0).note == ""


def test_the_key_names_every_state(words_of: Callable[..., PictureWords]) -> None:
    """Whatever is drawn has its words; avoided and added are said to be on balance."""
    assert [tuple(entry) for entry in words_of(Drawn(0.12, 0.06)).key] == [
        ("affected", "fell"),
        ("added", "falls added, on balance"),
        ("uncertain", "not settled by the study"),
        ("avoided", "falls avoided, on balance"),
        ("others", "did not fall"),
    ]


def test_one_array_says_what_happens_either_way(words_of: Callable[..., PictureWords]) -> None:
    """In one array the affected have the event with or without; both totals stay in the captions."""
    words = words_of(Drawn(0.12, 0.06), Asked("one"))
    texts = {entry.state: entry.text for entry in words.key}
    assert (texts["affected"], texts["others"]) == ("fell either way", "did not fall either way")
    assert (words.without.number, words.with_.number) == ("12 in 100", "6 in 100")


def test_the_others_are_never_called_what_the_affected_are(words_of: Callable[..., PictureWords]) -> None:
    """Person-time has no other column, and another form's may have no name: the rest are all others."""
    rates = PersonTime(
        first_left_text="38",
        first_right_text="4120",
        second_left_text="70",
        second_right_text="4090",
        unit_text="years",
    )
    unnamed = {"right_heading_text": "", "right_words_text": ""}
    named = {**unnamed, "left_words_text": "fell at least once", "left_heading_text": ""}
    for changes in ({"table": rates, **named}, named):
        key = {entry.state: entry.text for entry in words_of(Drawn(0.2, 0.1), **changes).key}
        assert (key["affected"], key["others"]) == ("fell at least once", "all others")
        key = {entry.state: entry.text for entry in words_of(Drawn(0.2, 0.1), Asked("one"), **changes).key}
        assert (key["affected"], key["others"]) == ("fell at least once either way", "all others")
    nothing = {**unnamed, "left_words_text": "", "left_heading_text": "", "table": rates}
    key = {entry.state: entry.text for entry in words_of(Drawn(0.2, 0.1), **nothing).key}
    assert (key["affected"], key["others"]) == ("had the event", "did not have the event")


def test_a_welcome_outcome_says_what_is_filled(words_of: Callable[..., PictureWords]) -> None:
    """Filled icons of a welcome outcome are said to be such; its icons are gained or lost, not added or avoided."""
    words = words_of(Drawn(0.12, 0.06), left_welcome=True)
    texts = {entry.state: entry.text for entry in words.key}
    assert words.note == "Filled: people with the welcome outcome."
    assert (texts["added"], texts["avoided"]) == ("falls gained, on balance", "falls lost, on balance")
    assert words_of(Drawn(0.12, 0.06), said=Said(turned=True), left_welcome=True).note == ""


@pytest.mark.parametrize(
    ("name", "key"),
    [
        ("Falls", "falls avoided, on balance"),
        ("Falls, %", "falls avoided, on balance"),
        ("", "avoided, on balance"),
        ("x" * 41, "avoided, on balance"),
    ],
)
def test_a_long_name_stays_out_of_the_key(words_of: Callable[..., PictureWords], name: str, key: str) -> None:
    """A key has room for forty characters of it, and its unit is none of them."""
    texts = {entry.state: entry.text for entry in words_of(Drawn(0.12, 0.06), name_text=name).key}
    assert texts["avoided"] == key


def test_the_key_of_the_other_outcome_has_no_name(words_of: Callable[..., PictureWords]) -> None:
    """ "Falls" names the left column: of those who did not fall nobody is called by it, and they are welcome."""
    texts = {entry.state: entry.text for entry in words_of(Drawn(0.83, 0.91), counted="right").key}
    assert (texts["affected"], texts["others"]) == ("did not fall", "fell")
    assert (texts["added"], texts["avoided"]) == ("gained, on balance", "lost, on balance")


def test_a_page_can_have_words_of_its_own(words_of: Callable[..., PictureWords]) -> None:
    """Titles, event and key are taken as given; the numbers stay those of the risks."""
    said = Said(
        "fall", "do not fall", "With usual care", "With night lights", "falls avoided", "falls added", "may fall"
    )
    words = words_of(Drawn(0.12, 0.06), said=said)
    assert words.without == ("With usual care", "12 in 100", "(12%)", "88 do not fall")
    assert [entry.text for entry in words.key] == ["fall", "falls added", "may fall", "falls avoided", "do not fall"]


def test_uncertainty_is_a_range_of_people(words_of: Callable[..., PictureWords]) -> None:
    """On demand the interval is said in the same people, with its level; off by default."""
    drawn = Drawn(0.12, 0.06, 100, 0.04, 0.09)
    assert words_of(drawn).note == ""
    assert words_of(drawn, Asked(uncertainty=True)).note == "With night lights: 95% interval 4 to 9 in 100."
    assert words_of(Drawn(0.12, 0.06), Asked(uncertainty=True)).note == (
        "The interval has no limit on one side here, so it is not drawn."
    )


def test_the_relative_figure_comes_after_the_people(relative_of: Callable[..., RelativeWords]) -> None:
    """In people first, in the picture and in its sentence; the relative figure has its word."""
    words = relative_of(Drawn(0.12, 0.06))
    assert RelativeWords._fields[:2] == ("people", "sounds")
    assert words.people.values == ("12 in 100", "6 in 100")
    assert words.people.ends == ("0", "all 100")
    assert words.sounds.values == ("", "50% lower")
    assert words.sentence.index("6 fewer in 100") < words.sentence.index("50% lower")
    assert words.sentence.startswith("In people: usual care 12 in 100, night lights 6 in 100, 6 fewer in 100")


@pytest.mark.parametrize(
    ("drawn", "relative"),
    [
        (Drawn(0.06, 0.12), "100% higher"),
        (Drawn(0.12, 0.12), "the same"),
        (Drawn(0.12, 0.0), "100% lower"),
        (Drawn(0.044, 0.056, 1_000), "27% higher"),
        (Drawn(0.95, 0.97), "2% higher"),
    ],
)
def test_the_relative_figure_has_its_side(
    relative_of: Callable[..., RelativeWords], drawn: Drawn, relative: str
) -> None:
    """Lower, higher or the same; the full bar stands for the larger of the two risks."""
    words = relative_of(drawn)
    assert words.sounds.values[1] == relative
    assert words.sounds.ends == ("0", "full length: the larger risk")


def test_the_difference_is_that_of_the_risks(relative_of: Callable[..., RelativeWords]) -> None:
    """Of 4.4 and 5.6 in 100 it is 12 more in 1,000, not the 2 of the rounded icons; equal risks have none."""
    assert "12 more in 1,000" in relative_of(Drawn(0.044, 0.056, 1_000)).sentence
    assert "the same number" in relative_of(Drawn(0.12, 0.12)).sentence


def test_a_study_before_and_after_names_its_times(
    words_of: Callable[..., PictureWords], outcome_of: Callable[..., Outcome]
) -> None:
    """The same people at two times are not "with" and "without" anything."""
    changes = {"design": "before-after", "first_label_text": "after", "second_label_text": "before"}
    words = words_of(Drawn(0.12, 0.06), **changes)
    assert (words.without.title, words.with_.title) == ("Before", "After")
    relative = relative_words(outcome_of(**changes), Drawn(0.12, 0.06))
    assert relative.people.labels == ("Before", "After")
    assert relative.sentence.startswith("In people: before 12 in 100, after 6 in 100")
