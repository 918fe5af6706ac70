"""What a start offers that a window which broke off had set aside, beside what its file holds."""

from __future__ import annotations

from datetime import datetime
from pathlib import Path
from typing import NamedTuple

from PySide6.QtCore import Qt
from PySide6.QtGui import QIcon, QShowEvent
from PySide6.QtWidgets import QDialog, QDialogButtonBox, QHBoxLayout, QPushButton, QVBoxLayout, QWidget

from fourcount.face.keeping import named
from fourcount.face.look import Look
from fourcount.face.set_aside import Orphan
from fourcount.face.text import Words
from fourcount.face.whole_file import digest_of
from fourcount.publish.files import open_file
from fourcount.record.paper import Record
from fourcount.wording import keeping as words
from fourcount.wording.set_aside import record_lines, when_text


class Offer(NamedTuple):
    """What is said of a state that was set aside, and of its file; ``saved`` is the record in that file, if any."""

    aside: list[str]
    file: list[str]
    notes: list[str]
    can_open: bool
    saved: Record | None
    path: Path | None


def offer_of(orphan: Orphan) -> Offer:
    """Put both states into words; the file is read for it and not touched."""
    head, found = orphan.head, orphan.found
    aside = [when_text(head.when)] if head else []
    if head and head.file:
        aside.insert(0, words.OFFER_FOR.format(name=named(Path(head.file))))
    if isinstance(found, str):
        return Offer([*aside, words.OFFER_BROKEN.format(reason=found)], [], [], can_open=False, saved=None, path=None)
    aside += record_lines(found)
    path = Path(head.file) if head and head.file else None
    if path is None:
        return Offer(aside, [words.OFFER_NO_FILE], [], can_open=True, saved=None, path=None)
    opened = open_file(path)
    if isinstance(opened, str):
        return Offer(aside, [opened], [], can_open=True, saved=None, path=path)
    file = [named(path), _saved_when(path), *record_lines(opened.record)]
    notes = [words.OFFER_SAME if opened.record == found else words.OFFER_UNDO]
    if head and digest_of(opened.data) != head.digest:
        notes.insert(0, words.OFFER_CHANGED)
    return Offer(aside, file, notes, can_open=True, saved=opened.record, path=path)


def _saved_when(path: Path) -> str:
    try:
        return when_text(datetime.fromtimestamp(path.stat().st_mtime).astimezone())
    except (OSError, OverflowError, ValueError):
        return ""


class RecoverDialog(QDialog):
    """Two columns, what was set aside and what the file holds, over three buttons; Escape decides later."""

    def __init__(self, look: Look, offer: Offer, parent: QWidget) -> None:
        super().__init__(parent)
        self._look = look
        self.answer = "later"
        self.setWindowTitle(words.OFFER_TITLE)
        column = QVBoxLayout(self)
        column.setContentsMargins(*[look.px(24)] * 4)
        column.setSpacing(look.px(16))
        column.addWidget(Words(look, "body", "ink", words.OFFER_HEAD))
        sides = QHBoxLayout()
        sides.setSpacing(look.px(32))
        sides.addLayout(self._side(words.OFFER_ASIDE, offer.aside), 1)
        if offer.file:
            sides.addLayout(self._side(words.OFFER_FILE, offer.file), 1)
        column.addLayout(sides)
        if offer.notes:
            column.addWidget(Words(look, "body", "muted", "\n".join(offer.notes)))
        self._buttons = QDialogButtonBox()
        roles = QDialogButtonBox.ButtonRole
        self.waits = self._button(words.OFFER_LATER, roles.RejectRole)
        self.deletes = self._button(words.OFFER_DELETE, roles.DestructiveRole)
        self.opens = self._button(words.OFFER_OPEN, roles.AcceptRole) if offer.can_open else None
        (self.opens or self.waits).setDefault(True)
        self._buttons.clicked.connect(self._on_clicked)
        column.addStretch(1)
        column.addWidget(self._buttons)
        self._column = column

    def showEvent(self, event: QShowEvent) -> None:
        width = self._look.px(680)
        self.resize(width, self._column.totalHeightForWidth(width))  # known once every line has its font
        super().showEvent(event)

    def _side(self, head: str, lines: list[str]) -> QVBoxLayout:
        side = QVBoxLayout()
        side.setSpacing(self._look.px(4))
        side.addWidget(Words(self._look, "strong", "ink", head))
        side.addWidget(Words(self._look, "body", "ink", "\n".join(line for line in lines if line)))
        side.addStretch(1)
        return side

    def _button(self, text: str, role: QDialogButtonBox.ButtonRole) -> QPushButton:
        button = self._buttons.addButton(text, role)
        button.setIcon(QIcon())
        button.setAutoDefault(False)
        button.setFocusPolicy(Qt.FocusPolicy.StrongFocus)
        return button

    def _on_clicked(self, button: QPushButton) -> None:
        self.answer = "open" if button is self.opens else "delete" if button is self.deletes else "later"
        self.done(0)
