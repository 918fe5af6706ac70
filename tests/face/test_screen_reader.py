"""A screen reader's walk through every window: names, order, the picture and its table, focus that is seen.

Qt for Python offers no handler of accessibility events, so that what is sent when figures change cannot be caught. Qt
sends "name changed" and "description changed" with every name and description that is set on a widget, and "data
changed" with every cell of a table: what is held here is that names, descriptions and cells are those of the figures.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator
from typing import TYPE_CHECKING

import numpy as np
import pytest
from PySide6.QtCore import Qt
from PySide6.QtGui import QAccessible, QGuiApplication, QImage
from PySide6.QtWidgets import QApplication, QComboBox, QLineEdit, QWidget
from pytestqt.qtbot import QtBot

from fourcount.face.curve_window import open_curve
from fourcount.face.handout_window import open_handout
from fourcount.face.help_window import HelpWindow
from fourcount.face.look import APPEARANCES
from fourcount.face.patient_screen import open_screen
from fourcount.face.window import MainWindow
from fourcount.record.outcome import FORMS
from fourcount.record.paper import Record
from patient_outcomes import AT_TWELVE, HARM, WELCOME
from screen_reader import Heard, Role, faults, reading_order, tab_order, tree

if TYPE_CHECKING:
    from conftest import Hands

SEVERAL = Record(title_text="Night lights", outcomes=(AT_TWELVE, HARM, WELCOME))


def open_all_rows(hands: Hands) -> None:
    """Open every row that few papers need."""
    optional = hands.window.printed.rare.optional
    assert optional is not None
    for link in (*optional.links.values(), *hands.window.patient.quiet.links.values()):
        if link.isVisible():
            link.click()
    hands.do("own-line")


def bring_about(hands: Hands, state: str) -> None:
    """Put the window into a state that somebody can meet it in."""
    if state != "first start":
        hands.do("example")
    if state in FORMS:
        hands.do("outcome-copy")
        hands.fill(state)  # type: ignore[arg-type]
        open_all_rows(hands)
    elif state in ("three", "rate", "overall"):
        hands.window.commands.choose("start_kind", state)
        for field, text in zip(hands.window.patient.start.shown, ("5%", "12%", "25%"), strict=False):
            hands.write(field, text)
    elif state == "case-control":
        hands.choose(hands.window.printed.design, "case-control study")
        hands.write(hands.window.patient.baseline, "2%")
    elif state == "wrong":
        hands.write(hands.window.printed.grid.cells["first_left_text"], "abc")
        hands.write(hands.window.patient.baseline, "120%")
    elif state == "all measures":
        hands.do("more")
        hands.row("risk_ratio").click()
        hands.do("relative")
    elif state == "paste":
        QGuiApplication.clipboard().setText("38\t412\n70\t409")
        hands.do("paste")
    elif state == "told":
        hands.do("copy-text")
        hands.window.tell_unexpected("ValueError", "/a/place")


TYPED = (*FORMS, "three", "rate", "overall", "case-control", "wrong")
STATES = ("first start", "example", *TYPED, "all measures", "told", "paste")


@pytest.mark.parametrize("state", STATES)
def test_the_window_is_heard_as_it_is_seen(hands: Hands, state: str) -> None:
    """Everything has a name of its own in words, can be seen and hit, and is heard column by column, as Tab goes."""
    bring_about(hands, state)
    assert faults(hands.window) == []
    read = reading_order(hands.window)
    assert len(read) > 20
    assert names(tab_order(hands.window)) == names(read)
    columns = [hands.window.printed, hands.window.says, hands.window.patient, hands.window.cautions]
    first = [next(place for place, one in enumerate(read) if _in(column, one)) for column in columns]
    assert first == sorted(first)


def test_what_is_told_is_heard(hands: Hands) -> None:
    """The banner and the short notice are in the tree while they are there, and only then."""
    bring_about(hands, "told")
    told = {one.name for one in tree(hands.window)}
    assert hands.window.banner.words.text() in told
    assert hands.window.header.notice.text() in told
    hands.click(hands.window.banner.dismiss)
    hands.window.header.tell("")
    kinds = [one.kind for one in tree(hands.window)]
    assert "Banner" not in kinds
    assert faults(hands.window) == []


def names(widgets: list[QWidget]) -> list[str]:
    """What these are called, or what they say."""
    return [
        f"{type(widget).__name__} {widget.accessibleName() or getattr(widget, 'text', str)()}" for widget in widgets
    ]


def _in(column: QWidget, widget: QWidget) -> bool:
    return widget is column or column.isAncestorOf(widget)


def test_every_field_is_labelled(hands: Hands) -> None:
    """A label that stands beside a field is tied to it; a field without one says itself what it is."""
    bring_about(hands, "events-and-others")
    fields = [one for one in hands.window.findChildren(QWidget) if isinstance(one, QComboBox | QLineEdit)]
    shown = [one for one in fields if one.isVisible()]
    assert len(shown) > 10
    assert [one for one in shown if not one.accessibleName()] == []
    tied = {one.label for one in tree(hands.window) if one.label}
    assert {"Study", "Outcome", "People who", "Time span", "Printed as", "Paper says", "Its source"} <= tied


def one_of(found: list[Heard], kind: str) -> Heard:
    """The one thing of a kind."""
    (only,) = (one for one in found if one.kind == kind)
    return only


@pytest.mark.parametrize("arrangement", ["two", "one", "bars"])
def test_the_picture_is_one_object(hands: Hands, arrangement: str) -> None:
    """However it is drawn: a title, a sentence with the counts of both groups, and nothing inside to stumble over."""
    hands.do("example")
    if arrangement == "bars":
        hands.do("bars")
    else:
        menu = hands.window.menus["picture"]
        next(action for action in menu.actions() if action.data() == arrangement).trigger()
    picture = one_of(tree(hands.window), "PictureView")
    assert picture.name == "Picture: 8 fewer in 100 fell at least once"
    assert "Of 100 people with usual care 17 (17%) fell" in picture.description
    assert "and 83 did not fall; of 100 with night lights 9 (9%) fell at least once and 91 did not fall" in picture.said
    assert picture.children == 0
    assert picture.focusable


def rows_of_table(window: QWidget, kind: str) -> list[list[tuple[str, str, str]]]:
    """Each row's cells: the head of its row, the head of its column, and what stands in it."""
    (table,) = (widget for widget in window.findChildren(QWidget) if type(widget).__name__ == kind)
    found = QAccessible.queryAccessibleInterface(table)
    rows: dict[int, list[tuple[str, str, str]]] = {}
    for place in range(found.childCount()):
        child = found.child(place)
        cell = child.tableCellInterface() if child.role() == Role.Cell else None
        if cell is not None:
            heads = (cell.rowHeaderCells()[0], cell.columnHeaderCells()[0], child)
            rows.setdefault(cell.rowIndex(), []).append(tuple(one.text(QAccessible.Text.Name) for one in heads))
    return list(rows.values())


