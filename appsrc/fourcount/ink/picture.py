"""The picture for one patient: two icon arrays with their captions and key, drawn at any width."""

from __future__ import annotations

from PySide6.QtCore import QRectF, QSize, Qt
from PySide6.QtGui import QImage, QPainter

from fourcount.ink.arrays import array_height, draw_array, draw_bar
from fourcount.ink.people import draw_icon
from fourcount.ink.style import OnPaper, Role, Style
from fourcount.ink.typeset import RIGHT, draw_text, text_height, text_width
from fourcount.picture.grid import GRIDS
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.picture.plan import Array, Plan
from fourcount.picture.scales import risk_scale
from fourcount.wording.picture_words import KeyEntry, PictureWords, Side

__all__ = ["KeyEntry", "Picture", "PictureWords", "Side", "as_image"]

SIDE_BY_SIDE_FROM = 280
"""Below this width (at 100% text) the two groups stand one under the other."""

GAP = 28
"""Room between two groups side by side, at 100% text."""


class Picture:
    """A plan with its words, laid out for a style. The same drawing serves the window and the copied picture."""

    def __init__(
        self, plan: Plan, words: PictureWords, options: PictureOptions | bool = USUAL, bars: bool = False
    ) -> None:
        asked = USUAL if isinstance(options, bool) else options
        as_bars = bars or options is True or plan.denominator is None
        self.plan = plan
        self.words = words
        self.options = asked._replace(arrangement="bars") if as_bars else asked
        self.bars = self.options.arrangement == "bars"

    def __eq__(self, other: object) -> bool:
        """Whether both would be drawn alike."""
        if not isinstance(other, Picture):
            return NotImplemented
        return (self.plan, self.words, self.options) == (other.plan, other.words, other.options)

    def __hash__(self) -> int:
        return hash((self.plan, self.words, self.options))

    def height(self, style: Style, width: float) -> int:
        """Height of the picture at ``width``, both in logical pixels."""
        return round(self._run(None, style, 0, 0, width))

    def draw(self, painter: QPainter, style: Style, x: float, y: float, width: float) -> float:
        """Draw the picture with its top left corner at (x, y) and give the height it took."""
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        painter.setRenderHint(QPainter.RenderHint.SmoothPixmapTransform)
        return self._run(painter, style, x, y, width)

    def _run(self, painter: QPainter | None, style: Style, x: float, y: float, width: float) -> float:
        """Walk down the picture; without a painter only measure."""
        top = y
        y += self._draw_sides(painter, style, x, y, width)
        y += style.px(10) + self._draw_key(painter, style, x, y + style.px(10), width)
        if self.words.note:
            y += style.px(6)
            y += self._text(painter, style, x, y, width, self.words.note, "small", style.palette.muted)
        return y - top

    def _draw_sides(self, painter: QPainter | None, style: Style, x: float, y: float, width: float) -> float:
        pairs = ((self.words.without, self.plan.without), (self.words.with_, self.plan.with_))
        if self._stacked(style, width):
            top = y
            for side, array in pairs:
                heights = self._caption_heights(style, side, width)
                y += self._draw_side(painter, style, x, y, width, side, array, heights) + style.px(16)
            return y - top - style.px(16)
        gap = style.px(GAP)
        each = (width - gap) / 2
        measured = [self._caption_heights(style, side, each) for side, _ in pairs]
        heights = (max(m[0] for m in measured), max(m[1] for m in measured))
        return max(
            self._draw_side(painter, style, x + i * (each + gap), y, each, side, array, heights)
            for i, (side, array) in enumerate(pairs)
        )

    def _stacked(self, style: Style, width: float) -> bool:
        """Whether one group stands under the other: ten thousand icons need all the width there is."""
        tiny = self.plan.denominator == 10_000 and not self.bars
        return width < style.px(SIDE_BY_SIDE_FROM) or tiny

    def _icon_width(self, style: Style, width: float) -> float:
        """How wide one icon of the arrays is."""
        each = width if self._stacked(style, width) else (width - style.px(GAP)) / 2
        return each / GRIDS[self.plan.denominator or 100].width

    def _caption_heights(self, style: Style, side: Side, width: float) -> tuple[float, float]:
        """Heights of the title and of the count, so that both arrays can begin on one line."""
        count = text_height(side.number, style.font("figure"), width)
        if self._breaks(style, side, width):
            count += text_height(side.percent, style.font("body"), width)
        return text_height(side.title, style.font("strong"), width), count

    def _breaks(self, style: Style, side: Side, width: float) -> bool:
        """Whether count and percentage need more than one line."""
        one_line = text_width(side.number, style.font("figure")) + text_width(f"  {side.percent}", style.font("body"))
        return one_line > width

    def _draw_side(
        self,
        painter: QPainter | None,
        style: Style,
        x: float,
        y: float,
        width: float,
        side: Side,
        array: Array,
        heights: tuple[float, float],
    ) -> float:
        top, palette = y, style.palette
        self._text(painter, style, x, y, width, side.title, "strong", palette.ink)
        y += heights[0] + style.px(6)
        self._draw_count(painter, style, x, y, width, side)
        y += heights[1] + style.px(8)
        if self.bars:
            risk = self.plan.without_risk if side is self.words.without else self.plan.with_risk
            bar = style.px(18)
            if painter:
                scale = risk_scale((self.plan.without_risk, self.plan.with_risk))
                draw_bar(painter, QRectF(x, y, width, bar), risk, scale.high, palette)
            y += bar + style.px(2)
            y += self._draw_bar_ends(painter, style, x, y, width)
        else:
            denominator = self.plan.denominator or 100
            tall = array_height(denominator, width)
            if painter:
                draw_array(painter, QRectF(x, y, width, tall), array, denominator, palette)
            y += tall
        y += style.px(6)
        y += self._text(painter, style, x, y, width, side.other, "body", palette.muted)
        return y - top

    def _draw_bar_ends(self, painter: QPainter | None, style: Style, x: float, y: float, width: float) -> float:
        """Name both ends of a bar's scale, so that no bar is taken for the whole."""
        font, colour = style.font("small"), style.palette.muted
        if painter:
            draw_text(painter, x, y, width, self.words.bar_ends[0], font, colour)
            draw_text(painter, x, y, width, self.words.bar_ends[1], font, colour, RIGHT)
        return text_height(self.words.bar_ends[1], font, width)

    def _draw_count(self, painter: QPainter | None, style: Style, x: float, y: float, width: float, side: Side) -> None:
        """The count in large figures, the percentage after it on the same base line where both fit."""
        if painter is None:
            return
        figure, body = style.font("figure"), style.font("body")
        tall = draw_text(painter, x, y, width, side.number, figure, style.palette.ink)
        if self._breaks(style, side, width):
            draw_text(painter, x, y + tall, width, side.percent, body, style.palette.muted)
            return
        after = text_width(f"{side.number} ", figure)
        drop = tall - text_height(side.percent, body, width)
        lift = style.px(3)
        draw_text(painter, x + after, y + drop - lift, width - after, side.percent, body, style.palette.muted)

    def _draw_key(self, painter: QPainter | None, style: Style, x: float, y: float, width: float) -> float:
        if self.bars:
            return 0.0
        font, icon, top, left = style.font("small"), style.px(16), y, x
        line = max(float(icon), text_height("X", font, width))
        stands_for = self._icon_width(style, width)
        for entry in self.words.key:
            wide = icon + style.px(6) + text_width(entry.text, font) + 2
            if x > left and x + wide > left + width:
                x, y = left, y + line + style.px(4)
            room = min(wide, width) - icon - style.px(6)
            tall = max(line, text_height(entry.text, font, room))
            if painter:
                draw_icon(painter, QRectF(x, y, icon, icon), entry.state, style.palette, stands_for)
                draw_text(painter, x + icon + style.px(6), y, room, entry.text, font, style.palette.muted)
            if tall > line:
                y += tall - line
            x += wide + style.px(16)
        return y + line - top

    def _text(
        self,
        painter: QPainter | None,
        style: Style,
        x: float,
        y: float,
        width: float,
        text: str,
        role: Role,
        colour: str,
    ) -> float:
        font = style.font(role)
        if painter is None:
            return text_height(text, font, width)
        return draw_text(painter, x, y, width, text, font, colour)


