"""How a figure was computed, and the help: opened and closed by keyboard, complete, and in nobody's way."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt
from PySide6.QtTest import QTest

from fourcount import __version__
from fourcount.face.actions import COMMANDS, LATER_COMMANDS, command_names
from fourcount.face.help_window import HelpWindow
from fourcount.stats.methods import METHODS, TESTS
from fourcount.wording import labels
from fourcount.wording.standing import STANDING_FULL

if TYPE_CHECKING:
    from conftest import Hands


def opened(hands: Hands, command: str) -> HelpWindow:
    """Ask for help and wait for its window."""
    hands.do(command)
    hands.qtbot.waitUntil(lambda: any(window.isVisible() for window in hands.window.findChildren(HelpWindow)))
    return next(window for window in hands.window.findChildren(HelpWindow) if window.isVisible())


@pytest.mark.parametrize("keys", ["Return", "Space"])
def test_a_row_opens_its_working_and_closes_it(example: Hands, keys: str) -> None:
    """Enter or Space on a measure shows how it was computed, and hides it again."""
    working = example.window.says.working
    assert not working.isVisible()
    example.row("risk_ratio").setFocus(Qt.FocusReason.TabFocusReason)
    example.press(keys)
    assert working.isVisible()
    assert all(part in working.text() for part in ("38", "412", "70", "409", "Miettinen"))
    example.press(keys)
    assert not working.isVisible()


def test_measures_under_the_fold_come_into_view(example: Hands) -> None:
    """What "More measures" opens stands on screen, though it begins below the window's edge."""
    window = example.window
    window.resize(1280, 420)
    before = set(example.rows)
    example.do("more")
    first = next(key for key in example.rows if key not in before)

    def seen() -> bool:
        row, port = example.row(first), window.page_scroll.viewport()
        top = row.mapTo(port, row.rect().topLeft()).y()
        return top >= 0 and top + row.height() < port.height()

    example.qtbot.waitUntil(seen)


def test_escape_closes_the_working(example: Hands) -> None:
    """Escape hides it from wherever the focus is, and changes nothing else."""
    example.click(example.row("odds_ratio"))
    working = example.window.says.working
    assert working.isVisible()
    record = example.window.session.record
    example.do("first-cell")
    example.press("Escape")
    assert not working.isVisible()
    assert example.window.session.record is record
    example.press("Escape")
    assert example.window.isVisible()


def test_one_working_is_open_at_a_time(example: Hands) -> None:
    """Opening another measure's working moves it there, under its row."""
    working = example.window.says.working
    example.click(example.row("risk_difference"))
    first = working.text()
    example.click(example.row("odds_ratio"))
    assert working.text() != first
    example.qtbot.waitUntil(lambda: working.y() >= example.row("odds_ratio").geometry().bottom())


def test_an_open_working_follows_the_counts(example: Hands) -> None:
    """New counts are in the working at the next pause; without counts it is gone."""
    example.click(example.row("risk_ratio"))
    working = example.window.says.working
    before = working.text()
    example.write(example.window.printed.grid.cells["first_left_text"], "41")
    assert working.isVisible()
    example.qtbot.waitUntil(lambda: working.text() != before)
    assert "41" in working.text()
    example.do("clear")
    assert not working.isVisible()


@pytest.mark.parametrize("key", ["risk_difference", "number_needed", "risk_reference", "risk_index", "risk_ratio", "odds_ratio", "odds_reference", "odds_index"])  # fmt: skip  # noqa: E501
def test_every_measure_has_a_working(example: Hands, key: str) -> None:
    """No row opens to nothing."""
    example.do("more")
    example.click(example.row(key))
    assert example.window.says.working.isVisible()
    assert len(example.window.says.working.text()) > 60


def test_every_command_has_keys_of_its_own(hands: Hands) -> None:
    """Each command can be given by keyboard, and no two share a key, not even one with itself."""
    actions = hands.window.actions_by_key
    assert [key for key, action in actions.items() if action.shortcut().isEmpty()] == []
    keys = [shortcut.toString() for action in actions.values() for shortcut in action.shortcuts()]
    assert sorted({key for key in keys if keys.count(key) > 1}) == []


def test_every_command_is_in_a_menu(hands: Hands) -> None:
    """Whatever a key does can be found in the menus as well, under its name."""
    named = {action.text() for menu in hands.window.menus.values() for action in menu.actions()}
    words = command_names()
    assert {words[command.key] for command in (*COMMANDS, *LATER_COMMANDS)} <= named


def test_access_keys_of_a_menu_are_unique(hands: Hands) -> None:
    """In no menu do two entries share the letter that opens them."""
    for name, menu in hands.window.menus.items():
        letters = [text[text.index("&") + 1].lower() for action in menu.actions() if "&" in (text := action.text())]
        assert sorted(letters) == sorted(set(letters)), name


def test_the_keys_window_lists_every_command(hands: Hands) -> None:
    """Names and keys of all commands stand there, as this platform writes them."""
    text = opened(hands, "keys").text.toPlainText()
    for key, action in hands.window.actions_by_key.items():
        assert command_names()[key].replace("&", "") in text
        assert action.shortcut().toString() in text
    assert all(words.format(paste="Ctrl+V") in text for pair in labels.KEYS_MORE for words in pair)


def test_the_methods_window_lists_every_method(hands: Hands) -> None:
    """Each method and test has its title, formula and source there, with what the program leaves out."""
    text = opened(hands, "methods").text.toPlainText()
    for entry in (*METHODS, *TESTS):
        assert entry.title in text
        assert entry.formula in text
        assert entry.source in text
    assert labels.HELP_LIMITS in text
    assert all(sentence in text for sentence in STANDING_FULL)


def test_the_link_opens_the_methods(example: Hands) -> None:
    """The words under the figures lead to the same window."""
    example.click(example.window.says.help)
    titles = [window.windowTitle() for window in example.window.findChildren(HelpWindow) if window.isVisible()]
    assert titles == [labels.HELP_TITLES["methods"]]


def test_about_says_what_it_is_and_is_not(hands: Hands) -> None:
    """Version, licence, libraries, and that it does not recommend."""
    text = opened(hands, "about").text.toPlainText()
    assert __version__ in text
    assert "MIT" in text
    assert "{" not in text
    assert all(sentence in text for sentence in STANDING_FULL)


@pytest.mark.parametrize("command", ["methods", "keys", "about"])
def test_escape_closes_a_help_window(hands: Hands, command: str) -> None:
    """Escape closes the help and leaves the window open."""
    window = opened(hands, command)
    QTest.keyClick(window.text, Qt.Key.Key_Escape)
    hands.qtbot.waitUntil(lambda: not window.isVisible())
    assert hands.window.isVisible()


def test_one_can_work_beside_the_help(hands: Hands) -> None:
    """A help window does not block the table."""
    opened(hands, "methods")
    cell = hands.window.printed.grid.cells["first_left_text"]
    QTest.keyClicks(cell, "38")
    assert hands.texts[0] == "38"
    assert not any(window.isModal() for window in hands.window.findChildren(HelpWindow))


def test_help_grows_with_the_text(hands: Hands) -> None:
    """An open help window takes the size of text that the window takes."""
    window = opened(hands, "about")
    before = window.text.document().size().height()
    hands.window.look.set_zoom(2.0)
    assert window.text.document().size().height() > before
