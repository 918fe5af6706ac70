"""The colours, in light and in dark, each with a pair of higher contrast, by the part they play."""

from __future__ import annotations

from typing import NamedTuple


class Palette(NamedTuple):
    """Colours as ``#RRGGBB``.

    ``ink`` and ``muted`` are text on ``page`` and on ``tint``; ``hairline`` only divides and carries no
    meaning; ``outline`` edges fields and icons; ``caution`` is the bar of a caution and the edge of a marked
    field; ``on_accent`` is text on ``accent``.
    """

    page: str
    ink: str
    muted: str
    hairline: str
    accent: str
    tint: str
    caution: str
    outline: str
    on_accent: str


LIGHT = Palette(
    page="#FBFAF7",
    ink="#1B2530",
    muted="#56616C",
    hairline="#D8D8D1",
    accent="#0B5C7A",
    tint="#E4EEF2",
    caution="#8A4B08",
    outline="#747B82",
    on_accent="#FFFFFF",
)

DARK = Palette(
    page="#171C21",
    ink="#E8EAEC",
    muted="#A3ADB7",
    hairline="#343C44",
    accent="#6FC0DC",
    tint="#20313A",
    caution="#E5A552",
    outline="#8B949D",
    on_accent="#171C21",
)

HIGH_LIGHT = Palette(
    page="#FFFFFF",
    ink="#000000",
    muted="#2B2B2B",
    hairline="#6B6B6B",
    accent="#003A56",
    tint="#DCEBF3",
    caution="#6B3300",
    outline="#333333",
    on_accent="#FFFFFF",
)

HIGH_DARK = Palette(
    page="#000000",
    ink="#FFFFFF",
    muted="#DADADA",
    hairline="#8C8C8C",
    accent="#8FDCF5",
    tint="#0F303D",
    caution="#FFC46B",
    outline="#C8C8C8",
    on_accent="#000000",
)
"""For those who need more than the usual contrast; hairlines can be seen there too."""

PAPER = LIGHT._replace(page="#FFFFFF", ink="#12181F")
"""For pictures that leave the window: always dark on white."""


def relative_luminance(colour: str) -> float:
    """Relative luminance of ``#RRGGBB``, 0 to 1 (WCAG 2.2, definition of relative luminance)."""
    channels = (int(colour[i : i + 2], 16) / 255 for i in (1, 3, 5))
    linear = [c / 12.92 if c <= 0.04045 else ((c + 0.055) / 1.055) ** 2.4 for c in channels]
    return 0.2126 * linear[0] + 0.7152 * linear[1] + 0.0722 * linear[2]


def contrast(one: str, other: str) -> float:
    """Contrast ratio of two colours, 1 to 21 (WCAG 2.2, definition of contrast ratio)."""
    lighter, darker = sorted((relative_luminance(one), relative_luminance(other)), reverse=True)
    return (lighter + 0.05) / (darker + 0.05)
