"""Opening and saving: what is on disk is the record in the window, and nothing unseen is written over."""

from __future__ import annotations

import os
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from fourcount.face.keeping import with_suffix
from fourcount.publish.files import read_file
from fourcount.wording import keeping as words
from fourcount.wording.example import worked_example
from kept import Answers, change, marked, save_as, told

if TYPE_CHECKING:
    from conftest import Hands


def test_a_first_save_asks_where_and_the_next_does_not(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """The file holds the record of the window each time, under the suffix that was left out."""
    assert marked(example)
    answers.path = str(tmp_path / "falls")
    example.do("save")
    path = tmp_path / "falls.fourcount"
    assert read_file(path) == example.window.session.record
    assert not marked(example)
    assert example.window.windowTitle() == "falls.fourcount[*] · Fourcount"
    assert example.window.header.notice.text() == "Saved as falls.fourcount."
    answers.path = str(tmp_path / "another")
    example.count("39")
    assert marked(example)
    example.do("save")
    assert read_file(path) == example.window.session.record
    assert answers.asked == []
    assert [file.name for file in tmp_path.glob("*.fourcount*")] == ["falls.fourcount"]


def test_undo_goes_back_beyond_a_save(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """The mark follows what the file holds: back beyond the save is unsaved, forth to it is not."""
    save_as(example, answers, tmp_path / "a.fourcount")
    example.do("undo")
    assert marked(example)
    assert example.texts == ("38", "374", "70", "")
    example.do("redo")
    assert not marked(example)
    assert read_file(tmp_path / "a.fourcount") == example.window.session.record


def test_open_save_open_leaves_the_same_bytes(hands: Hands, answers: Answers, paper: Path) -> None:
    """A file that is opened and saved is not another one."""
    before = paper.read_bytes()
    answers.path = str(paper)
    hands.do("open")
    assert hands.window.session.record == worked_example()
    assert not marked(hands)
    assert not hands.window.session.can_undo
    hands.do("save")
    assert paper.read_bytes() == before


def test_a_new_table_has_no_file(hands: Hands, answers: Answers, paper: Path) -> None:
    """New leaves the old file alone; undo brings its record back, which is still that file's."""
    hands.window.files.open_path(str(paper))
    hands.do("new")
    assert hands.window.files.keeping.path is None
    assert hands.window.windowTitle() == "Fourcount[*]"
    hands.do("undo")
    assert hands.window.files.keeping.path == paper
    assert not marked(hands)
    hands.do("redo")
    assert hands.window.files.keeping.path is None


@pytest.mark.parametrize("command", ["new", "example", "open"])
def test_unsaved_work_is_asked_about(example: Hands, answers: Answers, paper: Path, command: str) -> None:
    """Cancel leaves everything as it was, Discard goes on, and both are asked with the paper's title."""
    example.write(example.window.header.title, "Lamps")
    record = example.window.session.record
    answers.path = str(paper)
    example.window.actions_by_key[command].trigger()
    assert answers.asked == ["Lamps"]
    assert example.window.session.record == record
    answers.losing = "discard"
    example.window.actions_by_key[command].trigger()
    assert example.window.session.record != record
    assert not marked(example)


def test_save_is_an_answer(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """Saved first and then gone; where no name is given for it, nothing goes."""
    answers.losing, record = "save", example.window.session.record
    example.do("new")
    assert example.window.session.record == record
    answers.path = str(tmp_path / "kept")
    example.do("new")
    assert read_file(tmp_path / "kept.fourcount") == record
    assert example.texts == ("", "", "", "")


def test_a_saved_window_closes_at_once(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """Nothing is asked where nothing is lost; one more letter is asked about."""
    save_as(example, answers, tmp_path / "a.fourcount")
    example.type("1")
    assert not example.window.close()
    example.do("undo")
    assert example.window.close()
    assert answers.asked == ["“a.fourcount”"]


def test_choices_of_a_saved_record_are_work(hands: Hands, answers: Answers, paper: Path) -> None:
    """Intervals are the record's: changed, they are unsaved."""
    hands.window.files.open_path(str(paper))
    hands.choose(hands.window.says.family, "exact")
    assert marked(hands)


def test_a_suffix_that_was_added_is_no_leave_to_replace(example: Hands, answers: Answers, paper: Path) -> None:
    """The dialog asked about another name, so the name with the suffix is asked about anew."""
    before = paper.read_bytes()
    save_as(example, answers, paper.with_suffix(""))
    assert answers.asked == ["paper.fourcount"]
    assert paper.read_bytes() == before
    answers.replace = True
    save_as(example, answers, paper.with_suffix(""))
    assert read_file(paper) == example.window.session.record


@pytest.mark.parametrize(
    ("name", "expected"),
    [
        ("a", "a.fourcount"),
        ("Smith 1.2", "Smith 1.2.fourcount"),
        ("a.FourCount", "a.FourCount"),
        ("a.", "a..fourcount"),
    ],
)
def test_other_endings_are_part_of_the_name(name: str, expected: str) -> None:
    """Only the suffix of a record is one."""
    assert with_suffix(Path("/x") / name).name == expected


def test_a_title_makes_a_name(example: Hands, answers: Answers) -> None:
    """What no file name may hold is left out of the one that is offered."""
    example.write(example.window.header.title, "Lamps: a/b <trial>?")
    example.do("save")
    assert Path(answers.suggested).name == "Lamps a b trial.fourcount"


def test_a_change_by_somebody_else_is_not_written_over(hands: Hands, answers: Answers, paper: Path) -> None:
    """Cancel leaves theirs, another name keeps both, and only "write over it" replaces it."""
    hands.window.files.open_path(str(paper))
    hands.write(hands.window.header.title, "Mine")
    theirs = change(paper)
    hands.do("save")
    assert answers.asked == ["paper.fourcount"]
    assert (paper.read_bytes(), marked(hands)) == (theirs, True)
    answers.over, answers.path = "other", str(paper.with_name("mine.fourcount"))
    hands.do("save")
    assert paper.read_bytes() == theirs
    assert read_file(paper.with_name("mine.fourcount")) == hands.window.session.record
    hands.window.files.open_path(str(paper))
    hands.write(hands.window.header.title, "Mine")
    change(paper.with_name("unrelated"))
    paper.write_bytes(theirs + b"\n")
    answers.over = "over"
    hands.do("save")
    assert read_file(paper) == hands.window.session.record


def test_the_same_bytes_are_no_change(hands: Hands, answers: Answers, paper: Path) -> None:
    """A copy that put the same content there again, with another date, is no conflict."""
    hands.window.files.open_path(str(paper))
    data = paper.read_bytes()
    paper.unlink()
    paper.write_bytes(data)
    os.utime(paper, (1, 1))
    hands.write(hands.window.header.title, "Mine")
    hands.do("save")
    assert answers.asked == []
    assert read_file(paper) == hands.window.session.record


def test_a_change_on_disk_is_told_as_it_happens(hands: Hands, answers: Answers, paper: Path) -> None:
    """The banner says that the file has another content, once, and what is in the window stays."""
    hands.window.files.open_path(str(paper))
    change(paper)
    hands.qtbot.waitUntil(lambda: told(hands) == words.CHANGED_ELSEWHERE.format(name="paper.fourcount"))
    assert hands.window.session.record == worked_example()
    hands.window.banner.hide()
    hands.window.files.keeping.look()
    assert told(hands) == ""


def test_a_file_that_is_gone_is_told_and_written_again(hands: Hands, answers: Answers, paper: Path) -> None:
    """There is nothing to lose, so saving asks nothing."""
    hands.window.files.open_path(str(paper))
    paper.unlink()
    hands.window.files.keeping.look()
    assert told(hands) == words.GONE.format(name="paper.fourcount")
    hands.write(hands.window.header.title, "Mine")
    hands.do("save")
    assert read_file(paper) == hands.window.session.record
    assert answers.asked == []


def test_our_own_saves_are_no_change_elsewhere(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """The watcher sees them and keeps quiet; after the second one it still watches."""
    path = tmp_path / "a.fourcount"
    save_as(example, answers, path)
    example.type("1")
    example.do("save")
    example.window.files.keeping.look()
    assert told(example) == ""
    change(path)
    example.qtbot.waitUntil(lambda: "has been changed" in told(example))
