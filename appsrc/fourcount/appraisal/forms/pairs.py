"""What follows from counts of pairs."""

from __future__ import annotations

from collections.abc import Callable

from fourcount.appraisal.carrying.carry import marks_of
from fourcount.appraisal.carrying.studies import study_of_pairs
from fourcount.appraisal.case import Case
from fourcount.appraisal.clusters import clusters_of
from fourcount.appraisal.extras.of_ratio import extras_of_ratio
from fourcount.appraisal.extras.printed import adjusted_of
from fourcount.appraisal.findings import (
    PAIR_MEASURES,
    Figure,
    Gap,
    OutcomeFindings,
    PairCounts,
    Totals,
)
from fourcount.appraisal.forms.by_method import ByMethod
from fourcount.appraisal.forms.nothing_yet import nothing_yet
from fourcount.appraisal.forms.whole import Measure, for_the_reader, given_or_why, whole
from fourcount.appraisal.gating import Withheld, withheld_of_pairs
from fourcount.appraisal.measures import number_needed_from
from fourcount.appraisal.postponing import NOTHING, PAIRS_NEED_NUMPY, Pace
from fourcount.appraisal.reach import within_everybody
from fourcount.record.entry.pairs import read_pairs
from fourcount.record.entry.readings import PairsReading
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import Outcome, Pairs
from fourcount.record.paper import Choices
from fourcount.stats import pairs as stats
from fourcount.stats.methods import PAIR_FAMILIES, PairFamily

NEEDS_ALL = ("pair_risk_index", "pair_risk_reference", "pair_difference", "number_needed")
"""The measures that are of all pairs; the ratio is of those with an event, the odds ratio of the discordant ones."""


def appraise_pairs(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:
    """The paired difference and ratio, the odds ratio of the discordant pairs, and McNemar's test.

    Where concordant pairs are not typed, what needs them is withheld and the odds ratio stands.
    """
    reading = read_pairs(outcome.table) if isinstance(outcome.table, Pairs) else PairsReading()
    clusters, adjusted, typed = clusters_of(outcome), adjusted_of(outcome), read_start(outcome.patient)
    marks = reading.marks + marks_of(outcome, typed) + clusters.marks + adjusted.marks
    totals = _totals(reading)
    lacking = _lacking(reading)
    if lacking is not None:
        return nothing_yet(lacking, form="pairs", measures=PAIR_MEASURES, totals=totals, marks=marks)
    pairs, unknown = _oriented(reading, outcome)
    withheld = {**unknown, **withheld_of_pairs(outcome)}
    family = PAIR_FAMILIES[choices.family]
    waiting = PAIRS_NEED_NUMPY if pace.without_numpy else NOTHING
    by = ByMethod(level=choices.level, without=clusters.elsewhere, waiting=waiting)
    figures = _figures(pairs, family, by, withheld)
    refused = withheld.get("pair_odds_ratio")
    measures = {key: _measure(key, figures, withheld, welcome=outcome.welcome) for key in PAIR_MEASURES}
    study = study_of_pairs(outcome, figures, withheld, adjusted, choices.level)
    case = Case(
        outcome=outcome,
        form="pairs",
        given=Gap("concordant-pairs-unknown") if unknown else pairs,
        choices=choices,
        figures=figures,
        test=Gap(refused) if refused else by.probability(family.test, pairs),
        reader=for_the_reader(study, typed, measures, choices.level),
        marks=marks,
        extras=extras_of_ratio(
            outcome, figures.get("pair_odds_ratio"), "odds_ratio", adjusted, clusters=clusters.clusters
        ),
    )
    return whole(case, measures, totals)


def _lacking(reading: PairsReading) -> Gap | None:
    """Why the pairs say nothing yet: a cell that cannot be used, or discordant pairs that are not there."""
    if any(not mark.used for mark in reading.marks):
        return Gap("unreadable")
    return Gap("pairs-not-typed") if reading.first_only is None or reading.second_only is None else None


def _oriented(reading: PairsReading, outcome: Outcome) -> tuple[PairCounts, dict[str, str]]:
    """The counts by index and reference side and the counted outcome; and which measures lack their pairs.

    With the other outcome counted, both become neither, and the pairs in which only the index side had the one are
    those in which only the reference side has the other.
    """
    both, neither = reading.both, reading.neither
    index_only, reference_only = reading.first_only or 0, reading.second_only or 0
    if outcome.index_group == "second":
        index_only, reference_only = reference_only, index_only
    if outcome.counted == "right":
        both, neither = neither, both
        index_only, reference_only = reference_only, index_only
    unknown = dict.fromkeys(NEEDS_ALL, "concordant-pairs-unknown") if both is None or neither is None else {}
    if both is None:
        unknown["pair_ratio"] = "concordant-pairs-unknown"
    pairs = PairCounts(both=both or 0, index_only=index_only, reference_only=reference_only, neither=neither or 0)
    return pairs, unknown


def _totals(reading: PairsReading) -> Totals:
    """The margins of the table of the first side by the second."""
    both, first_only, second_only, neither = reading.both, reading.first_only, reading.second_only, reading.neither
    first, second = _sum(both, first_only), _sum(second_only, neither)
    return Totals(
        first_left=both,
        first_right=first_only,
        second_left=second_only,
        second_right=neither,
        first=first,
        second=second,
        left=_sum(both, second_only),
        right=_sum(first_only, neither),
        everyone=_sum(first, second),
    )


def _figures(pairs: PairCounts, family: PairFamily, by: ByMethod, withheld: Withheld) -> dict[str, Figure]:
    index, reference, total = stats.index_events(pairs), stats.reference_events(pairs), pairs.total
    computed: dict[str, Callable[[], Figure]] = {
        "pair_risk_index": lambda: by.figure("pair_risk", family.risk, stats.risk_index(pairs), index, total),
        "pair_risk_reference": lambda: by.figure(
            "pair_risk", family.risk, stats.risk_reference(pairs), reference, total
        ),
        "pair_difference": lambda: by.figure("pair_difference", family.difference, stats.difference(pairs), pairs),
        "pair_ratio": lambda: by.figure("pair_ratio", family.ratio, stats.ratio(pairs), pairs),
        "pair_odds_ratio": lambda: by.figure("pair_odds_ratio", family.odds_ratio, stats.odds_ratio(pairs), pairs),
    }
    return {key: compute() for key, compute in computed.items() if key not in withheld}


def _measure(key: str, figures: dict[str, Figure], withheld: Withheld, *, welcome: bool) -> Measure:
    if key in withheld:
        return Gap(withheld[key])
    if key == "number_needed":
        return number_needed_from(within_everybody(figures["pair_difference"]), welcome=welcome)
    return given_or_why(figures[key])


def _sum(one: int | None, other: int | None) -> int | None:
    return None if one is None or other is None else one + other
