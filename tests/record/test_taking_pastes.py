"""What a paste was understood as, taken into an outcome."""

from __future__ import annotations

import pytest

from fourcount.record import editing
from fourcount.record.entry.readings import Pasted, PastedGroup, PrintedFigure, PrintedNumber
from fourcount.record.outcome import (
    FORMS,
    EffectOnly,
    EventsAndOthers,
    EventsOfTotal,
    Outcome,
    Pairs,
    Patient,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
    form_of,
)

GROUPS = (
    PastedGroup(left_text="38", right_text="412", label="night lights"),
    PastedGroup(left_text="70", right_text="409", label="usual care"),
)
TEXT = "RR 0.54 (0.37 to 0.78)"


def figure(measure="risk_ratio", adjusted=False):
    """A printed figure."""
    estimate = PrintedNumber(text="0.54", value=0.54, decimals=2)
    return PrintedFigure(measure=measure, text=TEXT, estimate=estimate, adjusted=adjusted)


def test_a_sentence_fills_counts_labels_words_and_figures():
    """All in one new outcome; choices and what was not told stay."""
    before = Outcome(name_text="Falls", design="cohort", right_heading_text="did not fall", layout="across")
    pasted = Pasted(
        form="events-of-total",
        groups=GROUPS,
        words="fell at least once",
        span="12 months",
        figures=(figure(),),
        paper_text=TEXT,
        source="sentence",
    )
    assert editing.take_paste(before, pasted) == Outcome(
        name_text="Falls",
        design="cohort",
        right_heading_text="did not fall",
        layout="across",
        table=EventsOfTotal(
            first_left_text="38", first_right_text="412", second_left_text="70", second_right_text="409"
        ),
        first_label_text="night lights",
        second_label_text="usual care",
        left_words_text="fell at least once",
        span_text="12 months",
        paper_measure="risk_ratio",
        paper_text=TEXT,
    )


def test_a_block_says_how_groups_run_and_what_columns_are_called():
    """Labels that it does not tell stay, and so does the text of earlier figures."""
    before = Outcome(first_label_text="lights", paper_text=TEXT)
    groups = (PastedGroup(left_text="38", right_text="374"), PastedGroup(left_text="70", right_text="339"))
    pasted = Pasted(form="events-and-others", groups=groups, left_heading="fell", right_heading="not", layout="across")
    after = editing.take_paste(before, pasted)
    assert (after.left_heading_text, after.right_heading_text, after.layout) == ("fell", "not", "across")
    assert (after.first_label_text, after.paper_text) == ("lights", TEXT)
    assert after.table.second_right_text == "339"


def test_a_shorter_paste_leaves_nothing_of_the_table_before():
    """Cells that a paste does not fill are empty."""
    before = Outcome(table=EventsAndOthers(first_left_text="1", second_right_text="2"))
    after = editing.take_paste(before, Pasted(form="events-and-others", groups=GROUPS[:1]))
    assert after.table == EventsAndOthers(first_left_text="38", first_right_text="412")


def test_strata_and_person_time_bring_what_is_theirs():
    """Labels of rows and whether totals stand right; the unit."""
    pasted = Pasted(form="strata", groups=GROUPS * 2, stratum_labels=("young",), strata_of_total=False)
    row = {"first_left_text": "38", "first_right_text": "412", "second_left_text": "70", "second_right_text": "409"}
    table = Strata(strata=(Stratum(label_text="young", **row), Stratum(**row)), of_total=False)
    assert editing.take_paste(Outcome(), pasted).table == table
    timed = editing.take_paste(Outcome(), Pasted(form="person-time", groups=GROUPS, unit="years"))
    assert timed.table == PersonTime(**row, unit_text="years")


def test_a_printed_effect_joins_the_counts_that_are_there():
    """Where nothing was typed it is an outcome of its own."""
    pasted = Pasted(form="effect-only", figures=(figure("odds_ratio"),), paper_text=TEXT)
    counts = Outcome(table=EventsAndOthers(first_left_text="38"))
    assert editing.take_paste(counts, pasted) == Outcome(
        table=counts.table, paper_text=TEXT, paper_measure="odds_ratio"
    )
    alone = editing.take_paste(Outcome(), pasted)
    assert alone == Outcome(table=EffectOnly(), paper_text=TEXT, paper_measure="odds_ratio")


def test_an_adjusted_effect_is_kept_apart_from_crude_counts():
    """Beside counts it has its own field; alone it is the effect itself."""
    pasted = Pasted(form="events-of-total", groups=GROUPS, figures=(figure(adjusted=True),), paper_text=TEXT)
    after = editing.take_paste(Outcome(), pasted)
    assert (after.adjusted_text, after.adjusted_measure, after.paper_text) == (TEXT, "risk_ratio", "")
    alone = Pasted(form="effect-only", figures=(figure(adjusted=True),), paper_text=TEXT)
    assert editing.take_paste(Outcome(), alone).paper_text == TEXT


