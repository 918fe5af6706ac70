"""Plain words for a patient: the present tense, both frames, one order, certainty as rated, easy to read."""

from __future__ import annotations

import re
from collections.abc import Callable
from typing import Any

import pytest
from msgspec.structs import replace

from fourcount.appraisal.findings import OutcomeFindings, PatientFindings
from fourcount.record.outcome import CERTAINTIES, Outcome, Pairs, Patient
from fourcount.wording.plain_outcome import PlainWords
from fourcount.wording.plain_risks import plain_risks
from patient_outcomes import AT_TWELVE, CASE_CONTROL, HARM, HAZARD, SHOWN, SMALL, TRIAL, WELCOME, of_counts

UNWORDED = replace(TRIAL, left_words_text="", right_words_text="", left_heading_text="", right_heading_text="")

FindingsOf = Callable[[Outcome], OutcomeFindings]


@pytest.mark.parametrize(
    ("left", "right", "event", "other"),
    [
        ("fell", "", "fall", "do not"),
        ("Died", "Survived", "die", "survive"),
        ("Died, n (%)", "", "die", "do not"),
        ("healed", "", "heal", "do not"),
        ("", "Survived", "do not survive", "survive"),
        ("Falls", "", "have falls", "do not"),
        ("Stroke", "", "have the event “Stroke”", "do not"),
    ],
)
def test_a_heading_alone_is_said_as_a_verb(
    left: str, right: str, event: str, other: str, say: Callable[..., PlainWords]
) -> None:
    """The most usual entry, headings and no words, gives plain words where the table knows the verb."""
    words = say(replace(UNWORDED, left_heading_text=left, right_heading_text=right))
    assert (words.event, words.other) == (event, other)


def test_words_typed_for_patients_go_first(say: Callable[..., PlainWords]) -> None:
    """What the reader typed for patients is said as it is, in each column's place."""
    words = say(replace(TRIAL, plain_event_text="trip over", plain_other_text="stay on their feet"))
    assert (words.event, words.other) == ("trip over", "stay on their feet")
    turned = replace(WELCOME, plain_event_text="get well", plain_other_text="stay ill")
    assert (say(turned).event, say(turned).other) == ("stay ill", "get well")


def test_the_page_says_first_both_risks_then_the_difference(say: Callable[..., PlainWords]) -> None:
    """The absolute risks in both frames, the difference, and that nobody knows which people, in this order."""
    sentence = say(AT_TWELVE).told()
    order = [
        "12 in 100",
        "88 in 100 do not fall",
        "6 in 100",
        "94 in 100 do not fall",
        "With night lights, 6 fewer of these 100",
        "which",
    ]
    places = [sentence.index(part) for part in order]
    assert places == sorted(places)
    assert "Falls in 12 months" in sentence


def test_a_welcome_outcome_is_turned_to_its_complement(say: Callable[..., PlainWords]) -> None:
    """The unwelcome side is counted: 45 and 60 of 100 who heal are 55 and 40 who do not."""
    words = say(WELCOME)
    assert words.without.number == "55 in 100"
    assert words.with_.number == "40 in 100"
    assert words.with_.other == "60 in 100 heal"
    assert words.summary == "With night lights, 15 more of these 100 heal."
    assert words.turned == "The filled ones are people who do not heal."
    assert words.relative == "Going from 55 to 40 in 100 who do not heal is also called “27% lower”."


@pytest.mark.parametrize(
    ("changes", "summary"),
    [
        ({"counted": "right"}, "15 more of these 100 heal"),
        ({"left_words_text": "did not heal", "right_words_text": "healed", "left_welcome": False}, "fewer of these"),
        ({"left_words_text": "had no falls", "right_words_text": "fell"}, "15 fewer of these 100 fall"),
        ({"left_words_text": "survived", "right_words_text": "died"}, "15 more of these 100 survive"),
        ({"plain_event_text": "get well", "plain_other_text": "stay ill"}, "15 more of these 100 get well"),
        ({"right_words_text": ""}, "15 more of these 100 heal"),
    ],
    ids=str,
)
@pytest.mark.parametrize("certainty", CERTAINTIES)
def test_no_sentence_has_a_double_negative(
    changes: dict[str, Any], summary: str, certainty: str, say: Callable[..., PlainWords]
) -> None:
    """Whatever is counted and however it is worded, the difference is said of the side that is said positively."""
    words = say(replace(WELCOME, certainty=certainty, **changes))
    assert summary in words.summary
    said = (words.summary, words.certainty)
    assert not any(re.search(r"(?:fewer|more).*\b(?:not|no|never)\b", part) for part in said if "not rated" not in part)


