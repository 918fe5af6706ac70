"""Where the cells of the small table stand: columns as wide as their texts, an interval under its figure."""

from __future__ import annotations

from typing import TYPE_CHECKING, NamedTuple

from fourcount.face.look import Look
from fourcount.ink.typeset import text_height, text_width
from fourcount.wording.patient_labels import TABLE_HEADS

if TYPE_CHECKING:
    from fourcount.wording.patient_table import Row

GAP = 10
PAD = 5
"""Pixels at 100% text between two columns, and above and under a row."""

Texts = list[tuple[str, ...]]


class Line(NamedTuple):
    """A laid line: its top and bottom, and left edge, width and text of each cell."""

    top: float
    bottom: float
    cells: list[tuple[float, float, str]]


def shown_texts(rows: tuple[Row, ...], corner: str) -> Texts:
    """Every cell from top to bottom; of one starting risk, which stands in its field above, no row's name."""
    if not rows:
        return []
    every = [(corner, *TABLE_HEADS.values()), *map(_texts, rows)]
    return [texts[1:] for texts in every] if len(rows) == 1 else every


def lines_at(every: Texts, look: Look, width: int) -> list[Line]:
    """The heads and the rows with their cells at a width."""
    lines: list[Line] = []
    y = 0.0
    places = edges(every, look, width)
    for texts in every:
        laid = [(x, wide, text) for (x, wide), text in zip(places, texts, strict=True) if text]
        if len(laid) > 1 and not texts[-1]:  # a reason instead of figures
            x, _, reason = laid.pop()
            laid.append((x, width - x, reason))
        height = max(text_height(text, look.font("small"), wide) for _, wide, text in laid)
        lines.append(Line(y, y + height, laid))
        y += height + 2 * look.px(PAD)
    return lines


def edges(every: Texts, look: Look, width: int) -> list[tuple[float, float]]:
    """Left edge and width of each column: as wide as its widest text, and the rest shared out between them."""
    if not every:
        return []
    font, gap = look.font("small"), float(look.px(GAP))
    columns = zip(*(texts for texts in every if texts[-1]), strict=True)
    needed = [max(text_width(line, font) for text in column for line in text.split("\n")) + 1 for column in columns]
    free = width - sum(needed) - gap * (len(needed) - 1)
    wide = [each + free / len(needed) if free < 0 else each for each in needed]
    gap += max(free, 0) / (len(needed) - 1)
    return [(sum(wide[:place]) + gap * place, each) for place, each in enumerate(wide)]


def _texts(row: Row) -> tuple[str, str, str, str, str]:
    """A row's name and figures from left to right, an interval under its figure."""
    figures = (row.without, row.with_, row.difference, row.number_needed)
    without, with_, difference, needed = (text.replace(" (", "\n(", 1) for text in figures)
    return (row.label, without, with_, difference, needed)
