"""Fields that few patients need, in the third column."""

from __future__ import annotations

from collections.abc import Mapping

from PySide6.QtCore import Qt, Signal
from PySide6.QtWidgets import QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import TextField
from fourcount.face.look import Look
from fourcount.face.rows_on_demand import EMPTY, Kind, RowOnDemand, RowsOnDemand, value
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

ROWS: dict[str, Kind] = {
    "span": Kind(texts=("other_span_text",)),
    "words": Kind(texts=("plain_event_text", "plain_other_text")),
    "certainty": Kind(choice="certainty", choices=tuple(CERTAINTIES.items())),
    "handout": Kind(choice="on_handout", choices=tuple(ON_HANDOUT.items())),
}


def holds(key: str, outcome: Outcome) -> bool:
    """Whether a row's fields hold anything but what an empty outcome has."""
    kind = ROWS[key]
    names = (*kind.texts, *((kind.choice,) if kind.choice else ()))
    return any(value(outcome, name) != value(EMPTY, name) for name in names)


class QuietRow(RowOnDemand):
    """A name, and the choice and the fields under one another."""

    def __init__(self, look: Look, key: str) -> None:
        kind = ROWS[key]
        super().__init__(look, key, kind, QUIET[key], holds)
        name = Words(look, "body", "muted", QUIET_NAMES[key], wraps=False)
        if kind.choice:
            self.choice = ChoiceField(look, QUIET_FIELDS[kind.choice], kind.choices)
            self.choice.chosen.connect(self._on_chosen)
            name.name_of(self.choice)
        self.fields = tuple(TextField(look, text, QUIET_FIELDS[text], QUIET_HINTS.get(text, "")) for text in kind.texts)
        self._layout.addWidget(name, 0, 0)
        for line, widget in enumerate(self.stops[:-1]):
            self._layout.addWidget(widget, line, 1)
        self._layout.addWidget(self.close_link, 0, 2, Qt.AlignmentFlag.AlignRight)
        self._pass_on(*self.fields)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_state(self, outcome: Outcome) -> None:
        """Show what was typed and chosen."""
        super().show_state(outcome)
        if self._key == "words":
            self._show_plain_hints(outcome)
        if self._key == "span":
            span = " ".join(outcome.span_text.split())
            known = QUIET_HINTS["other_span_known"].format(span=span)
            self.fields[0].setPlaceholderText(known if span else QUIET_HINTS["other_span_text"])

    def _show_plain_hints(self, outcome: Outcome) -> None:
        """An empty field shows what a patient is told without it."""
        from fourcount.wording.plain import plain_hint

        self.fields[0].setPlaceholderText(plain_hint(outcome, "left"))
        self.fields[1].setPlaceholderText(plain_hint(outcome, "right"))

    def _on_look_changed(self) -> None:
        self._layout.setHorizontalSpacing(self._look.px(12))
        self._layout.setVerticalSpacing(self._look.px(2))


class QuietRows(RowsOnDemand):
    """One line of links, and the rows that are open: under it, or at home among the fields they belong to.

    **Signals**
        made: a row was made, and wants its place in the order of Tab.
    """

    made = Signal()

    def __init__(self, look: Look, homes: Mapping[str, QVBoxLayout]) -> None:
        self._homes = homes
        super().__init__(look, ROWS, QUIET, QuietRow, holds, spacing=4, gap=12)

    @property
    def stops(self) -> tuple[QWidget, ...]:
        """What Tab stops at here, in order."""
        here = (row for key, row in self.rows.items() if key not in self._homes)
        return (*self.links.values(), *(stop for row in here for stop in row.stops))

    @property
    def stops_at_home(self) -> tuple[QWidget, ...]:
        """What Tab stops at in rows that stand elsewhere, in order."""
        return tuple(stop for key, row in self.rows.items() if key in self._homes for stop in row.stops)

    def _place(self, key: str, row: RowOnDemand) -> None:
        if key in self._homes:
            self._homes[key].addWidget(row)
        else:
            here = [name for name in self.rows if name not in self._homes]
            self._column.insertWidget(here.index(key) + 1, row)
        self.made.emit()
