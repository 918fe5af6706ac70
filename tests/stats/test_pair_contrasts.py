"""Intervals of the difference and the ratio of pairs: against 90 digits, put back, and by their properties."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any

import mpmath
import numpy as np
import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st

from fourcount.stats import mcnemar, pair_contrasts, pairs
from fourcount.stats.results import Gap, Interval, PairCounts
from paired_tables import EXTREME_PAIRS, PAIRS, pairs_of, random_pairs
from tables import LEVELS, assert_nested, given_interval

Method = Callable[[PairCounts, float], Interval | Gap]

DIFFERENCE = (pair_contrasts.newcombe_paired, pair_contrasts.tango, pair_contrasts.wald_paired)
RATIO = (pair_contrasts.bonett_price, pair_contrasts.wald_log_paired_ratio)
SOME = [*EXTREME_PAIRS, *random_pairs(20261201, 300)]


def _wilson(x: Any, n: Any, z: Any) -> tuple[Any, Any]:
    root = z * mpmath.sqrt(z * z + 4 * x * (1 - mpmath.mpf(x) / n))
    low, high = (2 * x + z * z - root) / (2 * (n + z * z)), (2 * x + z * z + root) / (2 * (n + z * z))
    return (low if x else mpmath.mpf(0)), (high if x < n else mpmath.mpf(1))


def _newcombe(e: int, f: int, g: int, h: int, z: Any) -> tuple[Any, Any]:
    """The formula as it is printed."""
    n = mpmath.mpf(e + f + g + h)
    p1, p2 = (e + f) / n, (e + g) / n
    (l1, u1), (l2, u2) = _wilson(e + f, n, z), _wilson(e + g, n, z)
    root = mpmath.sqrt((e + f) * (g + h) * (e + g) * (f + h))
    top = mpmath.mpf(e * h - f * g)
    if top > 0:
        top = max(top - n / 2, 0)
    phi = top / root if root else 0
    below = mpmath.sqrt((p1 - l1) ** 2 - 2 * phi * (p1 - l1) * (u2 - p2) + (u2 - p2) ** 2)
    above = mpmath.sqrt((u1 - p1) ** 2 - 2 * phi * (u1 - p1) * (p2 - l2) + (p2 - l2) ** 2)
    return p1 - p2 - below, p1 - p2 + above


def _wald(e: int, f: int, g: int, h: int, z: Any) -> tuple[Any, Any] | str:
    n = mpmath.mpf(e + f + g + h)
    half = z * mpmath.sqrt(f + g - (f - g) ** 2 / n) / n
    return ((f - g) / n - half, (f - g) / n + half) if half else "zero-width"


def _bonett_price(e: int, f: int, g: int, _h: int, z: Any) -> tuple[Any, Any] | str:
    some, index, reference = mpmath.mpf(e + f + g), e + f, e + g
    if not some:
        return "no-events"
    a = mpmath.sqrt(mpmath.mpf(f + g + 2) / ((index + 1) * (reference + 1)))
    b = mpmath.sqrt((1 - (index + 1) / (some + 2)) / (index + 1))
    c = mpmath.sqrt((1 - (reference + 1) / (some + 2)) / (reference + 1))
    k = z * a / (b + c)
    (l1, u1), (l2, u2) = _wilson(index, some, k), _wilson(reference, some, k)
    return l1 / u2, (u1 / l2 if l2 else mpmath.inf)


def _log_ratio(e: int, f: int, g: int, _h: int, z: Any) -> tuple[Any, Any] | str:
    index, reference = mpmath.mpf(e + f), mpmath.mpf(e + g)
    if index == reference == 0:
        return "no-events"
    if index == 0 or reference == 0:
        return "zero-count"
    if f + g == 0:
        return "zero-width"
    factor = mpmath.exp(z * mpmath.sqrt(1 / index + 1 / reference - 2 * e / (index * reference)))
    return index / reference / factor, index / reference * factor


FORMULAS = {
    pair_contrasts.newcombe_paired: _newcombe,
    pair_contrasts.wald_paired: _wald,
    pair_contrasts.bonett_price: _bonett_price,
    pair_contrasts.wald_log_paired_ratio: _log_ratio,
}


@pytest.mark.parametrize("method", FORMULAS)
@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_closed_forms_agree_with_90_digits(method: Method, level: float, exact_z: Callable[[float], Any]) -> None:
    """The printed formula at 90 digits, over 300 random tables and every combination of 0, 1, 3, 10^5 and 10^9."""
    z = exact_z(level)
    for cells in SOME:
        with mpmath.workdps(90):
            wanted = FORMULAS[method](*cells, z)  # type: ignore[operator]
        found = method(pairs_of(cells), level)
        if isinstance(wanted, str):
            assert found == Gap(wanted), cells
            continue
        interval = given_interval(found)
        width = float(wanted[1] - wanted[0])
        for limit, exactly in zip((interval.low, interval.high), map(float, wanted), strict=True):
            off = 0.0 if limit == exactly else abs(limit - exactly)  # both may be infinite
            assert off <= max(1e-12 * abs(exactly), 1e-13 * width if width < math.inf else 0), (cells, limit, exactly)


def _tango_statistic(cells: tuple[int, ...]) -> Callable[[Any], Any]:
    """The published statistic."""
    _e, f, g, _h = cells
    n = sum(cells)

    def at(d0: Any) -> Any:
        a, b, c = 2 * n, -f - g + (2 * n - f + g) * d0, -g * d0 * (1 - d0)
        q = (mpmath.sqrt(b**2 - 4 * a * c) - b) / (2 * a)
        return (f - g - n * d0) / mpmath.sqrt(n * (2 * q + d0 * (1 - d0)))

    return at


@pytest.mark.parametrize("level", [0.8, 0.95, 0.999])
def test_tangos_limits_put_back_into_the_statistic(
    level: float, exact_z: Callable[[float], Any], distance_from_root: Callable[..., float]
) -> None:
    """At each limit the published statistic is z, from single pairs to 10^9 a cell."""
    z = exact_z(level)
    for cells in SOME:
        interval = given_interval(pair_contrasts.tango(pairs_of(cells), level))
        for limit, target in ((interval.low, z), (interval.high, -z)):
            if abs(limit) != 1:
                distance = distance_from_root(_tango_statistic(cells), limit, target)
                assert distance <= max(1e-13 * abs(limit), 1e-13 * (interval.high - interval.low)), (cells, limit)


def test_tango_without_discordance_in_closed_form() -> None:
    """All pairs agree: -+ z^2 / (n + z^2)."""
    for cells in ((3, 0, 0, 7), (0, 0, 0, 1), (10**9, 0, 0, 10**9)):
        n, square = sum(cells), 1.959963984540054**2
        interval = given_interval(pair_contrasts.tango(pairs_of(cells), 0.95))
        assert (interval.low, interval.high) == pytest.approx((-square / (n + square), square / (n + square)))


@pytest.mark.parametrize("method", [pair_contrasts.newcombe_paired, pair_contrasts.tango])
def test_a_difference_of_one_is_its_own_limit(method: Method) -> None:
    """All pairs disagree the same way: that limit is exactly 1 or -1, the other lies inside."""
    for pairs_seen in (1, 12, 10**9):
        upper = given_interval(method(pairs_of((0, pairs_seen, 0, 0)), 0.95))
        lower = given_interval(method(pairs_of((0, 0, pairs_seen, 0)), 0.95))
        assert (upper.high, lower.low) == (1, -1)
        assert -1 < upper.low < 1
        assert -1 < lower.high < 1


@pytest.mark.parametrize("cells", [(20, 12, 5, 30), (3, 9, 1, 7), (794, 150, 86, 570)])
def test_wald_is_the_mean_of_the_differences_within_pairs(cells: tuple[int, int, int, int]) -> None:
    """numpy's mean and standard deviation of +1, -1 and 0, one a pair, give the same interval."""
    e, f, g, h = cells
    within = np.repeat([0.0, 1.0, -1.0], [e + h, f, g])
    half = 1.959963984540054 * within.std() / math.sqrt(len(within))
    interval = given_interval(pair_contrasts.wald_paired(pairs_of(cells), 0.95))
    assert (interval.low, interval.high) == pytest.approx((within.mean() - half, within.mean() + half), rel=1e-12)