def test_figures_of_no_known_effect_leave_the_measure():
    """A p alone says nothing of what the paper calls its result."""
    pasted = Pasted(form="events-of-total", groups=GROUPS, figures=(figure("p"),), paper_text="P = 0.03")
    after = editing.take_paste(Outcome(paper_measure="odds_ratio"), pasted)
    assert (after.paper_measure, after.paper_text) == ("odds_ratio", "P = 0.03")


def test_pasted_pairs_have_a_design_of_pairs():
    """As if the form had been chosen."""
    after = editing.take_paste(Outcome(design="case-control"), Pasted(form="pairs", groups=GROUPS))
    assert isinstance(after.table, Pairs)
    assert after.design == "matched"


@pytest.mark.parametrize("form", FORMS)
def test_any_form_can_be_pasted_over_any_other(form):
    """And without groups at all nothing raises."""
    for before in FORMS:
        outcome = editing.in_form(Outcome(), before)
        assert form_of(editing.take_paste(outcome, Pasted(form=form, groups=GROUPS)).table) == form
        assert form_of(editing.take_paste(outcome, Pasted(form=form)).table) == form


def test_what_no_file_can_hold_is_put_right():
    """Lone surrogates of a paste become the mark of a missing character."""
    groups = (PastedGroup(left_text="3\ud800", right_text="4", label="a\udfff"),)
    after = editing.take_paste(Outcome(), Pasted(form="events-and-others", groups=groups))
    assert (after.table.first_left_text, after.first_label_text) == ("3\ufffd", "a\ufffd")


@pytest.mark.parametrize("level", ["90%", ""])
def test_printed_limits_take_the_level_that_stands_beside_them(level):
    """The level of an earlier paste does not stay where none is printed now."""
    before = Outcome(table=RiskAtTime(limits_level_text="99%"))
    groups = (PastedGroup(left_text="9%", right_text="6 to 12%"), PastedGroup(left_text="17%", right_text="13 to 21%"))
    taken = editing.take_paste(before, Pasted(form="risk-at-time", groups=groups, limits_level=level))
    assert taken.table == RiskAtTime(
        first_left_text="9%",
        first_right_text="6 to 12%",
        second_left_text="17%",
        second_right_text="13 to 21%",
        limits_level_text=level,
    )


FULL = Outcome(
    name_text="Falls",
    table=EventsAndOthers(first_left_text="38", first_right_text="374", second_left_text="70", second_right_text="339"),
    design="cohort",
    first_label_text="night lights",
    second_label_text="usual care",
    left_heading_text="fell",
    right_heading_text="did not fall",
    right_words_text="did not fall",
    span_text="12 months",
    index_group="second",
    counted="right",
    paper_text=TEXT,
    adjusted_text="OR 0.47 (0.30 to 0.72)",
    adjusted_for_text="age",
    first_lost_text="18",
    icc_text="0.02",
    patient=Patient(starting_risk_text="12%"),
)


def test_another_table_brings_none_of_the_last_ones_words_and_results():
    """Counts of other groups over counts that were there: only the study and how its groups run stay."""
    others = (PastedGroup(left_text="23", right_text="204", label="coaching"), GROUPS[1])
    pasted = Pasted(form="events-of-total", groups=others, words="were readmitted", source="sentence")
    assert editing.brings_another_table(FULL, pasted)
    assert editing.take_paste(FULL, pasted) == Outcome(
        design="cohort",
        table=EventsOfTotal(
            first_left_text="23", first_right_text="204", second_left_text="70", second_right_text="409"
        ),
        first_label_text="coaching",
        second_label_text="usual care",
        left_words_text="were readmitted",
    )


@pytest.mark.parametrize("label", ["", "Night lights"])
def test_counts_of_the_same_groups_leave_all_else(label):
    """Bare counts, or counts under the labels that are there, are a correction."""
    group = PastedGroup(left_text="39", right_text="412", label=label)
    pasted = Pasted(form="events-of-total", groups=(group, GROUPS[1]))
    assert not editing.brings_another_table(FULL, pasted)
    after = editing.take_paste(FULL, pasted)
    assert (after.counted, after.paper_text, after.name_text) == ("right", TEXT, "Falls")


def test_words_typed_before_any_count_stay():
    """An empty table has nothing that a paste could be another one than."""
    before = Outcome(name_text="Falls", span_text="12 months", paper_text=TEXT)
    after = editing.take_paste(before, Pasted(form="events-of-total", groups=GROUPS, words="fell"))
    assert (after.name_text, after.span_text, after.paper_text) == ("Falls", "12 months", TEXT)
