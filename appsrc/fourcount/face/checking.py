"""When the check of the print is made: at a pause in typing, away from the keyboard; until then the last one stands."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QObject, QTimer, Signal

from fourcount.face.later import Later
from fourcount.face.session import Session
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices

if TYPE_CHECKING:
    from fourcount.appraisal.findings import CheckFindings

CHECK_PAUSE = 150
"""Milliseconds without a key after which the print is checked."""


class Checking(QObject):
    """Asks for the check of the outcome in view, and keeps what it found.

    **Signals**
        changed: what was found is new.
    """

    changed = Signal()

    def __init__(self, session: Session, later: Later, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self._session = session
        self._later = later
        self._asked: tuple[Outcome, Choices] | None = None
        self._answered: tuple[Outcome, Choices] | None = None
        self.found: CheckFindings | None = None
        self._timer = QTimer(self)
        self._timer.setSingleShot(True)
        self._timer.setInterval(CHECK_PAUSE)
        self._timer.timeout.connect(self._on_pause)
        later.checked.connect(self._on_checked)

    def follow(self) -> None:
        """The record changed: check it at the next pause, and forget what was found of a print that is gone."""
        if not self._session.awake:
            return
        outcome, choices = self._session.outcome, self._session.record.choices
        if (outcome, choices) == self._asked:
            return
        if not (outcome.paper_text.strip() or outcome.adjusted_text.strip()):
            self.found = None
        self._asked = (outcome, choices)
        if outcome == Outcome():
            self._timer.stop()
        else:
            self._timer.start()

    def settle(self) -> CheckFindings | None:
        """What the check of the record as it stands now finds; made at once where it was still to come."""
        from fourcount.appraisal.check import check

        now = (self._session.outcome, self._session.record.choices)
        if self._answered != now:
            self._timer.stop()
            self._on_checked(*now, check(*now))
        return self.found

    def _on_pause(self) -> None:
        if self._asked:
            self._later.ask_check(*self._asked)

    def _on_checked(self, outcome: Outcome, choices: Choices, found: CheckFindings) -> None:
        if (outcome, choices) == (self._session.outcome, self._session.record.choices):
            self._answered = (outcome, choices)
            self.found = found
            self.changed.emit()
