"""The command of the handout: a page from a record's file without a window, and a sentence for what fails."""

from __future__ import annotations

import subprocess
import sys
from pathlib import Path

import pytest
from msgspec.structs import replace
from PySide6.QtGui import QImage

from fourcount.face import handout_command
from fourcount.record.codec import encode
from fourcount.record.paper import Record
from patient_outcomes import AT_TWELVE, HARM, TRIAL

UNNAMED = replace(TRIAL, span_text="", name_text="Sleep")


@pytest.fixture
def record_file(tmp_path: Path) -> Path:
    """A record of two outcomes in a file."""
    path = tmp_path / "paper.fourcount"
    path.write_bytes(encode(Record(title_text="Night lights", outcomes=(AT_TWELVE, HARM))))
    return path


def run(*words: str | Path) -> int:
    """The command in this process, which has its application already."""
    return handout_command.run([str(word) for word in words])


@pytest.mark.parametrize("paper", ["a4", "letter"])
def test_the_command_writes_the_page(record_file: Path, tmp_path: Path, paper: str) -> None:
    """Status 0, and a picture in the shape of the paper."""
    out = tmp_path / "page.png"
    assert run(record_file, "-o", out, "--paper", paper) == 0
    image = QImage(str(out))
    shape = {"a4": 297 / 210, "letter": 279.4 / 215.9}[paper]
    assert image.height() / image.width() == pytest.approx(shape, abs=0.01)


@pytest.mark.parametrize(
    ("words", "said"),
    [
        ((), "A file is needed"),
        (("FILE",), "Say where the page goes with -o"),
        (("FILE", "-o"), "-o needs a value"),
        (("FILE", "-o", "x.doc"), "The page can be saved as .pdf, .png or .svg"),
        (("FILE", "-o", "x.pdf", "--paper", "a3"), "The paper must be a4 or letter"),
        (("FILE", "--fast", "-o", "x.pdf"), "There is no option"),
        (("FILE", "FILE", "-o", "x.pdf"), "One file at a time"),
        (("nothing.fourcount", "-o", "x.pdf"), "no such file"),
    ],
)
def test_bad_input_is_one_sentence_and_status_2(
    record_file: Path, words: tuple[str, ...], said: str, capsys: pytest.CaptureFixture[str]
) -> None:
    """Whatever is typed wrongly is answered on stderr in one line, without a traceback."""
    assert run(*(record_file if word == "FILE" else word for word in words)) == 2
    told = capsys.readouterr()
    assert said in told.err
    assert told.err.startswith("fourcount: ")
    assert told.err.count("\n") == 1
    assert told.out == ""


def test_an_unfinished_outcome_is_named(tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    """A ticked outcome that is not ready stops the page; left off it, the rest is made."""
    path, out = tmp_path / "paper.fourcount", tmp_path / "page.svg"
    path.write_bytes(encode(Record(outcomes=(TRIAL, UNNAMED))))
    assert run(path, "-o", out) == 2
    assert "“Sleep” cannot be on the page yet" in capsys.readouterr().err
    path.write_bytes(encode(Record(outcomes=(TRIAL, replace(UNNAMED, on_handout=False)))))
    assert run(path, "-o", out) == 0


def test_a_folder_that_cannot_be_written_is_status_1(
    record_file: Path, tmp_path: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    """What went wrong outside is status 1 and one sentence."""
    assert run(record_file, "-o", tmp_path / "nowhere" / "page.pdf") == 1
    assert "could not be saved" in capsys.readouterr().err


def test_the_command_needs_no_display(record_file: Path, tmp_path: Path) -> None:
    """A fresh process without any display writes a PDF and says nothing."""
    out = tmp_path / "page.pdf"
    code = "import sys; from fourcount.face.handout_command import run; sys.exit(run(sys.argv[1:]))"
    done = subprocess.run(
        [sys.executable, "-c", code, str(record_file), "-o", str(out)], capture_output=True, text=True, check=False
    )
    assert (done.returncode, done.stdout, done.stderr) == (0, "", "")
    assert out.read_bytes().startswith(b"%PDF")
