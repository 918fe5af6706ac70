"""What stands under the fold of four counts."""

from __future__ import annotations

from msgspec import structs

from fourcount.appraisal.clusters import ReadClusters
from fourcount.appraisal.extras.attributable import of_population
from fourcount.appraisal.extras.of_ratio import extras_of_ratio
from fourcount.appraisal.extras.printed import ReadEffect
from fourcount.appraisal.extras.scenarios import loss_scenarios
from fourcount.appraisal.findings import Counts, Extras, Fragility, Gap
from fourcount.appraisal.losses import ReadLosses
from fourcount.appraisal.measures import Figures, Table
from fourcount.appraisal.postponing import Pace
from fourcount.record.outcome import Outcome
from fourcount.stats.fragility import fragility
from fourcount.stats.methods import slow

FOLLOWED = ("trial", "cohort")
"""The designs that follow people, and so can lose them."""


def extras_of_counts(
    outcome: Outcome,
    counts: Counts,
    table: Table,
    figures: Figures,
    clusters: ReadClusters,
    losses: ReadLosses,
    adjusted: ReadEffect,
    pace: Pace,
) -> Extras:
    """E-value outside trials, fragility in them, losses in both kinds that follow people, fractions of a cohort."""
    measure = "risk_ratio" if "risk_ratio" in figures else "odds_ratio"
    ratio = figures.get(measure)
    beside = extras_of_ratio(outcome, ratio, measure, adjusted, clusters=clusters.clusters, counts=counts)
    if ratio is None:
        return beside
    design, level = outcome.design, table.choices.level
    return structs.replace(
        beside,
        fragility=_fragility(counts, clusters, losses, pace) if design == "trial" else None,
        losses=loss_scenarios(counts, table, figures, losses, clusters) if design in FOLLOWED else None,
        attributable_population=of_population(counts, table.effective, level) if design == "cohort" else None,
    )


def _fragility(counts: Counts, clusters: ReadClusters, losses: ReadLosses, pace: Pace) -> Fragility | Gap:
    """Of whole people who were allotted one by one."""
    if clusters.clusters is not None:
        return Gap("clusters-not-here")
    if pace.without_numpy or (pace.deferring and slow(counts, "exact")):
        return Gap("follows")
    found = fragility(counts)
    if isinstance(found, Gap):
        return found
    return Fragility(
        changes=found.changes,
        group=found.group,
        p_before=found.p_before,
        p_after=found.p_after,
        lost=losses.number,
    )
