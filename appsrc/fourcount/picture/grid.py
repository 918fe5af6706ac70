"""Where the icons of an array stand: in blocks that can be counted, each filled row by row from the same corner."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from math import floor
from typing import NamedTuple

GAP = 0.5
"""The space that sets tens apart, in icon widths, where there is room for it."""

LEAST_GAP = 0.3
"""The same at its narrowest."""

SNAPPED_FROM = 3
"""From this width on an icon's cell is a whole number of pixels, so that all icons look alike."""


class Piece(NamedTuple):
    """A rectangle of icons inside one block: first column and row of the array, and how many of each."""

    column: int
    row: int
    columns: int
    rows: int


@dataclass(frozen=True, kw_only=True, slots=True)
class Grid:
    """Blocks of ``block`` columns and rows, filled one after another from the top left corner, row by row inside each.

    Gaps follow every ``across`` columns and ``down`` rows.
    """

    columns: int
    rows: int
    across: int
    down: int
    block: int = 10

    def place(self, icon: int) -> tuple[int, int]:
        """Column and row of an icon, counted from 0 in the order of filling."""
        block, inside = divmod(icon, self.block * self.block)
        below, beside = divmod(block, self.columns // self.block)
        row, column = divmod(inside, self.block)
        return beside * self.block + column, below * self.block + row

    def pieces(self, start: int, stop: int) -> Iterator[Piece]:
        """The icons from ``start`` up to ``stop`` as few rectangles: whole blocks, whole rows of one, and the rest."""
        across = self.block
        while start < stop:
            column, row = self.place(start)
            if start % across == 0:
                rows = min((stop - start) // across, self.block - row % self.block)
                if rows:
                    yield Piece(column, row, across, rows)
                    start += rows * across
                    continue
            columns = min(stop - start, across - start % across)
            yield Piece(column, row, columns, 1)
            start += columns

    @property
    def crowded(self) -> bool:
        """Whether there are more icons than can be looked at one by one."""
        return self.columns > self.block

    @property
    def gaps_across(self) -> int:
        return (self.columns - 1) // self.across

    @property
    def gaps_down(self) -> int:
        return (self.rows - 1) // self.down


GRIDS = {
    100: Grid(columns=10, rows=10, across=5, down=5),
    1_000: Grid(columns=50, rows=20, across=10, down=10),
    10_000: Grid(columns=100, rows=100, across=10, down=10),
}
"""One grid a denominator: ten rows of ten, ten blocks of a hundred, a hundred blocks of a hundred."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Laid:
    """A grid laid down in pixels: the size of an icon's cell and of the gap that sets tens apart."""

    grid: Grid
    across: float
    down: float
    gap: float

    def x(self, column: int) -> float:
        """Left edge of a column."""
        return column * self.across + self.gap * (column // self.grid.across)

    def y(self, row: int) -> float:
        """Top edge of a row."""
        return row * self.down + self.gap * (row // self.grid.down)

    @property
    def width(self) -> float:
        return self.x(self.grid.columns - 1) + self.across

    @property
    def height(self) -> float:
        return self.y(self.grid.rows - 1) + self.down


def lay(grid: Grid, width: float, most: float, shape: float = 1.0) -> Laid:
    """A grid in at most ``width``; an icon is at most ``most`` wide, and ``shape`` times as high as wide.

    Where there is room to the side, cells higher than wide widen up to squares, so that an array fills its column.
    """
    cell = min(width / (grid.columns + LEAST_GAP * grid.gaps_across), most)
    if cell < SNAPPED_FROM:
        cell = min(width / (grid.columns + GAP * grid.gaps_across), most)
        return Laid(grid=grid, across=cell, down=cell * shape, gap=GAP * cell)
    cell = floor(cell)
    down = round(cell * shape)
    across = max(cell, min(down, floor(width / (grid.columns + GAP * grid.gaps_across))))
    spare = (width - across * grid.columns) / max(grid.gaps_across, 1)
    return Laid(grid=grid, across=across, down=down, gap=floor(min(GAP * cell + 0.5, spare)))
