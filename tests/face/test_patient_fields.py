"""The fields of "For one patient": the ways of giving a starting risk, and those that open where they are needed."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt
from PySide6.QtWidgets import QApplication

from fourcount.face.fields import TextField
from fourcount.record.outcome import START_KINDS
from fourcount.wording.patient_labels import START_KINDS as KIND_WORDS

if TYPE_CHECKING:
    from conftest import Hands

FIELDS = {
    "one": ["starting_risk_text"],
    "three": ["low_risk_text", "starting_risk_text", "high_risk_text"],
    "rate": ["rate_text"],
    "overall": ["overall_risk_text", "exposed_share_text"],
}


def shown(hands: Hands) -> list[str]:
    """The fields of the starting risk that are on screen, from the left."""
    QApplication.sendPostedEvents()
    start = hands.window.patient.start
    fields = [field for field in start.fields if field.isVisible()]
    return [field.field for field in sorted(fields, key=TextField.x)]


def take(hands: Hands, kind: str) -> None:
    """Choose how the starting risk is given."""
    hands.choose(hands.window.patient.start.kind, KIND_WORDS[kind])


@pytest.mark.parametrize("kind", START_KINDS)
def test_each_way_shows_the_fields_it_needs_and_no_others(example: Hands, kind: str) -> None:
    """One risk, three, a rate, or an overall risk with a share; the source stays."""
    take(example, kind)
    assert shown(example) == FIELDS[kind]
    assert example.window.session.outcome.patient.start_kind == kind
    assert example.window.patient.source.isVisible()
    assert len({field.y() for field in example.window.patient.start.shown}) == 1


def test_what_was_typed_for_another_way_stays(example: Hands) -> None:
    """Going through all ways and back loses no text."""
    patient = example.window.patient
    example.write(patient.baseline, "12%")
    take(example, "rate")
    example.write(patient.start.shown[0], "12 per 1,000 person-years")
    take(example, "overall")
    share = next(field for field in example.window.patient.start.shown if field.field == "exposed_share_text")
    assert share.accessibleName() == "Share of people in the index group"
    take(example, "one")
    assert patient.baseline.text() == "12%"
    take(example, "rate")
    assert patient.start.shown[0].text() == "12 per 1,000 person-years"


def test_tab_goes_through_three_risks_in_reading_order(example: Hands) -> None:
    """From the choice through low, usual and high to the source."""
    take(example, "three")
    example.window.patient.start.kind.setFocus(Qt.FocusReason.TabFocusReason)
    seen = []
    for _ in range(4):
        example.press("Tab")
        seen.append(example.field)
    assert seen == [*FIELDS["three"], "starting_risk_source_text"]


def test_the_three_fields_say_which_they_are(example: Hands) -> None:
    """Above each stands a word, and a screen reader hears it in its name."""
    take(example, "three")
    fields = example.window.patient.start.shown
    assert [field.accessibleName() for field in fields] == [
        "Low starting risk", "Usual starting risk", "High starting risk",
    ]  # fmt: skip
    take(example, "one")
    assert example.window.patient.baseline.accessibleName() == "Starting risk"


def test_undo_returns_to_the_field_of_another_way(example: Hands) -> None:
    """A low risk typed and then left for one risk comes back with the way in which it is shown."""
    take(example, "three")
    example.write(example.window.patient.start.shown[0], "8%")
    take(example, "one")
    example.window.session.undo()
    assert shown(example) == FIELDS["three"]
    example.window.session.undo()
    assert example.field == "low_risk_text"
    assert example.focus.text() == ""


def test_the_key_to_the_starting_risk_leads_to_its_first_field(example: Hands) -> None:
    """However it is given, one key goes there."""
    take(example, "rate")
    example.do("first-cell")
    example.do("baseline")
    assert example.field == "rate_text"


def test_a_field_of_the_starting_risk_keeps_the_cursor_when_the_way_changes(example: Hands) -> None:
    """The cursor never stays in a field that is gone."""
    take(example, "three")
    example.window.patient.start.shown[2].setFocus()
    example.window.session.undo()
    assert example.focus.isVisible()


@pytest.mark.parametrize(
    ("key", "field"),
    [("span", "other_span_text"), ("words", "plain_event_text"), ("certainty", ""), ("handout", "")],
)
def test_a_quiet_link_opens_its_row_and_the_cross_closes_it(example: Hands, key: str, field: str) -> None:
    """The cursor goes into the row; closed while empty, the cursor is back on the link."""
    quiet = example.window.patient.quiet
    assert key not in quiet.rows
    example.click(quiet.links[key])
    assert quiet.rows[key].isVisible()
    assert example.field == field
    assert example.focus is quiet.rows[key].stops[0]
    example.click(quiet.rows[key].close_link)
    assert not quiet.rows[key].isVisible()
    assert example.focus is quiet.links[key]


def test_a_row_that_holds_something_stays_open(example: Hands) -> None:
    """Text in it keeps it there and takes its cross away; emptied it can be closed again."""
    quiet = example.window.patient.quiet
    example.click(quiet.links["span"])
    example.type("5 years")
    row = quiet.rows["span"]
    assert not row.close_link.isVisible()
    assert example.window.session.outcome.patient.other_span_text == "5 years"
    example.do("swap")
    assert row.isVisible()
    example.write(row.fields[0], "")
    assert row.close_link.isVisible()


def test_another_time_span_stands_above_the_picture(example: Hands) -> None:
    """What the figures rest on is read before them."""
    quiet = example.window.patient.quiet
    example.click(quiet.links["span"])
    QApplication.sendPostedEvents()
    patient = example.window.patient
    bottom = quiet.rows["span"].mapTo(patient, quiet.rows["span"].rect().bottomLeft()).y()
    assert patient.effect.y() < bottom
    assert bottom < patient.figures.mapTo(patient, patient.figures.rect().topLeft()).y()


def test_certainty_and_handout_are_choices_that_can_be_undone(example: Hands) -> None:
    """Each choice is a step; nothing rated and standing on the handout is how an outcome begins."""
    quiet = example.window.patient.quiet
    example.click(quiet.links["certainty"])
    example.choose(quiet.rows["certainty"].choice, "very low")
    assert example.window.session.outcome.certainty == "very-low"
    example.click(quiet.links["handout"])
    example.choose(quiet.rows["handout"].choice, "left out")
    assert example.window.session.outcome.on_handout is False
    example.window.session.undo()
    assert example.window.session.outcome.on_handout is True


def test_plain_words_show_what_a_patient_is_told_without_them(hands: Hands) -> None:
    """The empty fields hold the event in the present, as the patient's page would say it."""
    hands.do("example")
    quiet = hands.window.patient.quiet
    hands.write(quiet.rows["words"].fields[0], "")
    assert quiet.rows["words"].fields[0].placeholderText() == "fall at least once"
    assert quiet.rows["words"].fields[1].text() == "do not fall"


