"""Several outcomes on one page: one denominator for all of them, where one can show each honestly."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.picture.plan import DENOMINATORS, shows_honestly

Risks = tuple[float, float]
"""The risk without and the risk with, as fractions."""


def common_denominator(pairs: Sequence[Risks]) -> int | None:
    """The first denominator that shows every pair of risks honestly; None where none shows them all."""
    return next((n for n in DENOMINATORS if all(shows_honestly(*pair, n) for pair in pairs)), None)
