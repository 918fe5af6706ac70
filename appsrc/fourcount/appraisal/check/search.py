"""The search: which candidates, by which methods and at which level, give the digits of one printed figure.

Estimates come first; intervals are worked out only where an estimate fits. What needs numpy (exact intervals, the
conditional estimate) is always tried up to 10^5 a cell, beyond it only where nothing else fits, and beyond 10^7 not at
all: there exact intervals print as the others do.
"""

from __future__ import annotations

import math
from collections.abc import Iterable
from dataclasses import dataclass

from fourcount.appraisal.check.candidate import Candidate, Limits, Number, Way, same
from fourcount.appraisal.check.digits import last_digits, rounds_to, scale_of
from fourcount.appraisal.findings.check import Fit, Match
from fourcount.record.entry.readings import PrintedFigure, PrintedNumber
from fourcount.record.paper import USUAL_LEVEL

OTHER_ANALYSES = ("unpaired_", "crude_", "unclustered_")
"""How the keys of measures begin that are worked out as the form does not ask for."""

AS_PRINTED = (0, 0)
"""The rank of a whole fit at the level under the print's own name."""
LEVELS = (0.95, 0.90, 0.99)
ALWAYS_TO = 100_000
NEVER_FROM = 10_000_000


@dataclass(frozen=True, kw_only=True, slots=True)
class Hit:
    """A match with the candidate behind it; ``at_level`` where its level is the printed one (or the usual one)."""

    match: Match
    candidate: Candidate
    at_level: bool

    @property
    def place(self) -> int:
        """0 as printed, 1 under another name, 2 the other way round, 3 both."""
        return (not self.candidate.named) + 2 * (not self.candidate.as_printed)

    @property
    def rank(self) -> tuple[int, int]:
        """What is said first: whole fits at the level, whole fits at another, estimates, intervals."""
        fits = {"all": 0 if self.at_level else 1, "estimate": 2, "interval": 3}
        return fits[self.match.fit], self.place


def wanted_level(figure: PrintedFigure) -> float:
    """The level the print says, or 95% where it says none, as is usual."""
    return USUAL_LEVEL if figure.level is None else figure.level


def levels_of(figure: PrintedFigure) -> tuple[float, ...]:
    """The levels to try, the printed one first."""
    wanted = wanted_level(figure)
    return (wanted, *(level for level in LEVELS if abs(level - wanted) > 1e-12))


def has_limits(figure: PrintedFigure) -> bool:
    """Whether at least one limit is printed."""
    return figure.low is not None or figure.high is not None


def search(figure: PrintedFigure, candidates: tuple[Candidate, ...], largest: float) -> tuple[Hit, ...]:
    """Every match, best first. ``largest`` is the largest count."""
    heavy = largest <= ALWAYS_TO
    hits = _all_hits(figure, candidates, heavy=heavy)
    if not heavy and largest <= NEVER_FROM and not any(hit.match.fit == "all" for hit in hits):
        hits = _all_hits(figure, candidates, heavy=True)
    if not hits and has_limits(figure) and figure.estimate is not None:
        hits = _intervals_alone(figure, candidates)
    return tuple(sorted(hits, key=lambda hit: hit.rank))


def _all_hits(figure: PrintedFigure, candidates: tuple[Candidate, ...], *, heavy: bool) -> list[Hit]:
    hits: list[Hit] = []
    fitted: set[tuple[object, ...]] = set()
    for candidate in candidates:
        side = (candidate.measure, candidate.orientation, candidate.seen)
        if candidate.heavy and (not heavy or side in fitted):
            continue
        found = _hits_of(figure, candidate, heavy=heavy)
        if found:
            fitted.add(side)
            hits += found
    return hits


