"""Letters, listings and sheets of every form: what they rest on, absolute and relative together, all cautions."""

from __future__ import annotations

import json
import re

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from copies import NUMBER, letter, on_screen, sheet_of, table_of
from drawn_forms import outcomes
from forms import EVERY_FORM, at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.publish.contract import contract
from fourcount.publish.listing import WIDTH
from fourcount.publish.plain_text import one_line
from fourcount.record.paper import FAMILIES, Choices
from fourcount.wording.cautions import STANDING, STANDING_FULL, caution_text
from fourcount.wording.exports import SHEET_HEAD

NAMES = ("first_label_text", "second_label_text", "left_words_text", "right_words_text")
RAW = re.compile(r"\bnan\b|None|\binf\b|Gap\(|Interval\(|-0\.0|\de[+-]\d\d")
BESIDE = {
    "first_lost_text": "20",
    "second_lost_text": "10",
    "adjusted_text": "0.61 (0.42 to 0.88)",
    "adjusted_for_text": "age",
}


@pytest.mark.parametrize("name", EVERY_FORM)
def test_every_copy_of_every_form_carries_its_cautions(name: str) -> None:
    """And the standing block."""
    outcome = EVERY_FORM[name]
    texts = [letter(outcome), sheet_of(outcome), " ".join(on_screen(outcome).split())]
    for caution in appraise(outcome, Choices()).cautions:
        assert all(one_line(caution_text(caution)) in text for text in texts)
    assert all(sentence in text for sentence in STANDING_FULL for text in texts[:2])
    assert STANDING in texts[2]


@pytest.mark.parametrize(
    ("outcome", "rests"),
    [
        (
            paired(),
            (
                "Pairs, fell at least once: 30 on both sides, 20 only with night lights, 40 only with usual care, 110 "
                "on neither."
            ),
        ),
        (
            paired("before-after", (14, 5, 2, 22), first_label_text="", second_label_text="", left_words_text="fell"),
            "People, fell: 14 both times, 5 only after, 2 only before, 22 at neither time.",
        ),
        (
            paired("matched", (27, 29, 3, 44), **dict.fromkeys(NAMES, "")),
            "Pairs, was exposed: 27 on both sides, 29 only the case, 3 only the control, 44 on neither.",
        ),
        (
            paired("paired", ("", 20, 40, "")),
            "Pairs that differ, fell at least once: 20 only with night lights, 40 only with usual care.",
        ),
        (
            person_time(),
            "Night lights: 38 events in 4,120 person-years. Usual care: 70 events in 4,090 person-years.",
        ),
        (effect_only(adjusted_for_text="age"), "As printed: 0.72 (0.55 to 0.92), adjusted for age."),
        (
            strata(),
            "under 65: night lights 10 of 200, usual care 22 of 190. 65 and over: night lights 28 of 212, usual",
        ),
    ],
)
def test_a_letter_says_what_it_rests_on(outcome, rests) -> None:
    """Whoever gets it can type it again."""
    assert rests in letter(outcome)


@pytest.mark.parametrize(
    ("outcome", "lines"),
    [
        (
            paired(),
            (
                "- Difference, paired: 10.0 fewer (95% interval 2.4 to 17.4), per 100, score",
                "(NNTB) 10 (95% interval 6 to 42) over 12 months, if the difference is caused by it",
                "- Odds ratio of the pairs: 0.50 (95% interval 0.29 to 0.85), 20 to 40 pairs that differ, mid-P",
            ),
        ),
        (
            person_time(),
            (
                "- Rate difference: 7.9 fewer (95% interval 3.0 to 13.1), per 1,000 person-years, score",
                "- Rate ratio: 0.54 (95% interval 0.36 to 0.80), score, relative reduction 46%: 20% to 64%",
            ),
        ),
        (
            at_time(level="90%"),
            (
                "- Difference: 7.9 fewer (90% interval 3.3 to 12.6), per 100, from the printed limits",
                "printed intervals at 90%.",
            ),
        ),
        (
            strata(),
            (
                "- Risk ratio, pooled: 0.55 (95% interval 0.38 to 0.79), Mantel–Haenszel, relative reduction 45%",
                "- Number needed to treat for one to benefit (NNTB), pooled 13 (95% interval 9 to 32) over 12 months",
                "score intervals at 95%. Pooled by Mantel and Haenszel.",
            ),
        ),
        (
            of_total(**BESIDE),
            (
                "- Printed, adjusted odds ratio: 0.61 (0.42 to 0.88), from the paper’s own model, for age",
                "- Risk ratio: 0.54 (95% interval 0.37 to 0.78), relative reduction 46%",
            ),
        ),
    ],
)
def test_a_letter_has_one_line_for_every_measure(outcome, lines) -> None:
    """With interval, unit and method."""
    text = letter(outcome)
    for line in lines:
        assert line in text


