"""Icon arrays and bars: a plan laid down on a painter."""

from __future__ import annotations

from functools import lru_cache

from PySide6.QtCore import QLineF, QPointF, QRectF, Qt
from PySide6.QtGui import QColor, QPainter, QPen, QPixmap

from fourcount.ink.palette import Palette
from fourcount.ink.people import draw_icon, is_vector
from fourcount.ink.shapes import TALL
from fourcount.picture.bar_pair import Bar
from fourcount.picture.grid import GRIDS, Laid, lay
from fourcount.picture.options import Icons
from fourcount.picture.plan import Array, State

HATCH = 5
"""How far the slanted lines of an interval stand apart."""


def lay_array(denominator: int, width: float, most: float, icons: Icons = "person") -> Laid:
    """An array in at most ``width``, its cells at most ``most`` wide; a hundred people have cells of their shape."""
    return lay(GRIDS[denominator], width, most, TALL[icons] if denominator == 100 else 1.0)


def draw_array(
    painter: QPainter, corner: QPointF, array: Array, laid: Laid, palette: Palette, icons: Icons = "person"
) -> None:
    """Draw every icon of a group from the top left corner on.

    On a screen blocks and rows are copied from one ready-made block a state, so that ten thousand icons cost some
    hundred copies and a repaint stays within a frame. On paper every icon is drawn as lines, sharp at any size.
    """
    if is_vector(painter):
        _draw_one_by_one(painter, corner, array, laid, palette, icons)
        return
    place = painter.deviceTransform()
    scale = abs(place.m11())
    at = place.map(corner)
    origin = QPointF(round(at.x()), round(at.y())) - at  # tiles on whole pixels stay sharp
    corner = corner + QPointF(origin.x() / scale, origin.y() / scale)
    for state, start, stop in array.runs():
        tile = _tile(state, laid, scale, palette, icons)
        for piece in laid.grid.pieces(start, stop):
            left, top = _in_block(laid, piece.column, piece.row)
            right, bottom = _in_block(laid, piece.column + piece.columns - 1, piece.row + piece.rows - 1)
            box = _whole(left, top, right + laid.across, bottom + laid.down, scale)
            x, y = laid.x(piece.column) - left, laid.y(piece.row) - top
            x, y = round(x * scale) / scale, round(y * scale) / scale
            where = QPointF(corner.x() + x + box.x() / scale, corner.y() + y + box.y() / scale)
            painter.drawPixmap(QRectF(where, box.size() / scale), tile, box)


def _draw_one_by_one(
    painter: QPainter, corner: QPointF, array: Array, laid: Laid, palette: Palette, icons: Icons
) -> None:
    for state, start, stop in array.runs():
        for icon in range(start, stop):
            column, row = laid.grid.place(icon)
            cell = QRectF(corner.x() + laid.x(column), corner.y() + laid.y(row), laid.across, laid.down)
            draw_icon(painter, cell, state, palette, icons, _icon_width(laid, icons), specks=laid.grid.crowded)


def _icon_width(laid: Laid, icons: Icons) -> float:
    """How wide an icon is, whose cell may be wider."""
    return min(laid.across, laid.down / TALL[icons]) if not laid.grid.crowded else laid.across


def _in_block(laid: Laid, column: int, row: int) -> tuple[float, float]:
    """Where an icon's cell begins in its own block."""
    first_column, first_row = (n - n % laid.grid.block for n in (column, row))
    return laid.x(column) - laid.x(first_column), laid.y(row) - laid.y(first_row)


def _whole(left: float, top: float, right: float, bottom: float, scale: float) -> QRectF:
    """A box in whole pixels of the device."""
    x, y = round(left * scale), round(top * scale)
    return QRectF(x, y, round(right * scale) - x, round(bottom * scale) - y)


@lru_cache(maxsize=24)
def _tile(state: State, laid: Laid, scale: float, palette: Palette, icons: Icons) -> QPixmap:
    """One block of icons in one state, on a transparent ground, at the device's resolution."""
    last = laid.grid.block - 1
    pixmap = QPixmap(
        int((laid.x(last) + laid.across) * scale) + 2,
        int((laid.y(last) + laid.down) * scale) + 2,
    )
    pixmap.fill(Qt.GlobalColor.transparent)
    painter = QPainter(pixmap)
    painter.setRenderHint(QPainter.RenderHint.Antialiasing)
    painter.scale(scale, scale)
    for row in range(last + 1):
        for column in range(last + 1):
            cell = QRectF(laid.x(column), laid.y(row), laid.across, laid.down)
            draw_icon(painter, cell, state, palette, icons, _icon_width(laid, icons), specks=laid.grid.crowded)
    painter.end()
    return pixmap


def draw_bar(painter: QPainter, area: QRectF, bar: Bar, palette: Palette) -> None:
    """Draw a bar in ``area``, whose right edge is the end of its scale; an interval is hatched about its end."""
    accent = QColor(palette.accent)
    painter.setPen(QPen(QColor(palette.outline), 1))
    painter.setBrush(Qt.BrushStyle.NoBrush)
    painter.drawRect(area.adjusted(0.5, 0.5, -0.5, -0.5))
    solid = bar.length if bar.low is None else bar.low
    least = 1 / area.width() if bar.length else 0.0  # somebody is never drawn as nobody
    painter.fillRect(_stretch(area, 0.0, max(solid, least)), accent)
    if bar.low is None or bar.high is None:
        return
    open_part = _stretch(area, bar.low, bar.high)
    _hatch(painter, open_part, accent)
    painter.setPen(QPen(accent, 1))
    painter.drawRect(open_part.adjusted(0.5, 0.5, -0.5, -0.5))
    end = area.left() + area.width() * bar.length
    painter.fillRect(QRectF(end - 1.5, area.top() - 3, 3, area.height() + 6), accent)


def _hatch(painter: QPainter, area: QRectF, colour: QColor) -> None:
    """Slanted lines of our own: a brush's pattern has another size on every device."""
    painter.save()
    painter.setClipRect(area)
    painter.setPen(QPen(colour, 1.2))
    x = area.left()
    while x < area.right() + area.height():
        painter.drawLine(QLineF(x, area.top(), x - area.height(), area.bottom()))
        x += HATCH
    painter.restore()


def _stretch(area: QRectF, start: float, stop: float) -> QRectF:
    return QRectF(area.left() + area.width() * start, area.top(), area.width() * (stop - start), area.height())
