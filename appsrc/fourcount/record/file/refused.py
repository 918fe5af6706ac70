"""Why bytes are no record, with the place in the file."""

from __future__ import annotations

import re
from typing import NamedTuple

from fourcount.record.entry.digits import specimen

Fact = str | int
Place = tuple[str | int, ...]


class Refused(NamedTuple):
    """A file that is not opened, or a record that is not kept. ``key`` names the reason, ``facts`` what to say of it.

    ``facts["place"]`` is a path of names and of places counted from 0, parted by dots: ``outcomes.2.name_text``. A
    ``facts["name"]`` is what a file calls something at that place, cut to 40 characters.
    """

    key: str
    facts: dict[str, Fact] = {}  # noqa: RUF012 -- never written to


REFUSALS = (
    "empty",  # no bytes
    "too-large",  # more bytes than a record has
    "not-text",  # not UTF-8, from a line on
    "damaged",  # not JSON, at a line and a column
    "cut-off",  # JSON that has no end
    "too-deep",  # objects within objects beyond anything a record holds
    "key-twice",  # one key twice in one object
    "not-a-record",  # JSON, but without the number of a format
    "newer",  # a format that only a later version knows
    "unknown-field",  # a field that no record has
    "missing-field",  # a field that every record has
    "wrong-kind",  # a number, say, where text belongs
    "unknown-word",  # a word that is none of those possible there
    "level-out-of-range",  # a confidence level that is none
    "no-outcome",  # a record without an outcome
    "too-many-outcomes",
    "no-stratum",  # strata without a row
    "too-many-strata",
    "too-long",  # a text of more characters than a record holds
    "character",  # a character that would hide in a text or turn it round
)
"""Every reason; ``wording.refusals`` has a sentence for each."""

_ERRORS = (
    ("Object contains unknown field", "unknown-field"),
    ("Object missing required field", "missing-field"),
    ("Invalid enum value", "unknown-word"),
    ("Invalid value", "unknown-word"),
)
_PATH = re.compile(r" - at `(?P<path>[^`]*)`$")
_NAME = re.compile(r"`(?P<name>[^`]*)`")
_STEP = re.compile(r"\.(?P<name>\w+)|\[(?P<place>[0-9]+)\]")


def at(place: Place) -> str:
    """A place as its path."""
    return ".".join(map(str, place))


def refused_by_types(message: str) -> Refused:
    """The refusal for what the types say of a file, which is a message with a path such as ``$.outcomes[2].design``."""
    found = _PATH.search(message)
    path = found["path"] if found else ""
    place = tuple(step["name"] or step["place"] for step in _STEP.finditer(path))
    key = next((key for beginning, key in _ERRORS if message.startswith(beginning)), "wrong-kind")
    named = _NAME.search(message) if key in ("unknown-field", "missing-field") else None
    return Refused(key, {"place": at(place), "name": specimen(named["name"])} if named else {"place": at(place)})
