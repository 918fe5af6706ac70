"""The same table in another form of print, with all that can be carried over."""

from __future__ import annotations

from typing import TYPE_CHECKING

from msgspec.structs import replace

from fourcount.record.editing.texts import one_of
from fourcount.record.outcome import (
    CELLS,
    FORMS,
    PAIRED_DESIGNS,
    Design,
    EffectOnly,
    EventsAndOthers,
    EventsOfTotal,
    Form,
    Outcome,
    Pairs,
    PercentOfTotal,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
    Table,
)

if TYPE_CHECKING:
    from fourcount.record.entry.readings import GroupCounts

FOUR_COUNTS = (EventsAndOthers, EventsOfTotal, PercentOfTotal)
ROWS = (("first_left_text", "first_right_text"), ("second_left_text", "second_right_text"))

USUAL_UNIT = "person-years"
"""The unit of person-time that stands in its field until another one is typed."""

Cells = dict[str, str]

UNPAIRED: dict[Design, Design] = {"matched": "case-control", "paired": "trial", "before-after": "cohort"}
"""What a design of pairs is without its pairs: a crossover trial is a trial."""


def in_form(outcome: Outcome, form: Form) -> Outcome:
    """The same table in another form of print: ``38 · 374`` becomes ``38 of 412``, and back.

    A row whose two counts are known is converted: its left cell stays as typed where it can (a blank one is filled),
    its right cell gets the number that belongs there. Any other row keeps its text, to be read in the new form. Pairs
    leave their margins; no margins give pairs back. Choosing pairs makes the design one of pairs, and leaving them
    makes it one without. Person-time begins in person-years, and a lone effect that is not typed yet as an odds ratio,
    as its specimen does.
    """
    kind = FORMS[one_of(form, FORMS)]
    table = outcome.table
    if type(table) is kind:
        return outcome
    changed = replace(outcome, table=_table(table, kind), design=_design(outcome.design, form))
    if kind is PersonTime:
        return replace(changed, counted="left")
    if kind is EffectOnly and not outcome.paper_text.strip() and outcome.paper_measure == "risk_ratio":
        return replace(changed, paper_measure="odds_ratio")
    return changed


def _design(design: Design, form: Form) -> Design:
    if form == "pairs":
        return design if design in PAIRED_DESIGNS else "matched" if design == "case-control" else "paired"
    return design if form == "effect-only" else UNPAIRED.get(design, design)


def _table(table: Table, kind: type[Table]) -> Table:
    if issubclass(kind, EffectOnly) or isinstance(table, EffectOnly):
        return kind()
    if issubclass(kind, Strata):
        of_total = not isinstance(table, EventsAndOthers | Pairs)
        cells = _cells(table, EventsOfTotal if of_total else EventsAndOthers)
        return Strata(strata=(Stratum(**cells), Stratum()), of_total=of_total)
    if issubclass(kind, PersonTime):
        return PersonTime(**_cells(table, kind), unit_text=USUAL_UNIT)
    return kind(**_cells(table, kind))


def _cells(table: Table, kind: type[Table]) -> Cells:
    """The four texts of a table in another form."""
    if isinstance(table, Strata):
        table = _together(table)
    if isinstance(table, Pairs):
        table = _margins(table)
    if kind is Pairs:
        return _of_pairs(table)
    if kind is PersonTime:
        return {left: _events_alone(getattr(table, left)) for left, _ in ROWS if isinstance(table, FOUR_COUNTS)}
    if kind is RiskAtTime:
        return {left: getattr(table, left) for left, _ in ROWS if isinstance(table, PercentOfTotal)}
    if isinstance(table, PersonTime):
        return {left: _events_alone(getattr(table, left)) for left, _ in ROWS if kind is not PercentOfTotal}
    if isinstance(table, RiskAtTime):
        return {left: getattr(table, left) for left, _ in ROWS if kind is PercentOfTotal}
    return _counted(table, kind) if isinstance(table, FOUR_COUNTS) else {}


