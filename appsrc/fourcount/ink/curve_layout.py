"""What stands where in the curve: axes, lines with their band, points, and names at the ends of the lines."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings.curve import Curve, CurveLine
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
    Pen,
    Shape,
    Sheet,
    wrapped,
)
from fourcount.ink.curve_values import CurveValues
from fourcount.ink.palette import Palette
from fourcount.picture import curve_axes
from fourcount.picture.places import Box, Drawn, Value, leads_to, place_beside, shared
from fourcount.wording.curve import CurveWords, View

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
        self.values = CurveValues(curve, view)
        self.words = words
        self.palette = palette
        self.sheet = sheet
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
        if not self.values.lines:
            self._put(pen, self.margin, top, self._block(pen, " ".join(self.words.notes), BODY, self.palette.muted))
            return
        across, up = (
            self.values.across(6 if self.sheet.zoom < 1.5 else 4),
            self.values.up(6 if top - floor > self.px(TALL / 1.2) else 4),
        )
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
        pen.set_axes(box, across, up, self.values.ratios, self.px(SMALL), self.palette)
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

    # Lines

    def _draw_lines(self, pen: Pen) -> None:
        palette, values = self.palette, self.values
        for line in values.references:
            pen.line(line, palette.outline, self.px(1.2), NO_EFFECT)
        pen.area(values.band, palette.accent, BAND)
        for edge in values.edges:
            pen.line(edge, palette.accent, self.px(0.9))
        for one in sorted(values.lines, key=lambda line: line is values.chosen):  # the chosen one lies above
            colour, width = (palette.accent, 2.6) if one is values.chosen else (palette.ink, 1.3)
            pen.line(values.of(one), colour, self.px(width), dash_of(one))

    # Names

    def _names(self, pen: Pen, height: float) -> list[Name]:
        palette, values, room = self.palette, self.values, self.inside * NAMES_SHARE
        ends: list[tuple[str, bool, str, Value]] = [
            (text, False, palette.muted, line[-1])
            for text, line in zip((self.words.reference, self.words.itself), values.references, strict=False)
        ]
        for line, name in zip(values.lines, self.words.names, strict=True):
            drawn, chosen = values.of(line), line is values.chosen
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
        floor, top = between
        level = box[3] + heights[wanted.index(max(wanted))] / 2  # a leader from the top of the axes then stays there
        ceiling = min(level, top) if sum(heights) <= min(level, top) - floor else top
        middles = curve_axes.apart(wanted, heights, floor, ceiling)
        left = box[2] + self.px(2.5 * GAP)
        for name, (x, y), middle in zip(names, places, middles, strict=True):
            bend = (box[2] + self.px(GAP), middle)
            pen.stroke([(x + self.px(2), y), bend, (left - self.px(3), middle)], self.palette.outline, self.px(0.8))
            block = Block(name.lines, self.px(SMALL), name.colour, name.strong)
            self._put(pen, left, middle + block.height / 2, block)

    # Points

    def _draw_points(self, pen: Pen, box: Box) -> None:
        palette = self.palette
        shown: list[tuple[Value, str, bool]] = []
        for mark, name in zip(self.curve.marks, self.words.marks, strict=True):
            y = self.values.at(mark)
            if y is None:
                continue
            if bar := self.values.bar(mark):
                pen.line(bar, palette.ink, self.px(1.6))
            own = mark.of_study and not mark.of_patient
            shape: Shape = "square" if mark.of_study else "round"
            pen.point(mark.without, y, shape, self.px(8), palette.page if own else palette.ink, palette.ink)
            above = y > (1.0 if self.values.ratios else mark.without)
            shown.append((pen.where(mark.without, y), name, above))
        self._name_points(pen, shown, box)

    def _name_points(self, pen: Pen, shown: list[tuple[Value, str, bool]], box: Box) -> None:
        """A name stands beside its point, clear of the axes and, where there is room, of all lines."""
        reach, size = self.px(GAP), self.px(SMALL)
        taken = [(x - reach, y - reach, x + reach, y + reach) for (x, y), _, _ in shown]
        room = (box[0] + self.px(2), box[1] + self.px(2), box[2] + reach, box[3])
        paths = [[pen.where(*value) for value in line] for line in self.values.paths]
        for at, name, above in shown:
            wide = pen.width(name, size)
            place = place_beside(at, (wide, size * LINE), reach, upwards=above, drawn=Drawn(room, taken, paths))
            taken.append(place)
            end = leads_to(at, place)
            if max(abs(end[0] - at[0]), abs(end[1] - at[1])) > 2 * reach:
                pen.stroke([at, end], self.palette.ink, self.px(0.8))
            pen.text(place[0], (place[1] + place[3]) / 2, name, size, self.palette.ink, ground=self.palette.page)


def dash_of(line: CurveLine) -> Dash:
    """How an effect's line is dashed."""
    return ADJUSTED if line.effect.adjusted else DASHES[line.effect.effect]
