"""What stands in each column of the grid, form by form. The cells themselves are the same four in every form."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.record.outcome import Form

Sides = tuple[str, str]


class GridForm(NamedTuple):
    """The heads of three columns, the totals beside the groups and under the columns, and how the cells are called.

    A head is "left" or "right" (the outcome's heading, typed in place), "total", "unit", "limits", or "" for none.
    Totals are fields of the findings' ``Totals``; so is what an empty right cell can show as known already.
    """

    heads: tuple[str, str, str]
    sides: Sides
    feet: tuple[str, str, str]
    stretches: tuple[int, int, int, int]
    names: Sides
    known: Sides = ("", "")


COUNTS = GridForm(
    heads=("left", "right", "total"),
    sides=("first", "second"),
    feet=("left", "right", "everyone"),
    stretches=(7, 5, 5, 2),
    names=("events-and-others", "events-and-others"),
    known=("first_right", "second_right"),
)
OF_TOTAL = GridForm(
    heads=("left", "total", "right"),
    sides=("first_right", "second_right"),
    feet=("left", "everyone", "right"),
    stretches=(5, 5, 5, 5),
    names=("left", "right"),
    known=("first", "second"),
)
GRID_FORMS: dict[Form, GridForm] = {
    "events-and-others": COUNTS,
    "events-of-total": OF_TOTAL,
    "percent-of-total": OF_TOTAL._replace(stretches=(4, 6, 5, 5), names=("percent", "right")),
    "pairs": COUNTS._replace(names=("pairs", "pairs"), known=("", "")),
    "person-time": GridForm(
        heads=("left", "unit", ""),
        sides=("", ""),
        feet=("left", "", ""),
        stretches=(6, 5, 6, 0),
        names=("events", "time"),
    ),
    "risk-at-time": GridForm(
        heads=("left", "limits", ""),
        sides=("", ""),
        feet=("", "", ""),
        stretches=(6, 5, 7, 0),
        names=("risk", "limits"),
    ),
}
"""The forms whose text stands in four cells."""
