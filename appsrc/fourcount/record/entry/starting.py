"""A starting risk of other people: a risk, with limits or counts where those tell how precise it is."""

from __future__ import annotations

import re
from fractions import Fraction

from msgspec import structs

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.digits import LONGEST, plain, specimen, whole_number
from fourcount.record.entry.duration import number_in
from fourcount.record.entry.level import read_level
from fourcount.record.entry.limits import BEHIND
from fourcount.record.entry.percent import printed_percent, rounds_to
from fourcount.record.entry.readings import Blank, Count, Fact, Proportion, RiskReading, Unreadable
from fourcount.record.entry.risk import SO_MANY_IN, WITH_SIGN, read_risk
from fourcount.record.paper import USUAL_LEVEL

_COUNTED = re.compile(r"[0-9 ,']*[0-9](?: */ *| +(?:out +)?of +)[0-9 ,']*[0-9]", re.IGNORECASE)
_WITH_PERCENT = re.compile(r"(?P<counts>[^()]+?) *\( *(?P<percent>[^()]+?) *\)")
_ROUND = re.compile(r"10+")


def read_starting_risk(text: str) -> RiskReading | Blank | Unreadable:
    """``12%``, ``12% (9 to 15)``, ``12% (90% CI 9-15)``, ``24 of 200``, ``24/200 (12%)``, ``12 in 100``.

    ``24 of 200`` and ``24/200`` are counts of people. With ``in`` and ``per``, or of 10, 100, 1,000 and so on, it is a
    way of saying a risk ("12 out of 100"), which does not tell how many people were seen. What ``read_risk`` refuses
    stays refused. Limits without a sign are in the unit of the risk, and are asked about beside counts.
    """
    typed = plain(text)
    if not typed:
        return Blank()
    if len(typed) > LONGEST:
        return _unreadable("not-a-risk", text)
    bare = read_risk(typed)
    if isinstance(bare, Proportion):
        return _with_counts(typed, bare.value)
    match = _WITH_PERCENT.fullmatch(typed)
    if match and printed_percent(match["percent"]) and _COUNTED.fullmatch(match["counts"]):
        return _counts_with_percent(match, text)
    match = BEHIND.fullmatch(typed)
    if match is None:
        return _unreadable(bare.key, text) if isinstance(bare, Unreadable) else bare
    return _with_limits(match, text)


def read_share(text: str) -> Proportion | Blank | Unreadable:
    """The share of people who have the exposure, written as a risk is."""
    reading = read_risk(text)
    if not isinstance(reading, Unreadable):
        return reading
    keys = {"not-a-risk": "not-a-share", "risk-out-of-range": "share-out-of-range"}
    return Unreadable(key=keys.get(reading.key, reading.key), facts=reading.facts)


def _with_counts(typed: str, value: float) -> RiskReading:
    cell = read_cell(typed) if _COUNTED.fullmatch(typed) else Blank()
    if not isinstance(cell, Count) or cell.total is None or _ROUND.fullmatch(str(cell.total)):
        return RiskReading(value=value)
    return RiskReading(value=value, events=cell.value, total=cell.total)


def _counts_with_percent(match: re.Match[str], text: str) -> RiskReading | Unreadable:
    """Counts as a table prints them, with the percentage that they round to."""
    cell, percent = read_cell(match["counts"]), printed_percent(match["percent"])
    if not isinstance(cell, Count) or not cell.total or percent is None:
        reading = read_risk(match["counts"])
        return _unreadable(reading.key if isinstance(reading, Unreadable) else "not-limits", text)
    if not rounds_to(percent, cell.value, cell.total):
        return _unreadable("risk-unlike-percent", text, events=cell.value, total=cell.total)
    return _with_counts(match["counts"], cell.value / cell.total)


def _with_limits(match: re.Match[str], text: str) -> RiskReading | Unreadable:
    """A value and its limits; one sign, or one number above 1, says that all are percentages."""
    low, high = number_in(match["low"]), number_in(match["high"])
    level = read_level(f"{match['level']}%" if match["level"] else "")
    if low is None or high is None or isinstance(level, Unreadable):
        return _unreadable(level.key if isinstance(level, Unreadable) else "not-limits", text)
    number = _bare(match["value"])
    signed = bool(match["low_sign"] or match["high_sign"]) or (number is not None and max(number, high) > 1)
    reading = read_risk(match["value"] if number is None or not signed else f"{match['value']}%")
    if not isinstance(reading, Proportion):
        return _unreadable(reading.key if isinstance(reading, Unreadable) else "not-a-risk", text)
    said = SO_MANY_IN.fullmatch(match["value"])
    whole = whole_number(said["whole"]) if said and not signed else 100
    if said and not signed and not _ROUND.fullmatch(str(whole)):
        return _unreadable("limits-need-sign", text)
    limits = (float(low / (whole or 100)), float(high / (whole or 100)))
    if max(limits) > 1:
        return _unreadable("risk-out-of-range", text)
    if not limits[0] <= reading.value <= limits[1]:
        return _unreadable("limits-disordered", text)
    counted = _with_counts(match["value"], reading.value)
    printed = level.value if isinstance(level, Proportion) else USUAL_LEVEL
    return structs.replace(counted, low=limits[0], high=limits[1], level=printed)


def _bare(text: str) -> Fraction | None:
    """The number of a percentage, or a fraction, without a sign."""
    match = WITH_SIGN.fullmatch(text)
    return number_in(match["number"]) if match and match["sign"] is None else None


def _unreadable(key: str, text: str, **facts: Fact) -> Unreadable:
    return Unreadable(key=key, facts={"text": specimen(text), **facts})
