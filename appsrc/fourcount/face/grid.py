"""The four-cell grid: counts to type, labels in place, and live totals beside them."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QRectF, QSize, Qt, Signal
from PySide6.QtGui import QFocusEvent, QFontMetrics, QKeyEvent, QPainter, QPaintEvent, QPen, QResizeEvent
from PySide6.QtWidgets import QGridLayout, QLabel, QSizePolicy, QWidget

from fourcount.face.fields import FieldsView, QuietField, TextField
from fourcount.face.look import Look
from fourcount.ink.style import Role
from fourcount.record.outcome import CELLS, EventsOfTotal, Outcome
from fourcount.wording import labels

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings

CELL_ROLES: tuple[Role, ...] = ("cell", "total", "body", "small")
LONGEST_IN_FULL = 7
"""Totals of more characters than this are all set smaller, so that the grid keeps its shape."""

RIGHT = Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignVCenter


class CountCell(TextField):
    """One count, in a frame of its own.

    **Signals**
        moved: an arrow key or Enter asks for another cell. Carries this cell's field and the key.
    """

    moved = Signal(str, object)

    def __init__(self, look: Look, field: str) -> None:
        super().__init__(look, field, "", role="cell")
        self.setAlignment(Qt.AlignmentFlag.AlignRight)

    def sizeHint(self) -> QSize:
        return QSize(self._look.px(84), self._look.px(40))

    def minimumSizeHint(self) -> QSize:
        return QSize(self._look.px(60), self._look.px(40))

    def show_text(self, text: str) -> None:
        super().show_text(text)
        self._fit_text()

    def show_known(self, text: str) -> None:
        """Show in an empty cell the number that is known already from what stands beside it."""
        if text != self.placeholderText():
            self.setPlaceholderText(text)

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._fit_text()

    def keyPressEvent(self, event: QKeyEvent) -> None:
        key = Qt.Key(event.key())
        plain = not event.modifiers() & ~Qt.KeyboardModifier.KeypadModifier
        at_start = self.cursorPosition() == 0 and not self.hasSelectedText()
        at_end = self.cursorPosition() == len(self.text())
        leaves = (
            key in (Qt.Key.Key_Up, Qt.Key.Key_Down, Qt.Key.Key_Return, Qt.Key.Key_Enter)
            or (key == Qt.Key.Key_Left and at_start)
            or (key == Qt.Key.Key_Right and at_end)
        )
        if plain and leaves:
            self.moved.emit(self.field, key)
            return
        super().keyPressEvent(event)

    def _fit_text(self) -> None:
        """Set a long text in a smaller size, so that it is seen whole."""
        self.setTextMargins(self._look.px(6), 0, self._look.px(8), 0)
        room = self.width() - self._look.px(18) - (self._look.px(8) if self.marked else 0)
        for role in CELL_ROLES:
            font = self._look.font(role)
            if QFontMetrics(font).horizontalAdvance(self.text()) <= room:
                break
        if font != self.font():
            self.setFont(font)

    def focusInEvent(self, event: QFocusEvent) -> None:
        super().focusInEvent(event)
        if event.reason() in (Qt.FocusReason.TabFocusReason, Qt.FocusReason.BacktabFocusReason):
            self.selectAll()

    def paintEvent(self, event: QPaintEvent) -> None:
        super(TextField, self).paintEvent(event)
        part = "caution" if self.marked else "accent" if self.hasFocus() else "outline"
        width = 2.0 if self.marked or self.hasFocus() else 1.0
        painter = QPainter(self)
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        painter.setPen(QPen(self._look.colour(part), width))
        inset = width / 2
        painter.drawRoundedRect(QRectF(self.rect()).adjusted(inset, inset, -inset, -inset), 4, 4)
        text = self.fontMetrics().horizontalAdvance(self.text())
        if self.marked and text + self._look.px(28) < self.width():
            painter.setFont(self._look.font("strong"))
            painter.drawText(self.rect().adjusted(8, 0, 0, 0), Qt.AlignmentFlag.AlignVCenter, "!")
        painter.end()


class Grid(FieldsView):
    """Two groups by two outcomes, as the paper prints them: groups down or across, others or totals typed."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._arranged: tuple[str, bool] | None = None
        self.cells = {field: CountCell(look, field) for field in CELLS}
        self.labels = {
            position: QuietField(
                look, f"{position}_label_text", labels.FIELDS["label"].format(group=name), labels.HINTS["label"]
            )
            for position, name in labels.GROUP_NAMES.items()
        }
        self.headings = {
            column: QuietField(
                look, f"{column}_heading_text", labels.FIELDS["heading"].format(column=column), role="small"
            )
            for column in ("left", "right")
        }
        self.roles = {key: self._small() for key in ("first", "second", "left", "right")}
        self.total_heading = self._small()
        self.total_heading.setText(labels.TOTAL)
        self.totals = {key: self._small(RIGHT) for key in ("first", "second", "left", "right", "everyone")}
        self._layout = QGridLayout(self)
        self._layout.setContentsMargins(0, 0, 0, 0)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        self._connect_all()

    def show_state(self, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        """Show the texts, which column is counted, and the totals."""
        of_total = isinstance(outcome.table, EventsOfTotal)
        self._arrange(outcome.layout, of_total)
        for field, cell in self.cells.items():
            cell.show_text(getattr(outcome.table, field))
        for position, label in self.labels.items():
            label.show_text(getattr(outcome, f"{position}_label_text"))
        for column, heading in self.headings.items():
            heading.show_text(getattr(outcome, f"{column}_heading_text"))
        self._show_hints(outcome)
        self._show_roles(outcome)
        self._show_names(outcome, of_total)
        self._show_totals(findings, of_total)

    def _show_hints(self, outcome: Outcome) -> None:
        cases = outcome.design == "case-control"
        for column, heading in self.headings.items():
            words = getattr(outcome, f"{column}_words_text").strip()
            hint = labels.HINTS[f"{column}_heading_cases" if cases else f"{column}_heading"]
            heading.setPlaceholderText(words or hint)

    def _show_roles(self, outcome: Outcome) -> None:
        for position in ("first", "second"):
            role = "index" if outcome.index_group == position else "reference"
            self.roles[position].setText(labels.ROLES[role])
        for column in ("left", "right"):
            self.roles[column].setText(labels.ROLES["counted"] if outcome.counted == column else "")

    def _show_names(self, outcome: Outcome, of_total: bool) -> None:
        for field, cell in self.cells.items():
            position, column = field.split("_")[:2]
            group = getattr(outcome, f"{position}_label_text").strip() or labels.GROUP_NAMES[position]
            heading = self.headings[column]
            words = heading.text().strip() or heading.placeholderText()
            pattern = labels.CELL_NAMES[column] if of_total else labels.CELL_NAMES["events-and-others"]
            name = pattern.format(group=group, outcome=words)
            if name != cell.accessibleName():
                cell.setAccessibleName(name)

    def _show_totals(self, findings: OutcomeFindings | None, of_total: bool) -> None:
        from fourcount.wording.numbers import whole

        totals = findings.totals if findings else None
        self._show_known(findings, of_total)

        def words(key: str) -> str:
            value = getattr(totals, key) if totals else None
            return "" if value is None else whole(value)

        groups = ("first_right", "second_right") if of_total else ("first", "second")
        for position, key in zip(("first", "second"), groups, strict=True):
            self.totals[position].setText(words(key))
        right, everyone = ("everyone", "right") if of_total else ("right", "everyone")
        self.totals["left"].setText(words("left"))
        self.totals["right"].setText(words(right))
        self.totals["everyone"].setText(words(everyone))
        self._fit_totals()

    def _show_known(self, findings: OutcomeFindings | None, of_total: bool) -> None:
        """Fill an empty right cell, as a hint, where its number follows from a left one such as 38/412."""
        from fourcount.wording.numbers import whole

        for position in ("first", "second"):
            value = getattr(findings.totals, position if of_total else f"{position}_right") if findings else None
            self.cells[f"{position}_right_text"].show_known("" if value is None else whole(value))

    def _fit_totals(self) -> None:
        """Set all totals smaller where one of them is long."""
        longest = max(len(label.text()) for label in self.totals.values())
        font = self._look.font("total" if longest <= LONGEST_IN_FULL else "small")
        for label in self.totals.values():
            if label.font() != font:
                label.setFont(font)

    def _arrange(self, layout: str, of_total: bool) -> None:
        """Place the widgets in blocks, typed columns first and what follows from them last; across, transposed."""
        if self._arranged == (layout, of_total):
            return
        self._arranged = (layout, of_total)
        while self._layout.count():
            self._layout.takeAt(0)
        middle = (self.total_heading, None) if of_total else (self.headings["right"], self.roles["right"])
        last = (self.headings["right"], self.roles["right"]) if of_total else (self.total_heading, None)
        heads = ((self.headings["left"], self.roles["left"]), middle, last)
        for column, (heading, role) in enumerate(heads, start=1):
            self._place(0, column, heading, role)
        for row, position in enumerate(("first", "second"), start=1):
            self._place(row, 0, self.labels[position], self.roles[position])
            for column, part in ((1, "left"), (2, "right")):
                self._place(row, column, self.cells[f"{position}_{part}_text"])
            self._place(row, 3, self.totals[position])
        for column, key in ((1, "left"), (2, "right"), (3, "everyone")):
            self._place(3, column, self.totals[key])
        for column, stretch in enumerate((6, 5, 5, 4) if of_total else (7, 5, 5, 2)):
            self._layout.setColumnStretch(column, stretch)
        self._set_alignment(layout)
        before: QWidget = self.labels["second"]
        for field in self._reading_order():
            self.setTabOrder(before, self.cells[field])
            before = self.cells[field]

    def _reading_order(self) -> tuple[str, ...]:
        """The cells line by line, as they stand."""
        across = self._arranged is not None and self._arranged[0] == "across"
        return (CELLS[0], CELLS[2], CELLS[1], CELLS[3]) if across else CELLS

    def _place(self, row: int, column: int, widget: QWidget, under: QWidget | None = None) -> None:
        """Put a widget into a block of the upright grid, with a small line under it or over the block's height."""
        if self._arranged and self._arranged[0] == "across":
            row, column = column, row
        one_line = row == 0 or under is not None
        self._layout.addWidget(widget, 3 * row, column, 1 if one_line else 2, 1)
        if under:
            self._layout.addWidget(under, 3 * row + 1, column)

    def _set_alignment(self, layout: str) -> None:
        """Right over the figures of a column, left where a row begins."""
        upright = layout == "down"
        left = Qt.AlignmentFlag.AlignLeft
        over, before = (self.headings, self.labels) if upright else (self.labels, self.headings)
        for key, field in over.items():
            field.setAlignment(Qt.AlignmentFlag.AlignRight)
            self.roles[key].setAlignment(RIGHT)
        for key, field in before.items():
            field.setAlignment(left)
            self.roles[key].setAlignment(left | Qt.AlignmentFlag.AlignVCenter)
        self.total_heading.setAlignment(RIGHT if upright else left | Qt.AlignmentFlag.AlignVCenter)

    def _small(self, alignment: Qt.AlignmentFlag = Qt.AlignmentFlag.AlignLeft) -> QLabel:
        label = QLabel()
        label.setAlignment(alignment)
        label.setTextFormat(Qt.TextFormat.PlainText)
        return label

    def _connect_all(self) -> None:
        self._pass_on(*self.cells.values(), *self.labels.values(), *self.headings.values())
        for cell in self.cells.values():
            cell.moved.connect(self._on_moved)
        self.labels["first"].returnPressed.connect(self._on_first_label_done)
        self.labels["second"].returnPressed.connect(self._on_second_label_done)
        self._look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    def _on_moved(self, field: str, key: Qt.Key) -> None:
        """Go to the cell in the direction of an arrow key; Enter goes on in reading order, past what is known."""
        order = self._reading_order()
        at = order.index(field)
        steps = {Qt.Key.Key_Up: -2, Qt.Key.Key_Down: 2, Qt.Key.Key_Left: -1}
        target = at + steps.get(key, 1)
        goes_on = key in (Qt.Key.Key_Return, Qt.Key.Key_Enter)
        while (
            goes_on
            and target < len(order)
            and self.cells[order[target]].placeholderText()
            and not (self.cells[order[target]].text())
        ):
            target += 1
        if 0 <= target < len(order):
            self._go_to(order[target])

    def _go_to(self, field: str) -> None:
        cell = self.cells[field]
        cell.setFocus(Qt.FocusReason.OtherFocusReason)
        cell.selectAll()

    def _on_first_label_done(self) -> None:
        self._go_to(CELLS[0])

    def _on_second_label_done(self) -> None:
        self._go_to(CELLS[2])

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._layout.setHorizontalSpacing(px(10))
        self._layout.setVerticalSpacing(0)
        for block in range(3):
            self._layout.setRowMinimumHeight(3 * block + 2, px(8))
        self._layout.setColumnMinimumWidth(0, px(84))
        palette = self._look.text_palette("muted")
        for label in (*self.roles.values(), self.total_heading, *self.totals.values()):
            label.setPalette(palette)
        for label in (*self.roles.values(), self.total_heading):
            label.setFont(self._look.font("small"))
        self._fit_totals()
