"""The working of pooled measures: each stratum's part in the sums, and whether the strata tell the same."""

from __future__ import annotations

from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Counts,
    Figure,
    Gap,
    Homogeneity,
    OutcomeFindings,
    StrataFindings,
)
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.methods import HOMOGENEITY_TESTS, STRATA_TESTS, homogeneity_test
from fourcount.stats.results import HomogeneityTest
from fourcount.wording import limits, lines, numbers
from fourcount.wording.form import crude, measure_of
from fourcount.wording.gaps import gap_text
from fourcount.wording.numbers import plain
from fourcount.wording.working.extras import CALCULATIONS
from fourcount.wording.working.parts import (
    ESTIMATE,
    SPACE,
    Row,
    about,
    interval_rows,
    other_methods,
    reciprocal,
    rows_of_tests,
    table_measure,
    value,
)
from fourcount.wording.working.unpaired import needed_rows, unpaired_rows

RATIO_OF_RATIOS = "Ratio of the two strata’s ratios"
DIFFERENCE_OF_DIFFERENCES = "Between the two strata’s differences, per 100"


def strata_rows(measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """A pooled measure's rows; a crude one's are those of the four counts thrown together."""
    strata, found = findings.strata, measure_of(measure, findings)
    if isinstance(found, AnyNumberNeeded):
        return _needed(found, findings, choices)
    if not measure.startswith("pooled_"):
        return unpaired_rows(measure, outcome, crude(findings), choices)
    if not isinstance(strata, StrataFindings) or not isinstance(found, Figure):
        return ()
    counts = [stratum.counts for stratum in strata.strata]
    parts = [(stratum.label, _parts(measure, stratum.counts)) for stratum in strata.strata]
    rows = [*parts, (ESTIMATE, _sums(measure, counts))]
    unit = "per 100" if measure == "pooled_risk_difference" else ""
    rows += interval_rows(measure, found, choices.level, "strata", counts, unit=unit)
    rows += _interaction(measure, strata)
    return (*rows, *other_methods(measure, found, table_measure(measure), (counts,), choices.level))


def _needed(needed: AnyNumberNeeded, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """The reciprocal of the pooled difference and of its limits."""
    pooled = measure_of("pooled_risk_difference", findings)
    if not isinstance(pooled, Figure) or isinstance(pooled.estimate, Gap):
        return ()
    estimate = reciprocal(abs(pooled.estimate), numbers.number_needed(needed.estimate))
    rows = needed_rows(needed, pooled, findings, choices, measure="pooled_risk_difference")
    return ((ESTIMATE, estimate), *rows)


def strata_test_rows(findings: OutcomeFindings) -> tuple[Row, ...]:
    """Tests of no association within the strata, then those of one odds ratio for all."""
    strata = findings.strata
    if not isinstance(strata, StrataFindings):
        return ()
    counts = [stratum.counts for stratum in strata.strata]
    same = [(entry.title, _homogeneity(entry.test(counts))) for entry in HOMOGENEITY_TESTS]
    found = strata.homogeneity
    how = about(homogeneity_test(found.method)) if isinstance(found, Homogeneity) else []
    return (*rows_of_tests(STRATA_TESTS, counts, strata.test), SPACE, *same, *how)


def pooled_parts(measure: str, t: Counts) -> tuple[float, float]:
    """A stratum's part of the sum above and of that below the line."""
    n1, n2, n = t.index_total, t.reference_total, t.total
    if not n:
        return 0.0, 0.0
    a, b, c, d = t.index_events, t.index_non_events, t.reference_events, t.reference_non_events
    if measure == "pooled_risk_difference":
        return (a * n2 - c * n1) / n, n1 * n2 / n
    return (a * n2 / n, c * n1 / n) if measure == "pooled_risk_ratio" else (a * d / n, b * c / n)


def _parts(measure: str, t: Counts) -> str:
    above, below = pooled_parts(measure, t)
    names = {
        "pooled_risk_difference": ("(a n2 − c n1)/N", "n1 n2/N"),
        "pooled_risk_ratio": ("a n2/N", "c n1/N"),
        "pooled_odds_ratio": ("ad/N", "bc/N"),
    }[measure]
    return f"{names[0]} = {plain(above)}, {names[1]} = {plain(below)}"


def _sums(measure: str, counts: list[Counts]) -> str:
    parts = [pooled_parts(measure, t) for t in counts]
    above, below = sum(part[0] for part in parts), sum(part[1] for part in parts)
    return f"{plain(above)}/{plain(below)} = {value(above, below)}"


def _interaction(measure: str, strata: StrataFindings) -> list[Row]:
    """Of exactly two strata, how far their effects are apart."""
    found = strata.interactions.get(measure)
    if found is None:
        return []
    label = DIFFERENCE_OF_DIFFERENCES if measure == "pooled_risk_difference" else RATIO_OF_RATIOS
    if isinstance(found, Gap):
        return [SPACE, (label, gap_text(found))]
    interval = limits.bracketed(lines.interval_text(measure, found.figure))
    words = f"{lines.estimate_text(measure, found.figure)}{interval}, {numbers.p_phrase(found.p)}"
    return [SPACE, (label, words), *about(CALCULATIONS["interaction"])]


def _homogeneity(found: HomogeneityTest | Gap) -> str:
    if isinstance(found, Gap):
        return gap_text(found)
    return f"{numbers.p_phrase(found.p)}, chi-square {numbers.fixed(found.chi_square, 2)}, degrees {found.degrees}"