@pytest.mark.parametrize(
    ("typed", "other"),
    [
        ({"right_words_text": "", "right_heading_text": ""}, "88 in 100 do not"),
        ({"right_words_text": "did not fall at least once"}, "88 in 100 do not"),
        ({"plain_other_text": "do not fall at least once"}, "88 in 100 do not"),
        ({"plain_event_text": "are hurt", "plain_other_text": "are not hurt"}, "88 in 100 are not"),
        ({"right_words_text": "did not fall"}, "88 in 100 do not fall"),
        ({"plain_other_text": "stay on their feet"}, "88 in 100 stay on their feet"),
    ],
    ids=str,
)
def test_the_other_frame_is_short(typed: dict[str, str], other: str, say: Callable[..., PlainWords]) -> None:
    """Beside the event its lack is a bare "do not"; words of its own are kept."""
    assert say(replace(AT_TWELVE, **typed)).without.other == other


@pytest.mark.parametrize("outcome", [TRIAL, HARM, SMALL], ids=["fewer", "more", "small"])
def test_counting_the_welcome_side_shows_the_same_page(outcome: Outcome, say: Callable[..., PlainWords]) -> None:
    """Whichever column the record counts, a patient sees the same people."""
    other = replace(outcome, counted="right")
    one, two = say(outcome, 1_000), say(other, 1_000)
    assert (one.without, one.with_, one.summary) == (two.without, two.with_, two.summary)


def test_a_turned_range_keeps_its_ends_in_order(say: Callable[..., PlainWords], findings_of: FindingsOf) -> None:
    """The limits of the complement are the complements of the limits, the other way round."""
    patient = findings_of(WELCOME).patient
    assert isinstance(patient, PatientFindings)
    plain, turned = plain_risks(patient, False), plain_risks(patient, True)
    assert plain
    assert turned
    assert turned.with_ends == pytest.approx((1 - plain.with_ends[1], 1 - plain.with_ends[0]))
    assert turned.apart == pytest.approx((-plain.apart[1], -plain.apart[0]))


def test_the_relative_figure_names_both_absolute_ones(say: Callable[..., PlainWords]) -> None:
    """ "46% lower" never stands without the two risks in the same sentence, and rounding is owned up to."""
    relative = say(AT_TWELVE).relative
    assert relative == (
        "Going from 12 to 6 in 100 is also called “46% lower” (worked out before rounding to whole people)."
    )
    assert relative in say(AT_TWELVE).told(printed=True)
    assert "before rounding" not in say(HARM).relative
    assert relative not in say(AT_TWELVE).told()


@pytest.mark.parametrize(
    ("outcome", "avoided"), [(TRIAL, "spared, on balance"), (CASE_CONTROL, "fewer here, on balance")]
)
def test_the_key_claims_no_cause_that_the_page_doubts(
    outcome: Outcome, avoided: str, say: Callable[..., PlainWords]
) -> None:
    """Only where chance made the groups alike is anybody said to be spared."""
    words = say(outcome)
    assert words.avoided == avoided
    assert bool(words.doubt) == (avoided != "spared, on balance")


@pytest.mark.parametrize("certainty", CERTAINTIES)
@pytest.mark.parametrize("outcome", [TRIAL, HARM], ids=["fewer", "more"])
def test_certainty_is_said_as_it_was_rated(certainty: str, outcome: Outcome, say: Callable[..., PlainWords]) -> None:
    """Never silence: the rating in words, with the verb that goes with it, or that nobody rated it."""
    said = say(replace(outcome, certainty=certainty)).certainty
    verbs = {"": "not rated", "high": "high", "moderate": "probably", "low": "may", "very-low": "very uncertain"}
    assert verbs[certainty] in said
    assert said in say(replace(outcome, certainty=certainty)).told()


