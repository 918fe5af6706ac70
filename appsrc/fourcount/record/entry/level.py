"""A confidence level as a person types it."""

from __future__ import annotations

import re
from fractions import Fraction

from fourcount.record.entry.digits import LONGEST, decimal_number, plain, specimen
from fourcount.record.entry.readings import Blank, Proportion, Unreadable
from fourcount.record.paper import HIGHEST_LEVEL, LOWEST_LEVEL

_LEVEL = re.compile(r"(?P<minus>-)? *(?P<number>[0-9][0-9.,\u00b7]*) *(?P<sign>%|per ?cent)?", re.IGNORECASE)


def read_level(text: str) -> Proportion | Blank | Unreadable:
    """``95``, ``95%``, ``99,9 %`` or the fraction ``0.95``, from 80% to 99.9%.

    A fraction needs no question here: a level under 1% is none, so ``0.95`` can only be meant as 95%.
    """
    typed = plain(text)
    if not typed:
        return Blank()
    match = _LEVEL.fullmatch(typed) if len(typed) <= LONGEST else None
    number = decimal_number(match["number"]) if match else None
    if match is None or number is None:
        return Unreadable(key="not-a-level", facts={"text": specimen(text)})
    fraction = number if match["sign"] is None and number < 1 else number / 100
    value = float(min(fraction, Fraction(1)))
    if match["minus"] or not LOWEST_LEVEL <= value <= HIGHEST_LEVEL:
        return Unreadable(key="level-out-of-range", facts={"text": specimen(text)})
    return Proportion(value=value)
