"""Bytes to a tree of plain JSON values, with nothing let through that a later step would not see."""

from __future__ import annotations

import json
import re
from typing import Any

from fourcount.record.entry.digits import specimen
from fourcount.record.file.refused import Place, Refused, at

LARGEST_FILE = 10_000_000
"""Bytes. Two hundred outcomes with all their texts are under one million."""

DEEPEST = 16
"""Objects and lists within one another. A record has six."""

LONGEST_NUMBER = 40
"""Digits and signs. Longer ones are no number of a record, and slow to read."""

_BYTE_ORDER_MARK = b"\xef\xbb\xbf"
_OPENS_OR_CLOSES = re.compile(r'"(?:[^"\\]|\\.)*+"?|(?P<open>[\[{])|(?P<close>[\]}])', re.DOTALL)
_HALF = re.compile("[\ud800-\udfff]")
"""Half of a character, which JSON can escape and UTF-8 cannot write, so that no type could be asked about it."""

Tree = dict[str, Any]


class _Pairs(list[tuple[str, Any]]):
    """An object's keys and values as they stand in the file, keys that stand twice as well."""


class _NoNumber:
    """What stands where JSON allows no number, or where one is too long."""


def read_tree(data: bytes) -> Tree | Refused:
    """The object in the bytes of a file."""
    if len(data) > LARGEST_FILE:
        return Refused("too-large", {"limit": LARGEST_FILE})
    text = _text(data)
    if isinstance(text, Refused):
        return text
    if not text.strip():
        return Refused("empty")
    if not text.lstrip().startswith("{"):
        return Refused("not-a-record")
    if _depth(text) > DEEPEST:
        return Refused("too-deep", {"limit": DEEPEST})
    try:
        found = json.loads(
            text,
            object_pairs_hook=_Pairs,
            parse_int=lambda digits: int(digits) if len(digits) <= LONGEST_NUMBER else _NoNumber(),
            parse_float=lambda digits: float(digits) if len(digits) <= LONGEST_NUMBER else _NoNumber(),
            parse_constant=lambda _: _NoNumber(),
        )
    except json.JSONDecodeError as error:
        if not text[error.pos :].strip() or error.msg.startswith("Unterminated string"):
            return Refused("cut-off")
        return Refused("damaged", {"line": error.lineno, "column": error.colno})
    return _with_single_keys(found, ())


def _text(data: bytes) -> str | Refused:
    """The text, without the mark that some editors put before it."""
    try:
        return data.removeprefix(_BYTE_ORDER_MARK).decode("utf-8")
    except UnicodeDecodeError as error:
        return Refused("not-text", {"line": data.count(b"\n", 0, error.start) + 1})


def _depth(text: str) -> int:
    """How deep brackets stand within one another, those in strings left out. Nothing is built for it."""
    depth = deepest = 0
    for found in _OPENS_OR_CLOSES.finditer(text):
        if found["open"]:
            depth += 1
            if depth > DEEPEST:
                return depth
            deepest = max(deepest, depth)
        elif found["close"]:
            depth -= 1
    return deepest


def _with_single_keys(pairs: _Pairs, place: Place) -> Tree | Refused:
    """The object as a dictionary; Refused where a key stands twice, or where a number is none, in it or below it."""
    tree: Tree = {}
    for key, value in pairs:
        if half := _HALF.search(key):
            return _half(half, place)
        if key in tree:
            return Refused("key-twice", {"place": at(place), "name": specimen(key)})
        plain = _plain(value, (*place, key))
        if isinstance(plain, Refused):
            return plain
        tree[key] = plain
    return tree


def _half(half: re.Match[str], place: Place) -> Refused:
    return Refused("character", {"place": at(place), "character": f"U+{ord(half[0]):04X}"})


def _plain(value: Any, place: Place) -> Any:
    if isinstance(value, str) and (half := _HALF.search(value)):
        return _half(half, place)
    if isinstance(value, _Pairs):
        return _with_single_keys(value, place)
    if isinstance(value, _NoNumber):
        return Refused("wrong-kind", {"place": at(place)})
    if not isinstance(value, list):
        return value
    plain = []
    for position, each in enumerate(value):
        found = _plain(each, (*place, position))
        if isinstance(found, Refused):
            return found
        plain.append(found)
    return plain
