"""The two questions that the window asks, as they stand on screen."""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import Qt, QTimer
from PySide6.QtTest import QTest
from PySide6.QtWidgets import QApplication, QDialog, QInputDialog, QLineEdit, QMessageBox, QPushButton

from fourcount.face.dialogs import ask_level
from fourcount.face.keeping_dialogs import ask_losing
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


ANSWERS = (("Save", "save"), ("Discard", "discard"), ("Cancel", "cancel"))


@pytest.mark.parametrize(("words", "answer"), ANSWERS)
def test_losing_work_has_three_answers(hands: Hands, answering: Callable[..., None], words: str, answer: str) -> None:
    """Each is a button of its own, in the words that people know."""
    answering(lambda question: QTest.mouseClick(button(question, words), Qt.MouseButton.LeftButton))
    assert ask_losing(hands.window, "“a.fourcount”") == answer


@pytest.mark.parametrize(("key", "answer"), [(Qt.Key.Key_Escape, "cancel"), (Qt.Key.Key_Return, "save")])
def test_a_hasty_key_keeps_the_work(hands: Hands, answering: Callable[..., None], key: Qt.Key, answer: str) -> None:
    """Neither Escape nor Enter discards what was typed."""
    answering(lambda question: QTest.keyClick(question, key))
    assert ask_losing(hands.window, "“a.fourcount”") == answer


def test_the_question_says_what_would_be_lost(hands: Hands, answering: Callable[..., None]) -> None:
    """It names the record as it is called, and renders none of it."""
    said: list[str] = []

    def answer(question: QDialog) -> None:
        assert isinstance(question, QMessageBox)
        assert question.textFormat() == Qt.TextFormat.PlainText
        said.append(question.text())
        question.reject()

    answering(answer)
    ask_losing(hands.window, "<b>bold</b>")
    assert said == ["Save the changes to <b>bold</b>?"]


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
