"""Unsaved work set aside at each pause, and offered by the next start where this one broke off."""

from __future__ import annotations

import os
import subprocess
import sys
from collections.abc import Callable
from pathlib import Path
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt, QTimer
from PySide6.QtTest import QTest
from PySide6.QtWidgets import QApplication, QLabel

from fourcount.face import keeping_dialogs, set_aside
from fourcount.face.recovering import RecoverDialog, offer_of
from fourcount.face.set_aside import Head, Orphan
from fourcount.publish.files import read_file
from fourcount.record.paper import Record
from fourcount.wording import keeping as words
from fourcount.wording.example import worked_example
from kept import Answers, change, marked, save_as, told

if TYPE_CHECKING:
    from conftest import Hands
    from fourcount.face.window import MainWindow

CHILD = """
import os, sys
from pathlib import Path
import fourcount.face.running_start
from fourcount.face.application import make_application, make_window

os.environ["QT_QPA_PLATFORM"] = "offscreen"
application, folder, file = make_application(["fourcount"]), Path(sys.argv[1]), sys.argv[2]
window = make_window(folder)
window.wanted_file = file

def work():
    window.session.edit_text("title_text", "Not saved yet")
    window.files.set_aside.keep()
    print("ready", flush=True)

window.first_painted.connect(work)
window.show()
application.exec()
"""
"""A window that changes a record and sets it aside, in a process that can be killed."""


@pytest.fixture
def aside(folder: Path) -> Path:
    """The folder where windows of this test set work aside."""
    return folder / "state" / "aside"


def kept_in(aside: Path) -> list[Path]:
    return sorted(aside.glob("*.aside"))


def break_off(folder: Path, file: str = "") -> None:
    """Open a window in a process of its own, change something, wait until it is set aside, and kill the process."""
    command = [sys.executable, "-c", CHILD, str(folder), file]
    child = subprocess.Popen(command, stdout=subprocess.PIPE, text=True, env=dict(os.environ))
    assert child.stdout is not None
    assert child.stdout.readline() == "ready\n"
    child.kill()
    child.wait()
    child.stdout.close()


@pytest.fixture
def offered(monkeypatch: pytest.MonkeyPatch) -> list[object]:
    """What was offered; the answer to each is the last entry of ``answer``, at first to decide later."""
    offers: list[object] = []
    monkeypatch.setattr(keeping_dialogs, "ask_recover", lambda look, parent, offer: offers.append(offer) or "later")
    return offers


def answering(monkeypatch: pytest.MonkeyPatch, answer: str) -> None:
    monkeypatch.setattr(keeping_dialogs, "ask_recover", lambda look, parent, offer: answer)


