"""The four-cell grid: counts to type, labels in place, and live totals beside them."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import Qt
from PySide6.QtWidgets import QGridLayout, QLabel, QSizePolicy, QWidget

from fourcount.face.cell import CountCell
from fourcount.face.fields import FieldsView, QuietField, TextField
from fourcount.face.grid_forms import GRID_FORMS, GridForm
from fourcount.face.look import Look
from fourcount.record.outcome import CELLS, Form, Outcome, form_of
from fourcount.wording import labels

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings

LONGEST_IN_FULL = 7
"""Totals of more characters than this are all set smaller, so that the grid keeps its shape."""

RIGHT = Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignVCenter

ACROSS = (4, 7, 7, 3)
"""Shares of the width where groups run across: their names stand over the columns."""


class Grid(FieldsView):
    """Two groups by two columns, as the paper prints them: groups down or across.

    The widgets of rarer forms (a unit, the level of limits, notes under cells) are made on first use.
    """

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._arranged: tuple[str, Form] | None = None
        self._rare: dict[str, TextField] = {}
        self.notes: dict[str, QLabel] = {}
        self.row_heads: dict[str, QLabel] = {}
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
        for widget in (*self.fields, *self._small_words()):
            widget.setParent(self)  # a form may leave some out
        self._layout = QGridLayout(self)
        self._layout.setContentsMargins(0, 0, 0, 0)
        self.setSizePolicy(QSizePolicy.Policy.Expanding, QSizePolicy.Policy.Fixed)
        self._connect_all()

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every field of the grid that was made so far, in reading order."""
        return (*self.headings.values(), *self._rare.values(), *self.labels.values(), *self.cells.values())

    def show_state(self, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        """Show the texts, which column is counted, and the totals; nothing where the form has no four cells."""
        form = form_of(outcome.table)
        if form not in GRID_FORMS:
            return
        self._arrange("down" if form == "pairs" else outcome.layout, form)
        for name, cell in (*self.cells.items(), *self._rare.items()):
            cell.show_text(getattr(outcome.table, name, ""))
        for position, label in self.labels.items():
            label.show_text(getattr(outcome, f"{position}_label_text"))
        for column, heading in self.headings.items():
            heading.show_text(getattr(outcome, f"{column}_heading_text"))
        self._show_hints(outcome)
        self._show_roles(outcome)
        self._show_names(outcome, GRID_FORMS[form])
        self._show_totals(findings, GRID_FORMS[form])
        self._show_rest(outcome, findings, form)

    def _show_rest(self, outcome: Outcome, findings: OutcomeFindings | None, form: Form) -> None:
        """What some forms have besides; the names of the sums."""
        if form == "pairs":
            from fourcount.face.printed.pair_grid import show_pairs

            show_pairs(self, outcome)
        elif form == "percent-of-total":
            from fourcount.face.printed.percent_grid import show_counts

            show_counts(self, findings)
        for word in self._small_words():
            word.setVisible(bool(word.text()) and self._layout.indexOf(word) >= 0)
        if findings:  # the first paint needs no names
            from fourcount.face.grid_names import name_totals

            name_totals(self, GRID_FORMS[form], form)

    def read_in_order(self, parts: list[QWidget]) -> list[QWidget]:
        """Names first, then the counts line by line with what stands beside them, as Tab goes."""
        names = (*self.headings.items(), *self._rare.items(), *self.labels.items())
        first = [part for key, field in names for part in (field, self.roles.get(key)) if part in parts]
        return [*first, *(part for part in parts if part not in first)]

    def note(self, field: str) -> QLabel:
        """The small line under a cell."""
        if field not in self.notes:
            self.notes[field] = self._small(RIGHT)
            self.notes[field].setContentsMargins(0, 0, 0, 4)
            self.notes[field].setWordWrap(True)
            self.notes[field].setMinimumWidth(0)
            self._dress()
        return self.notes[field]

    def row_head(self, column: str) -> QLabel:
        """The name of a row that repeats the heading of a column, as a table of pairs has it."""
        if column not in self.row_heads:
            self.row_heads[column] = self._small(Qt.AlignmentFlag.AlignLeft | Qt.AlignmentFlag.AlignVCenter)
            self._dress()
        return self.row_heads[column]

    def _show_hints(self, outcome: Outcome) -> None:
        kind = {"case-control": "_cases", "matched": "_exposed"}.get(outcome.design, "")
        for column, heading in self.headings.items():
            words = getattr(outcome, f"{column}_words_text").strip()
            heading.setPlaceholderText(words or labels.HINTS[f"{column}_heading{kind}"])
        for label in self.labels.values():
            if form_of(outcome.table) != "pairs":
                label.setPlaceholderText(labels.HINTS["label"])

    def _show_roles(self, outcome: Outcome) -> None:
        for position in ("first", "second"):
            role = "index" if outcome.index_group == position else "reference"
            self.roles[position].setText(labels.ROLES[role])
        for column in ("left", "right"):
            self.roles[column].setText(labels.ROLES["counted"] if outcome.counted == column else "")

    def _show_names(self, outcome: Outcome, kind: GridForm) -> None:
        if "pairs" in kind.names:
            return
        for field, cell in self.cells.items():
            position, column = field.split("_")[:2]
            group = getattr(outcome, f"{position}_label_text").strip() or labels.GROUP_NAMES[position]
            heading = self.headings[column]
            words = heading.text().strip() or heading.placeholderText()
            pattern = labels.CELL_NAMES[kind.names[0 if column == "left" else 1]]
            name = pattern.format(group=group, outcome=words)
            if name != cell.accessibleName():
                cell.setAccessibleName(name)

    def _show_totals(self, findings: OutcomeFindings | None, kind: GridForm) -> None:
        from fourcount.wording.numbers import whole

        totals = findings.totals if findings else None

        def words(key: str) -> str:
            value = getattr(totals, key) if totals and key else None
            return "" if value is None else whole(value)

        for position, key, known in zip(("first", "second"), kind.sides, kind.known, strict=True):
            self.totals[position].setText(words(key))
            self.cells[f"{position}_right_text"].show_known(words(known))
        for key, foot in zip(("left", "right", "everyone"), kind.feet, strict=True):
            self.totals[key].setText(words(foot))
        self._fit_totals()

    def _fit_totals(self) -> None:
        """Set all totals smaller where one of them is long."""
        longest = max(len(label.text()) for label in self.totals.values())
        font = self._look.font("total" if longest <= LONGEST_IN_FULL else "small")
        for label in self.totals.values():
            if label.font() != font:
                label.setFont(font)

    def _arrange(self, layout: str, form: Form) -> None:
        """Place the widgets in blocks, typed columns first and what follows from them last; across, transposed."""
        if self._arranged == (layout, form):
            return
        self._arranged = (layout, form)
        while self._layout.count():
            self._layout.takeAt(0)
        kind = GRID_FORMS[form]
        if form == "pairs":
            from fourcount.face.printed.pair_grid import place_pairs

            place_pairs(self, self._layout)
        else:
            self._place_groups(kind, form)
        self._layout.setRowMinimumHeight(11, self._look.px(8) if form == "pairs" else 0)
        for column, stretch in enumerate(kind.stretches if layout == "down" else ACROSS):
            self._layout.setColumnStretch(column, stretch)
        self._set_alignment(layout)
        for widget in self.fields:
            widget.setVisible(self._layout.indexOf(widget) >= 0)
        for made in self._rare.values():
            if self._layout.indexOf(made) >= 0:
                self.setTabOrder(self.headings["right"], made)
        before: QWidget = self.labels["second"]
        for field in self._reading_order():
            self.setTabOrder(before, self.cells[field])
            before = self.cells[field]

    def _place_groups(self, kind: GridForm, form: Form) -> None:
        """A row for each group, a column for what is typed of it."""
        for column, head in enumerate(kind.heads, start=1):
            if head:
                self._place(0, column, *self._head(head))
        for row, position in enumerate(("first", "second"), start=1):
            self._place(row, 0, self.labels[position], self.roles[position])
            for column, part in ((1, "left"), (2, "right")):
                self._place(row, column, self.cells[f"{position}_{part}_text"])
            if form == "percent-of-total":
                self._place(row, 1, self.note(f"{position}_left_text"), line=2)
            if kind.sides[0]:
                self._place(row, 3, self.totals[position])
        for column, key in ((1, "left"), (2, "right"), (3, "everyone")):
            if kind.feet[column - 1]:
                self._place(3, column, self.totals[key])

    def _head(self, key: str) -> tuple[QWidget, QWidget | None]:
        """The head of a column, and the small line under it."""
        if key == "total":
            return self.total_heading, None
        if key == "unit":
            return self._rare_field("unit_text"), None
        if key == "limits":
            head = self.row_head("limits")
            head.setText(labels.LIMITS)
            return head, self._rare_field("limits_level_text")
        return self.headings[key], self.roles[key]

    def _rare_field(self, field: str) -> TextField:
        if field not in self._rare:
            made = QuietField(self._look, field, labels.FIELDS[field], labels.HINTS[field], role="small")
            made.setParent(self)
            self._pass_on(made)
            self._rare[field] = made
        return self._rare[field]

    def _small_words(self) -> tuple[QLabel, ...]:
        """All that is only read; what is empty keeps its room and is not there for a screen reader."""
        return (
            *self.roles.values(), self.total_heading, *self.totals.values(), *self.notes.values(),
            *self.row_heads.values(),
        )  # fmt: skip

    def _reading_order(self) -> tuple[str, ...]:
        """The cells line by line, as they stand."""
        across = self._arranged is not None and self._arranged[0] == "across"
        return (CELLS[0], CELLS[2], CELLS[1], CELLS[3]) if across else CELLS

    def _place(self, row: int, column: int, widget: QWidget, under: QWidget | None = None, line: int = 0) -> None:
        """Put a widget into a block of the upright grid, with a small line under it or over the block's height."""
        if self._arranged and self._arranged[0] == "across":
            row, column = column, row
        one_line = row == 0 or under is not None or line > 0
        self._layout.addWidget(widget, 3 * row + line, column, 1 if one_line else 2, 1)
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
        for made in self._rare.values():
            made.setAlignment(Qt.AlignmentFlag.AlignRight if upright else left)
        if "limits" in self.row_heads:
            self.row_heads["limits"].setAlignment(RIGHT if upright else left | Qt.AlignmentFlag.AlignVCenter)
        self.total_heading.setAlignment(RIGHT if upright else left | Qt.AlignmentFlag.AlignVCenter)

    def _small(self, alignment: Qt.AlignmentFlag = Qt.AlignmentFlag.AlignLeft) -> QLabel:
        label = QLabel()
        label.setAlignment(alignment)
        label.setTextFormat(Qt.TextFormat.PlainText)
        policy = label.sizePolicy()
        policy.setRetainSizeWhenHidden(True)
        label.setSizePolicy(policy)
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
        self._dress()
        self._fit_totals()

    def _dress(self) -> None:
        """Give every small word its colour and size."""
        palette, small = self._look.text_palette("muted"), self._look.font("small")
        for label in self.totals.values():
            label.setPalette(palette)
        for label in (*self.roles.values(), self.total_heading, *self.notes.values(), *self.row_heads.values()):
            label.setPalette(palette)
            label.setFont(small)
