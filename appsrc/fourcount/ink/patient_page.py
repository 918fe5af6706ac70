"""One outcome on a screen for the patient: a title, two groups of people, one sentence; dark on white."""

from __future__ import annotations

from collections.abc import Sequence

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

STEPS = 12
MARGIN = 45

Spaced = tuple[Sequence[Run], float]
"""A paragraph and the space below it."""


class PatientPage:
    """A page that fills the room it is given: text first, and the picture in what is left."""

    def __init__(self, it: Shown) -> None:
        self._words = it.words
        self._drawn = it.plan.denominator is not None and it.options.arrangement != "bars"
        self._persons = it.options.icons == "person" and it.plan.denominator == 100  # larger crowds are marks
        self._range = it.options.uncertainty
        self._picture = PlainPicture(it)

    def style(self, width: float, height: float, zoom: float = 1.0) -> PaperStyle:
        """The largest text that fits the room, never smaller than the window's own at the reader's text size.

        Where even that does not fit, the page is taller than the room.
        """
        least = LEAST_AT_ONE * zoom
        wanted = min(AT_THAT_SIZE * min(width / DESIGNED_FOR[0], height / DESIGNED_FOR[1]) * max(zoom, 1.0), LARGEST)
        first = None
        for step in range(STEPS):
            style = PaperStyle(max(wanted * (1 - step * 0.05), least), SCREEN_SIZES)
            wide = self._wide(style, width)
            if self._text_height(style, wide) + self._picture.good_height(style, wide) <= height:
                if not self._picture.counts_wrap(style, wide):
                    return style
                first = first or style
            if first and step * 0.05 >= WORTH_A_LINE:
                break
        return first or PaperStyle(least, SCREEN_SIZES)

    def least_height(self, style: PaperStyle, width: float) -> float:
        """Height below which nothing would be left of the picture."""
        wide = self._wide(style, width)
        return self._text_height(style, wide) + self._picture.least_height(style, wide)

    def _wide(self, style: PaperStyle, width: float) -> float:
        return width - 2 * style.px(MARGIN)

    def draw(self, painter: QPainter, style: PaperStyle, width: float, height: float) -> None:
        """Draw the page in ``height``, which is at least ``least_height``."""
        painter.fillRect(QRectF(0, 0, width, height), QColor(style.palette.page))
        x, y, wide = style.px(MARGIN), float(style.px(20)), self._wide(style, width)
        room = max(height - self._text_height(style, wide), self._picture.least_height(style, wide))
        for runs, gap in self._above(style, wide):
            y += draw_paragraph(painter, x, y, wide, runs) + gap
        y += self._picture.draw(painter, style, x, y, wide, room) + style.px(14)
        for runs, gap in self._below(style, wide):
            y += draw_paragraph(painter, x, y, wide, runs) + gap

    def _text_height(self, style: PaperStyle, wide: float) -> float:
        paragraphs = (*self._above(style, wide), *self._below(style, wide))
        return sum(paragraph_height(runs, wide) + gap for runs, gap in paragraphs) + style.px(20 + 14)

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
        sentence = style.font("sentence")
        said = [
            *beside_or_below([Run(words.summary, sentence, ink), Run(words.open_, sentence, ink)], wide),
            [Run(words.rounded, body, muted)],
            [Run(words.doubt, style.sized(DOUBT), ink)],
            [Run(words.which, body, ink), Run(words.certainty, body, ink), Run(words.study, body, muted)],
        ]
        spoken = [runs for runs in said if any(run.text for run in runs)]
        return [*((runs, style.px(3)) for runs in spoken[:-1]), (spoken[-1], style.px(8))]
