"""What the methods for several tables sum up, and which strata tell them anything."""

from __future__ import annotations

import math
from collections.abc import Sequence

from fourcount.stats.results import Counts, Gap


def with_both_groups(strata: Sequence[Counts]) -> tuple[Counts, ...]:
    """The strata in which both groups have somebody: no other one compares anything."""
    return tuple(t for t in strata if t.index_total and t.reference_total)


def informative(strata: Sequence[Counts]) -> tuple[Counts, ...]:
    """The strata in which both groups and both outcomes have somebody, and whose margins leave more than one table."""
    return tuple(t for t in with_both_groups(strata) if t.events and t.non_events and t.total > 1)


def smallest_expected(t: Counts) -> float:
    """The least of the four counts that are expected with no effect: the product of its margins over N."""
    return min(t.index_total, t.reference_total) * min(t.events, t.non_events) / t.total


def nothing_to_compare(compared: Sequence[Counts]) -> Gap:
    """Why strata with both groups give no odds ratio: nobody had the event, or everybody, or there are no strata."""
    if compared and not any(t.events for t in compared):
        return Gap("no-events")
    if compared and not any(t.non_events for t in compared):
        return Gap("no-non-events")
    return Gap("no-strata")


def cross_products(compared: Sequence[Counts]) -> tuple[float, float]:
    """Mantel and Haenszel's sum(ad/N) and sum(bc/N), whose quotient is the pooled odds ratio; either can be 0."""
    towards = math.fsum(t.index_events * t.reference_non_events / t.total for t in compared)
    against = math.fsum(t.index_non_events * t.reference_events / t.total for t in compared)
    return towards, against


def excess(t: Counts) -> float:
    """Observed index events less those expected with no effect, rounded once from the exact fraction."""
    return (t.index_events * t.reference_total - t.reference_events * t.index_total) / t.total
