"""A hundred people a group with their captions beside them, for a page that holds several outcomes."""

from __future__ import annotations

from dataclasses import dataclass

from PySide6.QtCore import QPointF
from PySide6.QtGui import QPainter

from fourcount.ink.arrays import draw_array
from fourcount.ink.paper_style import PaperStyle
from fourcount.ink.paragraph import draw_paragraph, paragraph_height
from fourcount.ink.picture import WIDEST_ICON
from fourcount.ink.picture_key import set_key
from fourcount.ink.plain_picture import Shown, captions, picture_words
from fourcount.ink.shapes import TALL
from fourcount.ink.sheet import Sheet
from fourcount.picture.grid import GAP as GAP_OF_TENS
from fourcount.picture.grid import GRIDS, Laid
from fourcount.picture.options import Icons
from fourcount.picture.plan import states_drawn
from fourcount.wording.picture_words import KeyEntry

LEAST_PERSON = 7.2
"""Narrower than this, 2 mm high on paper, a person's outline runs together; blocks are drawn then."""

ROWS_APART: dict[Icons, float] = {"person": 0.14, "block": 0.0, "dot": 0.0}
"""The space between rows, in icon widths: without it feet would touch the heads below."""

LEAST_ACROSS = 1.1
"""How wide the cell of a person is where there is room for it, by the person."""

GAP, CAPTION_GAP = 18, 10
CAPTION, WIDE_CAPTION = 104, 132
"""How wide a caption is at least, at 100%, and before columns of people are moved apart."""

IN_BOTH = ("affected", "others")
"""The states that stand in both arrays; what makes the difference stands in the second alone."""


@dataclass(frozen=True, kw_only=True, slots=True)
class SpacedRows(Laid):
    """A hundred icons as large as their room, to a fraction of a pixel, with space between their rows."""

    apart: float

    def y(self, row: int) -> float:
        """Top edge of a row."""
        return row * (self.down + self.apart) + self.gap * (row // self.grid.down)


class BesidePicture:
    """Two arrays of a hundred, each with its name and counts on its right.

    The key stands below both, or, where captions are wide, ``key_aside`` under them.
    """

    def __init__(self, it: Shown) -> None:
        self._it = it
        self._words = picture_words(it)
        seen = states_drawn(it.plan, "two")
        self._key = tuple(entry for entry in self._words.key if entry.state in seen)

    def draw(
        self,
        painter: QPainter | None,
        style: PaperStyle,
        corner: QPointF,
        width: float,
        array: float,
        key_aside: bool,
    ) -> float:
        """Draw it with its top left corner at ``corner`` and give the height it took; without a painter measure it."""
        x, y, each = corner.x(), corner.y(), (width - style.px(GAP)) / 2
        laid, icons = self._laid(style, each, array)
        left, tall = laid.width + style.px(CAPTION_GAP), laid.height
        sheet, plan = Sheet(painter, style), self._it.plan
        said = captions(style, (self._it.words.without, self._it.words.with_), each - left)
        lines = [max(paragraph_height(runs, each - left) for runs in pair) for pair in zip(*said, strict=True)]
        for column, (caption, people) in enumerate(zip(said, (plan.without, plan.with_), strict=True)):
            at, down = x + column * (each + style.px(GAP)), 0.0
            if painter:
                draw_array(painter, QPointF(at, y), people, laid, style.palette, icons)
            for runs, line in zip(caption, lines, strict=True):
                if painter:
                    draw_paragraph(painter, at + left, y + down, each - left, runs)
                down += line + style.px(2)
            if key_aside:
                down += style.px(6)
                down += set_key(sheet, at + left, y + down, each - left, self._entries(column), icons, laid)
            tall = max(tall, down)
        y += tall
        if not key_aside:
            y += style.px(8) + set_key(sheet, x, y + style.px(8), width, self._key, icons, laid)
        if self._words.note:
            y += style.px(4) + sheet.text(x, y + style.px(4), width, self._words.note, "small", "muted")
        return y - corner.y()

    def drawn_as(self, style: PaperStyle, width: float, array: float) -> Icons:
        """What its people are drawn as."""
        return self._laid(style, (width - style.px(GAP)) / 2, array)[1]

    def _entries(self, column: int) -> tuple[KeyEntry, ...]:
        """The part of the key that stands beside an array."""
        return tuple(entry for entry in self._key if (entry.state in IN_BOTH) == (column == 0))

    def _laid(self, style: PaperStyle, each: float, array: float) -> tuple[Laid, Icons]:
        """The largest array that is no higher than asked for and leaves its caption room."""
        room, most = each - style.px(CAPTION + CAPTION_GAP), style.px(WIDEST_ICON[100])
        icons = self._it.options.icons
        spare = each - style.px(WIDE_CAPTION + CAPTION_GAP)
        laid = _largest(icons, most, room, spare, array)
        if icons == "person" and laid.down < LEAST_PERSON * TALL[icons]:
            return _largest("block", most, room, spare, array), "block"
        return laid, icons


def _largest(icons: Icons, most: float, room: float, spare: float, array: float) -> SpacedRows:
    """Icons as large as ``room`` lets them be; those higher than wide stand as far apart to the side as ``spare``."""
    grid, tall, apart = GRIDS[100], TALL[icons], ROWS_APART[icons]
    high = grid.rows * tall + (grid.rows - 1) * apart + grid.gaps_down * GAP_OF_TENS
    wide = grid.columns + grid.gaps_across * GAP_OF_TENS
    icon = min(most, array / high, room / wide)
    gap = GAP_OF_TENS * icon
    gaps = grid.gaps_across * gap
    least = min((room - gaps) / grid.columns, icon * min(LEAST_ACROSS, tall))
    across = max(least, min((spare - gaps) / grid.columns, icon * tall))
    return SpacedRows(grid=grid, across=across, down=icon * tall, gap=gap, apart=apart * icon)
