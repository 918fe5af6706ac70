"""Estimates of matched pairs, and intervals of the odds ratio of pairs.

Letters: e pairs with the event on both sides, f on the index side only, g on the reference side only, h on neither;
n = e+f+g+h. A pair is two matched people or one person twice.
"""

from __future__ import annotations

import math

from fourcount.stats import two_counts
from fourcount.stats.results import Gap, Interval, PairCounts


def without_pairs(pairs: PairCounts) -> Gap | None:
    """The gap of a table without a pair; None where there is one."""
    return Gap("empty-pairs") if pairs.total == 0 else None


def without_discordance(pairs: PairCounts) -> Gap | None:
    """The gap of a table whose pairs all agree, or that has none; None where a discordant pair compares the sides."""
    gap = without_pairs(pairs)
    if gap is None and pairs.discordant == 0:
        return Gap("no-discordant-pairs")
    return gap


def index_events(pairs: PairCounts) -> int:
    """The pairs with the event on the index side, e + f."""
    return pairs.both + pairs.index_only


def reference_events(pairs: PairCounts) -> int:
    """The pairs with the event on the reference side, e + g."""
    return pairs.both + pairs.reference_only


def risk_index(pairs: PairCounts) -> float | Gap:
    """The fraction of pairs with the event on the index side, (e + f) / n."""
    return without_pairs(pairs) or index_events(pairs) / pairs.total


def risk_reference(pairs: PairCounts) -> float | Gap:
    """The fraction of pairs with the event on the reference side, (e + g) / n."""
    return without_pairs(pairs) or reference_events(pairs) / pairs.total


def difference(pairs: PairCounts) -> float | Gap:
    """The index side's risk minus the reference side's, (f - g) / n: pairs that agree cancel out."""
    return without_pairs(pairs) or (pairs.index_only - pairs.reference_only) / pairs.total


def ratio(pairs: PairCounts) -> float | Gap:
    """The index side's risk over the reference side's, (e + f) / (e + g); ``inf`` where only e + g is 0."""
    gap = without_pairs(pairs)
    if gap is not None:
        return gap
    index, reference = index_events(pairs), reference_events(pairs)
    if index == reference == 0:
        return Gap("no-events")
    return index / reference if reference else math.inf


def odds_ratio(pairs: PairCounts) -> float | Gap:
    """The conditional odds ratio f / g, of the discordant pairs alone; ``inf`` where only g is 0."""
    gap = without_discordance(pairs)
    if gap is not None:
        return gap
    return pairs.index_only / pairs.reference_only if pairs.reference_only else math.inf


def exact_discordant(pairs: PairCounts, level: float) -> Interval | Gap:
    """Clopper and Pearson's limits of f / (f+g), each turned into odds (Breslow and Day 1980, from memory)."""
    return without_discordance(pairs) or two_counts.exact(pairs.index_only, pairs.reference_only, level)


def mid_p_discordant(pairs: PairCounts, level: float) -> Interval | Gap:
    """The mid-P limits of f / (f+g), each turned into odds (Fagerland and others 2014, from memory).

    It leaves out 1 exactly where McNemar's mid-P p is below 1 - level.
    """
    return without_discordance(pairs) or two_counts.mid_p(pairs.index_only, pairs.reference_only, level)


def log_discordant(pairs: PairCounts, level: float) -> Interval | Gap:
    """The textbook interval f/g exp(-+ z sqrt(1/f + 1/g)); none where only one kind of discordance was seen."""
    return without_discordance(pairs) or two_counts.log(pairs.index_only, pairs.reference_only, level)
