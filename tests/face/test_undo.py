"""Undo and redo: one path back and forth, a run of typing at a time, and nothing is ever lost on the way."""

from __future__ import annotations

from typing import TYPE_CHECKING

from fourcount.record.outcome import CELLS
from fourcount.record.paper import Record

if TYPE_CHECKING:
    from conftest import Hands


def test_a_run_of_typing_in_one_field_is_one_step(hands: Hands) -> None:
    """Four digits are undone at once, while the cursor still stands behind them."""
    hands.type("1204")
    hands.press("Ctrl+Z")
    assert hands.texts == ("", "", "", "")
    assert not hands.window.session.can_undo


def test_each_field_is_a_step_of_its_own(hands: Hands) -> None:
    """Leaving a field ends its run: the counts come off one by one, the last first."""
    hands.count("38", "374", "70", "339")
    seen = []
    for _ in CELLS:
        hands.do("undo")
        seen.append(hands.texts)
    assert seen == [("38", "374", "70", ""), ("38", "374", "", ""), ("38", "", "", ""), ("", "", "", "")]


def test_coming_back_to_a_field_begins_a_new_step(hands: Hands) -> None:
    """Typing on after a visit elsewhere can be undone without what was there before."""
    hands.type("38")
    hands.press("Tab")
    hands.press("Shift+Tab")
    hands.press("End")
    hands.type("4")
    assert hands.texts[0] == "384"
    hands.do("undo")
    assert hands.texts[0] == "38"
    hands.do("undo")
    assert hands.texts[0] == ""


def test_the_cursor_comes_back_to_the_field_that_was_undone(hands: Hands) -> None:
    """Whoever undoes sees where: the field of the step gets the focus, on the way back as on the way forth."""
    hands.count("38", "374", "70")
    hands.write(hands.window.patient.baseline, "12%")
    hands.do("undo")
    assert hands.field == "starting_risk_text"
    hands.do("undo")
    assert hands.field == CELLS[2]
    hands.do("redo")
    assert hands.field == CELLS[2]
    hands.do("redo")
    assert hands.field == "starting_risk_text"


def test_the_keys_work_in_every_kind_of_field(hands: Hands) -> None:
    """No field keeps Ctrl+Z or its opposite for itself."""
    window, grid = hands.window, hands.window.printed.grid
    fields = [
        window.header.title, window.header.source, window.printed.name, window.printed.event_words,
        window.printed.span, grid.headings["right"], grid.labels["second"], grid.cells[CELLS[3]],
        window.patient.baseline, window.patient.source,
    ]  # fmt: skip
    for field in fields:
        hands.write(field, "7")
        hands.press("Ctrl+Z")
        assert field.text() == ""
        assert hands.focus is field
        hands.press("Ctrl+Shift+Z")
        assert field.text() == "7"


def test_ctrl_y_does_again_too(hands: Hands) -> None:
    """Both customs of redoing are known."""
    hands.type("38")
    hands.press("Ctrl+Z")
    hands.press("Ctrl+Y")
    assert hands.texts[0] == "38"


def test_ten_steps_back_and_forth_return_to_the_same_record(hands: Hands) -> None:
    """After ten undos and ten redos the very same record is shown, with the same figures."""
    window, grid = hands.window, hands.window.printed.grid
    hands.count("38", "374", "70", "339")
    hands.write(grid.labels["first"], "Night lights")
    hands.write(window.printed.span, "12 months")
    hands.do("swap")
    hands.do("form-events-of-total")
    hands.choose(window.printed.design, "cohort study")
    hands.write(window.patient.baseline, "12%")
    record, rows, texts = window.session.record, hands.rows, hands.texts
    for _ in range(10):
        hands.do("undo")
    assert window.session.record == Record()
    assert hands.texts == ("", "", "", "")
    assert hands.rows == {}
    for _ in range(10):
        hands.do("redo")
    assert window.session.record == record
    assert (hands.rows, hands.texts) == (rows, texts)
    assert not window.session.can_redo


def test_new_typing_takes_the_way_forth_away(hands: Hands) -> None:
    """After an undo, typing begins another future."""
    hands.count("38", "374")
    hands.do("undo")
    hands.type("9")
    assert not hands.window.actions_by_key["redo"].isEnabled()
    hands.press("Ctrl+Y")
    assert hands.texts == ("38", "9", "", "")


