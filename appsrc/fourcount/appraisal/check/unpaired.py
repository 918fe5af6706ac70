"""What a printed figure may be where there are the four counts of an unpaired table."""

from __future__ import annotations

import math
from collections.abc import Callable
from dataclasses import dataclass
from fractions import Fraction
from functools import partial
from typing import TypeVar

from fourcount.appraisal.check.candidate import Candidate, Number, Way, increase, reciprocal, reduction, same
from fourcount.appraisal.findings.check import Orientation
from fourcount.record.entry.readings import PrintedMeasure
from fourcount.stats.entries.entry import Method
from fourcount.stats.entries.print_only import PRINT_METHODS
from fourcount.stats.estimates import without_a_contrast, without_people
from fourcount.stats.methods import METHODS
from fourcount.stats.results import Counts, FractionalCounts, Gap, Interval

HEAVY = frozenset(
    {"baptista-pike-mid-p", "conditional-exact", "conditional-mid-p", "clopper-pearson", "mid-p", "jeffreys"}
)
CENTRED = frozenset({"gart", "walter"})
AnyCounts = TypeVar("AnyCounts", bound=FractionalCounts)
_USUAL = ("wald", "katz", "woolf", "log")  # what papers usually print is named first


@dataclass(frozen=True, slots=True)
class Reading:
    """A measure that a printed name may stand for, what is printed of it, and whether the name is its own."""

    measure: str
    named: bool
    seen: Callable[[Number], Number] = same
    label: str = ""


READINGS: dict[PrintedMeasure, tuple[Reading, ...]] = {
    "risk_ratio": (Reading("risk_ratio", True), Reading("odds_ratio", False)),
    "odds_ratio": (Reading("odds_ratio", True), Reading("risk_ratio", False)),
    "hazard_ratio": (Reading("risk_ratio", False), Reading("odds_ratio", False)),
    "rate_ratio": (Reading("risk_ratio", False), Reading("odds_ratio", False)),
    "risk_difference": (
        Reading("risk_difference", True),
        Reading("risk_ratio", False, reduction, "relative_reduction"),
        Reading("risk_ratio", False, increase, "relative_increase"),
    ),
    "rate_difference": (Reading("risk_difference", False),),
    "relative_reduction": (
        Reading("risk_ratio", True, reduction, "relative_reduction"),
        Reading("risk_ratio", True, increase, "relative_increase"),
        Reading("odds_ratio", False, reduction, "odds_reduction"),
        Reading("risk_difference", False),
    ),
    "number_needed": (Reading("risk_difference", True, reciprocal, "number_needed"),),
    "risk": (),
    "p": (),
}
_ORIENTATIONS: dict[str, tuple[Orientation, ...]] = {
    "risk_ratio": ("as-read", "groups-swapped", "other-outcome", "both-swapped"),
    "odds_ratio": ("as-read", "groups-swapped"),
    "risk_difference": ("as-read", "groups-swapped"),
}
"""The sides from which a measure looks different: the odds ratio and the difference of the other outcome are those of
the swapped groups."""


def unpaired(counts: Counts, says: PrintedMeasure, behind: FractionalCounts | None = None) -> tuple[Candidate, ...]:
    """All that a figure of this name may be, likeliest first.

    ``behind`` are the counts behind intervals, where clusters make those other than the table's own.
    """
    if says == "risk":
        return _risks(counts, behind or counts)
    return tuple(
        made
        for reading in READINGS[says]
        for side in (("as-read",) if reading.seen is reciprocal else _ORIENTATIONS[reading.measure])
        for made in _of(turned(counts, side), turned(behind or counts, side), reading, side)
    )


def turned(counts: AnyCounts, side: Orientation) -> AnyCounts:
    """The counts seen from one side."""
    index = (counts.index_events, counts.index_non_events)
    reference = (counts.reference_events, counts.reference_non_events)
    if side in ("groups-swapped", "both-swapped"):
        index, reference = reference, index
    if side in ("other-outcome", "both-swapped"):
        index, reference = index[::-1], reference[::-1]
    return type(counts)(
        index_events=index[0],
        index_non_events=index[1],
        reference_events=reference[0],
        reference_non_events=reference[1],
    )


