"""Where a textbook interval rests on counts that were altered because one of them is 0."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, Interval, Range

WALTER = "half added to the events and to the people of each group (Walter)"
GART = "half added to each of the four counts (Gart)"
ADDED_BY_METHOD = {"katz": WALTER, "woolf": GART, "gart": GART}
"""What each method adds where it says that it added."""


def half_added(figure: Figure) -> str:
    """``interval with half added ...``, or "" where nothing was; the estimate is never altered."""
    return half_added_by(figure.method, figure.interval)


def half_added_by(method: str, interval: Interval | Range | Gap) -> str:
    """The same of another method's interval."""
    if isinstance(interval, Gap) or interval.adjusted != "half":
        return ""
    return f"interval with {ADDED_BY_METHOD.get(method, GART)}: it need not hold the estimate"
