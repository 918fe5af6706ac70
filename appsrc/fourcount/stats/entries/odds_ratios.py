"""The interval methods of the odds ratio; the conditional ones are imported when they are first called."""

from __future__ import annotations

from fourcount.stats import odds
from fourcount.stats.entries.entry import Method
from fourcount.stats.results import Counts, FractionalCounts, Gap, Interval


def _conditional_exact(counts: FractionalCounts, level: float) -> Interval | Gap:
    if not isinstance(counts, Counts):
        return Gap("not-whole")
    from fourcount.stats import conditional

    return conditional.conditional_exact(counts, level)


def _conditional_mid_p(counts: FractionalCounts, level: float) -> Interval | Gap:
    if not isinstance(counts, Counts):
        return Gap("not-whole")
    from fourcount.stats import conditional

    return conditional.conditional_mid_p(counts, level)


def _baptista_pike_mid_p(counts: FractionalCounts, level: float) -> Interval | Gap:
    if not isinstance(counts, Counts):
        return Gap("not-whole")
    from fourcount.stats import conditional

    return conditional.baptista_pike_mid_p(counts, level)


ODDS_RATIO_METHODS = (
    Method(
        key="baptista-pike-mid-p",
        measure="odds_ratio",
        interval=_baptista_pike_mid_p,
        title="Baptista–Pike mid-P",
        formula=(
            "The least and the greatest odds ratio at which the sum of the probabilities, given the margins, of all "
            "tables no likelier than this one, less half of this one’s own, is above alpha"
        ),
        source="Baptista and Pike 1977, Appl Stat 26:214; Fagerland and others 2015, Stat Methods Med Res 24:224",
        note="Inverts the two-sided test. Where the kept odds ratios leave a hole, the span round it is given.",
    ),
    Method(
        key="conditional-exact",
        measure="odds_ratio",
        interval=_conditional_exact,
        title="Conditional exact (Cornfield, Fisher)",
        formula="Lower: P(A ≥ a | margins) = alpha/2; upper: P(A ≤ a | margins) = alpha/2; A noncentral hypergeometric",
        source="Cornfield 1956; Fisher 1935",
        note="Covers the true odds ratio at least as often as its level says, and usually more often, so it is wide.",
    ),
    Method(
        key="conditional-mid-p",
        measure="odds_ratio",
        interval=_conditional_mid_p,
        title="Conditional mid-P",
        formula=(
            "Lower: P(A > a | margins) + P(A = a | margins)/2 = alpha/2; "
            "upper: P(A < a | margins) + P(A = a | margins)/2 = alpha/2"
        ),
        source="Fagerland, Lydersen and Laake 2015, Stat Methods Med Res 24:224",
        note="Half of the observed table’s own probability in each tail: narrower than the exact interval.",
    ),
    Method(
        key="miettinen-nurminen",
        measure="odds_ratio",
        interval=odds.miettinen_nurminen,
        title="Miettinen–Nurminen score",
        formula=(
            "The psi at which (a − n1 P1)² (1/(n1 P1(1−P1)) + 1/(n2 P2(1−P2))) (N−1)/N is z²; "
            "P1, P2 keep n1 P1 + n2 P2 = m and have the odds ratio psi"
        ),
        source="Miettinen and Nurminen 1985, Stat Med 4:213",
        note=(
            "Cornfield’s without continuity correction, with the factor N/(N−1), so that it agrees with the (N−1) "
            "chi-square test. Asymptotic. The lower limit is 0 where a or d is 0, the upper infinite where b or c is 0."
        ),
    ),
    Method(
        key="woolf",
        measure="odds_ratio",
        interval=odds.woolf,
        title="Woolf logit",
        formula="(ad/bc) exp(∓ z √(1/a + 1/b + 1/c + 1/d))",
        source="Woolf 1955; at a count of 0 Gart 1966",
        note="With a count of 0 it does not exist: Gart’s takes its place, which adds 1/2 to all four counts.",
    ),
    Method(
        key="gart",
        measure="odds_ratio",
        interval=odds.gart,
        title="Gart adjusted logit",
        formula="Woolf’s interval with 1/2 added to each of a, b, c, d, centre included",
        source="Gart 1966",
        note="It is centred on the adjusted odds ratio and need not hold the observed one.",
    ),
)
