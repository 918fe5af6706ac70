"""Whatever is not certainly a record is refused, with its reason and its place."""

from __future__ import annotations

import json
from collections.abc import Callable
from typing import Any

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.codec import LARGEST_FILE, Refused, decode, encode
from fourcount.record.file.limits import LONGEST_TEXT
from fourcount.record.file.refused import REFUSALS
from fourcount.record.outcome import Outcome, Strata, Stratum
from fourcount.record.paper import Choices, Record
from record_files import EVERYTHING, Tree, file_with, put

DAMAGED: list[tuple[str, bytes, dict[str, Any]]] = [
    ("empty", b"", {}),
    ("empty", b" \n", {}),
    ("too-large", b" " * (LARGEST_FILE + 1), {"limit": LARGEST_FILE}),
    ("not-text", b'{\n"title_text": "\xff"}', {"line": 2}),
    ("not-text", '{"fourcount_format": 1}'.encode("utf-16"), {"line": 1}),
    ("damaged", b'{"fourcount_format": 1,\n  design: 2}', {"line": 2, "column": 3}),
    ("damaged", EVERYTHING.read_bytes() + b"{}", {}),
    ("damaged", b'{"a": "\x00"}', {"line": 1, "column": 8}),
    ("cut-off", EVERYTHING.read_bytes()[:1000], {}),
    ("cut-off", EVERYTHING.read_bytes().rstrip()[:-1], {}),
    ("too-deep", b'{"a":' * 100_000, {"limit": 16}),
    ("too-deep", b'{"a":' + b"[" * 3_000_000, {"limit": 16}),
    ("not-a-record", b"[" * 3_000_000, {}),
    ("not-a-record", b"null", {}),
    ("not-a-record", b'"fourcount_format"', {}),
    ("not-a-record", b"<html>", {}),
    ("not-a-record", b"{}", {}),
    ("not-a-record", b'{"format": 1, "outcomes": []}', {}),
    ("not-a-record", b'{"fourcount_format": true, "outcomes": [{}]}', {}),
    ("not-a-record", b'{"fourcount_format": "1", "outcomes": [{}]}', {}),
    ("not-a-record", b'{"fourcount_format": 1.0, "outcomes": [{}]}', {}),
    ("not-a-record", b'{"fourcount_format": 0, "outcomes": [{}]}', {}),
    ("newer", b'{"fourcount_format": 2, "anything": []}', {"number": 2, "newest": 1}),
    ("newer", b'{"fourcount_format": ' + b"9" * 30 + b"}", {"number": 10**9, "newest": 1}),
    ("wrong-kind", b'{"fourcount_format": ' + b"9" * 5_000 + b"}", {"place": "fourcount_format"}),
    ("key-twice", b'{"fourcount_format": 1, "outcomes": [{}], "outcomes": [{}]}', {"place": "", "name": "outcomes"}),
    (
        "key-twice",
        b'{"fourcount_format": 1, "outcomes": [{}, {"design": "trial", "\\u0064esign": "cohort"}]}',
        {"place": "outcomes.1", "name": "design"},
    ),
    ("missing-field", b'{"fourcount_format": 1}', {"place": "", "name": "outcomes"}),
]

CHANGED: list[tuple[str, Callable[[Tree], None], dict[str, Any]]] = [
    ("unknown-field", put("outcomes", 2, "colour", "red"), {"place": "outcomes.2", "name": "colour"}),
    ("unknown-field", put("colour", "red"), {"place": "", "name": "colour"}),
    ("unknown-field", put("outcomes", 1, "patient", "age", 81), {"place": "outcomes.1.patient", "name": "age"}),
    ("unknown-field", put("outcomes", 0, "table", "unit_text", ""), {"place": "outcomes.0.table", "name": "unit_text"}),
    ("missing-field", put("outcomes", 1, "table", {}), {"place": "outcomes.1.table", "name": "form"}),
    ("wrong-kind", put("outcomes", 1, "table", "first_left_text", 38), {"place": "outcomes.1.table.first_left_text"}),
    ("wrong-kind", put("outcomes", 1, "on_handout", 1), {"place": "outcomes.1.on_handout"}),
    ("wrong-kind", put("outcomes", 1, None), {"place": "outcomes.1"}),
    ("wrong-kind", put("outcomes", {}), {"place": "outcomes"}),
    ("wrong-kind", put("choices", "level", "95"), {"place": "choices.level"}),
    ("wrong-kind", put("choices", "level", True), {"place": "choices.level"}),
    ("wrong-kind", put("choices", "level", float("nan")), {"place": "choices.level"}),
    ("unknown-word", put("outcomes", 1, "design", "rct"), {"place": "outcomes.1.design"}),
    ("unknown-word", put("outcomes", 1, "table", "form", "cells"), {"place": "outcomes.1.table.form"}),
    ("unknown-word", put("choices", "family", "wald"), {"place": "choices.family"}),
    ("level-out-of-range", put("choices", "level", 95), {"place": "choices.level"}),
    ("level-out-of-range", put("choices", "level", 0.9991), {"place": "choices.level"}),
    ("no-outcome", put("outcomes", []), {"place": "outcomes"}),
    ("too-many-outcomes", put("outcomes", [{}] * 201), {"place": "outcomes", "limit": 200}),
    ("no-stratum", put("outcomes", 7, "table", "strata", []), {"place": "outcomes.7.table.strata"}),
    ("too-many-strata", put("outcomes", 7, "table", "strata", [{}] * 51), {"place": "outcomes.7.table.strata"}),
    ("too-long", put("outcomes", 7, "line_text", "x" * 2_001), {"place": "outcomes.7.line_text", "limit": 2_000}),
    (
        "too-long",
        put("outcomes", 7, "table", "strata", 1, "label_text", "x" * 2_001),
        {"place": "outcomes.7.table.strata.1.label_text"},
    ),
    ("character", put("title_text", "a\u202eb"), {"place": "title_text", "character": "U+202E"}),
    ("character", put("title_text", "a\x00b"), {"place": "title_text", "character": "U+0000"}),
    ("character", put("outcomes", 0, "design", "\ud800"), {"place": "outcomes.0.design", "character": "U+D800"}),
    ("character", put("outcomes", 0, "a\udfff", "x"), {"place": "outcomes.0", "character": "U+DFFF"}),
    (
        "character",
        put("outcomes", 0, "patient", "rate_text", "\ud800"),
        {"place": "outcomes.0.patient.rate_text", "character": "U+D800"},
    ),
]


