"""The drawn strip of a measure: where its parts stand, and what happens beyond its ends."""

from __future__ import annotations

import math
from collections.abc import Callable

import pytest
from PySide6.QtCore import QRectF
from PySide6.QtGui import QColor, QImage

from fourcount.ink.palette import LIGHT
from fourcount.ink.strips import draw_strip
from fourcount.picture.scales import Scale, difference_scale, ratio_scale, risk_scale

LEFT, RIGHT, TOP, TALL = 20, 220, 10, 20
MIDDLE = TOP + TALL // 2
Strip = Callable[..., QImage]


@pytest.fixture
def strip(sheet: Callable[..., object]) -> Strip:
    """Paint a strip of 200 pixels from x = 20 to 220."""

    def paint(scale: Scale, estimate: float | None, low: float | None, high: float | None) -> QImage:
        with sheet(240, 40, LIGHT.page) as (image, painter):
            area = QRectF(LEFT, TOP, RIGHT - LEFT, TALL)
            draw_strip(painter, area, scale, LIGHT, estimate, low, high)
        return image

    return paint


@pytest.fixture
def marked(sheet: Callable[..., object]) -> Strip:
    """Paint an empty strip with a line of the reader's own."""

    def paint(scale: Scale, mark: float | None) -> QImage:
        with sheet(240, 40, LIGHT.page) as (image, painter):
            area = QRectF(LEFT, TOP, RIGHT - LEFT, TALL)
            draw_strip(painter, area, scale, LIGHT, None, None, None, mark)
        return image

    return paint


def is_accent(image: QImage, x: int, y: int) -> bool:
    """Whether a pixel is nearer to the accent than to anything else that is drawn."""
    seen, accent = image.pixelColor(x, y), QColor(LIGHT.accent)
    apart = (seen.red() - accent.red(), seen.green() - accent.green(), seen.blue() - accent.blue())
    return max(map(abs, apart)) <= 60


def painted_columns(image: QImage, y: int = MIDDLE) -> list[int]:
    """The columns of a line in the accent's colour."""
    return [x for x in range(image.width()) if is_accent(image, x, y)]


def test_the_interval_is_drawn_from_limit_to_limit(strip: Strip) -> None:
    """On a scale of -10 to 10 points, -8 to -2 is drawn from a tenth to two fifths of the strip."""
    columns = painted_columns(strip(difference_scale([0.1]), None, -0.08, -0.02))
    assert (columns[0], columns[-1]) == (pytest.approx(40, abs=1), pytest.approx(99, abs=1))


def test_the_estimate_is_a_dot_on_its_place(strip: Strip) -> None:
    """The dot is taller than the bar and its middle stands where the estimate lies."""
    image = strip(difference_scale([0.1]), -0.05, -0.08, -0.02)
    beside_the_bar = painted_columns(image, MIDDLE - 3)
    assert sum(beside_the_bar) / len(beside_the_bar) == pytest.approx(70, abs=1)


@pytest.mark.parametrize(("low", "high", "side"), [(0.001, 2.0, "left"), (0.5, 5_000.0, "right"), (0.5, math.inf, "right"), (0.0, 2.0, "left")])  # fmt: skip  # noqa: E501
def test_a_limit_beyond_the_scale_is_an_arrow(strip: Strip, low: float, high: float, side: str) -> None:
    """Where the interval goes on, an arrow points over the strip's end; the other end has none."""
    image = strip(ratio_scale([100.0]), None, low, high)
    over = {"left": is_accent(image, LEFT - 2, MIDDLE), "right": is_accent(image, RIGHT + 1, MIDDLE)}
    head = {"left": is_accent(image, LEFT + 4, MIDDLE - 3), "right": is_accent(image, RIGHT - 5, MIDDLE - 3)}
    other = "right" if side == "left" else "left"
    assert over[side]
    assert head[side]
    assert not over[other]
    assert not head[other]


def test_limits_on_the_ends_of_the_scale_have_no_arrow(strip: Strip) -> None:
    """An interval that just fills the scale ends there, and says so by a plain end."""
    image = strip(risk_scale([0.25]), None, 0.0, 0.25)
    assert is_accent(image, LEFT + 1, MIDDLE)
    assert not is_accent(image, LEFT + 4, MIDDLE - 3)
    assert not is_accent(image, RIGHT - 5, MIDDLE - 3)


