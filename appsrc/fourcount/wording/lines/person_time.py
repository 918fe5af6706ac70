"""The lines of person-time: the difference of two rates, both rates, and their ratio."""

from __future__ import annotations

import math

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, Rates
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers
from fourcount.wording.form import given, measure_of
from fourcount.wording.lines.line import MeasureLine, blank_line, figure_line, withheld_line
from fourcount.wording.lines.unpaired import relative_note
from fourcount.wording.lines.words import KINDS, method_word
from fourcount.wording.person_time import per_units, time_in, unit_sum

PAST_NONE = "the bare formula reaches below 0"
RATES_ORDER = ("rate_difference", "rate_reference", "rate_index", "rate_ratio")


def rate_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[MeasureLine, ...]:
    """Difference first, the ratio last."""
    return tuple(_line(key, outcome, findings, choices) for key in RATES_ORDER)


def rate_name(key: str, outcome: Outcome) -> str:
    """What a line of person-time calls its measure."""
    return {
        "rate_difference": "Rate difference",
        "rate_reference": f"Rate, {names.label_within(outcome, 'reference')}",
        "rate_index": f"Rate, {names.label_within(outcome, 'index')}",
        "rate_ratio": "Rate ratio",
    }[key]


def _line(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> MeasureLine:
    rates, measure, name = given(findings), measure_of(key, findings), rate_name(key, outcome)
    if not isinstance(rates, Rates):
        return blank_line(key, name)
    if isinstance(measure, Gap):
        return withheld_line(key, name, measure)
    if not isinstance(measure, Figure):
        return blank_line(key, name)
    per = per_units(rates)
    detail = f"{_counts(key, rates, outcome)}{method_word(measure.method, choices)}"
    below = PAST_NONE if KINDS[key] == "rate" and limits.beyond(measure.interval, 0.0, math.inf) else ""
    notes = (below, relative_note(measure) if key == "rate_ratio" else "")
    return figure_line(key, name, measure, detail=detail, notes=notes, per=1 if key == "rate_ratio" else per)


def _counts(key: str, rates: Rates, outcome: Outcome) -> str:
    """The unit in which a figure is told, with the events and the time behind a single rate."""
    if key == "rate_ratio":
        return ""
    per = per_units(rates)
    if key == "rate_difference":
        return f"per {unit_sum(per, outcome)}, "
    index = key == "rate_index"
    events, time = (rates.index_events, rates.index_time) if index else (rates.reference_events, rates.reference_time)
    told = numbers.whole(per) if per > 1 else unit_sum(per, outcome)
    return f"per {told}; {numbers.whole(events)} in {time_in(time, outcome)}, "
