"""Findings as other programs read them: plain dictionaries, lists, numbers and strings, ready for strict JSON.

Other programs rely on the keys: add some, never rename one. Fractions, not percentages, and unrounded. An infinity is
the string "inf" or "-inf". What cannot be given is ``{"withheld": key, "text": sentence}`` in its place, at any depth.
"""

from __future__ import annotations

from collections.abc import Mapping
from math import inf

from fourcount.appraisal.every import conditional_odds_ratio, every_method, every_test
from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Conversion,
    Counts,
    Figure,
    Gap,
    Interval,
    NumberNeededLimit,
    OutcomeFindings,
    PatientFindings,
    Range,
)
from fourcount.record.entry.digits import plain
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording.cautions import caution_text
from fourcount.wording.gaps import gap_text, limit_text

Json = dict[str, object]

FORMAT = 1
PUBLISHED = ("risk_index", "risk_reference", "risk_difference", "number_needed", "risk_ratio", "odds_ratio")


def contract(outcome: Outcome, choices: Choices, findings: OutcomeFindings) -> Json:
    """All that one outcome says, every method and test included."""
    given: Json = {"patient": _patient(findings.patient)} if plain(outcome.patient.starting_risk_text) else {}
    return {
        "format": FORMAT,
        "design": outcome.design,
        "level": choices.level,
        "intervals": choices.family,
        "measures": {key: _measure(findings.measures[key]) for key in PUBLISHED},
        **_every_method(findings.counts, outcome, choices),
        "conversion": _conversion(findings.conversion),
        **given,
        "cautions": [{"key": caution.key, "text": caution_text(caution)} for caution in findings.cautions],
    }


def _every_method(counts: Counts | Gap, outcome: Outcome, choices: Choices) -> Json:
    """Every method of every measure and every test; ``adjusted_methods`` names those that added to the counts.

    Two numbers cannot say that a count was altered on the way, so the methods that do are listed beside them.
    """
    if isinstance(counts, Gap):
        gap = _withheld(counts)
        return {"methods": gap, "adjusted_methods": {}, "conditional_odds_ratio": gap, "tests": gap}
    intervals = every_method(counts, outcome.design, choices.level)
    adjusted = {measure: _adjusted(methods) for measure, methods in intervals.items()}
    return {
        "methods": {
            measure: {key: _pair(interval) for key, interval in methods.items()}
            for measure, methods in intervals.items()
        },
        "adjusted_methods": {measure: keys for measure, keys in adjusted.items() if keys},
        "conditional_odds_ratio": _value(conditional_odds_ratio(counts)),
        "tests": {key: _value(p) for key, p in every_test(counts).items()},
    }


def _adjusted(methods: Mapping[str, Interval | Gap]) -> dict[str, str]:
    return {
        key: interval.adjusted
        for key, interval in methods.items()
        if isinstance(interval, Interval) and interval.adjusted is not None
    }


def _measure(measure: Figure | AnyNumberNeeded | Gap) -> Json:
    if isinstance(measure, Gap):
        return _withheld(measure)
    return _number_needed(measure) if isinstance(measure, AnyNumberNeeded) else _figure(measure)


def _figure(figure: Figure) -> Json:
    low, high, adjusted = _limits(figure.interval)
    correction: Json = {"adjusted": adjusted} if adjusted else {}
    return {"estimate": _value(figure.estimate), "low": low, "high": high, "method": figure.method, **correction}


def _limits(interval: Interval | Range | Gap) -> tuple[object, object, str | None]:
    """Both limits and the correction in use; an interval that is withheld is withheld at both ends."""
    if isinstance(interval, Gap):
        return _withheld(interval), _withheld(interval), None
    return _limit(interval.low), _limit(interval.high), interval.adjusted


def _limit(limit: float | Gap) -> object:
    """One limit, or why it alone is not given."""
    return _withheld_limit(limit) if isinstance(limit, Gap) else _value(limit)


def _pair(interval: Interval | Gap) -> object:
    return _withheld(interval) if isinstance(interval, Gap) else [_value(interval.low), _value(interval.high)]


def _number_needed(needed: AnyNumberNeeded) -> Json:
    return {
        "estimate": _value(needed.estimate),
        "kind": needed.kind,
        "low": _number_needed_limit(needed.low),
        "high": _number_needed_limit(needed.high),
        "through_infinity": needed.through_infinity,
    }


def _number_needed_limit(limit: NumberNeededLimit | Gap) -> Json:
    if isinstance(limit, Gap):
        return _withheld_limit(limit)
    return {"value": _value(limit.value), "kind": limit.kind}


def _conversion(conversion: Conversion | Gap) -> Json:
    if isinstance(conversion, Gap):
        return _withheld(conversion)
    return {
        "baseline": conversion.baseline,
        "baseline_from": conversion.baseline_from,
        "risk_ratio": _figure(conversion.risk_ratio),
    }


def _patient(patient: PatientFindings | Gap) -> Json:
    """The effect at a starting risk from elsewhere, which is a bare number: only what follows from it has limits."""
    if isinstance(patient, Gap):
        return _withheld(patient)
    return {
        "baseline": patient.baseline,
        "effect": patient.effect,
        "risk_without": _value(patient.without.estimate),
        "risk_with": _figure(patient.with_),
        "difference": _figure(patient.difference),
        "number_needed": _measure(patient.number_needed),
        "risk_ratio": _figure(patient.risk_ratio),
        "range_from": patient.range_from,
    }


def _value(number: float | Gap) -> object:
    """A number as JSON can hold it."""
    if isinstance(number, Gap):
        return _withheld(number)
    return {inf: "inf", -inf: "-inf"}.get(number, number)


def _withheld_limit(gap: Gap) -> Json:
    return {"withheld": gap.key, "text": limit_text(gap)}


def _withheld(gap: Gap) -> Json:
    return {"withheld": gap.key, "text": gap_text(gap)}
