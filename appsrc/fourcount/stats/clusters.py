"""Trials that allot whole clusters of people, read from the counts of single people."""

from __future__ import annotations

from fourcount.stats.results import FractionalCounts, Gap


def design_effect(mean_size: float, icc: float) -> float | Gap:
    """How many times too many people a cluster trial seems to hold: 1 + (m - 1) ICC.

    ``mean_size`` is the clusters' mean size m, at least 1; ``icc``, the intracluster correlation, lies from 0 to 1.
    Source: Cochrane Handbook 23.1.4.
    """
    if not 0.0 <= icc <= 1.0:
        return Gap("icc-out-of-range", {"icc": icc})
    if not 1.0 <= mean_size < float("inf"):
        return Gap("cluster-below-one", {"mean_size": mean_size})
    return 1.0 + (mean_size - 1.0) * icc


def effective(counts: FractionalCounts, design_effect: float) -> FractionalCounts:
    """The counts divided by the design effect: risks stay, intervals and p become those of so many single people.

    A design effect of 1 gives the counts as they are. Source: Cochrane Handbook 23.1.4.
    """
    if design_effect == 1.0:
        return counts
    return FractionalCounts(
        index_events=counts.index_events / design_effect,
        index_non_events=counts.index_non_events / design_effect,
        reference_events=counts.reference_events / design_effect,
        reference_non_events=counts.reference_non_events / design_effect,
    )
