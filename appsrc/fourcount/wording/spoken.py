"""Words that are only heard: what a screen reader says where the eye sees it from the place of a thing."""

from __future__ import annotations

TOGETHER = "together"
"""The name of a row, or a column, of sums."""

SUM = "{row}, {column}: {value}"

PICTURE = "{name}: {summary}"
"""The name of a picture where there is a short sentence of what it shows."""


def named_sum(row: str, column: str, value: str) -> str:
    """A number at the edge of a table with the names of its line and its column; "" where there is none."""
    return SUM.format(row=row, column=column, value=value) if value else ""
