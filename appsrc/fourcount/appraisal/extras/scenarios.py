"""What the table would say if the people lost had fared in this way or that."""

from __future__ import annotations

from dataclasses import replace

from fourcount.appraisal.case import side_of
from fourcount.appraisal.clusters import ReadClusters
from fourcount.appraisal.findings import Counts, Gap, Losses, LossScenario
from fourcount.appraisal.losses import ReadLosses
from fourcount.appraisal.measures import Figures, Table, risk_difference, risk_ratio
from fourcount.stats.losses import SCENARIOS, Lost, Scenario, imputed


def loss_scenarios(
    counts: Counts, table: Table, figures: Figures, losses: ReadLosses, clusters: ReadClusters
) -> Losses | Gap | None:
    """Every scenario's risks, difference and ratio, and which of them tell something else about no effect.

    That of a ratio of risks is there only where the reader gave one.
    """
    lost = losses.lost
    if not isinstance(lost, Lost):
        return lost
    found: list[LossScenario] = []
    for key in SCENARIOS:
        if key == "ratio" and not losses.by_ratio:
            continue
        scenario = _scenario(table, counts, lost, clusters, key)
        if isinstance(scenario, Gap):
            return scenario
        found.append(scenario)
    own = side_of(figures["risk_difference"], 0.0)
    overturned = [scenario.key for scenario in found if _parts(own, side_of(scenario.difference, 0.0))]
    return Losses(
        index_lost=lost.index,
        reference_lost=lost.reference,
        index_ratio=lost.index_ratio,
        reference_ratio=lost.reference_ratio,
        scenarios=tuple(found),
        overturned=tuple(overturned),
    )


def _scenario(table: Table, counts: Counts, lost: Lost, clusters: ReadClusters, key: Scenario) -> LossScenario | Gap:
    put_back = imputed(counts, lost, key)
    if isinstance(put_back, Gap):
        return put_back
    there = replace(table, counts=put_back, behind=clusters.behind(put_back))
    return LossScenario(
        key=key,
        risk_index=put_back.index_events / put_back.index_total,
        risk_reference=put_back.reference_events / put_back.reference_total,
        difference=risk_difference(there),
        risk_ratio=risk_ratio(there),
    )


def _parts(own: int | None, scenario: int | None) -> bool:
    return own is not None and scenario is not None and own != scenario