@settings(max_examples=200)
@given(cells=PAIRS, level=st.sampled_from(LEVELS))
def test_intervals_hold_their_estimate(cells: tuple[int, ...], level: float) -> None:
    """low <= estimate <= high with a width above 0; score intervals of the difference keep to -1 to 1."""
    counts = pairs_of(cells)
    for methods, estimate in ((DIFFERENCE, pairs.difference(counts)), (RATIO, pairs.ratio(counts))):
        for method in methods:
            found = method(counts, level)
            if isinstance(found, Gap):
                continue
            assert isinstance(estimate, float)
            assert found.low <= estimate <= found.high
            assert found.low < found.high
            if method in (pair_contrasts.newcombe_paired, pair_contrasts.tango):
                assert -1 <= found.low < found.high <= 1
            if method in RATIO:
                assert found.low >= 0


@settings(max_examples=100)
@given(cells=PAIRS)
def test_a_higher_level_is_never_narrower(cells: tuple[int, ...]) -> None:
    """Each interval lies within the one of the next higher level."""
    for method in (*DIFFERENCE, *RATIO):
        assert_nested(method(pairs_of(cells), level) for level in LEVELS)


@settings(max_examples=200)
@given(cells=PAIRS, level=st.sampled_from(LEVELS))
def test_swapped_sides_mirror(cells: tuple[int, ...], level: float) -> None:
    """Exchanging the sides changes the sign of differences and turns ratios upside down."""
    e, f, g, h = cells
    for method in (*DIFFERENCE, *RATIO):
        one, other = method(pairs_of((e, f, g, h)), level), method(pairs_of((e, g, f, h)), level)
        if isinstance(one, Gap):
            assert one == other
            continue
        mirrored = given_interval(other)
        if method in DIFFERENCE:
            wanted = (-mirrored.high, -mirrored.low)
        else:
            wanted = (1 / mirrored.high, 1 / mirrored.low if mirrored.low else math.inf)
        assert (one.low, one.high) == pytest.approx(wanted, rel=1e-12, abs=1e-15)


