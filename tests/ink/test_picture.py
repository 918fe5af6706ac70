"""The picture as a whole: as tall as it says, whole at any width, and on white where it leaves the window."""

from __future__ import annotations

from collections.abc import Callable

import pytest
from PySide6.QtGui import QColor, QImage

from fourcount.ink.palette import DARK, LIGHT, PAPER
from fourcount.ink.picture import Picture, as_image
from fourcount.ink.typeset import text_height

WIDTHS = [150, 279, 280, 342, 600]
RISKS = [(0.12, 0.06), (0.052, 0.047), (0.0015, 0.0008), (0.00001, 0.00002), (0.05, 0.23)]
CAUTIONS = "Calculates and displays what a study’s numbers imply. Does not recommend."


def painted_rows(image: QImage, page: str) -> list[int]:
    """The rows of an image that hold anything but the page."""
    blank = QImage(image.size(), image.format())
    blank.fill(QColor(page))
    line = bytes(blank.constScanLine(0))
    return [y for y in range(image.height()) if bytes(image.constScanLine(y)) != line]


@pytest.mark.parametrize("width", WIDTHS)
@pytest.mark.parametrize("risks", RISKS, ids=str)
@pytest.mark.parametrize("long", [False, True], ids=["short words", "long words"])
@pytest.mark.parametrize("bars", [False, True], ids=["people", "bars"])
def test_the_height_is_what_drawing_takes(
    sheet: Callable[..., object],
    style: Callable[..., object],
    picture: Callable[..., Picture],
    width: int,
    risks: tuple[float, float],
    long: bool,
    bars: bool,
) -> None:
    """Measured and drawn height agree, and nothing is drawn below."""
    it = picture(*risks, bars=bars, long=long, note="Each picture shows 1,000 people." if long else "")
    look = style()
    height = it.height(look, width)
    with sheet(width, height + 60, LIGHT.page) as (image, painter):
        taken = it.draw(painter, look, 0, 0, width)
    assert height == round(taken)
    assert max(painted_rows(image, LIGHT.page)) <= height


@pytest.mark.parametrize("zoom", [0.8, 1.0, 2.0])
def test_larger_text_makes_a_taller_picture_that_is_still_whole(
    sheet: Callable[..., object], style: Callable[..., object], picture: Callable[..., Picture], zoom: float
) -> None:
    """At 80% to 200% text the measured height is the drawn one."""
    it, look = picture(0.12, 0.06, long=True), style(zoom=zoom)
    height = it.height(look, 342)
    with sheet(342, height + 60, LIGHT.page) as (image, painter):
        assert round(it.draw(painter, look, 0, 0, 342)) == height
    assert max(painted_rows(image, LIGHT.page)) <= height


def test_a_picture_is_drawn_where_it_is_asked_for(
    sheet: Callable[..., object], style: Callable[..., object], picture: Callable[..., Picture]
) -> None:
    """Moved to another corner, the same picture is drawn there."""
    it, look = picture(0.12, 0.06), style()
    height = it.height(look, 342)
    images = []
    for x, y in ((0, 0), (40, 30)):
        with sheet(342 + x, height + y + 2, LIGHT.page) as (image, painter):
            it.draw(painter, look, x, y, 342)
        images.append(image.copy(x, y, 342, height))
    assert images[0] == images[1]


