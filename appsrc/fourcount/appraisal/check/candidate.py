"""One thing that a printed figure may be: a measure of these counts, seen from one side, with its intervals."""

from __future__ import annotations

import math
from collections.abc import Callable
from dataclasses import dataclass
from fractions import Fraction

from fourcount.appraisal.findings.check import Orientation
from fourcount.stats.results import Gap, Interval

Number = Fraction | float
Limits = tuple[float, float]
DIFFERENCES = frozenset(
    {"risk_difference", "pair_difference", "pooled_risk_difference", "timed_difference", "rate_difference"}
)


@dataclass(frozen=True, kw_only=True, slots=True)
class Way:
    """One method of an interval; ``centred`` where its own centre is printed as the estimate too (a half was added).

    ``heavy`` ones need numpy and take longer where counts are large; those not ``shown`` are known in print only.
    """

    key: str
    interval: Callable[[float], Interval | Gap]
    heavy: bool = False
    centred: bool = False
    shown: bool = True


def same(x: Number) -> Number:
    """A measure as it is."""
    return x


def reduction(ratio: Number) -> Number:
    """What a ratio takes off: 0.46 for 0.54."""
    return 1 - ratio


def increase(ratio: Number) -> Number:
    """What a ratio adds: 0.46 for 1.46."""
    return ratio - 1


def reciprocal(difference: Number) -> Number:
    """A number needed from a difference, whatever its sign."""
    return abs(1 / difference) if difference else math.inf


@dataclass(frozen=True, kw_only=True, slots=True)
class Candidate:
    """A measure of the counts that a printed figure may be.

    ``named`` says that the print calls it so. ``estimate`` and the limits of ``ways`` are those of the entry
    ``measure`` in the table of methods; ``seen`` turns them into what is printed. ``heavy`` as in ``Way``.
    """

    measure: str
    orientation: Orientation
    named: bool
    estimate: Callable[[], Number | Gap]
    ways: tuple[Way, ...]
    seen: Callable[[Number], Number] = same
    label: str = ""
    heavy: bool = False

    @property
    def key(self) -> str:
        """The measure that the figure is: that of the intervals, or what is made of it (a relative reduction)."""
        return self.label or self.measure

    @property
    def sign_alone(self) -> bool:
        """Whether it is the difference with its sign turned, which many papers print as a reduction."""
        return self.orientation == "groups-swapped" and self.measure in DIFFERENCES and self.seen is same

    @property
    def as_printed(self) -> bool:
        """Whether it is seen from the side from which the table is read; a difference may have either sign."""
        return self.orientation == "as-read" or self.sign_alone

    def value(self) -> Number | None:
        """The estimate on the print's side, None where there is none."""
        found = self.estimate()
        return None if isinstance(found, Gap) else self.seen(found)

    def corrected(self, way: Way, level: float) -> str:
        """What was done to the counts behind an interval ("half" was added); "" where nothing was."""
        found = way.interval(level)
        return "" if isinstance(found, Gap) else found.adjusted or ""

    def limits(self, way: Way, level: float) -> Limits | None:
        """The interval on the print's side; None where there is none, or where a number needed passes infinity."""
        found = way.interval(level)
        if isinstance(found, Gap):
            return None
        if self.seen is reciprocal and found.low <= 0.0 <= found.high:
            return None
        low, high = float(self.seen(found.low)), float(self.seen(found.high))
        return (low, high) if low <= high else (high, low)