@pytest.mark.parametrize("estimate", [None, 500.0, math.inf, 0.0])
def test_an_estimate_off_the_scale_is_not_drawn_on_it(strip: Strip, estimate: float | None) -> None:
    """No dot is moved to an end where it does not belong."""
    image = strip(ratio_scale([2.0]), estimate, None, None)
    assert painted_columns(image) == []


@pytest.mark.parametrize(("low", "high"), [(None, 0.1), (0.1, None), (None, None)])
def test_without_both_limits_no_bar_is_drawn(strip: Strip, low: float | None, high: float | None) -> None:
    """Half an interval is none."""
    assert painted_columns(strip(risk_scale([0.25]), None, low, high)) == []


def test_no_effect_is_a_dotted_line(strip: Strip) -> None:
    """No effect is marked over the strip's whole height, and not as a solid line."""
    image = strip(ratio_scale([4.0]), None, None, None)
    page = QColor(LIGHT.page)
    middle = (LEFT + RIGHT) // 2
    line = [image.pixelColor(middle, y) != page for y in range(TOP, TOP + TALL)]
    assert any(line[:5])
    assert any(line[-5:])
    assert not all(line)


def test_a_risk_has_no_line_of_no_effect(strip: Strip) -> None:
    """Risks have no value that means no effect."""
    image = strip(risk_scale([0.25]), None, None, None)
    above = MIDDLE - 5
    assert all(image.pixelColor(x, above) == QColor(LIGHT.page) for x in range(240))


def is_ink(image: QImage, x: int, y: int) -> bool:
    """Whether a pixel is nearly as dark as text."""
    return image.pixelColor(x, y).lightness() < QColor(LIGHT.ink).lightness() + 60


def test_the_readers_own_line_is_solid_over_the_whole_height(marked: Strip) -> None:
    """-5 points on a scale of -10 to 10 is marked at a quarter, from top to bottom, in the colour of text."""
    image = marked(difference_scale([0.1]), -0.05)
    column = [any(is_ink(image, x, y) for x in (69, 70, 71)) for y in range(TOP + 1, TOP + TALL - 1)]
    assert all(column)


def test_the_readers_own_line_has_a_flag(marked: Strip) -> None:
    """The flag tells it from no effect in grey too, and points away from it unless it would leave the strip."""
    fewer, more = marked(difference_scale([0.1]), -0.05), marked(difference_scale([0.1]), 0.05)
    assert (is_ink(fewer, 67, TOP + 3), is_ink(fewer, 73, TOP + 3)) == (True, False)
    assert (is_ink(more, 167, TOP + 3), is_ink(more, 173, TOP + 3)) == (False, True)
    least, most = marked(difference_scale([0.1]), -0.1), marked(difference_scale([0.1]), 0.1)
    assert (is_ink(least, LEFT - 3, TOP + 3), is_ink(least, LEFT + 3, TOP + 3)) == (False, True)
    assert (is_ink(most, RIGHT - 3, TOP + 3), is_ink(most, RIGHT + 3, TOP + 3)) == (True, False)


@pytest.mark.parametrize("mark", [None, 500.0, 0.0])
def test_a_line_off_the_scale_is_not_drawn_on_it(marked: Strip, mark: float | None) -> None:
    """No line is moved to an end where it does not belong."""
    image = marked(ratio_scale([2.0]), mark)
    page_like = [is_ink(image, x, TOP + 3) for x in range(240)]
    assert not any(page_like)


def test_the_bar_and_the_dot_stay_beside_the_line(sheet: Callable[..., object]) -> None:
    """A line through the interval leaves it to be seen on both sides, and an estimate on the line keeps its dot."""
    with sheet(240, 40, LIGHT.page) as (image, painter):
        area = QRectF(LEFT, TOP, RIGHT - LEFT, TALL)
        draw_strip(painter, area, difference_scale([0.1]), LIGHT, -0.05, -0.08, -0.02, -0.05)
    assert is_accent(image, 70, MIDDLE)
    assert is_accent(image, 50, MIDDLE)
    assert is_accent(image, 90, MIDDLE)
