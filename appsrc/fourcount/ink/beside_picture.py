"""A hundred people a group with their captions beside them, for a page that holds several outcomes."""

from __future__ import annotations

from PySide6.QtCore import QPointF
from PySide6.QtGui import QPainter

from fourcount.ink.arrays import draw_array, lay_array
from fourcount.ink.paper_style import PaperStyle
from fourcount.ink.paragraph import draw_paragraph, paragraph_height
from fourcount.ink.picture import WIDEST_ICON
from fourcount.ink.picture_key import set_key
from fourcount.ink.plain_picture import Shown, caption, picture_words
from fourcount.ink.sheet import Sheet
from fourcount.picture.grid import Laid
from fourcount.picture.options import Icons
from fourcount.picture.plan import states_drawn

LEAST_ICON = 6
LEAST_PERSON = 8
"""Narrower than this, 2 mm on paper, a person's outline runs together; blocks are drawn then."""

GAP, CAPTION_GAP = 18, 10
CAPTION = 104
"""How wide a caption is at least, at 100%."""


class BesidePicture:
    """Two arrays of a hundred, each with its name and counts on its right; the key below both."""

    def __init__(self, it: Shown) -> None:
        self._it = it
        self._words = picture_words(it)
        seen = states_drawn(it.plan, "two")
        self._key = tuple(entry for entry in self._words.key if entry.state in seen)

    def height(self, style: PaperStyle, width: float, array: float) -> float:
        """Height at ``width`` with arrays of at most ``array``."""
        return self._run(None, style, 0, 0, width, array)

    def draw(self, painter: QPainter, style: PaperStyle, x: float, y: float, width: float, array: float) -> float:
        """Draw it with its top left corner at (x, y) and give the height it took."""
        return self._run(painter, style, x, y, width, array)

    def _run(
        self, painter: QPainter | None, style: PaperStyle, x: float, y: float, width: float, array: float
    ) -> float:
        top, each = y, (width - style.px(GAP)) / 2
        laid, icons = self._laid(style, each, array)
        left = laid.width + style.px(CAPTION_GAP)
        plan, tall = self._it.plan, laid.height
        groups = ((self._it.words.without, plan.without), (self._it.words.with_, plan.with_))
        for column, (side, people) in enumerate(groups):
            at = x + column * (each + style.px(GAP))
            if painter:
                draw_array(painter, QPointF(at, y), people, laid, style.palette, icons)
            down = 0.0
            for runs in caption(style, side):
                if painter:
                    draw_paragraph(painter, at + left, y + down, each - left, runs)
                down += paragraph_height(runs, each - left) + style.px(2)
            tall = max(tall, down)
        y += tall + style.px(8)
        sheet = Sheet(painter, style)
        y += set_key(sheet, x, y, width, self._key, icons, laid)
        if self._words.note:
            y += style.px(4) + sheet.text(x, y + style.px(4), width, self._words.note, "small", "muted")
        return y - top

    def drawn_as(self, style: PaperStyle, width: float, array: float) -> Icons:
        """What its people are drawn as."""
        return self._laid(style, (width - style.px(GAP)) / 2, array)[1]

    def _laid(self, style: PaperStyle, each: float, array: float) -> tuple[Laid, Icons]:
        """The largest array that is no higher than asked for and leaves its caption room."""
        room = each - style.px(CAPTION + CAPTION_GAP)
        icons = self._it.options.icons
        laid = _largest(icons, style.px(WIDEST_ICON[100]), room, array)
        if icons == "person" and laid.across < LEAST_PERSON:
            return _largest("block", style.px(WIDEST_ICON[100]), room, array), "block"
        return laid, icons


def _largest(icons: Icons, widest: int, room: float, array: float) -> Laid:
    for icon in range(widest, LEAST_ICON, -1):
        laid = lay_array(100, room, icon, icons)
        if laid.height <= array:
            return laid
    return lay_array(100, room, LEAST_ICON, icons)
