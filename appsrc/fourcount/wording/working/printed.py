"""The working of what only the print gives: two risks with their limits, or one effect."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, OutcomeFindings, PrintedFigure, TimedRisks
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import numbers
from fourcount.wording.form import given, level_of, measure_of, shown_choices
from fourcount.wording.numbers import plain
from fourcount.wording.working.extras import recovered_rows
from fourcount.wording.working.parts import ESTIMATE, SPACE, Row, interval_rows, reciprocal
from fourcount.wording.working.unpaired import needed_rows, units

AS_PRINTED = "As printed"
NO_LEVEL = "The paper names no level; 95% is taken"


def timed_rows(measure: str, _outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """The rows of one measure of two printed risks."""
    timed, found = given(findings), measure_of(measure, findings)
    if not isinstance(timed, TimedRisks) or isinstance(found, Gap):
        return ()
    index, reference = timed.index.risk, timed.reference.risk
    if isinstance(found, AnyNumberNeeded):
        row = (ESTIMATE, reciprocal(abs(index - reference), numbers.number_needed(found.estimate)))
        shown = shown_choices(findings, choices)
        return (row, *needed_rows(found, findings.measures["risk_difference"], findings, shown))
    if measure in ("risk_index", "risk_reference"):
        rows = [(AS_PRINTED, plain(index if measure == "risk_index" else reference))]
    elif measure == "risk_difference":
        rows = [(ESTIMATE, f"{plain(index)} − {plain(reference)} = {plain(index - reference)}"), *units(found)]
    else:
        ratio = "" if isinstance(found.estimate, Gap) else f" = {plain(found.estimate)}"
        rows = [(ESTIMATE, f"{plain(index)} / {plain(reference)}{ratio}")]
    unit = "per 100" if measure == "risk_difference" else ""
    return (*rows, *interval_rows(measure, found, level_of(findings, choices), "risk-at-time", timed, unit=unit))


def effect_rows(measure: str, _outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """The printed text, its level, and what follows from its limits alone."""
    printed, found = given(findings), measure_of(measure, findings)
    if not isinstance(printed, PrintedFigure) or not isinstance(found, Figure):
        return ()
    level = numbers.level(level_of(findings, choices)) if printed.level else NO_LEVEL
    rows: list[Row] = [(AS_PRINTED, printed.text), ("Level", level)]
    return (*rows, *([SPACE, *rest] if (rest := recovered_rows(findings)) else []))
