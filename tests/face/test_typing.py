"""Typing a table: findings at every keystroke, the way of the cursor, and names as they are typed."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtGui import QGuiApplication

from fourcount.record.outcome import CELLS
from fourcount.wording import labels

if TYPE_CHECKING:
    from conftest import Hands

MEASURES = ["risk_difference", "number_needed", "risk_reference", "risk_index", "risk_ratio", "odds_ratio"]


def test_the_first_start_has_the_cursor_in_the_first_cell(hands: Hands) -> None:
    """A person can type at once; one quiet line offers an example, and nothing is claimed yet."""
    assert hands.field == CELLS[0]
    assert hands.window.printed.example.isVisible()
    assert hands.rows == {}
    assert hands.sentence == "Type the four counts of the table."
    assert hands.window.patient.waits.text() == labels.PATIENT_WAITS


def test_the_example_line_opens_the_example_and_goes_away(hands: Hands) -> None:
    """The quiet line shows the invented example, says that it is invented, and is gone with it."""
    hands.click(hands.window.printed.example)
    assert hands.texts == ("38", "374", "70", "339")
    assert "invented" in hands.window.header.source.text()
    assert not hands.window.printed.example.isVisible()
    assert hands.field == CELLS[0]


def test_the_example_line_goes_away_with_the_first_digit(hands: Hands) -> None:
    """Whoever types needs no example."""
    hands.type("3")
    assert not hands.window.printed.example.isVisible()


def test_four_counts_give_sentence_rows_and_picture(hands: Hands) -> None:
    """38 of 412 against 70 of 409: the figures of both columns appear, in order."""
    hands.count("38", "374", "70", "339")
    assert hands.sentence.startswith("Of 100 people in the reference group about 17")
    assert list(hands.rows) == MEASURES
    assert hands.rows["risk_difference"] == "Difference: 7.9 fewer, 3.3 to 12.6"
    assert hands.rows["risk_reference"] == "Risk, reference group: 17.1%, 13.8 to 21.1%"
    assert hands.rows["risk_ratio"].startswith("Risk ratio: 0.54")
    assert hands.rows["odds_ratio"].startswith("Odds ratio: 0.49")
    assert hands.p.startswith("p < 0.001, two-sided (N−1 chi-square)")
    assert hands.window.patient.figures.picture.isVisible()
    assert not hands.window.patient.waits.isVisible()


def test_rows_stand_on_screen_in_their_order(example: Hands) -> None:
    """The difference stands on top and the odds ratio last, each under the one before."""
    tops = [example.row(key).y() for key in MEASURES]
    assert tops == sorted(tops)
    assert len(set(tops)) == len(tops)


def test_each_keystroke_brings_new_figures(hands: Hands) -> None:
    """Without a button to press, every digit of the last count shows other figures."""
    hands.count("38", "374", "70")
    assert hands.rows == {}
    hands.press("Tab")
    seen = []
    for digit in "339":
        hands.type(digit)
        seen.append(hands.rows["risk_reference"])
    assert len(set(seen)) == len(seen)
    assert seen[-1].startswith("Risk, reference group: 17.1%")
    hands.press("Backspace", times=3)
    assert hands.rows == {}


def test_totals_follow_the_counts(hands: Hands) -> None:
    """Totals of rows, columns and everybody appear as soon as they can be known."""
    totals = hands.window.printed.grid.totals
    hands.count("38", "374")
    assert (totals["first"].text(), totals["second"].text(), totals["everyone"].text()) == ("412", "", "")
    hands.count("38", "374", "70", "1339")
    assert [totals[key].text() for key in ("first", "second", "left", "right", "everyone")] == [
        "412", "1,409", "108", "1,713", "1,821",
    ]  # fmt: skip


def test_tab_walks_the_cells_in_reading_order_and_back(hands: Hands) -> None:
    """Tab goes from cell to cell as one reads, Shift+Tab the other way."""
    there = []
    for _ in CELLS:
        there.append(hands.field)
        hands.press("Tab")
    assert there == list(CELLS)
    back = []
    for _ in CELLS:
        hands.press("Shift+Tab")
        back.append(hands.field)
    assert back == list(reversed(CELLS))


def test_tab_into_a_cell_selects_its_count(example: Hands) -> None:
    """A count that Tab arrives at is replaced by typing."""
    example.do("first-cell")
    example.press("Tab")
    example.type("9")
    assert example.texts == ("38", "9", "70", "339")


def test_tab_walks_every_field_in_reading_order_and_comes_round(example: Hands) -> None:
    """From the title to the cautions, the paper's result right after the counts, each control once."""
    window, grid, rare = example.window, example.window.printed.grid, example.window.printed.rare
    patient, bar = window.patient, window.header.bar
    assert rare.optional
    assert rare.check
    assert bar
    expected = [
        window.header.title, window.header.source, bar.tabs, bar.plus, window.printed.design, window.printed.name,
        window.printed.welcome, window.printed.event_words, window.printed.span,
        window.printed.form, window.printed.layout_choice,
        grid.headings["left"], grid.headings["right"], grid.labels["first"], grid.labels["second"],
        *grid.cells.values(), rare.check.paper.measure, rare.check.paper.text, *window.printed.links,
        *rare.optional.links.values(), window.says.sentence, *(example.row(key) for key in (*MEASURES, "test")),
        window.says.family, window.says.level, window.says.more, window.says.help, window.says.own_line_link,
        *window.says.copies, patient.start.kind, patient.baseline, patient.source, patient.effect,
        patient.figures.picture, patient.figures.show_patient, patient.figures.handout, patient.figures.draw,
        patient.figures.copy, patient.figures.curve, patient.figures.table, *patient.quiet.links.values(),
        window.cautions,
    ]  # fmt: skip
    example.click(window.header.title)
    seen = []
    for _ in expected:
        seen.append(example.focus)
        example.press("Tab")
    assert [widget.accessibleName() for widget in seen] == [widget.accessibleName() for widget in expected]
    assert seen == expected
    assert example.focus is window.header.title