def test_the_same_numbers_are_a_table(hands: Hands) -> None:
    """Each cell is read with the head of its column and of its row, which say of how many people."""
    bring_about(hands, "three")
    rows = rows_of_table(hands.window, "PatientTable")
    assert [cells[0][2] for cells in rows] == ["Low, 5%", "Usual, 12%", "High, 25%"]
    assert rows[1][1:] == [
        ("Usual, 12%", "Without: usual care, in 100 (95% interval)", "12"),
        ("Usual, 12%", "With: night lights, in 100 (95% interval)", "6 (4 to 9)"),
        ("Usual, 12%", "Difference, in 100 (95% interval)", "6 fewer (3 to 8)"),
        ("Usual, 12%", "Number needed (95% interval)", "NNTB 19 (14 to 38)"),
    ]


def test_figures_that_cannot_be_given_are_told_in_the_table(hands: Hands) -> None:
    """A starting risk at which the effect would pass 100% has its reason where its figures would stand."""
    bring_about(hands, "three")
    hands.do("swap")
    hands.write(hands.window.patient.start.shown[2], "80%")
    high = rows_of_table(hands.window, "PatientTable")[2]
    assert "100%" in high[2][2]
    assert all(text for _, _, text in high)


def test_arrows_go_through_the_table_and_tab_leaves_it(hands: Hands) -> None:
    """The focus is in one cell at a time."""
    bring_about(hands, "three")
    table = hands.window.patient.figures.table
    table.setFocus(Qt.FocusReason.TabFocusReason)
    hands.press("Right")
    hands.press("Down")
    assert (table.currentRow(), table.currentColumn()) == (1, 1)
    hands.press("Tab")
    assert hands.focus is hands.window.patient.figures.show_patient


def test_new_figures_are_told_everywhere(hands: Hands) -> None:
    """After a key the picture, its table, the sentence and the measures say the new figures, and none the old."""
    hands.do("example")
    before = tree(hands.window)
    hands.write(hands.window.printed.grid.cells["first_left_text"], "60")
    after = tree(hands.window)
    old, new = one_of(before, "PictureView"), one_of(after, "PictureView")
    assert old.name != new.name
    assert "of 100 with night lights 14 (14%) fell" in new.description
    assert rows_of_table(hands.window, "PatientTable")[0][1][2].startswith("14 (")
    told = {one.name for one in after}
    assert "Risk, night lights: 13.8%, 10.9 to 17.4%" in told
    assert "Night lights, total: 434" in told
    assert not told & {one.name for one in before if "9.2%" in one.name or "412" in one.name}


def test_a_new_name_is_in_the_heads_of_the_table(hands: Hands) -> None:
    """A group that is called otherwise is called so in every cell, though no figure changed."""
    hands.do("example")
    hands.write(hands.window.printed.grid.labels["first"], "Lamps")
    assert rows_of_table(hands.window, "PatientTable")[0][1][1] == "With: lamps, in 100 (95% interval)"


