"""How often a print that is not from the table fits it by chance.

    python tests/reference/false_matches.py [--tables 2000] [--seed 1]

Random tables of 40 to 2,000 people a group with risks of 3% to 60%. Beside each stands a random print as another
analysis might give it: the estimate lies off the table's own by a factor (for a difference, by points) drawn from a
normal distribution, and the limits lie evenly round it with the table's own standard error times 0.8 to 1.25. "Far" is
a standard deviation of 0.3 on the log scale (of half the standard error for differences, at least 3 points), "near" of
0.1 (1 point), as adjustment for a few things might do. Every number is printed with the decimals of its row.

The columns are shares of prints: a whole fit as printed (name, side and level); a whole fit in any way; the estimate
fitting under its own name as read; in any way; and a near miss that is said (cut off, the last digit, one limit).
"""

from __future__ import annotations

import argparse
import math
import random
from collections.abc import Iterator
from dataclasses import dataclass
from typing import Any

from fourcount.appraisal.check import check_figures
from fourcount.appraisal.check.basis import of_counts
from fourcount.appraisal.check.candidate import Candidate
from fourcount.appraisal.check.unpaired import unpaired
from fourcount.appraisal.findings import FigureCheck
from fourcount.record.entry.readings import PrintedFigure, PrintedNumber
from fourcount.record.paper import Choices
from fourcount.stats.results import Counts

MEASURES = ("risk_ratio", "odds_ratio", "risk_difference")
DECIMALS = (1, 2, 3)
SPREADS = {"far": 0.3, "near": 0.1}
NEAR_MISSES = frozenset({"cut-off", "last-digit", "one-limit"})
HEADING = f"{'':38} {'all':>8} {'all, any':>9} {'estimate':>9} {'est., any':>9} {'miss':>8}"


@dataclass(kw_only=True)
class Tally:
    """How many prints fitted in each way."""

    prints: int = 0
    whole: int = 0
    whole_anyhow: int = 0
    estimate: int = 0
    estimate_anyhow: int = 0
    missed: int = 0

    def add(self, found: FigureCheck) -> None:
        matches = found.matches
        own = [one for one in matches if one.measure == found.printed.measure and one.orientation == "as-read"]
        self.prints += 1
        self.whole += any(one.fit == "all" and one.level == 0.95 for one in own)
        self.whole_anyhow += any(one.fit == "all" for one in matches)
        self.estimate += any(one.fit in ("all", "estimate") for one in own)
        self.estimate_anyhow += any(one.fit in ("all", "estimate") for one in matches)
        self.missed += any(finding.key in NEAR_MISSES for finding in found.findings)

    def shares(self) -> tuple[float, ...]:
        counted = (self.whole, self.whole_anyhow, self.estimate, self.estimate_anyhow, self.missed)
        return tuple(number / self.prints for number in counted)


def random_counts(chance: random.Random) -> Counts:
    """A table in which no cell is 0."""
    while True:
        cells = []
        for _ in range(2):
            people, risk = round(math.exp(chance.uniform(math.log(40), math.log(2000)))), chance.uniform(0.03, 0.6)
            events = sum(chance.random() < risk for _ in range(people))
            cells += [events, people - events]
        if all(cells):
            a, b, c, d = cells
            return Counts(index_events=a, index_non_events=b, reference_events=c, reference_non_events=d)


def random_print(counts: Counts, measure: Any, decimals: int, spread: float, chance: random.Random) -> PrintedFigure:
    """An estimate off the table's own with even limits, in so many decimals; a difference in points."""
    own = next(one for one in unpaired(counts, measure) if one.named)
    value, half = _textbook(own, log_scale=measure != "risk_difference")
    half *= chance.uniform(0.8, 1.25)
    if measure == "risk_difference":
        shift = chance.gauss(0, 10 * spread)
        middle, half = 100 * value + shift, 100 * half
        return _figure(measure, (middle, middle - half, middle + half), decimals, "percent")
    middle = value * math.exp(chance.gauss(0, spread))
    return _figure(measure, (middle, middle * math.exp(-half), middle * math.exp(half)), decimals, "one")


def _textbook(own: Candidate, *, log_scale: bool) -> tuple[float, float]:
    """The estimate and half the width of its textbook interval, on its own scale."""
    limits = own.limits(own.ways[0], 0.95)
    value = own.value()
    assert limits is not None
    assert value is not None
    low, high = (math.log(limit) if log_scale else limit for limit in limits)
    return float(value), (high - low) / 2


def _figure(measure: Any, values: tuple[float, ...], decimals: int, unit: Any) -> PrintedFigure:
    estimate, low, high = (
        PrintedNumber(text=f"{value:.{decimals}f}", value=round(value, decimals), decimals=decimals) for value in values
    )
    name = measure.replace("_", " ")
    return PrintedFigure(measure=measure, text=name, estimate=estimate, low=low, high=high, unit=unit)


def simulate(tables: int, seed: int) -> Iterator[tuple[str, str, int, Tally]]:
    """One tally for each measure, distance and number of decimals."""
    for measure in MEASURES:
        for distance, spread in SPREADS.items():
            for decimals in DECIMALS:
                chance, tally = random.Random(f"{seed} {measure} {distance} {decimals}"), Tally()
                for _ in range(tables):
                    counts = random_counts(chance)
                    figure = random_print(counts, measure, decimals, spread, chance)
                    tally.add(check_figures((figure,), of_counts(counts), Choices()).figures[0])
                yield measure, distance, decimals, tally


def main() -> None:
    parser = argparse.ArgumentParser(description="How often a print that is not from a table fits it by chance.")
    parser.add_argument("--tables", type=int, default=2000, help="tables a row (2000)")
    parser.add_argument("--seed", type=int, default=1)
    options = parser.parse_args()
    print(f"{options.tables} random tables and prints a row, seed {options.seed}")
    print(HEADING)
    for measure, distance, decimals, tally in simulate(options.tables, options.seed):
        shares = " ".join(f"{share:{width}.1%}" for share, width in zip(tally.shares(), (8, 9, 9, 9, 8), strict=True))
        print(f"{measure:17} {distance:5} {decimals} decimal{'s' if decimals > 1 else ' '}{'':5} {shares}", flush=True)


if __name__ == "__main__":
    main()
