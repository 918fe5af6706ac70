"""Trials that allot clusters: what their intervals and tests are computed from."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings import Clusters, Gap, Mark
from fourcount.record.entry.clusters import read_clusters
from fourcount.record.outcome import Outcome
from fourcount.stats.clusters import design_effect, effective
from fourcount.stats.results import FractionalCounts


class ReadClusters(msgspec.Struct, frozen=True, kw_only=True):
    """The design effect, why it is not known, or None where no clusters are spoken of; and the marks of the fields."""

    clusters: Clusters | Gap | None
    marks: tuple[Mark, ...] = ()

    def behind(self, counts: FractionalCounts) -> FractionalCounts | Gap | None:
        """The counts behind intervals and tests, where they are not the table's own."""
        if self.clusters is None or isinstance(self.clusters, Gap):
            return self.clusters
        return None if self.clusters.design_effect == 1 else effective(counts, self.clusters.design_effect)

    @property
    def elsewhere(self) -> Gap | None:
        """Why a form without a correction for clusters has no intervals."""
        return None if self.clusters is None else Gap("clusters-not-here")


def clusters_of(outcome: Outcome) -> ReadClusters:
    """What the two fields about clusters say. One that cannot be read leaves the design effect unknown."""
    if not outcome.icc_text.strip() and not outcome.cluster_size_text.strip():
        return ReadClusters(clusters=None)
    reading = read_clusters(outcome)
    if reading.icc is None:
        return ReadClusters(clusters=Gap("cluster-without-icc"), marks=reading.marks)
    if reading.mean_size is None:
        return ReadClusters(clusters=Gap("cluster-size-missing"), marks=reading.marks)
    factor = design_effect(reading.mean_size, reading.icc)
    if isinstance(factor, Gap):
        return ReadClusters(clusters=factor, marks=reading.marks)
    clusters = Clusters(icc=reading.icc, mean_size=reading.mean_size, design_effect=factor)
    return ReadClusters(clusters=clusters, marks=reading.marks)