def test_no_difference_is_left_open_where_the_interval_holds_it(say: Callable[..., PlainWords]) -> None:
    """An interval through no effect is said right behind the difference; one beside it is not."""
    words = say(SMALL, 1_000)
    assert f"{words.summary} There may be no difference: the study leaves that open." in words.told()
    assert say(TRIAL).open_ == ""


@pytest.mark.parametrize(
    ("design", "table"),
    [
        ("cohort", TRIAL.table),
        ("survey", TRIAL.table),
        ("case-control", TRIAL.table),
        (
            "before-after",
            Pairs(first_left_text="20", first_right_text="10", second_left_text="30", second_right_text="40"),
        ),
    ],
)
def test_a_study_without_chance_says_so(design: str, table: Any, say: Callable[..., PlainWords]) -> None:
    """Outside trials the page says right behind the difference that other things may explain it."""
    words = say(replace(AT_TWELVE, design=design, table=table))
    assert words.doubt.startswith("Other things may explain the difference: ")
    assert f"{words.summary} {words.doubt}" in words.told()
    assert say(TRIAL).doubt == ""


def test_no_difference_needs_no_other_explanation(say: Callable[..., PlainWords]) -> None:
    """Of equal risks it is only said that the groups may not have been alike."""
    equal = of_counts(TRIAL, (38, 374, 38, 374), design="cohort")
    assert say(equal).doubt == "The groups may not have been alike."


def test_groups_are_headed_by_what_they_had_or_by_their_names(say: Callable[..., PlainWords]) -> None:
    """ "With usual care" in a trial; elsewhere the label as it is, which may be any noun."""
    assert (say(TRIAL).without.title, say(TRIAL).with_.title) == ("With usual care", "With night lights")
    words = say(CASE_CONTROL)
    assert (words.without.title, words.with_.title) == ("Day work", "Night work")
    assert words.summary.startswith("In the group “Night work”, 6 fewer")
    people = replace(CASE_CONTROL, first_label_text="people who took iron")
    assert say(people).with_.title == "People who took iron"
    assert say(people).summary.startswith("Among people who took iron, 6 fewer")


BANNED = r"\b(NNT\w*|odds|ratio|intervals?|CI|p ?[<=]|significant\w*|hazard|95%|common|rare|likely|unlikely)\b"
ONE_IN = re.compile(r"\b1 in (?!1(?:,?0)+\b)\d")


@pytest.mark.parametrize("name", [name for name in SHOWN if name != "tiny"])
@pytest.mark.parametrize("certainty", CERTAINTIES)
def test_a_patient_hears_no_statistics(name: str, certainty: str, say: Callable[..., PlainWords]) -> None:
    """No number needed, no odds, no interval, no p, no lone word for a risk, no 1-in-X."""
    words = say(replace(SHOWN[name], certainty=certainty), 1_000)
    said = " ".join((words.told(), words.relative, words.range_, *words.other_starts))
    assert not re.search(BANNED, said)
    assert not ONE_IN.search(said)


def syllables(word: str) -> int:
    """Groups of vowels, less a silent e at the end; a figure counts as one, as it is read at a glance."""
    if not word.isalpha():
        return 1
    groups = len(re.findall(r"[aeiouy]+", word.lower()))
    silent = word.lower().endswith("e") and not word.lower().endswith("le")
    return max(groups - silent, 1)


def reading_grade(text: str) -> float:
    """Grade level of Flesch and Kincaid: 0.39 words a sentence + 11.8 syllables a word - 15.59.

    Kincaid, Fishburne, Rogers and Chissom 1975, Derivation of new readability formulas for Navy enlisted personnel.
    """
    sentences = [part for part in re.split(r"[.:!?](?:\s|$)", text) if part.strip()]
    words = re.findall(r"[A-Za-z]+|\d[\d,.]*\d|\d", text)
    return 0.39 * len(words) / len(sentences) + 11.8 * sum(map(syllables, words)) / len(words) - 15.59


