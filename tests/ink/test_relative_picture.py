"""The picture of the relative figure: after the absolute one, in people first, whole at any width."""

from __future__ import annotations

from collections.abc import Callable

import pytest
from PySide6.QtGui import QColor, QImage

from fourcount.ink.palette import LIGHT
from fourcount.ink.picture import Picture, as_image
from fourcount.ink.relative_picture import RelativePicture
from fourcount.picture.plan import plan
from fourcount.picture.relative import relative_plan
from fourcount.record.outcome import Outcome
from fourcount.wording.relative_words import relative_words


@pytest.fixture
def relative() -> Callable[..., RelativePicture]:
    """Make the picture of two risks, with short names or with a long one."""

    def make(without: float, with_: float, name: str = "Usual care") -> RelativePicture:
        outcome = Outcome(first_label_text="Night lights", second_label_text=name)
        drawn = plan(without, with_)
        lengths = relative_plan(drawn)
        assert lengths is not None
        return RelativePicture(lengths, relative_words(outcome, drawn))

    return make


def bars(image: QImage) -> list[tuple[int, int]]:
    """First column and length of each stretch in the accent's colour, from the top, each bar once."""
    accent = QColor(LIGHT.accent)
    found: list[tuple[int, int]] = []
    before: list[tuple[int, int]] = []
    for y in range(image.height()):
        row = [x for x in range(image.width()) if image.pixelColor(x, y) == accent]
        starts = [x for x in row if x - 1 not in row]
        runs = [(x, next(n for n in range(1, image.width() + 1) if x + n not in row)) for x in starts]
        found += [run for run in runs if run not in before]
        before = runs
    return found


@pytest.mark.parametrize("width", [150, 342, 479, 480, 700])
@pytest.mark.parametrize("zoom", [1.0, 2.0])
@pytest.mark.parametrize("name", ["Usual care", "A treatment with a name that goes on and on, twice a day with meals"])
def test_the_height_is_what_drawing_takes(
    sheet: Callable[..., object],
    style: Callable[..., object],
    relative: Callable[..., RelativePicture],
    width: int,
    zoom: float,
    name: str,
) -> None:
    """Measured and drawn height agree, and nothing is drawn below."""
    it, look = relative(0.12, 0.06, name), style(zoom=zoom)
    height = it.height(look, width)
    with sheet(width, height + 60, LIGHT.page) as (image, painter):
        assert round(it.draw(painter, look, 0, 0, width)) == height
    blank = QColor(LIGHT.page)
    assert all(image.pixelColor(x, y) == blank for x in range(width) for y in range(height + 1, height + 60))


def test_in_people_comes_first(
    sheet: Callable[..., object], style: Callable[..., object], relative: Callable[..., RelativePicture]
) -> None:
    """In a narrow column 12 and 6 of 100 stand above what their ratio sounds like: all and half."""
    it, look = relative(0.12, 0.06), style()
    with sheet(400, it.height(look, 400), LIGHT.page) as (image, painter):
        it.draw(painter, look, 0, 0, 400)
    assert [length for _, length in bars(image)] == [48, 24, 400, 200]


def test_side_by_side_in_people_stands_left(
    sheet: Callable[..., object], style: Callable[..., object], relative: Callable[..., RelativePicture]
) -> None:
    """Where there is room, both pairs stand on the same lines, in people on the left."""
    it, look = relative(0.12, 0.06), style()
    with sheet(628, it.height(look, 628), LIGHT.page) as (image, painter):
        it.draw(painter, look, 0, 0, 628)
    assert bars(image) == [(0, 36), (328, 300), (0, 18), (328, 150)]


def test_equal_pictures_are_equal(relative: Callable[..., RelativePicture]) -> None:
    """Plan and words make the picture."""
    assert relative(0.12, 0.06) == relative(0.12, 0.06)
    assert hash(relative(0.12, 0.06)) == hash(relative(0.12, 0.06))
    assert relative(0.12, 0.06) != relative(0.12, 0.07)


def test_a_copied_picture_takes_it_along(
    style: Callable[..., object], picture: Callable[..., Picture], relative: Callable[..., RelativePicture]
) -> None:
    """On demand it follows the absolute picture on the same sheet, and everything else stays."""
    it, look, wide = relative(0.12, 0.06), style(), 520 - 2 * 28
    bare = as_image(picture(0.12, 0.06), look, "Falls", "Cautions.", scale=1)
    both = as_image(picture(0.12, 0.06), look, "Falls", "Cautions.", scale=1, relative=it)
    assert both.height() - bare.height() == pytest.approx(it.height(look, wide) + 16, abs=1)
    above = round(picture(0.12, 0.06).height(look, wide)) + 28
    assert both.copy(0, 0, 520, above) == bare.copy(0, 0, 520, above)
