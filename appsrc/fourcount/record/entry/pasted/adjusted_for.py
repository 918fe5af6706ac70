"""What a sentence says its effect was adjusted for: ``age, sex and centre``."""

from __future__ import annotations

import re

_TOLD = re.compile(r"\b(?:adjust(?:ed|ment|ing)|controll(?:ed|ing)) for ([^.;:()\[\]]{1,200})", re.IGNORECASE)
_ENDS = re.compile(
    r"\b(?:the|was|were|is|are|has|had|there|we|with|in|at|among|showed|gave|did|remained|a|an)\b", re.IGNORECASE
)
_LAST = re.compile(r"\b(?:and|or) ", re.IGNORECASE)
_LONGEST_ITEM = 5  # words; longer is no item of a list but the sentence going on


def adjusted_for(text: str) -> str:
    """The list behind "adjusted for", up to where the sentence goes on; "" where there is none."""
    found = _TOLD.search(text)
    if found is None:
        return ""
    items: list[str] = []
    for piece in found[1].split(","):
        item = _ENDS.split(piece, maxsplit=1)[0].strip()
        if not item or len(item.split()) > _LONGEST_ITEM or any(character.isdigit() for character in item):
            break
        items.append(item)
        if _LAST.search(item) or item != piece.strip():
            break
    return ", ".join(items)
