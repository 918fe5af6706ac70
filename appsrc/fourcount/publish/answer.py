"""Four counts in, the published dictionary out: the way in for other programs, without a window."""

from __future__ import annotations

import operator
from dataclasses import dataclass
from numbers import Real
from typing import cast

from fourcount.appraisal.appraise import appraise
from fourcount.publish.asked_patient import WISHES, Wishes, check_against_study, with_wishes
from fourcount.publish.contract import contract
from fourcount.publish.shown import shown
from fourcount.record.entry.cell import LARGEST_COUNT
from fourcount.record.outcome import (
    CELLS,
    DESIGNS,
    PAIRED_DESIGNS,
    Design,
    EventsAndOthers,
    Outcome,
    Pairs,
    PaperMeasure,
)
from fourcount.record.paper import FAMILIES, HIGHEST_LEVEL, LOWEST_LEVEL, Choices
from fourcount.wording import command as words

COUNT_NAMES = ("index events", "index non-events", "reference events", "reference non-events")
PAIR_NAMES = ("pairs with both", "pairs with the index side only", "pairs with the reference side only", "other pairs")
ODDS_RATIO_DESIGNS: tuple[Design, ...] = ("case-control", "matched")
"""Designs whose papers print an odds ratio: what a printed figure without a name is taken for."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Question:
    """Four counts of an unpaired table, or of pairs, checked, and what is asked of them.

    ``outcome`` is what a reader would have typed: the index group first, the events left; pairs both first.
    """

    counts: tuple[int, ...]
    outcome: Outcome
    choices: Choices

    @property
    def printed_text(self) -> str:
        """What the paper prints as the result of these counts."""
        return self.outcome.paper_text


def answer(  # noqa: PLR0913 - four counts, and six choices by name
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
    **wishes: object,
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
        A starting risk from outside the study: a fraction from 0 to 1, or a text such as "12%", "12% (9 to 15)" or
        "24 of 200".
    unwelcome : bool
        Whether the event is a bad one, which decides between NNTB and NNTH.
    printed : str or None
        What the paper prints as the result of these counts, such as "RR 1.50 (1.12 to 2.01)". The ways in which it
        follows from them are listed under ``printed``, what is said of it under ``check``.
    low, high : float, str or None
        A low and a high starting risk beside the usual one, ``baseline``.
    rate : str or None
        In place of a starting risk, a rate such as "12 per 1,000 person-years", over ``span``.
    overall, exposed : float, str or None
        In place of a starting risk, the risk of all people and the share of them who have the exposure.
    effect : str or None
        The effect to carry: "risk_ratio", "odds_ratio", "risk_difference", "adjusted" and so on; the usual one if None.
    adjusted : str or None
        An adjusted effect that the paper prints, of the index group against the reference group, such as
        "OR 0.49 (0.32 to 0.75)".
    span, other_span : str or None
        The study's time span, such as "12 months", and another one to carry the risks to.
    margin, matters : str or None
        A margin, or the smallest difference that would matter: "RD 2% more", "RR 1.25". Where the interval lies
        against it stands under ``line``.

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
        **wishes,
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
    **wishes: object,
) -> Question:
    """The question, each part of it checked; ValueError with one plain sentence otherwise."""
    names = PAIR_NAMES if design in PAIRED_DESIGNS else COUNT_NAMES
    whole = tuple(_count(value, name) for value, name in zip(counts, names, strict=True))
    if not isinstance(design, str) or design not in DESIGNS:
        raise ValueError(words.ONE_OF.format(name="design", allowed=", ".join(DESIGNS), given=shown(design)))
    if not isinstance(intervals, str) or intervals not in FAMILIES:
        raise ValueError(words.ONE_OF.format(name="intervals", allowed=", ".join(FAMILIES), given=shown(intervals)))
    if not isinstance(unwelcome, bool):
        raise ValueError(words.NOT_A_TRUTH.format(given=shown(unwelcome)))
    if printed is not None and not isinstance(printed, str):
        raise ValueError(words.NOT_A_PRINT.format(given=shown(printed)))
    unknown = wishes.keys() - set(WISHES)
    if unknown:
        raise TypeError(words.NO_SUCH_ARGUMENT.format(name=min(unknown)))
    wanted, choices = Wishes(baseline=baseline, **wishes), Choices(family=intervals, level=_level(level))
    plain = _typed(whole, design, unwelcome=unwelcome, printed_text=printed or "")
    outcome = with_wishes(plain, wanted)
    check_against_study(wanted, outcome, choices)
    return Question(counts=whole, outcome=outcome, choices=choices)


def _typed(counts: tuple[int, ...], design: Design, *, unwelcome: bool, printed_text: str) -> Outcome:
    """The table as a reader would have typed it."""
    cells = dict(zip(CELLS, map(str, counts), strict=True))
    measure: PaperMeasure = "odds_ratio" if design in ODDS_RATIO_DESIGNS else "risk_ratio"
    return Outcome(
        table=Pairs(**cells) if design in PAIRED_DESIGNS else EventsAndOthers(**cells),
        design=design,
        left_welcome=not unwelcome,
        paper_measure=measure,
        paper_text=printed_text,
    )


def _count(value: object, name: str) -> int:
    """The count; anything that is a whole number by its type will do, a truth value will not."""
    try:
        count = -1 if isinstance(value, bool) else operator.index(value)  # type: ignore[arg-type]
    except TypeError:
        count = -1
    if not 0 <= count <= LARGEST_COUNT:
        raise ValueError(words.NOT_A_COUNT.format(name=name, largest=f"{LARGEST_COUNT:,}", given=shown(value)))
    return count


def _level(level: object) -> float:
    usable = isinstance(level, Real) and not isinstance(level, bool)
    if not usable or not LOWEST_LEVEL <= cast(float, level) <= HIGHEST_LEVEL:
        raise ValueError(words.NOT_A_LEVEL.format(low=f"{LOWEST_LEVEL:.2f}", high=HIGHEST_LEVEL, given=shown(level)))
    return float(cast(float, level))
