"""Text that is only read: plain words in a role, a colour and, where needed, several lines."""

from __future__ import annotations

import sys

from PySide6.QtCore import QSize, Qt
from PySide6.QtGui import QDragEnterEvent, QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QComboBox, QLabel, QLineEdit, QSizePolicy, QWidget

from fourcount.face.look import Look
from fourcount.ink.style import Role
from fourcount.ink.typeset import bounded

LONGEST_TIP = 200
"""Characters of a tip; what is typed can be as long as one likes."""


def tip(text: str) -> str:
    """A text for a tool tip, which Qt would otherwise lay out as a page, with its pictures, where it looks like one."""
    short = text if len(text) <= LONGEST_TIP else f"{text[:LONGEST_TIP]}…"
    if not any(sign in short for sign in "<&"):
        return short
    plain = short.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;")
    return f"<qt>{plain}</qt>"


class TextOnly(QLineEdit):
    """A line that text can be dropped into, and no file: the window opens files."""

    def dragEnterEvent(self, event: QDragEnterEvent) -> None:
        if event.mimeData().hasUrls() and any(url.isLocalFile() for url in event.mimeData().urls()):
            event.ignore()
        else:
            super().dragEnterEvent(event)


def name_choice(box: QComboBox, name: str) -> None:
    """Give a choice a name that is heard: but for Windows, Qt tells the value as the name, and the name nowhere."""
    box.setAccessibleName(name)
    if sys.platform != "win32":
        box.setAccessibleDescription(name)


class Words(QLabel):
    """A piece of plain text. Whatever it holds is shown as it is, never as markup."""

    def __init__(
        self,
        look: Look,
        role: Role = "body",
        part: str = "ink",
        text: str = "",
        wraps: bool = True,
        selectable: bool = False,
    ) -> None:
        super().__init__()
        self._look = look
        self._role: Role = role
        self._part = part
        self.setTextFormat(Qt.TextFormat.PlainText)
        self.setWordWrap(wraps)
        self.setMinimumWidth(0)
        if wraps:
            policy = QSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Minimum)
            policy.setHeightForWidth(True)
            self.setSizePolicy(policy)
        if selectable:
            flags = Qt.TextInteractionFlag
            self.setTextInteractionFlags(flags.TextSelectableByMouse | flags.TextSelectableByKeyboard)
        self.show_words(text)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_words(self, text: str) -> None:
        """Show a text; an empty one takes no room."""
        shown = bounded(text)
        if shown != self.text():
            self.setText(shown)
        if not text:
            self.hide()
        elif self.isHidden() and self.parent() is not None:
            self.show()

    def paintEvent(self, event: QPaintEvent) -> None:
        super().paintEvent(event)
        if self.hasFocus():
            painter = QPainter(self)
            painter.setPen(QPen(self._look.colour("accent"), 1, Qt.PenStyle.DotLine))
            painter.drawRect(self.rect().adjusted(0, 0, -1, -1))
            painter.end()

    def name_of(self, field: QWidget) -> None:
        """Be the name of a field, which is then told with it."""
        self.setBuddy(field)
        if isinstance(field, QComboBox):
            field.setAccessibleDescription("")  # it is told the name once

    def minimumSizeHint(self) -> QSize:
        hint = super().minimumSizeHint()
        return QSize(0, hint.height()) if self.wordWrap() else hint

    def _on_look_changed(self) -> None:
        self.setFont(self._look.font(self._role))
        self.setPalette(self._look.text_palette(self._part))
