"""Writing made plain: digits of any script, and spaces, apostrophes and dashes as they come out of a PDF.

Everything that reads a number goes through ``plain`` first, so that one place knows what looks alike.
"""

from __future__ import annotations

import re
from fractions import Fraction

LONGEST = 400
"""Longer text is no number. It also keeps every later step short, whatever was pasted."""

LONGEST_SPECIMEN = 40

_SPACES = "\u0020\u00a0\u1680\u2000\u2001\u2002\u2003\u2004\u2005\u2006\u2007\u2008\u2009\u200a\u202f\u205f\u3000"
_BREAKS = "\t\n\v\f\r\x1c\x1d\x1e\x1f\x85\u2028\u2029"
# Without width, and left behind by a paste. Only taken off the ends: inside, some of them turn digits round on screen.
_UNSEEN = "\u061c\u200b\u200e\u200f\u2060\ufeff"
_EDGES = _SPACES + _BREAKS + _UNSEEN

_LOOKALIKES = {
    " ": _SPACES,
    "'": "\u2018\u2019\u02bc\uff07",
    "-": "\u2010\u2011\u2012\u2013\u2014\u2015\u2212\ufe58\ufe63\uff0d",
    "/": "\u2044\u2215\uff0f",
    ",": "\u060c\u066c\ufe50\uff0c",
    ".": "\u066b\ufe52\uff0e",
    "%": "\u066a\ufe6a\uff05",
    "(": "\uff08",
    ")": "\uff09",
    "<": "\uff1c",
}
_PLAINER = str.maketrans({seen: ascii_ for ascii_, alike in _LOOKALIKES.items() for seen in alike})

_UNGROUPED = re.compile(r"[0-9]+")
_GROUPED = re.compile(r"[1-9][0-9]{0,2}([ ,'])[0-9]{3}(?:\1[0-9]{3})*")
_DECIMAL = re.compile(r"[0-9]+(?:[.,\u00b7][0-9]+)?")


def plain(text: str) -> str:
    """The text without surrounding blanks, in ASCII where a character has an ASCII twin.

    Digits of one script become 0-9; where digits of two scripts stand together all stay as they are, and nothing
    reads them, since some look like other digits. The result is cut at one character above ``LONGEST``.
    """
    return alike_in_ascii(text.strip(_EDGES)[: LONGEST + 1])


def alike_in_ascii(text: str) -> str:
    """The text, character for character, in ASCII where a character has an ASCII twin."""
    if text.isascii():
        return text
    twins = text.translate(_PLAINER)
    scripts = {ord(character) - int(character) for character in twins if character.isdecimal()}
    if len(scripts) != 1:
        return twins
    return "".join(str(int(character)) if character.isdecimal() else character for character in twins)


def specimen(text: str) -> str:
    """What was typed, on one line and at most 40 characters long, to be quoted in a sentence about it."""
    line = " ".join(text.strip(_EDGES)[: LONGEST + 1].split())
    shown = "".join(character if character.isprintable() else "\ufffd" for character in line)
    return shown if len(shown) <= LONGEST_SPECIMEN else shown[: LONGEST_SPECIMEN - 1] + "\u2026"


def whole_number(text: str) -> int | None:
    """A whole number in plain text, with thousands marks of one kind (comma, space, apostrophe) or without."""
    if len(text) > LONGEST or not (_UNGROUPED.fullmatch(text) or _GROUPED.fullmatch(text)):
        return None
    return int(re.sub("[ ,']", "", text))


def decimal_number(text: str) -> Fraction | None:
    """A number with decimals after a point, a comma or a middle dot, exactly. For fields where a percentage stands."""
    if len(text) > LONGEST or not _DECIMAL.fullmatch(text):
        return None
    return Fraction(re.sub("[,\u00b7]", ".", text))
