"""What painting needs to know of how things look: colours, fonts by role, and the size of text."""

from __future__ import annotations

from typing import Literal, Protocol

from PySide6.QtGui import QFont

from fourcount.ink.palette import PAPER, Palette

Role = Literal["body", "small", "head", "sentence", "cell", "estimate", "figure", "strong", "total"]
"""What a text is for; each part has a size and a weight of its own."""


class Style(Protocol):
    """Colours, fonts and lengths; the window's look is one, paper another."""

    palette: Palette

    def font(self, role: Role, /) -> QFont:
        """The font of a role."""

    def px(self, pixels: float, /) -> int:
        """A length that grows with the text."""


class OnPaper:
    """Another style's fonts at its size, dark on white whatever the window looks like."""

    palette = PAPER

    def __init__(self, style: Style) -> None:
        self.font = style.font
        self.px = style.px
