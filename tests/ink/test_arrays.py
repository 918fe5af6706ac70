"""What is painted is what was planned: every icon, in its place, in its state."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import pytest
from PySide6.QtCore import QBuffer, QPointF, QRectF
from PySide6.QtGui import QColor, QImage, QPainter, QPdfWriter
from PySide6.QtSvg import QSvgGenerator

from fourcount.ink.arrays import draw_array, draw_bar, lay_array
from fourcount.ink.palette import DARK, LIGHT, Palette
from fourcount.ink.people import STATES, State, draw_icon
from fourcount.ink.shapes import TALL
from fourcount.picture.bar_pair import Bar
from fourcount.picture.grid import GRIDS
from fourcount.picture.options import ICONS, Icons
from fourcount.picture.plan import Array, plan

SIDE = {100: 16, 1_000: 8, 10_000: 6}
"""Icon widths in pixels at which the arrays are looked at."""

EXPECTED = {
    100: plan(0.12, 0.06),
    1_000: plan(0.052, 0.047),
    10_000: plan(0.0116, 0.0102, 0.0101, 0.0104),
}


def shades(image: QImage) -> bytes:
    """An image in greyscale, row by row."""
    grey = image.convertToFormat(QImage.Format.Format_Grayscale8)
    return b"".join(bytes(grey.constScanLine(y))[: grey.width()] for y in range(grey.height()))


@pytest.fixture
def seen(sheet: Callable[..., object]) -> Callable[..., list[State]]:
    """Paint an array and say of each cell, in the order of filling, which state's icon it looks like."""

    def look(
        array: Array, denominator: int, palette: Palette = LIGHT, ratio: int = 1, icons: Icons = "person"
    ) -> list[State]:
        side = SIDE[denominator]
        laid = lay_array(denominator, 2_000, side, icons)
        with sheet(int(laid.width) + 20, int(laid.height) + 20, palette.page, ratio) as (image, painter):
            draw_array(painter, QPointF(10, 10), array, laid, palette, icons)
        patterns = {}
        for state in STATES:
            with sheet(int(laid.across), int(laid.down), palette.page, ratio) as (pattern, painter):
                painter.setRenderHint(QPainter.RenderHint.Antialiasing)
                draw_icon(
                    painter, QRectF(0, 0, laid.across, laid.down), state, palette, icons, specks=denominator > 100
                )
            patterns[shades(pattern)] = state
        found = []
        for icon in range(denominator):
            column, row = laid.grid.place(icon)
            corner = (int(10 + laid.x(column)) * ratio, int(10 + laid.y(row)) * ratio)
            cell = shades(image.copy(*corner, int(laid.across) * ratio, int(laid.down) * ratio))
            nearest = min(patterns, key=lambda pattern: sum(abs(a - b) for a, b in zip(pattern, cell, strict=True)))
            found.append(patterns[nearest])
        return found

    return look


def in_order(array: Array) -> list[State]:
    """The states that a plan asks for, in the order of filling."""
    return [state for state in STATES for _ in range(getattr(array, state))]


@pytest.mark.parametrize("denominator", [100, 1_000])
@pytest.mark.parametrize("group", ["without", "with_"])
def test_every_icon_is_painted_as_planned(seen: Callable[..., list[State]], denominator: int, group: str) -> None:
    """Each cell of the grid holds the planned state: the affected as one block from the same corner, nobody missing."""
    result = EXPECTED[denominator]
    assert result.denominator == denominator
    array = getattr(result, group)
    assert seen(array, denominator) == in_order(array)


def test_ten_thousand_icons_are_painted_as_planned(seen: Callable[..., list[State]]) -> None:
    """The largest array too, icon by icon."""
    array = EXPECTED[10_000].with_
    assert EXPECTED[10_000].denominator == 10_000
    assert seen(array, 10_000) == in_order(array)


@pytest.mark.parametrize("icons", ICONS)
@pytest.mark.parametrize(
    "array",
    [
        plan(0.05, 0.23).with_,
        plan(0.0, 1.0).with_,
        plan(0.0, 1.0).without,
        plan(0.12, 0.06, 0.04, 0.09).with_,
        plan(0.05, 0.23, 0.11, 0.37).with_,
    ],
)
def test_every_state_is_painted_as_planned(seen: Callable[..., list[State]], array: Array, icons: Icons) -> None:
    """Added and uncertain icons, arrays of one state and of nobody affected, in people, blocks and dots."""
    assert seen(array, 100, icons=icons) == in_order(array)


@pytest.mark.parametrize("ratio", [1, 2])
def test_dark_and_sharp_screens_show_the_same(seen: Callable[..., list[State]], ratio: int) -> None:
    """In dark colours and at twice the pixels the same icons stand in the same places."""
    array = plan(0.17, 0.33).with_
    assert seen(array, 100, DARK, ratio) == in_order(array)


def test_a_crowd_is_specks_on_any_screen(seen: Callable[..., list[State]]) -> None:
    """A thousand figures would run into chains: on the sharpest screen they are the specks of an ordinary one."""
    array = EXPECTED[1_000].with_
    assert seen(array, 1_000, ratio=4) == in_order(array)


