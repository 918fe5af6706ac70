"""A paper's own results as it prints them: what each is called, estimate, limits, level and p."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.record.entry.digits import specimen
from fourcount.record.entry.figure_found import Figure
from fourcount.record.entry.figure_grammar import Grammar
from fourcount.record.entry.readings import Fact, Mark, PaperReading, PrintedFigure, PrintedUnit
from fourcount.record.entry.tokens import LONGEST_TEXT, Print, take_apart
from fourcount.record.outcome import PaperMeasure

PAPER_MARKS = (
    "paper-unreadable",  # no figure in it at all
    "paper-measure",  # a figure of another kind, such as a difference of means: left out
    "paper-leftover",  # a number in it that was taken for nothing: the rest is used
    "paper-one-limit",  # one number where two limits belong: the estimate is used without it
    "paper-limits-order",  # the lower limit is printed behind the upper one: used as printed
    "paper-limits-outside",  # the estimate lies outside its own limits: used as printed
    "paper-level",  # a level below 50% or of 100% and more: left out
    "paper-p",  # a p above 1 or below 0: left out
    "paper-too-long",  # more text than is read
)
_LOWEST_LEVEL = 0.5
_BEYOND_ONE = 1.2
"""Up to here limits of a difference of fractions reach, as some methods let them pass one."""


def read_paper(text: str, measure: PaperMeasure, field: str = "paper_text") -> PaperReading:
    """All results in a text such as ``RR 0.54 (95% CI, 0.37 to 0.78; P = 0.001)``.

    A figure without a name is of ``measure``; an unnamed percentage beside a ratio is a risk, or a risk difference
    where it has limits or a minus. Differences in points, with a percent sign or above 1 are percentages.
    """
    if len(text) > LONGEST_TEXT:
        return PaperReading(marks=(_mark(field, "paper-too-long", text),))
    printed = take_apart(text)
    if not printed.tokens:
        return PaperReading()
    grammar = Grammar(printed.tokens, unnamed=True)
    found = grammar.figures()
    marks = [_mark(field, "paper-leftover", token.text, used=bool(found)) for token in grammar.leftover[:1]]
    if not found:
        return PaperReading(marks=(_mark(field, "paper-unreadable", text),))
    figures = []
    for figure in found:
        marks.extend(_doubts(figure, printed, field))
        finished = _finished(figure, printed, measure)
        if finished:
            figures.append(finished)
    return PaperReading(figures=tuple(figures), marks=tuple(marks))


def named_figures(printed: Print, measure: PaperMeasure) -> tuple[tuple[PrintedFigure, tuple[int, int]], ...]:
    """The figures that a longer text names, each with the places of its first token and after its last one."""
    found = Grammar(printed.tokens, unnamed=False).figures()
    finished = ((_finished(figure, printed, measure), (figure.first, figure.after)) for figure in found)
    return tuple((figure, places) for figure, places in finished if figure)


def _finished(figure: Figure, printed: Print, measure: PaperMeasure) -> PrintedFigure | None:
    """A figure with its measure and unit decided; None for one of another kind or without anything usable."""
    called = figure.measure_or(measure)
    p = figure.p if figure.p and 0 <= figure.p.value <= 1 else None
    if called is None or _is_percent_ratio(figure, called) or (figure.estimate is None and p is None):
        return None
    level = figure.level if figure.level and _LOWEST_LEVEL <= figure.level < 1 else None
    return PrintedFigure(
        measure=called,
        text=printed.piece(figure.first, figure.after),
        estimate=figure.estimate,
        low=figure.low,
        high=figure.high,
        level=level,
        p=p,
        p_relation=figure.p_relation,
        unit=_unit(figure, called),
        adjusted=figure.adjusted,
    )


def _is_percent_ratio(figure: Figure, called: str | None) -> bool:
    """Whether a ratio is printed as a percentage, which may be the ratio or the change from one."""
    return called is not None and called.endswith("ratio") and figure.unit == "percent"


def _unit(figure: Figure, called: str) -> PrintedUnit:
    if called not in ("risk_difference", "rate_difference", "relative_reduction", "risk"):
        return "one"
    if figure.unit != "one" or called == "rate_difference":
        return figure.unit
    values = [abs(number.value) for number in (figure.estimate, figure.low, figure.high) if number]
    estimate = figure.estimate
    fraction = estimate is not None and abs(estimate.value) <= 1 and estimate.decimals > 1
    return "percent" if max(values, default=0) > (_BEYOND_ONE if fraction else 1) else "one"


def _doubts(figure: Figure, printed: Print, field: str) -> Sequence[Mark]:
    """What is odd in one printed figure; most of it is used all the same, as printed."""
    text = printed.piece(figure.first, figure.after)
    marks = []
    other = figure.named and figure.name is not None and figure.name.measure is None
    if other or _is_percent_ratio(figure, figure.measure_or("risk_ratio")):
        marks.append(_mark(field, "paper-measure", text))
    if figure.one_limit:
        marks.append(_mark(field, "paper-one-limit", text, used=True, limit=figure.one_limit))
    if figure.level is not None and not _LOWEST_LEVEL <= figure.level < 1:
        marks.append(_mark(field, "paper-level", text, used=True))
    if figure.p and not 0 <= figure.p.value <= 1:
        marks.append(_mark(field, "paper-p", text, used=True, p=figure.p.text))
    if figure.low and figure.high and figure.estimate and figure.measure_or("risk_ratio") != "number_needed":
        low, high, estimate = figure.low, figure.high, figure.estimate
        facts: dict[str, Fact] = {"low": low.text, "high": high.text, "estimate": estimate.text}
        if low.value > high.value:
            marks.append(_mark(field, "paper-limits-order", text, used=True, **facts))
        elif not low.value <= estimate.value <= high.value:
            marks.append(_mark(field, "paper-limits-outside", text, used=True, **facts))
    return marks


def _mark(field: str, key: str, text: str, *, used: bool = False, **facts: Fact) -> Mark:
    return Mark(field=field, key=key, facts={"text": specimen(text), **facts}, used=used)
