"""For one patient: a starting risk as typed, the effect that is carried, and the picture of both."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt

from fourcount.ink.picture import Picture
from fourcount.wording.patient import WHICH_PEOPLE

if TYPE_CHECKING:
    from conftest import Hands

GOOD = ["12%", "12", "12 %", "12 in 100", "12/100", "12 of 100", "12,0%", "120 per 1,000"]
BAD = [
    ("abc", "abc: a risk is needed, such as 12% or 12 in 100"),
    ("0.12", "0.12: this could be a percentage or a fraction; write it with its sign, such as 12%"),
    ("1", "1: this could be a percentage or a fraction; write it with its sign, such as 12%"),
    ("120%", "120%: a risk lies between 0% and 100%"),
    ("-5%", "-5%: a risk lies between 0% and 100%"),
    ("12 in 0", "12 in 0: a risk is needed, such as 12% or 12 in 100"),
]


def drawn(hands: Hands) -> Picture:
    """The picture on screen."""
    picture = hands.window.patient.figures.drawn
    assert picture is not None
    return picture


def test_an_empty_starting_risk_is_the_studys_own(example: Hands) -> None:
    """Nothing typed means the reference group's risk, which the empty field shows."""
    assert example.window.patient.baseline.text() == ""
    assert example.window.patient.baseline.placeholderText() == "17.1%"
    assert drawn(example).plan.without_risk == pytest.approx(70 / 409)


@pytest.mark.parametrize("typed", GOOD)
def test_a_starting_risk_is_taken_in_many_forms(example: Hands, typed: str) -> None:
    """12% however it is written: 12 and 6 in 100, the risk ratio carried."""
    example.write(example.window.patient.baseline, typed)
    plan = drawn(example).plan
    assert plan.without_risk == pytest.approx(0.12)
    assert plan.with_risk == pytest.approx(0.12 * (38 / 412) / (70 / 409))
    assert plan.denominator == 100
    assert example.window.patient.figures.summary.text().startswith("6 fewer in 100")
    assert not example.window.patient.baseline.marked


@pytest.mark.parametrize(("typed", "sentence"), BAD, ids=[typed for typed, _ in BAD])
def test_a_bad_starting_risk_is_marked_and_nothing_drawn(example: Hands, typed: str, sentence: str) -> None:
    """The text stays, the field is marked and explained, no picture stands, and the study's figures go on."""
    rows, patient = example.rows, example.window.patient
    example.write(patient.baseline, typed)
    assert patient.baseline.text() == typed
    assert patient.baseline.marked
    assert patient.mark.text() == sentence
    assert patient.mark.isVisible()
    assert not patient.figures.picture.isVisible()
    assert not patient.figures.summary.isVisible()
    assert list(example.rows) == list(rows)
    assert example.rows["risk_ratio"] == rows["risk_ratio"]
    example.write(patient.baseline, "")
    assert not patient.mark.isVisible()
    assert patient.figures.picture.isVisible()


def test_why_a_starting_risk_is_marked_comes_into_view(example: Hands) -> None:
    """In a low window the sentence would lie under the fold, and the field alone says nothing."""
    window = example.window
    window.resize(900, 560)
    example.do("baseline")
    example.type("low")
    mark, scroll = window.patient.mark, window.page_scroll
    example.qtbot.waitUntil(mark.isVisible)

    def bottom() -> int:
        return mark.mapTo(scroll.viewport(), mark.rect().bottomLeft()).y()

    example.qtbot.waitUntil(lambda: 0 < bottom() <= scroll.viewport().height())
    assert example.field == "starting_risk_text"


def test_a_starting_risk_keeps_its_source(example: Hands) -> None:
    """Where the risk is from is kept beside it."""
    example.write(example.window.patient.baseline, "12%")
    example.write(example.window.patient.source, "own ward")
    assert example.window.session.outcome.patient.starting_risk_source_text == "own ward"


def test_a_typed_starting_risk_says_what_the_interval_leaves_out(example: Hands) -> None:
    """A bare risk has no interval of its own, and the effect is assumed to be the same there."""
    example.write(example.window.patient.baseline, "12%")
    assert "leaves out that 12% is itself uncertain" in example.window.patient.figures.detail.text()
    assert any("assumed to be the same at 12%" in text for text in example.window.cautions.texts)


def test_a_distant_starting_risk_gets_a_caution(example: Hands) -> None:
    """Outside half to twice the study's own risk the window says so."""
    example.write(example.window.patient.baseline, "60%")
    assert any("outside half to twice" in text for text in example.window.cautions.texts)


def test_another_effect_carries_other_risks(example: Hands) -> None:
    """At 40% the carried odds ratio gives a higher risk than the risk ratio, and each choice shows its value."""
    effect = example.window.patient.effect
    example.write(example.window.patient.baseline, "40%")
    by_ratio = drawn(example).plan.with_risk
    assert [effect.itemText(i) for i in range(effect.count())] == [
        "risk ratio 0.54, kept constant", "odds ratio 0.49, kept constant",
        "risk difference 7.9 fewer per 100, kept constant",
    ]  # fmt: skip
    example.choose(effect, "odds ratio 0.49, kept constant")
    odds = 0.4 / 0.6 * (38 * 339) / (374 * 70)
    assert drawn(example).plan.with_risk == pytest.approx(odds / (1 + odds))
    assert drawn(example).plan.with_risk != pytest.approx(by_ratio, abs=0.01)


