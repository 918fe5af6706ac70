"""How the three columns stand: side by side where there is room, else stacked, always on one page that scrolls."""

from __future__ import annotations

from PySide6.QtCore import Qt
from PySide6.QtGui import QPainter, QPaintEvent, QResizeEvent
from PySide6.QtWidgets import QFrame, QGridLayout, QScrollArea, QWidget

from fourcount.face.look import Look

THREE_FROM = 1200
TWO_FROM = 900
"""Widths of the window, at 100% text, from which three columns or two stand side by side."""


class Page(QWidget):
    """The three columns on one page, parted by hairlines."""

    def __init__(self, look: Look, printed: QWidget, says: QWidget, patient: QWidget) -> None:
        super().__init__()
        self._look = look
        self._columns = (printed, says, patient)
        self.arrangement = 0
        self._grid = QGridLayout(self)
        self._grid.setContentsMargins(0, 0, 0, 0)
        self._grid.setSpacing(0)
        for column in self._columns:
            column.setParent(self)

    def arrange(self, width: int) -> None:
        """Choose the arrangement for a width of the window."""
        room = width / self._look.zoom
        arrangement = 3 if room >= THREE_FROM else 2 if room >= TWO_FROM else 1
        if arrangement == self.arrangement:
            return
        self.arrangement = arrangement
        while self._grid.count():
            self._grid.takeAt(0)
        printed, says, patient = self._columns
        if arrangement == 3:
            places = ((printed, 0, 0, 1), (says, 0, 1, 1), (patient, 0, 2, 1))
            stretches = (375, 515, 390)
        elif arrangement == 2:
            places = ((printed, 0, 0, 1), (patient, 1, 0, 1), (says, 0, 1, 2))
            stretches = (420, 560, 0)
        else:
            places = ((printed, 0, 0, 1), (says, 1, 0, 1), (patient, 2, 0, 1))
            stretches = (1, 0, 0)
        for widget, row, column, rows in places:
            self._grid.addWidget(widget, row, column, rows, 1)
        for column, stretch in enumerate(stretches):
            self._grid.setColumnStretch(column, stretch)
        for row in range(3):
            self._grid.setRowStretch(row, 0)
        self._grid.setRowStretch({3: 0, 2: 1, 1: 2}[arrangement], 1)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        hairline = self._look.colour("hairline")
        printed, says, patient = self._columns
        if self.arrangement > 1:
            painter.fillRect(says.x(), 0, 1, self.height(), hairline)
        if self.arrangement == 3:
            painter.fillRect(patient.x(), 0, 1, self.height(), hairline)
        else:
            painter.fillRect(patient.x(), patient.y(), patient.width(), 1, hairline)
        if self.arrangement == 1:
            painter.fillRect(says.x(), says.y(), says.width(), 1, hairline)
        painter.end()


class PageScroll(QScrollArea):
    """Holds the page, as wide as the window and as tall as it needs."""

    def __init__(self, look: Look, page: Page) -> None:
        super().__init__()
        self._look = look
        self._page = page
        self.setFrameShape(QFrame.Shape.NoFrame)
        self.setWidgetResizable(True)
        self.setHorizontalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAsNeeded)
        self.setFocusPolicy(Qt.FocusPolicy.NoFocus)
        self.setWidget(page)
        look.changed.connect(self._on_look_changed)

    def resizeEvent(self, event: QResizeEvent) -> None:
        self._page.arrange(self.width())
        super().resizeEvent(event)

    def _on_look_changed(self) -> None:
        self._page.arrange(self.width())
