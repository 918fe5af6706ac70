"""The third column: the effect at one patient's starting risk, and the picture of it."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QSize, Signal
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QGridLayout, QSizePolicy, QVBoxLayout, QWidget

from fourcount.face.fields import ChoiceField, FieldsView, TextField
from fourcount.face.flow import FlowLayout
from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import labels
from fourcount.wording.standing import STANDING

if TYPE_CHECKING:
    from PySide6.QtGui import QAction

    from fourcount.appraisal.findings import OutcomeFindings
    from fourcount.ink.picture import Picture


class PictureView(QWidget):
    """The picture as one object: painted, and described in a full sentence."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.picture: Picture | None = None
        policy = QSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Minimum)
        policy.setHeightForWidth(True)
        self.setSizePolicy(policy)
        self.hide()
        look.changed.connect(self._on_look_changed)

    def show_picture(self, picture: Picture | None, sentence: str) -> None:
        """Show a picture, or nothing; an equal one changes nothing."""
        if picture is not None and picture == self.picture:
            return
        self.picture = picture
        self.setAccessibleName(labels.COLUMNS["patient"])
        self.setAccessibleDescription(sentence)
        self.setVisible(picture is not None)
        self.updateGeometry()
        self.update()

    def hasHeightForWidth(self) -> bool:
        return True

    def heightForWidth(self, width: int) -> int:
        return self.picture.height(self._look, width) if self.picture else 0

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(280), self.heightForWidth(max(self.width(), self._look.px(200))))

    def minimumSizeHint(self) -> QSize:
        return QSize(0, self.heightForWidth(self.width()))

    def paintEvent(self, event: QPaintEvent) -> None:
        if self.picture:
            painter = QPainter(self)
            self.picture.draw(painter, self._look, 0, 0, self.width())
            painter.end()

    def _on_look_changed(self) -> None:
        self.updateGeometry()
        self.update()


class ForOnePatient(FieldsView):
    """Starting risk, the effect that is carried to it, the picture, and what it comes to.

    **Signals**
        effect_chosen: the effect to carry was chosen. Carries its key.
    """

    effect_chosen = Signal(object)

    def __init__(self, look: Look, actions: dict[str, QAction]) -> None:
        super().__init__()
        self._look = look
        self._bars = False
        self.takes_a_risk = True
        self.setAccessibleName(labels.COLUMNS["patient"])
        self._shown: tuple[Outcome, OutcomeFindings, Choices] | None = None
        self.baseline = TextField(look, "starting_risk_text", labels.FIELDS["starting_risk_text"], role="total")
        self.source = TextField(
            look,
            "starting_risk_source_text",
            labels.FIELDS["starting_risk_source_text"],
            labels.HINTS["starting_risk_source_text"],
        )
        self.effect = ChoiceField(look, labels.FIELDS["effect"], tuple(labels.EFFECTS.items()))
        self.mark = Words(look, "small", "caution")
        self.waits = Words(look, "body", "muted", labels.PATIENT_WAITS)
        self.picture = PictureView(look)
        self.summary = Words(look, "strong", selectable=True)
        self.detail = Words(look, "body", "muted", selectable=True)
        self.copy = Link(look, labels.LINK_WORDS["copy-picture"], actions["copy-picture"])
        self.standing: Words | None = None
        self._build()
        self._connect_all()

    def show_state(self, record: Record, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        """Show the patient's fields; with findings, the picture and its sentences."""
        self.baseline.show_text(outcome.patient.starting_risk_text)
        self.source.show_text(outcome.patient.starting_risk_source_text)
        self.effect.show_choice(outcome.patient.effect)
        self._shown = (outcome, findings, record.choices) if findings else None
        if findings is None:
            self.baseline.setPlaceholderText("")
            return
        self._show_findings(outcome, findings, record.choices)

    def show_standing(self, shown: bool) -> None:
        """Show at the end of the page what always holds, where the strip of cautions has no room for it."""
        if shown and self.standing is None:
            self.standing = Words(self._look, "small", "muted", STANDING)
            self._column.addWidget(self.standing)
        if self.standing:
            self.standing.setVisible(shown)

    def set_bars(self, bars: bool) -> None:
        """Draw a bar pair instead of people, or people again."""
        self._bars = bars
        if self._shown:
            self._show_findings(*self._shown)

    def _show_findings(self, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> None:
        from fourcount.face.patient_view import patient_view

        view = patient_view(outcome, findings, choices, self._bars)
        self.baseline.setPlaceholderText(view.baseline_hint)
        own = view.own_risk and not outcome.patient.starting_risk_text.strip()
        hint = labels.OWN_RISK_SOURCE if own else labels.HINTS["starting_risk_source_text"]
        self.source.setPlaceholderText(hint)
        self.effect.show_words(view.effect_words)
        self.effect.show_choice(view.effect)
        self.effect.setEnabled(view.effect_is_free)
        self.takes_a_risk = view.takes_a_risk
        for widget in (*self._names, self.baseline, self.source, self.effect):
            widget.setVisible(view.takes_a_risk)
        self.baseline.show_mark(view.mark)
        self.mark.show_words(view.mark)
        self.waits.show_words(view.waits)
        self.picture.show_picture(view.picture, view.sentence)
        self.summary.show_words(view.summary)
        self.detail.show_words(view.detail)
        self.copy.setVisible(view.picture is not None)

    def _build(self) -> None:
        self._fields = QGridLayout()
        self._fields.setContentsMargins(0, 0, 0, 0)
        self._fields.setColumnStretch(1, 1)
        names = ("starting_risk_text", "starting_risk_source_text", "effect")
        self._names = [Words(self._look, "body", "muted", labels.FIELDS[name], wraps=False) for name in names]
        for row, words in enumerate(self._names):
            self._fields.addWidget(words, row, 0)
        self._fields.addWidget(self.baseline, 0, 1)
        self._fields.addWidget(self.source, 1, 1)
        self._fields.addWidget(self.effect, 2, 1)
        copies = FlowLayout(self._look)
        copies.addWidget(self.copy)
        self._column = QVBoxLayout(self)
        self._column.addWidget(Words(self._look, "head", "muted", labels.COLUMNS["patient"], wraps=False))
        self._column.addLayout(self._fields)
        for widget in (self.mark, self.waits, self.picture, self.summary, self.detail):
            self._column.addWidget(widget)
        self._column.addLayout(copies)
        self._column.addStretch(1)
        self.copy.hide()
        self._on_look_changed()

    def _connect_all(self) -> None:
        self._pass_on(self.baseline, self.source)
        self.effect.chosen.connect(self.effect_chosen)
        self._look.changed.connect(self._on_look_changed)

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setContentsMargins(px(24), px(20), px(24), px(16))
        self._column.setSpacing(px(12))
        self._fields.setHorizontalSpacing(px(12))
        self._fields.setVerticalSpacing(px(4))
