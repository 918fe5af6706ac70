"""The small fields beside a table: people randomised and lost, and what describes clusters."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.cell import LARGEST_COUNT, read_cell
from fourcount.record.entry.digits import LONGEST, decimal_number, plain, specimen, whole_number
from fourcount.record.entry.readings import Blank, Count, Mark, Unreadable

_AMOUNT = re.compile(r"(?P<minus>-)? *(?P<number>[0-9][0-9.,\u00b7']*|[.,\u00b7][0-9]+)(?: *(?:x|\u00d7|times))?", re.I)


def read_people(text: str) -> int | Blank | Unreadable:
    """A whole number of people, as a cell takes it, with nothing beside it but a percentage."""
    cell = read_cell(text)
    if isinstance(cell, Count):
        if cell.total is None:
            return cell.value
        return Unreadable(key="not-a-count", facts={"text": specimen(text)})
    return cell


def read_amount(text: str) -> float | Blank | Unreadable:
    """A number of 0 or more, with or without decimals: ``0.05``, ``1·5``, ``2``, ``1.5 times``."""
    typed = plain(text)
    if not typed:
        return Blank()
    match = _AMOUNT.fullmatch(typed) if len(typed) <= LONGEST else None
    number = _number(match["number"]) if match else None
    if match is None or number is None:
        return Unreadable(key="not-an-amount", facts={"text": specimen(text)})
    if match["minus"] and number > 0:
        return Unreadable(key="negative-amount", facts={"text": specimen(text)})
    if number > LARGEST_COUNT:
        return Unreadable(key="too-large", facts={"text": specimen(text), "limit": LARGEST_COUNT})
    return float(number)


def marks_of_fields(readings: dict[str, object]) -> tuple[Mark, ...]:
    """The marks of the fields that hold text which gives nothing."""
    return tuple(
        Mark(field=field, key=reading.key, facts=reading.facts)
        for field, reading in readings.items()
        if isinstance(reading, Unreadable)
    )


def _number(text: str) -> Fraction | None:
    grouped = whole_number(text)
    if grouped is not None:
        return Fraction(grouped)
    return decimal_number(text if text[0].isdigit() else f"0{text}")
