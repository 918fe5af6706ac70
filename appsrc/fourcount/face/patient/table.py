"""The picture's numbers as a small table: a row for each starting risk, without and with, difference, number needed."""

from __future__ import annotations

from collections.abc import Sequence
from typing import TYPE_CHECKING

from PySide6.QtCore import QRect, QSize, Qt
from PySide6.QtGui import QPainter, QPaintEvent, QPen, QResizeEvent, QWheelEvent
from PySide6.QtWidgets import QAbstractItemView, QHeaderView, QSizePolicy, QTableWidget, QTableWidgetItem

from fourcount.face.look import Look
from fourcount.face.patient.table_lines import GAP, PAD, Line, edges, lines_at, shown_texts
from fourcount.ink.typeset import draw_text
from fourcount.wording.patient_labels import TABLE_NAME

if TYPE_CHECKING:
    from fourcount.wording.patient_table import Row


class Heads(QHeaderView):
    """The line of heads, painted like the rows under it; a screen reader hears the full ones."""

    def __init__(self, table: PatientTable) -> None:
        super().__init__(Qt.Orientation.Horizontal, table)
        self._table = table
        self.setSectionResizeMode(QHeaderView.ResizeMode.Fixed)
        self.setMinimumSectionSize(0)
        self.setFocusPolicy(Qt.FocusPolicy.NoFocus)

    def sizeHint(self) -> QSize:
        return QSize(0, self._table.height_of_heads)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self.viewport())
        self._table.paint_heads(painter)
        painter.end()


