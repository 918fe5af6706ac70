"""Every form of print: chosen by its specimen, typed by keyboard, read, said, and taken back."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt
from PySide6.QtWidgets import QWidget

from fourcount.record.outcome import CELLS, FORMS, Form, form_of
from fourcount.record.paper import Record
from fourcount.wording import labels

if TYPE_CHECKING:
    from conftest import Hands

TYPED: dict[Form, tuple[str, str, str, str]] = {
    "events-and-others": ("38", "374", "70", "339"),
    "events-of-total": ("38", "412", "70", "409"),
    "percent-of-total": ("9.2%", "412", "17.1%", "409"),
    "pairs": ("12", "21", "9", "58"),
    "person-time": ("38", "4120", "70", "3980"),
    "risk-at-time": ("9%", "6 to 12", "17%", "13 to 21"),
}
FIRST_ROWS: dict[Form, str] = {
    "events-and-others": "Difference: 7.9 fewer, 3.3 to 12.6",
    "events-of-total": "Difference: 7.9 fewer, 3.3 to 12.6",
    "percent-of-total": "Difference: 7.9 fewer, 3.3 to 12.6",
    "pairs": "Difference, paired: 12.0 more",
    "person-time": "Rate difference: ",
    "risk-at-time": "Difference: 8.0 fewer",
}


def said(hands: Hands) -> list[str]:
    """The rows on screen from the top."""
    return list(hands.rows.values())


@pytest.mark.parametrize("form", FORMS)
def test_each_form_has_a_key_that_takes_it_and_goes_to_its_first_field(hands: Hands, form: Form) -> None:
    """F2 to F9 take a form; the cursor stands where it begins, and the choice shows its specimen."""
    hands.do(f"form-{form}")
    assert form_of(hands.window.session.outcome.table) == form
    assert hands.window.printed.form.currentText() == labels.FORMS[form]
    assert hands.focus is hands.window.printed.first_field
    expected = {"effect-only": "paper_text", "strata": "strata.0.first_left_text"}.get(form, CELLS[0])
    assert hands.field == expected


@pytest.mark.qt_log_ignore("does not support grabbing the keyboard", extend=True)  # a list, on a screen that is none
def test_the_key_of_the_choice_opens_its_list(hands: Hands) -> None:
    """One key opens the list of specimens, each with what it stands for."""
    hands.window.actions_by_key["form"].trigger()
    view = hands.window.printed.form.view()
    hands.qtbot.waitUntil(view.isVisible)
    notes = [view.model().index(row, 0).data(Qt.ItemDataRole.StatusTipRole) for row in range(len(FORMS))]
    assert notes == list(labels.FORM_NOTES.values())
    hands.window.printed.form.hidePopup()


@pytest.mark.parametrize("form", list(TYPED))
def test_a_form_of_four_cells_is_typed_with_tab(hands: Hands, form: Form) -> None:
    """Tab walks the four cells in reading order; figures stand as soon as they are there."""
    hands.do(f"form-{form}")
    hands.count(*TYPED[form])
    assert hands.texts == TYPED[form]
    assert said(hands)[0].startswith(FIRST_ROWS[form])
    assert hands.notes == []


@pytest.mark.parametrize("form", list(TYPED))
def test_a_form_of_four_cells_is_typed_with_enter(hands: Hands, form: Form) -> None:
    """Enter goes on as Tab does."""
    hands.do(f"form-{form}")
    for text in TYPED[form]:
        hands.type(text)
        hands.press("Return")
    assert hands.texts == TYPED[form]


@pytest.mark.parametrize("form", FORMS)
def test_taking_a_form_is_one_step(example: Hands, form: Form) -> None:
    """One undo brings back the counts as they were typed, with their figures."""
    rows = example.rows
    example.do(f"form-{form}")
    if form == "events-and-others":
        return
    example.do("undo")
    assert example.texts == ("38", "374", "70", "339")
    assert example.rows == rows
    assert example.window.printed.grid.isVisible()
    assert example.field == ("paper_text" if form == "effect-only" else CELLS[0])


@pytest.mark.parametrize("form", list(TYPED))
def test_cells_say_what_they_are_in_every_form(hands: Hands, form: Form) -> None:
    """Each of the four cells has an accessible name of its own."""
    hands.do(f"form-{form}")
    names = [cell.accessibleName() for cell in hands.window.printed.grid.cells.values()]
    assert all(names)
    assert len(set(names)) == 4


def test_stepping_through_the_forms_loses_nothing(example: Hands) -> None:
    """With the arrow keys each form on the way is taken; the counts arrive where they can be kept, and come back."""
    form = example.window.printed.form
    example.choose(form, "38 in 4,120 person-years")
    assert (example.texts[0], example.texts[2]) == ("38", "70")
    example.choose(form, "strata")
    example.choose(form, "38 · 374")
    assert example.texts == ("38", "374", "70", "339")
    assert example.window.printed.design.currentData() == "trial"


def test_stepping_through_the_designs_loses_nothing(example: Hands) -> None:
    """Paired designs on the way are passed through."""
    example.choose(example.window.printed.design, "before-after study")
    example.choose(example.window.printed.design, "randomised trial")
    assert example.texts == ("38", "374", "70", "339")
    assert example.window.printed.form.currentData() == "events-and-others"


def test_the_paper_is_asked_for_the_measure_that_fits(example: Hands) -> None:
    """Rates bring the rate ratio, cases and controls the odds ratio, until somebody types or chooses."""
    check = example.window.printed.rare.check
    assert check is not None
    assert check.paper.measure.currentText() == "risk ratio"
    example.do("form-person-time")
    assert check.paper.measure.currentText() == "rate ratio"
    example.do("undo")
    example.choose(example.window.printed.design, "case-control study")
    assert check.paper.measure.currentText() == "odds ratio"
    example.choose(check.paper.measure, "hazard ratio")
    example.choose(example.window.printed.design, "randomised trial")
    assert check.paper.measure.currentText() == "hazard ratio"


def test_percentages_show_the_people_they_stand_for(hands: Hands) -> None:
    """Under 9.2% of 412 stand 38 people; the others and the sums are worked out."""
    hands.do("form-percent-of-total")
    hands.count("9.2%", "412", "17.1", "409")
    grid = hands.window.printed.grid
    assert grid.note("first_left_text").text() == "= 38"
    assert grid.note("second_left_text").text() == "= 70"
    assert (grid.totals["first"].text(), grid.totals["right"].text()) == ("374", "821")
    hands.do("form-events-and-others")
    assert not grid.note("first_left_text").isVisible()


def test_a_percentage_that_no_count_gives_is_said(hands: Hands) -> None:
    """50.5% of 10 cannot be; the line under the table says so."""
    hands.do("form-percent-of-total")
    hands.count("50.5%", "10", "17.1%", "409")
    assert any("50.5%" in note for note in hands.notes)
    assert hands.window.printed.grid.cells[CELLS[0]].marked


def test_pairs_make_the_study_a_paired_one_and_back(hands: Hands) -> None:
    """Choosing pairs changes the design with them, and a design of pairs brings their grid."""
    hands.do("form-pairs")
    assert hands.window.printed.design.currentData() == "paired"
    assert not hands.window.printed.layout_choice.isVisible()
    hands.choose(hands.window.printed.design, "randomised trial")
    assert hands.window.printed.form.currentData() == "events-and-others"
    hands.choose(hands.window.printed.design, "before-after study")
    assert hands.window.printed.form.currentData() == "pairs"
    sides = hands.window.printed.grid.labels
    assert (sides["first"].placeholderText(), sides["second"].placeholderText()) == ("after", "before")


def test_the_discordant_pairs_are_named(hands: Hands) -> None:
    """Both counts on which the comparison rests say whose event they are; rows repeat the headings."""
    hands.do("form-pairs")
    grid = hands.window.printed.grid
    hands.write(grid.labels["first"], "Cream A")
    hands.write(grid.labels["second"], "Cream B")
    hands.write(grid.headings["left"], "healed")
    assert grid.note("first_right_text").text() == "only Cream A"
    assert grid.note("second_left_text").text() == "only Cream B"
    assert grid.row_head("left").text() == "healed"
    assert grid.cells["first_right_text"].accessibleName() == "pairs: healed on the side of Cream A only"


def test_a_matched_case_control_study_gives_its_odds_ratio_and_nothing_else(hands: Hands) -> None:
    """The conditional odds ratio of the pairs stands alone; all else is withheld with one reason."""
    hands.choose(hands.window.printed.design, "matched case-control study")
    hands.count("12", "21", "9", "58")
    rows = hands.rows
    assert rows.pop("pair_odds_ratio").startswith("Odds ratio of the pairs: 2.33")
    assert len(rows) == 1
    assert "matched case-control" in next(iter(rows.values()))


def test_swapping_sides_of_pairs_turns_their_odds_ratio(hands: Hands) -> None:
    """21 to 9 becomes 9 to 21; nothing that was typed moves."""
    hands.do("form-pairs")
    hands.count("12", "21", "9", "58")
    hands.do("swap")
    assert hands.texts == TYPED["pairs"]
    assert hands.rows["pair_odds_ratio"].startswith("Odds ratio of the pairs: 0.43")


def test_the_unit_of_person_time_is_typed_over_its_column(hands: Hands) -> None:
    """The unit is said in the rates' lines, and comes back with an undo."""
    hands.do("form-person-time")
    hands.count(*TYPED["person-time"])
    unit = hands.window.printed.field_named("unit_text")
    assert unit is not None
    hands.write(unit, "patient-days")
    assert "patient-days" in hands.window.says._rows["rate_index"].accessibleDescription()
    hands.do("undo")
    assert unit.text() == ""
    assert hands.focus is unit


