"""Tests of reading the table into counts, margins and marks."""

from __future__ import annotations

from fourcount.appraisal.findings import MEASURES, Counts, Gap, Totals
from fourcount.appraisal.table import read
from fourcount.record.outcome import EventsOfTotal, Outcome


def test_first_group_and_left_column_are_counted_as_printed(study):
    """The print's order is kept where the first group is the index group and the left column is counted."""
    expected = Counts(index_events=38, index_non_events=374, reference_events=70, reference_non_events=339)
    assert expected == read(study(38, 374, 70, 339)).counts


def test_second_group_as_index_turns_the_rows(study):
    """With the second group as the index group its cells come first."""
    counts = read(study(70, 339, 38, 374, index_group="second")).counts
    assert Counts(index_events=38, index_non_events=374, reference_events=70, reference_non_events=339) == counts


def test_right_column_counted_turns_the_columns(study):
    """With the right column counted its people are the events."""
    counts = read(study(374, 38, 339, 70, counted="right")).counts
    assert Counts(index_events=38, index_non_events=374, reference_events=70, reference_non_events=339) == counts


def test_events_of_total_gives_the_same_counts(study):
    """Events and totals give the counts that events and non-events give."""
    table = EventsOfTotal(first_left_text="38", first_right_text="412", second_left_text="70", second_right_text="409")
    assert read(study(38, 374, 70, 339)).counts == read(Outcome(table=table)).counts


def test_an_empty_cell_is_not_typed_and_margins_stay_live(appraised):
    """One missing cell withholds every measure, and the margins that are known stand."""
    findings = appraised(38, 374, 70, "")
    assert Gap("not-typed") == findings.counts
    assert dict.fromkeys(MEASURES, Gap("not-typed")) == findings.measures
    assert (Gap("not-typed"),) * 3 == (findings.test, findings.conversion, findings.patient)
    assert findings.cautions == ()
    assert Totals(first_left=38, first_right=374, second_left=70, first=412, left=108) == findings.totals


def test_an_unreadable_cell_outweighs_an_empty_one(appraised):
    """A cell without a count makes the table unreadable, and its mark names the field."""
    findings = appraised("-3", 374, "", 339)
    assert Gap("unreadable") == findings.counts
    assert [(mark.field, mark.used) for mark in findings.marks] == [("first_left_text", False)]


def test_a_mark_whose_cell_is_used_withholds_nothing(appraised):
    """A printed percentage that disagrees is marked, and the counts are used."""
    findings = appraised("38 (50%)", 374, 70, 339)
    assert isinstance(findings.counts, Counts)
    assert [mark.used for mark in findings.marks] == [True]


def test_margins_of_a_whole_table(appraised):
    """All nine margins are there once the four counts are."""
    expected = Totals(
        first_left=38, first_right=374, second_left=70, second_right=339,
        first=412, second=409, left=108, right=713, everyone=821,
    )  # fmt: skip
    assert expected == appraised(38, 374, 70, 339).totals


def test_an_unreadable_starting_risk_is_marked_in_its_field(appraised):
    """The field of the starting risk has its own mark, and the study's figures stand."""
    findings = appraised(38, 374, 70, 339, baseline="twelve")
    assert [mark.field for mark in findings.marks] == ["starting_risk_text"]
    assert Gap("baseline-unreadable") == findings.patient
    assert Gap("baseline-unreadable") == findings.conversion
    assert not isinstance(findings.measures["risk_ratio"], Gap)


def test_the_mark_of_the_starting_risk_is_there_without_counts(appraised):
    """An unreadable starting risk is marked while the table is still empty."""
    assert [mark.field for mark in appraised("", "", "", "", baseline="x").marks] == ["starting_risk_text"]
