"""Several outcomes on one page: one denominator for all of them, where one can show each honestly."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.picture.plan import DENOMINATORS, Array, Plan, half_up, shows_honestly

Risks = tuple[float, float]
"""The risk without and the risk with, as fractions."""


def common_denominator(pairs: Sequence[Risks]) -> int | None:
    """The first denominator that shows every pair of risks honestly; None where none shows them all."""
    return next((n for n in DENOMINATORS if all(shows_honestly(*pair, n) for pair in pairs)), None)


def plan_at(without: float, with_: float, denominator: int) -> Plan:
    """Two risks laid out on a denominator that is known to show them honestly."""
    before, after = half_up(without * denominator), half_up(with_ * denominator)
    return Plan(
        denominator=denominator,
        without_risk=without,
        with_risk=with_,
        without=Array(affected=before, avoided=0, added=0, others=denominator - before),
        with_=Array(
            affected=min(before, after),
            avoided=max(before - after, 0),
            added=max(after - before, 0),
            others=denominator - max(before, after),
        ),
    )
