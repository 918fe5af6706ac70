"""The table as typed, turned to index and reference group and to the counted outcome."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings import Counts, Gap, Mark, Totals
from fourcount.record.entry.readings import GroupCounts, TableReading
from fourcount.record.entry.table import read_table
from fourcount.record.outcome import EventsAndOthers, EventsOfTotal, Outcome, PercentOfTotal

FOUR_COUNTS = (EventsAndOthers, EventsOfTotal, PercentOfTotal)
_NOBODY = GroupCounts()


class ReadTable(msgspec.Struct, frozen=True, kw_only=True):
    """The four counts, or why there are none yet, with the live margins and the marks of the cells."""

    counts: Counts | Gap
    totals: Totals
    marks: tuple[Mark, ...]


def read(outcome: Outcome) -> ReadTable:
    """Read the outcome's table. A cell that gives no count outweighs one that is still empty."""
    table = outcome.table
    reading = read_table(table) if isinstance(table, FOUR_COUNTS) else TableReading(first=_NOBODY, second=_NOBODY)
    return ReadTable(counts=oriented(reading, outcome), totals=totals_of(reading), marks=reading.marks)


def oriented(reading: TableReading, outcome: Outcome) -> Counts | Gap:
    """The four counts of the index and the reference group and of the counted outcome, or why there are none yet."""
    if any(not mark.used for mark in reading.marks):
        return Gap("unreadable")
    index, reference = (
        (reading.first, reading.second) if outcome.index_group == "first" else (reading.second, reading.first)
    )
    index_pair = _events_and_others(index, outcome)
    reference_pair = _events_and_others(reference, outcome)
    if index_pair is None or reference_pair is None:
        return Gap("not-typed")
    return Counts(
        index_events=index_pair[0],
        index_non_events=index_pair[1],
        reference_events=reference_pair[0],
        reference_non_events=reference_pair[1],
    )


def _events_and_others(group: GroupCounts, outcome: Outcome) -> tuple[int, int] | None:
    if group.left is None or group.right is None:
        return None
    return (group.left, group.right) if outcome.counted == "left" else (group.right, group.left)


def totals_of(reading: TableReading) -> Totals:
    """The margins, as far as they are known."""
    first, second = _group_total(reading.first), _group_total(reading.second)
    return Totals(
        first_left=reading.first.left,
        first_right=reading.first.right,
        second_left=reading.second.left,
        second_right=reading.second.right,
        first=first,
        second=second,
        left=_sum(reading.first.left, reading.second.left),
        right=_sum(reading.first.right, reading.second.right),
        everyone=_sum(first, second),
    )


def _group_total(group: GroupCounts) -> int | None:
    return _sum(group.left, group.right) if group.total is None else group.total


def _sum(one: int | None, other: int | None) -> int | None:
    return None if one is None or other is None else one + other
