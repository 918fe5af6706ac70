"""A rate in one person over time as a person types it: ``12 per 1,000 person-years``, ``1.2% per year``."""

from __future__ import annotations

import re

from fourcount.record.entry.cell import LARGEST_COUNT
from fourcount.record.entry.digits import LONGEST, plain, specimen, whole_number
from fourcount.record.entry.duration import NUMBER, UNIT, number_in, unit_named
from fourcount.record.entry.readings import Blank, RateReading, Unreadable

_PEOPLE = (
    r"(?:(?:person|people|patient|participant|individual|subject|resident|adult|wom[ae]n|m[ae]n|child|children|infant)s?"
    r"|pt)"
)
_EVENTS = r"(?: +(?:events?|cases?|deaths?))?"
_PER = r"(?: *[/] *| +(?:per|in|a|an|each|every) +)"
_TIME = rf"(?:{_PEOPLE}[- ]+|p[- ]?)?(?P<unit>{UNIT})\.?"
_RATE = re.compile(
    rf"(?P<minus>-)? *(?P<number>{NUMBER}) *(?P<sign>%|per ?cent)?{_EVENTS}"
    rf"(?:{_PER}(?P<whole>[0-9][0-9 ,']*)(?:(?: +{_PEOPLE})?{_PER}| +)|{_PER}){_TIME}",
    re.IGNORECASE,
)
_WITHOUT_TIME = re.compile(
    rf"(?:{NUMBER}) *(?:%|per ?cent)?{_EVENTS}(?:{_PER}[0-9][0-9 ,']*(?: +{_PEOPLE})?)?", re.IGNORECASE
)


def read_rate(text: str) -> RateReading | Blank | Unreadable:
    """So many events in so much time of people: ``12 per 1,000 person-years``, ``12 in 1,000 a year``, ``0.4/month``.

    The decimals may follow a comma. A rate may be 0, and above 1 in a unit of time, as of seizures a year.
    """
    typed = plain(text)
    if not typed:
        return Blank()
    if len(typed) > LONGEST:
        return _unreadable("not-a-rate", text)
    match = _RATE.fullmatch(typed)
    number = number_in(match["number"]) if match else None
    whole = whole_number(match["whole"].strip()) if match and match["whole"] else 1
    if match is None or number is None or not whole or (match["sign"] and match["whole"]):
        return _unreadable("rate-without-time" if _WITHOUT_TIME.fullmatch(typed) else "not-a-rate", text)
    if match["minus"] and number > 0:
        return _unreadable("negative-rate", text)
    if number > LARGEST_COUNT or whole > LARGEST_COUNT:
        return Unreadable(key="too-large", facts={"text": specimen(text), "limit": LARGEST_COUNT})
    value = number / (100 if match["sign"] else whole)
    return RateReading(value=float(value), unit=unit_named(match["unit"]))


def _unreadable(key: str, text: str) -> Unreadable:
    return Unreadable(key=key, facts={"text": specimen(text)})
