"""What follows from several strata: each of them, all thrown together, and pooled."""

from __future__ import annotations

from dataclasses import replace

from fourcount.appraisal.carrying.carry import marks_of
from fourcount.appraisal.carrying.studies import study_of_strata
from fourcount.appraisal.case import Case
from fourcount.appraisal.clusters import ReadClusters, clusters_of
from fourcount.appraisal.extras.of_ratio import extras_of_ratio
from fourcount.appraisal.extras.printed import ReadEffect, adjusted_of
from fourcount.appraisal.findings import (
    MEASURES,
    Counts,
    Extras,
    Figure,
    Gap,
    OutcomeFindings,
    StrataFindings,
    StratumFindings,
)
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import Measure, for_the_reader, given_or_why, whole
from fourcount.appraisal.gating import Support, support_of
from fourcount.appraisal.measures import Table, all_figures, measures, number_needed_from, own_test
from fourcount.appraisal.pooling import cmh, homogeneity, interactions, parting, pooled_figures
from fourcount.appraisal.postponing import NOTHING, Pace, postponed
from fourcount.appraisal.reach import within_everybody
from fourcount.appraisal.table import oriented, totals_of
from fourcount.record.entry.readings import GroupCounts, StratumReading, TableReading
from fourcount.record.entry.starts import read_start
from fourcount.record.entry.strata import read_strata
from fourcount.record.outcome import Outcome, Strata
from fourcount.record.paper import Choices

WITHIN = ("risk_index", "risk_reference", "risk_difference", "risk_ratio", "odds_ratio")
"""The measures of a single stratum."""


def appraise_strata(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:
    """Crude measures of all strata together beside the pooled ones; blank rows are left out.

    The number needed is that of the pooled difference: the crude one may point the other way.
    """
    readings = read_strata(outcome.table) if isinstance(outcome.table, Strata) else ()
    typed, clusters, adjusted = read_start(outcome.patient), clusters_of(outcome), adjusted_of(outcome)
    marks = tuple(mark for reading in readings for mark in reading.marks)
    marks += marks_of(outcome, typed) + clusters.marks + adjusted.marks
    used = [reading for reading in readings if not reading.blank]
    labels = [reading.label or str(place + 1) for place, reading in enumerate(readings) if not reading.blank]
    totals = totals_of(_summed(used))
    strata = _all_counts(used, outcome)
    if isinstance(strata, Gap):
        return nothing_yet(strata, form="strata", measures=MEASURES, totals=totals, marks=marks)
    counts, support = _together(strata), support_of(outcome)
    later = postponed(counts, choices, pace.loaded) if pace.deferring else NOTHING
    table = Table(counts=counts, choices=choices, postponed=later, behind=clusters.elsewhere)
    crude = all_figures(table, support)
    parts = _strata(strata, labels, table, crude, support, clusters.elsewhere)
    pooled = {} if isinstance(parts, Gap) else _given(parts)
    study = study_of_strata(outcome, pooled, support, adjusted, choices.level)
    shown = _measures(crude, parts, support, outcome)
    case = Case(
        outcome=outcome,
        form="strata",
        given=counts,
        choices=choices,
        figures={**crude, **pooled},
        test=Gap(support.refused) if support.refused else own_test(table),
        reader=for_the_reader(study, typed, {**shown, **pooled}, choices.level),
        marks=marks,
        extras=_extras(pooled, outcome, counts, adjusted, clusters),
        strata=parts,
    )
    return whole(case, shown, totals)


def _measures(
    crude: dict[str, Figure], strata: StrataFindings | Gap, support: Support, outcome: Outcome
) -> dict[str, Measure]:
    found = measures(crude, support, welcome=outcome.welcome)
    if isinstance(found["number_needed"], Gap) or isinstance(strata, Gap):
        return found
    pooled = strata.pooled["pooled_risk_difference"]
    if isinstance(pooled, Gap):
        return {**found, "number_needed": pooled}
    needed = number_needed_from(within_everybody(pooled), welcome=outcome.welcome)
    return {**found, "number_needed": needed}


def _extras(
    pooled: dict[str, Figure], outcome: Outcome, counts: Counts, adjusted: ReadEffect, clusters: ReadClusters
) -> Extras:
    """Those of the pooled ratio that the design gives: the strata have dealt with what they are strata of."""
    measure = "odds_ratio" if outcome.design == "case-control" else "risk_ratio"
    ratio = pooled.get(f"pooled_{measure}")
    return extras_of_ratio(outcome, ratio, measure, adjusted, clusters=clusters.clusters, counts=counts)


def _all_counts(readings: list[StratumReading], outcome: Outcome) -> tuple[Counts, ...] | Gap:
    """The counts of every row; one that cannot be read outweighs one that is not whole yet."""
    found = [
        oriented(TableReading(first=reading.first, second=reading.second, marks=reading.marks), outcome)
        for reading in readings
    ]
    gaps = [one for one in found if isinstance(one, Gap)]
    if gaps or not found:
        return Gap("unreadable") if Gap("unreadable") in gaps else Gap("strata-not-typed")
    return tuple(one for one in found if isinstance(one, Counts))


def _together(strata: tuple[Counts, ...]) -> Counts:
    """All strata thrown together, as if they were one table."""
    return Counts(
        index_events=sum(one.index_events for one in strata),
        index_non_events=sum(one.index_non_events for one in strata),
        reference_events=sum(one.reference_events for one in strata),
        reference_non_events=sum(one.reference_non_events for one in strata),
    )


def _summed(readings: list[StratumReading]) -> TableReading:
    """The sums of the strata's counts in the print's order, as far as all are known."""
    first, second = ([getattr(reading, side) for reading in readings] for side in ("first", "second"))
    return TableReading(first=_sum_of(first), second=_sum_of(second))


def _sum_of(groups: list[GroupCounts]) -> GroupCounts:
    sums: dict[str, int | None] = {}
    for name in ("left", "right", "total"):
        values = [getattr(group, name) for group in groups]
        sums[name] = None if not values or any(value is None for value in values) else sum(values)
    return GroupCounts(**sums)


def _strata(
    strata: tuple[Counts, ...],
    labels: list[str],
    table: Table,
    crude: dict[str, Figure],
    support: Support,
    without: Gap | None,
) -> StrataFindings | Gap:
    if support.refused:
        return Gap(support.refused)
    pooled = pooled_figures(strata, table.choices.level, support, without=without)
    return StrataFindings(
        strata=tuple(
            StratumFindings(label=label, counts=counts, measures=_within(replace(table, counts=counts), support))
            for label, counts in zip(labels, strata, strict=True)
        ),
        pooled=pooled,
        test=cmh(strata, without=without),
        homogeneity=homogeneity(strata, without=without),
        parting=parting(crude, pooled),
        interactions=interactions(strata, table.choices.level, support, without=without),
    )


def _within(table: Table, support: Support) -> dict[str, Measure]:
    figures = all_figures(table, support, only=WITHIN)
    found: dict[str, Measure] = {}
    for key in WITHIN:
        figure = figures.get(key)
        found[key] = Gap(support.withheld[key]) if figure is None else given_or_why(figure)
    return found


def _given(strata: StrataFindings) -> dict[str, Figure]:
    return {key: figure for key, figure in strata.pooled.items() if isinstance(figure, Figure)}
