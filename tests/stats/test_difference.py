"""Intervals of the risk difference."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

import mpmath
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats import difference
from fourcount.stats.estimates import risk_difference
from fourcount.stats.results import Counts, Gap, Interval
from tables import CELLS, EXTREMES, LEVELS, assert_nested, given_interval

Table = Callable[..., Counts]
Method = Callable[[Counts, float], Interval | Gap]

SCORE = (difference.miettinen_nurminen, difference.mee)
HYBRID = (difference.newcombe, difference.newcombe_continuity)
METHODS = (*SCORE, *HYBRID, difference.agresti_caffo, difference.wald)


def _likeliest_reference_risk(cells: tuple[int, ...], d0: Any) -> Any:
    """Miettinen and Nurminen's closed form of the cubic; its cancellation does not matter in 90 digits."""
    a, b, c, d = (mpmath.mpf(cell) for cell in cells)
    n1, n2, m = a + b, c + d, a + c
    l3 = n1 + n2
    l2, l1, l0 = (n1 + 2 * n2) * d0 - l3 - m, (n2 * d0 - l3 - 2 * c) * d0 + m, c * d0 * (1 - d0)
    q = l2**3 / (27 * l3**3) - l1 * l2 / (6 * l3**2) + l0 / (2 * l3)
    p = mpmath.sign(q) * mpmath.sqrt(l2**2 / (9 * l3**2) - l1 / (3 * l3))
    if p == 0:
        return -l2 / (3 * l3)  # the three roots are one
    angle = (mpmath.pi + mpmath.acos(max(-1, min(1, q / p**3)))) / 3
    return 2 * p * mpmath.cos(angle) - l2 / (3 * l3)


def _statistic(cells: tuple[int, ...], *, finite: bool) -> Callable[[Any], Any]:
    a, b, c, d = cells
    n1, n2, people = a + b, c + d, sum(cells)
    factor = mpmath.mpf(people) / (people - 1) if finite else 1

    def at(d0: Any) -> Any:
        p2 = _likeliest_reference_risk(cells, d0)
        p1 = p2 + d0
        variance = (p1 * (1 - p1) / n1 + p2 * (1 - p2) / n2) * factor
        return (mpmath.mpf(a) / n1 - mpmath.mpf(c) / n2 - d0) / mpmath.sqrt(variance)

    return at


@pytest.mark.parametrize("method", SCORE)
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_score_limits_put_back_into_the_cubic(
    method: Method, level: float, distances_at_limits: Callable[..., Any]
) -> None:
    """At each limit the published statistic is z: to 1e-12 of the limit or 1e-15 of the width, up to 10^9 a cell."""
    finite = method is difference.miettinen_nurminen
    found = distances_at_limits(
        method, level, lambda cells: _statistic(cells, finite=finite), lambda limit: abs(limit) == 1
    )
    for cells, interval, limit, distance in found:
        assert distance <= max(1e-12 * abs(limit), 1e-15 * (interval.high - interval.low)), (cells, limit)


@pytest.mark.parametrize("method", SCORE)
def test_a_difference_of_one_is_its_own_limit(method: Method, table: Table) -> None:
    """10/10 v 0/20: the upper limit is exactly 1; turned round, the lower one exactly -1."""
    for few, many in ((10, 20), (1, 1), (10**9, 3)):
        upper, lower = (
            given_interval(method(table(few, 0, 0, many), 0.95)),
            given_interval(method(table(0, many, few, 0), 0.95)),
        )
        assert upper.high == 1
        assert lower.low == -1
        assert upper.low < 1
        assert lower.high > -1


def test_newcombes_table(table: Table) -> None:
    """Newcombe 1998, Stat Med 17:873, table II: methods 5, 6 and 10."""
    printed = {
        (difference.mee, (56, 14, 48, 32)): (0.0533, 0.3377),
        (difference.miettinen_nurminen, (9, 1, 3, 7)): (0.1700, 0.8406),
        (difference.miettinen_nurminen, (0, 10, 0, 20)): (-0.1658, 0.2844),
        (difference.newcombe, (5, 51, 0, 29)): (-0.0381, 0.1926),
        (difference.newcombe_continuity, (9, 1, 3, 7)): (0.1013, 0.8387),
    }
    for (method, cells), limits in printed.items():
        interval = given_interval(method(table(*cells), 0.95))
        assert (interval.low, interval.high) == pytest.approx(limits, abs=5e-5)


def _wilson(x: Any, n: Any, z: Any, shift: int) -> Any:
    """The lower (shift -1) and upper (shift 1) Wilson limits with half an event's correction, and without it."""
    p = x / n
    plain = (2 * x + z * z + shift * z * mpmath.sqrt(z * z + 4 * x * (1 - p))) / (2 * (n + z * z))
    if (x == 0 and shift < 0) or (x == n and shift > 0):
        return plain, p
    inside = z * z + shift * 2 - 1 / n + 4 * p * (n * (1 - p) - shift)
    return plain, (2 * x + z * z + shift + shift * z * mpmath.sqrt(inside)) / (2 * (n + z * z))


