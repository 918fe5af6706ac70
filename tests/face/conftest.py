"""A window as a person finds it, hands to use it with, and eyes to read it."""

from __future__ import annotations

import gc
from collections.abc import Callable, Iterator
from pathlib import Path

import pytest
from PySide6.QtCore import Qt
from PySide6.QtGui import QGuiApplication, QKeySequence
from PySide6.QtTest import QTest
from PySide6.QtWidgets import QApplication, QComboBox, QWidget
from pytestqt.qtbot import QtBot

from fourcount.face import keeping_dialogs
from fourcount.face.application import make_application, make_window
from fourcount.face.later import Later
from fourcount.face.measure_row import MeasureRow
from fourcount.face.window import MainWindow
from fourcount.record.outcome import CELLS, Form
from fourcount.record.paper import Record
from fourcount.wording.example import worked_example
from kept import Answers, bytes_of
from printed_forms import TYPED

EXAMPLE_COUNTS = ("38", "374", "70", "339")


class Hands:
    """What a person does with keyboard and mouse, and what stands on screen afterwards."""

    def __init__(self, qtbot: QtBot, window: MainWindow) -> None:
        self.qtbot = qtbot
        self.window = window

    @property
    def focus(self) -> QWidget:
        """The widget that gets what is typed."""
        return QApplication.focusWidget() or self.window

    @property
    def field(self) -> str:
        """The key of the field that has the focus."""
        return getattr(self.focus, "field", "")

    def type(self, text: str) -> None:
        """Type into whatever has the focus."""
        QTest.keyClicks(self.focus, text)

    def press(self, keys: str, times: int = 1) -> None:
        """Press a key or a chord, written as in a menu."""
        chord = QKeySequence(keys)[0]
        for _ in range(times):
            QTest.keyClick(self.focus, chord.key(), chord.keyboardModifiers())

    def do(self, command: str) -> None:
        """Give a command by its shortcut."""
        self.press(self.window.actions_by_key[command].shortcut().toString())

    def click(self, widget: QWidget) -> None:
        """Click into the middle of a widget."""
        QTest.mouseClick(widget, Qt.MouseButton.LeftButton)

    def write(self, widget: QWidget, text: str) -> None:
        """Go to a field and replace what it holds."""
        self.click(widget)
        self.press("Ctrl+A")
        if text:
            self.type(text)
        else:
            self.press("Del")

    def count(self, *texts: str) -> None:
        """Type counts from the first cell on, with Tab between them."""
        self.do("first-cell")
        for place, text in enumerate(texts):
            if place:
                self.press("Tab")
            self.press("Ctrl+A")
            if text:
                self.type(text)
            else:
                self.press("Del")

    def fill(self, form: Form) -> None:
        """Take a form and type something whole into it."""
        self.do(f"form-{form}")
        if form == "effect-only":
            self.type("OR 0.49 (0.32 to 0.75)")
        elif form == "strata":
            for text in ("38", "412", "70", "409", "10", "100", "20", "100"):
                self.type(text)
                self.press("Return")
        else:
            self.count(*TYPED[form])

    def choose(self, box: QComboBox, text: str) -> None:
        """Go to a choice and step to an entry, as a closed box takes it: each step on the way is chosen too."""
        box.setFocus(Qt.FocusReason.TabFocusReason)
        wanted = box.findText(text)
        assert wanted >= 0
        if wanted in (0, box.count() - 1):
            self.press("End" if wanted else "Home")
            return
        while box.currentIndex() != wanted:
            self.press("Down" if box.currentIndex() < wanted else "Up")

    @property
    def texts(self) -> tuple[str, ...]:
        """What stands in the four cells."""
        return tuple(self.window.printed.grid.cells[field].text() for field in CELLS)

    @property
    def sentence(self) -> str:
        """The sentence above the measures."""
        return self.window.says.sentence.text()

    @property
    def rows(self) -> dict[str, str]:
        """The measures on screen from top to bottom: each row as a screen reader says it, by its key."""
        QApplication.sendPostedEvents()
        rows = [row for row in self.window.says.findChildren(MeasureRow) if row.isVisible() and row.key != "test"]
        return {row.key: row.accessibleName() for row in sorted(rows, key=MeasureRow.y)}

    @property
    def p(self) -> str:
        """The sentence about p, as a screen reader says it."""
        return self.row("test").accessibleName()

    def row(self, key: str) -> MeasureRow:
        """A measure's row on screen."""
        return next(row for row in self.window.says.findChildren(MeasureRow) if row.key == key and row.isVisible())

    def top(self, widget: QWidget) -> int:
        """How far down the first column a widget stands."""
        return widget.mapTo(self.window.printed, widget.rect().bottomLeft()).y()

    def stands_alone(self, widget: QWidget) -> bool:
        """Whether a widget stands in the first column and not in its grid, where labels come before cells."""
        printed = self.window.printed
        return printed.isAncestorOf(widget) and not printed.grid.isAncestorOf(widget)

    @property
    def notice(self) -> str:
        """What is told under the table at this moment."""
        words = self.window.printed.notice
        return words.text() if words is not None and words.isVisible() else ""

    @property
    def notes(self) -> list[str]:
        """The sentences about marked cells."""
        words = self.window.printed.notes
        return words.text().splitlines() if words.isVisible() else []


