"""Fisher's exact test: the probability, at an odds ratio of 1, of tables as unlikely as the one observed.

All margins are held fixed. Two-sided: the sum over all tables whose probability is at most that of the observed one
times 1 + 1e-7, so that tables tied with it count in spite of rounding (common practice). Sources: R. A. Fisher
(1935) J R Stat Soc 98:39; mid-P: Lancaster HO (1961) J Am Stat Assoc 56:223, Lydersen S, Fagerland MW, Laake P
(2009) Stat Med 28:1159. Where no event, or nothing but events, was seen, only one table is possible: its p
would be 1 and its mid-P 1/2 by definition, whatever the groups, so that neither tests anything, and both are gaps. A p
below the smallest double is 0.
"""

from __future__ import annotations

import math

from fourcount.stats.central import log_probability, moved, tail
from fourcount.stats.estimates import without_a_contrast
from fourcount.stats.hypergeometric import support
from fourcount.stats.results import Counts, Gap

TIE = math.log1p(1e-7)
"""What the log probability of a table may exceed that of the observed one by and still count as tied with it."""


def fisher(counts: Counts) -> float | Gap:
    """Fisher's two-sided p."""
    return without_a_contrast(counts) or min(1.0, _unlikely(counts))


def fisher_mid_p(counts: Counts) -> float | Gap:
    """Fisher's two-sided p less half the observed table's own probability; tables tied with it count in full."""
    return without_a_contrast(counts) or min(1.0, _unlikely(counts)) - math.exp(log_probability(counts)) / 2


def fisher_greater(counts: Counts) -> float | Gap:
    """One-sided: the probability of as many index events, or more."""
    return without_a_contrast(counts) or beyond(counts, 1)


def fisher_less(counts: Counts) -> float | Gap:
    """One-sided: the probability of as many index events, or fewer."""
    return without_a_contrast(counts) or beyond(counts, -1)


def beyond(counts: Counts, away: int) -> float:
    """The probability of this table and those beyond it: summed where they fall, else by what is left."""
    if _ends(counts, -away):
        return 1.0
    if _side(counts) in (0, away):
        return min(1.0, _times(tail(counts, away), log_probability(counts)))
    before = moved(counts, -away)
    return 1.0 - _times(tail(before, -away), log_probability(before))


def _unlikely(counts: Counts) -> float:
    """The sum over the tables no likelier than this one; 1 if it is the likeliest or tied with that."""
    away = from_likeliest(counts)
    likeliest = moved(counts, -away)
    bound = log_probability(counts) + TIE
    if log_probability(likeliest) <= bound:
        return 1.0
    total = 0.0
    for side in (-1, 1):
        first = first_unlikely(likeliest, side, bound, abs(away))
        if first is not None:
            total += _times(tail(first, side), log_probability(first))
    return total


def from_likeliest(counts: Counts) -> int:
    """How many more index events this table has than the likeliest one: floor((n1 + 1)(m + 1) / (N + 2)).

    Source: common practice.
    """
    return counts.index_events - (counts.index_total + 1) * (counts.events + 1) // (counts.total + 2)


def _times(sum_over_own: float, log_own: float) -> float:
    return math.exp(math.log(sum_over_own) + log_own)


def _ends(counts: Counts, away: int) -> bool:
    least, greatest = support(counts)
    return (greatest if away > 0 else least) == 0


def _side(counts: Counts) -> int:
    """On which side of the likeliest table this one lies: 1 with more index events, -1 with fewer, 0 if likeliest."""
    a, b = counts.index_events, counts.index_non_events
    c, d = counts.reference_events, counts.reference_non_events
    if b * c > (a + 1) * (d + 1):
        return -1
    return 1 if a * d > (b + 1) * (c + 1) else 0


def first_unlikely(likeliest: Counts, side: int, bound: float, guess: int) -> Counts | None:
    """On one side, the table nearest the likeliest whose log probability is within the bound; None without one.

    Probabilities fall from the likeliest table outwards; the search spreads from a guess of the distance,
    that of the observed table, which is right on its own side and nearly so on the other.
    """
    last = abs(support(likeliest)[0 if side < 0 else 1])

    def unlikely(steps: int) -> bool:
        return log_probability(moved(likeliest, side * steps)) <= bound

    if not unlikely(last):
        return None
    within, beyond = 0, last
    stride = 1
    while within < guess < beyond:
        if unlikely(guess):
            beyond, guess = guess, guess - stride
        else:
            within, guess = guess, guess + stride
        stride *= 2
    while beyond - within > 1:
        halfway = (within + beyond) // 2
        within, beyond = (within, halfway) if unlikely(halfway) else (halfway, beyond)
    return moved(likeliest, side * beyond)
