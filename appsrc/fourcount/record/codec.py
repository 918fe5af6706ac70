"""A record as the bytes of its file, and back.

A file is a JSON object in UTF-8, the number of its format first. Every field is written, so that no default of a later
version can change what an old file says, and always in one order, so that an equal record is an equal file. Whatever
is not certainly a record is refused with the place where it is not; nothing is repaired or left out in silence.
"""

from __future__ import annotations

import msgspec

from fourcount.record.editing.outcomes import MOST_OUTCOMES
from fourcount.record.editing.stratum_rows import MOST_STRATA
from fourcount.record.file.limits import beyond_limits, beyond_numbers
from fourcount.record.file.reading import LARGEST_FILE, read_tree
from fourcount.record.file.refused import Refused, refused_by_types
from fourcount.record.file.upgrades import FORMAT, FORMAT_KEY, upgraded
from fourcount.record.paper import Record

__all__ = ["FORMAT", "LARGEST_FILE", "MOST_OUTCOMES", "MOST_STRATA", "Refused", "decode", "encode"]


def encode(record: Record) -> bytes | Refused:
    """The bytes of a file, which ``decode`` gives the same record for; Refused where the record goes beyond the limits.

    A text may be longer than a file holds, since typing never stops at a limit: then the place is named, and nothing
    is cut.
    """
    refusal = beyond_limits(record)
    if refusal is not None:
        return refusal
    fields = msgspec.json.encode(record)
    data = msgspec.json.format(f'{{"{FORMAT_KEY}":{FORMAT},'.encode() + fields[1:], indent=2) + b"\n"
    return data if len(data) <= LARGEST_FILE else Refused("too-large", {"limit": LARGEST_FILE})


def decode(data: bytes) -> Record | Refused:
    """The record in the bytes of a file, whatever the bytes are; Refused with the first thing that is wrong.

    Asked in this order: size, UTF-8, JSON, depth, keys that stand twice, the format's number, the steps from an older
    format to this one, names and kinds of all fields, limits and characters.
    """
    tree = read_tree(data)
    if isinstance(tree, Refused):
        return tree
    fields = upgraded(tree)
    if isinstance(fields, Refused):
        return fields
    refusal = beyond_numbers(fields)
    if refusal is not None:
        return refusal
    try:
        record = msgspec.convert(fields, Record)
    except msgspec.ValidationError as error:
        return refused_by_types(str(error))
    return beyond_limits(record) or record
