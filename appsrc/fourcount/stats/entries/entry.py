"""What an entry of the table of methods holds."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from typing import Literal

from fourcount.stats.results import Gap, Interval

Measure = Literal[
    "risk",
    "risk_difference",
    "risk_ratio",
    "odds_ratio",
    "pair_difference",
    "pair_ratio",
    "pair_odds_ratio",
    "rate",
    "rate_difference",
    "rate_ratio",
]


@dataclass(frozen=True, kw_only=True, slots=True)
class Method:
    """An interval method of one measure.

    ``interval`` takes (events, total, level) for a risk, (events, time, level) for a rate and (counts, level) for the
    other measures, the counts being those of their form: ``Counts``, ``PairCounts`` or ``Rates``.
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
    """A two-sided test of no association; ``p`` takes the counts of its form."""

    __test__ = False  # pytest collects classes of this name

    key: str
    title: str
    formula: str
    source: str
    note: str
    p: Callable[..., float | Gap]


@dataclass(frozen=True, kw_only=True, slots=True)
class Family:
    """The keys of the methods that one choice of the reader brings together."""

    risk: str
    odds: str  # the method of the risk whose limits, turned into odds, are those of the odds
    risk_difference: str
    risk_ratio: str
    odds_ratio: str
    test: str


@dataclass(frozen=True, kw_only=True, slots=True)
class PairFamily:
    """The same for matched pairs; ``risk`` is the method of one side's risk, a method of an unpaired risk."""

    difference: str
    ratio: str
    odds_ratio: str
    risk: str
    test: str


@dataclass(frozen=True, kw_only=True, slots=True)
class RateFamily:
    """The same for person-time."""

    rate: str
    difference: str
    ratio: str
    test: str