@pytest.fixture(scope="session")
def qapp() -> QApplication:
    """The application that a start of the program makes; what is loaded by now is left out of every collection."""
    application = make_application(["fourcount"])
    gc.collect()
    gc.freeze()
    return application


@pytest.fixture
def folder(tmp_path: Path) -> Path:
    """The folder of this test's settings and log."""
    return tmp_path / "settings"


@pytest.fixture
def open_window(qtbot: QtBot, folder: Path, monkeypatch: pytest.MonkeyPatch) -> Iterator[Callable[..., MainWindow]]:
    """Open a window and wait until it has painted; it is closed at the end without a question."""
    monkeypatch.setattr(keeping_dialogs, "ask_losing", lambda parent, name: "discard")
    workers: list[Later] = []
    windows: list[MainWindow] = []  # a window that nobody holds is collected, and all that it owns with it

    def make(record: Record | None = None) -> MainWindow:
        gc.disable()  # a dead window that is collected while this one is made takes its slots along
        workers.append(Later())
        window = make_window(folder, record, workers[-1])
        windows.append(window)
        qtbot.addWidget(window)
        with qtbot.waitSignal(window.first_painted):
            window.show()
        qtbot.waitUntil(lambda: window.session.awake and window.isActiveWindow())
        return window

    yield make
    for worker in workers:
        assert worker.finish(10.0)
    gc.enable()  # no worker is left that could collect what is Qt's
    QGuiApplication.styleHints().setColorScheme(Qt.ColorScheme.Unknown)


@pytest.fixture
def window(open_window: Callable[..., MainWindow]) -> MainWindow:
    """The window of a first start."""
    return open_window()


@pytest.fixture
def hands(qtbot: QtBot, window: MainWindow) -> Hands:
    """Hands at the window of a first start."""
    return Hands(qtbot, window)


@pytest.fixture
def at(qtbot: QtBot) -> Callable[[MainWindow], Hands]:
    """Hands at another window."""
    return lambda window: Hands(qtbot, window)


@pytest.fixture
def example(hands: Hands) -> Hands:
    """Hands at a window with the four counts of the worked example typed, and nothing else."""
    hands.count(*EXAMPLE_COUNTS)
    return hands


@pytest.fixture
def answers(open_window: Callable[..., MainWindow], monkeypatch: pytest.MonkeyPatch) -> Iterator[Answers]:
    """Answers instead of questions; at the end everything may be discarded."""
    given = Answers()
    for name in ("ask_losing", "ask_over", "ask_replace"):
        monkeypatch.setattr(keeping_dialogs, name, getattr(given, name))
    for name in ("ask_open_path", "ask_save_path"):
        monkeypatch.setattr(keeping_dialogs, name, given.ask_path)
    yield given
    given.losing = "discard"


@pytest.fixture
def paper(tmp_path: Path) -> Path:
    """A file that holds the worked example."""
    path = tmp_path / "paper.fourcount"
    path.write_bytes(bytes_of(worked_example()))
    return path
