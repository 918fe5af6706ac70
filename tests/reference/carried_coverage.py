"""Coverage of what is carried to a starting risk of other people, by simulation with a fixed seed.

    python tests/reference/carried_coverage.py

A study of two groups gives the effect with its interval, another sample of people the starting risk. The true
difference at the true starting risk is looked for in three ranges: the propagated one (the starting risk by its counts,
or by printed limits of Clopper and Pearson, Wald or the logit); the one at the estimated starting risk as if it were
certain, which covers far too seldom; and, to show where propagating is wrong, the propagated one with the study's own
reference group as the starting risk. A limit beyond 100% leaves its side open.

Hazard ratios are drawn from their asymptotic distribution, with the standard error 2/sqrt(events).
"""

from __future__ import annotations

import itertools
import math
from collections.abc import Callable, Iterable
from dataclasses import dataclass

import numpy as np

from fourcount.stats import difference, odds, ratio
from fourcount.stats.conversion import Effect, risk_with
from fourcount.stats.estimates import odds_ratio, risk_difference, risk_ratio
from fourcount.stats.normal import quantile
from fourcount.stats.propagation import Limits, Propagated, StartLimits, limits_as_typed, limits_of_counts, propagated
from fourcount.stats.results import Counts, Gap, Interval
from fourcount.stats.risk import clopper_pearson, logit, wald

SEED = 20_261_201
LEVEL = 0.95
Sized = tuple[int, int]


@dataclass(frozen=True, kw_only=True)
class Point:
    """A true effect, a study of ``people`` a group with a reference risk, and a starting risk seen in other people."""

    effect: Effect
    value: float
    reference_risk: float
    people: int
    start: float
    start_people: int

    @property
    def truth(self) -> float | Gap:
        with_ = risk_with(self.effect, self.value, self.start)
        return with_ if isinstance(with_, Gap) else with_ - self.start

    @property
    def index_risk(self) -> float | Gap:
        return risk_with(self.effect, self.value, self.reference_risk)


@dataclass(frozen=True, kw_only=True)
class Share:
    """How often each range holds the truth, and the share of samples that have no range of either limit."""

    held: float
    none: float


Estimated = tuple[float, Interval]
Study = Callable[[Point, int, int, np.random.Generator], Estimated | Gap]

_INTERVALS = {
    "risk_ratio": (risk_ratio, ratio.miettinen_nurminen),
    "odds_ratio": (odds_ratio, odds.miettinen_nurminen),
    "risk_difference": (risk_difference, difference.miettinen_nurminen),
}


def _of_counts(point: Point, index: int, reference: int, _: np.random.Generator) -> Estimated | Gap:
    counts = Counts(
        index_events=index,
        index_non_events=point.people - index,
        reference_events=reference,
        reference_non_events=point.people - reference,
    )
    estimate, method = _INTERVALS[point.effect]
    value, interval = estimate(counts), method(counts, LEVEL)
    if isinstance(value, Gap):
        return value
    return interval if isinstance(interval, Gap) else (value, interval)


def _hazard_ratio(point: Point, index: int, reference: int, random: np.random.Generator) -> Estimated | Gap:
    if index + reference == 0:
        return Gap("no-events")
    error = 2 / math.sqrt(index + reference)
    value = math.exp(math.log(point.value) + error * random.standard_normal())
    reach = math.exp(quantile(LEVEL) * error)
    return value, Interval(low=value / reach, high=value * reach)


def _counted(events: int, total: int) -> StartLimits | Gap:
    return limits_of_counts(events, total)


def _printed(method: Callable[[float, float, float], Interval | Gap]) -> Callable[[int, int], StartLimits | Gap]:
    """A starting risk of which a paper prints these limits; those that pass 0 or 100% are printed as 0 and 100%."""

    def typed(events: int, total: int) -> StartLimits | Gap:
        found = method(events, total, LEVEL)
        if isinstance(found, Gap):
            return found
        return limits_as_typed(events / total, max(found.low, 0.0), min(found.high, 1.0), LEVEL)

    return typed


def _certain(events: int, total: int) -> StartLimits | Gap:
    return StartLimits(value=events / total, below=math.inf, above=math.inf)


