"""The measures of one table under the chosen family of intervals, as far as the design supports them."""

from __future__ import annotations

import math
from collections.abc import Callable, Mapping
from dataclasses import dataclass
from types import MappingProxyType

from fourcount.appraisal.findings import (
    MEASURES,
    AnyNumberNeeded,
    Counts,
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

Figures = Mapping[str, Figure]


@dataclass(frozen=True, kw_only=True, slots=True)
class Table:
    """One table, how its intervals are computed, and which methods are left for later."""

    counts: Counts
    choices: Choices
    postponed: frozenset[str]


def all_figures(table: Table, support: Support) -> Figures:
    """Every figure that the design supports, by the key of its measure, except the number needed."""
    return {key: compute(table) for key, compute in _FIGURES.items() if key not in support.withheld}


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


def number_needed_from(difference: Figure, *, welcome: bool) -> AnyNumberNeeded | Gap:
    """The number needed to treat from a difference and its interval (Altman 1998).

    Where one limit of the difference is withheld, so is the limit that would be its reciprocal, and nothing else.
    """
    estimate, interval = difference.estimate, difference.interval
    if isinstance(estimate, Gap):
        return estimate
    if isinstance(interval, Range):
        return _half_known(estimate, interval, welcome=welcome)
    return interval if isinstance(interval, Gap) else number_needed(estimate, interval, unwelcome=not welcome)


def _half_known(difference: float, interval: Range, *, welcome: bool) -> NumberNeededRange:
    """An endless limit stands in for the one withheld: it lies on the same side, and its reciprocal is 0."""
    low = -math.inf if isinstance(interval.low, Gap) else interval.low
    high = math.inf if isinstance(interval.high, Gap) else interval.high
    reason = interval.low if isinstance(interval.low, Gap) else interval.high
    needed = number_needed(difference, Interval(low=low, high=high), unwelcome=not welcome)

    def given(limit: NumberNeededLimit) -> NumberNeededLimit | Gap:
        return reason if isinstance(reason, Gap) and limit.value == 0 else limit

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
    p = Gap("follows") if key in table.postponed else test(key).p(table.counts)
    return Probability(p=p, method=key)


def other_outcome(counts: Counts) -> Counts:
    """The same people with the other outcome counted."""
    return Counts(
        index_events=counts.index_non_events,
        index_non_events=counts.index_events,
        reference_events=counts.reference_non_events,
        reference_non_events=counts.reference_events,
    )


def _risk(table: Table, events: int, total: int) -> Figure:
    key = FAMILIES[table.choices.family].risk
    interval = _interval(table, "risk", key, events, total)
    return Figure(estimate=estimates.risk(events, total), interval=interval, method=key)


def _odds(table: Table, events: int, total: int) -> Figure:
    """Odds with the limits of the risk, each mapped p/(1-p): the map is monotone, so the coverage is the same.

    The textbook family takes the limits of its own method for odds, since Wald's can lie where no odds are.
    """
    key = FAMILIES[table.choices.family].odds
    interval = _as_odds(_interval(table, "risk", key, events, total))
    return Figure(estimate=estimates.odds(events, total), interval=interval, method=key)


def _as_odds(interval: Interval | Gap) -> Interval | Gap:
    if isinstance(interval, Gap):
        return interval
    low, high = (risk / (1 - risk) if risk < 1 else math.inf for risk in (interval.low, interval.high))
    return Interval(low=low, high=high, adjusted=interval.adjusted)


def _interval(table: Table, measure: str, key: str, *arguments: int | Counts) -> Interval | Gap:
    if key in table.postponed:
        return Gap("follows")
    return method(measure, key).interval(*arguments, table.choices.level)


def _risk_index(table: Table) -> Figure:
    return _risk(table, table.counts.index_events, table.counts.index_total)


def _risk_reference(table: Table) -> Figure:
    return _risk(table, table.counts.reference_events, table.counts.reference_total)


def _odds_index(table: Table) -> Figure:
    return _odds(table, table.counts.index_events, table.counts.index_total)


def _odds_reference(table: Table) -> Figure:
    return _odds(table, table.counts.reference_events, table.counts.reference_total)


def _risk_difference(table: Table) -> Figure:
    key = FAMILIES[table.choices.family].risk_difference
    interval = _interval(table, "risk_difference", key, table.counts)
    return Figure(estimate=estimates.risk_difference(table.counts), interval=interval, method=key)


def _risk_ratio(table: Table) -> Figure:
    return _ratio_of(table.counts, table)


def _other_risk_ratio(table: Table) -> Figure:
    return _ratio_of(other_outcome(table.counts), table)


def _ratio_of(counts: Counts, table: Table) -> Figure:
    key = FAMILIES[table.choices.family].risk_ratio
    interval = _interval(table, "risk_ratio", key, counts)
    return Figure(estimate=estimates.risk_ratio(counts), interval=interval, method=key)


def _odds_ratio(table: Table) -> Figure:
    key = FAMILIES[table.choices.family].odds_ratio
    interval = _interval(table, "odds_ratio", key, table.counts)
    return Figure(estimate=estimates.odds_ratio(table.counts), interval=interval, method=key)


_FIGURES: Mapping[str, Callable[[Table], Figure]] = MappingProxyType(
    {
        "risk_index": _risk_index,
        "risk_reference": _risk_reference,
        "odds_index": _odds_index,
        "odds_reference": _odds_reference,
        "risk_difference": _risk_difference,
        "risk_ratio": _risk_ratio,
        "other_risk_ratio": _other_risk_ratio,
        "odds_ratio": _odds_ratio,
    }
)
