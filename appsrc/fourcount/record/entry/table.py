"""The four cells together: the counts they give, and the marks of those that give none."""

from __future__ import annotations

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.digits import specimen
from fourcount.record.entry.percent import printed_percent, rounds_to
from fourcount.record.entry.percent_of_total import holds_a_count, read_row
from fourcount.record.entry.readings import Blank, Count, Fact, GroupCounts, Mark, TableReading, Unreadable
from fourcount.record.entry.spaced import spaced_marks
from fourcount.record.outcome import CELLS, EventsAndOthers, EventsOfTotal, PercentOfTotal

Reading = Count | Blank | Unreadable
Row = tuple[GroupCounts, tuple[Mark, ...]]
Table = EventsAndOthers | EventsOfTotal | PercentOfTotal


def read_table(table: Table) -> TableReading:
    """The counts of both groups in the print's order, as far as the cells give them.

    A total typed in a cell (``38/412``) fills a blank cell beside it, and has to agree with one that is not blank.
    A cell that is marked and not used gives None; everything else goes on. Nothing is ever corrected: a percentage
    that the counts do not give is marked, and the counts are used as they stand.
    """
    cells = {field: read_cell(getattr(table, field)) for field in CELLS}
    first, first_marks = _row(table, cells, "first_left_text", "first_right_text")
    second, second_marks = _row(table, cells, "second_left_text", "second_right_text")
    marks = first_marks + second_marks
    marks += _percentages(table, cells, first, second, {mark.field for mark in marks})
    marks += spaced_marks(table, cells, {mark.field for mark in marks})
    return TableReading(
        first=first, second=second, marks=tuple(sorted(marks, key=lambda mark: CELLS.index(mark.field)))
    )


def _row(table: Table, cells: dict[str, Reading], left_field: str, right_field: str) -> Row:
    """One group in its form. Where a percentage is used, its cell holds no count for the later steps."""
    if isinstance(table, EventsAndOthers):
        return _row_of_others(table, cells, left_field, right_field)
    left_text = getattr(table, left_field)
    if isinstance(table, EventsOfTotal) or holds_a_count(left_text):
        return _row_of_total(table, cells, left_field, right_field)
    cells[left_field] = Blank()
    return read_row(left_text, getattr(table, right_field), left_field, right_field)


def _row_of_others(table: Table, cells: dict[str, Reading], left_field: str, right_field: str) -> Row:
    """People with the left outcome and people with the right one."""
    left, right = cells[left_field], cells[right_field]
    marks = _unread(left_field, left) + _unread(right_field, right)
    if isinstance(left, Count) and isinstance(right, Count):
        total = left.value + right.value
        wrong = _other_totals(table, {left_field: left, right_field: right}, total)
        wrong_fields = {mark.field for mark in wrong}
        counts = GroupCounts(
            left=None if left_field in wrong_fields else left.value,
            right=None if right_field in wrong_fields else right.value,
            total=None if wrong else total,
        )
        return counts, marks + wrong
    if isinstance(left, Count):
        rest = left.total - left.value if left.total is not None and isinstance(right, Blank) else None
        return GroupCounts(left=left.value, right=rest, total=left.total), marks
    if isinstance(right, Count):
        rest = right.total - right.value if right.total is not None and isinstance(left, Blank) else None
        return GroupCounts(left=rest, right=right.value, total=right.total), marks
    return GroupCounts(), marks


def _row_of_total(table: Table, cells: dict[str, Reading], left_field: str, right_field: str) -> Row:
    """People with the left outcome, and all people of the group."""
    left, right = cells[left_field], cells[right_field]
    if isinstance(right, Count) and right.total is not None:
        right = Unreadable(key="not-a-count", facts={"text": specimen(getattr(table, right_field))})
    marks = _unread(left_field, left) + _unread(right_field, right)
    total = right.value if isinstance(right, Count) else None
    if not isinstance(left, Count):
        return GroupCounts(total=total), marks
    if isinstance(right, Blank):
        total = left.total
    if total is None:
        return GroupCounts(left=left.value), marks
    wrong = _other_totals(table, {left_field: left}, total)
    if not wrong and left.value > total:
        facts: dict[str, Fact] = {"text": specimen(getattr(table, left_field)), "events": left.value, "total": total}
        wrong = (Mark(field=left_field, key="events-above-total", facts=facts),)
    if wrong:
        return GroupCounts(total=total), marks + wrong
    return GroupCounts(left=left.value, right=total - left.value, total=total), marks


def _unread(field: str, reading: Reading) -> tuple[Mark, ...]:
    return (Mark(field=field, key=reading.key, facts=reading.facts),) if isinstance(reading, Unreadable) else ()


def _other_totals(table: Table, cells: dict[str, Count], total: int) -> tuple[Mark, ...]:
    """Marks for the cells whose own typed total is not the row's."""
    return tuple(
        Mark(
            field=field,
            key="total-disagrees",
            facts={"text": specimen(getattr(table, field)), "typed": cell.total, "total": total},
        )
        for field, cell in cells.items()
        if cell.total is not None and cell.total != total
    )


def _percentages(
    table: Table, cells: dict[str, Reading], first: GroupCounts, second: GroupCounts, marked: set[str]
) -> tuple[Mark, ...]:
    """Marks for typed percentages that the counts do not give.

    A percentage may be of the group or of the column (case-control studies print the latter). One behind a group's
    total is of something that the table does not hold, and is not looked at.
    """
    columns = {"left": _sum(first.left, second.left), "right": _sum(first.right, second.right)}
    fields = CELLS if isinstance(table, EventsAndOthers) else (CELLS[0], CELLS[2])
    marks = []
    for field in fields:
        cell = cells[field]
        group = first if field.startswith("first") else second
        wholes = (group.total, columns["left" if field.endswith("left_text") else "right"])
        if field in marked or not isinstance(cell, Count) or group.total is None or _fits(cell, wholes):
            continue
        facts: dict[str, Fact] = {
            "text": specimen(getattr(table, field)),
            "percent": cell.percent_text or "",
            "events": cell.value,
            "total": group.total,
        }
        marks.append(Mark(field=field, key="percent-disagrees", facts=facts, used=True))
    return tuple(marks)


def _fits(cell: Count, wholes: tuple[int | None, ...]) -> bool:
    """Whether the cell's percentage, if it has one, is what its count is of one of the wholes."""
    percent = printed_percent(cell.percent_text) if cell.percent_text else None
    return percent is None or any(whole is not None and rounds_to(percent, cell.value, whole) for whole in wholes)


def _sum(one: int | None, other: int | None) -> int | None:
    return None if one is None or other is None else one + other
