"""Which denominator can show two risks honestly, and how many icons of each state it takes."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from math import floor
from typing import Literal

from fourcount.picture.options import Arrangement

DENOMINATORS = (100, 1_000, 10_000)
NOISE = 1e-9
"""In icons: more than the float error of a difference, less than any two counts can make."""


State = Literal["affected", "added", "uncertain", "avoided", "others"]
STATES: tuple[State, ...] = ("affected", "added", "uncertain", "avoided", "others")
"""What an icon can be, in the order in which an array is filled: who has the event first, who has not last."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Array:
    """How many icons of one group are in each state.

    ``uncertain`` are those at the edge of the affected of whom the interval leaves open on which side they are.
    """

    affected: int
    avoided: int
    added: int
    others: int
    uncertain: int = 0

    def runs(self) -> Iterator[tuple[State, int, int]]:
        """Each state that is there, with its first icon and the one after its last."""
        start = 0
        for state in STATES:
            count: int = getattr(self, state)
            if count:
                yield state, start, start + count
            start += count


@dataclass(frozen=True, kw_only=True, slots=True)
class Plan:
    """Both groups on one denominator; ``denominator`` is None where no array can show the two risks.

    ``without_risk`` and ``with_risk`` are the risks themselves, ``low`` and ``high`` the limits of the risk with where
    its uncertainty is drawn: captions are computed from them, never from the icons.
    """

    denominator: int | None
    without_risk: float
    with_risk: float
    without: Array
    with_: Array
    low: float | None = None
    high: float | None = None


def half_up(value: float) -> int:
    """The nearest whole number, halves up; a relative 1e-12 absorbs the float error of risk times denominator."""
    return floor(value * (1 + 1e-12) + 0.5)


def shows_honestly(without: float, with_: float, denominator: int) -> bool:
    """Whether this many icons show two risks without hiding or inventing anything.

    (a) the risks are equal or differ by at least one icon; (b) the drawn and the true difference differ by
    under half an icon or under a tenth of the true one; (c) no non-zero risk draws none and no risk under
    100% draws all. Ours; the reason for (b) is that 4.4 and 5.6 in 100 would draw a difference of two.
    """
    drawn = [half_up(risk * denominator) for risk in (without, with_)]
    true_difference = abs(with_ - without) * denominator
    drawn_difference = abs(drawn[1] - drawn[0])
    apart = without == with_ or true_difference >= 1 - NOISE
    slip = abs(drawn_difference - true_difference)
    faithful = slip < 0.5 - NOISE or slip < true_difference / 10 - NOISE
    whole = all(
        (icons > 0 or risk == 0) and (icons < denominator or risk == 1)
        for icons, risk in zip(drawn, (without, with_), strict=True)
    )
    return apart and faithful and whole


def plan(without: float, with_: float, low: float | None = None, high: float | None = None) -> Plan:
    """Lay out two risks (fractions from 0 to 1) on the first denominator that shows them honestly.

    ``low`` and ``high`` are limits of the risk with. They have no part in the choice of the denominator.
    """
    denominator = next((n for n in DENOMINATORS if shows_honestly(without, with_, n)), None)
    return plan_on(denominator, without, with_, low, high)


def plan_on(
    denominator: int | None, without: float, with_: float, low: float | None = None, high: float | None = None
) -> Plan:
    """Lay out two risks on a denominator that is known to show them honestly, None where none does.

    The icons between the limits are drawn as uncertain. Where a limit is not given, or they do not hold the risk, none
    are.
    """
    scale = denominator or 0
    before, after = half_up(without * scale), half_up(with_ * scale)
    changed = Array(
        affected=min(before, after),
        avoided=max(before - after, 0),
        added=max(after - before, 0),
        others=scale - max(before, after),
    )
    if low is None or high is None or not 0 <= low <= with_ <= high <= 1:
        low = high = None
    else:
        changed = uncertain_between(changed, half_up(low * scale), half_up(high * scale))
    return Plan(
        denominator=denominator,
        without_risk=without,
        with_risk=with_,
        without=Array(affected=before, avoided=0, added=0, others=scale - before),
        with_=changed,
        low=low,
        high=high,
    )


def uncertain_between(array: Array, first: int, last: int) -> Array:
    """The array with its icons from ``first`` up to ``last`` uncertain, whatever they were; all others stay."""

    def left(start: int, stop: int) -> int:
        return (stop - start) - max(0, min(stop, last) - max(start, first))

    stays = {state: left(start, stop) for state, start, stop in array.runs()}
    return Array(
        affected=stays.get("affected", 0),
        uncertain=last - first,
        avoided=stays.get("avoided", 0),
        added=stays.get("added", 0),
        others=stays.get("others", 0),
    )


def states_drawn(plan: Plan, arrangement: Arrangement) -> tuple[State, ...]:
    """The states that are there to be seen, and so to be explained, in the order of filling."""
    arrays = {"two": (plan.without, plan.with_), "one": (plan.with_,), "bars": ()}[arrangement]
    seen = {state for array in arrays for state, _, _ in array.runs()}
    return tuple(state for state in STATES if state in seen)