STARTS: dict[str, Callable[[int, int], StartLimits | Gap]] = {
    "counted": _counted,
    "printed, exact": _printed(clopper_pearson),
    "printed, Wald": _printed(wald),
    "printed, logit": _printed(logit),
    "as if certain": _certain,
}


def coverage(point: Point, start: str, draws: int, *, own: bool = False) -> Share:
    """How often the difference's range holds it; ``own`` starts from the study's own reference group."""
    random = np.random.default_rng(SEED)
    truth, index_risk = point.truth, point.index_risk
    assert isinstance(truth, float)
    assert isinstance(index_risk, float)
    indexes = random.binomial(point.people, index_risk, draws).tolist()
    references = random.binomial(point.people, point.reference_risk, draws).tolist()
    starts = random.binomial(point.start_people, point.start, draws).tolist()
    study = _hazard_ratio if point.effect == "hazard_ratio" else _of_counts
    held = none = 0
    for index, reference, other in zip(indexes, references, starts, strict=True):
        seen = (reference, point.people) if own else (other, point.start_people)
        limits = _difference(study(point, index, reference, random), STARTS[start](*seen), point.effect)
        if isinstance(limits, Gap):
            none += 1
        else:
            held += holds(limits, truth)
    return Share(held=held / (draws - none) if none < draws else math.nan, none=none / draws)


def _difference(estimated: Estimated | Gap, start: StartLimits | Gap, effect: Effect) -> Limits | Gap:
    if isinstance(estimated, Gap):
        return estimated
    if isinstance(start, Gap):
        return start
    found = propagated(effect, *estimated, LEVEL, start)
    return found.difference if isinstance(found, Propagated) else found


def holds(limits: Limits, value: float) -> bool:
    """Whether a value lies within the limits, a withheld one leaving its side open; to the last bits."""
    slack = 1e-12
    above = isinstance(limits.low, Gap) or limits.low <= value + slack
    return above and (isinstance(limits.high, Gap) or value - slack <= limits.high)


VALUES: dict[Effect, tuple[float, ...]] = {
    "risk_ratio": (0.5, 0.8, 1.5),
    "odds_ratio": (0.5, 0.8, 2.0),
    "hazard_ratio": (0.5, 0.8, 1.5),
    "risk_difference": (-0.04, 0.03),
}


def points(effect: Effect) -> list[Point]:
    """The grid of one effect; what would carry a risk past 0 or 100% is left out."""
    grid = [
        Point(
            effect=effect, value=value, reference_risk=risk, people=people, start=start, start_people=start_people
        )
        for value, risk, people, start, start_people in itertools.product(
            VALUES[effect], (0.1, 0.3), (100, 400), (0.05, 0.2, 0.5), (50, 200, 1000)
        )
    ]  # fmt: skip
    return [point for point in grid if isinstance(point.truth, float) and isinstance(point.index_risk, float)]


def row(label: str, shares: Iterable[Share]) -> str:
    found = list(shares)
    held = np.array([one.held for one in found])
    none = float(np.mean([one.none for one in found]))
    under = float(np.mean(held < 0.93))
    return (
        f"  {label:34} {len(found):4} points  mean {held.mean():.4f}  least {held.min():.4f}  most {held.max():.4f}  "
        f"< 93% {under:.1%}  none {none:.1%}"
    )


def main() -> None:
    draws = 1000
    print(f"Simulated coverage of a carried difference at {LEVEL:.0%}, {draws} samples a point, seed {SEED}")
    for effect in VALUES:
        grid = points(effect)
        for start in STARTS:
            print(row(f"{effect}, {start}", (coverage(point, start, draws) for point in grid)), flush=True)
    own = [Point(effect="risk_ratio", value=value, reference_risk=risk, people=people, start=risk, start_people=people)
           for value, risk, people in itertools.product((0.5, 0.8, 1.5), (0.1, 0.3, 0.5), (100, 400))]  # fmt: skip
    print(row("risk_ratio, own reference group", (coverage(point, "counted", draws, own=True) for point in own)))


if __name__ == "__main__":
    main()
