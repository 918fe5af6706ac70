"""What stands where in the curve: axes, lines with their band, points, and names at the ends of the lines."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import Gap
from fourcount.appraisal.findings.curve import Curve, CurveLine, CurveMark
from fourcount.ink.curve_sheet import (
    BAND,
    BODY,
    FOOT,
    GAP,
    LEAST,
    LINE,
    MARGIN,
    NAMES_SHARE,
    PAGE_MARGIN,
    SMALL,
    STRONG,
    TALL,
    Dash,
    Marks,
    Pen,
    Shape,
    Sheet,
    wrapped,
)
from fourcount.ink.palette import Palette
from fourcount.picture import curve_axes
from fourcount.picture.places import Box, Drawn, Value, leads_to, place_beside, shared
from fourcount.wording import numbers
from fourcount.wording.curve import CurveWords, View, shown_lines

DASHES: dict[str, Dash] = {
    "risk_ratio": (),
    "odds_ratio": (7, 2.5),
    "hazard_ratio": (7, 2, 1.5, 2),
    "rate_ratio": (7, 2, 1.5, 2),
    "risk_difference": (2.5, 2),
}
ADJUSTED: Dash = (12, 2, 1.5, 2, 1.5, 2)
NO_EFFECT: Dash = (1, 2.5)
"""Lines are told by their dashes and by their names: colour says nothing that these do not."""


class Block(NamedTuple):
    """A text in lines, as it is drawn, with the room before and after it."""

    lines: list[str]
    size: float
    colour: str
    strong: bool = False
    before: float = 0.0
    after: float = 0.0

    @property
    def height(self) -> float:
        return self.before + LINE * self.size * len(self.lines) + self.after


class Name(NamedTuple):
    """What stands at the end of a line: its words in lines, how strong, its colour, and the value it belongs to."""

    lines: list[str]
    strong: bool
    colour: str
    end: Value


class CurveLayout:
    """One drawing."""

    def __init__(self, curve: Curve, view: View, words: CurveWords, palette: Palette, sheet: Sheet) -> None:
        self.curve = curve
        self.view = view
        self.words = words
        self.palette = palette
        self.sheet = sheet
        self.lines = shown_lines(curve, view)
        self.margin = self.px(PAGE_MARGIN if sheet.foot else MARGIN)

    @property
    def texts(self) -> tuple[str, ...]:
        """Every text that may be drawn."""
        words = self.words
        plain = (words.heading, words.title, words.across, words.up, words.reference, words.itself, words.sentence)
        return (*plain, *words.names, *words.marks, *words.notes, *self.sheet.foot)

    def px(self, pixels: float) -> float:
        """A length that grows with the text."""
        return pixels * self.sheet.zoom

    def grow(self, pen: Pen) -> Sheet:
        """The sheet as large as it has to be: a page has its texts beyond the room for its curve."""
        sheet, margins = self.sheet, 2 * (self.margin - self.px(MARGIN))
        wide, tall = (self.px(length) + margins for length in LEAST)
        self.sheet = sheet._replace(width=max(sheet.width, wide), height=max(sheet.height, tall))
        if sheet.foot:
            texts = sum(block.height for block in (*self._head(pen), *self._end(pen)))
            self.sheet = self.sheet._replace(height=self.sheet.height + texts)
        return self.sheet

    def draw(self, pen: Pen) -> None:
        """Draw all of it."""
        top, floor = self.sheet.height - self.margin, self.margin
        if self.sheet.foot:
            for block in self._head(pen):
                top = self._put(pen, self.margin, top, block)
            end = self._end(pen)
            floor += sum(block.height for block in end)
            under = floor
            for block in end:
                under = self._put(pen, self.margin, under, block)
        if not self.lines:
            self._put(pen, self.margin, top, self._block(pen, " ".join(self.words.notes), BODY, self.palette.muted))
            return
        across, up = self._across(), self._up()
        left = self.margin + max(pen.width(word, self.px(SMALL)) for word in up.words) + self.px(GAP)
        names = self._names(pen, top - floor)
        widest = max(pen.width(line, self.px(SMALL), name.strong) for name in names for line in name.lines)
        right = self.sheet.width - self.margin - widest - self.px(3 * GAP)
        room, most = right - left + self.px(GAP), 2 if self.sheet.height < self.px(TALL) else 3
        above = self._block(pen, self.words.up, SMALL, self.palette.muted, room=room, most=most)
        below = self._block(pen, self.words.across, SMALL, self.palette.muted, room=room, most=most)
        self._put(pen, left, top, above)
        self._put(pen, left, floor + below.height, below)
        marks = self.px(SMALL) * LINE + self.px(1.5 * GAP)
        box = (left, floor + below.height + marks, right, top - above.height - self.px(1.5 * GAP))
        pen.set_axes(box, across, up, self.view.ratios, self.px(SMALL), self.palette)
        self._draw_lines(pen)
        self._set_names(pen, names, box, (floor, top))
        self._draw_points(pen, box)

    # Text

    @property
    def inside(self) -> float:
        """The width between the margins."""
        return self.sheet.width - 2 * self.margin

    def _block(
        self,
        pen: Pen,
        text: str,
        size: float,
        colour: str,
        *,
        strong: bool = False,
        room: float | None = None,
        most: int | None = None,
    ) -> Block:
        """A text in lines, in the room given or between the margins."""
        tall = self.px(size)
        lines = wrapped(pen, text, tall, self.inside if room is None else room, strong=strong, most=most)
        return Block(lines, tall, colour, strong)

    def _put(self, pen: Pen, x: float, top: float, block: Block) -> float:
        """Lines of text downwards; gives where they end."""
        top -= block.before
        for line in block.lines:
            pen.text(x, top - block.size * LINE / 2, line, block.size, block.colour, block.strong)
            top -= block.size * LINE
        return top - block.after

    def _head(self, pen: Pen) -> tuple[Block, Block]:
        """What stands above the curve of a page: of which paper it is, and its title."""
        words, palette = self.words, self.palette
        title = self._block(pen, words.title, STRONG, palette.ink, strong=True, most=3)
        return (
            self._block(pen, words.heading, SMALL, palette.muted, most=2),
            title._replace(after=self.px(1.5 * GAP)),
        )

    def _end(self, pen: Pen) -> tuple[Block, ...]:
        """What stands under the curve of a page: its sentence, what it rests on, what has to be kept in mind."""
        sentence = self._block(pen, self.words.sentence, SMALL, self.palette.ink)
        notes = (" ".join(self.words.notes), *self.sheet.foot)
        apart = sentence._replace(before=self.px(1.5 * GAP), after=self.px(GAP))
        return (apart, *(self._block(pen, text, FOOT, self.palette.muted) for text in notes))

    # Axes

    def _across(self) -> Marks:
        values = curve_axes.even_marks(self.curve.reach, 6 if self.sheet.zoom < 1.5 else 4)
        return Marks(0.0, self.curve.reach, values, tuple(numbers.percent_given(value) for value in values))

    def _up(self) -> Marks:
        """The axis holds all lines, the band of the one chosen, the points and the line of no difference."""
        values = [value for line in self.lines for value in self._values(line)]
        if not self.view.ratios:
            marked = [value for mark in self.curve.marks for value in (mark.with_, self._bar(mark)[1])]
            values += [value for value in marked if not isinstance(value, Gap)]
            high = curve_axes.top_of(max((*values, self.curve.reach)))
            rounds = curve_axes.even_marks(high)
            return Marks(0.0, high, rounds, tuple(numbers.percent_given(value) for value in rounds))
        odds = self.lines[0].effect.figure.estimate
        positive = [value for value in (*values, odds, 1.0) if not isinstance(value, Gap) and value > 0]
        low, high = curve_axes.ratio_ends(min(positive), max(positive))
        rounds = curve_axes.ratio_marks(low, high)
        return Marks(low, high, rounds, tuple(numbers.quantity(value) for value in rounds))

    def _values(self, line: CurveLine) -> list[float]:
        found = [point.value for point in line.points]
        if self._chosen(line):
            found += [end for point in line.points for end in (point.low, point.high)]
        return [value for value in found if not isinstance(value, Gap)]

    def _chosen(self, line: CurveLine) -> bool:
        return self.view.ratios or line is self.lines[self.view.place]

    # Lines

    def _draw_lines(self, pen: Pen) -> None:
        reach, palette = self.curve.reach, self.palette
        for y in (1.0, self._odds()) if self.view.ratios else ():
            if y is not None:
                pen.line([(0.0, y), (reach, y)], palette.outline, self.px(1.2), NO_EFFECT)
        if not self.view.ratios:
            pen.line([(0.0, 0.0), (reach, reach)], palette.outline, self.px(1.2), NO_EFFECT)
        chosen = next(line for line in self.lines if self._chosen(line))
        self._draw_band(pen, chosen)
        for line in self.lines:
            if line is not chosen:
                pen.line(self._drawn(line), palette.ink, self.px(1.3), dash_of(line))
        pen.line(self._drawn(chosen), palette.accent, self.px(2.6), dash_of(chosen))

    def _draw_band(self, pen: Pen, line: CurveLine) -> None:
        """Filled where both limits are there, edged where one is."""
        rows = [
            (point.start, point.low, point.high)
            for point in line.points
            if not isinstance(point.low, Gap) and not isinstance(point.high, Gap) and self._fits(point.low, point.high)
        ]
        pen.area(rows, self.palette.accent, BAND)
        for edge in self._edges(line):
            pen.line(edge, self.palette.accent, self.px(0.9))

    def _edges(self, line: CurveLine) -> list[list[Value]]:
        ends = ([(p.start, p.low) for p in line.points], [(p.start, p.high) for p in line.points])
        return [[(x, y) for x, y in edge if not isinstance(y, Gap) and self._fits(y)] for edge in ends]

    def _drawn(self, line: CurveLine) -> list[Value]:
        """The values of a line that are there; what is missing lies beyond its ends."""
        return [(p.start, p.value) for p in line.points if not isinstance(p.value, Gap) and self._fits(p.value)]

    def _fits(self, *values: float) -> bool:
        """Whether values can stand on the axis: ratios of 0 cannot."""
        return not self.view.ratios or all(value > 0 for value in values)

    def _odds(self) -> float | None:
        odds = self.lines[0].effect.figure.estimate
        return None if isinstance(odds, Gap) or odds <= 0 else odds

    # Names

    def _names(self, pen: Pen, height: float) -> list[Name]:
        palette, reach, room = self.palette, self.curve.reach, self.inside * NAMES_SHARE
        ends: list[tuple[str, bool, str, Value]] = [
            (self.words.reference, False, palette.muted, (reach, 1.0 if self.view.ratios else reach))
        ]
        odds = self._odds() if self.view.ratios else None
        if odds is not None:
            ends.append((self.words.itself, False, palette.muted, (reach, odds)))
        for line, name in zip(self.lines, self.words.names, strict=True):
            drawn, chosen = self._drawn(line), self._chosen(line)
            if drawn:
                ends.append((name, chosen, palette.accent if chosen else palette.ink, drawn[-1]))
        size = self.px(SMALL)
        wanted = [len(wrapped(pen, text, size, room, strong=strong)) for text, strong, _, _ in ends]
        most = shared(wanted, int((height - len(ends) * self.px(GAP / 2)) / (size * LINE)))
        return [
            Name(wrapped(pen, text, size, room, strong=strong, most=lines), strong, colour, end)
            for (text, strong, colour, end), lines in zip(ends, most, strict=True)
        ]

    def _set_names(self, pen: Pen, names: list[Name], box: Box, between: Value) -> None:
        """Names stand at the right, apart from one another, each led to by a thin line from the end of its own."""
        tall = self.px(SMALL) * LINE
        places = [pen.where(*name.end) for name in names]
        heights = [tall * len(name.lines) + self.px(GAP / 2) for name in names]
        # Of lines that end at the top, the one that ends first has the highest name: its leader then crosses no line.
        wanted = [y + (box[2] - x) for x, y in places]
        middles = curve_axes.apart(wanted, heights, *between)
        left = box[2] + self.px(2.5 * GAP)
        for name, (x, y), middle in zip(names, places, middles, strict=True):
            bend = (box[2] + self.px(GAP), middle)
            pen.stroke([(x + self.px(2), y), bend, (left - self.px(3), middle)], self.palette.outline, self.px(0.8))
            block = Block(name.lines, self.px(SMALL), name.colour, name.strong)
            self._put(pen, left, middle + block.height / 2, block)

    # Points

    def _bar(self, mark: CurveMark) -> tuple[float | Gap, float | Gap]:
        """The limits that a patient is told, beside the line of the effect that is carried."""
        if self.view.ratios or self.view.place != self.curve.carried or not mark.of_patient:
            return Gap("bare-starting-risk"), Gap("bare-starting-risk")
        return mark.low, mark.high

    def _value(self, mark: CurveMark) -> float | Gap:
        """Where a point stands: the study's on its own risks, a patient's on the line chosen."""
        if mark.of_study and not self.view.ratios:
            return mark.with_
        chosen = next(line for line in self.lines if self._chosen(line))
        return next(point.value for point in chosen.points if point.start == mark.without)

    def _draw_points(self, pen: Pen, box: Box) -> None:
        palette = self.palette
        shown: list[tuple[Value, str, bool]] = []
        for mark, name in zip(self.curve.marks, self.words.marks, strict=True):
            y, (low, high) = self._value(mark), self._bar(mark)
            if isinstance(y, Gap) or not self._fits(y):
                continue
            if not isinstance(low, Gap) and not isinstance(high, Gap):
                pen.line([(mark.without, low), (mark.without, high)], palette.ink, self.px(1.6))
            own = mark.of_study and not mark.of_patient
            shape: Shape = "square" if mark.of_study else "round"
            pen.point(mark.without, y, shape, self.px(8), palette.page if own else palette.ink, palette.ink)
            above = y > (1.0 if self.view.ratios else mark.without)
            shown.append((pen.where(mark.without, y), name, above))
        self._name_points(pen, shown, box)

    def _name_points(self, pen: Pen, shown: list[tuple[Value, str, bool]], box: Box) -> None:
        """A name stands beside its point, clear of the axes and, where there is room, of all lines."""
        reach, size = self.px(GAP), self.px(SMALL)
        taken = [(x - reach, y - reach, x + reach, y + reach) for (x, y), _, _ in shown]
        room = (box[0] + self.px(2), box[1] + self.px(2), box[2] + reach, box[3])
        paths = [[pen.where(*value) for value in line] for line in self._all_drawn()]
        for at, name, above in shown:
            wide = pen.width(name, size)
            place = place_beside(at, (wide, size * LINE), reach, upwards=above, drawn=Drawn(room, taken, paths))
            taken.append(place)
            middle = (place[1] + place[3]) / 2
            end = leads_to(at, place)
            if max(abs(end[0] - at[0]), abs(end[1] - at[1])) > 2 * reach:
                pen.stroke([at, end], self.palette.ink, self.px(0.8))
            pen.text(place[0], middle, name, size, self.palette.ink, ground=self.palette.page)

    def _all_drawn(self) -> list[list[Value]]:
        """Every line there is: of effects, a band's edges, of no difference, and the bars of points."""
        found = [self._drawn(line) for line in self.lines]
        found += self._edges(next(line for line in self.lines if self._chosen(line)))
        found += [[(0.0, y), (self.curve.reach, y)] for y in (1.0, self._odds()) if self.view.ratios and y is not None]
        if not self.view.ratios:
            found.append([(0.0, 0.0), (self.curve.reach, self.curve.reach)])
        for mark in self.curve.marks:
            low, high = self._bar(mark)
            if not isinstance(low, Gap) and not isinstance(high, Gap):
                found.append([(mark.without, low), (mark.without, high)])
        return found


def dash_of(line: CurveLine) -> Dash:
    """How an effect's line is dashed."""
    return ADJUSTED if line.effect.adjusted else DASHES[line.effect.effect]
