"""Every method over 2,000 random tables against statsmodels, scipy and arithmetic of 50 digits.

oracle.json.gz is made by make_oracle.py, which says how; its header names command, seed and versions. A library
that refuses a table is no oracle: such a table is compared with 50 digits, and the refusals are counted in the file.
Of 2,000 tables, 1,008 of them with a zero cell, statsmodels 0.15.0 refuses 490 for the score interval of the ratio
and 1,008 for the odds ratio's. For the difference it refuses 1,910: its restricted risk comes from a cubic with a
count in the place of a group's size, so that its limits seldom solve Miettinen and Nurminen's equation (with the
size put there it gives Newcombe's printed 0.0528 to 0.3382 for 56/70 v 48/80, without it 0.0526 to 0.3440).
"""

from __future__ import annotations

import gzip
import json
import math
from collections.abc import Callable
from pathlib import Path
from typing import Any

import pytest

from fourcount.stats import association, baptista_pike, conditional, difference, fisher, odds, ratio, risk
from fourcount.stats.results import Counts, Gap, Interval
from tables import counts_of

ORACLE = json.loads(gzip.decompress((Path(__file__).parent / "oracle.json.gz").read_bytes()))
TABLES = [(counts_of(table[:4]), table[4]) for table in ORACLE["tables"]]

Answer = Interval | float | Gap


def _of_risk(function: Callable[[int, int, float], Answer]) -> Callable[[Counts, float], Answer]:
    return lambda counts, level: function(counts.index_events, counts.index_total, level)


def _without_level(function: Callable[[Counts], Answer]) -> Callable[[Counts, float], Answer]:
    return lambda counts, level: function(counts)


METHODS: dict[str, Callable[[Counts, float], Answer]] = {
    "risk/wald": _of_risk(risk.wald),
    "risk/wilson": _of_risk(risk.wilson),
    "risk/wilson-continuity": _of_risk(risk.wilson_continuity),
    "risk/agresti-coull": _of_risk(risk.agresti_coull),
    "risk/clopper-pearson": _of_risk(risk.clopper_pearson),
    "risk/mid-p": _of_risk(risk.mid_p),
    "risk/jeffreys": _of_risk(risk.jeffreys),
    "risk_difference/wald": difference.wald,
    "risk_difference/newcombe": difference.newcombe,
    "risk_difference/newcombe-continuity": difference.newcombe_continuity,
    "risk_difference/agresti-caffo": difference.agresti_caffo,
    "risk_difference/miettinen-nurminen": difference.miettinen_nurminen,
    "risk_difference/mee": difference.mee,
    "risk_ratio/katz": ratio.katz,
    "risk_ratio/miettinen-nurminen": ratio.miettinen_nurminen,
    "risk_ratio/koopman": ratio.koopman,
    "odds_ratio/woolf": odds.woolf,
    "odds_ratio/gart": odds.gart,
    "odds_ratio/miettinen-nurminen": odds.miettinen_nurminen,
    "odds_ratio/cornfield": odds.cornfield,
    "odds_ratio/conditional-exact": conditional.conditional_exact,
    "odds_ratio/conditional-mid-p": conditional.conditional_mid_p,
    "odds_ratio/baptista-pike-mid-p": baptista_pike.baptista_pike_mid_p,
    "conditional-odds-ratio": _without_level(conditional.conditional_odds_ratio),
    "test/fisher": _without_level(fisher.fisher),
    "test/fisher-mid-p": _without_level(fisher.fisher_mid_p),
    "test/pearson": _without_level(association.pearson),
    "test/n-minus-1": _without_level(association.n_minus_1),
}

CLOSED = (2e-12, 1e-15)
"""Both sides are a formula or a sum in doubles and the file keeps 13 digits; the absolute part is for a limit that
cancels near 0."""

ROOT = (1e-8, 1e-10)
"""The library stops its root-finder at about 2e-12 on a scale of its own: on the sample it has nine to twelve digits
in common with 50-digit arithmetic, so no more can be asked of the comparison."""

POLYNOMIAL = (1e-7, 1e-10)
"""statsmodels takes the limits of a risk ratio from the roots of a cubic, which lie close together where a risk is
near 1: eight digits on the sample."""

FIFTY_DIGITS = (1e-12, 1e-15)
"""Against 50 digits, of which the file keeps 15."""

