"""The one page for a patient: every ticked outcome with its people and its sentences, benefits and harms alike.

The page is laid out in units of 1/96 inch and drawn alike on every device. Text is made smaller and arrays lower until
all fits; what does not fit at a size that can be read is refused, with the number of outcomes that would.
"""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from datetime import date
from typing import NamedTuple

from PySide6.QtCore import QLineF, QPointF, QRectF
from PySide6.QtGui import QColor, QPainter, QPen

from fourcount.appraisal.findings import Gap, OutcomeFindings
from fourcount.ink.handout_block import Block, Setting
from fourcount.ink.paper_style import COMPACT_SIZES, SIZES, PaperStyle
from fourcount.ink.paragraph import Run, draw_paragraph, paragraph_height
from fourcount.ink.plain_picture import Shown, shown
from fourcount.ink.style import Role
from fourcount.picture.common import common_denominator
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from fourcount.wording import handout as words
from fourcount.wording.handout import HandoutWords

PER_MM = 96 / 25.4
MARGIN = 14.0
"""In millimetres: what printers keep clear is mostly 4 to 6, and 12 at the foot (common practice)."""

LARGE, BELOW, ASIDE = Setting(False, False), Setting(True, False), Setting(True, True)
"""How blocks can be set, from a page of one outcome to a page of many."""


class Try(NamedTuple):
    """A way to set the page: scale and sizes of its text, and how high arrays of a hundred have to come out.

    ``whole`` ways are for pages on which no count needs a second line.
    """

    setting: Setting
    scale: float
    sizes: Mapping[Role, float] = SIZES
    least: int = 0
    whole: bool = False


FOR_ONE = tuple(Try(LARGE, scale, SIZES, 200, whole) for whole in (True, False) for scale in (1.3, 1.2, 1.1, 1.0))
FOR_TWO = (
    *(Try(LARGE, scale, SIZES, 180, whole=True) for scale in (1.2, 1.1, 1.0)),
    *(Try(LARGE, scale, SIZES, 170) for scale in (1.2, 1.1, 1.05, 1.0, 0.95)),
    *(Try(BELOW, scale, SIZES, 200) for scale in (1.1, 1.0)),
)
FOR_THREE = tuple(Try(BELOW, scale, SIZES, 150) for scale in (1.1, 1.05, 1.0, 0.95))
FOR_ANY = (
    *(Try(BELOW, scale, SIZES, 160) for scale in (1.3, 1.2, 1.1)),
    *(Try(BELOW, scale, SIZES, 120) for scale in (1.05, 1.0, 0.95)),
    *(Try(ASIDE, scale, SIZES, 100) for scale in (1.0, 0.95)),
    *(Try(ASIDE, scale, COMPACT_SIZES) for scale in (1.0, 0.95, 0.9)),
)
"""From the best to read to what can just be read: the last has text of 8 points."""

WAYS = {1: FOR_ONE, 2: FOR_TWO, 3: FOR_THREE}
"""What is tried before that, by the number of outcomes."""

LONGEST_LEAD = (True, False)
"""People drawn as figures and as marks: the words for that are the longest that a page can need."""

MOST = 12
"""More outcomes than any page holds in whatever way."""

LARGEST_ARRAY = 520
FOOT_SIZE = 11
BLOCK_GAP = 12

Named = tuple[Outcome, OutcomeFindings]


class Paper(NamedTuple):
    """A sheet, in millimetres."""

    key: str
    width: float
    height: float


PAPERS = {"a4": Paper("a4", 210.0, 297.0), "letter": Paper("letter", 215.9, 279.4)}


class NoPage(NamedTuple):
    """Why there is no page, in one sentence."""

    sentence: str


class _Making(NamedTuple):
    """What a page is made from, whichever outcomes are on it."""

    record: Record
    paper: Paper
    version: str
    today: date
    options: PictureOptions


class _Fit(NamedTuple):
    style: PaperStyle
    setting: Setting
    array: float


class Handout:
    """A page that fits its paper, ready to be drawn."""

    def __init__(self, page: HandoutWords, blocks: Sequence[Block], paper: Paper, fit: _Fit) -> None:
        self.words = page
        self.paper = paper
        self._blocks = blocks
        self._fit = fit

    @property
    def size(self) -> tuple[float, float]:
        """Width and height of the sheet in units of 1/96 inch."""
        return self.paper.width * PER_MM, self.paper.height * PER_MM

    def draw(self, painter: QPainter) -> None:
        """Draw the sheet on a painter whose unit is 1/96 inch, its corner at (0, 0)."""
        width, height = self.size
        style, x = self._fit.style, MARGIN * PER_MM
        wide, y = width - 2 * x, MARGIN * PER_MM
        painter.setRenderHint(QPainter.RenderHint.Antialiasing)
        painter.fillRect(QRectF(0, 0, width, height), QColor(style.palette.page))
        for runs, gap in _head(self.words, style):
            y += draw_paragraph(painter, x, y, wide, runs) + gap
        for block in self._blocks:
            _rule(painter, style, x, y, wide)
            y += style.px(BLOCK_GAP)
            y += block.draw(painter, style, self._fit.setting, QPointF(x, y), wide, self._fit.array)
            y += style.px(BLOCK_GAP)
        y = height - MARGIN * PER_MM - _foot_height(self.words, style, wide)
        _rule(painter, style, x, y - style.px(6), wide)
        for runs in _foot(self.words, style):
            y += draw_paragraph(painter, x, y, wide, runs) + 2


