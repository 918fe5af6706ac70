"""One row of a sheet for a figure, a number needed or a sentence; numbers in full."""

from __future__ import annotations

from decimal import Decimal
from math import isinf

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, NumberNeededLimit, Range
from fourcount.record.outcome import Form
from fourcount.wording import exports, limits
from fourcount.wording.gaps import gap_text, limit_text
from fourcount.wording.half_added import half_added
from fourcount.wording.working.extras import CALCULATIONS
from fourcount.wording.working.parts import ALL_METHODS, methods_of, table_measure

Row = tuple[str, str, str, str, str, str]
"""What it is, estimate, low, high, method, note."""

PRINTED = "printed"
P_DIGITS = 4


def measure_row(name: str, measure: Figure | AnyNumberNeeded | Gap, key: str, form: Form) -> Row:
    """A measure, or why it is not given."""
    if isinstance(measure, Gap):
        return (name, "", "", "", "", gap_text(measure))
    return (
        _number_needed(name, measure) if isinstance(measure, AnyNumberNeeded) else figure_row(name, measure, key, form)
    )


def figure_row(name: str, figure: Figure, key: str, form: Form) -> Row:
    """Estimate, both limits and method; blanks have their reasons in the note."""
    interval = figure.interval
    low, high = (interval, interval) if isinstance(interval, Gap) else (interval.low, interval.high)
    say = limit_text if isinstance(interval, Range) else gap_text
    reasons = [gap_text(figure.estimate)] if isinstance(figure.estimate, Gap) else []
    reasons += [say(limit) for limit in (low, high) if isinstance(limit, Gap)]
    note = "; ".join(part for part in (half_added(figure), *dict.fromkeys(reasons)) if part)
    cells = number_cell(figure.estimate), number_cell(low), number_cell(high)
    return (name, *cells, method_title(key, figure.method, form), note)


def method_title(key: str, method: str, form: Form) -> str:
    """What the working calls the method of a figure; of a printed one that it is printed."""
    if method == PRINTED:
        return exports.METHOD_AS_PRINTED
    named = (*methods_of(table_measure(key, form)), *ALL_METHODS)
    title = next((entry.title for entry in named if entry.key == method), "")
    return title or (CALCULATIONS[method].title if method in CALCULATIONS else method)


def _number_needed(name: str, needed: AnyNumberNeeded) -> Row:
    through = exports.THROUGH_INFINITY if needed.through_infinity else ""
    low, high = _needed_limit(needed.low, needed), _needed_limit(needed.high, needed)
    why = "; ".join(part for part in (through, limits.withheld_needed(needed)) if part)
    return (name, number_cell(needed.estimate), low, high, "", why)


def _needed_limit(limit: NumberNeededLimit | Gap, needed: AnyNumberNeeded) -> str:
    """A limit with its own kind in front where that is not the estimate's; blank where it is withheld."""
    if isinstance(limit, Gap):
        return ""
    value = number_cell(limit.value)
    return value if limit.kind in (needed.kind, "neither") else f"{limit.kind} {value}"


def text_row(sentence: str) -> Row:
    """A sentence of its own under the head: what the sheet is about."""
    return (sentence, "", "", "", "", "")


def note_row(kind: str, sentence: str) -> Row:
    """A sentence in the last column: a caution, or what holds of the whole sheet."""
    return (kind, "", "", "", "", sentence)


def count_row(name: str, number: float) -> Row:
    """A number that was typed."""
    return (name, str(number) if isinstance(number, int) else number_cell(number), "", "", "", "")


def number_cell(number: float | Gap) -> str:
    """The number in full, the point as its decimal mark; blank where there is none."""
    if isinstance(number, Gap):
        return ""
    return exports.SHEET_INFINITY if isinf(number) else repr(float(number))


def p_cell(p: float | Gap) -> str:
    """A p to four significant digits, written out: more of them mean nothing, and no test gives them alike."""
    return "" if isinstance(p, Gap) else format(Decimal(f"{p:.{P_DIGITS}g}"), "f")
