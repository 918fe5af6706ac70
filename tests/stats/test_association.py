"""The chi-square tests."""

from __future__ import annotations

from collections.abc import Callable

import mpmath
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats.association import n_minus_1, pearson
from fourcount.stats.results import Counts, Gap

Table = Callable[..., Counts]

CELLS = st.tuples(*[st.integers(0, 40) | st.sampled_from([10**5, 10**9])] * 4)


def _exact(cells: tuple[int, ...], weight: int) -> float:
    a, b, c, d = cells
    margins = (a + b) * (c + d) * (a + c) * (b + d)
    with mpmath.workdps(50):
        return float(mpmath.erfc(mpmath.sqrt(mpmath.mpf(weight * (a * d - b * c) ** 2) / margins / 2)))


@settings(max_examples=150)
@given(cells=CELLS)
def test_both_p_values_keep_their_digits(table: Table, cells: tuple[int, ...]) -> None:
    """Equal to 50-digit arithmetic, from single events to 10^9 a cell, until p underflows to 0."""
    a, b, c, d = cells
    if 0 in (a + b, c + d, a + c, b + d):
        return
    for p, weight in ((pearson, sum(cells)), (n_minus_1, sum(cells) - 1)):
        assert p(table(*cells)) == pytest.approx(_exact(cells, weight), rel=1e-12, abs=1e-300)


def test_smoking_women_of_doll_and_hill(table: Table) -> None:
    """Chi-square 5.76 (Doll and Hill 1950, BMJ 2:739, table IV, from memory): p = 0.0164."""
    assert pearson(table(41, 19, 28, 32)) == pytest.approx(0.0164, abs=0.00005)


@pytest.mark.parametrize(
    ("cells", "key"), [((0, 10, 0, 20), "no-events"), ((10, 0, 20, 0), "no-non-events"), ((0, 1, 0, 1), "no-events")]
)
def test_an_outcome_that_all_share_leaves_nothing_to_test(table: Table, cells: tuple[int, ...], key: str) -> None:
    """No event, or nothing but events: a gap, never a p that tested nothing."""
    assert pearson(table(*cells)) == n_minus_1(table(*cells)) == Gap(key)


def test_an_empty_group_has_no_p(table: Table) -> None:
    """Nobody in a group: a gap with the group."""
    assert pearson(table(0, 0, 3, 7)) == Gap("empty-index-group")
    assert n_minus_1(table(3, 7, 0, 0)) == Gap("empty-reference-group")


@settings(max_examples=60)
@given(cells=CELLS)
def test_p_does_not_ask_which_group_or_outcome_comes_first(table: Table, cells: tuple[int, ...]) -> None:
    """Swapped groups and swapped outcomes give the same p."""
    a, b, c, d = cells
    if 0 in (a + b, c + d, a + c, b + d):
        return
    for p in (pearson, n_minus_1):
        assert p(table(a, b, c, d)) == p(table(c, d, a, b)) == p(table(b, a, d, c))
