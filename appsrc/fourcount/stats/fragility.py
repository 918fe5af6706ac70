"""The fragility index: how few changed outcomes would take a p below the threshold up to it."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

from fourcount.stats.estimates import without_a_contrast
from fourcount.stats.fisher import fisher
from fourcount.stats.results import Counts, Gap

_TIE = 1.0 - 1e-9


@dataclass(frozen=True, kw_only=True, slots=True)
class FragilityIndex:
    """So many people of one group, changed from non-events to events, bring Fisher's two-sided p to the threshold."""

    changes: int
    group: Literal["index", "reference"]
    p_before: float
    p_after: float


def fragility(counts: Counts, threshold: float = 0.05) -> FragilityIndex | Gap:
    """The least number of events to add to the group with the lower risk, its size fixed, for p to reach the threshold.

    Source: Walsh and others 2014, J Clin Epidemiol 67:622.
    """
    gap = without_a_contrast(counts)
    if gap is not None:
        return gap
    index_lower = counts.index_events * counts.reference_total < counts.reference_events * counts.index_total
    before = _p(counts, 0, index_lower)
    if before >= threshold * _TIE:
        return Gap("fragility-not-below", {"p": before, "threshold": threshold})
    room = counts.index_non_events if index_lower else counts.reference_non_events
    for changes in range(1, room + 1):
        after = _p(counts, changes, index_lower)
        if after >= threshold * _TIE:
            group: Literal["index", "reference"] = "index" if index_lower else "reference"
            return FragilityIndex(changes=changes, group=group, p_before=before, p_after=after)
    return Gap("fragility-not-reached", {"room": room, "threshold": threshold})


def _p(counts: Counts, changes: int, index_lower: bool) -> float:
    index, reference = (changes, 0) if index_lower else (0, changes)
    p = fisher(
        Counts(
            index_events=counts.index_events + index,
            index_non_events=counts.index_non_events - index,
            reference_events=counts.reference_events + reference,
            reference_non_events=counts.reference_non_events - reference,
        )
    )
    return 1.0 if isinstance(p, Gap) else p
