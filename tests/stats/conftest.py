"""What the tests of this folder share: tables, and roots judged in 90-digit arithmetic."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from typing import Any

import mpmath
import pytest

from fourcount.stats.results import Counts, Gap, Interval
from tables import EXTREMES, counts_of, given_interval

Statistic = Callable[[Any], Any]


@pytest.fixture(scope="session")
def table() -> Callable[..., Counts]:
    """Four counts from a, b, c, d."""

    def four(a: int, b: int, c: int, d: int) -> Counts:
        return counts_of((a, b, c, d))

    return four


@pytest.fixture(scope="session")
def exact_z() -> Callable[[float], Any]:
    """The normal quantile of a level to 90 digits."""

    def z(level: float) -> Any:
        with mpmath.workdps(90):
            return mpmath.sqrt(2) * mpmath.erfinv(mpmath.mpf(level))

    return z


@pytest.fixture(scope="session")
def distances_at_limits(
    exact_z: Callable[[float], Any], distance_from_root: Callable[..., float]
) -> Callable[..., Iterator[tuple[tuple[int, ...], Interval, float, float]]]:
    """Each limit of a score method over the extreme tables, and how far it lies from where its statistic is z."""

    def distances(
        method: Callable[[Counts, float], Interval | Gap],
        level: float,
        statistic_of: Callable[[tuple[int, ...]], Statistic],
        given_exactly: Callable[[float], bool],
    ) -> Iterator[tuple[tuple[int, ...], Interval, float, float]]:
        z = exact_z(level)
        for cells in EXTREMES:
            interval = given_interval(method(counts_of(cells), level))
            with mpmath.workdps(90):
                statistic = statistic_of(cells)
            for limit, target in ((interval.low, z), (interval.high, -z)):
                if not given_exactly(limit):
                    yield cells, interval, limit, distance_from_root(statistic, limit, target)

    return distances


@pytest.fixture(scope="session")
def distance_from_root() -> Callable[[Statistic, float, Any], float]:
    """How far a limit lies from where the statistic meets its target: one Newton step in 90-digit arithmetic."""

    def distance(statistic: Statistic, limit: float, target: Any) -> float:
        with mpmath.workdps(90):
            x = mpmath.mpf(limit)
            step = abs(x) * mpmath.mpf(10) ** -35
            value = statistic(x)
            slope = (statistic(x + step) - value) / step
            return abs(float((value - target) / slope))

    return distance
