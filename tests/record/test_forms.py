"""One table in every form of print: what is carried over from each to each."""

from __future__ import annotations

import itertools

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record import editing
from fourcount.record.entry.pairs import read_pairs
from fourcount.record.entry.strata import read_strata
from fourcount.record.entry.table import read_table
from fourcount.record.outcome import (
    CELLS,
    COUNTED_FORMS,
    FORMS,
    PAIRED_DESIGNS,
    EffectOnly,
    EventsAndOthers,
    EventsOfTotal,
    Outcome,
    Pairs,
    PercentOfTotal,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
    form_of,
)


def cells(*texts):
    """Four texts by the names of their cells."""
    return dict(zip(CELLS, texts, strict=True))


def texts(table):
    """The four texts of a table."""
    return tuple(getattr(table, field) for field in CELLS)


FALLS = Outcome(table=EventsOfTotal(**cells("38", "412", "70", "409")))
PAIRED = Outcome(table=Pairs(**cells("12", "30", "9", "49")), design="paired")
counts = st.integers(0, 60) | st.integers(0, 10**8)


@given(st.tuples(counts, counts, counts, counts), st.sampled_from(COUNTED_FORMS), st.sampled_from(COUNTED_FORMS))
def test_forms_of_four_counts_keep_every_count(table, form, other):
    """Any of the three forms becomes any other and back without altering a number, and none is marked on the way."""
    outcome = editing.in_form(Outcome(table=EventsAndOthers(**cells(*map(str, table)))), form)
    for step in (outcome, editing.in_form(outcome, other), editing.in_form(editing.in_form(outcome, other), form)):
        reading = read_table(step.table)
        found = (reading.first.left, reading.first.right, reading.second.left, reading.second.right)
        assert found == table
        assert reading.marks == ()


def test_a_count_becomes_the_percentage_that_only_it_rounds_to():
    """One decimal is enough for 412 people and not for 12,000."""
    assert texts(editing.in_form(FALLS, "percent-of-total").table) == ("9.2%", "412", "17.1%", "409")
    many = Outcome(table=EventsOfTotal(**cells("38", "12,000", "0", "5")))
    assert texts(editing.in_form(many, "percent-of-total").table) == ("0.317%", "12000", "0.0%", "5")


def test_a_percentage_without_its_total_is_no_count():
    """It goes where it would be read as people, and stays where it would not be read as another number."""
    alone = Outcome(table=PercentOfTotal(**cells("9", "", "9.2%", "")))
    assert texts(editing.in_form(alone, "events-of-total").table) == ("", "", "9.2%", "")


def test_person_time_takes_the_events_and_leaves_the_people():
    """The totals of people are no person-time; on the way back the person-time is no number of people."""
    typed = Outcome(table=EventsOfTotal(**cells("38/412", "412", "70 (17.1%)", "409")), counted="right")
    outcome = editing.in_form(typed, "person-time")
    assert texts(outcome.table) == ("38", "", "70", "")
    assert outcome.counted == "left"
    timed = Outcome(table=PersonTime(**cells("38", "4,120", "70", "4,090")))
    assert texts(editing.in_form(timed, "events-of-total").table) == ("38", "", "70", "")
    assert texts(editing.in_form(timed, "percent-of-total").table) == ("", "", "", "")


def test_a_percentage_may_be_a_risk_at_a_time():
    """The printed percentages go both ways, the totals do not."""
    there = editing.in_form(Outcome(table=PercentOfTotal(**cells("9%", "412", "17%", "409"))), "risk-at-time")
    assert texts(there.table) == ("9%", "", "17%", "")
    assert texts(editing.in_form(there, "percent-of-total").table) == ("9%", "", "17%", "")


def test_pairs_leave_their_margins_and_margins_give_no_pairs():
    """42 of 100 on the first side, 21 on the second; back again nothing is made up."""
    there = editing.in_form(PAIRED, "events-and-others")
    assert texts(there.table) == ("42", "58", "21", "79")
    assert texts(editing.in_form(there, "pairs").table) == ("", "", "", "")


