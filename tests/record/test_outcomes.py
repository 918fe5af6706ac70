"""Several outcomes of one paper, and what follows when groups or outcomes change places."""

from __future__ import annotations

from typing import Any

import msgspec
import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record import editing
from fourcount.record.entry.margin import read_margin
from fourcount.record.entry.readings import Unreadable
from fourcount.record.outcome import (
    CELLS,
    CERTAINTIES,
    EFFECTS,
    FORMS,
    LINE_KINDS,
    LINE_SCALES,
    LINE_SIDES,
    START_KINDS,
    EventsOfTotal,
    Outcome,
    Patient,
    PersonTime,
    Strata,
    Stratum,
    form_of,
)
from fourcount.record.paper import Record

STUDY = Outcome(
    name_text="Falls",
    table=EventsOfTotal(first_left_text="38", first_right_text="412", second_left_text="70", second_right_text="409"),
    design="cohort",
    first_label_text="night lights",
    second_label_text="usual care",
    left_heading_text="fell",
    left_words_text="fell at least once",
    left_welcome=True,
    span_text="12 months",
    index_group="second",
    counted="right",
    layout="across",
    patient=Patient(starting_risk_text="12%", effect="odds_ratio", start_kind="three"),
    counting="events",
    follow_up_varied=True,
    where="table",
    paper_measure="hazard_ratio",
    paper_text="0.54 (0.37 to 0.78)",
    adjusted_measure="rate_ratio",
    adjusted_text="0.50",
    first_randomised_text="420",
    second_randomised_text="420",
    first_lost_text="8",
    icc_text="0.05",
    cluster_size_text="20",
    line_kind="margin",
    line_text="5",
    certainty="low",
    on_handout=False,
)
OF_THE_STUDY = {
    "design", "first_label_text", "second_label_text", "span_text", "index_group", "layout", "follow_up_varied",
    "paper_measure", "adjusted_measure", "first_randomised_text", "second_randomised_text", "cluster_size_text",
}  # fmt: skip


def record_of(names: str) -> Record:
    """A paper whose outcomes have names of one letter."""
    return Record(title_text="Lights", outcomes=tuple(Outcome(name_text=name) for name in names))


def names(record: Record) -> str:
    """The outcomes' names in their order."""
    return "".join(outcome.name_text for outcome in record.outcomes)


def test_a_new_outcome_is_of_the_same_study() -> None:
    """It takes what is the study's, and begins anew in all that is an outcome's own."""
    record = editing.add_outcome(Record(outcomes=(STUDY, Outcome(name_text="b"))), 0)
    first, added, last = record.outcomes
    assert first is STUDY
    assert last.name_text == "b"
    fresh = Outcome()
    for field in Outcome.__struct_fields__:
        expected = getattr(STUDY if field in OF_THE_STUDY else fresh, field)
        if field != "table":
            assert getattr(added, field) == expected, field
    assert added.table == EventsOfTotal()


@pytest.mark.parametrize("form", FORMS)
def test_a_new_outcome_is_in_the_form_of_its_neighbour(form: Any) -> None:
    """And empty: a paper prints its outcomes alike."""
    neighbour = editing.in_form(Outcome(name_text="a"), form)
    if form not in ("effect-only", "strata"):
        neighbour = editing.edit_text(neighbour, CELLS[0], "38")
    added = editing.add_outcome(Record(outcomes=(neighbour,)), 0).outcomes[1]
    assert form_of(added.table) == form
    assert editing.typed_texts(added) == ()
    assert added.design == neighbour.design


def test_a_new_outcome_keeps_units_and_strata() -> None:
    """Person-time stays in its unit, and strata keep their labels."""
    rates = Outcome(table=PersonTime(first_left_text="38", unit_text="patient-years"))
    assert editing.add_outcome(Record(outcomes=(rates,)), 0).outcomes[1].table == PersonTime(unit_text="patient-years")
    strata = Strata(strata=(Stratum(label_text="under 65", first_left_text="3"), Stratum()), of_total=False)
    added = editing.add_outcome(Record(outcomes=(Outcome(table=strata),)), 0).outcomes[1]
    assert added.table == Strata(strata=(Stratum(label_text="under 65"), Stratum()), of_total=False)


