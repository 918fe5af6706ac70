"""McNemar's tests of matched pairs: whether the event is as frequent on either side (letters: see ``pairs``).

Only the discordant pairs tell; where all pairs agree there is nothing to test, and the answer is a gap. Source:
McNemar 1947, Psychometrika 12:153 (from memory); the four forms are compared by Fagerland, Lydersen and Laake 2013,
BMC Med Res Methodol 13:91 (from memory).
"""

from __future__ import annotations

import math

from fourcount.stats import two_counts
from fourcount.stats.normal import two_sided_p
from fourcount.stats.pairs import without_discordance
from fourcount.stats.results import Gap, PairCounts


def mcnemar(pairs: PairCounts) -> float | Gap:
    """The asymptotic test: (f - g)^2 / (f + g) is a chi-square with one degree of freedom."""
    return _asymptotic(pairs, correction=0)


def mcnemar_corrected(pairs: PairCounts) -> float | Gap:
    """The same with a correction for continuity, (|f - g| - 1)^2 / (f + g); p is 1 where f = g."""
    return _asymptotic(pairs, correction=1)


def mcnemar_exact(pairs: PairCounts) -> float | Gap:
    """Twice the smaller tail of a binomial of f + g at 1/2, at most 1."""
    return without_discordance(pairs) or min(1.0, 2.0 * _smaller_tail(pairs).below)


def mcnemar_mid_p(pairs: PairCounts) -> float | Gap:
    """The exact p less the probability of the observed split; where f = g, 1 less half of that."""
    gap = without_discordance(pairs)
    if gap is not None:
        return gap
    tail = _smaller_tail(pairs)
    if pairs.index_only == pairs.reference_only:
        return 1.0 - tail.own / 2.0
    return 2.0 * tail.below - tail.own


def _smaller_tail(pairs: PairCounts) -> two_counts.Tails:
    fewer, more = sorted((pairs.index_only, pairs.reference_only))
    return two_counts.tails(fewer, more)


def _asymptotic(pairs: PairCounts, *, correction: int) -> float | Gap:
    gap = without_discordance(pairs)
    if gap is not None:
        return gap
    apart = max(abs(pairs.index_only - pairs.reference_only) - correction, 0)
    return two_sided_p(apart / math.sqrt(pairs.discordant))
