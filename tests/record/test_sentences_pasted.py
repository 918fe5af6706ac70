"""Pasted sentences: what each is understood as, and which hold no table."""

from __future__ import annotations

import pytest

from fourcount.record.entry.paste import read_paste
from fourcount.record.entry.sentence import read_sentence
from pastes import FOLDER, cases, described

SENTENCES = cases("sentences.txt")
NOT_TABLES = [
    line for line in (FOLDER / "not_tables.txt").read_text(encoding="utf-8").splitlines() if not line.startswith("#")
]


@pytest.mark.parametrize(("text", "expected"), SENTENCES, ids=[text[:40] for text, _ in SENTENCES])
def test_a_sentence_is_understood_with_its_groups_words_results_and_doubts(text: str, expected: list[str]) -> None:
    """Each sentence gives the table that a reader would see in it, and what may be seen otherwise is listed."""
    assert described(read_paste(text)) == expected


def test_the_file_holds_enough_shapes() -> None:
    """At least sixty shapes of sentence are held, and two hundred sentences without a table."""
    assert len({text for text, _ in SENTENCES}) >= 60
    assert len(set(NOT_TABLES)) >= 200


@pytest.mark.parametrize("text", NOT_TABLES)
def test_a_sentence_without_two_groups_is_no_table(text: str) -> None:
    """Dates, doses, scores, single groups and the like are not taken for a table."""
    assert read_paste(text) is None


def test_the_sentence_of_a_trial_fills_everything_in_one_go() -> None:
    """Counts, labels, event and printed result come out of one sentence, and nothing is doubted."""
    pasted = read_sentence(
        "Falls occurred in 38 of 412 patients (9.2%) with night lights and 70 of 409 (17.1%) with usual care "
        "(relative risk, 0.54; 95% CI, 0.37 to 0.78; P = 0.001)"
    )
    assert described(pasted) == [
        "sentence: events-of-total",
        "group: 38 | 412 | night lights",
        "group: 70 | 409 | usual care",
        "words: falls",
        "paper_text: relative risk, 0.54; 95% CI, 0.37 to 0.78; P = 0.001",
        "figure: risk_ratio 0.54 [0.37 0.78] 95% p=0.001",
    ]


@pytest.mark.parametrize("between", [" and ", " versus ", " vs ", " vs. ", " v ", ", compared with ", "; "])
def test_the_word_between_the_groups_does_not_matter(between: str) -> None:
    """However two groups are set against each other, the counts are the same."""
    pasted = read_sentence(f"Falls occurred in 38 of 412 (9.2%) with lamps{between}70 of 409 (17.1%) with torches.")
    assert pasted is not None
    assert [(group.left_text, group.right_text, group.label) for group in pasted.groups] == [
        ("38", "412", "lamps"),
        ("70", "409", "torches"),
    ]


@pytest.mark.parametrize(
    "count", ["{0} of {1} ({2}%)", "{0}/{1} ({2}%)", "{2}% ({0}/{1})", "{0} ({2}%) of {1}", "{0} of {1} [{2}%]"]
)
def test_the_order_of_count_total_and_percentage_does_not_matter(count: str) -> None:
    """Every way to print a count, its total and its percentage gives the same cells."""
    first, second = count.format(38, 412, "9·2"), count.format(70, 409, "17·1")
    pasted = read_sentence(f"Falls occurred in {first} in the lamp group and {second} in the torch group.")
    assert pasted is not None
    assert [(group.left_text, group.right_text) for group in pasted.groups] == [("38", "412"), ("70", "409")]
    assert not pasted.ambiguous


def test_lines_of_a_wrapped_sentence_are_one_sentence() -> None:
    """A sentence with the line breaks of a PDF is read as one."""
    pasted = read_paste(
        "Falls occurred in 38 of 412 patients\n(9.2%) with night lights and 70 of 409 (17.1%)\nwith usual care "
        "during the whole of\nthe following winter."
    )
    assert pasted is not None
    assert pasted.source == "sentence"
    assert [(group.left_text, group.right_text) for group in pasted.groups] == [("38", "412"), ("70", "409")]
