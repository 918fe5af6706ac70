"""The session without a window: one record, one signal, a past and a future."""

from __future__ import annotations

from collections.abc import Callable

import msgspec
import pytest
from pytestqt.qtbot import QtBot

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Counts
from fourcount.face.session import Session
from fourcount.record import editing
from fourcount.record.outcome import CELLS, Outcome
from fourcount.record.paper import Record


@pytest.fixture
def session(qtbot: QtBot) -> Session:
    """A session that appraises."""
    session = Session()
    session.wake()
    return session


@pytest.fixture
def heard(session: Session) -> list[tuple[object, object]]:
    """Every record and its findings as the views hear of them."""
    heard: list[tuple[object, object]] = []
    session.changed.connect(lambda record, findings: heard.append((record, findings)))
    return heard


def typed(session: Session, *texts: str) -> None:
    """Write the counts, leaving each cell."""
    for field, text in zip(CELLS, texts, strict=False):
        for end in range(1, len(text) + 1):
            session.edit_text(field, text[:end])
        session.end_run(field)


def test_before_it_wakes_a_session_computes_nothing(qtbot: QtBot) -> None:
    """Typing before the first paint is kept, and appraised as soon as the window has painted."""
    session = Session()
    typed(session, "38", "374", "70", "339")
    assert session.findings is None
    with qtbot.waitSignal(session.changed):
        session.wake()
    assert session.findings is not None
    assert session.findings.counts == Counts(
        index_events=38, index_non_events=374, reference_events=70, reference_non_events=339
    )


def test_waking_twice_tells_once(qtbot: QtBot) -> None:
    """The second paint wakes nobody."""
    session = Session()
    heard: list[object] = []
    session.changed.connect(lambda record, findings: heard.append(record))
    session.wake()
    session.wake()
    assert len(heard) == 1


def test_each_keystroke_tells_the_record_and_its_findings(session: Session, heard: list[tuple[object, object]]) -> None:
    """The views hear of the very record that the session holds, with what follows from it."""
    typed(session, "38")
    assert len(heard) == 2
    record, findings = heard[-1]
    assert record is session.record
    assert findings is session.findings


def test_findings_are_those_of_the_outcome(session: Session) -> None:
    """Nothing is computed here that appraising the outcome would not give."""
    typed(session, "38", "374", "70", "339")
    session.settle()
    assert session.findings == appraise(session.outcome, session.record.choices)


def test_equal_text_is_no_change(session: Session, heard: list[tuple[object, object]]) -> None:
    """Setting what is there already tells nobody and leaves nothing to undo."""
    session.edit_text(CELLS[0], "")
    session.edit_text("title_text", "")
    session.change_record(session.record)
    session.change_outcome(session.outcome)
    assert heard == []
    assert not session.can_undo


def test_a_record_is_never_changed_in_place(session: Session) -> None:
    """A record that somebody kept stays as it was."""
    kept = session.record
    typed(session, "38")
    assert kept == Record()
    assert session.record != kept


def test_a_run_goes_on_until_its_field_is_left(session: Session) -> None:
    """Leaving another field does not end it."""
    session.edit_text(CELLS[0], "3")
    session.end_run(CELLS[1])
    session.edit_text(CELLS[0], "38")
    session.undo()
    assert session.record == Record()


def test_a_change_between_ends_the_run(session: Session) -> None:
    """Typing, a command and typing in the same field are three steps."""
    session.edit_text(CELLS[0], "3")
    session.change_outcome(editing.swap_groups(session.outcome))
    session.edit_text(CELLS[0], "38")
    session.undo()
    assert session.outcome.table.first_left_text == "3"
    assert session.outcome.index_group == "second"
    session.undo()
    session.undo()
    assert session.record == Record()
    assert not session.can_undo


