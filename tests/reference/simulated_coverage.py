"""Coverage that cannot be enumerated, by simulation with a fixed seed.

    python tests/reference/simulated_coverage.py

The population fraction: people drawn without regard to exposure and outcome (and, beside it, groups of fixed size). A
sample for which no fraction is given, because its ratio is below 1 or its unexposed had no event, counts neither way;
its share is the column "none". Where the true ratio is near 1 that leaves the larger ratios, and coverage with it.

Cluster trials: the risk of each cluster is drawn from a beta distribution with the intracluster correlation, the events
in it are binomial, and the difference's interval is taken from the plain counts and from the counts divided by the
design effect.
"""

from __future__ import annotations

import itertools
import math
from collections.abc import Iterable
from dataclasses import dataclass

import numpy as np

from fourcount.stats.attributable import population_fraction_interval
from fourcount.stats.clusters import design_effect, effective
from fourcount.stats.difference import miettinen_nurminen
from fourcount.stats.results import Counts, FractionalCounts, Gap, Interval

SEED = 20_260_801
LEVEL = 0.95


@dataclass(frozen=True, kw_only=True)
class Population:
    """People of whom ``exposed`` are exposed, with the risk ratio ``ratio`` to those who are not."""

    people: int
    exposed: float
    reference_risk: float
    ratio: float

    @property
    def fraction(self) -> float:
        excess = self.exposed * (self.ratio - 1)
        return excess / (1 + excess)

    def samples(self, draws: int, random: np.random.Generator, *, fixed: bool) -> Iterable[Counts]:
        """Tables of the whole sample; ``fixed`` gives both groups the size that is expected of them."""
        index_total = np.full(draws, round(self.people * self.exposed))
        if not fixed:
            index_total = random.binomial(self.people, self.exposed, draws)
        index = random.binomial(index_total, self.reference_risk * self.ratio)
        reference = random.binomial(self.people - index_total, self.reference_risk)
        for a, n1, c in zip(index.tolist(), index_total.tolist(), reference.tolist(), strict=True):
            yield _counts(a, n1, c, self.people - n1)


@dataclass(frozen=True, kw_only=True)
class ClusterTrial:
    """Two groups of ``clusters`` clusters of ``size`` people."""

    clusters: int
    size: int
    icc: float
    risks: tuple[float, float]

    def samples(self, draws: int, random: np.random.Generator) -> Iterable[Counts]:
        spread = 1 / self.icc - 1
        people = self.clusters * self.size
        events = [
            random.binomial(self.size, random.beta(risk * spread, (1 - risk) * spread, (draws, self.clusters))).sum(1)
            for risk in self.risks
        ]
        for a, c in zip(events[0].tolist(), events[1].tolist(), strict=True):
            yield _counts(a, people, c, people)


@dataclass(frozen=True, kw_only=True)
class Share:
    """The share of intervals that hold the truth, and of samples without one."""

    held: float
    none: float


def _counts(index: int, index_total: int, reference: int, reference_total: int) -> Counts:
    return Counts(
        index_events=index,
        index_non_events=index_total - index,
        reference_events=reference,
        reference_non_events=reference_total - reference,
    )


def share(intervals: Iterable[Interval | Gap], truth: float) -> Share:
    found = list(intervals)
    given = [interval for interval in found if isinstance(interval, Interval)]
    held = sum(interval.low <= truth <= interval.high for interval in given)
    return Share(held=held / len(given) if given else math.nan, none=1 - len(given) / len(found))


def of_population(population: Population, draws: int, *, fixed: bool = False) -> Share:
    """How often the population fraction's interval holds it."""
    random = np.random.default_rng(SEED)
    tables = population.samples(draws, random, fixed=fixed)
    return share((population_fraction_interval(table, LEVEL) for table in tables), population.fraction)


def of_clusters(trial: ClusterTrial, draws: int) -> tuple[Share, Share]:
    """How often the difference's interval holds it, from plain counts and from those divided by the design effect."""
    effect = design_effect(trial.size, trial.icc)
    assert isinstance(effect, float)
    truth = trial.risks[0] - trial.risks[1]
    tables = list(trial.samples(draws, np.random.default_rng(SEED)))
    divided: list[FractionalCounts] = [effective(table, effect) for table in tables]
    return (
        share((miettinen_nurminen(table, LEVEL) for table in tables), truth),
        share((miettinen_nurminen(table, LEVEL) for table in divided), truth),
    )


POPULATIONS = [
    Population(people=people, exposed=exposed, reference_risk=risk, ratio=ratio)
    for people, exposed, risk, ratio in itertools.product(
        (200, 1000, 5000), (0.1, 0.3, 0.6), (0.02, 0.1, 0.3), (1.2, 1.5, 2.0, 3.0)
    )
]
TRIALS = [
    ClusterTrial(clusters=20, size=25, icc=0.05, risks=(0.2, 0.2)),
    ClusterTrial(clusters=20, size=25, icc=0.05, risks=(0.1, 0.2)),
    ClusterTrial(clusters=10, size=50, icc=0.02, risks=(0.3, 0.3)),
    ClusterTrial(clusters=6, size=100, icc=0.1, risks=(0.2, 0.3)),
]


def rows(fixed: bool, draws: int) -> Iterable[str]:
    """All populations together, then those that show where the interval is weak."""
    found = [(point, of_population(point, draws, fixed=fixed)) for point in POPULATIONS]
    groups = {
        "all points": found,
        "none under 1%": [pair for pair in found if pair[1].none < 0.01],
        "200 people": [pair for pair in found if pair[0].people == 200],
        "ratio 1.2": [pair for pair in found if pair[0].ratio == 1.2],
    }
    for label, pairs in groups.items():
        held = [one.held for _, one in pairs]
        none = float(np.mean([one.none for _, one in pairs]))
        yield (
            f"  {label:16} {len(held):4} points  mean {np.mean(held):.4f}  least {min(held):.4f}  "
            f"most {max(held):.4f}  none {none:.1%}"
        )


def main() -> None:
    draws = 10_000
    print(f"Simulated coverage at {LEVEL:.0%}, {draws} samples a point, seed {SEED}")
    for fixed, label in ((False, "people drawn at random"), (True, "groups of fixed size")):
        print(f"population fraction, {label}")
        print("\n".join(rows(fixed, draws)))
    print("cluster trials: the difference, from plain counts and from counts divided by the design effect")
    for trial in TRIALS:
        plain, divided = of_clusters(trial, draws)
        print(f"  {trial}: {plain.held:.4f}, {divided.held:.4f}")


if __name__ == "__main__":
    main()
