"""Does it add up: what the paper says is typed under the table, and the answer follows at a pause."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from fourcount.face.printed.check import CheckView

if TYPE_CHECKING:
    from conftest import Hands


def check_of(hands: Hands) -> CheckView:
    """The part of the column that holds the check."""
    view = hands.window.printed.rare.check
    assert view is not None
    return view


def says(hands: Hands, text: str) -> list[str]:
    """Type what the paper says and wait for the answer to it."""
    view = check_of(hands)
    hands.write(view.paper.text, text)
    checking = hands.window.checking
    assert checking is not None
    found = checking.found
    hands.qtbot.waitUntil(lambda: checking.found is not found and checking.found is not None)
    return view.sentences


def signs(hands: Hands) -> list[str]:
    """The signs before the sentences."""
    return [row.sign.text() for row in check_of(hands).rows if not row.words.isHidden()]


def test_an_empty_window_has_no_check(hands: Hands) -> None:
    """While nothing is typed there is nothing to add up, and the first start stays calm."""
    assert hands.window.printed.rare.check is None
    hands.type("3")
    assert check_of(hands).isVisible()
    hands.do("undo")
    assert not check_of(hands).isVisible()


def test_a_figure_that_follows_agrees(example: Hands) -> None:
    """The log interval of the risk ratio is found, with our digits, under the sign of equality."""
    sentences = says(example, "0.54 (0.37 to 0.78)")
    assert "follows from the counts" in sentences[0]
    assert signs(example)[0] == "="


def test_an_odds_ratio_called_a_risk_ratio_asks_to_check(example: Hands) -> None:
    """The sentence names the odds ratio; its sign is another shape, not only another colour."""
    sentences = says(example, "0.49 (0.32 to 0.75)")
    assert sentences[0].startswith("Check the name")
    assert signs(example)[0] == "?"
    check_of(example).paper.measure.setFocus()
    example.choose(check_of(example).paper.measure, "odds ratio")
    example.qtbot.waitUntil(lambda: signs(example)[:1] == ["="])


def test_the_check_waits_for_a_pause_and_keeps_the_last_one_until_then(example: Hands) -> None:
    """A keystroke changes nothing that was found; the pause does."""
    before = says(example, "0.54 (0.37 to 0.78)")
    example.write(example.window.printed.grid.cells["first_left_text"], "48")
    assert check_of(example).sentences == before
    example.qtbot.waitUntil(lambda: check_of(example).sentences != before)


def test_a_print_that_is_gone_leaves_no_sentence(example: Hands) -> None:
    """An emptied field takes its findings with it at once."""
    says(example, "0.54 (0.37 to 0.78)")
    example.write(check_of(example).paper.text, "")
    assert check_of(example).sentences == []


def test_what_cannot_be_read_is_marked_with_its_reason(example: Hands) -> None:
    """Text without a figure marks its field and says why."""
    sentences = says(example, "a lot")
    assert check_of(example).paper.text.marked
    assert sentences
    assert signs(example) == ["?"]


def test_an_adjusted_effect_that_cannot_be_read_marks_its_own_field(example: Hands) -> None:
    """The line of what the paper says stays unmarked."""
    optional = example.window.printed.rare.optional
    assert optional is not None
    example.click(optional.links["adjusted"])
    field = optional.rows["adjusted"].fields[0]
    example.write(field, "a lot")
    assert field.marked
    assert any(note.startswith("a lot") for note in example.notes)
    assert not check_of(example).paper.text.marked
    example.write(example.window.printed.span, "2 years")
    assert field.marked


@pytest.mark.parametrize("text", ["0.54 (0.39 to 0.73)", "0.49 (0.35 to 0.70)", "0.54 (0.37 to 0.87); P = 0.3"])
def test_a_new_answer_comes_into_view_with_its_field(example: Hands, text: str) -> None:
    """In a low window, the field, every sentence and the link stand on screen when the answer is there."""
    window = example.window
    window.resize(1280, 620)
    example.do("paper")
    says(example, text)
    view = check_of(example)

    def seen() -> bool:
        port = window.page_scroll.viewport()
        shown = [view.paper.text, view.adopt, *(row.words for row in view.rows)]
        places = [
            (part.mapTo(port, part.rect().topLeft()).y(), part.mapTo(port, part.rect().bottomLeft()).y())
            for part in shown
            if part.isVisible()
        ]
        return all(top >= 0 and bottom < port.height() for top, bottom in places)

    example.qtbot.waitUntil(seen)
    for part in (view.adopt, *(row.words for row in view.rows)):
        assert not part.isVisible() or part.height() >= part.heightForWidth(part.width())


def test_a_long_result_gets_a_line_of_its_own(example: Hands) -> None:
    """It is typed on, cursor and all, where it can be seen whole, and goes back beside its measure when it is short."""
    view = check_of(example)
    text, measure = view.paper.text, view.paper.measure
    example.window.resize(1280, 800)
    example.do("paper")
    example.type("0.54 (0.37 to 0.78)")
    assert text.y() == measure.y()
    example.type(", P = 0.001; OR 0.49 (0.32 to 0.75)")
    example.qtbot.waitUntil(lambda: text.y() > measure.y())
    assert example.focus is text
    assert text.text().endswith("0.75)")
    example.press("Ctrl+A")
    example.type("0.5")
    example.qtbot.waitUntil(lambda: text.y() == measure.y())


def test_adopting_takes_family_and_level_in_one_step(example: Hands) -> None:
    """A 90% textbook interval is found; the link takes both, and one undo gives both back."""
    view = check_of(example)
    says(example, "0.54 (0.39 to 0.73)")
    assert view.adopt.isVisible()
    example.click(view.adopt)
    choices = example.window.session.record.choices
    assert (choices.family, choices.level) != ("score", 0.95)
    assert example.rows["risk_ratio"] == "Risk ratio: 0.54, 0.39 to 0.73"
    assert not view.adopt.isVisible()
    example.do("undo")
    assert example.window.session.record.choices.level == 0.95
    assert example.window.session.record.choices.family == "score"


def test_adopting_is_a_command_where_there_is_something_to_adopt(example: Hands) -> None:
    """Its entry in the menu is off until a method is found."""
    action = example.window.actions_by_key["adopt"]
    assert not action.isEnabled()
    says(example, "0.54 (0.39 to 0.73)")
    assert action.isEnabled()
    example.do("adopt")
    assert example.window.session.record.choices.level == 0.9


def test_going_to_the_line_again_leaves_the_answer(example: Hands) -> None:
    """The key that goes to what the paper says changes nothing that was found."""
    sentences = says(example, "0.54 (0.37 to 0.78)")
    example.press("Tab")
    example.do("paper")
    assert check_of(example).sentences == sentences


def test_adopting_right_after_a_key_rests_on_what_is_typed_now(example: Hands) -> None:
    """No check of counts that are gone is adopted."""
    says(example, "0.54 (0.39 to 0.73)")
    example.do("first-cell")
    example.press("End")
    example.type("9")
    example.do("adopt")
    assert example.window.session.record.choices.level == 0.95


def test_undo_reaches_what_the_paper_says(example: Hands) -> None:
    """Typing there is one step, and its field gets the cursor back."""
    says(example, "0.54 (0.37 to 0.78)")
    example.click(example.window.header.title)
    example.do("undo")
    assert check_of(example).paper.text.text() == ""
    assert example.focus is check_of(example).paper.text


def test_a_key_goes_to_what_the_paper_says(hands: Hands) -> None:
    """Ctrl+3 opens the line and brings the cursor there, even before a count is typed."""
    hands.do("paper")
    assert hands.field == "paper_text"
    hands.type("0.54")
    assert hands.window.session.outcome.paper_text == "0.54"


@pytest.mark.parametrize(
    ("form", "cells", "text"),
    [
        ("percent-of-total", ("9.2%", "412", "17.1%", "409"), "0.54 (0.37 to 0.78)"),
        ("pairs", ("12", "21", "9", "58"), "OR 2.33 (1.07 to 5.09)"),
        ("person-time", ("38", "4120", "70", "3980"), "rate ratio 0.52 (0.35 to 0.78)"),
    ],
)
def test_other_forms_are_checked_too(hands: Hands, form: str, cells: tuple[str, ...], text: str) -> None:
    """A figure that follows from them agrees."""
    hands.do(f"form-{form}")
    hands.count(*cells)
    assert says(hands, text)
    assert "=" in signs(hands)


def test_an_effect_alone_is_checked_for_what_needs_no_counts(hands: Hands) -> None:
    """Limits that lie evenly agree; a p of 0.03 beside an interval that holds 1 does not."""
    hands.do("form-effect-only")
    sentences = says(hands, "OR 0.80 (0.60 to 1.07), P = 0.03")
    assert len(sentences) >= 2
    assert "?" in signs(hands)


def test_sentences_are_named_with_their_sign(example: Hands) -> None:
    """A screen reader hears whether a sentence agrees or asks to check."""
    says(example, "0.49 (0.32 to 0.75)")
    assert check_of(example).rows[0].words.accessibleName().startswith("to check: Check the name")


def test_another_record_brings_no_check_of_the_last(example: Hands) -> None:
    """A new table has nothing to add up."""
    says(example, "0.54 (0.37 to 0.78)")
    example.do("new")
    assert not check_of(example).isVisible()
    example.type("3")
    assert check_of(example).sentences == []


def test_limits_in_the_wrong_order_are_said_once(example: Hands) -> None:
    """The sentence about the typed text says it, with both numbers; nothing says that the estimate lies outside."""
    example.do("form-effect-only")
    example.write(example.window.printed.rare.check.paper.text, "OR 0.49 (0.75 to 0.32)")
    example.qtbot.waitUntil(lambda: bool(check_of(example).sentences))
    (only,) = check_of(example).sentences
    assert "0.75" in only
    assert "0.32" in only
