"""What a table gives to check a print against, whatever its form: candidates, tests, and the sizes of its groups."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass, field

from fourcount.appraisal.check.candidate import Candidate
from fourcount.appraisal.check.percentages import Group
from fourcount.appraisal.check.probability import Tested
from fourcount.appraisal.check.search import NEVER_FROM
from fourcount.appraisal.check.unpaired import unpaired
from fourcount.appraisal.findings import OutcomeFindings
from fourcount.record.entry.readings import PrintedMeasure
from fourcount.stats.entries.entry import Test
from fourcount.stats.entries.print_only import PRINT_TESTS
from fourcount.stats.methods import TESTS
from fourcount.stats.results import Counts

_CONDITIONAL_TESTS = frozenset({"fisher", "fisher-mid-p"})
_USUAL_TESTS = ("pearson", "fisher", "yates")  # what papers usually print is named first


@dataclass(frozen=True, kw_only=True, slots=True)
class Basis:
    """Nothing at all where there are no counts: then a print can only be held against itself."""

    candidates: Callable[[PrintedMeasure], tuple[Candidate, ...]] = field(default=lambda _: ())
    tests: Callable[[], tuple[Tested, ...]] = field(default=tuple)
    largest: float = 0
    groups: tuple[Group, ...] = ()


def basis_of(findings: OutcomeFindings) -> Basis:
    """What these findings rest on."""
    if isinstance(findings.counts, Counts):
        return of_counts(findings.counts)
    return Basis()


def of_counts(counts: Counts) -> Basis:
    """The four counts of an unpaired table."""
    largest = max(counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events)
    return Basis(
        candidates=lambda says: unpaired(counts, says),
        tests=lambda: _tested(counts, conditional=largest <= NEVER_FROM),
        largest=largest,
        groups=((counts.index_events, counts.index_total), (counts.reference_events, counts.reference_total)),
    )


def _tested(counts: Counts, *, conditional: bool) -> tuple[Tested, ...]:
    entries: list[Test] = [test for test in TESTS + PRINT_TESTS if conditional or test.key not in _CONDITIONAL_TESTS]
    entries.sort(key=lambda test: _USUAL_TESTS.index(test.key) if test.key in _USUAL_TESTS else len(_USUAL_TESTS))
    found = ((test.key, test.p(counts)) for test in entries)
    return tuple(Tested(key=key, p=p) for key, p in found if isinstance(p, float))
