"""Fisher's p while events are added, one by one, to the group with the lower risk, the sizes staying.

With k added, p is A(k) + B(k): A the probability of this table and those beyond it, B that of the tables on the other
side which are no likelier. p rises on the whole but not at every step, since B falls until one more table joins it. So
the first k that reaches a threshold is not found by halving alone. But as k grows, A only rises, and of two tables told
apart by the other group's events, the one with fewer of them only loses probability against the other (monotone
likelihood ratio of the hypergeometric distribution in the number of events). So the tables that make up B, counted by
the other group's events, never leave it, and the probability of any given set of them only falls. Hence p is, for every
k from i to j, at most A(j) plus the probability, with i added, of the set that makes up B(j). Spans whose bound stays
below the threshold are passed over whole; the others are halved, the nearer half first.
"""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.stats.central import log_probability, moved
from fourcount.stats.fisher import TIE, beyond, first_unlikely, fisher, from_likeliest
from fourcount.stats.results import Counts, Gap

_SAME = 1e-9  # a p of 1/20 can come out some last bits below 0.05


@dataclass(frozen=True, slots=True)
class AddingEvents:
    """The tables with ever more events in the index group, which has the lower risk at the start."""

    start: Counts
    threshold: float

    def table(self, added: int) -> Counts:
        """The counts with so many people of the index group turned from non-events to events."""
        return Counts(
            index_events=self.start.index_events + added,
            index_non_events=self.start.index_non_events - added,
            reference_events=self.start.reference_events,
            reference_non_events=self.start.reference_non_events,
        )

    def to_equal_risks(self) -> int:
        """How many make the risk at least that of the other group."""
        start = self.start
        return -(-start.reference_events * start.index_total // start.reference_total) - start.index_events

    def p(self, added: int) -> float:
        """Fisher's two-sided p; where everybody has had the event at last it is 1 by definition."""
        p = fisher(self.table(added))
        return 1.0 if isinstance(p, Gap) else p

    def reaches(self, p: float) -> bool:
        """Whether a p is the threshold or above it, last bits apart."""
        return p >= self.threshold * (1.0 - _SAME)

    def bound(self, first: int, last: int) -> float:
        """What p does not exceed from ``first`` to ``last`` added; 1 where this way says nothing."""
        at_last = self.table(last)
        away = -from_likeliest(at_last)
        if away <= 0 or log_probability(moved(at_last, away)) <= log_probability(at_last) + TIE:
            return 1.0
        own_side = beyond(at_last, -1)
        return own_side if self.reaches(own_side) else own_side + self._other_side(at_last, first)

    def first_reaching(self, below: int, last: int) -> int | None:
        """The first number after ``below``, where p is too small, up to ``last``; None without one."""
        if not self.reaches(self.bound(below + 1, last)):
            return None
        if last - below == 1:
            return last if self.reaches(self.p(last)) else None
        halfway = (below + last) // 2
        return self.first_reaching(below, halfway) or self.first_reaching(halfway, last)

    def _other_side(self, at_last: Counts, first: int) -> float:
        """The probability, with ``first`` added, of the tables on the other side that are no likelier than this one."""
        away = -from_likeliest(at_last)
        nearest = first_unlikely(moved(at_last, away), 1, log_probability(at_last) + TIE, away)
        if nearest is None:
            return 0.0
        there = moved(self.table(first), nearest.index_events - at_last.index_events)
        return beyond(there, 1) if from_likeliest(there) > 0 else 1.0
