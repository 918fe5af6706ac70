"""What a computation takes and what it can answer."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass, field
from types import MappingProxyType

Fact = str | int | float

GAP_KEYS = (
    "empty-table",  # nobody in either group
    "empty-index-group",  # nobody in the index group
    "empty-reference-group",  # nobody in the reference group
    "empty-group",  # nobody in the one group that is asked about
    "no-events",  # no event in either group: the ratio and the odds ratio are 0/0
    "no-non-events",  # everybody had the event: the odds ratio is 0/0
    "zero-width",  # the bare formula would give an interval of zero width
    "one-outcome",  # nobody, or everybody, in the group had the event: its log odds are infinite
    "beyond-one",  # a risk would pass 100%
    "undetermined-at-baseline",  # an infinite effect at a starting risk of 0, or an odds ratio of 0 at a risk of 1
    "next-to-certain",  # a risk lies so near 100% that no digit is left of what is missing to it
    "beyond-zero",  # a risk would fall below 0
    "carried-beyond-zero",  # a difference kept constant would take a risk below 0
    "no-discordant-pairs",  # all pairs agree: the odds ratio of pairs is 0/0
    "concordant-pairs-unknown",  # only the discordant pairs are known: no risk of either side follows
    "empty-pairs",  # there is no pair
    "zero-count",  # one of the two counts compared is 0: the log of their ratio is infinite
    "no-time",  # a group has no person-time
    "no-strata",  # no stratum holds anything to compare
    "one-stratum",  # one informative stratum has nothing to agree with
    "fragility-not-below",  # p is not below the threshold at the start
    "fragility-not-reached",  # no change of this kind brings p to the threshold
    "icc-out-of-range",  # an intracluster correlation lies from 0 to 1
    "not-positive",  # a ratio and its limits have to be above 0
    "limits-disordered",  # a lower limit above its upper one, or an estimate outside both
    "cluster-below-one",  # a cluster holds one person at least
    "not-whole",  # an exact method counts whole people, and these counts have fractions
    "too-few-left",  # divided by the design effect, no more than one person is left in the whole table
    "ratio-below-one",  # the exposed fare better: there is no share of events that the exposure explains
    "ratio-above-one",  # the exposed fare worse: there is no share of events that the exposure prevents
    "no-reference-events",  # an infinite ratio only says that the unexposed had no event: no share of events follows
    "no-width",  # the interval would have no width, and no family gives another one
    "endless-log",  # a ratio of 0 or without end has no logarithm, and the formula needs one
    "endless-limit",  # a limit without end gives no standard error
    "p-out-of-range",  # a p lies above 0 and goes up to 1
    "estimate-at-no-effect",  # an estimate at no effect, or a p of 1, goes with any standard error
    "level-not-printed",  # limits printed at one level give none at another
    "loss-ratio-out-of-range",  # the ratio of the risk among the lost is 0 or more
    "prevalence-out-of-range",  # the share of people exposed lies from 0 to 1
    "margin-out-of-range",  # a margin's difference lies between -1 and 1, its ratio above 0
)
"""Every reason for which a function of this folder gives no figure."""


@dataclass(frozen=True, slots=True)
class Gap:
    """A figure that cannot be given: the key of the reason (one of ``GAP_KEYS``) and the facts for its sentence."""

    key: str
    facts: Mapping[str, Fact] = field(default_factory=lambda: MappingProxyType({}))


@dataclass(frozen=True, kw_only=True, slots=True)
class Interval:
    """A confidence interval; a limit can be ``inf``, never nan. ``adjusted`` names a correction in use ("half")."""

    low: float
    high: float
    adjusted: str | None = None


@dataclass(frozen=True, kw_only=True, slots=True)
class FractionalCounts:
    """Four counts that need not be whole: divided by a design effect, or with a share of the people lost put back.

    Whatever takes these takes whole ``Counts`` too. The score and textbook methods do; exact methods count tables of
    whole people and take ``Counts`` alone.
    """

    index_events: float
    index_non_events: float
    reference_events: float
    reference_non_events: float

    @property
    def index_total(self) -> float:
        return self.index_events + self.index_non_events

    @property
    def reference_total(self) -> float:
        return self.reference_events + self.reference_non_events

    @property
    def events(self) -> float:
        return self.index_events + self.reference_events

    @property
    def non_events(self) -> float:
        return self.index_non_events + self.reference_non_events

    @property
    def total(self) -> float:
        return self.index_total + self.reference_total


@dataclass(frozen=True, kw_only=True, slots=True)
class Counts(FractionalCounts):
    """The four counts of an unpaired table, each a whole number from 0 to 10^9."""

    index_events: int
    index_non_events: int
    reference_events: int
    reference_non_events: int

    @property
    def index_total(self) -> int:
        return self.index_events + self.index_non_events

    @property
    def reference_total(self) -> int:
        return self.reference_events + self.reference_non_events

    @property
    def events(self) -> int:
        return self.index_events + self.reference_events

    @property
    def non_events(self) -> int:
        return self.index_non_events + self.reference_non_events

    @property
    def total(self) -> int:
        return self.index_total + self.reference_total


@dataclass(frozen=True, kw_only=True, slots=True)
class PairCounts:
    """The four counts of pairs, each a whole number from 0 to 10^9.

    A pair is two matched people (a case and its control) or one person twice. "Index only" counts the pairs in which
    the event is there on the index side alone; these and "reference only" are the discordant ones.
    """

    both: int
    index_only: int
    reference_only: int
    neither: int

    @property
    def total(self) -> int:
        return self.both + self.index_only + self.reference_only + self.neither

    @property
    def discordant(self) -> int:
        return self.index_only + self.reference_only


@dataclass(frozen=True, kw_only=True, slots=True)
class Rates:
    """Events (0 to 10^9) and person-time (above 0, in any one unit) of two groups."""

    index_events: int
    index_time: float
    reference_events: int
    reference_time: float


@dataclass(frozen=True, kw_only=True, slots=True)
class LimitedRisk:
    """A risk that a paper prints with its limits, all three as fractions from 0 to 1."""

    risk: float
    low: float
    high: float


@dataclass(frozen=True, kw_only=True, slots=True)
class TimedRisks:
    """Both groups' risks at one time with the limits printed for them, and the level of those limits."""

    index: LimitedRisk
    reference: LimitedRisk
    level: float


@dataclass(frozen=True, kw_only=True, slots=True)
class HomogeneityTest:
    """Whether the strata may share one odds ratio: a chi-square, its degrees of freedom and its p."""

    chi_square: float
    degrees: int
    p: float
