"""Both groups of a table, the reference group first, as every copy has them."""

from __future__ import annotations

from fourcount.appraisal.findings import Counts, Rates
from fourcount.wording.names import Group


def people(counts: Counts) -> tuple[tuple[Group, int, int], ...]:
    """Each group's events and its people."""
    return (
        ("reference", counts.reference_events, counts.reference_total),
        ("index", counts.index_events, counts.index_total),
    )


def person_time(rates: Rates) -> tuple[tuple[Group, int, float], ...]:
    """Each group's events and its person-time."""
    return (
        ("reference", rates.reference_events, rates.reference_time),
        ("index", rates.index_events, rates.index_time),
    )
