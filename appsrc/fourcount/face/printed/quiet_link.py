"""A link that opens or closes a row of fields: smaller and quieter than a command."""

from __future__ import annotations

from PySide6.QtCore import QSize, Signal
from PySide6.QtGui import QPainter, QPaintEvent

from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.text import tip
from fourcount.wording.printed_labels import OPENED


class QuietLink(Link):
    """Muted words, in the accent's colour under the mouse or with the focus.

    **Signals**
        opened: the link was pressed. Carries its key.
    """

    opened = Signal(str)

    def __init__(self, look: Look, key: str, words: str, name: str = "") -> None:
        self._key = key
        self._open = False
        super().__init__(look, words)
        if name:
            self.setAccessibleName(name)
            self.setToolTip(tip(name))
        self.clicked.connect(self._on_clicked)

    def show_open(self, is_open: bool) -> None:
        """Keep the place of a link whose row is open, its words in ink; it leads into the row."""
        if is_open != self._open:
            self._open = is_open
            self.setAccessibleDescription(OPENED if is_open else "")
            self.update()

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(24), self._look.px(24))

    def sizeHint(self) -> QSize:
        width = self.fontMetrics().horizontalAdvance(self.text()) + 2
        return QSize(max(width, self._look.px(24)), self._look.px(24))

    def paintEvent(self, event: QPaintEvent) -> None:
        if self.hasFocus() or self.underMouse():
            super().paintEvent(event)
            return
        painter = QPainter(self)
        painter.setFont(self.font())
        painter.setPen(self._look.colour("ink" if self._open else "muted"))
        painter.drawText(self.rect(), self._alignment(), self.text())
        painter.end()

    def _on_clicked(self) -> None:
        self.opened.emit(self._key)

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font("small"))
        self.updateGeometry()
