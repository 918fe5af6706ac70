"""The record in the window, its past and its future. Every change and every undo takes the same path."""

from __future__ import annotations

from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import QObject, Signal

from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record

if TYPE_CHECKING:
    from pathlib import Path

    from fourcount.appraisal.findings import OutcomeFindings

RECORD_FIELDS = ("title_text", "source_text")


class Document:
    """Where a record is kept: its file, what stands in it as far as is known, and the record as saved there.

    ``path`` is None while there is no file; ``digest`` is of the bytes last read or written, "" while there are none;
    ``saved`` is what a new record began with until there is a file, and None where the file cannot be read any more.
    """

    def __init__(self, saved: Record | None, path: Path | None = None, digest: str = "") -> None:
        self.saved = saved
        self.path = path
        self.digest = digest


class Step(NamedTuple):
    """A state to go back or forth to, and where the change between it and its neighbour was made.

    ``field`` is the one that was typed into ("" for a command). ``before`` and ``after`` are the outcomes in view on
    either side of the change, None where it was no outcome's but the paper's: then the view stays where it is.
    ``document`` is where the state's record is kept, since a new table is a step too.
    """

    record: Record
    field: str
    before: int | None
    after: int | None
    document: Document


class Session(QObject):
    """Holds the record; a change makes a new record, the findings follow, one signal reaches every view.

    A run of typing in one field is one step back, until the field loses focus. Which outcome is in view is the
    window's own and no step; an undo or a redo brings the outcome into view that it changes.

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
        self.document = Document(self.record)
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

    @property
    def unsaved(self) -> bool:
        """Whether closing would lose something: choices of intervals alone are remembered without a file."""
        document, record = self.document, self.record
        if record == document.saved:
            return False
        if document.path is not None or document.saved is None or record.choices == document.saved.choices:
            return True
        from fourcount.record import editing

        return editing.with_choices(record, document.saved.choices) != document.saved

    def wake(self) -> None:
        """Appraise from now on: called once the window has painted, so that the first paint waits for nothing."""
        if not self.awake:
            self.awake = True
            self.announce()

    def edit_text(self, field: str, text: str) -> None:
        """Take the text of a field at a keystroke."""
        from fourcount.record import editing  # no first paint needs it

        place = None if field in RECORD_FIELDS else self.view
        if place is None:
            record = editing.edit_record_text(self.record, field, text)
        else:
            record = self._with(editing.edit_text(self.outcome, field, text))
        if record == self.record:
            return
        if self._run != field:
            self._past.append(Step(self.record, field, place, place, self.document))
            self._run = field
        self._take(record)

    def end_run(self, field: str | None = None) -> None:
        """Close the run of typing in a field that lost focus, or any run, since the record is saved as it is now."""
        if field is None or self._run == field:
            self._run = ""

    def change_outcome(self, outcome: Outcome) -> None:
        """Take a new outcome in view, as one step."""
        self.change_record(self._with(outcome))

    def change_record(self, record: Record, view: int | None = None, document: Document | None = None) -> None:
        """Take a new record, as one step, and bring an outcome into view; nothing happens if both are as they were.

        Without a place the view stays where no other outcome has changed, and goes to the first one otherwise. With a
        document the record is another paper's.
        """
        anew = document is not None and (self.document.path is not None or self.document.saved != document.saved)
        if record == self.record and not anew:
            self.look_at(self.view if view is None else view)
            return
        after = _checked(record, self._place_in(record) if view is None else view)
        of_an_outcome = record.outcomes != self.record.outcomes or after != self.view
        before, there = (self.view, after) if of_an_outcome else (None, None)
        self._past.append(Step(self.record, "", before, there, self.document))
        self._run = ""
        self.document = document or self.document
        self.view = after
        self._take(record)

    def begin(self, record: Record, document: Document) -> None:
        """Take the record of another file, with neither past nor future."""
        self._past.clear()
        self._future.clear()
        self._run, self.view = "", 0
        self.record, self.document = record, document
        self.announce()

    def look_at(self, place: int) -> None:
        """Bring another outcome into view; this ends a run of typing and is no step."""
        if _checked(self.record, place) != self.view:
            self.view = place
            self._run = ""
            self.announce()

    def undo(self) -> None:
        """Show the state before the last step, and the outcome that the step changed."""
        if self._past:
            self._travel(self._past, self._future, self._past[-1].before)

    def redo(self) -> None:
        """Show the state after the step that was last undone, and the outcome that it changes."""
        if self._future:
            self._travel(self._future, self._past, self._future[-1].after)

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

    def _place_in(self, record: Record) -> int:
        """The place in view where the other outcomes of a new record are those of the present one, else the first."""
        before, after = list(self.record.outcomes), list(record.outcomes)
        if len(before) != len(after):
            return 0
        del before[self.view], after[self.view]
        return self.view if before == after else 0

    def _take(self, record: Record) -> None:
        self._future.clear()
        self.record = record
        self.announce()

    def _travel(self, source: list[Step], target: list[Step], view: int | None) -> None:
        self._run = ""
        step = source.pop()
        target.append(step._replace(record=self.record, document=self.document))
        self.record, self.document = step.record, step.document
        self.view = self.view if view is None else view
        self.announce()
        if step.field:
            self.focus_wanted.emit(step.field)


def _checked(record: Record, place: int) -> int:
    """The place, where the record has an outcome there."""
    if not 0 <= place < len(record.outcomes):
        raise IndexError(f"the record has no outcome at {place}")
    return place
