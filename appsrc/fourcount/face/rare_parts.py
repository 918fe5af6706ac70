"""The parts of the first column that are not there from the start: each is made when it is first needed.

While nothing is typed, the column is the table and one quiet line; the window paints before any of this is loaded.
"""

from __future__ import annotations

from typing import TYPE_CHECKING, NamedTuple

from PySide6.QtCore import Qt, Signal
from PySide6.QtGui import QAction
from PySide6.QtWidgets import QHBoxLayout, QVBoxLayout, QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import FieldsView, TextField
from fourcount.face.look import Look
from fourcount.record.outcome import EffectOnly, Outcome, Strata
from fourcount.record.paper import Choices

if TYPE_CHECKING:
    from fourcount.appraisal.findings import CheckFindings, OutcomeFindings
    from fourcount.face.printed.check import CheckView
    from fourcount.face.printed.optional import OptionalFields
    from fourcount.face.printed.paste_panel import PastePanel
    from fourcount.face.printed.row_links import RowLinks
    from fourcount.face.printed.strata_rows import StrataRows
    from fourcount.record.entry.readings import Pasted


class TabStops(NamedTuple):
    """Where Tab comes from: to the table's place, to what stands right under it, and to the column's foot."""

    table: QWidget
    under: QWidget
    foot: QWidget


