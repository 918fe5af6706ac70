"""People randomised and lost, in the print's order."""

from __future__ import annotations

import msgspec

from fourcount.record.entry.amounts import marks_of_fields, read_amount, read_people
from fourcount.record.entry.readings import Mark
from fourcount.record.outcome import Outcome


class GroupLosses(msgspec.Struct, frozen=True, kw_only=True):
    """One group's people beside those of the table; None where a number is not known.

    ``ratio`` is how many times the risk of those followed the lost ones have in a scenario of the reader's own.
    """

    randomised: int | None = None
    lost: int | None = None
    ratio: float | None = None


class LossesReading(msgspec.Struct, frozen=True, kw_only=True):
    """Both groups in the print's order, and the marks of the fields."""

    first: GroupLosses
    second: GroupLosses
    marks: tuple[Mark, ...] = ()


def read_losses(outcome: Outcome) -> LossesReading:
    """What the six fields about losses hold."""
    people = {
        field: read_people(getattr(outcome, field))
        for field in ("first_randomised_text", "second_randomised_text", "first_lost_text", "second_lost_text")
    }
    ratios = {
        field: read_amount(getattr(outcome, field)) for field in ("first_loss_ratio_text", "second_loss_ratio_text")
    }
    count = {field: reading if isinstance(reading, int) else None for field, reading in people.items()}
    ratio = {field: reading if isinstance(reading, float) else None for field, reading in ratios.items()}
    first, second = (
        GroupLosses(
            randomised=count[f"{group}_randomised_text"],
            lost=count[f"{group}_lost_text"],
            ratio=ratio[f"{group}_loss_ratio_text"],
        )
        for group in ("first", "second")
    )
    return LossesReading(first=first, second=second, marks=marks_of_fields({**people, **ratios}))
