"""One outcome on the printed page: its title, its people, and beside or below them what is said of it."""

from __future__ import annotations

from collections.abc import Iterator, Sequence
from typing import NamedTuple

from PySide6.QtCore import QPointF
from PySide6.QtGui import QPainter

from fourcount.ink.beside_picture import BesidePicture
from fourcount.ink.paper_style import PaperStyle
from fourcount.ink.paragraph import Run, draw_paragraph, paragraph_height
from fourcount.ink.plain_picture import PlainPicture, Shown, beside_or_below
from fourcount.wording import plain_texts

GAP = 24
"""Room between the people and the words beside them, at 100%."""

BESIDE = 0.68
"""The share of the width that the people get where words stand beside them."""

PARAGRAPH = 4
LEAST_ARRAY: dict[int | None, int] = {100: 100, 1_000: 100, 10_000: 190, None: 0}
"""How high an array is at least, in units of 1/96 inch: a figure of a hundred is 2 mm high then."""


class Setting(NamedTuple):
    """How blocks are set: captions beside their people or above them, and words beside the people or below them.

    Captions beside people are wide enough for the key where the words stand below.
    """

    captions_aside: bool
    words_aside: bool


class Block:
    """One outcome with its words. More than a hundred people a group take the whole width, whatever the setting.

    ``tells_who`` says that the head names whose people these are, since another outcome of the page shows others.
    """

    def __init__(self, it: Shown, tells_who: bool = False) -> None:
        self._it = it
        self._tells_who = tells_who
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

    def counts_wrap(self, style: PaperStyle, width: float) -> bool:
        """Whether a count needs more than its line where captions stand above their people."""
        return self._above.counts_wrap(style, width)

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
            return self._aside.draw(painter, style, corner, width, array, not setting.words_aside)
        within = self._above.height(style, width, 0) + array
        if painter is None:
            return self._above.height(style, width, within)
        return self._above.draw(painter, style, x, y, width, within)

    def _title(self, painter: QPainter | None, style: PaperStyle, x: float, y: float, width: float) -> float:
        words, ink, body = self._it.words, style.palette.ink, style.font("body")
        head = plain_texts.HEAD.format(title=words.title, who=words.who) if self._tells_who else words.title
        said = beside_or_below(
            [
                Run(head, style.font("total"), ink),
                Run("" if self._tells_who else words.lead, body, style.palette.muted),
                Run(words.turned if self._it.plan.denominator else "", body, ink),
            ],
            width,
        )
        return sum(_paragraphs(painter, x, y, width, said, style.px(1)))

    def _words(self, painter: QPainter | None, style: PaperStyle, x: float, y: float, width: float) -> float:
        """The difference first with what makes it doubtful; that nobody knows which people; the relative figure."""
        words, palette, body = self._it.words, style.palette, style.font("body")
        total = style.font("total")
        rest = (words.which, words.certainty, words.relative, *words.other_starts)
        said = [
            *beside_or_below([Run(words.summary, total, palette.ink), Run(words.open_, total, palette.ink)], width),
            [Run(words.rounded, body, palette.muted)],
            [Run(words.doubt, style.font("cell"), palette.ink)],
            [*(Run(text, body, palette.ink) for text in rest), Run(words.study, body, palette.muted)],
        ]
        return sum(_paragraphs(painter, x, y, width, said, style.px(PARAGRAPH)))


def _paragraphs(
    painter: QPainter | None, x: float, y: float, width: float, said: Sequence[Sequence[Run]], gap: float
) -> Iterator[float]:
    """Set paragraphs one under the other and give the height that each took, with the space before it."""
    before = 0.0
    for runs in said:
        spoken = [run for run in runs if run.text]
        if spoken:
            y += before
            tall = _paragraph(painter, x, y, width, spoken)
            y += tall
            yield before + tall
            before = gap


def _paragraph(painter: QPainter | None, x: float, y: float, width: float, runs: list[Run]) -> float:
    if painter is None:
        return paragraph_height(runs, width)
    return draw_paragraph(painter, x, y, width, runs)
