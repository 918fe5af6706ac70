"""The measures of one table under the chosen family of intervals, as far as the design supports them."""

from __future__ import annotations

import math
from collections.abc import Callable, Container, Mapping
from dataclasses import dataclass
from types import MappingProxyType

from fourcount.appraisal.findings import (
    MEASURES,
    AnyNumberNeeded,
    Figure,
    Gap,
    Interval,
    NumberNeededLimit,
    NumberNeededRange,
    Probability,
    Range,
)
from fourcount.appraisal.gating import Support
from fourcount.appraisal.reach import within_everybody
from fourcount.record.paper import Choices
from fourcount.stats import estimates
from fourcount.stats.methods import FAMILIES, method, test
from fourcount.stats.number_needed import number_needed
from fourcount.stats.results import FractionalCounts

Figures = Mapping[str, Figure]


@dataclass(frozen=True, kw_only=True, slots=True)
class Table:
    """One table, how its intervals are computed, and which methods are left for later.

    ``behind`` are the counts behind intervals and tests where they are not the table's own (those of a cluster trial,
    divided by its design effect), or the reason why there are no intervals.
    """

    counts: FractionalCounts
    choices: Choices
    postponed: frozenset[str] = frozenset()
    behind: FractionalCounts | Gap | None = None

    @property
    def effective(self) -> FractionalCounts | Gap:
        return self.counts if self.behind is None else self.behind


def all_figures(table: Table, support: Support, only: Container[str] = MEASURES) -> dict[str, Figure]:
    """Every figure that the design supports, by the key of its measure, except the number needed."""
    return {key: compute(table) for key, compute in _FIGURES.items() if key not in support.withheld and key in only}


def measures(figures: Figures, support: Support, *, welcome: bool) -> dict[str, Figure | AnyNumberNeeded | Gap]:
    """All keys of ``MEASURES`` in order: the figure, the number needed, or the reason why neither is given."""
    return {key: _measure(key, figures, support, welcome=welcome) for key in MEASURES}


def _measure(key: str, figures: Figures, support: Support, *, welcome: bool) -> Figure | AnyNumberNeeded | Gap:
    if key in support.withheld:
        return Gap(support.withheld[key])
    if key == "number_needed":
        return number_needed_from(within_everybody(figures["risk_difference"]), welcome=welcome)
    figure = figures[key]
    if isinstance(figure.estimate, Gap) and isinstance(figure.interval, Gap):
        return figure.estimate
    return figure


def number_needed_from(difference: Figure, *, welcome: bool, beside: bool = False) -> AnyNumberNeeded | Gap:
    """The number needed to treat from a difference and its interval (Altman 1998).

    Where one limit of the difference is withheld, so is the limit that would be its reciprocal, and nothing else. Such
    a limit lies beyond 0 on its own side, or, ``beside`` it, on the side of the other one.
    """
    estimate, interval = difference.estimate, difference.interval
    if isinstance(estimate, Gap):
        return estimate
    if isinstance(interval, Range):
        return _half_known(estimate, interval, welcome=welcome, beside=beside)
    return interval if isinstance(interval, Gap) else number_needed(estimate, interval, unwelcome=not welcome)


def number_needed_alone(difference: float, reason: Gap, *, welcome: bool) -> NumberNeededRange:
    """The number needed of a difference without any interval: both limits are withheld, for the one reason."""
    needed = number_needed(difference, Interval(low=difference, high=difference), unwelcome=not welcome)
    return NumberNeededRange(
        estimate=needed.estimate, kind=needed.kind, low=reason, high=reason, through_infinity=False
    )


def _half_known(difference: float, interval: Range, *, welcome: bool, beside: bool) -> NumberNeededRange:
    """A limit without end, whose reciprocal is 0, stands in for the one withheld; beside 0 it is 0 itself."""
    stand_in = 0.0 if beside else math.inf
    low = -stand_in if isinstance(interval.low, Gap) else interval.low
    high = stand_in if isinstance(interval.high, Gap) else interval.high
    reason = interval.low if isinstance(interval.low, Gap) else interval.high
    needed = number_needed(difference, Interval(low=low, high=high), unwelcome=not welcome)

    def given(limit: NumberNeededLimit) -> NumberNeededLimit | Gap:
        return reason if isinstance(reason, Gap) and limit.value == (math.inf if beside else 0.0) else limit

    return NumberNeededRange(
        estimate=needed.estimate,
        kind=needed.kind,
        low=given(needed.low),
        high=given(needed.high),
        through_infinity=needed.through_infinity,
    )


def own_test(table: Table) -> Probability:
    """The two-sided p of the family's own test."""
    key = FAMILIES[table.choices.family].test
    return Probability(p=_p(table, key), method=key)


