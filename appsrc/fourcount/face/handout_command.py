"""``fourcount handout FILE -o OUT``: a record's page without a window, also where there is no display."""

from __future__ import annotations

import os
import sys
from collections.abc import Sequence
from pathlib import PurePath
from typing import NamedTuple

from fourcount.record.entry.digits import specimen
from fourcount.wording import command, handout_labels

GOOD, FAILED, MISTYPED = 0, 1, 2
WITH_VALUE = {"-o": "out", "--out": "out", "--paper": "paper"}


class Wanted(NamedTuple):
    """What the command line asks for."""

    file: str
    out: str
    paper: str


def run(arguments: Sequence[str]) -> int:
    """Write the page of a record; whatever keeps it from being written is said in one sentence on stderr."""
    if any(word in ("--help", "-h") for word in arguments):
        print(command.HELP, end="")
        return GOOD
    wanted = _wanted(arguments)
    if isinstance(wanted, str):
        return _complain(wanted, MISTYPED)
    from fourcount.publish.files import read_file

    record = read_file(wanted.file)
    if isinstance(record, str):
        return _complain(record, MISTYPED)
    if PurePath(wanted.out).suffix.lower() not in handout_labels.FILTERS:
        return _complain(handout_labels.UNKNOWN_SUFFIX.format(name=specimen(wanted.out)), MISTYPED)
    if sys.platform.startswith("linux") and "PySide6.QtWidgets" not in sys.modules:
        os.environ["QT_QPA_PLATFORM"] = "offscreen"  # elsewhere there is a display, and offscreen there are no fonts
    from fourcount.face.application import make_application
    from fourcount.face.handout_pages import candidates, page_of
    from fourcount.face.page_file import write_page
    from fourcount.ink.handout import NoPage

    application = make_application(["fourcount"])
    found = candidates(record)
    unready = [one for one in found if one.outcome.on_handout and one.why]
    if unready:
        name, why = specimen(unready[0].name), unready[0].why
        return _complain(handout_labels.CANNOT_SHOW.format(name=name, why=why), MISTYPED)
    page = page_of(record, found, wanted.paper)
    if isinstance(page, NoPage):
        return _complain(page.sentence, MISTYPED)
    sentence = write_page(page, wanted.out)
    del application
    return _complain(sentence, FAILED) if sentence else GOOD


def _wanted(arguments: Sequence[str]) -> Wanted | str:
    """The command line as read, or what is wrong with it."""
    values = {"out": "", "paper": "a4"}
    files: list[str] = []
    words = iter(arguments)
    for word in words:
        option, _, value = word.partition("=")
        if option in WITH_VALUE:
            given = value or next(words, "")
            if not given:
                return handout_labels.NO_VALUE.format(option=option)
            values[WITH_VALUE[option]] = given
        elif word.startswith("-") and word != "-":
            return handout_labels.UNKNOWN_OPTION.format(text=f"'{specimen(word)}'")
        else:
            files.append(word)
    if not files:
        return handout_labels.NO_FILE
    if len(files) > 1:
        return handout_labels.ONE_FILE.format(number=len(files))
    if not values["out"]:
        return handout_labels.NO_OUT
    paper = values["paper"].lower()
    if paper not in handout_labels.PAPERS:
        return handout_labels.UNKNOWN_PAPER.format(text=f"'{specimen(values['paper'])}'")
    return Wanted(files[0], values["out"], paper)


def _complain(sentence: str, status: int) -> int:
    """One sentence on stderr, if there is one to write to."""
    if sys.stderr is not None:
        print(f"fourcount: {sentence}", file=sys.stderr)
    return status
