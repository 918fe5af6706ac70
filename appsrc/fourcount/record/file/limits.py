"""What a record may hold at most, and characters that it may not hold at all."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from typing import Any

import msgspec

from fourcount.record.characters import UNHELD
from fourcount.record.editing.outcomes import MOST_OUTCOMES
from fourcount.record.editing.stratum_rows import MOST_STRATA
from fourcount.record.file.refused import Place, Refused, at
from fourcount.record.outcome import Strata
from fourcount.record.paper import HIGHEST_LEVEL, LOWEST_LEVEL, Record

LONGEST_TEXT = 2_000
"""Characters."""


def beyond_limits(record: Record) -> Refused | None:
    """The first thing in a record that goes beyond what a file may hold."""
    if not LOWEST_LEVEL <= record.choices.level <= HIGHEST_LEVEL:
        return Refused("level-out-of-range", {"place": "choices.level"})
    return _number_beyond(record) or _text_beyond(record)


def beyond_numbers(fields: Mapping[str, Any]) -> Refused | None:
    """The number of outcomes in a file's fields, before anything is made of them: none, or more than a record has."""
    if "outcomes" not in fields:
        return Refused("missing-field", {"place": "", "name": "outcomes"})
    outcomes = fields["outcomes"]
    if not isinstance(outcomes, list | tuple):
        return None
    if not outcomes:
        return Refused("no-outcome", {"place": "outcomes"})
    if len(outcomes) > MOST_OUTCOMES:
        return Refused("too-many-outcomes", {"place": "outcomes", "limit": MOST_OUTCOMES})
    return None


def _number_beyond(record: Record) -> Refused | None:
    """Too many outcomes or rows of strata, or none."""
    refusal = beyond_numbers({"outcomes": record.outcomes})
    if refusal is not None:
        return refusal
    for number, outcome in enumerate(record.outcomes):
        if not isinstance(outcome.table, Strata):
            continue
        place = at(("outcomes", number, "table", "strata"))
        if not outcome.table.strata:
            return Refused("no-stratum", {"place": place})
        if len(outcome.table.strata) > MOST_STRATA:
            return Refused("too-many-strata", {"place": place, "limit": MOST_STRATA})
    return None


def _text_beyond(record: Record) -> Refused | None:
    """A text that is too long, or holds a character that none may hold."""
    for place, text in _texts(record, ()):
        if len(text) > LONGEST_TEXT:
            return Refused("too-long", {"place": at(place), "limit": LONGEST_TEXT})
        unheld = UNHELD.search(text)
        if unheld:
            return Refused("character", {"place": at(place), "character": f"U+{ord(unheld[0]):04X}"})
    return None


def _texts(held: object, place: Place) -> Iterator[tuple[Place, str]]:
    """Every text in a structure with its place."""
    if isinstance(held, str):
        yield place, held
    elif isinstance(held, msgspec.Struct):
        for name in held.__struct_fields__:
            yield from _texts(getattr(held, name), (*place, name))
    elif isinstance(held, tuple):
        for position, each in enumerate(held):
            yield from _texts(each, (*place, position))
