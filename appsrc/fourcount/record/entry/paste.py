"""A pasted block or sentence as a table, whichever it is."""

from __future__ import annotations

import re

import msgspec

from fourcount.record.entry.block import read_block
from fourcount.record.entry.pasted.doubts import PASTE_DOUBTS
from fourcount.record.entry.readings import Pasted
from fourcount.record.entry.sentence import read_sentence
from fourcount.record.entry.tokens import LONGEST_TEXT, in_ascii, presentable

__all__ = ["PASTE_DOUBTS", "read_paste"]

_WORD = re.compile(r"[^\W\d_]{2,}")
_NUMBER = re.compile(r"[0-9]+(?:[.,\u00b7][0-9]+)*")
_POINT = re.compile(r"(?<![0-9])[0-9]+(?:\.[0-9]+)+")
_POINT_THOUSANDS = re.compile(r"(?<![0-9.,])[1-9][0-9]{0,2}(?:\.[0-9]{3})+(?![0-9.])")
_DECIMAL_COMMA = re.compile(r"[0-9],[0-9]+ ?%")
_BORDER = re.compile(r"\t|\||[^\s] {3,}[^\s]")


def read_paste(text: str) -> Pasted | None:
    """What a paste was understood as; None where there is no table in it.

    Prose is read as a sentence, anything else as a block first. Never raises, whatever was pasted.
    """
    if len(text) > LONGEST_TEXT:
        return None
    plain = _without_points(text)
    found = _read(plain)
    if found is None or plain == text:
        return found
    return msgspec.structs.replace(found, ambiguous=(*found.ambiguous, "point-thousands"))


def _without_points(text: str) -> str:
    """The text without points in its thousands ("1.204"), where percentages have decimal commas and no point is one."""
    shown = in_ascii(presentable(text))
    points = _POINT.findall(shown)
    if not points or not _DECIMAL_COMMA.search(shown) or len(points) != len(_POINT_THOUSANDS.findall(shown)):
        return text
    return _POINT_THOUSANDS.sub(lambda match: match[0].replace(".", ""), text)


def _read(text: str) -> Pasted | None:
    if is_prose(text):
        return read_sentence(text)
    return read_block(text) or (None if "\t" in text.strip() else read_sentence(text))


def is_prose(text: str) -> bool:
    """Whether a text is running words rather than cells: no borders, and more words than numbers, or one line."""
    shown = in_ascii(presentable(text)).strip()
    if _BORDER.search(shown):
        return False
    words, numbers = len(_WORD.findall(shown)), len(_NUMBER.findall(shown))
    if "\n" not in shown:
        return words >= 3 or ":" in shown
    lines = shown.split("\n")
    wrapped = any(line.strip()[:1].islower() or line.strip()[:1] == "(" for line in lines[1:])
    return words > 2 * numbers and words > (3 if wrapped else 6) * len(lines)