def test_typing_on_after_an_undo_is_a_step(hands: Hands) -> None:
    """What was undone to stays reachable: the run does not go on over an undo."""
    hands.type("38")
    hands.press("Ctrl+Z")
    hands.type("70")
    hands.press("Ctrl+Z")
    assert hands.texts[0] == ""
    hands.press("Ctrl+Y")
    assert hands.texts[0] == "70"


def test_commands_are_only_offered_where_there_is_a_way(hands: Hands) -> None:
    """Undo and redo are off at the ends of the way."""
    undo, redo = (hands.window.actions_by_key[key] for key in ("undo", "redo"))
    assert (undo.isEnabled(), redo.isEnabled()) == (False, False)
    hands.type("3")
    assert (undo.isEnabled(), redo.isEnabled()) == (True, False)
    hands.press("Ctrl+Z")
    assert (undo.isEnabled(), redo.isEnabled()) == (False, True)


def test_undo_at_the_beginning_does_nothing(hands: Hands) -> None:
    """Pressing on at the end of the way changes nothing."""
    record = hands.window.session.record
    hands.press("Ctrl+Z", times=3)
    hands.press("Ctrl+Y", times=3)
    assert hands.window.session.record is record


def test_a_new_table_can_be_taken_back(example: Hands) -> None:
    """New empties the window and keeps the choice of intervals; undo brings the old table back."""
    window = example.window
    example.choose(window.says.level, "99.9%")
    record = window.session.record
    example.do("new")
    assert example.texts == ("", "", "", "")
    assert example.field == CELLS[0]
    assert window.says.level.currentText() == "99.9%"
    example.do("undo")
    assert window.session.record == record
    assert example.texts == ("38", "374", "70", "339")


def test_the_example_can_be_taken_back(hands: Hands) -> None:
    """The worked example replaces what was typed, and undo brings it back."""
    hands.count("1", "2", "3", "4")
    hands.do("example")
    assert hands.texts == ("38", "374", "70", "339")
    hands.do("undo")
    assert hands.texts == ("1", "2", "3", "4")
    assert hands.window.header.title.text() == ""


def test_cleared_counts_can_be_taken_back(example: Hands) -> None:
    """Clear empties the four cells and nothing else; undo fills them again."""
    example.write(example.window.printed.grid.labels["first"], "Night lights")
    example.do("clear")
    assert example.texts == ("", "", "", "")
    assert example.window.printed.grid.labels["first"].text() == "Night lights"
    assert example.field == CELLS[0]
    example.do("undo")
    assert example.texts == ("38", "374", "70", "339")


def test_clear_by_its_link(example: Hands) -> None:
    """The word beside the table clears it too."""
    example.click(example.window.printed.links[2])
    assert example.texts == ("", "", "", "")


def test_clearing_an_empty_table_is_no_step(hands: Hands) -> None:
    """What changes nothing leaves nothing to undo."""
    for command in ("clear", "new"):
        hands.do(command)
    assert not hands.window.session.can_undo


def test_choices_are_steps(example: Hands) -> None:
    """A swap, a form and a family are each taken back by one undo."""
    rows = example.rows
    for command in ("swap", "count-other", "form-events-of-total", "layout"):
        example.do(command)
        example.do("undo")
        assert example.rows == rows
        assert example.texts == ("38", "374", "70", "339")
    example.choose(example.window.says.family, "textbook")
    assert example.rows != rows
    example.do("undo")
    assert example.rows == rows
    assert example.window.says.family.currentText() == "score"


def test_undo_reaches_words_of_the_column_that_was_counted(hands: Hands) -> None:
    """Words typed for the other outcome come back to the state in which they stood."""
    hands.write(hands.window.printed.event_words, "fell")
    hands.do("count-other")
    hands.write(hands.window.printed.event_words, "stood")
    hands.do("undo")
    assert hands.window.printed.event_words.text() == ""
    hands.do("undo")
    assert hands.window.printed.event_words.text() == "fell"
    hands.do("undo")
    assert hands.window.printed.event_words.text() == ""
