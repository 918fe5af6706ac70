"""The last line of every copy: which version made it, when, and by which intervals."""

from __future__ import annotations

from datetime import date

from fourcount.record.outcome import Form
from fourcount.record.paper import Choices
from fourcount.wording import exports, numbers

FROM_PRINT: tuple[Form, ...] = ("risk-at-time", "effect-only")
"""The forms whose intervals are the print's, or are built from those."""


def made_with(choices: Choices, version: str, today: date, form: Form = "events-and-others") -> str:
    """``version`` and ``today`` are given by whoever asks: this room looks at no clock.

    ``choices`` have the level at which the intervals stand.
    """
    family = exports.PRINTED_FAMILY if form in FROM_PRINT else choices.family
    level = numbers.level(choices.level)
    made = exports.MADE_WITH.format(version=version, date=today.isoformat(), family=family, level=level)
    parts = (made, exports.POOLED_BY if form == "strata" else "", _not_exact(choices, form))
    return " ".join(part for part in parts if part)


def _not_exact(choices: Choices, form: Form) -> str:
    """What has no exact interval in the exact family."""
    if choices.family != "exact" or form in FROM_PRINT:
        return ""
    return exports.NO_EXACT_RATE_DIFFERENCE if form == "person-time" else exports.NOT_ALL_EXACT
