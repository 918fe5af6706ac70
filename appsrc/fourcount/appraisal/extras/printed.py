"""A printed effect as a figure on the program's own scales."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings import EFFECT_MEASURES, Figure, Gap, Interval, Mark, PrintedFigure
from fourcount.record.outcome import Outcome, PaperMeasure
from fourcount.record.paper import USUAL_LEVEL

PRINTED = "printed"
"""The method of a figure that is taken over as it is printed."""

DIFFERENCES = ("risk_difference", "rate_difference")
RATIOS = tuple(measure for measure in EFFECT_MEASURES if measure not in DIFFERENCES)
_UNITS = {"one": 1.0, "percent": 100.0, "per-1000": 1000.0}


class ReadEffect(msgspec.Struct, frozen=True, kw_only=True):
    """The effect that a printed text holds, or why there is none, and the marks of its field."""

    effect: PrintedFigure | Gap
    marks: tuple[Mark, ...] = ()

    @property
    def figure(self) -> PrintedFigure | None:
        return None if isinstance(self.effect, Gap) else self.effect


def adjusted_of(outcome: Outcome) -> ReadEffect:
    """The adjusted effect that stands beside the counts."""
    return read_effect(outcome.adjusted_text, outcome.adjusted_measure, "adjusted_text")


def read_effect(text: str, measure: PaperMeasure, field: str) -> ReadEffect:
    """The first effect in a text, one of the measure first; risks, p alone and the like are passed over."""
    if not text.strip():
        return ReadEffect(effect=Gap("effect-not-typed"))
    from fourcount.record.entry.printed import read_paper  # most tables have no such text, and start without its reader

    reading = read_paper(text, measure, field)
    effects = [
        figure for figure in reading.figures if figure.measure in EFFECT_MEASURES and figure.estimate is not None
    ]
    chosen = next((figure for figure in effects if figure.measure == measure), effects[0] if effects else None)
    return ReadEffect(effect=Gap("effect-unreadable") if chosen is None else chosen, marks=reading.marks)


def level_of(printed: PrintedFigure) -> float:
    """The level of printed limits; the usual one where the print says none."""
    return printed.level or USUAL_LEVEL


def is_adjusted(printed: PrintedFigure, outcome: Outcome) -> bool:
    """Whether the table's own effect is an adjusted one, by its print or since the reader says for what."""
    return printed.adjusted or bool(outcome.adjusted_for_text.strip())


def as_figure(printed: PrintedFigure) -> Figure | Gap:
    """Estimate and limits as fractions and ratios, the interval a Gap where two limits are not printed.

    Printed limits in the wrong order are put in order; the field's mark says so. Limits that do not hold their own
    estimate give no interval, so that nothing rests on them.
    """
    if printed.estimate is None:
        return Gap("effect-unreadable")
    unit = _UNITS[printed.unit]
    numbers = [number.value / unit for number in (printed.estimate, printed.low, printed.high) if number is not None]
    if printed.measure not in DIFFERENCES and min(numbers) < 0:
        return Gap("effect-out-of-range")
    if printed.measure == "risk_difference" and max(map(abs, numbers)) > 1:
        return Gap("effect-out-of-range")
    interval: Interval | Gap = Gap("no-interval-printed")
    if printed.low is not None and printed.high is not None:
        low, high = min(numbers[1:]), max(numbers[1:])
        interval = Interval(low=low, high=high) if low <= numbers[0] <= high else Gap("limits-disordered")
    return Figure(estimate=numbers[0], interval=interval, method=PRINTED)