@pytest.mark.parametrize("which", [0, 1])
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_square_and_add_keeps_every_digit(
    which: int, level: float, table: Table, exact_z: Callable[[float], Any]
) -> None:
    """Equal to Newcombe's printed formula in 50 digits, also where a distance is 1e-5 of its risk."""
    z = exact_z(level)
    for cells in EXTREMES:
        interval = given_interval(HYBRID[which](table(*cells), level))
        with mpmath.workdps(50):
            a, b, c, d = (mpmath.mpf(cell) for cell in cells)
            n1, n2 = a + b, c + d
            l1, u1, l2, u2 = (_wilson(x, n, z, shift)[which] for x, n in ((a, n1), (c, n2)) for shift in (-1, 1))
            low = a / n1 - c / n2 - mpmath.sqrt((a / n1 - l1) ** 2 + (u2 - c / n2) ** 2)
            high = a / n1 - c / n2 + mpmath.sqrt((u1 - a / n1) ** 2 + (c / n2 - l2) ** 2)
            error = max(abs(interval.low - low), abs(interval.high - high))
        assert error <= 1e-15 * (interval.high - interval.low) + 1e-12 * min(abs(interval.low), abs(interval.high))


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_wald_and_agresti_caffo_keep_every_digit(level: float, table: Table, exact_z: Callable[[float], Any]) -> None:
    """Equal to their formulas in 50 digits."""
    z = exact_z(level)
    for cells in EXTREMES:
        for method, added in ((difference.wald, 0), (difference.agresti_caffo, 1)):
            interval = method(table(*cells), level)
            if isinstance(interval, Gap):
                continue
            with mpmath.workdps(50):
                a, b, c, d = (mpmath.mpf(cell + added) for cell in cells)
                p1, p2 = a / (a + b), c / (c + d)
                half_width = z * mpmath.sqrt(p1 * (1 - p1) / (a + b) + p2 * (1 - p2) / (c + d))
                error = max(abs(interval.low - p1 + p2 + half_width), abs(interval.high - p1 + p2 - half_width))
            assert error <= 2e-15 * max(interval.high - interval.low, abs(interval.low), abs(interval.high))


def test_the_textbook_width_is_never_zero(table: Table) -> None:
    """Risks of 0 or 1 on both sides leave the bare formula without a width: a gap. One such side does not."""
    for cells in ((0, 10, 0, 10), (10, 0, 0, 20), (10, 0, 20, 0)):
        assert difference.wald(table(*cells), 0.95) == Gap("zero-width")
    interval = given_interval(difference.wald(table(5, 51, 0, 29), 0.95))
    assert (interval.low, interval.high) == pytest.approx((0.0146, 0.1640), abs=5e-5)  # Newcombe 1998, table II


def test_agresti_caffo_is_given_beyond_one(table: Table) -> None:
    """10/10 v 0/20: the upper limit is 1.05, as the method has it."""
    assert given_interval(difference.agresti_caffo(table(10, 0, 0, 20), 0.95)).high == pytest.approx(
        1.050181004541, rel=1e-12
    )


@pytest.mark.parametrize("method", METHODS)
def test_an_empty_group_has_no_difference(method: Method, table: Table) -> None:
    """Nobody in a group: a gap that names it."""
    assert method(table(0, 0, 3, 7), 0.95) == Gap("empty-index-group")
    assert method(table(3, 7, 0, 0), 0.95) == Gap("empty-reference-group")
    assert method(table(0, 0, 0, 0), 0.95) == Gap("empty-table")


@settings(max_examples=150)
@given(cells=CELLS, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate(table: Table, cells: tuple[int, ...], level: float) -> None:
    """low <= D <= high within -1 to 1. Agresti-Caffo is exempt (10/10 v 0/10 at 80%), Wald from the bounds."""
    counts = table(*cells)
    estimate = risk_difference(counts)
    assert isinstance(estimate, float)
    for method in METHODS:
        interval = method(counts, level)
        if isinstance(interval, Gap):
            continue
        assert interval.low < interval.high
        if method is not difference.agresti_caffo:
            assert interval.low <= estimate <= interval.high
        if method in SCORE or method in HYBRID:
            assert interval.low >= -1
            assert interval.high <= 1


@settings(max_examples=80)
@given(cells=CELLS)
def test_a_higher_level_is_never_narrower(table: Table, cells: tuple[int, ...]) -> None:
    """Each interval lies within the one of the next higher level."""
    for method in METHODS:
        assert_nested(method(table(*cells), level) for level in LEVELS)


@settings(max_examples=80)
@given(cells=CELLS, level=st.sampled_from(LEVELS))
def test_swapped_groups_and_outcomes_mirror(table: Table, cells: tuple[int, ...], level: float) -> None:
    """Either swap turns the difference and its limits round 0."""
    a, b, c, d = cells
    for method in METHODS:
        one = method(table(a, b, c, d), level)
        for swapped in (table(c, d, a, b), table(b, a, d, c)):
            other = method(swapped, level)
            if isinstance(one, Gap):
                assert other == one
                continue
            close = 4e-15 * max(one.high - one.low, abs(one.low), abs(one.high))
            assert one.low == pytest.approx(-given_interval(other).high, rel=0, abs=close)
            assert one.high == pytest.approx(-given_interval(other).low, rel=0, abs=close)
