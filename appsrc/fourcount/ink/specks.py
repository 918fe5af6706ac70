"""The states of an icon where any drawing would be too small: block, ring, half a block, stroke and speck."""

from __future__ import annotations

from PySide6.QtCore import QPointF, QRectF, Qt
from PySide6.QtGui import QColor, QPainter, QPen, QPolygonF

from fourcount.ink.palette import Palette
from fourcount.picture.plan import State

SIZES: dict[State, float] = {"affected": 0.86, "added": 0.86, "uncertain": 0.86, "avoided": 0.7, "others": 0.36}
"""How much of the cell each takes."""


def draw_speck(painter: QPainter, cell: QRectF, state: State, palette: Palette) -> None:
    """Draw one speck in the middle of ``cell``."""
    side = min(cell.width(), cell.height())
    half = side * SIZES[state] / 2
    centre = cell.center()
    box = QRectF(centre.x() - half, centre.y() - half, 2 * half, 2 * half)
    accent = QColor(palette.accent)
    if state == "affected":
        painter.fillRect(box, accent)
    elif state == "others":
        painter.fillRect(box, QColor(palette.outline))
    elif state == "uncertain":
        painter.setPen(Qt.PenStyle.NoPen)
        painter.setBrush(accent)
        painter.drawPolygon(QPolygonF([box.topLeft(), box.bottomRight(), box.bottomLeft()]))
    elif state == "avoided":
        painter.setPen(QPen(accent, max(0.7, side * 0.16), Qt.PenStyle.SolidLine, Qt.PenCapStyle.FlatCap))
        painter.drawLine(box.bottomLeft(), box.topRight())
    else:
        width = max(0.7, side * 0.2)
        inset = QPointF(width / 2, width / 2)
        painter.setPen(QPen(accent, width))
        painter.setBrush(Qt.BrushStyle.NoBrush)
        painter.drawRect(QRectF(box.topLeft() + inset, box.bottomRight() - inset))
