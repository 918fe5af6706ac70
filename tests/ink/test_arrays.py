"""What is painted is what was planned: every icon, in its place, in its state."""

from __future__ import annotations

from collections.abc import Callable

import pytest
from PySide6.QtCore import QPointF, QRectF
from PySide6.QtGui import QColor, QImage

from fourcount.ink.arrays import array_height, draw_array, draw_bar
from fourcount.ink.palette import DARK, LIGHT, Palette
from fourcount.ink.people import PERSON_FROM, STATES, State
from fourcount.picture.grid import GRIDS
from fourcount.picture.plan import Array, plan

SIDE = {100: 16, 1_000: 8, 10_000: 6}
"""Icon widths in pixels at which the arrays are looked at."""

EXPECTED = {
    100: plan(0.12, 0.06),
    1_000: plan(0.052, 0.047),
    10_000: plan(0.0015, 0.0008),
}


def near(colour: QColor, named: str) -> bool:
    """Whether a pixel has a colour, antialiasing allowed for."""
    other = QColor(named)
    apart = (colour.red() - other.red(), colour.green() - other.green(), colour.blue() - other.blue())
    return max(map(abs, apart)) <= 24


def person_seen(at: Callable[[float, float], QColor], palette: Palette) -> State:
    """The state of a person, from spots of the cell: shoulder, hip, heart, and the end of a stroke through."""
    if near(at(0.42, 0.46), palette.accent) and near(at(0.58, 0.8), palette.accent):
        return "affected"
    if not near(at(0.77, 0.235), palette.page):
        return "avoided"
    return "added" if near(at(0.5, 0.57), palette.accent) else "others"


def speck_seen(at: Callable[[float, float], QColor], palette: Palette) -> State:
    """The state of a speck, from its centre and its corners."""
    centre = at(0.5, 0.5)
    if near(at(0.25, 0.25), palette.accent):
        return "affected" if near(centre, palette.accent) else "added"
    return "others" if near(centre, palette.outline) else "avoided"


@pytest.fixture
def seen(sheet: Callable[..., object]) -> Callable[..., list[State]]:
    """Paint an array and read the state of every icon from the pixels, in reading order."""

    def look(array: Array, denominator: int, palette: Palette = LIGHT, ratio: int = 1) -> list[State]:
        grid, side = GRIDS[denominator], SIDE[denominator]
        width, height = round(grid.width * side), round(grid.height * side)
        with sheet(width + 20, height + 20, palette.page, ratio) as (image, painter):
            draw_array(painter, QRectF(10, 10, width, height), array, denominator, palette)
        see = speck_seen if side * ratio < PERSON_FROM else person_seen
        return [
            see(spot_reader(image, QPointF(10 + grid.x(column) * side, 10 + grid.y(row) * side), side, ratio), palette)
            for row in range(grid.rows)
            for column in range(grid.columns)
        ]

    return look


def spot_reader(image: QImage, corner: QPointF, side: int, ratio: int) -> Callable[[float, float], QColor]:
    """Colours of a cell by fractions of its width and height."""

    def at(x: float, y: float) -> QColor:
        return image.pixelColor(int((corner.x() + x * side) * ratio), int((corner.y() + y * side) * ratio))

    return at


def in_order(array: Array) -> list[State]:
    """The states that a plan asks for, in reading order."""
    return [state for state in STATES for _ in range(getattr(array, state))]


@pytest.mark.parametrize("denominator", EXPECTED)
@pytest.mark.parametrize("group", ["without", "with_"])
def test_every_icon_is_painted_as_planned(seen: Callable[..., list[State]], denominator: int, group: str) -> None:
    """Each cell of the grid holds the planned state: the affected as one block from the same corner, nobody missing."""
    result = EXPECTED[denominator]
    assert result.denominator == denominator
    array = getattr(result, group)
    assert seen(array, denominator) == in_order(array)


@pytest.mark.parametrize("array", [plan(0.05, 0.23).with_, plan(0.0, 1.0).with_, plan(0.0, 1.0).without])
def test_added_all_and_none_are_painted_as_planned(seen: Callable[..., list[State]], array: Array) -> None:
    """Added icons, an array of one state, and one of nobody affected."""
    assert seen(array, 100) == in_order(array)


@pytest.mark.parametrize("ratio", [1, 2])
def test_dark_and_sharp_screens_show_the_same(seen: Callable[..., list[State]], ratio: int) -> None:
    """In dark colours and at twice the pixels the same icons stand in the same places."""
    array = plan(0.17, 0.33).with_
    assert seen(array, 100, DARK, ratio) == in_order(array)


@pytest.mark.parametrize("denominator", GRIDS)
def test_the_height_keeps_icons_square(denominator: int) -> None:
    """An array is as tall as square icons make it."""
    grid = GRIDS[denominator]
    assert array_height(denominator, 10 * grid.width) == pytest.approx(10 * grid.height)


@pytest.mark.parametrize(("risk", "share"), [(0.0, 0.0), (0.06, 0.24), (0.25, 1.0)])
def test_a_bar_is_as_long_as_its_risk(sheet: Callable[..., object], risk: float, share: float) -> None:
    """On a scale up to 25%, 6% fills 24% of the bar's length."""
    with sheet(240, 40, LIGHT.page) as (image, painter):
        draw_bar(painter, QRectF(20, 10, 200, 18), risk, 0.25, LIGHT)
    filled = [x for x in range(240) if near(image.pixelColor(x, 19), LIGHT.accent)]
    assert len(filled) == pytest.approx(200 * share, abs=1)
    assert not filled or filled[0] == 20
