"""A time span as a person types it: ``12 months``, ``5 years``, ``30-day``."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.digits import LONGEST, decimal_number, plain, specimen, whole_number
from fourcount.record.entry.number_words import spelled_number
from fourcount.record.entry.readings import Blank, Duration, Mark, TimeUnit, Unreadable

LONGEST_SPAN = 100.0
"""Years. No span of a patient's life is longer."""

SHORTEST = Fraction(1, 10**6)
"""Less of any unit than this is no time."""

NO_TIME = ("duration-not-above-zero", "duration-too-long")
"""Why a span that is plainly said is none in anybody's life."""

UNIT = r"(?:d(?:ays?)?|w(?:ks?|eeks?)?|mo(?:s|nths?)?|mths?|y(?:rs?|ears?)?)"
"""Units of time as they are written (common practice); a lone m may be minutes as well as months, and is none."""

NUMBER = r"[0-9][0-9 ,'.\u00b7]*?|[.\u00b7][0-9]+"

_SPAN = re.compile(
    rf"(?:(?:over|at|in|within|after|for|during|by) +)?(?P<minus>-)? *(?:(?P<number>{NUMBER})|(?P<one>an?)"
    rf"|(?P<said>[a-z]+(?:[- ][a-z]+)?)) *-? *(?P<unit>{UNIT})\.?'?(?: +(?:of +)?(?:follow-?up|treatment))?",
    re.IGNORECASE,
)
_NUMBER_ALONE = re.compile(r"[0-9][0-9 ,'.\u00b7]*")


def read_duration(text: str) -> Duration | Blank | Unreadable:
    """``12 months``, ``1.5 years``, ``30-day``, ``over 2 y``, ``six weeks``, ``a year``: one span in one unit.

    A number without its unit is asked about. Whatever says more than one span ("median 2.3 years", "1 to 5 years") is
    no span that a risk could be carried to. The decimals of a span may follow a comma.
    """
    typed = plain(text)
    if not typed:
        return Blank()
    if len(typed) > LONGEST:
        return _unreadable("not-a-duration", text)
    if _NUMBER_ALONE.fullmatch(typed):
        return _unreadable("duration-without-unit", text)
    match = _SPAN.fullmatch(typed)
    value = _value(match) if match else None
    if match is None or value is None:
        return _unreadable("not-a-duration", text)
    if match["minus"] or value < SHORTEST:
        return _unreadable("duration-not-above-zero", text)
    try:
        span = Duration(value=float(value), unit=unit_named(match["unit"]))
    except OverflowError:
        return _unreadable("duration-too-long", text)
    return span if span.years <= LONGEST_SPAN else _unreadable("duration-too-long", text)


def marks_of_study_span(text: str) -> tuple[Mark, ...]:
    """The mark of a study's own span that is no time; it is left out of every sentence.

    Words are no mistake there ("median 2 years", "inpatient stay"): they are said as typed.
    """
    reading = read_duration(text)
    if not isinstance(reading, Unreadable) or reading.key not in NO_TIME:
        return ()
    return (Mark(field="span_text", key=reading.key, facts=reading.facts),)


def unit_named(text: str) -> TimeUnit:
    """The unit that a match of ``UNIT`` names."""
    units: dict[str, TimeUnit] = {"d": "day", "w": "week", "m": "month", "y": "year"}
    return units[text[0].lower()]


def number_in(text: str) -> Fraction | None:
    """A number with thousands marks or with decimals, exactly: ``1,000``, ``1.5``, ``1,5``, ``.5``."""
    text = text.strip()
    grouped = whole_number(text)
    if grouped is not None:
        return Fraction(grouped)
    return decimal_number(text if text[:1].isdigit() else f"0{text}")


def _value(match: re.Match[str]) -> Fraction | None:
    if match["number"]:
        return number_in(match["number"])
    if match["one"]:
        return Fraction(1)
    said = match["said"].lower().split(" ")
    length, value = spelled_number(said)
    return Fraction(value) if length == len(said) else None


def _unreadable(key: str, text: str) -> Unreadable:
    return Unreadable(key=key, facts={"text": specimen(text)})
