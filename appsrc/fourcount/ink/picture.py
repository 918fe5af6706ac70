"""The picture for one patient: arrays or bars with their captions, key and note, drawn at any width."""

from __future__ import annotations

from PySide6.QtCore import QPointF, QRectF
from PySide6.QtGui import QPainter

from fourcount.ink.arrays import draw_array, draw_bar, lay_array
from fourcount.ink.picture_image import as_image
from fourcount.ink.picture_key import set_key
from fourcount.ink.sheet import Sheet
from fourcount.ink.style import Style
from fourcount.ink.typeset import RIGHT
from fourcount.picture.bar_pair import bar_pair
from fourcount.picture.grid import Laid
from fourcount.picture.one_array import one_array
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.picture.plan import Array, Plan, states_drawn
from fourcount.wording.picture_words import KeyEntry, PictureWords, Side

__all__ = ["KeyEntry", "Picture", "PictureWords", "Side", "as_image"]

SIDE_BY_SIDE_FROM = {100: 280, 1_000: 548, 10_000: 588}
"""Below this width (at 100% text) the two groups stand one under the other, by the denominator."""

WIDEST_ICON = {100: 26, 1_000: 12, 10_000: 6}
"""In pixels at 100% text: larger icons would only move what belongs together apart."""

GAP = 28
"""Room between two groups side by side, at 100% text."""

BAR = 18
"""How thick a bar is, at 100% text."""


