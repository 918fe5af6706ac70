"""Blocks with one two-group table a row, or a section: strata of one outcome, or one wide row."""

from __future__ import annotations

from collections.abc import Sequence

import msgspec

from fourcount.record.entry.pasted.cells import Cell
from fourcount.record.entry.pasted.groups import two_groups
from fourcount.record.entry.pasted.heading_sets import roles_of
from fourcount.record.entry.pasted.headings import Role, is_sum
from fourcount.record.entry.pasted.matrix import Head, Matrix
from fourcount.record.entry.pasted.proportions import gives
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.pasted.understood import Understood
from fourcount.record.entry.tokens import Token

_PROVEN = (0, 2, 1, 3)


class Strata(msgspec.Struct, frozen=True, kw_only=True):
    """One understood table a stratum, with its label."""

    labels: tuple[str, ...]
    tables: tuple[Understood, ...]
    doubts: tuple[str, ...] = ()


def strata_of(matrix: Matrix) -> Strata | None:
    """Strata of a block, or its one wide row; None where its rows are no tables of their own."""
    return _by_sections(matrix) or _wide(matrix) or _of_complete(matrix)


def _by_sections(matrix: Matrix) -> Strata | None:
    """Two rows under each of several labels."""
    if len(matrix.sections) < 2:
        return None
    starts = [start for _, start in matrix.sections] + [len(matrix.rows)]
    labels, tables = [], []
    for (label, start), after in zip(matrix.sections, starts[1:], strict=True):
        rows = [row for row in range(start, after) if not is_sum(matrix.labels[row].label)]
        found = two_groups(matrix.only(rows)) if len(rows) == 2 else None
        if found is None:
            return None
        labels.append(label)
        tables.append(found)
    return _strata(labels, tables, set()) if len({table.form for table in tables}) == 1 else None


def _wide(matrix: Matrix) -> Strata | None:
    """Rows of four counts: those of the first group, then those of the second."""
    if len(matrix.heads) != 4 or any(head.total for head in matrix.heads):
        return None
    rows = [row for row in range(len(matrix.rows)) if not is_sum(matrix.labels[row].label)] or [0]
    order = _ordered(matrix, rows)
    matrix = matrix.only(range(len(matrix.rows)), order)
    if any(cell.count is None for row in rows for cell in matrix.rows[row][::2]):
        return None
    groups = (_shared(matrix.heads[0], matrix.heads[1]), _shared(matrix.heads[2], matrix.heads[3]))
    roles = _roles(matrix)
    timed = roles[1] == roles[3] == "time" or any(
        cell.quantity and cell.quantity.unit for row in rows for cell in matrix.rows[row][1::2]
    )
    seconds = [cell.amount if timed else cell.count for row in rows for cell in matrix.rows[row][1::2]]
    if (len(rows) > 1 and timed) or not all(seconds):
        return None
    others = roles[1] == roles[3] == "others" or any(
        _whole(matrix, row, place) > _whole(matrix, row, place + 1) for row in rows for place in (0, 2)
    )
    told = order == _PROVEN or (roles[1] == roles[3] and roles[1] in ("total", "others", "time"))
    doubts: set[str] = set() if told else {"others-or-totals"}
    tables = [_table(matrix, row, groups, "time" if timed else "others" if others else "total") for row in rows]
    if len(rows) < len(matrix.rows):
        doubts.add("total-left-out")
    return _strata([matrix.labels[row].label for row in rows], tables, doubts)


def _roles(matrix: Matrix) -> list[Role]:
    groups = (_shared(matrix.heads[0], matrix.heads[1]), _shared(matrix.heads[2], matrix.heads[3]))
    return roles_of([Head(_without(head.label, groups[place // 2])) for place, head in enumerate(matrix.heads)])


def _ordered(matrix: Matrix, rows: Sequence[int]) -> tuple[int, ...]:
    """The columns as events and total of one group, then of the other, where headings or percentages tell."""
    roles = _roles(matrix)
    if roles[0] == roles[2] == "total" and roles[1] == roles[3] != "total":
        return 1, 0, 3, 2
    if all(_proves(matrix.rows[row][place], matrix.rows[row][place + 2]) for row in rows for place in (0, 1)):
        return _PROVEN
    return 0, 1, 2, 3


def _proves(part: Cell, whole: Cell) -> bool:
    quantity, total = part.quantity, whole.count
    if quantity is None or quantity.percent is None or quantity.events is None or total is None:
        return False
    return gives(quantity.percent, quantity.events.whole or 0, total.whole or 0)


def _whole(matrix: Matrix, row: int, column: int) -> int:
    token = matrix.rows[row][column].count
    return (token.whole or 0) if token else 0


def _shared(one: Head, other: Head) -> str:
    """The words that the headings of one group's two columns share: its label."""
    shared = set(one.label.split()) & set(other.label.split())
    return " ".join(word for word in one.label.split() if word in shared)


def _without(text: str, label: str) -> str:
    """A heading without its group's label."""
    return " ".join(word for word in text.split() if word not in label.split())


def _table(matrix: Matrix, row: int, groups: tuple[str, str], second: str) -> Understood:
    cells = matrix.rows[row]
    pair, apart = [], []
    for place in (0, 2):
        quantity = cells[place].quantity or Quantity(first=0, after=1)
        whole = cells[place + 1].amount
        changes = {"total": whole} if second == "total" else {"time": whole} if second == "time" else {}
        pair.append(msgspec.structs.replace(quantity, **changes))
        apart.append(whole)
    others: tuple[Token, ...] = tuple(token for token in apart if token) if second == "others" else ()
    unit = next((cell.quantity.unit for cell in cells if cell.quantity and cell.quantity.unit), "")
    if second == "time" and not unit:
        unit = _without(matrix.heads[1].label, groups[0]).lower()
    return Understood(
        form={"total": "events-of-total", "time": "person-time"}.get(second, "events-and-others"),  # type: ignore[arg-type]
        quantities=(pair[0], pair[1]),
        labels=groups,
        left_heading=matrix.labels[row].label,
        unit=unit,
        others=others,
    )


def _of_complete(matrix: Matrix) -> Strata | None:
    """Rows of two whole groups, ``15/150`` and ``27/148``, whose totals differ from row to row and within rows."""
    rows = [row for row in range(len(matrix.rows)) if not is_sum(matrix.labels[row].label)]
    columns = [place for place in range(len(matrix.heads)) if not is_sum(matrix.heads[place].label)]
    if len(rows) < 2 or len(columns) != 2:
        return None
    small = matrix.only(rows, columns)
    quantities = [[cell.quantity for cell in row] for row in small.rows]
    if not all(each and each.events and each.total for row in quantities for each in row):
        return None
    totals = [[each.total.whole if each and each.total else 0 for each in row] for row in quantities]
    if any(len(set(column)) == 1 for column in zip(*totals, strict=True)) or all(one == two for one, two in totals):
        return None
    turned = [
        two_groups(msgspec.structs.replace(small.only([row]).turned(), heads=(Head(),))) for row in range(len(rows))
    ]
    tables = [table for table in turned if table]
    if len(tables) != len(rows):
        return None
    doubts = {"strata-or-outcomes"} | ({"total-left-out"} if len(rows) < len(matrix.rows) else set())
    return _strata([label.label for label in small.labels], tables, doubts)


def _strata(labels: Sequence[str], tables: Sequence[Understood], doubts: set[str]) -> Strata:
    found = doubts | {doubt for table in tables for doubt in table.doubts}
    return Strata(labels=tuple(labels), tables=tuple(tables), doubts=tuple(sorted(found)))
