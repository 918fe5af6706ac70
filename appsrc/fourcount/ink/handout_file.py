"""A page as the bytes of a file: PDF and SVG with real text, and PNG; no author and no machine in any of them."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import PurePath

from PySide6.QtCore import QBuffer, QIODevice, QMarginsF, QRectF, QSize, QSizeF, Qt
from PySide6.QtGui import QImage, QPageLayout, QPageSize, QPainter, QPdfWriter

from fourcount.ink.handout import Handout, Paper

DOTS = 300
"""Dots per inch of a PNG."""

VECTOR_DOTS = 1200
"""Steps per inch in which a PDF places things."""

PAGE_SIZES = {"a4": QPageSize.PageSizeId.A4, "letter": QPageSize.PageSizeId.Letter}


def page_layout(paper: Paper) -> QPageLayout:
    """The sheet without margins of Qt's own: the page keeps its own ones."""
    size = QPageSize(PAGE_SIZES[paper.key])
    return QPageLayout(size, QPageLayout.Orientation.Portrait, QMarginsF(0, 0, 0, 0))


def as_pdf(page: Handout) -> bytes:
    """A PDF of one sheet; its title is the paper's."""
    buffer = _buffer()
    writer = QPdfWriter(buffer)
    writer.setPageLayout(page_layout(page.paper))
    writer.setResolution(VECTOR_DOTS)
    writer.setTitle(page.words.title)
    writer.setCreator("Fourcount")
    draw_scaled(page, QPainter(writer), VECTOR_DOTS)
    del writer  # it writes to the buffer as long as it is there
    return _taken(buffer)


def as_svg(page: Handout) -> bytes:
    """An SVG with text as text, a title, and all that the page says as its description."""
    from PySide6.QtSvg import QSvgGenerator

    width, height = page.size
    buffer = _buffer()
    generator = QSvgGenerator()
    generator.setOutputDevice(buffer)
    generator.setResolution(96)
    generator.setSize(QSize(round(width), round(height)))
    generator.setViewBox(QRectF(0, 0, width, height))
    generator.setTitle(page.words.title)
    generator.setDescription(page.words.description)
    painter = QPainter(generator)
    page.draw(painter)
    painter.end()
    del generator
    return _taken(buffer)


def as_png(page: Handout) -> bytes:
    """A picture of the sheet at 300 dots per inch."""
    buffer = _buffer()
    page_image(page, DOTS).save(buffer, "PNG")  # type: ignore[call-overload]
    return _taken(buffer)


def page_image(page: Handout, dots: float) -> QImage:
    """The sheet at so many dots per inch, as screens and pictures show it."""
    width, height = page.size
    scale = dots / 96
    image = QImage(QSizeF(width * scale, height * scale).toSize(), QImage.Format.Format_RGB32)
    image.fill(Qt.GlobalColor.white)  # the last row and column are not whole units
    image.setDevicePixelRatio(scale)
    per_metre = round(dots / 0.0254)
    image.setDotsPerMeterX(per_metre)
    image.setDotsPerMeterY(per_metre)
    painter = QPainter(image)
    page.draw(painter)
    painter.end()
    return image


def draw_scaled(page: Handout, painter: QPainter, dots: float) -> None:
    """Draw the sheet on a device of so many dots per inch, and be done with it."""
    painter.scale(dots / 96, dots / 96)
    page.draw(painter)
    painter.end()


WRITERS: dict[str, Callable[[Handout], bytes]] = {".pdf": as_pdf, ".png": as_png, ".svg": as_svg}
"""The kinds of file by their suffix."""


def writer_for(name: str) -> Callable[[Handout], bytes] | None:
    """What makes the kind of file that a name asks for; None for another kind."""
    return WRITERS.get(PurePath(name).suffix.lower())


def _buffer() -> QBuffer:
    buffer = QBuffer()
    buffer.open(QIODevice.OpenModeFlag.WriteOnly)
    return buffer


def _taken(buffer: QBuffer) -> bytes:
    buffer.close()
    return bytes(buffer.data().data())
