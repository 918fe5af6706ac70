"""Quiet commands: words in the accent's colour, underlined while they have the focus."""

from __future__ import annotations

from PySide6.QtCore import QRect, QSize, Qt
from PySide6.QtGui import QAction, QKeyEvent, QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QAbstractButton, QSizePolicy

from fourcount.face.look import Look
from fourcount.face.text import tip


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
            self.setToolTip(tip(f"{name or words}  {self._shortcut}".strip()))
            self.setAccessibleDescription(self._shortcut)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_words(self, words: str) -> None:
        """Give the command other words."""
        if words != self.text():
            self.setText(words)
            self.setAccessibleName(words)
            self.setToolTip(tip(f"{words}  {self._shortcut}".strip()))
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
        painter.drawText(self.rect(), self._alignment(), self._shown_words())
        if self.hasFocus():
            painter.setPen(QPen(self._look.colour("accent"), 1, Qt.PenStyle.DotLine))
            painter.drawRect(self.rect().adjusted(0, 0, -1, -1))
        painter.end()

    def _shown_words(self) -> str:
        return self.fontMetrics().elidedText(self.text(), Qt.TextElideMode.ElideRight, self.width())

    def _alignment(self) -> Qt.AlignmentFlag:
        return Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag.AlignVCenter

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font("body"))
        self.updateGeometry()


class WrappedLink(Link):
    """A command of several words, which goes on in another line where a column is narrow."""

    def __init__(self, look: Look, words: str, action: QAction | None = None, name: str = "") -> None:
        super().__init__(look, words, action, name)
        policy = QSizePolicy(QSizePolicy.Policy.Preferred, QSizePolicy.Policy.Minimum)
        policy.setHeightForWidth(True)
        self.setSizePolicy(policy)

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        words = self.fontMetrics().boundingRect(QRect(0, 0, width, 10_000), self._alignment(), self.text())
        return max(words.height(), self._look.px(26))

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(40), self.heightForWidth(max(self.width(), self._look.px(40))))

    def _shown_words(self) -> str:
        return self.text()

    def _alignment(self) -> Qt.AlignmentFlag:
        return super()._alignment() | Qt.AlignmentFlag(Qt.TextFlag.TextWordWrap)
