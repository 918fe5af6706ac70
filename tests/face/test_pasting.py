"""A pasted block or sentence fills the table in one step; a doubtful one is shown before it is taken."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import QMimeData, QPoint, Qt
from PySide6.QtGui import QAction, QDropEvent, QGuiApplication
from PySide6.QtWidgets import QMenu

from fourcount.face.printed.paste_panel import PastePanel
from fourcount.record.outcome import CELLS, EventsAndOthers, EventsOfTotal, Strata, Stratum, form_of
from fourcount.wording.printed_labels import COUNTS_NOT_UNDERSTOOD, NO_TABLE_PASTED

if TYPE_CHECKING:
    from conftest import Hands

EXAMPLE_COUNTS = ("38", "374", "70", "339")

SENTENCE = (
    "Falls occurred in 38 of 412 patients (9.2%) with night lights and 70 of 409 (17.1%) with usual care "
    "(relative risk, 0.54; 95% CI, 0.37 to 0.78; P = 0.001)"
)
BLOCK = "\tfell\tdid not fall\nNight lights\t38\t374\nUsual care\t70\t339"
DOUBTFUL = "38\t412\n70\t409"


def paste(hands: Hands, text: str, keys: str = "Ctrl+V") -> None:
    """Paste a text wherever the cursor is."""
    QGuiApplication.clipboard().setText(text)
    hands.press(keys)


def panel_of(hands: Hands) -> PastePanel:
    """The panel that shows what was understood."""
    panel = hands.window.printed.rare.panel
    assert panel is not None
    return panel


def test_a_sentence_fills_everything_in_one_step(hands: Hands) -> None:
    """Counts, groups, event and the printed figures; one undo takes all of it back."""
    paste(hands, SENTENCE)
    outcome = hands.window.session.outcome
    assert form_of(outcome.table) == "events-of-total"
    assert hands.texts == ("38", "412", "70", "409")
    assert (outcome.first_label_text, outcome.second_label_text) == ("night lights", "usual care")
    assert "0.54" in outcome.paper_text
    assert hands.rows["risk_ratio"].startswith("Risk ratio: 0.54")
    assert hands.notice.startswith("Pasted: table, groups")
    check = hands.window.printed.rare.check
    assert check is not None
    hands.qtbot.waitUntil(lambda: bool(check.sentences))
    hands.do("undo")
    assert hands.texts == ("", "", "", "")
    assert not hands.window.session.can_undo


def test_a_block_fills_the_table_with_its_labels(hands: Hands) -> None:
    """Tabs between cells, headings above and groups before them."""
    paste(hands, BLOCK)
    assert hands.texts == ("38", "374", "70", "339")
    grid = hands.window.printed.grid
    assert [grid.labels[key].text() for key in ("first", "second")] == ["Night lights", "Usual care"]
    assert [grid.headings[key].text() for key in ("left", "right")] == ["fell", "did not fall"]


@pytest.mark.parametrize("field", ["second_right_text", "first_label_text", "span_text", "name_text", "paper_text"])
def test_a_table_can_be_pasted_anywhere_in_the_column(example: Hands, field: str) -> None:
    """Into a cell, a label, the span or the line of what the paper says: it is a table there too."""
    place = example.window.printed.field_named(field)
    assert place is not None
    example.click(place)
    paste(example, BLOCK.replace("38", "39"))
    assert example.texts == ("39", "374", "70", "339")


def test_elsewhere_a_table_is_only_text(hands: Hands) -> None:
    """The title of the paper takes what is pasted as it is."""
    hands.click(hands.window.header.title)
    paste(hands, "38 of 412 and 70 of 409")
    assert hands.window.header.title.text() == "38 of 412 and 70 of 409"
    assert hands.texts == ("", "", "", "")


@pytest.mark.parametrize("text", ["38", "1,204", "1 204", "38/412", "38 (9.2%)"])
def test_a_number_is_pasted_into_its_cell(hands: Hands, text: str) -> None:
    """One cell's text goes into the cell, as ever."""
    paste(hands, text)
    assert hands.texts == (text, "", "", "")
    assert hands.window.printed.rare.panel is None or not panel_of(hands).isVisible()


def test_a_printed_effect_is_pasted_into_what_the_paper_says(example: Hands) -> None:
    """There it is text for the check; the counts stay."""
    example.do("paper")
    paste(example, "RR 0.54 (95% CI 0.37 to 0.78)")
    assert example.window.session.outcome.paper_text == "RR 0.54 (95% CI 0.37 to 0.78)"
    assert example.texts == ("38", "374", "70", "339")


