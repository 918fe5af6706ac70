"""Reading pairs, person-time, printed risks, strata, and the small fields beside a table."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.entry.amounts import read_amount, read_people
from fourcount.record.entry.clusters import read_clusters
from fourcount.record.entry.losses import GroupLosses, read_losses
from fourcount.record.entry.pairs import read_pairs
from fourcount.record.entry.person_time import read_person_time, read_time
from fourcount.record.entry.readings import Blank, GroupCounts, GroupRate, PairsReading, PrintedRisk, Unreadable
from fourcount.record.entry.risk_at_time import read_risk_at_time
from fourcount.record.entry.strata import read_strata
from fourcount.record.outcome import CELLS, Outcome, Pairs, PersonTime, RiskAtTime, Strata, Stratum


def cells(*texts):
    """Four texts by the names of their cells."""
    return dict(zip(CELLS, texts, strict=True))


def told(reading):
    """The marks as field and key."""
    return [(mark.field, mark.key) for mark in reading.marks]


def test_pairs_are_read_in_the_order_of_their_table():
    """Both, first only, second only, neither; a blank one is not known."""
    assert read_pairs(Pairs(**cells("12", "1,030", "9", ""))) == PairsReading(both=12, first_only=1030, second_only=9)


def test_a_percentage_of_pairs_may_be_of_all_of_its_line_or_of_its_column():
    """12 of 100 pairs, of the 42 of its line, of the 21 of its column; any other is marked and the count used."""
    for percent in ("12%", "28.6", "57%"):
        assert told(read_pairs(Pairs(**cells(f"12 ({percent})", "30", "9", "49")))) == []
    reading = read_pairs(Pairs(**cells("12 (13%)", "30", "9", "49")))
    assert told(reading) == [("first_left_text", "percent-disagrees")]
    assert (reading.both, reading.marks[0].used) == (12, True)


def test_cells_of_pairs_that_give_no_count_are_marked():
    """A total has no place there; a count in two parts is said as what it was read."""
    reading = read_pairs(Pairs(**cells("12/38", "-3", "1 030", "49")))
    assert set(told(reading)) == {
        ("first_left_text", "not-a-count"), ("first_right_text", "negative"), ("second_left_text", "read-as"),
    }  # fmt: skip


@pytest.mark.parametrize(
    ("text", "time"),
    [
        ("4,120", (4120, "")),
        ("4120.5", (4120.5, "")),
        ("4 120\u00b75 person-years", (4120.5, "person-years")),
        ("0", (0, "")),
        ("\u0664\u0661\u0662\u0660", (4120, "")),
        ("12 years at risk", (12, "years at risk")),
    ],
)
def test_person_time_has_decimals_behind_a_point(text, time):
    """A comma parts thousands; a unit may follow."""
    assert read_time(text) == time


@pytest.mark.parametrize(
    ("text", "key"),
    [
        ("4,12", "not-a-time"),
        ("-3", "negative-time"),
        ("many", "not-a-time"),
        ("9" * 14, "too-large"),
        ("1.2.3", "not-a-time"),
    ],
)
def test_what_is_no_person_time_is_said(text, key):
    """A comma before two digits is neither thousands nor, here, a decimal mark."""
    reading = read_time(text)
    assert isinstance(reading, Unreadable)
    assert (reading.key, reading.facts["text"]) == (key, text)


def test_one_cell_may_hold_events_and_person_time():
    """It fills a blank cell beside it and has to agree with one that is not blank."""
    both = read_person_time(PersonTime(**cells("38 in 4,120 person-years", "", "70/4090", "4,090")))
    assert both.first == GroupRate(events=38, time=4120)
    assert both.second == GroupRate(events=70, time=4090)
    assert (both.unit, both.marks) == ("person-years", ())
    apart = read_person_time(PersonTime(**cells("38 in 4,120", "4,121", "70", "4,090")))
    assert told(apart) == [("first_left_text", "time-disagrees")]


def test_more_events_than_person_time_is_no_mistake():
    """Time is no number of people."""
    assert read_person_time(PersonTime(**cells("38/12.5", "", "", ""))).first == GroupRate(events=38, time=12.5)


def test_the_unit_is_the_typed_one_and_units_have_to_agree():
    """Case, dots and a plural are no difference; years and months are."""
    typed = read_person_time(PersonTime(**cells("1", "2 py", "3", "4 PY."), unit_text=" person  years "))
    assert (typed.unit, typed.marks) == ("person years", ())
    apart = read_person_time(PersonTime(**cells("1", "2 years", "3", "4 months")))
    assert told(apart) == [("second_right_text", "units-differ")]


@pytest.mark.parametrize(
    ("left", "right"),
    [
        ("9%", "6 to 12"),
        ("9", "6\u201312"),
        ("9% (6 to 12)", ""),
        ("9.0% [95% CI: 6.0, 12.0]", ""),
        ("9 in 100", "6 to 12"),
        ("9 (6 to 12%)", ""),
        ("9,0 %", "(6,0; 12,0)"),
    ],
)
def test_a_risk_and_its_limits_are_read_in_many_ways(left, right):
    """Signs, dashes, brackets and commas as papers set them."""
    reading = read_risk_at_time(RiskAtTime(**cells(left, right, "", "")))
    assert (reading.first, reading.marks) == (PrintedRisk(risk=0.09, low=0.06, high=0.12), ())
    assert (reading.second, reading.level) == (PrintedRisk(), 0.95)


@pytest.mark.parametrize(
    ("left", "right", "field", "key"),
    [
        ("0.09", "0.06 to 0.12", "first_left_text", "percent-or-fraction"),
        ("often", "6 to 12", "first_left_text", "not-a-risk"),
        ("9%", "6", "first_right_text", "not-limits"),
        ("9%", "10 to 12", "first_right_text", "limits-disordered"),
        ("9% (12 to 6)", "", "first_left_text", "limits-disordered"),
        ("", "12 to 6", "first_right_text", "limits-disordered"),
        ("120%", "", "first_left_text", "risk-out-of-range"),
        ("9 in 0", "", "first_left_text", "not-a-risk"),
    ],
)
def test_risks_that_cannot_be_used_are_marked(left, right, field, key):
    """The group gives nothing, and the other one goes on."""
    reading = read_risk_at_time(RiskAtTime(**cells(left, right, "17%", "13 to 21")))
    assert told(reading) == [(field, key)]
    assert reading.first == PrintedRisk()
    assert reading.second == PrintedRisk(risk=0.17, low=0.13, high=0.21)


def test_one_sign_speaks_for_a_whole_group():
    """0.6% to 12% is no question where one of the three has its sign or is above 1."""
    for left, right in (("0.9%", "0.6 to 0.99"), ("0.9", "0.6 to 1.2")):
        assert read_risk_at_time(RiskAtTime(**cells(left, right, "", ""))).first.low == 0.006


def test_strata_are_read_row_by_row():
    """As totals or as others; the mark of a row names its place; blank rows stay in their places."""
    rows = (
        Stratum(label_text=" under  65 ", **cells("38", "412", "70", "409")),
        Stratum(),
        Stratum(**cells("x", "", "", "")),
    )
    first, blank, broken = read_strata(Strata(strata=rows))
    assert (first.label, first.first) == ("under 65", GroupCounts(left=38, right=374, total=412))
    assert (blank.blank, first.blank, broken.blank) == (True, False, False)
    assert told(broken) == [("strata.2.first_left_text", "not-a-count")]
    (others,) = read_strata(Strata(strata=rows[:1], of_total=False))
    assert others.first == GroupCounts(left=38, right=412, total=450)


@pytest.mark.parametrize(
    ("text", "amount"),
    [("0.05", 0.05), ("0,05", 0.05), (".05", 0.05), ("1\u00b75", 1.5), ("2", 2), ("1,204", 1204), ("1.5 times", 1.5)],
)
def test_amounts_have_decimals_or_thousands(text, amount):
    """As the cells and percentages elsewhere take them."""
    assert read_amount(text) == amount


@pytest.mark.parametrize(
    ("text", "key"),
    [("x", "not-an-amount"), ("-2", "negative-amount"), ("10,000,000,000", "too-large"), ("1.2.3", "not-an-amount")],
)
def test_what_is_no_amount_is_said(text, key):
    """With what was typed."""
    reading = read_amount(text)
    assert isinstance(reading, Unreadable)
    assert reading.key == key


def test_people_are_whole():
    """A total beside the number has no place there."""
    assert (read_people("30"), read_people(" "), read_people("30 (7%)")) == (30, Blank(), 30)
    assert isinstance(read_people("30/412"), Unreadable)


def test_losses_are_read_in_the_prints_order():
    """What is not typed is not known; what cannot be read is marked."""
    outcome = Outcome(
        first_randomised_text="442", first_lost_text="30", second_lost_text="-1", second_loss_ratio_text="1.5"
    )
    reading = read_losses(outcome)
    assert reading.first == GroupLosses(randomised=442, lost=30)
    assert reading.second == GroupLosses(ratio=1.5)
    assert told(reading) == [("second_lost_text", "negative")]


def test_clusters_have_a_correlation_up_to_1_and_a_size_from_1():
    """Anything else is marked and not known."""
    reading = read_clusters(Outcome(icc_text="0.05", cluster_size_text="21.5"))
    assert (reading.icc, reading.mean_size, reading.marks) == (0.05, 21.5, ())
    beyond = read_clusters(Outcome(icc_text="1.01", cluster_size_text="0.5"))
    assert told(beyond) == [("icc_text", "icc-out-of-range"), ("cluster_size_text", "cluster-too-small")]
    assert (beyond.icc, beyond.mean_size) == (None, None)


@given(st.tuples(*[st.text(max_size=20)] * 4))
def test_no_text_stops_a_reader(texts):
    """Every reader answers for any text, and marks name fields of the table."""
    for reader, table in (
        (read_pairs, Pairs(**cells(*texts))),
        (read_person_time, PersonTime(**cells(*texts))),
        (read_risk_at_time, RiskAtTime(**cells(*texts), limits_level_text=texts[0])),
    ):
        assert {mark.field for mark in reader(table).marks} <= {*CELLS, "limits_level_text"}
