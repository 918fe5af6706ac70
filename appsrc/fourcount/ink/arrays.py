"""Icon arrays and bar pairs: a plan laid down on a painter."""

from __future__ import annotations

from functools import lru_cache

from PySide6.QtCore import QPointF, QRectF, Qt
from PySide6.QtGui import QColor, QPainter, QPen, QPixmap

from fourcount.ink.palette import Palette
from fourcount.ink.people import STATES, State, draw_icon
from fourcount.picture.grid import GRIDS, Grid
from fourcount.picture.plan import Array


def array_height(denominator: int, width: float) -> float:
    """Height of an array that is ``width`` wide, both in logical pixels."""
    grid = GRIDS[denominator]
    return grid.height * width / grid.width


def draw_array(painter: QPainter, area: QRectF, array: Array, denominator: int, palette: Palette) -> None:
    """Draw every icon of a group, filled from the top left; rows are laid down as ready-made strips.

    A row is one copy of a strip where all its icons share a state, so that ten thousand icons cost a hundred
    copies and a repaint stays within a frame.
    """
    grid = GRIDS[denominator]
    side = min(area.width() / grid.width, area.height() / grid.height)
    ratio = painter.device().devicePixelRatioF()
    start = 0
    for state in STATES:
        count = getattr(array, state)
        if count:
            strip = _row_strip(state, denominator, side, ratio, palette)
            _lay(painter, area.topLeft(), grid, side, ratio, strip, start, start + count)
        start += count


def _lay(
    painter: QPainter, corner: QPointF, grid: Grid, side: float, ratio: float, strip: QPixmap, start: int, stop: int
) -> None:
    """Copy the part of ``strip`` that each row needs for the icons ``start`` to ``stop`` in reading order."""
    first_row, last_row = start // grid.columns, (stop - 1) // grid.columns
    for row in range(first_row, last_row + 1):
        left = start - row * grid.columns if row == first_row else 0
        right = stop - 1 - row * grid.columns if row == last_row else grid.columns - 1
        x, end = grid.x(left) * side, (grid.x(right) + 1) * side
        target = QRectF(corner.x() + x, corner.y() + grid.y(row) * side, end - x, side)
        painter.drawPixmap(target, strip, QRectF(x * ratio, 0, (end - x) * ratio, side * ratio))


@lru_cache(maxsize=24)
def _row_strip(state: State, denominator: int, side: float, ratio: float, palette: Palette) -> QPixmap:
    """One full row of icons in one state, on a transparent ground, at the device's resolution."""
    grid = GRIDS[denominator]
    pixmap = QPixmap(int(grid.width * side * ratio) + 2, int(side * ratio) + 2)
    pixmap.fill(Qt.GlobalColor.transparent)
    painter = QPainter(pixmap)
    painter.setRenderHint(QPainter.RenderHint.Antialiasing)
    painter.scale(ratio, ratio)
    for column in range(grid.columns):
        draw_icon(painter, QRectF(grid.x(column) * side, 0, side, side), state, palette)
    painter.end()
    return pixmap


def draw_bar(painter: QPainter, area: QRectF, risk: float, top: float, palette: Palette) -> None:
    """Draw a risk as a bar along ``area``, whose right edge stands for the risk ``top``."""
    painter.setPen(QPen(QColor(palette.outline), 1))
    painter.setBrush(Qt.BrushStyle.NoBrush)
    painter.drawRect(area.adjusted(0.5, 0.5, -0.5, -0.5))
    length = area.width() * risk / top if top else 0.0
    painter.fillRect(QRectF(area.left(), area.top(), length, area.height()), QColor(palette.accent))
