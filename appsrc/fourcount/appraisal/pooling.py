"""Strata pooled, tested, and set beside the crude figures."""

from __future__ import annotations

from collections.abc import Callable, Mapping, Sequence

from fourcount.appraisal.findings import (
    POOLED_MEASURES,
    Counts,
    Figure,
    Gap,
    Homogeneity,
    Interaction,
    Interval,
    Probability,
)
from fourcount.appraisal.gating import Support
from fourcount.stats import estimates, interaction
from fourcount.stats import strata as stats
from fourcount.stats.interaction import Estimate
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

INTERACTION = "interaction"
"""The key of its entry among the calculations."""

SET_AGAINST_EACH_OTHER = 2  # more strata than this have no one ratio between them

_AGAINST: dict[str, tuple[str, Callable[[Counts], float | Gap], Callable[..., interaction.Interaction | Gap]]] = {
    "pooled_risk_difference": ("wald", estimates.risk_difference, interaction.difference_of_differences),
    "pooled_risk_ratio": ("katz", estimates.risk_ratio, interaction.ratio_of_ratios),
    "pooled_odds_ratio": ("woolf", estimates.odds_ratio, interaction.ratio_of_ratios),
}
"""The textbook interval of each stratum, in every family: it reaches equally far both ways and so tells an error."""

_ESTIMATES: dict[str, Callable[[Sequence[Counts]], float | Gap]] = {
    "pooled_risk_difference": stats.pooled_risk_difference,
    "pooled_risk_ratio": stats.pooled_risk_ratio,
    "pooled_odds_ratio": stats.pooled_odds_ratio,
}


def pooled_figures(
    strata: Sequence[Counts], level: float, support: Support, *, without: Gap | None = None
) -> dict[str, Figure | Gap]:
    """The Mantel-Haenszel measures that the design supports; ``without`` is the reason for no intervals, if any."""
    return {key: _pooled(key, strata, level, support, without) for key in POOLED_MEASURES}


def _pooled(key: str, strata: Sequence[Counts], level: float, support: Support, without: Gap | None) -> Figure | Gap:
    crude = key.removeprefix("pooled_")
    if crude in support.withheld:
        return Gap(support.withheld[crude])
    name = POOLED_METHODS[key]
    estimate = _ESTIMATES[key](strata)
    interval: Interval | Gap
    interval = method(key, name).interval(strata, level) if without is None else without
    if isinstance(estimate, Gap) and isinstance(interval, Gap):
        return estimate
    return Figure(estimate=estimate, interval=interval, method=name)


def cmh(strata: Sequence[Counts], *, without: Gap | None = None) -> Probability:
    """The p of no association within the strata."""
    return Probability(p=test(TEST).p(strata) if without is None else without, method=TEST)


def homogeneity(strata: Sequence[Counts], *, without: Gap | None = None) -> Homogeneity | Gap:
    """Whether one odds ratio may hold in all strata, by Breslow and Day's test with Tarone's correction."""
    if without is not None:
        return without
    found = homogeneity_test(HOMOGENEITY).test(strata)
    if isinstance(found, Gap):
        return found
    return Homogeneity(method=HOMOGENEITY, chi_square=found.chi_square, degrees=found.degrees, p=found.p)


def interactions(
    strata: Sequence[Counts], level: float, support: Support, *, without: Gap | None = None
) -> dict[str, Interaction | Gap]:
    """The first of two strata against the second, measure by measure; nothing of one stratum, or of more than two."""
    if len(strata) != SET_AGAINST_EACH_OTHER:
        return {}
    return {
        key: _interaction(key, strata, level) if without is None else without
        for key in POOLED_MEASURES
        if key.removeprefix("pooled_") not in support.withheld
    }


def _interaction(key: str, strata: Sequence[Counts], level: float) -> Interaction | Gap:
    name, estimate, against = _AGAINST[key]
    compute = method(key.removeprefix("pooled_"), name).interval
    effects: list[Estimate] = []
    for counts in strata:
        effect, interval = estimate(counts), compute(counts, level)
        if isinstance(effect, Gap):
            return effect
        if isinstance(interval, Gap):
            return interval
        effects.append((effect, interval.low, interval.high))
    found = against(effects[0], effects[1], level)
    if isinstance(found, Gap):
        return found
    interval = Interval(low=found.low, high=found.high)
    return Interaction(figure=Figure(estimate=found.estimate, interval=interval, method=INTERACTION), p=found.p)


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
