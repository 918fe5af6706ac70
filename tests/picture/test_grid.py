"""Where icons stand: each denominator has one grid, and tens can be told apart."""

from __future__ import annotations

from itertools import pairwise

import pytest

from fourcount.picture.grid import GAP, GRIDS, Grid
from fourcount.picture.plan import DENOMINATORS


def test_every_denominator_has_a_grid() -> None:
    """A plan with a denominator can always be laid out."""
    assert set(GRIDS) == set(DENOMINATORS)


@pytest.mark.parametrize("denominator", DENOMINATORS)
def test_a_grid_holds_exactly_its_people(denominator: int) -> None:
    """Rows times columns is the denominator: the whole group is drawn, and nobody else."""
    grid = GRIDS[denominator]
    assert grid.columns * grid.rows == denominator


@pytest.mark.parametrize("denominator", DENOMINATORS)
def test_icons_never_overlap(denominator: int) -> None:
    """Columns and rows are at least one icon apart, and half an icon more where a ten begins."""
    grid = GRIDS[denominator]
    for place, count, each in ((grid.x, grid.columns, grid.across), (grid.y, grid.rows, grid.down)):
        steps = [after - before for before, after in pairwise([place(i) for i in range(count)])]
        assert steps == [1 + GAP if (i + 1) % each == 0 else 1 for i in range(count - 1)]


@pytest.mark.parametrize(("denominator", "block"), [(100, 25), (1_000, 100), (10_000, 100)])
def test_blocks_can_be_counted(denominator: int, block: int) -> None:
    """Gaps part the grid into equal blocks of a number that can be counted with."""
    grid = GRIDS[denominator]
    assert grid.across * grid.down == block
    assert (grid.columns % grid.across, grid.rows % grid.down) == (0, 0)


@pytest.mark.parametrize("denominator", DENOMINATORS)
def test_a_grid_begins_at_its_corner_and_ends_with_its_last_icon(denominator: int) -> None:
    """Width and height run from the first icon's edge to the last one's."""
    grid = GRIDS[denominator]
    assert (grid.x(0), grid.y(0)) == (0, 0)
    assert grid.width == grid.x(grid.columns - 1) + 1
    assert grid.height == grid.y(grid.rows - 1) + 1


def test_a_grid_of_one_icon_has_no_gap() -> None:
    """There is no gap before the first icon nor after the last."""
    grid = Grid(columns=5, rows=1, across=5, down=5)
    assert (grid.width, grid.height) == (5, 1)
