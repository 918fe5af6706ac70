"""The session without a window: one record, one signal, a past and a future."""

from __future__ import annotations

import pytest
from pytestqt.qtbot import QtBot

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Counts
from fourcount.face.session import Session
from fourcount.record import editing
from fourcount.record.outcome import CELLS
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
