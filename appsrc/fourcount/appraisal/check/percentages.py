"""Percentages that no whole number of people gives.

Only where the group is small enough for the digits to leave some out: fewer than 100 times 10^decimals people
(Brown and Heathers 2017, on means, from memory; the same for shares).
"""

from __future__ import annotations

import math
from fractions import Fraction

from fourcount.appraisal.check.digits import rounds_to, scale_of
from fourcount.appraisal.findings.check import Finding
from fourcount.record.entry.digits import plain
from fourcount.record.entry.percent import PrintedPercent, printed_percent
from fourcount.record.entry.percent import rounds_to as percent_rounds_to
from fourcount.record.entry.readings import Mark, PrintedFigure
from fourcount.stats.results import Fact

Group = tuple[int, int]
"""Events and people."""


def of_risk(figure: PrintedFigure, groups: tuple[Group, ...]) -> tuple[Finding, ...]:
    """A printed risk that is no group's: whether any whole number of the group that it comes nearest to gives it."""
    groups = tuple(group for group in groups if group[1])
    if figure.estimate is None or not groups:
        return ()
    scale, decimals = scale_of(figure), figure.estimate.decimals
    printed = figure.estimate.value / scale
    events, total = min(groups, key=lambda group: abs(group[0] / group[1] - printed))
    if not 0 <= printed <= 1 or total >= scale * 10**decimals:
        return ()
    around = range(max(0, math.floor(printed * total) - 1), min(total, math.ceil(printed * total) + 1) + 1)
    if any(rounds_to(Fraction(other * scale, total), figure.estimate) for other in around):
        return ()
    facts: dict[str, Fact] = {"events": events, "total": total, "own": events / total * scale}
    return (Finding(key="percent-none", facts=facts),)


def of_cells(marks: tuple[Mark, ...]) -> tuple[Finding, ...]:
    """For each percentage beside a count that does not give it: whether another whole number would."""
    found = []
    for mark in marks:
        if mark.key != "percent-disagrees":
            continue
        percent = printed_percent(plain(str(mark.facts.get("percent", ""))))
        total, events = mark.facts.get("total"), mark.facts.get("events")
        if percent is None or not isinstance(total, int) or not isinstance(events, int) or total == 0:
            continue
        found.append(_of_cell(mark, percent, events, total))
    return tuple(found)


def _of_cell(mark: Mark, percent: PrintedPercent, events: int, total: int) -> Finding:
    facts: dict[str, Fact] = {
        "field": mark.field,
        "text": str(mark.facts.get("text", "")),
        "percent": str(mark.facts.get("percent", "")).rstrip("% "),
        "events": events,
        "total": total,
        "own": events / total,
    }
    near = math.floor(percent.value * total / 100)
    around = range(max(0, near - 1), min(total, near + 2) + 1)
    fitting = [other for other in around if percent_rounds_to(percent, other, total)]
    if fitting:
        fitting.sort(key=lambda other: abs(other - percent.value * total / 100))
        return Finding(key="percent-other-count", facts={**facts, "fitting": fitting[0], "many": int(len(fitting) > 1)})
    return Finding(key="percent-none-of-total", facts=facts)
