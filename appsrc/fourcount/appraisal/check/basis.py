"""What a table gives to check a print against, whatever its form: candidates, tests, and the sizes of its groups."""

from __future__ import annotations

from collections.abc import Callable, Iterable
from dataclasses import dataclass, field, replace

from fourcount.appraisal.check.candidate import Candidate
from fourcount.appraisal.check.other_forms import apart, clustered, discordant, paired, person_time, stratified, timed
from fourcount.appraisal.check.percentages import Group
from fourcount.appraisal.check.probability import Tested
from fourcount.appraisal.check.search import NEVER_FROM
from fourcount.appraisal.check.shown import Given
from fourcount.appraisal.check.unpaired import unpaired
from fourcount.appraisal.findings import Clusters, OutcomeFindings, StrataFindings, Totals
from fourcount.record.entry.readings import PrintedMeasure
from fourcount.record.outcome import Outcome
from fourcount.stats.clusters import effective
from fourcount.stats.entries.entry import Test
from fourcount.stats.entries.print_only import PRINT_TESTS
from fourcount.stats.methods import PAIR_TESTS, RATE_TESTS, STRATA_TESTS, TESTS
from fourcount.stats.results import Counts, FractionalCounts, Gap, PairCounts, Rates, TimedRisks

_CONDITIONAL_TESTS = frozenset({"fisher", "fisher-mid-p"})
_USUAL_TESTS = ("pearson", "fisher", "yates")  # what papers usually print is named first


@dataclass(frozen=True, kw_only=True, slots=True)
class Basis:
    """Nothing at all where there are no counts: then a print can only be held against itself."""

    candidates: Callable[[PrintedMeasure], tuple[Candidate, ...]] = field(default=lambda _: ())
    tests: Callable[[], tuple[Tested, ...]] = field(default=tuple)
    largest: float = 0
    groups: tuple[Group, ...] = ()
    given: Given = "counts"
    adoptable: bool = True  # whether the window shows these very figures under some family and level


def basis_of(findings: OutcomeFindings, outcome: Outcome) -> Basis:
    """What these findings rest on."""
    clusters = findings.extras.clusters
    if isinstance(findings.counts, Counts) and isinstance(clusters, Clusters) and findings.strata is None:
        return of_clusters(findings.counts, clusters)
    basis = _without_clusters(findings, outcome)
    return basis if clusters is None else replace(basis, adoptable=False)


def _without_clusters(findings: OutcomeFindings, outcome: Outcome) -> Basis:
    if isinstance(findings.strata, StrataFindings) and isinstance(findings.counts, Counts):
        return of_strata(tuple(stratum.counts for stratum in findings.strata.strata), findings.counts)
    if isinstance(findings.counts, Counts):
        return of_counts(findings.counts)
    given = findings.given
    if given == Gap("concordant-pairs-unknown"):
        return of_discordant(findings.totals, outcome)
    if isinstance(given, PairCounts):
        return of_pairs(given)
    if isinstance(given, Rates):
        return of_rates(given)
    return of_timed(given) if isinstance(given, TimedRisks) else Basis()


def of_counts(counts: Counts) -> Basis:
    """The four counts of an unpaired table."""
    largest = max(counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events)
    return Basis(
        candidates=lambda says: unpaired(counts, says),
        tests=lambda: _tested(counts, conditional=largest <= NEVER_FROM),
        largest=largest,
        groups=((counts.index_events, counts.index_total), (counts.reference_events, counts.reference_total)),
    )


def of_clusters(counts: Counts, clusters: Clusters) -> Basis:
    """Four counts of people in clusters, intervals and tests from the counts divided by the design effect."""
    whole, behind = of_counts(counts), effective(counts, clusters.design_effect)
    return replace(
        whole,
        candidates=lambda says: clustered(counts, behind, says),
        tests=lambda: _tested(behind, conditional=False) + whole.tests(),
    )


def of_discordant(totals: Totals, outcome: Outcome) -> Basis:
    """Discordant pairs alone, turned to the index side and the counted outcome."""
    index_only, reference_only = totals.first_right or 0, totals.second_left or 0
    if (outcome.index_group == "second") is not (outcome.counted == "right"):
        index_only, reference_only = reference_only, index_only
    pairs = PairCounts(both=0, index_only=index_only, reference_only=reference_only, neither=0)
    return Basis(
        candidates=lambda says: discordant(pairs, says),
        tests=lambda: _all_tests(PAIR_TESTS, pairs),
        largest=max(index_only, reference_only),
        given="pairs",
    )


def of_pairs(pairs: PairCounts) -> Basis:
    """The four counts of matched pairs."""
    people = apart(pairs)
    return Basis(
        candidates=lambda says: paired(pairs, says),
        tests=lambda: _all_tests(PAIR_TESTS, pairs),
        largest=max(pairs.both, pairs.index_only, pairs.reference_only, pairs.neither),
        groups=((people.index_events, pairs.total), (people.reference_events, pairs.total)),
        given="pairs",
    )


def of_rates(rates: Rates) -> Basis:
    """Events and person-time."""
    return Basis(
        candidates=lambda says: person_time(rates, says),
        tests=lambda: _all_tests(RATE_TESTS, rates),
        largest=max(rates.index_events, rates.reference_events),
        given="person-time",
    )


def of_timed(risks: TimedRisks) -> Basis:
    """Two printed risks with their limits."""
    return Basis(candidates=lambda says: timed(risks, says), given="risks")


def of_strata(strata: tuple[Counts, ...], crude: Counts) -> Basis:
    """Several tables, and all of them thrown together."""
    whole = of_counts(crude)
    return Basis(
        candidates=lambda says: stratified(strata, crude, says),
        tests=lambda: _all_tests(STRATA_TESTS, strata) + whole.tests(),
        largest=whole.largest,
        groups=whole.groups,
        given="strata",
    )


def _tested(counts: FractionalCounts, *, conditional: bool) -> tuple[Tested, ...]:
    entries = [test for test in TESTS + PRINT_TESTS if conditional or test.key not in _CONDITIONAL_TESTS]
    entries.sort(key=lambda test: _USUAL_TESTS.index(test.key) if test.key in _USUAL_TESTS else len(_USUAL_TESTS))
    return _all_tests(entries, counts)


def _all_tests(entries: Iterable[Test], given: object) -> tuple[Tested, ...]:
    found = ((test.key, test.p(given)) for test in entries)
    return tuple(Tested(key=key, p=p) for key, p in found if isinstance(p, float))
