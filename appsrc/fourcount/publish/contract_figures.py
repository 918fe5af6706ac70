"""Figures as other programs read them: numbers as they are, infinities as strings, reasons in their place."""

from __future__ import annotations

from math import inf

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, Interval, NumberNeededLimit, Range
from fourcount.wording.gaps import gap_text, limit_text

Json = dict[str, object]


def measure_json(measure: Figure | AnyNumberNeeded | Gap) -> Json:
    """A measure, or why it is not given."""
    if isinstance(measure, Gap):
        return withheld_json(measure)
    return _number_needed(measure) if isinstance(measure, AnyNumberNeeded) else figure_json(measure)


def figure_json(figure: Figure) -> Json:
    """Estimate, both limits and the method; a correction in use beside them."""
    low, high, adjusted = _limits(figure.interval)
    correction: Json = {"adjusted": adjusted} if adjusted else {}
    return {"estimate": value_json(figure.estimate), "low": low, "high": high, "method": figure.method, **correction}


def _limits(interval: Interval | Range | Gap) -> tuple[object, object, str | None]:
    """Both limits and the correction in use; an interval that is withheld is withheld at both ends."""
    if isinstance(interval, Gap):
        return withheld_json(interval), withheld_json(interval), None
    return _limit(interval.low), _limit(interval.high), interval.adjusted


def _limit(limit: float | Gap) -> object:
    """One limit, or why it alone is not given."""
    return _withheld_limit(limit) if isinstance(limit, Gap) else value_json(limit)


def pair_json(interval: Interval | Gap) -> object:
    """Both limits of one method."""
    return (
        withheld_json(interval) if isinstance(interval, Gap) else [value_json(interval.low), value_json(interval.high)]
    )


def _number_needed(needed: AnyNumberNeeded) -> Json:
    return {
        "estimate": value_json(needed.estimate),
        "kind": needed.kind,
        "low": _number_needed_limit(needed.low),
        "high": _number_needed_limit(needed.high),
        "through_infinity": needed.through_infinity,
    }


def _number_needed_limit(limit: NumberNeededLimit | Gap) -> Json:
    if isinstance(limit, Gap):
        return _withheld_limit(limit)
    return {"value": value_json(limit.value), "kind": limit.kind}


def value_json(number: float | Gap) -> object:
    """A number as JSON can hold it."""
    if isinstance(number, Gap):
        return withheld_json(number)
    return {inf: "inf", -inf: "-inf"}.get(number, number)


def _withheld_limit(gap: Gap) -> Json:
    return {"withheld": gap.key, "text": limit_text(gap)}


def withheld_json(gap: Gap) -> Json:
    """Why something is not given."""
    return {"withheld": gap.key, "text": gap_text(gap)}
