"""All that a frozen thing holds."""

from __future__ import annotations

import dataclasses
from collections.abc import Iterator

import msgspec


def everything(thing: object) -> Iterator[object]:
    """The thing and all that it holds, at any depth."""
    yield thing
    if isinstance(thing, msgspec.Struct):
        parts = [getattr(thing, name) for name in thing.__struct_fields__]
    elif dataclasses.is_dataclass(thing):
        parts = [getattr(thing, field.name) for field in dataclasses.fields(thing)]
    elif isinstance(thing, dict):
        parts = list(thing.values())
    else:
        parts = list(thing) if isinstance(thing, tuple) else []
    for part in parts:
        yield from everything(part)
