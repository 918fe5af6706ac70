"""Whatever is pasted: reading is total, bounded, and lists its doubts by known keys."""

from __future__ import annotations

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.paste import read_paste
from fourcount.record.entry.pasted.doubts import PASTE_DOUBTS
from fourcount.record.entry.printed import PAPER_MARKS, read_paper
from fourcount.record.entry.readings import Count, Pasted
from fourcount.record.entry.tokens import LONGEST_TEXT
from fourcount.record.outcome import PAPER_MEASURES
from pastes import cases

PRINTED = (
    "0 1 7 10 38 412 9.2 17.1% 1,204 2012 0.54 -3.3 \u22120.5 .05 95% (9.2%) (n=412) 38/412 \u221e 12,5% 00 007 of in "
    "and versus with CI RR OR HR P = < ( ) [ ] { } , ; : / - \u2013 \u00b7 . | + patients group respectively Falls per "
    "person-years Total total n N % the Of yes no Cases Controls thirty-two hundred \u2192 \u0663\u0664"
)
UNSEEN = ("\t", "\n", "  ", "\u00a0", "\u2009", "\x00", "\u202e", "\ud800")
PIECES = st.sampled_from((*PRINTED.split(), *UNSEEN))
TEXTS = st.lists(PIECES, max_size=60).map(" ".join) | st.lists(PIECES, max_size=60).map("".join) | st.text(max_size=200)
HOSTILE = [
    "(" * 10**6,
    "9" * 10**6,
    "38 of 412 " * 10**5,
    "38/412 (9.2%)\t" * 10**5,
    "1,204" * 10**5,
    "[(" * 2_900,
    "38 (" * 1_450,
    "9.2% (" * 850,
    "p " * 2_900,
    "0.5 (0.4 to 0.6) " * 350,
    "38 of 412 with a and " * 270,
    "n = " * 1_450,
    "1\n" * 2_900,
    "\x00\x1b[31m38 of 412\x07 v 70 of 409",
    "\u202e38 of 412 v 70 of 409",
    "\ud80038 of 412 v 70 of 409",
    " " * 5_900 + "38",
    "a" * 5_900 + " 38",
    "1 " * 2_900,
    "38, " * 1_450,
    "of " * 1_900,
    "-" * 5_900,
    "1-" * 2_900,
    "one hundred and " * 350,
    "38 (9.2%) with lamps, " + "12, " * 600 + "and 70 (17.1%) with torches, " + "13, " * 600,
    "38 (9.2%) with a lamp and 70 (17.1%) with a torch. " * 110,
    "38 (9.2%) with a lamp. " * 250,
    "38 of 412 residents. " * 280,
    "In the a and b and c and d " * 200 + "38 of 412 and 70 of 409",
]


def held(pasted: Pasted | None) -> None:
    """What holds of every understanding: known doubts, groups in pairs, text that a cell or a field can hold."""
    if pasted is None:
        return
    assert set(pasted.ambiguous) <= set(PASTE_DOUBTS)
    assert len(set(pasted.ambiguous)) == len(pasted.ambiguous)
    assert len(pasted.groups) % 2 == 0
    assert bool(pasted.groups) == (pasted.form != "effect-only")
    texts = [text for group in pasted.groups for text in (group.left_text, group.right_text, group.label)]
    texts += [*pasted.stratum_labels, pasted.left_heading, pasted.right_heading, pasted.words, pasted.paper_text]
    assert not [text for text in texts if any(ord(character) < 32 or character in "\u202e\ud800" for character in text)]
    if pasted.form in ("events-of-total", "events-and-others", "pairs", "strata", "person-time"):
        assert all(isinstance(read_cell(group.left_text), Count) for group in pasted.groups)


@given(TEXTS)
def test_any_paste_is_understood_or_not_and_never_raises(text: str) -> None:
    """Reading a paste is total, and whatever it gives can stand in the cells."""
    held(read_paste(text))


@given(
    st.sampled_from([text for text, _ in [*cases("blocks.txt"), *cases("sentences.txt")]]),
    st.lists(st.tuples(st.integers(0, 300), st.integers(0, 3), PIECES), min_size=1, max_size=6),
)
@settings(max_examples=400)
def test_a_damaged_paste_is_understood_or_not_and_never_raises(text: str, changes: list[tuple[int, int, str]]) -> None:
    """A table or a sentence with pieces lost or put in is read without an error, as something a cell can hold."""
    for place, length, piece in changes:
        text = text[:place] + piece + text[place + length :]
    held(read_paste(text))


@pytest.mark.parametrize(
    "text",
    [
        "Lamp 12\nTorch n 412",
        "12 (1,301,204.5%)\t38\n5 (3%)\t70",
        "Hospital: 1.8% (37/2\n041) with spray; 2.9% (59/2038) with saline",
        "Arm\tTime at risk, person-years\nLamp\t38.5\t.05\nTorch\t70.5\t3.3",
        "Men\nLamp\t1\t2\nP = 0.3\nWomen\nLamp\t3\t4\nRR 2 (1 to 3)",
    ],
)
def test_what_once_raised_is_answered(text: str) -> None:
    """Texts on which an earlier reading failed stay readable."""
    held(read_paste(text))


@given(TEXTS, st.sampled_from(PAPER_MEASURES))
def test_any_printed_text_is_read_or_marked_and_never_raises(text: str, measure: str) -> None:
    """Reading printed results is total; its marks are listed ones, and every number is one."""
    reading = read_paper(text, measure)  # type: ignore[arg-type]
    assert {mark.key for mark in reading.marks} <= set(PAPER_MARKS)
    numbers = [n for figure in reading.figures for n in (figure.estimate, figure.low, figure.high, figure.p) if n]
    assert all(number.value == number.value and number.decimals >= 0 for number in numbers)


@pytest.mark.parametrize("text", HOSTILE, ids=range(len(HOSTILE)))
def test_hostile_text_is_answered(text: str) -> None:
    """Endless brackets, digits and repetitions, controls and half characters give an answer and nothing else."""
    held(read_paste(text))
    read_paper(text, "risk_ratio")


def test_longer_text_is_no_table() -> None:
    """Text that is longer than a table or an abstract is not searched."""
    assert read_paste("38/412\n70/409" + " " * LONGEST_TEXT) is None


@pytest.mark.parametrize("text", [text for text, _ in [*cases("blocks.txt"), *cases("sentences.txt")]])
def test_reading_does_not_depend_on_what_surrounds_a_paste(text: str) -> None:
    """Blank lines around a paste and line ends of another system change nothing."""
    assert read_paste("\n\n" + text + "\n") == read_paste(text)
    assert read_paste(text.replace("\n", "\r\n")) == read_paste(text)


@given(st.integers(0, 500), st.integers(1, 500), st.integers(0, 500), st.integers(1, 500))
def test_counts_come_back_as_they_were_printed(one: int, more_one: int, two: int, more_two: int) -> None:
    """A table written as a block or as a sentence is read with its own counts."""
    totals = (one + more_one, two + more_two)
    block = read_paste(f"\tLamp (n = {totals[0]})\tTorch (n = {totals[1]})\nFell\t{one}\t{two}")
    sentence = read_paste(f"Falls occurred in {one}/{totals[0]} with lamps versus {two}/{totals[1]} with torches.")
    for pasted in (block, sentence):
        assert pasted is not None
        assert [(group.left_text, group.right_text) for group in pasted.groups] == [
            (str(one), str(totals[0])),
            (str(two), str(totals[1])),
        ]
