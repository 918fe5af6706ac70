"""A print that is not from a table seldom fits it, once it has digits enough."""

from __future__ import annotations

import importlib.util
import sys
from pathlib import Path
from typing import Any

import pytest

TABLES = 60


@pytest.fixture(scope="module")
def shares() -> dict[tuple[str, str, int], tuple[float, ...]]:
    """The columns of the simulation, by measure, distance and decimals."""
    spec = importlib.util.spec_from_file_location("false_matches", Path(__file__).with_name("false_matches.py"))
    assert spec is not None
    assert spec.loader is not None
    simulation: Any = importlib.util.module_from_spec(spec)
    sys.modules[spec.name] = simulation
    spec.loader.exec_module(simulation)
    return {row[:3]: row[3].shares() for row in simulation.simulate(TABLES, seed=1)}


def test_three_decimals_hardly_ever_fit_by_chance(shares: dict[tuple[str, str, int], tuple[float, ...]]) -> None:
    """At most one of sixty prints fits whole in any way, for every measure and distance."""
    assert max(row[1] for (_, _, decimals), row in shares.items() if decimals == 3) <= 1 / TABLES


def test_two_decimals_seldom_fit_by_chance(shares: dict[tuple[str, str, int], tuple[float, ...]]) -> None:
    """At most 10% fit whole in any way; 4% are to be expected where another analysis comes near."""
    assert max(row[1] for (_, _, decimals), row in shares.items() if decimals == 2) <= 0.10


def test_one_decimal_of_a_ratio_says_little(shares: dict[tuple[str, str, int], tuple[float, ...]]) -> None:
    """A fifth or more fit in some way, which is why the sentences then speak of chance."""
    for measure in ("risk_ratio", "odds_ratio"):
        assert shares[measure, "near", 1][1] >= 0.2


def test_more_digits_never_fit_more_often(shares: dict[tuple[str, str, int], tuple[float, ...]]) -> None:
    """The share of whole fits falls with each decimal."""
    for measure, distance, decimals in shares:
        if decimals < 3:
            assert shares[measure, distance, decimals][1] >= shares[measure, distance, decimals + 1][1]