def test_a_pause_sets_work_aside(hands: Hands, aside: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """Not at each key, but once nothing is typed for a moment; the next pause writes the same file."""
    monkeypatch.setattr(set_aside, "PAUSE", 30)
    hands.type("38")
    assert kept_in(aside) == []
    hands.qtbot.waitUntil(lambda: len(kept_in(aside)) == 1)
    (path,) = kept_in(aside)
    before = path.read_bytes()
    hands.type("4")
    hands.qtbot.waitUntil(lambda: path.read_bytes() != before)
    assert kept_in(aside) == [path]
    assert set_aside._read(path)[1] == hands.window.session.record


def test_typing_without_a_pause_is_set_aside_too(hands: Hands, aside: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """A run that goes on for long is not waited for."""
    monkeypatch.setattr(set_aside, "PAUSE", 100_000)
    monkeypatch.setattr(set_aside, "LONGEST_RUN", 0)
    hands.type("3")
    hands.qtbot.waitUntil(lambda: len(kept_in(aside)) == 1)


@pytest.mark.parametrize("way", ["save", "undo", "close", "new", "switch"])
def test_nothing_unsaved_is_nothing_set_aside(
    example: Hands, answers: Answers, aside: Path, tmp_path: Path, way: str
) -> None:
    """Saved, undone, closed or let go, or with the switch off: the file is gone, and its lock with it."""
    window = example.window
    window.files.set_aside.keep()
    assert len(kept_in(aside)) == 1
    answers.losing = "discard"
    if way == "save":
        save_as(example, answers, tmp_path / "a.fourcount")
    elif way == "undo":
        example.press("Ctrl+Z", times=4)
        assert not marked(example)
    elif way == "close":
        assert window.close()
    elif way == "new":
        example.do("new")
    else:
        window.keeps_aside.trigger()
    assert list(aside.iterdir()) == []


def test_the_switch_lasts(
    example: Hands, aside: Path, open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands]
) -> None:
    """Switched off, no later window sets anything aside; switched on again, this one does at once."""
    example.window.keeps_aside.trigger()
    assert example.window.close()
    second = at(open_window())
    assert not second.window.keeps_aside.isChecked()
    second.type("38")
    second.window.files.set_aside.keep()
    assert kept_in(aside) == []
    second.window.keeps_aside.trigger()
    assert len(kept_in(aside)) == 1


def test_a_disk_that_is_full_is_told_once(example: Hands, aside: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """One sentence while it fails, and again only after it has worked."""
    aside.parent.mkdir(parents=True, exist_ok=True)
    aside.write_text("not a folder", encoding="ascii")
    keep = example.window.files.set_aside.keep
    keep()
    assert told(example).startswith("Unsaved work could not be set aside in ")
    example.window.banner.hide()
    keep()
    assert told(example) == ""
    aside.unlink()
    keep()
    assert len(kept_in(aside)) == 1


def test_a_text_beyond_the_limits_is_told(example: Hands, aside: Path) -> None:
    """What cannot be set aside is said with its place; the state before stays."""
    example.window.files.set_aside.keep()
    (path,) = kept_in(aside)
    before = path.read_bytes()
    example.window.session.edit_text("title_text", "x" * 2_001)
    example.window.files.set_aside.keep()
    assert told(example).startswith("This state can neither be saved nor set aside: ")
    assert path.read_bytes() == before


def test_other_windows_that_run_are_left_alone(
    example: Hands, open_window: Callable[..., MainWindow], offered: list[object]
) -> None:
    """What a window that is open has set aside is its own."""
    example.window.files.set_aside.keep()
    open_window().files.offer()
    assert offered == []


def test_a_broken_off_window_is_offered(
    folder: Path, paper: Path, aside: Path, open_window: Callable[..., MainWindow], offered: list[object]
) -> None:
    """After a kill the next window says when and what, beside what stands in the file; nothing is opened by itself."""
    break_off(folder, str(paper))
    before = paper.read_bytes()
    window = open_window()
    window.files.offer()
    (offer,) = offered
    assert offer.aside[0] == "for paper.fourcount"
    assert offer.aside[2:] == ["Not saved yet", "Falls: 38 · 374 · 70 · 339", "Poor sleep: 62 · 350 · 49 · 360"]
    assert offer.aside[1][-5:-3].isdigit()
    assert offer.file[0] == "paper.fourcount"
    assert offer.file[2] == "Night lights on a rehabilitation ward"
    assert offer.notes == [words.OFFER_UNDO]
    assert window.session.record == Record()
    assert paper.read_bytes() == before
    assert len(kept_in(aside)) == 1


def test_what_was_set_aside_is_opened_as_unsaved(
    folder: Path,
    paper: Path,
    aside: Path,
    answers: Answers,
    open_window: Callable[..., MainWindow],
    at: Callable[[MainWindow], Hands],
    monkeypatch: pytest.MonkeyPatch,
) -> None:
    """It belongs to its file, undo shows what the file holds, and saving ends it."""
    break_off(folder, str(paper))
    answering(monkeypatch, "open")
    hands = at(open_window())
    hands.qtbot.waitUntil(lambda: hands.window.session.record.title_text == "Not saved yet")
    assert hands.window.files.keeping.path == paper
    assert marked(hands)
    hands.do("undo")
    assert hands.window.session.record == worked_example()
    assert not marked(hands)
    hands.do("redo")
    assert len(kept_in(aside)) == 0
    hands.window.files.set_aside.keep()
    hands.do("save")
    assert answers.asked == []
    assert read_file(paper) == hands.window.session.record
    assert kept_in(aside) == []


def test_a_file_that_changed_since_is_a_conflict(
    folder: Path,
    paper: Path,
    answers: Answers,
    open_window: Callable[..., MainWindow],
    at: Callable[[MainWindow], Hands],
    monkeypatch: pytest.MonkeyPatch,
) -> None:
    """The offer says so, and saving asks before it writes over the newer file."""
    break_off(folder, str(paper))
    theirs = change(paper)
    notes: list[str] = []
    monkeypatch.setattr(keeping_dialogs, "ask_recover", lambda look, parent, offer: notes.extend(offer.notes) or "open")
    hands = at(open_window())
    hands.qtbot.waitUntil(lambda: hands.window.session.record.title_text == "Not saved yet")
    assert notes == [words.OFFER_CHANGED, words.OFFER_UNDO]
    hands.do("save")
    assert answers.asked == ["paper.fourcount"]
    assert paper.read_bytes() == theirs


def test_deleted_is_gone_and_later_is_offered_again(
    folder: Path, aside: Path, open_window: Callable[..., MainWindow], offered: list[object],
    monkeypatch: pytest.MonkeyPatch,
) -> None:  # fmt: skip
    """What never had a file says so; "later" leaves it for the next start, "delete" for none."""
    break_off(folder)
    window = open_window()
    window.files.offer()
    assert offered[0].file == [words.OFFER_NO_FILE]
    window.files.offer()
    assert len(offered) >= 2
    answering(monkeypatch, "delete")
    window.files.offer()
    assert list(aside.iterdir()) == []


DAMAGED = {"empty": b"", "no record": b'{"when":"2026-12-01T10:00:00Z"}\n{', "no head": b"\x00\xff\n", "newer": b'{"when":"0001-01-01T00:00:00+14:00"}\n{"fourcount_format": 99}'}  # fmt: skip  # noqa: E501


@pytest.mark.parametrize("content", DAMAGED.values(), ids=list(DAMAGED))
def test_a_damaged_one_does_not_stop_the_start(
    aside: Path, open_window: Callable[..., MainWindow], offered: list[object], content: bytes
) -> None:
    """It is offered to be deleted, with the reason why it cannot be opened, and stays until then."""
    aside.mkdir(parents=True)
    (aside / "x.aside").write_bytes(content)
    window = open_window()
    window.files.offer()
    assert not offered[0].can_open
    assert offered[0].aside[-1].startswith("It cannot be read: ")
    assert (aside / "x.aside").read_bytes() == content


def test_what_broken_writes_left_is_cleared_away(hands: Hands, aside: Path) -> None:
    """Half a file that nobody can be writing any more goes, a fresh one stays."""
    aside.mkdir(parents=True)
    for name in ("a.aside.XyZ123", "b.aside.AbC456"):
        (aside / name).write_bytes(b"half")
    os.utime(aside / "a.aside.XyZ123", (1, 1))
    assert hands.window.files.set_aside.orphans() == []
    assert [path.name for path in aside.iterdir()] == ["b.aside.AbC456"]


def test_the_offer_has_three_answers_and_plain_text(hands: Hands, tmp_path: Path) -> None:
    """Escape decides later; whatever a record holds is shown as it is."""
    record = Record(title_text="<img src=x>")
    head = Head(when=set_aside.datetime(2026, 12, 1, 17, 42).astimezone())
    offer = offer_of(Orphan(tmp_path / "x.aside", set_aside._lock_of(tmp_path / "x.aside"), head, record))
    assert offer.aside[:2] == ["1 December 2026, 17:42", "<img src=x>"]
    for press, answer in (("opens", "open"), ("deletes", "delete"), ("waits", "later"), (None, "later")):
        dialog = RecoverDialog(hands.window.look, offer, hands.window)
        dialog.open()
        assert all(label.textFormat() == Qt.TextFormat.PlainText for label in dialog.findChildren(QLabel))
        if press:
            QTest.mouseClick(getattr(dialog, press), Qt.MouseButton.LeftButton)
        else:
            QTest.keyClick(dialog, Qt.Key.Key_Escape)
        assert (dialog.isVisible(), dialog.answer) == (False, answer)


def test_the_question_stands_on_screen(hands: Hands, folder: Path, aside: Path) -> None:
    """A real dialog over the window, answered by its button."""
    break_off(folder)

    def answer() -> None:
        dialog = QApplication.activeModalWidget()
        if isinstance(dialog, RecoverDialog):
            timer.stop()
            QTest.mouseClick(dialog.deletes, Qt.MouseButton.LeftButton)

    timer = QTimer(hands.window)
    timer.timeout.connect(answer)
    timer.start(5)
    hands.window.files.offer()
    assert list(aside.iterdir()) == []