def test_a_doubtful_paste_is_shown_before_anything_changes(hands: Hands) -> None:
    """The panel says what was understood and what is uncertain; the record waits."""
    record = hands.window.session.record
    paste(hands, DOUBTFUL)
    panel = panel_of(hands)
    assert panel.isVisible()
    assert hands.window.session.record is record
    assert "38" in panel.understood.text()
    assert panel.uncertain.text()
    assert hands.focus is panel.take
    assert panel.take.accessibleDescription()


@pytest.mark.parametrize("how", ["Return", "click"])
def test_taking_a_doubtful_paste(hands: Hands, how: str) -> None:
    """Enter or the link takes it, and the cursor is back in its cell."""
    paste(hands, DOUBTFUL)
    panel = panel_of(hands)
    if how == "click":
        hands.click(panel.take)
    else:
        hands.press(how)
    assert not panel.isVisible()
    assert hands.texts[0] == "38"
    assert hands.field == CELLS[0]
    hands.do("undo")
    assert hands.texts == ("", "", "", "")


@pytest.mark.parametrize("how", ["Escape", "click", "elsewhere"])
def test_leaving_a_doubtful_paste(hands: Hands, how: str) -> None:
    """Escape, also from another field, or the link puts it away; nothing changed."""
    paste(hands, DOUBTFUL)
    panel = panel_of(hands)
    if how == "elsewhere":
        hands.click(hands.window.printed.span)
        hands.press("Escape")
    elif how == "click":
        hands.click(panel.leave)
    else:
        hands.press(how)
    assert not panel.isVisible()
    assert hands.texts == ("", "", "", "")
    assert not hands.window.session.can_undo


def test_the_other_ways_round_come_in_turn(hands: Hands) -> None:
    """Totals or others, rows or columns: each press shows another way, and they come round."""
    paste(hands, DOUBTFUL)
    panel = panel_of(hands)
    shown = [panel.understood.text()]
    while True:
        hands.click(panel.turn)
        if panel.understood.text() == shown[0]:
            break
        shown.append(panel.understood.text())
        assert len(shown) < 8
    assert len(set(shown)) == len(shown) > 1


def test_the_other_way_round_is_what_is_taken(hands: Hands) -> None:
    """Counts with totals instead of the others."""
    paste(hands, DOUBTFUL)
    panel = panel_of(hands)
    hands.click(panel.turn)
    assert panel.pasted is not None
    form = panel.pasted.form
    hands.click(panel.take)
    assert form_of(hands.window.session.outcome.table) == form
    assert isinstance(hands.window.session.outcome.table, EventsAndOthers | EventsOfTotal)


def test_a_chosen_form_settles_what_four_counts_are(hands: Hands) -> None:
    """In 38 of 412 the second number is a total, and no other way fits: it is taken at once."""
    hands.do("form-events-of-total")
    paste(hands, DOUBTFUL)
    assert hands.texts == ("38", "412", "70", "409")
    assert form_of(hands.window.session.outcome.table) == "events-of-total"
    assert hands.window.printed.rare.panel is None


def test_four_counts_in_the_form_of_pairs_are_pairs(hands: Hands) -> None:
    """Which side runs down stays to be asked; the form and the design stay."""
    hands.do("form-pairs")
    paste(hands, "12\t21\n9\t58")
    panel = panel_of(hands)
    assert panel.understood.text() == "Pairs: 12 both, 21 first only, 9 second only, 58 neither"
    hands.click(panel.turn)
    assert panel.understood.text() == "Pairs: 12 both, 9 first only, 21 second only, 58 neither"
    hands.click(panel.take)
    assert hands.texts == ("12", "9", "21", "58")
    assert hands.window.printed.design.currentData() == "paired"


def test_typing_puts_an_offer_away(hands: Hands) -> None:
    """What was understood was for the table as it stood."""
    paste(hands, DOUBTFUL)
    hands.click(hands.window.printed.grid.cells[CELLS[0]])
    hands.type("3")
    assert not panel_of(hands).isVisible()


