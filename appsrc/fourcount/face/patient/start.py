"""How the starting risk is given, and the fields that this way needs: one risk, three, a rate, an overall risk."""

from __future__ import annotations

from collections.abc import Mapping

from PySide6.QtCore import Qt, Signal
from PySide6.QtWidgets import QGridLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.record.outcome import Outcome, StartKind
from fourcount.wording.patient_labels import (
    START_FIELDS,
    START_HEADS,
    START_HINTS,
    START_KIND,
    START_KINDS,
    START_NOTES,
    USUAL_START,
)

OWN = "starting_risk_text"
FIELDS_OF: dict[StartKind, tuple[str, ...]] = {
    "one": (OWN,),
    "three": ("low_risk_text", OWN, "high_risk_text"),
    "rate": ("rate_text",),
    "overall": ("overall_risk_text", "exposed_share_text"),
}
"""The texts that each way of giving the starting risk needs, in reading order."""


class StartFields(FieldsView):
    """Takes the place of the name before the starting risk, and sets the fields beside it; never shown itself.

    **Signals**
        kind_chosen: another way of giving the starting risk was chosen. Carries its key.
    """

    kind_chosen = Signal(object)

    def __init__(self, look: Look, rows: QGridLayout, area: QGridLayout, own: TextField, source: TextField) -> None:
        super().__init__()
        self.hide()
        self._look = look
        self._rows = rows
        self._area = area
        self._source = source
        self._shown: StartKind | None = None
        self._asked_for = True
        self._fields: dict[str, TextField] = {OWN: own}
        self._heads: dict[str, Words] = {}
        self.kind = ChoiceField(look, START_KIND, tuple(START_KINDS.items()), plain=True, notes=START_NOTES)
        self.kind.chosen.connect(self.kind_chosen)
        rows.addWidget(self.kind, 0, 0)
        before = own.previousInFocusChain()
        if before:
            QWidget.setTabOrder(before, self.kind)

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every field made so far."""
        return tuple(self._fields.values())

    @property
    def shown(self) -> tuple[TextField, ...]:
        """The fields of the way chosen, in reading order."""
        return tuple(self._fields[name] for name in FIELDS_OF[self._shown or "one"])

    def show_state(self, outcome: Outcome) -> None:
        """Show the fields of the way chosen, and what stands in them; the share is heard with whose it is."""
        patient, kind = outcome.patient, outcome.patient.start_kind
        if self._shown != kind:
            self._arrange(kind)
        self.kind.show_choice(kind)
        for field in self.shown:
            field.show_text(getattr(patient, field.field))
        if kind == "overall":
            from fourcount.wording.starts import share_name

            self._fields["exposed_share_text"].setAccessibleName(share_name(outcome))

    def show_marks(self, reasons: Mapping[str, str]) -> None:
        """Mark each field that has a reason."""
        for field in self.fields:
            field.show_mark(reasons.get(field.field, ""))

    def ask(self, asked_for: bool) -> None:
        """Ask for a starting risk, or for none where it would come to nothing."""
        if asked_for != self._asked_for:
            self._asked_for = asked_for
            self._arrange(self._shown or "one")

    def _arrange(self, kind: StartKind) -> None:
        """Set the fields of a kind in a line, with a head over each where there are several."""
        focus = next((field for field in self.fields if field.hasFocus()), None)
        names = FIELDS_OF[kind]
        self._shown = kind
        for column, name in enumerate(names):
            self._area.addWidget(self._field(name), 1, column)
            if len(names) > 1:
                self._area.addWidget(self._head(name), 0, column)
        for name, field in self._fields.items():
            field.setVisible(self._asked_for and name in names)
        for name, head in self._heads.items():
            head.setVisible(self._asked_for and len(names) > 1 and name in names)
        self.kind.setVisible(self._asked_for)
        for column in range(3):
            self._area.setColumnStretch(column, 1 if column < len(names) else 0)
        sides = Qt.AlignmentFlag
        self._rows.setAlignment(
            self.kind, sides.AlignLeft | (sides.AlignBottom if len(names) > 1 else sides.AlignVCenter)
        )
        self._fields[OWN].setAccessibleName(USUAL_START if kind == "three" else START_FIELDS[OWN])
        self._chain()
        if focus is not None and focus.field not in names:
            self._fields[names[0]].setFocus(Qt.FocusReason.OtherFocusReason)

    def _chain(self) -> None:
        """Tab goes through what is shown in reading order."""
        before: QWidget = self.kind
        for field in (*self.shown, self._source):
            QWidget.setTabOrder(before, field)
            before = field

    def _field(self, name: str) -> TextField:
        if name not in self._fields:
            field = TextField(self._look, name, START_FIELDS[name], START_HINTS[name], role="total")
            self._pass_on(field)
            self._fields[name] = field
        return self._fields[name]

    def _head(self, name: str) -> Words:
        if name not in self._heads:
            self._heads[name] = Words(self._look, "small", "muted", START_HEADS[name], wraps=False)
        return self._heads[name]
