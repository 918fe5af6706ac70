"""Events and person-time of two groups."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.digits import LONGEST, decimal_number, plain, specimen, whole_number
from fourcount.record.entry.readings import Blank, Count, GroupRate, Mark, PersonTimeReading, Unreadable
from fourcount.record.entry.spaced import spaced_marks
from fourcount.record.outcome import PersonTime

LARGEST_TIME = 10**12

_NUMBER = r"[0-9][0-9 ,']*(?:[.\u00b7][0-9]+)?"
_TIME = re.compile(rf"(?P<number>{_NUMBER})(?: *(?P<unit>[^\W\d][^\d]*))?")
_EVENTS_IN = re.compile(rf"(?P<events>[0-9][0-9 ,']*?)(?: */ *| +(?:in|per|over|of|during) +)(?P<time>{_NUMBER}.*)")

Time = tuple[float, str]


def read_person_time(table: PersonTime) -> PersonTimeReading:
    """Events and person-time of both groups; None where a cell is blank or cannot be used.

    Person-time may have decimals after a point and its unit behind it (``4,120 person-years``). A left cell may hold
    both (``38 in 4,120``) and then fills a blank cell beside it. The unit is the one typed for the table, else the
    one that stands in a cell. A time of 0 is a number like any other here.
    """
    first, first_unit, first_marks = _row(table, "first_left_text", "first_right_text")
    second, second_unit, second_marks = _row(table, "second_left_text", "second_right_text")
    unit = " ".join(table.unit_text.split()) or first_unit or second_unit
    marks = first_marks + second_marks
    if not unit_agrees(first_unit, second_unit):
        facts: dict[str, str | int | float] = {"text": specimen(table.second_right_text), "unit": first_unit}
        marks += (Mark(field="second_right_text", key="units-differ", facts=facts),)
    return PersonTimeReading(first=first, second=second, unit=unit, marks=marks)


def unit_agrees(one: str, other: str) -> bool:
    """Whether two units typed in cells may be one: equal but for case, dots and a last s, or one of them missing."""
    names = {re.sub(r"[\W_]+", " ", unit).strip().casefold().removesuffix("s") for unit in (one, other) if unit}
    return len(names) <= 1


def read_time(text: str) -> Time | Blank | Unreadable:
    """An amount of person-time and the unit behind it, if any."""
    typed = plain(text)
    if not typed:
        return Blank()
    match = _TIME.fullmatch(typed) if len(typed) <= LONGEST else None
    number = _amount(match["number"]) if match else None
    if match is None or number is None:
        key = "negative-time" if typed.startswith("-") else "not-a-time"
        return Unreadable(key=key, facts={"text": specimen(text)})
    if number > LARGEST_TIME:
        return Unreadable(key="too-large", facts={"text": specimen(text), "limit": LARGEST_TIME})
    return float(number), (match["unit"] or "").strip()


def _row(table: PersonTime, left_field: str, right_field: str) -> tuple[GroupRate, str, tuple[Mark, ...]]:
    left_text, right_text = getattr(table, left_field), getattr(table, right_field)
    time = read_time(right_text)
    match = _EVENTS_IN.fullmatch(plain(left_text))
    own = read_time(match["time"]) if match else Blank()
    events = read_cell(match["events"] if match and isinstance(own, tuple) else left_text)
    marks: tuple[Mark, ...] = ()
    if isinstance(events, Count) and (events.total is not None or events.percent_text is not None):
        events = Unreadable(key="not-a-count", facts={"text": specimen(left_text)})
    if isinstance(own, tuple) and isinstance(time, Blank):
        time = own
    elif isinstance(own, tuple) and isinstance(time, tuple) and own[0] != time[0]:
        facts: dict[str, str | int | float] = {"text": specimen(left_text), "typed": own[0], "total": time[0]}
        marks += (Mark(field=left_field, key="time-disagrees", facts=facts),)
    for field, reading in ((left_field, events), (right_field, time)):
        if isinstance(reading, Unreadable):
            marks += (Mark(field=field, key=reading.key, facts=reading.facts),)
    if not marks and not match:
        marks += spaced_marks(table, {left_field: events})
    rate = GroupRate(
        events=events.value if isinstance(events, Count) else None,
        time=time[0] if isinstance(time, tuple) else None,
    )
    return rate, time[1] if isinstance(time, tuple) else "", marks


def _amount(text: str) -> Fraction | None:
    """A number whose decimals follow a point; commas, spaces and apostrophes part thousands."""
    match = re.fullmatch(r"(?P<whole>[0-9 ,']+?) *(?:[.\u00b7](?P<part>[0-9]+))?", text.strip())
    whole = whole_number(match["whole"]) if match else None
    if match is None or whole is None:
        return None
    part = decimal_number(f"0.{match['part']}") if match["part"] else Fraction(0)
    return None if part is None else whole + part
