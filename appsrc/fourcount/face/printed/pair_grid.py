"""The grid of pairs: the first side runs down, the second across, and the discordant counts are named."""

from __future__ import annotations

from typing import TYPE_CHECKING

from fourcount.ink.typeset import bounded
from fourcount.record.outcome import Outcome
from fourcount.wording import labels
from fourcount.wording.printed_labels import PAIR_NAMES, PAIR_NOTES, SIDE_HINTS

if TYPE_CHECKING:
    from PySide6.QtWidgets import QGridLayout

    from fourcount.face.grid import Grid

DISCORDANT = tuple(PAIR_NOTES)


def place_pairs(grid: Grid, layout: QGridLayout) -> None:
    """Both headings stand twice: as columns for the second side, as rows for the first."""
    layout.addWidget(grid.labels["second"], 0, 1, 1, 2)
    layout.addWidget(grid.roles["second"], 1, 1, 1, 2)
    layout.addWidget(grid.labels["first"], 3, 0)
    layout.addWidget(grid.roles["first"], 4, 0)
    for column, key in enumerate(("left", "right"), start=1):
        layout.addWidget(grid.headings[key], 3, column)
        layout.addWidget(grid.roles[key], 4, column)
    layout.addWidget(grid.total_heading, 3, 3)
    for top, position, heading in ((6, "first", "left"), (9, "second", "right")):
        layout.addWidget(grid.row_head(heading), top, 0, 2, 1)
        for column, part in enumerate(("left", "right"), start=1):
            field = f"{position}_{part}_text"
            layout.addWidget(grid.cells[field], top, column, 2, 1)
            if field in DISCORDANT:
                layout.addWidget(grid.note(field), top + 2, column)
        layout.addWidget(grid.totals[position], top, 3, 2, 1)
    for column, key in enumerate(("left", "right", "everyone"), start=1):
        layout.addWidget(grid.totals[key], 12, column)


def show_pairs(grid: Grid, outcome: Outcome) -> None:
    """Name the sides, the rows and the cells."""
    hints = SIDE_HINTS.get(outcome.design, SIDE_HINTS["paired"])
    sides: dict[str, str] = {}
    for (position, label), hint in zip(grid.labels.items(), hints, strict=True):
        label.setPlaceholderText(hint)
        sides[position] = label.text().strip() or hint
        label.setAlignment(grid.total_heading.alignment() if position == "second" else grid.roles["first"].alignment())
    for column, head in grid.row_heads.items():
        if column in grid.headings:
            heading = grid.headings[column]
            head.setText(bounded(heading.text().strip() or heading.placeholderText()))
    heading = grid.headings["left"]
    event = heading.text().strip() or heading.placeholderText()
    for field, cell in grid.cells.items():
        name = PAIR_NAMES[field].format(outcome=event, **sides)
        if name != cell.accessibleName():
            cell.setAccessibleName(name)
    for field, pattern in PAIR_NOTES.items():
        grid.note(field).setText(bounded(pattern.format(**sides)))
    grid.roles["second"].setAlignment(grid.total_heading.alignment())
    grid.total_heading.setText(labels.TOTAL)
