"""A layout that sets its items in a line and goes on in the next where the line is full."""

from __future__ import annotations

from PySide6.QtCore import QPoint, QRect, QSize, Qt
from PySide6.QtWidgets import QWidget

from fourcount.face.item_layout import ItemLayout
from fourcount.face.look import Look


class FlowLayout(ItemLayout):
    """Items from the left, wrapped like words, with a gap that grows with the text."""

    def __init__(self, look: Look, parent: QWidget | None = None, gap: int = 16) -> None:
        super().__init__(look, parent)
        self._gap = gap
        self._heights: dict[int, int] = {}
        self.setContentsMargins(0, 0, 0, 0)

    def expandingDirections(self) -> Qt.Orientation:
        return Qt.Orientation(0)

    def heightForWidth(self, width: int) -> int:
        if width not in self._heights:  # a layout asks many times
            self._heights[width] = self._flow(QRect(0, 0, width, 0), place=False)
        return self._heights[width]

    def invalidate(self) -> None:
        self._heights.clear()
        super().invalidate()

    def setGeometry(self, rect: QRect) -> None:
        super().setGeometry(rect)
        self._flow(rect, place=True)

    def minimumSize(self) -> QSize:
        size = QSize()
        for item in self._items:
            size = size.expandedTo(item.minimumSize())
        return size

    def _flow(self, rect: QRect, place: bool) -> int:
        """Lay the items out in ``rect`` and give the height that they take."""
        gap = self._look.px(self._gap)
        x, y, line = rect.x(), rect.y(), 0
        for item in self._items:
            if item.isEmpty():
                continue
            size = item.sizeHint()
            width = min(size.width(), rect.width())
            if x > rect.x() and x + width > rect.right() + 1:
                x, y, line = rect.x(), y + line, 0
            if place:
                item.setGeometry(QRect(QPoint(x, y), QSize(width, size.height())))
            x += width + gap
            line = max(line, size.height())
        return y + line - rect.y()
