"""The command: what it prints, and that every mistake is answered with one sentence."""

from __future__ import annotations

import io
import json
import os
import re
import subprocess
import sys
from collections.abc import Mapping
from pathlib import Path
from typing import Any

import pytest

from fourcount import __main__ as command
from fourcount import __version__, answer
from fourcount.publish.answer_file import file_json, file_listing
from fourcount.publish.asked_patient import WISHES
from fourcount.record.codec import encode
from fourcount.wording.command import HELP
from fourcount.wording.example import worked_example

TRIAL = ["15", "85", "5", "95"]


def run(*arguments: str, environment: Mapping[str, str] | None = None) -> subprocess.CompletedProcess[str]:
    """The command in a process of its own."""
    return subprocess.run(
        [sys.executable, "-m", "fourcount", *arguments],
        capture_output=True,
        text=True,
        encoding="utf-8",
        env=None if environment is None else dict(environment),
        check=False,
    )


def test_json_is_what_the_function_gives(capsys: pytest.CaptureFixture[str]) -> None:
    """The command prints exactly the dictionary of the function."""
    assert command.main(["answer", *TRIAL, "--json"]) == 0
    assert json.loads(capsys.readouterr().out) == answer(15, 85, 5, 95)


def test_options_reach_the_answer(capsys: pytest.CaptureFixture[str]) -> None:
    """Every option changes what it names, wherever it stands between the counts."""
    words = ["15", "--design", "cohort", "85", "--level", "90%", "5", "95", "--intervals=exact", "--welcome", "--json"]
    assert command.main(["answer", *words, "--baseline", "12 in 100"]) == 0
    expected = answer(15, 85, 5, 95, design="cohort", level=0.9, intervals="exact", baseline=0.12, unwelcome=False)
    assert json.loads(capsys.readouterr().out) == expected


@pytest.mark.parametrize("design", ["trial", "cohort", "survey", "case-control"])
def test_text_is_readable_and_ends_with_the_cautions(design: str, capsys: pytest.CaptureFixture[str]) -> None:
    """The text names the odds ratio with its interval, and its last paragraph is the standing block."""
    from fourcount.wording.cautions import STANDING

    assert command.main(["answer", "38", "374", "70", "339", "--design", design]) == 0
    said = capsys.readouterr()
    assert "0.49  0.32 to 0.75" in said.out
    assert " ".join(said.out.split()).endswith(STANDING)
    assert said.err == ""


def test_what_is_printed_is_checked(capsys: pytest.CaptureFixture[str]) -> None:
    """Sentences before the figures, and the same matches as the function's in JSON."""
    printed = "RR 0.49 (95% CI, 0.32 to 0.75; P < 0.001)"
    assert command.main(["answer", "38", "374", "70", "339", "--printed", printed]) == 0
    said = " ".join(capsys.readouterr().out.split())
    assert said.startswith("Does it add up? - Check the name: 0.49 (0.32 to 0.75), printed as a risk ratio")
    assert command.main(["answer", "38", "374", "70", "339", "--printed", printed, "--json"]) == 0
    assert json.loads(capsys.readouterr().out) == answer(38, 374, 70, 339, printed=printed)


@pytest.mark.parametrize("design", ["matched", "paired", "before-after"])
def test_pairs_are_counted_both_index_reference_neither(design: str, capsys: pytest.CaptureFixture[str]) -> None:
    """25 pairs with the index side only against 10 with the reference side only: an odds ratio of 2.5."""
    words = ["answer", "12", "25", "10", "53", "--design", design]
    assert command.main([*words, "--printed", "OR 2.50 (1.20 to 5.21)", "--json"]) == 0
    found = json.loads(capsys.readouterr().out)
    assert found["measures"]["pair_odds_ratio"]["estimate"] == 2.5
    assert found["printed"][0]["as"] == "pair_odds_ratio"
    assert found == answer(12, 25, 10, 53, design=design, printed="OR 2.50 (1.20 to 5.21)")
    assert command.main(words) == 0
    assert "2.5" in capsys.readouterr().out


