"""What painting needs to know of how things look: colours, fonts by role, and the size of text."""

from __future__ import annotations

from typing import Protocol

from PySide6.QtGui import QFont

from fourcount.ink.palette import PAPER, Palette


class Style(Protocol):
    """Colours, fonts and lengths; the window's look is one, paper another."""

    palette: Palette

    def font(self, role: str, /) -> QFont:
        """The font of a role ("body", "small", "strong", "figure")."""

    def px(self, pixels: float, /) -> int:
        """A length that grows with the text."""


class OnPaper:
    """Another style's fonts at its size, dark on white whatever the window looks like."""

    palette = PAPER

    def __init__(self, style: Style) -> None:
        self.font = style.font
        self.px = style.px
