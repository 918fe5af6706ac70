"""The screen in memory that the other tests of a real window stand on is one where a window can be used."""

from __future__ import annotations

import pytest
from PySide6.QtWidgets import QLineEdit
from pytestqt.qtbot import QtBot

pytestmark = pytest.mark.real_window


def test_a_window_gets_the_keyboard(qtbot: QtBot) -> None:
    """A window that is shown becomes the active one, and what is typed arrives in it."""
    field = QLineEdit()
    qtbot.addWidget(field)
    field.show()
    field.activateWindow()
    qtbot.waitUntil(lambda: field.isActiveWindow() and field.hasFocus())
    qtbot.keyClicks(field, "38")
    assert field.text() == "38"


def test_a_window_fills_the_screen(qtbot: QtBot) -> None:
    """A window that is shown full screen is as large as the screen."""
    field = QLineEdit()
    qtbot.addWidget(field)
    field.showFullScreen()
    qtbot.waitUntil(lambda: field.size() == field.screen().size())
    assert field.isFullScreen()
