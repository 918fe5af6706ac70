"""The estimates and the gaps in their place."""

from __future__ import annotations

import math
from collections.abc import Callable

import pytest

from fourcount.stats.estimates import odds, odds_ratio, risk, risk_difference, risk_ratio
from fourcount.stats.results import GAP_KEYS, Counts, Gap

Table = Callable[..., Counts]


def test_a_plain_table(table: Table) -> None:
    """15/100 against 5/100, by hand."""
    counts = table(15, 85, 5, 95)
    assert risk(15, 100) == 0.15
    assert odds(15, 100) == 15 / 85
    assert risk_difference(counts) == 0.1
    assert risk_ratio(counts) == 3.0
    assert odds_ratio(counts) == pytest.approx(15 * 95 / (85 * 5), rel=1e-16)


def test_the_odds_ratio_of_eczema_and_hay_fever(table: Table) -> None:
    """Bland and Altman 2000, BMJ 320:1468: 4.89."""
    assert odds_ratio(table(141, 420, 928, 13525)) == pytest.approx(4.89, abs=0.005)


def test_risks_that_are_equal_differ_by_exactly_nothing(table: Table) -> None:
    """1/3 against 333333333/999999999: the fractions are compared, not their doubles."""
    assert risk_difference(table(1, 2, 333333333, 666666666)) == 0.0
    assert risk_ratio(table(1, 2, 333333333, 666666666)) == 1.0


def test_no_event_on_one_side(table: Table) -> None:
    """A ratio over nothing is infinite, nothing over something 0."""
    assert (risk_ratio(table(3, 7, 0, 10)), odds_ratio(table(3, 7, 0, 10))) == (math.inf, math.inf)
    assert (risk_ratio(table(0, 10, 3, 7)), odds_ratio(table(0, 10, 3, 7))) == (0.0, 0.0)
    assert odds(10, 10) == math.inf
    assert odds(0, 10) == 0.0


def test_what_the_table_does_not_determine(table: Table) -> None:
    """0/0 is a gap with its reason."""
    assert risk_ratio(table(0, 10, 0, 20)) == Gap("no-events")
    assert odds_ratio(table(0, 10, 0, 20)) == Gap("no-events")
    assert odds_ratio(table(10, 0, 20, 0)) == Gap("no-non-events")
    assert risk_ratio(table(10, 0, 20, 0)) == 1.0
    assert risk_difference(table(10, 0, 20, 0)) == 0.0


@pytest.mark.parametrize("estimate", [risk_difference, risk_ratio, odds_ratio])
@pytest.mark.parametrize(
    ("cells", "key"),
    [
        ((0, 0, 0, 0), "empty-table"),
        ((0, 0, 3, 7), "empty-index-group"),
        ((3, 7, 0, 0), "empty-reference-group"),
    ],
)
def test_an_empty_group_compares_with_nothing(
    table: Table, estimate: Callable[[Counts], float | Gap], cells: tuple[int, ...], key: str
) -> None:
    """Nobody in a group: no comparison, and which group is said."""
    assert estimate(table(*cells)) == Gap(key)


def test_the_risk_of_nobody() -> None:
    """A risk or odds of nobody is a gap."""
    assert risk(0, 0) == odds(0, 0) == Gap("empty-group")


def test_every_key_of_a_gap_is_listed_once() -> None:
    """The list of reasons holds no key twice."""
    assert len(set(GAP_KEYS)) == len(GAP_KEYS)
