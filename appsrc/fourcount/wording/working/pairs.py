"""The working of pairs: the four pair counts in each formula, and every other method."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, OutcomeFindings, PairCounts
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.methods import PAIR_TESTS
from fourcount.wording.form import given, measure_of
from fourcount.wording.lines.pairs import whole_needed_of_pairs
from fourcount.wording.numbers import whole
from fourcount.wording.pairs import pairs_that_differ
from fourcount.wording.working.parts import (
    ESTIMATE,
    Row,
    interval_rows,
    other_methods,
    quotient,
    reciprocal,
    rows_of_tests,
    table_measure,
    value,
)
from fourcount.wording.working.unpaired import needed_rows, units


def pair_rows(measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """The rows of one measure of pairs that are there."""
    pairs, found = given(findings), measure_of(measure, findings)
    if isinstance(found, Gap):
        return ()
    if not isinstance(pairs, PairCounts):
        return _of_those_that_differ(measure, outcome, findings, choices)
    rows = [(ESTIMATE, pair_formula(measure, pairs))]
    if isinstance(found, AnyNumberNeeded):
        return (*rows, *needed_rows(found, findings.measures["pair_difference"], findings, choices))
    if measure == "pair_difference":
        rows += units(found)
    unit = "per 100" if measure == "pair_difference" else ""
    letters_of = _arguments(measure, pairs) if measure.startswith("pair_risk") else pairs
    rows += interval_rows(measure, found, choices.level, "pairs", letters_of, unit=unit)
    rows += other_methods(measure, found, table_measure(measure), _arguments(measure, pairs), choices.level)
    return tuple(rows)


def _of_those_that_differ(
    measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices
) -> tuple[Row, ...]:
    """The odds ratio where only the pairs that differ were typed."""
    differ, found = pairs_that_differ(outcome, findings), measure_of(measure, findings)
    if differ is None or not isinstance(found, Figure) or measure != "pair_odds_ratio":
        return ()
    pairs = PairCounts(both=0, index_only=differ[0], reference_only=differ[1], neither=0)
    rows = [(ESTIMATE, quotient(*differ)), *interval_rows(measure, found, choices.level, "pairs", pairs)]
    return (*rows, *other_methods(measure, found, table_measure(measure), (pairs,), choices.level))


def pair_test_rows(findings: OutcomeFindings) -> tuple[Row, ...]:
    """The p of McNemar's tests, and the family's own in full; the pairs that differ are enough for them."""
    first, second = findings.totals.first_right, findings.totals.second_left
    if first is None or second is None:
        return ()
    pairs = PairCounts(both=0, index_only=first, reference_only=second, neither=0)
    return rows_of_tests(PAIR_TESTS, pairs, findings.test)


def pair_formula(measure: str, pairs: PairCounts) -> str:
    """The estimate's formula with the pair counts in it and each step worked out."""
    e, f, g, n = pairs.both, pairs.index_only, pairs.reference_only, pairs.total
    if measure in ("pair_risk_index", "pair_risk_reference"):
        only = f if measure == "pair_risk_index" else g
        return f"({whole(e)} + {whole(only)})/{whole(n)} = {quotient(e + only, n)}"
    if measure == "pair_difference":
        return f"({whole(f)} − {whole(g)})/{whole(n)} = {value(f - g, n)}"
    if measure == "number_needed":
        return reciprocal(abs(f - g) / n, whole_needed_of_pairs(pairs))
    if measure == "pair_ratio":
        return f"({whole(e)} + {whole(f)})/({whole(e)} + {whole(g)}) = {quotient(e + f, e + g)}"
    return quotient(f, g)


def _arguments(measure: str, pairs: PairCounts) -> tuple[object, ...]:
    if measure == "pair_risk_index":
        return (pairs.both + pairs.index_only, pairs.total)
    return (pairs.both + pairs.reference_only, pairs.total) if measure == "pair_risk_reference" else (pairs,)
