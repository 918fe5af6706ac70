"""The rows of fields that few papers need: which fields each holds, and whether it holds something."""

from __future__ import annotations

from PySide6.QtCore import Qt
from PySide6.QtWidgets import QGridLayout, QHBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import TextField
from fourcount.face.look import Look
from fourcount.face.rows_on_demand import EMPTY, Kind, RowOnDemand
from fourcount.face.text import Words
from fourcount.ink.typeset import bounded
from fourcount.record.outcome import EffectOnly, Outcome
from fourcount.wording import labels
from fourcount.wording.printed_labels import (
    COUNTING,
    FOLLOW_UP,
    OPTIONAL,
    OPTIONAL_FIELDS,
    OPTIONAL_HINTS,
    PAPER_MEASURES,
    WHERE,
)

LOSSES = ("randomised_text", "lost_text")
LOSS_RATIO = "loss_ratio_text"
NAMED = ("icc_text", "cluster_size_text", "adjusted_for_text")
"""Fields with a word before them, which still says what they are when they are filled."""


ROWS: dict[str, Kind] = {
    "counting": Kind(choice="counting", choices=tuple(COUNTING.items())),
    "follow-up": Kind(choice="follow_up_varied", choices=tuple(FOLLOW_UP.items())),
    "losses": Kind(
        texts=(
            *(f"{group}_{name}" for group in labels.GROUP_NAMES for name in LOSSES),
            *(f"{group}_{LOSS_RATIO}" for group in labels.GROUP_NAMES),
        )
    ),
    "clusters": Kind(texts=("icc_text", "cluster_size_text")),
    "adjusted": Kind(
        texts=("adjusted_text", "adjusted_for_text"), choice="adjusted_measure", choices=tuple(PAPER_MEASURES.items())
    ),
    "where": Kind(choice="where", choices=tuple(WHERE.items())),
}


def holds(key: str, outcome: Outcome) -> bool:
    """Whether a row's fields hold anything but what an empty outcome has."""
    if key == "adjusted" and isinstance(outcome.table, EffectOnly):
        return bool(outcome.adjusted_text.strip())  # what the one effect is adjusted for stands beside it
    if key == "adjusted":
        return bool(outcome.adjusted_text.strip() or outcome.adjusted_for_text.strip())
    kind = ROWS[key]
    if any(getattr(outcome, text).strip() for text in kind.texts):
        return True
    return bool(kind.choice) and getattr(outcome, kind.choice) != getattr(EMPTY, kind.choice)


class OptionalRow(RowOnDemand):
    """The fields of one row, each kind in a layout of its own."""

    def __init__(self, look: Look, key: str) -> None:
        kind = ROWS[key]
        super().__init__(look, key, kind, OPTIONAL[key], holds)
        if kind.choice:
            self.choice = ChoiceField(
                look, OPTIONAL_FIELDS[kind.choice if key == "adjusted" else key], kind.choices,
                snug=key == "adjusted",
            )  # fmt: skip
            self.choice.chosen.connect(self._on_chosen)
        self._texts = {text: self._field(text) for text in kind.texts}
        self._group_names = {
            group: [Words(look, "small", "muted", name) for _ in range(2)] for group, name in labels.GROUP_NAMES.items()
        }
        self.fields = tuple(self._texts.values())
        self._build(key)
        self._pass_on(*self.fields)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_state(self, outcome: Outcome) -> None:
        """Show what was typed and chosen."""
        super().show_state(outcome)
        for group, words in self._group_names.items():
            role = labels.ROLES["index" if outcome.index_group == group else "reference"]
            for word in words:
                word.setText(bounded(getattr(outcome, f"{group}_label_text").strip() or role))
                word.setVisible(self._key == "losses")

    def _build(self, key: str) -> None:
        name = Words(self._look, "body", "muted", OPTIONAL_FIELDS[key], wraps=False)
        self._layout.addWidget(
            self.close_link, 1 if key == "adjusted" else 0, 2, Qt.AlignmentFlag.AlignTop | Qt.AlignmentFlag.AlignRight
        )
        if key == "losses":
            self._build_losses(name)
            return
        self._layout.addWidget(name, 0, 0)
        line = QHBoxLayout()
        line.setSpacing(12)
        if self.choice:
            name.name_of(self.choice)
            line.addWidget(self.choice)
        fields = list(self.fields)
        last = fields.pop() if len(fields) > 1 else None
        for field in fields:
            self._add_named(line, field)
        self._layout.addLayout(line, 0, 1, 1, 2 if key == "adjusted" else 1)
        if last:
            under = QHBoxLayout()
            under.setSpacing(8)
            self._add_named(under, last)
            self._layout.addLayout(under, 1, 1)

    def _add_named(self, line: QHBoxLayout, field: TextField) -> None:
        """A field with the word that says what it is."""
        if field.field in NAMED:
            words = Words(self._look, "small", "muted", OPTIONAL_FIELDS[f"{field.field}_short"], wraps=False)
            words.name_of(field)
            line.addWidget(words)
        line.addWidget(field, 1)

    def _build_losses(self, name: Words) -> None:
        """A line for each group; the heads say what each field is."""
        table = QGridLayout()
        table.setHorizontalSpacing(8)
        table.setVerticalSpacing(2)
        self._layout.addLayout(table, 0, 0, 1, 2)
        table.addWidget(name, 0, 0)
        for column, text in enumerate(LOSSES, start=1):
            head = Words(self._look, "small", "muted", OPTIONAL_FIELDS[text], wraps=" " in OPTIONAL_FIELDS[text])
            head.setAlignment(Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignBottom)
            table.addWidget(head, 0, column)
            table.setColumnStretch(column, 2)
            for row, group in enumerate(labels.GROUP_NAMES, start=1):
                field = self._texts[f"{group}_{text}"]
                field.setAlignment(Qt.AlignmentFlag.AlignRight)
                table.addWidget(field, row, column)
        table.setColumnMinimumWidth(0, 72)
        ratio = Words(self._look, "small", "muted", OPTIONAL_FIELDS[LOSS_RATIO])
        table.addWidget(ratio, 3, 0, 1, 3)
        for row, (group, (name_above, name_below)) in enumerate(self._group_names.items(), start=1):
            field = self._texts[f"{group}_{LOSS_RATIO}"]
            field.setAlignment(Qt.AlignmentFlag.AlignRight)
            table.addWidget(name_above, row, 0)
            table.addWidget(name_below, row + 3, 0)
            table.addWidget(field, row + 3, 1)

    def _field(self, text: str) -> TextField:
        for group, name in labels.GROUP_NAMES.items():
            if text.startswith(f"{group}_"):
                what = text.removeprefix(f"{group}_")
                return TextField(self._look, text, f"{name}, {OPTIONAL_FIELDS[what]}", OPTIONAL_HINTS[what])
        return TextField(self._look, text, OPTIONAL_FIELDS[text], OPTIONAL_HINTS[text])

    def read_in_order(self, parts: list[QWidget]) -> list[QWidget]:
        """The way to close it comes last, wherever it stands."""
        return [*(part for part in parts if part is not self.close_link), self.close_link]

    def _on_look_changed(self) -> None:
        self._layout.setHorizontalSpacing(self._look.px(12 if self._key != "losses" else 4))
        self._layout.setVerticalSpacing(self._look.px(2))
