"""A two-by-two block whose rows and columns are the same question asked twice: counts of pairs."""

from __future__ import annotations

import re

from fourcount.record.entry.pasted.headings import heading_words, sign_of
from fourcount.record.entry.pasted.matrix import Matrix
from fourcount.record.entry.readings import Pasted, PastedGroup

_SAYS_PAIRS = frozenset(("pair", "pairs", "matched", "mcnemar", "discordant", "concordant", "paired"))
_TWICE = (
    ("before", "after"),
    ("case", "control"),
    ("cases", "controls"),
    ("first", "second"),
    ("baseline", "follow-up"),
)


def pair_table(matrix: Matrix, text: str) -> Pasted | None:
    """The four counts of pairs, the first side down; None where rows and columns are of different things."""
    if len(matrix.rows) != 2 or len(matrix.heads) != 2 or not all(cell.count for row in matrix.rows for cell in row):
        return None
    down, across = ([head.label for head in heads] for heads in (matrix.labels, matrix.heads))
    if {sign_of(label) for label in down} != {1, -1} or {sign_of(label) for label in across} != {1, -1}:
        return None
    said = set(heading_words(text))
    same = [sorted(heading_words(label)) for label in down] in (
        [sorted(heading_words(label)) for label in across],
        [sorted(heading_words(label)) for label in across[::-1]],
    )
    twice = any({one, two} <= _all(down) | _all(across) and not {one, two} <= _all(down) for one, two in _TWICE)
    same = same or bool(_all(down) and {word for word in _all(down) if len(word) > 1} & _all(across))
    if not (same or twice or _SAYS_PAIRS & said):
        return None
    rows = matrix.rows if sign_of(down[0]) == 1 else matrix.rows[::-1]
    cells = [row if sign_of(across[0]) == 1 else row[::-1] for row in rows]
    texts = [[cell.count.text if cell.count else "" for cell in row] for row in cells]
    surely = _SAYS_PAIRS & said or any(one in said and two in said for one, two in _TWICE)
    groups = tuple(
        PastedGroup(left_text=left, right_text=right, label=_side(labels))
        for (left, right), labels in zip(texts, (down, across), strict=True)
    )
    return Pasted(form="pairs", groups=groups, ambiguous=() if surely else ("pairs-or-groups",))


def _all(labels: list[str]) -> set[str]:
    """The words that stand in both labels."""
    return set(heading_words(labels[0])) & set(heading_words(labels[1]))


def _side(labels: list[str]) -> str:
    """What both labels of one side share ("before" in "Yes before", "No before")."""
    shared = _all(labels)
    return " ".join(word for word in re.findall(r"[\w'-]+", labels[0]) if word.casefold() in shared)
