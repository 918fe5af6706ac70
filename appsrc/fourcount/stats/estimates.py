"""The estimates of a table: what is printed before the interval."""

from __future__ import annotations

import math

from fourcount.stats.results import FractionalCounts, Gap


def without_people(counts: FractionalCounts) -> Gap | None:
    """The gap of a table in which a group is empty; None where both groups have somebody.

    An empty group says nothing about its risk, so no comparison and no interval is given, by any method.
    """
    if counts.total == 0:
        return Gap("empty-table")
    if counts.index_total == 0:
        return Gap("empty-index-group")
    if counts.reference_total == 0:
        return Gap("empty-reference-group")
    return None


def without_a_contrast(counts: FractionalCounts) -> Gap | None:
    """The gap of a table in which a group or a column is empty; None where there is something to test.

    Where nobody, or everybody, had the event, no other table has the same margins: a test would compare nothing.
    """
    gap = without_people(counts)
    if gap is None and counts.events == 0:
        return Gap("no-events")
    if gap is None and counts.non_events == 0:
        return Gap("no-non-events")
    return gap


def risk(events: float, total: float) -> float | Gap:
    """The fraction of a group that had the event."""
    return events / total if total else Gap("empty-group")


def odds(events: float, total: float) -> float | Gap:
    """Events for each non-event; ``inf`` where everybody had the event."""
    if total == 0:
        return Gap("empty-group")
    return events / (total - events) if events < total else math.inf


def risk_difference(counts: FractionalCounts) -> float | Gap:
    """The index group's risk minus the reference group's."""
    gap = without_people(counts)
    return difference_of_risks(counts) if gap is None else gap


def difference_of_risks(counts: FractionalCounts) -> float:
    """The risk difference of two groups with somebody in each, rounded once from the exact fraction."""
    across = counts.index_events * counts.reference_total - counts.reference_events * counts.index_total
    return across / (counts.index_total * counts.reference_total)


def risk_ratio(counts: FractionalCounts) -> float | Gap:
    """The index group's risk over the reference group's; ``inf`` where only the reference group has no event."""
    gap = without_people(counts)
    if gap is not None:
        return gap
    if counts.events == 0:
        return Gap("no-events")
    if counts.reference_events == 0:
        return math.inf
    return (counts.index_events * counts.reference_total) / (counts.reference_events * counts.index_total)


def odds_ratio(counts: FractionalCounts) -> float | Gap:
    """The sample odds ratio ad/bc; ``inf`` where only bc is 0."""
    gap = without_a_contrast(counts)
    if gap is not None:
        return gap
    across = counts.index_non_events * counts.reference_events
    return (counts.index_events * counts.reference_non_events) / across if across else math.inf
