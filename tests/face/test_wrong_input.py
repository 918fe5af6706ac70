"""What cannot be read stays as typed, is marked, and is answered by one sentence; everything else goes on."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from fourcount.record.outcome import CELLS
from fourcount.wording import labels

if TYPE_CHECKING:
    from conftest import Hands

WRONG = [
    ("abc", "abc: a whole number of people is needed, such as 38"),
    ("-3", "-3: a count cannot be negative"),
    ("4.5", "4.5: people are counted whole, without decimals"),
    ("1000000000000", "1000000000000: a count goes up to 1,000,000,000"),
    ("500/412", "500/412: more events than people; the events have to fit into the total"),
    ("1.204", "1.204: people are counted whole; a thousands mark is a comma, as in 1,204"),
    ("38, 374", "38, 374: one count in each cell"),
    ("38*", "38*: a whole number of people is needed, such as 38"),
    ("9999999999999999999999999999", "9999999999999999999999999999: a count goes up to 1,000,000,000"),
]


@pytest.mark.parametrize(("typed", "sentence"), WRONG, ids=[typed for typed, _ in WRONG])
def test_a_wrong_count_is_kept_marked_and_explained(example: Hands, typed: str, sentence: str) -> None:
    """The text stays, its cell alone is marked, one sentence says what is wrong, and no figure is shown."""
    cells = example.window.printed.grid.cells
    example.write(cells[CELLS[0]], typed)
    assert example.texts == (typed, "374", "70", "339")
    assert [field for field in CELLS if cells[field].marked] == [CELLS[0]]
    assert example.notes == [sentence]
    assert cells[CELLS[0]].accessibleDescription() == sentence
    assert example.rows == {}
    assert example.sentence == "A cell of the table cannot be used; the line under the table says why."
    assert not example.window.patient.figures.picture.isVisible()


@pytest.mark.parametrize("typed", [typed for typed, _ in WRONG])
def test_the_rest_stays_live_beside_a_wrong_count(example: Hands, typed: str) -> None:
    """While a cell is wrong, totals of the other group, names and other fields go on; mending it brings all back."""
    grid = example.window.printed.grid
    before = example.rows
    example.write(grid.cells[CELLS[0]], typed)
    example.write(grid.cells[CELLS[3]], "330")
    assert grid.totals["second"].text() == "400"
    example.write(example.window.printed.span, "12 months")
    assert example.window.session.outcome.span_text == "12 months"
    example.write(grid.cells[CELLS[3]], "339")
    example.write(grid.cells[CELLS[0]], "38")
    assert not grid.cells[CELLS[0]].marked
    assert example.notes == []
    assert example.rows == before


def test_a_wrong_count_in_every_cell_gets_its_own_sentence(hands: Hands) -> None:
    """Four wrong cells are four marks and four sentences, in reading order."""
    hands.count("abc", "-3", "4.5", "500/412")
    assert all(cell.marked for cell in hands.window.printed.grid.cells.values())
    assert [note.split(":")[0] for note in hands.notes] == ["abc", "-3", "4.5", "500/412"]


def test_a_blank_cell_is_no_mistake(example: Hands) -> None:
    """An emptied cell is waited for, and not marked."""
    example.write(example.window.printed.grid.cells[CELLS[2]], "")
    assert example.notes == []
    assert not any(cell.marked for cell in example.window.printed.grid.cells.values())
    assert example.sentence == "Type the four counts of the table."
    assert example.rows == {}
    assert example.window.patient.waits.text() == labels.PATIENT_WAITS


def test_blanks_alone_count_as_blank(example: Hands) -> None:
    """A cell of spaces is kept and is as good as empty."""
    example.write(example.window.printed.grid.cells[CELLS[2]], "   ")
    assert example.texts[2] == "   "
    assert example.notes == []
    assert example.rows == {}


def test_all_zeros_say_why_nothing_can_be_given(hands: Hands) -> None:
    """Four zeros are read, and every figure that nobody can give is refused with its reason."""
    hands.count("0", "0", "0", "0")
    assert hands.notes == []
    assert hands.sentence == "There is nobody in either group."
    assert hands.rows
    assert all("nan" not in row.lower() for row in hands.rows.values())
    assert not hands.window.patient.figures.picture.isVisible()
    assert hands.window.patient.waits.text()


def test_zero_events_are_shown_as_they_are(hands: Hands) -> None:
    """No event in one group gives a ratio of 0, with a caution, and never an edited count."""
    hands.count("0", "100", "7", "93")
    assert hands.rows["risk_ratio"].startswith("Risk ratio: 0")
    assert hands.rows["risk_index"].startswith("Risk, index group: 0.0%")
    assert any("One of the four counts is 0" in text for text in hands.window.cautions.texts)


def test_the_largest_counts_are_taken(hands: Hands) -> None:
    """A thousand million people in each cell are no trouble."""
    hands.count("1,000,000,000", "1,000,000,000", "900,000,000", "1,000,000,000")
    assert hands.notes == []
    assert hands.rows["risk_index"].startswith("Risk, index group: 50.0%")
    assert hands.window.printed.grid.totals["everyone"].text() == "3,900,000,000"


def test_a_total_that_disagrees_is_marked(hands: Hands) -> None:
    """A total typed in a cell has to be the group's."""
    hands.count("38/413", "374", "70", "339")
    assert hands.notes == ["38/413: the total here is 413, but the group’s total is 412; check the paper"]


def test_a_percentage_that_disagrees_is_marked_and_the_count_is_used(hands: Hands) -> None:
    """A percentage that no whole number gives raises a mark, and the figures go on from the count."""
    hands.count("38 (9.9%)", "374", "70", "339")
    assert hands.window.printed.grid.cells[CELLS[0]].marked
    assert hands.notes == ["38 (9.9%): 38 of 412 does not round to this percentage; the count is used"]
    assert hands.rows["risk_ratio"].startswith("Risk ratio: 0.54")


def test_a_very_long_text_is_kept_and_named_in_short(hands: Hands) -> None:
    """A whole paragraph in a cell stays, and its sentence quotes only its beginning."""
    hands.write(hands.window.printed.grid.cells[CELLS[0]], "word " * 60)
    assert hands.texts[0] == "word " * 60
    assert len(hands.notes) == 1
    assert len(hands.notes[0]) < 120


def test_what_is_typed_is_text_in_tips_too(hands: Hands) -> None:
    """A tip over a marked cell or a long title shows signs as they are, and never at any length."""
    cell = hands.window.printed.grid.cells["first_left_text"]
    hands.write(cell, "<h1>x</h1><img src='a'>")
    assert "<h1>" not in cell.toolTip()
    assert "&lt;h1&gt;" in cell.toolTip()
    hands.write(hands.window.header.title, "<b>long</b> " * 1_000)
    hands.click(cell)
    hands.window.grab()
    tip = hands.window.header.title.toolTip()
    assert "<b>" not in tip
    assert 0 < len(tip) < 1_000


def test_a_study_that_took_no_time_is_marked_and_said_nowhere(example: Hands) -> None:
    """The figures stay; the span is missing where names are, until it is one."""
    span = example.window.printed.span
    example.write(span, "0 days")
    assert span.marked
    assert example.notes == ["0 days: a time span has to be longer than nothing"]
    assert "0 days" not in example.sentence
    assert "within" not in example.sentence
    example.write(span, "30-day")
    assert not span.marked
    assert example.notes == []
    assert "within 30 days" in example.sentence
