"""A risk as a person types it: a percentage, or so many in so many."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.cell import LARGEST_COUNT
from fourcount.record.entry.digits import LONGEST, decimal_number, plain, specimen, whole_number
from fourcount.record.entry.readings import Blank, Proportion, Unreadable

WITH_SIGN = re.compile(
    r"(?P<minus>-)? *(?P<number>[0-9][0-9.,\u00b7]*|[.,][0-9]+) *(?P<sign>%|per ?cent)?", re.IGNORECASE
)
SO_MANY_IN = re.compile(
    r"(?P<part>[0-9][0-9 ,'.\u00b7]*?)(?: */ *| +(?:in|per|(?:out +)?of) +)(?P<whole>[0-9 ,']*[0-9])", re.IGNORECASE
)


def read_risk(text: str) -> Proportion | Blank | Unreadable:
    """``12%``, ``12,5 %``, ``12 in 100``, ``12/100``, ``12 of 100``, ``12 per 1,000``; a bare ``12`` is 12%.

    A bare number above 0 and up to 1 could be a percentage as well as a fraction (0.5 is a half, or one in two
    hundred), so it is not read but asked about. A bare 0 is 0 either way.
    """
    typed = plain(text)
    if not typed:
        return Blank()
    if len(typed) > LONGEST:
        return _unreadable("not-a-risk", text)
    if match := SO_MANY_IN.fullmatch(typed):
        return _in_so_many(match["part"], match["whole"], text)
    match = WITH_SIGN.fullmatch(typed)
    number = decimal_number(_with_leading_zero(match["number"])) if match else None
    if match is None or number is None:
        return _unreadable("not-a-risk", text)
    if number > 100 or (match["minus"] and number > 0):
        return _unreadable("risk-out-of-range", text)
    if match["sign"] is None and 0 < number <= 1:
        return _unreadable("percent-or-fraction", text)
    return Proportion(value=float(number / 100))


def _in_so_many(part_text: str, whole_text: str, text: str) -> Proportion | Unreadable:
    """A part of a whole; the part may have decimals ("1.5 in 1,000"), the whole is a count above 0."""
    grouped = whole_number(part_text)
    part = Fraction(grouped) if grouped is not None else decimal_number(part_text)
    whole = whole_number(whole_text)
    if part is None or not whole or whole > LARGEST_COUNT:
        return _unreadable("not-a-risk", text)
    if part > whole:
        return _unreadable("risk-out-of-range", text)
    return Proportion(value=float(part / whole))


def _with_leading_zero(number: str) -> str:
    return number if number[0].isdigit() else "0" + number


def _unreadable(key: str, text: str) -> Unreadable:
    return Unreadable(key=key, facts={"text": specimen(text)})
