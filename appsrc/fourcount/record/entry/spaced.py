"""Counts that an ordinary space parts: they are used, and it is said as what."""

from __future__ import annotations

from collections.abc import Container, Mapping

import msgspec

from fourcount.record.entry.cell import spaced_number
from fourcount.record.entry.digits import specimen
from fourcount.record.entry.readings import Blank, Count, Mark, Unreadable


def spaced_marks(
    table: msgspec.Struct, cells: Mapping[str, Count | Blank | Unreadable], marked: Container[str] = ()
) -> tuple[Mark, ...]:
    """A mark for every readable cell, not marked yet, whose count stands in two parts."""
    marks = []
    for field, cell in cells.items():
        text = getattr(table, field)
        value = spaced_number(text) if isinstance(cell, Count) and field not in marked else None
        if value is not None:
            marks.append(Mark(field=field, key="read-as", facts={"text": specimen(text), "value": value}, used=True))
    return tuple(marks)
