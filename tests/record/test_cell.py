"""What a cell takes, what it refuses, and that it answers for every text."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.entry.cell import LARGEST_COUNT, read_cell
from fourcount.record.entry.readings import Blank, Count, Unreadable

ANY_TEXT = st.text(st.characters(exclude_categories=()), max_size=60)
NEARLY_A_COUNT = st.text(st.sampled_from("0123456789 ,.'/%()-oftu*<\u00a0\u202f\u2019\u2212\u0663\u0967"), max_size=24)

TAKEN = [
    ("38", 38),
    ("0", 0),
    ("007", 7),
    ("1,204", 1204),
    ("1 204", 1204),
    ("1\u00a0204", 1204),
    ("1\u2009204", 1204),
    ("1\u202f204", 1204),
    ("1'204", 1204),
    ("1\u2019204", 1204),
    ("1,000,000,000", 10**9),
    ("12 345 678", 12345678),
    ("  38\t\n", 38),
    ("\ufeff\u200e38\u200f", 38),
    ("\u0663\u0668", 38),
    ("\u0661\u066c\u0662\u0660\u0664", 1204),
    ("\u0969\u096e", 38),
    ("\uff13\uff18", 38),
    ("\U0001d7db\U0001d7e0", 38),
]

WITH_MORE = [
    ("38/412", 38, 412, None),
    ("38 / 412", 38, 412, None),
    ("38\u2044412", 38, 412, None),
    ("38 of 412", 38, 412, None),
    ("38 OUT  OF 1,412", 38, 1412, None),
    ("0/0", 0, 0, None),
    ("38 (9.2%)", 38, None, "9.2%"),
    ("38 (9,2 %)", 38, None, "9,2 %"),
    ("38 (9\u00b72)", 38, None, "9\u00b72"),
    ("38(<10%)", 38, None, "<10%"),
    ("38 (100.0%)", 38, None, "100.0%"),
    ("38/412 (9.2%)", 38, 412, "9.2%"),
    ("1,204 of 2,408 (50%)", 1204, 2408, "50%"),
]

REFUSED = [
    ("38*", "not-a-count"),
    ("38\u00b2", "not-a-count"),
    ("38a", "not-a-count"),
    ("\u2020", "not-a-count"),
    ("\u2014", "not-a-count"),
    ("n/a", "not-a-count"),
    ("1,2,3", "not-a-count"),
    ("1 20", "two-counts"),
    ("1,204 567", "not-a-count"),
    ("12 34", "two-counts"),
    ("38  412", "two-counts"),
    ("1\t204", "two-counts"),
    ("3\u200f8", "not-a-count"),
    ("\u202e38", "not-a-count"),
    ("3\u0968", "not-a-count"),
    ("38 (100.1%)", "not-a-count"),
    ("0" * 500, "not-a-count"),
    ("x" * 500, "not-a-count"),
    ("38 (p=0.2)", "not-a-count"),
    ("38/412/5", "not-a-count"),
    ("38%", "not-a-count"),
    ("1e3", "not-a-count"),
    ("+38", "not-a-count"),
    ("38\x00", "not-a-count"),
    ("\ud800", "not-a-count"),
    ("-3", "negative"),
    ("\u22123", "negative"),
    ("\u20133", "negative"),
    ("- 1,204", "negative"),
    ("-3.5", "negative"),
    ("38, 374", "two-counts"),
    ("38\t374", "two-counts"),
    ("38; 374", "two-counts"),
    ("38;374", "two-counts"),
    ("1.204", "point-in-thousands"),
    ("12.204.000", "point-in-thousands"),
    ("1.2045", "decimal"),
    ("0.204", "decimal"),
    ("1204.500", "decimal"),
    ("1,20", "decimal"),
    ("0,204", "decimal"),
    ("38.0", "decimal"),
    (".5", "decimal"),
    ("38\u00b75", "decimal"),
    ("1000000001", "too-large"),
    ("38/1,000,000,001", "too-large"),
    ("9" * 300, "too-large"),
    ("9" * 5000, "too-large"),
    ("412/38", "events-above-total"),
]


@pytest.mark.parametrize(("text", "value"), TAKEN)
def test_a_count_is_read_as_it_is_printed(text: str, value: int) -> None:
    """Thousands marks, blanks round it and digits of other scripts do not stop a count."""
    assert read_cell(text) == Count(value=value)


@pytest.mark.parametrize(("text", "value", "total", "percent"), WITH_MORE)
def test_a_total_or_a_percentage_may_stand_beside_it(
    text: str, value: int, total: int | None, percent: str | None
) -> None:
    """A count keeps the total and the percentage printed in the same cell."""
    assert read_cell(text) == Count(value=value, total=total, percent_text=percent)


@pytest.mark.parametrize(("text", "key"), REFUSED)
def test_what_is_no_count_is_refused_with_its_reason(text: str, key: str) -> None:
    """Nothing is guessed: a footnote mark, a decimal, a sign or another number makes the cell unreadable."""
    reading = read_cell(text)
    assert isinstance(reading, Unreadable)
    assert reading.key == key


@pytest.mark.parametrize("text", ["", " ", "\n\t", "\u00a0\u200b\ufeff"])
def test_blanks_are_no_count_and_no_mistake(text: str) -> None:
    """A cell with nothing to be seen in it is blank."""
    assert read_cell(text) == Blank()


@pytest.mark.parametrize("text", ["9" * 10**7, " " * 10**7 + "38", "1," * 10**6, "/" * 10**6, "(" * 10**6])
def test_a_huge_paste_is_read_like_any_other(text: str) -> None:
    """Ten megabytes in a cell give an answer of a known kind."""
    reading = read_cell(text)
    assert reading == Count(value=38) or isinstance(reading, Unreadable)


def test_what_was_typed_is_quoted_short_and_on_one_line() -> None:
    """The sentence about an unreadable cell gets at most 40 characters, none of them invisible."""
    reading = read_cell("people\nwho fell \x00 \u202e \ud800 " + "x" * 100)
    assert isinstance(reading, Unreadable)
    quoted = str(reading.facts["text"])
    assert quoted.startswith("people who fell \ufffd \ufffd \ufffd x")
    assert len(quoted) == 40


def test_a_reason_tells_what_its_sentence_needs() -> None:
    """A count that is too large says up to where counts go; events above a total say both numbers."""
    too_large, above = read_cell("1,000,000,001"), read_cell("412/38")
    assert isinstance(too_large, Unreadable)
    assert isinstance(above, Unreadable)
    assert too_large.facts == {"text": "1,000,000,001", "limit": 10**9}
    assert above.facts == {"text": "412/38", "events": 412, "total": 38}


@given(ANY_TEXT | NEARLY_A_COUNT)
def test_every_text_gets_an_answer(text: str) -> None:
    """Reading never raises, and a count is a whole number from 0 to 10^9 that its total holds."""
    reading = read_cell(text)
    assert isinstance(reading, Count | Blank | Unreadable)
    if isinstance(reading, Count):
        assert 0 <= reading.value <= (LARGEST_COUNT if reading.total is None else reading.total) <= LARGEST_COUNT
    if isinstance(reading, Unreadable):
        assert 0 < len(str(reading.facts["text"])) <= 40


@given(st.integers(0, LARGEST_COUNT), st.sampled_from([",", " ", "'", "\u00a0", "\u202f", "\u2009", "\u2019", ""]))
def test_a_grouped_number_is_the_number(value: int, mark: str) -> None:
    """Every count with any thousands mark reads back as itself."""
    assert read_cell(f"{value:,}".replace(",", mark)) == Count(value=value)


@given(st.integers(0, LARGEST_COUNT), st.sampled_from([0x660, 0x6F0, 0x966, 0x9E6, 0xE50, 0xFF10, 0x1D7CE]))
def test_digits_of_another_script_are_digits(value: int, zero: int) -> None:
    """Every count in the digits of another script reads as the same count."""
    assert read_cell("".join(chr(zero + int(digit)) for digit in str(value))) == Count(value=value)
