"""Fields that few papers need, under the table."""

from __future__ import annotations

from collections.abc import Sequence

from PySide6.QtWidgets import QWidget

from fourcount.face.look import Look
from fourcount.face.printed.optional_rows import ROWS, OptionalRow, holds
from fourcount.face.rows_on_demand import RowOnDemand, RowsOnDemand
from fourcount.record.outcome import Form, Outcome, form_of
from fourcount.wording.printed_labels import OPTIONAL

COUNTED = ("counting", "follow-up", "losses", "clusters", "adjusted", "where")
OFFERED: dict[Form, tuple[str, ...]] = {
    "events-and-others": COUNTED,
    "events-of-total": COUNTED,
    "percent-of-total": COUNTED,
    "strata": ("counting", "follow-up", "clusters", "adjusted", "where"),
    "pairs": ("adjusted", "where"),
    "person-time": ("counting", "clusters", "adjusted", "where"),
    "risk-at-time": ("adjusted", "where"),
    "effect-only": ("where",),
}
"""Which links each form offers; a row that holds something is there in every form."""


class OptionalFields(RowsOnDemand):
    """One line of links, and under it the rows that are open."""

    def __init__(self, look: Look) -> None:
        super().__init__(look, ROWS, OPTIONAL, OptionalRow, holds, spacing=6)

    @property
    def last_stop(self) -> QWidget:
        """The last place at which Tab stops here."""
        return [*self.links.values(), *(stop for row in self.rows.values() for stop in row.stops)][-1]

    def _offered(self, outcome: Outcome) -> Sequence[str]:
        return OFFERED[form_of(outcome.table)]

    def _place(self, key: str, row: RowOnDemand) -> None:
        super()._place(key, row)
        before: QWidget = list(self.links.values())[-1]
        for widget in (stop for part in self.rows.values() for stop in part.stops):
            QWidget.setTabOrder(before, widget)
            before = widget

    def _on_opened(self, key: str) -> None:
        closed = key not in self.rows or self.rows[key].isHidden()
        super()._on_opened(key)
        if key == "follow-up" and closed:
            self.chosen.emit("follow_up_varied", True)  # whoever opens it has something else to say than is assumed
