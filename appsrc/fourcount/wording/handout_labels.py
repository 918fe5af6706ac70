"""What the handout's window and its command say."""

from __future__ import annotations

WINDOW_TITLE = "Handout"
PAPERS = {"a4": "A4", "letter": "Letter"}
PAPER_NAME = "Paper"
PAPER_PREFIX = "Paper: "
OUTCOMES_NAME = "On the page"
PREVIEW_NAME = "The page as it will be printed"
NOT_READY = "{name}: {why}"
UNNAMED = "Outcome {number}"
SAVE, PRINT, CLOSE = "Save as…", "Print…", "Close"
SAVE_TITLE = "Save the page"
SAVED = "The page is saved as {name}."
PRINTED = "The page is on its way to the printer."
NOT_PRINTED = "The printer did not take the page."
NOT_SAVED = "The page could not be saved in {folder}: {reason}."
UNKNOWN_SUFFIX = "A page can be saved as .pdf, .png or .svg; {name} ends in none of these."
FILTERS = {".pdf": "PDF (*.pdf)", ".png": "Picture (*.png)", ".svg": "Drawing (*.svg)"}

NO_FILE = "A file is needed after 'handout': fourcount handout FILE -o OUT."
NO_OUT = "Say where the page goes with -o, such as -o page.pdf."
ONE_FILE = "One file at a time, not {number}."
UNKNOWN_OPTION = "There is no option {text}: try 'fourcount --help'."
UNKNOWN_PAPER = "The paper must be a4 or letter, not {text}."
NO_VALUE = "{option} needs a value after it."
CANNOT_SHOW = "“{name}” cannot be on the page yet. {why}"
