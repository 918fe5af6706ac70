"""Curves for tests: what a view draws, laid out by a pen that remembers."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.curve import curve, highest_start
from fourcount.ink.curve_layout import CurveLayout
from fourcount.ink.curve_sheet import Sheet
from fourcount.ink.palette import LIGHT
from fourcount.picture.curve_axes import reach_for
from fourcount.record.outcome import CELLS, Outcome, Patient
from fourcount.record.paper import Choices, Record
from fourcount.wording.curve import curve_words, views
from fourcount.wording.example import worked_example

FOOT = ("Keep this in mind. Fourcount, some day.",)


class Notes:
    """A pen that draws nothing and remembers everything; a character is six pixels wide at 12."""

    def __init__(self) -> None:
        self.texts: list[tuple[float, float, float, str, float]] = []
        self.lines: list[tuple[tuple, ...]] = []
        self.widths: list[float] = []
        self.strokes: list[list[tuple[float, float]]] = []
        self.areas: list[list[tuple[float, float, float]]] = []
        self.points: list[tuple[float, float, str]] = []

    def width(self, text: str, size: float, *_strong: object) -> float:
        return len(text) * size / 2

    def text(self, x, y, text, size, *_look, **_more) -> None:
        self.texts.append((x, y, self.width(text, size), text, size))

    def stroke(self, points, *_look) -> None:
        self.strokes.append(points)

    def set_axes(self, box, across, up, *_look) -> None:
        self.box, self.across, self.up = box, across, up

    def where(self, x: float, y: float) -> tuple[float, float]:
        left, bottom, right, top = self.box
        high = (y - self.up.low) / (self.up.high - self.up.low)
        return left + (right - left) * x / self.across.high, bottom + (top - bottom) * high

    def line(self, points, colour, width, dash=()) -> None:
        self.lines.append((tuple(points), colour, dash))
        self.widths.append(width)

    def area(self, rows, *_look) -> None:
        self.areas.append(rows)

    def point(self, x, y, shape, *_look) -> None:
        self.points.append((x, y, shape))


def parts(outcome: Outcome, place: int = 0, *, whole: bool = False):
    findings = appraise(outcome, Choices())
    drawn = curve(findings, 1.0 if whole else reach_for(highest_start(findings)))
    view = views(outcome, drawn)[place][0]
    return drawn, view, curve_words(Record(outcomes=(outcome,)), outcome, findings, drawn, view)


def laid(outcome: Outcome, place: int = 0, *, whole: bool = False, sheet: Sheet | None = None) -> Notes:
    """What is drawn where, on a sheet of the usual size."""
    notes = Notes()
    CurveLayout(*parts(outcome, place, whole=whole), LIGHT, sheet or Sheet(760, 460)).draw(notes)
    return notes


def with_counts(outcome: Outcome, *counts: int) -> Outcome:
    """The outcome with other counts, in the print's order."""
    cells = dict(zip(CELLS, map(str, counts), strict=True))
    return msgspec.structs.replace(outcome, table=msgspec.structs.replace(outcome.table, **cells))


AT_TWELVE = msgspec.structs.replace(worked_example().outcomes[0], patient=Patient(starting_risk_text="12%"))
"""The worked example for a patient who starts at 12%."""

RISING = with_counts(AT_TWELVE, 60, 140, 22, 178)
"""A table whose risk ratio passes 100%."""
