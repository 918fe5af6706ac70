"""A pasted block, out of a spreadsheet or a PDF, as a table."""

from __future__ import annotations

from collections.abc import Sequence

import msgspec

from fourcount.record.entry.pasted.columns import (
    with_percentages,
    with_proven_rows,
    with_risks,
    without_measures,
    without_results,
)
from fourcount.record.entry.pasted.effects import effects_alone, only_name
from fourcount.record.entry.pasted.grid import read_grid
from fourcount.record.entry.pasted.groups import two_groups
from fourcount.record.entry.pasted.heading_sets import negated
from fourcount.record.entry.pasted.headings import SEXES, heading_words, is_sum, is_time
from fourcount.record.entry.pasted.matrix import Matrix, matrix_of
from fourcount.record.entry.pasted.pair_table import pair_table
from fourcount.record.entry.pasted.proportions import beside
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.pasted.strata_rows import Strata, strata_of
from fourcount.record.entry.pasted.understood import Understood, agrees
from fourcount.record.entry.printed import read_paper
from fourcount.record.entry.readings import Pasted, PastedGroup
from fourcount.record.entry.tokens import LONGEST_TEXT
from fourcount.record.outcome import Layout, PaperMeasure

_MOST_STRATA = 50


def read_block(text: str) -> Pasted | None:
    """What a block of cells holds: two groups down or across, pairs, or strata; None where it holds no table.

    Columns of results and of percentages are told from the counts, rows and columns of sums are left out, and what
    might be understood otherwise is listed.
    """
    if len(text) > LONGEST_TEXT or not any(character.isdecimal() for character in text):
        return None
    grid = read_grid(text)
    whole = matrix_of(grid) if grid else None
    if grid is None or whole is None:
        return None
    kept = without_measures(with_risks(whole))
    matrix = with_proven_rows(with_percentages(without_results(kept))) if kept else None
    found = _understood(matrix, text) if matrix else None
    if matrix is None or found is None:
        return effects_alone(whole, grid.results)
    doubts = dict.fromkeys((*found.ambiguous, *(("comma-pairs",) if grid.comma_pairs else ())))
    said = only_name(text)
    pieces = [" ".join(piece.split()) for piece in (*matrix.results, *grid.results)]
    pieces = [f"{said} {piece}" if said and piece[:1].isdigit() else piece for piece in pieces]
    paper = "; ".join(pieces)
    figures = tuple(figure for piece in pieces for figure in read_paper(piece, _usual(piece)).figures)
    return msgspec.structs.replace(
        found, ambiguous=tuple(doubts), figures=figures, paper_text=paper if figures else "", source="block"
    )


def _usual(piece: str) -> PaperMeasure:
    return "risk_difference" if "difference" in piece.casefold() else "risk_ratio"


def _understood(matrix: Matrix, text: str) -> Pasted | None:
    small = _without_sums(matrix)
    pairs = pair_table(small, text)
    if pairs:
        return pairs
    strata = strata_of(matrix)
    if strata and len(strata.tables) > 1:
        return _strata(strata)
    if strata:
        return _table(strata.tables[0], strata.doubts, "across")
    down = _down(matrix)
    across = _down(msgspec.structs.replace(matrix.turned(), corner=""))
    layouts: list[tuple[Understood, Layout]] = [(down, "down")] if down else []
    layouts += [(across, "across")] if across else []
    if not layouts:
        return None
    best, layout = max(layouts, key=lambda found: found[0].score)
    unnamed = not (all(label.label for label in matrix.labels) and all(head.label for head in matrix.heads))
    summed = any(is_sum(head.label) for head in (*matrix.labels, *matrix.heads)) and unnamed
    differ = down and across and _counts(down) != _counts(across)
    undecided = (
        down and across and differ and (down.score == across.score or (summed and best.form == "events-and-others"))
    )
    sexes = best.form == "events-and-others" and all(set(heading_words(head.label)) & SEXES for head in matrix.heads)
    shared = any(each.percent for each in best.quantities)
    nameless = best.form == "events-and-others" and not shared and _nameless(matrix, best.doubts)
    undecided = undecided or sexes or nameless
    doubts = (*best.doubts, *(("orientation",) if undecided else ()))
    return _table(best, doubts, layout)