def as_image(picture: Picture, style: Style, heading: str, cautions: str, width: int = 520, scale: int = 2) -> QImage:
    """The picture alone on white paper: its heading above it, the sentences and cautions that belong to it below."""
    paper = OnPaper(style)
    margin = paper.px(28)
    wide = paper.px(width) - 2 * margin
    heads: list[tuple[str, Role, str]] = [(heading, "strong", paper.palette.ink)]
    below: list[tuple[str, Role, str]] = [(line, "body", paper.palette.ink) for line in picture.words.lines]
    below.append((cautions, "small", paper.palette.muted))
    gap = paper.px(8)
    tall = sum(text_height(text, paper.font(role), wide) + gap for text, role, _ in (*heads, *below))
    height = round(tall + picture.height(paper, wide) + 2 * margin + 2 * gap)
    image = QImage(QSize(paper.px(width), height) * scale, QImage.Format.Format_RGB32)
    image.setDevicePixelRatio(scale)
    image.fill(Qt.GlobalColor.white)
    painter = QPainter(image)
    y = float(margin)
    y += draw_text(painter, margin, y, wide, heading, paper.font("strong"), paper.palette.ink) + gap
    y += picture.draw(painter, paper, margin, y, wide) + 2 * gap
    for text, role, colour in below:
        y += draw_text(painter, margin, y, wide, text, paper.font(role), colour) + gap
    painter.end()
    return image