def ways(entries: tuple[Method, ...], measure: str, *given: object) -> tuple[Way, ...]:
    """The interval methods of one measure for what is given, those that papers usually print first."""
    found = [
        Way(
            key=entry.key,
            interval=partial(_interval, entry.interval, given),
            heavy=entry.key in HEAVY,
            centred=entry.key in CENTRED,
            shown=entry not in PRINT_METHODS,
        )
        for entry in entries
        if entry.measure == measure
    ]
    return tuple(sorted(found, key=lambda way: way.key not in _USUAL))


def _interval(function: Callable[..., Interval | Gap], given: tuple[object, ...], level: float) -> Interval | Gap:
    return function(*given, level)


def _of(counts: Counts, behind: FractionalCounts, reading: Reading, side: Orientation) -> tuple[Candidate, ...]:
    """The sample estimate; beside an odds ratio also the conditional one, which exact methods print."""
    found = Candidate(
        measure=reading.measure,
        orientation=side,
        named=reading.named,
        estimate=partial(_ESTIMATES[reading.measure], counts),
        ways=ways(METHODS + PRINT_METHODS, reading.measure, behind),
        seen=reading.seen,
        label=reading.label,
    )
    if reading.measure != "odds_ratio":
        return (found,)
    conditional = Candidate(
        measure="odds_ratio",
        orientation=side,
        named=reading.named,
        estimate=partial(_conditional, counts),
        ways=tuple(way for way in found.ways if way.key.startswith("conditional")),
        seen=reading.seen,
        label=reading.label or "conditional_odds_ratio",
        heavy=True,
    )
    return found, conditional


def _risks(counts: Counts, behind: FractionalCounts) -> tuple[Candidate, ...]:
    """A printed risk may be either group's, or that of not having the event."""
    groups = (
        ("risk_index", counts.index_events, counts.index_total, behind.index_events, behind.index_total),
        (
            "risk_reference",
            counts.reference_events,
            counts.reference_total,
            behind.reference_events,
            behind.reference_total,
        ),
    )
    sides: tuple[tuple[Orientation, bool], ...] = (("as-read", False), ("other-outcome", True))
    return tuple(
        Candidate(
            measure="risk",
            orientation=side,
            named=True,
            estimate=partial(_risk, total - events if other else events, total),
            ways=ways(METHODS + PRINT_METHODS, "risk", people - part if other else part, people),
            label=label,
        )
        for side, other in sides
        for label, events, total, part, people in groups
    )


def _risk(events: int, total: int) -> Number | Gap:
    return Fraction(events) / Fraction(total) if total else Gap("empty-group")


def _risk_difference(counts: Counts) -> Number | Gap:
    gap = without_people(counts)
    if gap is not None:
        return gap
    index = Fraction(counts.index_events) / Fraction(counts.index_total)
    return index - Fraction(counts.reference_events) / Fraction(counts.reference_total)


def _risk_ratio(counts: Counts) -> Number | Gap:
    gap = without_people(counts)
    if gap is not None or counts.events == 0:
        return gap or Gap("no-events")
    across = Fraction(counts.reference_events) * Fraction(counts.index_total)
    return Fraction(counts.index_events) * Fraction(counts.reference_total) / across if across else math.inf


def _odds_ratio(counts: Counts) -> Number | Gap:
    gap = without_a_contrast(counts)
    if gap is not None:
        return gap
    across = Fraction(counts.index_non_events) * Fraction(counts.reference_events)
    return Fraction(counts.index_events) * Fraction(counts.reference_non_events) / across if across else math.inf


_ESTIMATES: dict[str, Callable[[Counts], Number | Gap]] = {
    "risk_difference": _risk_difference,
    "risk_ratio": _risk_ratio,
    "odds_ratio": _odds_ratio,
}


def _conditional(counts: Counts) -> Number | Gap:
    from fourcount.stats.conditional import conditional_odds_ratio  # loads numpy

    return conditional_odds_ratio(counts)