class PatientTable(QTableWidget):
    """A real table, so that its cells can be walked through and heard with their heads; painted under hairlines.

    It is as high as its rows: the page scrolls, not the table. Its description reads it out row by row.
    """

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._rows: tuple[Row, ...] = ()
        self._head: Row | None = None
        self._named: tuple[object, ...] = ()
        self._reasons: dict[int, int] = {}
        self._corner = ""
        self._laid: dict[int, list[Line]] = {}
        policy = QSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Minimum)
        policy.setHeightForWidth(True)
        self.setSizePolicy(policy)
        self.setAccessibleName(TABLE_NAME)
        self.setFocusPolicy(Qt.FocusPolicy.TabFocus)
        self.setTabKeyNavigation(False)
        self.setEditTriggers(QAbstractItemView.EditTrigger.NoEditTriggers)
        self.setSelectionMode(QAbstractItemView.SelectionMode.NoSelection)
        self.setFrameShape(QTableWidget.Shape.NoFrame)
        self.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self.setVerticalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        self.setHorizontalHeader(Heads(self))
        self.verticalHeader().hide()
        self.verticalHeader().setMinimumSectionSize(0)
        for ground in (self.viewport(), self.horizontalHeader().viewport()):
            ground.setAutoFillBackground(False)
        self.hide()
        look.changed.connect(self._on_look_changed)

    def show_rows(self, rows: Sequence[Row], head: Row | None, corner: str, sentence: str) -> None:
        """Show these rows, or nothing; ``corner`` says of how many people. Equal ones change nothing."""
        if sentence != self.accessibleDescription():
            self.setAccessibleDescription(sentence)
        if (tuple(rows), head, corner) == (self._rows, self._head, self._corner):
            return
        self._rows, self._head, self._corner = tuple(rows), head, corner
        self._laid.clear()
        if head is not None:
            self._fill(head)
        self.setVisible(bool(self._rows))
        self._fit()
        self.updateGeometry()
        self.viewport().update()

    @property
    def height_of_heads(self) -> int:
        """Pixels from the table's top to its first hairline."""
        lines = self._lines(self.width())
        return round(lines[1].top) - self._look.px(PAD) if lines else 0

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        lines = self._lines(width)
        return round(lines[-1].bottom + self._look.px(PAD)) if lines else 0

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(280), self.heightForWidth(max(self.width(), self._look.px(200))))

    def minimumSizeHint(self) -> QSize:
        return QSize(0, self.heightForWidth(self.width()))

    def paint_heads(self, painter: QPainter) -> None:
        """Paint the line of heads."""
        for line in self._lines(self.width())[:1]:
            self._paint_cells(painter, line, 0.0, head=True)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self.viewport())
        up = float(self.height_of_heads)
        for line in self._lines(self.width())[1:]:
            self._paint_cells(painter, line, up, head=False)
            top = round(line.top - up) - self._look.px(PAD)
            painter.fillRect(0, top, self.width(), 1, self._look.colour("hairline"))
        if self.hasFocus():
            painter.setPen(QPen(self._look.colour("accent"), 2))
            painter.drawRect(self._ring())
        painter.end()

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._fit()

    def wheelEvent(self, event: QWheelEvent) -> None:
        """Leave the wheel to the page."""
        event.ignore()

    def _fill(self, head: Row) -> None:
        """The cells as they are heard; of one starting risk its name stands before the row alone."""
        first = 0 if len(self._rows) > 1 else 1
        self.setRowCount(len(self._rows))
        self.setColumnCount(len(head) - first)
        named = (head[first:], *(row.label for row in self._rows))
        if named != self._named:  # a key at a time, most of it stays as it is
            self._named = named
            self.setHorizontalHeaderLabels(head[first:])
            self.setVerticalHeaderLabels([row.label for row in self._rows])
        reasons = {}
        for place, row in enumerate(self._rows):
            texts = [text for text in row[first:] if text]
            for column, text in enumerate(row[first:]):
                self._put(place, column, text or texts[-1])
            if len(texts) < self.columnCount():
                reasons[place] = len(texts) - 1
        self._span(reasons)
        if self.currentRow() < 0:
            self.setCurrentCell(0, 0)

    def _span(self, reasons: dict[int, int]) -> None:
        """Give what is said instead of figures the room of all of them; ``reasons`` has its column by its row."""
        if reasons != self._reasons:
            self._reasons = reasons
            self.clearSpans()
            for row, column in reasons.items():
                self.setSpan(row, column, 1, self.columnCount() - column)

    def _put(self, row: int, column: int, text: str) -> None:
        item = self.item(row, column)
        if item is None:
            self.setItem(row, column, QTableWidgetItem(text))
        elif item.text() != text:
            item.setText(text)

    def _fit(self) -> None:
        """Give rows and columns the places at which they are painted."""
        lines, pad = self._lines(self.width()), self._look.px(PAD)
        if not lines:
            return
        lefts = [round(x) for x, _ in edges(shown_texts(self._rows, self._corner), self._look, self.width())]
        for column, (left, right) in enumerate(zip(lefts, (*lefts[1:], self.width()), strict=True)):
            self.setColumnWidth(column, max(right - left, 0))
        tops = [round(line.top) - pad for line in lines[1:]]
        for row, (top, end) in enumerate(zip(tops, (*tops[1:], self.heightForWidth(self.width())), strict=True)):
            self.setRowHeight(row, end - top)
        self.updateGeometries()

    def _ring(self) -> QRect:
        """Where the focus is shown: around the cell that is read."""
        cell = self.visualRect(self.currentIndex())
        free = self._look.px(GAP) // 2  # the text begins at the cell's edge
        return cell.adjusted(-free if cell.x() else 1, 2, -free if cell.right() + 2 < self.width() else -1, -1)

    def _lines(self, width: int) -> list[Line]:
        if width not in self._laid:  # a layout asks many times
            self._laid[width] = lines_at(shown_texts(self._rows, self._corner), self._look, width)
        return self._laid[width]

    def _paint_cells(self, painter: QPainter, line: Line, up: float, *, head: bool) -> None:
        look, named = self._look, len(self._rows) > 1
        for x, wide, text in line.cells:
            colour = look.palette.muted if head or (named and x == 0) else look.palette.ink
            draw_text(painter, x, line.top - up, wide, text, look.font("small"), colour)

    def _on_look_changed(self) -> None:
        self._laid.clear()
        self._fit()
        self.updateGeometry()
        self.viewport().update()
