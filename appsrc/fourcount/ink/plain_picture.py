"""The picture that a patient is shown: each group's name, so many who have it, so many who do not, and its people."""

from __future__ import annotations

from collections.abc import Sequence
from typing import NamedTuple

from PySide6.QtGui import QFont, QPainter

from fourcount.appraisal.findings import Gap, OutcomeFindings
from fourcount.ink.arrays import lay_array
from fourcount.ink.paper_style import PaperStyle
from fourcount.ink.paragraph import Run, draw_paragraph, paragraph_height
from fourcount.ink.patient_picture import plan_of
from fourcount.ink.picture import WIDEST_ICON, Picture
from fourcount.ink.picture_key import set_key
from fourcount.ink.sheet import Sheet
from fourcount.picture.bar_pair import bar_pair
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.picture.plan import Plan, plan_on
from fourcount.record.outcome import Outcome
from fourcount.wording import numbers, plain_texts
from fourcount.wording.axis import axis_words
from fourcount.wording.picture_words import OPEN, KeyEntry, PictureWords, Side, people_of, too_close
from fourcount.wording.plain import is_turned
from fourcount.wording.plain_outcome import PlainSide, PlainWords, plain_words
from fourcount.wording.plain_refusal import why_not
from fourcount.wording.plain_risks import plain_risks

LEAST_ARRAY, GOOD_ARRAY = 140, 205
"""How high an array is at least, and where there is room, at 100%: a hundred people of some 14 and 20 pixels."""

FIGURE_SIZES = (1.0, 0.95, 0.9, 0.85, 0.8)
"""Parts of the usual size at which a count may be set to stay on one line."""

ON_ONE_LINE = 3
"""Paragraphs of a caption whose count and percentage share a line."""

ENDLESS = 100_000.0
"""A width at which nothing wraps."""

Caption = tuple[Sequence[Run], ...]
"""The paragraphs of a group's caption."""


class Shown(NamedTuple):
    """One outcome ready to be shown: its words, its plan, and how its picture is asked for."""

    words: PlainWords
    plan: Plan
    options: PictureOptions = USUAL

    @property
    def people(self) -> int:
        """Of how many people the words speak."""
        return people_of(self.plan)


def shown(
    outcome: Outcome, findings: OutcomeFindings, options: PictureOptions = USUAL, denominator: int | None = None
) -> Shown | None:
    """An outcome for a page, None where ``why_not`` says why not; ``denominator`` is one that suits the whole page."""
    patient, turned = findings.patient, is_turned(outcome)
    if isinstance(patient, Gap) or why_not(outcome, findings):
        return None
    plan, risks = plan_of(patient, turned, options.uncertainty), plain_risks(patient, turned)
    if plan is None or risks is None:
        return None
    if denominator is not None and denominator != plan.denominator:
        plan = plan_on(denominator, plan.without_risk, plan.with_risk, plan.low, plan.high)
    return Shown(plain_words(outcome, patient, risks, people_of(plan)), plan, options)


class PlainPicture:
    """The arrays under their captions; where one array stands under the other, each under its own.

    ``key_first`` sets the key above the people, for pages of which not all is seen at once.
    """

    def __init__(self, it: Shown, key_first: bool = False) -> None:
        self._words = it.words
        self._options = options = it.options._replace(relative=False)
        words = picture_words(it)
        self._bare = Picture(it.plan, words, options._replace(captions=False))
        self._key = self._bare.key if key_first else ()
        if self._key:
            self._bare = Picture(it.plan, words._replace(key=()), options._replace(captions=False))
        self._captioned = Picture(it.plan, words, options)

    def height(self, style: PaperStyle, width: float, within: float | None = None) -> float:
        """Height at ``width``, with icons as large as ``within`` allows."""
        return self._run(None, style, 0, 0, width, within)

    def least_height(self, style: PaperStyle, width: float) -> float:
        """Height below which its people could not be told apart."""
        least = self.height(style, width, 0) + (0 if self._bare.bars else style.px(LEAST_ARRAY))
        return min(least, self.height(style, width))

    def people_height(self, style: PaperStyle, width: float, within: float) -> float:
        """How much higher than without any room its people are within a height; of one array, where two are stacked."""
        spare = self.height(style, width, within) - self.height(style, width, 0)
        return spare / self._stacked(style, width)

    def height_with(self, style: PaperStyle, width: float, people: float) -> float:
        """Height at which its people are as high as ``people_height`` told of another style or width."""
        wanted = self.height(style, width, 0) + people * self._stacked(style, width)
        return min(wanted, self.height(style, width))

    def good_height(self, style: PaperStyle, width: float) -> float:
        """Height at which its people weigh as much as the words, or all that it can use."""
        good = self.height(style, width, 0) + (0 if self._bare.bars else style.px(GOOD_ARRAY))
        return min(good, self.height(style, width))

    def counts_wrap(self, style: PaperStyle, width: float) -> bool:
        """Whether a count needs more than its line, where each group's stands over its own people."""
        columns = self._own_columns(style, width)
        if not columns:
            return False
        sides = (self._words.without, self._words.with_)
        return any(len(block) > ON_ONE_LINE for block in captions(style, sides, columns[0][1]))

    def draw(
        self, painter: QPainter, style: PaperStyle, x: float, y: float, width: float, within: float | None = None
    ) -> float:
        """Draw it with its top left corner at (x, y) and give the height it took."""
        return self._run(painter, style, x, y, width, within)

    def _run(
        self, painter: QPainter | None, style: PaperStyle, x: float, y: float, width: float, within: float | None
    ) -> float:
        columns = self._own_columns(style, width)
        if not columns:
            return _picture(self._captioned, painter, style, x, y, width, within)
        sides = (self._words.without, self._words.with_)
        blocks = captions(style, sides, columns[0][1])
        heights = [
            max(paragraph_height(block[line], wide) for block, (_, wide) in zip(blocks, columns, strict=True))
            for line in range(len(blocks[0]))
        ]
        top, last = y, len(heights) - 1
        for line, tall in enumerate(heights):
            gap = style.px({0: 4, last: 10}.get(line, 0))
            if painter:
                for block, (left, wide) in zip(blocks, columns, strict=True):
                    draw_paragraph(painter, x + left, y, wide, block[line])
            y += tall + gap
        if self._key:
            people, each = self._bare.plan.denominator or 100, columns[0][1]
            laid = lay_array(people, each, style.px(WIDEST_ICON[people]), self._options.icons)
            y += set_key(Sheet(painter, style), x, y, width, self._key, self._options.icons, laid) + style.px(10)
        left_over = None if within is None else within - (y - top)
        return y + _picture(self._bare, painter, style, x, y, width, left_over) - top

    def _stacked(self, style: PaperStyle, width: float) -> int:
        """How many arrays stand one under the other."""
        columns = self._bare.columns(style, width)
        return 2 if len(columns) == 2 and columns[0][0] == columns[1][0] else 1

    def _own_columns(self, style: PaperStyle, width: float) -> tuple[tuple[float, float], ...]:
        """Left edge and width of both groups' columns; none where one picture holds both or they stand stacked."""
        columns = self._bare.columns(style, width)
        if len(columns) != 2 or columns[0][0] == columns[1][0] or self._bare.bars:
            return ()
        return columns


