"""Rows of strata: one more, one less, and in which form all of them stand."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.record.editing.forms import in_form
from fourcount.record.editing.texts import one_of
from fourcount.record.outcome import CELLS, EventsAndOthers, EventsOfTotal, Outcome, Strata, Stratum

MOST_STRATA = 50
"""No record holds more."""


def add_stratum(outcome: Outcome) -> Outcome:
    """One more empty row at the end, up to fifty; in any other form nothing happens."""
    table = outcome.table
    if not isinstance(table, Strata) or len(table.strata) >= MOST_STRATA:
        return outcome
    return replace(outcome, table=replace(table, strata=(*table.strata, Stratum())))


def remove_stratum(outcome: Outcome, place: int) -> Outcome:
    """Take out the row at a place, counted from 0; the last one that is left is only emptied."""
    table = outcome.table
    if not isinstance(table, Strata):
        return outcome
    one_of(str(place), {str(there) for there in range(len(table.strata))})
    left = (*table.strata[:place], *table.strata[place + 1 :])
    return replace(outcome, table=replace(table, strata=left or (Stratum(),)))


def with_of_total(outcome: Outcome, of_total: bool) -> Outcome:
    """Each row as ``38 of 412`` or as ``38 · 374``; rows whose counts are known are converted."""
    table = outcome.table
    if not isinstance(table, Strata) or table.of_total == bool(of_total):
        return outcome
    strata = tuple(_turned(stratum, of_total=bool(of_total)) for stratum in table.strata)
    return replace(outcome, table=replace(table, strata=strata, of_total=bool(of_total)))


def _turned(stratum: Stratum, *, of_total: bool) -> Stratum:
    cells = {field: getattr(stratum, field) for field in CELLS}
    row = EventsAndOthers(**cells) if of_total else EventsOfTotal(**cells)
    turned = in_form(Outcome(table=row), "events-of-total" if of_total else "events-and-others").table
    return replace(stratum, **{field: getattr(turned, field) for field in CELLS})
