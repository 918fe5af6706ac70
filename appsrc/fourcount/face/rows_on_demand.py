"""Rows of fields that few readers need: absent until a quiet link opens them, and there while they hold something."""

from __future__ import annotations

from collections.abc import Callable, Mapping, Sequence
from typing import NamedTuple

from PySide6.QtCore import Qt, Signal
from PySide6.QtWidgets import QGridLayout, QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.flow import FlowLayout
from fourcount.face.look import Look
from fourcount.face.printed.quiet_link import QuietLink
from fourcount.record.outcome import Outcome, Patient
from fourcount.wording.printed_labels import CLOSE_FIELDS

EMPTY = Outcome()


class Kind(NamedTuple):
    """A row's text fields, and its choice: the outcome's field and what it offers."""

    texts: tuple[str, ...] = ()
    choice: str = ""
    choices: tuple[tuple[object, str], ...] = ()


Holds = Callable[[str, Outcome], bool]
"""Whether a row's fields hold anything but what an empty outcome has, by the row's key."""


def value(outcome: Outcome, name: str) -> object:
    """What a field holds, in the outcome or its patient."""
    return getattr(outcome.patient if name in Patient.__struct_fields__ else outcome, name)


class RowOnDemand(FieldsView):
    """Name, fields, and a way to close it while it is empty.

    **Signals**
        chosen: a choice was made. Carries the outcome's field and the choice.
        closed: the row is to be closed. Carries its key.
    """

    chosen = Signal(str, object)
    closed = Signal(str)

    def __init__(self, look: Look, key: str, kind: Kind, name: str, holds: Holds) -> None:
        super().__init__()
        self._look = look
        self._key = key
        self._kind = kind
        self._holds = holds
        self.choice: ChoiceField | None = None
        self.fields: tuple[TextField, ...] = ()
        self.close_link = QuietLink(look, key, "×", CLOSE_FIELDS.format(name=name))
        self.close_link.opened.connect(self.closed)
        policy = self.close_link.sizePolicy()
        policy.setRetainSizeWhenHidden(True)  # nothing moves while somebody types
        self.close_link.setSizePolicy(policy)
        self._layout = QGridLayout(self)
        self._layout.setContentsMargins(0, 0, 0, 0)
        self._layout.setColumnStretch(1, 1)

    @property
    def stops(self) -> tuple[QWidget, ...]:
        """What Tab stops at, in order."""
        return (*((self.choice,) if self.choice else ()), *self.fields, self.close_link)

    def show_state(self, outcome: Outcome) -> None:
        """Show what was typed and chosen."""
        if self.choice:
            self.choice.show_choice(value(outcome, self._kind.choice))
        for field in self.fields:
            field.show_text(str(value(outcome, field.field)))
        self.close_link.setVisible(not self._holds(self._key, outcome))

    def align(self, width: int) -> None:
        """Give the name the width that names have in the rows above."""
        self._layout.setColumnMinimumWidth(0, width)

    def _on_chosen(self, choice: object) -> None:
        self.chosen.emit(self._kind.choice, choice)


class RowsOnDemand(FieldsView):
    """One line of links, and the rows that are open; ``make`` makes a row by its key.

    **Signals**
        chosen: a choice was made in a row. Carries the field's key and the choice.
    """

    chosen = Signal(str, object)

    def __init__(
        self,
        look: Look,
        kinds: Mapping[str, Kind],
        links: Mapping[str, str],
        make: Callable[[Look, str], RowOnDemand],
        holds: Holds,
        spacing: int,
        gap: int = 16,
    ) -> None:
        super().__init__()
        self._look = look
        self._kinds = kinds
        self._make = make
        self._holds = holds
        self._spacing = spacing
        self._opened: set[str] = set()
        self._outcome = EMPTY
        self._width = 0
        self.rows: dict[str, RowOnDemand] = {}
        self.links: dict[str, QuietLink] = {}
        self._column = QVBoxLayout(self)
        self._column.setContentsMargins(0, 0, 0, 0)
        line = FlowLayout(look, gap=gap)
        for key, words in links.items():
            self.links[key] = QuietLink(look, key, words)
            self.links[key].opened.connect(self._on_opened)
            line.addWidget(self.links[key])
        self._column.addLayout(line)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every text field of the rows made so far."""
        return tuple(field for row in self.rows.values() for field in row.fields)

    def show_state(self, outcome: Outcome, width: int | None = None) -> None:
        """Show the rows that hold something or were opened, their names as wide as those of the fields above."""
        self._width = self._width if width is None else width
        if outcome == EMPTY != self._outcome:
            self._opened.clear()  # another record: what was open in the last one is not opened here
        self._outcome = outcome
        offered = self._offered(outcome)
        for key, link in self.links.items():
            shown = self._holds(key, outcome) or (key in self._opened and key in offered)
            if shown:
                row = self._row(key)
                row.align(self._width)
                row.show_state(outcome)
            if key in self.rows:
                self.rows[key].setVisible(shown)
            link.setVisible(key in offered)
            link.show_open(shown)

    def show_marks(self, reasons: Mapping[str, str]) -> None:
        """Mark each field that has a reason."""
        for field in self.fields:
            field.show_mark(reasons.get(field.field, ""))

    def open_for(self, name: str) -> TextField | None:
        """The field with a name, its row opened; None where no row here has it, or none can be opened."""
        for key, kind in self._kinds.items():
            if name in kind.texts:
                self._opened.add(key)
                self.show_state(self._outcome)
        return next((field for field in self.fields if field.field == name), None)

    def _offered(self, outcome: Outcome) -> Sequence[str]:
        """The rows that can be opened; one that holds something is there all the same."""
        return tuple(self._kinds)

    def _place(self, key: str, row: RowOnDemand) -> None:
        """Put a new row where it stands."""
        here = list(self.rows)
        self._column.insertWidget(here.index(key) + 1, row)

    def _row(self, key: str) -> RowOnDemand:
        if key not in self.rows:
            row = self._make(self._look, key)
            row.chosen.connect(self.chosen)
            row.closed.connect(self._on_closed)
            self._pass_on(row)
            made = {**self.rows, key: row}
            self.rows = {name: made[name] for name in self._kinds if name in made}
            self._place(key, row)
        return self.rows[key]

    def _on_opened(self, key: str) -> None:
        self._opened.add(key)
        self.show_state(self._outcome)
        if key in self.rows:
            self.rows[key].stops[0].setFocus(Qt.FocusReason.OtherFocusReason)

    def _on_closed(self, key: str) -> None:
        self._opened.discard(key)
        self.show_state(self._outcome)
        if self.links[key].isVisible():
            self.links[key].setFocus(Qt.FocusReason.OtherFocusReason)

    def _on_look_changed(self) -> None:
        self._column.setSpacing(self._look.px(self._spacing))
