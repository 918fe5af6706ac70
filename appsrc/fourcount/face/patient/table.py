"""The picture's numbers as a small table: a row for each starting risk, without and with, difference, number needed."""

from __future__ import annotations

from collections.abc import Sequence
from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import QSize
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QSizePolicy, QWidget

from fourcount.face.look import Look
from fourcount.ink.typeset import draw_text, text_height, text_width
from fourcount.wording.patient_labels import TABLE_HEADS, TABLE_NAME

if TYPE_CHECKING:
    from fourcount.wording.patient_table import Row

GAP = 10
PAD = 5
"""Pixels at 100% text between two columns, and above and under a row."""


class Line(NamedTuple):
    """A laid line: its top and bottom, and left edge, width and text of each cell."""

    top: float
    bottom: float
    cells: list[tuple[float, float, str]]


class PatientTable(QWidget):
    """Painted as one object under hairlines; its description reads it out row by row."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._rows: tuple[Row, ...] = ()
        self._corner = ""
        self._laid: dict[int, list[Line]] = {}
        policy = QSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Minimum)
        policy.setHeightForWidth(True)
        self.setSizePolicy(policy)
        self.setAccessibleName(TABLE_NAME)
        self.hide()
        look.changed.connect(self._on_look_changed)

    def show_rows(self, rows: Sequence[Row], corner: str, sentence: str) -> None:
        """Show these rows, or nothing; ``corner`` says of how many people. Equal ones change nothing."""
        if sentence != self.accessibleDescription():
            self.setAccessibleDescription(sentence)
        if (tuple(rows), corner) == (self._rows, self._corner):
            return
        self._rows, self._corner = tuple(rows), corner
        self._laid.clear()
        self.setVisible(bool(self._rows))
        self.updateGeometry()
        self.update()

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        if not self._rows:
            return 0
        if width not in self._laid:  # a layout asks many times
            self._laid[width] = self._lay(width)
        return round(self._laid[width][-1].bottom + self._look.px(PAD))

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(280), self.heightForWidth(max(self.width(), self._look.px(200))))

    def minimumSizeHint(self) -> QSize:
        return QSize(0, self.heightForWidth(self.width()))

    def paintEvent(self, event: QPaintEvent) -> None:
        look, pad = self._look, self._look.px(PAD)
        painter = QPainter(self)
        named = len(self._rows) > 1
        for place, line in enumerate(self._lay(self.width())):
            for x, wide, text in line.cells:
                name = named and x == 0
                colour = look.palette.ink if place and not name else look.palette.muted
                draw_text(painter, x, line.top, wide, text, look.font("small"), colour)
            if place:
                painter.fillRect(0, round(line.top) - pad, self.width(), 1, look.colour("hairline"))
        painter.end()

    def _lay(self, width: int) -> list[Line]:
        """The heads and the rows with their cells at a width."""
        look, lines, y = self._look, [], 0.0
        edges = self._edges(width) if self._rows else []
        for texts in self._texts:
            laid = [(x, wide, text) for (x, wide), text in zip(edges, texts, strict=True) if text]
            if len(laid) > 1 and not texts[-1]:  # a reason instead of figures
                x, _, reason = laid.pop()
                laid.append((x, width - x, reason))
            height = max(text_height(text, look.font("small"), wide) for _, wide, text in laid)
            lines.append(Line(y, y + height, laid))
            y += height + 2 * look.px(PAD)
        return lines

    @property
    def _texts(self) -> list[tuple[str, ...]]:
        """Every cell from top to bottom; of one starting risk, which stands in its field above, no row's name."""
        if not self._rows:
            return []
        every = [(self._corner, *TABLE_HEADS.values()), *map(_texts, self._rows)]
        return [texts[1:] for texts in every] if len(self._rows) == 1 else every

    def _edges(self, width: int) -> list[tuple[float, float]]:
        """Left edge and width of each column: as wide as its widest text, and the rest shared out between them."""
        font, gap = self._look.font("small"), float(self._look.px(GAP))
        columns = zip(*(texts for texts in self._texts if texts[-1]), strict=True)
        needed = [max(text_width(line, font) for text in column for line in text.split("\n")) + 1 for column in columns]
        free = width - sum(needed) - gap * (len(needed) - 1)
        wide = [each + free / len(needed) if free < 0 else each for each in needed]
        gap += max(free, 0) / (len(needed) - 1)
        return [(sum(wide[:place]) + gap * place, each) for place, each in enumerate(wide)]

    def _on_look_changed(self) -> None:
        self._laid.clear()
        self.updateGeometry()
        self.update()


def _texts(row: Row) -> tuple[str, str, str, str, str]:
    """A row's name and figures from left to right, an interval under its figure."""
    figures = (row.without, row.with_, row.difference, row.number_needed)
    without, with_, difference, needed = (text.replace(" (", "\n(", 1) for text in figures)
    return (row.label, without, with_, difference, needed)
