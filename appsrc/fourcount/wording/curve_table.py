"""The numbers of the curve as a table: a row for each starting risk, a column for each line."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import Gap
from fourcount.appraisal.findings.curve import Curve, CurveLine, CurvePoint
from fourcount.record.outcome import Outcome
from fourcount.wording import limits, names, numbers
from fourcount.wording.curve import NOT_GIVEN, View, mark_words, name_and_value, point_at, shown_lines, start_text


class CurveRow(NamedTuple):
    """One starting risk of the table of the same numbers, and a text for each line."""

    start: str
    cells: tuple[str, ...]


def curve_head(outcome: Outcome, curve: Curve, view: View) -> CurveRow:
    """The heads of the table of the same numbers."""
    cells = [names.sentence_case(name_and_value(outcome, line.effect)) for line in shown_lines(curve, view)]
    if view.ratios:
        cells = [f"{cell} as a {names.effect_name(outcome, 'risk_ratio')}" for cell in cells]
    return CurveRow(f"Starting {names.risk_name(outcome)}", tuple(cells))


def curve_rows(curve: Curve, view: View, starts: tuple[float, ...]) -> list[CurveRow]:
    """The figures at round starting risks and at the points that are marked, each with its interval."""
    lines = shown_lines(curve, view)
    marked = {mark.without: mark for mark in curve.marks}
    rows = []
    for start in sorted({_nearest(lines[0], start) for start in starts} | marked.keys()) if lines else ():
        found = [point_at(line, start) for line in lines]
        label = start_text(marked[start]) if start in marked else numbers.percent_given(start)
        name = f" ({mark_words(marked[start])})" if start in marked else ""
        rows.append(CurveRow(f"{label}{name}", tuple(_cell(point, view.ratios) for point in found)))
    return rows


def _nearest(line: CurveLine, start: float) -> float:
    """The starting risk of the point that is nearest."""
    return min((point.start for point in line.points), key=lambda at: abs(at - start))


def _cell(point: CurvePoint, ratios: bool) -> str:
    """``6.5% (4.4 to 9.4%)``."""
    if isinstance(point.value, Gap):
        return limits.WITHHELD_ENDS.get(point.value.key, NOT_GIVEN)
    write = numbers.ratio if ratios else numbers.percent
    if not ratios and point.value == point.low == point.high and point.value in (0.0, 1.0):
        return numbers.percent_given(point.value)  # nobody or everybody, whatever the effect: nothing is uncertain
    if isinstance(point.low, Gap) and isinstance(point.high, Gap):
        return write(point.value)
    ends = []
    for end, sign in ((point.low, ""), (point.high, "%")):
        if isinstance(end, Gap):
            ends.append(limits.WITHHELD_ENDS.get(end.key, NOT_GIVEN))
        elif ratios:
            ends.append(numbers.ratio_limit(end, point.value))
        else:
            ends.append(numbers.percent_limit(end, point.value, sign))
    return f"{write(point.value)} ({numbers.TO.join(ends)})"
