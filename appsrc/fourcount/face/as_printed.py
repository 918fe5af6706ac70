"""The first column: what the paper prints, in the form in which it prints it."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import Qt, Signal
from PySide6.QtGui import QAction
from PySide6.QtWidgets import QGridLayout, QHBoxLayout, QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.flow import FlowLayout
from fourcount.face.grid import Grid
from fourcount.face.grid_forms import GRID_FORMS
from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.record.outcome import CELLS, Form, Outcome, form_of
from fourcount.record.paper import Choices
from fourcount.wording import labels

if TYPE_CHECKING:
    from fourcount.appraisal.findings import CheckFindings, OutcomeFindings
    from fourcount.face.rare_parts import RareParts

LINKS = ("swap", "count-other", "clear", "paste")
LONG_SPECIMENS = ("person-time", "risk-at-time", "effect-only")
"""Forms whose specimen needs a line of its own; which way groups run then stands under it."""


LINKLESS: dict[Form, tuple[str, ...]] = {"effect-only": ("swap", "count-other"), "person-time": ("count-other",)}
"""Commands that do nothing in a form."""


class AsPrinted(FieldsView):
    """Study, event, time span and the table; further parts are made by ``RareParts`` when they are first needed.

    **Signals**
        example_wanted: the quiet line of the first start was pressed.
        chosen: one of the rarer choices was made. Carries the outcome's field and the choice.
        row_wanted: one more row of strata is wanted.
        paste_taken: what was pasted is to be taken as shown. Carries it.
        paste_left: what was pasted is not to be taken.
    """

    example_wanted = Signal()
    chosen = Signal(str, object)
    row_wanted = Signal()
    paste_taken = Signal(object)
    paste_left = Signal()

    def __init__(self, look: Look, actions: dict[str, QAction]) -> None:
        super().__init__()
        self._look = look
        self._actions = actions
        self._rare: RareParts | None = None
        self._long: bool | None = None
        self.setAccessibleName(labels.COLUMNS["printed"])
        self.design = ChoiceField(look, labels.FIELDS["design"], tuple(labels.DESIGNS.items()))
        self.name = TextField(look, "name_text", labels.FIELDS["name_text"], labels.HINTS["name_text"])
        self.event_words = TextField(look, "left_words_text", labels.FIELDS["left_words_text"], labels.HINTS["words"])
        self.welcome = ChoiceField(look, labels.FIELDS["welcome"], tuple(labels.WELCOME.items()), whole=True)
        self.span = TextField(look, "span_text", labels.FIELDS["span_text"], labels.HINTS["span_text"])
        self.form = ChoiceField(look, labels.FIELDS["form"], tuple(labels.FORMS.items()), notes=labels.FORM_NOTES)
        self.layout_choice = ChoiceField(look, labels.FIELDS["layout"], tuple(labels.LAYOUTS.items()))
        self.grid = Grid(look)
        self.notes = Words(look, "small", "caution")
        self.notice: Words | None = None
        self.example = Link(look, labels.FIRST_STEP)
        self.links = [Link(look, labels.LINK_WORDS[key], actions[key], labels.LINK_NAMES.get(key, "")) for key in LINKS]
        self._build()
        self._connect_all()

    @property
    def rare(self) -> RareParts:
        """The parts that are not there from the start."""
        if self._rare is None:
            from fourcount.face.rare_parts import RareParts, TabStops

            stops = TabStops(self.layout_choice, self.grid.cells[CELLS[3]], self.example)
            self._rare = RareParts(self._look, self._actions, self._column, self._printed_row, stops)
            self._rare.setParent(self)
            self._pass_on(self._rare)
            self._rare.chosen.connect(self.chosen)
            self._rare.row_wanted.connect(self.row_wanted)
            self._rare.paste_taken.connect(self.paste_taken)
            self._rare.paste_left.connect(self.paste_left)
        return self._rare

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every field of the column that was made so far, in reading order."""
        own = (self.name, self.event_words, self.span)
        rare = self._rare
        before, after = (rare.fields_before, rare.fields_after) if rare else ((), ())
        return (*own, *before, *self.grid.fields, *after)

    def show_state(self, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        """Show the outcome as typed, and a sentence for each marked cell."""
        form, focus = form_of(outcome.table), self.focused_field()
        self.design.show_choice(outcome.design)
        self.event_words.field = f"{outcome.counted}_words_text"
        self.event_words.show_text(outcome.event_words_text)
        self.event_words.setPlaceholderText(self._event_hint(outcome))
        self.name.show_text(outcome.name_text)
        left = outcome.counted == "left"
        self._names["name_text"].show_words(labels.FIELDS["name_text" if left else "other_than"])
        self.welcome.show_choice("welcome" if outcome.welcome else "unwelcome")
        self.span.show_text(outcome.span_text)
        self.form.show_choice(form)
        self.layout_choice.show_choice(outcome.layout)
        self.layout_choice.setVisible(form in GRID_FORMS and form != "pairs")
        self._place_layout_choice(form in LONG_SPECIMENS)
        for key, link in zip(LINKS, self.links, strict=True):
            link.setVisible(key not in LINKLESS.get(form, ()))
        self.grid.setVisible(form in GRID_FORMS)
        self.grid.show_state(outcome, findings)
        self.example.setVisible(outcome == Outcome())
        if self._rare or outcome != Outcome():
            self.rare.show_state(outcome, findings, self._width_of_names())
        self._show_marks(findings)
        if focus and not focus.isVisible():  # its row, or its whole form, is gone
            instead = (self._rare and self._rare.instead_of(focus)) or self.first_field
            instead.setFocus(Qt.FocusReason.OtherFocusReason)

    def focused_field(self) -> TextField | None:
        """The field of this column that has the focus."""
        focus = self.window().focusWidget()
        return focus if isinstance(focus, TextField) and self.isAncestorOf(focus) else None

    def show_check(
        self, outcome: Outcome, check: CheckFindings | None, choices: Choices
    ) -> tuple[QWidget, QWidget] | None:
        """Show what the paper says and whether it adds up; the field with a new answer to what is typed there."""
        if self._rare or outcome != Outcome():
            return self.rare.show_check(outcome, check, choices, self._width_of_names())
        return None

    def tell(self, notice: str) -> None:
        """Say under the table what became of it."""
        if self.notice is None and notice:
            self.notice = Words(self._look)
            self._column.insertWidget(self._column.indexOf(self.example), self.notice)
        if self.notice:
            self.notice.show_words(notice)
            self.notice.setAccessibleName(notice)

    def field_named(self, key: str) -> TextField | None:
        """The field of this column with a key, its row opened where it has one."""
        self.rare.open_for(key)
        return next((field for field in self.fields if field.field == key and field.isVisible()), None)

    @property
    def first_field(self) -> TextField:
        """Where typing the table begins in its form."""
        return (self._rare and self._rare.first_field) or self.grid.cells[CELLS[0]]

    def paper_field(self, outcome: Outcome, choices: Choices) -> TextField:
        """The field of what the paper says, made if it is not there yet."""
        return self.rare.paper_field(outcome, choices, self._width_of_names())

    def read_in_order(self, parts: list[QWidget]) -> list[QWidget]:
        """What the paper says comes right after the table, as Tab goes: the links are seldom needed."""
        rare = self._rare
        if rare is None or rare.check is None or rare.check.paper.parentWidget() is not rare.check:
            return parts
        moved = [part for part in (rare.check, rare.row_links) if part is not None]
        rest = [part for part in parts if part not in moved]
        after = rest.index(self.notes) + 1
        return [*rest[:after], *moved, *rest[after:]]

    def _width_of_names(self) -> int:
        return max(words.sizeHint().width() for words in self._names.values())

    def _event_hint(self, outcome: Outcome) -> str:
        """What the event is called while nothing is typed: that it is not the other one, where that is named."""
        if not (outcome.other_words_text.strip() or outcome.other_heading_text.strip()):
            return labels.HINTS["words"]
        from fourcount.wording.names import event_words

        return event_words(outcome)

    def _show_marks(self, findings: OutcomeFindings | None) -> None:
        reasons: dict[str, str] = {}
        if findings and findings.marks:
            from fourcount.wording.gaps import mark_text

            reasons = {mark.field: mark_text(mark) for mark in findings.marks}
        marked = (*self.grid.fields, self.span)
        told = [field.field for field in marked]
        for field in marked:
            field.show_mark(reasons.get(field.field, ""))
        told += self._rare.show_marks(reasons) if self._rare else []
        self.notes.show_words("\n".join(dict.fromkeys(text for field, text in reasons.items() if field in told)))

    def _build(self) -> None:
        self._form_rows = QGridLayout()
        self._form_rows.setContentsMargins(0, 0, 0, 0)
        self._form_rows.setColumnStretch(1, 1)
        names = ("design", "name_text", "left_words_text", "span_text", "form")
        self._names = {name: Words(self._look, "body", "muted", labels.FIELDS[name], wraps=False) for name in names}
        fields = (self.design, self.name, self.event_words, self.span, self.form)
        for row, (words, field) in enumerate(zip(self._names.values(), fields, strict=True)):
            self._form_rows.addWidget(words, row, 0)
            words.name_of(field)
        self._form_rows.addWidget(self.design, 0, 1, 1, 2)
        self._form_rows.addWidget(self.name, 1, 1)
        self._form_rows.addWidget(self.welcome, 1, 2)
        self._form_rows.addWidget(self.event_words, 2, 1, 1, 2)
        self._form_rows.addWidget(self.span, 3, 1, 1, 2)
        self._printed_row = QHBoxLayout()
        self._printed_row.addWidget(self.form, 3)
        self._printed_row.addWidget(self.layout_choice, 3)
        self._form_rows.addLayout(self._printed_row, 4, 1, 1, 2)
        links = FlowLayout(self._look)
        for link in self.links:
            links.addWidget(link)
        self._column = QVBoxLayout(self)
        self._column.addWidget(Words(self._look, "head", "muted", labels.COLUMNS["printed"], wraps=False))
        self._column.addLayout(self._form_rows)
        self._column.addWidget(self.grid)
        self._column.addWidget(self.notes)
        self._column.addLayout(links)
        self._column.addWidget(self.example)
        self._column.addStretch(1)
        self._on_look_changed()

    def _place_layout_choice(self, long: bool) -> None:
        """Beside the specimen, or under a long one."""
        if self._long != long:
            self._long = long
            if long:
                self._form_rows.addWidget(self.layout_choice, 5, 1, 1, 2, Qt.AlignmentFlag.AlignLeft)
            else:
                self._printed_row.addWidget(self.layout_choice, 3)

    def _connect_all(self) -> None:
        self._pass_on(self.name, self.event_words, self.span, self.grid)
        self.example.clicked.connect(self.example_wanted)
        self._look.changed.connect(self._on_look_changed)

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setContentsMargins(px(24), px(20), px(24), px(16))
        self._column.setSpacing(px(16))
        self._form_rows.setHorizontalSpacing(px(12))
        self._form_rows.setVerticalSpacing(px(4))
        self._printed_row.setSpacing(px(12))
