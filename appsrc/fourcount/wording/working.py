"""The working of one measure: the formula with the reader's numbers in it, its method, and every other method."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass

from fourcount.appraisal.every import conditional_odds_ratio
from fourcount.appraisal.findings import AnyNumberNeeded, Conversion, Counts, Figure, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.methods import METHODS, TESTS, Method, Test, method, test
from fourcount.wording import limits, lines, names, numbers
from fourcount.wording.gaps import gap_text
from fourcount.wording.half_added import half_added_by
from fourcount.wording.numbers import plain, whole
from fourcount.wording.sentence import measure_sentence, p_sentence

Row = tuple[str, str]

SPACE: Row = ("", "")
OTHER_METHODS = "By other methods:"
TEST = "test"
TEST_TITLE = "p value"
OTHER_TITLE = "Ratio of the other outcome"
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
}
BY_LIMITS = {
    "odds_index": "Each limit of the risk, p, turned into odds: p/(1 − p)",
    "odds_reference": "Each limit of the risk, p, turned into odds: p/(1 − p)",
    "number_needed": "The reciprocal of each limit of the difference, rounded up (Altman 1998, BMJ 317:1309)",
}
CONVERSION_SOURCE = "OR/(1 − p + p × OR) at starting risk p (Zhang and Yu 1998, JAMA 280:1690)"
OWN_CONVERSION = "At the study’s own risk this is the table’s own risk ratio and interval: nothing is converted"


@dataclass(frozen=True, kw_only=True, slots=True)
class Working:
    """How a figure came about, row by row: what the row is, and its text; rows of nothing part the groups."""

    title: str
    sentence: str
    rows: tuple[Row, ...]


def working(measure: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> Working:
    """The working of a measure, or of the p values where ``measure`` is "test"."""
    if measure == TEST:
        return Working(title=TEST_TITLE, sentence=p_sentence(findings), rows=_test_rows(findings))
    found = findings.measures[measure]
    needed = found if isinstance(found, AnyNumberNeeded) else None
    title = OTHER_TITLE if measure == "other_risk_ratio" else lines.measure_name(measure, outcome, needed)
    sentence = measure_sentence(measure, outcome, findings, choices)
    counts = findings.counts
    if isinstance(counts, Gap) or isinstance(found, Gap):
        return Working(title=title, sentence=sentence, rows=())
    rows = [("Estimate", formula_with_numbers(measure, counts))]
    if measure == "risk_difference":
        rows += _units(found)
    rows += [SPACE, *_interval_rows(measure, found, findings, choices)]
    if measure == "odds_ratio":
        rows += [*_conversion_rows(findings.conversion, names.risk_name(outcome)), _conditional_row(counts)]
    others = _other_methods(measure, counts, findings, choices)
    if others:
        rows += [SPACE, ("", OTHER_METHODS), *others]
    return Working(title=title, sentence=sentence, rows=tuple(rows))


def formula_with_numbers(measure: str, counts: Counts) -> str:
    """The estimate's formula with the four counts in it and each step worked out."""
    a, b, c, d = (
        counts.index_events,
        counts.index_non_events,
        counts.reference_events,
        counts.reference_non_events,
    )
    if measure in ("risk_index", "odds_index"):
        return _quotient(a, a + b) if measure == "risk_index" else _quotient(a, b)
    if measure in ("risk_reference", "odds_reference"):
        return _quotient(c, c + d) if measure == "risk_reference" else _quotient(c, d)
    if measure == "risk_difference":
        return _difference(counts)
    if measure == "number_needed":
        return _reciprocal(counts)
    if measure == "odds_ratio":
        return f"({whole(a)} × {whole(d)}) / ({whole(b)} × {whole(c)}) = {_quotient(a * d, b * c)}"
    return _ratio(counts) if measure == "risk_ratio" else _ratio(_turned(counts))


def _quotient(numerator: int, denominator: int) -> str:
    """``38/412 = 0.0922``, also with nothing below the line."""
    return f"{whole(numerator)}/{whole(denominator)} = {_value(numerator, denominator)}"


def _value(numerator: int, denominator: int) -> str:
    if denominator:
        return plain(numerator / denominator)
    return numbers.INFINITY if numerator else lines.NOT_DETERMINED


def _difference(counts: Counts) -> str:
    a, n1, c, n2 = counts.index_events, counts.index_total, counts.reference_events, counts.reference_total
    return (
        f"{whole(a)}/{whole(n1)} − {whole(c)}/{whole(n2)} = {_value(a, n1)} − {_value(c, n2)} "
        f"= {plain((a * n2 - c * n1) / (n1 * n2))}"
    )


def _reciprocal(counts: Counts) -> str:
    n1, n2 = counts.index_total, counts.reference_total
    change = abs(counts.index_events * n2 - counts.reference_events * n1) / (n1 * n2)
    exact = numbers.INFINITY if change == 0 else numbers.fixed(1 / change, 2)
    return f"1/{plain(change)} = {exact}, rounded up {lines.whole_needed(counts)}"


