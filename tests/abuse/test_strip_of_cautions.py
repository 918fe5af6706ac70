"""Dragging the window past the width at which the strip of cautions takes another form."""

from __future__ import annotations

from collections.abc import Iterator
from pathlib import Path

import pytest
from PySide6.QtWidgets import QApplication
from pytestqt.qtbot import QtBot

from fourcount.face.application import make_application, make_window
from fourcount.face.window import MainWindow
from fourcount.record.editing import count_other_outcome, with_outcome
from fourcount.wording.example import worked_example


@pytest.fixture(scope="session")
def qapp() -> QApplication:
    """The application as it is in use."""
    return make_application(["fourcount"])


@pytest.fixture
def window(qtbot: QtBot, tmp_path: Path) -> Iterator[MainWindow]:
    """A window whose text is taller beside its head than below it."""
    example = worked_example()
    window = make_window(tmp_path, with_outcome(example, 0, count_other_outcome(example.outcomes[0])))
    with qtbot.waitSignal(window.numbers_ready, timeout=20_000):
        window.show()
    yield window
    window.look.deleteLater()
    window.deleteLater()


@pytest.mark.parametrize("zoom", [0.8, 1.0, 1.75])
def test_the_strip_settles_at_every_width(window: MainWindow, qapp: QApplication, zoom: float) -> None:
    """Layout comes to rest, whether the bar that it may need changes the form of the text or not."""
    window.look.set_zoom(zoom)
    turn = window.look.px(700)
    for height in (360, 900):
        for width in range(turn - 14, turn + 16, 2):
            window.resize(max(width, 480), height)
            qapp.processEvents()
            height_once = window.cautions.height()
            qapp.processEvents()
            assert window.cautions.height() == height_once
    assert window.cautions.texts
