"""The table of methods: every interval, every test and every family, with its title, formula, source and function.

A new method is one more entry. Letters: a, b are the index group's events and non-events, c, d the reference
group's; n1 = a+b, n2 = c+d, m = a+c, N = n1+n2; p1 = a/n1, p2 = c/n2; for one risk x of n people, p = x/n; z is the
normal quantile of the confidence level (1.96 at 95%), alpha what the level leaves to 1. Of pairs, e have the event on
both sides, f on the index side only, g on the reference side only, h on neither, n = e+f+g+h; of person-time, x1 events
fell into t1 and x2 into t2. Importing this file loads neither numpy nor scipy; the entries that need them import them
when they are first called.
"""

from __future__ import annotations

from fourcount.stats.entries.association_tests import ASSOCIATION_TESTS
from fourcount.stats.entries.carrying import CARRYING
from fourcount.stats.entries.comparisons import DIFFERENCE_METHODS, RATIO_METHODS
from fourcount.stats.entries.entry import Family, HomogeneityEntry, Measure, Method, PairFamily, RateFamily, Test
from fourcount.stats.entries.extras import EXTRAS
from fourcount.stats.entries.margins import MARGINS
from fourcount.stats.entries.odds_ratios import ODDS_RATIO_METHODS
from fourcount.stats.entries.pairs import PAIR_METHODS, PAIR_TESTS
from fourcount.stats.entries.rates import RATE_METHODS, RATE_TESTS
from fourcount.stats.entries.recovery import RECOVERIES
from fourcount.stats.entries.risks import RISK_METHODS
from fourcount.stats.entries.strata import HOMOGENEITY_TESTS, STRATA_METHODS, STRATA_TESTS
from fourcount.stats.entries.timed import TIMED_METHODS
from fourcount.stats.results import Counts

__all__ = [
    "CARRYING",
    "EXTRAS",
    "FAMILIES",
    "HOMOGENEITY_TESTS",
    "MARGINS",
    "METHODS",
    "PAIR_FAMILIES",
    "PAIR_METHODS",
    "PAIR_TESTS",
    "RATE_FAMILIES",
    "RATE_METHODS",
    "RATE_TESTS",
    "RECOVERIES",
    "STRATA_METHODS",
    "STRATA_TESTS",
    "TESTS",
    "TIMED_METHODS",
    "Family",
    "HomogeneityEntry",
    "Measure",
    "Method",
    "PairFamily",
    "RateFamily",
    "Test",
    "homogeneity_test",
    "method",
    "slow",
    "test",
]

METHODS: tuple[Method, ...] = RISK_METHODS + DIFFERENCE_METHODS + RATIO_METHODS + ODDS_RATIO_METHODS
"""Every interval method of an unpaired table, in the order in which a measure's methods are listed."""

TESTS: tuple[Test, ...] = ASSOCIATION_TESTS

FAMILIES: dict[str, Family] = {
    "score": Family(
        risk="wilson",
        odds="wilson",
        risk_difference="miettinen-nurminen",
        risk_ratio="miettinen-nurminen",
        odds_ratio="miettinen-nurminen",
        test="n-minus-1",
    ),
    "textbook": Family(
        risk="wald", odds="logit", risk_difference="wald", risk_ratio="katz", odds_ratio="woolf", test="pearson"
    ),
    "exact": Family(
        risk="clopper-pearson",
        odds="clopper-pearson",
        risk_difference="miettinen-nurminen",
        risk_ratio="miettinen-nurminen",
        odds_ratio="conditional-exact",
        test="fisher",
    ),
}

PAIR_FAMILIES: dict[str, PairFamily] = {
    "score": PairFamily(
        difference="newcombe",
        ratio="bonett-price",
        odds_ratio="conditional-mid-p",
        risk="wilson",
        test="mcnemar-mid-p",
    ),
    "textbook": PairFamily(difference="wald", ratio="log", odds_ratio="log", risk="wald", test="mcnemar"),
    "exact": PairFamily(
        difference="newcombe",
        ratio="bonett-price",
        odds_ratio="conditional-exact",
        risk="clopper-pearson",
        test="mcnemar-exact",
    ),
}

RATE_FAMILIES: dict[str, RateFamily] = {
    "score": RateFamily(rate="score", difference="miettinen-nurminen", ratio="score", test="rate-score"),
    "textbook": RateFamily(rate="wald", difference="wald", ratio="log", test="rate-score"),
    "exact": RateFamily(rate="exact", difference="miettinen-nurminen", ratio="exact", test="binomial-exact"),
}

_METHOD_BY_KEY: dict[tuple[str, str], Method] = {
    (entry.measure, entry.key): entry
    for entry in (*METHODS, *PAIR_METHODS, *RATE_METHODS, *STRATA_METHODS, *TIMED_METHODS)
}
_METHOD_BY_KEY |= {("pair_risk", entry.key): entry for entry in RISK_METHODS}  # one side of pairs is a risk like any
_TEST_BY_KEY = {entry.key: entry for entry in (*TESTS, *PAIR_TESTS, *RATE_TESTS, *STRATA_TESTS)}
_HOMOGENEITY_TEST_BY_KEY = {entry.key: entry for entry in HOMOGENEITY_TESTS}

_SLOW_FROM = 10_000_000  # the largest count at which the conditional odds ratio still keeps within one frame


def method(measure: str, key: str) -> Method:
    """The entry of one measure's method."""
    return _METHOD_BY_KEY[measure, key]


def test(key: str) -> Test:
    """The entry of one test."""
    return _TEST_BY_KEY[key]


test.__test__ = False  # type: ignore[attr-defined]  # pytest would collect a function of this name


def homogeneity_test(key: str) -> HomogeneityEntry:
    """The entry of one test of whether strata share an odds ratio."""
    return _HOMOGENEITY_TEST_BY_KEY[key]


def slow(counts: Counts, family: str) -> bool:
    """Whether a figure of this family may take longer than one frame of the screen."""
    largest = max(counts.index_events, counts.index_non_events, counts.reference_events, counts.reference_non_events)
    return family == "exact" and largest > _SLOW_FROM