def _nameless(matrix: Matrix, doubts: Sequence[str]) -> bool:
    """Whether only one side is named, and that by a thing and its absence, or no side but a sum was found."""
    sides = (matrix.heads, matrix.labels), (matrix.labels, matrix.heads)
    alone = any(negated(one) and not any(head.label for head in other) for one, other in sides)
    bare = not any(head.label for head in (*matrix.heads, *matrix.labels))
    return alone or (bare and "total-left-out" in doubts)


def _without_sums(matrix: Matrix) -> Matrix:
    rows = [row for row, label in enumerate(matrix.labels) if not is_sum(label.label)]
    columns = [place for place, head in enumerate(matrix.heads) if not is_sum(head.label)]
    return matrix.only(rows, columns)


def _down(matrix: Matrix) -> Understood | None:
    """The rows as groups, without those of sums; without labels, a last row that is the sum of the others is one."""
    rows = [row for row, label in enumerate(matrix.labels) if not is_sum(label.label)]
    if len(rows) == len(matrix.labels) == 3 and _is_sum_row(matrix):
        rows = [0, 1]
    if len(rows) != 2:
        return None
    found = two_groups(matrix.only(rows))
    if found and len(rows) < len(matrix.labels):
        doubts = tuple(dict.fromkeys((*found.doubts, "total-left-out")))
        return msgspec.structs.replace(found, doubts=doubts)
    return found


def _is_sum_row(matrix: Matrix) -> bool:
    """Whether the third row's counts are the sums of the first two, and nothing names it as a group."""
    counts = [[cell.count for cell in row] for row in matrix.rows]
    values = [[token.whole or 0 if token else None for token in row] for row in counts]
    pairs = [column for column in zip(*values, strict=True) if None not in column]
    return bool(pairs) and all((one or 0) + (two or 0) == three for one, two, three in pairs)


def _counts(found: Understood) -> tuple[int | None, ...]:
    parts = [each.events or each.percent for each in found.quantities]
    wholes = [each.total or each.time for each in found.quantities]
    return tuple(token.whole if token else None for token in (*parts, *wholes, *found.others))


def _table(found: Understood, doubts: Sequence[str], layout: Layout) -> Pasted:
    doubts = (*doubts, "changed-count") if all(is_time(label) for label in found.labels) else doubts
    return Pasted(
        form=found.form,
        groups=_groups(found),
        left_heading=_heading(found.left_heading),
        right_heading=_heading(found.right_heading),
        unit=found.unit,
        limits_level=found.quantities[0].level_text or found.quantities[1].level_text,
        layout=layout,
        ambiguous=tuple(dict.fromkeys(doubts)),
    )


def _heading(text: str) -> str:
    """A heading without what only says how its cells are printed."""
    for ending in ("% (95% CI)", "n/N (%)", "(n/N)", "n (%)", "no. (%)", "No. (%)", "N (%)", "n/N", "(%)", "(n)"):
        if text.endswith(ending):
            text = text.removesuffix(ending).rstrip(" ,-:\u2013\u2014")
            break
    return text if any(character.isalnum() for character in text) else ""


def _strata(found: Strata) -> Pasted:
    tables = found.tables[:_MOST_STRATA]
    return Pasted(
        form="strata",
        groups=tuple(group for table in tables for group in _groups(table)),
        stratum_labels=found.labels[:_MOST_STRATA],
        ambiguous=(*found.doubts, "left-out") if len(found.tables) > _MOST_STRATA else found.doubts,
        strata_of_total=tables[0].form != "events-and-others",
        layout="across",
    )


def _groups(found: Understood) -> tuple[PastedGroup, ...]:
    groups = []
    for place, (quantity, label) in enumerate(zip(found.quantities, found.labels, strict=True)):
        part = quantity.events or quantity.percent
        left = part.text if part else ""
        if quantity.events is None:
            left += "%"
        elif quantity.percent is not None and not agrees(quantity, found):
            left = beside(left, quantity.percent)
        groups.append(PastedGroup(left_text=left, right_text=_right(quantity, found, place), label=_heading(label)))
    return tuple(groups)


def _right(quantity: Quantity, found: Understood, place: int) -> str:
    if quantity.low and quantity.high:
        return f"{quantity.low.text} to {quantity.high.text}%"
    if found.others:
        return found.others[place].text
    whole = quantity.time or quantity.total
    return whole.text if whole else ""
