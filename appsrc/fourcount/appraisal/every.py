"""Every method of every measure, whatever the chosen family: for the working and for other programs."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any

from fourcount.appraisal.clusters import ReadClusters, clusters_of
from fourcount.appraisal.discordant import pairs_as_typed
from fourcount.appraisal.findings import (
    Counts,
    Gap,
    Interval,
    OutcomeFindings,
    PairCounts,
    Rates,
    StrataFindings,
    TimedRisks,
)
from fourcount.appraisal.gating import (
    Withheld,
    support_of,
    withheld_of_pairs,
    withheld_of_rates,
    withheld_of_timed,
)
from fourcount.record.outcome import Outcome
from fourcount.stats import pairs as pair_counts
from fourcount.stats.entries.entry import Method, Test
from fourcount.stats.methods import (
    METHODS,
    PAIR_METHODS,
    PAIR_TESTS,
    RATE_METHODS,
    RATE_TESTS,
    STRATA_METHODS,
    STRATA_TESTS,
    TESTS,
    TIMED_METHODS,
)
from fourcount.stats.results import FractionalCounts

Intervals = dict[str, Interval | Gap]
Arguments = Mapping[str, tuple[str, tuple[Any, ...]]]
"""By measure: the measure of its methods in the table of methods, and what they take before the level."""

_RISKS = tuple(method for method in METHODS if method.measure == "risk")


def every_interval(outcome: Outcome, findings: OutcomeFindings, level: float) -> dict[str, Intervals]:
    """The interval of each method by measure and by the method's key, whatever the form of print.

    A measure that the design withholds is a Gap, and so is every interval where clusters leave none. Printed risks
    keep the level of their limits. An effect alone, and a table that is not whole, have no methods.
    """
    given, clusters = findings.given, clusters_of(outcome)
    if isinstance(given, Counts):
        behind, without = _behind(given, clusters)
        if findings.form == "strata":
            behind, without = given, clusters.elsewhere
        withheld = support_of(outcome).withheld
        crude = _every(METHODS, _of_counts(behind), withheld, level, without)
        return {**crude, **_pooled(findings, withheld, level, without)}
    pairs = pairs_as_typed(outcome, findings)
    if pairs is not None:
        withheld = {**_lacking_pairs(findings), **withheld_of_pairs(outcome)}
        return _every((*_RISKS, *PAIR_METHODS), _of_pairs(pairs), withheld, level, clusters.elsewhere)
    if isinstance(given, Rates):
        return _every(RATE_METHODS, _of_rates(given), withheld_of_rates(outcome.design), level, clusters.elsewhere)
    if isinstance(given, TimedRisks):
        return _every(TIMED_METHODS, _of_timed(given), withheld_of_timed(outcome.design), given.level, None)
    return {}


def every_p(outcome: Outcome, findings: OutcomeFindings) -> dict[str, float | Gap]:
    """The two-sided p of each test of the form, by the test's key; those of strata are of all of them."""
    given, clusters = findings.given, clusters_of(outcome)
    if isinstance(findings.test, Gap):
        return {}
    if isinstance(findings.strata, StrataFindings):
        counts = tuple(stratum.counts for stratum in findings.strata.strata)
        return _every_test(STRATA_TESTS, counts, clusters.elsewhere)
    if isinstance(given, Counts):
        return _every_test(TESTS, *_behind(given, clusters))
    pairs = pairs_as_typed(outcome, findings)
    if pairs is not None:
        return _every_test(PAIR_TESTS, pairs, clusters.elsewhere)
    return _every_test(RATE_TESTS, given, clusters.elsewhere) if isinstance(given, Rates) else {}


def _behind(counts: Counts, clusters: ReadClusters) -> tuple[FractionalCounts, Gap | None]:
    """The counts that methods take, divided by a design effect where there is one, or why they give nothing."""
    behind = clusters.behind(counts)
    if isinstance(behind, Gap):
        return counts, behind
    return (counts if behind is None else behind), None


def conditional_odds_ratio(counts: Counts) -> float | Gap:
    """The odds ratio most likely given both margins (conditional maximum likelihood)."""
    from fourcount.stats.conditional import conditional_odds_ratio as estimate  # loads numpy

    return estimate(counts)


def _every(
    methods: tuple[Method, ...], arguments: Arguments, withheld: Withheld, level: float, without: Gap | None
) -> dict[str, Intervals]:
    return {
        measure: {
            method.key: _interval(method, values, withheld.get(measure), level, without)
            for method in methods
            if method.measure == kind
        }
        for measure, (kind, values) in arguments.items()
    }


def _interval(
    method: Method, values: tuple[Any, ...], withheld: str | None, level: float, without: Gap | None
) -> Interval | Gap:
    if withheld is not None:
        return Gap(withheld)
    if without is not None:
        return without
    interval = method.interval(*values, level)
    return Gap("cluster-no-exact") if isinstance(interval, Gap) and interval.key == "not-whole" else interval


def _every_test(tests: tuple[Test, ...], counts: Any, without: Gap | None) -> dict[str, float | Gap]:
    found: dict[str, float | Gap] = {}
    for test in tests:
        p = test.p(counts) if without is None else without
        found[test.key] = Gap("cluster-no-exact") if isinstance(p, Gap) and p.key == "not-whole" else p
    return found


def _lacking_pairs(findings: OutcomeFindings) -> Withheld:
    """The measures that need pairs which were not typed."""
    found = {key: measure.key for key, measure in findings.measures.items() if isinstance(measure, Gap)}
    return {key: reason for key, reason in found.items() if reason == "concordant-pairs-unknown"}


def _pooled(findings: OutcomeFindings, withheld: Withheld, level: float, without: Gap | None) -> dict[str, Intervals]:
    if not isinstance(findings.strata, StrataFindings):
        return {}
    counts = tuple(stratum.counts for stratum in findings.strata.strata)
    arguments = {key: (key, (counts,)) for key in findings.strata.pooled}
    reasons = {key: withheld[crude] for key in arguments if (crude := key.removeprefix("pooled_")) in withheld}
    return _every(STRATA_METHODS, arguments, reasons, level, without)


def _of_counts(counts: FractionalCounts) -> Arguments:
    return {
        "risk_index": ("risk", (counts.index_events, counts.index_total)),
        "risk_reference": ("risk", (counts.reference_events, counts.reference_total)),
        "risk_difference": ("risk_difference", (counts,)),
        "risk_ratio": ("risk_ratio", (counts,)),
        "odds_ratio": ("odds_ratio", (counts,)),
    }


def _of_pairs(pairs: PairCounts) -> Arguments:
    return {
        "pair_risk_index": ("risk", (pair_counts.index_events(pairs), pairs.total)),
        "pair_risk_reference": ("risk", (pair_counts.reference_events(pairs), pairs.total)),
        "pair_difference": ("pair_difference", (pairs,)),
        "pair_ratio": ("pair_ratio", (pairs,)),
        "pair_odds_ratio": ("pair_odds_ratio", (pairs,)),
    }


def _of_rates(rates: Rates) -> Arguments:
    return {
        "rate_index": ("rate", (rates.index_events, rates.index_time)),
        "rate_reference": ("rate", (rates.reference_events, rates.reference_time)),
        "rate_difference": ("rate_difference", (rates,)),
        "rate_ratio": ("rate_ratio", (rates,)),
    }


def _of_timed(timed: TimedRisks) -> Arguments:
    return {"risk_difference": ("timed_difference", (timed,)), "risk_ratio": ("timed_ratio", (timed,))}
