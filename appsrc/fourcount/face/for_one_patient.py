"""The third column: the effect at one patient's starting risk, and the picture of it."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import Signal
from PySide6.QtWidgets import QGridLayout, QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import labels
from fourcount.wording.standing import STANDING

if TYPE_CHECKING:
    from PySide6.QtGui import QAction
    from PySide6.QtWidgets import QMenu

    from fourcount.appraisal.findings import OutcomeFindings
    from fourcount.face.patient.figures import Figures
    from fourcount.face.patient.quiet_rows import QuietRows
    from fourcount.face.patient.start import StartFields
    from fourcount.picture.options import PictureOptions

KIND_MARK = 17
"""Pixels at 100% text that are kept beside the name of the starting risk for the mark of a choice."""


class ForOnePatient(FieldsView):
    """Starting risk and the effect that is carried to it; all under them is made once the window has painted.

    **Signals**
        chosen: a choice was made. Carries the outcome's field and the choice.
        marked: what is being typed cannot be used. Carries the field and the sentence that says why.
    """

    chosen = Signal(str, object)
    marked = Signal(object, object)

    start: StartFields
    quiet: QuietRows
    figures: Figures
    options: PictureOptions

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._awake = False
        self.takes_a_risk = True
        self.has_curve = False
        self.setAccessibleName(labels.COLUMNS["patient"])
        self._shown: tuple[Outcome, OutcomeFindings, Choices] | None = None
        self.baseline = TextField(look, "starting_risk_text", labels.FIELDS["starting_risk_text"], role="total")
        self.source = TextField(
            look,
            "starting_risk_source_text",
            labels.FIELDS["starting_risk_source_text"],
            labels.HINTS["starting_risk_source_text"],
        )
        self.effect = ChoiceField(look, labels.FIELDS["effect"], (("usual", labels.EFFECTS["risk_ratio"]),))
        self.mark = Words(look, "small", "caution")
        self.waits = Words(look, "body", "muted", labels.PATIENT_WAITS)
        self.standing: Words | None = None
        self._build()
        self._pass_on(self.baseline, self.source)
        self.effect.chosen.connect(self._on_effect)
        look.changed.connect(self._on_look_changed)

    def wake(self, actions: dict[str, QAction], menu: QMenu, options: PictureOptions) -> None:
        """Make what no first paint needs; ``menu`` offers how the picture is drawn."""
        from fourcount.face.patient.figures import Figures
        from fourcount.face.patient.quiet_rows import QuietRows
        from fourcount.face.patient.start import StartFields

        self.options = options
        self.start = StartFields(self._look, self._fields, self._start_area, self.baseline, self.source)
        self.start.setParent(self)
        self.start.kind_chosen.connect(self._on_kind)
        self.names["starting_risk_text"].hide()
        self.figures = Figures(self._look, actions, menu)
        self.figures.hide()
        self.figures.moved.connect(self._chain)
        self.figures.odds_wanted.connect(self._on_odds)
        rows = QVBoxLayout()
        self._column.insertLayout(2, rows)
        self.quiet = QuietRows(self._look, {"span": rows})
        self.quiet.hide()
        self.quiet.chosen.connect(self.chosen)
        self.quiet.made.connect(self._chain)
        self._pass_on(self.start, self.quiet)
        self._column.insertWidget(self._column.indexOf(self.waits) + 1, self.quiet)
        self._column.insertWidget(self._column.indexOf(self.waits) + 1, self.figures)
        self._awake = True
        self._chain()

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every text field of the column that was made so far."""
        if not self._awake:
            return (self.baseline, self.source)
        return (*self.start.fields, self.source, *self.quiet.fields)

    @property
    def first_field(self) -> TextField:
        """Where typing the starting risk begins, however it is given."""
        return self.start.shown[0] if self._awake else self.baseline

    def field_named(self, key: str) -> TextField | None:
        """The field of this column with a key, its row opened where it has one."""
        return self.quiet.open_for(key) or next(
            (field for field in self.fields if field.field == key and field.isVisible()), None
        )

    def show_state(self, record: Record, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        """Show the patient's fields; with findings, the picture and its sentences."""
        self._shown = (outcome, findings, record.choices) if findings else None
        self.source.show_text(outcome.patient.starting_risk_source_text)
        if not self._awake:
            self.baseline.show_text(outcome.patient.starting_risk_text)
            return
        self.start.show_state(outcome)
        if findings is not None:
            self._show_findings(outcome, findings, record.choices)

    def show_standing(self, shown: bool) -> None:
        """Show at the end of the page what always holds, where the strip of cautions has no room for it."""
        if shown and self.standing is None:
            self.standing = Words(self._look, "small", "muted", STANDING)
            self._column.addWidget(self.standing)
        if self.standing:
            self.standing.setVisible(shown)

    def set_options(self, options: PictureOptions) -> None:
        """Draw the picture in another way."""
        self.options = options
        if self._shown:
            self._show_findings(*self._shown)

    def _show_findings(self, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> None:
        from fourcount.face.patient_view import PATIENT_MARKS, patient_view

        view = patient_view(outcome, findings, choices, self.options)
        self.baseline.setPlaceholderText(view.baseline_hint)
        own = view.own_risk and not outcome.patient.starting_risk_text.strip()
        hint = labels.OWN_RISK_SOURCE if own else labels.HINTS["starting_risk_source_text"]
        self.source.setPlaceholderText(hint)
        self.effect.show_choices(view.effects)
        self.effect.show_choice(view.effect)
        self.effect.setEnabled(len(view.effects) > 1)
        self.takes_a_risk, self.has_curve = view.takes_a_risk, view.to_curve
        self.start.ask(view.takes_a_risk)
        for widget in (self.source, self.effect, self.names["starting_risk_source_text"], self.names["effect"]):
            widget.setVisible(view.takes_a_risk)
        for part in (self.start, self.quiet):
            part.show_marks(view.marks)
        marked = [text for field, text in view.marks.items() if field in PATIENT_MARKS]
        self._show_reasons("\n".join(dict.fromkeys(marked)))
        self.waits.show_words(view.waits)
        self.quiet.setVisible(not view.waits)
        self.quiet.show_state(outcome, self._fields.columnMinimumWidth(0))
        self.figures.show_view(view)
        self.figures.setVisible(not view.waits or view.to_odds)

    def _show_reasons(self, reasons: str) -> None:
        """Show why fields are marked; a new reason of the field in which somebody types is to be seen."""
        new = reasons and reasons != self.mark.text()
        self.mark.show_words(reasons)
        typed = next((field for field in self.fields if field.hasFocus()), None)
        if new and typed:
            self.marked.emit(typed, self.mark)

    def _build(self) -> None:
        self._fields = QGridLayout()
        self._fields.setContentsMargins(0, 0, 0, 0)
        self._fields.setColumnStretch(1, 1)
        names = ("starting_risk_text", "starting_risk_source_text", "effect")
        self.names = {name: Words(self._look, "body", "muted", labels.FIELDS[name], wraps=False) for name in names}
        for row, (words, field) in enumerate(
            zip(self.names.values(), (self.baseline, self.source, self.effect), strict=True)
        ):
            self._fields.addWidget(words, row, 0)
            words.name_of(field)
        self._start_area = QGridLayout()
        self._start_area.addWidget(self.baseline, 1, 0)
        self._fields.addLayout(self._start_area, 0, 1)
        self._fields.addWidget(self.source, 1, 1)
        self._fields.addWidget(self.effect, 2, 1)
        self._column = QVBoxLayout(self)
        self._column.addWidget(Words(self._look, "head", "muted", labels.COLUMNS["patient"], wraps=False))
        self._column.addLayout(self._fields)
        for widget in (self.mark, self.waits):
            self._column.addWidget(widget)
        self._column.addStretch(1)
        self._on_look_changed()

    def _chain(self) -> None:
        """Tab goes through the column in reading order."""
        before: QWidget = self.source
        for widget in (self.effect, *self.quiet.stops_at_home, *self.figures.stops, *self.quiet.stops):
            QWidget.setTabOrder(before, widget)
            before = widget

    def _on_effect(self, key: object) -> None:
        self.chosen.emit("effect", key)

    def _on_odds(self) -> None:
        self.effect.setFocus()  # the link goes with what it was for
        self.chosen.emit("effect", "odds_ratio")

    def _on_kind(self, key: object) -> None:
        self.chosen.emit("start_kind", key)

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setContentsMargins(px(24), px(20), px(24), px(16))
        self._column.setSpacing(px(12))
        self._fields.setHorizontalSpacing(px(12))
        self._fields.setVerticalSpacing(px(4))
        self._start_area.setHorizontalSpacing(px(12))
        self._start_area.setVerticalSpacing(px(1))
        widest = max(words.sizeHint().width() for words in self.names.values())
        self._fields.setColumnMinimumWidth(0, widest + px(KIND_MARK))
