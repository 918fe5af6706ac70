"""What stands where in the curve: axes, lines with their band, points, and names at the ends of the lines."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Literal, NamedTuple, Protocol

from fourcount.appraisal.findings import Gap
from fourcount.appraisal.findings.curve import Curve, CurveLine, CurveMark
from fourcount.ink.palette import Palette
from fourcount.picture import curve_axes
from fourcount.wording import numbers
from fourcount.wording.curve import CurveWords, View, shown_lines

Box = tuple[float, float, float, float]
Dash = tuple[float, ...]
Shape = Literal["square", "round"]
Value = tuple[float, float]

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

BODY, SMALL, STRONG, FOOT = 13.0, 12.0, 15.0, 10.5
LINE = 1.3  # the height of a line of text, of its size
GAP = 8.0
MARGIN, PAGE_MARGIN = 6.0, 28.0
NAMES_SHARE = 0.34  # of the width, at most, for the names at the ends of the lines
BAND = 0.15  # the strength of its colour


class Marks(NamedTuple):
    """An axis: where it begins and ends, and its marks with their words."""

    low: float
    high: float
    values: tuple[float, ...]
    words: tuple[str, ...]


class Sheet(NamedTuple):
    """What is drawn on: its size in pixels, the size of text, device pixels a pixel, and the font.

    ``foot`` is what has to travel with a drawing that leaves the window; it then has its heading and sentences too.
    """

    width: float
    height: float
    zoom: float = 1.0
    ratio: float = 1.0
    family: str = ""
    foot: tuple[str, ...] = ()


class Name(NamedTuple):
    """What stands at the end of a line: its words in lines, how strong, its colour, and the value it belongs to."""

    lines: list[str]
    strong: bool
    colour: str
    end: Value


class Pen(Protocol):
    """What is drawn with."""

    def width(self, text: str, size: float, strong: bool = False) -> float: ...
    def text(
        self, x: float, y: float, text: str, size: float, colour: str, strong: bool = False, right: bool = False,
        ground: str = "",
    ) -> None: ...  # fmt: skip
    def stroke(self, points: Sequence[Value], colour: str, width: float) -> None: ...
    def set_axes(
        self, box: Box, across: Marks, up: Marks, logarithmic: bool, size: float, colours: Palette
    ) -> None: ...
    def where(self, x: float, y: float) -> Value: ...
    def line(self, points: Sequence[Value], colour: str, width: float, dash: Dash = ()) -> None: ...
    def area(self, rows: Sequence[tuple[float, float, float]], colour: str, strength: float) -> None: ...
    def point(self, x: float, y: float, shape: Shape, size: float, fill: str, edge: str) -> None: ...


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

    def draw(self, pen: Pen) -> None:
        """Draw all of it."""
        inside, top, floor = self.sheet.width - 2 * self.margin, self.sheet.height - self.margin, self.margin
        if self.sheet.foot:
            top, floor = self._page(pen, inside, top)
        if not self.lines:
            note = self._wrapped(pen, " ".join(self.words.notes), BODY, inside)
            self._put(pen, self.margin, top, note, BODY, self.palette.muted)
            return
        across, up = self._across(), self._up()
        left = self.margin + max(pen.width(word, self.px(SMALL)) for word in up.words) + self.px(GAP)
        names = self._names(pen, inside)
        widest = max(pen.width(line, self.px(SMALL), name.strong) for name in names for line in name.lines)
        right = self.sheet.width - self.margin - widest - self.px(3 * GAP)
        above = self._wrapped(pen, self.words.up, SMALL, self.sheet.width - self.margin - left)
        top = self._put(pen, left, top, above, SMALL, self.palette.muted) - self.px(1.5 * GAP)
        below = self._wrapped(pen, self.words.across, SMALL, self.sheet.width - self.margin - left)
        tall = self.px(SMALL) * LINE
        self._put(pen, left, floor + tall * len(below), below, SMALL, self.palette.muted)
        box = (left, floor + tall * (len(below) + 1) + self.px(1.5 * GAP), right, top)
        pen.set_axes(box, across, up, self.view.ratios, self.px(SMALL), self.palette)
        self._draw_lines(pen)
        self._set_names(pen, names, box)
        self._draw_points(pen, box)

    # Text

    def _wrapped(self, pen: Pen, text: str, size: float, room: float, strong: bool = False) -> list[str]:
        """A text in lines that fit; a word that is too long for one is cut, with a sign of it."""
        lines: list[str] = []
        for whole in text.split():
            word = whole
            longer = f"{lines[-1]} {word}" if lines else word
            if lines and pen.width(longer, self.px(size), strong) <= room:
                lines[-1] = longer
                continue
            while len(word) > 2 and pen.width(word, self.px(size), strong) > room:
                word = f"{word[: min(len(word) - 2, int(len(word) * 0.9))]}…"
            lines.append(word)
        return lines

    def _put(
        self, pen: Pen, x: float, top: float, lines: Sequence[str], size: float, colour: str, strong: bool = False
    ) -> float:
        """Lines of text downwards; gives where they end."""
        tall = self.px(size) * LINE
        for place, line in enumerate(lines):
            pen.text(x, top - tall * (place + 0.5), line, self.px(size), colour, strong)
        return top - tall * len(lines)

    def _page(self, pen: Pen, inside: float, top: float) -> Value:
        """Heading, sentences and foot of a drawing that leaves the window; gives what is left between them."""
        words, palette = self.words, self.palette
        top = self._put(pen, self.margin, top, self._wrapped(pen, words.heading, SMALL, inside), SMALL, palette.muted)
        title = self._wrapped(pen, words.title, STRONG, inside, True)
        top = self._put(pen, self.margin, top, title, STRONG, palette.ink, True) - self.px(1.5 * GAP)
        said = self._wrapped(pen, words.sentence, SMALL, inside)
        foot = [
            line
            for text in (" ".join(words.notes), *self.sheet.foot)
            for line in self._wrapped(pen, text, FOOT, inside)
        ]
        tall = LINE * (self.px(SMALL) * len(said) + self.px(FOOT) * len(foot)) + self.px(GAP)
        end = self._put(pen, self.margin, self.margin + tall, said, SMALL, palette.ink) - self.px(GAP)
        self._put(pen, self.margin, end, foot, FOOT, palette.muted)
        return top, self.margin + tall + self.px(1.5 * GAP)

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
        for edge in ([(p.start, p.low) for p in line.points], [(p.start, p.high) for p in line.points]):
            points = [(x, y) for x, y in edge if not isinstance(y, Gap) and self._fits(y)]
            pen.line(points, self.palette.accent, self.px(0.9))

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

    def _names(self, pen: Pen, inside: float) -> list[Name]:
        palette, reach, room = self.palette, self.curve.reach, inside * NAMES_SHARE
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
        return [
            Name(self._wrapped(pen, text, SMALL, room, strong), strong, colour, end)
            for text, strong, colour, end in ends
        ]

    def _set_names(self, pen: Pen, names: list[Name], box: Box) -> None:
        """Names stand at the right, apart from one another, each led to by a thin line from the end of its own."""
        tall = self.px(SMALL) * LINE
        places = [pen.where(*name.end) for name in names]
        heights = [tall * len(name.lines) + self.px(GAP / 2) for name in names]
        low, high = box[1] - 3 * tall, self.sheet.height - self.margin
        # Of lines that end at the top, the one that ends first has the highest name: its leader then crosses no line.
        wanted = [y + (box[2] - x) for x, y in places]
        middles = curve_axes.apart(wanted, heights, low, high)
        left = box[2] + self.px(2.5 * GAP)
        for name, (x, y), middle in zip(names, places, middles, strict=True):
            bend = (box[2] + self.px(GAP), middle)
            pen.stroke([(x + self.px(2), y), bend, (left - self.px(3), middle)], self.palette.outline, self.px(0.8))
            self._put(pen, left, middle + tall * len(name.lines) / 2, name.lines, SMALL, name.colour, name.strong)

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
        palette, shown = self.palette, []
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
            shown.append((pen.where(mark.without, y), name, 1 if above else -1))
        reach = self.px(GAP)
        taken: list[Box] = [(x - reach, y - reach, x + reach, y + reach) for (x, y), _, _ in shown]
        for at, name, side in shown:
            place = self._beside(pen, at, name, side, box, taken)
            taken.append(place)
            middle = (place[1] + place[3]) / 2
            if abs(middle - at[1]) > 1.5 * self.px(SMALL) * LINE:
                near = min(max(at[0], place[0]), place[2])
                pen.stroke([at, (near, place[1] if middle > at[1] else place[3])], palette.ink, self.px(0.8))
            pen.text(place[0], middle, name, self.px(SMALL), palette.ink, ground=palette.page)

    def _beside(self, pen: Pen, at: Value, name: str, side: int, box: Box, taken: list[Box]) -> Box:
        """Room for the name of a point: beside it, on the side where no line goes on if that is free."""
        tall, wide, gap = self.px(SMALL) * LINE, pen.width(name, self.px(SMALL)), self.px(GAP)
        tried = []
        for steps in (1.0, 2.2, 3.4, 4.6):
            for way in (side, -side):
                for left in (at[0] + gap, at[0] - gap - wide):
                    middle = at[1] + way * steps * tall
                    tried.append((left, middle - tall / 2, left + wide, middle + tall / 2))
        inside = [one for one in tried if one[0] >= box[0] and one[1] > box[1] + 2 and one[2] <= box[2] + gap]
        free = [one for one in inside if not any(_meet(one, other) for other in taken)]
        return (free or inside or tried)[0]


def _meet(one: Box, other: Box) -> bool:
    return one[0] < other[2] and other[0] < one[2] and one[1] < other[3] and other[1] < one[3]


def dash_of(line: CurveLine) -> Dash:
    """How an effect's line is dashed."""
    return ADJUSTED if line.effect.adjusted else DASHES[line.effect.effect]
