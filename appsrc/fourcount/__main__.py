"""The command: a window, or the figures of one table in a terminal.

What is typed wrongly is answered with one sentence on stderr and exit status 2. Nothing here loads Qt but the window.
"""

from __future__ import annotations

import os
import re
import sys
from collections.abc import Mapping, Sequence
from typing import TYPE_CHECKING, NoReturn, TextIO

from fourcount import __version__
from fourcount.wording import command as words

if TYPE_CHECKING:
    from argparse import Namespace

    from fourcount.publish.answer import Question

COUNTS_NEEDED = 4
GOOD, FAILED, MISTYPED = 0, 1, 2
_MINUS_NUMBER = re.compile(r"-[0-9.,]")


class MistypedError(Exception):
    """The command line asks for something that there is not; its text is one plain sentence."""


def main(arguments: Sequence[str] | None = None) -> int:
    """Run the command and return its exit status."""
    given = sys.argv[1:] if arguments is None else list(arguments)
    try:
        return _run(given)
    except MistypedError as mistake:
        _complain(str(mistake))
        return MISTYPED


def _run(given: list[str]) -> int:
    if not given:
        return _open_window()
    if given[0] == "answer":
        return _answer(given[1:])
    if given[0] == "handout":
        from fourcount.face.handout_command import run

        return run(given[1:])
    if given[0] in ("--help", "-h", "--version") and len(given) > 1:
        raise MistypedError(words.TOO_MANY.format(option=given[0]))
    if given[0] in ("--help", "-h"):
        return _say(words.HELP)
    if given[0] == "--version":
        return _say(f"fourcount {__version__}\n")
    if _is_a_file(given[0]):
        if len(given) > 1:
            raise MistypedError(words.ONE_RECORD)
        return _open_window(given[0])
    kind = "option" if given[0].startswith("-") else "command"
    raise MistypedError(words.UNKNOWN.format(kind=kind, text=_quoted(given[0])))


def _answer(given: list[str]) -> int:
    wanted, unknown = _parsed(given)
    if wanted.help:
        return _say(words.HELP)
    if wanted.version:
        return _say(f"fourcount {__version__}\n")
    if unknown:
        raise MistypedError(words.UNKNOWN.format(kind="option", text=_quoted(unknown[0])))
    if len(wanted.counts) == 1 and not wanted.counts[0].strip().isdigit():
        return _answer_file(wanted, given)
    question = _question(wanted)
    from fourcount.appraisal.appraise import appraise
    from fourcount.record.outcome import PAIRED_DESIGNS

    outcome, choices = question.outcome, question.choices
    if wanted.json:
        import json

        from fourcount.publish.answer import checked
        from fourcount.publish.contract import contract

        published = {**contract(outcome, choices, appraise(outcome, choices)), **checked(question)}
        return _say(json.dumps(published, indent=2, allow_nan=False) + "\n")
    from fourcount.publish.listing import listing

    # Of unpaired counts only exact figures and what stands under the fold need numpy, and the text shows no fold.
    light = choices.family != "exact" and outcome.design not in PAIRED_DESIGNS
    findings = appraise(outcome, choices, deferring=light)
    return _say(_printed(question) + listing(outcome, findings, choices))


def _answer_file(wanted: Namespace, given: list[str]) -> int:
    """The same of every outcome of a record, which has its own design, choices and patient."""
    option = next((word for word in given if word.startswith("-") and word != "--json"), None)
    if option is not None:
        raise MistypedError(words.ONLY_JSON.format(option=_quoted(option)))
    from fourcount.publish.files import read_file

    record = read_file(wanted.counts[0])
    if isinstance(record, str):
        raise MistypedError(record)
    from fourcount.publish.answer_file import file_json, file_listing

    if wanted.json:
        import json

        return _say(json.dumps(file_json(record), indent=2, allow_nan=False) + "\n")
    return _say(file_listing(record))


def _printed(question: Question) -> str:
    """What is said of the printed text, if there is any."""
    if not question.printed_text:
        return ""
    from fourcount.appraisal.check import check
    from fourcount.publish.printed import printed_listing

    return printed_listing(check(question.outcome, question.choices))


def _question(wanted: Namespace) -> Question:
    """The counts and options as read; MistypedError with the sentence of whatever cannot be."""
    from fourcount.publish.answer import asked
    from fourcount.publish.asked_patient import WISHES

    if len(wanted.counts) != COUNTS_NEEDED:
        raise MistypedError(words.FOUR_COUNTS.format(number=len(wanted.counts)))
    try:
        return asked(
            tuple(_count(text) for text in wanted.counts),
            design=wanted.design,
            level=_level(wanted.level),
            intervals=wanted.intervals,
            unwelcome=not wanted.welcome,
            printed=wanted.printed,
            **{name: getattr(wanted, name) for name in WISHES},
        )
    except ValueError as mistake:
        raise MistypedError(str(mistake)) from None


