"""A printed effect turned to the index group and the counted outcome."""

from __future__ import annotations

import math

from fourcount.appraisal.extras.printed import DIFFERENCES
from fourcount.appraisal.findings import Figure, Gap, Interval
from fourcount.record.outcome import EffectOnly, Outcome, Pairs

TURNED = ("odds_ratio", "risk_difference")
"""The effects that say the same of the other outcome: an odds ratio turned over, a difference with its sign changed."""


def oriented_effect(figure: Figure, measure: str, outcome: Outcome) -> Figure | Gap:
    """An effect of the print's first group and left outcome, as that of the index group and the counted outcome."""
    if not outcome.counts_left and measure not in TURNED:
        return Gap("other-outcome-unknown")
    turns = (outcome.index_group == "second") + (not outcome.counts_left)
    return turned(figure, measure) if turns == 1 else figure


def welcome_of_effects(outcome: Outcome) -> bool:
    """Whether the event that the outcome's effects are of is welcome.

    A matched case-control study counts the exposed among cases and controls; its odds ratio is of becoming a case.
    """
    return outcome.welcome and not (outcome.design == "matched" and isinstance(outcome.table, Pairs | EffectOnly))


def turned(figure: Figure, measure: str) -> Figure:
    """The other way round: 1/x of a ratio, the other sign of a difference. Twice is as before."""
    turn = _negative if measure in DIFFERENCES else _reciprocal
    estimate, interval = figure.estimate, figure.interval
    if isinstance(interval, Interval):
        interval = Interval(low=turn(interval.high), high=turn(interval.low))
    return Figure(
        estimate=estimate if isinstance(estimate, Gap) else turn(estimate), interval=interval, method=figure.method
    )


def _negative(value: float) -> float:
    return 0.0 - value


def _reciprocal(value: float) -> float:
    return math.inf if value == 0 else 1.0 / value
