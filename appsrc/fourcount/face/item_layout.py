"""What every layout of our own has to tell Qt about its items."""

from __future__ import annotations

from PySide6.QtCore import QSize
from PySide6.QtWidgets import QLayout, QLayoutItem, QWidget

from fourcount.face.look import Look


class ItemLayout(QLayout):
    """A layout whose height follows from its width; a subclass places the items."""

    def __init__(self, look: Look, parent: QWidget | None = None) -> None:
        super().__init__(parent)
        self._look = look
        self._items: list[QLayoutItem] = []

    def addItem(self, item: QLayoutItem) -> None:
        self._items.append(item)

    def count(self) -> int:
        return len(self._items)

    def itemAt(self, index: int) -> QLayoutItem | None:
        return self._items[index] if 0 <= index < len(self._items) else None

    def takeAt(self, index: int) -> QLayoutItem | None:
        return self._items.pop(index) if 0 <= index < len(self._items) else None

    def hasHeightForWidth(self) -> bool:
        return True

    def sizeHint(self) -> QSize:
        return self.minimumSize()
