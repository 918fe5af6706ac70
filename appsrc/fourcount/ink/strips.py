"""The drawn strip of a measure: its interval as a bar, its estimate as a dot, no effect as a dotted line.

A line of the reader's own is solid, in the colour of text, with a flag at its top: it cannot be taken for no effect, in
grey as little as in colour.
"""

from __future__ import annotations

from PySide6.QtCore import QLineF, QPointF, QRectF, Qt
from PySide6.QtGui import QColor, QPainter, QPen, QPolygonF

from fourcount.ink.palette import Palette
from fourcount.picture.scales import Scale

HEIGHT = 20.0
"""The height of a strip at 100% text, in logical pixels."""


def draw_strip(
    painter: QPainter,
    area: QRectF,
    scale: Scale,
    palette: Palette,
    estimate: float | None,
    low: float | None,
    high: float | None,
    mark: float | None = None,
) -> None:
    """Draw one strip along the middle of ``area``; a limit beyond the scale's end is drawn as an arrow.

    Bar and dot grow with the height of ``area``, and so with the text. ``mark`` is the reader's own line, drawn under
    the dot and over the bar; beyond the scale's end it has no place.
    """
    unit = max(area.height() / HEIGHT, 1.0)
    middle = round(area.center().y()) + 0.5
    painter.setRenderHint(QPainter.RenderHint.Antialiasing)
    painter.setPen(QPen(QColor(palette.hairline), 1.5 * unit))
    painter.drawLine(QLineF(area.left(), middle, area.right(), middle))
    if scale.no_effect is not None:
        x = _x(area, scale.place(scale.no_effect))
        painter.setPen(QPen(QColor(palette.outline), 1.5 * unit, Qt.PenStyle.DotLine))
        painter.drawLine(QLineF(x, area.top(), x, area.bottom()))
    if low is not None and high is not None:
        _draw_interval(painter, area, middle, scale.place(low), scale.place(high), palette.accent, unit)
    if mark is not None and 0 <= scale.place(mark) <= 1:
        _draw_mark(painter, scale, mark, area, palette, unit)
    if estimate is not None and 0 <= scale.place(estimate) <= 1:
        painter.setPen(Qt.PenStyle.NoPen)
        painter.setBrush(QColor(palette.page))
        centre = QPointF(_x(area, scale.place(estimate)), middle)
        painter.drawEllipse(centre, 6 * unit, 6 * unit)
        painter.setBrush(QColor(palette.accent))
        painter.drawEllipse(centre, 4 * unit, 4 * unit)


def _x(area: QRectF, place: float) -> float:
    return area.left() + area.width() * place


def _draw_mark(painter: QPainter, scale: Scale, mark: float, area: QRectF, palette: Palette, unit: float) -> None:
    """A line over the strip's whole height; its flag points away from no effect, unless it would leave the strip."""
    x = _x(area, scale.place(mark))
    painter.setPen(QPen(QColor(palette.page), 4 * unit, Qt.PenStyle.SolidLine, Qt.PenCapStyle.FlatCap))
    painter.drawLine(QLineF(x, area.top(), x, area.bottom()))
    painter.setPen(QPen(QColor(palette.ink), 1.5 * unit, Qt.PenStyle.SolidLine, Qt.PenCapStyle.FlatCap))
    painter.drawLine(QLineF(x, area.top(), x, area.bottom()))
    size = 6 * unit
    leftwards = scale.no_effect is not None and mark < scale.no_effect
    if x - size >= area.left() if leftwards else x + size > area.right():
        size = -size
    painter.setPen(Qt.PenStyle.NoPen)
    painter.setBrush(QColor(palette.ink))
    top = area.top()
    painter.drawPolygon(
        QPolygonF([QPointF(x, top), QPointF(x + size, top + abs(size) / 2), QPointF(x, top + abs(size))])
    )


def _draw_interval(
    painter: QPainter, area: QRectF, middle: float, low: float, high: float, accent: str, unit: float
) -> None:
    left, right = _x(area, min(max(low, 0.0), 1.0)), _x(area, min(max(high, 0.0), 1.0))
    colour = QColor(accent)
    painter.setPen(QPen(colour, 3 * unit, Qt.PenStyle.SolidLine, Qt.PenCapStyle.FlatCap))
    painter.drawLine(QLineF(left, middle, right, middle))
    painter.setPen(Qt.PenStyle.NoPen)
    painter.setBrush(colour)
    if low < 0:
        _arrow(painter, left, middle, -unit)
    if high > 1:
        _arrow(painter, right, middle, unit)


def _arrow(painter: QPainter, x: float, y: float, size: float) -> None:
    """An arrow head at x; it points to the left where ``size`` is negative."""
    tip, back, half = x + 3 * size, x - 5 * size, 4.5 * abs(size)
    painter.drawPolygon(QPolygonF([QPointF(tip, y), QPointF(back, y - half), QPointF(back, y + half)]))
