"""One measure's line: its text and the numbers of its strip, and how a figure becomes one."""

from __future__ import annotations

from dataclasses import dataclass, replace
from typing import Literal

from fourcount.appraisal.findings import Figure, Gap, Interval
from fourcount.wording.gaps import gap_text
from fourcount.wording.lines.text import estimate_text, interval_text
from fourcount.wording.lines.words import KINDS, Kind

LineGroup = Literal["main", "more"]


@dataclass(frozen=True, kw_only=True, slots=True)
class MeasureLine:
    """One measure's text, and the numbers of its drawn strip (None where there is nothing to draw).

    ``withheld`` is the reason for which the whole measure is not given, else "". While the table is
    not whole, every text of a figure is empty. Rates have their strip's numbers in the unit that is shown. ``mark`` is
    where the reader's own line stands on the strip.
    """

    key: str
    name: str
    detail: str = ""
    estimate: str = ""
    interval: str = ""
    note: str = ""
    kind: Kind = ""
    group: LineGroup = "main"
    withheld: str = ""
    low: float | None = None
    estimate_value: float | None = None
    high: float | None = None
    mark: float | None = None


def blank_line(key: str, name: str, group: LineGroup = "main") -> MeasureLine:
    """A measure's name, before there is anything to say of it."""
    return MeasureLine(key=key, name=name, kind=KINDS.get(key, ""), group=group)


def withheld_line(key: str, name: str, gap: Gap, group: LineGroup = "main") -> MeasureLine:
    """A measure that is not given, and why."""
    return replace(blank_line(key, name, group), withheld=gap_text(gap))


def figure_line(
    key: str,
    name: str,
    figure: Figure,
    *,
    detail: str,
    notes: tuple[str, ...] = (),
    group: LineGroup = "main",
    per: int = 1,
    kind: Kind | None = None,
) -> MeasureLine:
    """A figure as its line; ``per`` is how many units of person-time a rate is told for.

    ``notes`` are fragments; the reasons why a part is not given follow them as sentences.
    """
    interval = figure.interval if isinstance(figure.interval, Interval) else None
    estimate = None if isinstance(figure.estimate, Gap) else figure.estimate
    return MeasureLine(
        key=key,
        name=name,
        detail=detail,
        estimate=estimate_text(key, figure, per),
        interval=interval_text(key, figure, per),
        note=note_of(figure, *notes),
        kind=KINDS.get(key, "") if kind is None else kind,
        group=group,
        low=None if interval is None else interval.low * per,
        estimate_value=None if estimate is None else estimate * per,
        high=None if interval is None else interval.high * per,
    )


def note_of(figure: Figure, *fragments: str) -> str:
    """Fragments parted by semicolons, then the reasons for which estimate or interval are not there."""
    sentences = [gap_text(part) for part in (figure.estimate, figure.interval) if isinstance(part, Gap)]
    fragment = "; ".join(part for part in fragments if part)
    if fragment and sentences and not fragment.endswith("."):
        fragment += "."
    return " ".join(part for part in (fragment, *dict.fromkeys(sentences)) if part)


def told_once(lines: tuple[MeasureLine, ...]) -> tuple[MeasureLine, ...]:
    """Neighbours that are withheld for one and the same reason become one line with all their names."""
    result: list[MeasureLine] = []
    for line in lines:
        before = result[-1] if result else None
        if before and line.withheld and line.withheld == before.withheld:
            result[-1] = replace(before, name=f"{before.name}\n{line.name}")
        else:
            result.append(line)
    return tuple(result)