def _hits_of(figure: PrintedFigure, candidate: Candidate, *, heavy: bool) -> list[Hit]:
    value = candidate.value()
    if value is None:
        return []
    fits = figure.estimate is None or prints(value, figure.estimate, figure, candidate)
    if not has_limits(figure):
        return [hit(figure, candidate, None, wanted_level(figure), "all")] if fits else []
    ways = [way for way in candidate.ways if (heavy or not way.heavy) and (fits or _centred(way, candidate))]
    whole: Fit = "interval" if figure.estimate is None else "all"
    found = [
        hit(figure, candidate, way, level, whole)
        for level in levels_of(figure)
        for way in ways
        if _gives(figure, candidate, way, level, fits=fits)
    ]
    if found or not fits or figure.estimate is None:
        return found
    return [hit(figure, candidate, nearest_way(figure, candidate, ways), wanted_level(figure), "estimate")]


def _centred(way: Way, candidate: Candidate) -> bool:
    return way.centred and candidate.seen is same


def _gives(figure: PrintedFigure, candidate: Candidate, way: Way, level: float, *, fits: bool) -> bool:
    limits = candidate.limits(way, level)
    if limits is None or not both_print(limits, figure, candidate):
        return False
    if fits or figure.estimate is None:
        return True
    return limits[0] > 0 and prints(math.sqrt(limits[0] * limits[1]), figure.estimate, figure, candidate)


def both_print(limits: Limits, figure: PrintedFigure, candidate: Candidate) -> bool:
    """Whether the limits that are printed are these."""
    pairs = zip(limits, (figure.low, figure.high), strict=True)
    return all(printed is None or prints(limit, printed, figure, candidate) for limit, printed in pairs)


def prints(value: Number, printed: PrintedNumber, figure: PrintedFigure, candidate: Candidate) -> bool:
    """Whether a value prints as these digits on the figure's scale; a number needed may also be rounded up."""
    scaled = value * scale_of(figure)
    if candidate.key == "number_needed" and printed.decimals == 0 and math.isfinite(scaled + printed.value):
        return rounds_to(scaled, printed) or math.ceil(scaled * (1 - 1e-9)) == abs(last_digits(printed))
    return rounds_to(scaled, printed)


def hit(figure: PrintedFigure, candidate: Candidate, way: Way | None, level: float, fit: Fit) -> Hit:
    """A match of one candidate by one method, with all that it gives."""
    scale = scale_of(figure)
    value = candidate.value()
    limits = None if way is None else candidate.limits(way, level)
    match = Match(
        measure=candidate.key,
        method="" if way is None else way.key,
        level=level,
        orientation=candidate.orientation,
        fit=fit,
        computed=(
            None if value is None else float(value * scale),
            None if limits is None else limits[0] * scale,
            None if limits is None else limits[1] * scale,
        ),
        adjusted="" if way is None or limits is None else candidate.corrected(way, level),
    )
    return Hit(match=match, candidate=candidate, at_level=abs(level - wanted_level(figure)) < 1e-12)


def nearest_way(figure: PrintedFigure, candidate: Candidate, ways: Iterable[Way]) -> Way | None:
    """The shown method whose limits at the wanted level lie nearest to the printed ones."""
    level = wanted_level(figure)
    apart = {way.key: distance(candidate.limits(way, level), figure) for way in ways if way.shown}
    best = min(apart, key=lambda key: apart[key], default=None)
    return None if best is None else next(way for way in candidate.ways if way.key == best)


def distance(limits: Limits | None, figure: PrintedFigure) -> float:
    """How far limits are from the printed ones, on the printed scale."""
    if limits is None:
        return math.inf
    scale = scale_of(figure)
    pairs = zip(limits, (figure.low, figure.high), strict=True)
    return sum(_apart(limit * scale, printed.value) for limit, printed in pairs if printed is not None)


def _apart(limit: float, printed: float) -> float:
    return 0.0 if limit == printed else abs(limit - printed)


def _intervals_alone(figure: PrintedFigure, candidates: tuple[Candidate, ...]) -> list[Hit]:
    """Where no estimate fits: the quick methods whose limits are the printed ones at the wanted level."""
    if figure.low is None or figure.high is None:
        return []
    level = wanted_level(figure)
    return [
        hit(figure, candidate, way, level, "interval")
        for candidate in candidates
        if not candidate.heavy and candidate.value() is not None
        for way in candidate.ways
        if not way.heavy
        for limits in (candidate.limits(way, level),)
        if limits is not None and both_print(limits, figure, candidate)
    ]
