"""A line of the reader's own under the measures: what it stands for, where it lies, and where the interval lies."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import Signal
from PySide6.QtWidgets import QHBoxLayout, QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.flow import FlowLayout
from fourcount.face.look import Look
from fourcount.face.printed.quiet_link import QuietLink
from fourcount.face.text import Words
from fourcount.record.outcome import LINE_SCALES as SCALES
from fourcount.record.outcome import Outcome
from fourcount.wording.patient_labels import (
    LINE_HINTS,
    LINE_KIND,
    LINE_KINDS,
    LINE_SCALE,
    LINE_SCALES,
    LINE_SIDE,
    LINE_SIDES,
    LINE_SIDES_OF_RATIO,
    LINE_TEXT,
    OWN_LINE_CLOSE,
)

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings


class OwnLineRow(FieldsView):
    """Kind, place, scale and side of the line, and one sentence about it.

    **Signals**
        chosen: a choice was made. Carries the outcome's field and the choice.
    """

    chosen = Signal(str, object)

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self.kind = ChoiceField(look, LINE_KIND, tuple(LINE_KINDS.items()), snug=True)
        self.text = TextField(look, "line_text", LINE_TEXT)
        self.scale = ChoiceField(look, LINE_SCALE, tuple(LINE_SCALES.items()), snug=True)
        self.side = ChoiceField(look, LINE_SIDE, tuple(LINE_SIDES.items()), snug=True)
        self.close_link = QuietLink(look, "none", "×", OWN_LINE_CLOSE)
        self.sentence = Words(look, "body", selectable=True)
        self.mark = Words(look, "small", "caution")
        self._build()
        self._pass_on(self.text)
        self.kind.chosen.connect(self._on_kind)
        self.scale.chosen.connect(self._on_scale)
        self.side.chosen.connect(self._on_side)
        self.close_link.opened.connect(self._on_kind)
        look.changed.connect(self._on_look_changed)

    @property
    def stops(self) -> tuple[QWidget, ...]:
        """What Tab stops at, in order."""
        return (self.kind, self.side, self.text, self.scale, self.close_link, self.sentence)

    def show_state(self, outcome: Outcome, findings: OutcomeFindings) -> None:
        """Show the line as typed and chosen, and what is said of it."""
        from fourcount.appraisal.findings import Gap, OwnLine
        from fourcount.wording.gaps import gap_text, mark_text
        from fourcount.wording.own_line import line_sentence

        self.kind.show_choice(outcome.line_kind)
        self.scale.show_choices(_scales(outcome, findings))
        self.scale.show_choice(outcome.line_scale)
        ratio = outcome.line_scale != "risk_difference"
        self.side.show_choices(tuple((LINE_SIDES_OF_RATIO if ratio else LINE_SIDES).items()))
        self.side.show_choice(outcome.line_side)
        self.text.show_text(outcome.line_text)
        self.text.setPlaceholderText(LINE_HINTS[outcome.line_scale])
        reason = next((mark_text(mark) for mark in findings.marks if mark.field == self.text.field), "")
        self.text.show_mark(reason)
        self.mark.show_words(reason)
        line = findings.line
        said = line_sentence(outcome, line) if isinstance(line, OwnLine) else ""
        self.sentence.show_words(gap_text(line) if isinstance(line, Gap) and not reason else said)

    def _build(self) -> None:
        flow = FlowLayout(self._look, gap=12)
        place = QWidget()
        self._line = QHBoxLayout(place)
        self._line.setContentsMargins(0, 0, 0, 0)
        self._line.addWidget(self.text, 1)
        self._line.addWidget(self.scale)
        for widget in (self.kind, self.side, place, self.close_link):
            flow.addWidget(widget)
        self._column = QVBoxLayout(self)
        self._column.setContentsMargins(0, 0, 0, 0)
        self._column.addLayout(flow)
        for words in (self.mark, self.sentence):
            self._column.addWidget(words)
        self._on_look_changed()

    def _on_kind(self, kind: object) -> None:
        self.chosen.emit("line_kind", kind)

    def _on_scale(self, scale: object) -> None:
        self.chosen.emit("line_scale", scale)

    def _on_side(self, side: object) -> None:
        self.chosen.emit("line_side", side)

    def _on_look_changed(self) -> None:
        self._column.setSpacing(self._look.px(6))
        self._line.setSpacing(self._look.px(8))


def _scales(outcome: Outcome, findings: OutcomeFindings) -> tuple[tuple[str, str], ...]:
    """The scales of the measures that are there, and the one chosen."""
    from fourcount.appraisal.findings import StrataFindings
    from fourcount.appraisal.own_line import MEASURES_OF

    pooled = findings.strata.pooled if isinstance(findings.strata, StrataFindings) else {}
    there = {**findings.measures, **pooled}
    return tuple(
        (scale, LINE_SCALES[scale])
        for scale in SCALES
        if scale == outcome.line_scale or any(key in there for key in MEASURES_OF[scale])
    )
