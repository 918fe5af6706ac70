"""What a table would say if the people lost to follow-up had fared in this way or that.

The risk of a group becomes (events + lost x min(1, k x events/followed)) / (followed + lost), with fractions of
people kept. Intervals of such a table treat the imputed people as if they had been seen, so they are too narrow.
Source: Akl and others 2012, BMJ 344:e2809.
"""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Literal

from fourcount.stats.estimates import without_people
from fourcount.stats.results import Counts, FractionalCounts, Gap

Scenario = Literal["none", "all", "worst", "best", "ratio"]

SCENARIOS: tuple[Scenario, ...] = ("none", "all", "worst", "best", "ratio")
"""``none``: nobody lost had the event; ``all``: everybody; ``worst``: all of one group and none of the other, against
the observed direction; ``best``: the opposite; ``ratio``: the lost had k times the risk of those followed."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Lost:
    """The people lost in each group, and the ratio k of their risk to that of those followed, 0 or more."""

    index: int
    reference: int
    index_ratio: float = 1.0
    reference_ratio: float = 1.0


def imputed(counts: Counts, lost: Lost, scenario: Scenario) -> FractionalCounts | Gap:
    """The table with the people lost put back as the scenario says; whole ``Counts`` but for ``ratio``.

    The worst case sets all against none so that the observed difference shrinks or turns, whichever column is counted.
    Where the observed risks are equal there is no direction to go against: there the worst case is the split that
    parts the risks farthest, since that upsets "no difference" most, and if both part them alike, the one in which
    the index group fares as if all its lost had the event. A group without anybody followed is a gap.
    """
    gap = without_people(counts)
    if gap is not None:
        return gap
    if scenario == "ratio":
        return _by_ratio(counts, lost) if _usable(lost) else Gap("loss-ratio-out-of-range")
    index_all, reference_all = _who(counts, lost, scenario)
    return _put_back(counts, lost, lost.index if index_all else 0, lost.reference if reference_all else 0)


def _who(counts: Counts, lost: Lost, scenario: Scenario) -> tuple[bool, bool]:
    """Whether all the lost of the index group, and of the reference group, had the event."""
    if scenario in ("none", "all"):
        return scenario == "all", scenario == "all"
    index_all_is_worst = _index_all_is_worst(counts, lost)
    index_all = index_all_is_worst if scenario == "worst" else not index_all_is_worst
    return index_all, not index_all


def _index_all_is_worst(counts: Counts, lost: Lost) -> bool:
    across = _across(counts)
    if across != 0:
        return across < 0
    upwards = _put_back(counts, lost, lost.index, 0)
    downwards = _put_back(counts, lost, 0, lost.reference)
    return abs(_across(upwards)) >= abs(_across(downwards))


def _across(counts: Counts) -> int:
    """The risk difference times both totals: its sign without rounding."""
    return counts.index_events * counts.reference_total - counts.reference_events * counts.index_total


def _put_back(counts: Counts, lost: Lost, index_events: int, reference_events: int) -> Counts:
    return Counts(
        index_events=counts.index_events + index_events,
        index_non_events=counts.index_non_events + lost.index - index_events,
        reference_events=counts.reference_events + reference_events,
        reference_non_events=counts.reference_non_events + lost.reference - reference_events,
    )


def _usable(lost: Lost) -> bool:
    return all(0.0 <= ratio < math.inf for ratio in (lost.index_ratio, lost.reference_ratio))


def _by_ratio(counts: Counts, lost: Lost) -> FractionalCounts:
    index = lost.index * min(1.0, lost.index_ratio * counts.index_events / counts.index_total)
    reference = lost.reference * min(1.0, lost.reference_ratio * counts.reference_events / counts.reference_total)
    return FractionalCounts(
        index_events=counts.index_events + index,
        index_non_events=counts.index_non_events + (lost.index - index),
        reference_events=counts.reference_events + reference,
        reference_non_events=counts.reference_non_events + (lost.reference - reference),
    )
