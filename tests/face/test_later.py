"""Figures that take longer than a keystroke may: the row says so, typing goes on, and the newest answer follows."""

from __future__ import annotations

import threading
from collections.abc import Callable, Iterator
from typing import TYPE_CHECKING

import pytest
from PySide6.QtGui import QGuiApplication
from pytestqt.qtbot import QtBot

from fourcount.appraisal import appraise as room
from fourcount.face.later import Later
from fourcount.record.outcome import EventsAndOthers, Outcome
from fourcount.record.paper import Choices
from fourcount.wording.lines import FOLLOWS
from heard import Heard

if TYPE_CHECKING:
    from conftest import Hands

EXACT = Choices(family="exact")


def table(first: str) -> Outcome:
    """An outcome that differs by one count."""
    cells = EventsAndOthers(
        first_left_text=first, first_right_text="374", second_left_text="70", second_right_text="339"
    )
    return Outcome(table=cells)


class Gate:
    """Holds the answers of the other thread back until it is opened, and counts the questions."""

    def __init__(self, appraise: Callable[..., object]) -> None:
        self._appraise = appraise
        self.open = threading.Event()
        self.reached = threading.Event()
        self.asked: list[str] = []

    def __call__(self, outcome: Outcome, choices: Choices, deferring: bool = False) -> object:
        if not deferring:
            self.asked.append(outcome.table.first_left_text)
            self.reached.set()
            assert self.open.wait(20)
        return self._appraise(outcome, choices, deferring=deferring)


@pytest.fixture
def gate(monkeypatch: pytest.MonkeyPatch) -> Iterator[Gate]:
    """A gate in front of the other thread's answers; the numerical libraries count as not loaded."""
    gate = Gate(room.appraise)
    monkeypatch.setattr(room, "appraise", gate)
    monkeypatch.setattr(room, "numbers_loaded", lambda: False)
    yield gate
    gate.open.set()


@pytest.fixture
def waiting(hands: Hands, gate: Gate) -> Hands:
    """Hands at a window whose exact figures have not come yet."""
    hands.choose(hands.window.says.family, "exact")
    hands.count("38", "374", "70", "339")
    return hands


def test_a_row_says_that_its_figure_follows(waiting: Hands) -> None:
    """The risks stand without their exact limits, the difference whole, and nothing is blank."""
    assert waiting.rows["risk_reference"] == f"Risk, reference group: 17.1%, {FOLLOWS}"
    assert waiting.rows["odds_ratio"].count(FOLLOWS) >= 1
    assert waiting.rows["risk_difference"] == "Difference: 7.9 fewer, 3.3 to 12.6"


def test_the_figures_follow(waiting: Hands, gate: Gate) -> None:
    """Once computed they stand where the word was, and the sentence about p with them."""
    assert "p <" not in waiting.p
    gate.open.set()
    waiting.qtbot.waitUntil(lambda: FOLLOWS not in str(waiting.rows))
    assert waiting.rows["risk_reference"] == "Risk, reference group: 17.1%, 13.6 to 21.1%"
    assert waiting.p.startswith("p < 0.001, two-sided (Fisher")


def test_typing_goes_on_meanwhile(waiting: Hands, gate: Gate) -> None:
    """Keystrokes are answered at once with all that can be said at once."""
    waiting.do("first-cell")
    waiting.type("41")
    assert waiting.texts[0] == "41"
    assert waiting.rows["risk_index"] == f"Risk, index group: 9.9%, {FOLLOWS}"
    gate.open.set()
    waiting.qtbot.waitUntil(lambda: FOLLOWS not in str(waiting.rows))
    assert waiting.rows["risk_index"].startswith("Risk, index group: 9.9%, ")


def test_workings_open_meanwhile(waiting: Hands) -> None:
    """How a figure is computed can be read before the figure is there, for every row."""
    for key in (*waiting.rows, "test"):
        waiting.click(waiting.row(key))
        assert waiting.window.says.working.isVisible()
        assert len(waiting.window.says.working.text()) > 60


@pytest.mark.parametrize("command", ["copy-text", "copy-table"])
def test_a_copy_never_holds_a_figure_that_is_still_to_follow(waiting: Hands, gate: Gate, command: str) -> None:
    """What leaves the window is whole: a letter cannot be told that a figure will follow."""
    clipboard = QGuiApplication.clipboard()
    clipboard.setText("before")
    gate.open.set()
    waiting.do(command)
    assert "will follow" not in clipboard.text()
    waiting.qtbot.waitUntil(lambda: FOLLOWS not in str(waiting.rows))
    waiting.do(command)
    assert clipboard.text() != "before"
    assert "will follow" not in clipboard.text()