def test_a_reason_is_said_once_in_a_letter_of_pairs() -> None:
    """What a matched study withholds is explained once."""
    text = letter(paired("matched"))
    assert text.count("A matched case-control study sets how many") == 1
    assert "; Risk ratio, paired: A matched" in text


def test_a_reason_behind_several_figures_is_said_once() -> None:
    """A limit that was not printed is missed by difference and ratio alike."""
    text = letter(at_time(("9.2%", "", "17.1%", "13.8 to 21.1")))
    figures = text[text.index("- Difference") :]
    assert figures.count("A risk stands without its limits") == 2  # behind the first figure, and for the number needed


def test_a_listing_shows_the_lost_and_the_printed_effect_only_where_they_were_typed() -> None:
    """Fragility and E-values stay under the fold."""
    with_them, without = on_screen(of_total(**BESIDE)), on_screen(of_total())
    assert "Lost: the extreme against the result" in with_them
    assert "Printed, adjusted odds ratio" in with_them
    assert "Lost" not in without
    assert "Fragility" not in with_them + without


@pytest.mark.parametrize(
    ("outcome", "name", "estimate"),
    [
        (paired(), "Difference, paired", -0.1),
        (person_time(), "Rate, night lights", 38 / 4120),
        (at_time(), "Risk, usual care", 0.171),
        (effect_only(), "Hazard ratio", 0.72),
        (strata(), "under 65: Risk ratio", (10 / 200) / (22 / 190)),
        (of_total(**BESIDE), "Printed, adjusted odds ratio", 0.61),
        (of_total(design="cohort"), "E-value", 3.115655748583495),
        (of_total(), "Fragility index", 13),
    ],
)
def test_a_sheet_holds_unrounded_numbers(outcome, name, estimate) -> None:
    """To the last digit, with the method behind each."""
    row = {row[0]: row for row in table_of(outcome)}[name]
    assert float(row[1]) == pytest.approx(estimate, rel=1e-7)
    assert row[4] or row[5]


@pytest.mark.parametrize(
    ("outcome", "rows"),
    [
        (
            paired(),
            {"Pairs, fell at least once: on both sides": "30", "Pairs, fell at least once: only with usual care": "40"},
        ),
        (
            person_time(),
            {
                "Events in the group “Usual care”": "70",
                "Person-time in the group “Night lights”, person-years": "4120.0",
            },
        ),
        (strata(), {"65 and over: People in the group “Night lights”, all": "212"}),
    ],
)
def test_a_sheet_names_what_was_typed(outcome, rows) -> None:
    """Number by number."""
    found = {row[0]: row[1] for row in table_of(outcome)}
    assert rows.items() <= found.items()


@settings(max_examples=150)
@given(outcomes(), st.sampled_from(FAMILIES))
def test_whatever_is_typed_can_be_exported(outcome, family) -> None:
    """Strict JSON, five columns, numbers in number cells, lines no longer than a terminal's, and no raw value."""
    choices = Choices(family=family)
    published = contract(outcome, choices, appraise(outcome, choices))
    assert json.loads(json.dumps(published, allow_nan=False)) == published
    text, shown = letter(outcome, choices), on_screen(outcome, choices)
    assert not RAW.search(text)
    assert not RAW.search(shown)
    assert max(map(len, shown.splitlines())) <= WIDTH
    head, *rows = table_of(outcome, choices)
    assert head == SHEET_HEAD
    for row in rows:
        assert len(row) == len(SHEET_HEAD)
        assert all(not cell or NUMBER.fullmatch(cell.split(" ")[-1]) for cell in row[1:4])