def _ratio(counts: Counts) -> str:
    a, n1, c, n2 = counts.index_events, counts.index_total, counts.reference_events, counts.reference_total
    return (
        f"({whole(a)}/{whole(n1)}) / ({whole(c)}/{whole(n2)}) = {_value(a, n1)} / {_value(c, n2)} "
        f"= {_value(a * n2, c * n1)}"
    )


def _turned(counts: Counts) -> Counts:
    """The same people with the other outcome counted."""
    return Counts(
        index_events=counts.index_non_events,
        index_non_events=counts.index_events,
        reference_events=counts.reference_non_events,
        reference_non_events=counts.reference_events,
    )


def _interval_rows(
    measure: str, found: Figure | AnyNumberNeeded, findings: OutcomeFindings, choices: Choices
) -> list[Row]:
    """The shown interval, and the method behind it in full."""
    label = f"Interval, {numbers.level(choices.level)}{', per 100' if measure == 'risk_difference' else ''}"
    if isinstance(found, AnyNumberNeeded):
        shown, figure = limits.number_needed_interval(found), findings.measures["risk_difference"]
    else:
        gap = gap_text(found.interval) if isinstance(found.interval, Gap) else ""
        shown, figure = gap or _interval(measure, found.interval, found, found.method), found
    rows = [(label, shown)]
    if measure in BY_LIMITS:
        rows.append(("How", BY_LIMITS[measure]))
    if isinstance(figure, Figure):
        rows += _about(method(METHOD_MEASURES[measure], figure.method))
    return rows


def _about(entry: Method | Test) -> list[Row]:
    rows = [("Method", entry.title), ("Formula", entry.formula), ("Source", entry.source), ("Note", entry.note)]
    return [(label, text) for label, text in rows if text]


def _interval(measure: str, interval: limits.AnyInterval, figure: Figure, method_key: str) -> str:
    """One method's interval with the rounding of the figure that is shown."""
    if isinstance(interval, Gap):
        return gap_text(interval)
    text = lines.interval_text(measure, Figure(estimate=figure.estimate, interval=interval, method=figure.method))
    return f"{text}{limits.bracketed(half_added_by(method_key, interval))}"


def _other_methods(measure: str, counts: Counts, findings: OutcomeFindings, choices: Choices) -> list[Row]:
    """The interval of every other method of the same measure, with the same rounding."""
    figure = findings.measures[measure]
    if not isinstance(figure, Figure) or measure in BY_LIMITS:
        return []
    rows = []
    for entry in METHODS:
        if entry.measure != METHOD_MEASURES[measure] or entry.key == figure.method:
            continue
        interval = entry.interval(*_arguments(measure, counts), choices.level)
        rows.append((entry.title, _interval(measure, interval, figure, entry.key)))
    return rows


def _arguments(measure: str, counts: Counts) -> tuple[int, int] | tuple[Counts]:
    if measure == "risk_index":
        return counts.index_events, counts.index_total
    if measure == "risk_reference":
        return counts.reference_events, counts.reference_total
    return (_turned(counts) if measure == "other_risk_ratio" else counts,)


def _conversion_rows(conversion: Conversion | Gap, risk: str) -> list[Row]:
    if isinstance(conversion, Gap):
        return []
    figure = conversion.risk_ratio
    label = f"As a {risk} ratio at {lines.baseline_text(conversion.baseline, conversion.baseline_from)}"
    if isinstance(figure.estimate, Gap):
        return [(label, gap_text(figure.estimate))]
    interval = limits.bracketed(limits.ratio_interval(figure.interval, figure.estimate))
    how = CONVERSION_SOURCE if conversion.baseline_from == "given" else OWN_CONVERSION
    return [(label, f"{numbers.ratio(figure.estimate)}{interval}"), ("How", how)]


def _conditional_row(counts: Counts) -> Row:
    estimate = conditional_odds_ratio(counts)
    text = gap_text(estimate) if isinstance(estimate, Gap) else numbers.ratio(estimate)
    return ("Conditional estimate, given both margins", text)


def _units(found: Figure | AnyNumberNeeded) -> list[Row]:
    """The difference in its two other units; a percentage of nothing."""
    if not isinstance(found, Figure) or isinstance(found.estimate, Gap):
        return []
    change = found.estimate
    word = f" {limits.side(change)}" if change else ""
    return [
        ("In percentage points", f"{numbers.hundred(change)}{word}"),
        ("Per 1,000 people", f"{numbers.thousand(change)}{word}"),
    ]


def _test_rows(findings: OutcomeFindings) -> tuple[Row, ...]:
    """The p of all tests, then the formula and source of each."""
    counts = findings.counts
    if isinstance(counts, Gap):
        return ()
    values = [(entry.title, _p(entry.p, counts)) for entry in TESTS]
    own = [] if isinstance(findings.test, Gap) else _about(test(findings.test.method))
    return (*values, *own)


def _p(compute: Callable[[Counts], float | Gap], counts: Counts) -> str:
    p = compute(counts)
    return gap_text(p) if isinstance(p, Gap) else numbers.p_phrase(p)
