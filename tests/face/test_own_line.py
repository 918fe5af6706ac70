"""A line of the reader's own under the measures: opened by a link or a key, undone like everything else."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

if TYPE_CHECKING:
    from conftest import Hands
    from fourcount.face.own_line import OwnLineRow


def row(hands: Hands) -> OwnLineRow:
    """The row of the line on screen."""
    found = hands.window.says.own_line
    assert found is not None
    assert found.isVisible()
    return found


@pytest.mark.parametrize("way", ["link", "key"])
def test_a_line_is_opened_with_the_cursor_in_it(example: Hands, way: str) -> None:
    """The link under the measures and its key do the same; while the row is there, the link is not."""
    link = example.window.says.own_line_link
    assert link is not None
    if way == "link":
        example.click(link)
    else:
        example.do("own-line")
    assert example.field == "line_text"
    assert not link.isVisible()
    assert example.window.session.outcome.line_kind == "matters"


def test_one_sentence_says_where_the_interval_lies(example: Hands) -> None:
    """3.3 to 12.6 fewer per 100 lies on both sides of 5, and wholly past 3."""
    example.do("own-line")
    example.type("5")
    across = row(example).sentence.text()
    assert across
    assert "significant" not in across
    example.press("Ctrl+A")
    example.type("3")
    assert row(example).sentence.text() not in ("", across)


def test_a_margin_has_its_p(example: Hands) -> None:
    """As a margin on the side of harm, the sentence gives a p."""
    example.do("own-line")
    example.choose(row(example).kind, "non-inferiority margin")
    example.choose(row(example).side, "more")
    row(example).text.setFocus()
    example.type("5")
    assert " p " in row(example).sentence.text()


def test_what_cannot_be_read_is_marked(example: Hands) -> None:
    """The text stays, with one sentence that says what would do."""
    example.do("own-line")
    example.type("abc")
    assert row(example).text.marked
    assert row(example).mark.text().startswith("abc: ")
    assert not row(example).sentence.isVisible()


def test_ratios_are_lower_and_higher(example: Hands) -> None:
    """A difference is fewer or more, a ratio lower or higher, and the field shows such a number."""
    example.do("own-line")
    assert row(example).side.currentText() == "fewer"
    example.choose(row(example).scale, "risk ratio")
    assert row(example).side.currentText() == "lower"
    assert row(example).text.placeholderText() == "0.80"


def test_only_scales_of_measures_that_are_there_are_offered(example: Hands) -> None:
    """Counts have no hazard ratio."""
    example.do("own-line")
    scale = row(example).scale
    assert [scale.itemText(place) for place in range(scale.count())] == ["per 100", "risk ratio", "odds ratio"]


def test_a_closed_line_keeps_its_text(example: Hands) -> None:
    """The cross takes the line away; opened again, its text is there, and each is a step."""
    example.do("own-line")
    example.type("5")
    example.click(row(example).close_link)
    assert example.window.says.own_line is not None
    assert not example.window.says.own_line.isVisible()
    assert example.window.says.own_line_link is not None
    assert example.window.says.own_line_link.isVisible()
    example.do("own-line")
    assert row(example).text.text() == "5"


def test_undo_brings_the_cursor_back_to_the_line(example: Hands) -> None:
    """A text typed there and undone is shown with the cursor in its field."""
    example.do("own-line")
    example.type("5")
    example.do("first-cell")
    example.press("Ctrl+Z")
    assert example.field == "line_text"
    assert example.focus.text() == ""
    example.press("Ctrl+Z")
    assert example.window.session.outcome.line_kind == "none"


def test_tab_goes_through_the_line_in_reading_order(example: Hands) -> None:
    """From the links over it through kind, side, place and scale to the cross."""
    example.do("own-line")
    example.type("5")
    line = row(example)
    line.kind.setFocus()
    seen = []
    for _ in range(4):
        example.press("Tab")
        seen.append(example.focus)
    assert seen == [line.side, line.text, line.scale, line.close_link]
