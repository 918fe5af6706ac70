"""The JSON Schema in the assets: made of the types and the limits, and of one mind with what opens a file."""

from __future__ import annotations

import copy
import json
from typing import Any

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.codec import decode, encode
from fourcount.record.paper import Record
from record_files import EVERYTHING, LEAST, TREE, put
from record_schema import SCHEMA, Schema, faults, schema, written

MADE = schema()


def trees(part: Schema) -> st.SearchStrategy[Any]:
    """Whatever a part of the schema allows; a field that need not be there may be missing."""
    if "$ref" in part:
        return st.deferred(lambda: trees(MADE["$defs"][part["$ref"].rpartition("/")[2]]))
    if "anyOf" in part:
        return st.one_of(*map(trees, part["anyOf"]))
    if "const" in part or "enum" in part:
        return st.sampled_from(part.get("enum") or [part["const"]])
    if part["type"] == "object":
        fields = {name: trees(field) for name, field in part["properties"].items()}
        needed = {name: fields.pop(name) for name in part["required"]}
        return st.fixed_dictionaries(needed, optional=fields)
    if part["type"] == "array":
        return st.lists(trees(part["items"]), min_size=1, max_size=2)
    if part["type"] == "number":
        return st.floats(part["minimum"], part["maximum"])
    return st.booleans() if part["type"] == "boolean" else st.sampled_from(("", "38", "a\tb", "\u05d0\u200f", "\u00e9"))


def test_the_schema_is_that_of_the_types_and_the_limits() -> None:
    """Names, kinds, words, beginnings and numbers are all taken from them: write it anew by ``record_schema.py``."""
    assert SCHEMA.read_text(encoding="utf-8") == written(MADE)


@pytest.mark.parametrize("file", [EVERYTHING, LEAST])
def test_a_file_keeps_to_the_schema(file: Any) -> None:
    """One that holds everything, and one that leaves everything out."""
    assert faults(json.loads(file.read_bytes()), MADE, MADE) == []


@given(trees(MADE))
def test_whatever_keeps_to_the_schema_opens(tree: Any) -> None:
    """And is saved so that it keeps to it again."""
    record = decode(json.dumps(tree).encode())
    assert isinstance(record, Record)
    data = encode(record)
    assert isinstance(data, bytes)
    assert faults(json.loads(data), MADE, MADE) == []
    assert decode(data) == record


@pytest.mark.parametrize(
    ("path", "fault"),
    [
        (("fourcount_format", 2), "const"),
        (("fourcount_format", True), "const"),
        (("colour", "red"), "unknown colour"),
        (("outcomes", []), "array"),
        (("outcomes", [{}] * 201), "array"),
        (("outcomes", 0, "table", {}), "required form"),
        (("outcomes", 7, "table", "strata", [{}] * 51), "array"),
        (("outcomes", 0, "design", "rct"), "enum"),
        (("outcomes", 0, "name_text", "x" * 2001), "string"),
        (("outcomes", 0, "name_text", "a\u202eb"), "string"),
        (("outcomes", 0, "on_handout", 1), "boolean"),
        (("choices", "level", 0.5), "number"),
        (("choices", "level", "95"), "number"),
    ],
)
def test_what_breaks_the_schema_does_not_open(path: tuple[Any, ...], fault: str) -> None:
    """The schema finds the same fault as the program."""
    tree = copy.deepcopy(TREE)
    put(*path)(tree)
    assert fault in faults(tree, MADE, MADE)
    assert not isinstance(decode(json.dumps(tree).encode()), Record)
