"""What an entry of the table of methods holds."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from typing import Literal

from fourcount.stats.results import Counts, Gap, Interval

Measure = Literal["risk", "risk_difference", "risk_ratio", "odds_ratio"]


@dataclass(frozen=True, kw_only=True, slots=True)
class Method:
    """An interval method of one measure.

    ``interval`` takes (events, total, level) for a risk and (counts, level) for the other measures.
    """

    key: str
    measure: Measure
    title: str
    formula: str
    source: str
    note: str
    interval: Callable[..., Interval | Gap]


@dataclass(frozen=True, kw_only=True, slots=True)
class Test:
    """A two-sided test of no association."""

    __test__ = False  # pytest collects classes of this name

    key: str
    title: str
    formula: str
    source: str
    note: str
    p: Callable[[Counts], float | Gap]


@dataclass(frozen=True, kw_only=True, slots=True)
class Family:
    """The keys of the methods that one choice of the reader brings together."""

    risk: str
    odds: str  # the method of the risk whose limits, turned into odds, are those of the odds
    risk_difference: str
    risk_ratio: str
    odds_ratio: str
    test: str
