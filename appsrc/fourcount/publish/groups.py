"""Both groups of a table, the index group first, as every copy has them and most tables do."""

from __future__ import annotations

from fourcount.appraisal.findings import Counts, Rates
from fourcount.wording.names import Group


def people(counts: Counts) -> tuple[tuple[Group, int, int], ...]:
    """Each group's events and its people."""
    return (
        ("index", counts.index_events, counts.index_total),
        ("reference", counts.reference_events, counts.reference_total),
    )


def person_time(rates: Rates) -> tuple[tuple[Group, int, float], ...]:
    """Each group's events and its person-time."""
    return (
        ("index", rates.index_events, rates.index_time),
        ("reference", rates.reference_events, rates.reference_time),
    )