def test_the_formula_knows_easy_from_hard() -> None:
    """A child's sentence is below the first grade, one of a methods section far above the twelfth."""
    assert reading_grade("The cat sat on the mat. It was fat.") < 1
    assert reading_grade("Heterogeneity of methodological characteristics necessitates multivariable adjustment.") > 20


@pytest.mark.parametrize("name", ["trial", "at twelve", "harm", "welcome", "small", "hazard", "case-control"])
@pytest.mark.parametrize("certainty", CERTAINTIES)
def test_a_page_reads_at_about_the_sixth_grade(name: str, certainty: str, say: Callable[..., PlainWords]) -> None:
    """All that a page says together is at most a little above the sixth grade by Flesch and Kincaid's formula."""
    words = say(replace(SHOWN[name], certainty=certainty), 1_000)
    assert reading_grade(f"{words.told()} {words.relative}") < 7


def test_no_difference_is_said_without_a_direction(say: Callable[..., PlainWords]) -> None:
    """Equal risks: the same number, nothing avoided or added, no relative figure."""
    equal = replace(TRIAL, table=replace(TRIAL.table, second_left_text="38", second_right_text="374"))
    words = say(equal)
    assert words.summary == "Going by the study, the same number of these 100 fall at least once."
    assert words.relative == ""


@pytest.mark.parametrize("counts", [(10, 90, 10, 90), (0, 374, 0, 339)], ids=["ten each", "none in either"])
def test_equal_numbers_are_no_claim_of_no_difference(
    counts: tuple[int, int, int, int], say: Callable[..., PlainWords]
) -> None:
    """What a study of this size leaves open on both sides is said right behind the equal numbers."""
    words = say(of_counts(TRIAL, counts))
    assert words.open_ == "The study leaves open a difference either way."
    assert f"{words.summary} {words.open_}" in words.told()
    assert "no difference" not in words.told()


def test_rounded_counts_that_differ_otherwise_are_owned_up_to(say: Callable[..., PlainWords]) -> None:
    """Where whole people lie farther or less apart than the difference says, that stands right behind it."""
    patient = Patient(starting_risk_text="12%", other_span_text="5 years")
    counts = {at: say(replace(AT_TWELVE, patient=replace(patient, starting_risk_text=f"{at}%"))) for at in range(5, 30)}
    differ = [words for words in counts.values() if words.rounded]
    assert differ
    for words in differ:
        assert words.rounded == "Numbers are rounded to whole people; the difference is worked out before."
        assert f"{words.summary} {words.rounded}" in words.told()
    assert say(AT_TWELVE).rounded == ""


def test_the_range_is_heard_where_it_is_seen(say: Callable[..., PlainWords]) -> None:
    """The text of the page has the range where it is drawn, and only there."""
    words = say(TRIAL)
    assert words.range_ in words.told(ranged=True)
    assert words.range_ not in words.told()


def test_a_hazard_ratio_alone_gives_people(say: Callable[..., PlainWords]) -> None:
    """A printed hazard ratio at a typed risk: 1 - 0.8 to the power of 0.72 is 14.8%."""
    words = say(HAZARD)
    assert (words.without.number, words.with_.number) == ("20 in 100", "15 in 100")


@pytest.mark.parametrize(
    "field", ["left_words_text", "right_words_text", "name_text", "first_label_text", "second_label_text"]
)
def test_names_of_any_length_leave_the_page_its_numbers(field: str, say: Callable[..., PlainWords]) -> None:
    """A name that goes on for pages is cut where it can be seen to go on; every number stands behind it."""
    words = say(replace(AT_TWELVE, **{field: "had a fall that went on " * 80}))
    assert "…" in words.told()
    assert len(words.told()) < 2_500
    for part in ("12 in 100", "6 fewer of these 100", "94 in 100"):
        assert part in words.told()
