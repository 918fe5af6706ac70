"""The parts of the curve's window: the drawing as one object, and the table of the same numbers."""

from __future__ import annotations

from collections.abc import Sequence

from PySide6.QtCore import QRect, QSize, Qt, QTimer, Signal
from PySide6.QtGui import QImage, QPainter, QPaintEvent, QPen, QResizeEvent
from PySide6.QtWidgets import QAbstractItemView, QHeaderView, QSizePolicy, QTableWidget, QTableWidgetItem, QWidget

from fourcount.face.look import Look
from fourcount.face.scroll_bar import ScrollBar
from fourcount.ink.curve_sheet import LEAST
from fourcount.wording import curve_labels as labels
from fourcount.wording.curve_table import CurveRow

ROW_GAP, HEAD_MARGIN = 4, 12


class CurveCanvas(QWidget):
    """The drawing, made elsewhere; its description says what it shows.

    **Signals**
        resized: there is another room to draw in.
    """

    resized = Signal()

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.image = QImage()
        self.setFocusPolicy(Qt.FocusPolicy.StrongFocus)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Expanding)

    def show_words(self, name: str, description: str) -> None:
        """Say what is drawn."""
        self.setAccessibleName(name)
        self.setAccessibleDescription(description)

    def show_image(self, image: QImage) -> None:
        """Show a drawing in device pixels."""
        self.image = image
        self.update()

    def sizeHint(self) -> QSize:
        return self.minimumSizeHint()

    def minimumSizeHint(self) -> QSize:
        return QSize(*(self._look.px(length) for length in LEAST))

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self.resized.emit()

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        if self.image.isNull():
            painter.setFont(self._look.font("body"))
            painter.setPen(self._look.colour("muted"))
            painter.drawText(self.rect(), Qt.AlignmentFlag.AlignCenter, labels.DRAWING)
        else:  # until the next drawing is there, the last one is fitted into the room
            size = self.image.deviceIndependentSize().toSize()
            size.scale(self.size(), Qt.AspectRatioMode.KeepAspectRatio)
            painter.setRenderHint(QPainter.RenderHint.SmoothPixmapTransform)
            painter.drawImage(QRect(0, 0, size.width(), size.height()), self.image)
        if self.hasFocus():
            painter.setPen(QPen(self._look.colour("accent"), 2))
            painter.drawRect(self.rect().adjusted(1, 1, -1, -1))
        painter.end()


class CurveTable(QTableWidget):
    """The figures at round starting risks and at the points; to be read and walked through, not changed."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._shown: tuple[CurveRow, ...] = ()
        self.setAccessibleName(labels.TABLE_NAME)
        self.setEditTriggers(QAbstractItemView.EditTrigger.NoEditTriggers)
        self.setTabKeyNavigation(False)
        self.setFrameShape(QTableWidget.Shape.NoFrame)
        self.setWordWrap(True)
        self.setShowGrid(False)
        self.verticalHeader().hide()
        self.horizontalHeader().setSectionResizeMode(QHeaderView.ResizeMode.Stretch)
        self.horizontalHeader().setDefaultAlignment(
            Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag(Qt.TextFlag.TextWordWrap)
        )
        self.setVerticalScrollBar(ScrollBar(look))
        self.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOff)
        look.changed.connect(self._on_look_changed)

    def show_rows(self, head: CurveRow, rows: Sequence[CurveRow]) -> None:
        """Show these rows under their heads; equal ones change nothing."""
        shown = (head, *rows)
        if shown == self._shown:
            return
        self._shown = shown
        self.setColumnCount(1 + len(head.cells))
        self.setHorizontalHeaderLabels([head.start, *head.cells])
        self.setRowCount(len(rows))
        self.setVerticalHeaderLabels([row.start for row in rows])  # told with each cell of the row
        for place, row in enumerate(rows):
            for column, text in enumerate((row.start, *row.cells)):
                self.setItem(place, column, QTableWidgetItem(text))
        self._fit()

    def _fit(self) -> None:
        """All rows are seen: the page scrolls, not the table."""
        for widget in (self, self.horizontalHeader()):
            widget.setFont(self._look.font("body"))
        self.resizeRowsToContents()
        for place in range(self.rowCount()):
            self.setRowHeight(place, self.rowHeight(place) + self._look.px(ROW_GAP))
        rows = sum(self.rowHeight(place) for place in range(self.rowCount()))
        self.horizontalHeader().setFixedHeight(self._head_height())
        self.setFixedHeight(self._head_height() + rows + self._look.px(4))

    def _head_height(self) -> int:
        """That of the longest head in its column; Qt's own hint counts one line."""
        heads = [self.horizontalHeaderItem(column) for column in range(self.columnCount())]
        metrics, room = self.horizontalHeader().fontMetrics(), self._look.px(HEAD_MARGIN)
        flags = Qt.AlignmentFlag.AlignLeft.value | Qt.TextFlag.TextWordWrap.value
        tall = [
            metrics.boundingRect(0, 0, self.columnWidth(column) - room, 0, flags, head.text()).height()
            for column, head in enumerate(heads)
            if head is not None
        ]
        return max(tall, default=0) + room

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        if event.size().width() != event.oldSize().width():
            QTimer.singleShot(0, self._fit)  # once the columns have their widths

    def _on_look_changed(self) -> None:
        self._fit()
