"""A screen reader's walk through the windows beside the main one: curve, patient view, handout and help."""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING

import pytest
from pytestqt.qtbot import QtBot

from fourcount.face.curve_window import open_curve
from fourcount.face.handout_window import open_handout
from fourcount.face.help_window import HelpWindow
from fourcount.face.patient_screen import open_screen
from fourcount.face.window import MainWindow
from fourcount.record.paper import Record
from patient_outcomes import AT_TWELVE, HARM, WELCOME
from screen_reader import Role, faults, names, one_of, reading_order, rows_of_table, tab_order, tree
from seen_focus import unseen_focus

if TYPE_CHECKING:
    from conftest import Hands

SEVERAL = Record(title_text="Night lights", outcomes=(AT_TWELVE, HARM, WELCOME))


@pytest.fixture
def several(open_window: Callable[..., MainWindow]) -> MainWindow:
    """A window on a trial, a harm and a welcome outcome."""
    return open_window(SEVERAL)


def test_the_window_of_the_curve(hands: Hands) -> None:
    """Drawing, sentence and table of the same numbers; every cell with the starting risk and the effect it is of."""
    hands.do("example")
    hands.write(hands.window.patient.baseline, "12%")
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
    """Each outcome is a box to tick and the range the last one, the page one object that says all that is printed."""
    opened = open_handout(several)
    assert opened is not None
    qtbot.waitUntil(opened.isActiveWindow)
    assert faults(opened) == []
    ticks = [one.name for one in tree(opened) if one.role == Role.CheckBox]
    assert ticks == ["Falls", "Bleeding", "Healing", "Show the range"]
    page = one_of(tree(opened), "Preview")
    assert all(f"{name} in" in page.description for name in ticks[:3])
    assert unseen_focus(reading_order(opened)) == []
    opened.close()


def test_the_windows_of_help(hands: Hands) -> None:
    """A page of help is one text with its title for a name, and a way to close it."""
    hands.do("keys")
    opened = hands.window.findChild(HelpWindow)
    assert faults(opened) == []
    assert one_of(tree(opened), "QTextEdit").name == opened.windowTitle()
    opened.close()
