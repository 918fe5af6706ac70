"""Entries of the methods that are only recognised in print. They stand in no list that is shown as ours."""

from __future__ import annotations

from fourcount.stats import difference, odds, print_only, ratio
from fourcount.stats.entries.entry import Method, Test

PRINT_METHODS: tuple[Method, ...] = (
    Method(
        key="wald-continuity",
        measure="risk",
        interval=print_only.risk_wald_continuity,
        title="Wald with continuity correction",
        formula="p ∓ (z √(p(1−p)/n) + 1/(2n))",
        source="Newcombe 1998, Stat Med 17:857, method 2",
        note="Recognised in print only.",
    ),
    Method(
        key="wald-continuity",
        measure="risk_difference",
        interval=print_only.wald_continuity,
        title="Wald with continuity correction",
        formula="D ∓ (z √(p1(1−p1)/n1 + p2(1−p2)/n2) + (1/n1 + 1/n2)/2)",
        source="Common practice; Newcombe 1998, Stat Med 17:873, method 2",
        note="Recognised in print only.",
    ),
    Method(
        key="mee",
        measure="risk_difference",
        interval=difference.mee,
        title="Mee score",
        formula="Miettinen and Nurminen’s interval without the factor N/(N−1)",
        source="Mee 1984; Newcombe 1998, Stat Med 17:873, method 5",
        note="Recognised in print only.",
    ),
    Method(
        key="newcombe-continuity",
        measure="risk_difference",
        interval=difference.newcombe_continuity,
        title="Newcombe hybrid score with continuity correction",
        formula="Newcombe’s interval from Wilson limits with a correction for continuity",
        source="Newcombe 1998, Stat Med 17:873, method 11",
        note="Recognised in print only.",
    ),
    Method(
        key="walter",
        measure="risk_ratio",
        interval=ratio.walter,
        title="Walter adjusted log",
        formula="Katz’s interval with 1/2 added to the events and to the people of each group, centre included",
        source="Walter 1975",
        note="Recognised in print only, where no count is 0.",
    ),
    Method(
        key="test-based",
        measure="risk_ratio",
        interval=print_only.test_based_risk_ratio,
        title="Test-based",
        formula="R to the power of 1 ∓ z/χ, χ² being the (N−1) chi-square",
        source="Miettinen 1976 (from memory)",
        note="Recognised in print only; right near no effect alone.",
    ),
    Method(
        key="cornfield",
        measure="odds_ratio",
        interval=odds.cornfield,
        title="Cornfield score",
        formula="Miettinen and Nurminen’s interval without the factor N/(N−1)",
        source="Cornfield 1956, without correction for continuity",
        note="Recognised in print only.",
    ),
    Method(
        key="test-based",
        measure="odds_ratio",
        interval=print_only.test_based_odds_ratio,
        title="Test-based",
        formula="OR to the power of 1 ∓ z/χ, χ² being the (N−1) chi-square",
        source="Miettinen 1976 (from memory)",
        note="Recognised in print only; right near no effect alone.",
    ),
)

PRINT_TESTS: tuple[Test, ...] = (
    Test(
        key="yates",
        title="Yates’s corrected chi-square",
        formula="N(|ad − bc| − N/2)² / (n1 n2 m (N−m)), one degree of freedom",
        source="Yates 1934, Suppl J R Stat Soc 1:217 (from memory)",
        note="Recognised in print only.",
        p=print_only.yates,
    ),
    Test(
        key="likelihood-ratio",
        title="Likelihood ratio chi-square",
        formula="2 Σ count ln(count/expected), one degree of freedom",
        source="Common practice",
        note="Recognised in print only.",
        p=print_only.likelihood_ratio,
    ),
    Test(
        key="log-odds-ratio",
        title="Wald test of the log odds ratio",
        formula="ln(ad/bc) / √(1/a + 1/b + 1/c + 1/d)",
        source="Common practice; logistic regression prints it",
        note="Recognised in print only.",
        p=print_only.log_odds_ratio_z,
    ),
    Test(
        key="log-risk-ratio",
        title="Wald test of the log risk ratio",
        formula="ln R / √(1/a − 1/n1 + 1/c − 1/n2)",
        source="Common practice",
        note="Recognised in print only.",
        p=print_only.log_risk_ratio_z,
    ),
)