def test_undo_says_where(session: Session) -> None:
    """The field of the step is wanted; a command leaves the cursor where it is."""
    wanted: list[str] = []
    session.focus_wanted.connect(wanted.append)
    session.edit_text("span_text", "12 months")
    session.change_outcome(editing.swap_groups(session.outcome))
    session.undo()
    session.undo()
    session.redo()
    assert wanted == ["span_text", "span_text"]


def test_undo_and_redo_are_one_path(session: Session, heard: list[tuple[object, object]]) -> None:
    """The records on the way back are the very ones of the way forth."""
    typed(session, "38", "374", "70", "339")
    forth = [heard[1][0], heard[4][0], heard[6][0], heard[9][0]]
    heard.clear()
    for _ in range(4):
        session.undo()
    for _ in range(4):
        session.redo()
    back = [record for record, _ in heard]
    assert [id(record) for record in back[:3]] == [id(record) for record in forth[2::-1]]
    assert [id(record) for record in back[4:]] == [id(record) for record in forth]


def test_findings_that_come_late_are_taken_for_their_outcome_only(
    session: Session, heard: list[tuple[object, object]]
) -> None:
    """Figures of a table that has changed meanwhile are left aside."""
    typed(session, "38", "374", "70", "339")
    old, findings = session.outcome, session.findings
    assert findings is not None
    session.edit_text(CELLS[0], "41")
    heard.clear()
    session.take_findings(old, findings)
    assert heard == []
    assert session.findings is not findings
    newer = appraise(session.outcome, session.record.choices)
    session.take_findings(session.outcome, newer)
    assert heard == [(session.record, newer)]


def test_the_paper_has_texts_of_its_own(session: Session) -> None:
    """Title and source are the record's, all else the outcome's."""
    session.edit_text("title_text", "A trial")
    session.edit_text("source_text", "table 2")
    session.edit_text("first_label_text", "Night lights")
    assert (session.record.title_text, session.record.source_text) == ("A trial", "table 2")
    assert session.outcome.first_label_text == "Night lights"


def test_an_unknown_field_is_refused(session: Session) -> None:
    """A field that no record has cannot be written, and nothing is harmed."""
    record = session.record
    with pytest.raises(ValueError, match="nowhere"):
        session.edit_text("nowhere", "38")
    assert session.record is record


def test_a_long_past_is_kept_whole(session: Session) -> None:
    """Two hundred steps are undone to the first."""
    for number in range(200):
        session.edit_text(CELLS[number % 4], str(number))
    steps = 0
    while session.can_undo:
        session.undo()
        steps += 1
    assert steps == 200
    assert session.record == Record()


@pytest.fixture
def three(session: Session) -> Session:
    """A session whose paper has three outcomes, named by their places; the first is in view."""
    outcomes = tuple(Outcome(name_text=name) for name in "abc")
    session.change_record(msgspec.structs.replace(session.record, outcomes=outcomes))
    return session


def names(session: Session) -> str:
    """The names of the outcomes in their order."""
    return "".join(outcome.name_text for outcome in session.record.outcomes)


def test_looking_at_another_outcome_brings_its_findings(three: Session, heard: list[tuple[object, object]]) -> None:
    """The same record with other findings, told once; it is no step to undo."""
    three.look_at(2)
    typed(three, "38", "374", "70", "339")
    three.look_at(0)
    heard.clear()
    three.look_at(2)
    assert three.outcome.name_text == "c"
    assert heard == [(three.record, appraise(three.outcome, three.record.choices, deferring=True))]
    steps = 0
    while three.can_undo:
        three.undo()
        steps += 1
    assert steps == 5


def test_looking_where_one_looks_tells_nobody(three: Session, heard: list[tuple[object, object]]) -> None:
    """Nothing changes, so no view is drawn anew."""
    heard.clear()
    three.look_at(0)
    assert heard == []