def _picture(
    picture: Picture,
    painter: QPainter | None,
    style: PaperStyle,
    x: float,
    y: float,
    width: float,
    within: float | None,
) -> float:
    if painter is None:
        return picture.height(style, width, within)
    return picture.draw(painter, style, x, y, width, within)


def captions(style: PaperStyle, sides: Sequence[PlainSide], width: float) -> list[Caption]:
    """Each group's name, count and other frame, in as many paragraphs for all, so that their lines stand level.

    Count and percentage stand on one line where both groups' do at some size, else the percentages on their own, under
    counts of a size at which these do, if there is one.
    """
    for part in FIGURE_SIZES:
        figure = _part_of(style.font("figure"), part)
        counts = [_count(style, side, figure) for side in sides]
        if all(on_one_line(count, width) for count in counts):
            return [_caption(style, side, count) for side, count in zip(sides, counts, strict=True)]
    alone = [_part_of(style.font("figure"), part) for part in FIGURE_SIZES]
    whole = (figure for figure in alone if all(on_one_line(_count(style, side, figure)[:1], width) for side in sides))
    figure = next(whole, alone[0])
    return [_caption(style, side, *([run] for run in _count(style, side, figure))) for side in sides]


def _caption(style: PaperStyle, side: PlainSide, *counts: Sequence[Run]) -> Caption:
    ink, muted = style.palette.ink, style.palette.muted
    return ((Run(side.title, style.font("strong"), ink),), *counts, (Run(side.other, style.font("body"), muted),))


def _count(style: PaperStyle, side: PlainSide, figure: QFont) -> list[Run]:
    """ "12 in 100 fall (12%)"."""
    count = Run(f"{side.number} {side.event}", figure, style.palette.ink)
    return [count, Run(side.percent, style.font("body"), style.palette.muted)]


def on_one_line(runs: Sequence[Run], width: float) -> bool:
    """Whether a paragraph does not wrap."""
    return paragraph_height(runs, width) <= paragraph_height(runs, ENDLESS)


def beside_or_below(runs: Sequence[Run], width: float) -> list[Sequence[Run]]:
    """Sentences in one line where they fit it, else each in a paragraph of its own."""
    spoken = [run for run in runs if run.text]
    if not spoken or on_one_line(spoken, width):
        return [spoken] if spoken else []
    return [[run] for run in spoken]


def _part_of(font: QFont, part: float) -> QFont:
    smaller = QFont(font)
    smaller.setPixelSize(round(font.pixelSize() * part))
    return smaller


def picture_words(it: Shown) -> PictureWords:
    """The words inside the picture of an outcome."""
    words, plan = it.words, it.plan
    pattern = plain_texts.EITHER_WAY if it.options.arrangement == "one" else "{words}"
    entries = (
        KeyEntry("affected", pattern.format(words=words.event)),
        KeyEntry("others", pattern.format(words=words.other)),
        KeyEntry("added", words.added),
        KeyEntry("avoided", words.avoided),
        KeyEntry("uncertain", OPEN),
    )
    low, _, high = axis_words("risk", bar_pair(plan).top)
    return PictureWords(
        without=_side(words.without),
        with_=_side(words.with_),
        key=entries,
        note=_note(it),
        lines=(),
        bar_ends=(low, high),
    )


def _side(side: PlainSide) -> Side:
    return Side(title=side.title, number=f"{side.number} {side.event}", percent=side.percent, other=side.other)


def _note(it: Shown) -> str:
    """What has to be said of the picture itself."""
    parts = []
    if it.plan.denominator is None:
        parts.append(plain_texts.TOO_CLOSE if too_close(it.plan) else plain_texts.TOO_SMALL)
    elif it.plan.denominator != 100:
        parts.append(plain_texts.EACH_PICTURE.format(people=numbers.whole(it.plan.denominator)))
    if it.options.uncertainty:
        parts.append(it.words.range_ or plain_texts.NO_RANGE)
    return " ".join(part for part in parts if part)
