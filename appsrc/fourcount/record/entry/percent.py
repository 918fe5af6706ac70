"""A percentage printed beside a count, and whether the count gives it."""

from __future__ import annotations

import re
from fractions import Fraction
from math import floor

import msgspec

from fourcount.record.entry.digits import plain

_PERCENT = re.compile(r"(?P<below><)? *(?P<whole>[0-9]{1,3})(?:[.,\u00b7](?P<part>[0-9]+))? *%?")


class PrintedPercent(msgspec.Struct, frozen=True, kw_only=True):
    """A percentage to the decimals printed; ``below`` for one printed as "<1%"."""

    value: Fraction
    decimals: int
    below: bool = False


def printed_percent(text: str) -> PrintedPercent | None:
    """``9.2%``, ``9,2 %``, ``9.2`` or ``<1%``, from 0 to 100; None for anything else."""
    match = _PERCENT.fullmatch(plain(text))
    if match is None:
        return None
    part = match["part"] or ""
    value = Fraction(int(match["whole"] + part), 10 ** len(part))
    if value > 100:
        return None
    return PrintedPercent(value=value, decimals=len(part), below=match["below"] is not None)


def rounds_to(percent: PrintedPercent, events: int, total: int) -> bool:
    """Whether ``events`` of ``total`` round to the printed percentage, halves up or to the even digit.

    Both ways are in use in print (common practice). Exact: no floating point. Of nobody, only 0% is right.
    """
    if total == 0:
        return percent.value == 0 and not percent.below
    exact = Fraction(100 * events, total)
    if percent.below:
        return exact < percent.value
    scale = 10**percent.decimals
    return percent.value * scale in {floor(exact * scale + Fraction(1, 2)), round(exact * scale)}
