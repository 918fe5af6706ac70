"""A name of an event as a sentence can say it of people: "falls" as "had falls", "Falls, %" without its unit.

Nothing here knows a language: a phrase is taken for a plural noun only where it can hardly be anything else, and all
other text stays as the reader typed it.
"""

from __future__ import annotations

import re

UNIT = re.compile(
    r"""[\s,;:]*(?:
        \(\s*(?:%|n|no\.?|number|n\s*[,;/]?\s*\(?%\)?|%\s*of\s+\w+)\s*\)   # (%), (n), (n, %)
      | [,;:]\s*(?:%|n|no\.?|number|per\s?cent)(?:\s*\(\s*%\s*\))?           # , %   , n (%)   , no. (%)
      | (?<!\d)(?<!\d\s)%
    )\s*$""",
    re.VERBOSE | re.IGNORECASE,
)
OF_WHOM = r"\b(?:of|in|at|with|on|from|after|before|within|during|by|per|or|and|to|needing|requiring)\b"
NO_PLURAL = re.compile(r"(?:ss|us|is|as|os)$")
LIKE_THIS = re.compile(r"(?:ous|ss)$")
VERBS = {
    "became", "bled", "broke", "came", "caught", "did", "died", "fell", "felt", "gave", "gained", "got", "grew",
    "had", "has", "have", "healed", "is", "kept", "lay", "left", "lost", "made", "met", "needs", "needed", "not",
    "quit", "ran", "reached", "sat", "saw", "slept", "smoked", "stood", "stopped", "survived", "took", "was", "went",
    "were", "woke", "won", "wore",
}  # fmt: skip
DIED = {"death": "died", "deaths": "died", "mortality": "died"}


def without_unit(text: str) -> str:
    """The name without the unit in which a table's row counts it: "Falls, n (%)" is "Falls"."""
    bare = UNIT.sub("", text).rstrip(" ,;:")
    return bare or text


def of_people(text: str) -> str:
    """The phrase with a verb where it has none: "had falls", "died"; "" where it is not known for a noun."""
    name = without_unit(text)
    if name.lower() in DIED:
        return DIED[name.lower()]
    return f"had {lowered(name)}" if is_plural_noun(name) else ""


def lacked_by(text: str) -> str:
    """The lack of it: "had no falls", "did not die"; "" where it is not known for a noun."""
    name = without_unit(text)
    if name.lower() in DIED:
        return "did not die"
    return f"had no {lowered(name)}" if is_plural_noun(name) else ""


def lowered(text: str) -> str:
    """A phrase inside a sentence: its first letter small where it is the word's only capital."""
    first = text.split(" ", 1)[0]
    return text[:1].lower() + text[1:] if first[1:].islower() else text


def is_plural_noun(text: str) -> bool:
    """Whether a phrase is a plural noun, with or without adjectives: "hip fractures", "falls at night"."""
    words = re.split(OF_WHOM, text.lower(), maxsplit=1)[0].split()
    if not words or any(word in VERBS or word.endswith("ed") or not word[:1].isalpha() for word in words):
        return False
    *before, head = words
    if any(word.endswith("s") and not LIKE_THIS.search(word) for word in before):
        return False
    return head.isalpha() and len(head) > 3 and head.endswith("s") and not NO_PLURAL.search(head)
