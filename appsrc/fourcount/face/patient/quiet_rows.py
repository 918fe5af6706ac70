"""Fields that few patients need: absent until a quiet link opens them, and there while they hold something."""

from __future__ import annotations

from collections.abc import Mapping
from typing import NamedTuple

from PySide6.QtCore import Qt, Signal
from PySide6.QtWidgets import QGridLayout, QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.flow import FlowLayout
from fourcount.face.look import Look
from fourcount.face.printed.quiet_link import QuietLink
from fourcount.face.text import Words
from fourcount.record.outcome import Outcome
from fourcount.wording.patient_labels import (
    CERTAINTIES,
    ON_HANDOUT,
    QUIET,
    QUIET_FIELDS,
    QUIET_HINTS,
    QUIET_NAMES,
)
from fourcount.wording.printed_labels import CLOSE_FIELDS


class Kind(NamedTuple):
    """A row's text fields, or its choice: the outcome's field and what it offers."""

    texts: tuple[str, ...] = ()
    choice: str = ""
    choices: tuple[tuple[object, str], ...] = ()


ROWS: dict[str, Kind] = {
    "span": Kind(texts=("other_span_text",)),
    "words": Kind(texts=("plain_event_text", "plain_other_text")),
    "certainty": Kind(choice="certainty", choices=tuple(CERTAINTIES.items())),
    "handout": Kind(choice="on_handout", choices=tuple(ON_HANDOUT.items())),
}
EMPTY = Outcome()
OF_PATIENT = ("other_span_text",)


def value(outcome: Outcome, name: str) -> object:
    """What a field holds, in the outcome or its patient."""
    return getattr(outcome.patient if name in OF_PATIENT else outcome, name)


def holds(key: str, outcome: Outcome) -> bool:
    """Whether a row's fields hold anything but what an empty outcome has."""
    kind = ROWS[key]
    names = (*kind.texts, *((kind.choice,) if kind.choice else ()))
    return any(value(outcome, name) != value(EMPTY, name) for name in names)


class QuietRow(FieldsView):
    """Name, fields, and a way to close it while it is empty.

    **Signals**
        chosen: a choice was made. Carries the outcome's field and the choice.
        closed: the row is to be closed. Carries its key.
    """

    chosen = Signal(str, object)
    closed = Signal(str)

    def __init__(self, look: Look, key: str) -> None:
        super().__init__()
        self._look = look
        self._key = key
        kind = ROWS[key]
        self.choice: ChoiceField | None = None
        if kind.choice:
            self.choice = ChoiceField(look, QUIET_FIELDS[kind.choice], kind.choices)
            self.choice.chosen.connect(self._on_chosen)
        self.fields = tuple(TextField(look, text, QUIET_FIELDS[text], QUIET_HINTS.get(text, "")) for text in kind.texts)
        self._name = Words(look, "body", "muted", QUIET_NAMES[key], wraps=False)
        if self.choice:
            self._name.name_of(self.choice)
        self.close_link = QuietLink(look, key, "×", CLOSE_FIELDS.format(name=QUIET[key]))
        self.close_link.opened.connect(self.closed)
        policy = self.close_link.sizePolicy()
        policy.setRetainSizeWhenHidden(True)  # nothing moves while somebody types
        self.close_link.setSizePolicy(policy)
        self._layout = QGridLayout(self)
        self._layout.setContentsMargins(0, 0, 0, 0)
        self._layout.setColumnStretch(1, 1)
        self._layout.addWidget(self._name, 0, 0)
        for line, widget in enumerate((*((self.choice,) if self.choice else ()), *self.fields)):
            self._layout.addWidget(widget, line, 1)
        self._layout.addWidget(self.close_link, 0, 2, Qt.AlignmentFlag.AlignRight)
        self._pass_on(*self.fields)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    @property
    def stops(self) -> tuple[QWidget, ...]:
        """What Tab stops at, in order."""
        return (*((self.choice,) if self.choice else ()), *self.fields, self.close_link)

    def show_state(self, outcome: Outcome) -> None:
        """Show what was typed and chosen."""
        if self.choice:
            self.choice.show_choice(value(outcome, ROWS[self._key].choice))
        for field in self.fields:
            field.show_text(str(value(outcome, field.field)))
        if self._key == "words":
            self._show_plain_hints(outcome)
        if self._key == "span":
            span = " ".join(outcome.span_text.split())
            known = QUIET_HINTS["other_span_known"].format(span=span)
            self.fields[0].setPlaceholderText(known if span else QUIET_HINTS["other_span_text"])
        self.close_link.setVisible(not holds(self._key, outcome))

    def align(self, width: int) -> None:
        """Give the name the width that names have in the rows above."""
        self._layout.setColumnMinimumWidth(0, width)

    def _show_plain_hints(self, outcome: Outcome) -> None:
        """An empty field shows what a patient is told without it."""
        from fourcount.wording.plain import plain_hint

        self.fields[0].setPlaceholderText(plain_hint(outcome, "left"))
        self.fields[1].setPlaceholderText(plain_hint(outcome, "right"))

    def _on_chosen(self, choice: object) -> None:
        self.chosen.emit(ROWS[self._key].choice, choice)

    def _on_look_changed(self) -> None:
        self._layout.setHorizontalSpacing(self._look.px(12))
        self._layout.setVerticalSpacing(self._look.px(2))


