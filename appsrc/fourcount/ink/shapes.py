"""The outlines of our own icons in a cell one unit wide: a standing person, a block and a dot."""

from __future__ import annotations

from functools import cache

from PySide6.QtCore import QPointF, QRectF
from PySide6.QtGui import QPainterPath, QTransform

from fourcount.picture.options import Icons

TALL: dict[Icons, float] = {"person": 1.38, "block": 1.0, "dot": 1.0}
"""How many times as high as wide an icon's cell is."""


@cache
def shape(icons: Icons, fine: bool = False) -> QPainterPath:
    """The outline of one icon; a ``fine`` person has legs, which a small one would only blur."""
    if icons == "person":
        return _person(fine)
    path = QPainterPath()
    if icons == "block":
        path.addRoundedRect(QRectF(0.12, 0.12, 0.76, 0.76), 0.1, 0.1)
    else:
        path.addEllipse(QPointF(0.5, 0.5), 0.38, 0.38)
    return path


def _person(fine: bool) -> QPainterPath:
    """A standing figure without features: a round head, rounded shoulders, arms at its sides.

    The left half is drawn by hand from the neck to between the feet; the right half is its mirror image.
    """
    path = QPainterPath()
    path.addEllipse(QPointF(0.5, 0.22), 0.155, 0.155)
    left = QPainterPath(QPointF(0.5, 0.42))
    left.lineTo(0.4, 0.42)
    left.cubicTo(0.285, 0.42, 0.235, 0.48, 0.225, 0.57)
    left.lineTo(0.19, 0.8)
    left.cubicTo(0.182, 0.865, 0.275, 0.885, 0.29, 0.825)
    left.lineTo(0.33, 0.835)
    left.lineTo(0.345, 1.22)
    left.quadTo(0.347, 1.25, 0.375, 1.25)
    if fine:
        left.lineTo(0.445, 1.25)
        left.quadTo(0.472, 1.25, 0.474, 1.22)
        left.lineTo(0.488, 0.91)
        left.quadTo(0.49, 0.885, 0.5, 0.885)
    else:
        left.lineTo(0.5, 1.25)
    right = QTransform(-1, 0, 0, 1, 1, 0).map(left).toReversed()
    left.connectPath(right)
    left.closeSubpath()
    path.addPath(left)
    return path.translated(0, 0.03)