def _p(table: Table, key: str) -> float | Gap:
    if isinstance(table.effective, Gap):
        return table.effective
    if key in table.postponed:
        return Gap("follows")
    p = test(key).p(table.effective)
    return _said_of_clusters(p) if isinstance(p, Gap) else p


def other_outcome(counts: FractionalCounts) -> FractionalCounts:
    """The same people with the other outcome counted."""
    return type(counts)(
        index_events=counts.index_non_events,
        index_non_events=counts.index_events,
        reference_events=counts.reference_non_events,
        reference_non_events=counts.reference_events,
    )


Group = Callable[[FractionalCounts], tuple[float, float]]


def _index(counts: FractionalCounts) -> tuple[float, float]:
    return counts.index_events, counts.index_total


def _reference(counts: FractionalCounts) -> tuple[float, float]:
    return counts.reference_events, counts.reference_total


def _risk(table: Table, group: Group) -> Figure:
    key = FAMILIES[table.choices.family].risk
    interval = _interval(table, "risk", key, group)
    return Figure(estimate=estimates.risk(*group(table.counts)), interval=interval, method=key)


def _odds(table: Table, group: Group) -> Figure:
    """Odds with the limits of the risk, each mapped p/(1-p): the map is monotone, so the coverage is the same.

    The textbook family takes the limits of its own method for odds, since Wald's can lie where no odds are.
    """
    key = FAMILIES[table.choices.family].odds
    interval = _as_odds(_interval(table, "risk", key, group))
    return Figure(estimate=estimates.odds(*group(table.counts)), interval=interval, method=key)


def _as_odds(interval: Interval | Gap) -> Interval | Gap:
    if isinstance(interval, Gap):
        return interval
    low, high = (risk / (1 - risk) if risk < 1 else math.inf for risk in (interval.low, interval.high))
    return Interval(low=low, high=high, adjusted=interval.adjusted)


def _whole(counts: FractionalCounts) -> tuple[FractionalCounts]:
    return (counts,)


def _other(counts: FractionalCounts) -> tuple[FractionalCounts]:
    return (other_outcome(counts),)


def _interval(
    table: Table, measure: str, key: str, arguments: Callable[[FractionalCounts], tuple[object, ...]]
) -> Interval | Gap:
    if isinstance(table.effective, Gap):
        return table.effective
    if key in table.postponed:
        return Gap("follows")
    interval = method(measure, key).interval(*arguments(table.effective), table.choices.level)
    return _said_of_clusters(interval) if isinstance(interval, Gap) else interval


def _said_of_clusters(gap: Gap) -> Gap:
    """Counts are not whole here because of a design effect, or of a share of the people lost."""
    return Gap("cluster-no-exact") if gap.key == "not-whole" else gap


def _risk_index(table: Table) -> Figure:
    return _risk(table, _index)


def _risk_reference(table: Table) -> Figure:
    return _risk(table, _reference)


def _odds_index(table: Table) -> Figure:
    return _odds(table, _index)


def _odds_reference(table: Table) -> Figure:
    return _odds(table, _reference)


def risk_difference(table: Table) -> Figure:
    """The difference with the family's interval."""
    key = FAMILIES[table.choices.family].risk_difference
    interval = _interval(table, "risk_difference", key, _whole)
    return Figure(estimate=estimates.risk_difference(table.counts), interval=interval, method=key)


def risk_ratio(table: Table) -> Figure:
    """The risk ratio with the family's interval."""
    key = FAMILIES[table.choices.family].risk_ratio
    interval = _interval(table, "risk_ratio", key, _whole)
    return Figure(estimate=estimates.risk_ratio(table.counts), interval=interval, method=key)


def _other_risk_ratio(table: Table) -> Figure:
    key = FAMILIES[table.choices.family].risk_ratio
    interval = _interval(table, "risk_ratio", key, _other)
    return Figure(estimate=estimates.risk_ratio(other_outcome(table.counts)), interval=interval, method=key)


def _odds_ratio(table: Table) -> Figure:
    key = FAMILIES[table.choices.family].odds_ratio
    interval = _interval(table, "odds_ratio", key, _whole)
    return Figure(estimate=estimates.odds_ratio(table.counts), interval=interval, method=key)


_FIGURES: Mapping[str, Callable[[Table], Figure]] = MappingProxyType(
    {
        "risk_index": _risk_index,
        "risk_reference": _risk_reference,
        "odds_index": _odds_index,
        "odds_reference": _odds_reference,
        "risk_difference": risk_difference,
        "risk_ratio": risk_ratio,
        "other_risk_ratio": _other_risk_ratio,
        "odds_ratio": _odds_ratio,
    }
)
