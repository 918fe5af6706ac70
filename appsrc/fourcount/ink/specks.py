"""The states of an icon where any drawing would be too small: block, ring, half a block, stroke and speck.

A dot's are round; a small person is a block.
"""

from __future__ import annotations

from PySide6.QtCore import QPointF, QRectF, Qt
from PySide6.QtGui import QColor, QPainter, QPen, QPolygonF

from fourcount.ink.palette import Palette
from fourcount.picture.options import Icons
from fourcount.picture.plan import State

SIZES: dict[State, float] = {"affected": 0.86, "added": 0.86, "uncertain": 0.86, "avoided": 0.7, "others": 0.36}
"""How much of the cell each takes."""


def draw_speck(painter: QPainter, cell: QRectF, state: State, palette: Palette, icons: Icons) -> None:
    """Draw one speck in the middle of ``cell``."""
    side = min(cell.width(), cell.height())
    half = side * SIZES[state] / 2
    centre = cell.center()
    box = QRectF(centre.x() - half, centre.y() - half, 2 * half, 2 * half)
    accent = QColor(palette.accent)
    painter.setPen(Qt.PenStyle.NoPen)
    painter.setBrush(QColor(palette.outline) if state == "others" else accent)
    if state in ("affected", "others"):
        _draw_whole(painter, box, icons)
    elif state == "uncertain":
        _draw_half(painter, box, icons)
    elif state == "avoided":
        painter.setPen(QPen(accent, max(0.7, side * 0.16), Qt.PenStyle.SolidLine, Qt.PenCapStyle.FlatCap))
        painter.drawLine(box.bottomLeft(), box.topRight())
    else:
        width = max(0.7, side * 0.2)
        inset = QPointF(width / 2, width / 2)
        painter.setPen(QPen(accent, width))
        painter.setBrush(Qt.BrushStyle.NoBrush)
        _draw_whole(painter, QRectF(box.topLeft() + inset, box.bottomRight() - inset), icons)


def _draw_whole(painter: QPainter, box: QRectF, icons: Icons) -> None:
    if icons == "dot":
        painter.drawEllipse(box)
    else:
        painter.drawRect(box)


def _draw_half(painter: QPainter, box: QRectF, icons: Icons) -> None:
    """The lower left half."""
    if icons == "dot":
        painter.drawChord(box, 135 * 16, 180 * 16)
    else:
        painter.drawPolygon(QPolygonF([box.topLeft(), box.bottomRight(), box.bottomLeft()]))
