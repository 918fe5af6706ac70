"""Numbers needed to treat for one more person to benefit (NNTB) or to be harmed (NNTH)."""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Literal

from fourcount.stats.results import Counts, Interval

Kind = Literal["NNTB", "NNTH", "neither"]


@dataclass(frozen=True, kw_only=True, slots=True)
class NumberNeededLimit:
    """One limit: a positive value, unrounded (``inf`` where the difference's limit is 0), and its own kind."""

    value: float
    kind: Kind


@dataclass(frozen=True, kw_only=True, slots=True)
class NumberNeeded:
    """The reciprocal of a risk difference with its interval.

    ``low`` is the reciprocal of the difference's limit on the estimate's side farthest from 0, ``high`` of
    the other. ``through_infinity`` holds only if 0 lies strictly inside the difference's interval.
    """

    estimate: float
    kind: Kind
    low: NumberNeededLimit
    high: NumberNeededLimit
    through_infinity: bool


def number_needed(difference: float, interval: Interval, unwelcome: bool) -> NumberNeeded:
    """The number needed of a risk difference (index minus reference, of the event) and its interval.

    For an unwelcome event a negative difference is benefit. Values are positive and unrounded, and the kind of
    each limit is that of its own side. A limit of exactly 0 gives ``inf`` with the other limit's kind; a difference
    of 0 gives ``inf``, kind "neither", and its ``low`` lies on the NNTB side. The interval passes through infinity,
    from NNTB to NNTH, only where 0 lies strictly inside. Source: Altman 1998, BMJ 317:1309.
    """
    benefit = -difference if unwelcome else difference
    least, most = (-interval.high, -interval.low) if unwelcome else (interval.low, interval.high)
    far, near = (least, most) if benefit < 0.0 else (most, least)
    return NumberNeeded(
        estimate=_reciprocal(benefit),
        kind=_kind(benefit, instead=0.0),
        low=NumberNeededLimit(value=_reciprocal(far), kind=_kind(far, instead=near)),
        high=NumberNeededLimit(value=_reciprocal(near), kind=_kind(near, instead=far)),
        through_infinity=least < 0.0 < most,
    )


def whole_number_needed(counts: Counts) -> int | None:
    """1/|D| rounded up, from the counts by whole numbers: 30/100 v 25/100 is 20.

    In binary fractions 1/(0.30 - 0.25) is a little above 20 and would round up to 21. None where the risks are
    equal or a group is empty.
    """
    across = abs(counts.index_events * counts.reference_total - counts.reference_events * counts.index_total)
    return -(-counts.index_total * counts.reference_total // across) if across else None


def _reciprocal(benefit: float) -> float:
    return 1.0 / abs(benefit) if benefit != 0.0 else math.inf


def _kind(benefit: float, *, instead: float) -> Kind:
    if benefit == 0.0:
        benefit = instead
    if benefit == 0.0:
        return "neither"
    return "NNTB" if benefit > 0.0 else "NNTH"
