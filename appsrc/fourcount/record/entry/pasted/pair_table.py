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
    signs = _signs(down), _signs(across)
    if not all(signs):
        return None
    said = set(heading_words(text))
    same = [sorted(heading_words(label)) for label in down] in (
        [sorted(heading_words(label)) for label in across],
        [sorted(heading_words(label)) for label in across[::-1]],
    )
    twice = any({one, two} <= _all(down) | _all(across) and not {one, two} <= _all(down) for one, two in _TWICE)
    states = _states(down, across)
    same = same or states or bool(_all(down) and {word for word in _all(down) if len(word) > 1} & _all(across))
    if not (same or twice or _SAYS_PAIRS & said):
        return None
    rows = matrix.rows if signs[0] == (1, -1) else matrix.rows[::-1]
    cells = [row if signs[1] == (1, -1) else row[::-1] for row in rows]
    texts = [[cell.count.text if cell.count else "" for cell in row] for row in cells]
    plain = all({sign_of(label) for label in labels} == {1, -1} for labels in (down, across))
    surely = _SAYS_PAIRS & said or (plain and any(one in said and two in said for one, two in _TWICE))
    groups = tuple(
        PastedGroup(left_text=left, right_text=right, label=_side(labels, others))
        for (left, right), labels, others in zip(texts, (down, across), (across, down), strict=True)
    )
    return Pasted(form="pairs", groups=groups, ambiguous=() if surely else ("pairs-or-groups",))


def _all(labels: list[str]) -> set[str]:
    """The words that stand in both labels."""
    return set(heading_words(labels[0])) & set(heading_words(labels[1]))


def _signs(labels: list[str]) -> tuple[int, int] | None:
    """Which of two labels is the yes: by its words, by the "no" in the other, or the first one."""
    signs = sign_of(labels[0]), sign_of(labels[1])
    if signs in ((1, -1), (-1, 1)):
        return signs
    words = [heading_words(label) for label in labels]
    if signs in ((0, -1), (-1, 0)) and abs(len(words[0]) - len(words[1])) == 1:
        return (1, -1) if signs[1] else (-1, 1)
    return (1, -1) if signs == (0, 0) and _all(labels) else None


def _states(down: list[str], across: list[str]) -> bool:
    """Whether both sides have a name and the same two states ("positive", "negative"), other than a yes and a no."""
    sides = []
    for labels in (down, across):
        shared = _all(labels)
        sides.append({" ".join(word for word in heading_words(label) if word not in shared) for label in labels})
        if not shared:
            return False
    return sides[0] == sides[1] and len(sides[0]) == 2 and not sides[0] & {"yes", "no", "+", "-"}


def _side(labels: list[str], others: list[str]) -> str:
    """What both labels of one side share and those of the other do not ("before" in "Yes before", "No before")."""
    shared = _all(labels)
    told = [word for word in re.findall(r"[\w'-]+", labels[0]) if word.casefold() in shared]
    if all(word.casefold() in _all(others) for word in told):
        return " ".join(told)
    states = {word for word in shared if any(word in heading_words(label) for label in others)}
    apart = {"before", "after", "first", "second", "case", "control", "cases", "controls", "baseline"}
    states = states if shared - states <= apart and not {"test", "eye"} & states else set()
    return " ".join(word for word in told if word.casefold() not in states)