@pytest.mark.parametrize(
    ("start", "keys", "end"),
    [
        (0, "Down", 2),
        (2, "Up", 0),
        (0, "Right", 1),
        (1, "Left", 0),
        (1, "Down", 3),
        (0, "Return", 1),
        (1, "Enter", 2),
        (2, "Return", 3),
        (3, "Return", 3),
        (0, "Up", 0),
        (2, "Down", 2),
        (1, "Right", 2),
    ],
)
def test_arrows_and_enter_go_from_cell_to_cell(hands: Hands, start: int, keys: str, end: int) -> None:
    """In the grid an arrow leads to the neighbour it points to, and Enter goes on in reading order."""
    hands.click(hands.window.printed.grid.cells[CELLS[start]])
    hands.press(keys)
    assert hands.field == CELLS[end]


def test_arrows_follow_the_eye_when_groups_run_across(hands: Hands) -> None:
    """With a group in each column, Right leads to the other group and Down to the other outcome."""
    hands.do("layout")
    hands.click(hands.window.printed.grid.cells[CELLS[0]])
    hands.press("Right")
    assert hands.field == "second_left_text"
    hands.press("Down")
    assert hands.field == "second_right_text"
    hands.press("Left")
    assert hands.field == "first_right_text"


def test_tab_follows_the_eye_when_groups_run_across(hands: Hands) -> None:
    """With a group in each column, reading order goes from group to group, and so does Tab."""
    hands.do("layout")
    hands.click(hands.window.printed.grid.cells[CELLS[0]])
    seen = []
    for _ in CELLS:
        seen.append(hands.field)
        hands.press("Tab")
    assert seen == ["first_left_text", "second_left_text", "first_right_text", "second_right_text"]


def test_what_has_the_focus_is_in_view(example: Hands) -> None:
    """In a small window the page scrolls to whatever Tab, an arrow or a command leads to."""
    window = example.window
    window.resize(480, 360)
    inside = window.centralWidget()
    example.qtbot.waitUntil(lambda: window.cautions.geometry().bottom() < inside.height() < 360)
    example.click(window.header.title)
    out_of_view = []
    for _ in range(40):
        example.press("Tab")
        if example.focus.visibleRegion().isEmpty():
            out_of_view.append(example.focus.accessibleName())
    assert out_of_view == []
    for command in ("baseline", "first-cell"):
        example.do(command)
        assert not example.focus.visibleRegion().isEmpty()
    example.press("Down")
    assert not example.focus.visibleRegion().isEmpty()


