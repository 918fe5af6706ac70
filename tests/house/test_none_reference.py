"""PySide6 6.12.0 on Python 3.11 loses a reference to None in most calls of QPainter, until the interpreter aborts."""

from __future__ import annotations

import gc
import sys
from collections.abc import Callable

import pytest
from PySide6.QtCore import QRect
from PySide6.QtGui import QBrush, QColor, QImage, QPainter, QPen, QPixmap

CALLS = 500
# Other references to None come and go meanwhile; a call that loses one shows up as all 500.
MOST = 50

PAINT: dict[str, Callable[[QPainter], object]] = {
    "drawRect": lambda painter: painter.drawRect(QRect(1, 1, 8, 8)),
    "setPen": lambda painter: painter.setPen(QPen(QColor("black"))),
    "setBrush": lambda painter: painter.setBrush(QBrush(QColor("black"))),
    "fillRect": lambda painter: painter.fillRect(QRect(1, 1, 8, 8), QColor("black")),
    "translate": lambda painter: painter.translate(0.0, 0.0),
    "drawPixmap": lambda painter: painter.drawPixmap(0, 0, QPixmap(4, 4)),
    "drawText": lambda painter: painter.drawText(1, 9, "4"),
    "save and restore": lambda painter: (painter.save(), painter.restore()),
}


@pytest.mark.parametrize("call", PAINT.values(), ids=PAINT.keys())
@pytest.mark.usefixtures("qapp")
def test_painting_keeps_the_references_to_none(call: Callable[[QPainter], object]) -> None:
    """Five hundred calls leave the number of references to None about where it was."""
    image = QImage(16, 16, QImage.Format.Format_ARGB32)
    painter = QPainter(image)
    call(painter)  # what is made only once is made here
    gc.collect()
    before = sys.getrefcount(None)
    for _ in range(CALLS):
        call(painter)
    after = sys.getrefcount(None)
    painter.end()
    assert abs(after - before) < MOST
