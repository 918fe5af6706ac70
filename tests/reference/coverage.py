"""Real coverage of every interval, by adding up every table that a design can give.

    python tests/reference/coverage.py          one row per method, over all sizes
    python tests/reference/coverage.py --each   the same for each pair of group sizes

For groups of the sizes below and each pair of true risks on a grid, all tables are listed, each one's interval is
computed once, and the binomial probabilities of the tables whose interval holds the true value are added. Nothing is
simulated. A table for which a method gives no interval, or one from 0 to infinity that says nothing, counts neither
way: its probability is left out, and its average is the column "none". Widths are compared on tables without a zero
cell, where every method has one; those of ratios are on the log scale.

Pairs are listed likewise for numbers of pairs, over a grid of both sides' risks and three correlations of the sides;
person-time for a grid of expected events in both groups, all counts to far beyond the largest expectation.
"""

from __future__ import annotations

import argparse
import math
from collections.abc import Callable, Iterable, Iterator, Sequence
from dataclasses import dataclass

import numpy as np
from numpy.typing import NDArray

from fourcount.stats.methods import METHODS, PAIR_METHODS, RATE_METHODS, Method
from fourcount.stats.results import Counts, Interval, PairCounts, Rates

CELLS = ("index_events", "index_non_events", "reference_events", "reference_non_events")
LEVEL = 0.95
SIZES = ((10, 10), (20, 20), (15, 30), (40, 40))
SINGLE_SIZES = (10, 20, 50)
RISKS = (0.02, *(step / 40 for step in range(2, 39)), 0.98)
FINE_RISKS = tuple(step / 200 for step in range(1, 200))
PAIR_SIZES = (20, 50)
PAIR_RISKS = (0.05, *(step / 10 for step in range(1, 10)), 0.95)
CORRELATIONS = (0.0, 0.3, 0.6)
TIMES = ((1.0, 1.0), (1.0, 3.0))
EXPECTED = (0.5, *range(1, 11), 12, 15, 20, 25)
FINE_EXPECTED = tuple(step / 4 for step in range(2, 161))
MOST_EVENTS = 100  # at 40 expected events more than these have a probability of 1e-15
TINY = 1e-12  # a limit that equals the true value but for the last digits of a double holds it

Array = NDArray[np.float64]


@dataclass(frozen=True, kw_only=True)
class Coverage:
    """Coverage at every point of the grid, how often there is no interval, and the mean width."""

    held: Array
    none: Array
    width: float

    def row(self) -> str:
        under = [float((self.held < bar).mean()) for bar in (0.93, 0.94)]
        return (
            f"{self.held.mean():8.4f} {self.held.min():8.4f} {under[0]:8.1%} {under[1]:8.1%} "
            f"{self.none.mean():7.1%} {self.width:9.4f}"
        )


HEADING = f"{'':44} {'mean':>8} {'least':>8} {'< 93%':>8} {'< 94%':>8} {'none':>7} {'width':>9}"


def binomial(total: int, risks: Sequence[float]) -> Array:
    """The probability of each count 0 to ``total`` (columns) at each risk (rows)."""
    coefficients = np.array([float(math.comb(total, count)) for count in range(total + 1)])
    counts, chances = np.arange(total + 1), np.array(risks)[:, None]
    return np.asarray(coefficients * chances**counts * (1 - chances) ** (total - counts))


TRUTHS: dict[str, Callable[[Array, Array], Array]] = {
    "risk_difference": lambda index, reference: index - reference,
    "risk_ratio": lambda index, reference: index / reference,
    "odds_ratio": lambda index, reference: index / (1 - index) / reference * (1 - reference),
}


def limits(intervals: Iterable[object]) -> Array:
    """The limits of intervals, one row each; nan marks a table without an interval that says something."""
    nothing = (math.nan, math.nan)
    rows = [(found.low, found.high) if isinstance(found, Interval) else nothing for found in intervals]
    return np.array([nothing if row == (0, math.inf) else row for row in rows])


