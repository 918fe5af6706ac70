"""Figures and tests of a form without a correction for clusters, by the keys of their methods."""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.appraisal.findings import Figure, Gap, Interval, PairCounts, Probability, Rates
from fourcount.stats.methods import method, test


@dataclass(frozen=True, kw_only=True, slots=True)
class ByMethod:
    """At one level; ``without`` is why there are no intervals, if any, ``waiting`` the keys that follow later."""

    level: float
    without: Gap | None
    waiting: frozenset[str]

    def figure(self, measure: str, key: str, estimate: float | Gap, *arguments: object) -> Figure:
        """The estimate with the interval of one method; ``arguments`` are what that takes before the level."""
        gap = self._gap(key)
        interval: Interval | Gap = method(measure, key).interval(*arguments, self.level) if gap is None else gap
        return Figure(estimate=estimate, interval=interval, method=key)

    def probability(self, key: str, given: PairCounts | Rates) -> Probability:
        """The p of one test."""
        gap = self._gap(key)
        return Probability(p=test(key).p(given) if gap is None else gap, method=key)

    def _gap(self, key: str) -> Gap | None:
        if self.without is not None:
            return self.without
        return Gap("follows") if key in self.waiting else None
