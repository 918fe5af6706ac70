"""One row of a sheet for a figure, a number needed or a sentence; numbers in full."""

from __future__ import annotations

from math import isinf

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, NumberNeededLimit, Range
from fourcount.wording import exports, limits
from fourcount.wording.gaps import gap_text, limit_text
from fourcount.wording.half_added import half_added

Row = tuple[str, str, str, str, str]


def measure_row(name: str, measure: Figure | AnyNumberNeeded | Gap) -> Row:
    """A measure, or why it is not given."""
    if isinstance(measure, Gap):
        return (name, "", "", "", gap_text(measure))
    return _number_needed(name, measure) if isinstance(measure, AnyNumberNeeded) else figure_row(name, measure)


def figure_row(name: str, figure: Figure) -> Row:
    """Estimate, both limits and method; blanks have their reasons under the method."""
    interval = figure.interval
    low, high = (interval, interval) if isinstance(interval, Gap) else (interval.low, interval.high)
    say = limit_text if isinstance(interval, Range) else gap_text
    reasons = [gap_text(figure.estimate)] if isinstance(figure.estimate, Gap) else []
    reasons += [say(limit) for limit in (low, high) if isinstance(limit, Gap)]
    method = "; ".join(part for part in (figure.method, half_added(figure), *dict.fromkeys(reasons)) if part)
    return (name, number_cell(figure.estimate), number_cell(low), number_cell(high), method)


def _number_needed(name: str, needed: AnyNumberNeeded) -> Row:
    through = exports.THROUGH_INFINITY if needed.through_infinity else ""
    low, high = _needed_limit(needed.low, needed), _needed_limit(needed.high, needed)
    why = "; ".join(part for part in (through, limits.withheld_needed(needed)) if part)
    return (name, number_cell(needed.estimate), low, high, why)


def _needed_limit(limit: NumberNeededLimit | Gap, needed: AnyNumberNeeded) -> str:
    """A limit with its own kind in front where that is not the estimate's; blank where it is withheld."""
    if isinstance(limit, Gap):
        return ""
    value = number_cell(limit.value)
    return value if limit.kind in (needed.kind, "neither") else f"{limit.kind} {value}"


def text_row(sentence: str) -> Row:
    """A sentence of its own."""
    return (sentence, "", "", "", "")


def number_cell(number: float | Gap) -> str:
    """The number in full, the point as its decimal mark; blank where there is none."""
    if isinstance(number, Gap):
        return ""
    return exports.SHEET_INFINITY if isinf(number) else repr(float(number))
