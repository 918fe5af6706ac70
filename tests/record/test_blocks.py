"""Pasted blocks: what each is understood as."""

from __future__ import annotations

import pytest

from fourcount.record.entry.block import read_block
from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.paste import read_paste
from fourcount.record.entry.readings import Count
from pastes import cases, described

BLOCKS = cases("blocks.txt")


@pytest.mark.parametrize(("text", "expected"), BLOCKS, ids=[text[:40] for text, _ in BLOCKS])
def test_a_block_is_understood_with_its_groups_headings_results_and_doubts(text: str, expected: list[str]) -> None:
    """Each block gives the table that a reader would see in it, and what may be seen otherwise is listed."""
    assert described(read_paste(text)) == expected


def test_the_file_holds_enough_shapes() -> None:
    """At least sixty shapes of block are held, no two alike."""
    assert len({text for text, _ in BLOCKS}) >= 60


@pytest.mark.parametrize("border", ["\t", "  ", "   ", ";", "|", ","])
def test_the_border_between_cells_does_not_matter(border: str) -> None:
    """Tabs, runs of spaces, semicolons, bars and commas give the same table."""
    lines = [("Arm", "Events", "Total"), ("Lights", "38", "412"), ("Dark", "70", "409")]
    pasted = read_block("\n".join(border.join(line) for line in lines))
    assert pasted is not None
    assert [(group.left_text, group.right_text, group.label) for group in pasted.groups] == [
        ("38", "412", "Lights"),
        ("70", "409", "Dark"),
    ]
    assert pasted.form == "events-of-total"
    assert not pasted.ambiguous


@pytest.mark.parametrize("mark", ["\u2009", "\u00a0", "\u202f", ",", "'", "\u2019"])
def test_thousands_marks_are_no_borders(mark: str) -> None:
    """A narrow or no-break space, a comma or an apostrophe within a number parts thousands, not cells."""
    pasted = read_block(f"Bright 1{mark}204/10{mark}418\nDim 1{mark}377/10{mark}402")
    assert pasted is not None
    cells = [read_cell(text) for group in pasted.groups for text in (group.left_text, group.right_text)]
    assert [cell.value for cell in cells if isinstance(cell, Count)] == [1204, 10418, 1377, 10402]


def test_a_percentage_that_disagrees_is_listed_and_kept() -> None:
    """A percentage that the count does not give is listed and stays in the cell; one that it gives goes."""
    pasted = read_block("Lights\t38 (9.5%)\t412\nDark\t70 (17.1%)\t409")
    assert pasted is not None
    assert [group.left_text for group in pasted.groups] == ["38 (9.5%)", "70"]
    assert pasted.ambiguous == ("percent-disagrees",)


def test_a_column_of_something_else_is_left_out_and_listed() -> None:
    """A mean age beside the counts is no percentage of them: it is left out, and that is listed."""
    pasted = read_block("Arm\tEvents\tTotal\tMean age\nLamp\t38\t412\t65.2\nTorch\t70\t409\t64.8")
    assert pasted is not None
    assert [(group.left_text, group.right_text) for group in pasted.groups] == [("38", "412"), ("70", "409")]
    assert pasted.ambiguous == ("left-out",)