TOLERANCES: dict[str, tuple[float, float]] = {
    "risk_difference/miettinen-nurminen": ROOT,
    "risk_difference/mee": ROOT,
    "risk_ratio/miettinen-nurminen": POLYNOMIAL,
    "risk_ratio/koopman": POLYNOMIAL,
    "odds_ratio/miettinen-nurminen": ROOT,
    "odds_ratio/cornfield": ROOT,
    "odds_ratio/conditional-exact": ROOT,
    "conditional-odds-ratio": ROOT,
}
"""Where a library is asked for less than a closed form gives."""


def _parts(answer: Any) -> tuple[float, ...] | None:
    """The figures of an answer, ours or the oracle's; none for a gap."""
    if answer is None or isinstance(answer, Gap):
        return None
    if isinstance(answer, Interval):
        return answer.low, answer.high
    return tuple(float(part) for part in answer) if isinstance(answer, list) else (float(answer),)


def _equal(ours: Answer, oracle: Any, tolerance: tuple[float, float]) -> bool:
    first, second = _parts(ours), _parts(oracle)
    if first is None or second is None:
        return first is second
    relative, absolute = tolerance
    return all(
        math.isclose(one, other, rel_tol=relative, abs_tol=absolute) for one, other in zip(first, second, strict=True)
    )


ONE_TABLE_POSSIBLE = {"test/fisher-mid-p": 0.5}
"""What a test's definition gives where a column is empty, if not 1. Nothing is tested there, so ours is a gap."""


def _tested(key: str, counts: Counts) -> bool:
    """False for a test that has nothing to test in this table."""
    return not key.startswith("test/") or bool(counts.events and counts.non_events)


@pytest.mark.parametrize("key", METHODS)
def test_method_agrees_with_its_oracle(key: str) -> None:
    """The library's figure where it gives one, 50 digits where it refuses and on a sample of 300 tables."""
    column = ORACLE["columns"][key]
    tolerance = TOLERANCES.get(key, CLOSED)
    apart = []
    for index, (counts, level) in enumerate(TABLES):
        library = column["answers"][index] if column["answers"] else None
        sampled = str(index) in column["exact"]
        if (library is None and not sampled) or not _tested(key, counts):
            continue
        ours = METHODS[key](counts, level)
        if library is not None and not _equal(ours, library, tolerance):
            apart.append((counts, level, ours, library))
        if sampled and not _equal(ours, column["exact"][str(index)], FIFTY_DIGITS):
            apart.append((counts, level, ours, column["exact"][str(index)]))
    assert not apart, (len(apart), apart[:5])


@pytest.mark.parametrize("key", [key for key in METHODS if key.startswith("test/")])
def test_a_test_of_an_empty_column_is_withheld(key: str) -> None:
    """The oracle has the definition's value there, 1 or for mid-P 1/2, whatever the groups; ours is a gap."""
    column, definition = ORACLE["columns"][key], ONE_TABLE_POSSIBLE.get(key, 1.0)
    empty = [index for index, (counts, _level) in enumerate(TABLES) if not _tested(key, counts)]
    assert len(empty) == ORACLE["with_an_empty_column"]
    for index in empty:
        counts, level = TABLES[index]
        assert METHODS[key](counts, level) == Gap("no-events" if counts.events == 0 else "no-non-events")
        library = column["answers"][index] if column["answers"] else None
        assert {library, column["exact"].get(str(index))} <= {None, definition}


def test_every_column_of_the_oracle_is_compared() -> None:
    """No method of the oracle is left out, and no method here lacks its oracle."""
    assert set(ORACLE["columns"]) == set(METHODS)


def test_refusals_are_covered() -> None:
    """Where a library refuses a table, the figure at 50 digits stands in its place."""
    for key, column in ORACLE["columns"].items():
        refused = [index for index, answer in enumerate(column["answers"]) if answer is None]
        assert len(refused) == sum(column["refusals"].values()), key
        assert all(str(index) in column["exact"] for index in refused), key


def test_tables_hold_enough_zeros() -> None:
    """About half of the tables have a zero cell, and more than a hundred an empty column."""
    assert len(TABLES) == 2000
    assert 800 < ORACLE["with_a_zero_cell"] < 1200
    assert ORACLE["with_an_empty_column"] > 100
