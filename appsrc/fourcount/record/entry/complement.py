"""The risk of the other outcome, written as the one that was typed."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.digits import decimal_number, plain, whole_number
from fourcount.record.entry.readings import Proportion
from fourcount.record.entry.risk import SO_MANY_IN, WITH_SIGN, read_risk

_MARK = re.compile(r"[.,\u00b7](?=[0-9]+$)")
_THOUSANDS = re.compile(r"[0-9]([ ,'])[0-9]{3}")


def complement_text(text: str) -> str:
    """``70%`` as ``30%``, ``12 in 100`` as ``88 in 100``, with the same decimals; text that gives no risk as it is."""
    if not isinstance(read_risk(text), Proportion):
        return text
    typed = plain(text)
    if match := SO_MANY_IN.fullmatch(typed):
        part, whole = match["part"], whole_number(match["whole"])
        grouped = whole_number(part)
        number = Fraction(grouped) if grouped is not None else decimal_number(part)
        if number is None or whole is None:
            return text
        written = _written(whole - number, 0 if grouped is not None else _decimals(part), part)
        mark = _THOUSANDS.search(match["whole"])
        if mark and grouped is not None and number != whole:
            written = f"{int(whole - number):,}".replace(",", mark[1])
        return written + typed[match.end("part") :]
    match = WITH_SIGN.fullmatch(typed)
    number = (
        decimal_number(match["number"] if match["number"][0].isdigit() else f"0{match['number']}") if match else None
    )
    if match is None or number is None:
        return text
    written = _written(100 - number, _decimals(match["number"]), match["number"])
    bare = match["sign"] is None and 0 < 100 - number <= 1
    return f"{written}%" if bare else written + typed[match.end("number") :]


def _decimals(number: str) -> int:
    mark = _MARK.search(number)
    return len(number) - mark.end() if mark else 0


def _written(number: Fraction, decimals: int, like: str) -> str:
    """A number with so many decimals, exactly, and the decimal mark of another; a point where a comma would mislead."""
    digits = f"{int(number * 10**decimals):0{decimals + 1}d}"
    if not decimals:
        return digits
    mark = _MARK.search(like)
    sign = "." if mark is None or decimals == 3 else mark[0]
    return f"{digits[:-decimals]}{sign}{digits[-decimals:]}"
