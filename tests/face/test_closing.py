"""Closing asks only where something typed would be lost."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from fourcount.face import keeping_dialogs

if TYPE_CHECKING:
    from conftest import Hands


@pytest.fixture
def asked(hands: Hands, monkeypatch: pytest.MonkeyPatch) -> list[bool]:
    """How often closing was asked about; the answer is to keep working."""
    questions: list[bool] = []
    monkeypatch.setattr(keeping_dialogs, "ask_losing", lambda parent, name: questions.append(True) or "cancel")
    yield questions
    monkeypatch.setattr(keeping_dialogs, "ask_losing", lambda parent, name: "discard")


def test_an_empty_window_closes_at_once(hands: Hands, asked: list[bool]) -> None:
    """Nothing was typed, so nothing is asked."""
    hands.do("quit")
    assert not hands.window.isVisible()
    assert asked == []


def test_the_example_closes_at_once(hands: Hands, asked: list[bool]) -> None:
    """The worked example is no work of the reader's."""
    hands.do("example")
    assert hands.window.close()
    assert asked == []


def test_choices_alone_close_at_once(hands: Hands, asked: list[bool]) -> None:
    """A family or a text size is remembered anyway."""
    hands.choose(hands.window.says.family, "textbook")
    hands.do("bigger")
    assert hands.window.close()
    assert asked == []


def test_what_was_undone_is_not_asked_about(hands: Hands, asked: list[bool]) -> None:
    """Back at the empty table there is nothing to lose."""
    hands.type("38")
    hands.press("Ctrl+Z")
    assert hands.window.close()
    assert asked == []


@pytest.mark.parametrize(
    "place", ["cell", "label", "outcome", "event", "baseline", "patient source", "title", "source"]
)
def test_whatever_was_typed_is_asked_about(hands: Hands, asked: list[bool], place: str) -> None:
    """A single word in any field is enough, and the answer No leaves the window as it was."""
    window, grid = hands.window, hands.window.printed.grid
    fields = {
        "cell": grid.cells["second_right_text"],
        "label": grid.labels["second"],
        "outcome": window.printed.name,
        "event": window.printed.event_words,
        "baseline": window.patient.baseline,
        "patient source": window.patient.source,
        "title": window.header.title,
        "source": window.header.source,
    }
    hands.write(fields[place], "7")
    assert not window.close()
    assert asked == [True]
    assert window.isVisible()
    assert fields[place].text() == "7"
    hands.write(fields[place], "78")
    assert fields[place].text() == "78"


def test_a_changed_example_is_asked_about(hands: Hands, asked: list[bool]) -> None:
    """With a count of the reader's own it is work."""
    hands.do("example")
    hands.type("41")
    assert not hands.window.close()
    assert asked == [True]


def test_the_answer_yes_closes(hands: Hands, asked: list[bool], monkeypatch: pytest.MonkeyPatch) -> None:
    """Discarding is possible, once it was asked for."""
    hands.type("38")
    monkeypatch.setattr(keeping_dialogs, "ask_losing", lambda parent, name: "discard")
    hands.do("quit")
    assert not hands.window.isVisible()
