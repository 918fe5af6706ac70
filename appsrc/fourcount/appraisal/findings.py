"""What follows from one outcome of a record: figures, gaps and cautions, by key and without words."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.record.entry.readings import Mark
from fourcount.stats.number_needed import Kind, NumberNeeded, NumberNeededLimit
from fourcount.stats.results import Counts, Fact, Gap, Interval

__all__ = [
    "AnyNumberNeeded", "Caution", "Conversion", "Counts", "Fact", "Figure", "Gap", "Interval", "Kind", "Mark",
    "NumberNeeded", "NumberNeededLimit", "NumberNeededRange", "OutcomeFindings", "PatientFindings",
    "Probability", "Range", "Totals",
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

GAP_KEYS = (
    "not-typed",  # not all four counts are there yet
    "unreadable",  # a cell holds text that gives no count
    "follows",  # the figure takes a moment and is computed apart
    "design-survey-nnt",  # a cross-sectional survey has no number needed to treat
    "design-case-control",  # a case-control study gives no risk: its totals are those of cases and controls
    "case-control-needs-baseline",  # without an outside starting risk a case-control study says nothing of a patient
    "no-starting-risk",  # nothing typed, and the reference group has nobody
    "baseline-unreadable",  # the typed starting risk gives no risk
    "carried-gap",  # the effect to carry has no value
    "bare-starting-risk",  # the starting risk is a bare value without an interval of its own
    "formula-beyond-one",  # a limit of the bare textbook formula passes 100%, where no risk of a patient lies
    "formula-beyond-risks",  # a limit of the bare textbook formula parts two risks farther than they can lie apart
)
"""Every reason this folder gives for withholding a figure, beside those of ``stats.results.GAP_KEYS``."""


class Range(msgspec.Struct, frozen=True, kw_only=True):
    """An interval of which exactly one limit cannot be given, since no risk lies there.

    Only figures under the patient have one; where both limits cannot be given, the interval is a ``Gap``.
    """

    low: float | Gap
    high: float | Gap
    adjusted: str | None = None


class NumberNeededRange(msgspec.Struct, frozen=True, kw_only=True):
    """A number needed of which exactly one limit cannot be given, since the difference has none there.

    All else is as in ``NumberNeeded``: a withheld limit of the difference lies beyond 0 on its own side, so that it
    decides about infinity as a limit in its place would.
    """

    estimate: float
    kind: Kind
    low: NumberNeededLimit | Gap
    high: NumberNeededLimit | Gap
    through_infinity: bool


AnyNumberNeeded = NumberNeeded | NumberNeededRange


class Figure(msgspec.Struct, frozen=True, kw_only=True):
    """An estimate with its interval; ``method`` is the key of the interval's method in the table of methods.

    Either can be a ``Gap`` while the other stands. In ``measures`` the interval is never a ``Range``.
    """

    estimate: float | Gap
    interval: Interval | Range | Gap
    method: str


class Probability(msgspec.Struct, frozen=True, kw_only=True):
    """A two-sided p of the family's own test of no association."""

    p: float | Gap
    method: str


class Conversion(msgspec.Struct, frozen=True, kw_only=True):
    """The odds ratio as a risk ratio at a starting risk (Zhang and Yu).

    At the table's own reference risk this is the table's own risk ratio with its direct interval and method.
    """

    baseline: float
    baseline_from: Literal["reference", "given"]
    risk_ratio: Figure


class PatientFindings(msgspec.Struct, frozen=True, kw_only=True):
    """The effect carried to one starting risk.

    ``without`` and ``with_`` are risks; ``without`` has an interval only where the table's own reference
    group is the starting risk (else the Gap "bare-starting-risk"). ``difference`` is with minus without.
    ``range_from`` says what the range holds: "table" (the table's direct intervals) or "effect" (the effect's
    limits at a bare starting risk). ``risk_ratio`` is the relative figure at this starting risk, whatever
    effect was carried. A figure from the effect names the effect's method.
    """

    baseline: float
    baseline_from: Literal["reference", "given"]
    effect: Literal["risk_ratio", "odds_ratio"]
    carried: Figure
    without: Figure
    with_: Figure
    difference: Figure
    number_needed: AnyNumberNeeded | Gap
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
    measures: dict[str, Figure | AnyNumberNeeded | Gap]
    test: Probability | Gap
    conversion: Conversion | Gap
    patient: PatientFindings | Gap
    cautions: tuple[Caution, ...]