def test_the_command_pastes_from_anywhere(hands: Hands) -> None:
    """Its key works in any field, and says so where there is no table."""
    hands.click(hands.window.patient.baseline)
    paste(hands, BLOCK, "Ctrl+Shift+V")
    assert hands.texts == ("38", "374", "70", "339")
    paste(hands, "nothing of the kind", "Ctrl+Shift+V")
    assert hands.notice == NO_TABLE_PASTED
    paste(hands, "It was 12 in May and 14 in June", "Ctrl+Shift+V")
    assert hands.notice == COUNTS_NOT_UNDERSTOOD
    paste(hands, DOUBTFUL, "Ctrl+Shift+V")
    assert not hands.notice
    hands.press("Escape")
    hands.do("undo")
    assert hands.texts == ("", "", "", "")


@pytest.mark.parametrize("field", ["name_text", "first_label_text", "span_text", "paper_text"])
def test_an_effect_alone_is_text_among_words(example: Hands, field: str) -> None:
    """Only in a cell does it make another table."""
    place = example.window.printed.field_named(field)
    assert place is not None
    example.write(place, "")
    paste(example, "Risk ratio 0.54 (0.37 to 0.78)")
    assert place.text() == "Risk ratio 0.54 (0.37 to 0.78)"
    assert example.texts == EXAMPLE_COUNTS


@pytest.mark.parametrize(
    ("text", "label", "cells"),
    [
        ("9/122\t15/125", "", ("9", "122", "15", "125")),
        ("women\t9\t122\t15\t125", "women", ("9", "122", "15", "125")),
    ],
)
def test_a_row_pasted_into_strata_fills_its_row(hands: Hands, text: str, label: str, cells: tuple[str, ...]) -> None:
    """One row of a table belongs where the cursor is; the others stay; one undo takes it back."""
    hands.fill("strata")
    hands.press("Tab")
    before = hands.window.session.outcome
    paste(hands, text)
    table = hands.window.session.outcome.table
    assert isinstance(table, Strata)
    assert table.strata[2] == Stratum(label_text=label, **dict(zip(CELLS, cells, strict=True)))
    assert table.strata[:2] == before.table.strata[:2]  # type: ignore[union-attr]
    assert hands.notice
    hands.do("undo")
    assert hands.window.session.outcome == before


def test_the_link_pastes_too(hands: Hands) -> None:
    """The word beside the table does what the command does."""
    QGuiApplication.clipboard().setText(BLOCK)
    hands.click(hands.window.printed.links[3])
    assert hands.texts == ("38", "374", "70", "339")


def test_the_menu_of_a_cell_pastes_a_table(hands: Hands) -> None:
    """Paste in the context menu knows tables as the key does."""
    QGuiApplication.clipboard().setText(BLOCK)
    cell = hands.window.printed.grid.cells[CELLS[0]]
    menu = QMenu(hands.window)
    for action in cell.createStandardContextMenu().actions():
        if action.objectName() == "edit-paste":
            ours = cell.own_paste(action, menu)
            assert isinstance(ours, QAction)
            ours.trigger()
    assert hands.texts == ("38", "374", "70", "339")


def test_a_table_can_be_dropped(hands: Hands) -> None:
    """Text dragged from a spreadsheet onto a cell fills the table."""
    data = QMimeData()
    data.setText(BLOCK)
    drop = QDropEvent(
        QPoint(5, 5), Qt.DropAction.CopyAction, data, Qt.MouseButton.LeftButton, Qt.KeyboardModifier.NoModifier
    )
    hands.window.printed.grid.cells[CELLS[0]].dropEvent(drop)
    assert hands.texts == ("38", "374", "70", "339")


@pytest.mark.parametrize(
    ("text", "form"),
    [
        ("38 in 4,120 person-years versus 70 in 3,980 person-years", "person-time"),
        ("\tevents\tn\nA\t9.2%\t412\nB\t17.1%\t409", "percent-of-total"),
        ("HR 0.72 (95% CI 0.55 to 0.92)", "effect-only"),
    ],
)
def test_other_forms_are_pasted(hands: Hands, text: str, form: str) -> None:
    """What is pasted brings its own form of print."""
    hands.click(hands.window.printed.grid.cells[CELLS[0]])
    paste(hands, text)
    panel = hands.window.printed.rare.panel
    if panel is not None and panel.isVisible():
        hands.press("Return")
    assert form_of(hands.window.session.outcome.table) == form


def test_pasting_the_same_again_is_no_step(hands: Hands) -> None:
    """What changes nothing leaves nothing to undo, and says so."""
    paste(hands, BLOCK)
    hands.do("undo")
    hands.do("redo")
    paste(hands, BLOCK)
    hands.do("undo")
    assert not hands.window.session.can_undo