def weigh(weights: Array, truth: Array, found: Array, width: Array) -> Coverage:
    """Coverage from the tables' probabilities (points by tables), the points' true values and the tables' limits."""
    has = ~np.isnan(found[:, 0])
    slack = TINY * np.maximum(1, np.abs(truth))[:, None]
    with np.errstate(invalid="ignore"):
        holds = (found[:, 0] <= truth[:, None] + slack) & (truth[:, None] - slack <= found[:, 1])
    some = (weights * has).sum(axis=1)
    comparable = np.isfinite(width)
    shares = weights[:, comparable]
    mean_width = float((shares @ width[comparable] / shares.sum(axis=1)).mean())
    return Coverage(held=(weights * (holds & has)).sum(axis=1) / some, none=np.maximum(1 - some, 0), width=mean_width)


def two_groups(method: Method, sizes: tuple[int, int], risks: Sequence[float], level: float) -> Coverage:
    """One method of two groups over the grid of both risks."""
    first, second = sizes
    cells = [(a, first - a, c, second - c) for a in range(first + 1) for c in range(second + 1)]
    found = limits(method.interval(Counts(**dict(zip(CELLS, row, strict=True))), level) for row in cells)
    both = np.einsum("ia,jc->ijac", binomial(first, risks), binomial(second, risks))
    weights = both.reshape(len(risks) ** 2, len(cells))
    index, reference = np.meshgrid(np.array(risks), np.array(risks), indexing="ij")
    truth = TRUTHS[method.measure](index, reference).ravel()
    full = np.array([0 not in row for row in cells])
    return weigh(weights, truth, found, _width(found, full, method.measure.endswith("ratio")))


def one_group(method: Method, total: int, risks: Sequence[float], level: float) -> Coverage:
    """One method of a single risk over a grid of risks."""
    found = limits(method.interval(events, total, level) for events in range(total + 1))
    full = np.array([0 < events < total for events in range(total + 1)])
    return weigh(binomial(total, risks), np.array(risks), found, _width(found, full, log_scale=False))


def pair_points(risks: Sequence[float], correlations: Sequence[float]) -> Array:
    """The chances of both, index only, reference only, neither at each point where all four can happen."""
    points = []
    for index in risks:
        for reference in risks:
            for correlation in correlations:
                spread = math.sqrt(index * (1 - index) * reference * (1 - reference))
                both = index * reference + correlation * spread
                points.append((both, index - both, reference - both, 1 - index - reference + both))
    return np.array([point for point in points if min(point) > TINY])


PAIR_TRUTHS: dict[str, Callable[[Array], Array]] = {
    "pair_difference": lambda chances: chances[:, 1] - chances[:, 2],
    "pair_ratio": lambda chances: (chances[:, 0] + chances[:, 1]) / (chances[:, 0] + chances[:, 2]),
    "pair_odds_ratio": lambda chances: chances[:, 1] / chances[:, 2],
}


def of_pairs(method: Method, total: int, chances: Array, level: float) -> Coverage:
    """One method of pairs at points of four chances, by every split of ``total`` pairs."""
    cells = [
        (both, index, reference, total - both - index - reference)
        for both in range(total + 1)
        for index in range(total + 1 - both)
        for reference in range(total + 1 - both - index)
    ]
    found = limits(
        method.interval(PairCounts(**dict(zip(PairCounts.__slots__, row, strict=True))), level) for row in cells
    )
    counts = np.array(cells, dtype=np.float64)
    ways = [math.lgamma(total + 1) - sum(math.lgamma(count + 1) for count in row) for row in cells]
    weights = np.exp(np.log(chances) @ counts.T + np.array(ways))
    full = np.array([0 not in row for row in cells])
    truth = PAIR_TRUTHS[method.measure](chances)
    return weigh(weights, truth, found, _width(found, full, method.measure.endswith("ratio")))


def poisson(expected: Sequence[float]) -> Array:
    """The probability of each count 0 to ``MOST_EVENTS`` (columns) at each expectation (rows)."""
    counts = np.arange(MOST_EVENTS + 1)
    logs = np.array([math.lgamma(count + 1) for count in counts])
    means = np.array(expected, dtype=np.float64)[:, None]
    return np.asarray(np.exp(counts * np.log(means) - means - logs))


