"""What headings say together, which none of them says alone."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.record.entry.pasted.headings import Role, heading_words, role_of
from fourcount.record.entry.pasted.matrix import Head


def negated(labels: Sequence[Head]) -> bool:
    """Whether one label is the other with a "no" or "not" before it: two groups as well as two outcomes."""
    if len(labels) != 2:
        return False
    one, two = (heading_words(label.label) for label in labels)
    shorter, longer = sorted((one, two), key=len)
    return bool(shorter) and longer[1:] == shorter and longer[0] in ("no", "not", "without", "non")


def by_case(heads: Sequence[Head]) -> bool:
    """Whether cases stand beside controls: outcomes by which people were chosen, not groups."""
    said = [set(heading_words(head.label)) for head in heads]
    return any("cases" in each for each in said) and any("controls" in each for each in said)


def corner_says(corner: str) -> int:
    """1 where the corner says that rows are groups, -1 where it says that they are outcomes."""
    said = set(heading_words(corner))
    groups = said & {"arm", "group", "groups", "treatment", "exposure", "intervention", "drug", "strategy", "ward"}
    outcomes = said & {"outcome", "outcomes", "characteristic", "event", "events", "variable", "endpoint", "end-point"}
    return 1 if groups else -1 if outcomes else 0


def roles_of(heads: Sequence[Head]) -> list[Role]:
    """The roles of all headings; "controls" are those without the event only where "cases" stand beside them.

    "n" is the part and "N" the whole where both stand side by side.
    """
    said = [set(heading_words(head.label)) for head in heads]
    roles = [role_of(head.label) for head in heads]
    if any("cases" in each for each in said):
        roles = ["others" if "controls" in each else role for each, role in zip(said, roles, strict=True)]
    letters = [head.label.strip(" ,.").rpartition(" ")[2] for head in heads]
    if {"n", "N"} <= set(letters):
        parts: dict[str, Role] = {"n": "events", "N": "total"}
        roles = [parts.get(letter, role) for letter, role in zip(letters, roles, strict=True)]
    lone = [letter == "n" and head.label.strip() == "n" for letter, head in zip(letters, heads, strict=True)]
    if sum(lone) == 1 and any(role == "total" and not alone for role, alone in zip(roles, lone, strict=True)):
        roles = ["events" if alone else role for role, alone in zip(roles, lone, strict=True)]
    return roles
