"""Does it add up? What the paper prints, and what the check finds, sentence by sentence."""

from __future__ import annotations

from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import Qt, Signal
from PySide6.QtGui import QAction
from PySide6.QtWidgets import QGridLayout, QLabel, QVBoxLayout

from fourcount.face.fields import FieldsView
from fourcount.face.header import Hairline
from fourcount.face.links import WrappedLink
from fourcount.face.look import Look
from fourcount.face.printed.paper_says import PaperSays
from fourcount.face.text import Words
from fourcount.record.outcome import EffectOnly, Outcome
from fourcount.record.paper import Choices
from fourcount.wording import labels
from fourcount.wording.printed_labels import CHECK_HEAD, CHECK_MARKS

if TYPE_CHECKING:
    from fourcount.appraisal.findings import CheckFindings
    from fourcount.wording.check import CheckLine

AGREES, TO_CHECK, NOTE = CHECK_MARKS
PARTS = {AGREES: "accent", TO_CHECK: "caution", NOTE: "muted"}


class Row(NamedTuple):
    """A sentence with its sign before it."""

    sign: QLabel
    words: Words


class CheckView(FieldsView):
    """The heading, the line of what the paper says, the findings, and a command that adopts the paper's method.

    **Signals**
        measure_chosen: what the paper calls its result was chosen. Carries the key.
    """

    measure_chosen = Signal(object)

    def __init__(self, look: Look, adopt: QAction) -> None:
        super().__init__()
        self._look = look
        self.found: CheckFindings | None = None
        self.paper = PaperSays(look)
        self.head = Words(look, "head", "muted", CHECK_HEAD, wraps=False)
        self.adopt = WrappedLink(look, labels.COMMANDS["adopt"].replace("&", ""), adopt)
        self.rows: list[Row] = []
        self._column = QVBoxLayout(self)
        self._column.setContentsMargins(0, 0, 0, 0)
        self._findings = QGridLayout()
        self._findings.setContentsMargins(0, 0, 0, 0)
        self._findings.setColumnStretch(1, 1)
        self._column.addWidget(Hairline(look))
        self._column.addWidget(self.head)
        self._column.addWidget(self.paper)
        self._column.addLayout(self._findings)
        self._column.addWidget(self.adopt)
        self.setAccessibleName(CHECK_HEAD)
        self._pass_on(self.paper)
        self.paper.measure_chosen.connect(self.measure_chosen)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def show_state(self, outcome: Outcome, check: CheckFindings | None, choices: Choices, field_width: int) -> None:
        """Show what was typed, and what the last check found; a paper that says nothing has no findings."""
        alone = isinstance(outcome.table, EffectOnly)
        self.paper.align(field_width)
        self.paper.show_state(outcome, alone)
        if check is not self.found:
            self.found = check
            self._show_findings(check)
        self._show_adopt(check, choices)

    def take_back(self) -> None:
        """Hold the line of what the paper says again, after it stood in the table's place."""
        self._column.insertWidget(2, self.paper)

    @property
    def sentences(self) -> list[str]:
        """The findings on screen, in order."""
        return [row.words.text() for row in self.rows if not row.words.isHidden()]

    @property
    def answer(self) -> tuple[str, ...]:
        """All that is said about what the paper prints, the offer to adopt its method included."""
        return (*self.sentences, "" if self.adopt.isHidden() else self.adopt.text())

    def _show_findings(self, check: CheckFindings | None) -> None:
        told: list[tuple[str, str]] = []
        marks: dict[str, str] = {}
        if check is not None:
            from fourcount.wording.check import check_lines
            from fourcount.wording.gaps import mark_text

            marked = any(mark.key.startswith("paper-limits") for mark in check.marks)  # says the same, with its numbers
            lines = (line for line in check_lines(check) if not (marked and line.key == "limits-disordered"))
            told = [(_sign(line), line.text) for line in lines]
            marks = {mark.field: mark_text(mark) for mark in check.marks}
        self.paper.text.show_mark(marks.get(self.paper.text.field, ""))
        told += [(TO_CHECK, text) for text in marks.values()]
        for place in range(max(len(told), len(self.rows))):
            self._show_row(place, *told[place] if place < len(told) else (TO_CHECK, ""))

    def _show_row(self, place: int, sign: str, text: str) -> None:
        if place == len(self.rows):
            row = Row(QLabel(), Words(self._look, "body", selectable=True))
            row.sign.setTextFormat(Qt.TextFormat.PlainText)
            row.sign.setAlignment(Qt.AlignmentFlag.AlignTop)
            self._findings.addWidget(row.sign, place, 0)
            self._findings.addWidget(row.words, place, 1)
            self.rows.append(row)
        row = self.rows[place]
        row.sign.setVisible(bool(text))
        row.sign.setText(sign if text else "")
        row.sign.setAccessibleName(CHECK_MARKS[sign])
        row.words.setAccessibleName(f"{CHECK_MARKS[sign]}: {text}" if text else "")
        row.words.show_words(text)
        self._dress(row, sign)

    def _show_adopt(self, check: CheckFindings | None, choices: Choices) -> None:
        adopt = check.adopt if check else None
        wanted = adopt is not None and adopt != (choices.family, choices.level)
        self.adopt.setVisible(wanted)
        if adopt and wanted:
            from fourcount.wording.check import adopt_text

            self.adopt.show_words(adopt_text(adopt))

    def _dress(self, row: Row, sign: str) -> None:
        row.sign.setFont(self._look.font("strong"))
        row.sign.setPalette(self._look.text_palette(PARTS[sign]))
        row.sign.setMinimumWidth(self._look.px(16))

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setSpacing(px(12))
        self._findings.setHorizontalSpacing(0)
        self._findings.setVerticalSpacing(px(6))
        for row in self.rows:
            self._dress(row, row.sign.text() or TO_CHECK)


def _sign(line: CheckLine) -> str:
    return NOTE if line.note else AGREES if line.agrees else TO_CHECK
