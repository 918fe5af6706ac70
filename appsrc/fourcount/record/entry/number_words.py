"""Whole numbers in words, as a sentence begins with them: "thirty-two", "one hundred and four"."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.record.entry.word_list import words

_ONES = words("one two three four five six seven eight nine")
_TEENS = words("ten eleven twelve thirteen fourteen fifteen sixteen seventeen eighteen nineteen")
_TENS = words("twenty thirty forty fifty sixty seventy eighty ninety")
UNITS: dict[str, int] = {
    **{word: value for value, word in enumerate(_ONES, 1)},
    **{word: value for value, word in enumerate(_TEENS, 10)},
    **{word: 10 * value for value, word in enumerate(_TENS, 2)},
}


def spelled_number(said: Sequence[str]) -> tuple[int, int]:
    """How many of the words are a number in words, and its value; (0, 0) where none is."""
    length, value = _below_hundred(said)
    if not length:
        return 0, 0
    if value < 10 and said[length : length + 1] == ["hundred"]:
        length, value = length + 1, value * 100
        joined = 1 if said[length : length + 1] == ["and"] else 0
        more, rest = _below_hundred(said[length + joined :])
        if more:
            return length + joined + more, value + rest
    return length, value


def _below_hundred(said: Sequence[str]) -> tuple[int, int]:
    """As above, for 1 to 99, with a hyphen or a space in "thirty-two"."""
    if not said:
        return 0, 0
    tens, _, ones = said[0].partition("-")
    if tens not in UNITS:
        return 0, 0
    value = UNITS[tens]
    if ones:
        return (1, value + UNITS[ones]) if value >= 20 and UNITS.get(ones, 99) < 10 else (0, 0)
    if value >= 20 and len(said) > 1 and UNITS.get(said[1], 99) < 10:
        return 2, value + UNITS[said[1]]
    return 1, value
