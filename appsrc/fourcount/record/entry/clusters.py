"""The intracluster correlation and the mean size of clusters."""

from __future__ import annotations

import msgspec

from fourcount.record.entry.amounts import marks_of_fields, read_amount
from fourcount.record.entry.digits import specimen
from fourcount.record.entry.readings import Mark, Unreadable
from fourcount.record.outcome import Outcome


class ClustersReading(msgspec.Struct, frozen=True, kw_only=True):
    """Both numbers, None where one is not typed or cannot be used, and the marks of the fields."""

    icc: float | None = None
    mean_size: float | None = None
    marks: tuple[Mark, ...] = ()


def read_clusters(outcome: Outcome) -> ClustersReading:
    """An intracluster correlation from 0 to 1 and a mean size of at least 1."""
    icc, size = read_amount(outcome.icc_text), read_amount(outcome.cluster_size_text)
    if isinstance(icc, float) and icc > 1:
        icc = Unreadable(key="icc-out-of-range", facts={"text": specimen(outcome.icc_text)})
    if isinstance(size, float) and size < 1:
        size = Unreadable(key="cluster-too-small", facts={"text": specimen(outcome.cluster_size_text)})
    return ClustersReading(
        icc=icc if isinstance(icc, float) else None,
        mean_size=size if isinstance(size, float) else None,
        marks=marks_of_fields({"icc_text": icc, "cluster_size_text": size}),
    )
