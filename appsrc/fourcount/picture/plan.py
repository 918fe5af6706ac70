"""Which denominator can show two risks honestly, and how many icons of each state it takes."""

from __future__ import annotations

from dataclasses import dataclass
from math import floor

DENOMINATORS = (100, 1_000, 10_000)
NOISE = 1e-9
"""In icons: more than the float error of a difference, less than any two counts can make."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Array:
    """The icons of one group, in drawing order: affected, then changed (avoided or added), then the others."""

    affected: int
    avoided: int
    added: int
    others: int


@dataclass(frozen=True, kw_only=True, slots=True)
class Plan:
    """Both groups on one denominator; ``denominator`` is None where no array can show the two risks.

    ``without_risk`` and ``with_risk`` are the risks themselves: captions are computed from them, never from
    the icons.
    """

    denominator: int | None
    without_risk: float
    with_risk: float
    without: Array
    with_: Array


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


def plan(without: float, with_: float) -> Plan:
    """Lay out two risks (fractions from 0 to 1) on the first denominator that shows them honestly."""
    denominator = next((n for n in DENOMINATORS if shows_honestly(without, with_, n)), None)
    scale = denominator or 0
    before, after = half_up(without * scale), half_up(with_ * scale)
    both = min(before, after)
    return Plan(
        denominator=denominator,
        without_risk=without,
        with_risk=with_,
        without=Array(affected=before, avoided=0, added=0, others=scale - before),
        with_=Array(
            affected=both,
            avoided=max(before - after, 0),
            added=max(after - before, 0),
            others=scale - max(before, after),
        ),
    )
