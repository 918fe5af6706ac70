"""Where a picture is set: a painter with a style, or a style alone to measure with."""

from __future__ import annotations

from dataclasses import dataclass

from PySide6.QtGui import QFontMetricsF, QPainter

from fourcount.ink.style import Role, Style
from fourcount.ink.typeset import LEFT, draw_text, text_height, text_width
from fourcount.wording.picture_words import Side


@dataclass(frozen=True, slots=True)
class Sheet:
    """Without a painter everything is measured and nothing is drawn, by the same steps."""

    painter: QPainter | None
    style: Style

    def text(
        self, x: float, y: float, width: float, text: str, role: Role, part: str = "ink", flags: int = LEFT
    ) -> float:
        """Set a text that wraps in a colour of the palette, and give its height."""
        font = self.style.font(role)
        if self.painter is None:
            return text_height(text, font, width)
        return draw_text(self.painter, x, y, width, text, font, getattr(self.style.palette, part), flags)

    def title_height(self, side: Side, width: float) -> float:
        """Height of a group's title."""
        return text_height(side.title, self.style.font("strong"), width)

    def count(self, x: float, y: float, width: float, side: Side) -> float:
        """Set the count in large figures, the percentage after it on one base line where both fit; give the height."""
        figure, body = self.style.font("figure"), self.style.font("body")
        tall = self.text(x, y, width, side.number, "figure")
        after = text_width(f"{side.number} ", figure)
        if after + text_width(side.percent, body) > width:
            return tall + self.text(x, y + tall, width, side.percent, "body", "muted")
        drop = QFontMetricsF(figure).ascent() - QFontMetricsF(body).ascent()
        self.text(x + after, y + drop, width - after, side.percent, "body", "muted")
        return tall

    def measured(self) -> Sheet:
        """The same sheet, to measure with."""
        return Sheet(None, self.style)
