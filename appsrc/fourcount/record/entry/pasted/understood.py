"""One way to understand a block, and whether its percentages follow from its counts."""

from __future__ import annotations

import msgspec

from fourcount.record.entry.pasted.proportions import gives
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.tokens import Token
from fourcount.record.outcome import Form


class Understood(msgspec.Struct, frozen=True, kw_only=True):
    """One way to understand a block: the form, the two groups and how much speaks for it."""

    form: Form
    quantities: tuple[Quantity, Quantity]
    labels: tuple[str, str]
    left_heading: str = ""
    right_heading: str = ""
    unit: str = ""
    doubts: tuple[str, ...] = ()
    score: int = 0
    others: tuple[Token, ...] = ()


def agrees(quantity: Quantity, found: Understood) -> bool:
    """Whether a printed percentage is what the count gives of its group."""
    if quantity.percent is None or quantity.events is None:
        return True
    whole = quantity.total.whole if quantity.total else None
    if whole is None and found.others:
        other = found.others[[each.events for each in found.quantities].index(quantity.events)]
        whole = (quantity.events.whole or 0) + (other.whole or 0)
    return whole is None or gives(quantity.percent, quantity.events.whole or 0, whole)