def _counted(table: EventsAndOthers | EventsOfTotal | PercentOfTotal, kind: type[Table]) -> Cells:
    """Counts in another form of four counts."""
    from fourcount.record.entry.table import read_table  # the window starts without the readers

    reading = read_table(table)
    cells = {field: getattr(table, field) for field in CELLS}
    for (left, right), counts in zip(ROWS, (reading.first, reading.second), strict=True):
        if counts.left is None or counts.right is None or counts.total is None:
            if isinstance(table, PercentOfTotal) or kind is PercentOfTotal:
                cells[left] = _kept_percent(cells[left], kind)
            continue
        cells[left] = _left(cells[left], counts, table, kind)
        cells[right] = str(counts.right if kind is EventsAndOthers else counts.total)
    return cells


def _left(text: str, counts: GroupCounts, table: Table, kind: type[Table]) -> str:
    """The left cell of a row whose counts are known."""
    from fourcount.record.entry.digits import plain
    from fourcount.record.entry.percent_of_total import holds_a_count, written_percent

    if counts.left is None or counts.total is None:
        return text
    if kind is PercentOfTotal:
        return text if holds_a_count(text) else written_percent(counts.left, counts.total)
    if isinstance(table, PercentOfTotal) and not holds_a_count(text):
        return str(counts.left)
    return text if plain(text) else str(counts.left)


def _kept_percent(text: str, kind: type[Table]) -> str:
    """A left cell that no total completes: a percentage is no count, nor a count a percentage."""
    from fourcount.record.entry.percent_of_total import holds_a_count

    return text if holds_a_count(text) or (kind is not PercentOfTotal and "%" in text) else ""


def _events_alone(text: str) -> str:
    """The events of a cell without the total or percentage beside them; text that gives no count as it is."""
    from fourcount.record.entry.cell import read_cell
    from fourcount.record.entry.readings import Count

    cell = read_cell(text)
    if not isinstance(cell, Count) or (cell.total is None and cell.percent_text is None):
        return text
    return str(cell.value)


def _of_pairs(table: Table) -> Cells:
    """Four counts that a reader typed before saying that they are of pairs.

    Two margins of the same pairs have one total, and do not tell how the pairs fell; so groups of one size leave
    nothing behind. Other four counts can only have been the table of pairs itself.
    """
    from fourcount.record.entry.table import read_table

    if not isinstance(table, EventsAndOthers):
        return {}
    reading = read_table(table)
    if reading.first.total is not None and reading.first.total == reading.second.total:
        return {}
    return {field: getattr(table, field) for field in CELLS}


def _margins(table: Pairs) -> EventsAndOthers:
    """How many had the left outcome on each side, and how many had not."""
    from fourcount.record.entry.pairs import read_pairs

    reading = read_pairs(table)
    counts = (reading.both, reading.first_only, reading.second_only, reading.neither)
    if any(count is None for count in counts):
        return EventsAndOthers(**{field: getattr(table, field) for field in CELLS})
    both, first_only, second_only, neither = (count or 0 for count in counts)
    margins = (both + first_only, second_only + neither, both + second_only, first_only + neither)
    return EventsAndOthers(**dict(zip(CELLS, map(str, margins), strict=True)))


def _together(table: Strata) -> EventsAndOthers | EventsOfTotal:
    """The only stratum as it was typed; several thrown together, where all can be read; else the first."""
    from fourcount.record.entry.strata import read_strata

    form = EventsOfTotal if table.of_total else EventsAndOthers
    used = [
        (stratum, reading)
        for stratum, reading in zip(table.strata, read_strata(table), strict=True)
        if any(getattr(stratum, field).strip() for field in CELLS)
    ]
    if not used:
        return form()
    sums = [0, 0, 0, 0]
    for _, reading in used:
        row = (reading.first.left, reading.first.right, reading.second.left, reading.second.right)
        if len(used) == 1 or any(count is None for count in row):
            return form(**{field: getattr(used[0][0], field) for field in CELLS})
        sums = [before + (count or 0) for before, count in zip(sums, row, strict=True)]
    if table.of_total:
        sums = [sums[0], sums[0] + sums[1], sums[2], sums[2] + sums[3]]
    return form(**dict(zip(CELLS, map(str, sums), strict=True)))
