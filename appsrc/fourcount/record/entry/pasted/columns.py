"""Columns of a block that stand beside its counts: printed results and percentages."""

from __future__ import annotations

import re
from collections.abc import Sequence
from itertools import permutations

import msgspec

from fourcount.record.entry.pasted.cells import Cell
from fourcount.record.entry.pasted.headings import Role, is_measure, role_of
from fourcount.record.entry.pasted.matrix import Head, Matrix
from fourcount.record.entry.pasted.proportions import gives, nearly_gives
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.pasted.result_text import add_result
from fourcount.record.entry.tokens import Token

_LEVEL = re.compile(r"([0-9]{2}(?:\.[0-9])?) ?% ?-?(?:CI|CrI|confidence)", re.IGNORECASE)
_MOST_COUNTS = 6


def without_results(matrix: Matrix) -> Matrix:
    """The matrix without its columns and rows of effects and p values, whose text goes to ``results``."""
    columns = [place for place in range(len(matrix.heads)) if not _is_result(matrix, place)]
    turned = matrix.turned()
    rows = [place for place in range(len(matrix.labels)) if not _is_result(turned, place)]
    if not columns or not rows:
        return matrix
    texts = list(matrix.results)
    texts += _texts(matrix, [place for place in range(len(matrix.heads)) if place not in columns])
    texts += _texts(turned, [place for place in range(len(matrix.labels)) if place not in rows])
    return msgspec.structs.replace(matrix.only(rows, columns), results=tuple(texts))


def without_measures(matrix: Matrix) -> Matrix | None:
    """The matrix without rows and columns of something measured ("Age, years"); None where nothing else is there."""
    turned = matrix.turned()
    rows = [place for place, label in enumerate(matrix.labels) if not _is_measured(label, matrix.rows[place])]
    columns = [place for place, head in enumerate(matrix.heads) if not _is_measured(head, turned.rows[place])]
    return matrix.only(rows, columns) if rows and columns else None


def _is_measured(head: Head, cells: Sequence[Cell]) -> bool:
    counted = any(cell.quantity and cell.quantity.events for cell in cells)
    shared = any(cell.quantity and cell.quantity.percent and cell.quantity.percent.percent for cell in cells)
    return counted and not shared and is_measure(head.label)


def with_risks(matrix: Matrix) -> Matrix:
    """The matrix with "9.1 (6.4-12.8)" as a percentage and its limits where a heading or a label says percent.

    "20.2 (41)" is a percentage with its count where the total proves it.
    """
    rows = [list(row) for row in matrix.rows]
    turned = matrix.turned()
    for row, label in enumerate(matrix.labels):
        for column, head in enumerate(matrix.heads):
            told = next((each.label for each in (head, label) if role_of(each.label) == "percent"), None)
            risk = rows[row][column].risk
            counted = rows[row][column].counted
            if counted and _is_of_any(counted, [head.total, label.total], (*matrix.rows[row], *turned.rows[column])):
                rows[row][column] = Cell(text=rows[row][column].text, quantity=counted)
            elif told is not None and risk:
                level = _LEVEL.search(told)
                risk = msgspec.structs.replace(risk, level_text=f"{level[1]}%" if level else "")
                rows[row][column] = Cell(text=rows[row][column].text, quantity=risk)
    return msgspec.structs.replace(matrix, rows=tuple(tuple(row) for row in rows))


def _is_of_any(quantity: Quantity, totals: Sequence[Token | None], cells: Sequence[Cell]) -> bool:
    """Whether a count and its percentage are proven by a total in a heading or in a cell beside."""
    events, percent = quantity.events, quantity.percent
    if events is None or percent is None:
        return False
    wholes = [whole for whole in (*totals, *(cell.count for cell in cells)) if whole]
    return any(gives(percent, events.whole or 0, whole.whole or 0) for whole in wholes)


def _is_result(matrix: Matrix, column: int) -> bool:
    role: Role = role_of(matrix.heads[column].label)
    filled = [row[column] for row in matrix.rows if row[column].filled]
    if not filled:
        return True
    if column and not matrix.heads[column].label and all(cell.decimal and cell.decimal.value <= 1 for cell in filled):
        beside = [row[column - 1] for row in matrix.rows if row[column - 1].filled]
        return bool(beside) and all(cell.result for cell in beside)
    plain = any(cell.quantity and (cell.quantity.total or cell.count) for cell in filled)
    return all(cell.result for cell in filled) or (role in ("result", "p", "rate") and not (plain and role != "rate"))


def _texts(matrix: Matrix, columns: Sequence[int]) -> list[str]:
    """Each result with its name from the heading: "RR (95% CI)" over "0.55 (0.30-0.99)" gives "RR 0.55 (95% CI ...".

    A column of rates is not a result of the comparison and gives none.
    """
    found: list[str] = []
    for column in columns:
        head = matrix.heads[column].label
        role = role_of(head)
        cells = [row[column] for row in matrix.rows if row[column].filled]
        if role == "rate" or not cells:
            continue
        add_result(found, head, "p" if cells[0].decimal and not head else role, cells[0])
    return found


