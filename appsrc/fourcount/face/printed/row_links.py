"""Two links under the strata: one more row, and without the row in which the cursor is."""

from __future__ import annotations

from PySide6.QtGui import QAction
from PySide6.QtWidgets import QWidget

from fourcount.face.flow import FlowLayout
from fourcount.face.links import Link
from fourcount.face.look import Look
from fourcount.wording.printed_labels import ROW_LINKS


class RowLinks(QWidget):
    """Adds and removes rows of strata."""

    def __init__(self, look: Look, add: QAction, remove: QAction) -> None:
        super().__init__()
        self.add = Link(look, ROW_LINKS["add"], add)
        self.remove = Link(look, ROW_LINKS["remove"].format(number=1), remove)
        flow = FlowLayout(look, self)
        flow.addWidget(self.add)
        flow.addWidget(self.remove)

    def show_current(self, place: int) -> None:
        """Name the row that would go."""
        self.remove.show_words(ROW_LINKS["remove"].format(number=place + 1))