class Picture:
    """A plan with its words, laid out for a style. The same drawing serves window, page and copied picture.

    ``within`` is a height that the picture is to keep to where it can: its icons are made smaller.
    """

    def __init__(self, plan: Plan, words: PictureWords, options: PictureOptions = USUAL) -> None:
        self.plan = plan
        self.words = words
        self.options = options if plan.denominator else options._replace(arrangement="bars")
        self.bars = self.options.arrangement == "bars"

    def __eq__(self, other: object) -> bool:
        """Whether both would be drawn alike."""
        if not isinstance(other, Picture):
            return NotImplemented
        return (self.plan, self.words, self.options) == (other.plan, other.words, other.options)

    def __hash__(self) -> int:
        return hash((self.plan, self.words, self.options))

    @property
    def key(self) -> tuple[KeyEntry, ...]:
        """The entries of the key whose states are there to be seen."""
        seen = states_drawn(self.plan, self.options.arrangement)
        return tuple(entry for entry in self.words.key if entry.state in seen)

    def height(self, style: Style, width: float, within: float | None = None) -> int:
        """Height of the picture at ``width``, in logical pixels."""
        return round(self._run(Sheet(None, style), 0, 0, width, self._widest_icon(style, width, within)))

    def draw(
        self, painter: QPainter, style: Style, x: float, y: float, width: float, within: float | None = None
    ) -> float:
        """Draw the picture with its top left corner at (x, y) and give the height it took."""
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        return self._run(Sheet(painter, style), x, y, width, self._widest_icon(style, width, within))

    def columns(self, style: Style, width: float) -> tuple[tuple[float, float], ...]:
        """Left edge and width of each array's column, from the picture's own left edge."""
        if self.options.arrangement != "two":
            return ((0.0, width),)
        if self._stacked(style, width):
            return ((0.0, width), (0.0, width))
        each = (width - style.px(GAP)) / 2
        return ((0.0, each), (each + style.px(GAP), each))

    def _widest_icon(self, style: Style, width: float, within: float | None) -> int:
        """How wide an icon may be: as wide as the height allows, in whole pixels."""
        widest = style.px(WIDEST_ICON[self.plan.denominator or 100])
        if within is None or self.bars:
            return widest
        fits, least = 1, 1
        while least <= widest:
            middle = (least + widest) // 2
            if self._run(Sheet(None, style), 0, 0, width, middle) <= within:
                fits, least = middle, middle + 1
            else:
                widest = middle - 1
        return fits

    def _run(self, sheet: Sheet, x: float, y: float, width: float, most: float) -> float:
        """Walk down the picture; without a painter only measure."""
        top, px = y, sheet.style.px
        arrange = {"two": self._two, "one": self._one, "bars": self._bars}[self.options.arrangement]
        y += arrange(sheet, x, y, width, most)
        if self.key:
            y += px(12)
            laid = self._laid(sheet.style, width, most)
            y += set_key(sheet, x, y, width, self.key, self.options.icons, laid)
        if self.words.note:
            y += px(8)
            y += sheet.text(x, y, width, self.words.note, "small", "muted")
        return y - top

    def _laid(self, style: Style, width: float, most: float) -> Laid:
        each = self.columns(style, width)[0][1]
        return lay_array(self.plan.denominator or 100, each, most, self.options.icons)

    def _stacked(self, style: Style, width: float) -> bool:
        return width < style.px(SIDE_BY_SIDE_FROM[self.plan.denominator or 100])

    def _two(self, sheet: Sheet, x: float, y: float, width: float, most: float) -> float:
        """One array a group, side by side, or the second below the first."""
        laid = self._laid(sheet.style, width, most)
        groups = ((self.words.without, self.plan.without), (self.words.with_, self.plan.with_))
        columns = self.columns(sheet.style, width)
        if self._stacked(sheet.style, width):
            top = y
            for side, array in groups:
                y += sheet.style.px(20) if y > top else 0
                y += self._group(sheet, x, y, width, side, array, laid, self._heads(sheet, width, side))
            return y - top
        heads = self._heads(sheet, columns[0][1], *(side for side, _ in groups))
        return max(
            self._group(sheet, x + left, y, each, side, array, laid, heads)
            for (left, each), (side, array) in zip(columns, groups, strict=True)
        )

    def _group(
        self,
        sheet: Sheet,
        x: float,
        y: float,
        width: float,
        side: Side,
        array: Array,
        laid: Laid,
        heads: tuple[float, float],
    ) -> float:
        top, px = y, sheet.style.px
        if self.options.captions:
            sheet.text(x, y + heads[0] - sheet.title_height(side, width), width, side.title, "strong")
            y += heads[0] + px(4)
            sheet.count(x, y, width, side)
            y += heads[1] + px(8)
        self._array(sheet, x, y, array, laid)
        y += laid.height
        if self.options.captions:
            y += px(6)
            y += sheet.text(x, y, width, side.other, "body", "muted")
        return y - top

    def _one(self, sheet: Sheet, x: float, y: float, width: float, most: float) -> float:
        """Both groups' captions above one array with all three states."""
        top, px = y, sheet.style.px
        if self.options.captions:
            y += self._both_captions(sheet, x, y, width) + px(12)
        laid = self._laid(sheet.style, width, most)
        self._array(sheet, x, y, one_array(self.plan), laid)
        return y + laid.height - top

    def _both_captions(self, sheet: Sheet, x: float, y: float, width: float) -> float:
        sides, px = (self.words.without, self.words.with_), sheet.style.px
        if width < px(SIDE_BY_SIDE_FROM[100]):
            first = self._caption(sheet, x, y, width, sides[0], self._heads(sheet, width, sides[0])) + px(12)
            heads = self._heads(sheet, width, sides[1])
            return first + self._caption(sheet, x, y + first, width, sides[1], heads)
        each = (width - px(GAP)) / 2
        heads = self._heads(sheet, each, *sides)
        return max(self._caption(sheet, x + i * (each + px(GAP)), y, each, side, heads) for i, side in enumerate(sides))

    def _bars(self, sheet: Sheet, x: float, y: float, width: float, most: float) -> float:
        """Both bars from one line, one under the other, so that their ends can be compared."""
        top, px = y, sheet.style.px
        pair = bar_pair(self.plan)
        for side, bar in ((self.words.without, pair.without), (self.words.with_, pair.with_)):
            y += px(14) if y > top else 0
            if self.options.captions:
                y += self._caption(sheet, x, y, width, side, self._heads(sheet, width, side)) + px(6)
            if sheet.painter:
                draw_bar(sheet.painter, QRectF(x, y, width, px(BAR)), bar, sheet.style.palette)
            y += px(BAR)
        low, high = self.words.bar_ends
        y += px(4)
        sheet.text(x, y, width, low, "small", "muted")
        y += sheet.text(x, y, width, high, "small", "muted", RIGHT)
        return y - top

    def _heads(self, sheet: Sheet, width: float, *sides: Side) -> tuple[float, float]:
        """Heights of title and count, the same for all ``sides``, so that what follows begins on one line."""
        bare = sheet.measured()
        return max(bare.title_height(side, width) for side in sides), max(
            bare.count(0, 0, width, side) for side in sides
        )

    def _caption(self, sheet: Sheet, x: float, y: float, width: float, side: Side, heads: tuple[float, float]) -> float:
        """Title, count and the other frame, one under the other."""
        top, px = y, sheet.style.px
        sheet.text(x, y + heads[0] - sheet.title_height(side, width), width, side.title, "strong")
        y += heads[0] + px(4)
        sheet.count(x, y, width, side)
        y += heads[1] + px(2)
        return y + sheet.text(x, y, width, side.other, "body", "muted") - top

    def _array(self, sheet: Sheet, x: float, y: float, array: Array, laid: Laid) -> None:
        if sheet.painter:
            draw_array(sheet.painter, QPointF(x, y), array, laid, sheet.style.palette, self.options.icons)
