"""What the tests of this folder share: tables, and roots judged in 90-digit arithmetic."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

import mpmath
import pytest

from fourcount.stats.results import Counts
from tables import counts_of

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
