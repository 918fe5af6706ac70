"""What stands under the fold of four counts."""

from __future__ import annotations

from fourcount.appraisal.clusters import ReadClusters
from fourcount.appraisal.extras.attributable import of_exposed, of_population
from fourcount.appraisal.extras.e_values import COMMON, E_VALUE_MEASURES, OBSERVATIONAL, e_values
from fourcount.appraisal.extras.printed import ReadEffect, as_figure
from fourcount.appraisal.extras.scenarios import loss_scenarios
from fourcount.appraisal.findings import Counts, EValues, Extras, Fragility, Gap
from fourcount.appraisal.gating import Support
from fourcount.appraisal.losses import ReadLosses
from fourcount.appraisal.measures import Figures, Table
from fourcount.appraisal.postponing import Pace
from fourcount.appraisal.starting_risk import typed_risk
from fourcount.record.entry.readings import Proportion
from fourcount.record.outcome import Outcome
from fourcount.stats.fragility import fragility
from fourcount.stats.methods import slow

FOLLOWED = ("trial", "cohort")
"""The designs that follow people, and so can lose them."""


def extras_of_counts(
    outcome: Outcome,
    table: Table,
    figures: Figures,
    support: Support,
    clusters: ReadClusters,
    losses: ReadLosses,
    adjusted: ReadEffect,
    pace: Pace,
) -> Extras:
    """E-value outside trials, fragility in them, losses in both kinds that follow people, fractions of a cohort."""
    if support.refused:
        return Extras(clusters=clusters.clusters, adjusted=adjusted.figure)
    design, cohort = outcome.design, outcome.design == "cohort"
    counts = table.counts
    return Extras(
        e_value=_e_value(outcome, figures, adjusted, counts) if design in OBSERVATIONAL else None,
        fragility=_fragility(counts, clusters, losses, pace) if design == "trial" else None,
        losses=loss_scenarios(table, figures, losses, clusters) if design in FOLLOWED else None,
        attributable_exposed=of_exposed(figures["risk_ratio"]) if cohort else None,
        attributable_population=of_population(counts, table.effective, table.choices.level) if cohort else None,
        clusters=clusters.clusters,
        adjusted=adjusted.figure,
    )


def _e_value(outcome: Outcome, figures: Figures, adjusted: ReadEffect, counts: object) -> EValues | Gap:
    """Of the printed adjusted ratio where there is one, which has dealt with some confounding; else of the table's."""
    common = outcome_is_common(outcome, counts)
    printed = adjusted.figure
    if printed is not None and printed.measure in E_VALUE_MEASURES:
        return e_values(as_figure(printed), printed.measure, common=common, adjusted=True)
    measure = "risk_ratio" if "risk_ratio" in figures else "odds_ratio"
    return e_values(figures[measure], measure, common=common)


def outcome_is_common(outcome: Outcome, counts: object) -> bool:
    """Whether over 15% have the event: of the table's people; of a case-control study's by a typed starting risk."""
    if outcome.design in ("case-control", "matched") or not isinstance(counts, Counts):
        typed = typed_risk(outcome)
        return isinstance(typed, Proportion) and typed.value > COMMON
    return counts.total > 0 and counts.events / counts.total > COMMON


def _fragility(counts: object, clusters: ReadClusters, losses: ReadLosses, pace: Pace) -> Fragility | Gap | None:
    """Of whole people who were allotted one by one."""
    if not isinstance(counts, Counts):
        return None
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
