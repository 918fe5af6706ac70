"""The score statistic of two groups along a constraint, written in the constraint's own multiplier.

The intervals of Mee, Koopman, Cornfield and of Miettinen and Nurminen ask which values of an effect (a difference, a
ratio, an odds ratio) a chi-square statistic keeps, the two risks P1 and P2 being fitted to the table under that
effect. Usually the effect is given and P1 and P2 follow from a cubic or quadratic equation, which cancels at large
groups and rare events. Here the Lagrange multiplier of the effect is given instead. Then each group's fitted risk
follows from its own counts alone, by a linear or quadratic equation free of cancellation, the effect follows from
the two risks, and the statistic grows with the multiplier from 0, at the estimate, without a turn. So there is one
root and it can be bracketed.

    difference   P1 - P2        (a - n1 P1) / (P1 (1 - P1)) = u       (c - n2 P2) / (P2 (1 - P2)) = -u
    ratio        ln P1/P2       (a - n1 P1) / (1 - P1) = u            (c - n2 P2) / (1 - P2) = -u
    odds ratio   ln psi         a - n1 P1 = u                         c - n2 P2 = -u

The statistic is u^2 V, with V = sum of P(1-P)/n, (1-P)/(nP) or 1/(nP(1-P)), whichever belongs to the effect.
"""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import TypeVar

from fourcount.stats.normal import quantile
from fourcount.stats.results import FractionalCounts, Gap
from fourcount.stats.roots import increasing_root

Spread = Callable[[float], tuple[float, float]]
"""V and its slope at a multiplier."""

Table = TypeVar("Table", bound=FractionalCounts)


def mirrored(counts: Table) -> Table:
    """The same table with the groups swapped: an upper limit is a lower limit of this one, seen from the other side."""
    return type(counts)(
        index_events=counts.reference_events,
        index_non_events=counts.reference_non_events,
        reference_events=counts.index_events,
        reference_non_events=counts.index_non_events,
    )


def target(counts: FractionalCounts, level: float, *, finite: bool) -> float | Gap:
    """What u sqrt(V) must reach at a limit: z, times sqrt(N/(N-1)) with Miettinen and Nurminen's finite factor.

    Two groups hold two people at least, but what a design effect leaves of them can be one or fewer: a gap there.
    """
    z = quantile(level)
    if not finite:
        return z
    return z * math.sqrt(counts.total / (counts.total - 1)) if counts.total > 1 else Gap("too-few-left")


def multiplier(spread: Spread, high: float, reach: float, start: float) -> float:
    """The u between 0 and ``high`` at which u sqrt(V) is ``reach``; V may be infinite at either end."""

    def curve(u: float) -> tuple[float, float]:
        v, slope = spread(u)
        root = math.sqrt(v)
        return u * root - reach, root + u * slope / (2.0 * root)

    return increasing_root(curve, 0.0, high, start)
