"""The last line of every copy: which version made it, when, and by which intervals."""

from __future__ import annotations

from datetime import date

from fourcount.record.paper import Choices
from fourcount.wording import exports, numbers


def made_with(choices: Choices, version: str, today: date) -> str:
    """``version`` and ``today`` are given by whoever asks: this room looks at no clock."""
    level = numbers.level(choices.level)
    made = exports.MADE_WITH.format(version=version, date=today.isoformat(), family=choices.family, level=level)
    return f"{made} {exports.NOT_ALL_EXACT}" if choices.family == "exact" else made
