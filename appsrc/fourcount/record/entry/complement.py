"""The risk of the other outcome, written as the one that was typed."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.digits import decimal_number, plain, whole_number
from fourcount.record.entry.duration import number_in
from fourcount.record.entry.limits import BEHIND
from fourcount.record.entry.readings import Proportion, RiskReading
from fourcount.record.entry.risk import SO_MANY_IN, WITH_SIGN, read_risk
from fourcount.record.entry.starting import read_starting_risk

_MARK = re.compile(r"[.,\u00b7](?=[0-9]+$)")
_THOUSANDS = re.compile(r"[0-9]([ ,'])[0-9]{3}")


def complement_text(text: str) -> str:
    """``70%`` as ``30%``, ``12 in 100`` as ``88 in 100``, ``12% (9 to 15)`` as ``88% (85 to 91)``.

    The decimals stay the same, and so does text that gives no risk.
    """
    if isinstance(read_risk(text), Proportion):
        return _complement(plain(text))
    return _with_what_is_behind(plain(text)) if isinstance(read_starting_risk(text), RiskReading) else text


def _with_what_is_behind(typed: str) -> str:
    """A risk with its limits, which change places, or counts with their percentage."""
    match = BEHIND.fullmatch(typed)
    if match is None:
        counts, _, percent = typed.partition("(")
        return f"{_complement(counts.strip())} ({_complement(percent.strip(' )'))})"
    said = SO_MANY_IN.fullmatch(match["value"])
    signed = match["low_sign"] or match["high_sign"]
    whole = 100 if signed or said is None else whole_number(said["whole"]) or 100
    low, high = (_taken_from(whole, match[name]) for name in ("low", "high"))
    value = _complement(match["value"] if said or match["value"][-1] in "%t" else f"{match['value']}%")
    start, end = match.start("low"), match.end("high")
    between = typed[match.end("low") : match.start("high")]
    return f"{value}{typed[match.end('value') : start]}{high}{between}{low}{typed[end:]}"


def _taken_from(whole: int, number_text: str) -> str:
    number = number_in(number_text)
    return number_text if number is None else _written(whole - number, _decimals(number_text), number_text)


def _complement(typed: str) -> str:
    """The complement of one plain risk."""
    if match := SO_MANY_IN.fullmatch(typed):
        part, whole = match["part"], whole_number(match["whole"])
        grouped = whole_number(part)
        number = Fraction(grouped) if grouped is not None else decimal_number(part)
        if number is None or whole is None:
            return typed
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
        return typed
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
