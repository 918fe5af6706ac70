"""What is particular to a form: percentages, pairs, person-time, printed risks, an effect alone."""

from __future__ import annotations

from typing import TYPE_CHECKING

from fourcount.record.outcome import CELLS
from printed_forms import TYPED

if TYPE_CHECKING:
    from conftest import Hands


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
    """It begins as person-years, is said in the rates' lines, and comes back with an undo."""
    hands.do("form-person-time")
    hands.count(*TYPED["person-time"])
    unit = hands.window.printed.field_named("unit_text")
    assert unit is not None
    hands.write(unit, "patient-days")
    assert "patient-days" in hands.window.says._rows["rate_index"].accessibleDescription()
    hands.do("undo")
    assert unit.text() == "person-years"
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
    assert next(iter(hands.rows.values())).startswith("Odds ratio: 0.49, 0.32 to 0.75")
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
    assert patient.figures.picture.isVisible()
    assert not patient.effect.isEnabled()
    assert patient.effect.currentText().startswith("odds ratio 0.49")
