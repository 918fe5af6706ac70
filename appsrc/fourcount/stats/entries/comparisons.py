"""The interval methods of the risk difference and the risk ratio."""

from __future__ import annotations

from fourcount.stats import difference, ratio
from fourcount.stats.entries.entry import Method

DIFFERENCE_METHODS = (
    Method(
        key="newcombe",
        measure="risk_difference",
        interval=difference.newcombe,
        title="Newcombe hybrid score",
        formula=(
            "Lower: D − √((p1−l1)² + (u2−p2)²); upper: D + √((u1−p1)² + (p2−l2)²); "
            "l, u are the Wilson limits of each risk"
        ),
        source="Newcombe 1998, Stat Med 17:873, method 10",
        note="Built from the two Wilson intervals.",
    ),
    Method(
        key="miettinen-nurminen",
        measure="risk_difference",
        interval=difference.miettinen_nurminen,
        title="Miettinen–Nurminen score",
        formula=(
            "The D0 at which (p1 − p2 − D0) / √((P1(1−P1)/n1 + P2(1−P2)/n2) N/(N−1)) is z (lower) and −z (upper); "
            "P1, P2 are the likeliest risks with P1 − P2 = D0"
        ),
        source="Miettinen and Nurminen 1985, Stat Med 4:213; Newcombe 1998, Stat Med 17:873, method 6",
        note="With the factor N/(N−1), so that it agrees with the (N−1) chi-square test. Asymptotic.",
    ),
    Method(
        key="agresti-caffo",
        measure="risk_difference",
        interval=difference.agresti_caffo,
        title="Agresti–Caffo",
        formula="Wald’s interval with 1 added to each of a, b, c, d",
        source="Agresti and Caffo 2000, Am Stat 54:280",
        note="Can pass −100 or 100 points and is given as it is. It need not hold the observed difference.",
    ),
    Method(
        key="wald",
        measure="risk_difference",
        interval=difference.wald,
        title="Wald",
        formula="D ∓ z √(p1(1−p1)/n1 + p2(1−p2)/n2)",
        source="Common practice; Newcombe 1998, Stat Med 17:873, method 1",
        note="Can pass −100 or 100 points. Where both risks are 0 or 100% its width would be zero, so none is given.",
    ),
)

RATIO_METHODS = (
    Method(
        key="koopman",
        measure="risk_ratio",
        interval=ratio.koopman,
        title="Koopman score",
        formula=(
            "The R0 at which (p1 − R0 p2)² / (P1(1−P1)/n1 + R0² P2(1−P2)/n2) is z²; "
            "P1, P2 are the likeliest risks with P1 = R0 P2"
        ),
        source="Koopman 1984, Biometrics 40:513; Gart and Nam 1988, Biometrics 44:323",
        note=(
            "Without the factor N/(N−1). The lower limit is 0 with no index event, the upper infinite with no "
            "reference event."
        ),
    ),
    Method(
        key="miettinen-nurminen",
        measure="risk_ratio",
        interval=ratio.miettinen_nurminen,
        title="Miettinen–Nurminen score",
        formula=(
            "The R0 at which (p1 − R0 p2)² / ((P1(1−P1)/n1 + R0² P2(1−P2)/n2) N/(N−1)) is z²; "
            "P1, P2 are the likeliest risks with P1 = R0 P2"
        ),
        source="Miettinen and Nurminen 1985, Stat Med 4:213",
        note=(
            "Koopman’s with the factor N/(N−1), so that it agrees with the (N−1) chi-square test. Asymptotic. "
            "The lower limit is 0 with no index event, the upper infinite with no reference event."
        ),
    ),
    Method(
        key="katz",
        measure="risk_ratio",
        interval=ratio.katz,
        title="Katz log",
        formula="R exp(∓ z √(1/a − 1/n1 + 1/c − 1/n2))",
        source="Katz, Baptista, Azen and Pike 1978, Biometrics 34:469; at 0 events Walter 1975",
        note=(
            "With 0 events in a group it does not exist: Walter’s takes its place, which adds 1/2 to the events and to "
            "the people of each group. Where everybody had the event its width would be zero, so none is given."
        ),
    ),
)
