"""Blocks that hold printed results and no counts, and names of results that stand elsewhere in a block."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.record.entry.figure_names import name_at
from fourcount.record.entry.pasted.cells import Cell
from fourcount.record.entry.pasted.headings import role_of
from fourcount.record.entry.pasted.matrix import Head, Matrix
from fourcount.record.entry.pasted.result_text import add_result
from fourcount.record.entry.printed import read_paper
from fourcount.record.entry.readings import Pasted
from fourcount.record.entry.tokens import take_apart
from fourcount.record.outcome import PAPER_MEASURES

_LOW = ("lower", "low", "lcl", "lower limit", "lower 95%", "lower ci", "lower bound")
_HIGH = ("upper", "high", "ucl", "upper limit", "upper 95%", "upper ci", "upper bound")


def effects_alone(matrix: Matrix, lines: Sequence[str]) -> Pasted | None:
    """Results with limits under headings or behind labels, one below the other; None where one has no name."""
    if len(matrix.rows) == 1 and any(head.label for head in matrix.heads):
        heads, cells = matrix.heads, matrix.rows[0]
    elif len(matrix.heads) == 1:
        heads, cells = matrix.labels, tuple(row[0] for row in matrix.rows)
    elif len(matrix.rows) == 1 and matrix.labels[0].label:
        heads, cells = (matrix.labels[0], *matrix.heads[1:]), matrix.rows[0]
    else:
        return None
    if any(cell.quantity and cell.quantity.events for cell in cells):
        return None
    texts = list(matrix.results)
    for head, cell in _with_limits(heads, cells):
        if cell.filled:
            add_result(texts, head.label, role_of(head.label), cell)
    paper = "; ".join((*texts, *lines))
    named = all(name_at(take_apart(text).tokens, 0) or text[:1] in "pP" or _is_adjusted(text) for text in texts)
    figures = read_paper(paper, "risk_ratio").figures
    told = any(figure.measure in PAPER_MEASURES and figure.low and figure.high for figure in figures)
    if not (named and told):
        return None
    return Pasted(form="effect-only", figures=figures, paper_text=paper, source="block")


def _is_adjusted(text: str) -> bool:
    """Whether a name stands behind "adjusted"."""
    tokens = take_apart(text).tokens
    return any(name_at(tokens, place) for place in range(1, min(4, len(tokens))))


def _with_limits(heads: Sequence[Head], cells: Sequence[Cell]) -> list[tuple[Head, Cell]]:
    """The cells with a lower and an upper limit in columns of their own as one cell."""
    found: list[tuple[Head, Cell]] = []
    for place, (head, cell) in enumerate(zip(heads, cells, strict=True)):
        said = head.label.casefold()
        if said in _HIGH and place and heads[place - 1].label.casefold() in _LOW:
            text = f"{cells[place - 1].text} to {cell.text}"
            found.append((Head("CI"), Cell(text=text, result=text, limits=True)))
        elif said not in _LOW:
            found.append((head, cell))
    return found


def only_name(text: str) -> str:
    """The one name of an effect that stands anywhere in a block, "" where there is none or several."""
    tokens = take_apart(text).tokens
    found: dict[str, str] = {}
    for place in range(len(tokens)):
        name = name_at(tokens, place)
        if name and name.measure and name.measure in PAPER_MEASURES and not name.vague:
            found.setdefault(name.measure, " ".join(each.text for each in tokens[place : place + name.length]))
    return next(iter(found.values())) if len(found) == 1 else ""
