"""The picture as a whole: as tall as it says, whole at any width, and on white where it leaves the window."""

from __future__ import annotations

from collections.abc import Callable
from itertools import product

import pytest
from PySide6.QtGui import QColor, QImage

from fourcount.ink.palette import DARK, LIGHT, PAPER
from fourcount.ink.picture import Picture, as_image
from fourcount.ink.shapes import TALL
from fourcount.ink.typeset import text_height
from fourcount.picture.options import ARRANGEMENTS, ICONS, Arrangement, Icons, PictureOptions

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
@pytest.mark.parametrize("arrangement", ARRANGEMENTS)
@pytest.mark.parametrize("captions", [True, False], ids=["captions", "bare"])
def test_the_height_is_what_drawing_takes(
    sheet: Callable[..., object],
    style: Callable[..., object],
    picture: Callable[..., Picture],
    width: int,
    risks: tuple[float, float],
    long: bool,
    arrangement: Arrangement,
    captions: bool,
) -> None:
    """Measured and drawn height agree, and nothing is drawn below, in every arrangement."""
    options = PictureOptions(arrangement=arrangement, captions=captions)
    it = picture(*risks, options=options, long=long, note="Each picture shows 1,000 people." if long else "")
    look = style()
    height = it.height(look, width)
    with sheet(width, height + 60, LIGHT.page) as (image, painter):
        taken = it.draw(painter, look, 0, 0, width)
    assert height == round(taken)
    assert max(painted_rows(image, LIGHT.page)) <= height


@pytest.mark.parametrize("icons", ICONS)
@pytest.mark.parametrize("arrangement", ["two", "one"])
@pytest.mark.parametrize("within", [240, 330, 500])
def test_a_picture_keeps_to_a_height(
    sheet: Callable[..., object],
    style: Callable[..., object],
    picture: Callable[..., Picture],
    icons: Icons,
    arrangement: Arrangement,
    within: int,
) -> None:
    """Icons get smaller where the page has no more room, and no smaller than they must; the columns stay."""
    it, look = picture(0.12, 0.06, options=PictureOptions(icons, arrangement)), style()
    height = it.height(look, 800, within)
    with sheet(800, 700, LIGHT.page) as (image, painter):
        assert round(it.draw(painter, look, 0, 0, 800, within)) == height
    assert max(painted_rows(image, LIGHT.page)) <= within
    assert height <= within
    rows = 10 * TALL[icons]  # one pixel more a cell would have made the array so much higher, gap and all
    assert height == it.height(look, 800) or height > within - rows - 6


ODD = [0.0, 5e-324, 1e-12, 0.00005, 0.004, 0.5, 0.50001, 0.99995, 1 - 1e-12, 1.0]


@pytest.mark.parametrize("arrangement", ARRANGEMENTS)
@pytest.mark.parametrize("width", [1, 30, 360])
def test_any_two_risks_can_be_drawn(
    sheet: Callable[..., object],
    style: Callable[..., object],
    picture: Callable[..., Picture],
    arrangement: Arrangement,
    width: int,
) -> None:
    """However small, close or certain the risks are, and however narrow the place, the height drawn is the one told."""
    look, options = style(), PictureOptions(arrangement=arrangement)
    for without, with_ in product(ODD, ODD):
        it = picture(without, with_, limits=(with_ / 2, (1 + with_) / 2), options=options)
        with sheet(max(width, 1), 10, LIGHT.page) as (_, painter):
            assert round(it.draw(painter, look, 0, 0, width)) == it.height(look, width)


def test_what_cannot_be_made_smaller_stays(style: Callable[..., object], picture: Callable[..., Picture]) -> None:
    """Bars keep their height, whatever is asked."""
    it = picture(0.12, 0.06, bars=True)
    assert it.height(style(), 342, 10) == it.height(style(), 342)


@pytest.mark.parametrize(
    ("risks", "width", "columns"),
    [
        ((0.12, 0.06), 342, 2),
        ((0.12, 0.06), 279, 1),
        ((0.052, 0.047), 342, 1),
        ((0.052, 0.047), 600, 2),
        ((0.0015, 0.0008), 500, 1),
        ((0.0015, 0.0008), 642, 2),
    ],
)
def test_columns_say_where_the_arrays_stand(
    sheet: Callable[..., object],
    style: Callable[..., object],
    picture: Callable[..., Picture],
    risks: tuple[float, float],
    width: int,
    columns: int,
) -> None:
    """A page that sets its own heads finds each array's left edge, side by side or one under the other."""
    it, look = picture(*risks, options=PictureOptions(captions=False)), style()
    places = it.columns(look, width)
    assert len({left for left, _ in places}) == columns
    with sheet(width, it.height(look, width), LIGHT.page) as (image, painter):
        it.draw(painter, look, 0, 0, width)
    for left, wide in places:
        assert left + wide <= width
        first = [x for x in range(int(left), int(left + wide)) if image.pixelColor(x, 2) != QColor(LIGHT.page)]
        assert first[0] - left <= 12


def test_captions_are_left_to_the_page(style: Callable[..., object], picture: Callable[..., Picture]) -> None:
    """Without captions the words of the groups take no room; key and note stay."""
    look = style()
    bare = picture(0.12, 0.06, options=PictureOptions(captions=False), note="Each picture shows 1,000 people.")
    bare_but_long = picture(0.12, 0.06, options=PictureOptions(captions=False), note="")
    assert bare.height(look, 342) < picture(0.12, 0.06, note="Each picture shows 1,000 people.").height(look, 342)
    assert bare.height(look, 342) > bare_but_long.height(look, 342)


def test_the_key_explains_what_is_drawn(picture: Callable[..., Picture]) -> None:
    """Of all words that there are for states only those of the icons that are there are shown; bars have no key."""
    assert [entry.state for entry in picture(0.12, 0.06).key] == ["affected", "avoided", "others"]
    assert [entry.state for entry in picture(0.06, 0.12).key] == ["affected", "added", "others"]
    assert [entry.state for entry in picture(0.12, 0.06, limits=(0.04, 0.09)).key] == [
        "affected",
        "uncertain",
        "avoided",
        "others",
    ]
    assert picture(0.12, 0.06, bars=True).key == ()


def test_pictures_are_equal_where_they_are_drawn_alike(picture: Callable[..., Picture]) -> None:
    """Plan, words and options make a picture; the same ones make the same."""
    assert picture(0.12, 0.06) == picture(0.12, 0.06)
    assert hash(picture(0.12, 0.06)) == hash(picture(0.12, 0.06))
    others = [picture(0.12, 0.07), picture(0.12, 0.06, bars=True), picture(0.12, 0.06, options=PictureOptions("dot"))]
    assert all(other != picture(0.12, 0.06) for other in others)


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


def test_bars_share_one_scale_and_begin_on_one_line(
    sheet: Callable[..., object], style: Callable[..., object], picture: Callable[..., Picture]
) -> None:
    """Bars of 12% and 6% on a scale up to 25%, one under the other, fill 48% and 24% of the width."""
    it = picture(0.12, 0.06, bars=True)
    with sheet(400, it.height(style(), 400), LIGHT.page) as (image, painter):
        it.draw(painter, style(), 0, 0, 400)
    accent = QColor(LIGHT.accent)
    rows = [[x for x in range(400) if image.pixelColor(x, y) == accent] for y in range(image.height())]
    filled = [row for row in rows if len(row) > 40]
    assert {row[0] for row in filled} == {0}
    assert {len(row) for row in filled} == {round(0.48 * 400), round(0.24 * 400)}


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
