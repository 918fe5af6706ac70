"""What is remembered from one start to the next, and that nothing of a record is."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import QSize

from fourcount.face.window import FIRST_SIZE, MainWindow
from fourcount.ink.palette import DARK
from fourcount.record.paper import Choices

if TYPE_CHECKING:
    from conftest import Hands


def test_a_second_window_is_as_the_first_was_left(hands: Hands, open_window: Callable[..., MainWindow]) -> None:
    """Size, text size, appearance, family and level come back; the counts do not."""
    first = hands.window
    first.resize(700, 600)
    hands.do("bigger")
    first.look.set_appearance("dark")
    hands.choose(first.says.family, "textbook")
    hands.choose(first.says.level, "99%")
    hands.count("38", "374", "70", "339")
    assert first.close()
    second = open_window()
    assert second.size() == QSize(700, 600)
    assert second.look.zoom == first.look.zoom
    assert second.look.appearance == "dark"
    assert second.look.palette == DARK
    assert second.session.record.choices == Choices(family="textbook", level=0.99)
    assert second.says.family.currentText() == "textbook"
    assert second.says.level.currentText() == "99%"
    assert second.printed.grid.cells["first_left_text"].text() == ""
    assert [action.isChecked() for action in second.menus["view"].actions() if action.data() == "dark"] == [True]


def test_an_unusual_level_is_remembered(
    hands: Hands, open_window: Callable[..., MainWindow], monkeypatch: pytest.MonkeyPatch
) -> None:
    """A level that is not in the list comes back as an entry."""
    from fourcount.face import dialogs

    monkeypatch.setattr(dialogs, "ask_level", lambda parent, now, problem="": "97.5")
    hands.do("level")
    assert hands.window.close()
    second = open_window()
    assert second.session.record.choices.level == pytest.approx(0.975)
    assert second.says.level.currentText() == "97.5%"


def test_nothing_of_the_record_is_written(hands: Hands, folder: Path) -> None:
    """After closing, no file in the settings folder holds anything that was typed."""
    window, grid = hands.window, hands.window.printed.grid
    hands.count("71", "3749", "7001", "33917")
    for field in (window.header.title, window.header.source, grid.labels["first"], window.printed.event_words, window.patient.source):  # fmt: skip  # noqa: E501
        hands.write(field, "Confidential")
    assert window.close()
    written = [file.read_bytes() for file in folder.rglob("*") if file.is_file()]
    assert written
    for text in (b"Confidential", b"3749", b"7001", b"33917"):
        assert not any(text in content for content in written)


def test_the_first_start_has_the_first_size_and_choices(window: MainWindow) -> None:
    """Without settings the window is 1,280 by 800 as far as there is room, at 100%, with the score family at 95%."""
    room = window.screen().availableSize()
    assert window.width() == min(FIRST_SIZE.width(), room.width())
    assert 0 < min(FIRST_SIZE.height(), room.height()) - window.height() < 60
    assert window.look.zoom == 1.0
    assert window.look.appearance == "system"
    assert window.session.record.choices == Choices()


def test_an_adopted_method_stays_with_its_paper(
    hands: Hands, open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands]
) -> None:
    """A new table and the next start take what was last chosen by hand, and say so where it is unusual."""
    window = hands.window
    hands.choose(window.says.family, "exact")
    hands.count("38", "374", "70", "339")
    hands.do("paper")
    hands.type("0.54 (0.39 to 0.73)")
    hands.qtbot.waitUntil(window.actions_by_key["adopt"].isEnabled)
    hands.do("adopt")
    assert window.session.record.choices.level == 0.9
    adopted = window.session.record.choices
    hands.do("new")
    assert window.session.record.choices == Choices(family="exact")
    assert "exact" in hands.notice
    hands.do("undo")
    assert window.session.record.choices == adopted
    assert window.close()
    second = open_window()
    assert second.session.record.choices == Choices(family="exact")
    again = at(second)
    assert "exact" in again.notice
    again.do("example")
    again.do("new")
    assert second.session.record.choices == Choices(family="exact")


def test_a_level_that_was_adopted_can_be_chosen_by_hand(hands: Hands) -> None:
    """Chosen from the list after an undo, it is somebody's own and goes on."""
    window = hands.window
    hands.count("38", "374", "70", "339")
    hands.do("paper")
    hands.type("0.54 (0.39 to 0.73)")
    hands.qtbot.waitUntil(window.actions_by_key["adopt"].isEnabled)
    hands.do("adopt")
    adopted = window.session.record.choices
    hands.do("undo")
    hands.choose(window.says.family, adopted.family)
    hands.choose(window.says.level, "90%")
    hands.do("new")
    assert window.session.record.choices == adopted


DAMAGED = {
    "binary": bytes(range(256)) * 8,
    "empty": b"",
    "no section": b"zoom",
    "not numbers": b"[General]\nzoom=large\nlevel=high\nfamily=mine\nappearance=pink\ngeometry=here\n",
    "out of range": b"[General]\nzoom=40\nlevel=2\ngeometry=@ByteArray(x)\n",
    "not a number": b"[General]\nzoom=nan\nlevel=nan\n",
    "infinite": b"[General]\nzoom=inf\nlevel=-inf\n",
    "lists": b"[General]\nzoom=1, 2\nlevel=0.9, 0.8\nfamily=exact, score\nappearance=dark, light\n",
    "invalid variants": b"[General]\nzoom=@Invalid()\nlevel=@Invalid()\ngeometry=@Invalid()\n",
    "half a line": b"[General]\ngeometry=@ByteArray(\\x1\\xd9\\xd0",
}


@pytest.mark.parametrize("content", DAMAGED.values(), ids=list(DAMAGED))
def test_a_damaged_file_does_not_stop_the_start(
    folder: Path, open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands], content: bytes
) -> None:
    """Whatever stands in the file, the window opens with what it can use and the usual choices elsewhere."""
    folder.mkdir()
    (folder / "window.ini").write_bytes(content)
    window = open_window()
    assert (window.look.zoom, window.look.appearance) == (1.0, "system")
    assert window.session.record.choices == Choices()
    hands = at(window)
    hands.count("38", "374", "70", "339")
    assert hands.rows["risk_ratio"].startswith("Risk ratio: 0.54")
    assert window.close()


def test_a_folder_that_cannot_be_made_is_no_trouble(
    folder: Path, open_window: Callable[..., MainWindow], at: Callable[[MainWindow], Hands]
) -> None:
    """Where a file stands in the folder's place things are just not remembered."""
    folder.write_text("not a folder", encoding="ascii")
    window = open_window()
    at(window).do("bigger")
    assert window.close()
    assert folder.read_text(encoding="ascii") == "not a folder"
