"""Text that cannot break out of its line: what a reader typed goes into letters, sheets and terminals as data."""

from __future__ import annotations

import unicodedata

# These turn the order of characters round, so that text reads as something other than what it holds.
_TURNING = frozenset("\u202a\u202b\u202c\u202d\u202e\u2066\u2067\u2068\u2069")


def one_line(text: str) -> str:
    """The text on one line, blanks drawn together, control characters as U+FFFD."""
    return " ".join("".join(_tame(character) for character in text).split())


def _tame(character: str) -> str:
    if character.isspace():
        return " "
    return "\ufffd" if character in _TURNING or unicodedata.category(character) in {"Cc", "Cs"} else character
