"""Going among the outcomes of a paper; adding, copying, moving and removing them are steps that can be undone."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QObject, Signal

from fourcount.face.session import Session
from fourcount.record import editing
from fourcount.record.outcome import Outcome
from fourcount.wording.patient_labels import OUTCOME_REMOVED, OUTCOMES_FULL, outcome_title

if TYPE_CHECKING:
    from PySide6.QtGui import QAction

    from fourcount.record.paper import Record


class OutcomeCommands(QObject):
    """The slots of the outcomes' commands and of their tabs.

    **Signals**
        begun: an outcome with nothing counted is in view; bring the cursor to where it begins.
        told: a short notice of what became of the outcomes. Carries its sentence.
    """

    begun = Signal()
    told = Signal(str)

    def __init__(self, session: Session, parent: QObject) -> None:
        super().__init__(parent)
        self._session = session

    def add(self) -> None:
        """One more outcome of the same study behind the one in view, with the cursor in it."""
        if self._one_more(editing.add_outcome(self._session.record, self._session.view)):
            self.begun.emit()

    def copy(self) -> None:
        """The outcome in view once more, behind itself."""
        self._one_more(editing.copy_outcome(self._session.record, self._session.view))

    def remove(self) -> None:
        """Take out the outcome in view; the last one is only emptied."""
        session = self._session
        name = outcome_title(session.outcome, session.view)
        record = editing.remove_outcome(session.record, session.view)
        if record == session.record:
            return
        session.change_record(record, min(session.view, len(record.outcomes) - 1))
        self.told.emit(OUTCOME_REMOVED.format(name=name))

    def look_at(self, place: int) -> None:
        """Bring the outcome at a place into view."""
        self._session.look_at(place)

    def next(self) -> None:
        """Bring the next outcome into view; behind the last one comes the first."""
        self._session.look_at((self._session.view + 1) % self._count)

    def previous(self) -> None:
        """Bring the previous outcome into view; before the first one comes the last."""
        self._session.look_at((self._session.view - 1) % self._count)

    def move_left(self) -> None:
        """Move the outcome in view one place to the left."""
        self.move_to(self._session.view - 1)

    def move_right(self) -> None:
        """Move the outcome in view one place to the right."""
        self.move_to(self._session.view + 1)

    def move_to(self, place: int) -> None:
        """Move the outcome in view to a place, where there is such a one."""
        session = self._session
        if 0 <= place < self._count:
            session.change_record(editing.move_outcome(session.record, session.view, place), place)

    def show_enabled(self, actions: dict[str, QAction]) -> None:
        """Let those commands be given that would do something."""
        view, count = self._session.view, self._count
        can = {
            "outcome-add": count < editing.MOST_OUTCOMES,
            "outcome-copy": count < editing.MOST_OUTCOMES,
            "outcome-next": count > 1,
            "outcome-previous": count > 1,
            "outcome-left": view > 0,
            "outcome-right": view < count - 1,
            "outcome-remove": count > 1 or self._session.outcome != Outcome(),
        }
        for key, enabled in can.items():
            actions[key].setEnabled(enabled)

    @property
    def _count(self) -> int:
        return len(self._session.record.outcomes)

    def _one_more(self, record: Record) -> bool:
        if len(record.outcomes) == self._count:
            self.told.emit(OUTCOMES_FULL)
            return False
        self._session.change_record(record, self._session.view + 1)
        return True
