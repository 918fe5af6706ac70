"""What a screen reader finds: a name on everything that can have the focus, and whole sentences behind pictures."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt
from PySide6.QtGui import QAccessible, QGuiApplication
from PySide6.QtWidgets import QApplication, QComboBox, QLabel, QWidget

from fourcount.record.outcome import FORMS
from fourcount.wording import labels
from fourcount.wording.standing import STANDING

if TYPE_CHECKING:
    from conftest import Hands


def name_of(widget: QWidget) -> str:
    """The name that a screen reader hears."""
    return QAccessible.queryAccessibleInterface(widget).text(QAccessible.Text.Name)


def focusable(hands: Hands) -> list[QWidget]:
    """Everything on screen that Tab or a click can give the focus to."""
    widgets = hands.window.findChildren(QWidget)
    return [widget for widget in widgets if widget.isVisible() and widget.focusPolicy() != Qt.FocusPolicy.NoFocus]


def open_all_rows(hands: Hands) -> None:
    """Open every row that few papers need."""
    optional = hands.window.printed.rare.optional
    assert optional is not None
    patient = hands.window.patient
    for link in (*optional.links.values(), *patient.quiet.links.values()):
        if link.isVisible():
            link.click()
    hands.do("own-line")
    hands.do("outcome-copy")


@pytest.mark.parametrize("form", FORMS)
def test_every_target_is_large_enough(hands: Hands, form: str) -> None:
    """Whatever can be clicked is at least 24 pixels high and wide."""
    hands.do("example")
    hands.do(f"form-{form}")
    open_all_rows(hands)
    QApplication.processEvents()
    small = [
        f"{name_of(widget)} {widget.width()} x {widget.height()}"
        for widget in focusable(hands)
        if not isinstance(widget, QLabel) and min(widget.width(), widget.height()) < 24
    ]
    assert small == []


@pytest.mark.parametrize(
    "state",
    ["first start", "example", "wrong", "case-control", "more", "rows", "paste", "three", "rate", "overall", *FORMS],
)
def test_everything_that_takes_the_focus_has_a_name(hands: Hands, state: str) -> None:
    """In every state of the window each control says what it is."""
    if state != "first start":
        hands.do("example")
    if state == "wrong":
        hands.write(hands.window.printed.grid.cells["first_left_text"], "abc")
    if state == "case-control":
        hands.choose(hands.window.printed.design, "case-control study")
    if state in ("three", "rate", "overall"):
        hands.window.commands.choose("start_kind", state)
    if state == "more":
        hands.do("more")
    if state == "rows":
        open_all_rows(hands)
    if state == "paste":
        QGuiApplication.clipboard().setText("38\t412\n70\t409")
        hands.do("paste")
    if state in FORMS:
        hands.do(f"form-{state}")
    widgets = focusable(hands)
    assert len(widgets) > 15
    assert [widget for widget in widgets if not name_of(widget).strip()] == []


@pytest.mark.parametrize("form", FORMS)
def test_names_tell_controls_apart(hands: Hands, form: str) -> None:
    """No two controls that Tab leads to are called alike, in any form and with every rarer row open."""
    hands.do("example")
    hands.do(f"form-{form}")
    open_all_rows(hands)
    stops = [widget for widget in focusable(hands) if widget.focusPolicy() & Qt.FocusPolicy.TabFocus]
    names = [widget.accessibleName() if isinstance(widget, QComboBox) else name_of(widget) for widget in stops]
    assert sorted(names) == sorted(set(names))


def test_cells_are_named_by_group_and_outcome(hands: Hands) -> None:
    """Without labels of the reader's own, stand-ins say which cell it is."""
    cells = hands.window.printed.grid.cells
    assert [cell.accessibleName() for cell in cells.values()] == [
        "first group, event", "first group, no event", "second group, event", "second group, no event",
    ]  # fmt: skip


def test_a_row_says_its_figures_and_its_notes(hands: Hands) -> None:
    """Name, estimate and interval are its name; method, denominators and notes its description."""
    hands.do("example")
    row = hands.row("risk_ratio")
    assert row.accessibleName() == "Risk ratio: 0.54, 0.37 to 0.78"
    assert "relative reduction 46%" in row.accessibleDescription()


def test_a_row_is_one_thing_to_press(hands: Hands) -> None:
    """Rows are reached by Tab and say that they can be pressed."""
    hands.do("example")
    row = hands.row("risk_ratio")
    assert row.focusPolicy() & Qt.FocusPolicy.TabFocus


def test_the_cautions_are_one_text(hands: Hands) -> None:
    """Every caution and the standing sentences are read out together."""
    hands.do("example")
    hands.choose(hands.window.printed.design, "cohort study")
    said = hands.window.cautions.accessibleDescription()
    assert hands.window.cautions.accessibleName() == labels.COLUMNS["cautions"]
    assert all(text in said for text in hands.window.cautions.texts)
    assert STANDING in said


def test_marks_are_said(hands: Hands) -> None:
    """A wrong cell describes what is wrong, not by its colour alone."""
    hands.type("-3")
    cell = hands.window.printed.grid.cells["first_left_text"]
    assert cell.accessibleDescription() == "-3: a count cannot be negative"
    hands.write(cell, "3")
    assert cell.accessibleDescription() == ""


def test_no_text_is_ever_markup(hands: Hands) -> None:
    """Every label takes its text as it is."""
    hands.do("example")
    labels_shown = [label for label in hands.window.findChildren(QLabel) if label.text()]
    assert labels_shown
    assert [label for label in labels_shown if label.textFormat() != Qt.TextFormat.PlainText] == []