def test_counts_are_read_as_people_type_them(capsys: pytest.CaptureFixture[str]) -> None:
    """A thousands mark in a count is no mistake."""
    assert command.main(["answer", "1,204", "8 796", "1'000", "9000", "--json"]) == 0
    assert json.loads(capsys.readouterr().out) == answer(1204, 8796, 1000, 9000)


@pytest.mark.parametrize(
    ("options", "given"),
    [
        (
            ["--baseline", "12% (9 to 15)", "--effect", "odds_ratio"],
            {"baseline": "12% (9 to 15)", "effect": "odds_ratio"},
        ),
        (["--low", "5%", "--baseline", "12%", "--high", "20%"], {"low": "5%", "baseline": "12%", "high": "20%"}),
        (["--rate", "1% per year", "--span", "2 years"], {"rate": "1% per year", "span": "2 years"}),
        (["--overall", "12%", "--exposed", "30%"], {"overall": "12%", "exposed": "30%"}),
        (["--span", "1 year", "--other-span", "5 years"], {"span": "1 year", "other_span": "5 years"}),
        (
            ["--adjusted", "OR 0.4 (0.3 to 0.6)", "--design", "cohort"],
            {"adjusted": "OR 0.4 (0.3 to 0.6)", "design": "cohort"},
        ),
        (["--margin", "-2%"], {"margin": "-2%"}),
    ],
)
def test_all_that_is_asked_for_a_patient(
    options: list[str], given: dict[str, Any], capsys: pytest.CaptureFixture[str]
) -> None:
    """Each option is the function's argument of that name."""
    assert command.main(["answer", *TRIAL, *options, "--json"]) == 0
    assert json.loads(capsys.readouterr().out) == answer(*map(int, TRIAL), **given)
    assert command.main(["answer", *TRIAL, *options]) == 0
    assert capsys.readouterr().out


@pytest.mark.parametrize("name", WISHES)
def test_every_option_of_a_patient_is_told(name: str) -> None:
    """The help names it, and so does the function that takes it."""
    assert re.search(rf"--{name.replace('_', '-')}\b", HELP)
    assert re.search(rf"^    ([a-z_]+, )*{name}(, [a-z_]+)* :", str(answer.__doc__), re.MULTILINE)


def test_why_nobody_is_carried_is_said(capsys: pytest.CaptureFixture[str]) -> None:
    """A rate without a time span gives no risk, and the text says what is missing."""
    assert command.main(["answer", *TRIAL, "--rate", "1% per year"]) == 0
    assert "time span" in " ".join(capsys.readouterr().out.split())


