"""Every method of every measure, whatever the chosen family: for the working and for other programs."""

from __future__ import annotations

from fourcount.appraisal.findings import Counts, Gap, Interval
from fourcount.appraisal.gating import SUPPORT
from fourcount.record.outcome import Design
from fourcount.stats.methods import METHODS, TESTS

Intervals = dict[str, Interval | Gap]

_METHODS_OF = {
    "risk_index": "risk",
    "risk_reference": "risk",
    "risk_difference": "risk_difference",
    "risk_ratio": "risk_ratio",
    "odds_ratio": "odds_ratio",
}


def every_method(counts: Counts, design: Design, level: float) -> dict[str, Intervals]:
    """The interval of each method by measure and by the method's key; a measure the design withholds is a Gap."""
    withheld = SUPPORT[design].withheld
    return {
        measure: {
            method.key: Gap(withheld[measure])
            if measure in withheld
            else method.interval(*_arguments(measure, counts), level)
            for method in METHODS
            if method.measure == kind
        }
        for measure, kind in _METHODS_OF.items()
    }


def every_test(counts: Counts) -> dict[str, float | Gap]:
    """The two-sided p of each test of no association, by the test's key."""
    return {test.key: test.p(counts) for test in TESTS}


def conditional_odds_ratio(counts: Counts) -> float | Gap:
    """The odds ratio most likely given both margins (conditional maximum likelihood)."""
    from fourcount.stats.conditional import conditional_odds_ratio as estimate  # loads numpy

    return estimate(counts)


def _arguments(measure: str, counts: Counts) -> tuple[int, int] | tuple[Counts]:
    if measure == "risk_index":
        return counts.index_events, counts.index_total
    if measure == "risk_reference":
        return counts.reference_events, counts.reference_total
    return (counts,)