@pytest.mark.parametrize("scale", [1.25, 1.5, 1.7])
@pytest.mark.parametrize("denominator", [100, 1_000])
def test_tiles_are_as_sharp_as_single_icons(sheet: Callable[..., object], scale: float, denominator: int) -> None:
    """At broken scales too an array of copies is nearly the one of icons drawn one by one, and nothing is missing."""
    array = EXPECTED[denominator].with_
    laid = lay_array(denominator, 400, SIDE[denominator])
    images = []
    for copied in (True, False):
        with sheet(420, 420, LIGHT.page) as (image, painter):
            painter.setRenderHint(QPainter.RenderHint.Antialiasing)
            painter.scale(scale, scale)
            if copied:
                draw_array(painter, QPointF(0, 0), array, laid, LIGHT)
            else:
                for state, start, stop in array.runs():
                    for icon in range(start, stop):
                        column, row = laid.grid.place(icon)
                        cell = QRectF(laid.x(column), laid.y(row), laid.across, laid.down)
                        draw_icon(painter, cell, state, LIGHT, specks=denominator > 100)
        images.append(shades(image))
    inked = [sum(251 - shade for shade in image if shade < 251) for image in images]
    assert inked[0] == pytest.approx(inked[1], rel=0.05)


@pytest.mark.parametrize("icons", ICONS)
@pytest.mark.parametrize("denominator", GRIDS)
def test_icons_keep_their_proportions(denominator: int, icons: Icons) -> None:
    """A hundred people in a narrow column stand in cells of their own shape; all other icons are square."""
    laid = lay_array(denominator, 150, 26, icons)
    shape = TALL[icons] if denominator == 100 else 1.0
    assert laid.down == pytest.approx(laid.across * shape, abs=0.5)


def test_a_pdf_holds_lines_and_no_copies() -> None:
    """On paper every icon is drawn, not copied: there is no image in the file."""
    buffer = QBuffer()
    buffer.open(QBuffer.OpenModeFlag.WriteOnly)
    writer = QPdfWriter(buffer)
    painter = QPainter(writer)
    painter.scale(writer.resolution() / 96, writer.resolution() / 96)
    draw_array(painter, QPointF(0, 0), EXPECTED[100].with_, lay_array(100, 300, 26), LIGHT)
    painter.end()
    assert b"/Subtype /Image" not in buffer.data().data()
    assert buffer.size() > 2_000


def test_an_svg_holds_every_icon(tmp_path: Path) -> None:
    """A drawing of lines has a path at least for each of a hundred people, and no picture of dots."""
    generator = QSvgGenerator()
    file = tmp_path / "array.svg"
    generator.setFileName(str(file))
    painter = QPainter(generator)
    draw_array(painter, QPointF(0, 0), EXPECTED[100].with_, lay_array(100, 300, 26), LIGHT)
    painter.end()
    text = file.read_text(encoding="utf-8")
    assert text.count("<path") >= 100
    assert "<image" not in text


def painted(sheet: Callable[..., object], bar: Bar) -> list[bool]:
    """Where the middle of a bar from x = 20 to 220 has the accent's colour."""
    with sheet(240, 40, LIGHT.page) as (image, painter):
        draw_bar(painter, QRectF(20, 10, 200, 18), bar, LIGHT)
    accent = QColor(LIGHT.accent)
    return [image.pixelColor(x, 19) == accent for x in range(240)]


@pytest.mark.parametrize("share", [0.0, 0.24, 1.0])
def test_a_bar_is_as_long_as_its_share(sheet: Callable[..., object], share: float) -> None:
    """A quarter of the scale fills a quarter of the bar, from its left end."""
    filled = [x for x, accent in enumerate(painted(sheet, Bar(length=share))) if accent]
    assert len(filled) == pytest.approx(200 * share, abs=1)
    assert not filled or filled[0] == 20


def test_somebody_is_never_drawn_as_nobody(sheet: Callable[..., object]) -> None:
    """A risk too small for a pixel still has one; no risk has none."""
    assert any(painted(sheet, Bar(length=0.00001)))
    assert not any(painted(sheet, Bar(length=0.0)))


def test_an_interval_is_hatched_about_the_end_of_its_bar(sheet: Callable[..., object]) -> None:
    """Solid to the lower limit, hatched to the upper one, with a mark at the estimate that is higher than the bar."""
    with sheet(240, 40, LIGHT.page) as (image, painter):
        draw_bar(painter, QRectF(20, 10, 200, 18), Bar(length=0.5, low=0.25, high=0.75), LIGHT)
    accent = QColor(LIGHT.accent)

    def share(left: int, right: int) -> float:
        spots = [image.pixelColor(x, y) == accent for x in range(left, right) for y in range(13, 26)]
        return sum(spots) / len(spots)

    assert share(22, 68) == 1
    assert 0.1 < share(72, 116) < 0.9
    assert 0.1 < share(124, 168) < 0.9
    assert share(174, 216) == 0
    assert [x for x in range(240) if image.pixelColor(x, 8) == accent] == pytest.approx([119, 120, 121], abs=1)
