"""The working of one unpaired table's measures: the four counts in each formula, and every other method."""

from __future__ import annotations

from dataclasses import replace
from typing import TypeVar

from fourcount.appraisal.every import conditional_odds_ratio
from fourcount.appraisal.findings import AnyNumberNeeded, Clusters, Conversion, Counts, Figure, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.clusters import effective
from fourcount.stats.methods import TESTS
from fourcount.stats.results import FractionalCounts
from fourcount.wording import limits, lines, names, numbers
from fourcount.wording.gaps import gap_text
from fourcount.wording.numbers import plain, whole
from fourcount.wording.working.parts import (
    ESTIMATE,
    METHOD_MEASURES,
    SPACE,
    Row,
    about,
    entry_of,
    interval_label,
    interval_rows,
    other_methods,
    quotient,
    reciprocal,
    rows_of_tests,
    value,
)

AnyCounts = TypeVar("AnyCounts", bound=FractionalCounts)

BY_LIMITS = {
    "odds_index": "Each limit of the risk, p, turned into odds: p/(1 − p)",
    "odds_reference": "Each limit of the risk, p, turned into odds: p/(1 − p)",
    "number_needed": "The reciprocal of each limit of the difference, rounded up (Altman 1998, BMJ 317:1309)",
}
CONVERSION_SOURCE = "OR/(1 − p + p × OR) at starting risk p (Zhang and Yu 1998, JAMA 280:1690)"
OWN_CONVERSION = "At the study’s own risk this is the table’s own risk ratio and interval: nothing is converted"
DIVIDED = "Of intervals and p, the counts divided by the design effect"


