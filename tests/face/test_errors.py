"""An unexpected error: one sentence on screen, kind and place in the log, what was typed nowhere but in the window."""

from __future__ import annotations

import sys
import threading
from collections.abc import Callable, Iterator
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from fourcount.face.errors import LARGEST_LOG, LOG_NAME, ErrorListener
from fourcount.record import editing
from fourcount.wording import labels

if TYPE_CHECKING:
    from conftest import Hands

SECRET = "Confidential 38 of 412"


def fail(*_: object, **__: object) -> None:
    """Stand in for something that goes wrong with what was typed in its message."""
    raise ArithmeticError(SECRET)


@pytest.fixture
def listening(hands: Hands, folder: Path) -> Iterator[Hands]:
    """Hands at a window whose errors are listened to, as a start of the program does."""
    listener = ErrorListener(folder, hands.window)
    listener.happened.connect(hands.window.tell_unexpected)
    listener.install()
    yield hands
    listener.remove()


@pytest.fixture
def failing(listening: Hands, monkeypatch: pytest.MonkeyPatch) -> Hands:
    """Hands at a window with a table, in which swapping the groups goes wrong."""
    listening.count("38", "374", "70", "339")
    listening.write(listening.window.printed.grid.labels["first"], "Confidential")
    monkeypatch.setattr(editing, "swap_groups", fail)
    return listening


def test_the_window_says_one_sentence(failing: Hands, folder: Path) -> None:
    """The banner names the kind of error and where its details are, and nothing of the error's own message."""
    assert not failing.window.banner.isVisible()
    failing.do("swap")
    assert failing.window.banner.isVisible()
    said = failing.window.banner.words.text()
    assert said == labels.UNEXPECTED.format(name="ArithmeticError", place=folder / LOG_NAME)
    assert SECRET not in said


def test_the_record_is_unharmed(failing: Hands) -> None:
    """What was typed stands there as before, and the window goes on."""
    record, rows = failing.window.session.record, failing.rows
    failing.do("swap")
    assert failing.window.session.record is record
    assert failing.rows == rows
    failing.write(failing.window.printed.grid.cells["first_left_text"], "41")
    assert failing.rows != rows


def test_the_log_has_the_place_and_no_message(failing: Hands, folder: Path, capfd: pytest.CaptureFixture[str]) -> None:
    """The log and the terminal hold the kind of error and the lines of code, never its message nor anything typed."""
    failing.do("swap")
    log = (folder / LOG_NAME).read_text(encoding="utf-8")
    assert log.startswith("ArithmeticError\n")
    assert "commands.py:" in log
    said = "".join(capfd.readouterr())
    assert "fourcount: unexpected ArithmeticError" in said
    for text in (log, said):
        assert "Confidential" not in text
        assert "412" not in text


def test_every_error_is_logged(failing: Hands, folder: Path) -> None:
    """A second error is written under the first."""
    failing.do("swap")
    failing.do("swap")
    assert (folder / LOG_NAME).read_text(encoding="utf-8").count("ArithmeticError") == 2


def test_the_banner_can_be_dismissed_by_keyboard(failing: Hands) -> None:
    """Enter on its word closes the banner; another error shows it again."""
    failing.do("swap")
    failing.window.banner.dismiss.setFocus()
    failing.press("Return")
    assert not failing.window.banner.isVisible()
    failing.do("swap")
    assert failing.window.banner.isVisible()


def test_the_banner_goes_with_what_works_next(failing: Hands) -> None:
    """A new table, a keystroke or a copy: what went wrong is over."""
    for command in ("new", "undo", "copy-text"):
        failing.do("swap")
        assert failing.window.banner.isVisible()
        failing.do(command)
        assert not failing.window.banner.isVisible()


def test_without_a_log_the_sentence_names_none(failing: Hands, folder: Path) -> None:
    """Where no log can be written, the banner does not send anybody there."""
    folder.write_text("not a folder", encoding="ascii")
    failing.do("swap")
    assert failing.window.banner.words.text() == labels.UNEXPECTED_NO_LOG.format(name="ArithmeticError")


def test_a_large_log_is_begun_anew(failing: Hands, folder: Path) -> None:
    """The log never grows without end."""
    folder.mkdir(exist_ok=True)
    (folder / LOG_NAME).write_text("x" * (LARGEST_LOG + 1), encoding="ascii")
    failing.do("swap")
    assert (folder / LOG_NAME).stat().st_size < 10_000


def test_an_error_while_computing_apart_is_told_too(
    listening: Hands, folder: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    """What goes wrong away from the keyboard reaches the same banner and log."""
    from fourcount.appraisal import appraise as room

    whole = room.appraise
    monkeypatch.setattr(room, "numbers_loaded", lambda: False)
    monkeypatch.setattr(room, "appraise", lambda *a, **k: whole(*a, **k) if k.get("deferring") else fail())
    listening.choose(listening.window.says.family, "exact")
    listening.count("38", "374", "70", "338")
    listening.qtbot.waitUntil(listening.window.banner.isVisible)
    assert SECRET not in (folder / LOG_NAME).read_text(encoding="utf-8")
    assert listening.texts == ("38", "374", "70", "338")
    listening.window._later.close()
    workers = [thread for thread in threading.enumerate() if thread.name == "fourcount-later"]
    listening.qtbot.waitUntil(lambda: not any(thread.is_alive() for thread in workers))


def test_an_interruption_is_no_error(folder: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """Ctrl+C in the terminal goes where it always went."""
    heard: list[type[BaseException]] = []
    monkeypatch.setattr(sys, "excepthook", lambda kind, *rest: heard.append(kind))
    listener = ErrorListener(folder)
    listener.install()
    sys.excepthook(KeyboardInterrupt, KeyboardInterrupt(), None)
    assert heard == [KeyboardInterrupt]
    assert not (folder / LOG_NAME).exists()


def test_removing_gives_the_old_report_back(folder: Path) -> None:
    """Afterwards errors are reported as they were before."""
    before: Callable[..., object] = sys.excepthook
    listener = ErrorListener(folder)
    listener.install()
    assert sys.excepthook != before
    listener.remove()
    assert sys.excepthook == before