def test_a_record_is_answered_outcome_by_outcome(tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    """The text and the dictionary of each outcome of a file."""
    encoded = encode(worked_example())
    assert isinstance(encoded, bytes)
    path = tmp_path / "lights.fourcount"
    path.write_bytes(encoded)
    assert command.main(["answer", str(path), "--json"]) == 0
    assert json.loads(capsys.readouterr().out) == file_json(worked_example())
    assert command.main(["answer", str(path)]) == 0
    assert capsys.readouterr().out == file_listing(worked_example())


MISTAKES = [
    ["answer"],
    ["answer", "1", "2", "3"],
    ["answer", "1", "2", "3", "4", "5"],
    ["answer", "-3", "2", "3", "4"],
    ["answer", "1", "2", "3", "-4"],
    ["answer", "1", "2", "3", "-4x"],
    ["answer", "1", "2", "3", "-1,204"],
    ["answer", "1", "2", "3", "\u22124"],
    ["answer", "1", "2", "3", "4.5"],
    ["answer", "1", "2", "3", "x"],
    ["answer", "1", "2", "3", ""],
    ["answer", "1", "2", "3", "4\ud800"],
    ["answer", "1", "2", "3", "9" * 5000],
    ["answer", "1", "2", "3", "1000000001"],
    ["answer", "1", "2", "3", "3/4"],
    ["answer", "1", "2", "3", "3 (4%)"],
    ["answer", *TRIAL, "--design", "crossover"],
    ["answer", *TRIAL, "--printed"],
    ["answer", *TRIAL, "--design"],
    ["answer", *TRIAL, "--intervals", "wald"],
    ["answer", *TRIAL, "--level", "120"],
    ["answer", *TRIAL, "--level", "-95"],
    ["answer", *TRIAL, "--level", "high"],
    ["answer", *TRIAL, "--level="],
    ["answer", *TRIAL, "--level"],
    ["answer", *TRIAL, "--baseline", "0.12"],
    ["answer", *TRIAL, "--baseline", "-3%"],
    ["answer", *TRIAL, "--baseline", ""],
    ["answer", *TRIAL, "--json=yes"],
    ["answer", *TRIAL, "--jso"],
    ["answer", *TRIAL, "--bogus"],
    ["answer", *TRIAL, "-x"],
    ["answer", "paper.fourcount"],
    ["answer", "paper.fourcount", "--level", "90"],
    ["answer", ""],
    ["answer", "38"],
    ["answer", *TRIAL, "--baseline", "120%"],
    ["answer", *TRIAL, "--low", "20%", "--baseline", "12%"],
    ["answer", *TRIAL, "--rate", "x"],
    ["answer", *TRIAL, "--overall", "12%"],
    ["answer", *TRIAL, "--other-span", "some time"],
    ["answer", *TRIAL, "--effect", "hr"],
    ["answer", *TRIAL, "--margin", "1.25"],
    ["answer", *TRIAL, "--margin", "RR 1.25", "--matters", "RD 5%"],
    ["handout", "paper.fourcount"],
    ["--bogus"],
    ["answer\nanswer"],
    [""],
]


@pytest.mark.parametrize("words", MISTAKES, ids=lambda words: ascii(" ".join(words))[:50])
def test_a_mistake_is_answered_with_one_sentence(words: list[str], capsys: pytest.CaptureFixture[str]) -> None:
    """Exit status 2, one line on stderr that ends like a sentence, nothing on stdout."""
    assert command.main(words) == 2
    said = capsys.readouterr()
    assert said.out == ""
    assert said.err.startswith("fourcount: ")
    assert said.err.endswith(".\n")
    assert said.err.count("\n") == 1
    assert len(said.err) < 200


@pytest.mark.parametrize("words", [["--help"], ["-h"], ["answer", "--help"], ["answer", *TRIAL, "-h"]])
def test_help_is_given(words: list[str], capsys: pytest.CaptureFixture[str]) -> None:
    """Help names every option and goes to stdout."""
    assert command.main(words) == 0
    said = capsys.readouterr().out
    for option in ("design", "level", "intervals", "baseline", "welcome", "printed", "json", "version", "help"):
        assert f"--{option}" in said
    assert all(len(line) <= 80 for line in said.splitlines())


@pytest.mark.parametrize("words", [["--version"], ["answer", "--version"]])
def test_the_version_is_given(words: list[str], capsys: pytest.CaptureFixture[str]) -> None:
    """The version is the package's."""
    assert command.main(words) == 0
    assert capsys.readouterr().out == f"fourcount {__version__}\n"


def test_no_words_open_the_window(monkeypatch: pytest.MonkeyPatch) -> None:
    """Without words the window runs, and its exit status is the command's."""

    class Application:
        @staticmethod
        def run(path: str) -> int:
            return 7 if path == "" else 8

    monkeypatch.setitem(sys.modules, "fourcount.face.application", Application)  # type: ignore[arg-type]
    monkeypatch.setenv("QT_QPA_PLATFORM", "offscreen")
    assert command.main([]) == 7


@pytest.mark.skipif(not sys.platform.startswith("linux"), reason="other systems always have a display")
def test_without_a_display_the_window_says_so() -> None:
    """One sentence and exit status 1 instead of an abort, where no display is there."""
    bare = {
        key: value for key, value in os.environ.items() if key not in ("DISPLAY", "WAYLAND_DISPLAY", "QT_QPA_PLATFORM")
    }
    ended = run(environment=bare)
    assert ended.returncode == 1
    assert ended.stdout == ""
    assert ended.stderr.count("\n") == 1
    assert "display" in ended.stderr


def test_figures_need_no_window_and_their_text_no_numpy() -> None:
    """Neither Qt nor matplotlib is loaded for an answer, and the default text not even numpy."""
    code = (
        "import sys; from fourcount.__main__ import main; main(sys.argv[1:])\n"
        "print(sorted({'PySide6', 'matplotlib', 'numpy', 'scipy', 'argparse'} & set(sys.modules)))"
    )
    for words, expected in (([], "['argparse']"), (["--json"], "['argparse', 'numpy', 'scipy']")):
        ended = subprocess.run(
            [sys.executable, "-c", code, "answer", *TRIAL, *words],
            capture_output=True,
            text=True,
            encoding="utf-8",
            check=True,
        )
        assert ended.stdout.splitlines()[-1] == expected


def test_a_reader_who_has_gone_is_no_trouble() -> None:
    """A pipe that is closed at the other end ends the command without a word."""
    with subprocess.Popen(
        [sys.executable, "-m", "fourcount", "answer", *TRIAL, "--json"], stdout=subprocess.PIPE, stderr=subprocess.PIPE
    ) as process:
        assert process.stdout is not None
        assert process.stderr is not None
        process.stdout.close()
        assert process.stderr.read() == b""
    assert process.returncode == 1


@pytest.mark.skipif(not os.path.exists("/dev/full"), reason="needs a device that is always full")  # noqa: PTH110
def test_a_full_disk_is_said_in_one_sentence() -> None:
    """What cannot be written is one sentence and exit status 1."""
    with open("/dev/full", "w", encoding="utf-8") as full:  # noqa: PTH123
        ended = subprocess.run(
            [sys.executable, "-m", "fourcount", "answer", *TRIAL],
            stdout=full,
            stderr=subprocess.PIPE,
            text=True,
            check=False,
        )
    assert ended.returncode == 1
    assert ended.stderr.count("\n") == 1


def test_a_narrow_terminal_encoding_loses_no_figure(monkeypatch: pytest.MonkeyPatch) -> None:
    """Where the terminal cannot show a character, a question mark stands for it and the rest is there."""
    narrow = io.TextIOWrapper(io.BytesIO(), encoding="ascii")
    monkeypatch.setattr(sys, "stdout", narrow)
    assert command.main(["answer", "0", "100", "5", "95"]) == 0
    narrow.flush()
    said = narrow.buffer.getvalue().decode("ascii")  # type: ignore[attr-defined]
    assert "study?s" in said
    assert "95% interval" in said


@pytest.mark.skipif(sys.platform == "win32", reason="a shell of POSIX closes the streams")
@pytest.mark.parametrize(
    ("arguments", "status", "said"),
    [
        ("answer 1 2 3 4 >&-", 1, "There is no standard output to write to."),
        ("--help >&-", 1, "There is no standard output to write to."),
        ("answer 1 2 3 4 <&- >/dev/null", 0, ""),
        ("answer 1 2 3 x 2>&-", 2, ""),
        ("answer 1 2 3 x 2>/dev/full", 2, ""),
    ],
)
def test_closed_streams_end_in_a_status_and_no_traceback(arguments: str, status: int, said: str) -> None:
    """Whatever stream is closed or full, the status is the command's own and nothing else is said."""
    command_line = f'"{sys.executable}" -m fourcount {arguments}'
    done = subprocess.run(["/bin/sh", "-c", command_line], capture_output=True, text=True, check=False)
    assert done.returncode == status
    assert done.stdout == ""
    assert done.stderr.strip() == (f"fourcount: {said}" if said else "")
