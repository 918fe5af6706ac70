"""What every working is put together from: a method's own rows, a quotient with the reader's numbers, other methods."""

from __future__ import annotations

from collections.abc import Callable, Iterable
from dataclasses import dataclass

from fourcount.appraisal.findings import Figure, Gap, Probability
from fourcount.record.outcome import Form
from fourcount.stats.entries.entry import Calculation, HomogeneityEntry
from fourcount.stats.methods import (
    METHODS,
    PAIR_METHODS,
    RATE_METHODS,
    STRATA_METHODS,
    TIMED_METHODS,
    Method,
    Test,
    method,
    test,
)
from fourcount.wording import limits, lines, numbers
from fourcount.wording.gaps import gap_text
from fourcount.wording.half_added import half_added_by
from fourcount.wording.numbers import plain, quantity
from fourcount.wording.working.letters import letter_rows

Row = tuple[str, str]

SPACE: Row = ("", "")
OTHER_METHODS = "By other methods:"
CLUSTER = "cluster"  # reasons that withhold every interval and every p alike begin so
ESTIMATE = "Estimate"
FORMULA = "Formula"
ALL_METHODS = (*METHODS, *PAIR_METHODS, *RATE_METHODS, *STRATA_METHODS, *TIMED_METHODS)
METHOD_MEASURES = {
    "risk_index": "risk",
    "risk_reference": "risk",
    "odds_index": "risk",
    "odds_reference": "risk",
    "risk_difference": "risk_difference",
    "number_needed": "risk_difference",
    "risk_ratio": "risk_ratio",
    "other_risk_ratio": "risk_ratio",
    "odds_ratio": "odds_ratio",
    "pair_risk_index": "pair_risk",
    "pair_risk_reference": "pair_risk",
    "rate_index": "rate",
    "rate_reference": "rate",
}
"""Under which measure the methods of a figure stand in their table, where not under its own key."""

TIMED_MEASURES = {
    "risk_difference": "timed_difference",
    "number_needed": "timed_difference",
    "risk_ratio": "timed_ratio",
}


@dataclass(frozen=True, kw_only=True, slots=True)
class Working:
    """How a figure came about, row by row: what the row is, and its text; rows of nothing part the groups."""

    title: str
    sentence: str
    rows: tuple[Row, ...]


def table_measure(key: str, form: Form = "events-and-others") -> str:
    """Under which measure a figure's methods stand in their table."""
    if form == "risk-at-time" and key in TIMED_MEASURES:
        return TIMED_MEASURES[key]
    if form == "pairs" and key == "number_needed":
        return "pair_difference"
    return METHOD_MEASURES.get(key, key)


def entry_of(key: str, figure: Figure, form: Form) -> Method | None:
    """The method behind a figure; None for a printed interval, which has none."""
    return None if figure.method == "printed" else method(table_measure(key, form), figure.method)


def about(entry: Method | Test | HomogeneityEntry | Calculation) -> list[Row]:
    """A method in full."""
    rows = [("Method", entry.title), (FORMULA, entry.formula), ("Source", entry.source), ("Note", entry.note)]
    return [(label, text) for label, text in rows if text]


def methods_of(measure: str) -> tuple[Method, ...]:
    """Every method of a measure, in the table's order; one side of pairs has those of any risk."""
    wanted = "risk" if measure == "pair_risk" else measure
    return tuple(entry for entry in ALL_METHODS if entry.measure == wanted)


def other_methods(
    key: str, figure: Figure, measure: str, arguments: tuple[object, ...], level: float, per: int = 1
) -> list[Row]:
    """The interval of every other method of the same measure, with the rounding of the one that is shown."""
    if isinstance(figure.interval, Gap) and figure.interval.key.startswith(CLUSTER):
        return []
    rows = []
    for entry in methods_of(measure):
        if entry.key != figure.method:
            interval = entry.interval(*arguments, level)
            rows.append((entry.title, interval_words(key, interval, figure, entry.key, per)))
    return [SPACE, ("", OTHER_METHODS), *rows] if rows else []


def interval_words(key: str, interval: limits.AnyInterval, figure: Figure, method_key: str, per: int = 1) -> str:
    """One method's interval with the rounding of the figure that is shown, or why it has none."""
    if isinstance(interval, Gap):
        return gap_text(interval)
    shown = Figure(estimate=figure.estimate, interval=interval, method=figure.method)
    return f"{lines.interval_text(key, shown, per)}{limits.bracketed(half_added_by(method_key, interval))}"


def interval_rows(
    key: str,
    figure: Figure,
    level: float,
    form: Form,
    counts: object,
    *,
    unit: str = "",
    how: str = "",
    per: int = 1,
) -> list[Row]:
    """The shown interval, and the method behind it in full, with the numbers of ``counts`` for its letters."""
    shown = interval_words(key, figure.interval, figure, figure.method, per)
    rows = [SPACE, (interval_label(level, unit), shown)]
    if how:
        rows.append(("How", how))
    entry = entry_of(key, figure, form)
    if entry is None:
        return rows
    letters = letter_rows(entry.measure, figure, counts, level)
    return [*rows, *before_formula(about(entry), letters)]


def before_formula(rows: list[Row], letters: list[Row]) -> list[Row]:
    """The rows about a method with its letters before its formula: what they are is known when it comes."""
    place = next((i for i, (label, _) in enumerate(rows) if label == FORMULA), len(rows))
    return [*rows[:place], *letters, *rows[place:]]


def interval_label(level: float, unit: str = "") -> str:
    """``Interval, 95%, per 100``."""
    return f"Interval, {numbers.level(level)}{f', {unit}' if unit else ''}"


def quotient(numerator: float, denominator: float) -> str:
    """``38/412 = 0.0922``, also with nothing below the line."""
    return f"{quantity(numerator)}/{quantity(denominator)} = {value(numerator, denominator)}"


def value(numerator: float, denominator: float) -> str:
    """A quotient worked out; infinite, or not determined, with nothing below the line."""
    if denominator:
        return plain(numerator / denominator)
    return numbers.INFINITY if numerator else lines.NOT_DETERMINED


def reciprocal(change: float, rounded_up: str) -> str:
    """``1/0.0789 = 12.67, rounded up 13``."""
    exact = numbers.INFINITY if change == 0 else numbers.fixed(1 / change, 2)
    return f"1/{plain(change)} = {exact}, rounded up {rounded_up}"


def rows_of_tests(
    tests: tuple[Test, ...], counts: object, own: Probability | Gap, *, between: Iterable[Row] = ()
) -> tuple[Row, ...]:
    """The p of every test, or why it has none, then the family's own test in full.

    Where clusters withhold the family's own p, no other one is told either.
    """
    gap = own if isinstance(own, Gap) else own.p
    withheld = isinstance(gap, Gap) and gap.key.startswith(CLUSTER)
    every = [] if withheld else [(entry.title, p_words(entry.p, (counts,))) for entry in tests]
    return (*every, *between, *([] if isinstance(own, Gap) else about(test(own.method))))


def p_words(compute: Callable[..., float | Gap], arguments: tuple[object, ...]) -> str:
    """One p, or why there is none."""
    p = compute(*arguments)
    return gap_text(p) if isinstance(p, Gap) else numbers.p_phrase(p)