def _count(text: str) -> int:
    """One plain count; a total or a percentage beside it has no place here, since four counts say it all."""
    from fourcount.record.entry.cell import read_cell
    from fourcount.record.entry.digits import specimen
    from fourcount.record.entry.readings import Blank, Unreadable
    from fourcount.wording.gaps import mark_text

    reading = read_cell(text)
    if isinstance(reading, Blank):
        raise ValueError(words.NO_COUNT)
    if isinstance(reading, Unreadable):
        raise ValueError(f"{mark_text(reading)}.")
    if reading.total is not None or reading.percent_text is not None:
        raise ValueError(words.ONLY_THE_COUNT.format(text=specimen(text), value=reading.value))
    return reading.value


def _level(text: str) -> float:
    from fourcount.record.entry.level import read_level
    from fourcount.record.entry.readings import Blank, Unreadable
    from fourcount.wording.gaps import mark_text

    reading = read_level(text)
    if isinstance(reading, Blank):
        raise ValueError(words.NO_LEVEL)
    if isinstance(reading, Unreadable):
        raise ValueError(f"{mark_text(reading)}.")
    return reading.value


def _parsed(given: list[str]) -> tuple[Namespace, list[str]]:
    """The words behind ``answer`` sorted into counts, options and words that are neither.

    Only the grammar is looked at here: what a value may be is said by our own sentences.
    """
    from argparse import ArgumentParser  # the window starts without it

    from fourcount.publish.asked_patient import WISHES

    class Parser(ArgumentParser):
        """A parser whose complaints are exceptions, so that one place says them."""

        def error(self, message: str) -> NoReturn:
            option = re.match(r"argument (\S+): expected one argument", message)
            said = words.NO_VALUE.format(option=option[1]) if option else words.NO_FIT.format(message=message)
            raise MistypedError(said)

    parser = Parser(prog="fourcount answer", add_help=False, allow_abbrev=False)
    parser.add_argument("counts", nargs="*")
    parser.add_argument("--design", default="trial")
    parser.add_argument("--level", default="95")
    parser.add_argument("--intervals", default="score")
    for option in ("printed", *WISHES):
        parser.add_argument(f"--{option.replace('_', '-')}")
    for switch in ("--welcome", "--json", "--version"):
        parser.add_argument(switch, action="store_true")
    parser.add_argument("--help", "-h", action="store_true")
    # Behind a blank a negative number is no option, and our own sentence can say what is wrong with it.
    return parser.parse_known_intermixed_args([f" {word}" if _MINUS_NUMBER.match(word) else word for word in given])


def _is_a_file(word: str) -> bool:
    """Whether a word that is no command names a file: it is there, or it looks like one."""
    if word.startswith("-"):
        return False
    return word.lower().endswith(".fourcount") or any(sign in word for sign in "/\\") or os.path.exists(word)  # noqa: PTH110 -- never raises


def _open_window(path: str = "") -> int:
    if sys.platform.startswith("linux") and not _display_in(os.environ):
        _complain(words.NO_DISPLAY)
        return FAILED
    import fourcount.face.running_start  # noqa: F401 - before Qt is loaded
    from fourcount.face.application import run

    return int(run(path))


def _display_in(environment: Mapping[str, str]) -> bool:
    """Whether there is anything to open a window on. Without it Qt would blame a library and abort."""
    return any(environment.get(name) for name in ("DISPLAY", "WAYLAND_DISPLAY", "QT_QPA_PLATFORM"))


def _say(text: str) -> int:
    """Write to stdout at once, so that what stops it is noticed here and not while Python ends."""
    if sys.stdout is None:  # closed by whoever started the command
        _complain(words.NO_STREAM)
        return FAILED
    if "utf" not in (sys.stdout.encoding or "utf").lower() and hasattr(sys.stdout, "reconfigure"):
        sys.stdout.reconfigure(errors="replace")
    try:
        sys.stdout.write(text)
        sys.stdout.flush()
    except BrokenPipeError:  # whoever read this has had enough
        _let_go_of(sys.stdout)
        return FAILED
    except OSError as trouble:
        _let_go_of(sys.stdout)
        _complain(words.NOT_WRITTEN.format(reason=trouble.strerror or trouble))
        return FAILED
    return GOOD


def _complain(sentence: str) -> None:
    """Write one sentence to stderr, if there is one; the exit status says the same."""
    if sys.stderr is None:
        return
    try:
        sys.stderr.write(f"fourcount: {sentence}\n")
        sys.stderr.flush()
    except OSError:
        _let_go_of(sys.stderr)


def _let_go_of(stream: TextIO) -> None:
    """Point a broken pipe to nowhere; Python would complain about it on its way out."""
    nowhere = os.open(os.devnull, os.O_WRONLY)
    os.dup2(nowhere, stream.fileno())
    os.close(nowhere)


def _quoted(text: str) -> str:
    from fourcount.record.entry.digits import specimen

    return f"'{specimen(text)}'"


if __name__ == "__main__":
    sys.exit(main())
