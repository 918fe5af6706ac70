"""A figure's estimate and its interval as text, by the kind of its measure."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap
from fourcount.wording import limits, numbers
from fourcount.wording.lines.words import FOLLOWS, KINDS, NOT_DETERMINED, NOT_PRINTED, WITHHELD

NO_WORDS = {"follows": FOLLOWS, "no-interval-printed": NOT_PRINTED}


def estimate_text(key: str, figure: Figure, per: int = 1) -> str:
    """A figure's estimate, with "fewer" or "more" behind a difference; a rate for ``per`` units of person-time."""
    estimate, kind = figure.estimate, KINDS.get(key)
    if isinstance(estimate, Gap):
        return FOLLOWS if estimate.key == "follows" else NOT_DETERMINED
    if kind == "difference":
        return f"{numbers.hundred(estimate)} {limits.side(estimate)}" if estimate else numbers.hundred(0.0)
    if kind == "rate_difference":
        size = numbers.rate(estimate * per)
        return f"{size} {limits.side(estimate)}" if estimate else size
    if kind == "rate":
        return numbers.rate(estimate * per)
    return numbers.percent(estimate) if kind == "risk" else numbers.ratio(estimate)


def interval_text(key: str, figure: Figure, per: int = 1) -> str:
    """A figure's interval without its estimate."""
    interval, kind = figure.interval, KINDS.get(key)
    if isinstance(interval, Gap):
        return NO_WORDS.get(interval.key, WITHHELD)
    if kind == "difference":
        return limits.difference_interval(interval, figure.estimate)
    if kind == "rate_difference":
        return limits.rate_difference_interval(interval, figure.estimate, per)
    if kind == "rate":
        return limits.rate_interval(interval, figure.estimate, per)
    if kind == "risk":
        return limits.percent_interval(interval, figure.estimate)
    return limits.ratio_interval(interval, figure.estimate)
