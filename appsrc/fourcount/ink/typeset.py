"""Lines of text that wrap, measured and drawn alike."""

from __future__ import annotations

from PySide6.QtCore import QRectF, Qt
from PySide6.QtGui import QColor, QFont, QFontMetricsF, QPainter

WRAP = int(Qt.TextFlag.TextWordWrap)
LEFT = int(Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag.AlignTop)
RIGHT = int(Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignTop)
CENTRE = int(Qt.AlignmentFlag.AlignHCenter | Qt.AlignmentFlag.AlignTop)


LONGEST = 2_000
"""Characters of one text that are laid out: what is typed can be of any length, and a screen holds no more."""


def bounded(text: str) -> str:
    """The text as far as it is laid out."""
    return text if len(text) <= LONGEST else f"{text[:LONGEST]}…"


def text_height(text: str, font: QFont, width: float) -> float:
    """Height of a text that wraps at ``width``, 0 for no text."""
    if not text:
        return 0.0
    return QFontMetricsF(font).boundingRect(QRectF(0, 0, width, 10_000), LEFT | WRAP, bounded(text)).height()


def text_width(text: str, font: QFont) -> float:
    """Width of a text on one line."""
    return QFontMetricsF(font).horizontalAdvance(bounded(text))


def draw_text(
    painter: QPainter, x: float, y: float, width: float, text: str, font: QFont, colour: str, flags: int = LEFT
) -> float:
    """Draw a text that wraps at ``width`` and give the height it took."""
    height = text_height(text, font, width)
    painter.setFont(font)
    painter.setPen(QColor(colour))
    painter.drawText(QRectF(x, y, width, height + 1), flags | WRAP, bounded(text))
    return height
