"""A pasted block as rows of cells, wherever it came from: a spreadsheet, a PDF, a page."""

from __future__ import annotations

import re
from collections.abc import Callable, Sequence

import msgspec

from fourcount.record.entry.pasted.cells import Cell, delimited_cell, row_cells
from fourcount.record.entry.printed import named_figures
from fourcount.record.entry.tokens import presentable, take_apart

MOST_ROWS = 60
MOST_COLUMNS = 24
LONGEST_RESULT = 200
_RULE = re.compile(r"[\s|+:=_-]*")
_CAPTION = re.compile(r"\s*(?:Supplement\w* |Appendix )?(?:Table|Figure|Box) [A-Z]?[0-9]+[.:]? +[^\t|]*$")
_GAP = re.compile(r"[ \u00a0]{2,}| \| ?")
_PAIR = re.compile(r"[0-9]{1,3},[0-9]{3}")
_BARE = re.compile(r"[0-9]{1,3}(?:,[0-9]{3})+")
_DECIMAL_COMMA = re.compile(r"[0-9],[0-9]+ ?%")
_COMMA_IN_NUMBER = re.compile(r"[0-9],[0-9]{3}(?![0-9])")


class Grid(msgspec.Struct, frozen=True):
    """Rows of cells, and lines of printed results; ``comma_pairs`` where a border may be a thousands mark."""

    rows: tuple[tuple[Cell, ...], ...]
    comma_pairs: bool = False
    results: tuple[str, ...] = ()


def read_grid(text: str) -> Grid | None:
    """The rows of a text; None where it has too many to be one table."""
    printed = [line for line in presentable(text).split("\n") if not _RULE.fullmatch(line)]
    if not printed or len(printed) > MOST_ROWS:
        return None
    printed = [line for line in printed if not _CAPTION.match(line)] or printed
    results = tuple(line.strip() for line in printed if _is_result(line))
    lines = [line for line in printed if line.strip() not in results]
    if not lines:
        return None
    split, comma_pairs = _splitter(lines)
    rows = []
    for line in lines:
        pieces = split(line)
        if len(pieces) > MOST_COLUMNS:
            return None
        cells = row_cells(line) if len(pieces) == 1 else _delimited(pieces)
        rows.append(tuple(cells[:MOST_COLUMNS]))
    return Grid(tuple(rows), comma_pairs, results)


def _delimited(pieces: Sequence[str]) -> list[Cell]:
    """The cells between borders; a result with its name, "RR 0.54 (0.37 to 0.78)", is one unless it stands first."""
    cells: list[Cell] = []
    for piece in pieces:
        found = delimited_cell(piece)
        limits = "(" in piece or "[" in piece
        if cells and limits and len(found) == 1 and found[0].label and _is_result(piece.strip()):
            found = [Cell(text=piece.strip(), result=piece.strip())]
        cells += found
    return cells


def _is_result(line: str) -> bool:
    """Whether a line without borders is a printed result from its first word on."""
    if "\t" in line or "|" in line or _GAP.search(line.strip()):
        return False
    figures = named_figures(take_apart(line[:LONGEST_RESULT]), "risk_ratio")
    return bool(figures) and figures[0][1][0] == 0 and figures[0][0].estimate is not None


def _splitter(lines: Sequence[str]) -> tuple[Callable[[str], list[str]], bool]:
    """How the lines are parted into cells: by the first border that parts them as a table would be."""
    if any("\t" in line.strip() for line in lines):
        return (lambda line: line.strip("\n ").split("\t")), False
    if all(line.count("|") >= 1 for line in lines):
        return (lambda line: line.strip().strip("|").split("|")), False
    if all(";" in _outside_brackets(line) for line in lines):
        return (lambda line: _split_outside(line, ";")), False
    gaps = [len(_GAP.findall(line.strip())) for line in lines]
    if sum(gap > 0 for gap in gaps) * 2 > len(lines):
        return (lambda line: _GAP.split(line.strip())), False
    if all(_PAIR.fullmatch(line.strip()) for line in lines) and len(lines) == 2:
        return (lambda line: line.strip().split(",")), True
    if _comma_parts(lines):
        return (lambda line: _split_outside(line, ",")), any(_BARE.fullmatch(line.strip()) for line in lines)
    return (lambda line: [line]), False


def _comma_parts(lines: Sequence[str]) -> bool:
    """Whether commas part every line into equally many cells, at least two of them."""
    numbers = {len(_split_outside(line, ",")) for line in lines}
    if len(numbers) != 1 or min(numbers) < 2 or any(_DECIMAL_COMMA.search(line) for line in lines):
        return False
    return all(len(_COMMA_IN_NUMBER.findall(line)) < line.count(",") or line.count(",") > 2 for line in lines)


def _outside_brackets(line: str) -> str:
    return re.sub(r"\([^()]*\)|\[[^\[\]]*\]", "", line)


def _split_outside(line: str, border: str) -> list[str]:
    """The line parted at a border outside brackets and quotation marks."""
    pieces, depth, quoted, start = [], 0, False, 0
    for place, character in enumerate(line):
        depth += (character in "([") - (character in ")]")
        quoted ^= character == '"'
        if character == border and depth <= 0 and not quoted:
            pieces.append(line[start:place])
            start = place + 1
    return [*pieces, line[start:]]
