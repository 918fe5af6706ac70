"""A figure with its interval, a number needed, a p, and a caution: what all findings are made of."""

from __future__ import annotations

import msgspec

from fourcount.stats.number_needed import Kind, NumberNeeded, NumberNeededLimit
from fourcount.stats.results import Fact, Gap, Interval


class Range(msgspec.Struct, frozen=True, kw_only=True):
    """An interval of which exactly one limit cannot be given, since no risk lies there.

    Only figures under the patient have one; where both limits cannot be given, the interval is a ``Gap``.
    """

    low: float | Gap
    high: float | Gap
    adjusted: str | None = None


class NumberNeededRange(msgspec.Struct, frozen=True, kw_only=True):
    """A number needed of which a limit cannot be given, since the difference has none there, or neither of them.

    All else is as in ``NumberNeeded``: a withheld limit of the difference lies beyond 0 on its own side, so that it
    decides about infinity as a limit in its place would, unless what is carried tells that it stays on the other one's.
    """

    estimate: float
    kind: Kind
    low: NumberNeededLimit | Gap
    high: NumberNeededLimit | Gap
    through_infinity: bool


AnyNumberNeeded = NumberNeeded | NumberNeededRange


class Figure(msgspec.Struct, frozen=True, kw_only=True):
    """An estimate with its interval; ``method`` is the key of the interval's method in the table of methods.

    Either can be a ``Gap`` while the other stands. In ``measures`` the interval is never a ``Range``.
    """

    estimate: float | Gap
    interval: Interval | Range | Gap
    method: str


class Probability(msgspec.Struct, frozen=True, kw_only=True):
    """A two-sided p of the family's own test of no association."""

    p: float | Gap
    method: str


class Caution(msgspec.Struct, frozen=True, kw_only=True):
    """A rule of the table of cautions that holds here, with the facts for its sentence."""

    key: str
    facts: dict[str, Fact] = {}
