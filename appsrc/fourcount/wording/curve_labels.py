"""What the window of the curve says."""

from __future__ import annotations

WINDOW_TITLE = "Across starting risks"
VIEW_NAME = "What is drawn"
WHOLE = "Show all, 0 to 100%"
NEAR = "Show near these risks"
SHOW_NUMBERS = "Show the numbers"
HIDE_NUMBERS = "Hide the numbers"
TABLE_NAME = "The same numbers as a table"
DRAWING = "Drawing…"
SAVE, COPY, CLOSE = "Save as…", "Copy", "Close"
COPY_NAME = "Copy the curve"
COPIED = "The curve is copied, with what has to be kept in mind."
SAVE_TITLE = "Save the curve"
SAVED = "The curve is saved as {name}."
NOT_SAVED = "The curve could not be saved in {folder}: {reason}."
UNKNOWN_SUFFIX = "The curve can be saved as .png, .svg or .pdf; {name} ends in none of these."
FILTERS = {".png": "Picture (*.png)", ".svg": "Drawing (*.svg)", ".pdf": "PDF (*.pdf)"}
FILE_NAME = "curve"