def test_four_counts_that_can_only_be_pairs_stay_as_typed():
    """Groups of different sizes are no margins of the same pairs."""
    outcome = Outcome(table=EventsAndOthers(**cells("12", "30", "9", "49")))
    assert texts(editing.in_form(outcome, "pairs").table) == ("12", "30", "9", "49")


def test_strata_start_with_the_table_and_end_with_their_sum():
    """One table becomes the first stratum; two strata become the sum of both; what cannot be read stays."""
    one = editing.in_form(FALLS, "strata")
    assert one.table == Strata(strata=(Stratum(**cells("38", "412", "70", "409")), Stratum()))
    assert editing.in_form(one, "events-of-total") == FALLS
    two = editing.edit_text(editing.edit_text(one, "strata.1.first_left_text", "2"), "strata.1.first_right_text", "8")
    two = editing.edit_text(editing.edit_text(two, "strata.1.second_left_text", "1"), "strata.1.second_right_text", "1")
    assert texts(editing.in_form(two, "events-of-total").table) == ("40", "420", "71", "410")
    assert texts(editing.in_form(two, "events-and-others").table) == ("40", "380", "71", "339")
    broken = editing.edit_text(two, "strata.1.first_left_text", "two")
    assert texts(editing.in_form(broken, "events-of-total").table) == ("38", "412", "70", "409")


def test_rows_of_strata_come_and_go():
    """One more at the end, one less at its place, the last one only emptied; other forms have none."""
    outcome = editing.add_stratum(editing.in_form(FALLS, "strata"))
    assert len(outcome.table.strata) == 3
    assert len(editing.remove_stratum(outcome, 0).table.strata) == 2
    last = editing.remove_stratum(editing.remove_stratum(editing.remove_stratum(outcome, 2), 1), 0)
    assert last.table.strata == (Stratum(),)
    assert editing.add_stratum(FALLS) is editing.remove_stratum(FALLS, 0) is FALLS
    for _ in range(60):
        outcome = editing.add_stratum(outcome)
    assert len(outcome.table.strata) == 50
    with pytest.raises(ValueError, match="none of the possible"):
        editing.remove_stratum(outcome, 50)


def test_rows_of_strata_stand_as_totals_or_as_others():
    """Known rows are converted, and back; labels stay."""
    outcome = editing.edit_text(editing.in_form(FALLS, "strata"), "strata.0.label_text", "under 65")
    others = editing.with_of_total(outcome, of_total=False)
    assert others.table.strata[0] == Stratum(label_text="under 65", **cells("38", "374", "70", "339"))
    assert editing.with_of_total(others, of_total=True) == outcome
    assert read_strata(others.table) == read_strata(outcome.table)


@pytest.mark.parametrize(
    "field", ["strata.2.first_left_text", "strata.x.label_text", "strata.-1.label_text", "strata.0.design", "strata."]
)
def test_only_texts_of_strata_that_are_there_take_text(field):
    """No other place, and no other field."""
    with pytest.raises(ValueError, match="none of the possible"):
        editing.edit_text(editing.in_form(FALLS, "strata"), field, "x")


def test_texts_of_one_form_are_written_in_that_form_only():
    """The unit of person-time, the level of printed limits, and cells where there are cells."""
    timed = editing.edit_text(Outcome(table=PersonTime()), "unit_text", "person-years")
    assert timed.table == PersonTime(unit_text="person-years")
    printed = editing.edit_text(Outcome(table=RiskAtTime()), "limits_level_text", "90%")
    assert printed.table == RiskAtTime(limits_level_text="90%")
    for table, field in ((EventsOfTotal(), "unit_text"), (Strata(), CELLS[0]), (EffectOnly(), CELLS[0])):
        with pytest.raises(ValueError, match="none of the possible"):
            editing.edit_text(Outcome(table=table), field, "x")


@pytest.mark.parametrize(
    ("design", "chosen", "left"),
    [
        ("trial", "paired", "trial"),
        ("cohort", "paired", "trial"),
        ("case-control", "matched", "case-control"),
        ("before-after", "before-after", "cohort"),
    ],
)
def test_pairs_have_a_design_of_pairs(design, chosen, left):
    """Choosing the form chooses a design that has it; leaving it leaves the design too."""
    there = editing.in_form(Outcome(design=design), "pairs")
    assert there.design == chosen
    assert editing.in_form(there, "events-of-total").design == left
    assert editing.in_form(there, "effect-only").design == chosen


