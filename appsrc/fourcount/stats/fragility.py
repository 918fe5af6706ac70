"""The fragility index: how few changed outcomes would take a p below the threshold up to it."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

from fourcount.stats.results import Counts, Gap
from fourcount.stats.score import mirrored


@dataclass(frozen=True, kw_only=True, slots=True)
class FragilityIndex:
    """So many people of one group, changed from non-events to events, bring Fisher's two-sided p to the threshold."""

    changes: int
    group: Literal["index", "reference"]
    p_before: float
    p_after: float


def fragility(counts: Counts, threshold: float = 0.05) -> FragilityIndex | Gap:
    """The least number of events to add to the group with the lower risk, its size fixed, for p to reach the threshold.

    A gap where p is not below the threshold to begin with. On the way to equal risks p passes through 1, so that
    any threshold up to 1 is reached before the group runs out. Source: Walsh and others 2014, J Clin Epidemiol 67:622.
    """
    from fourcount.stats.adding_events import AddingEvents
    from fourcount.stats.fisher import fisher

    before = fisher(counts)
    if isinstance(before, Gap):
        return before
    index_lower = counts.index_events * counts.reference_total < counts.reference_events * counts.index_total
    path = AddingEvents(counts if index_lower else mirrored(counts), threshold)
    if path.reaches(before):
        return Gap("fragility-not-below", {"p": before, "threshold": threshold})
    changes = path.first_reaching(0, path.to_equal_risks())
    if changes is None:
        return Gap("fragility-not-reached", {"threshold": threshold})
    group: Literal["index", "reference"] = "index" if index_lower else "reference"
    return FragilityIndex(changes=changes, group=group, p_before=before, p_after=path.p(changes))
