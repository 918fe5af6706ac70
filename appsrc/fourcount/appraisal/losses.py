"""People randomised and lost, turned to index and reference group and set beside the table."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings import Counts, Gap, Mark
from fourcount.record.entry.losses import GroupLosses, read_losses
from fourcount.record.outcome import Outcome
from fourcount.stats.losses import Lost


class Randomised(msgspec.Struct, frozen=True, kw_only=True):
    """One group whose people randomised are not those of the table and those lost together."""

    group: str
    label: str
    randomised: int
    analysed: int
    lost: int | None


class ReadLosses(msgspec.Struct, frozen=True, kw_only=True):
    """How many were lost, why that is not known, or None where nobody speaks of it.

    ``by_ratio`` says that the reader gave a ratio of risks; ``randomised`` lists the groups that do not add up.
    """

    lost: Lost | Gap | None
    by_ratio: bool = False
    randomised: tuple[Randomised, ...] = ()
    marks: tuple[Mark, ...] = ()

    @property
    def number(self) -> int | None:
        """Everybody lost, where that is known."""
        return self.lost.index + self.lost.reference if isinstance(self.lost, Lost) else None


_FIELDS = tuple(
    f"{group}_{what}_text" for group in ("first", "second") for what in ("randomised", "lost", "loss_ratio")
)


def losses_of(outcome: Outcome, counts: Counts | Gap) -> ReadLosses:
    """What the fields about losses say. Without a number lost, those randomised and not in the table are taken."""
    if not any(getattr(outcome, field).strip() for field in _FIELDS):
        return ReadLosses(lost=None)
    reading = read_losses(outcome)
    first_is_index = outcome.index_group == "first"
    index, reference = (reading.first, reading.second) if first_is_index else (reading.second, reading.first)
    if isinstance(counts, Gap):
        return ReadLosses(lost=None, marks=reading.marks)
    totals = (counts.index_total, counts.reference_total)
    labels = (outcome.index_label_text, outcome.reference_label_text)
    odd = tuple(
        Randomised(
            group=name, label=" ".join(label.split()), randomised=group.randomised, analysed=total, lost=group.lost
        )
        for name, group, total, label in zip(("index", "reference"), (index, reference), totals, labels, strict=True)
        if group.randomised is not None and _odd(group, group.randomised, total)
    )
    lost = Gap("losses-unreadable") if reading.marks else _lost(index, reference, totals)
    by_ratio = index.ratio is not None or reference.ratio is not None
    return ReadLosses(lost=lost, by_ratio=by_ratio, randomised=odd, marks=reading.marks)


def _odd(group: GroupLosses, randomised: int, total: int) -> bool:
    """Whether people are missing who are not said to be lost, or there are more than were randomised."""
    return total > randomised if group.lost is None else total + group.lost != randomised


def _lost(index: GroupLosses, reference: GroupLosses, totals: tuple[int, int]) -> Lost | Gap:
    known = [_number(group, total) for group, total in zip((index, reference), totals, strict=True)]
    if known[0] is None or known[1] is None:
        return Gap("losses-of-one-group")
    if known == [0, 0]:
        return Gap("no-losses")
    ratios = [1.0 if group.ratio is None else group.ratio for group in (index, reference)]
    return Lost(index=known[0], reference=known[1], index_ratio=ratios[0], reference_ratio=ratios[1])


def _number(group: GroupLosses, total: int) -> int | None:
    if group.lost is not None:
        return group.lost
    return None if group.randomised is None or group.randomised < total else group.randomised - total
