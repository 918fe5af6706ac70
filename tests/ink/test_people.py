"""The four states of an icon: told apart without colour, at any size in use."""

from __future__ import annotations

from collections.abc import Callable
from itertools import combinations

import pytest
from PySide6.QtCore import QRectF
from PySide6.QtGui import QColor, QImage, QPainter

from fourcount.ink.palette import DARK, LIGHT, PAPER, Palette
from fourcount.ink.people import STATES, State, draw_icon

PALETTES = [pytest.param(LIGHT, id="light"), pytest.param(DARK, id="dark"), pytest.param(PAPER, id="paper")]
SHADES_APART = 40
"""Of 256: what is nearer to the page than this is not counted as drawn."""


@pytest.fixture
def grey(sheet: Callable[..., object]) -> Callable[[State, int, Palette], dict[tuple[int, int], int]]:
    """How far each pixel of an icon is from the page, in greyscale."""

    def draw(state: State, side: int, palette: Palette) -> dict[tuple[int, int], int]:
        with sheet(side, side, palette.page) as (image, painter):
            painter.setRenderHint(QPainter.RenderHint.Antialiasing)
            draw_icon(painter, QRectF(0, 0, side, side), state, palette)
        shades = image.convertToFormat(QImage.Format.Format_Grayscale8)
        blank = QImage(1, 1, QImage.Format.Format_RGB32)
        blank.fill(QColor(palette.page))
        ground = blank.convertToFormat(QImage.Format.Format_Grayscale8).pixelColor(0, 0).value()
        spots = ((x, y) for x in range(side) for y in range(side))
        return {spot: abs(shades.pixelColor(*spot).value() - ground) for spot in spots}

    return draw


@pytest.fixture
def drawn(grey: Callable[..., dict[tuple[int, int], int]]) -> Callable[[State, int, Palette], set[tuple[int, int]]]:
    """The pixels of an icon that stand out from the page."""

    def draw(state: State, side: int, palette: Palette) -> set[tuple[int, int]]:
        return {spot for spot, apart in grey(state, side, palette).items() if apart >= SHADES_APART}

    return draw


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("side", [6, 16])
@pytest.mark.parametrize(("one", "other"), list(combinations(STATES, 2)))
def test_states_differ_in_shape(
    drawn: Callable[..., set[tuple[int, int]]], palette: Palette, side: int, one: State, other: State
) -> None:
    """In greyscale any two states differ in at least a fifth of what they draw, by its place and not by its shade."""
    first, second = drawn(one, side, palette), drawn(other, side, palette)
    assert len(first ^ second) >= len(first | second) / 5


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("side", [3, 6, 8, 11, 12, 13, 16, 24, 40])
def test_the_affected_stand_out(grey: Callable[..., dict[tuple[int, int], int]], palette: Palette, side: int) -> None:
    """Affected icons hold most ink at every size, so that avoided and added ones are not counted with them."""
    ink = {state: sum(grey(state, side, palette).values()) for state in STATES}
    assert all(ink["affected"] > 1.1 * ink[state] for state in STATES if state != "affected")


@pytest.mark.parametrize("side", [12, 16, 40])
def test_a_small_key_can_stand_for_smaller_icons(sheet: Callable[..., object], side: int) -> None:
    """In a key beside specks a cell of any size shows a speck: a block, that fills its corners as no person does."""
    corners = []
    for stands_for in (None, 6.0):
        with sheet(side, side, LIGHT.page) as (image, painter):
            draw_icon(painter, QRectF(0, 0, side, side), "affected", LIGHT, stands_for)
        corners.append(image.pixelColor(round(side * 0.15), round(side * 0.15)).name().upper())
    assert corners == [LIGHT.page, LIGHT.accent]


@pytest.mark.parametrize(("ratio", "person"), [(1, False), (2, True)])
def test_a_sharp_screen_shows_people_at_half_the_size(sheet: Callable[..., object], ratio: int, person: bool) -> None:
    """Eight logical pixels are too few for a person on an ordinary screen, and enough on one of twice the pixels."""
    with sheet(8, 8, LIGHT.page, ratio) as (image, painter):
        draw_icon(painter, QRectF(0, 0, 8, 8), "affected", LIGHT)
    corner = image.pixelColor(ratio, ratio).name().upper()
    assert corner == (LIGHT.page if person else LIGHT.accent)


@pytest.mark.parametrize("side", [3, 6, 7, 16, 40])
@pytest.mark.parametrize("state", STATES)
def test_an_icon_stays_in_its_cell(sheet: Callable[..., object], state: State, side: int) -> None:
    """Nothing that can be seen is drawn outside the cell, at any size; a tint of antialiasing may be."""
    with sheet(3 * side, 3 * side, LIGHT.page) as (image, painter):
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        draw_icon(painter, QRectF(side, side, side, side), state, LIGHT)
    ground = image.pixelColor(0, 0).lightness()
    inside = range(side, 2 * side)
    spots = [(x, y) for x in range(3 * side) for y in range(3 * side)]
    painted = [spot for spot in spots if abs(image.pixelColor(*spot).lightness() - ground) >= SHADES_APART]
    assert painted
    assert all(x in inside and y in inside for x, y in painted)


@pytest.mark.parametrize("state", STATES)
def test_drawing_an_icon_leaves_the_painter_as_it_was(sheet: Callable[..., object], state: State) -> None:
    """The next thing drawn is neither moved nor scaled."""
    with sheet(40, 40, LIGHT.page) as (_, painter):
        before = painter.worldTransform()
        draw_icon(painter, QRectF(4, 4, 16, 16), state, LIGHT)
        assert painter.worldTransform() == before
