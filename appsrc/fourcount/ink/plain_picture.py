"""The picture that a patient is shown: each group's name, so many who have it, so many who do not, and its people."""

from __future__ import annotations

from collections.abc import Sequence
from typing import NamedTuple

from PySide6.QtGui import QPainter

from fourcount.appraisal.findings import Gap, OutcomeFindings
from fourcount.ink.paper_style import PaperStyle
from fourcount.ink.paragraph import Run, draw_paragraph, paragraph_height
from fourcount.ink.patient_picture import plan_of
from fourcount.ink.picture import Picture
from fourcount.picture.bar_pair import bar_pair
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.picture.plan import Plan, plan_on
from fourcount.record.outcome import Outcome
from fourcount.wording import numbers, plain_texts
from fourcount.wording.axis import axis_words
from fourcount.wording.picture_words import KeyEntry, PictureWords, Side, people_of
from fourcount.wording.plain import is_turned
from fourcount.wording.plain_outcome import PlainSide, PlainWords, plain_risks, plain_words, why_not

LEAST_ARRAY, GOOD_ARRAY = 110, 190
"""How high an array is at least, and where there is room, at 100%: a hundred people of some 11 and 19 pixels."""


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
    """The arrays under their captions; where one array stands under the other, each under its own."""

    def __init__(self, it: Shown) -> None:
        self._words = it.words
        options = it.options._replace(relative=False)
        words = picture_words(it)
        self._bare = Picture(it.plan, words, options._replace(captions=False))
        self._captioned = Picture(it.plan, words, options)

    def height(self, style: PaperStyle, width: float, within: float | None = None) -> float:
        """Height at ``width``, with icons as large as ``within`` allows."""
        return self._run(None, style, 0, 0, width, within)

    def least_height(self, style: PaperStyle, width: float) -> float:
        """Height below which its people could not be told apart."""
        return self.height(style, width, 0) + (0 if self._bare.bars else style.px(LEAST_ARRAY))

    def good_height(self, style: PaperStyle, width: float) -> float:
        """Height at which its people weigh as much as the words, or all that it can use."""
        good = self.height(style, width, 0) + (0 if self._bare.bars else style.px(GOOD_ARRAY))
        return min(good, self.height(style, width))

    def draw(
        self, painter: QPainter, style: PaperStyle, x: float, y: float, width: float, within: float | None = None
    ) -> float:
        """Draw it with its top left corner at (x, y) and give the height it took."""
        return self._run(painter, style, x, y, width, within)

    def _run(
        self, painter: QPainter | None, style: PaperStyle, x: float, y: float, width: float, within: float | None
    ) -> float:
        columns = self._bare.columns(style, width)
        if len(columns) != 2 or columns[0][0] == columns[1][0] or self._bare.bars:
            return _picture(self._captioned, painter, style, x, y, width, within)
        sides = (self._words.without, self._words.with_)
        blocks = [caption(style, side) for side in sides]
        heights = [
            max(paragraph_height(block[line], wide) for block, (_, wide) in zip(blocks, columns, strict=True))
            for line in range(len(blocks[0]))
        ]
        gaps = (style.px(4), 0, style.px(10))
        top = y
        for line, (tall, gap) in enumerate(zip(heights, gaps, strict=True)):
            if painter:
                for block, (left, wide) in zip(blocks, columns, strict=True):
                    draw_paragraph(painter, x + left, y, wide, block[line])
            y += tall + gap
        left_over = None if within is None else within - (y - top)
        return y + _picture(self._bare, painter, style, x, y, width, left_over) - top


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


def caption(style: PaperStyle, side: PlainSide) -> tuple[Sequence[Run], Sequence[Run], Sequence[Run]]:
    """Name, count and the other frame: three paragraphs, so that both groups' lines stand level."""
    ink, muted = style.palette.ink, style.palette.muted
    figure, body = style.font("figure"), style.font("body")
    return (
        (Run(side.title, style.font("strong"), ink),),
        (Run(f"{side.number} {side.event}", figure, ink), Run(side.percent, body, muted)),
        (Run(side.other, body, muted),),
    )


def picture_words(it: Shown) -> PictureWords:
    """The words inside the picture of an outcome."""
    words, plan = it.words, it.plan
    pattern = plain_texts.EITHER_WAY if it.options.arrangement == "one" else "{words}"
    entries = (
        KeyEntry("affected", pattern.format(words=words.event)),
        KeyEntry("added", words.added),
        KeyEntry("uncertain", plain_texts.EITHER),
        KeyEntry("avoided", words.avoided),
        KeyEntry("others", pattern.format(words=words.other)),
    )
    low, _, high = axis_words("risk", bar_pair(plan).top)
    return PictureWords(
        without=_side(words.without),
        with_=_side(words.with_),
        key=tuple(entry for entry in entries if entry.text),
        note=_note(it),
        lines=(),
        bar_ends=(low, high),
    )


def _side(side: PlainSide) -> Side:
    return Side(title=side.title, number=f"{side.number} {side.event}", percent=side.percent, other=side.other)


def _note(it: Shown) -> str:
    """What has to be said of the picture itself."""
    parts = [it.words.turned if it.plan.denominator else ""]
    if it.plan.denominator is None:
        parts.append(plain_texts.TOO_SMALL)
    elif it.plan.denominator != 100:
        parts.append(plain_texts.EACH_PICTURE.format(people=numbers.whole(it.plan.denominator)))
    if it.options.uncertainty:
        parts.append(it.words.range_)
    return " ".join(part for part in (*parts, it.words.rounded) if part)
