"""The terms, the methods and their sources as the help shows them, and what the program does not do."""

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

TERMS = (
    (
        "index group, reference group",
        (
            "The index group had what the study looks at: a treatment or an exposure. The reference group is what it "
            "is compared with: a placebo, usual care, people without the exposure. Swap the groups if they stand the "
            "other way round."
        ),
    ),
    (
        "event counted",
        (
            "The one of the two outcomes that all figures count. It may be welcome or unwelcome. Count the other "
            "outcome to turn every figure to the people who did not have this one."
        ),
    ),
    (
        "difference per 100",
        (
            "Of 100 people in the index group, how many more or fewer had the event than of 100 in the reference "
            "group. It is a difference of two percentages, in percentage points; it is not a percentage of the risk."
        ),
    ),
    (
        "NNTB, NNTH",
        (
            "Number needed to treat for one more person to benefit, or for one to be harmed: one divided by the "
            "difference. It belongs to a comparison, a time span and a starting risk. Here it and its limits are "
            "always rounded up, NNTB and NNTH alike."
        ),
    ),
    (
        "through infinity",
        (
            "Where the interval of the difference holds no effect, a number needed runs from NNTB through infinity to "
            "NNTH: “NNTB 12 to ∞ to NNTH 40” is compatible with one more benefit in 12 people, with no effect at all, "
            "and with one more harm in 40."
        ),
    ),
    (
        "risk ratio",
        (
            "The risk in the index group divided by that in the reference group; 1 is no effect, and 0.54 is a "
            "relative reduction of 46%. By itself it does not say how large the risks are. In a survey it is a "
            "prevalence ratio."
        ),
    ),
    (
        "odds ratio, and as a risk ratio at 12%",
        (
            "Odds are people with the event for each person without it; the odds ratio compares the odds of two "
            "groups. It always lies farther from 1 than the risk ratio, the farther the more common the event. “As a "
            "risk ratio at 12%” says what it comes to where 12 in 100 have the event without the index treatment or "
            "exposure."
        ),
    ),
    (
        "interval, level",
        (
            "All values that the study’s numbers are compatible with at the level chosen. At 95%, intervals made in "
            "this way hold the true value in about 95 of 100 studies, if nothing but the play of small numbers is at "
            "work."
        ),
    ),
    (
        "score intervals",
        (
            "The default: they keep close to their level also with few events and zeros. Difference, ratios and p "
            "never disagree about no effect."
        ),
    ),
    (
        "textbook intervals",
        (
            "The bare formulas that papers usually print, to check a paper’s own figures with. With few events those "
            "of a risk and of a difference are too narrow, and with zeros the ratios need a correction, said beside "
            "them."
        ),
    ),
    (
        "exact intervals",
        (
            "They never fall short of their level, and so are often wider than need be. There is none for a "
            "difference or a risk ratio here: those rows then say “score, approximate”."
        ),
    ),
    (
        "starting risk",
        (
            "How many of 100 people such as this patient have the event without the index treatment or exposure, in "
            "the study’s time span. It is the reference group’s own unless you type one, with its source; the effect "
            "is then assumed to be the same there."
        ),
    ),
    (
        "avoided, added, on balance",
        (
            "How many fewer, or more, people in the picture have the event with the index treatment. Only the balance "
            "is known: some may gain while others lose, and nobody can be pointed to."
        ),
    ),
)
"""The words of the window, each with what it means: two or three plain sentences."""


LETTERS = (
    "a and b: people with and without the event in the index group; c and d: in the reference group. n1 = a + b, "
    "n2 = c + d, m = a + c, N: everybody. p1 = a/n1, p2 = c/n2; for a single risk x events among n people, p = x/n. "
    "z: the standard normal quantile of the level, 1.96 at 95%. alpha: 1 minus the level. D0, R0 and psi: a "
    "difference, a ratio and an odds ratio on trial; P1 and P2: the likeliest risks of the two groups under it."
)


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


def terms() -> tuple[tuple[str, str], ...]:
    """The terms on screen in the order in which a reader meets them, each with its explanation."""
    return TERMS


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
