"""What the handout's window and its command say."""

from __future__ import annotations

from fourcount.wording.command import NO_VALUE
from fourcount.wording.file_labels import CLOSE, SAVE, file_labels

__all__ = [
    "CANNOT_SHOW", "CLOSE", "FILTERS", "NOT_PRINTED", "NOT_READY", "NOT_SAVED", "NO_FILE", "NO_OUT", "NO_ROOM",
    "NO_VALUE", "ONE_FILE", "OUTCOMES_NAME", "PAPERS", "PAPER_NAME", "PAPER_PREFIX", "PREVIEW_NAME", "PRINT", "PRINTED",
    "SAVE", "SAVED", "SAVE_TITLE", "SHOW_RANGE", "UNKNOWN_OPTION", "UNKNOWN_PAPER", "UNKNOWN_SUFFIX", "UNNAMED",
    "WINDOW_TITLE",
]  # fmt: skip

WINDOW_TITLE = "Handout"
PAPERS = {"a4": "A4", "letter": "Letter"}
PAPER_NAME = "Paper"
PAPER_PREFIX = "Paper: "
OUTCOMES_NAME = "On the page"
PREVIEW_NAME = "The page as it will be printed"
NOT_READY = "{name}: {why}"
UNNAMED = "Outcome {number}"
PRINT = "Print…"
SAVE_TITLE, SAVED, NOT_SAVED, UNKNOWN_SUFFIX, FILTERS = file_labels("the page", ".pdf", ".png", ".svg")
NO_ROOM = "the disk may be full"
SHOW_RANGE = "Show the range"
PRINTED = "The page is on its way to the printer."
NOT_PRINTED = "The printer did not take the page."

NO_FILE = "A file is needed after 'handout': fourcount handout FILE -o OUT."
NO_OUT = "Say where the page goes with -o, such as -o page.pdf."
ONE_FILE = "One file at a time, not {number}."
UNKNOWN_OPTION = "There is no option {text}: try 'fourcount --help'."
UNKNOWN_PAPER = "The paper must be a4 or letter, not {text}."
CANNOT_SHOW = "“{name}” cannot be on the page yet. {why}"
