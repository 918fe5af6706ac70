"""The second column: a sentence, the measures with their intervals and strips, and how they are computed."""

from __future__ import annotations

from collections.abc import Sequence
from typing import TYPE_CHECKING

from PySide6.QtCore import Qt, QTimer, Signal
from PySide6.QtWidgets import QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.flow import FlowLayout
from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.face.text import Words
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import labels

if TYPE_CHECKING:
    from PySide6.QtGui import QAction

    from fourcount.appraisal.findings import OutcomeFindings
    from fourcount.face.measure_row import ColumnHead, MeasureRow
    from fourcount.face.own_line import OwnLineRow
    from fourcount.wording.lines import MeasureLine

PRINTED_INTERVALS = ("effect-only", "risk-at-time")
"""Forms whose intervals are the paper's own: no family and no level is chosen for them."""

WORKING_PAUSE = 120
"""Milliseconds without a key after which an open working is computed anew."""


class WhatItSays(FieldsView):
    """Sentence, rows of measures, the choice of family and level, and a line of the reader's own.

    **Signals**
        chosen: a choice of the reader's own line was made. Carries the outcome's field and the choice.
        family_chosen: a family of intervals was chosen. Carries its key.
        level_chosen: a level was chosen. Carries its fraction.
    """

    chosen = Signal(str, object)
    family_chosen = Signal(object)
    level_chosen = Signal(object)

    def __init__(self, look: Look, actions: dict[str, QAction]) -> None:
        super().__init__()
        self._look = look
        self.setAccessibleName(labels.COLUMNS["says"])
        self._rows: dict[str, MeasureRow] = {}
        self._order: Sequence[str] = ()
        self._working_timer = QTimer(self)
        self._working_timer.setSingleShot(True)
        self._working_timer.setInterval(WORKING_PAUSE)
        self._head: ColumnHead | None = None
        self.more_head: Words | None = None
        self.own_line: OwnLineRow | None = None
        self.own_line_link: Link | None = None
        self._open = ""
        self._shown: tuple[Outcome, OutcomeFindings, Choices] | None = None
        self._show_more = False
        self.sentence = Words(look, "sentence", selectable=True)
        self.sentence.setFocusPolicy(Qt.FocusPolicy.StrongFocus)  # Qt gives what can be selected no place for Tab
        self.working = Words(look, "small", selectable=True)
        self.working.hide()
        self.family = ChoiceField(
            look, labels.FIELDS["family"], tuple(labels.FAMILIES.items()), prefix=labels.INTERVALS_PREFIX, plain=True
        )
        self.level = ChoiceField(
            look,
            labels.FIELDS["level"],
            tuple(labels.LEVELS.items()),
            prefix=labels.LEVEL_PREFIX,
            plain=True,
        )
        self.more = Link(look, labels.LINKS["more"], actions["more"])
        self.help = Link(look, labels.LINKS["help"], actions["methods"])
        self.copies = [Link(look, labels.LINK_WORDS[key], actions[key]) for key in ("copy-text", "copy-table")]
        self._build()
        self._connect_all()

    def show_state(self, record: Record, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        """Show the sentence and the measures; before the first appraisal, only the empty page."""
        self._show_choices(record.choices)
        if findings is None:
            self._shown = None
            return
        from fourcount.wording.sentence import headline

        self._shown = (outcome, findings, record.choices)
        self.sentence.show_words(headline(outcome, findings, record.choices))
        self._show_rows()
        self._show_own_line(outcome, findings)

    def take_link(self, action: QAction) -> None:
        """Make the link to the reader's own line, which no first paint needs."""
        from fourcount.wording.patient_labels import OWN_LINE

        self.own_line_link = Link(self._look, OWN_LINE, action)
        self.own_line_link.hide()
        self._choosers.addWidget(self.own_line_link)
        QWidget.setTabOrder(self.help, self.own_line_link)

    def field_named(self, key: str) -> TextField | None:
        """The field of the reader's own line, where it is that one and shown."""
        row = self.own_line
        return row.text if row and row.text.field == key and row.isVisible() else None

    def _show_own_line(self, outcome: Outcome, findings: OutcomeFindings) -> None:
        """The row of the line while one is drawn, else the link that opens it."""
        drawn = outcome.line_kind != "none"
        if drawn and self.own_line is None:
            from fourcount.face.own_line import OwnLineRow

            self.own_line = OwnLineRow(self._look)
            self._pass_on(self.own_line)
            self.own_line.chosen.connect(self.chosen)
            self._column.insertWidget(self._column.indexOf(self._choosers) + 1, self.own_line)
            before: QWidget = self.help
            for widget in self.own_line.stops:
                QWidget.setTabOrder(before, widget)
                before = widget
        if self.own_line:
            self.own_line.setVisible(drawn)
            if drawn:
                self.own_line.show_state(outcome, findings)
        if self.own_line_link:
            self.own_line_link.setVisible(not drawn and bool(self._order))

    def set_more(self, more: bool) -> tuple[QWidget, QWidget] | None:
        """Show or hide the measures under the fold; the first and the last row that is new."""
        before = self._order
        self._show_more = more
        self.more.show_words(labels.LINKS["less" if more else "more"])
        self._show_rows()
        new = [self._rows[key] for key in self._order if key not in before]
        return (new[0], new[-1]) if new else None

    def close_working(self) -> bool:
        """Hide an open working; whether there was one."""
        was_open = bool(self._open)
        self._open = ""
        self._show_rows()
        return was_open

    def _show_choices(self, choices: Choices) -> None:
        self.family.show_choice(choices.family)
        if self.level.findData(choices.level) < 0:
            from fourcount.wording import numbers

            place = sum(self.level.itemData(i) < choices.level for i in range(self.level.count()))
            self.level.insertItem(place, numbers.level(choices.level), choices.level)
        self.level.show_choice(choices.level)

    def _show_rows(self) -> None:
        if self._shown is None:
            return
        from fourcount.face.says_lines import shown_lines
        from fourcount.wording.form import lacking, opens_more

        outcome, findings, choices = self._shown
        untyped = lacking(findings) is not None
        lines = ((), ()) if untyped else shown_lines(outcome, findings, choices, more=self._show_more)
        self._show_lines(*lines)
        for link in self.copies:
            link.setVisible(not untyped)
        self.more.setVisible(opens_more(findings))
        computed = findings.form not in PRINTED_INTERVALS
        self.family.setVisible(computed)
        self.level.setVisible(computed)

    def _show_lines(self, main: Sequence[MeasureLine], under: Sequence[MeasureLine]) -> None:
        from fourcount.face.says_lines import scales_of

        lines = (*main, *under)
        scales, last = scales_of(tuple(main), tuple(under))
        shown = {line.key for line in lines}
        for key, row in self._rows.items():
            if key not in shown:
                row.hide()
        for line in lines:
            row = self._row(line.key)
            scale = None if line.withheld else scales.get(line.kind)
            axis = None
            if scale and line.key in last:
                from fourcount.wording.axis import axis_words

                axis = axis_words(line.kind, scale.high)
            row.show_line(line, scale, axis, line.key == self._open)
            row.show()
        self._put_in_order([line.key for line in lines])
        self._show_head_of_more(under[0].key if under else "")
        if self._head and self._shown:
            from fourcount.wording.form import level_of
            from fourcount.wording.limits import interval_name

            _, findings, choices = self._shown
            self._head.show_words(interval_name(level_of(findings, choices)) if len(lines) > 1 else "")
        if self._open in shown and not self.working.isHidden():
            self._working_timer.start()  # while somebody types, an open working follows at the next pause
        else:
            self._show_working()

    def _row(self, key: str) -> MeasureRow:
        from fourcount.face.measure_row import ColumnHead, MeasureRow

        if key not in self._rows:
            row = MeasureRow(self._look, key)
            row.chosen.connect(self._on_row_chosen)
            self._rows[key] = row
            if not self._measures.count():
                self._head = ColumnHead(self._look)
                self._measures.addWidget(self._head)
            self._measures.addWidget(row)
        return self._rows[key]

    def _put_in_order(self, keys: Sequence[str]) -> None:
        """Bring the rows, and Tab through them, into the order of their lines."""
        if keys == self._order:
            return
        self._order = keys
        before: QWidget = self.sentence
        if self.more_head:
            self._measures.removeWidget(self.more_head)
        for place, key in enumerate(keys):
            row = self._rows[key]
            self._measures.removeWidget(row)
            self._measures.insertWidget(place + 1, row)
            QWidget.setTabOrder(before, row)
            before = row
        QWidget.setTabOrder(before, self.family)

    def _show_head_of_more(self, first: str) -> None:
        """A head over what is seldom needed, so that nobody takes it for the study's main result."""
        if first:
            self.more_head = self.more_head or Words(self._look, "head", "muted", labels.LINKS["more"], wraps=False)
            self.more_head.setContentsMargins(0, self._look.px(20), 0, self._look.px(6))
            self._measures.removeWidget(self.more_head)
            self._measures.insertWidget(self._measures.indexOf(self._rows[first]), self.more_head)
        if self.more_head:
            self.more_head.setVisible(bool(first))

    def _show_working(self) -> None:
        """Put the working under its row; it is computed only while it is open."""
        self._working_timer.stop()
        if self._open not in self._order or self._shown is None:
            self.working.hide()
            return
        from fourcount.wording.working import working

        outcome, findings, choices = self._shown
        text = working(self._open, outcome, findings, choices)
        rows = "\n".join(f"{label}: {value}" if label else value for label, value in text.rows)
        self._measures.removeWidget(self.working)
        self._measures.insertWidget(self._measures.indexOf(self._rows[self._open]) + 1, self.working)
        said = self._open == "test"  # its row is the sentence already
        self.working.show_words(rows if said else f"{text.sentence}\n\n{rows}")

    def _on_row_chosen(self, key: str) -> None:
        self._open = "" if self._open == key else key
        self.working.hide()
        self._show_rows()

    def _build(self) -> None:
        self._measures = QVBoxLayout()
        self._measures.setSpacing(0)
        self._choosers = choosers = FlowLayout(self._look, gap=20)
        for widget in (self.family, self.level, self.more, self.help):
            choosers.addWidget(widget)
        copies = FlowLayout(self._look, gap=20)
        for link in self.copies:
            copies.addWidget(link)
        self._column = QVBoxLayout(self)
        self._column.addWidget(Words(self._look, "head", "muted", labels.COLUMNS["says"], wraps=False))
        self._column.addWidget(self.sentence)
        self._column.addLayout(self._measures)
        self._column.addLayout(choosers)
        self._column.addLayout(copies)
        self._column.addStretch(1)
        for widget in (self.more, *self.copies):
            widget.hide()
        self._on_look_changed()

    def _connect_all(self) -> None:
        self._working_timer.timeout.connect(self._show_working)
        self.family.chosen.connect(self.family_chosen)
        self.level.chosen.connect(self.level_chosen)
        self._look.changed.connect(self._on_look_changed)

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._column.setContentsMargins(px(24), px(20), px(24), px(16))
        self._column.setSpacing(px(12))
        self.working.setContentsMargins(px(12), px(4), 0, px(12))
