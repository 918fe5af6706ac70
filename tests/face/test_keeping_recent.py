"""The files last opened, the help on what is kept, and settings that are damaged."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from fourcount.face.help_window import HelpWindow
from fourcount.face.recent import MOST
from fourcount.wording import keeping as words
from fourcount.wording.kept import KEPT
from kept import Answers, told

if TYPE_CHECKING:
    from PySide6.QtGui import QAction

    from conftest import Hands
    from fourcount.face.window import MainWindow


def entries(window: MainWindow) -> list[QAction]:
    """The files in the menu."""
    return [action for action in window.files.recent.actions() if action.data()]


def copies(paper: Path, number: int) -> list[Path]:
    """The same record in several files."""
    paths = [paper.with_name(f"paper {place}.fourcount") for place in range(number)]
    for path in paths:
        path.write_bytes(paper.read_bytes())
    return paths


def test_the_newest_stands_first_and_the_oldest_goes(hands: Hands, paper: Path) -> None:
    """At most eight, each once."""
    paths = copies(paper, MOST + 2)
    for path in (*paths, paths[-2]):
        hands.window.files.open_path(str(path))
    assert [entry.data() for entry in entries(hands.window)] == [
        str(path) for path in (paths[-2], paths[-1], *reversed(paths[2:-2]))
    ]


def test_they_are_there_at_the_next_start(
    hands: Hands, paper: Path, open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands]
) -> None:
    """Chosen from the menu, a file is opened; one alone is remembered as well as several."""
    hands.window.files.open_path(str(paper))
    assert hands.window.close()
    second = at(open_window())
    (entry,) = entries(second.window)
    assert entry.text() == "&1  paper.fourcount"
    entry.trigger()
    assert second.window.files.keeping.path == paper


def test_a_file_that_is_gone_leaves_the_list(hands: Hands, answers: Answers, paper: Path) -> None:
    """It is said once, and not offered again."""
    hands.window.files.open_path(str(paper))
    hands.do("new")
    paper.unlink()
    entries(hands.window)[0].trigger()
    assert told(hands) == "“paper.fourcount” cannot be opened: there is no such file."
    assert entries(hands.window) == []


def test_the_list_is_cleared(hands: Hands, paper: Path, open_window: Callable[..., MainWindow], folder: Path) -> None:
    """Nothing of it is left, on disk or at the next start."""
    hands.window.files.open_path(str(paper))
    hands.window.files.recent.clears.trigger()
    assert entries(hands.window) == []
    assert not hands.window.files.recent.clears.isEnabled()
    assert hands.window.close()
    assert entries(open_window()) == []
    assert b"paper.fourcount" not in (folder / "window.ini").read_bytes()


def test_the_list_is_switched_off(hands: Hands, paper: Path, open_window: Callable[..., MainWindow]) -> None:
    """What was remembered goes, nothing new comes, and the next start knows it."""
    hands.window.files.open_path(str(paper))
    hands.window.files.recent.keeps.trigger()
    hands.window.files.open_path(str(paper))
    assert entries(hands.window) == []
    assert hands.window.close()
    second = open_window()
    assert not second.files.recent.keeps.isChecked()
    second.files.open_path(str(paper))
    assert entries(second) == []


def test_files_of_one_name_are_told_apart(hands: Hands, paper: Path) -> None:
    """Their folders stand beside them."""
    other = paper.parent / "older" / paper.name
    other.parent.mkdir()
    other.write_bytes(paper.read_bytes())
    for path in (paper, other):
        hands.window.files.open_path(str(path))
    assert entries(hands.window)[0].text() == "&1  paper.fourcount  (older)"


DAMAGED = {
    "no list": b"[General]\nrecent=7\nkeep_recent=perhaps\nset_aside=\n",
    "no texts": b"[General]\nrecent=@Invalid()\nkeep_recent=@Invalid()\n",
    "null": b"[General]\nrecent=a\\0b, c\n",
    "bytes": b"[General]\nrecent=@ByteArray(\\xff)\n",
    "many": b"[General]\nrecent=" + b", ".join(b"/nowhere/%d" % each for each in range(10_000)) + b"\n",
}


@pytest.mark.parametrize("content", DAMAGED.values(), ids=list(DAMAGED))
def test_damaged_settings_do_not_stop_the_start(
    folder: Path, paper: Path, open_window: Callable[..., MainWindow], content: bytes
) -> None:
    """Whatever stands there, the window opens with its menus, and files open."""
    folder.mkdir()
    (folder / "window.ini").write_bytes(content)
    window = open_window()
    assert len(entries(window)) <= MOST
    for entry in entries(window):
        entry.trigger()
    window.files.open_path(str(paper))
    assert window.files.keeping.path == paper
    assert entries(window)[0].data() == str(paper)


def test_the_help_says_what_is_kept_and_where(hands: Hands, folder: Path) -> None:
    """The folders of this computer, the two switches by their names, and that a clean exit deletes unsaved work."""
    hands.do("kept")
    (window,) = (each for each in hands.window.findChildren(HelpWindow) if each.isVisible())
    text = window.text.toPlainText()
    assert all(heading in text for heading in KEPT)
    assert str(folder / "state" / "aside") in text
    assert str(folder / "errors.log") in text
    for switch in (words.KEEP_ASIDE, words.RECENT_MENU):
        assert switch.replace("&", "") in text
    assert "when the window is closed as usual" in text
    assert "{" not in text
