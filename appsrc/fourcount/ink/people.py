"""The icon of one person, in its four states, and rows of them ready to be laid down."""

from __future__ import annotations

from functools import cache
from typing import Literal

from PySide6.QtCore import QPointF, QRectF, Qt
from PySide6.QtGui import QColor, QPainter, QPainterPath, QPen

from fourcount.ink.palette import Palette

State = Literal["affected", "uncertain", "avoided", "added", "others"]
STATES: tuple[State, ...] = ("affected", "avoided", "added", "others")

PERSON_FROM = 12.0
"""Below this width in device pixels an outline runs together and reads as filled: squares and dots are drawn then."""


@cache
def person() -> QPainterPath:
    """A standing figure without features in a cell of 1 by 1: a round head over a body that narrows to the feet."""
    path = QPainterPath()
    path.addEllipse(QPointF(0.5, 0.2), 0.125, 0.125)
    body = QPainterPath(QPointF(0.38, 0.36))
    body.lineTo(0.62, 0.36)
    body.quadTo(0.71, 0.36, 0.73, 0.46)
    body.lineTo(0.77, 0.66)
    body.lineTo(0.65, 0.69)
    body.lineTo(0.65, 0.93)
    body.lineTo(0.35, 0.93)
    body.lineTo(0.35, 0.69)
    body.lineTo(0.23, 0.66)
    body.lineTo(0.27, 0.46)
    body.quadTo(0.29, 0.36, 0.38, 0.36)
    path.addPath(body)
    return path


def draw_icon(painter: QPainter, cell: QRectF, state: State, palette: Palette, stands_for: float | None = None) -> None:
    """Draw one person in ``cell``: filled when affected, hollow when not, with a mark of its own in between.

    In a key, ``stands_for`` is the width of the icons it explains, so that it shows the very shapes that they have.
    """
    if (stands_for or cell.width()) * painter.deviceTransform().m11() < PERSON_FROM:
        _draw_speck(painter, cell, state, palette)
        return
    painter.save()
    painter.translate(cell.topLeft())
    side = min(cell.width(), cell.height())
    painter.translate((cell.width() - side) / 2, (cell.height() - side) / 2)
    painter.scale(side, side)
    line = max(1.0, side * 0.05) / side
    if state == "affected":
        painter.fillPath(person(), QColor(palette.accent))
    elif state == "others":
        painter.strokePath(person(), QPen(QColor(palette.outline), line))
    elif state == "avoided":
        painter.strokePath(person(), _dashed(palette.outline, line))
        painter.strokePath(_stroke_through(), _round(palette.accent, line * 1.7))
    else:
        painter.strokePath(person(), QPen(QColor(palette.accent), line))
        painter.fillPath(_dot(), QColor(palette.accent))
    painter.restore()


def _draw_speck(painter: QPainter, cell: QRectF, state: State, palette: Palette) -> None:
    """The same four states where a person would be too small: block, ring of a block, cross, dot."""
    side = min(cell.width(), cell.height())
    centre = cell.center()
    sizes = {"affected": 0.86, "avoided": 0.7, "added": 0.86, "others": 0.36}
    half = side * sizes[state] / 2
    box = QRectF(centre.x() - half, centre.y() - half, 2 * half, 2 * half)
    if state == "affected":
        painter.fillRect(box, QColor(palette.accent))
    elif state == "others":
        painter.fillRect(box, QColor(palette.outline))
    elif state == "avoided":
        width = max(0.7, side * 0.16)
        painter.setPen(QPen(QColor(palette.accent), width, Qt.PenStyle.SolidLine, Qt.PenCapStyle.FlatCap))
        painter.drawLine(box.bottomLeft(), box.topRight())
    else:
        width = max(0.7, side * 0.2)
        painter.setPen(QPen(QColor(palette.accent), width))
        painter.setBrush(Qt.BrushStyle.NoBrush)
        painter.drawRect(box.adjusted(width / 2, width / 2, -width / 2, -width / 2))


def _round(colour: str, width: float) -> QPen:
    return QPen(QColor(colour), width, Qt.PenStyle.SolidLine, Qt.PenCapStyle.RoundCap, Qt.PenJoinStyle.RoundJoin)


def _dashed(colour: str, width: float) -> QPen:
    pen = QPen(QColor(colour), width)
    pen.setDashPattern([2.0, 1.6])
    return pen


@cache
def _stroke_through() -> QPainterPath:
    path = QPainterPath(QPointF(0.16, 0.9))
    path.lineTo(0.84, 0.16)
    return path


@cache
def _dot() -> QPainterPath:
    path = QPainterPath()
    path.addEllipse(QPointF(0.5, 0.57), 0.115, 0.115)
    return path
