"""One outcome on the printed page: its title, its people, and beside or below them what is said of it."""

from __future__ import annotations

from typing import NamedTuple

from PySide6.QtCore import QPointF
from PySide6.QtGui import QPainter

from fourcount.ink.beside_picture import BesidePicture
from fourcount.ink.paper_style import PaperStyle
from fourcount.ink.paragraph import Run, draw_paragraph, paragraph_height
from fourcount.ink.plain_picture import PlainPicture, Shown

GAP = 24
"""Room between the people and the words beside them, at 100%."""

BESIDE = 0.66
"""The share of the width that the people get where words stand beside them."""

PARAGRAPH = 4
LEAST_ARRAY: dict[int | None, int] = {100: 100, 1_000: 100, 10_000: 190, None: 0}
"""How high an array is at least, in units of 1/96 inch: a figure of a hundred is 2 mm high then."""


class Setting(NamedTuple):
    """How blocks are set: captions beside their people or above them, and words beside the people or below them."""

    captions_aside: bool
    words_aside: bool


class Block:
    """One outcome with its words. More than a hundred people a group take the whole width, whatever the setting."""

    def __init__(self, it: Shown) -> None:
        self._it = it
        self._hundred = it.plan.denominator == 100
        self._above = PlainPicture(it)
        self._aside = BesidePicture(it)
        self._least_array = LEAST_ARRAY[it.plan.denominator]

    def has_persons(self, style: PaperStyle, setting: Setting, width: float, array: float) -> bool:
        """Whether its people are drawn as persons and not as marks."""
        wide = round(width * BESIDE) if setting.words_aside else width
        aside = setting.captions_aside and self._hundred
        drawn = self._aside.drawn_as(style, wide, array) if aside else self._it.options.icons
        return drawn == "person"

    def height(self, style: PaperStyle, setting: Setting, width: float, array: float) -> float:
        """Height with arrays of at most ``array``, but not less than their least."""
        return self.draw(None, style, setting, QPointF(0, 0), width, array)

    def draw(
        self,
        painter: QPainter | None,
        style: PaperStyle,
        setting: Setting,
        corner: QPointF,
        width: float,
        array: float,
    ) -> float:
        """Draw it with its top left corner at ``corner`` and give the height it took; without a painter measure it."""
        x, y, px = corner.x(), corner.y(), style.px
        y += self._title(painter, style, x, y, width) + px(6)
        array = max(array, self._least_array)
        if setting.words_aside and self._hundred:
            wide = round(width * BESIDE)
            left = wide + px(GAP)
            people = self._people(painter, style, setting, QPointF(x, y), wide, array)
            return y + max(people, self._words(painter, style, x + left, y, width - left)) - corner.y()
        y += self._people(painter, style, setting, QPointF(x, y), width, array) + px(8)
        return y + self._words(painter, style, x, y, width) - corner.y()

    def _people(
        self,
        painter: QPainter | None,
        style: PaperStyle,
        setting: Setting,
        corner: QPointF,
        width: float,
        array: float,
    ) -> float:
        x, y = corner.x(), corner.y()
        if setting.captions_aside and self._hundred:
            if painter is None:
                return self._aside.height(style, width, array)
            return self._aside.draw(painter, style, x, y, width, array)
        within = self._above.height(style, width, 0) + array
        if painter is None:
            return self._above.height(style, width, within)
        return self._above.draw(painter, style, x, y, width, within)

    def _title(self, painter: QPainter | None, style: PaperStyle, x: float, y: float, width: float) -> float:
        words, palette = self._it.words, style.palette
        runs = [Run(words.title, style.font("total"), palette.ink), Run(words.lead, style.font("body"), palette.muted)]
        return _paragraph(painter, x, y, width, runs)

    def _words(self, painter: QPainter | None, style: PaperStyle, x: float, y: float, width: float) -> float:
        """The difference first, then that nobody knows which people; the relative figure; how sure one can be."""
        words, palette, body, top = self._it.words, style.palette, style.font("body"), y
        paragraphs = [
            [Run(words.summary, style.font("total"), palette.ink), Run(words.which, body, palette.muted)],
            [Run(words.relative, body, palette.ink)],
            [Run(line, body, palette.ink) for line in words.other_starts],
            [Run(words.certainty, body, palette.ink), Run(words.open_, body, palette.ink)],
            [Run(words.study, body, palette.muted)],
        ]
        for runs in paragraphs:
            spoken = [run for run in runs if run.text]
            if spoken:
                y += _paragraph(painter, x, y, width, spoken) + style.px(PARAGRAPH)
        return y - style.px(PARAGRAPH) - top


def _paragraph(painter: QPainter | None, x: float, y: float, width: float, runs: list[Run]) -> float:
    if painter is None:
        return paragraph_height(runs, width)
    return draw_paragraph(painter, x, y, width, runs)
