"""The tests of no association; the conditional ones are imported when they are first called.

Campbell 2007 is cited from memory.
"""

from __future__ import annotations

from fourcount.stats import association
from fourcount.stats.entries.entry import Test
from fourcount.stats.results import Counts, FractionalCounts, Gap


def _fisher(counts: FractionalCounts) -> float | Gap:
    if not isinstance(counts, Counts):
        return Gap("not-whole")
    from fourcount.stats import conditional

    return conditional.fisher(counts)


def _fisher_mid_p(counts: FractionalCounts) -> float | Gap:
    if not isinstance(counts, Counts):
        return Gap("not-whole")
    from fourcount.stats import conditional

    return conditional.fisher_mid_p(counts)


ASSOCIATION_TESTS = (
    Test(
        key="fisher",
        title="Fisher exact",
        formula="The sum of the probabilities, given the margins, of all tables no likelier than this one",
        source="Fisher 1935",
        note="Never too small, and usually too large.",
        p=_fisher,
    ),
    Test(
        key="fisher-mid-p",
        title="Fisher mid-P",
        formula="Fisher’s p less half of this table’s own probability",
        source="Lydersen, Fagerland and Laake 2009, Stat Med 28:1159",
        note="Half of this table’s own probability is taken off, not half of all tables equally likely.",
        p=_fisher_mid_p,
    ),
    Test(
        key="pearson",
        title="Pearson chi-square",
        formula="N(ad − bc)² / (n1 n2 m (N−m)), one degree of freedom, no continuity correction",
        source="K. Pearson 1900",
        note="Where everybody had the event, or nobody, there is nothing to test.",
        p=association.pearson,
    ),
    Test(
        key="n-minus-1",
        title="(N−1) chi-square",
        formula="(N−1)(ad − bc)² / (n1 n2 m (N−m)), one degree of freedom, no continuity correction",
        source="E. S. Pearson 1947; Campbell 2007",
        note=(
            "Agrees with the Miettinen–Nurminen intervals about no effect. "
            "Where everybody had the event, or nobody, there is nothing to test."
        ),
        p=association.n_minus_1,
    ),
)
