"""What somebody gave, in a sentence about it."""

from __future__ import annotations

import reprlib

from fourcount.wording import command as words


def shown(value: object) -> str:
    """What was given, short enough for a sentence. Python refuses to write out a whole number of great length."""
    if isinstance(value, int) and abs(value) > 10**40:
        return words.HUGE if value > 0 else words.HUGE_BELOW_ZERO
    return reprlib.repr(value)
