"""The whole way through a real window, on a screen, with the keyboard alone."""

from __future__ import annotations

from typing import Any

import pytest
from PySide6.QtGui import QGuiApplication

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
    hands.press("End")
    assert "The odds" in hands.sentence
    hands.press("Home")
    assert hands.sentence.startswith("Of 100 people with usual care about 17")
    assert hands.texts == ("38", "374", "70", "339")
    hands.window.says.family.setFocus()
    hands.press("Down", 2)
    assert hands.window.session.record.choices.family == "exact"
    hands.do("baseline")
    hands.type("12%")
    assert hands.window.patient.picture.picture.words.without.number == "12 in 100"
    full = hands.window.session.record
    hands.press("Ctrl+Z", 11)
    assert hands.window.session.record == empty
    assert hands.texts == ("", "", "", "")
    hands.press("Ctrl+Shift+Z", 11)
    assert hands.window.session.record == full


def test_the_picture_reaches_the_clipboard(example: Any) -> None:
    """On a real screen the copied picture is an image with something in it."""
    example.do("copy-picture")
    image = QGuiApplication.clipboard().image()
    assert image.width() > 500
    assert len({image.pixel(x, image.height() // 2) for x in range(0, image.width(), 3)}) > 1