class QuietRows(FieldsView):
    """One line of links, and the rows that are open: under it, or at home among the fields they belong to.

    **Signals**
        chosen: a choice was made in a row. Carries the field's key and the choice.
        made: a row was made, and wants its place in the order of Tab.
    """

    chosen = Signal(str, object)
    made = Signal()

    def __init__(self, look: Look, homes: Mapping[str, QVBoxLayout]) -> None:
        super().__init__()
        self._look = look
        self._homes = homes
        self._opened: set[str] = set()
        self._outcome = EMPTY
        self._width = 0
        self.rows: dict[str, QuietRow] = {}
        self.links: dict[str, QuietLink] = {}
        self._column = QVBoxLayout(self)
        self._column.setContentsMargins(0, 0, 0, 0)
        flow = FlowLayout(look, gap=12)
        for key, words in QUIET.items():
            self.links[key] = QuietLink(look, key, words)
            self.links[key].opened.connect(self._on_opened)
            flow.addWidget(self.links[key])
        self._column.addLayout(flow)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every text field of the rows made so far."""
        return tuple(field for row in self.rows.values() for field in row.fields)

    @property
    def stops(self) -> tuple[QWidget, ...]:
        """What Tab stops at here, in order."""
        here = (row for key, row in self.rows.items() if key not in self._homes)
        return (*self.links.values(), *(stop for row in here for stop in row.stops))

    @property
    def stops_at_home(self) -> tuple[QWidget, ...]:
        """What Tab stops at in rows that stand elsewhere, in order."""
        return tuple(stop for key, row in self.rows.items() if key in self._homes for stop in row.stops)

    def show_state(self, outcome: Outcome, width: int) -> None:
        """Show the rows that hold something or were opened, their names as wide as those of the fields above."""
        self._width = width
        if outcome == EMPTY != self._outcome:
            self._opened.clear()  # another record: what was open in the last one is not opened here
        self._outcome = outcome
        for key, link in self.links.items():
            shown = holds(key, outcome) or key in self._opened
            if shown:
                self._row(key).align(width)
                self._row(key).show_state(outcome)
            if key in self.rows:
                self.rows[key].setVisible(shown)
            link.show_open(shown)

    def show_marks(self, reasons: Mapping[str, str]) -> None:
        """Mark each field that has a reason."""
        for field in self.fields:
            field.show_mark(reasons.get(field.field, ""))

    def open_for(self, name: str) -> TextField | None:
        """The field with a name, its row opened; None where no row here has it."""
        for key, kind in ROWS.items():
            if name in kind.texts:
                self._opened.add(key)
                self.show_state(self._outcome, self._width)
                return next(field for field in self.rows[key].fields if field.field == name)
        return None

    def _row(self, key: str) -> QuietRow:
        if key not in self.rows:
            row = QuietRow(self._look, key)
            row.chosen.connect(self.chosen)
            row.closed.connect(self._on_closed)
            self._pass_on(row)
            made = {**self.rows, key: row}
            self.rows = {name: made[name] for name in ROWS if name in made}
            if key in self._homes:
                self._homes[key].addWidget(row)
            else:
                here = [name for name in self.rows if name not in self._homes]
                self._column.insertWidget(here.index(key) + 1, row)
            self.made.emit()
        return self.rows[key]

    def _on_opened(self, key: str) -> None:
        self._opened.add(key)
        self.show_state(self._outcome, self._width)
        self.rows[key].stops[0].setFocus(Qt.FocusReason.OtherFocusReason)

    def _on_closed(self, key: str) -> None:
        self._opened.discard(key)
        self.show_state(self._outcome, self._width)
        self.links[key].setFocus(Qt.FocusReason.OtherFocusReason)

    def _on_look_changed(self) -> None:
        self._column.setSpacing(self._look.px(4))
