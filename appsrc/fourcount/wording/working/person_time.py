"""The working of rates: events and person-time in each formula, and every other method."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, OutcomeFindings, Rates
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.methods import RATE_TESTS
from fourcount.wording import lines
from fourcount.wording.form import given, measure_of
from fourcount.wording.numbers import plain, quantity
from fourcount.wording.person_time import per_units, unit_sum
from fourcount.wording.working.parts import (
    ESTIMATE,
    Row,
    interval_rows,
    other_methods,
    quotient,
    rows_of_tests,
    table_measure,
    value,
)


def rate_rows(measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """The rows of one measure of person-time that are there."""
    rates, found = given(findings), measure_of(measure, findings)
    if not isinstance(rates, Rates) or not isinstance(found, Figure):
        return ()
    per = 1 if measure == "rate_ratio" else per_units(rates)
    rows = [(ESTIMATE, rate_formula(measure, rates))]
    unit = "" if measure == "rate_ratio" else f"per {unit_sum(per, outcome)}"
    if unit:
        rows.append((f"{unit[:1].upper()}{unit[1:]}", lines.estimate_text(measure, found, per)))
    arguments = _arguments(measure, rates)
    letters_of = rates if arguments == (rates,) else arguments
    rows += interval_rows(measure, found, choices.level, "person-time", letters_of, unit=unit, per=per)
    return (*rows, *other_methods(measure, found, table_measure(measure), arguments, choices.level, per))


def rate_test_rows(findings: OutcomeFindings) -> tuple[Row, ...]:
    """The p of the tests of equal rates, and the family's own in full."""
    rates = given(findings)
    if not isinstance(rates, Rates):
        return ()
    return rows_of_tests(RATE_TESTS, rates, findings.test)


def rate_formula(measure: str, rates: Rates) -> str:
    """The estimate's formula with events and person-time in it, for one unit."""
    x1, t1, x2, t2 = rates.index_events, rates.index_time, rates.reference_events, rates.reference_time
    if measure in ("rate_index", "rate_reference"):
        return quotient(x1, t1) if measure == "rate_index" else quotient(x2, t2)
    first, second = f"{quantity(x1)}/{quantity(t1)}", f"{quantity(x2)}/{quantity(t2)}"
    if measure == "rate_difference":
        return f"{first} − {second} = {value(x1, t1)} − {value(x2, t2)} = {plain(x1 / t1 - x2 / t2)}"
    return f"({first}) / ({second}) = {value(x1, t1)} / {value(x2, t2)} = {value(x1 * t2, x2 * t1)}"


def _arguments(measure: str, rates: Rates) -> tuple[object, ...]:
    if measure == "rate_index":
        return (rates.index_events, rates.index_time)
    return (rates.reference_events, rates.reference_time) if measure == "rate_reference" else (rates,)
