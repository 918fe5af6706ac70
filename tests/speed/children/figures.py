"""Timings of figures: ours and those of statsmodels and scipy, for the tables that the parent names.

numbers.py ours|libraries|conditional|scipy-conditional [events...]
"""

from __future__ import annotations

import json
import random
import statistics
import sys
import time
import warnings
from collections.abc import Callable

from fourcount.stats.results import Counts, Interval

Table = tuple[int, int, int, int]
LEVEL = 0.95


def tables(largest: int, count: int = 20) -> list[Table]:
    """Tables without zeros, to ``largest`` a cell: a library refuses too many of the others."""
    chance = random.Random(12)
    found = []
    for _ in range(count):
        top = chance.choice((30, 300, 3000, largest))
        found.append(tuple(chance.randint(1, top) for _ in range(4)))
    return found  # type: ignore[return-value]


def seconds(work: Callable[[Table], object], items: list[Table]) -> list[float]:
    """The time of each item, after one that warms up."""
    work((11, 17, 13, 19))
    times = []
    for item in items:
        start = time.perf_counter()
        work(item)
        times.append(time.perf_counter() - start)
    return times


def _counts(table: Table) -> Counts:
    return Counts(
        index_events=table[0],
        index_non_events=table[1],
        reference_events=table[2],
        reference_non_events=table[3],
    )


SHARED = {
    "risk": ("wilson", "clopper-pearson", "wald", "agresti-coull", "jeffreys"),
    "risk_difference": ("newcombe", "miettinen-nurminen", "agresti-caffo", "wald"),
    "risk_ratio": ("koopman", "miettinen-nurminen", "katz"),
    "odds_ratio": ("conditional-exact", "miettinen-nurminen", "woolf", "gart"),
}
"""The methods that statsmodels or scipy have too."""


def ours(table: Table, without_conditional: bool = False) -> None:
    """Estimates, the shared intervals and the shared tests of one table."""
    from fourcount.stats import estimates
    from fourcount.stats.conditional import conditional_odds_ratio
    from fourcount.stats.methods import METHODS, TESTS

    counts = _counts(table)
    a, b, c, d = table
    estimates.risk_difference(counts), estimates.risk_ratio(counts), estimates.odds_ratio(counts)
    for method in METHODS:
        if method.key not in SHARED[method.measure] or (without_conditional and method.key == "conditional-exact"):
            continue
        if method.measure == "risk":
            method.interval(a, a + b, LEVEL), method.interval(c, c + d, LEVEL)
        else:
            method.interval(counts, LEVEL)
    if not without_conditional:
        conditional_odds_ratio(counts)
    for test in TESTS:
        if test.key != "fisher-mid-p":
            test.p(counts)


def libraries(table: Table, without_conditional: bool = False) -> None:
    """The same by statsmodels and scipy; a refusal counts with the time that it took."""
    from scipy.stats import chi2, chi2_contingency, contingency, fisher_exact
    from statsmodels.stats.proportion import confint_proportions_2indep, proportion_confint

    a, b, c, d = table
    for method in ("wilson", "beta", "normal", "agresti_coull", "jeffreys"):
        for events, total in ((a, a + b), (c, c + d)):
            proportion_confint(events, total, method=method)
    calls = [
        ("diff", "newcomb", True), ("diff", "score", True), ("diff", "agresti-caffo", True), ("diff", "wald", True),
        ("ratio", "score", False), ("ratio", "score", True), ("ratio", "log", True),
        ("odds-ratio", "score", True), ("odds-ratio", "logit", True), ("odds-ratio", "logit-adjusted", True),
    ]  # fmt: skip
    for compare, method, correction in calls:
        try:
            confint_proportions_2indep(a, a + b, c, c + d, compare=compare, method=method, correction=correction)
        except ValueError:  # its root-finder finds no bracket
            continue
    if not without_conditional:
        contingency.odds_ratio([[a, b], [c, d]]).confidence_interval(LEVEL)
    fisher_exact([[a, b], [c, d]])
    statistic = chi2_contingency([[a, b], [c, d]], correction=False).statistic
    total = a + b + c + d
    chi2.sf(statistic * (total - 1) / total, 1)


def conditional(table: Table) -> tuple[float, float, float]:
    """The conditional odds ratio with its exact limits."""
    from fourcount.stats.conditional import conditional_exact, conditional_odds_ratio

    counts = _counts(table)
    interval, estimate = conditional_exact(counts, LEVEL), conditional_odds_ratio(counts)
    assert isinstance(interval, Interval)
    assert isinstance(estimate, float)
    return estimate, interval.low, interval.high


def scipy_conditional(table: Table) -> tuple[float, float, float]:
    from scipy.stats import contingency

    result = contingency.odds_ratio([[table[0], table[1]], [table[2], table[3]]])
    limits = result.confidence_interval(LEVEL)
    return float(result.statistic), float(limits.low), float(limits.high)


def near(table: Table, count: int = 15) -> list[Table]:
    """Tables of the same size, none twice, so that nothing remembered helps."""
    return [(table[0] + step, table[1] - step, table[2] - step, table[3] + step) for step in range(count)]


def main() -> None:
    warnings.simplefilter("ignore")
    what, *numbers = sys.argv[1:]
    if what in ("conditional", "scipy-conditional"):
        table: Table = tuple(int(number) for number in numbers)  # type: ignore[assignment]
        if what == "conditional":
            taken, figures = statistics.median(seconds(conditional, near(table))), conditional(table)
        else:
            scipy_conditional((11, 17, 13, 19))
            start = time.perf_counter()
            figures = scipy_conditional(table)
            taken = time.perf_counter() - start
        print(json.dumps({"seconds": taken, "figures": figures}))
        return
    largest, without = int(numbers[0]), numbers[1:] == ["without-conditional"]
    work = ours if what == "ours" else libraries
    print(json.dumps({"seconds": sum(seconds(lambda table: work(table, without), tables(largest)))}))


if __name__ == "__main__":
    main()
