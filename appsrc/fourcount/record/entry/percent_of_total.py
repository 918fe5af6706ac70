"""A percentage of a total, turned into the whole number of people that it stands for."""

from __future__ import annotations

import re
from fractions import Fraction
from math import ceil, floor

import msgspec

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.digits import LONGEST, plain, specimen
from fourcount.record.entry.percent import PrintedPercent, printed_percent, rounds_to
from fourcount.record.entry.readings import Blank, Count, Fact, GroupCounts, Mark, Unreadable
from fourcount.record.entry.risk import read_risk

_OF_TOTAL = re.compile(r"(?P<percent>.+?)(?: *\(| *%? +(?:out +)?of +)(?:n *= *)?(?P<total>[0-9][0-9 ,']*)\)?")
_MOST_DECIMALS = 13
_SHOWN = 4
"""As many fitting counts as this are written out; more are told by the first and the last."""


class Fitting(msgspec.Struct, frozen=True, kw_only=True):
    """The whole numbers of people that round to a percentage (``low`` to ``high``, or none), and the one taken."""

    taken: int
    low: int | None = None
    high: int | None = None

    @property
    def several(self) -> bool:
        return self.low is not None and self.low != self.high


def fitting_counts(percent: PrintedPercent, total: int) -> Fitting:
    """Which counts of ``total`` round to the percentage, halves up or to the even digit, and the nearest of them.

    Where none does, the count nearest the percentage is taken; ties go to the smaller.
    """
    exact = percent.value * total / 100
    half = Fraction(1, 2 * 10**percent.decimals) * total / 100
    least, most = max(0, ceil(exact - half)), min(total, floor(exact + half))
    while least <= most and not rounds_to(percent, least, total):
        least += 1
    while least <= most and not rounds_to(percent, most, total):
        most -= 1
    nearest = ceil(exact - Fraction(1, 2))
    if least > most:
        return Fitting(taken=min(max(nearest, 0), total))
    return Fitting(taken=min(max(nearest, least), most), low=least, high=most)


def read_row(
    left_text: str, right_text: str, left_field: str, right_field: str
) -> tuple[GroupCounts, tuple[Mark, ...]]:
    """One group: its counts, and the marks of its cells. A total beside the percentage fills a blank right cell."""
    right = read_cell(right_text)
    if isinstance(right, Count) and right.total is not None:
        right = Unreadable(key="not-a-count", facts={"text": specimen(right_text)})
    marks: tuple[Mark, ...] = ()
    if isinstance(right, Unreadable):
        marks = (Mark(field=right_field, key=right.key, facts=right.facts),)
    total = right.value if isinstance(right, Count) else None
    percent_text, own_total = _parted(left_text)
    if own_total is not None and total is not None and own_total != total:
        facts: dict[str, Fact] = {"text": specimen(left_text), "typed": own_total, "total": total}
        return GroupCounts(total=total), (*marks, Mark(field=left_field, key="total-disagrees", facts=facts))
    if own_total is not None and isinstance(right, Blank):
        total = own_total
    percent = _percent(percent_text, left_text)
    if isinstance(percent, Unreadable):
        marks = (*marks, Mark(field=left_field, key=percent.key, facts=percent.facts))
        return GroupCounts(total=total), marks
    if isinstance(percent, Blank) or total is None:
        return GroupCounts(total=total), marks
    fitting = fitting_counts(percent, total)
    counts = GroupCounts(left=fitting.taken, right=total - fitting.taken, total=total)
    return counts, marks + _said(fitting, total, left_text, left_field)


def holds_a_count(text: str) -> bool:
    """Whether a left cell gives a count of people beside its percentage or total, rather than a percentage alone."""
    cell = read_cell(text)
    return isinstance(cell, Count) and (cell.total is not None or cell.percent_text is not None)


def _parted(text: str) -> tuple[str, int | None]:
    """The percentage and the total of one cell, where both stand there."""
    typed = plain(text)
    match = _OF_TOTAL.fullmatch(typed) if len(typed) <= LONGEST else None
    total = read_cell(match["total"]) if match else None
    if match is None or not isinstance(total, Count) or printed_percent(match["percent"]) is None:
        return text, None
    return match["percent"], total.value


def _percent(text: str, typed: str) -> PrintedPercent | Blank | Unreadable:
    written = plain(text)
    if not written:
        return Blank()
    percent = printed_percent(f"0{written}" if written[0] in ".,\u00b7" else written)
    if percent is not None and not percent.below:
        return percent
    reading = read_risk(text)
    beyond = isinstance(reading, Unreadable) and reading.key == "risk-out-of-range"
    key = "percent-below" if percent is not None else "risk-out-of-range" if beyond else "not-a-percent"
    return Unreadable(key=key, facts={"text": specimen(typed)})


def _said(fitting: Fitting, total: int, text: str, field: str) -> tuple[Mark, ...]:
    """What is said where not exactly one count fits."""
    facts: dict[str, Fact] = {"text": specimen(text), "total": total, "value": fitting.taken}
    if fitting.low is None or fitting.high is None:
        return (Mark(field=field, key="percent-none", facts=facts, used=True),)
    if not fitting.several:
        return ()
    shown = fitting.high - fitting.low < _SHOWN
    counts = ", ".join(map(str, range(fitting.low, fitting.high + 1))) if shown else f"{fitting.low} to {fitting.high}"
    return (Mark(field=field, key="percent-several", facts={**facts, "counts": counts}, used=True),)


def written_percent(events: int, total: int) -> str:
    """A percentage with as few decimals, one at least, as let this count alone round to it."""
    for decimals in range(1, _MOST_DECIMALS):
        scaled = floor(Fraction(100 * events * 10**decimals, total or 1) + Fraction(1, 2))
        percent = PrintedPercent(value=Fraction(scaled, 10**decimals), decimals=decimals)
        fitting = fitting_counts(percent, total)
        if fitting.low == fitting.high == events:
            break
    digits = f"{scaled:0{decimals + 1}d}"
    return f"{digits[:-decimals]}.{digits[-decimals:]}%"
