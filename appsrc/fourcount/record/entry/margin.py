"""A line of the reader's own: the smallest difference that would matter, or a margin."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.digits import LONGEST, plain, specimen, whole_number
from fourcount.record.entry.duration import NUMBER, number_in
from fourcount.record.entry.readings import Blank, Unreadable
from fourcount.record.outcome import LineScale, LineSide

LARGEST_RATIO = 10**6
_UNIT = r"%|per ?cent(?:age)?(?: ?points?)?|(?:%|percentage)[- ]points?|points?|pp"
_SIDE = r"fewer|less|lower|more|higher|greater"
_DIFFERENCE = re.compile(
    rf"(?P<sign>[+-])? *(?P<number>{NUMBER}) *(?:(?P<unit>{_UNIT}))?(?: +(?P<side>{_SIDE}))?"
    rf"(?:(?: */ *| +(?:in|per|out +of|of) +)(?P<whole>[0-9][0-9 ,']*))?(?: +(?P<side_behind>{_SIDE}))?",
    re.IGNORECASE,
)
_RATIO = re.compile(rf"(?:(?:RR|OR|HR) *=? *)?(?P<sign>-)? *(?P<number>{NUMBER})", re.IGNORECASE)
_FEWER = ("fewer", "less", "lower", "-")


def read_margin(text: str, scale: LineScale, side: LineSide) -> float | Blank | Unreadable:
    """The line as a value on its scale: a difference, index minus reference, is below 0 on the side of fewer.

    A difference is ``5 per 100``, ``5%``, ``5 points``, ``5 fewer per 100`` or ``1 in 20``; a bare number above 1 is
    so many per 100, one up to 1 is asked about. A sign or a word of its own has to agree with the side chosen. A ratio
    lies below 1 on the side of fewer and above it on the other.
    """
    typed = plain(text)
    if not typed:
        return Blank()
    if len(typed) > LONGEST:
        return _unreadable("not-a-margin" if scale == "risk_difference" else "not-a-ratio", text)
    return _difference(typed, text, side) if scale == "risk_difference" else _ratio(typed, text, side)


def _difference(typed: str, text: str, side: LineSide) -> float | Unreadable:
    match = _DIFFERENCE.fullmatch(typed)
    number = number_in(match["number"]) if match else None
    whole = whole_number(match["whole"].strip()) if match and match["whole"] else None
    if match is None or number is None or (match["whole"] and (not whole or match["unit"])):
        return _unreadable("not-a-margin", text)
    said = [word.lower() for word in (match["sign"], match["side"], match["side_behind"]) if word]
    if any((word in _FEWER) != (side == "fewer") for word in said):
        return _unreadable(f"margin-not-{side}", text)
    if whole is None and match["unit"] is None and 0 < number <= 1:
        return _unreadable("percent-or-fraction", text)
    value = number / (whole or 100)
    if value == 0:
        return _unreadable("margin-no-effect", text)
    if value > 1:
        return _unreadable("margin-out-of-range", text)
    return float(-value if side == "fewer" else value)


def _ratio(typed: str, text: str, side: LineSide) -> float | Unreadable:
    match = _RATIO.fullmatch(typed)
    number = number_in(match["number"]) if match else None
    if match is None or number is None:
        return _unreadable("not-a-ratio", text)
    if match["sign"] or number < Fraction(1, LARGEST_RATIO) or number > LARGEST_RATIO:
        return _unreadable("ratio-out-of-range", text)
    if number == 1:
        return _unreadable("margin-no-effect", text)
    if (number < 1) != (side == "fewer"):
        return _unreadable(f"ratio-not-{side}", text)
    return float(number)


def _unreadable(key: str, text: str) -> Unreadable:
    return Unreadable(key=key, facts={"text": specimen(text)})
