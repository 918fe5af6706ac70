"""The questions about files, one function each: where, whether to save, whether to write over, what to recover."""

from __future__ import annotations

from typing import TYPE_CHECKING, Literal

from PySide6.QtCore import Qt
from PySide6.QtWidgets import QFileDialog, QMessageBox, QWidget

from fourcount.wording import keeping as words

if TYPE_CHECKING:
    from fourcount.face.look import Look
    from fourcount.face.recovering import Offer

Losing = Literal["save", "discard", "cancel"]
Over = Literal["over", "other", "cancel"]


def ask_open_path(parent: QWidget, folder: str) -> str:
    """Ask which file to open; "" where none was chosen."""
    filters = f"{words.FILE_FILTER};;{words.ANY_FILTER}"
    return QFileDialog.getOpenFileName(parent, words.OPEN_TITLE, folder, filters)[0]


def ask_save_path(parent: QWidget, suggested: str) -> str:
    """Ask where to save; "" where nothing was chosen."""
    return QFileDialog.getSaveFileName(parent, words.SAVE_TITLE, suggested, words.FILE_FILTER)[0]


def ask_losing(parent: QWidget, name: str) -> Losing:
    """Ask whether to save before something unsaved goes; Enter saves and Escape stays."""
    box = _box(parent, words.LOSING_TITLE, words.LOSING_QUESTION.format(name=name), words.LOSING_DETAIL)
    buttons = QMessageBox.StandardButton
    save, discard = box.addButton(buttons.Save), box.addButton(buttons.Discard)
    cancel = box.addButton(buttons.Cancel)
    box.setDefaultButton(save)
    box.setEscapeButton(cancel)
    box.exec()
    clicked = box.clickedButton()
    box.deleteLater()
    return "save" if clicked is save else "discard" if clicked is discard else "cancel"


def ask_over(parent: QWidget, name: str) -> Over:
    """Ask what to do where the file holds something that this window has never seen."""
    box = _box(parent, words.OVER_TITLE, words.OVER_QUESTION.format(name=name), words.OVER_DETAIL)
    over = box.addButton(words.OVER_YES, QMessageBox.ButtonRole.DestructiveRole)
    other = box.addButton(words.OVER_AS, QMessageBox.ButtonRole.AcceptRole)
    cancel = box.addButton(QMessageBox.StandardButton.Cancel)
    box.setDefaultButton(other)
    box.setEscapeButton(cancel)
    box.exec()
    clicked = box.clickedButton()
    box.deleteLater()
    return "over" if clicked is over else "other" if clicked is other else "cancel"


def ask_replace(parent: QWidget, name: str) -> bool:
    """Ask whether a file may be written over whose name only a suffix of ours has made."""
    box = _box(parent, words.EXISTS_TITLE, words.EXISTS_QUESTION.format(name=name), words.EXISTS_DETAIL)
    over = box.addButton(words.OVER_YES, QMessageBox.ButtonRole.DestructiveRole)
    cancel = box.addButton(QMessageBox.StandardButton.Cancel)
    box.setDefaultButton(cancel)
    box.setEscapeButton(cancel)
    box.exec()
    agreed = box.clickedButton() is over
    box.deleteLater()
    return agreed


def ask_recover(look: Look, parent: QWidget, offer: Offer) -> str:
    """Offer what was set aside beside what its file holds: "open", "delete" or "later"."""
    from fourcount.face.recovering import RecoverDialog

    dialog = RecoverDialog(look, offer, parent)
    dialog.exec()
    answer = dialog.answer
    dialog.deleteLater()
    return answer


def _box(parent: QWidget, title: str, question: str, detail: str) -> QMessageBox:
    """A question in plain text, whatever a file is called."""
    box = QMessageBox(parent)
    box.setTextFormat(Qt.TextFormat.PlainText)
    box.setWindowTitle(title)
    box.setText(question)
    box.setInformativeText(detail)
    return box
