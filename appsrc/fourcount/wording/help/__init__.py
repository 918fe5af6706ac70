"""The terms, the methods and their sources as the help shows them, and what the program does not do."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.stats.entries.carrying import CARRYING
from fourcount.stats.entries.entry import Calculation, HomogeneityEntry
from fourcount.stats.entries.extras import EXTRAS
from fourcount.stats.entries.margins import MARGINS
from fourcount.stats.entries.print_only import PRINT_METHODS, PRINT_TESTS
from fourcount.stats.entries.recovery import RECOVERIES
from fourcount.stats.methods import (
    HOMOGENEITY_TESTS,
    METHODS,
    PAIR_METHODS,
    PAIR_TESTS,
    RATE_METHODS,
    RATE_TESTS,
    STRATA_METHODS,
    STRATA_TESTS,
    TESTS,
    TIMED_METHODS,
    Method,
    Test,
)
from fourcount.wording.facts import MEASURE_NAMES
from fourcount.wording.help.entering import ENTERING
from fourcount.wording.help.terms import TERMS

Entry = tuple[str, str, str, str]
Section = tuple[str, tuple[Entry, ...]]

HEADINGS = {
    "risk": "Intervals of a risk",
    "risk_difference": "Intervals of a risk difference",
    "risk_ratio": "Intervals of a risk ratio",
    "odds_ratio": "Intervals of an odds ratio",
    "pair_difference": "Intervals of a difference within pairs",
    "pair_ratio": "Intervals of a risk ratio within pairs",
    "pair_odds_ratio": "Intervals of the odds ratio of pairs",
    "rate": "Intervals of a rate",
    "rate_difference": "Intervals of a rate difference",
    "rate_ratio": "Intervals of a rate ratio",
    "pooled_risk_difference": "Intervals of a pooled risk difference",
    "pooled_risk_ratio": "Intervals of a pooled risk ratio",
    "pooled_odds_ratio": "Intervals of a pooled odds ratio",
    "timed_difference": "Interval of a difference of two risks at a time",
    "timed_ratio": "Interval of a ratio of two risks at a time",
}
TESTS_HEADING = "Tests of no association"
PAIR_TESTS_HEADING = "Tests of no difference within pairs"
RATE_TESTS_HEADING = "Tests of equal rates"
STRATA_TESTS_HEADING = "Tests of no association within strata"
HOMOGENEITY_HEADING = "Tests of one odds ratio for all strata"
EXTRAS_HEADING = "Beside the measures"
CARRYING_HEADING = "For one patient"
MARGINS_HEADING = "A margin of your own"
PRINT_ONLY_HEADING = "Recognised in what a paper prints, and not given here"
PRINT_HEADING = "From printed results"

LETTERS = (
    "a and b: people with and without the event in the index group; c and d: in the reference group. n1 = a + b, "
    "n2 = c + d, m = a + c, N: everybody. p1 = a/n1, p2 = c/n2; for a single risk x events among n people, p = x/n. "
    "z: the standard normal quantile of the level, 1.96 at 95%. alpha: 1 minus the level. D0, R0 and psi: a "
    "difference, a ratio and an odds ratio on trial; P1 and P2: the likeliest risks of the two groups under it. "
    "D and R: the estimated difference and ratio. "
    "Of pairs, e have the event on both sides, f on the index side only, g on the reference side only, h on neither, "
    "n = e + f + g + h. Of person-time, x1 events in time t1 in the index group, x2 in t2 in the reference group; for "
    "a single rate x in t. Of strata, Σ adds up what each stratum gives. l and u: the lower and upper limit of a risk. "
    "For one patient: q the starting risk, O, R and h the odds, risk and hazard ratio, s the share of people exposed, "
    "P their overall risk. M: a margin."
)


LIMITS = (
    "Fourcount answers one outcome of one study at a time. It pools strata and no studies: it is no meta-analysis.",
    "Counts give crude figures only. What a paper adjusted can be typed as printed; it cannot be had from counts.",
    "Counts take everybody as followed for the whole time span. Where that varied, type printed risks or person-time.",
    "Counts of events, several in one person, give no risk of people.",
    "Pooled figures, and those built from printed limits, are approximate in every family of intervals.",
    "Of clusters only the design effect is known here: a paper’s own model may say more.",
    "Intervals hold the play of small numbers only: not bias, losses to follow-up or mistakes of measurement.",
    "Carried to a patient, an effect is assumed to be the same at that starting risk as in the study.",
    "Carried to another time span, both groups’ hazards are assumed to stay constant.",
    "A survey has no number needed to treat.",
    "A case-control study has only its odds ratio, unless a starting risk is typed from elsewhere.",
    "A matched case-control study has only its pairs’ odds ratio, unless a starting risk is typed from elsewhere.",
    "No figure here says what to do: that takes all the evidence, what a person values, and judgement.",
)
"""What the program leaves out, in whole sentences."""


def methods_and_sources() -> tuple[Section, ...]:
    """Each measure's methods, then the tests, straight from their tables: title, formula, source, note."""
    return (
        *_by_measure(METHODS),
        (TESTS_HEADING, _entries(TESTS)),
        *_by_measure(PAIR_METHODS),
        (PAIR_TESTS_HEADING, _entries(PAIR_TESTS)),
        *_by_measure(RATE_METHODS),
        (RATE_TESTS_HEADING, _entries(RATE_TESTS)),
        *_by_measure(TIMED_METHODS),
        *_by_measure(STRATA_METHODS),
        (STRATA_TESTS_HEADING, _entries(STRATA_TESTS)),
        (HOMOGENEITY_HEADING, _entries(HOMOGENEITY_TESTS)),
        (EXTRAS_HEADING, _entries(EXTRAS)),
        (CARRYING_HEADING, _entries(CARRYING)),
        (MARGINS_HEADING, _entries(MARGINS)),
        (PRINT_HEADING, _entries(RECOVERIES)),
        (PRINT_ONLY_HEADING, tuple(map(_named, PRINT_METHODS)) + _entries(PRINT_TESTS)),
    )


def terms() -> tuple[tuple[str, str], ...]:
    """What is entered by its specimen, then the terms in the order in which a reader meets them, each explained."""
    return (*ENTERING, *TERMS)


def entering() -> tuple[tuple[str, str], ...]:
    """Every form of entry by its specimen, then the paste and what the paper prints, each explained."""
    return ENTERING


def limits_of_the_program() -> tuple[str, ...]:
    """What the program leaves out, in whole sentences."""
    return LIMITS


def _by_measure(methods: tuple[Method, ...]) -> tuple[Section, ...]:
    kinds = dict.fromkeys(method.measure for method in methods)
    return tuple((HEADINGS.get(kind, kind), _entries(tuple(m for m in methods if m.measure == kind))) for kind in kinds)


def _named(method: Method) -> Entry:
    """A method under a heading of several measures: its own stands behind its title."""
    return (f"{method.title}, {MEASURE_NAMES.get(method.measure, method.measure)}", *_entries((method,))[0][1:])


def _entries(entries: Sequence[Method | Test | HomogeneityEntry | Calculation]) -> tuple[Entry, ...]:
    return tuple((e.title, e.formula, e.source, e.note) for e in entries)
