"""The picture of a relative figure: both risks among all people, beside the same two as shares of the larger."""

from __future__ import annotations

from PySide6.QtCore import QRectF
from PySide6.QtGui import QPainter

from fourcount.ink.arrays import draw_bar
from fourcount.ink.sheet import Sheet
from fourcount.ink.style import Style
from fourcount.ink.typeset import RIGHT, text_height, text_width
from fourcount.picture.bar_pair import Bar
from fourcount.picture.relative import RelativePlan
from fourcount.wording.relative_words import Panel, RelativeWords

SIDE_BY_SIDE_FROM = 480
"""Below this width (at 100% text) what the figure sounds like stands under what it is in people."""

GAP = 28
BAR = 14


class RelativePicture:
    """It stands after the absolute picture, never alone: in people first, then as it sounds."""

    def __init__(self, plan: RelativePlan, words: RelativeWords) -> None:
        self.plan = plan
        self.words = words

    def __eq__(self, other: object) -> bool:
        """Whether both would be drawn alike."""
        if not isinstance(other, RelativePicture):
            return NotImplemented
        return (self.plan, self.words) == (other.plan, other.words)

    def __hash__(self) -> int:
        return hash((self.plan, self.words))

    def height(self, style: Style, width: float) -> int:
        """Height of the picture at ``width``, in logical pixels."""
        return round(self._run(Sheet(None, style), 0, 0, width))

    def draw(self, painter: QPainter, style: Style, x: float, y: float, width: float) -> float:
        """Draw the picture with its top left corner at (x, y) and give the height it took."""
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        return self._run(Sheet(painter, style), x, y, width)

    def _run(self, sheet: Sheet, x: float, y: float, width: float) -> float:
        px = sheet.style.px
        panels = ((self.words.people, self.plan.people), (self.words.sounds, self.plan.sounds))
        if width < px(SIDE_BY_SIDE_FROM):
            top = y
            for words, lengths in panels:
                y += px(16) if y > top else 0
                y += self._panel(sheet, x, y, width, words, lengths, self._heights(sheet, width, words))
            return y - top
        each = (width - px(GAP)) / 2
        heights = self._heights(sheet, each, *(words for words, _ in panels))
        return max(
            self._panel(sheet, x + i * (each + px(GAP)), y, each, words, lengths, heights)
            for i, (words, lengths) in enumerate(panels)
        )

    def _heights(self, sheet: Sheet, width: float, *panels: Panel) -> tuple[float, float, float]:
        """Heights of title and of both lines over the bars, the same for all ``panels``."""
        strong = sheet.style.font("strong")
        bare = sheet.measured()
        lines = [[self._line(bare, 0, 0, width, panel, i) for panel in panels] for i in (0, 1)]
        return max(text_height(panel.title, strong, width) for panel in panels), max(lines[0]), max(lines[1])

    def _panel(
        self,
        sheet: Sheet,
        x: float,
        y: float,
        width: float,
        words: Panel,
        lengths: tuple[float, float],
        heights: tuple[float, float, float],
    ) -> float:
        top, px = y, sheet.style.px
        sheet.text(x, y, width, words.title, "strong")
        y += heights[0] + px(8)
        for i, length in enumerate(lengths):
            self._line(sheet, x, y, width, words, i)
            y += heights[i + 1] + px(3)
            if sheet.painter:
                draw_bar(sheet.painter, QRectF(x, y, width, px(BAR)), Bar(length=length), sheet.style.palette)
            y += px(BAR) + (px(8) if i == 0 else px(3))
        return y + self._ends(sheet, x, y, width, words.ends) - top

    def _line(self, sheet: Sheet, x: float, y: float, width: float, words: Panel, i: int) -> float:
        """What stands over a bar: its group, and its value at the right, or below where both do not fit."""
        style, label, value = sheet.style, words.labels[i], words.values[i]
        room = width - (text_width(value, style.font("strong")) + style.px(12) if value else 0)
        if text_width(label, style.font("body")) <= room:
            sheet.text(x, y, room, label, "body", "muted")
            return max(
                sheet.text(x, y, width, value, "strong", "ink", RIGHT), text_height(label, style.font("body"), width)
            )
        tall = sheet.text(x, y, width, label, "body", "muted")
        return tall + sheet.text(x, y + tall, width, value, "strong")

    def _ends(self, sheet: Sheet, x: float, y: float, width: float, ends: tuple[str, str]) -> float:
        low, high = ends
        sheet.text(x, y, width, low, "small", "muted")
        left = text_width(low, sheet.style.font("small")) + sheet.style.px(8)
        return sheet.text(x + left, y, width - left, high, "small", "muted", RIGHT)
