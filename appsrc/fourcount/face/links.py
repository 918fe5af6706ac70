"""Quiet commands: words in the accent's colour, underlined while they have the focus."""

from __future__ import annotations

from PySide6.QtCore import QSize, Qt
from PySide6.QtGui import QAction, QKeyEvent, QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QAbstractButton, QSizePolicy

from fourcount.face.look import Look


class Link(QAbstractButton):
    """A command as words to click, to reach with Tab and to press with Space or Enter."""

    def __init__(self, look: Look, words: str, action: QAction | None = None, name: str = "") -> None:
        super().__init__()
        self._look = look
        self.setText(words)
        self.setAccessibleName(name or words)
        self.setCursor(Qt.CursorShape.PointingHandCursor)
        self.setFocusPolicy(Qt.FocusPolicy.StrongFocus)
        self.setSizePolicy(QSizePolicy.Policy.Fixed, QSizePolicy.Policy.Fixed)
        self._shortcut = ""
        if action:
            self.clicked.connect(action.trigger)
            self._shortcut = action.shortcut().toString(action.shortcut().SequenceFormat.NativeText)
            self.setToolTip(f"{name or words}  {self._shortcut}".strip())
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_words(self, words: str) -> None:
        """Give the command other words."""
        if words != self.text():
            self.setText(words)
            self.setAccessibleName(words)
            self.setToolTip(f"{words}  {self._shortcut}".strip())
            self.updateGeometry()

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(40), self._look.px(26))

    def sizeHint(self) -> QSize:
        return QSize(self.fontMetrics().horizontalAdvance(self.text()) + 2, self._look.px(26))

    def keyPressEvent(self, event: QKeyEvent) -> None:
        if event.key() in (Qt.Key.Key_Return, Qt.Key.Key_Enter):
            self.click()
            return
        super().keyPressEvent(event)

    def paintEvent(self, event: QPaintEvent) -> None:
        painter = QPainter(self)
        font = self.font()
        font.setUnderline(self.underMouse() or self.hasFocus())
        painter.setFont(font)
        painter.setPen(QPen(self._look.colour("accent")))
        words = self.fontMetrics().elidedText(self.text(), Qt.TextElideMode.ElideRight, self.width())
        painter.drawText(self.rect(), self._alignment(), words)
        if self.hasFocus():
            painter.setPen(QPen(self._look.colour("accent"), 1, Qt.PenStyle.DotLine))
            painter.drawRect(self.rect().adjusted(0, 0, -1, -1))
        painter.end()

    def _alignment(self) -> Qt.AlignmentFlag:
        return Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag.AlignVCenter

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font("body"))
        self.updateGeometry()
