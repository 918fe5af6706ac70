"""What reading a piece of text can give: a value, a blank, or a reason why not."""

from __future__ import annotations

import msgspec

Fact = str | int | float


class Blank(msgspec.Struct, frozen=True):
    """Nothing was typed."""


class Unreadable(msgspec.Struct, frozen=True, kw_only=True):
    """Text that gives no value. ``key`` names the reason, ``facts`` what a sentence about it needs.

    ``facts["text"]`` is always what was typed, cut to 40 characters.
    """

    key: str
    facts: dict[str, Fact] = {}


class Count(msgspec.Struct, frozen=True, kw_only=True):
    """A whole number of people, 0 to 10^9, with the total or the percentage typed in the same cell."""

    value: int
    total: int | None = None
    percent_text: str | None = None


class Proportion(msgspec.Struct, frozen=True, kw_only=True):
    """A risk as a fraction from 0 to 1."""

    value: float


class Mark(msgspec.Struct, frozen=True, kw_only=True):
    """A field that is marked on screen, why, and whether what it holds is still used."""

    field: str
    key: str
    facts: dict[str, Fact] = {}
    used: bool = False


class GroupCounts(msgspec.Struct, frozen=True, kw_only=True):
    """One group in the print's order: left outcome, right outcome, all. None where it is not known."""

    left: int | None = None
    right: int | None = None
    total: int | None = None


class TableReading(msgspec.Struct, frozen=True, kw_only=True):
    """A table's numbers as far as they can be read, and the marks of its cells."""

    first: GroupCounts
    second: GroupCounts
    marks: tuple[Mark, ...] = ()