def test_rates_have_strips_of_their_own(hands: Hands) -> None:
    """Rates share a scale from 0, their difference has one around 0."""
    hands.do("form-person-time")
    hands.count(*TYPED["person-time"])
    for key in ("rate_index", "rate_reference", "rate_difference", "rate_ratio"):
        assert hands.row(key)._scale is not None
    assert hands.row("rate_index")._scale == hands.row("rate_reference")._scale


def test_the_level_of_printed_limits_is_typed_over_them(hands: Hands) -> None:
    """90% limits give the same estimate and are called so."""
    hands.do("form-risk-at-time")
    hands.count(*TYPED["risk-at-time"])
    level = hands.window.printed.field_named("limits_level_text")
    assert level is not None
    hands.write(level, "90%")
    assert hands.window.says._head is not None
    assert hands.window.says._head.accessibleName() == "90% interval"
    assert not hands.window.says.family.isVisible()


def test_a_form_without_counts_is_one_line(hands: Hands) -> None:
    """The measure, the printed text and what it is adjusted for; no grid, no swap, and its figure as printed."""
    hands.do("form-effect-only")
    printed = hands.window.printed
    assert not printed.grid.isVisible()
    hands.type("0.49 (0.32 to 0.75)")
    check = printed.rare.check
    assert check is not None
    hands.choose(check.paper.measure, "odds ratio")
    assert said(hands)[0].startswith("Odds ratio: 0.49, 0.32 to 0.75")
    assert [link.text() for link in printed.links if link.isVisible()] == ["Clear", "Paste…"]
    hands.write(check.paper.adjusted, "age")
    assert hands.window.session.outcome.adjusted_for_text == "age"
    assert not hands.window.says.family.isVisible()


