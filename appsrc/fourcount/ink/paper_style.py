"""Fonts and lengths of a page for patients: dark on white, text without hinting, so that every device sets it alike."""

from __future__ import annotations

from collections.abc import Mapping

from PySide6.QtGui import QFont, QGuiApplication

from fourcount.ink.palette import PAPER
from fourcount.ink.style import Role

SIZES: dict[Role, float] = {
    "body": 13,
    "small": 11.5,
    "head": 11,
    "sentence": 17,
    "cell": 15,
    "estimate": 15,
    "figure": 17,
    "strong": 13,
    "total": 15,
}
"""Text sizes of the printed page at 100%, in units of 1/96 inch."""

SCREEN_SIZES: dict[Role, float] = {
    "body": 14,
    "small": 12,
    "head": 12,
    "sentence": 19,
    "cell": 14,
    "estimate": 20,
    "figure": 21,
    "strong": 15,
    "total": 15,
}
"""The same where one outcome fills a screen and is read from across a desk."""

COMPACT_SIZES: dict[Role, float] = {**SIZES, "body": 12, "small": 11, "figure": 14, "strong": 12, "total": 14}
"""The printed page where it holds many outcomes."""

BOLD: tuple[Role, ...] = ("figure", "strong", "estimate", "sentence", "total")


class PaperStyle:
    """A style whose ``scale`` makes text and lengths larger alike."""

    palette = PAPER

    def __init__(self, scale: float = 1.0, sizes: Mapping[Role, float] = SIZES) -> None:
        self.scale = scale
        self._sizes = sizes
        self._fonts: dict[tuple[float, bool], QFont] = {}

    def px(self, pixels: float) -> int:
        """A length that grows with the text."""
        return round(pixels * self.scale)

    def font(self, role: Role) -> QFont:
        """The font of a role."""
        return self.sized(self._sizes[role], bold=role in BOLD)

    def sized(self, size: float, *, bold: bool = False) -> QFont:
        """The system's font in a size of its own, at 100%."""
        key = (size, bold)
        if key not in self._fonts:
            font = QFont(QGuiApplication.font())
            font.setPixelSize(max(round(size * self.scale), 1))
            font.setWeight(QFont.Weight.DemiBold if bold else QFont.Weight.Normal)
            font.setHintingPreference(QFont.HintingPreference.PreferNoHinting)
            font.setFeature(QFont.Tag("tnum"), 1)
            font.setFeature(QFont.Tag("liga"), 0)  # a search for "figure" finds no ligature
            self._fonts[key] = font
        return self._fonts[key]
