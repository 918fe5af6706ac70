"""What the window of the curve says."""

from __future__ import annotations

from fourcount.wording.file_labels import CLOSE, SAVE, file_labels

__all__ = [
    "CLOSE", "COPIED", "COPY", "COPY_NAME", "DRAWING", "FILE_NAME", "FILTERS", "HIDE_NUMBERS", "NEAR", "NOT_SAVED",
    "NO_ROOM", "SAVE", "SAVED", "SAVE_TITLE", "SHOW_NUMBERS", "TABLE_NAME", "UNKNOWN_SUFFIX", "VIEW_NAME", "WHOLE",
    "WINDOW_TITLE",
]  # fmt: skip

WINDOW_TITLE = "Across starting risks"
VIEW_NAME = "What is drawn"
WHOLE = "Show all, 0 to 100%"
NEAR = "Show near these risks"
SHOW_NUMBERS = "Show the numbers"
HIDE_NUMBERS = "Hide the numbers"
TABLE_NAME = "The same numbers as a table"
DRAWING = "Drawing…"
COPY = "Copy"
COPY_NAME = "Copy the curve"
COPIED = "The curve is copied, with what has to be kept in mind."
SAVE_TITLE, SAVED, NOT_SAVED, UNKNOWN_SUFFIX, FILTERS = file_labels("the curve", ".png", ".svg", ".pdf")
NO_ROOM = "the disk may be full"
FILE_NAME = "curve"
