"""What a window says of a file that it saves, whatever is in it."""

from __future__ import annotations

from typing import NamedTuple

SAVE, CLOSE = "Save as…", "Close"
KINDS = {".png": "Picture (*.png)", ".svg": "Drawing (*.svg)", ".pdf": "PDF (*.pdf)"}


class FileLabels(NamedTuple):
    """The title of the dialog, what is said afterwards, and the kinds of file by their suffix, the usual one first."""

    title: str
    saved: str
    not_saved: str
    unknown_suffix: str
    filters: dict[str, str]


def file_labels(what: str, *suffixes: str) -> FileLabels:
    """The words for "the curve" or "the page"; ``name``, ``folder`` and ``reason`` are left to fill in."""
    subject, (*others, last) = f"{what[:1].upper()}{what[1:]}", suffixes
    return FileLabels(
        title=f"Save {what}",
        saved=f"{subject} is saved as {{name}}.",
        not_saved=f"{subject} could not be saved in {{folder}}: {{reason}}.",
        unknown_suffix=f"{subject} can be saved as {', '.join(others)} or {last}; {{name}} ends in none of these.",
        filters={suffix: KINDS[suffix] for suffix in suffixes},
    )