@pytest.mark.parametrize("place", [-1, 3])
def test_an_outcome_that_is_not_there_is_refused(three: Session, place: int) -> None:
    """Neither looking nor changing leads to a place without an outcome, and nothing is harmed."""
    record = three.record
    with pytest.raises(IndexError):
        three.look_at(place)
    with pytest.raises(IndexError):
        three.change_record(Record(title_text="x", outcomes=record.outcomes), place)
    assert three.record is record
    assert three.view == 0


def test_typing_goes_into_the_outcome_in_view(three: Session) -> None:
    """The others stay the very ones that they were."""
    first, _, third = three.record.outcomes
    three.look_at(1)
    three.edit_text("span_text", "12 months")
    assert [outcome.span_text for outcome in three.record.outcomes] == ["", "12 months", ""]
    assert three.record.outcomes[0] is first
    assert three.record.outcomes[2] is third


def test_another_outcome_ends_the_run(three: Session) -> None:
    """The same field of two outcomes is two steps, even if it never lost focus."""
    three.edit_text("span_text", "1 year")
    three.look_at(1)
    three.edit_text("span_text", "2 years")
    three.undo()
    assert [outcome.span_text for outcome in three.record.outcomes] == ["1 year", "", ""]


def test_undo_and_redo_return_to_the_outcome_that_changed(three: Session) -> None:
    """Whichever outcome is looked at meanwhile, and the field's focus is asked for once it is in view."""
    seen: list[tuple[str, str]] = []
    three.focus_wanted.connect(lambda field: seen.append((three.outcome.name_text, field)))
    three.look_at(1)
    three.edit_text("span_text", "12 months")
    three.look_at(2)
    three.undo()
    assert (three.view, three.outcome.span_text) == (1, "")
    three.look_at(0)
    three.redo()
    assert (three.view, three.outcome.span_text) == (1, "12 months")
    assert seen == [("b", "span_text"), ("b", "span_text")]


def test_what_belongs_to_the_paper_moves_no_view(three: Session) -> None:
    """Its title and its family of intervals are undone from wherever one looks."""
    three.edit_text("title_text", "A trial")
    three.change_record(editing.with_family(three.record, "exact"))
    three.look_at(2)
    three.undo()
    three.undo()
    three.redo()
    three.redo()
    assert three.view == 2
    assert (three.record.title_text, three.record.choices.family) == ("A trial", "exact")


@pytest.mark.parametrize(
    ("change", "view", "after"),
    [
        (lambda record: editing.add_outcome(record, 1), 2, "abc"),
        (lambda record: editing.copy_outcome(record, 1), 2, "abbc"),
        (lambda record: editing.move_outcome(record, 1, 2), 2, "acb"),
        (lambda record: editing.move_outcome(record, 1, 0), 0, "bac"),
        (lambda record: editing.remove_outcome(record, 1), 1, "ac"),
    ],
)
def test_each_command_about_outcomes_is_one_step_with_its_view(
    three: Session, change: Callable[[Record], Record], view: int, after: str
) -> None:
    """The outcome that is there afterwards is in view; undo shows the one from which the command was given."""
    three.look_at(1)
    before = three.record
    three.change_record(change(three.record), view)
    assert (names(three), three.view) == (after, view)
    changed = three.record
    three.look_at(0)
    three.undo()
    assert three.record is before
    assert three.view == 1
    three.redo()
    assert three.record is changed
    assert three.view == view


def test_another_record_is_shown_from_its_first_outcome(three: Session) -> None:
    """A new record without a place begins at the first one; a change of the outcome in view alone stays there."""
    three.look_at(2)
    three.change_outcome(editing.swap_groups(three.outcome))
    assert three.view == 2
    three.change_record(Record())
    assert three.view == 0
    three.undo()
    assert (three.view, names(three)) == (2, "abc")


def test_an_equal_record_may_still_move_the_view(three: Session) -> None:
    """Removing nothing is no step, but the place asked for is shown."""
    three.change_record(Record(outcomes=three.record.outcomes, choices=three.record.choices), 2)
    assert three.view == 2
    three.undo()
    assert names(three) == ""
