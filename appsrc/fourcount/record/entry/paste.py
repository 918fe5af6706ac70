"""A pasted block or sentence as a table, whichever it is."""

from __future__ import annotations

from fourcount.record.entry.readings import Pasted
from fourcount.record.entry.sentence import read_sentence


def read_paste(text: str) -> Pasted | None:
    return read_sentence(text)
