"""A record as a file: the same record back, the same bytes again, and formats that follow one another."""

from __future__ import annotations

import json
from collections.abc import Callable
from typing import Any

import msgspec
import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record import editing
from fourcount.record.codec import FORMAT, Refused, decode, encode
from fourcount.record.file.limits import LONGEST_TEXT
from fourcount.record.file.upgrades import STEPS, upgraded
from fourcount.record.outcome import FORMS, Outcome, Patient, Strata, Stratum, form_of
from fourcount.record.paper import Choices, Record
from record_files import EVERYTHING, FILES, LEAST, TREE


def test_a_record_of_every_kind_opens_and_is_saved_as_the_same_bytes() -> None:
    """Every form of print and every field, none of them as it begins: a file of this format stays what it is."""
    record = decode(EVERYTHING.read_bytes())
    assert isinstance(record, Record)
    assert encode(record) == EVERYTHING.read_bytes()


def test_the_file_of_everything_holds_every_field_away_from_its_beginning() -> None:
    """So a field that is added, or begins otherwise, cannot do so without a new format."""
    record = decode(EVERYTHING.read_bytes())
    assert isinstance(record, Record)
    fresh = Record()
    assert not set(same_as(record, fresh)) & {"title_text", "source_text", "outcomes", "choices"}
    for outcome in record.outcomes:
        kept = set(same_as(outcome, Outcome()))
        assert kept <= ({"table"} if form_of(outcome.table) == "events-and-others" else set())
        assert same_as(outcome.patient, Patient()) == []
        assert set(TREE["outcomes"][0]) == set(Outcome.__struct_fields__)
        assert set(TREE["outcomes"][0]["patient"]) == set(Patient.__struct_fields__)
    assert same_as(record.choices, Choices()) == []


def same_as(one: Any, other: Any) -> list[str]:
    """The names of the fields that are equal in both."""
    return [name for name in one.__struct_fields__ if getattr(one, name) == getattr(other, name)]


def test_what_a_file_leaves_out_is_as_a_new_record_begins() -> None:
    """A file of this format means the same for ever: what begins otherwise one day needs a step from it."""
    record = decode(LEAST.read_bytes())
    assert record == Record()
    written = encode(Record())
    assert isinstance(written, bytes)
    tree = json.loads(written)
    assert tree["choices"] == {"family": "score", "level": 0.95}
    beginnings = {name: value for name, value in tree["outcomes"][0].items() if not name.endswith("_text")}
    assert {name: value for name, value in beginnings.items() if value not in ("", False)} == {
        "table": {
            "form": "events-and-others",
            "first_left_text": "",
            "first_right_text": "",
            "second_left_text": "",
            "second_right_text": "",
        },
        "design": "trial",
        "index_group": "first",
        "counted": "left",
        "layout": "down",
        "patient": {
            **dict.fromkeys((name for name in Patient.__struct_fields__ if name.endswith("_text")), ""),
            "effect": "usual",
            "start_kind": "one",
        },
        "counting": "people",
        "paper_measure": "risk_ratio",
        "adjusted_measure": "odds_ratio",
        "line_kind": "none",
        "line_scale": "risk_difference",
        "line_side": "fewer",
        "on_handout": True,
    }


def test_every_form_stands_in_the_file_of_everything() -> None:
    """Under the name that it has had since the first format."""
    forms = [outcome["table"]["form"] for outcome in TREE["outcomes"]]
    assert forms == [
        "events-and-others",
        "events-of-total",
        "percent-of-total",
        "pairs",
        "person-time",
        "risk-at-time",
        "effect-only",
        "strata",
    ]
    assert set(forms) == set(FORMS)


def test_a_file_says_first_what_it_is() -> None:
    """The number of the format is its first key; lines end alike everywhere, and the last one ends."""
    data = encode(Record())
    assert isinstance(data, bytes)
    assert data.startswith(b'{\n  "fourcount_format": 1,\n')
    assert data.endswith(b"}\n")
    assert b"\r" not in data


@given(
    st.lists(st.text(st.characters(exclude_categories=()), max_size=50), min_size=6, max_size=6),
    st.integers(0, 3),
    st.floats(0.8, 0.999),
)
def test_whatever_is_typed_opens_as_it_was_saved(texts: list[str], copies: int, level: float) -> None:
    """Any text in any field, any number of outcomes: the same record back, and the same bytes again."""
    outcome = Outcome()
    for field, text in zip(
        ("name_text", "first_left_text", "paper_text", "starting_risk_text", "line_text", "span_text"),
        texts,
        strict=True,
    ):
        outcome = editing.edit_text(outcome, field, text)
    record = editing.with_level(editing.with_outcome(Record(), 0, outcome), level)
    for _ in range(copies):
        record = editing.copy_outcome(record, 0)
    data = encode(record)
    assert isinstance(data, bytes)
    assert decode(data) == record
    assert encode(decode(data)) == data  # type: ignore[arg-type]


@pytest.mark.parametrize(
    "change",
    [
        lambda data: b"\xef\xbb\xbf" + data,
        lambda data: data.replace(b"\n", b"\r\n"),
        lambda data: json.dumps(json.loads(data), indent=None, sort_keys=True).encode(),
        lambda data: b" \n\t" + data + b"\n\n",
    ],
)
def test_another_editor_may_have_saved_it(change: Callable[[bytes], bytes]) -> None:
    """A byte order mark, other line ends, another order or spacing: the record is the same."""
    data = EVERYTHING.read_bytes()
    assert decode(change(data)) == decode(data)


def test_as_much_as_a_record_may_hold_opens() -> None:
    """Two hundred outcomes, fifty strata, two thousand characters."""
    strata = Strata(strata=(Stratum(label_text="\u20ac" * LONGEST_TEXT),) * 50)
    record = Record(outcomes=(Outcome(table=strata), *[Outcome()] * 199), choices=Choices(level=0.8))
    data = encode(record)
    assert isinstance(data, bytes)
    assert decode(data) == record


def test_every_older_format_has_a_step_to_the_next() -> None:
    """And none is beyond the newest."""
    assert set(STEPS) == set(range(1, FORMAT))


def test_steps_are_taken_one_after_the_other_from_the_format_of_the_file() -> None:
    """A file of the first format goes through all, one of the newest through none, and the number is left behind."""
    steps = {1: lambda tree: {**tree, "taken": "1"}, 2: lambda tree: {**tree, "taken": tree.get("taken", "") + "2"}}
    read = [upgraded({"fourcount_format": number, "outcomes": []}, steps, 3) for number in (1, 2, 3, 4)]
    assert read[:3] == [{"outcomes": [], "taken": "12"}, {"outcomes": [], "taken": "2"}, {"outcomes": []}]
    assert read[3] == Refused("newer", {"number": 4, "newest": 3})


def test_files_of_every_format_are_kept_and_open() -> None:
    """From the first on."""
    for number in range(1, FORMAT + 1):
        kept = sorted(FILES.glob(f"format-{number}-*.fourcount"))
        assert kept
        assert all(isinstance(decode(file.read_bytes()), Record) for file in kept)


def test_a_record_is_made_of_texts_words_and_truth_values() -> None:
    """But for the level: so that no file holds a number that a later version would write otherwise."""
    kinds = {type(value) for value in msgspec.to_builtins(Record(outcomes=(Outcome(),)))["outcomes"][0].values()}
    assert kinds == {str, bool, dict}
