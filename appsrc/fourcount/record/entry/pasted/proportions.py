"""What counts give in percent, against percentages as printed."""

from __future__ import annotations

from fractions import Fraction

from fourcount.record.entry.percent import PrintedPercent, printed_percent, rounds_to
from fourcount.record.entry.tokens import Token


def gives(percent: Token, events: int, total: int) -> bool:
    """Whether so many of so many are the printed percentage."""
    if not 0 <= percent.value <= 100:
        return False
    value = Fraction(f"{percent.value:.{percent.decimals}f}")
    return rounds_to(PrintedPercent(value=value, decimals=percent.decimals), events, total)


def may_be_of(percent: Token, total: int) -> bool:
    """Whether any whole number of so many is the printed percentage."""
    least = int(percent.value * total / 100)
    return any(gives(percent, events, total) for events in (least, least + 1) if events <= total)


def nearly_gives(percent: Token, events: int, total: int) -> bool:
    """Whether so many of so many are about the printed percentage, so that it may be a slip of print."""
    return total > 0 and events <= total and abs(100 * events / total - percent.value) <= max(1.0, 0.1 * percent.value)


def beside(count: str, percent: Token) -> str:
    """A count with its percentage as a cell takes both; the count alone where no cell could hold the percentage."""
    text = percent.text if percent.text[:1].isdigit() else f"0{percent.text}"
    return f"{count} ({text}%)" if printed_percent(text) else count
