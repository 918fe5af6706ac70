"""Whether printed limits lie evenly round their estimate, on the scale on which most methods make them.

A ratio's limits are symmetric on the log scale, a difference's as they are. Score, exact and profile intervals need
not be; all others are, up to the digits printed. No counts are needed.
"""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Literal

from fourcount.appraisal.check.digits import bounds, exchanged
from fourcount.appraisal.extras.printed import DIFFERENCES, RATIOS
from fourcount.record.entry.readings import PrintedFigure, PrintedNumber

Part = Literal["estimate", "low", "high"]


@dataclass(frozen=True, kw_only=True, slots=True)
class Triple:
    """An estimate and its two limits as printed."""

    estimate: PrintedNumber
    low: PrintedNumber
    high: PrintedNumber
    log_scale: bool


def triple_of(figure: PrintedFigure) -> Triple | None:
    """The three numbers where all are printed and finite and the measure has a scale of symmetry; else None."""
    scaled = figure.measure in RATIOS or figure.measure in DIFFERENCES
    if not scaled or figure.estimate is None or figure.low is None or figure.high is None:
        return None
    if not all(math.isfinite(part.value) for part in (figure.estimate, figure.low, figure.high)):
        return None
    return Triple(estimate=figure.estimate, low=figure.low, high=figure.high, log_scale=figure.measure in RATIOS)


def ordered(triple: Triple) -> bool:
    """Whether the estimate may lie between its limits, and those in their order."""
    estimate, low, high = (bounds(part) for part in (triple.estimate, triple.low, triple.high))
    return low[0] <= high[1] and low[0] <= estimate[1] and estimate[0] <= high[1]


def symmetric(triple: Triple) -> bool:
    """Whether some numbers that print so are symmetric."""
    estimate, low, high = (bounds(part) for part in (triple.estimate, triple.low, triple.high))
    if triple.log_scale:
        middle = tuple(max(end, 0.0) ** 2 for end in estimate)
        least, most = (max(low[at], 0.0) * max(high[at], 0.0) for at in (0, 1))
    else:
        middle = tuple(2.0 * end for end in estimate)
        least, most = low[0] + high[0], low[1] + high[1]
    slack = 1e-9 * max(1.0, abs(most))
    return least <= middle[1] + slack and middle[0] - slack <= most


def mirrored_limit(triple: Triple, given: Literal["low", "high"]) -> float | None:
    """The other limit that would be symmetric with this one round the estimate."""
    limit = (triple.low if given == "low" else triple.high).value
    if not triple.log_scale:
        return 2.0 * triple.estimate.value - limit
    return triple.estimate.value**2 / limit if limit > 0 else None


def slips(triple: Triple) -> tuple[tuple[Part, PrintedNumber], ...]:
    """Each exchange of two neighbouring digits in one of the three numbers that would make them symmetric."""
    parts: tuple[Part, ...] = ("low", "high", "estimate")
    found = []
    for part in parts:
        for other in exchanged(getattr(triple, part)):
            changed = _with(triple, part, other)
            if ordered(changed) and symmetric(changed):
                found.append((part, other))
    return tuple(found)


def _with(triple: Triple, part: Part, number: PrintedNumber) -> Triple:
    parts = {"estimate": triple.estimate, "low": triple.low, "high": triple.high, part: number}
    return Triple(log_scale=triple.log_scale, **parts)
