"""How it looks: text from 80% to 200%, columns as there is room, light and dark."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from fourcount.face.look import SIZES, ZOOMS
from fourcount.face.window import MainWindow
from fourcount.ink.palette import DARK, HIGH_DARK, HIGH_LIGHT, LIGHT, Palette

if TYPE_CHECKING:
    from conftest import Hands


def pixel_sizes(window: MainWindow) -> tuple[int, ...]:
    """Sizes of text in every part of the window."""
    widgets = (
        window.says.sentence, window.printed.grid.cells["first_left_text"], window.printed.span, window.header.title,
        window.says.family, window.says.more, window.patient.figures.detail, window.menuBar(),
    )  # fmt: skip
    return tuple(widget.font().pixelSize() for widget in widgets)


def columns(window: MainWindow) -> int:
    """How many columns stand side by side."""
    return len({part.x() for part in (window.printed, window.says, window.patient)})


def test_larger_and_smaller_text(example: Hands) -> None:
    """The zoom keys change all text together, and one key brings the normal size back."""
    normal = pixel_sizes(example.window)
    assert normal[0] == SIZES["sentence"]
    example.do("bigger")
    assert all(now > before for now, before in zip(pixel_sizes(example.window), normal, strict=True))
    example.do("actual")
    assert pixel_sizes(example.window) == normal
    example.do("smaller")
    assert all(now < before for now, before in zip(pixel_sizes(example.window), normal, strict=True))


def test_text_goes_from_80_to_200_percent(example: Hands) -> None:
    """Each press is a step, and the ends hold."""
    example.press("Ctrl+-", times=20)
    seen = [example.window.look.zoom]
    for _ in range(20):
        example.do("bigger")
        seen.append(example.window.look.zoom)
    assert tuple(dict.fromkeys(seen)) == ZOOMS
    assert pixel_sizes(example.window)[0] == 2 * SIZES["sentence"]


def test_ctrl_equals_enlarges_too(hands: Hands) -> None:
    """The plus key without Shift works as people press it."""
    hands.press("Ctrl+=")
    assert hands.window.look.zoom > 1


def test_zoom_loses_neither_focus_nor_figures(example: Hands) -> None:
    """Larger text is the same window: the cursor stays, and so does all that is shown."""
    example.do("first-cell")
    field, rows, texts = example.field, example.rows, example.texts
    example.do("bigger")
    assert (example.field, example.rows, example.texts) == (field, rows, texts)


@pytest.mark.parametrize(("width", "zoom", "expected"), [(1280, 1.0, 3), (1000, 1.0, 2), (700, 1.0, 1), (1280, 1.25, 2), (1280, 1.5, 1), (1000, 0.8, 3)])  # fmt: skip  # noqa: E501
def test_columns_stand_side_by_side_where_there_is_room(example: Hands, width: int, zoom: float, expected: int) -> None:
    """Three columns, two or one, by the width of the window in units of its text."""
    window = example.window
    window.resize(width, 800)
    while window.look.zoom < zoom:
        example.do("bigger")
    while window.look.zoom > zoom:
        example.do("smaller")
    example.qtbot.waitUntil(lambda: columns(window) == expected)
    parts = (window.printed, window.says, window.patient)
    assert all(part.x() + part.width() <= window.page.width() for part in parts)


@pytest.mark.parametrize("width", [480, 700, 1000, 1280])
def test_nothing_overlaps(example: Hands, width: int) -> None:
    """At any width the three columns keep apart, and each is as tall as it needs."""
    window = example.window
    window.resize(width, 700)
    example.qtbot.waitUntil(lambda: window.page.width() >= width - 12)
    places = [part.geometry() for part in (window.printed, window.says, window.patient)]
    assert not any(one.intersects(other) for one in places for other in places if one is not other)
    assert all(place.height() >= part.heightForWidth(place.width()) for place, part in zip(places, (window.printed, window.says, window.patient), strict=True))  # fmt: skip  # noqa: E501


def test_in_two_columns_the_patient_stands_under_the_print(example: Hands) -> None:
    """The table and the patient share the left side; what it says has the right one."""
    window = example.window
    window.resize(1000, 800)
    example.qtbot.waitUntil(lambda: columns(window) == 2)
    assert window.patient.x() == window.printed.x()
    assert window.patient.y() >= window.printed.y() + window.printed.height()
    assert window.says.x() > window.printed.x()


@pytest.mark.parametrize(
    ("appearance", "palette"),
    [("dark", DARK), ("light", LIGHT), ("high-light", HIGH_LIGHT), ("high-dark", HIGH_DARK)],
)
def test_light_and_dark(example: Hands, appearance: str, palette: Palette) -> None:
    """The choice in the menu takes hold of page, text and picture at once."""
    window = example.window
    for action in window.menus["view"].actions():
        if action.data() == appearance:
            action.trigger()
    assert window.look.palette == palette
    for part in (window.printed, window.says, window.patient, window.header):
        example.qtbot.waitUntil(lambda p=part: p.grab().toImage().pixelColor(6, 6).name().upper() == palette.page)
    ink = window.says.sentence.palette().windowText().color().name().upper()
    assert ink == palette.ink


def test_appearance_changes_nothing_but_colours(example: Hands) -> None:
    """Dark and light have the same figures in the same places."""
    rows, place = example.rows, example.row("risk_ratio").geometry()
    example.window.look.set_appearance("dark")
    assert (example.rows, example.row("risk_ratio").geometry()) == (rows, place)


def test_the_cautions_strip_leaves_room_for_the_page(example: Hands) -> None:
    """However many cautions hold, the strip takes a quarter of the height at most, and scrolls by keyboard."""
    window = example.window
    window.resize(700, 500)
    example.choose(window.printed.design, "case-control study")
    example.write(window.patient.baseline, "12%")
    strip = window.cautions
    assert len(strip.texts) >= 3
    example.qtbot.waitUntil(lambda: strip.verticalScrollBar().maximum() > 0)
    assert strip.height() <= 0.3 * window.height()
    strip.setFocus()
    example.press("Down", times=3)
    assert strip.verticalScrollBar().value() > 0


def test_a_narrow_window_keeps_its_room_for_the_table(example: Hands) -> None:
    """The standing block goes to the end of the page, its shortest form stays, the title has its own line."""
    window = example.window
    assert window.patient.standing is None
    assert window.cautions.isVisible()
    window.resize(480, 700)
    example.qtbot.waitUntil(lambda: window.patient.standing is not None)
    standing = window.patient.standing
    assert standing is not None
    assert standing.isVisible()
    assert standing.text() in window.cautions.accessibleDescription()
    assert not window.cautions.texts
    assert window.cautions.isVisible()
    example.qtbot.waitUntil(lambda: window.header.source.y() > window.header.title.y())
    window.resize(1280, 700)
    example.qtbot.waitUntil(lambda: not standing.isVisible())
    assert window.cautions.isVisible()
    window.look.set_zoom(2.0)
    example.qtbot.waitUntil(standing.isVisible)