@settings(max_examples=100)
@given(cells=PAIRS, level=st.sampled_from(LEVELS))
def test_counting_the_other_outcome_changes_only_the_sign_of_a_difference(cells: tuple[int, ...], level: float) -> None:
    """Both and neither exchanged, index only and reference only exchanged: the limits change sign."""
    e, f, g, h = cells
    for method in DIFFERENCE:
        one, other = method(pairs_of((e, f, g, h)), level), method(pairs_of((h, g, f, e)), level)
        if isinstance(one, Gap):
            assert one == other
            continue
        mirrored = given_interval(other)
        assert (one.low, one.high) == pytest.approx((-mirrored.high, -mirrored.low), rel=1e-11, abs=1e-15)


@settings(max_examples=300)
@given(cells=PAIRS, level=st.sampled_from(LEVELS))
def test_tango_leaves_out_no_effect_just_where_mcnemar_does(cells: tuple[int, ...], level: float) -> None:
    """At a difference of 0 the statistic is McNemar's."""
    counts = pairs_of(cells)
    p = mcnemar.mcnemar(counts)
    assume(isinstance(p, Gap) or abs(p - (1 - level)) > 1e-9)  # on the border itself a last bit decides
    interval = given_interval(pair_contrasts.tango(counts, level))
    assert (not interval.low <= 0 <= interval.high) == (isinstance(p, float) and p < 1 - level)


@pytest.mark.parametrize("method", [*DIFFERENCE, *RATIO])
def test_no_pair_has_no_interval(method: Method) -> None:
    """Nobody at all: a gap."""
    assert method(pairs_of((0, 0, 0, 0)), 0.95) == Gap("empty-pairs")


def test_pairs_without_any_event_have_no_ratio_but_a_difference() -> None:
    """0/0 is a gap; the difference is 0 with an interval round it."""
    counts = pairs_of((0, 0, 0, 9))
    assert pair_contrasts.bonett_price(counts, 0.95) == Gap("no-events") == pairs.ratio(counts)
    assert given_interval(pair_contrasts.newcombe_paired(counts, 0.95)).high > 0


def test_bonett_and_price_where_one_side_has_no_event() -> None:
    """No event on the index side: from 0. None on the reference side: to infinity. Log limits do not exist there."""
    few, many = pairs_of((0, 0, 4, 9)), pairs_of((0, 4, 0, 9))
    low, high = (
        given_interval(pair_contrasts.bonett_price(few, 0.95)),
        given_interval(pair_contrasts.bonett_price(many, 0.95)),
    )
    assert (low.low, high.high) == (0, math.inf)
    assert low.high == pytest.approx(1 / high.low)
    assert pair_contrasts.wald_log_paired_ratio(few, 0.95) == Gap("zero-count")
    assert pair_contrasts.wald_log_paired_ratio(many, 0.95) == Gap("zero-count")
