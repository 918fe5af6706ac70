"""What follows from events and person-time."""

from __future__ import annotations

from fourcount.appraisal.carrying.carry import marks_of
from fourcount.appraisal.carrying.studies import study_of_rates
from fourcount.appraisal.case import Case
from fourcount.appraisal.clusters import clusters_of
from fourcount.appraisal.extras.of_ratio import extras_of_ratio
from fourcount.appraisal.extras.printed import adjusted_of
from fourcount.appraisal.findings import (
    RATE_MEASURES,
    Figure,
    Gap,
    OutcomeFindings,
    Rates,
    Totals,
)
from fourcount.appraisal.forms.by_method import ByMethod
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import Measure, for_the_reader, given_or_why, whole
from fourcount.appraisal.gating import withheld_of_rates
from fourcount.appraisal.postponing import NOTHING, RATES_NEED_NUMPY, Pace
from fourcount.record.entry.person_time import read_person_time
from fourcount.record.entry.readings import GroupRate, PersonTimeReading
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import Outcome, PersonTime
from fourcount.record.paper import Choices
from fourcount.stats import rates as stats
from fourcount.stats.methods import RATE_FAMILIES, RateFamily


def appraise_rates(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:
    """Both rates, their difference and ratio. Person-time has events alone, so that nothing else can be counted."""
    table = outcome.table
    reading = read_person_time(table) if isinstance(table, PersonTime) else _BLANK
    clusters, adjusted, typed = clusters_of(outcome), adjusted_of(outcome), read_start(outcome.patient)
    marks = reading.marks + marks_of(outcome, typed) + clusters.marks + adjusted.marks
    totals = _totals(reading)
    rates = _rates(reading, outcome)
    if isinstance(rates, Gap):
        return nothing_yet(rates, form="person-time", measures=RATE_MEASURES, totals=totals, marks=marks)
    withheld = withheld_of_rates(outcome.design)
    family = RATE_FAMILIES[choices.family]
    waiting = RATES_NEED_NUMPY if pace.without_numpy else NOTHING
    by = ByMethod(level=choices.level, without=clusters.elsewhere, waiting=waiting)
    figures = {} if withheld else _figures(rates, family, by)
    refused = Gap(withheld["rate_ratio"]) if withheld else None
    study = study_of_rates(outcome, figures, withheld, adjusted, choices.level)
    measures: dict[str, Measure] = {
        key: Gap(withheld[key]) if key in withheld else given_or_why(figures[key]) for key in RATE_MEASURES
    }
    case = Case(
        outcome=outcome,
        form="person-time",
        given=rates,
        choices=choices,
        figures=figures,
        test=by.probability(family.test, rates) if refused is None else refused,
        reader=for_the_reader(study, typed, measures, choices.level),
        marks=marks,
        extras=extras_of_ratio(outcome, figures.get("rate_ratio"), "rate_ratio", adjusted, clusters=clusters.clusters),
    )
    return whole(case, measures, totals)


_BLANK = PersonTimeReading(first=GroupRate(), second=GroupRate())


def _rates(reading: PersonTimeReading, outcome: Outcome) -> Rates | Gap:
    if any(not mark.used for mark in reading.marks):
        return Gap("unreadable")
    first_is_index = outcome.index_group == "first"
    index, reference = (reading.first, reading.second) if first_is_index else (reading.second, reading.first)
    if index.events is None or index.time is None or reference.events is None or reference.time is None:
        return Gap("rates-not-typed")
    return Rates(
        index_events=index.events,
        index_time=index.time,
        reference_events=reference.events,
        reference_time=reference.time,
    )


def _totals(reading: PersonTimeReading) -> Totals:
    first, second = reading.first.events, reading.second.events
    left = None if first is None or second is None else first + second
    return Totals(first_left=first, second_left=second, left=left)


def _figures(rates: Rates, family: RateFamily, by: ByMethod) -> dict[str, Figure]:
    index, reference = (rates.index_events, rates.index_time), (rates.reference_events, rates.reference_time)
    return {
        "rate_index": by.figure("rate", family.rate, stats.rate(*index), *index),
        "rate_reference": by.figure("rate", family.rate, stats.rate(*reference), *reference),
        "rate_difference": by.figure("rate_difference", family.difference, stats.rate_difference(rates), rates),
        "rate_ratio": by.figure("rate_ratio", family.ratio, stats.rate_ratio(rates), rates),
    }
