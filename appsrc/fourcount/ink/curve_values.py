"""What one view of a curve draws, in values on its axes: lines, a band, points with their bars, and the axes' marks."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap
from fourcount.appraisal.findings.curve import Curve, CurveLine, CurveMark
from fourcount.ink.curve_sheet import Marks
from fourcount.picture import curve_axes
from fourcount.picture.places import Value
from fourcount.wording import numbers
from fourcount.wording.curve import View, shown_lines

NO_BAR = Gap("bare-starting-risk")


class CurveValues:
    """The values of a view; what cannot stand on its axes is left out. ``chosen`` is the line that has the band."""

    def __init__(self, curve: Curve, view: View) -> None:
        self.curve = curve
        self.ratios = view.ratios
        self.lines = shown_lines(curve, view)
        self.chosen = self.lines[0 if view.ratios else view.place] if self.lines else None
        self._with_bars = not view.ratios and view.place == curve.carried

    # Lines

    def of(self, line: CurveLine) -> list[Value]:
        """The values of a line that are there; what is missing lies beyond its ends."""
        return [(p.start, p.value) for p in line.points if not isinstance(p.value, Gap) and self._fits(p.value)]

    @property
    def edges(self) -> list[list[Value]]:
        """The lower and the upper edge of the band."""
        points = self.chosen.points if self.chosen else ()
        ends = ([(p.start, p.low) for p in points], [(p.start, p.high) for p in points])
        return [[(x, y) for x, y in edge if not isinstance(y, Gap) and self._fits(y)] for edge in ends]

    @property
    def band(self) -> list[tuple[float, float, float]]:
        """Where both limits are there: starting risk, lower and upper limit."""
        low, high = (dict(edge) for edge in self.edges)
        return [(start, low[start], high[start]) for start in low if start in high]

    @property
    def references(self) -> list[list[Value]]:
        """The line of no difference, and that of an odds ratio taken for a risk ratio."""
        reach = self.curve.reach
        if not self.ratios:
            return [[(0.0, 0.0), (reach, reach)]]
        return [[(0.0, y), (reach, y)] for y in (1.0, self.odds) if y is not None]

    @property
    def odds(self) -> float | None:
        """The odds ratio that a view of ratios shows, where it can stand on the axis."""
        odds = self.lines[0].effect.figure.estimate if self.ratios and self.lines else 0.0
        return None if isinstance(odds, Gap) or odds <= 0 else odds

    @property
    def paths(self) -> list[list[Value]]:
        """Every line there is, the band's edges and the bars of points among them."""
        bars = [bar for mark in self.curve.marks if (bar := self.bar(mark))]
        return [*map(self.of, self.lines), *self.edges, *self.references, *bars]

    def _fits(self, value: float) -> bool:
        """Whether a value can stand on the axis: a ratio of 0 cannot."""
        return not self.ratios or value > 0

    # Points

    def at(self, mark: CurveMark) -> float | None:
        """Where a point stands: the study's on its own risks, a patient's on the line chosen; None where it cannot."""
        if mark.of_study and not self.ratios:
            found = mark.with_
        else:
            points = self.chosen.points if self.chosen else ()
            found = next((point.value for point in points if point.start == mark.without), NO_BAR)
        return None if isinstance(found, Gap) or not self._fits(found) else found

    def bar(self, mark: CurveMark) -> list[Value]:
        """The limits that a patient is told, beside the line of the effect that is carried; empty elsewhere."""
        low, high = (mark.low, mark.high) if self._with_bars and mark.of_patient else (NO_BAR, NO_BAR)
        return [] if isinstance(low, Gap) or isinstance(high, Gap) else [(mark.without, low), (mark.without, high)]

    # Axes

    def across(self, most: int) -> Marks:
        """The axis of starting risks."""
        values = curve_axes.even_marks(self.curve.reach, most)
        return Marks(0.0, self.curve.reach, values, tuple(numbers.percent_given(value) for value in values))

    def up(self, most: int) -> Marks:
        """The axis that holds all lines, the band, the points with their bars and the line of no difference."""
        found = [y for path in self.paths for _, y in path]
        found += [y for mark in self.curve.marks if (y := self.at(mark)) is not None]
        if self.ratios:
            low, high = curve_axes.ratio_ends(min(found), max(found))
            rounds = curve_axes.ratio_marks(low, high, most)
            return Marks(low, high, rounds, tuple(numbers.quantity(value) for value in rounds))
        high = curve_axes.top_of(max(found))
        rounds = curve_axes.even_marks(high, most)
        return Marks(0.0, high, rounds, tuple(numbers.percent_given(value) for value in rounds))
