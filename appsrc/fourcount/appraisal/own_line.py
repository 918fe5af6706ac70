"""A line of the reader's own beside a measure: the smallest difference that would matter, or a margin."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Literal, cast

from fourcount.appraisal.case import no_effect_of
from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, Interval, Mark, OwnLine, Range
from fourcount.appraisal.turning import welcome_of_effects
from fourcount.record.entry.margin import read_margin
from fourcount.record.entry.readings import Blank, Unreadable
from fourcount.record.outcome import LineScale, LineSide, Outcome
from fourcount.stats.margins import MarginMeasure, margin_p, margin_p_from_interval
from fourcount.stats.results import FractionalCounts

Measures = Mapping[str, Figure | AnyNumberNeeded | Gap]
Lies = Literal["beyond", "short", "across"]

MEASURES_OF: dict[LineScale, tuple[str, ...]] = {
    "risk_difference": ("pooled_risk_difference", "pair_difference", "risk_difference"),
    "risk_ratio": ("pooled_risk_ratio", "pair_ratio", "risk_ratio"),
    "odds_ratio": ("pooled_odds_ratio", "pair_odds_ratio", "odds_ratio"),
    "hazard_ratio": ("hazard_ratio", "rate_ratio"),
}
"""The measures on each scale of a line, the one that the form speaks of first."""

OF_COUNTS = ("risk_difference", "risk_ratio", "odds_ratio")
SCORE, PRINTED = "margin-score", "margin-printed"
"""The keys of the two tests of a margin among the calculations."""


def own_line(
    outcome: Outcome, measures: Measures, counts: FractionalCounts | None, level: float
) -> tuple[OwnLine | Gap | None, tuple[Mark, ...]]:
    """The line that the outcome draws, where it lies against the interval of its measure, and the field's mark.

    ``measures`` are the form's, with the pooled ones of strata. ``counts`` are those behind the intervals of one
    unpaired table, None where the intervals come from elsewhere; ``level`` is that of the intervals, maybe printed.
    None where no line is drawn, or none typed yet.
    """
    if outcome.line_kind == "none":
        return None, ()
    value = read_margin(outcome.line_text, outcome.line_scale, outcome.line_side)
    if isinstance(value, Blank):
        return None, ()
    if isinstance(value, Unreadable):
        return Gap("line-unreadable"), (Mark(field="line_text", key=value.key, facts=value.facts),)
    return _against(outcome, value, measures, counts, level), ()


def _against(
    outcome: Outcome, value: float, measures: Measures, counts: FractionalCounts | None, level: float
) -> OwnLine | Gap:
    key = next((key for key in MEASURES_OF[outcome.line_scale] if key in measures), None)
    figure = None if key is None else measures[key]
    if isinstance(figure, Gap):
        return figure
    if key is None or not isinstance(figure, Figure):
        return Gap("line-scale-not-here")
    lies = where_it_lies(figure.interval, value, outcome.line_side)
    if isinstance(lies, Gap):
        return lies
    margin, welcome = outcome.line_kind == "margin", welcome_of_effects(outcome)
    whole = counts if key in OF_COUNTS else None
    worse_side = (outcome.line_side == "fewer") == welcome
    # Always against what is worse than the margin, so that a small p speaks for the better side of it.
    p = _p(key, figure, whole, value, "fewer" if welcome else "more", level) if margin else None
    return OwnLine(
        kind="margin" if margin else "matters",
        measure=key,
        value=value,
        lies=lies,
        worse_side=worse_side,
        p=p,
        parted=isinstance(p, float) and (p < (1.0 - level) / 2.0) != (lies == ("short" if worse_side else "beyond")),
        method=(PRINTED if whole is None else SCORE) if margin else "",
        level=level,
    )


def where_it_lies(interval: Interval | Range | Gap, value: float, side: LineSide) -> Lies | Gap:
    """Whether the interval lies wholly past the line, wholly on the side of no effect, or on both sides of it.

    A limit on the line lies across it. A limit that is withheld tells only where the other one decides.
    """
    if isinstance(interval, Gap):
        return interval
    # Seen so that the line's own side is below.
    near, far = (interval.high, interval.low) if side == "fewer" else (interval.low, interval.high)
    sign = 1.0 if side == "fewer" else -1.0
    if not isinstance(near, Gap) and sign * near < sign * value:
        return "beyond"
    if isinstance(far, Gap):
        return far
    if sign * far > sign * value:
        return "short"
    return near if isinstance(near, Gap) else "across"


def _p(
    key: str, figure: Figure, counts: FractionalCounts | None, value: float, side: LineSide, level: float
) -> float | Gap:
    if counts is not None:
        return margin_p(cast("MarginMeasure", key), counts, value, side)
    if isinstance(figure.estimate, Gap):
        return figure.estimate
    if not isinstance(figure.interval, Interval):
        return Gap("no-interval-printed")
    scale: Literal["log", "plain"] = "log" if no_effect_of(key) else "plain"
    return margin_p_from_interval(figure.estimate, figure.interval.low, figure.interval.high, level, value, side, scale)