def compose(
    record: Record,
    named: Sequence[Named],
    paper: Paper,
    version: str,
    today: date,
    options: PictureOptions = USUAL,
) -> Handout | NoPage:
    """The page of these outcomes, all of which can be shown; a sentence where they do not fit on one."""
    if not named:
        return NoPage(words.NOTHING_TICKED)
    making = _Making(record, paper, version, today, options)
    page = _composed(making, named) if len(named) <= MOST else None
    if page is not None:
        return page
    fits = 0
    while fits + 1 < min(len(named), MOST) and _composed(making, named[: fits + 1], FOR_ANY[-1:]):
        fits += 1
    if not fits:
        return NoPage(words.TOO_LONG)
    rest = len(named) - fits
    return NoPage(words.TOO_MANY.format(fit=fits, count=len(named), rest=rest))


def _composed(making: _Making, named: Sequence[Named], ways: Sequence[Try] = ()) -> Handout | None:
    """One denominator for all where one shows all honestly and fits the page, else each its own.

    ``ways`` are those of setting it that are tried, none for all: the last of all takes the least room.
    """
    own = [shown(outcome, findings) for outcome, findings in named]
    pairs = [(it.plan.without_risk, it.plan.with_risk) for it in own if it]
    common = common_denominator(pairs)
    for denominator in dict.fromkeys((common, None)):
        pages = [shown(outcome, findings, making.options, denominator) for outcome, findings in named]
        ready = [_as_marks(it) for it in pages if it]
        differ = len({it.words.who for it in ready}) > 1
        blocks = [Block(it, tells_who=differ) for it in ready]
        tried = ways or (*WAYS.get(len(blocks), ()), *FOR_ANY)
        fit = _fitted(_words(making, named, ready, LONGEST_LEAD), blocks, making.paper, tried)
        if fit is not None:
            wide = (making.paper.width - 2 * MARGIN) * PER_MM
            persons = [
                block.has_persons(fit.style, fit.setting, wide, fit.array)
                for block, it in zip(blocks, ready, strict=True)
                if it.plan.denominator
            ]
            return Handout(_words(making, named, ready, persons), blocks, making.paper, fit)
    return None


def _as_marks(it: Shown) -> Shown:
    """More than a hundred people are too small for figures, on paper as on a screen."""
    return it if it.plan.denominator == 100 else it._replace(options=it.options._replace(icons="block"))


def _words(making: _Making, named: Sequence[Named], ready: Sequence[Shown], persons: Sequence[bool]) -> HandoutWords:
    patients = [(outcome, findings.patient) for outcome, findings in named]
    return words.handout_words(
        making.record,
        [(outcome, patient) for outcome, patient in patients if not isinstance(patient, Gap)],
        [it.plan.denominator for it in ready],
        [it.words.told(ranged=it.options.uncertainty, printed=True) for it in ready],
        persons,
        making.version,
        making.today,
    )


def _fitted(page: HandoutWords, blocks: Sequence[Block], paper: Paper, ways: Sequence[Try]) -> _Fit | None:
    """The way to set the page that is best to read and fits; None for none."""
    wide = (paper.width - 2 * MARGIN) * PER_MM
    for way in ways:
        style = PaperStyle(way.scale, way.sizes)
        if way.whole and any(block.counts_wrap(style, wide) for block in blocks):
            continue
        room = (paper.height - 2 * MARGIN) * PER_MM - _frame_height(page, len(blocks), style, wide)
        array = _highest(blocks, style, way, wide, room)
        if array is not None:
            return _Fit(style, way.setting, array)
    return None


def _highest(blocks: Sequence[Block], style: PaperStyle, way: Try, wide: float, room: float) -> int | None:
    """The height of the arrays, one for all, at which the blocks fill the room; None where they need more."""

    def fits_at(array: int) -> bool:
        left = room
        for block in blocks:
            left -= block.height(style, way.setting, wide, array)
            if left < 0:
                return False
        return True

    if not fits_at(way.least):
        return None
    fits, low, high = way.least, way.least + 1, LARGEST_ARRAY
    while low <= high:
        middle = (low + high) // 2
        if fits_at(middle):
            fits, low = middle, middle + 1
        else:
            high = middle - 1
    return fits


def _frame_height(page: HandoutWords, count: int, style: PaperStyle, wide: float) -> float:
    """Everything but the blocks: head, foot and the space round each block."""
    head = sum(paragraph_height(runs, wide) + gap for runs, gap in _head(page, style))
    return head + count * 2 * style.px(BLOCK_GAP) + style.px(8) + _foot_height(page, style, wide)


def _head(page: HandoutWords, style: PaperStyle) -> list[tuple[list[Run], float]]:
    palette = style.palette
    return [
        ([Run(page.heading, style.sized(22, bold=True), palette.ink)], style.px(3)),
        ([Run(page.lead, style.font("body"), palette.muted)], style.px(10)),
    ]


def _foot(page: HandoutWords, style: PaperStyle) -> list[list[Run]]:
    """The small print, whose size stays however small the rest has to be."""
    fixed = PaperStyle()
    first, *rest = page.foot
    ink, muted = style.palette.ink, style.palette.muted
    return [
        [Run(first, fixed.sized(FOOT_SIZE, bold=True), ink)],
        *([Run(line, fixed.sized(FOOT_SIZE), muted)] for line in rest if line),
    ]


def _foot_height(page: HandoutWords, style: PaperStyle, wide: float) -> float:
    return sum(paragraph_height(runs, wide) + 2 for runs in _foot(page, style))


def _rule(painter: QPainter, style: PaperStyle, x: float, y: float, wide: float) -> None:
    painter.setPen(QPen(QColor(style.palette.hairline), 1))
    painter.drawLine(QLineF(x, y, x + wide, y))
