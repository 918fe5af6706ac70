"""The lines of two printed risks at one time: all intervals are at the level of the printed limits."""

from __future__ import annotations

from dataclasses import replace

from fourcount.appraisal.findings import AnyNumberNeeded, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers
from fourcount.wording.form import lacking, measure_of
from fourcount.wording.lines.as_printed import risk_texts
from fourcount.wording.lines.line import MeasureLine, blank_line, figure_line, withheld_line
from fourcount.wording.lines.unpaired import measure_name, needed_line, relative_note
from fourcount.wording.lines.words import method_word

GROUPS: dict[str, names.Group] = {"risk_reference": "reference", "risk_index": "index"}
TIMED_ORDER = ("risk_difference", "number_needed", "risk_reference", "risk_index", "risk_ratio")


def timed_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """Difference first, the ratio last."""
    return tuple(_line(key, outcome, findings, choices) for key in TIMED_ORDER)


def _line(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> MeasureLine:
    measure = measure_of(key, findings)
    if lacking(findings):
        return blank_line(key, measure_name(key, outcome))
    if isinstance(measure, Gap):
        return withheld_line(key, measure_name(key, outcome), measure)
    if isinstance(measure, AnyNumberNeeded):
        people = numbers.number_needed(measure.estimate)
        return needed_line(measure_name(key, outcome, measure), measure, outcome, people)
    word = method_word(measure.method, choices)
    if key == "risk_difference":
        word = f"per 100, {word}"
    elif key != "risk_ratio":
        word = ", ".join(part for part in (names.over_span(outcome), word) if part)
    notes = (relative_note(measure),) if key == "risk_ratio" else (_past(key, measure.interval),)
    line = figure_line(key, measure_name(key, outcome), measure, detail=word, notes=notes)
    if key not in GROUPS:
        return line
    estimate, interval = risk_texts(GROUPS[key], outcome, measure)
    return replace(line, estimate=estimate, interval=interval)


def _past(key: str, interval: limits.AnyInterval) -> str:
    past = key == "risk_difference" and limits.beyond(interval, -1.0, 1.0)
    return "the printed limits, added up, reach past 100 in 100" if past else ""
