"""The fragility index against plain stepping, in fractions where they are quick."""

from __future__ import annotations

import math
from collections.abc import Callable
from fractions import Fraction
from functools import cache

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats.adding_events import AddingEvents
from fourcount.stats.fisher import fisher
from fourcount.stats.fragility import FragilityIndex, fragility
from fourcount.stats.results import Counts, Gap
from tables import counts_of

Table = Callable[..., Counts]
Found = tuple[int, str] | str

TIED = 1 + Fraction(1, 10**7)


@cache
def _weights(first: int, second: int, events: int) -> dict[int, int]:
    """The number of ways to each count of the first group's events, all margins fixed."""
    span = range(max(0, events - second), min(first, events) + 1)
    return {count: math.comb(first, count) * math.comb(second, events - count) for count in span}


def _exact_p(a: int, b: int, c: int, d: int) -> Fraction:
    weights = _weights(a + b, c + d, a + c)
    most = weights[a] * TIED
    return Fraction(sum(weight for weight in weights.values() if weight <= most), sum(weights.values()))


def _rounded_p(a: int, b: int, c: int, d: int) -> float:
    p = fisher(counts_of((a, b, c, d)))
    return 1.0 if isinstance(p, Gap) else p / (1 - 1e-9)


def _stepped(cells: tuple[int, int, int, int], threshold: Fraction, p: Callable[..., Fraction | float]) -> Found:
    """Every step tried in turn, the definition itself."""
    a, b, c, d = cells
    index_lower = a * (c + d) < c * (a + b)
    low, high = (cells[:2], cells[2:]) if index_lower else (cells[2:], cells[:2])
    for changes in range(low[1] + 1):
        if p(low[0] + changes, low[1] - changes, *high) >= threshold:
            return (changes, "index" if index_lower else "reference") if changes else "fragility-not-below"
    return "fragility-not-reached"


def _found(counts: Counts, threshold: float) -> Found:
    answer = fragility(counts, threshold)
    return (answer.changes, answer.group) if isinstance(answer, FragilityIndex) else answer.key


@pytest.mark.parametrize("first", range(1, 13))
def test_agrees_with_stepping_in_fractions_over_all_small_tables(first: int) -> None:
    """Every table of up to 12 a group at 5%, in exact arithmetic: also where p is 1/20 on the dot."""
    for second in range(1, 13):
        for a in range(first + 1):
            for c in range(second + 1):
                if 0 < a + c < first + second:
                    cells = (a, first - a, c, second - c)
                    assert _found(counts_of(cells), 0.05) == _stepped(cells, Fraction(1, 20), _exact_p), cells


@settings(max_examples=300, deadline=None)
@given(
    cells=st.tuples(*[st.integers(0, 12) | st.integers(0, 300)] * 4).filter(
        lambda cells: all(sum(cells[i] for i in pair) for pair in ((0, 1), (2, 3), (0, 2), (1, 3)))
    ),
    threshold=st.sampled_from((0.001, 0.01, 0.05, 0.3, 0.9)),
)
def test_agrees_with_stepping(cells: tuple[int, int, int, int], threshold: float) -> None:
    """Groups of very different sizes, at many thresholds: the first step of all that reaches it is found."""
    assert _found(counts_of(cells), threshold) == _stepped(cells, Fraction(threshold), _rounded_p)


def test_first_of_several_crossings(table: Table) -> None:
    """0/200 v 20/20: p reaches 0.05 at 164 events, falls below it again, and comes back at 168."""
    answer = fragility(table(0, 200, 20, 0))
    assert isinstance(answer, FragilityIndex)
    path = AddingEvents(table(0, 200, 20, 0), 0.05)
    assert [path.p(added) >= 0.05 for added in range(163, 169)] == [False, True, False, False, False, True]
    assert answer.changes == 164


@pytest.mark.parametrize(
    "cells",
    [
        (900_000, 9_100_000, 1_000_000, 9_000_000),
        (1_000, 9_999_000, 2_000, 9_998_000),
        (10, 10**7, 40, 10**5),
        (40, 10**5, 10, 10**7),
        (5_005_000, 4_995_000, 5_000_000, 5_000_000),
        (10**8, 9 * 10**8, 10**8 + 10**6, 9 * 10**8),
    ],
)
def test_large_groups(cells: tuple[int, ...], monkeypatch: pytest.MonkeyPatch) -> None:
    """Up to 10^9 a group the answer stands beside smaller p before it, after few looks at p or its bound."""
    counts = counts_of(cells)
    looks: list[int] = []
    bound, p = AddingEvents.bound, AddingEvents.p
    monkeypatch.setattr(AddingEvents, "bound", lambda self, *span: looks.append(1) or bound(self, *span))
    monkeypatch.setattr(AddingEvents, "p", lambda self, added: looks.append(1) or p(self, added))
    answer = fragility(counts)
    assert isinstance(answer, FragilityIndex)
    assert len(looks) < 150
    a, b, c, d = cells
    path = AddingEvents(counts if answer.group == "index" else counts_of((c, d, a, b)), 0.05)
    assert answer.p_after == path.p(answer.changes) >= 0.05
    assert max(path.p(answer.changes - before) for before in range(1, 40)) < 0.05
    assert answer.p_before == fisher(counts)


def test_bound_is_never_below_any_p_of_its_span(table: Table) -> None:
    """The bound that lets whole spans be passed over holds for each step in them."""
    for cells in ((0, 60, 12, 18), (3, 200, 15, 15), (1, 30, 90, 210), (0, 200, 20, 0)):
        path = AddingEvents(table(*cells), 1.0)
        p = [path.p(added) for added in range(path.to_equal_risks() + 1)]
        for first in range(1, len(p), 7):
            for last in range(first, len(p), 11):
                assert path.bound(first, last) >= max(p[first : last + 1]) * (1 - 1e-9), (cells, first, last)


def test_the_group_with_the_lower_risk_changes(table: Table) -> None:
    """The other group's mirror image gives the same number, and names the other group."""
    one, other = fragility(table(5, 95, 20, 80)), fragility(table(20, 80, 5, 95))
    assert isinstance(one, FragilityIndex)
    assert isinstance(other, FragilityIndex)
    assert (one.group, other.group) == ("index", "reference")
    assert (one.changes, one.p_before, one.p_after) == pytest.approx((other.changes, other.p_before, other.p_after))


def test_gaps(table: Table) -> None:
    """Not below at the start, nothing to test, nobody there: each is said, and p comes with the first."""
    not_below = fragility(table(10, 90, 12, 88))
    assert isinstance(not_below, Gap)
    assert not_below.key == "fragility-not-below"
    assert not_below.facts["p"] == fisher(table(10, 90, 12, 88))
    assert _found(table(10, 90, 10, 90), 0.05) == "fragility-not-below"
    assert _found(table(0, 10, 0, 10), 0.05) == "no-events"
    assert _found(table(10, 0, 10, 0), 0.05) == "no-non-events"
    assert _found(table(0, 0, 1, 10), 0.05) == "empty-index-group"
    assert _found(table(0, 10, 9, 1), 1.5) == "fragility-not-reached"
