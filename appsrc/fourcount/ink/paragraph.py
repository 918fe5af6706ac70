"""A paragraph of text in one or more fonts, broken into lines once, and laid down alike on every device.

Lines are broken by the fonts' own unhinted widths, so that a printer, a PDF and a screen break them alike; the text
stays text wherever the device takes text.
"""

from __future__ import annotations

from collections.abc import Iterator, Sequence
from typing import NamedTuple

from PySide6.QtCore import QPointF, Qt
from PySide6.QtGui import QColor, QFont, QPainter, QTextCharFormat, QTextLayout, QTextOption

from fourcount.ink.typeset import bounded

MOST_HEIGHTS = 4_000
_heights: dict[tuple[object, ...], float] = {}
"""Heights once measured: a page is tried at many sizes, and most of its words are those of the page before."""


class Run(NamedTuple):
    """A piece of a paragraph in one font and one colour."""

    text: str
    font: QFont
    colour: str


def paragraph_height(runs: Sequence[Run], width: float) -> float:
    """Height of a paragraph that wraps at ``width``; 0 for no text."""
    key = (width, *((run.text, run.font.key()) for run in runs))
    if key not in _heights:
        layout = _laid(runs, width)
        if len(_heights) >= MOST_HEIGHTS:
            _heights.clear()
        _heights[key] = layout.boundingRect().height() if layout else 0.0
    return _heights[key]


def draw_paragraph(painter: QPainter, x: float, y: float, width: float, runs: Sequence[Run]) -> float:
    """Draw a paragraph with its top left corner at (x, y) and give the height it took."""
    layout = _laid(runs, width)
    if layout is None:
        return 0.0
    layout.draw(painter, QPointF(x, y))
    return layout.boundingRect().height()


def _laid(runs: Sequence[Run], width: float) -> QTextLayout | None:
    """The runs with a space between them, in lines; a word wider than the paragraph is broken."""
    spoken = [run for run in runs if run.text]
    if not spoken or width <= 0:
        return None
    texts = [bounded(" ".join(run.text.split())) for run in spoken]
    layout = QTextLayout(" ".join(texts), spoken[0].font)
    option = QTextOption(Qt.AlignmentFlag.AlignLeft)
    option.setWrapMode(QTextOption.WrapMode.WrapAtWordBoundaryOrAnywhere)
    layout.setTextOption(option)
    layout.setFormats(list(_formats(spoken, texts)))
    layout.beginLayout()
    y = 0.0
    while (line := layout.createLine()).isValid():
        line.setLineWidth(width)
        line.setPosition(QPointF(0, y))
        y += line.height()
    layout.endLayout()
    return layout


def _formats(runs: Sequence[Run], texts: Sequence[str]) -> Iterator[QTextLayout.FormatRange]:
    """Each run's font and colour over its own stretch of the text, counted as Qt counts, in UTF-16."""
    start = 0
    for run, text in zip(runs, texts, strict=True):
        span = QTextLayout.FormatRange()
        span.start = start
        span.length = len(text.encode("utf-16-le")) // 2
        style = QTextCharFormat()
        style.setFont(run.font)
        style.setForeground(QColor(run.colour))
        span.format = style
        yield span
        start += span.length + 1
