"""What a sentence tells of one group, as the text of its two cells."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.record.entry.pasted.proportions import beside, gives
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.readings import PastedGroup
from fourcount.record.entry.tokens import Token
from fourcount.record.outcome import Form


def form_of(pair: Sequence[Quantity]) -> Form:
    if pair[0].time is not None:
        return "person-time"
    if pair[0].events is not None:
        return "events-of-total"
    return "risk-at-time" if pair[0].low is not None else "percent-of-total"


def of_own_total(quantity: Quantity) -> bool:
    """Whether a count follows its own total, "Of 412 patients with lamps, 38 ..."."""
    events, total = quantity.events, quantity.total
    return events is not None and total is not None and total.end < events.start and quantity.percent is None


def agrees(quantity: Quantity) -> bool:
    events, total = quantity.events, quantity.total
    if quantity.percent is None or events is None or total is None:
        return True
    return gives(quantity.percent, events.whole or 0, total.whole or 0)


def pasted_group(form: Form, quantity: Quantity, label: str) -> PastedGroup:
    """A group's two cells; a percentage stays beside its count only where the count does not give it."""
    part = quantity.events or quantity.percent
    left = part.text if part else ""
    if form in ("percent-of-total", "risk-at-time"):
        left += "%"
    elif quantity.percent is not None and not agrees(quantity):
        left = beside(left, quantity.percent)
    if form == "risk-at-time" and quantity.low and quantity.high:
        right = f"{quantity.low.text} to {quantity.high.text}%"
    else:
        whole: Token | None = quantity.time or quantity.total
        right = whole.text if whole else ""
    return PastedGroup(left_text=left, right_text=right, label=label)
