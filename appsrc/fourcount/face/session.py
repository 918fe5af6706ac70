"""The record in the window, its past and its future. Every change and every undo takes the same path."""

from __future__ import annotations

from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import QObject, Signal

from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings

RECORD_FIELDS = ("title_text", "source_text")


class Step(NamedTuple):
    """A state to go back to, and the field that had been changed after it ("" for a command)."""

    record: Record
    field: str


class Session(QObject):
    """Holds the record; a change makes a new record, the findings follow, one signal reaches every view.

    A run of typing in one field is one step back, until the field loses focus.

    **Signals**
        changed: the record or its findings are new. Carries both; the findings are None until the first
            appraisal, which waits for the first paint.
        focus_wanted: an undo or a redo changed this field; bring the cursor back to it.
    """

    changed = Signal(object, object)
    focus_wanted = Signal(str)

    def __init__(self, record: Record | None = None, parent: QObject | None = None) -> None:
        super().__init__(parent)
        self.record = record or Record()
        self.findings: OutcomeFindings | None = None
        self._appraised: tuple[Outcome, Choices] | None = None
        self.view = 0
        self.awake = False
        self._past: list[Step] = []
        self._future: list[Step] = []
        self._run = ""

    @property
    def outcome(self) -> Outcome:
        """The outcome in view."""
        return self.record.outcomes[self.view]

    @property
    def can_undo(self) -> bool:
        return bool(self._past)

    @property
    def can_redo(self) -> bool:
        return bool(self._future)

    def wake(self) -> None:
        """Appraise from now on: called once the window has painted, so that the first paint waits for nothing."""
        if not self.awake:
            self.awake = True
            self.announce()

    def edit_text(self, field: str, text: str) -> None:
        """Take the text of a field at a keystroke."""
        from fourcount.record import editing  # no first paint needs it

        if field in RECORD_FIELDS:
            record = editing.edit_record_text(self.record, field, text)
        else:
            record = self._with(editing.edit_text(self.outcome, field, text))
        if record == self.record:
            return
        if self._run != field:
            self._past.append(Step(self.record, field))
            self._run = field
        self._take(record)

    def end_run(self, field: str) -> None:
        """Close the run of typing in a field that lost focus."""
        if self._run == field:
            self._run = ""

    def change_outcome(self, outcome: Outcome) -> None:
        """Take a new outcome in view, as one step."""
        self.change_record(self._with(outcome))

    def change_record(self, record: Record) -> None:
        """Take a new record, as one step; nothing happens if it is equal."""
        if record != self.record:
            self._past.append(Step(self.record, ""))
            self._run = ""
            self._take(record)

    def undo(self) -> None:
        """Show the state before the last step."""
        self._travel(self._past, self._future)

    def redo(self) -> None:
        """Show the state after the step that was last undone."""
        self._travel(self._future, self._past)

    def announce(self) -> None:
        """Appraise the outcome in view and tell every view."""
        if self.awake:
            self._appraise()
        self.changed.emit(self.record, self.findings)

    def _appraise(self) -> None:
        """Appraise what has changed; whole findings of an unchanged outcome stay."""
        from fourcount.appraisal.appraise import appraise
        from fourcount.appraisal.waiting import waits

        asked = (self.outcome, self.record.choices)
        if self.findings is None or asked != self._appraised or waits(self.findings):
            self._appraised = asked
            self.findings = appraise(*asked, deferring=True)

    def settle(self) -> None:
        """Compute at once whatever was to follow: what is copied holds every figure."""
        from fourcount.appraisal.appraise import appraise
        from fourcount.appraisal.waiting import waits

        if self.findings is not None and waits(self.findings):
            self.take_findings(self.outcome, appraise(self.outcome, self.record.choices))

    def take_findings(self, outcome: Outcome, findings: OutcomeFindings) -> None:
        """Take figures that followed later, unless the table has changed meanwhile."""
        if outcome == self.outcome:
            self.findings = findings
            self.changed.emit(self.record, findings)

    def _with(self, outcome: Outcome) -> Record:
        from fourcount.record import editing

        return editing.with_outcome(self.record, self.view, outcome)

    def _take(self, record: Record) -> None:
        self._future.clear()
        self.record = record
        self.announce()

    def _travel(self, source: list[Step], target: list[Step]) -> None:
        if not source:
            return
        self._run = ""
        step = source.pop()
        target.append(Step(self.record, step.field))
        self.record = step.record
        self.announce()
        if step.field:
            self.focus_wanted.emit(step.field)
