"""Where the cursor goes: to the field that a command names, and back to what an undo changed."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QObject, Qt
from PySide6.QtGui import QAction
from PySide6.QtWidgets import QWidget

from fourcount.face.choice_field import ChoiceField
from fourcount.face.fields import TextField
from fourcount.record.outcome import CELLS

if TYPE_CHECKING:
    from fourcount.face.window import MainWindow
    from fourcount.record.entry.readings import Pasted


class CursorKeeper(QObject):
    """The slots that move the focus of one window."""

    def __init__(self, window: MainWindow) -> None:
        super().__init__(window)
        self._window = window
        self._before_paste: QWidget | None = None

    def focus_wanted(self, key: str) -> None:
        """Go to the field with a key, wherever it stands."""
        window = self._window
        heads = (window.header.title, window.header.source)
        head: TextField | None = next((field for field in heads if field.field == key), None)
        field = (
            head or window.patient.field_named(key) or window.says.field_named(key) or window.printed.field_named(key)
        )
        if field:
            field.setFocus(Qt.FocusReason.OtherFocusReason)

    def to_first_cell(self) -> None:
        """Go to where the table of this form begins."""
        self._go_to(self._window.printed.first_field)

    def to_baseline(self) -> None:
        """Go to the starting risk, however it is given."""
        self._go_to(self._window.patient.first_field)

    def to_own_line(self) -> None:
        """Go to the reader's own line, drawn anew where there was none."""
        if self._window.session.outcome.line_kind == "none":
            self._window.commands.choose("line_kind", "matters")
        field = self._window.says.field_named("line_text")
        if field:
            self._go_to(field)

    def to_paper(self) -> None:
        """Go to what the paper says."""
        session = self._window.session
        self._go_to(self._window.printed.paper_field(session.outcome, session.record.choices))

    def to_form(self) -> None:
        """Go to the choice of the form of print, and open it."""
        self._open(self._window.printed.form)

    def to_study(self) -> None:
        """Go to the choice of the kind of study, and open it."""
        self._open(self._window.printed.design)

    def form_chosen(self, action: QAction) -> None:
        """Take a form from the menu, and go to where it begins."""
        self._window.commands.choose_form(action.data())
        self.to_first_cell()

    def add_row(self) -> None:
        """One more row of strata, with the cursor in it."""
        self._window.commands.add_row()
        self._window.printed.rare.go_to_last_row()

    def add_row_by_enter(self) -> None:
        """One more row of strata, with the cursor in its first count, as Enter goes from count to count."""
        self._window.commands.add_row()
        self._window.printed.rare.go_to_last_row(CELLS[0])

    def remove_row(self) -> None:
        """Take out the row of strata in which the cursor is."""
        self._window.commands.remove_row(self._window.printed.rare.current_row)
        self._window.printed.rare.go_to_current_row()

    def paste_offered(self, pasted: Pasted) -> None:
        """Show what a paste was understood as, and remember where the cursor was."""
        self._before_paste = self._window.focusWidget()
        self._window.printed.tell("")
        self._window.printed.rare.offer(pasted, self._window.session.outcome)

    def paste_over(self) -> None:
        """Go back to where the cursor was before something was offered."""
        before, self._before_paste = self._before_paste, None
        if before is not None and before.isVisible():
            before.setFocus(Qt.FocusReason.OtherFocusReason)
        elif before is not None:
            self.to_first_cell()

    def _open(self, choice: ChoiceField) -> None:
        choice.setFocus(Qt.FocusReason.ShortcutFocusReason)
        self._window.page_scroll.ensureWidgetVisible(choice)
        choice.showPopup()

    def _go_to(self, field: TextField) -> None:
        field.setFocus(Qt.FocusReason.ShortcutFocusReason)
        field.selectAll()
        self._window.page_scroll.ensureWidgetVisible(field)
