"""The four states of an icon: told apart without colour, at any size in use."""

from __future__ import annotations

from collections.abc import Callable
from itertools import combinations

import pytest
from PySide6.QtCore import QPointF, QRectF
from PySide6.QtGui import QColor, QImage, QPainter

from fourcount.ink.palette import DARK, LIGHT, PAPER, Palette, contrast
from fourcount.ink.people import FINE_FROM, SHAPES_FROM, STATES, State, draw_icon
from fourcount.ink.shapes import TALL, shape
from fourcount.picture.options import ICONS, Icons

PALETTES = [pytest.param(LIGHT, id="light"), pytest.param(DARK, id="dark"), pytest.param(PAPER, id="paper")]
SHADES_APART = 40
"""Of 256: what is nearer to the page than this is not counted as drawn."""


Grey = Callable[..., dict[tuple[int, int], int]]
SIDES = [3, 6, 8, 11, 12, 13, 16, 24, 40, 60]


@pytest.fixture
def grey(sheet: Callable[..., object]) -> Grey:
    """How far each pixel of an icon is from the page, in greyscale."""

    def draw(state: State, side: int, palette: Palette, icons: Icons = "person") -> dict[tuple[int, int], int]:
        tall = round(side * TALL[icons])
        with sheet(side, tall, palette.page) as (image, painter):
            painter.setRenderHint(QPainter.RenderHint.Antialiasing)
            draw_icon(painter, QRectF(0, 0, side, tall), state, palette, icons)
        shades = image.convertToFormat(QImage.Format.Format_Grayscale8)
        blank = QImage(1, 1, QImage.Format.Format_RGB32)
        blank.fill(QColor(palette.page))
        ground = blank.convertToFormat(QImage.Format.Format_Grayscale8).pixelColor(0, 0).value()
        spots = ((x, y) for x in range(side) for y in range(tall))
        return {spot: abs(shades.pixelColor(*spot).value() - ground) for spot in spots}

    return draw


@pytest.fixture
def drawn(grey: Grey) -> Callable[..., set[tuple[int, int]]]:
    """The pixels of an icon that stand out from the page."""

    def draw(state: State, side: int, palette: Palette, icons: Icons = "person") -> set[tuple[int, int]]:
        return {spot for spot, apart in grey(state, side, palette, icons).items() if apart >= SHADES_APART}

    return draw


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("icons", ICONS)
@pytest.mark.parametrize("side", [6, 16, 40])
@pytest.mark.parametrize(("one", "other"), list(combinations(STATES, 2)))
def test_states_differ_in_shape(
    drawn: Callable[..., set[tuple[int, int]]], palette: Palette, icons: Icons, side: int, one: State, other: State
) -> None:
    """In greyscale any two states differ in at least a tenth of what they draw, by its place and not by its shade."""
    first, second = drawn(one, side, palette, icons), drawn(other, side, palette, icons)
    assert len(first ^ second) >= len(first | second) / 10


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("icons", ICONS)
@pytest.mark.parametrize("side", SIDES)
def test_the_affected_stand_out(grey: Grey, palette: Palette, icons: Icons, side: int) -> None:
    """Affected icons hold most ink at every size, so that avoided and added ones are not counted with them."""
    ink = {state: sum(grey(state, side, palette, icons).values()) for state in STATES}
    assert all(ink["affected"] > 1.1 * ink[state] for state in STATES if state != "affected")


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("icons", ICONS)
def test_the_uncertain_lie_between(grey: Grey, palette: Palette, icons: Icons) -> None:
    """Half filled: more ink than an outline, less than a filled icon."""
    ink = {state: sum(grey(state, 24, palette, icons).values()) for state in STATES}
    assert ink["others"] < ink["uncertain"] < ink["affected"]


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("state", STATES)
@pytest.mark.parametrize("icons", ICONS)
@pytest.mark.parametrize("side", [12, 16, 24, 40, 60])
def test_every_icon_can_be_seen(
    sheet: Callable[..., object], palette: Palette, state: State, icons: Icons, side: int
) -> None:
    """Some pixels of each icon have nearly the full colour of its line, which has 3:1 on the page."""
    tall = round(side * TALL[icons])
    with sheet(side, tall, palette.page) as (image, painter):
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        draw_icon(painter, QRectF(0, 0, side, tall), state, palette, icons)
    darkest = max(
        contrast(image.pixelColor(x, y).name().upper(), palette.page) for x in range(side) for y in range(tall)
    )
    assert darkest >= 3.0


def test_a_person_has_no_face() -> None:
    """A head and a body, nothing else: no feature, no clothes, nothing that tells of a sex, an age or a mood."""
    for fine in (False, True):
        pieces = shape("person", fine).toSubpathPolygons()
        assert len(pieces) == 2
        head, body = (piece.boundingRect() for piece in pieces)
        assert head.bottom() < body.top()


