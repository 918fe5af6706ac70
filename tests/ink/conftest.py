"""A style to draw in, a sheet to draw on, and words for a picture."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from contextlib import contextmanager

import pytest
from PySide6.QtCore import QSize
from PySide6.QtGui import QColor, QFont, QImage, QPainter
from PySide6.QtWidgets import QApplication

from fourcount.ink.palette import LIGHT, Palette
from fourcount.ink.picture import KeyEntry, Picture, PictureWords, Side
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.picture.plan import plan

SIZES = {"body": 13, "small": 12, "strong": 13, "figure": 20}


class PlainStyle:
    """The smallest style there is: a palette, and one font in the sizes of the roles."""

    def __init__(self, palette: Palette = LIGHT, zoom: float = 1.0) -> None:
        self.palette = palette
        self.zoom = zoom

    def font(self, role: str) -> QFont:
        font = QFont()
        font.setPixelSize(round(SIZES[role] * self.zoom))
        return font

    def px(self, pixels: float) -> int:
        return round(pixels * self.zoom)


@pytest.fixture(autouse=True)
def _application(qapp: QApplication) -> None:
    """Fonts and pixmaps need an application."""


@pytest.fixture
def style() -> Callable[..., PlainStyle]:
    """Make a style: a palette and a text size."""
    return PlainStyle


@pytest.fixture
def sheet() -> Callable[..., Iterator[tuple[QImage, QPainter]]]:
    """Make an image in one colour and a painter on it."""

    @contextmanager
    def make(width: int, height: int, page: str, ratio: float = 1.0) -> Iterator[tuple[QImage, QPainter]]:
        image = QImage(QSize(width, height) * ratio, QImage.Format.Format_RGB32)
        image.setDevicePixelRatio(ratio)
        image.fill(QColor(page))
        painter = QPainter(image)
        try:
            yield image, painter
        finally:
            painter.end()

    return make


@pytest.fixture
def picture() -> Callable[..., Picture]:
    """Make a picture of two risks, with short words or with long ones."""

    def make(
        without: float,
        with_: float,
        *,
        bars: bool = False,
        long: bool = False,
        note: str = "",
        limits: tuple[float, float] | None = None,
        options: PictureOptions = USUAL,
    ) -> Picture:
        name = "a treatment with a name that goes on and on, twice a day with meals" if long else "usual care"
        words = PictureWords(
            without=Side(f"Without: {name}", "1,204 in 10,000", "(12.04%)", "8,796 did not have the event"),
            with_=Side("With: night lights", "6 in 100", "(6%)", "94 did not fall"),
            key=(
                KeyEntry("affected", f"fell {name}"),
                KeyEntry("added", "falls added, on balance"),
                KeyEntry("uncertain", "not settled by the study"),
                KeyEntry("avoided", "falls avoided, on balance"),
                KeyEntry("others", "did not fall"),
            ),
            note=note,
            lines=("6 fewer in 100 fell", "range 3 to 8"),
            bar_ends=("0", "25%"),
        )
        asked = options._replace(arrangement="bars") if bars else options
        return Picture(plan(without, with_, *(limits or ())), words, asked)

    return make