def with_percentages(matrix: Matrix) -> Matrix:
    """The matrix with columns of percentages put beside the counts that they are of."""
    rows = [list(row) for row in matrix.rows]
    gone: list[int] = []
    for column in range(len(matrix.heads)):
        percents = [_percent(row[column], matrix.heads[column]) for row in rows]
        told = [percent for percent in percents if percent]
        if not told or any(row[column].filled and not percent for row, percent in zip(rows, percents, strict=True)):
            continue
        others = [place for place in range(len(matrix.heads)) if place != column and place not in gone]
        target = _proven(rows, percents, others)
        if target is None:
            target = _target(rows, percents, matrix.heads, [place for place in others if place < column])
        if target is None or not _is_percentage(matrix, percents, column, target):
            continue
        for row, percent in zip(rows, percents, strict=True):
            quantity = row[target].quantity
            if quantity and percent and quantity.percent is None:
                row[target] = msgspec.structs.replace(
                    row[target], quantity=msgspec.structs.replace(quantity, percent=percent)
                )
        gone.append(column)
    kept = [place for place in range(len(matrix.heads)) if place not in gone]
    whole = msgspec.structs.replace(matrix, rows=tuple(tuple(row) for row in rows))
    return msgspec.structs.replace(whole.only(range(len(rows)), kept), rows=_decimals_told(rows, kept, matrix.heads))


def with_proven_rows(matrix: Matrix) -> Matrix:
    """The matrix with a row of percentages beside the counts above it that are proven to give them."""
    turned = matrix.turned()
    if len(turned.heads) < 3 or turned.sections:
        return matrix
    rows = [list(row) for row in turned.rows]
    for column, head in enumerate(turned.heads):
        percents = [_percent(row[column], head) for row in rows]
        others = [place for place in range(len(turned.heads)) if place != column]
        target = _proven(rows, percents, others) if all(percents) else None
        if target is None:
            continue
        for row, percent in zip(rows, percents, strict=True):
            if quantity := row[target].quantity:
                shared = msgspec.structs.replace(quantity, percent=quantity.percent or percent)
                row[target] = msgspec.structs.replace(row[target], quantity=shared)
        whole = msgspec.structs.replace(turned, rows=tuple(tuple(row) for row in rows))
        return whole.only(range(len(rows)), others).turned()
    return matrix


def _is_percentage(matrix: Matrix, percents: Sequence[Token | None], column: int, target: int) -> bool:
    """Whether numbers are percentages by sign or heading, or are what the counts give; "mean age" is neither."""
    head = matrix.heads[column].label
    if not head or role_of(head) == "percent" or all(percent.percent for percent in percents if percent):
        return True
    for row, label, percent in zip(matrix.rows, matrix.labels, percents, strict=True):
        quantity = row[target].quantity
        wholes = [cell.count for cell in row] + [label.total, quantity.total if quantity else None]
        events = quantity.events if quantity else None
        if (
            percent
            and events
            and not any(whole and nearly_gives(percent, events.whole or 0, whole.whole or 0) for whole in wholes)
        ):
            return False
    return True


def _decimals_told(
    rows: Sequence[Sequence[Cell]], kept: Sequence[int], heads: Sequence[Head]
) -> tuple[tuple[Cell, ...], ...]:
    """Numbers with decimals that stand alone as person-time under such a heading, else as percentages."""
    return tuple(tuple(_told(row[column], heads[column]) for column in kept) for row in rows)


def _told(cell: Cell, head: Head) -> Cell:
    if cell.quantity or cell.decimal is None:
        return cell
    if role_of(head.label) == "time":
        return msgspec.structs.replace(cell, quantity=Quantity(first=0, after=1, events=cell.decimal))
    return msgspec.structs.replace(cell, quantity=Quantity(first=0, after=1, percent=cell.decimal))


def _percent(cell: Cell, head: Head) -> Token | None:
    if cell.percent:
        return cell.percent
    count = cell.count
    whole = count is not None and (count.whole or 0) <= 100 and role_of(head.label) == "percent"
    return count if whole and cell.quantity and cell.quantity.percent is None else None


def _proven(rows: Sequence[Sequence[Cell]], percents: Sequence[Token | None], others: Sequence[int]) -> int | None:
    """The column of counts that every percentage is exactly what it gives of another column."""
    told = [place for place, percent in enumerate(percents) if percent and percent.decimals]
    counts = [place for place in others if all(rows[row][place].count for row in told)]
    if len(told) < 2 or len(counts) > _MOST_COUNTS:
        return None
    for part, whole in permutations(counts, 2):
        pairs = [(percents[row], rows[row][part].count, rows[row][whole].count) for row in told]
        if all(one and two and three and gives(one, two.whole or 0, three.whole or 0) for one, two, three in pairs):
            return part
    return None


def _target(
    rows: Sequence[Sequence[Cell]], percents: Sequence[Token | None], heads: Sequence[Head], left: Sequence[int]
) -> int | None:
    """The column of counts, or of counts with their totals, that a column of percentages is of."""
    if not left:
        return None
    last = left[-1]
    complete = [row[last].quantity for row in rows if row[last].filled]
    if complete and all(quantity and quantity.events and quantity.total for quantity in complete):
        return last
    if len(left) > 1 and _fits(rows, percents, left[-2], last):
        return left[-2]
    if role_of(heads[last].label) == "total" and len(left) > 1:
        return left[-2]
    counted = all(row[last].count for row in rows if row[last].filled)
    return last if counted and role_of(heads[last].label) != "total" else None


def _fits(rows: Sequence[Sequence[Cell]], percents: Sequence[Token | None], part: int, whole: int) -> bool:
    """Whether every percentage is what the part gives of the whole, or of both together."""
    for row, percent in zip(rows, percents, strict=True):
        events, total = row[part].count, row[whole].count
        if percent is None:
            continue
        if events is None or total is None or events.whole is None or total.whole is None:
            return False
        if not (
            nearly_gives(percent, events.whole, total.whole) or gives(percent, events.whole, events.whole + total.whole)
        ):
            return False
    return True
