"""What the paper itself prints as its result: how it calls it, and the figures as one line of text."""

from __future__ import annotations

from PySide6.QtCore import Signal
from PySide6.QtGui import QResizeEvent
from PySide6.QtWidgets import QGridLayout, QHBoxLayout

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.ink.typeset import bounded
from fourcount.record.outcome import Outcome, Position
from fourcount.wording import labels
from fourcount.wording.printed_labels import COMPARED_HINTS, COMPARED_WITH, COMPARING, PAPER_MEASURES

SLACK = 24
"""A text on its own line goes back only when it leaves so much room, or it would jump at every key."""


class PaperSays(FieldsView):
    """One line, and for a result without counts a second one: what it is adjusted for.

    **Signals**
        measure_chosen: what the paper calls its result was chosen. Carries the key.
    """

    measure_chosen = Signal(object)

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._long = False
        self.name = Words(look, "body", "muted", labels.FIELDS["paper"], wraps=False)
        self.measure = ChoiceField(look, labels.FIELDS["paper_measure"], tuple(PAPER_MEASURES.items()), snug=True)
        self.text = TextField(look, "paper_text", labels.FIELDS["paper_text"], labels.HINTS["paper_text"])
        self.adjusted_name = Words(look, "body", "muted", labels.FIELDS["adjusted_for_text"], wraps=False)
        self.adjusted = TextField(
            look, "adjusted_for_text", labels.FIELDS["adjusted_for_text"], labels.HINTS["adjusted_for_text"]
        )
        self.compared_name = Words(look, "body", "muted", COMPARING, wraps=False)
        self.groups = {
            position: TextField(
                look, f"{position}_label_text", labels.FIELDS["label"].format(group=name), COMPARED_HINTS[position]
            )
            for position, name in labels.GROUP_NAMES.items()
        }
        self.compared_with = Words(look, "body", "muted", COMPARED_WITH, wraps=False)
        self._rows = QGridLayout(self)
        self._rows.setContentsMargins(0, 0, 0, 0)
        self._rows.setColumnStretch(1, 1)
        self._line = QHBoxLayout()
        self._line.addWidget(self.measure)
        self._line.addWidget(self.text, 1)
        self._line.addStretch(0)  # holds the measure at the left where the text stands on its own line
        self.name.name_of(self.measure)
        self.adjusted_name.name_of(self.adjusted)
        self._rows.addWidget(self.name, 0, 0)
        self._rows.addLayout(self._line, 0, 1)
        self._rows.addWidget(self.adjusted_name, 2, 0)
        self._rows.addWidget(self.adjusted, 2, 1)
        self._compared = QHBoxLayout()
        self._compared.addWidget(self.groups["first"], 1)
        self._compared.addWidget(self.compared_with)
        self._compared.addWidget(self.groups["second"], 1)
        self._rows.addWidget(self.compared_name, 3, 0)
        self._rows.addLayout(self._compared, 3, 1)
        self._pass_on(*self.fields)
        self.measure.chosen.connect(self.measure_chosen)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    @property
    def fields(self) -> tuple[TextField, ...]:
        """The text fields in reading order."""
        return (self.text, self.adjusted, *self.groups.values())

    def show_state(self, outcome: Outcome, alone: bool) -> None:
        """Show what was typed; ``alone`` where no counts stand beside it."""
        self.measure.show_choice(outcome.paper_measure)
        self.text.show_text(outcome.paper_text)
        self._give_room()
        self.adjusted.show_text(outcome.adjusted_for_text)
        positions: tuple[Position, Position] = ("first", "second")
        for field, position in zip(
            self.groups.values(), positions if outcome.index_group == "first" else positions[::-1], strict=True
        ):
            field.field = f"{position}_label_text"  # the index group stands first
            field.show_text(getattr(outcome, field.field))
        for widget in (
            self.adjusted_name, self.adjusted, self.compared_name, self.compared_with, *self.groups.values(),
        ):  # fmt: skip
            widget.setVisible(alone)

    def align(self, width: int) -> None:
        """Give the names the width that names have in the rows above."""
        self._rows.setColumnMinimumWidth(0, width)

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._give_room()

    def _give_room(self) -> None:
        """Put a text that does not fit beside its measure on a line of its own, until it is short again."""
        beside = self.width() - self._rows.columnMinimumWidth(0) - self.measure.sizeHint().width()
        room = beside - self._look.px(24 + 8) - (self._look.px(SLACK) if self._long else 0)
        long = self.text.fontMetrics().horizontalAdvance(bounded(self.text.text())) > room
        if long == self._long:
            return
        self._long = long
        (self._line if long else self._rows).removeWidget(self.text)
        if long:
            self._rows.addWidget(self.text, 1, 0, 1, 2)
        else:
            self._line.insertWidget(1, self.text, 1)

    def _on_look_changed(self) -> None:
        self._rows.setHorizontalSpacing(self._look.px(12))
        self._rows.setVerticalSpacing(self._look.px(4))
        self._line.setSpacing(self._look.px(12))
        self._compared.setSpacing(self._look.px(8))
        self._give_room()
