"""Which column is of which: percentages prove it, whatever the headings say."""

from __future__ import annotations

from collections.abc import Sequence
from itertools import permutations

from fourcount.record.entry.pasted.matrix import Matrix
from fourcount.record.entry.pasted.proportions import gives

_MOST_COLUMNS = 6


def proven_total(matrix: Matrix, columns: Sequence[int]) -> tuple[int, int] | None:
    """The columns of events and of their totals, where every printed percentage is exactly what these give."""
    for part, whole in permutations(columns[:_MOST_COLUMNS], 2):
        if all(_proves(matrix, row, part, whole) for row in range(len(matrix.rows))):
            return part, whole
    return None


def _proves(matrix: Matrix, row: int, part: int, whole: int) -> bool:
    quantity, total = matrix.rows[row][part].quantity, matrix.rows[row][whole].count
    if quantity is None or quantity.percent is None or quantity.events is None or total is None:
        return False
    events = quantity.events.whole or 0
    return events <= (total.whole or 0) and gives(quantity.percent, events, total.whole or 0)
