"""A record read from a file: the record, or one sentence."""

from __future__ import annotations

import os
from pathlib import Path

import pytest

from fourcount.assets_folder import assets_folder
from fourcount.publish.files import read_file
from fourcount.record.codec import LARGEST_FILE, encode
from fourcount.record.paper import Record
from fourcount.wording.example import worked_example

EXAMPLE = assets_folder() / "example.fourcount"


def test_the_example_among_the_assets_is_the_worked_example() -> None:
    """The very bytes that saving it would give."""
    assert read_file(EXAMPLE) == worked_example()
    assert EXAMPLE.read_bytes() == encode(worked_example())


def test_a_path_may_be_text(tmp_path: Path) -> None:
    """As a command line has it."""
    kept = encode(Record(title_text="Lights"))
    assert isinstance(kept, bytes)
    (tmp_path / "lights.fourcount").write_bytes(kept)
    assert read_file(str(tmp_path / "lights.fourcount")) == Record(title_text="Lights")


def test_reading_leaves_the_file_as_it_is(tmp_path: Path) -> None:
    """One that is refused as well."""
    file = tmp_path / "damaged.fourcount"
    file.write_bytes(EXAMPLE.read_bytes()[:900])
    before = file.stat().st_mtime_ns
    assert read_file(file) == (
        "“damaged.fourcount” cannot be opened: the file ends before the record does; its end is missing."
    )
    assert file.read_bytes() == EXAMPLE.read_bytes()[:900]
    assert file.stat().st_mtime_ns == before


def test_what_is_not_there_or_is_no_file_gets_a_sentence(tmp_path: Path) -> None:
    """Each says which file, by its name alone."""
    assert read_file(tmp_path / "none.fourcount") == "“none.fourcount” cannot be opened: there is no such file."
    (tmp_path / "folder.fourcount").mkdir()
    assert read_file(tmp_path / "folder.fourcount") == "“folder.fourcount” cannot be opened: it is a folder."
    (tmp_path / "text").write_text("38 of 412", encoding="utf-8")
    assert read_file(tmp_path / "text") == "“text” cannot be opened: this is no record of Fourcount."


@pytest.mark.parametrize("path", ["", "a\0b", "x" * 5_000, "\udcff", "a\nb\u202e{0}", "~", "/", "."])
def test_any_path_gets_an_answer(path: str, tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """One line that a terminal can print, whatever the path is made of."""
    monkeypatch.chdir(tmp_path)
    answer = read_file(path)
    assert isinstance(answer, str)
    assert answer.isprintable()
    assert answer.endswith(".")


@pytest.mark.skipif(not hasattr(os, "mkfifo"), reason="this system has no named pipes")
def test_a_pipe_is_not_waited_for(tmp_path: Path) -> None:
    """Nobody ever writes to this one."""
    os.mkfifo(tmp_path / "pipe")
    assert read_file(tmp_path / "pipe") == "“pipe” cannot be opened: it is not an ordinary file."


def test_of_a_huge_file_no_more_is_read_than_a_record_may_have(tmp_path: Path) -> None:
    """A terabyte without content, which would not fit into memory."""
    with (tmp_path / "huge").open("wb") as file:
        try:
            file.truncate(10**12)
        except OSError:
            file.truncate(LARGEST_FILE + 1)
    assert read_file(tmp_path / "huge") == (
        "“huge” cannot be opened: a record takes at most 10 megabytes, and this is more."
    )


def test_a_file_that_may_not_be_read_gets_a_sentence(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """The system's refusal, whoever runs the tests."""

    def refuse(*_: object, **__: object) -> None:
        raise PermissionError

    (tmp_path / "locked").write_bytes(EXAMPLE.read_bytes())
    monkeypatch.setattr(Path, "open", refuse)
    assert read_file(tmp_path / "locked") == "“locked” cannot be opened: the system does not let it be read."
