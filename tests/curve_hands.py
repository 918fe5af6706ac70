"""The curve's window for tests: open it, choose in it, wait for its drawing."""

from __future__ import annotations

from collections.abc import Iterator
from contextlib import contextmanager
from typing import TYPE_CHECKING

from PySide6.QtGui import QImage

from fourcount.face.curve_window import CurveWindow

if TYPE_CHECKING:
    from conftest import Hands

ODDS = "Odds ratio as a risk ratio"


def drawn(hands: Hands, shown: CurveWindow) -> QImage:
    """The drawing of the record as it stands, once it is there."""
    hands.qtbot.waitUntil(lambda: shown.drawn and not shown._pause.isActive() and shown.copy.isEnabled())
    return shown.canvas.image


def choose(hands: Hands, shown: CurveWindow, text: str) -> None:
    hands.choose(shown.view, text)
    drawn(hands, shown)


@contextmanager
def curve_shown(hands: Hands) -> Iterator[CurveWindow]:
    """The curve of the record in hand."""
    hands.do("curve")
    opened = hands.window.findChild(CurveWindow)
    assert opened is not None
    drawn(hands, opened)
    yield opened
    for left in hands.window.findChildren(CurveWindow):
        left.close()