def test_a_risk_over_100_percent_is_refused_and_the_odds_ratio_offered(hands: Hands) -> None:
    """A risk ratio of 3 cannot be carried to 60%; its odds ratio can."""
    hands.count("60", "40", "20", "80")
    hands.write(hands.window.patient.baseline, "60%")
    assert not hands.window.patient.figures.picture.isVisible()
    assert "the odds ratio can be carried instead" in hands.window.patient.figures.detail.text()
    effect = hands.window.patient.effect
    hands.choose(effect, effect.itemText(1))
    assert hands.window.patient.figures.picture.isVisible()


def test_the_odds_ratio_is_one_step_away_where_a_risk_would_pass_100_percent(hands: Hands) -> None:
    """The link carries the odds ratio, goes with its reason, and is undone as one step."""
    hands.count("60", "40", "30", "70")
    hands.write(hands.window.patient.baseline, "80%")
    link, effect = hands.window.patient.figures.odds, hands.window.patient.effect
    assert link.isVisible()
    hands.qtbot.keyClick(link, Qt.Key.Key_Return)
    assert hands.window.session.outcome.patient.effect == "odds_ratio"
    assert not link.isVisible()
    assert effect.hasFocus()
    assert drawn(hands).plan.with_risk < 1
    hands.window.session.undo()
    assert link.isVisible()


@pytest.mark.parametrize(
    ("typed", "denominator", "note"),
    [
        ("12%", 100, ""),
        ("1%", 1_000, "Each picture shows 1,000 people, not 100."),
        ("0.1%", 10_000, "Each picture shows 10,000 people, not 100."),
        ("0.0001%", None, "Too small to draw as people. The bars run to 0.1%, not to 100%."),
    ],
)
def test_smaller_risks_are_shown_in_more_people(example: Hands, typed: str, denominator: int | None, note: str) -> None:
    """The picture says when it shows more than a hundred people, or why it shows none."""
    example.write(example.window.patient.baseline, typed)
    assert drawn(example).plan.denominator == denominator
    assert drawn(example).words.note == note
    assert drawn(example).bars == (denominator is None)


def test_bars_instead_of_people_and_back(example: Hands) -> None:
    """The command draws the same risks as bars, in the same words."""
    before = drawn(example)
    example.do("bars")
    assert drawn(example).bars
    assert (drawn(example).words.without, drawn(example).words.with_) == (before.words.without, before.words.with_)
    example.type("")
    example.write(example.window.patient.baseline, "12%")
    assert drawn(example).bars
    example.do("bars")
    assert not drawn(example).bars


def test_the_picture_is_said_in_full(example: Hands) -> None:
    """A screen reader hears both groups, both frames, the change, its interval, and that nobody can be pointed to."""
    example.write(example.window.patient.baseline, "12%")
    view = example.window.patient.figures.picture
    said = view.accessibleDescription()
    assert view.accessibleName()
    for part in (
        "Of 100 people",
        "12 (12%)",
        "88 did not",
        "6 (6%)",
        "94 did not",
        "6 fewer in 100",
        "95% interval 3 to 8",
        WHICH_PEOPLE,
    ):
        assert part in said


def test_no_effect_is_said_as_such(hands: Hands) -> None:
    """Equal risks are the same number, with neither benefit nor harm."""
    hands.count("10", "90", "10", "90")
    assert hands.window.patient.figures.summary.text().startswith("The same number in 100")
    assert drawn(hands).plan.with_.avoided == drawn(hands).plan.with_.added == 0


def test_the_key_to_the_starting_risk_selects_it(example: Hands) -> None:
    """One key leads from the table to the starting risk, to be typed over."""
    example.write(example.window.patient.baseline, "12%")
    example.do("first-cell")
    example.do("baseline")
    example.type("20%")
    assert example.window.patient.baseline.text() == "20%"


def test_a_copied_picture_says_what_it_rests_on(example: Hands) -> None:
    """Its first line is the starting risk with its source, and the effect kept constant."""
    example.write(example.window.patient.baseline, "12%")
    example.write(example.window.patient.source, "ward audit 2025")
    assert drawn(example).words.lines[0] == (
        "Starting risk 12% (ward audit 2025), risk ratio 0.54 (0.37 to 0.78) kept constant."
    )
    assert example.window.patient.figures.summary.text().startswith("6 fewer in 100")


def test_a_survey_carries_a_prevalence_ratio(example: Hands) -> None:
    """The choice of effect is called as the row is."""
    example.choose(example.window.printed.design, "cross-sectional survey")
    effect = example.window.patient.effect
    assert [effect.itemText(i).split(" ", 1)[0] for i in range(effect.count())] == ["prevalence", "odds", "prevalence"]
