"""Several tables of one outcome as a compact table: a row for each, with its label and two cells a group."""

from __future__ import annotations

from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import Qt, Signal
from PySide6.QtWidgets import QGridLayout, QLabel, QWidget

from fourcount.face.cell import CountCell
from fourcount.face.fields import FieldsView, QuietField, TextField
from fourcount.face.look import Look
from fourcount.face.printed.strata_heads import StrataHeads
from fourcount.record.outcome import CELLS, Outcome, Strata, Stratum
from fourcount.wording import labels
from fourcount.wording.printed_labels import STRATUM_CELL
from fourcount.wording.spoken import TOGETHER, named_sum

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings

FIRST_ROW = 4
"""Lines of the layout that the heads take."""


class StratumRow(NamedTuple):
    """One stratum's fields."""

    label: TextField
    cells: dict[str, CountCell]

    @property
    def fields(self) -> tuple[TextField, ...]:
        return (self.label, *self.cells.values())


class StrataRows(FieldsView):
    """Rows are made as they are needed and hidden where there are fewer; a row is one stratum by its place.

    **Signals**
        row_wanted: Enter in the last cell of the last row.
        row_entered: the cursor came into a row. Carries its place.
    """

    row_wanted = Signal()
    row_entered = Signal(int)

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._rows: list[StratumRow] = []
        self._shown: dict[int, tuple[Stratum, dict[str, str]]] = {}
        self.current = 0
        self._count = 0
        self._layout = QGridLayout(self)
        self._layout.setContentsMargins(0, 0, 0, 0)
        self.heads = StrataHeads(look, self._layout)
        self._feet = [self._foot(place) for place in range(4)]
        for column, stretch in enumerate((8, 5, 5, 5, 5)):
            self._layout.setColumnStretch(column, stretch)
        self._pass_on(*self.heads.fields)
        for field in self.heads.fields:
            field.returnPressed.connect(self._on_head_done)
        look.changed.connect(self._on_look_changed)
        self._on_look_changed()

    @property
    def rows(self) -> list[StratumRow]:
        """The rows on screen."""
        return self._rows[: self._count]

    @property
    def fields(self) -> tuple[TextField, ...]:
        """Every field on screen, in reading order."""
        return (*self.heads.fields, *(field for row in self.rows for field in row.fields))

    @property
    def last_stop(self) -> QWidget:
        """The last field that was made, on screen or not: rows to come are put right behind it."""
        return self._rows[-1].fields[-1]

    def show_state(self, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        """Show the strata as typed."""
        table = outcome.table
        if not isinstance(table, Strata):
            return
        self.heads.show_state(outcome, table.of_total)
        while len(self._rows) < len(table.strata):
            self._add_row()
        if self._count != len(table.strata):
            self._count = len(table.strata)
            self.current = min(self.current, self._count - 1)
            self._place_feet()
            for place, row in enumerate(self._rows):
                for field in row.fields:
                    field.setVisible(place < self._count)
        names = {name: self.heads.name(name) for name in CELLS}
        for place, (row, stratum) in enumerate(zip(self.rows, table.strata, strict=True)):
            if (stratum, names) == self._shown.get(place):
                continue
            self._shown[place] = (stratum, names)
            row.label.show_text(stratum.label_text)
            for name, cell in row.cells.items():
                cell.show_text(getattr(stratum, name))
                cell.setAccessibleName(STRATUM_CELL.format(number=place + 1, name=names[name]))
        self._show_feet(findings, table.of_total)

    def show_marks(self, reasons: dict[str, str]) -> None:
        """Mark each cell that has a reason."""
        for row in self.rows:
            for field in row.fields:
                field.show_mark(reasons.get(field.field, ""))

    def go_to(self, place: int, name: str = "label_text") -> None:
        """Bring the cursor into a row."""
        row = self._rows[place]
        field = row.label if name == "label_text" else row.cells[name]
        field.setFocus(Qt.FocusReason.OtherFocusReason)
        field.selectAll()

    def place_of(self, field: str) -> int:
        """The place of the row that a field stands in; the current one where it stands in none."""
        parts = field.split(".")
        return int(parts[1]) if parts[0] == "strata" else self.current

    def _add_row(self) -> None:
        place = len(self._rows)
        label = QuietField(
            self._look,
            f"strata.{place}.label_text",
            labels.FIELDS["stratum"].format(number=place + 1),
            labels.HINTS["stratum"] if place == 0 else str(place + 1),
        )
        cells = {name: CountCell(self._look, f"strata.{place}.{name}", compact=True) for name in CELLS}
        row = StratumRow(label, cells)
        before: QWidget = self._rows[-1].fields[-1] if self._rows else self.heads.fields[-1]
        for column, field in enumerate(row.fields):
            self._layout.addWidget(field, FIRST_ROW + place, column)
            QWidget.setTabOrder(before, field)
            field.entered.connect(self._on_entered)
            before = field
        label.returnPressed.connect(self._on_label_done)
        for cell in cells.values():
            cell.moved.connect(self._on_moved)
        self._pass_on(*row.fields)
        self._rows.append(row)

    def _foot(self, _place: int) -> QLabel:
        foot = QLabel()
        foot.setTextFormat(Qt.TextFormat.PlainText)
        foot.setAlignment(Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignVCenter)
        return foot

    def _place_feet(self) -> None:
        for column, foot in enumerate(self._feet, start=1):
            self._layout.removeWidget(foot)
            self._layout.addWidget(foot, FIRST_ROW + len(self._rows), column)

    def _show_feet(self, findings: OutcomeFindings | None, of_total: bool) -> None:
        from fourcount.wording.numbers import whole

        keys = (
            ("first_left", "first", "second_left", "second")
            if of_total
            else ("first_left", "first_right", "second_left", "second_right")
        )
        for foot, key, cell in zip(self._feet, keys, CELLS, strict=True):
            value = getattr(findings.totals, key) if findings else None
            words = "" if value is None else whole(value)
            foot.setText(words)
            foot.setVisible(bool(words))
            name = named_sum(TOGETHER, self.heads.name(cell), words)
            if name != foot.accessibleName():
                foot.setAccessibleName(name)

    def _on_moved(self, field: str, key: Qt.Key) -> None:
        """Arrows go to the neighbour; Enter goes on in reading order, and past the end asks for a row."""
        _, text, name = field.split(".")
        place, column = int(text), CELLS.index(name)
        if key in (Qt.Key.Key_Up, Qt.Key.Key_Down):
            target = place + (1 if key == Qt.Key.Key_Down else -1)
            if 0 <= target < self._count:
                self.go_to(target, name)
        elif key == Qt.Key.Key_Left:
            self.go_to(place, CELLS[column - 1] if column else "label_text")
        elif column < len(CELLS) - 1:
            self.go_to(place, CELLS[column + 1])
        elif place + 1 < self._count:
            self.go_to(place + 1, "label_text" if key == Qt.Key.Key_Right else CELLS[0])
        elif key != Qt.Key.Key_Right:
            self.row_wanted.emit()

    def _on_label_done(self) -> None:
        sender = self.sender()
        if isinstance(sender, TextField):
            self.go_to(self.place_of(sender.field), CELLS[0])

    def _on_head_done(self) -> None:
        self.go_to(0)

    def _on_entered(self, field: str) -> None:
        self.current = min(self.place_of(field), self._count - 1)
        self.row_entered.emit(self.current)

    def _on_look_changed(self) -> None:
        px = self._look.px
        self._layout.setHorizontalSpacing(px(5))
        self._layout.setVerticalSpacing(px(4))
        self.heads.dress()
        for foot in self._feet:
            foot.setFont(self._look.font("small"))
            foot.setPalette(self._look.text_palette("muted"))
            foot.setContentsMargins(0, 0, px(5), 0)
