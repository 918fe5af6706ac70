"""Strata pooled, tested, and set beside the crude figures."""

from __future__ import annotations

from collections.abc import Callable, Mapping, Sequence

from fourcount.appraisal.findings import POOLED_MEASURES, Counts, Figure, Gap, Homogeneity, Interval, Probability
from fourcount.appraisal.gating import Support
from fourcount.stats import strata as stats
from fourcount.stats.methods import homogeneity_test, method, test

POOLED_METHODS = {
    "pooled_risk_difference": "sato",
    "pooled_risk_ratio": "greenland-robins",
    "pooled_odds_ratio": "robins-breslow-greenland",
}
"""The method of each pooled measure, the same in every family: all are asymptotic."""

TEST = "cmh"
HOMOGENEITY = "breslow-day-tarone"
A_TENTH = 0.1

_ESTIMATES: dict[str, Callable[[Sequence[Counts]], float | Gap]] = {
    "pooled_risk_difference": stats.pooled_risk_difference,
    "pooled_risk_ratio": stats.pooled_risk_ratio,
    "pooled_odds_ratio": stats.pooled_odds_ratio,
}


def pooled_figures(
    strata: Sequence[Counts], level: float, support: Support, *, without: object = None
) -> dict[str, Figure | Gap]:
    """The Mantel-Haenszel measures that the design supports; ``without`` is the reason for no intervals, if any."""
    return {key: _pooled(key, strata, level, support, without) for key in POOLED_MEASURES}


def _pooled(key: str, strata: Sequence[Counts], level: float, support: Support, without: object) -> Figure | Gap:
    crude = key.removeprefix("pooled_")
    if crude in support.withheld:
        return Gap(support.withheld[crude])
    name = POOLED_METHODS[key]
    estimate = _ESTIMATES[key](strata)
    interval: Interval | Gap
    interval = without if isinstance(without, Gap) else method(key, name).interval(strata, level)
    if isinstance(estimate, Gap) and isinstance(interval, Gap):
        return estimate
    return Figure(estimate=estimate, interval=interval, method=name)


def cmh(strata: Sequence[Counts], *, without: object = None) -> Probability:
    """The p of no association within the strata."""
    return Probability(p=without if isinstance(without, Gap) else test(TEST).p(strata), method=TEST)


def homogeneity(strata: Sequence[Counts], *, without: object = None) -> Homogeneity | Gap:
    """Whether one odds ratio may hold in all strata, by Breslow and Day's test with Tarone's correction."""
    if isinstance(without, Gap):
        return without
    found = homogeneity_test(HOMOGENEITY).test(strata)
    if isinstance(found, Gap):
        return found
    return Homogeneity(method=HOMOGENEITY, chi_square=found.chi_square, degrees=found.degrees, p=found.p)


def parting(crude: Mapping[str, Figure], pooled: Mapping[str, Figure | Gap]) -> tuple[str, ...]:
    """The pooled measures from which the crude ones differ by more than a tenth, or that point the other way."""
    parted = []
    for key in POOLED_MEASURES:
        together, apart = pooled[key], crude.get(key.removeprefix("pooled_"))
        if isinstance(together, Gap) or apart is None:
            continue
        if isinstance(together.estimate, Gap) or isinstance(apart.estimate, Gap):
            continue
        parts = _differences_part if key == "pooled_risk_difference" else _ratios_part
        if parts(apart.estimate, together.estimate):
            parted.append(key)
    return tuple(parted)


def _differences_part(crude: float, pooled: float) -> bool:
    return abs(crude - pooled) > A_TENTH * abs(pooled) or crude * pooled < 0


def _ratios_part(crude: float, pooled: float) -> bool:
    """By how much the larger exceeds the smaller, so that turning the groups changes nothing."""
    if crude == pooled:
        return False
    return max(crude, pooled) > (1 + A_TENTH) * min(crude, pooled) or (crude - 1) * (pooled - 1) < 0