def two_rates(method: Method, times: tuple[float, float], expected: Sequence[float], level: float) -> Coverage:
    """One method of two rates over the grid of both groups' expected events."""
    cells = [(x1, x2) for x1 in range(MOST_EVENTS + 1) for x2 in range(MOST_EVENTS + 1)]
    found = limits(
        method.interval(
            Rates(index_events=x1, index_time=times[0], reference_events=x2, reference_time=times[1]), level
        )
        for x1, x2 in cells
    )
    weights = np.einsum("ia,jc->ijac", poisson(expected), poisson(expected)).reshape(len(expected) ** 2, len(cells))
    index, reference = np.meshgrid(np.array(expected) / times[0], np.array(expected) / times[1], indexing="ij")
    ratio = method.measure == "rate_ratio"
    truth = (index / reference if ratio else index - reference).ravel()
    full = np.array([0 not in row for row in cells])
    return weigh(weights, truth, found, _width(found, full, ratio))


def one_rate(method: Method, expected: Sequence[float], level: float) -> Coverage:
    """One method of a single rate over a grid of expected events."""
    found = limits(method.interval(events, 1.0, level) for events in range(MOST_EVENTS + 1))
    full = np.array([events > 0 for events in range(MOST_EVENTS + 1)])
    return weigh(poisson(expected), np.array(expected), found, _width(found, full, log_scale=False))


def _width(found: Array, full: Array, log_scale: bool) -> Array:
    """Each table's width; nan where a cell is 0."""
    width = np.full(len(found), np.nan)
    inside = found[full]
    width[full] = np.log(inside[:, 1] / inside[:, 0]) if log_scale else inside[:, 1] - inside[:, 0]
    return width


def together(parts: Sequence[Coverage]) -> Coverage:
    """Several grids as one."""
    return Coverage(
        held=np.concatenate([part.held for part in parts]),
        none=np.concatenate([part.none for part in parts]),
        width=float(np.mean([part.width for part in parts])),
    )


def parts_of(method: Method) -> Iterator[tuple[object, Coverage]]:
    """Each size with the coverage of a method in it."""
    if method.measure == "risk":
        for size in SINGLE_SIZES:
            yield size, one_group(method, size, FINE_RISKS, LEVEL)
    elif method.measure in TRUTHS:
        for sizes in SIZES:
            yield sizes, two_groups(method, sizes, RISKS, LEVEL)
    elif method.measure in PAIR_TRUTHS:
        for size in PAIR_SIZES:
            yield size, of_pairs(method, size, pair_points(PAIR_RISKS, CORRELATIONS), LEVEL)
    elif method.measure == "rate":
        yield "", one_rate(method, FINE_EXPECTED, LEVEL)
    else:
        for times in TIMES:
            yield times, two_rates(method, times, EXPECTED, LEVEL)


def main() -> None:
    parser = argparse.ArgumentParser(description="Real coverage of every interval method by full enumeration.")
    parser.add_argument("--each", action="store_true", help="also a row for each size")
    parser.add_argument("--measure", help="only the methods of this measure")
    options = parser.parse_args()
    print(f"Real coverage of intervals at {LEVEL:.0%}")
    print(f"two groups of {', '.join(f'{n1} v {n2}' for n1, n2 in SIZES)}; {len(RISKS)} x {len(RISKS)} risks each")
    print(f"one group of {', '.join(map(str, SINGLE_SIZES))}; {len(FINE_RISKS)} risks each")
    points = len(pair_points(PAIR_RISKS, CORRELATIONS))
    print(f"{' and '.join(map(str, PAIR_SIZES))} pairs; {points} points of two risks and a correlation of 0, 0.3, 0.6")
    times = ", ".join(f"{t1:g} v {t2:g}" for t1, t2 in TIMES)
    print(
        f"person-time of {times}; {len(EXPECTED)} x {len(EXPECTED)} expected events of {EXPECTED[0]} to {EXPECTED[-1]}"
    )
    print(f"one rate; {len(FINE_EXPECTED)} expected events of {FINE_EXPECTED[0]} to {FINE_EXPECTED[-1]:g}")
    print(HEADING)
    for method in (*METHODS, *PAIR_METHODS, *RATE_METHODS):
        if options.measure in (None, method.measure):
            parts = list(parts_of(method))
            print(f"{method.measure:17} {method.key:26} {together([part for _, part in parts]).row()}", flush=True)
            for size, part in parts if options.each else ():
                print(f"{size!s:>44} {part.row()}")


if __name__ == "__main__":
    main()
