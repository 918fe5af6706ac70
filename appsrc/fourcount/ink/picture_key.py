"""The key of a picture: each state that is drawn, in the very shape in which it is drawn."""

from __future__ import annotations

from collections.abc import Iterable

from PySide6.QtCore import QRectF

from fourcount.ink.people import draw_icon
from fourcount.ink.shapes import TALL
from fourcount.ink.sheet import Sheet
from fourcount.ink.typeset import text_height, text_width
from fourcount.picture.grid import Laid
from fourcount.picture.options import Icons
from fourcount.wording.picture_words import KeyEntry

ICON = 16
"""How wide an icon of the key is, at 100% text."""


def set_key(
    sheet: Sheet, x: float, y: float, width: float, entries: Iterable[KeyEntry], icons: Icons, laid: Laid
) -> float:
    """Set the entries one after another, as many as fit on a line, and give the height; none take no room.

    Icons are those of the array as it is ``laid`` down.
    """
    style, font, left, top, bottom = sheet.style, sheet.style.font("small"), x, y, y
    icon, gap = style.px(ICON), style.px(6)
    specks = laid.grid.crowded
    tall = icon if specks else round(icon * TALL[icons])
    inset = style.px(2) if specks else 0
    line = text_height("X", font, width)
    for entry in entries:
        wide = min(icon + gap + text_width(entry.text, font) + 2, width)
        if x > left and x + wide > left + width:
            x, y = left, bottom + style.px(4)
        words = text_height(entry.text, font, wide - icon - gap)
        row = max(words, tall)
        if sheet.painter:
            cell = QRectF(x, y + (max(line, tall) - tall) / 2, icon, tall).adjusted(inset, inset, -inset, -inset)
            draw_icon(sheet.painter, cell, entry.state, style.palette, icons, laid.across, specks=specks)
        drop = max(0.0, (tall - line) / 2) if words <= line + 1 else 0.0
        sheet.text(x + icon + gap, y + drop, wide - icon - gap, entry.text, "small", "muted")
        bottom = max(bottom, y + row)
        x += wide + style.px(16)
    return bottom - top