def test_the_groups_of_an_effect_alone_are_named(hands: Hands) -> None:
    """Who is compared with whom stands under the effect, the index group first, also after a swap."""
    hands.do("form-effect-only")
    hands.type("OR 0.49 (0.32 to 0.75)")
    assert hands.window.printed.rare.check is not None
    groups = hands.window.printed.rare.check.paper.groups
    hands.write(groups["first"], "Night lights")
    hands.write(groups["second"], "Usual care")
    outcome = hands.window.session.outcome
    assert (outcome.first_label_text, outcome.second_label_text) == ("Night lights", "Usual care")
    assert "night lights" in hands.sentence
    hands.do("swap")
    assert (groups["first"].text(), groups["second"].text()) == ("Usual care", "Night lights")


def test_a_printed_effect_is_carried_to_a_typed_starting_risk(hands: Hands) -> None:
    """An odds ratio alone needs a starting risk, and then draws its picture."""
    hands.do("form-effect-only")
    hands.type("OR 0.49 (0.32 to 0.75)")
    patient = hands.window.patient
    assert "starting risk" in patient.waits.text()
    assert patient.baseline.placeholderText() == "needed"
    hands.write(patient.baseline, "12%")
    assert patient.picture.isVisible()
    assert not patient.effect.isEnabled()
    assert patient.effect.currentText().startswith("odds ratio 0.49")