@pytest.mark.parametrize("fine", [False, True])
def test_a_person_is_the_same_from_both_sides(fine: bool) -> None:
    """The figure is its own mirror image, and stands in the middle of its cell."""
    path = shape("person", fine)
    spots = [((x + 0.37) / 50, (y + 0.37) / 50) for x in range(25) for y in range(69)]
    mirrored = [path.contains(QPointF(1 - x, y)) for x, y in spots]
    assert [path.contains(QPointF(x, y)) for x, y in spots] == mirrored
    box = path.boundingRect()
    assert box.top() == pytest.approx(TALL["person"] - box.bottom(), abs=0.02)


def test_only_a_large_person_has_legs(sheet: Callable[..., object]) -> None:
    """From a size on there is page between the feet; below it the two would only blur."""
    between = []
    for side in (round(FINE_FROM) - 4, 40):
        with sheet(side, round(side * 1.38), LIGHT.page) as (image, painter):
            painter.setRenderHint(QPainter.RenderHint.Antialiasing)
            draw_icon(painter, QRectF(0, 0, side, side * 1.38), "affected", LIGHT)
        between.append(image.pixelColor(side // 2, round(side * 1.2)).lightness())
    accent = QColor(LIGHT.accent).lightness()
    assert between[0] == accent
    assert between[1] > accent + SHADES_APART


@pytest.mark.parametrize("side", [12, 16, 40])
def test_a_small_key_can_stand_for_smaller_icons(sheet: Callable[..., object], side: int) -> None:
    """In a key beside specks a cell of any size shows a speck: a block, that fills its corners as no person does."""
    corners = []
    for stands_for in (None, 6.0):
        with sheet(side, side, LIGHT.page) as (image, painter):
            draw_icon(painter, QRectF(0, 0, side, side), "affected", LIGHT, stands_for=stands_for)
        corners.append(image.pixelColor(round(side * 0.15), round(side * 0.15)).name().upper())
    assert corners == [LIGHT.page, LIGHT.accent]


def test_small_dots_stay_round(sheet: Callable[..., object]) -> None:
    """A dot too small to be drawn leaves its corners free; a block fills them."""
    corners = []
    for icons in ("dot", "block"):
        with sheet(10, 10, LIGHT.page) as (image, painter):
            painter.setRenderHint(QPainter.RenderHint.Antialiasing)
            draw_icon(painter, QRectF(0, 0, 10, 10), "affected", LIGHT, icons)
        corners.append(image.pixelColor(1, 1).name().upper() == LIGHT.accent)
    assert corners == [False, True]


@pytest.mark.parametrize(("ratio", "person"), [(1, False), (2, True)])
def test_a_sharp_screen_shows_people_at_half_the_size(sheet: Callable[..., object], ratio: int, person: bool) -> None:
    """Eight logical pixels are too few for a person on an ordinary screen, and enough on one of twice the pixels."""
    assert SHAPES_FROM / 2 < 8 < SHAPES_FROM
    with sheet(8, 8, LIGHT.page, ratio) as (image, painter):
        draw_icon(painter, QRectF(0, 0, 8, 8), "affected", LIGHT)
    corner = image.pixelColor(ratio, ratio).name().upper()
    assert corner == (LIGHT.page if person else LIGHT.accent)


@pytest.mark.parametrize("icons", ICONS)
@pytest.mark.parametrize("side", [3, 6, 7, 16, 40])
@pytest.mark.parametrize("state", STATES)
def test_an_icon_stays_in_its_cell(sheet: Callable[..., object], state: State, side: int, icons: Icons) -> None:
    """Nothing that can be seen is drawn outside the cell, at any size; a tint of antialiasing may be."""
    tall = round(side * TALL[icons])
    with sheet(3 * side, 3 * tall, LIGHT.page) as (image, painter):
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        draw_icon(painter, QRectF(side, tall, side, tall), state, LIGHT, icons)
    ground = image.pixelColor(0, 0).lightness()
    spots = [(x, y) for x in range(3 * side) for y in range(3 * tall)]
    painted = [spot for spot in spots if abs(image.pixelColor(*spot).lightness() - ground) >= SHADES_APART]
    assert painted
    assert all(side <= x < 2 * side and tall <= y < 2 * tall for x, y in painted)


@pytest.mark.parametrize("state", STATES)
def test_drawing_an_icon_leaves_the_painter_as_it_was(sheet: Callable[..., object], state: State) -> None:
    """The next thing drawn is neither moved nor scaled."""
    with sheet(40, 40, LIGHT.page) as (_, painter):
        before = painter.worldTransform()
        draw_icon(painter, QRectF(4, 4, 16, 16), state, LIGHT)
        assert painter.worldTransform() == before
