"""Vocabulary written as running text."""

from __future__ import annotations


def words(text: str) -> tuple[str, ...]:
    """The words of a text, in order."""
    return tuple(text.split())


EVENT_NOUNS = frozenset(
    words(
        "death deaths event events infection infections fall falls case cases stroke strokes relapse relapses "
        "recurrence recurrences fracture fractures complication complications bleed bleeds bleeding failure failures "
        "reaction reactions"
    )
)
"""Nouns that, right behind a number, say that it counts events."""
