"""The two questions that the window asks, as they stand on screen."""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt, QTimer
from PySide6.QtTest import QTest
from PySide6.QtWidgets import QApplication, QDialog, QInputDialog, QLineEdit, QMessageBox, QPushButton

from fourcount.face.dialogs import ask_level, may_discard
from fourcount.wording import labels

if TYPE_CHECKING:
    from conftest import Hands


@pytest.fixture
def answering(hands: Hands) -> Callable[[Callable[[QDialog], None]], None]:
    """Answer the next question as soon as it stands on screen."""
    timer = QTimer(hands.window)
    timer.setInterval(5)

    def prepare(answer: Callable[[QDialog], None]) -> None:
        def look() -> None:
            question = QApplication.activeModalWidget()
            if isinstance(question, QDialog):
                timer.stop()
                answer(question)

        timer.timeout.connect(look)
        timer.start()

    return prepare


def button(question: QDialog, words: str) -> QPushButton:
    """The button with these words."""
    return next(each for each in question.findChildren(QPushButton) if each.text().replace("&", "") == words)


@pytest.mark.parametrize(("words", "answer"), [(labels.CLOSE_YES, True), (labels.CLOSE_NO, False)])
def test_discarding_is_a_button_of_its_own(
    hands: Hands, answering: Callable[..., None], words: str, answer: bool
) -> None:
    """Each answer is said in words, and only one of them discards."""
    answering(lambda question: QTest.mouseClick(button(question, words), Qt.MouseButton.LeftButton))
    assert may_discard(hands.window) is answer


@pytest.mark.parametrize("key", [Qt.Key.Key_Escape, Qt.Key.Key_Return])
def test_a_hasty_key_keeps_the_work(hands: Hands, answering: Callable[..., None], key: Qt.Key) -> None:
    """Neither Escape nor Enter discards what was typed."""
    answering(lambda question: QTest.keyClick(question, key))
    assert may_discard(hands.window) is False


def test_the_question_says_what_would_be_lost(hands: Hands, answering: Callable[..., None]) -> None:
    """It is one plain sentence on what closing does and what can be done first."""
    said: list[str] = []

    def answer(question: QDialog) -> None:
        assert isinstance(question, QMessageBox)
        said.append(question.text())
        question.reject()

    answering(answer)
    may_discard(hands.window)
    assert said == [labels.CLOSE_QUESTION]


def test_a_level_is_typed_over_the_old_one(hands: Hands, answering: Callable[..., None]) -> None:
    """The old level stands there selected, the problem above it, and Enter answers."""
    said: list[str] = []

    def answer(question: QDialog) -> None:
        assert isinstance(question, QInputDialog)
        said.append(question.labelText())
        field = question.findChild(QLineEdit)
        assert field is not None
        assert field.selectedText() == "95"
        QTest.keyClicks(field, "97.5")
        QTest.keyClick(field, Qt.Key.Key_Return)

    answering(answer)
    assert ask_level(hands.window, "95", "abc: a confidence level is needed, such as 95%") == "97.5"
    assert said[0].startswith("abc: a confidence level is needed")
    assert labels.LEVEL_QUESTION in said[0]


def test_escape_answers_with_no_level(hands: Hands, answering: Callable[..., None]) -> None:
    """A question that is put away has no answer, whatever stands in it."""
    answering(lambda question: QTest.keyClick(question, Qt.Key.Key_Escape))
    assert ask_level(hands.window, "95") is None
