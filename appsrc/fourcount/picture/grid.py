"""Where the icons of an array stand, in units of one icon's cell."""

from __future__ import annotations

from dataclasses import dataclass

GAP = 0.5
"""The space that sets tens apart, in icon widths."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Grid:
    """Rows of icons filled from the top left corner; gaps after every ``across`` columns and ``down`` rows."""

    columns: int
    rows: int
    across: int
    down: int

    def x(self, column: int) -> float:
        """Left edge of a column, in icon widths."""
        return column + GAP * (column // self.across)

    def y(self, row: int) -> float:
        """Top edge of a row, in icon heights."""
        return row + GAP * (row // self.down)

    @property
    def width(self) -> float:
        """Width of the whole array, in icon widths."""
        return self.x(self.columns - 1) + 1

    @property
    def height(self) -> float:
        """Height of the whole array, in icon heights."""
        return self.y(self.rows - 1) + 1


GRIDS = {
    100: Grid(columns=10, rows=10, across=5, down=5),
    1_000: Grid(columns=20, rows=50, across=10, down=10),
    10_000: Grid(columns=100, rows=100, across=10, down=10),
}
"""One grid a denominator; each row is filled from the left, so that the affected form one block."""