def test_a_pasted_text_without_a_table_loses_nothing(hands: Hands) -> None:
    """What is no table stays in the cell as it was pasted, marked, until somebody takes it apart."""
    QGuiApplication.clipboard().setText("38 or so of the 374")
    hands.press("Ctrl+V")
    assert hands.texts[0] == "38 or so of the 374"
    assert hands.window.printed.grid.cells[CELLS[0]].marked


def test_arrows_stay_inside_a_count_until_its_end(hands: Hands) -> None:
    """Left and Right move the cursor through the digits first, so that a count can be mended."""
    hands.type("384")
    hands.press("Left")
    hands.press("Left")
    assert hands.field == CELLS[0]
    hands.press("Del")
    assert hands.texts[0] == "34"


def test_enter_types_a_whole_table(hands: Hands) -> None:
    """Four counts with Enter between them are a table."""
    for text in ("38", "374", "70", "339"):
        hands.type(text)
        hands.press("Return")
    assert hands.texts == ("38", "374", "70", "339")
    assert "risk_ratio" in hands.rows


def test_an_arrow_selects_the_count_it_arrives_at(example: Hands) -> None:
    """What an arrow arrives at can be typed over at once."""
    example.do("first-cell")
    example.press("Down")
    example.type("71")
    assert example.texts == ("38", "374", "71", "339")


def test_names_show_up_wherever_they_belong(example: Hands) -> None:
    """Labels, headings, the event in words and the time span go into the sentence, the rows and the picture."""
    window, grid = example.window, example.window.printed.grid
    example.write(grid.labels["first"], "Night lights")
    example.write(grid.labels["second"], "Usual care")
    example.write(grid.headings["left"], "fell")
    example.write(grid.headings["right"], "did not fall")
    example.write(window.printed.event_words, "fell at least once")
    example.write(window.printed.span, "12 months")
    assert "with usual care about 17 fell at least once within 12 months" in example.sentence
    assert "with night lights" in example.sentence
    assert example.rows["risk_index"].startswith("Risk, night lights: ")
    assert grid.cells[CELLS[0]].accessibleName() == "Night lights, fell"
    assert "with usual care 17 (17%) fell at least once" in window.patient.figures.picture.accessibleDescription()
    assert "Still to be filled in" not in window.patient.figures.detail.text()


def test_a_picture_of_nameless_groups_says_what_is_missing(example: Hands) -> None:
    """Four counts alone are drawn with stand-in names, and the column lists what is still to be named."""
    detail = example.window.patient.figures.detail.text()
    assert (
        "Still to be filled in: what happens to them (“People who”), the name of the reference group, "
        "the name of the index group, “Time span”."
    ) in detail


def test_title_and_source_are_the_papers_own(hands: Hands) -> None:
    """The title names the window; the source line is kept."""
    hands.write(hands.window.header.title, "A trial of lamps")
    hands.write(hands.window.header.source, "table 2")
    assert hands.window.windowTitle() == "A trial of lamps[*] · Fourcount"
    assert hands.window.session.record.source_text == "table 2"
    hands.write(hands.window.header.title, "")
    assert hands.window.windowTitle() == "Fourcount[*]"


def test_text_is_never_taken_for_markup(example: Hands) -> None:
    """A name with tags stands as it was typed."""
    example.write(example.window.printed.grid.labels["first"], "<b>new</b> & old")
    assert "<b>new</b> & old" in example.rows["risk_index"]
    assert "<b>new</b> & old" in example.sentence


@pytest.mark.parametrize("pasted", ["1,204", "1'204", "38/412", "38 (9.2%)"])
def test_a_count_is_taken_as_it_is_printed(hands: Hands, pasted: str) -> None:
    """What stands in a paper's cell can be typed as it stands there, and stays so."""
    hands.type(pasted)
    assert hands.texts[0] == pasted
    assert not hands.window.printed.grid.cells[CELLS[0]].marked


def test_a_count_with_an_ordinary_space_is_used_and_said(hands: Hands) -> None:
    """38 374 could be two counts pasted into one cell, so the window says as what it was taken."""
    hands.count("38 374", "10", "70", "339")
    assert hands.texts[0] == "38 374"
    assert len(hands.notes) == 1
    assert "38,374" in hands.notes[0]
    assert "risk_ratio" in hands.rows
