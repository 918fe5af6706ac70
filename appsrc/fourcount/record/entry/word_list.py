"""Vocabulary written as running text."""

from __future__ import annotations


def words(text: str) -> tuple[str, ...]:
    """The words of a text, in order."""
    return tuple(text.split())
