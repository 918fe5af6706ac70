"""Risks at one time with the limits that a paper prints for them."""

from __future__ import annotations

import re
from fractions import Fraction

import msgspec

from fourcount.record.entry.digits import LONGEST, decimal_number, plain, specimen, whole_number
from fourcount.record.entry.level import read_level
from fourcount.record.entry.readings import Mark, PrintedRisk, Proportion, RiskAtTimeReading, Unreadable
from fourcount.record.outcome import RiskAtTime
from fourcount.record.paper import USUAL_LEVEL

_NUMBER = r"(?:[0-9][0-9]*(?:[.,\u00b7][0-9]+)?|[.,\u00b7][0-9]+)"
_SIGN = r"(?: *(?P<{}>%|per ?cent))?"
_RISK = (
    rf"(?P<risk>{_NUMBER}){_SIGN.format('risk_sign')}(?: */ *(?P<slash>[0-9 ,']+)| +(?:in|per|of) +(?P<in>[0-9 ,']+))?"
)
_BOTH = (
    rf"\(? *(?:[0-9.]+ *% *CI *[:,;]? *)?(?P<low>{_NUMBER}){_SIGN.format('low_sign')} *(?:-| to |,| and |;) *"
    rf"(?P<high>{_NUMBER}){_SIGN.format('high_sign')} *\)?"
)
_RISK_ALONE = re.compile(_RISK, re.IGNORECASE)
_LIMITS_ALONE = re.compile(r"\[? *" + _BOTH + r" *\]?", re.IGNORECASE)
_TOGETHER = re.compile(_RISK + r" *[,;]? *\[? *" + _BOTH + r" *\]?", re.IGNORECASE)


class Written(msgspec.Struct, frozen=True, kw_only=True):
    """Numbers as written in one group: a risk, its limits, whether a percent sign stands there, and so many in what."""

    risk: Fraction | None = None
    limits: tuple[Fraction, Fraction] | None = None
    percent: bool = False
    whole: int | None = None


def read_risk_at_time(table: RiskAtTime) -> RiskAtTimeReading:
    """Both groups' risks and limits as fractions; None where a cell is blank or cannot be used.

    ``9%`` with ``6 to 12``, or ``9% (6 to 12)`` in the left cell alone. One percent sign in a group speaks for all
    its numbers, and so does one number above 1; where there is neither, the group is asked about as a typed risk is.
    """
    first, first_marks = _row(table, "first_left_text", "first_right_text")
    second, second_marks = _row(table, "second_left_text", "second_right_text")
    marks = first_marks + second_marks
    level = read_level(table.limits_level_text)
    if isinstance(level, Unreadable):
        marks += (Mark(field="limits_level_text", key=level.key, facts=level.facts),)
    value = level.value if isinstance(level, Proportion) else USUAL_LEVEL
    return RiskAtTimeReading(first=first, second=second, level=value, marks=marks)


def _row(table: RiskAtTime, left_field: str, right_field: str) -> tuple[PrintedRisk, tuple[Mark, ...]]:
    left_text, right_text = getattr(table, left_field), getattr(table, right_field)
    left, right = _left(left_text), _right(right_text)
    if isinstance(left, str) or isinstance(right, str):
        marks = [
            Mark(field=field, key=reading, facts={"text": specimen(text)})
            for field, reading, text in ((left_field, left, left_text), (right_field, right, right_text))
            if isinstance(reading, str)
        ]
        return PrintedRisk(), tuple(marks)
    limits = left.limits if right.limits is None else right.limits
    percent, whole = left.percent or right.percent, left.whole
    numbers = [number for number in (left.risk, *(limits or ())) if number is not None]
    if not numbers:
        return PrintedRisk(), ()
    key = _wrong(numbers, percent, whole)
    if key is None and limits and not limits[0] <= (limits[0] if left.risk is None else left.risk) <= limits[1]:
        key = "limits-disordered"
    if key is not None:
        field, text = (
            (right_field, right_text) if key == "limits-disordered" and right.limits else (left_field, left_text)
        )
        return PrintedRisk(), (Mark(field=field, key=key, facts={"text": specimen(text)}),)
    unit = whole or 100
    risk, (low, high) = left.risk, limits or (None, None)
    values = (None if number is None else float(number / unit) for number in (risk, low, high))
    return PrintedRisk(**dict(zip(("risk", "low", "high"), values, strict=True))), ()


def _wrong(numbers: list[Fraction], percent: bool, whole: int | None) -> str | None:
    """Why a group's numbers are no risks, by key."""
    if max(numbers) > (whole or 100):
        return "risk-out-of-range"
    if whole is None and not percent and 0 < max(numbers) <= 1:
        return "percent-or-fraction"
    return None


def _left(text: str) -> Written | str:
    """A risk with or without its limits, a blank, or the key of what is wrong."""
    typed = plain(text)
    if not typed:
        return Written()
    match = _RISK_ALONE.fullmatch(typed) or _TOGETHER.fullmatch(typed) if len(typed) <= LONGEST else None
    risk = _number(match["risk"]) if match else None
    whole_text = (match["slash"] or match["in"]) if match else None
    whole = whole_number(whole_text.strip()) if whole_text else None
    if match is None or risk is None or (whole_text and not whole):
        return "not-a-risk"
    found = match.groupdict()
    limits = _limits(found.get("low"), found.get("high"))
    if found.get("low") and limits is None:
        return "not-limits"
    return Written(risk=risk, limits=limits, percent=_signed(found), whole=whole)


def _right(text: str) -> Written | str:
    """Limits, a blank, or the key of what is wrong."""
    typed = plain(text)
    if not typed:
        return Written()
    match = _LIMITS_ALONE.fullmatch(typed) if len(typed) <= LONGEST else None
    limits = _limits(match["low"], match["high"]) if match else None
    if match is None or limits is None:
        return "not-limits"
    return Written(limits=limits, percent=_signed(match.groupdict()))


def _signed(found: dict[str, str | None]) -> bool:
    return any(found.get(name) for name in ("risk_sign", "low_sign", "high_sign"))


def _limits(low_text: str | None, high_text: str | None) -> tuple[Fraction, Fraction] | None:
    low, high = (_number(text) if text else None for text in (low_text, high_text))
    return None if low is None or high is None else (low, high)


def _number(text: str) -> Fraction | None:
    return decimal_number(text if text[0].isdigit() else f"0{text}")
