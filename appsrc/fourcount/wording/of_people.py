"""Shares of people in whole numbers: never nobody for somebody, nor everybody for nearly everybody."""

from __future__ import annotations

from fourcount.wording import numbers

UNDER_ONE = "under 1"
OVER = "over {number}"


def affected(risk: float, people: int) -> str:
    """How many of ``people`` a risk stands for: ``12``, ``under 1``, ``over 99``."""
    n = numbers.people(risk, people)
    if n == 0 and risk:
        return UNDER_ONE
    return OVER.format(number=numbers.whole(people - 1)) if n >= people and risk < 1 else numbers.whole(n)


def unaffected(risk: float, people: int) -> str:
    """What the rounded count of the affected leaves, so that the two make the whole."""
    n = numbers.people(risk, people)
    if n == 0 and risk:
        return OVER.format(number=numbers.whole(people - 1))
    return UNDER_ONE if n >= people and risk < 1 else numbers.whole(people - n)


def apart(difference: float, people: int) -> str:
    """The size of a difference, or of one of its limits: ``6``, ``under 1``."""
    n = numbers.people(difference, people)
    return UNDER_ONE if n == 0 and difference else numbers.whole(n)


def hidden(risk: float, people: int) -> bool:
    """Whether the whole number would say nobody, or everybody, of a risk that is neither."""
    return 0 < risk < 1 and numbers.people(risk, people) in (0, people)


def percentage(risk: float, people: int) -> str:
    """The same share as a percentage with the same digits: 12% of 100, 1.2% of 1,000."""
    if hidden(risk, people):
        return numbers.percent_whole(risk)
    return f"{numbers.fixed_percent(risk, len(str(people)) - 3)}%"
