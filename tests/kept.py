"""Stand-ins for the questions about files, and what stands on screen and on disk afterwards."""

from __future__ import annotations

from pathlib import Path
from typing import TYPE_CHECKING

from fourcount.record.codec import encode
from fourcount.record.paper import Record

if TYPE_CHECKING:
    from conftest import Hands


class Answers:
    """What a person answers to the questions about files, and which were asked."""

    def __init__(self) -> None:
        self.asked: list[str] = []
        self.losing, self.over, self.replace, self.path = "cancel", "cancel", False, ""

    def ask_losing(self, _parent: object, name: str) -> str:
        self.asked.append(name)
        return self.losing

    def ask_over(self, _parent: object, name: str) -> str:
        self.asked.append(name)
        return self.over

    def ask_replace(self, _parent: object, name: str) -> bool:
        self.asked.append(name)
        return self.replace

    def ask_path(self, _parent: object, suggested: str) -> str:
        self.suggested = suggested
        return self.path


def bytes_of(record: Record) -> bytes:
    data = encode(record)
    assert isinstance(data, bytes)
    return data


def told(hands: Hands) -> str:
    """The sentence in the banner."""
    return hands.window.banner.words.text() if hands.window.banner.isVisible() else ""


def marked(hands: Hands) -> bool:
    """Whether the window has the platform's mark of unsaved work."""
    return hands.window.isWindowModified()


def save_as(hands: Hands, answers: Answers, path: Path) -> None:
    answers.path = str(path)
    hands.window.actions_by_key["save-as"].trigger()


def change(path: Path) -> bytes:
    """Somebody else writes the file."""
    data = bytes_of(Record(title_text="Somebody else’s"))
    path.write_bytes(data)
    return data
