"""A picture by itself on white paper, with all that has to travel with it."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QSize, Qt
from PySide6.QtGui import QImage, QPainter

from fourcount.ink.sheet import Sheet
from fourcount.ink.style import OnPaper, Role, Style

if TYPE_CHECKING:
    from fourcount.ink.picture import Picture
    from fourcount.ink.relative_picture import RelativePicture

MARGIN = 28
WIDTH = 520
"""In pixels at 100% text."""


def as_image(
    picture: Picture,
    style: Style,
    heading: str,
    cautions: str,
    width: int = WIDTH,
    scale: int = 2,
    relative: RelativePicture | None = None,
) -> QImage:
    """The picture on white: its heading above it, the sentences and cautions that belong to it below.

    The picture of the relative figure, where it is asked for, follows the absolute one.
    """
    paper = OnPaper(style)
    height = round(_set(Sheet(None, paper), picture, heading, cautions, paper.px(width), relative))
    image = QImage(QSize(paper.px(width), height) * scale, QImage.Format.Format_RGB32)
    image.setDevicePixelRatio(scale)
    image.fill(Qt.GlobalColor.white)
    painter = QPainter(image)
    _set(Sheet(painter, paper), picture, heading, cautions, paper.px(width), relative)
    painter.end()
    return image


def _set(
    sheet: Sheet, picture: Picture, heading: str, cautions: str, width: float, relative: RelativePicture | None
) -> float:
    """Set the whole page and give its height; without a painter only measure."""
    paper = sheet.style
    margin, gap = paper.px(MARGIN), paper.px(8)
    wide = width - 2 * margin
    y = float(margin)
    y += sheet.text(margin, y, wide, heading, "strong") + gap
    for drawing in (picture, relative):
        if drawing is not None:
            if sheet.painter:
                drawing.draw(sheet.painter, paper, margin, y, wide)
            y += drawing.height(paper, wide) + 2 * gap
    below: list[tuple[str, Role, str]] = [(line, "body", "ink") for line in picture.words.lines]
    for text, role, part in (*below, (cautions, "small", "muted")):
        y += sheet.text(margin, y, wide, text, role, part) + gap
    return y - gap + margin
