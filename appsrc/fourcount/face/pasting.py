"""Pasting a table or a sentence: what it is understood as, taken in one step, or offered where it is not certain."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QObject, Signal
from PySide6.QtGui import QGuiApplication

from fourcount.face.session import Session
from fourcount.record import editing

if TYPE_CHECKING:
    from fourcount.record.entry.readings import Pasted

EFFECT_FIELDS = ("paper_text", "adjusted_text", "adjusted_for_text")
"""Fields in which a printed effect is what belongs there, not a table to fill."""


class Pasting(QObject):
    """Reads what is pasted into the first column.

    **Signals**
        offered: a paste might be understood otherwise; show it before it is taken. Carries the ``Pasted``.
        taken: a paste filled the table.
        noticed: what was filled, or that nothing was. Carries the sentence.
    """

    offered = Signal(object)
    taken = Signal()
    noticed = Signal(str)

    def __init__(self, session: Session, parent: QObject) -> None:
        super().__init__(parent)
        self._session = session

    def take_table(self, field: str, text: str) -> bool:
        """Fill the table from a text that was pasted into a field; False where the text belongs into the field."""
        if len(text.split()) < 2 and "," not in text:
            return False  # one word or one number
        from fourcount.record.entry.paste import read_paste

        pasted = read_paste(text)
        if pasted is None or (pasted.form == "effect-only" and field in EFFECT_FIELDS):
            return False
        self._offer_or_take(pasted)
        return True

    def paste(self) -> None:
        """Fill the table from the clipboard, wherever the cursor is."""
        from fourcount.record.entry.paste import read_paste
        from fourcount.wording.printed_labels import NO_TABLE_PASTED

        pasted = read_paste(QGuiApplication.clipboard().text())
        if pasted is None:
            self.noticed.emit(NO_TABLE_PASTED)
        else:
            self._offer_or_take(pasted)

    def take(self, pasted: Pasted) -> None:
        """Fill the table with what was understood, and say what was filled."""
        from fourcount.wording.pasted import filled

        before = self._session.outcome
        self._session.change_outcome(editing.take_paste(before, pasted))
        self.taken.emit()
        self.noticed.emit(filled(before, self._session.outcome))

    def _offer_or_take(self, pasted: Pasted) -> None:
        if pasted.ambiguous:
            self.offered.emit(pasted)
        else:
            self.take(pasted)
