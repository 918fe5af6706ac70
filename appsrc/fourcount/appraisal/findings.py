"""What follows from one outcome of a record: figures, gaps and cautions, by key and without words."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.record.entry.readings import Mark
from fourcount.stats.number_needed import Kind, NumberNeeded, NumberNeededLimit
from fourcount.stats.results import Counts, Fact, Gap, Interval

__all__ = [
    "Caution", "Conversion", "Counts", "Fact", "Figure", "Gap", "Interval", "Kind", "Mark",
    "NumberNeeded", "NumberNeededLimit", "OutcomeFindings", "PatientFindings", "Probability", "Totals",
]  # fmt: skip

MEASURES = (
    "risk_index",
    "risk_reference",
    "odds_index",
    "odds_reference",
    "risk_difference",
    "number_needed",
    "risk_ratio",
    "other_risk_ratio",
    "odds_ratio",
)
"""The keys of ``OutcomeFindings.measures``; ``other_risk_ratio`` is the ratio of not having the event."""


class Figure(msgspec.Struct, frozen=True, kw_only=True):
    """An estimate with its interval; ``method`` is the key of the interval's method in the table of methods."""

    estimate: float | Gap
    interval: Interval | Gap
    method: str


class Probability(msgspec.Struct, frozen=True, kw_only=True):
    """A two-sided p of the family's own test of no association."""

    p: float | Gap
    method: str


class Conversion(msgspec.Struct, frozen=True, kw_only=True):
    """The odds ratio as a risk ratio at a starting risk (Zhang and Yu)."""

    baseline: float
    baseline_from: Literal["reference", "given"]
    risk_ratio: Figure


class PatientFindings(msgspec.Struct, frozen=True, kw_only=True):
    """The effect carried to one starting risk.

    ``without`` and ``with_`` are risks; ``without`` has an interval only where the table's own reference
    group is the starting risk. ``difference`` is with minus without. ``range_from`` says what the range
    holds: "table" (the table's direct intervals) or "effect" (the effect's limits at a bare starting risk).
    ``risk_ratio`` is the relative figure at this starting risk, whatever effect was carried.
    """

    baseline: float
    baseline_from: Literal["reference", "given"]
    effect: Literal["risk_ratio", "odds_ratio"]
    carried: Figure
    without: Figure
    with_: Figure
    difference: Figure
    number_needed: NumberNeeded | Gap
    risk_ratio: Figure
    range_from: Literal["table", "effect"]


class Totals(msgspec.Struct, frozen=True, kw_only=True):
    """The live margins in the print's order; None where a part is not known yet."""

    first_left: int | None = None
    first_right: int | None = None
    second_left: int | None = None
    second_right: int | None = None
    first: int | None = None
    second: int | None = None
    left: int | None = None
    right: int | None = None
    everyone: int | None = None


class Caution(msgspec.Struct, frozen=True, kw_only=True):
    """A rule of the table of cautions that holds here, with the facts for its sentence."""

    key: str
    facts: dict[str, Fact] = {}


class OutcomeFindings(msgspec.Struct, frozen=True, kw_only=True):
    """All that one outcome says under the record's choices.

    Every key of ``MEASURES`` is in ``measures``; what cannot be given is a ``Gap`` there. ``counts`` is a
    Gap ("not-typed", "unreadable") while the table is not whole, and all measures then hold that Gap.
    """

    counts: Counts | Gap
    totals: Totals
    marks: tuple[Mark, ...]
    measures: dict[str, Figure | NumberNeeded | Gap]
    test: Probability | Gap
    conversion: Conversion | Gap
    patient: PatientFindings | Gap
    cautions: tuple[Caution, ...]