def numbered(table: list[tuple[str, Any, Any]]) -> list[str]:
    """A short name for each row; some are megabytes long."""
    return [f"{row[0]}-{place}" for place, row in enumerate(table)]


@pytest.mark.parametrize(("key", "data", "facts"), DAMAGED, ids=numbered(DAMAGED))
def test_bytes_that_are_no_record_are_refused(key: str, data: bytes, facts: dict[str, Any]) -> None:
    """Each with its own reason, and with the line where there is one."""
    refused = decode(data)
    assert isinstance(refused, Refused)
    assert refused.key == key
    assert facts.items() <= refused.facts.items()


@pytest.mark.parametrize(("key", "change", "facts"), CHANGED, ids=numbered(CHANGED))
def test_one_thing_wrong_is_found_where_it_is(key: str, change: Callable[[Tree], None], facts: dict[str, Any]) -> None:
    """Nothing is repaired, dropped or overlooked in a file that is right but for one place."""
    refused = decode(file_with(change))
    assert isinstance(refused, Refused)
    assert refused.key == key
    assert facts.items() <= refused.facts.items()


def test_every_reason_to_refuse_has_been_seen() -> None:
    """The tables above leave none out."""
    assert {key for key, _, _ in DAMAGED} | {key for key, _, _ in CHANGED} == set(REFUSALS)


@pytest.mark.parametrize(
    ("record", "key", "place"),
    [
        pytest.param(Record(source_text="x" * 2_001), "too-long", "source_text", id="too-long"),
        (Record(title_text="\x00"), "character", "title_text"),
        pytest.param(Record(outcomes=(Outcome(),) * 201), "too-many-outcomes", "outcomes", id="too-many"),
        (Record(outcomes=()), "no-outcome", "outcomes"),
        (Record(choices=Choices(level=0.5)), "level-out-of-range", "choices.level"),
    ],
)
def test_nothing_is_saved_that_would_not_open(record: Record, key: str, place: str) -> None:
    """What goes beyond the limits is named before it is in a file."""
    refused = encode(record)
    assert isinstance(refused, Refused)
    assert (refused.key, refused.facts["place"]) == (key, place)


def test_a_record_of_too_many_bytes_is_not_saved() -> None:
    """Each part is within the limits, and all together are not."""
    row = Stratum(label_text="\u20ac" * LONGEST_TEXT)
    record = Record(outcomes=(Outcome(table=Strata(strata=(row,) * 50)),) * 200)
    assert encode(record) == Refused("too-large", {"limit": LARGEST_FILE})


@given(st.binary(max_size=400))
def test_any_bytes_get_an_answer(data: bytes) -> None:
    """Whatever a file holds, nothing is raised."""
    assert isinstance(decode(data), Record | Refused)


PIECES = (b"", b'"', b"{", b"]", b"\\", b"\xff", b"0", b",", b"\\ud800", b"\\u0000", b"\x00", b"null", b"1e9")


@given(st.data())
def test_a_file_with_a_few_bytes_changed_gets_an_answer(data: st.DataObject) -> None:
    """What opens in spite of it is saved and opens again."""
    changed = bytearray(EVERYTHING.read_bytes())
    for _ in range(data.draw(st.integers(1, 4))):
        place = data.draw(st.integers(0, len(changed) - 1))
        length = data.draw(st.integers(0, 30))
        changed[place : place + length] = data.draw(
            st.sampled_from([b"", b'"', b"{", b"]", b"\\", b"\xff", b"0", b","])
        )
    found = decode(bytes(changed))
    if isinstance(found, Record):
        kept = encode(found)
        assert isinstance(kept, bytes)
        assert decode(kept) == found


ANY = st.text(st.characters(exclude_categories=()), max_size=5)
NAMES = st.sampled_from(("outcomes", "choices", "title_text", *Outcome.__struct_fields__))
JSON = st.recursive(
    st.none() | st.booleans() | st.integers() | st.floats() | ANY,
    lambda below: st.lists(below, max_size=3) | st.dictionaries(NAMES | ANY, below, max_size=3),
    max_leaves=6,
)


@given(NAMES, JSON, st.booleans())
def test_any_json_in_any_place_gets_an_answer(name: str, value: Any, inside: bool) -> None:
    """The types decide, and what they let through can be saved."""
    tree = {"fourcount_format": 1, "outcomes": [{name: value}] if inside else [{}], **({} if inside else {name: value})}
    found = decode(json.dumps(tree).encode())
    assert isinstance(encode(found), bytes) if isinstance(found, Record) else found.key in REFUSALS
