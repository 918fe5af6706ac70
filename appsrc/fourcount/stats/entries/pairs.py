"""The interval methods and tests of matched pairs; the exact ones load scipy when they are first called.

Tango 1998, Bonett and Price 2006, McNemar 1947 and both papers of Fagerland and others are cited from memory.
"""

from __future__ import annotations

from fourcount.stats import mcnemar, pair_contrasts, pairs
from fourcount.stats.entries.entry import Method, Test

PAIR_DIFFERENCE_METHODS = (
    Method(
        key="newcombe",
        measure="pair_difference",
        interval=pair_contrasts.newcombe_paired,
        title="Newcombe hybrid score for pairs",
        formula=(
            "Lower: D − √((p1−l1)² − 2φ(p1−l1)(u2−p2) + (u2−p2)²); upper: D + √((u1−p1)² − 2φ(u1−p1)(p2−l2) + "
            "(p2−l2)²); l, u are the Wilson limits of each side’s risk; φ = (eh − fg, less n/2 where positive but not "
            "below 0) / √((e+f)(g+h)(e+g)(f+h))"
        ),
        source="Newcombe 1998, Stat Med 17:2635, method 10",
        note="Built from the two Wilson intervals and how often the sides agree. It stays within −100 to 100 points.",
    ),
    Method(
        key="tango",
        measure="pair_difference",
        interval=pair_contrasts.tango,
        title="Tango score",
        formula=(
            "The D0 at which (f − g − nD0) / √(n(2q + D0(1 − D0))) is z (lower) and −z (upper); "
            "q is the likeliest share of pairs with the event on the reference side only"
        ),
        source="Tango 1998, Stat Med 17:891",
        note="Agrees with McNemar’s asymptotic test about no effect. Asymptotic.",
    ),
    Method(
        key="wald",
        measure="pair_difference",
        interval=pair_contrasts.wald_paired,
        title="Wald for pairs",
        formula="D ∓ z √(f + g − (f − g)²/n) / n",
        source="Common practice; Newcombe 1998, Stat Med 17:2635, method 1",
        note=(
            "Can pass −100 or 100 points. Where all pairs agree, or all disagree the same way, its width would be "
            "zero, so none is given."
        ),
    ),
)

PAIR_RATIO_METHODS = (
    Method(
        key="bonett-price",
        measure="pair_ratio",
        interval=pair_contrasts.bonett_price,
        title="Bonett–Price hybrid score",
        formula=(
            "Lower l1/u2, upper u1/l2: Wilson limits of (e+f) and (e+g) of m = e+f+g with z A/(B + C) for z; "
            "A = √((f+g+2)/((e+f+1)(e+g+1))), B = √((g+1)/((m+2)(e+f+1))), C = √((f+1)/((m+2)(e+g+1)))"
        ),
        source="Bonett and Price 2006, Stat Med 25:3039",
        note=(
            "The pairs without any event do not matter. The lower limit is 0 with no event on the index side, the "
            "upper infinite with none on the reference side."
        ),
    ),
    Method(
        key="log",
        measure="pair_ratio",
        interval=pair_contrasts.wald_log_paired_ratio,
        title="Log for pairs",
        formula="R exp(∓ z √((f + g) / ((e + f)(e + g))))",
        source="Common practice; Fagerland, Lydersen and Laake 2014, Stat Med 33:2850",
        note=(
            "Does not exist where a side has no event. Where all pairs agree its width would be zero, so none is given."
        ),
    ),
)

PAIR_ODDS_RATIO_METHODS = (
    Method(
        key="conditional-exact",
        measure="pair_odds_ratio",
        interval=pairs.exact_discordant,
        title="Conditional exact for pairs",
        formula="The Clopper–Pearson limits P of f among f + g, each as P/(1 − P)",
        source="Breslow and Day 1980; Clopper and Pearson 1934, Biometrika 26:404",
        note=(
            "From the discordant pairs alone. Covers the true odds ratio at least as often as its level says, and "
            "usually more often, so it is wide."
        ),
    ),
    Method(
        key="conditional-mid-p",
        measure="pair_odds_ratio",
        interval=pairs.mid_p_discordant,
        title="Conditional mid-P for pairs",
        formula="The binomial mid-P limits P of f among f + g, each as P/(1 − P)",
        source="Fagerland, Lydersen and Laake 2014, Stat Med 33:2850",
        note="From the discordant pairs alone. Agrees with McNemar’s mid-P test about no effect.",
    ),
    Method(
        key="log",
        measure="pair_odds_ratio",
        interval=pairs.log_discordant,
        title="Log for discordant pairs",
        formula="f/g exp(∓ z √(1/f + 1/g))",
        source="Common practice; Breslow and Day 1980",
        note="From the discordant pairs alone. Does not exist where f or g is 0.",
    ),
)

PAIR_METHODS = PAIR_DIFFERENCE_METHODS + PAIR_RATIO_METHODS + PAIR_ODDS_RATIO_METHODS

PAIR_TESTS = (
    Test(
        key="mcnemar-exact",
        title="McNemar exact",
        formula="2 P(X ≤ the smaller of f and g), at most 1; X binomial of f + g at 1/2",
        source="McNemar 1947; Fagerland, Lydersen and Laake 2013, BMC Med Res Methodol 13:91",
        note="Agrees with the conditional exact interval about no effect. Never too small, and usually too large.",
        p=mcnemar.mcnemar_exact,
    ),
    Test(
        key="mcnemar-mid-p",
        title="McNemar mid-P",
        formula="The exact p less P(X = f); where f = g, 1 − P(X = f)/2",
        source="Fagerland, Lydersen and Laake 2013, BMC Med Res Methodol 13:91",
        note="Agrees with the conditional mid-P interval about no effect.",
        p=mcnemar.mcnemar_mid_p,
    ),
    Test(
        key="mcnemar",
        title="McNemar chi-square",
        formula="(f − g)² / (f + g), one degree of freedom, no continuity correction",
        source="McNemar 1947, Psychometrika 12:153",
        note="Agrees with Tango’s interval about no effect. Where all pairs agree there is nothing to test.",
        p=mcnemar.mcnemar,
    ),
    Test(
        key="mcnemar-corrected",
        title="McNemar chi-square with continuity correction",
        formula="(|f − g| − 1)² / (f + g), 0 where f = g; one degree of freedom",
        source="Edwards 1948; Fagerland, Lydersen and Laake 2013, BMC Med Res Methodol 13:91",
        note="Usually even larger than the exact p. Given since papers print it.",
        p=mcnemar.mcnemar_corrected,
    ),
)
