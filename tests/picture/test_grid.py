"""Where icons stand: in blocks that can be counted, all filled in the same order, and the same in pixels."""

from __future__ import annotations

from itertools import pairwise

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.picture.grid import GAP, GRIDS, LEAST_GAP, SNAPPED_FROM, Laid, lay
from fourcount.picture.plan import DENOMINATORS

DENOMINATOR = st.sampled_from(DENOMINATORS)


def test_every_denominator_has_a_grid() -> None:
    """A plan with a denominator can always be laid out."""
    assert set(GRIDS) == set(DENOMINATORS)


@pytest.mark.parametrize("denominator", DENOMINATORS)
def test_a_grid_holds_exactly_its_people(denominator: int) -> None:
    """Every icon has a place of its own, and no place is left: the whole group is drawn, and nobody else."""
    grid = GRIDS[denominator]
    places = {grid.place(icon) for icon in range(denominator)}
    assert places == {(column, row) for column in range(grid.columns) for row in range(grid.rows)}


@pytest.mark.parametrize("denominator", DENOMINATORS)
def test_blocks_of_a_hundred_are_filled_row_by_row(denominator: int) -> None:
    """All begin in the upper left corner; ten icons make a row, ten rows a block, and the next block stands beside."""
    grid = GRIDS[denominator]
    assert [grid.place(icon) for icon in (0, 1, 9, 10, 99)] == [(0, 0), (1, 0), (9, 0), (0, 1), (9, 9)]
    if denominator > 100:
        assert grid.place(100) == (10, 0)
        assert grid.place(10 * grid.columns) == (0, 10)


@pytest.mark.parametrize("denominator", DENOMINATORS)
def test_icons_of_one_block_touch(denominator: int) -> None:
    """The affected form one block: inside a hundred each icon stands beside or under another one before it."""
    grid = GRIDS[denominator]
    for icon in range(1, 100):
        column, row = grid.place(icon)
        before = {grid.place(other) for other in range(icon)}
        assert {(column - 1, row), (column, row - 1)} & before


@given(DENOMINATOR, st.data())
def test_pieces_are_the_icons_in_between(denominator: int, data: st.DataObject) -> None:
    """Any run of icons is cut into rectangles that hold each of its icons once, and none leaves its block."""
    grid = GRIDS[denominator]
    start = data.draw(st.integers(0, denominator - 1))
    stop = data.draw(st.integers(start, min(denominator, start + 1_500)))
    cells = []
    for piece in grid.pieces(start, stop):
        assert piece.column // 10 == (piece.column + piece.columns - 1) // 10
        assert piece.row // 10 == (piece.row + piece.rows - 1) // 10
        cells += [(piece.column + i, piece.row + j) for j in range(piece.rows) for i in range(piece.columns)]
    assert cells == [grid.place(icon) for icon in range(start, stop)]


@pytest.mark.parametrize(("denominator", "pieces"), [(100, 1), (1_000, 10), (10_000, 100)])
def test_a_full_array_is_a_few_pieces(denominator: int, pieces: int) -> None:
    """Ten thousand icons in one state are a hundred pieces, not one an icon."""
    assert len(list(GRIDS[denominator].pieces(0, denominator))) == pieces


@pytest.mark.parametrize(("denominator", "block"), [(100, 25), (1_000, 100), (10_000, 100)])
def test_blocks_can_be_counted(denominator: int, block: int) -> None:
    """Gaps part the grid into equal blocks of a number that can be counted with."""
    grid = GRIDS[denominator]
    assert grid.across * grid.down == block
    assert (grid.columns % grid.across, grid.rows % grid.down) == (0, 0)
    assert (grid.gaps_across, grid.gaps_down) == (grid.columns // grid.across - 1, grid.rows // grid.down - 1)


@given(DENOMINATOR, st.integers(100, 2_000), st.sampled_from([6, 12, 26, 52]), st.sampled_from([1.0, 1.38]))
def test_tens_are_set_apart_in_pixels(denominator: int, width: int, most: int, shape: float) -> None:
    """Laid down, icons never overlap, and a visible gap stands where a ten or a five ends."""
    laid = lay(GRIDS[denominator], width, most, shape)
    parts = (
        (laid.x, laid.grid.columns, laid.grid.across, laid.across),
        (laid.y, laid.grid.rows, laid.grid.down, laid.down),
    )
    for place, count, each, cell in parts:
        steps = [after - before for before, after in pairwise([place(i) for i in range(count)])]
        wanted = [cell + (laid.gap if (i + 1) % each == 0 else 0) for i in range(count - 1)]
        assert steps == pytest.approx(wanted)
    assert laid.gap >= min(1.0, LEAST_GAP * laid.across) - 0.7
    assert laid.gap > 0


@given(DENOMINATOR, st.integers(40, 2_000), st.sampled_from([6, 12, 26, 52]))
def test_an_array_keeps_to_its_width(denominator: int, width: int, most: int) -> None:
    """It is never wider than its column, and no icon wider than asked."""
    laid = lay(GRIDS[denominator], width, most)
    assert laid.width <= width + 1e-9
    assert laid.across <= most
    if laid.across >= SNAPPED_FROM:
        assert (laid.across, laid.gap) == (int(laid.across), int(laid.gap))


def test_a_small_array_keeps_its_proportions() -> None:
    """Where an icon is under three pixels wide nothing is rounded, and gaps are half an icon."""
    laid = lay(GRIDS[10_000], 209.0, 6)
    assert (laid.across, laid.gap) == (2.0, 1.0)
    assert laid.gap == GAP * laid.across


def test_people_stand_in_cells_of_their_shape() -> None:
    """A cell can be higher than wide where there is no room to the side; the array grows downwards with it."""
    flat, tall = lay(GRIDS[100], 160, 26), lay(GRIDS[100], 160, 26, 1.38)
    assert (flat.across, flat.down, tall.across, tall.down) == (15, 15, 15, 21)
    assert (flat.width, flat.height, tall.height) == (158, 158, 218)


def test_people_stand_apart_where_there_is_room() -> None:
    """With room to the side the cells of people widen to squares, and no further; their height stays."""
    narrow, some, wide = (lay(GRIDS[100], width, 15, 1.38) for width in (160, 200, 600))
    assert [laid.down for laid in (narrow, some, wide)] == [21, 21, 21]
    assert [laid.across for laid in (narrow, some, wide)] == [15, 19, 21]
    assert some.width <= 200
    assert lay(GRIDS[100], 600, 15).across == 15


def test_laid_down_sizes_are_those_of_the_last_icon() -> None:
    """Width and height end with the last column and row, with no gap after them."""
    laid = Laid(grid=GRIDS[100], across=10, down=12, gap=4)
    assert (laid.width, laid.height) == (104, 124)
