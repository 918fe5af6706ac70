"""The words inside a picture: captions, key and note, which have to survive a screenshot."""

from __future__ import annotations

from typing import Literal, NamedTuple

KeyState = Literal["affected", "uncertain", "avoided", "added", "others"]


class Side(NamedTuple):
    """The captions of one group: its title, the count, the percentage, and the other frame."""

    title: str
    number: str
    percent: str
    other: str


class KeyEntry(NamedTuple):
    """One state of the key and what it means here."""

    state: KeyState
    text: str


class PictureWords(NamedTuple):
    """All words of a picture. ``note`` says a denominator other than 100, or that the risks are too small to draw.

    ``bar_ends`` are the ends of the scale on which the bars are drawn.
    """

    without: Side
    with_: Side
    key: tuple[KeyEntry, ...]
    note: str
    lines: tuple[str, ...]
    bar_ends: tuple[str, str] = ("", "")
