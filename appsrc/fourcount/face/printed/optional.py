"""Fields that few papers need: absent until a quiet link opens them, and there while they hold something."""

from __future__ import annotations

from PySide6.QtCore import Qt, Signal
from PySide6.QtWidgets import QVBoxLayout, QWidget

from fourcount.face.fields import FieldsView, TextField
from fourcount.face.flow import FlowLayout
from fourcount.face.look import Look
from fourcount.face.printed.optional_rows import ROWS, OptionalRow, holds
from fourcount.face.printed.quiet_link import QuietLink
from fourcount.record.outcome import Form, Outcome, form_of
from fourcount.wording.printed_labels import OPTIONAL

COUNTED = ("counting", "follow-up", "losses", "clusters", "adjusted", "where")
OFFERED: dict[Form, tuple[str, ...]] = {
    "events-and-others": COUNTED,
    "events-of-total": COUNTED,
    "percent-of-total": COUNTED,
    "strata": ("counting", "follow-up", "clusters", "adjusted", "where"),
    "pairs": ("adjusted", "where"),
    "person-time": ("counting", "clusters", "adjusted", "where"),
    "risk-at-time": ("adjusted", "where"),
    "effect-only": ("where",),
}
"""Which links each form offers; a row that holds something is there in every form."""


class OptionalFields(FieldsView):
    """One line of links, and under it the rows that are open.

    **Signals**
        chosen: a choice was made in a row. Carries the field's key and the choice.
    """

    chosen = Signal(str, object)

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._opened: set[str] = set()
        self._outcome = Outcome()
        self._width = 0
        self.rows: dict[str, OptionalRow] = {}
        self.links: dict[str, QuietLink] = {}
        self._column = QVBoxLayout(self)
        self._column.setContentsMargins(0, 0, 0, 0)
        self._flow = FlowLayout(look, gap=12)
        for key, words in OPTIONAL.items():
            self.links[key] = QuietLink(look, key, words)
            self.links[key].opened.connect(self._on_opened)
            self._flow.addWidget(self.links[key])
        self._column.addLayout(self._flow)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every text field of the rows made so far."""
        return tuple(field for row in self.rows.values() for field in row.fields)

    @property
    def last_stop(self) -> QWidget:
        """The last place at which Tab stops here."""
        return [*self.links.values(), *(stop for row in self.rows.values() for stop in row.stops)][-1]

    def show_state(self, outcome: Outcome, width: int | None = None) -> None:
        """Show the rows that hold something or were opened, and links for the others that fit the form."""
        self._width = self._width if width is None else width
        if outcome == Outcome() != self._outcome:
            self._opened.clear()  # another record: what was open in the last one is not opened here
        self._outcome = outcome
        offered = OFFERED[form_of(outcome.table)]
        for key, link in self.links.items():
            shown = holds(key, outcome) or (key in self._opened and key in offered)
            if shown:
                self._row(key).align(self._width)
                self._row(key).show_state(outcome)
            if key in self.rows:
                self.rows[key].setVisible(shown)
            link.setVisible(key in offered)
            link.show_open(shown)

    def show_marks(self, reasons: dict[str, str]) -> None:
        """Mark each field that has a reason."""
        for field in self.fields:
            field.show_mark(reasons.get(field.field, ""))

    def open_for(self, field: str) -> None:
        """Open the row that holds a field, so that the cursor can go there."""
        for key, kind in ROWS.items():
            if field in kind.texts:
                self._opened.add(key)
                self.show_state(self._outcome)

    def _row(self, key: str) -> OptionalRow:
        if key not in self.rows:
            row = OptionalRow(self._look, key)
            row.chosen.connect(self.chosen)
            row.closed.connect(self._on_closed)
            self._pass_on(row)
            later = [other for other in self.rows if list(ROWS).index(other) > list(ROWS).index(key)]
            place = self._column.indexOf(self.rows[later[0]]) if later else self._column.count()
            self._column.insertWidget(place, row)
            self.rows[key] = row
            self.rows = {name: self.rows[name] for name in ROWS if name in self.rows}
            before: QWidget = list(self.links.values())[-1]
            for widget in (stop for part in self.rows.values() for stop in part.stops):
                QWidget.setTabOrder(before, widget)
                before = widget
        return self.rows[key]

    def _on_opened(self, key: str) -> None:
        closed = key not in self.rows or self.rows[key].isHidden()
        self._opened.add(key)
        self.show_state(self._outcome)
        if key == "follow-up" and closed:
            self.chosen.emit("follow_up_varied", True)  # whoever opens it has something else to say than is assumed
        if key in self.rows:
            self.rows[key].stops[0].setFocus(Qt.FocusReason.OtherFocusReason)

    def _on_closed(self, key: str) -> None:
        self._opened.discard(key)
        self.show_state(self._outcome)
        if self.links[key].isVisible():
            self.links[key].setFocus(Qt.FocusReason.OtherFocusReason)

    def _on_look_changed(self) -> None:
        self._column.setSpacing(self._look.px(6))