def test_an_answer_for_a_table_that_is_gone_is_not_shown(waiting: Hands, gate: Gate) -> None:
    """Figures that arrive after the counts were cleared stay away."""
    assert gate.reached.wait(20)
    waiting.do("clear")
    heard = Heard(waiting.window._later.arrived, waiting.window)
    gate.open.set()
    waiting.qtbot.waitUntil(lambda: bool(heard.values))
    assert waiting.rows == {}
    assert waiting.sentence == "Type the four counts of the table."


def test_an_answer_for_another_family_is_not_shown(waiting: Hands, gate: Gate) -> None:
    """Whoever went back to the score family sees its figures, whatever arrives."""
    assert gate.reached.wait(20)
    waiting.choose(waiting.window.says.family, "score")
    heard = Heard(waiting.window._later.arrived, waiting.window)
    gate.open.set()
    waiting.qtbot.waitUntil(lambda: bool(heard.values))
    assert waiting.rows["risk_reference"] == "Risk, reference group: 17.1%, 13.8 to 21.1%"


def test_a_window_can_be_closed_while_figures_are_computed(waiting: Hands, gate: Gate) -> None:
    """Nothing waits for them, and nothing goes wrong when they come."""
    assert gate.reached.wait(20)
    assert waiting.window.close()
    gate.open.set()
    worker = [thread for thread in threading.enumerate() if thread.name == "fourcount-later"]
    waiting.qtbot.waitUntil(lambda: not any(thread.is_alive() for thread in worker))


def test_loading_the_libraries_brings_the_figures(hands: Hands, monkeypatch: pytest.MonkeyPatch) -> None:
    """With numpy loaded, exact figures of small tables come with the keystroke itself."""
    hands.qtbot.waitUntil(room.numbers_loaded)
    hands.choose(hands.window.says.family, "exact")
    asked: list[object] = []
    monkeypatch.setattr(hands.window._later, "ask", lambda *question: asked.append(question))
    hands.count("38", "374", "70", "339")
    assert hands.rows["risk_reference"] == "Risk, reference group: 17.1%, 13.6 to 21.1%"
    assert asked == []


def test_very_large_tables_follow_in_earnest(hands: Hands) -> None:
    """At a thousand million a cell the exact odds ratio is computed apart, and arrives."""
    hands.qtbot.waitUntil(room.numbers_loaded)
    hands.choose(hands.window.says.family, "exact")
    hands.count("500000000", "1000000000", "510000000", "1000000000")
    assert FOLLOWS in hands.rows["odds_ratio"]
    hands.qtbot.waitUntil(lambda: FOLLOWS not in str(hands.rows), timeout=30_000)
    assert hands.rows["odds_ratio"].startswith("Odds ratio: 0.98, ")


def test_of_several_questions_only_the_newest_is_computed(qtbot: QtBot, gate: Gate) -> None:
    """While one answer is computed, older questions in the queue are dropped."""
    later = Later()
    arrived: list[str] = []
    later.arrived.connect(lambda outcome, choices, findings: arrived.append(outcome.table.first_left_text))
    later.ask(table("1"), EXACT)
    assert gate.reached.wait(20)
    for first in ("2", "3", "4"):
        later.ask(table(first), EXACT)
    gate.open.set()
    qtbot.waitUntil(lambda: "4" in arrived)
    assert arrived == ["1", "4"]
    assert gate.asked == ["1", "4"]


def test_a_worker_that_is_done_starts_again(qtbot: QtBot, gate: Gate) -> None:
    """Question after question is answered, each with the very objects it was asked with."""
    later = Later()
    heard = Heard(later.arrived, later)
    gate.open.set()
    for number, first in enumerate(("1", "2"), start=1):
        asked = table(first)
        later.ask(asked, EXACT)
        qtbot.waitUntil(lambda n=number: len(heard.values) == n)
        assert heard.values[-1][0] is asked
        assert heard.values[-1][1] is EXACT


def test_after_closing_nothing_arrives(qtbot: QtBot, gate: Gate) -> None:
    """An answer that comes too late is dropped."""
    later = Later()
    later.ask(table("1"), EXACT)
    assert gate.reached.wait(20)
    later.close()
    worker = [thread for thread in threading.enumerate() if thread.name == "fourcount-later"]
    with qtbot.assertNotEmitted(later.arrived):
        gate.open.set()
        qtbot.waitUntil(lambda: not any(thread.is_alive() for thread in worker))
