"""What the numbers at the grid's edges are called, for whoever does not see beside which names they stand."""

from __future__ import annotations

from typing import TYPE_CHECKING

from fourcount.face.grid_forms import GridForm
from fourcount.record.outcome import Form
from fourcount.wording import labels
from fourcount.wording.spoken import TOGETHER, named_sum

if TYPE_CHECKING:
    from fourcount.face.fields import TextField
    from fourcount.face.grid import Grid


def shown(field: TextField) -> str:
    """What a field says to the eye: its text, or what stands in its place."""
    return field.text().strip() or field.placeholderText()


def name_totals(grid: Grid, kind: GridForm, form: Form) -> None:
    """Name each number by its line and its column, and say it: ``Night lights, total: 412``."""
    heads = [shown(grid.headings[head]) if head in grid.headings else labels.TOTAL for head in kind.heads]
    if form == "pairs":
        lines = [shown(heading) for heading in grid.headings.values()]
    else:
        lines = [field.text().strip() or labels.GROUP_NAMES[position] for position, field in grid.labels.items()]
    said = dict(zip(("first", "second"), ((line, heads[2]) for line in lines), strict=True))
    said |= dict(zip(("left", "right", "everyone"), ((TOGETHER, head) for head in heads), strict=True))
    for key, (line, column) in said.items():
        name = named_sum(line, column, grid.totals[key].text())
        if name != grid.totals[key].accessibleName():
            grid.totals[key].setAccessibleName(name)
