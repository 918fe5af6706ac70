"""One cell of the table: a count of people, with what may stand beside it in print."""

from __future__ import annotations

import re

from fourcount.record.entry.digits import LONGEST, plain, specimen, whole_number
from fourcount.record.entry.percent import printed_percent
from fourcount.record.entry.readings import Blank, Count, Fact, Unreadable

LARGEST_COUNT = 10**9

_CELL = re.compile(
    r"(?P<count>[0-9 ,']*[0-9])"
    r"(?:(?: */ *| +(?:out +)?of +)(?P<total>[0-9 ,']*[0-9]))?"
    r"(?: *\( *(?P<percent>[^()]+?) *\))?",
    re.IGNORECASE,
)
_SPACED = re.compile(r"\d{1,3}(?: \d{3})+")
_NEGATIVE = re.compile(r"- ?[0-9.][0-9.,' ]*")
_POINTED = re.compile(r"[1-9][0-9]{0,2}(?:\.[0-9]{3})+")
_TWO_COUNTS = re.compile(r"[0-9]+[,;]?[ \t]+[0-9]+|[0-9]+;[0-9]+")
_DECIMAL = re.compile(r"[0-9]*[.,\u00b7][0-9]+")


def read_cell(text: str) -> Count | Blank | Unreadable:
    """A count as typed or pasted: ``38``, ``1,204``, ``38/412``, ``38 of 412``, ``38 (9.2%)``, ``38/412 (9.2%)``.

    Thousands marks are commas, spaces and apostrophes, one kind in a number and only before groups of three. A point
    is always a decimal point, so ``1.204`` is no count, and so is ``1,20``; two counts (``38, 374``) are not one. A
    percentage may stand in brackets with or without its sign, as columns headed "n (%)" print it; it is kept as text
    and never used as a number. Nothing else may follow: a footnote mark (``38*``) makes the cell unreadable, since it
    might be a digit of the print.
    """
    cell = plain(text)
    if not cell:
        return Blank()
    match = _CELL.fullmatch(cell) if len(cell) <= LONGEST else None
    if match is None:
        return _unreadable(_reason(cell), text)
    count = whole_number(match["count"])
    total = whole_number(match["total"]) if match["total"] else None
    percent = match["percent"]
    if count is None or (match["total"] and total is None) or (percent and printed_percent(percent) is None):
        return _unreadable(_reason(cell), text)
    if max(count, total or 0) > LARGEST_COUNT:
        return _unreadable("too-large", text)
    if total is not None and count > total:
        return _unreadable("events-above-total", text, events=count, total=total)
    return Count(value=count, total=total, percent_text=percent)


def _reason(cell: str) -> str:
    """Why a text that is no count is none."""
    if len(cell) > LONGEST:
        return "too-large" if cell.isdecimal() and cell[0] != "0" else "not-a-count"
    if _NEGATIVE.fullmatch(cell):
        return "negative"
    if _POINTED.fullmatch(cell):
        return "point-in-thousands"
    if _TWO_COUNTS.fullmatch(cell):
        return "two-counts"
    return "decimal" if _DECIMAL.fullmatch(cell) else "not-a-count"


def _unreadable(key: str, text: str, **facts: Fact) -> Unreadable:
    if key == "too-large":
        facts["limit"] = LARGEST_COUNT
    if key == "point-in-thousands":
        facts["comma"] = plain(text).replace(".", ",")
    return Unreadable(key=key, facts={"text": specimen(text), **facts})


def spaced_number(text: str) -> int | None:
    """The number that a readable cell parts with an ordinary space, ``38 374``; None where no number is parted so.

    Print parts thousands with narrower or no-break spaces. A space bar's own space may as well part two counts that
    were typed or pasted into one cell, so whoever reads the cell says how it was taken.
    """
    match = _SPACED.search(text)
    return int(match[0].replace(" ", "")) if match else None
