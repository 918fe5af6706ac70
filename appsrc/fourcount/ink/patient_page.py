"""One outcome on a screen for the patient: a title, two groups of people, one sentence; dark on white."""

from __future__ import annotations

from collections.abc import Sequence
from typing import NamedTuple

from PySide6.QtCore import QRectF
from PySide6.QtGui import QColor, QPainter

from fourcount.ink.paper_style import SCREEN_SIZES, PaperStyle
from fourcount.ink.paragraph import Run, draw_paragraph, paragraph_height
from fourcount.ink.plain_picture import PlainPicture, Shown, beside_or_below, on_one_line
from fourcount.wording import plain_texts

DESIGNED_FOR = (1280, 690)
"""The room, in pixels, that the page fills at a scale of ``AT_THAT_SIZE``."""

AT_THAT_SIZE = 1.6
LARGEST = 3.2
LEAST_AT_ONE = 0.93
"""At this scale the page's text is as large as the window's own."""

DOUBT = 16
"""Text size, at 100%, of what is next in weight to the difference."""

WORTH_A_LINE = 0.2
"""How much smaller all text may be so that no count wraps."""

BELOW_HEADLINE = 14
"""More space than below other sentences, where the difference stands above the pictures."""

STEPS, STEP = 12, 0.05
"""How many sizes of text are tried, and by which part of the largest each is smaller."""

MARGIN = 45

Spaced = tuple[Sequence[Run], float]
"""A paragraph and the space below it."""


class Fit(NamedTuple):
    """The page's style and height in its room; whether it is higher than that, and its headline stands first."""

    style: PaperStyle
    height: float
    headline_first: bool


