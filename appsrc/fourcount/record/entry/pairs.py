"""The four counts of pairs, as far as the cells give them."""

from __future__ import annotations

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.digits import specimen
from fourcount.record.entry.percent import printed_percent, rounds_to
from fourcount.record.entry.readings import Blank, Count, Mark, PairsReading, Unreadable
from fourcount.record.entry.spaced import spaced_marks
from fourcount.record.outcome import CELLS, Pairs

Cells = dict[str, Count | Blank | Unreadable]


def read_pairs(table: Pairs) -> PairsReading:
    """Both, the first side only, the second side only, neither; None where a cell is blank or cannot be used.

    A count with a total of its own (``38/412``) is no count of pairs. A percentage beside a count may be of all
    pairs, of its line or of its column.
    """
    cells = {field: _cell(getattr(table, field)) for field in CELLS}
    marks = tuple(
        Mark(field=field, key=cell.key, facts=cell.facts)
        for field, cell in cells.items()
        if isinstance(cell, Unreadable)
    )
    both, first_only, second_only, neither = (
        cell.value if isinstance(cell, Count) else None for cell in cells.values()
    )
    marks += _percentages(table, cells) + spaced_marks(table, cells)
    return PairsReading(both=both, first_only=first_only, second_only=second_only, neither=neither, marks=marks)


def _cell(text: str) -> Count | Blank | Unreadable:
    cell = read_cell(text)
    if isinstance(cell, Count) and cell.total is not None:
        return Unreadable(key="not-a-count", facts={"text": specimen(text)})
    return cell


def _percentages(table: Pairs, cells: Cells) -> tuple[Mark, ...]:
    """Marks for typed percentages that the counts do not give."""
    counts = {field: cell.value for field, cell in cells.items() if isinstance(cell, Count)}
    if len(counts) < len(CELLS):
        return ()
    total = sum(counts.values())
    marks = []
    for place, field in enumerate(CELLS):
        cell = cells[field]
        percent = printed_percent(cell.percent_text) if isinstance(cell, Count) and cell.percent_text else None
        beside, below = counts[CELLS[place ^ 1]], counts[CELLS[place ^ 2]]
        wholes = (total, counts[field] + beside, counts[field] + below)
        if percent is None or any(rounds_to(percent, counts[field], whole) for whole in wholes):
            continue
        facts: dict[str, str | int | float] = {
            "text": specimen(getattr(table, field)),
            "percent": cell.percent_text or "" if isinstance(cell, Count) else "",
            "events": counts[field],
            "total": total,
        }
        marks.append(Mark(field=field, key="percent-disagrees", facts=facts, used=True))
    return tuple(marks)