def test_a_design_of_pairs_has_the_form_of_pairs():
    """And the other way round; a printed effect without counts stays one in every design."""
    for design in PAIRED_DESIGNS:
        assert editing.with_design(FALLS, design) == editing.in_form(editing.with_design(FALLS, design), "pairs")
        assert editing.with_design(FALLS, design).design == design
        assert isinstance(editing.with_design(FALLS, design).table, Pairs)
        assert isinstance(editing.with_design(Outcome(table=EffectOnly()), design).table, EffectOnly)
    assert isinstance(editing.with_design(PAIRED, "matched").table, Pairs)
    back = editing.with_design(PAIRED, "survey")
    assert back.design == "survey"
    assert isinstance(back.table, EventsAndOthers)


@pytest.mark.parametrize(("form", "other"), list(itertools.permutations(FORMS, 2)))
def test_any_form_becomes_any_other(form, other):
    """And is then of that form, whatever its cells hold; words and patient stay."""
    outcome = editing.in_form(Outcome(table=EventsAndOthers(**cells("38", "x", "", "9.2%")), name_text="Falls"), form)
    there = editing.in_form(outcome, other)
    assert form_of(there.table) == other
    assert (there.name_text, there.patient) == (outcome.name_text, outcome.patient)


@given(st.lists(st.text(max_size=12), min_size=4, max_size=4), st.sampled_from([*FORMS]), st.sampled_from([*FORMS]))
def test_no_text_stops_a_form_from_changing(typed, form, other):
    """Whatever was typed, the other form comes."""
    outcome = editing.in_form(Outcome(), form)
    fields = CELLS if form not in {"effect-only", "strata"} else [f"strata.0.{field}" for field in CELLS]
    for field, text in zip(fields, typed, strict=True):
        outcome = outcome if form == "effect-only" else editing.edit_text(outcome, field, text)
    assert form_of(editing.in_form(outcome, other).table) == other


def test_counting_the_other_outcome_of_person_time_is_nothing():
    """Person-time has events alone: the counted outcome, its words and its welcome are those of the left one."""
    timed = Outcome(table=PersonTime(), left_heading_text="fell", right_heading_text="did not fall")
    assert editing.count_other_outcome(timed) is timed
    turned = Outcome(table=PersonTime(), left_heading_text="fell", right_heading_text="did not fall", counted="right")
    assert (turned.event_heading_text, turned.welcome) == ("fell", False)


def test_clearing_keeps_words_of_the_table():
    """The unit, labels of strata and the level of limits are words; a printed effect is what its form holds."""
    timed = Outcome(table=PersonTime(**cells("1", "2", "3", "4"), unit_text="years"))
    assert editing.clear_table(timed).table == PersonTime(unit_text="years")
    strata = editing.edit_text(editing.in_form(FALLS, "strata"), "strata.0.label_text", "under 65")
    assert editing.clear_table(strata).table == Strata(strata=(Stratum(label_text="under 65"), Stratum()))
    assert editing.clear_table(Outcome(table=EffectOnly(), paper_text="RR 2")).paper_text == ""
    assert read_pairs(editing.clear_table(PAIRED).table).both is None


def test_a_lone_effect_begins_as_its_specimen_does() -> None:
    """Nothing typed: an odds ratio, as in the specimen; what was typed or chosen otherwise keeps its name."""
    assert editing.in_form(Outcome(), "effect-only").paper_measure == "odds_ratio"
    assert editing.in_form(Outcome(paper_text="0.5"), "effect-only").paper_measure == "risk_ratio"
    assert editing.in_form(Outcome(paper_measure="hazard_ratio"), "effect-only").paper_measure == "hazard_ratio"


def test_person_time_begins_in_person_years() -> None:
    """The unit is a value that can be typed over, not only a hint."""
    outcome = editing.in_form(FALLS, "person-time")
    assert outcome.table == PersonTime(first_left_text="38", second_left_text="70", unit_text="person-years")
