"""Strata: rows typed, added, removed and taken back by keyboard."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from fourcount.face.printed.strata_rows import StrataRows
from fourcount.record.outcome import Strata

if TYPE_CHECKING:
    from conftest import Hands

TWO_ROWS = (("under 65", "12", "200", "22", "210"), ("65 or more", "26", "212", "48", "199"))


def rows_of(hands: Hands) -> StrataRows:
    """The strata on screen."""
    rows = hands.window.printed.rare.strata
    assert rows is not None
    assert rows.isVisible()
    return rows


def texts(hands: Hands) -> list[tuple[str, ...]]:
    """What stands in each row."""
    return [tuple(field.text() for field in row.fields) for row in rows_of(hands).rows]


@pytest.fixture
def strata(hands: Hands) -> Hands:
    """Hands at two typed strata, as 38 of 412."""
    hands.do("form-strata")
    hands.click(rows_of(hands).rows[0].label)
    for row in TWO_ROWS:
        for text in row:
            hands.type(text)
            hands.press("Tab")
    return hands


def test_rows_are_typed_with_tab_in_reading_order(strata: Hands) -> None:
    """Label, first group's two cells, second group's two, then the next row; pooled beside crude."""
    assert texts(strata) == list(TWO_ROWS)
    assert any(key.startswith("pooled_") for key in strata.rows)
    assert "risk_ratio" in strata.rows


def test_enter_goes_through_the_rows_and_adds_one_at_the_end(hands: Hands) -> None:
    """Enter goes from count to count, and past the last one makes a new row, with the cursor in its first count."""
    hands.do("form-strata")
    hands.click(rows_of(hands).rows[0].label)
    hands.type("under 65")
    hands.press("Return")
    for row in (TWO_ROWS[0][1:], TWO_ROWS[1][1:], ("1", "9", "2", "8")):
        for text in row:
            hands.type(text)
            hands.press("Return")
    assert texts(hands) == [TWO_ROWS[0], ("", *TWO_ROWS[1][1:]), ("", "1", "9", "2", "8"), ("", "", "", "", "")]
    assert hands.field == "strata.3.first_left_text"
    hands.press("Shift+Tab")
    assert hands.field == "strata.3.label_text"
    hands.do("undo")
    assert len(texts(hands)) == 3
    assert hands.field == "strata.2.label_text"


def test_arrows_go_up_and_down_a_column(strata: Hands) -> None:
    """Down and Up stay in the column, Left and Right go through the row."""
    rows = rows_of(strata)
    rows.go_to(0, "second_left_text")
    strata.press("Down")
    assert strata.field == "strata.1.second_left_text"
    strata.press("Down")
    assert strata.field == "strata.1.second_left_text"
    strata.press("Up")
    strata.press("Right")
    assert strata.field == "strata.0.second_right_text"
    rows.go_to(0, "first_left_text")
    strata.press("Home")
    strata.press("Left")
    assert strata.field == "strata.0.label_text"


def test_rows_are_added_and_removed_by_key(strata: Hands) -> None:
    """Ctrl+Return adds a row; the row in which the cursor is can be removed; each is one step."""
    strata.press("Ctrl+Return")
    assert len(texts(strata)) == 3
    assert strata.field == "strata.2.label_text"
    rows_of(strata).go_to(0, "first_left_text")
    strata.do("remove-row")
    assert texts(strata)[0] == TWO_ROWS[1]
    assert len(texts(strata)) == 2
    strata.do("undo")
    strata.do("undo")
    assert texts(strata) == list(TWO_ROWS)


def test_rows_are_added_and_removed_by_link(strata: Hands) -> None:
    """The links under the rows do the same, and name the row that would go."""
    links = strata.window.printed.rare.row_links
    assert links is not None
    strata.click(links.add)
    assert len(texts(strata)) == 3
    rows_of(strata).go_to(1)
    assert links.remove.text() == "Remove row 2"
    strata.click(links.remove)
    assert texts(strata) == [TWO_ROWS[0], ("", "", "", "", "")]


def test_undo_brings_the_cursor_back_into_a_row(strata: Hands) -> None:
    """A run of typing in a row is a step, and its field gets the cursor."""
    field = rows_of(strata).rows[1].cells["second_left_text"]
    strata.write(field, "49")
    strata.click(strata.window.header.title)
    strata.do("undo")
    assert field.text() == "48"
    assert strata.focus is field


def test_a_wrong_cell_of_a_row_is_marked(strata: Hands) -> None:
    """More events than people are said under the table, and the cell is marked."""
    cell = rows_of(strata).rows[1].cells["first_left_text"]
    strata.write(cell, "999")
    assert cell.marked
    assert strata.notes == ["999: more events than people; the events have to fit into the total"]
    strata.write(cell, "26")
    assert not cell.marked


def test_rows_can_stand_in_the_other_form(strata: Hands) -> None:
    """38 of 412 becomes 38 · 374 in every row, with the same figures."""
    rows = strata.rows
    rows_as = strata.window.printed.rare.rows_as
    assert rows_as is not None
    strata.choose(rows_as, "rows 38 · 374")
    assert texts(strata)[0] == ("under 65", "12", "188", "22", "188")
    assert strata.rows == rows
    assert rows_of(strata).heads.headings["right"].isVisible()


def test_cells_of_rows_are_named(strata: Hands) -> None:
    """Every cell says its row, its group and what it counts; no two alike."""
    names = [cell.accessibleName() for row in rows_of(strata).rows for cell in row.cells.values()]
    assert names[0] == "row 1, first group, event"
    assert names[1] == "row 1, first group, all people"
    assert len(set(names)) == 8


def test_strata_carry_the_pooled_effect(strata: Hands) -> None:
    """A patient needs a starting risk of their own, and gets the pooled ratio."""
    patient = strata.window.patient
    assert patient.baseline.placeholderText() == "needed"
    strata.write(patient.baseline, "12%")
    assert patient.figures.picture.isVisible()
    pooled = strata.rows["pooled_risk_ratio"].split(": ")[1].split(",")[0]
    assert patient.effect.currentText().startswith(f"pooled risk ratio {pooled}")


def test_one_table_becomes_the_first_row_and_comes_back(example: Hands) -> None:
    """Counts that stand are the first stratum, and leaving strata keeps them."""
    example.do("form-strata")
    table = example.window.session.outcome.table
    assert isinstance(table, Strata)
    assert table.strata[0].first_left_text == "38"
    example.do("form-events-and-others")
    assert example.texts == ("38", "374", "70", "339")


def test_rows_are_only_offered_where_there_are_strata(strata: Hands) -> None:
    """In any other form the commands of rows are off."""
    actions = strata.window.actions_by_key
    assert actions["add-row"].isEnabled()
    strata.do("form-events-of-total")
    assert not actions["add-row"].isEnabled()
    assert not actions["remove-row"].isEnabled()


def test_fifty_rows_are_the_most(hands: Hands) -> None:
    """A row more than fifty is not made."""
    hands.do("form-strata")
    for _ in range(55):
        hands.window.actions_by_key["add-row"].trigger()
    assert len(rows_of(hands).rows) == 50
