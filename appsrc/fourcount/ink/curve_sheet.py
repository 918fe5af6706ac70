"""The sheet that a curve is drawn on, what it is drawn with, and texts in lines that fit."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Literal, NamedTuple, Protocol

from fourcount.ink.palette import Palette
from fourcount.picture.places import Box, Value

Dash = tuple[float, ...]
Shape = Literal["square", "round"]

MORE = "…"
BODY, SMALL, STRONG, FOOT = 13.0, 12.0, 15.0, 10.5
LINE = 1.3  # the height of a line of text, of its size
GAP = 8.0
MARGIN, PAGE_MARGIN = 6.0, 28.0
LEAST = (360.0, 240.0)
"""Width and height at 100% text below which a sheet does not go."""

TALL = 400.0  # from this height on, the words at the axes may have three lines
NAMES_SHARE = 0.34  # of the width, at most, for the names at the ends of the lines
BAND = 0.15  # the strength of its colour


class Marks(NamedTuple):
    """An axis: where it begins and ends, and its marks with their words."""

    low: float
    high: float
    values: tuple[float, ...]
    words: tuple[str, ...]


class Sheet(NamedTuple):
    """What is drawn on: its size in pixels, the size of text, device pixels a pixel, and the font.

    ``foot`` is what has to travel with a drawing that leaves the window; it then has its heading and sentences too,
    beyond the height that is given.
    """

    width: float
    height: float
    zoom: float = 1.0
    ratio: float = 1.0
    family: str = ""
    foot: tuple[str, ...] = ()


class Pen(Protocol):
    """What is drawn with."""

    def width(self, text: str, size: float, strong: bool = False) -> float: ...
    def text(
        self, x: float, y: float, text: str, size: float, colour: str, strong: bool = False, right: bool = False,
        ground: str = "",
    ) -> None: ...  # fmt: skip
    def stroke(self, points: Sequence[Value], colour: str, width: float) -> None: ...
    def set_axes(
        self, box: Box, across: Marks, up: Marks, logarithmic: bool, size: float, colours: Palette
    ) -> None: ...
    def where(self, x: float, y: float) -> Value: ...
    def line(self, points: Sequence[Value], colour: str, width: float, dash: Dash = ()) -> None: ...
    def area(self, rows: Sequence[tuple[float, float, float]], colour: str, strength: float) -> None: ...
    def point(self, x: float, y: float, shape: Shape, size: float, fill: str, edge: str) -> None: ...


def wrapped(
    pen: Pen, text: str, size: float, room: float, *, strong: bool = False, most: int | None = None
) -> list[str]:
    """A text in lines that fit, ``most`` of them; what has no room is cut, with a sign of it."""
    lines: list[str] = []
    for whole in text.split():
        longer = f"{lines[-1]} {whole}" if lines else whole
        if lines and pen.width(longer, size, strong) <= room:
            lines[-1] = longer
        elif len(lines) == most:
            lines[-1] = _shortened(pen, f"{lines[-1]} {MORE}", size, room, strong)
            break
        else:
            lines.append(_shortened(pen, whole, size, room, strong))
    return lines


def _shortened(pen: Pen, text: str, size: float, room: float, strong: bool) -> str:
    """A text on one line, cut as often as it takes."""
    while len(text) > 2 and pen.width(text, size, strong) > room:
        text = f"{text[: min(len(text) - 2, int(len(text) * 0.9))].rstrip(MORE)}{MORE}"
    return text
