"""Other counts that round to the same percentages, where only these give what is printed."""

from __future__ import annotations

import math
import re
from collections.abc import Iterator
from dataclasses import replace

import msgspec

from fourcount.appraisal.check.search import AS_PRINTED, has_limits, search
from fourcount.appraisal.check.unpaired import unpaired
from fourcount.appraisal.findings import Counts
from fourcount.appraisal.findings.check import Finding
from fourcount.appraisal.table import oriented
from fourcount.record.entry.readings import GroupCounts, PrintedFigure, TableReading
from fourcount.record.entry.table import read_table
from fourcount.record.outcome import Outcome, PercentOfTotal

_MOST_TABLES = 40
_SIDES = ("first_left_text", "second_left_text")


class OtherCounts(msgspec.Struct, frozen=True, kw_only=True):
    """The counts that give the print, and what is said of them."""

    counts: Counts
    finding: Finding


def other_counts(outcome: Outcome, figures: tuple[PrintedFigure, ...]) -> OtherCounts | None:
    """The nearest counts of the same percentages from which every printed figure with limits follows; None without.

    An estimate alone has too few digits to choose counts by.
    """
    figures = tuple(figure for figure in figures if has_limits(figure) and _of_counts(figure))
    if not figures or not isinstance(outcome.table, PercentOfTotal):
        return None
    reading = read_table(outcome.table)
    for first, second in _nearest_first(reading):
        groups = (_with(reading.first, first), _with(reading.second, second))
        counts = oriented(TableReading(first=groups[0], second=groups[1]), outcome)
        if isinstance(counts, Counts) and all(_follows(figure, counts) for figure in figures):
            return OtherCounts(counts=counts, finding=_finding(reading, groups))
    return None


def _of_counts(figure: PrintedFigure) -> bool:
    """Whether a figure can be worked out from counts."""
    return not figure.adjusted and figure.measure != "hazard_ratio"


def _follows(figure: PrintedFigure, counts: Counts) -> bool:
    """Whether the figure follows as printed, by a method that is shown and needs no numpy."""
    own = tuple(
        replace(one, ways=tuple(way for way in one.ways if way.shown))
        for one in unpaired(counts, figure.measure)
        if one.named and one.as_printed and not one.heavy
    )
    hits = search(figure, own, largest=math.inf)
    return bool(hits) and hits[0].rank == AS_PRINTED


def _nearest_first(reading: TableReading) -> Iterator[tuple[int, int]]:
    """Pairs of left counts other than those taken, the nearest first."""
    taken = (reading.first.left, reading.second.left)
    if taken[0] is None or taken[1] is None:
        return
    firsts, seconds = _fitting(reading, _SIDES[0], taken[0]), _fitting(reading, _SIDES[1], taken[1])
    pairs = [(first, second) for first in firsts for second in seconds if (first, second) != taken]
    pairs.sort(key=lambda pair: (abs(pair[0] - firsts[0]) + abs(pair[1] - seconds[0]), pair))
    yield from pairs[:_MOST_TABLES]


def _fitting(reading: TableReading, field: str, taken: int) -> list[int]:
    """The counts that round to a cell's percentage, the one taken first."""
    told = next((mark for mark in reading.marks if mark.field == field and mark.key == "percent-several"), None)
    if told is None:
        return [taken]
    text = str(told.facts.get("counts", ""))
    numbers = [int(number) for number in re.findall(r"[0-9]+", text)]
    if " to " in text and len(numbers) > 1:
        numbers = list(range(max(numbers[0], taken - _MOST_TABLES), min(numbers[1], taken + _MOST_TABLES) + 1))
    return [taken, *(number for number in numbers if number != taken)]


def _with(group: GroupCounts, left: int) -> GroupCounts:
    return GroupCounts(left=left, right=None if group.total is None else group.total - left, total=group.total)


def _finding(reading: TableReading, groups: tuple[GroupCounts, GroupCounts]) -> Finding:
    facts = {
        "first": groups[0].left or 0,
        "second": groups[1].left or 0,
        "first_total": groups[0].total or 0,
        "second_total": groups[1].total or 0,
        "first_taken": reading.first.left or 0,
        "second_taken": reading.second.left or 0,
    }
    return Finding(key="other-counts", facts={**facts})
