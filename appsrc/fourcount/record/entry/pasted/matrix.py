"""The body of a pasted block with what stands above and before it: labels, headings, results and sections."""

from __future__ import annotations

import re
from collections import Counter
from collections.abc import Sequence

import msgspec

from fourcount.record.entry.pasted.cells import Cell
from fourcount.record.entry.pasted.grid import Grid
from fourcount.record.entry.pasted.headings import is_sum, role_of
from fourcount.record.entry.pasted.result_text import add_result
from fourcount.record.entry.tokens import Token
from fourcount.record.entry.word_list import words

EMPTY = Cell()
_WORDS = re.compile(r"[^\s(]+(?: ?\([^()]*\))?")
_NUMBERED = frozenset(words("centre center site hospital clinic trial study stratum cluster group arm year ward"))
_CORNER = frozenset(words("outcome outcomes event events variable characteristic characteristics endpoint end-point"))


class Head(msgspec.Struct, frozen=True):
    """A heading or a label, with the total printed in it."""

    label: str = ""
    total: Token | None = None


class Matrix(msgspec.Struct, frozen=True, kw_only=True):
    """Rows of cells of equal length, the labels of rows and columns, and pieces of text that hold results."""

    rows: tuple[tuple[Cell, ...], ...]
    labels: tuple[Head, ...]
    heads: tuple[Head, ...]
    sections: tuple[tuple[str, int], ...] = ()
    results: tuple[str, ...] = ()
    corner: str = ""

    def turned(self) -> Matrix:
        """The same with rows as columns."""
        turned = tuple(zip(*self.rows, strict=True))
        return msgspec.structs.replace(self, rows=turned, labels=self.heads, heads=self.labels)

    def only(self, rows: Sequence[int], columns: Sequence[int] | None = None) -> Matrix:
        """The same with some of its rows and columns."""
        kept = range(len(self.heads)) if columns is None else columns
        return msgspec.structs.replace(
            self,
            rows=tuple(tuple(self.rows[row][column] for column in kept) for row in rows),
            labels=tuple(self.labels[row] for row in rows),
            heads=tuple(self.heads[column] for column in kept),
            sections=tuple((label, sum(row < start for row in rows)) for label, start in self.sections),
        )


def matrix_of(grid: Grid) -> Matrix | None:
    """The body of a grid; None where no row holds a number."""
    results, rows = _without_result_lines(grid.rows)
    body = [place for place, row in enumerate(rows) if any(cell.filled for cell in row)]
    if not body:
        return None
    lead = min(_lead(rows[place]) for place in body) or int(_numbered_labels(rows[: body[0]]))
    width = _width([rows[place] for place in body], lead)
    if width < 1:
        return None
    lines = [_line(rows[place], lead, width) for place in body]
    above = [rows[place] for place in range(body[0])]
    between = [place for place in range(body[0], len(rows)) if place not in body]
    heads, corner = _heads(above + [rows[place] for place in between if _all_totals(rows[place])], lead, width)
    sections = _sections(rows, body, above)
    if len(sections) == len(lines) and not any(label.label for label, _ in lines):
        lines = [(Head(name), cells) for (name, _), (_, cells) in zip(sections, lines, strict=True)]
        heads, sections = (Head(),) * width, ()
    return Matrix(
        rows=tuple(cells for _, cells in lines),
        labels=tuple(label for label, _ in lines),
        heads=heads,
        sections=sections,
        results=results,
        corner=corner,
    )


def _without_result_lines(rows: Sequence[Sequence[Cell]]) -> tuple[tuple[str, ...], list[Sequence[Cell]]]:
    """Lines that hold only printed results, as text, and the other rows."""
    texts: list[str] = []
    kept: list[Sequence[Cell]] = []
    for row in rows:
        filled = [cell for cell in row if cell.filled]
        label = " ".join(cell.label for cell in row if cell.label)
        if not filled or not (all(cell.result for cell in filled) or _is_one_result(label, filled)):
            kept.append(row)
            continue
        if len(filled) > 1 and label and role_of(label) not in ("result", "p", "percent"):
            continue
        above = kept[-1][0].label if kept and len(kept[-1]) == 1 else ""
        if not label and role_of(above) == "result" and kept[-1][0].empty is False:
            label = above
            kept.pop()
        pieces: list[str] = []
        if filled[0].limits:
            add_result(texts, label, role_of(label), filled[0])
            filled = filled[1:]
        for place, cell in enumerate(filled):
            add_result(pieces, label if not place else "", role_of(label), cell)
        texts += [", ".join(pieces)] if pieces else []
    return (tuple(texts), kept) if any(cell.filled for row in kept for cell in row) else ((), list(rows))


def _is_one_result(label: str, filled: Sequence[Cell]) -> bool:
    """Whether a line holds one number that its label calls an effect ("Risk difference 15.2% (8.8 to 22.0)")."""
    quantity = filled[0].quantity
    counted = quantity is not None and quantity.events is not None
    return len(filled) == 1 and not counted and role_of(label) == "result"