def test_a_copy_stands_behind_its_original() -> None:
    """Equal in everything."""
    record = editing.copy_outcome(Record(outcomes=(Outcome(), STUDY, Outcome(name_text="b"))), 1)
    assert record.outcomes[1] is record.outcomes[2] is STUDY
    assert len(record.outcomes) == 4


@pytest.mark.parametrize(
    ("place", "to", "after"),
    [(0, 0, "abcd"), (0, 1, "bacd"), (0, 3, "bcda"), (3, 0, "dabc"), (2, 1, "acbd"), (1, 2, "acbd")],
)
def test_an_outcome_is_moved_to_a_place(place: int, to: int, after: str) -> None:
    """It stands there afterwards, and the others keep their order."""
    moved = editing.move_outcome(record_of("abcd"), place, to)
    assert names(moved) == after
    assert names(editing.move_outcome(moved, to, place)) == "abcd"


def test_the_last_outcome_is_only_emptied() -> None:
    """A paper always has one."""
    record = editing.remove_outcome(record_of("ab"), 0)
    assert names(record) == "b"
    assert editing.remove_outcome(record, 0).outcomes == (Outcome(),)


@pytest.mark.parametrize("place", [-1, 2])
def test_a_place_without_an_outcome_is_refused(place: int) -> None:
    """By every command, whether it says from where or to where."""
    record = record_of("ab")
    for command in (editing.add_outcome, editing.copy_outcome, editing.remove_outcome):
        with pytest.raises(IndexError):
            command(record, place)
    with pytest.raises(IndexError):
        editing.move_outcome(record, place, 0)
    with pytest.raises(IndexError):
        editing.move_outcome(record, 0, place)


def test_no_record_holds_more_outcomes_than_its_file() -> None:
    """The two hundred and first is not added."""
    record = record_of("a" * editing.MOST_OUTCOMES)
    assert editing.add_outcome(record, 0) is record
    assert editing.copy_outcome(record, 0) is record


@given(st.lists(st.tuples(st.sampled_from(["add", "copy", "move", "remove"]), st.integers(0, 9), st.integers(0, 9))))
def test_whatever_is_done_to_outcomes_the_rest_stays(commands: list[tuple[str, int, int]]) -> None:
    """Title and choices are the paper's, at least one outcome is there, and the record before is as it was."""
    record = record_of("abc")
    for command, one, other in commands:
        place, to = one % len(record.outcomes), other % len(record.outcomes)
        before = msgspec.json.encode(record)
        after = {
            "add": lambda held=record, at=place: editing.add_outcome(held, at),
            "copy": lambda held=record, at=place: editing.copy_outcome(held, at),
            "move": lambda held=record, at=place, goal=to: editing.move_outcome(held, at, goal),
            "remove": lambda held=record, at=place: editing.remove_outcome(held, at),
        }[command]()
        assert msgspec.json.encode(record) == before
        assert (after.title_text, after.choices) == (record.title_text, record.choices)
        assert after.outcomes
        record = after


PATIENT = Patient(
    starting_risk_text="12% (9 to 15)",
    low_risk_text="5%",
    high_risk_text="20 in 100",
    overall_risk_text="10%",
    exposed_share_text="30%",
    rate_text="12 per 1,000 person-years",
    starting_risk_source_text="ward audit",
    other_span_text="5 years",
)


def test_counting_the_other_outcome_turns_every_risk() -> None:
    """Low and high change places; a share of people exposed, a rate and a span are no risks of the outcome."""
    turned = editing.count_other_outcome(Outcome(patient=PATIENT)).patient
    assert turned == msgspec.structs.replace(
        PATIENT,
        starting_risk_text="88% (85 to 91)",
        low_risk_text="80 in 100",
        high_risk_text="95%",
        overall_risk_text="90%",
    )


