"""Files that are no records, disks that are full, folders that are gone: one sentence, and the work is still there."""

from __future__ import annotations

import os
import shutil
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from fourcount.face import whole_file
from fourcount.face.whole_file import digest_of, write_whole
from fourcount.publish.files import read_file
from fourcount.wording import keeping as words
from kept import Answers, marked, save_as, told

if TYPE_CHECKING:
    from conftest import Hands

ROOT = hasattr(os, "geteuid") and os.geteuid() == 0


REFUSED = {
    "empty": b"",
    "cut off": None,
    "no record": b'{"a": 1}',
    "newer": b'{"fourcount_format": 99}',
    "not text": b"\xff\xfe\x00\x01",
    "too large": b" " * 10_000_001,
    "deep": b'{"a":' * 200 + b"1" + b"}" * 200,
}


@pytest.mark.parametrize("content", REFUSED.values(), ids=list(REFUSED))
def test_a_refused_file_is_untouched_and_so_is_the_work(
    example: Hands, answers: Answers, paper: Path, content: bytes | None
) -> None:
    """One sentence that names the file; the window keeps its record, its file and its past."""
    answers.losing = "discard"
    data = paper.read_bytes()[:-40] if content is None else content
    paper.write_bytes(data)
    record = example.window.session.record
    example.window.files.open_path(str(paper))
    assert told(example).startswith("“paper.fourcount” cannot be opened: ")
    assert told(example).count("\n") == 0
    assert paper.read_bytes() == data
    assert example.window.session.record == record
    assert example.window.files.keeping.path is None
    assert example.window.session.can_undo
    assert example.window.files.recent.paths == []


def test_a_record_beyond_the_limits_is_not_cut(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """A text that no file holds is named with its place, and nothing is written."""
    example.window.session.edit_text("title_text", "x" * 2_001)
    save_as(example, answers, tmp_path / "long.fourcount")
    assert "more than 2,000 characters stand in the title" in told(example)
    assert marked(example)
    assert list(tmp_path.glob("long*")) == []


def test_a_folder_that_is_gone(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """One sentence, and the work is there to be saved elsewhere."""
    folder = tmp_path / "away"
    folder.mkdir()
    save_as(example, answers, folder / "a.fourcount")
    example.type("1")
    shutil.rmtree(folder)
    example.do("save")
    assert "is not saved: there is no folder" in told(example)
    assert marked(example)
    save_as(example, answers, tmp_path / "b.fourcount")
    assert read_file(tmp_path / "b.fourcount") == example.window.session.record


def test_a_folder_of_that_name(example: Hands, answers: Answers, tmp_path: Path) -> None:
    """Nothing is put into it or in its place."""
    (tmp_path / "a.fourcount").mkdir()
    save_as(example, answers, tmp_path / "a.fourcount")
    assert told(example) == words.NOT_SAVED.format(name="a.fourcount", reason=words.A_FOLDER)
    assert list((tmp_path / "a.fourcount").iterdir()) == []


@pytest.mark.skipif(not hasattr(os, "mkfifo"), reason="this system has no pipes with names")
def test_what_is_no_ordinary_file_is_not_replaced(tmp_path: Path) -> None:
    """A pipe or a device stays what it is; a name that none can have is no file elsewhere."""
    pipe = tmp_path / "pipe"
    os.mkfifo(pipe)
    assert write_whole(pipe, b"new", None) == whole_file.Written(reason=words.A_DEVICE)
    assert pipe.is_fifo()
    assert write_whole(tmp_path / "a\0b", b"new", None) == whole_file.Written(reason=words.NO_NAME)
    assert [path.name for path in tmp_path.iterdir()] == ["pipe"]


@pytest.mark.skipif(ROOT, reason="for root no file is read-only")
def test_a_read_only_folder(example: Hands, answers: Answers, paper: Path) -> None:
    """The system's own reason stands in the sentence; the old file stays."""
    before = paper.read_bytes()
    paper.parent.chmod(0o500)
    save_as(example, answers, paper)
    paper.parent.chmod(0o700)
    assert told(example).startswith("“paper.fourcount” is not saved: ")
    assert paper.read_bytes() == before


def test_a_disk_that_is_full(example: Hands, answers: Answers, paper: Path) -> None:
    """A write that the system cuts short leaves the old file whole, and nothing beside it."""
    resource = pytest.importorskip("resource", reason="only some systems can limit the size of a file")
    before, there = paper.read_bytes(), sorted(paper.parent.iterdir())
    soft, hard = resource.getrlimit(resource.RLIMIT_FSIZE)
    resource.setrlimit(resource.RLIMIT_FSIZE, (100, hard))
    try:
        save_as(example, answers, paper)
    finally:
        resource.setrlimit(resource.RLIMIT_FSIZE, (soft, hard))
    assert told(example).startswith("“paper.fourcount” is not saved: ")
    assert paper.read_bytes() == before
    assert sorted(paper.parent.iterdir()) == there
    assert marked(example)


class Failing(whole_file.QSaveFile):
    """A file on a disk that fails at one step."""

    step, said = "open", ""

    def open(self, mode: object) -> bool:  # type: ignore[override]
        return self.step != "open" and super().open(mode)  # type: ignore[arg-type]

    def write(self, data: bytes) -> int:  # type: ignore[override]
        return len(data) // 2 if self.step == "write" else super().write(data)

    def flush(self) -> bool:
        return self.step != "flush" and super().flush()

    def commit(self) -> bool:
        if self.step == "commit":
            self.cancelWriting()
        return super().commit() and self.step != "commit"

    def errorString(self) -> str:  # noqa: N802 -- Qt's own name
        return self.said


@pytest.mark.parametrize("step", ["open", "write", "flush", "commit"])
@pytest.mark.parametrize("said", ["", "Unknown error", "No space left on device"])
def test_a_fault_at_each_step(
    example: Hands, answers: Answers, paper: Path, monkeypatch: pytest.MonkeyPatch, step: str, said: str
) -> None:
    """Wherever it breaks off: one sentence with a reason, the old file whole, the work unsaved in the window."""
    before = paper.read_bytes()
    monkeypatch.setattr(whole_file, "QSaveFile", type("Fails", (Failing,), {"step": step, "said": said}))
    save_as(example, answers, paper)
    reason = "no space left on device." if said.startswith("No") else words.NO_REASON if step == "open" else words.FULL
    assert told(example) == words.NOT_SAVED.format(name="paper.fourcount", reason=reason)
    assert paper.read_bytes() == before
    assert marked(example)
    assert example.window.files.keeping.path is None


def test_what_changes_while_it_is_written_is_a_conflict(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """The comparison is the last thing before the file is replaced."""
    path = tmp_path / "a"
    path.write_bytes(b"old")

    class Meddled(whole_file.QSaveFile):
        def flush(self) -> bool:
            path.write_bytes(b"theirs")
            return super().flush()

    monkeypatch.setattr(whole_file, "QSaveFile", Meddled)
    assert write_whole(path, b"new", digest_of(b"old")).conflict
    assert path.read_bytes() == b"theirs"
