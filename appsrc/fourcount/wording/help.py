"""Methods and sources as the help shows them, and what the program does not do."""

from __future__ import annotations

from fourcount.stats.methods import METHODS, TESTS

Entry = tuple[str, str, str, str]

HEADINGS = {
    "risk": "Intervals of a risk",
    "risk_difference": "Intervals of a risk difference",
    "risk_ratio": "Intervals of a risk ratio",
    "odds_ratio": "Intervals of an odds ratio",
}
TESTS_HEADING = "Tests of no association"


def methods_and_sources() -> tuple[tuple[str, tuple[Entry, ...]], ...]:
    """Each measure's methods, then the tests, straight from their tables: title, formula, source, note."""
    kinds = dict.fromkeys(method.measure for method in METHODS)
    sections = [
        (
            HEADINGS.get(kind, kind),
            tuple((m.title, m.formula, m.source, m.note) for m in METHODS if m.measure == kind),
        )
        for kind in kinds
    ]
    tests = tuple((test.title, test.formula, test.source, test.note) for test in TESTS)
    return (*sections, (TESTS_HEADING, tests))


def limits_of_the_program() -> tuple[str, ...]:
    """What the program leaves out, in whole sentences."""
    return (
        "Fourcount answers one table of four counts at a time and pools nothing: it is no meta-analysis.",
        "Counts give crude figures only. An effect that a paper adjusted for other differences cannot be had so.",
        "It takes people, each counted once. Matched pairs, clusters and events per person-time need other methods.",
        "It takes everybody as followed for the whole time span. Where follow-up varied, risks from counts mislead.",
        "Intervals hold the play of small numbers only: not bias, losses to follow-up or mistakes of measurement.",
        "Carried to a patient, an effect is assumed to be the same at that starting risk as in the study.",
        "A survey has no number needed to treat.",
        "A case-control study has only its odds ratio, unless a starting risk is typed from elsewhere.",
        "No figure here says what to do: that takes all the evidence, what a person values, and judgement.",
    )