def _lead(row: Sequence[Cell]) -> int:
    """How many cells stand before the first number."""
    return next((place for place, cell in enumerate(row) if cell.filled), len(row))


def _width(rows: Sequence[Sequence[Cell]], lead: int) -> int:
    """How many columns of numbers there are: as many as most rows have, the longer ones where they tie."""
    lengths = Counter(_last(row) - lead for row in rows)
    return max(lengths, key=lambda length: (lengths[length], length))


def _last(row: Sequence[Cell]) -> int:
    return max((place + 1 for place, cell in enumerate(row) if cell.filled), default=0)


def _line(row: Sequence[Cell], lead: int, width: int) -> tuple[Head, tuple[Cell, ...]]:
    """The label and the cells of a row; numbers too many belong to the label ("under 65")."""
    labels, cells = list(row[:lead]), list(row[lead : _last(row)])
    if labels and len(cells) > width:
        labels += cells[: len(cells) - width]
        cells = cells[len(cells) - width :]
    text = " ".join(piece for cell in labels if (piece := cell.label or (cell.text if cell.filled else "")))
    total = next((cell.total for cell in labels if cell.total), None)
    return Head(text, total), tuple((cells + [EMPTY] * width)[:width])


def _numbered_labels(above: Sequence[Sequence[Cell]]) -> bool:
    """Whether the first column holds numbers that are names, such as those of centres."""
    first = next((row[0].label.casefold() for row in above[::-1] if len(row) > 2), "")
    return first in _NUMBERED


def _all_totals(row: Sequence[Cell]) -> bool:
    return sum(cell.total is not None for cell in row) > 1


def _heads(rows: Sequence[Sequence[Cell]], lead: int, width: int) -> tuple[tuple[Head, ...], str]:
    """One heading a column, put together from all the rows above, and the text of the corner."""
    labels: list[list[str]] = [[] for _ in range(width)]
    totals: list[Token | None] = [None] * width
    corner = ""
    parted = any(len(row) > 1 for row in rows)
    for row in rows:
        cells = None if parted and len(row) == 1 and not row[0].total and width > 1 else _aligned(row, lead, width)
        if cells is None:
            continue
        if len(row) > width and lead and row[0].label:
            corner = f"{corner} {row[0].label}".strip()
        for place, cell in enumerate(cells):
            if cell.label:
                labels[place].append(cell.label)
            totals[place] = totals[place] or cell.total
    heads = tuple(Head(" ".join(words), total) for words, total in zip(labels, totals, strict=True))
    return heads, corner


def _aligned(row: Sequence[Cell], lead: int, width: int) -> list[Cell] | None:
    """The cells of a row of headings over the columns; a heading over several columns stands over each of them."""
    cells = list(row)
    while len(cells) > lead + width and cells[-1].empty:
        cells.pop()
    if len(cells) == 1 and not cells[0].total and lead + width > 1:
        cells = _parted(cells, lead, width)
    if not cells:
        return None
    if len(cells) == width and lead:
        cells[0] = _without_corner(cells[0])
    if len(cells) == lead + width:
        cells = cells[lead:]
    elif len(cells) > width:
        cells = cells[len(cells) - width :]
    elif len(cells) > 1 and lead and cells[0].empty:
        cells = cells[lead:]
        if cells and width % len(cells):
            cells += [EMPTY] * (width - len(cells))
    told = [cell for cell in cells if not cell.empty]
    if len(cells) < width or (len(told) < width and told and cells[0] is told[0]):
        spread = len(told) and width % len(told) == 0
        return (
            [cell for cell in told for _ in range(width // len(told))] if spread else (cells + [EMPTY] * width)[:width]
        )
    return cells


def _parted(cells: list[Cell], lead: int, width: int) -> list[Cell]:
    """A line of headings without borders as one for each column; empty where its words are more or fewer."""
    words = [Cell(text=word, label=word) for word in _WORDS.findall(cells[0].label)]
    if width == 1:
        return cells
    return words if len(words) in (width, width + lead) else []


def _without_corner(cell: Cell) -> Cell:
    """The first heading without the word for the column of labels before it ("Outcome Treatment (N=88)")."""
    corner, _, rest = cell.label.partition(" ")
    return msgspec.structs.replace(cell, label=rest) if rest and corner.casefold() in _CORNER else cell


def _sections(
    rows: Sequence[Sequence[Cell]], body: Sequence[int], above: Sequence[Sequence[Cell]]
) -> tuple[tuple[str, int], ...]:
    """Labels that stand alone above some rows, with the number of the row of the body that follows."""
    found = []
    if above and _only_label(above[-1]):
        found.append((_only_label(above[-1]), 0))
    for place in range(body[0], len(rows)):
        if place in body or not _only_label(rows[place]) or is_sum(_only_label(rows[place])):
            continue
        found.append((_only_label(rows[place]), sum(number < place for number in body)))
    return tuple(found) if len(found) > 1 else ()


def _only_label(row: Sequence[Cell]) -> str:
    told = [cell for cell in row if not cell.empty]
    return told[0].label if len(told) == 1 and not told[0].total and row[0] is told[0] else ""
