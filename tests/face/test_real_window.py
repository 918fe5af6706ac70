"""The whole way through a real window, on a screen, with the keyboard alone."""

from __future__ import annotations

from typing import Any

import pytest
from PySide6.QtGui import QContextMenuEvent, QGuiApplication

pytestmark = pytest.mark.real_window


def test_a_table_is_answered_by_keyboard_alone(hands: Any) -> None:
    """Type a table, name the groups, go to case-control and back, change the family, set a baseline; undo and redo."""
    empty = hands.window.session.record
    hands.count("38", "374", "70", "339")
    hands.do("first-cell")
    hands.press("Shift+Tab", 2)
    hands.press("Ctrl+A")
    hands.type("Night lights")
    hands.press("Tab")
    hands.type("Usual care")
    assert "with usual care" in hands.sentence
    hands.press("Shift+Tab", 10)
    assert hands.focus is hands.window.printed.design
    hands.press("Down", 3)
    assert "The odds" in hands.sentence
    hands.press("Home")
    assert hands.sentence.startswith("Of 100 people with usual care about 17")
    assert hands.texts == ("38", "374", "70", "339")
    hands.window.says.family.setFocus()
    hands.press("Down", 2)
    assert hands.window.session.record.choices.family == "exact"
    hands.do("baseline")
    hands.type("12%")
    assert hands.window.patient.figures.drawn.words.without.number == "12 in 100"
    full = hands.window.session.record
    hands.press("Ctrl+Z", 13)
    assert hands.window.session.record == empty
    assert hands.texts == ("", "", "", "")
    hands.press("Ctrl+Shift+Z", 13)
    assert hands.window.session.record == full


def test_every_form_is_reached_by_its_key(hands: Any, qtbot: Any) -> None:
    """Function keys take the forms; a table is typed, pasted and checked without a mouse."""
    hands.do("form-percent-of-total")
    for text in ("9.2%", "412", "17.1%", "409"):
        hands.type(text)
        hands.press("Return")
    assert hands.rows["risk_ratio"].startswith("Risk ratio: 0.54")
    hands.do("paper")
    hands.type("0.49 (0.32 to 0.75)")
    qtbot.waitUntil(lambda: any("Check the name" in text for text in hands.window.printed.rare.check.sentences))
    hands.do("form-strata")
    hands.press("Ctrl+Return")
    assert hands.field == "strata.2.label_text"
    QGuiApplication.clipboard().setText("38\t412\n70\t409")
    hands.press("Ctrl+V")
    assert hands.window.printed.rare.panel.isVisible()
    hands.press("Escape")
    assert hands.field == "strata.2.label_text"


def test_the_menu_of_a_tab_is_about_that_tab(example: Any, qtbot: Any) -> None:
    """Pressed with the right button a tab comes into view, and its menu opens with what can be done to it."""
    example.do("outcome-copy")
    tabs = example.window.header.bar.tabs
    place = tabs.tabRect(0).center()
    event = QContextMenuEvent(QContextMenuEvent.Reason.Mouse, place, tabs.mapToGlobal(place))
    QGuiApplication.sendEvent(tabs, event)
    menu = example.window.menus["outcomes"]
    qtbot.waitUntil(menu.isVisible)
    assert example.window.session.view == 0
    menu.close()


def test_the_picture_reaches_the_clipboard(example: Any) -> None:
    """On a real screen the copied picture is an image with something in it."""
    example.do("copy-picture")
    image = QGuiApplication.clipboard().image()
    assert image.width() > 500
    assert len({image.pixel(x, image.height() // 2) for x in range(0, image.width(), 3)}) > 1
