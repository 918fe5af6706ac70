"""Fields that few papers need: absent, opened by a quiet link, there while they hold something."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from fourcount.face.printed.optional import OptionalFields
from fourcount.wording.printed_labels import OPENED, OPTIONAL

if TYPE_CHECKING:
    from conftest import Hands

FIRST_FIELDS = {
    "losses": "first_randomised_text",
    "clusters": "icc_text",
}


def optional_of(hands: Hands) -> OptionalFields:
    """The part of the column that holds them."""
    optional = hands.window.printed.rare.optional
    assert optional is not None
    return optional


def test_the_first_start_has_none(hands: Hands) -> None:
    """While nothing is typed there is not even a link."""
    assert hands.window.printed.rare.optional is None
    hands.type("3")
    assert optional_of(hands).isVisible()


@pytest.mark.parametrize("key", list(OPTIONAL))
def test_a_link_opens_its_row_and_the_row_closes_again(example: Hands, key: str) -> None:
    """The row comes with the cursor in it; closed, its link is back with the cursor on it."""
    optional = optional_of(example)
    link = optional.links[key]
    assert link.isVisible()
    example.click(link)
    row = optional.rows[key]
    assert row.isVisible()
    assert link.isVisible()
    assert link.accessibleDescription() == OPENED
    assert example.focus is row.stops[0]
    example.click(link)
    assert example.focus is row.stops[0]
    if key == "follow-up":
        assert example.window.session.outcome.follow_up_varied
        example.do("undo")
    example.click(row.close_link)
    assert not row.isVisible()
    assert not link.accessibleDescription()
    assert link.isVisible()
    assert example.focus is link


@pytest.mark.parametrize("key", list(FIRST_FIELDS))
def test_a_row_that_holds_something_stays(example: Hands, key: str) -> None:
    """It cannot be closed while it is filled, and an emptied one can."""
    optional = optional_of(example)
    example.click(optional.links[key])
    row = optional.rows[key]
    example.type("7")
    assert getattr(example.window.session.outcome, FIRST_FIELDS[key]) == "7"
    assert not row.close_link.isVisible()
    example.press("Backspace")
    assert row.close_link.isVisible()


def test_content_opens_rows_by_itself(example: Hands) -> None:
    """An undo that brings a text back brings its row and the cursor."""
    optional = optional_of(example)
    example.click(optional.links["clusters"])
    example.type("0.02")
    example.press("Tab")
    example.type("25")
    record = example.window.session.record
    example.do("undo")
    example.do("undo")
    example.click(optional.rows["clusters"].close_link)
    assert not optional.rows["clusters"].isVisible()
    example.do("redo")
    assert optional.rows["clusters"].isVisible()
    assert example.field == "icc_text"
    example.do("redo")
    assert example.window.session.record == record


def test_a_new_record_opens_nothing_of_the_last(example: Hands) -> None:
    """Rows are remembered by what they hold."""
    optional = optional_of(example)
    example.click(optional.links["losses"])
    example.do("new")
    example.type("3")
    assert not optional.rows["losses"].isVisible()


def test_events_take_risks_away(example: Hands) -> None:
    """Counts of events, several a person, give no risk, and say so."""
    optional = optional_of(example)
    example.click(optional.links["counting"])
    choice = optional.rows["counting"].choice
    assert choice is not None
    example.choose(choice, "events, several a person")
    assert example.window.session.outcome.counting == "events"
    assert not any("17.1%" in row for row in example.rows.values())
    example.do("undo")
    assert example.rows["risk_reference"].startswith("Risk, reference group: 17.1%")


def test_varied_follow_up_takes_the_number_needed_away(example: Hands) -> None:
    """Raw counts of people followed for different times give none."""
    optional = optional_of(example)
    example.click(optional.links["follow-up"])
    choice = optional.rows["follow-up"].choice
    assert choice is not None
    example.choose(choice, "varied between people")
    assert not any(character.isdigit() for character in example.rows["number_needed"])


def test_clusters_widen_the_intervals(example: Hands) -> None:
    """Correlation and mean size divide the counts behind every interval."""
    before = example.rows["risk_difference"]
    example.click(optional_of(example).links["clusters"])
    example.type("0.02")
    example.press("Tab")
    example.type("25")
    assert example.rows["risk_difference"].split(",")[0] == before.split(",")[0]
    assert example.rows["risk_difference"] != before


def test_a_correlation_above_one_is_said(example: Hands) -> None:
    """It is marked, and a sentence stands under the table."""
    example.click(optional_of(example).links["clusters"])
    example.type("1.5")
    example.press("Tab")
    example.type("25")
    field = example.window.printed.field_named("icc_text")
    assert field is not None
    said = [*example.notes, *example.rows.values(), example.sentence]
    assert field.marked or any("intracluster" in text.lower() for text in said)


def test_losses_stand_under_the_fold(example: Hands) -> None:
    """Typed losses bring their scenarios beside the other measures."""
    before = len(example.rows)
    example.click(optional_of(example).links["losses"])
    for text in ("420", "8", "420", "11"):
        if text:
            example.type(text)
        example.press("Tab")
    outcome = example.window.session.outcome
    assert (outcome.first_lost_text, outcome.second_randomised_text, outcome.second_lost_text) == ("8", "420", "11")
    example.do("more")
    assert len(example.rows) > before + 2


def test_an_adjusted_effect_stands_beside_the_counts(example: Hands) -> None:
    """Measure, figure and what it is adjusted for are kept; the figure is a row of its own, above the fold."""
    optional = optional_of(example)
    example.click(optional.links["adjusted"])
    row = optional.rows["adjusted"]
    assert row.choice is not None
    example.choose(row.choice, "odds ratio")
    example.write(row.fields[0], "0.58 (0.39 to 0.85)")
    example.write(row.fields[1], "age")
    outcome = example.window.session.outcome
    assert (outcome.adjusted_text, outcome.adjusted_for_text) == ("0.58 (0.39 to 0.85)", "age")
    assert any("0.58" in row for row in example.rows.values())


def test_where_the_numbers_stand_is_kept(example: Hands) -> None:
    """Numbers of the abstract alone are cautioned."""
    optional = optional_of(example)
    before = example.window.cautions.texts
    example.click(optional.links["where"])
    choice = optional.rows["where"].choice
    assert choice is not None
    example.choose(choice, "in the abstract")
    assert example.window.session.outcome.where == "abstract"
    assert example.window.cautions.texts != before


def test_each_form_offers_what_fits_it(example: Hands) -> None:
    """Pairs have no clusters, and a printed effect has only its place."""
    links = optional_of(example).links
    example.do("form-pairs")
    assert [key for key, link in links.items() if link.isVisible()] == ["adjusted", "where"]
    example.do("form-effect-only")
    assert [key for key, link in links.items() if link.isVisible()] == ["where"]


def test_a_filled_row_is_there_in_every_form(example: Hands) -> None:
    """What holds something is never hidden."""
    optional = optional_of(example)
    example.click(optional.links["clusters"])
    example.type("0.02")
    example.do("form-pairs")
    assert optional.rows["clusters"].isVisible()


def test_more_measures_are_offered_where_there_are_any(example: Hands) -> None:
    """A printed effect in a trial has none beside it; four counts have."""
    more = example.window.says.more
    assert more.isVisible()
    example.do("form-effect-only")
    assert not more.isVisible()
