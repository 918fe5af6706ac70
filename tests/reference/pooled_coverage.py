"""Real coverage of the pooled intervals and real error of the tests of strata, by simulation.

    python tests/reference/pooled_coverage.py            5,000 sets of strata for each row
    python tests/reference/pooled_coverage.py --sets 500

Each stratum's reference risk is drawn between the bounds of its design; the index risk has the same effect in every
stratum (odds ratio, risk ratio or difference). A set for which a method gives no interval counts neither way; its
share is the column "none". The tests' columns are how often p falls below 0.05 where nothing is to be found: no effect
for Cochran-Mantel-Haenszel, one odds ratio for Breslow and Day.
"""

from __future__ import annotations

import argparse
from collections.abc import Callable, Iterator, Sequence
from dataclasses import dataclass

import numpy as np

from fourcount.stats import homogeneity
from fourcount.stats import strata as pooled
from fourcount.stats.results import Counts, Gap, HomogeneityTest, Interval

LEVEL = 0.95
SEED = 20_260


@dataclass(frozen=True, kw_only=True)
class Design:
    """How many strata, how many people in each of its two groups, and the range of the reference risk."""

    title: str
    strata: int
    index: int
    reference: int
    risks: tuple[float, float]


DESIGNS = (
    Design(title="3 strata of 100 v 100", strata=3, index=100, reference=100, risks=(0.1, 0.4)),
    Design(title="3 strata of 20 v 20", strata=3, index=20, reference=20, risks=(0.1, 0.4)),
    Design(title="3 strata of 100 v 20", strata=3, index=100, reference=20, risks=(0.1, 0.4)),
    Design(title="20 strata of 5 v 5", strata=20, index=5, reference=5, risks=(0.1, 0.4)),
    Design(title="50 strata of 1 v 2", strata=50, index=1, reference=2, risks=(0.1, 0.4)),
    Design(title="3 strata of 200 v 200, rare", strata=3, index=200, reference=200, risks=(0.01, 0.03)),
)


def index_risks(measure: str, effect: float, reference: np.ndarray) -> np.ndarray:
    """The index group's risks that have this effect in every stratum."""
    if measure == "pooled_risk_difference":
        return reference + effect
    if measure == "pooled_risk_ratio":
        return reference * effect
    return reference * effect / (1 - reference + reference * effect)


def drawn(design: Design, measure: str, effect: float, sets: int) -> Iterator[list[Counts]]:
    """Sets of strata with binomial events in both groups."""
    source = np.random.default_rng(SEED)
    shape = (sets, design.strata)
    reference = source.uniform(*design.risks, shape)
    index = index_risks(measure, effect, reference)
    index_events = source.binomial(design.index, index)
    reference_events = source.binomial(design.reference, reference)
    for a, c in zip(index_events.tolist(), reference_events.tolist(), strict=True):
        yield [
            Counts(
                index_events=x,
                index_non_events=design.index - x,
                reference_events=y,
                reference_non_events=design.reference - y,
            )
            for x, y in zip(a, c, strict=True)
        ]


METHODS: tuple[tuple[str, str, Callable[[Sequence[Counts], float], Interval | Gap], tuple[float, ...]], ...] = (
    ("pooled_risk_difference", "sato", pooled.sato_difference, (0.0, 0.15)),
    ("pooled_risk_difference", "greenland-robins", pooled.greenland_robins_difference, (0.0, 0.15)),
    ("pooled_risk_ratio", "greenland-robins", pooled.greenland_robins_ratio, (1.0, 2.0)),
    ("pooled_odds_ratio", "robins-breslow-greenland", pooled.robins_breslow_greenland, (1.0, 3.0)),
)


def coverage(
    design: Design,
    measure: str,
    interval: Callable[[Sequence[Counts], float], Interval | Gap],
    effect: float,
    sets: int,
) -> tuple[float, float]:
    """The share of intervals that hold the true effect, and the share of sets that have none."""
    given = held = 0
    for strata in drawn(design, measure, effect, sets):
        found = interval(strata, LEVEL)
        if isinstance(found, Interval):
            given += 1
            held += found.low <= effect <= found.high
    return held / given, 1 - given / sets


def error(
    design: Design, test: Callable[[Sequence[Counts]], float | HomogeneityTest | Gap], odds_ratio: float, sets: int
) -> tuple[float, float]:
    """How often p falls below 0.05 where all strata have this odds ratio, and the share of sets without a p."""
    given = below = 0
    for strata in drawn(design, "pooled_odds_ratio", odds_ratio, sets):
        found = test(strata)
        if not isinstance(found, Gap):
            given += 1
            below += (found.p if isinstance(found, HomogeneityTest) else found) < 1 - LEVEL
    return below / given, 1 - given / sets


def main() -> None:
    """Print every row."""
    parser = argparse.ArgumentParser(description=__doc__, formatter_class=argparse.RawDescriptionHelpFormatter)
    parser.add_argument("--sets", type=int, default=5_000)
    sets = parser.parse_args().sets
    print(f"Real coverage of pooled intervals at 95%, {sets} sets of strata a row\n{'':72} {'held':>7} {'none':>6}")
    for design in DESIGNS:
        for measure, key, interval, effects in METHODS:
            for effect in effects:
                held, none = coverage(design, measure, interval, effect, sets)
                print(f"{design.title:28} {measure:23}{key:25}{effect:5} {held:7.4f} {none:6.1%}")
    print(f"\nHow often p < 0.05 with nothing to be found\n{'':72} {'found':>7} {'none':>6}")
    for design in DESIGNS:
        for key, test, odds_ratio in (
            ("cmh", pooled.cochran_mantel_haenszel, 1.0),
            ("cmh-corrected", pooled.cochran_mantel_haenszel_corrected, 1.0),
            ("breslow-day", homogeneity.breslow_day, 3.0),
            ("breslow-day-tarone", homogeneity.breslow_day_tarone, 3.0),
        ):
            found, none = error(design, test, odds_ratio, sets)
            print(f"{design.title:28} {key:48}{odds_ratio:4} {found:7.4f} {none:6.1%}")


if __name__ == "__main__":
    main()
