"""Files that are dropped on the window, handed over by the system, or named at the start; and what they are called."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import QMimeData, QPoint, QPointF, Qt, QUrl
from PySide6.QtGui import QDragEnterEvent, QDropEvent
from PySide6.QtWidgets import QApplication, QWidget
from pytestqt.qtbot import QtBot

from fourcount.face import file_commands
from fourcount.face.text import TextOnly
from fourcount.face.window import MainWindow
from fourcount.wording import keeping as words
from fourcount.wording.example import worked_example
from kept import Answers, bytes_of, told

if TYPE_CHECKING:
    from conftest import Hands

DRAGGING = (Qt.DropAction.CopyAction, Qt.MouseButton.LeftButton, Qt.KeyboardModifier.NoModifier)


def files_of(*urls: str) -> QMimeData:
    """Files as a file manager hands them over, with their names as text too."""
    data = QMimeData()
    data.setUrls([QUrl(url) for url in urls])
    data.setData("text/plain", " ".join(urls).encode())
    return data


def takes(target: QWidget, data: QMimeData) -> bool:
    """Whether a widget takes what is dragged over it."""
    enters = QDragEnterEvent(QPoint(5, 5), *DRAGGING[:1], data, *DRAGGING[1:])
    enters.ignore()
    QApplication.sendEvent(target, enters)
    return enters.isAccepted()


def drop(window: MainWindow, *urls: str) -> None:
    """Drop files on the window."""
    data = files_of(*urls)
    assert takes(window, data)
    QApplication.sendEvent(window, QDropEvent(QPointF(5, 5), *DRAGGING[:1], data, *DRAGGING[1:]))


def test_a_field_takes_text_and_no_file(qtbot: QtBot) -> None:
    """A file that is dragged over a field goes on to the window; words can be dropped as ever."""
    field, text = TextOnly(), QMimeData()
    qtbot.addWidget(field)
    text.setText("38")
    assert takes(field, text)
    assert not takes(field, files_of("file:///tmp/a.fourcount"))


def test_a_dropped_file_is_opened(hands: Hands, answers: Answers, paper: Path) -> None:
    """The window opens it once the drop is over."""
    url = QUrl.fromLocalFile(str(paper)).toString()
    drop(hands.window, url)
    hands.qtbot.waitUntil(lambda: hands.window.files.keeping.path == paper)
    assert hands.window.session.record == worked_example()


@pytest.mark.parametrize(
    ("urls", "sentence"),
    [(("https://example.org/a.fourcount",), words.NOT_LOCAL), (("file:///a", "file:///b"), words.ONE_FILE)],
)
def test_only_one_file_of_this_computer_is_taken(hands: Hands, urls: tuple[str, ...], sentence: str) -> None:
    """An address elsewhere is not fetched, and two files are not guessed among."""
    drop(hands.window, *urls)
    assert told(hands) == sentence


def test_a_file_handed_over_opens_where_nothing_has_begun(
    hands: Hands, answers: Answers, paper: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    """An empty window takes it; one with a table leaves it to a window of its own."""
    started: list[str] = []
    monkeypatch.setattr(file_commands, "start_another", started.append)
    hands.window.take_file(str(paper))
    assert hands.window.files.keeping.path == paper
    other = paper.with_name("b.fourcount")
    hands.window.take_file(str(other))
    assert started == [str(other)]
    assert hands.window.files.keeping.path == paper


def test_a_start_with_a_file_opens_it(
    open_window: Callable[..., MainWindow], paper: Path, at: Callable[[MainWindow], Hands]
) -> None:
    """After the first paint, with the cursor in the first count."""
    hands = at(open_window())
    hands.window.files.begin(str(paper))
    assert hands.texts == ("38", "374", "70", "339")
    assert hands.field == "first_left_text"


def test_a_name_is_never_rendered(hands: Hands, answers: Answers, tmp_path: Path) -> None:
    """Markup, the sign of Qt's own mark and marks of direction in a file's name are shown as they are or not at all."""
    path = tmp_path / "<b>[*]&x\u202e.fourcount"
    path.write_bytes(bytes_of(worked_example()))
    hands.window.files.open_path(str(path))
    assert hands.window.windowTitle() == "<b>[*][*]&x\ufffd.fourcount[*] · Fourcount"
    assert hands.window.banner.words.textFormat() == Qt.TextFormat.PlainText
    assert hands.window.header.notice.textFormat() == Qt.TextFormat.PlainText
    entry = hands.window.files.recent.actions()[0].text()
    assert entry == "&1  <b>[*]&&x\ufffd.fourcount"
