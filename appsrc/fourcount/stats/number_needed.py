"""Numbers needed to treat for one more person to benefit (NNTB) or to be harmed (NNTH)."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

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
