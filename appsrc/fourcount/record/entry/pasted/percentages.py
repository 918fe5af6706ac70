"""Columns of percentages whose totals stand beside them: percentages of totals, without counts."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.record.entry.pasted.headings import Role, heading_words, role_of
from fourcount.record.entry.pasted.matrix import Matrix
from fourcount.record.entry.pasted.proportions import gives
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.pasted.understood import Understood
from fourcount.record.entry.tokens import Token


def _say_percent(matrix: Matrix, column: int) -> bool:
    """Whether numbers with decimals are percentages by a sign, a heading or a label; "pH 7.38" is none."""
    signs = [percent.percent for row in matrix.rows if (percent := row[column].percent)]
    named = [role_of(head.label) == "percent" for head in (matrix.heads[column], *matrix.labels)]
    return any(signs) or any(named) or "%" in matrix.corner


def _nested(matrix: Matrix, column: int, totals: Sequence[Token | None]) -> bool:
    """Whether one row is all people and the other row a part of them ("100%" and "9.2%")."""
    for whole, part in ((0, 1), (1, 0)):
        hundred, percent = matrix.rows[whole][column].percent, matrix.rows[part][column].percent
        all_of, some = totals[whole], totals[part]
        if hundred and percent and all_of and some and hundred.value == 100 and percent.value < 100:
            return gives(percent, some.whole or 0, all_of.whole or 0)
    return False


def percentages(matrix: Matrix, roles: Sequence[Role]) -> Understood | None:
    """Percentages of totals that stand in another column or beside the labels."""
    percents = [place for place in range(len(matrix.heads)) if all(row[place].percent for row in matrix.rows)]
    if not percents:
        return None
    totals: list[Token | None] = [label.total for label in matrix.labels]
    if not _say_percent(matrix, percents[0]):
        return None
    if not all(totals):
        counts = [place for place in range(len(matrix.heads)) if all(row[place].count for row in matrix.rows)]
        totals = (
            [row[counts[0]].count for row in matrix.rows] if counts and roles[counts[0]] in ("total", "unknown") else []
        )
    if len(totals) != 2 or not all(totals) or _nested(matrix, percents[0], totals):
        return None
    pair = [
        Quantity(first=0, after=1, percent=row[percents[0]].percent, total=total)
        for row, total in zip(matrix.rows, totals, strict=True)
    ]
    heading = matrix.heads[percents[0]].label
    return Understood(
        form="percent-of-total",
        quantities=(pair[0], pair[1]),
        labels=("", ""),
        left_heading="" if set(heading_words(heading)) <= {"%", "percent", "percentage"} else heading,
        doubts=("several-rows",) if len(percents) > 1 else (),
        score=2,
    )