@pytest.mark.parametrize("form", ["pairs", "person-time"])
def test_a_form_that_carries_nothing_says_so_quietly(hands: Hands, form: Form) -> None:
    """The patient's column has one sentence and no picture."""
    hands.do(f"form-{form}")
    hands.count(*TYPED[form])
    patient = hands.window.patient
    assert patient.waits.isVisible()
    assert not patient.picture.isVisible()
    assert not patient.copy.isVisible()


@pytest.mark.parametrize("form", list(TYPED))
def test_wrong_input_is_marked_and_the_rest_goes_on(hands: Hands, form: Form) -> None:
    """A cell that cannot be read says why under the table; mending it brings the figures."""
    hands.do(f"form-{form}")
    hands.count("abc", *TYPED[form][1:])
    assert hands.window.printed.grid.cells[CELLS[0]].marked
    assert hands.notes[0].startswith("abc")
    assert hands.rows == {}
    hands.write(hands.window.printed.grid.cells[CELLS[0]], TYPED[form][0])
    assert hands.notes == []
    assert hands.rows != {}


def fill(hands: Hands, form: Form) -> None:
    """Take a form and type something whole into it."""
    hands.do(f"form-{form}")
    if form == "effect-only":
        hands.type("OR 0.49 (0.32 to 0.75)")
    elif form == "strata":
        for text in ("38", "412", "70", "409", "old", "10", "100", "20", "100"):
            hands.type(text)
            hands.press("Return")
    else:
        hands.count(*TYPED[form])


@pytest.mark.parametrize("form", FORMS)
def test_every_row_of_every_form_has_a_working(hands: Hands, form: Form) -> None:
    """Each row opens, and Escape closes it."""
    fill(hands, form)
    hands.do("more")
    for key in list(hands.rows):
        hands.click(hands.row(key))
        assert hands.window.says.working.isVisible(), key
        assert len(hands.window.says.working.text()) > 40
        hands.press("Escape")
        assert not hands.window.says.working.isVisible()


@pytest.mark.parametrize("form", FORMS)
def test_copies_hold_every_form_that_is_whole(hands: Hands, form: Form) -> None:
    """Text and table are on the clipboard as soon as anything can be said."""
    from PySide6.QtGui import QGuiApplication

    fill(hands, form)
    for command in ("copy-text", "copy-table"):
        QGuiApplication.clipboard().clear()
        hands.do(command)
        assert len(QGuiApplication.clipboard().text()) > 100
        assert hands.window.header.notice.text() == labels.COPIED[command]


@pytest.mark.parametrize("form", FORMS)
def test_tab_comes_round_in_every_form(hands: Hands, form: Form) -> None:
    """Tab reaches every stop on screen once, and nothing that is hidden."""
    hands.do(f"form-{form}")
    hands.write(hands.window.printed.name, "Falls")
    hands.click(hands.window.header.title)
    start, seen = hands.focus, []
    for _ in range(80):
        seen.append(hands.focus)
        hands.press("Tab")
        if hands.focus is start:
            break
    assert hands.focus is start
    stops = [
        widget
        for widget in hands.window.findChildren(QWidget)
        if widget.isVisible() and widget.isEnabled() and widget.focusPolicy() & Qt.FocusPolicy.TabFocus
    ]
    assert {id(widget) for widget in stops} - {id(widget) for widget in seen} == set()
    tops = [hands.top(widget) for widget in seen if hands.stands_alone(widget)]
    assert tops == sorted(tops)


def test_every_form_can_be_walked_through_and_undone(example: Hands) -> None:
    """Through all forms and back to the beginning, the record is empty again and then the same."""
    for form in FORMS:
        example.do(f"form-{form}")
    record = example.window.session.record
    steps = 0
    while example.window.session.can_undo:
        example.do("undo")
        steps += 1
    assert example.window.session.record == Record()
    for _ in range(steps):
        example.do("redo")
    assert example.window.session.record == record