class PatientPage:
    """A page that fills the room it is given: text first, and the picture in what is left."""

    def __init__(self, it: Shown) -> None:
        self._words = it.words
        self._drawn = it.plan.denominator is not None and it.options.arrangement != "bars"
        self._persons = it.options.icons == "person" and it.plan.denominator == 100  # larger crowds are marks
        self._range = it.options.uncertainty
        self._picture = PlainPicture(it)
        self._key_first = PlainPicture(it, key_first=True)

    def fitted(self, width: float, height: float, zoom: float = 1.0, usual_height: float = 0) -> Fit:
        """How the page stands in its room, and in the higher one that it has at 100% text.

        At larger text people are no smaller than they are then, and one scrolls instead.
        """
        style = self.style(width, height, zoom)
        wide = self._wide(style, width)
        text, picture = self._text_height(style, wide), self._picture.least_height(style, wide)
        if zoom > 1:
            people = self._people_height(width, max(height, usual_height))
            picture = max(picture, self._picture.height_with(style, wide, people))
        if text + picture <= height:
            return Fit(style, height, False)
        return Fit(style, text + picture + style.px(BELOW_HEADLINE), True)

    def _people_height(self, width: float, height: float) -> float:
        """How much of the page its people take at 100% text."""
        style = self.style(width, height)
        wide = self._wide(style, width)
        room = max(height - self._text_height(style, wide), self._picture.least_height(style, wide))
        return self._picture.people_height(style, wide, room)

    def style(self, width: float, height: float, zoom: float = 1.0) -> PaperStyle:
        """The largest text that fits the room, never smaller than the window's own at the reader's text size.

        Where even that does not fit, the page is taller than the room.
        """
        least = LEAST_AT_ONE * zoom
        wanted = min(AT_THAT_SIZE * min(width / DESIGNED_FOR[0], height / DESIGNED_FOR[1]) * max(zoom, 1.0), LARGEST)
        scales = dict.fromkeys(max(wanted * (1 - step * STEP), least) for step in range(STEPS))
        styles = [PaperStyle(scale, SCREEN_SIZES) for scale in scales]
        none_fits = zoom > 1 and not self._fits(styles[-1], width, height)  # mostly so at large text
        first = None
        for at, style in enumerate(() if none_fits else styles):
            if self._fits(style, width, height):
                if not self._picture.counts_wrap(style, self._wide(style, width)):
                    return style
                first = first or style
            if first and at * STEP >= WORTH_A_LINE:
                break
        return first or PaperStyle(least, SCREEN_SIZES)

    def _fits(self, style: PaperStyle, width: float, height: float) -> bool:
        """Whether words and people of a good size have room."""
        wide = self._wide(style, width)
        left = height - self._text_height(style, wide)
        return left > 0 and self._picture.good_height(style, wide) <= left

    def least_height(self, style: PaperStyle, width: float) -> float:
        """Height below which nothing would be left of the picture."""
        wide = self._wide(style, width)
        return self._text_height(style, wide) + self._picture.least_height(style, wide)

    def _wide(self, style: PaperStyle, width: float) -> float:
        return width - 2 * style.px(MARGIN)

    def draw(
        self, painter: QPainter, style: PaperStyle, width: float, height: float, headline_first: bool = False
    ) -> None:
        """Draw the page in ``height``, which is at least ``least_height``.

        ``headline_first`` says the difference before the pictures, and their key before their people: what matters most
        is then seen before one scrolls.
        """
        painter.fillRect(QRectF(0, 0, width, height), QColor(style.palette.page))
        x, y, wide = style.px(MARGIN), float(style.px(20)), self._wide(style, width)
        above, below = self._above(style, wide), self._below(style, wide)
        picture, room = self._picture, height - self._text_height(style, wide)
        if headline_first:
            headline, below = below[: self._headlines(style, wide)], below[self._headlines(style, wide) :]
            above = [*above, *headline[:-1], (headline[-1][0], headline[-1][1] + style.px(BELOW_HEADLINE))]
            picture, room = self._key_first, room - style.px(BELOW_HEADLINE)
        room = max(room, picture.least_height(style, wide))
        for runs, gap in above:
            y += draw_paragraph(painter, x, y, wide, runs) + gap
        y += picture.draw(painter, style, x, y, wide, room) + style.px(14)
        for runs, gap in below:
            y += draw_paragraph(painter, x, y, wide, runs) + gap

    def _text_height(self, style: PaperStyle, wide: float) -> float:
        paragraphs = (*self._above(style, wide), *self._below(style, wide))
        return sum(paragraph_height(runs, wide) + gap for runs, gap in paragraphs) + style.px(20 + 14)

    def _headline(self, style: PaperStyle, wide: float) -> list[Sequence[Run]]:
        """The difference, what the study leaves open of it, and that it is not what rounded counts make."""
        words, ink, sentence = self._words, style.palette.ink, style.font("sentence")
        said = beside_or_below([Run(words.summary, sentence, ink), Run(words.open_, sentence, ink)], wide)
        rounded = [Run(words.rounded, style.font("body"), style.palette.muted)]
        return [*said, rounded] if words.rounded else said

    def _headlines(self, style: PaperStyle, wide: float) -> int:
        """How many paragraphs that is."""
        return len(self._headline(style, wide))

    def _above(self, style: PaperStyle, wide: float) -> list[Spaced]:
        words, ink, muted, body = self._words, style.palette.ink, style.palette.muted, style.font("body")
        each = plain_texts.EACH_FIGURE if self._persons else plain_texts.EACH_MARK
        lead = [Run(each if self._drawn else "", body, muted), Run(words.lead, body, muted)]
        turned = Run(words.turned if self._drawn else "", body, ink)
        below = [lead] if not turned.text else [[*lead, turned]]
        if turned.text and not on_one_line(below[0], wide):
            below = [lead, [turned]]
        return [
            ([Run(words.title, style.font("estimate"), ink)], style.px(3)),
            *((runs, 0.0) for runs in below[:-1]),
            (below[-1], style.px(14)),
        ]

    def _below(self, style: PaperStyle, wide: float) -> list[Spaced]:
        """The difference with what makes it doubtful, which must not be missed; how sure one can be of it."""
        words, ink, muted, body = self._words, style.palette.ink, style.palette.muted, style.font("body")
        said = [
            *self._headline(style, wide),
            [Run(words.doubt, style.sized(DOUBT), ink)],
            [Run(words.which, body, ink), Run(words.certainty, body, ink), Run(words.study, body, muted)],
        ]
        spoken = [runs for runs in said if any(run.text for run in runs)]
        return [*((runs, style.px(3)) for runs in spoken[:-1]), (spoken[-1], style.px(8))]
