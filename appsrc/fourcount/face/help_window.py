"""Help: a quiet window of plain text with headings, from the tables of methods and of commands."""

from __future__ import annotations

from collections.abc import Sequence

from PySide6.QtCore import Qt
from PySide6.QtGui import QIcon, QTextBlockFormat, QTextCharFormat, QTextCursor
from PySide6.QtWidgets import QDialog, QDialogButtonBox, QTextEdit, QVBoxLayout, QWidget

from fourcount.face.look import Look
from fourcount.face.scroll_bar import ScrollBar
from fourcount.ink.style import Role

Part = tuple[Role, str]
"""A paragraph: the role of its font, and its text."""


class HelpWindow(QDialog):
    """A window of paragraphs to read, to select and to scroll with the keyboard; Escape closes it."""

    def __init__(self, look: Look, title: str, parent: QWidget | None = None) -> None:
        super().__init__(parent)
        self._look = look
        self._parts: tuple[Part, ...] = ()
        self.setWindowTitle(title)
        self.setAttribute(Qt.WidgetAttribute.WA_DeleteOnClose)
        self.text = QTextEdit()
        self.text.setReadOnly(True)
        self.text.setAcceptRichText(False)
        self.text.setAccessibleName(title)
        self.text.setFrameShape(QTextEdit.Shape.NoFrame)
        self.text.setVerticalScrollBar(ScrollBar(look))
        self.text.setVerticalScrollBarPolicy(Qt.ScrollBarPolicy.ScrollBarAlwaysOn)
        flags = Qt.TextInteractionFlag
        self.text.setTextInteractionFlags(flags.TextSelectableByMouse | flags.TextSelectableByKeyboard)
        buttons = QDialogButtonBox(QDialogButtonBox.StandardButton.Close)
        buttons.button(QDialogButtonBox.StandardButton.Close).setIcon(QIcon())  # words alone, as everywhere
        buttons.rejected.connect(self.reject)
        layout = QVBoxLayout(self)
        layout.addWidget(self.text)
        layout.addWidget(buttons)
        self.resize(look.px(680), look.px(560))
        look.changed.connect(self._on_look_changed)

    def show_parts(self, parts: Sequence[Part]) -> None:
        """Show paragraphs; a "strong" one is a heading."""
        self._parts = tuple(parts)
        self.text.clear()
        self.text.setTabStopDistance(self._look.px(230))
        cursor = self.text.textCursor()
        for i, (role, words) in enumerate(self._parts):
            self._add(cursor, role, words, first=i == 0)
        self.text.moveCursor(QTextCursor.MoveOperation.Start)

    def fit_height(self) -> None:
        """Be as tall as the text is, where the screen has room for it."""
        room = self.screen().availableSize().height() - self._look.px(80)
        self.text.document().setTextWidth(self.width() - self._look.px(48))
        self.resize(self.width(), min(round(self.text.document().size().height()) + self._look.px(80), room))

    def _add(self, cursor: QTextCursor, role: Role, words: str, first: bool) -> None:
        block = QTextBlockFormat()
        block.setTopMargin(0 if first else self._look.px(16 if role in ("strong", "figure") else 4))
        style = QTextCharFormat()
        style.setFont(self._look.font(role))
        style.setForeground(self._look.colour("muted" if role == "small" else "ink"))
        if first:
            cursor.setBlockFormat(block)
            cursor.setCharFormat(style)
        else:
            cursor.insertBlock(block, style)
        cursor.insertText(words)

    def _on_look_changed(self) -> None:
        self.show_parts(self._parts)
