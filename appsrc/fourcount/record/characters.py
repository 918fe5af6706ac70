"""Characters that no record holds, since they would hide in a text or turn its neighbours round."""

from __future__ import annotations

import re

UNHELD = re.compile("[\x00-\x08\x0b\x0c\x0e-\x1f\x7f-\x9f\u202a-\u202e\u2066-\u2069\ud800-\udfff]")
"""Control characters but tab and line breaks, marks that override the direction of text, and halves of characters.

The marks that lean a text one way without overriding it (as Arabic and Hebrew need them) are held.
"""

_BREAKS = dict.fromkeys(map(ord, "\x0b\x0c\x1c\x1d\x1e\x1f\x85"), " ")


def storable(text: str) -> str:
    """The text as a record can hold it: a page break as a space, what cannot be held as U+FFFD, all else as it is."""
    if text.isascii() and text.isprintable():
        return text
    whole = text.encode("utf-16-le", "surrogatepass").decode("utf-16-le", "replace")
    return UNHELD.sub("\ufffd", whole.translate(_BREAKS))
