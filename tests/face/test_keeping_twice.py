"""One file, one window: opened once more it comes to the front; a lock that a crash has left stops nobody."""

from __future__ import annotations

import os
import subprocess
import sys
from collections.abc import Callable, Iterator
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from fourcount.face import application, open_files
from fourcount.face.open_files import OPEN_NAME, OpenFiles, show_elsewhere
from fourcount.wording import keeping as words
from kept import Answers, told

if TYPE_CHECKING:
    from conftest import Hands

HOLDER = """
import os, sys
from pathlib import Path
os.environ["QT_QPA_PLATFORM"] = "offscreen"
from PySide6.QtCore import QCoreApplication, QTimer
from fourcount.face.open_files import OpenFiles

application, files = QCoreApplication([]), OpenFiles(Path(sys.argv[1]))
files.wanted.connect(lambda: print("wanted", flush=True))
print(files.hold(Path(sys.argv[2])), flush=True)
if sys.argv[3] == "answers":
    application.exec()
else:
    sys.stdin.readline()
"""
"""A process that has a file open, and answers or is busy."""


@pytest.fixture
def locks(folder: Path) -> Path:
    """The folder in which the windows of this test say what they have open."""
    return folder / "state" / OPEN_NAME


@pytest.fixture
def holder(locks: Path, paper: Path) -> Iterator[Callable[[str], subprocess.Popen[str]]]:
    """Start another program that has the file open."""
    children: list[subprocess.Popen[str]] = []

    def start(manner: str) -> subprocess.Popen[str]:
        child = subprocess.Popen(
            [sys.executable, "-c", HOLDER, str(locks), str(paper), manner],
            stdin=subprocess.PIPE,
            stdout=subprocess.PIPE,
            text=True,
            env=dict(os.environ),
        )
        children.append(child)
        assert child.stdout is not None
        assert child.stdout.readline() == "True\n"
        return child

    yield start
    for child in children:
        child.kill()
        child.communicate()


def test_a_file_that_is_open_comes_to_the_front(
    hands: Hands, paper: Path, holder: Callable[[str], subprocess.Popen[str]]
) -> None:
    """The other window hears of it; this one says where the file is and keeps its own record."""
    child = holder("answers")
    hands.window.files.open_path(str(paper))
    assert child.stdout is not None
    assert child.stdout.readline() == "wanted\n"
    assert hands.window.files.keeping.path is None
    assert hands.window.header.notice.text() == words.OPEN_ELSEWHERE.format(name="paper.fourcount")


def test_a_window_that_does_not_answer_stops_nobody(
    hands: Hands, paper: Path, holder: Callable[[str], subprocess.Popen[str]], monkeypatch: pytest.MonkeyPatch
) -> None:
    """After a moment the file is opened here too, and it is said that it is open twice."""
    monkeypatch.setattr(open_files, "LONGEST_WAIT", 0.2)
    holder("is busy")
    hands.window.files.open_path(str(paper))
    assert hands.window.files.keeping.path == paper
    assert told(hands) == words.OPEN_TWICE.format(name="paper.fourcount")


def test_what_a_crash_left_stops_nobody(
    hands: Hands, paper: Path, locks: Path, holder: Callable[[str], subprocess.Popen[str]]
) -> None:
    """The lock of a process that was killed is nobody's, and neither is an unanswered wish."""
    child = holder("answers")
    child.kill()
    child.wait()
    assert len(list(locks.glob("*.open"))) == 1
    hands.window.files.open_path(str(paper))
    assert hands.window.files.keeping.path == paper
    assert told(hands) == ""


def test_a_window_comes_to_the_front_when_it_is_wanted(hands: Hands, paper: Path, locks: Path) -> None:
    """It takes the wish away, which is its answer; a wish for another file is left alone."""
    window = hands.window
    window.files.open_path(str(paper))
    window.showMinimized()
    (locks / "another.wanted").write_bytes(b"")
    wish = open_files._wish(locks, paper)
    wish.write_bytes(b"")
    hands.qtbot.waitUntil(lambda: not window.isMinimized())
    assert not wish.exists()
    assert (locks / "another.wanted").exists()


def test_the_lock_follows_the_record(hands: Hands, answers: Answers, paper: Path, locks: Path) -> None:
    """New lets the file go, undo takes it again, closing leaves nothing."""
    held = hands.window.files.open_files
    hands.window.files.open_path(str(paper))
    assert held.held == paper
    hands.do("new")
    assert held.held is None
    assert list(locks.glob("*.open")) == []
    hands.do("undo")
    assert held.held == paper
    assert hands.window.close()
    assert list(locks.iterdir()) == []


def test_a_link_to_a_file_is_that_file(paper: Path, locks: Path, tmp_path: Path) -> None:
    """However it is reached, it is one file."""
    link = tmp_path / "link.fourcount"
    try:
        link.symlink_to(paper)
    except OSError:
        pytest.skip("this system lets nobody make links")
    files = OpenFiles(locks)
    assert files.hold(paper)
    assert not OpenFiles(locks).hold(link)
    files.release()
    assert OpenFiles(locks).hold(link)


def test_a_folder_that_cannot_be_written_is_no_trouble(hands: Hands, paper: Path, locks: Path) -> None:
    """Without locks files are opened all the same."""
    locks.parent.mkdir(parents=True, exist_ok=True)
    locks.write_bytes(b"not a folder")
    hands.window.files.open_path(str(paper))
    assert hands.window.files.keeping.path == paper
    assert told(hands) == ""
    assert not show_elsewhere(locks, paper)


def test_a_second_launch_opens_no_second_window(
    paper: Path, holder: Callable[[str], subprocess.Popen[str]], monkeypatch: pytest.MonkeyPatch, folder: Path
) -> None:
    """The command on a file that is open brings that window to the front and ends well, before Qt makes a window."""
    child = holder("answers")
    monkeypatch.setattr(application, "make_application", lambda arguments: pytest.fail("a window was made"))
    assert application.run(str(paper)) == 0
    assert child.stdout is not None
    assert child.stdout.readline() == "wanted\n"


def test_a_file_handed_over_by_the_system_is_wanted(hands: Hands, paper: Path) -> None:
    """The event by which some systems open a document reaches the window."""
    from PySide6.QtCore import QUrl
    from PySide6.QtGui import QFileOpenEvent
    from PySide6.QtWidgets import QApplication

    running = QApplication.instance()
    assert isinstance(running, application.Application)
    running.file_wanted.connect(hands.window.take_file)
    QApplication.sendEvent(running, QFileOpenEvent(QUrl.fromLocalFile(str(paper))))
    running.file_wanted.disconnect(hands.window.take_file)
    assert hands.window.files.keeping.path == paper
