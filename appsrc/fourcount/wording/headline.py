"""How many people of a round number the headline speaks of, and what its numbers are.

Whole people of 100, unless that would make different risks look alike, somebody nobody, nearly all all, or numbers
that do not add up; then of 1,000 or 10,000. More than 10,000 people, whom nobody can picture, are spoken of only
where among fewer somebody would be nobody, nearly all all, or two risks of a few the same. The difference is rounded
from the difference itself, never taken from the rounded parts.
"""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.appraisal.findings import Gap, Interval, Range
from fourcount.wording import numbers

DENOMINATORS = tuple(10**power for power in range(2, 10))
ONE_PERSON = 1 - 1e-9  # a difference of less than one whole person is not said in whole people
LARGEST_PICTURED = 10_000  # common practice: beyond it whole people say no more than a percentage does
A_FEW = 10
DO_NOT_ADD_UP = "Whole numbers are rounded, so they need not add up."


@dataclass(frozen=True, kw_only=True, slots=True)
class People:
    """Whole people of ``denominator``; the difference is a size."""

    denominator: int
    reference: int
    index: int
    difference: int

    @property
    def add_up(self) -> bool:
        """Whether the rounded difference is that of the rounded parts."""
        return abs(self.reference - self.index) == self.difference


def choose(reference: float, index: float, difference: float, interval: Interval | Range | Gap | None = None) -> People:
    """The smallest denominator at which the sentence, with its interval if it has one, says only what is so.

    Where none to 10,000 does, the smallest from there on that calls nobody and everybody only who is: what is
    too small to count then is "under 1", and numbers may not add up.
    """
    pictured = [d for d in DENOMINATORS if d <= LARGEST_PICTURED]
    fitting = [d for d in pictured if _true_at(d, reference, index, difference)]
    fine = [d for d in fitting if limits_apart(d, interval)]
    whole = [
        d
        for d in DENOMINATORS
        if d >= LARGEST_PICTURED and _nobody_hidden(d, reference, index) and _few_apart(d, reference, index)
    ]
    denominator = (*fine, *fitting, *whole, DENOMINATORS[-1])[0]
    return People(
        denominator=denominator,
        reference=numbers.people(reference, denominator),
        index=numbers.people(index, denominator),
        difference=numbers.people(difference, denominator),
    )


def people_for(reference: float, index: float, difference: float) -> int:
    """Of how many people two risks are told, where no picture says of how many."""
    return choose(reference, index, difference).denominator


def _true_at(denominator: int, reference: float, index: float, difference: float) -> bool:
    """Whether the rounded numbers differ, add up, and call nobody or everybody only who is."""
    first, second = numbers.people(reference, denominator), numbers.people(index, denominator)
    apart = numbers.people(difference, denominator)
    return (
        abs(first - second) == apart
        and (difference == 0 or abs(difference) * denominator >= ONE_PERSON)
        and _nobody_hidden(denominator, reference, index)
    )


def _nobody_hidden(denominator: int, *risks: float) -> bool:
    """Whether somebody stays somebody, and nearly all stays under all."""
    rounded = [(numbers.people(risk, denominator), risk) for risk in risks]
    return all((n > 0) == (risk > 0) and (n < denominator) == (risk < 1) for n, risk in rounded)


def _few_apart(denominator: int, one: float, other: float) -> bool:
    """Whether two different risks of only a few people are not told by one and the same number."""
    first, second = numbers.people(one, denominator), numbers.people(other, denominator)
    return one == other or first != second or max(first, second) >= A_FEW


def limits_apart(denominator: int, interval: Interval | Range | Gap | None) -> bool:
    """Whether no limit is rounded to no effect, and the two do not fall together."""
    if interval is None or isinstance(interval, Gap):
        return True
    ends = [x for x in (interval.low, interval.high) if not isinstance(x, Gap)]
    rounded = [numbers.people(x, denominator) * (1 if x > 0 else -1) for x in ends]
    whole = all((n != 0) == (x != 0) for n, x in zip(rounded, ends, strict=True))
    return whole and (len(set(ends)) < 2 or len(set(rounded)) == 2)
