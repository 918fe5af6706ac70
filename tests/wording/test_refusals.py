"""Why a file is not opened, in one sentence that names the place."""

from __future__ import annotations

import pytest

from fourcount.record import editing
from fourcount.record.codec import Refused
from fourcount.record.file.refused import REFUSALS
from fourcount.wording.refusals import FIELD_NAMES, REFUSAL_TEXTS, place_words, refusal_text


def test_every_reason_has_a_sentence_and_every_sentence_a_reason():
    """In the order in which a file is asked."""
    assert tuple(REFUSAL_TEXTS) == REFUSALS


@pytest.mark.parametrize("key", REFUSALS)
def test_a_refusal_is_one_sentence(key):
    """Whole, with nothing left open in it, even if its facts are missing."""
    text = refusal_text(Refused(key, {"place": "outcomes.1.name_text", "name": "colour", "limit": 2000, "line": 3}))
    assert text[0].isupper() or text[0] == "“"
    assert text.endswith(".")
    assert text.count(". ") == 0
    assert "{" not in text
    assert refusal_text(Refused(key))


@pytest.mark.parametrize(
    ("refused", "text"),
    [
        (Refused("damaged", {"line": 12, "column": 7}), "The file is damaged: line 12 goes wrong at its character 7."),
        (
            Refused("newer", {"number": 3, "newest": 1}),
            "A newer version of Fourcount saved this file: its format is 3, and this one reads up to 1.",
        ),
        (
            Refused("key-twice", {"place": "outcomes.1", "name": "design"}),
            "“design” stands twice in outcome 2, and only one of them can be meant.",
        ),
        (
            Refused("unknown-field", {"place": "", "name": "colour"}),
            "There is something in the file that this version does not know: “colour”.",
        ),
        (
            Refused("too-long", {"place": "source_text", "limit": 2000}),
            "More than 2,000 characters stand in the source, and no record holds more.",
        ),
        (
            Refused("character", {"place": "outcomes.0.patient.rate_text", "character": "U+202E"}),
            "A hidden character that no record holds (U+202E) stands in the rate of outcome 1.",
        ),
        (Refused("too-large", {"limit": 10_000_000}), "A record takes at most 10 megabytes, and this is more."),
    ],
)
def test_a_refusal_names_the_place(refused, text):
    """In the words of the window where it has any."""
    assert refusal_text(refused) == text


@pytest.mark.parametrize(
    ("path", "words"),
    [
        ("", "in the file"),
        ("outcomes", "in “outcomes”"),
        ("outcomes.2", "in outcome 3"),
        ("outcomes.2.table", "in “table” of outcome 3"),
        ("outcomes.2.table.form", "in “form” of outcome 3"),
        ("outcomes.2.table.strata.4.label_text", "in the stratum’s name of stratum 5 of outcome 3"),
        ("choices.level", "in “level”"),
        ("title_text", "in the title"),
    ],
)
def test_a_path_is_said_from_its_end(path, words):
    """Counted from 1, as people count."""
    assert place_words(path) == words


def test_every_text_of_a_record_has_a_name():
    """So a refusal never speaks of a field as the program calls it."""
    assert set(FIELD_NAMES) == {
        *editing.OUTCOME_TEXTS, *editing.PATIENT_TEXTS, *editing.RECORD_TEXTS, *editing.STRATUM_TEXTS,
        "unit_text", "limits_level_text",
    }  # fmt: skip
