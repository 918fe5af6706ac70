"""One row of a table, pasted inside a row of strata: it belongs into that row, and is no table of its own."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.record.characters import storable
from fourcount.record.editing.forms import in_form
from fourcount.record.entry.paste import read_paste
from fourcount.record.entry.readings import Pasted
from fourcount.record.outcome import CELLS, EventsAndOthers, EventsOfTotal, Outcome, Strata, Stratum

KEPT_DOUBTS = {"others-or-totals", "no-totals"}
"""What the strata themselves settle, or the row shows as it stands."""


def pasted_row(outcome: Outcome, field: str, text: str) -> Outcome | None:
    """The outcome with the row filled in which ``field`` stands; None where the text is no single row of counts.

    Bare numbers are what the strata hold, totals or others; a row that is printed in the other way is converted.
    """
    table = outcome.table
    if not isinstance(table, Strata) or not field.startswith("strata.") or len(text.strip().splitlines()) != 1:
        return None
    pasted = read_paste(text)
    if pasted is None or pasted.source != "block" or len(pasted.groups) != 2 or set(pasted.ambiguous) - KEPT_DOUBTS:
        return None
    if pasted.form not in ("events-of-total", "events-and-others"):
        return None
    cells = _cells(pasted, of_total=table.of_total)
    label = storable(pasted.left_heading or pasted.words)
    place = int(field.split(".")[1])
    row = Stratum(label_text=label or table.strata[place].label_text, **cells)
    strata = (*table.strata[:place], row, *table.strata[place + 1 :])
    return replace(outcome, table=replace(table, strata=strata))


def _cells(pasted: Pasted, *, of_total: bool) -> dict[str, str]:
    texts = [storable(text) for group in pasted.groups for text in (group.left_text, group.right_text)]
    cells = dict(zip(CELLS, texts, strict=True))
    if "others-or-totals" in pasted.ambiguous:
        return cells
    read = EventsOfTotal(**cells) if pasted.form == "events-of-total" else EventsAndOthers(**cells)
    turned = in_form(Outcome(table=read), "events-of-total" if of_total else "events-and-others").table
    return {name: getattr(turned, name) for name in CELLS}