def test_menus_are_told_with_their_keys(hands: Hands) -> None:
    """Every entry has a name without the mark of its key, and those of one menu are called differently."""
    hands.do("example")
    for key, menu in hands.window.menus.items():
        entries = [one.text(QAccessible.Text.Name) for one in children(menu) if one.role() == Role.MenuItem]
        assert len(entries) > 1, key
        assert all(entry.strip() and "&" not in entry for entry in entries)
        assert len(set(entries)) == len(entries)


def children(widget: QWidget) -> Iterator[object]:
    """The things right under a widget in the tree."""
    found = QAccessible.queryAccessibleInterface(widget)
    yield from (found.child(place) for place in range(found.childCount()))


def shows_focus(widget: QWidget) -> bool:
    """Whether a widget looks different with the focus, by more than a caret: columns of logical pixels that differ."""
    widget.clearFocus()
    without = widget.grab().toImage()
    widget.setFocus(Qt.FocusReason.TabFocusReason)
    assert QApplication.focusWidget() is widget
    focused = widget.grab().toImage()
    assert focused.size() == without.size()
    return len(changed_columns(without, focused)) / focused.devicePixelRatio() >= 8


def changed_columns(one: QImage, other: QImage) -> set[int]:
    """Columns of pixels in which two pictures of one size differ."""
    wide = one.width()
    first, second = (np.frombuffer(_pixels(image), np.uint32).reshape(-1, wide) for image in (one, other))
    return set(np.nonzero((first != second).any(axis=0))[0].tolist())


def _pixels(image: QImage) -> bytes:
    return bytes(image.convertToFormat(QImage.Format.Format_RGB32).constBits())


def unseen_focus(stops: list[QWidget]) -> list[str]:
    """Those of some widgets that look the same with the focus as without."""
    return names([widget for widget in stops if not shows_focus(widget)])


@pytest.mark.parametrize("appearance", APPEARANCES[1:])
def test_the_focus_is_seen_wherever_it_is(hands: Hands, appearance: str) -> None:
    """Every stop of Tab, and every text that a click puts the focus on, shows where the focus is."""
    hands.window.look.set_appearance(appearance)
    bring_about(hands, "events-and-others")
    hands.do("more")
    stops = [one for one in hands.window.findChildren(QWidget) if one.focusPolicy() != Qt.FocusPolicy.NoFocus]
    shown = [one for one in stops if one.isVisible() and one.isEnabled()]
    assert len(shown) > 60
    assert unseen_focus(shown) == []


@pytest.fixture
def several(open_window: Callable[..., MainWindow]) -> MainWindow:
    """A window on a trial, a harm and a welcome outcome."""
    return open_window(SEVERAL)


def test_the_window_of_the_curve(hands: Hands) -> None:
    """Drawing, sentence and table of the same numbers; every cell with the starting risk and the effect it is of."""
    bring_about(hands, "three")
    opened = open_curve(hands.window)
    hands.qtbot.waitUntil(lambda: opened.drawn and opened.copy.isEnabled())
    hands.click(opened.numbers)
    assert faults(opened) == []
    assert names(tab_order(opened)) == names(reading_order(opened))
    drawing = one_of(tree(opened), "CurveCanvas")
    assert "12%: 6.5%" in drawing.description
    rows = rows_of_table(opened, "CurveTable")
    (usual,) = (cells for cells in rows if cells[0][0].startswith("12%"))
    assert usual[1] == (usual[0][2], "Risk ratio 0.54", "6.5% (4.5 to 9.3%)")
    opened.activateWindow()
    hands.qtbot.waitUntil(opened.isActiveWindow)
    assert unseen_focus(reading_order(opened)) == []
    opened.close()


def test_the_patient_view(several: MainWindow, qtbot: QtBot) -> None:
    """The page is one object with both groups' counts; under it, what can be done in reading order."""
    opened = open_screen(several)
    assert opened is not None
    qtbot.waitUntil(opened.isActiveWindow)
    assert faults(opened) == []
    assert names(tab_order(opened)) == names(reading_order(opened))
    page = one_of(tree(opened), "Canvas")
    assert "12 in 100 (12%)" in page.description
    assert "6 in 100 (6%)" in page.description
    assert page.children == 0


def test_the_window_of_the_handout(several: MainWindow, qtbot: QtBot) -> None:
    """Each outcome is a box to tick, the page one object that says all that will be printed."""
    opened = open_handout(several)
    assert opened is not None
    qtbot.waitUntil(opened.isActiveWindow)
    assert faults(opened) == []
    ticks = [one.name for one in tree(opened) if one.role == Role.CheckBox]
    assert ticks == ["Falls", "Bleeding", "Healing"]
    page = one_of(tree(opened), "Preview")
    assert all(f"{name} in" in page.description for name in ticks)
    assert unseen_focus(reading_order(opened)) == []
    opened.close()


def test_the_windows_of_help(hands: Hands) -> None:
    """A page of help is one text with its title for a name, and a way to close it."""
    hands.do("keys")
    opened = hands.window.findChild(HelpWindow)
    assert faults(opened) == []
    assert one_of(tree(opened), "QTextEdit").name == opened.windowTitle()
    opened.close()