class RareParts(FieldsView):
    """Makes and places them, and speaks for all of them; it is never shown itself.

    **Signals**
        chosen: a choice was made. Carries the outcome's field and the choice.
        row_wanted: one more row of strata is wanted.
        paste_taken: what was pasted is to be taken as shown. Carries it.
        paste_left: what was pasted is not to be taken.
    """

    chosen = Signal(str, object)
    row_wanted = Signal()
    paste_taken = Signal(object)
    paste_left = Signal()

    def __init__(
        self, look: Look, actions: dict[str, QAction], column: QVBoxLayout, row: QHBoxLayout, stops: TabStops
    ) -> None:
        super().__init__()
        self.hide()
        self._stops = stops
        self._look = look
        self._actions = actions
        self._column = column
        self._printed_row = row
        self._alone = False
        self._asked_for = False
        self._before_paper: QWidget | None = None
        self.strata: StrataRows | None = None
        self.row_links: RowLinks | None = None
        self.rows_as: ChoiceField | None = None
        self.optional: OptionalFields | None = None
        self.check: CheckView | None = None
        self.panel: PastePanel | None = None

    @property
    def fields_before(self) -> tuple[TextField, ...]:
        """The fields that stand in the table's place."""
        return self.strata.fields if self.strata and not self.strata.isHidden() else ()

    @property
    def fields_after(self) -> tuple[TextField, ...]:
        """The fields under the table."""
        optional = self.optional.fields if self.optional else ()
        return (*optional, *(self.check.paper.fields if self.check else ()))

    def show_state(self, outcome: Outcome, findings: OutcomeFindings | None, width: int) -> None:
        """Show what the outcome needs of them."""
        self._show_strata(outcome, findings)
        blank = outcome == Outcome()
        if self.panel and self.panel.isVisible() and self.panel.outcome != outcome:
            self.panel.hide()  # what was understood was compared with another table
        if self.optional is None and not blank and findings is not None:
            self.optional = self._make_optional()
        if self.optional:
            self.optional.setVisible(not blank)
            self.optional.show_state(outcome, width)

    def show_check(
        self, outcome: Outcome, check: CheckFindings | None, choices: Choices, width: int
    ) -> tuple[QWidget, QWidget] | None:
        """Show what the paper says and whether it adds up, as soon as anything is there to compare.

        Where the answer is another one and the cursor stands in a printed effect, its field and the check are given.
        """
        blank = outcome == Outcome() and not self._asked_for
        if self.check is None and blank:
            return None
        view = self.check or self._make_check()
        view.setVisible(not blank)
        before = view.answer
        view.show_state(outcome, check, choices, width)
        alone = isinstance(outcome.table, EffectOnly)
        if alone != self._alone:
            self._alone = alone
            self._move_paper(view)
        elif self._last_of_table() is not self._before_paper:
            self._chain_paper()
        focus = next((field for field in self.fields_after if field.hasFocus()), None)
        return (focus, view) if focus and view.answer != before else None

    def _move_paper(self, view: CheckView) -> None:
        """Put the line of what the paper says in the table's place, or back; a cursor in it stays there."""
        focused = view.paper.text.hasFocus()
        self._chain_paper()
        if self._alone:
            self._column.insertWidget(self._place_of_table(), view.paper)
        else:
            view.take_back()
        view.paper.show()  # another parent hides it until the next event
        if focused:
            view.paper.text.setFocus(Qt.FocusReason.OtherFocusReason)

    def show_marks(self, reasons: dict[str, str]) -> list[str]:
        """Mark the fields that have a reason; the fields that can be marked here."""
        told: list[str] = []
        if self.strata and not self.strata.isHidden():
            self.strata.show_marks(reasons)
            told += [field.field for field in self.strata.fields]
        if self.optional:
            self.optional.show_marks(reasons)
            told += [field.field for field in self.optional.fields]
        return told

    def open_for(self, field: str) -> None:
        """Open what holds a field."""
        if self.optional:
            self.optional.open_for(field)

    def offer(self, pasted: Pasted, outcome: Outcome) -> None:
        """Show what a paste was understood as, before it is taken."""
        if self.panel is None:
            from fourcount.face.printed.paste_panel import PastePanel

            self.panel = PastePanel(self._look)
            self.panel.taken.connect(self.paste_taken)
            self.panel.left.connect(self.paste_left)
            self._column.insertWidget(self._place_of_table(), self.panel)
            chain(self._stops.under, self.panel.take, self.panel.turn, self.panel.leave)
        self.panel.offer(pasted, outcome)

    @property
    def first_field(self) -> TextField | None:
        """Where typing begins in a form without the grid."""
        if self.strata and not self.strata.isHidden():
            return self.strata.rows[0].cells["first_left_text"]
        return self.check.paper.text if self.check and self._alone else None

    def instead_of(self, field: TextField) -> TextField | None:
        """Where the cursor goes from a row of strata that is gone, while others are there."""
        if field.field.startswith("strata.") and self.strata and not self.strata.isHidden():
            return self.strata.rows[-1].label
        return None

    def paper_field(self, outcome: Outcome, choices: Choices, width: int) -> TextField:
        """The field of what the paper says; once asked for, it stays."""
        self._asked_for = True
        self.show_check(outcome, self.check.found if self.check else None, choices, width)
        return (self.check or self._make_check()).paper.text

    @property
    def current_row(self) -> int:
        """The place of the row of strata in which the cursor is or was."""
        return self.strata.current if self.strata else 0

    def go_to_current_row(self) -> None:
        """Bring the cursor back into the strata."""
        if self.strata and not self.strata.isHidden():
            self.strata.go_to(self.strata.current)

    def go_to_last_row(self, name: str = "label_text") -> None:
        """Bring the cursor into the newest row."""
        if self.strata and not self.strata.isHidden():
            self.strata.go_to(len(self.strata.rows) - 1, name)

    def leave_paste(self) -> bool:
        """Put an offered paste away; whether there was one."""
        if self.panel is None or not self.panel.isVisible():
            return False
        self.panel.leave.click()
        return True

    def _show_strata(self, outcome: Outcome, findings: OutcomeFindings | None) -> None:
        wanted = isinstance(outcome.table, Strata)
        if wanted and self.strata is None:
            self._make_strata()
        if self.strata and self.row_links and self.rows_as:
            for widget in (self.strata, self.row_links, self.rows_as):
                widget.setVisible(wanted)
            self.strata.show_state(outcome, findings)
            if isinstance(outcome.table, Strata):
                self.rows_as.show_choice(outcome.table.of_total)
                self.row_links.show_current(self.strata.current)

    def _make_strata(self) -> None:
        from fourcount.face.printed.row_links import RowLinks
        from fourcount.face.printed.strata_rows import StrataRows
        from fourcount.wording import labels
        from fourcount.wording.printed_labels import ROWS_AS

        self.strata = StrataRows(self._look)
        self.row_links = RowLinks(self._look, self._actions["add-row"], self._actions["remove-row"])
        self.rows_as = ChoiceField(self._look, labels.FIELDS["rows_as"], tuple(ROWS_AS.items()))
        place = self._place_of_table()
        self._column.insertWidget(place, self.strata)
        self._column.insertWidget(place + 1, self.row_links)
        self._printed_row.addWidget(self.rows_as, 3)
        chain(self._stops.table, self.rows_as, *self.strata.fields, self.row_links.add, self.row_links.remove)
        self._pass_on(self.strata)
        self.strata.row_wanted.connect(self.row_wanted)
        self.strata.row_entered.connect(self.row_links.show_current)
        self.rows_as.chosen.connect(self._on_rows_as)

    def _make_optional(self) -> OptionalFields:
        from fourcount.face.printed.optional import OptionalFields

        made = OptionalFields(self._look)
        self._pass_on(made)
        made.chosen.connect(self.chosen)
        self._column.insertWidget(self._column.indexOf(self.check) if self.check else self._place_of_foot(), made)
        chain(self._stops.foot, *made.links.values())
        return made

    def _make_check(self) -> CheckView:
        from fourcount.face.printed.check import CheckView

        self.check = CheckView(self._look, self._actions["adopt"])
        self._pass_on(self.check)
        self.check.measure_chosen.connect(self._on_paper_measure)
        self._column.insertWidget(self._place_of_foot(), self.check)
        self._chain_paper()
        return self.check

    def _chain_paper(self) -> None:
        """Tab reaches what the paper says right after the table, or in its place: the links are seldom needed."""
        if self.check is None:
            return
        foot = self.optional.last_stop if self.optional else self._stops.foot
        self._before_paper = self._last_of_table()
        chain(self._before_paper, self.check.paper.measure, *self.check.paper.fields, self.check.adopt)
        if self._alone:
            chain(foot, self.check.adopt)

    def _last_of_table(self) -> QWidget:
        """Where typing a table ends: what the paper says of it comes next."""
        if self.strata and not self.strata.isHidden():
            return self.strata.last_stop
        return self._stops.table if self._alone else self._stops.under

    def _place_of_table(self) -> int:
        """Right under the grid, where whatever stands in its stead goes."""
        return 3

    def _place_of_foot(self) -> int:
        """Before the stretch at the column's end."""
        return self._column.count() - 1

    def _on_rows_as(self, of_total: bool) -> None:
        self.chosen.emit("of_total", of_total)

    def _on_paper_measure(self, measure: object) -> None:
        self.chosen.emit("paper_measure", measure)


def chain(before: QWidget, *widgets: QWidget) -> None:
    """Let Tab go from a widget through others in this order."""
    for widget in widgets:
        QWidget.setTabOrder(before, widget)
        before = widget
