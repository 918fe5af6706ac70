"""How a printed figure misses what its own measure gives: digits cut off, the last digit, or one limit alone."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass
from typing import Literal

from fourcount.appraisal.check.candidate import Candidate, Limits, Number, Way
from fourcount.appraisal.check.digits import (
    FINE,
    coarse,
    cut_to,
    rounds_to,
    scale_of,
    transposed,
    units_in_one,
    within_one,
)
from fourcount.appraisal.check.search import has_limits, wanted_level
from fourcount.record.entry.readings import PrintedFigure, PrintedNumber

Kind = Literal["cut-off", "last-digit", "one-limit"]
Judge = Callable[[Number, PrintedNumber], bool]


@dataclass(frozen=True, kw_only=True, slots=True)
class Miss:
    """A near miss: its kind, the methods, and for a single wrong limit which and what it would be.

    ``slip`` where exchanging two neighbouring digits of that limit would mend it.
    """

    kind: Kind
    ways: tuple[Way, ...]
    limit: Literal["", "low", "high"] = ""
    slip: bool = False


def near_miss(figure: PrintedFigure, candidate: Candidate, *, heavy: bool) -> Miss | None:
    """The nearest way of missing, if any; only the wanted level is looked at."""
    value = candidate.value()
    if value is None:
        return None
    value *= scale_of(figure)
    if not has_limits(figure):
        return _of_estimate(figure, value)
    given = [
        (way, limits)
        for way in candidate.ways
        if heavy or not way.heavy
        for limits in (candidate.limits(way, wanted_level(figure)),)
        if limits is not None
    ]
    slip = next(_single_limits(figure, value, given, slips=True), None)
    if slip is not None:
        return slip
    kinds: tuple[tuple[Kind, Judge], ...] = (("cut-off", _cut_or_rounded), ("last-digit", within_one))
    for kind, judge in kinds if _finely_printed(figure) else kinds[:1]:
        ways = tuple(way for way, limits in given if _all(figure, value, limits, judge))
        if ways:
            return Miss(kind=kind, ways=ways)
    return next(_single_limits(figure, value, given, slips=False), None) if _finely_printed(figure) else None


def _of_estimate(figure: PrintedFigure, value: Number) -> Miss | None:
    if figure.estimate is None:
        return None
    if cut_to(value, figure.estimate):
        return Miss(kind="cut-off", ways=())
    fine = not coarse(figure.estimate)
    return Miss(kind="last-digit", ways=()) if fine and within_one(value, figure.estimate) else None


def _finely_printed(figure: PrintedFigure) -> bool:
    """Whether the last digit is small beside the width of the interval."""
    if figure.low is None or figure.high is None:
        return False
    least = min(units_in_one(figure.low), units_in_one(figure.high))
    return (figure.high.value - figure.low.value) * least >= FINE


def _cut_or_rounded(value: Number, printed: PrintedNumber) -> bool:
    return cut_to(value, printed) or rounds_to(value, printed)


def _all(figure: PrintedFigure, value: Number, limits: Limits, judge: Judge) -> bool:
    scale = scale_of(figure)
    if figure.estimate is not None and not judge(value, figure.estimate):
        return False
    pairs = zip(limits, (figure.low, figure.high), strict=True)
    return all(printed is None or judge(limit * scale, printed) for limit, printed in pairs)


def _single_limits(
    figure: PrintedFigure, value: Number, given: list[tuple[Way, Limits]], *, slips: bool
) -> Iterator[Miss]:
    """One limit that is right beside one that is not; with ``slips`` only where two exchanged digits mend it."""
    if figure.estimate is None or figure.low is None or figure.high is None or not rounds_to(value, figure.estimate):
        return
    scale = scale_of(figure)
    sides: tuple[Literal["low", "high"], ...] = ("low", "high")
    printed = (figure.low, figure.high)
    for wrong in (1, 0):
        right = 1 - wrong
        fitting = [(way, limits) for way, limits in given if rounds_to(limits[right] * scale, printed[right])]
        mended = [way for way, limits in fitting if transposed(limits[wrong] * scale, printed[wrong])]
        ways = mended if slips else [way for way, _ in fitting]
        if ways:
            yield Miss(kind="one-limit", ways=tuple(ways), limit=sides[wrong], slip=slips)