def test_undo_opens_the_row_of_its_field(example: Hands) -> None:
    """A plain word that is undone is shown with the cursor in its field."""
    quiet = example.window.patient.quiet
    example.click(quiet.links["words"])
    example.type("fall")
    example.do("first-cell")
    example.press("Ctrl+Z")
    assert example.field == "plain_event_text"
    assert example.focus.isVisible()


def test_a_new_record_has_its_rows_closed(example: Hands) -> None:
    """What was open for one paper is not open for the next."""
    quiet = example.window.patient.quiet
    example.click(quiet.links["span"])
    example.do("new")
    example.count("38", "374", "70", "339")
    assert not quiet.rows["span"].isVisible()


def test_nothing_to_show_has_no_rows_and_no_buttons(hands: Hands) -> None:
    """Before there is a table, the column is its fields and one quiet line."""
    patient = hands.window.patient
    for widget in (patient.figures.show_patient, patient.figures.handout, patient.quiet, patient.figures.table):
        assert not widget.isVisible()
    assert patient.waits.isVisible()


@pytest.mark.parametrize("overall", ["90%", "100%"])
def test_where_no_start_gives_the_overall_risk_the_odds_ratio_is_one_press_away(example: Hands, overall: str) -> None:
    """The reason is said, whatever else is pointed out, and the link that it speaks of is there."""
    example.do("swap")
    take(example, "overall")
    for field, text in zip(example.window.patient.start.shown, (overall, "60%"), strict=True):
        example.write(field, text)
    patient = example.window.patient
    assert "the odds ratio can be carried instead" in patient.waits.text()
    assert patient.figures.odds.isVisible()
    assert not patient.figures.picture.isVisible()
    example.click(patient.figures.odds)
    assert not patient.figures.odds.isVisible()
    assert patient.waits.text() == ""
