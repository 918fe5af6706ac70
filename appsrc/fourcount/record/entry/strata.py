"""Several tables of one outcome, each read like a table of its own."""

from __future__ import annotations

from fourcount.record.entry.readings import Mark, StratumReading
from fourcount.record.entry.table import read_table
from fourcount.record.outcome import CELLS, EventsAndOthers, EventsOfTotal, Strata


def read_strata(table: Strata) -> tuple[StratumReading, ...]:
    """Every row in the print's order, blank ones included; a mark's field names the row by its place."""
    form = EventsOfTotal if table.of_total else EventsAndOthers
    readings = []
    for place, stratum in enumerate(table.strata):
        reading = read_table(form(**{field: getattr(stratum, field) for field in CELLS}))
        marks = tuple(
            Mark(field=f"strata.{place}.{mark.field}", key=mark.key, facts=mark.facts, used=mark.used)
            for mark in reading.marks
        )
        label = " ".join(stratum.label_text.split())
        readings.append(StratumReading(label=label, first=reading.first, second=reading.second, marks=marks))
    return tuple(readings)
