"""What an entry of the table of methods holds."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from dataclasses import dataclass
from typing import Literal

from fourcount.stats.results import Counts, Gap, HomogeneityTest, Interval

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
    "pooled_risk_difference",
    "pooled_risk_ratio",
    "pooled_odds_ratio",
    "timed_difference",
    "timed_ratio",
]


@dataclass(frozen=True, kw_only=True, slots=True)
class Method:
    """An interval method of one measure.

    ``interval`` takes (events, total, level) for a risk, (events, time, level) for a rate and (counts, level) for the
    other measures, the counts being those of their form: ``Counts``, ``PairCounts``, ``Rates``, ``TimedRisks`` or, for
    a pooled measure, a sequence of ``Counts``.
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
class HomogeneityEntry:
    """A test of whether strata may share one odds ratio."""

    key: str
    title: str
    formula: str
    source: str
    note: str
    test: Callable[[Sequence[Counts]], HomogeneityTest | Gap]


@dataclass(frozen=True, kw_only=True, slots=True)
class Calculation:
    """A formula that gives something else than an interval or a p, so that the help can list it with its source."""

    key: str
    title: str
    formula: str
    source: str
    note: str


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