def test_side_by_side_arrays_begin_on_one_line(
    sheet: Callable[..., object], style: Callable[..., object], picture: Callable[..., Picture]
) -> None:
    """However long one caption is, both groups' icons start at the same height."""
    it = picture(0.12, 0.06, long=True)
    width = 500
    with sheet(width, it.height(style(), width), LIGHT.page) as (image, painter):
        it.draw(painter, style(), 0, 0, width)
    accent = QColor(LIGHT.accent)
    halves = (range(width // 2 - 20), range(width // 2 + 20, width))
    first = [min(y for y in range(image.height()) for x in half if image.pixelColor(x, y) == accent) for half in halves]
    assert first[0] == first[1]


def test_what_is_too_small_to_draw_gets_bars(picture: Callable[..., Picture]) -> None:
    """Risks that no array can show are drawn as bars, whether asked for or not; others only if asked for."""
    assert picture(0.00001, 0.00002).bars
    assert picture(0.12, 0.06, bars=True).bars
    assert not picture(0.12, 0.06).bars


def test_bars_share_one_scale(
    sheet: Callable[..., object], style: Callable[..., object], picture: Callable[..., Picture]
) -> None:
    """Bars of 12% and 6%, side by side on a scale up to 25%, fill 48% and 24% of their lengths."""
    it = picture(0.12, 0.06, bars=True)
    with sheet(628, it.height(style(), 628), LIGHT.page) as (image, painter):
        it.draw(painter, style(), 0, 0, 628)
    accent = QColor(LIGHT.accent)
    rows = [[x for x in range(628) if image.pixelColor(x, y) == accent] for y in range(image.height())]
    longest = max(rows, key=len)
    left, right = (sum(1 for x in longest if low <= x < high) for low, high in ((0, 314), (314, 628)))
    assert (left, right) == (pytest.approx(0.48 * 300, abs=1), pytest.approx(0.24 * 300, abs=1))


@pytest.mark.parametrize("palette", [LIGHT, DARK], ids=["light", "dark"])
def test_a_copied_picture_is_dark_on_white(
    style: Callable[..., object], picture: Callable[..., Picture], palette: object
) -> None:
    """Whatever the window looks like, the image has white edges and dark text."""
    image = as_image(picture(0.12, 0.06), style(palette), "Falls · an invented example", CAUTIONS)
    white = QColor(PAPER.page)
    edge = {(x, y) for x in range(0, image.width(), 7) for y in (0, image.height() - 1)}
    edge |= {(x, y) for x in (0, image.width() - 1) for y in range(0, image.height(), 7)}
    assert all(image.pixelColor(*spot) == white for spot in edge)
    shades = [image.pixelColor(x, y).lightness() for x in range(60, 500, 2) for y in range(56, 90)]
    assert min(shades) < 60
    assert image == as_image(picture(0.12, 0.06), style(LIGHT), "Falls · an invented example", CAUTIONS)


def test_a_copied_picture_holds_its_cautions(style: Callable[..., object], picture: Callable[..., Picture]) -> None:
    """The standing sentences take their room at the foot of the image, and are drawn there."""
    look, scale, margin = style(), 2, 28
    image = as_image(picture(0.12, 0.06), look, "Falls", CAUTIONS, scale=scale)
    without = as_image(picture(0.12, 0.06), look, "Falls", "", scale=scale)
    tall = round(text_height(CAUTIONS, look.font("small"), 520 - 2 * margin))
    assert image.height() - without.height() == scale * tall
    foot = painted_rows(image.copy(0, without.height() - scale * (margin + 8), image.width(), scale * tall), "#FFFFFF")
    assert len(foot) > 10


def test_a_copied_picture_says_its_heading_and_sentences(
    style: Callable[..., object], picture: Callable[..., Picture]
) -> None:
    """A longer heading makes the image taller by its own height: nothing is cut off."""
    look = style()
    heading = "A heading that is so long that it needs three lines of the image to be said in full. " * 2
    tall = as_image(picture(0.12, 0.06), look, heading, CAUTIONS).height()
    short = as_image(picture(0.12, 0.06), look, "Falls", CAUTIONS).height()
    wide = 520 - 2 * 28
    lines = [text_height(text, look.font("strong"), wide) for text in (heading, "Falls")]
    assert tall - short == pytest.approx(2 * (lines[0] - lines[1]), abs=2)


@pytest.mark.parametrize("zoom", [1.0, 2.0])
def test_everything_of_a_copied_picture_is_inside_it(
    style: Callable[..., object], picture: Callable[..., Picture], zoom: float
) -> None:
    """The margin below the last line stays white, at any size of text."""
    image = as_image(picture(0.12, 0.06, long=True), style(zoom=zoom), "Falls", CAUTIONS * 3)
    margin = round(28 * zoom) * 2
    assert max(painted_rows(image, "#FFFFFF")) < image.height() - margin / 2
