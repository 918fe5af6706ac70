"""Every form of print: chosen by its specimen, typed by keyboard, read, said, and taken back."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt
from PySide6.QtWidgets import QWidget

from fourcount.face.links import Link
from fourcount.record.outcome import CELLS, FORMS, Form, form_of
from fourcount.record.paper import Record
from fourcount.wording import labels
from printed_forms import TYPED

if TYPE_CHECKING:
    from conftest import Hands

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


def test_rates_ask_for_a_starting_risk(hands: Hands) -> None:
    """Person-time has no risk of its own: one sentence, no picture, until a risk is typed."""
    hands.do("form-person-time")
    hands.count(*TYPED["person-time"])
    patient = hands.window.patient
    assert patient.waits.isVisible()
    assert patient.baseline.placeholderText() == "needed"
    assert not patient.figures.picture.isVisible()
    assert not patient.figures.copy.isVisible()
    hands.write(patient.baseline, "12%")
    assert patient.figures.picture.isVisible()


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


@pytest.mark.parametrize("form", FORMS)
def test_every_row_of_every_form_has_a_working(hands: Hands, form: Form) -> None:
    """Each row opens, and Escape closes it."""
    hands.fill(form)
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

    hands.fill(form)
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
    check = hands.window.printed.rare.check
    assert check is not None
    paper = (check.paper.measure, *check.paper.fields)
    tops = [hands.top(widget) for widget in seen if hands.stands_alone(widget) and widget not in paper]
    assert tops == sorted(tops)


@pytest.mark.parametrize("form", [form for form in FORMS if form != "effect-only"])
def test_tab_goes_from_the_table_to_what_the_paper_says(hands: Hands, form: Form) -> None:
    """After the last count the paper's own result comes next; the links, which few need, come after it."""
    hands.fill(form)
    if form == "strata":
        hands.press("Tab", 3)  # through the empty row
    for _ in range(2):
        hands.press("Tab")
    assert hands.field == "paper_text"
    hands.press("Tab")
    hands.qtbot.waitUntil(lambda: isinstance(hands.focus, Link))


def test_a_form_that_makes_the_study_another_one_says_so(hands: Hands) -> None:
    """Pairs make a trial a paired study, and a matched study makes the form pairs: both are told under the table."""
    printed = hands.window.printed
    hands.do("form-pairs")
    assert labels.DESIGNS["paired"] in hands.notice
    hands.do("first-cell")
    hands.type("1")
    assert not hands.notice
    hands.do("form-events-of-total")
    assert labels.DESIGNS["trial"] in hands.notice
    hands.do("form-percent-of-total")
    assert not hands.notice
    hands.choose(printed.design, labels.DESIGNS["matched"])
    assert labels.FORM_NOTES["pairs"] in hands.notice


@pytest.mark.qt_log_ignore("does not support grabbing the keyboard", extend=True)  # a list, on a screen that is none
def test_a_key_goes_to_the_kind_of_study(hands: Hands) -> None:
    """It opens the choice."""
    hands.window.actions_by_key["study"].trigger()
    hands.qtbot.waitUntil(hands.window.printed.design.view().isVisible)
    hands.window.printed.design.hidePopup()


def test_a_figure_that_cannot_be_carried_asks_for_no_starting_risk(hands: Hands) -> None:
    """The fields of the third column are there only where a starting risk would come to something."""
    patient = hands.window.patient
    hands.fill("effect-only")
    assert patient.baseline.isVisible()
    hands.write(hands.focus, "rate difference 1.2 (0.3 to 2.1)")
    for field in (patient.start.kind, patient.baseline, patient.source, patient.effect):
        assert not field.isVisible()
    assert patient.waits.text()
    assert not hands.window.actions_by_key["baseline"].isEnabled()
    hands.do("form-events-of-total")
    assert patient.baseline.isVisible()
    assert hands.window.actions_by_key["baseline"].isEnabled()


def test_a_lone_effect_is_an_odds_ratio_until_its_text_names_another(hands: Hands) -> None:
    """The choice beside the text follows what is typed, in the same step, and stays when the name is edited away."""
    hands.do("form-effect-only")
    check = hands.window.printed.rare.check
    assert check is not None
    assert check.paper.measure.currentText() == "odds ratio"
    hands.type("HR 0.72")
    assert check.paper.measure.currentText() == "hazard ratio"
    hands.write(check.paper.text, "0.72 (0.55 to 0.92)")
    assert check.paper.measure.currentText() == "hazard ratio"
    hands.do("undo")
    assert check.paper.measure.currentText() == "odds ratio"


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
