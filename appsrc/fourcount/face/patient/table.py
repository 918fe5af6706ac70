"""The picture's numbers as a small table: a row for each starting risk, without and with, difference, number needed."""

from __future__ import annotations

from collections.abc import Sequence
from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import QSize
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QSizePolicy, QWidget

from fourcount.face.look import Look
from fourcount.ink.typeset import LEFT, RIGHT, draw_text, text_height, text_width
from fourcount.wording.patient_labels import TABLE_HEADS, TABLE_NAME

if TYPE_CHECKING:
    from fourcount.wording.patient_table import Row

GAP = 10
PAD = 5
"""Pixels at 100% text between two columns, and above and under a row."""

WIDEST_LABEL = 0.3
"""The share of the width that the rows' names take at most."""


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
        self.setVisible(bool(self._rows))
        self.updateGeometry()
        self.update()

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        laid = self._lay(width)
        return round(laid[-1].bottom + self._look.px(PAD)) if laid else 0

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(280), self.heightForWidth(max(self.width(), self._look.px(200))))

    def minimumSizeHint(self) -> QSize:
        return QSize(0, self.heightForWidth(self.width()))

    def paintEvent(self, event: QPaintEvent) -> None:
        look, pad = self._look, self._look.px(PAD)
        painter = QPainter(self)
        for place, line in enumerate(self._lay(self.width())):
            font = look.font("body" if place else "small")
            for column, (x, wide, text) in enumerate(line.cells):
                figure = bool(column) or self._alone
                colour = look.palette.ink if place and figure else look.palette.muted
                draw_text(
                    painter, x, line.top, wide, text, font, colour, RIGHT if figure and len(line.cells) > 2 else LEFT
                )
            if place:
                painter.fillRect(0, round(line.top) - pad, self.width(), 1, look.colour("hairline"))
        painter.end()

    @property
    def _alone(self) -> bool:
        """Whether there is one starting risk, which stands in its field above: no row needs a name then."""
        return len(self._rows) == 1

    def _lay(self, width: int) -> list[Line]:
        """The heads and the rows with their cells at a width."""
        if not self._rows:
            return []
        look, lines, y = self._look, [], 0.0
        edges = self._edges(width)
        for place, texts in enumerate(((self._corner, *TABLE_HEADS.values()), *map(_texts, self._rows))):
            laid = [(x, wide, text) for (x, wide), text in zip(edges, texts[self._alone :], strict=True)]
            if place and not any(texts[2:]):  # a reason instead of figures
                x = edges[0 if self._alone else 1][0]
                laid = [*(laid[:1] if not self._alone else []), (x, width - x, texts[1])]
            font = look.font("body" if place else "small")
            height = max(text_height(text, font, wide) for _, wide, text in laid)
            lines.append(Line(y, y + height, laid))
            y += height + 2 * look.px(PAD)
        return lines

    def _edges(self, width: int) -> list[tuple[float, float]]:
        """Left edge and width of each column: the names as wide as they need, the figures in equal shares."""
        gap, font = self._look.px(GAP), self._look.font("body")
        if self._alone:
            share = (width - gap * (len(TABLE_HEADS) - 1)) / len(TABLE_HEADS)
            return [(place * (share + gap), share) for place in range(len(TABLE_HEADS))]
        name = min(max(text_width(row.label, font) for row in self._rows) + 1, width * WIDEST_LABEL)
        share = (width - name) / len(TABLE_HEADS) - gap
        return [(0.0, name), *((name + gap + place * (share + gap), share) for place in range(len(TABLE_HEADS)))]

    def _on_look_changed(self) -> None:
        self.updateGeometry()
        self.update()


def _texts(row: Row) -> tuple[str, str, str, str, str]:
    """A row's name and figures from left to right, an interval under its figure."""
    figures = (row.without, row.with_, row.difference, row.number_needed)
    without, with_, difference, needed = (text.replace(" (", "\n(", 1) for text in figures)
    return (row.label, without, with_, difference, needed)