@pytest.mark.parametrize(("rate", "kind"), [("12 per 1,000 person-years", "one"), ("often", "one"), (" ", "rate")])
def test_a_rate_of_one_event_is_never_taken_for_the_other_s(rate: str, kind: str) -> None:
    """It stays typed, and the starting risk is a risk again."""
    turned = editing.count_other_outcome(Outcome(patient=Patient(start_kind="rate", rate_text=rate))).patient
    assert (turned.rate_text, turned.start_kind) == (rate, kind)


@pytest.mark.parametrize(("low", "high"), [("5%", ""), ("", "20%"), ("many", "20%"), ("5%", "?"), ("", "")])
def test_counting_twice_gives_back_what_cannot_be_read(low: str, high: str) -> None:
    """A blank and an unreadable text change places with their neighbour, twice."""
    outcome = Outcome(patient=Patient(low_risk_text=low, high_risk_text=high))
    turned = editing.count_other_outcome(outcome)
    assert editing.count_other_outcome(turned) == outcome
    assert (turned.patient.low_risk_text == "") == (high == "")


@pytest.mark.parametrize("turn", [editing.swap_groups, editing.count_other_outcome])
def test_a_line_of_ones_own_is_the_same_line_from_the_other_side(turn: Any) -> None:
    """Five fewer fall is five more who do not, and five more in the other group; turned twice, it is as it was."""
    outcome = Outcome(line_kind="matters", line_text="5 per 100", line_side="fewer")
    turned = turn(outcome)
    assert (turned.line_text, turned.line_side) == ("5 per 100", "more")
    assert read_margin(turned.line_text, "risk_difference", turned.line_side) == -(
        read_margin(outcome.line_text, "risk_difference", outcome.line_side)  # type: ignore[operator]
    )
    assert turn(turned) == outcome


def test_a_ratio_that_no_longer_fits_is_marked_and_not_changed() -> None:
    """0.80 of the other outcome is another number, which only the reader knows."""
    turned = editing.swap_groups(Outcome(line_kind="margin", line_scale="risk_ratio", line_text="0.80"))
    assert turned.line_text == "0.80"
    assert isinstance(read_margin(turned.line_text, turned.line_scale, turned.line_side), Unreadable)


def test_without_a_line_no_side_changes() -> None:
    """What has not been typed has no side yet."""
    assert editing.swap_groups(Outcome(line_text=" ")).line_side == "fewer"


@pytest.mark.parametrize(("welcome", "matters", "margin"), [(False, "fewer", "more"), (True, "more", "fewer")])
def test_an_empty_line_goes_where_such_lines_lie(welcome: bool, matters: str, margin: str) -> None:
    """A margin lies on the worse side, what would matter on the better one; a typed line stays on its side."""
    outcome = Outcome(left_welcome=welcome)
    assert editing.with_line_kind(outcome, "matters").line_side == matters
    assert editing.with_line_kind(editing.with_line_kind(outcome, "matters"), "margin").line_side == margin
    typed = Outcome(left_welcome=welcome, line_kind="matters", line_side=matters, line_text="5%")
    assert editing.with_line_kind(typed, "margin").line_side == matters


@pytest.mark.parametrize(
    ("choose", "field", "words"),
    [
        (editing.with_start_kind, "start_kind", START_KINDS),
        (editing.with_effect, "effect", EFFECTS),
        (editing.with_line_kind, "line_kind", LINE_KINDS),
        (editing.with_line_scale, "line_scale", LINE_SCALES),
        (editing.with_line_side, "line_side", LINE_SIDES),
        (editing.with_certainty, "certainty", CERTAINTIES),
    ],
)
def test_choices_for_the_patient_take_only_what_there_is(choose: Any, field: str, words: tuple[str, ...]) -> None:
    """Every word can be chosen, and nothing else."""
    for word in words:
        chosen = choose(STUDY, word)
        assert getattr(chosen.patient if hasattr(chosen.patient, field) else chosen, field) == word
    with pytest.raises(ValueError, match="guess"):
        choose(STUDY, "guess")
