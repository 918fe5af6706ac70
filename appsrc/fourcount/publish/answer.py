"""Four counts in, the published dictionary out: the way in for other programs, without a window."""

from __future__ import annotations

import operator
import reprlib
from dataclasses import dataclass
from decimal import Decimal
from numbers import Real
from typing import cast

from fourcount.appraisal.appraise import appraise
from fourcount.publish.contract import contract
from fourcount.record.entry.cell import LARGEST_COUNT
from fourcount.record.entry.readings import Blank, Unreadable
from fourcount.record.entry.risk import read_risk
from fourcount.record.outcome import (
    CELLS,
    DESIGNS,
    PAIRED_DESIGNS,
    Design,
    EventsAndOthers,
    Outcome,
    Pairs,
    PaperMeasure,
    Patient,
)
from fourcount.record.paper import FAMILIES, HIGHEST_LEVEL, LOWEST_LEVEL, Choices, Family
from fourcount.wording import command as words
from fourcount.wording.gaps import mark_text

COUNT_NAMES = ("index events", "index non-events", "reference events", "reference non-events")
PAIR_NAMES = ("pairs with both", "pairs with the index side only", "pairs with the reference side only", "other pairs")
ODDS_RATIO_DESIGNS: tuple[Design, ...] = ("case-control", "matched")
"""Designs whose papers print an odds ratio: what a printed figure without a name is taken for."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Question:
    """Four counts of an unpaired table, or of pairs, checked, and what is asked of them."""

    counts: tuple[int, ...]
    design: Design
    level: float
    intervals: Family
    baseline_text: str
    unwelcome: bool
    printed_text: str = ""

    @property
    def outcome(self) -> Outcome:
        """The outcome that a reader would have typed: the index group first, the events left; pairs both first."""
        cells = dict(zip(CELLS, map(str, self.counts), strict=True))
        measure: PaperMeasure = "odds_ratio" if self.design in ODDS_RATIO_DESIGNS else "risk_ratio"
        return Outcome(
            table=Pairs(**cells) if self.design in PAIRED_DESIGNS else EventsAndOthers(**cells),
            design=self.design,
            left_welcome=not self.unwelcome,
            patient=Patient(starting_risk_text=self.baseline_text),
            paper_measure=measure,
            paper_text=self.printed_text,
        )

    @property
    def choices(self) -> Choices:
        return Choices(family=self.intervals, level=self.level)


def answer(  # noqa: PLR0913 - four counts, and five choices by name
    index_events: int,
    index_non_events: int,
    reference_events: int,
    reference_non_events: int,
    *,
    design: str = "trial",
    level: float = 0.95,
    intervals: str = "score",
    baseline: float | str | None = None,
    unwelcome: bool = True,
    printed: str | None = None,
) -> dict[str, object]:
    """Everything that four counts say, as plain dictionaries, lists, numbers and strings.

    Parameters
    ----------
    index_events, index_non_events, reference_events, reference_non_events : int
        People with and without the event in each group, 0 to 10^9. For the designs of pairs, the pairs in the order
        both, index only, reference only, neither.
    design : {"trial", "cohort", "survey", "case-control", "matched", "paired", "before-after"}
        What the design cannot give is withheld, with the reason.
    level : float
        The confidence level as a fraction, 0.80 to 0.999.
    intervals : {"score", "textbook", "exact"}
        The family whose intervals stand under ``measures``; ``methods`` holds all of them.
    baseline : float, str or None
        A starting risk from outside the study: a fraction from 0 to 1, or a text such as "12%" or "12 in 100".
    unwelcome : bool
        Whether the event is a bad one, which decides between NNTB and NNTH.
    printed : str or None
        What the paper prints as the result of these counts, such as "RR 1.50 (1.12 to 2.01)". The ways in which it
        follows from them are listed under ``printed``, what is said of it under ``check``.

    Raises
    ------
    ValueError
        With one plain sentence, where an argument is none of these.
    """
    question = asked(
        (index_events, index_non_events, reference_events, reference_non_events),
        design=design,
        level=level,
        intervals=intervals,
        baseline=baseline,
        unwelcome=unwelcome,
        printed=printed,
    )
    outcome, choices = question.outcome, question.choices
    return {**contract(outcome, choices, appraise(outcome, choices)), **checked(question)}


def checked(question: Question) -> dict[str, object]:
    """What is said of the printed text; nothing where none was given."""
    if not question.printed_text:
        return {}
    from fourcount.appraisal.check import check
    from fourcount.publish.printed import printed as published_check

    return published_check(check(question.outcome, question.choices))


def asked(
    counts: tuple[object, ...],
    *,
    design: object,
    level: object,
    intervals: object,
    baseline: object,
    unwelcome: object,
    printed: object = None,
) -> Question:
    """The question, each part of it checked; ValueError with one plain sentence otherwise."""
    names = PAIR_NAMES if design in PAIRED_DESIGNS else COUNT_NAMES
    whole = tuple(_count(value, name) for value, name in zip(counts, names, strict=True))
    if not isinstance(design, str) or design not in DESIGNS:
        raise ValueError(words.ONE_OF.format(name="design", allowed=", ".join(DESIGNS), given=_shown(design)))
    if not isinstance(intervals, str) or intervals not in FAMILIES:
        raise ValueError(words.ONE_OF.format(name="intervals", allowed=", ".join(FAMILIES), given=_shown(intervals)))
    if not isinstance(unwelcome, bool):
        raise ValueError(words.NOT_A_TRUTH.format(given=_shown(unwelcome)))
    if printed is not None and not isinstance(printed, str):
        raise ValueError(words.NOT_A_PRINT.format(given=_shown(printed)))
    return Question(
        counts=whole,
        design=design,
        level=_level(level),
        intervals=intervals,
        baseline_text=_baseline_text(baseline),
        unwelcome=unwelcome,
        printed_text=printed or "",
    )


def _count(value: object, name: str) -> int:
    """The count; anything that is a whole number by its type will do, a truth value will not."""
    try:
        count = -1 if isinstance(value, bool) else operator.index(value)  # type: ignore[arg-type]
    except TypeError:
        count = -1
    if not 0 <= count <= LARGEST_COUNT:
        raise ValueError(words.NOT_A_COUNT.format(name=name, largest=f"{LARGEST_COUNT:,}", given=_shown(value)))
    return count


def _level(level: object) -> float:
    usable = isinstance(level, Real) and not isinstance(level, bool)
    if not usable or not LOWEST_LEVEL <= cast(float, level) <= HIGHEST_LEVEL:
        raise ValueError(words.NOT_A_LEVEL.format(low=f"{LOWEST_LEVEL:.2f}", high=HIGHEST_LEVEL, given=_shown(level)))
    return float(cast(float, level))


def _baseline_text(baseline: object) -> str:
    """The starting risk as a reader would type it; a fraction is written so that it reads back as the same number."""
    if baseline is None:
        return ""
    if isinstance(baseline, str):
        reading = read_risk(baseline)
        if isinstance(reading, Unreadable):
            raise ValueError(words.UNUSABLE_BASELINE.format(reason=mark_text(reading)))
        if isinstance(reading, Blank):
            raise ValueError(words.NO_BASELINE)
        return baseline
    usable = isinstance(baseline, Real) and not isinstance(baseline, bool)
    if not usable or not 0 <= cast(float, baseline) <= 1:
        raise ValueError(words.NOT_A_BASELINE.format(given=_shown(baseline)))
    return f"{Decimal(repr(float(cast(float, baseline)))).scaleb(2):f}%"


def _shown(value: object) -> str:
    """What was given, short enough for a sentence. Python refuses to write out a whole number of great length."""
    if isinstance(value, int) and abs(value) > 10**40:
        return words.HUGE if value > 0 else words.HUGE_BELOW_ZERO
    return reprlib.repr(value)
