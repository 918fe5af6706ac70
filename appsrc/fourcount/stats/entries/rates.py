"""The interval methods and tests of person-time rates; the exact ones load scipy when they are first called.

All sources here but Wilson and Clopper and Pearson are cited from memory.
"""

from __future__ import annotations

from fourcount.stats import one_rate, rates
from fourcount.stats.entries.entry import Method, Test

ONE_RATE_METHODS = (
    Method(
        key="exact",
        measure="rate",
        interval=one_rate.exact,
        title="Poisson exact (Garwood)",
        formula="Lower: P(X ≥ x) = alpha/2; upper: P(X ≤ x) = alpha/2; X Poisson with the mean rate × t",
        source="Garwood 1936, Biometrika 28:437",
        note="Covers the true rate at least as often as its level says, and usually more often, so it is wide.",
    ),
    Method(
        key="mid-p",
        measure="rate",
        interval=one_rate.mid_p,
        title="Poisson mid-P",
        formula="Lower: P(X > x) + P(X = x)/2 = alpha/2; upper: P(X < x) + P(X = x)/2 = alpha/2; X Poisson",
        source="Cohen and Yang 1994, Stat Med 13:2189",
        note="Half of the observed count’s own probability in each tail: narrower than the exact interval.",
    ),
    Method(
        key="score",
        measure="rate",
        interval=one_rate.score,
        title="Score for a count",
        formula="(x + z²/2 ∓ z √(x + z²/4)) / t",
        source="Common practice; Rao 1948",
        note="Holds the rates that a two-sided z test would keep, also at no events.",
    ),
    Method(
        key="wald",
        measure="rate",
        interval=one_rate.wald,
        title="Wald for a count",
        formula="(x ∓ z √x) / t",
        source="Common practice; Rothman, Greenland and Lash 2008",
        note="Can fall below 0 and is given as it is. At no events its width would be zero, so none is given.",
    ),
)

RATE_DIFFERENCE_METHODS = (
    Method(
        key="miettinen-nurminen",
        measure="rate_difference",
        interval=rates.miettinen_nurminen_difference,
        title="Miettinen–Nurminen score for rates",
        formula=(
            "The D0 at which (x1/t1 − x2/t2 − D0) / √(R1/t1 + R2/t2) is z (lower) and −z (upper); "
            "R1, R2 are the likeliest rates with R1 − R2 = D0"
        ),
        source="Miettinen and Nurminen 1985, Stat Med 4:213",
        note="Agrees with the score test of equal rates about no effect. Asymptotic; it stands also at no events.",
    ),
    Method(
        key="wald",
        measure="rate_difference",
        interval=rates.wald_difference,
        title="Wald for rates",
        formula="D ∓ z √(x1/t1² + x2/t2²)",
        source="Common practice; Rothman, Greenland and Lash 2008",
        note="Without any event its width would be zero, so none is given.",
    ),
)

RATE_RATIO_METHODS = (
    Method(
        key="exact",
        measure="rate_ratio",
        interval=rates.exact_ratio,
        title="Conditional exact for rates",
        formula="The Clopper–Pearson limits P of x1 among x1 + x2, each as P/(1 − P) × t2/t1",
        source="Przyborowski and Wilenski 1940, Biometrika 31:313; Clopper and Pearson 1934, Biometrika 26:404",
        note="Covers the true ratio at least as often as its level says, and usually more often, so it is wide.",
    ),
    Method(
        key="mid-p",
        measure="rate_ratio",
        interval=rates.mid_p_ratio,
        title="Conditional mid-P for rates",
        formula="The binomial mid-P limits P of x1 among x1 + x2, each as P/(1 − P) × t2/t1",
        source="Rothman, Greenland and Lash 2008",
        note="Agrees with the binomial mid-P test about no effect. Narrower than the exact interval.",
    ),
    Method(
        key="score",
        measure="rate_ratio",
        interval=rates.score_ratio,
        title="Conditional score for rates",
        formula="The Wilson limits P of x1 among x1 + x2, each as P/(1 − P) × t2/t1",
        source="Wilson 1927, J Am Stat Assoc 22:209; Graham, Mengersen and Morton 2003, Stat Med 22:2071",
        note=(
            "Agrees with the score test of equal rates about no effect. The lower limit is 0 with no index event, the "
            "upper infinite with no reference event."
        ),
    ),
    Method(
        key="log",
        measure="rate_ratio",
        interval=rates.log_ratio,
        title="Log for rates",
        formula="R exp(∓ z √(1/x1 + 1/x2))",
        source="Common practice; Rothman, Greenland and Lash 2008",
        note="Does not exist where a group has no event.",
    ),
)

RATE_METHODS = ONE_RATE_METHODS + RATE_DIFFERENCE_METHODS + RATE_RATIO_METHODS

RATE_TESTS = (
    Test(
        key="binomial-exact",
        title="Conditional binomial exact",
        formula="Twice the smaller of P(X ≤ x1) and P(X ≥ x1), at most 1; X binomial of x1 + x2 at t1/(t1 + t2)",
        source="Przyborowski and Wilenski 1940, Biometrika 31:313",
        note=(
            "Agrees with the conditional exact interval about no effect. Adding up all splits no likelier than the "
            "observed one, as some do, gives another p."
        ),
        p=rates.binomial_exact,
    ),
    Test(
        key="binomial-mid-p",
        title="Conditional binomial mid-P",
        formula="The same with P(X = x1)/2 taken off each tail",
        source="Rothman, Greenland and Lash 2008",
        note="Agrees with the conditional mid-P interval about no effect.",
        p=rates.binomial_mid_p,
    ),
    Test(
        key="rate-score",
        title="Score test of equal rates",
        formula="(x1 t2 − x2 t1)² / ((x1 + x2) t1 t2), one degree of freedom",
        source="Common practice; Rothman, Greenland and Lash 2008",
        note="Agrees with the score intervals of the rate difference and the rate ratio about no effect.",
        p=rates.rate_score,
    ),
)
