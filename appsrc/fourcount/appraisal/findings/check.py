"""Whether what a paper prints follows from its counts."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.record.entry.readings import Mark, PrintedFigure
from fourcount.stats.results import Fact

Fit = Literal["all", "estimate", "interval"]

Orientation = Literal["as-read", "groups-swapped", "other-outcome", "both-swapped"]


class Match(msgspec.Struct, frozen=True, kw_only=True):
    """One way in which a printed figure follows from the counts.

    ``measure`` and ``method`` are keys of the table of methods, ``level`` a fraction. ``computed`` holds estimate, low
    and high on the printed figure's own scale (points for a percentage), None where it has none. ``fit`` says whether
    all that is printed was reproduced, the estimate alone, or the interval alone. ``adjusted`` names a correction that
    the interval rests on, as an ``Interval`` does ("half").
    """

    measure: str
    method: str
    level: float
    orientation: Orientation
    fit: Fit
    computed: tuple[float | None, float | None, float | None]
    adjusted: str = ""


class Finding(msgspec.Struct, frozen=True, kw_only=True):
    """One sentence of the check, by key, with its facts; ``agrees`` where it confirms rather than asks to check."""

    key: str
    facts: dict[str, Fact] = {}
    agrees: bool = False


class FigureCheck(msgspec.Struct, frozen=True, kw_only=True):
    """What the check says of one printed figure: how it matches, best first, and the findings in order."""

    printed: PrintedFigure
    matches: tuple[Match, ...]
    findings: tuple[Finding, ...]


class CheckFindings(msgspec.Struct, frozen=True, kw_only=True):
    """The check of all that the paper prints, and the marks of what could not be read.

    ``cells`` are findings about percentages that stand beside the counts themselves. ``adopt`` is the family and level
    under which this record's figures are the paper's, where one is told.
    """

    figures: tuple[FigureCheck, ...] = ()
    marks: tuple[Mark, ...] = ()
    cells: tuple[Finding, ...] = ()
    adopt: tuple[str, float] | None = None
