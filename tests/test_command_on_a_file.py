"""``fourcount FILE``: which words are files, and that nothing else is taken for one."""

from __future__ import annotations

from pathlib import Path

import pytest

from fourcount import __main__ as command


@pytest.fixture
def opened(monkeypatch: pytest.MonkeyPatch) -> list[str]:
    """What the window was opened on."""
    paths: list[str] = []
    monkeypatch.setattr(command, "_open_window", lambda path="": paths.append(path) or 0)
    return paths


@pytest.mark.parametrize("word", ["a.fourcount", "A.FOURCOUNT", "folder/a", "./answer", "\\\\share\\a"])
def test_what_looks_like_a_file_opens_a_window(opened: list[str], word: str) -> None:
    """Whether it is there or not: the window says what is wrong with it, where a double-click can see it."""
    assert command.main([word]) == 0
    assert opened == [word]


def test_a_file_that_is_there_needs_no_suffix(
    opened: list[str], tmp_path: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    """Any name of a file in the present folder is one, but for the commands' own."""
    monkeypatch.chdir(tmp_path)
    for name in ("paper", "answer"):
        (tmp_path / name).write_bytes(b"")
    assert command.main(["paper"]) == 0
    assert command.main(["answer"]) == 2
    assert opened == ["paper"]


@pytest.mark.parametrize("words", [["anwser"], ["-x.fourcount"], ["a.fourcount", "b.fourcount"], ["a.fourcount", "--json"], ["a\0b"]])  # fmt: skip  # noqa: E501
def test_anything_else_is_answered_with_one_sentence(
    opened: list[str], words: list[str], capsys: pytest.CaptureFixture[str]
) -> None:
    """A mistyped command, an option, or more than one file opens nothing."""
    assert command.main(words) == 2
    assert opened == []
    said = capsys.readouterr()
    assert said.out == ""
    assert said.err.count("\n") == 1
