"""The icon of one person in each of its states: told apart by shape and fill, not by colour."""

from __future__ import annotations

from PySide6.QtCore import QPointF, QRectF, Qt
from PySide6.QtGui import QColor, QPaintEngine, QPainter, QPainterPath, QPen

from fourcount.ink.palette import Palette
from fourcount.ink.shapes import TALL, shape
from fourcount.ink.specks import draw_speck
from fourcount.picture.options import Icons
from fourcount.picture.plan import STATES, State

__all__ = ["FINE_FROM", "SHAPES_FROM", "STATES", "State", "draw_icon", "pixels_across"]

SHAPES_FROM = 11.5
"""Below this width in device pixels an outline runs together and reads as filled: specks are drawn then."""

FINE_FROM = 26.0
"""From this width in device pixels on a person has legs."""

LINE = 1.15
"""The thinnest line that still has its colour."""

FILLED_EDGE = 0.6
"""A filled icon's edge, as a part of the line: with it, it is nearly as large as a hollow one."""

PAPER_SCALE = 1.6
"""Paper and drawings of lines are taken to be sharper than a screen of the usual pixels; people are 2 mm at least."""

ON_SCREEN = (QPaintEngine.Type.Raster, QPaintEngine.Type.OpenGL2)


def is_vector(painter: QPainter) -> bool:
    """Whether the device keeps lines as lines: PDF, SVG and most printers."""
    return painter.paintEngine().type() not in ON_SCREEN


def pixels_across(painter: QPainter, width: float) -> float:
    """How many pixels of the device a length takes."""
    return width * (PAPER_SCALE if is_vector(painter) else abs(painter.deviceTransform().m11()))


def draw_icon(
    painter: QPainter,
    cell: QRectF,
    state: State,
    palette: Palette,
    icons: Icons = "person",
    stands_for: float | None = None,
    *,
    specks: bool = False,
) -> None:
    """Draw one icon in ``cell``: filled when affected, hollow when not, with a mark of its own in between.

    In a key, ``stands_for`` is the width of the icons it explains, so that it shows the very shapes that they have.
    ``specks`` are for crowds, in which figures would run into chains, however sharp the screen is.
    """
    tall = TALL[icons]
    side = min(cell.width(), cell.height() / tall)
    across = pixels_across(painter, side)
    shown = pixels_across(painter, cell.width()) if stands_for is None else pixels_across(painter, stands_for)
    if specks or shown < SHAPES_FROM:
        draw_speck(painter, cell, state, palette, icons)
        return
    painter.save()
    painter.translate(cell.center() - QPointF(side / 2, side * tall / 2))
    painter.scale(side, side)
    _draw_state(painter, state, palette, icons, max(LINE, side * 0.058) / side, fine=across >= FINE_FROM)
    painter.restore()


def _draw_state(painter: QPainter, state: State, palette: Palette, icons: Icons, line: float, *, fine: bool) -> None:
    outline = shape(icons, fine)
    accent, plain = QColor(palette.accent), QColor(palette.outline)
    if state == "affected":
        painter.fillPath(outline, accent)
        painter.strokePath(outline, QPen(accent, line * FILLED_EDGE))
    elif state == "others":
        painter.strokePath(outline, QPen(plain, line))
    elif state == "avoided":
        painter.strokePath(shape(icons), QPen(plain, line))
        painter.strokePath(_slash(icons), QPen(QColor(palette.page), line * 4.2))
        painter.strokePath(_slash(icons), _round(accent, line * 1.7))
    elif state == "added":
        painter.strokePath(outline, QPen(accent, line))
        painter.fillPath(_core(icons), accent)
    else:
        painter.fillPath(outline.intersected(_lower_half(icons)), accent)
        painter.strokePath(outline, QPen(accent, line))


def _round(colour: QColor, width: float) -> QPen:
    return QPen(colour, width, Qt.PenStyle.SolidLine, Qt.PenCapStyle.RoundCap, Qt.PenJoinStyle.RoundJoin)


def _slash(icons: Icons) -> QPainterPath:
    """A stroke through, from the lower left to the upper right, over the edge of the shape."""
    tall = TALL[icons]
    beside, above = (0.17, 0.26) if icons == "person" else (0.08, 0.08)
    path = QPainterPath(QPointF(beside, tall - above))
    path.lineTo(1 - beside, above)
    return path


def _core(icons: Icons) -> QPainterPath:
    """A spot in the middle of the shape; a cross would make a nurse of a person."""
    middle, across = (0.67, 0.12) if icons == "person" else (0.5, 0.16)
    path = QPainterPath()
    if icons == "block":
        path.addRect(QRectF(0.5 - across, 0.5 - across, 2 * across, 2 * across))
    else:
        path.addEllipse(QPointF(0.5, middle), across, across)
    return path


def _lower_half(icons: Icons) -> QPainterPath:
    path = QPainterPath()
    top = 0.78 if icons == "person" else 0.5
    path.addRect(QRectF(0, top, 1, TALL[icons] - top))
    return path