def unpaired_rows(measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """The rows of one measure of four counts that are there."""
    found, counts = findings.measures[measure], findings.counts
    if isinstance(counts, Gap) or isinstance(found, Gap):
        return ()
    rows = [(ESTIMATE, formula_with_numbers(measure, counts))]
    if measure == "risk_difference":
        rows += units(found)
    if isinstance(found, AnyNumberNeeded):
        return (*rows, *needed_rows(found, findings.measures["risk_difference"], findings, choices))
    unit = "per 100" if measure == "risk_difference" else ""
    how = BY_LIMITS.get(measure, "")
    behind = counts_behind(findings)
    letters_of = None if behind is None else _lettered(measure, behind)
    rows += interval_rows(measure, found, choices.level, findings.form, letters_of, unit=unit, how=how)
    rows += _divided(findings)
    if measure == "odds_ratio":
        rows += [*_conversion_rows(findings.conversion, outcome), _conditional_row(counts)]
    if measure not in BY_LIMITS and behind is not None:
        arguments = _arguments(measure, behind)
        rows += other_methods(measure, found, METHOD_MEASURES[measure], arguments, choices.level)
    return tuple(rows)


def needed_rows(
    needed: AnyNumberNeeded,
    difference: Figure | AnyNumberNeeded | Gap,
    findings: OutcomeFindings,
    choices: Choices,
    measure: str = "number_needed",
) -> list[Row]:
    """The interval of a number needed: the reciprocals of the difference's limits, by the difference's method.

    ``measure`` is the key of the difference where it is not the form's own.
    """
    rows = [SPACE, (interval_label(choices.level), limits.number_needed_interval(needed))]
    rows.append(("How", BY_LIMITS["number_needed"]))
    entry = entry_of(measure, difference, findings.form) if isinstance(difference, Figure) else None
    return rows if entry is None else [*rows, *about(entry)]


def counts_behind(findings: OutcomeFindings) -> FractionalCounts | None:
    """The counts that intervals and p rest on: divided by the design effect of clusters; None where there are none."""
    counts, clusters = findings.counts, findings.extras.clusters
    if isinstance(counts, Gap) or isinstance(clusters, Gap):
        return None
    return effective(counts, clusters.design_effect) if isinstance(clusters, Clusters) else counts


def _divided(findings: OutcomeFindings) -> list[Row]:
    clusters = findings.extras.clusters
    return [(DIVIDED, plain(clusters.design_effect))] if isinstance(clusters, Clusters) else []


def formula_with_numbers(measure: str, counts: Counts) -> str:
    """The estimate's formula with the four counts in it and each step worked out."""
    a, b, c, d = (
        counts.index_events,
        counts.index_non_events,
        counts.reference_events,
        counts.reference_non_events,
    )
    if measure in ("risk_index", "odds_index"):
        return quotient(a, a + b) if measure == "risk_index" else quotient(a, b)
    if measure in ("risk_reference", "odds_reference"):
        return quotient(c, c + d) if measure == "risk_reference" else quotient(c, d)
    if measure == "risk_difference":
        return _difference(counts)
    if measure == "number_needed":
        return _reciprocal(counts)
    if measure == "odds_ratio":
        return f"({whole(a)} × {whole(d)}) / ({whole(b)} × {whole(c)}) = {quotient(a * d, b * c)}"
    return _ratio(counts) if measure == "risk_ratio" else _ratio(_turned(counts))


def _difference(counts: Counts) -> str:
    a, n1, c, n2 = counts.index_events, counts.index_total, counts.reference_events, counts.reference_total
    return (
        f"{whole(a)}/{whole(n1)} − {whole(c)}/{whole(n2)} = {value(a, n1)} − {value(c, n2)} "
        f"= {plain((a * n2 - c * n1) / (n1 * n2))}"
    )


def _reciprocal(counts: Counts) -> str:
    n1, n2 = counts.index_total, counts.reference_total
    change = abs(counts.index_events * n2 - counts.reference_events * n1) / (n1 * n2)
    return reciprocal(change, lines.whole_needed(counts))


def _ratio(counts: Counts) -> str:
    a, n1, c, n2 = counts.index_events, counts.index_total, counts.reference_events, counts.reference_total
    return (
        f"({whole(a)}/{whole(n1)}) / ({whole(c)}/{whole(n2)}) = {value(a, n1)} / {value(c, n2)} "
        f"= {value(a * n2, c * n1)}"
    )


def _turned(counts: AnyCounts) -> AnyCounts:
    """The same people with the other outcome counted."""
    return replace(
        counts,
        index_events=counts.index_non_events,
        index_non_events=counts.index_events,
        reference_events=counts.reference_non_events,
        reference_non_events=counts.reference_events,
    )


def _arguments(measure: str, counts: FractionalCounts) -> tuple[object, ...]:
    if measure == "risk_index":
        return counts.index_events, counts.index_total
    if measure == "risk_reference":
        return counts.reference_events, counts.reference_total
    return (_turned(counts) if measure == "other_risk_ratio" else counts,)


def _lettered(measure: str, counts: FractionalCounts) -> object:
    """What the letters of the measure's formula stand for: one group's events and people, or both groups."""
    if measure in ("risk_index", "odds_index"):
        return counts.index_events, counts.index_total
    if measure in ("risk_reference", "odds_reference"):
        return counts.reference_events, counts.reference_total
    return _arguments(measure, counts)[0]


def _conversion_rows(conversion: Conversion | Gap, outcome: Outcome) -> list[Row]:
    if isinstance(conversion, Gap):
        return []
    figure = conversion.risk_ratio
    label = f"As a {names.risk_name(outcome)} ratio at {lines.baseline_text(conversion, outcome)}"
    if isinstance(figure.estimate, Gap):
        return [(label, gap_text(figure.estimate))]
    interval = limits.bracketed(limits.ratio_interval(figure.interval, figure.estimate))
    how = CONVERSION_SOURCE if conversion.baseline_from == "given" else OWN_CONVERSION
    return [(label, f"{numbers.ratio(figure.estimate)}{interval}"), ("How", how)]


def _conditional_row(counts: Counts) -> Row:
    estimate = conditional_odds_ratio(counts)
    text = gap_text(estimate) if isinstance(estimate, Gap) else numbers.ratio(estimate)
    return ("Conditional estimate, given both margins", text)


def units(found: Figure | AnyNumberNeeded) -> list[Row]:
    """The difference in its two other units; a percentage of nothing."""
    if not isinstance(found, Figure) or isinstance(found.estimate, Gap):
        return []
    change = found.estimate
    word = f" {limits.side(change)}" if change else ""
    return [
        ("In percentage points", f"{numbers.hundred(change)}{word}"),
        ("Per 1,000 people", f"{numbers.thousand(change)}{word}"),
    ]


def test_rows(findings: OutcomeFindings) -> tuple[Row, ...]:
    """The p of all tests, then the formula and source of the family's own."""
    counts = counts_behind(findings)
    if counts is None:
        return ()
    return rows_of_tests(TESTS, counts, findings.test, between=_divided(findings))


test_rows.__test__ = False  # type: ignore[attr-defined]  # pytest would collect a function of this name
