"""Square-and-add of two risks that are printed with their limits."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.stats import risk
from fourcount.stats.difference import newcombe
from fourcount.stats.results import GAP_KEYS, Gap, LimitedRisk, TimedRisks
from fourcount.stats.timed import square_and_add, square_and_add_ratio, timed_difference, timed_ratio
from tables import CELLS, LEVELS, counts_of, given_interval

SHARE = st.floats(0, 1)
LIMITED = st.tuples(SHARE, SHARE, SHARE).map(sorted).map(lambda t: LimitedRisk(low=t[0], risk=t[1], high=t[2]))


def _timed(index: tuple[float, float, float], reference: tuple[float, float, float]) -> TimedRisks:
    """Each risk as (risk, low, high)."""
    one, two = (LimitedRisk(risk=r, low=low, high=high) for r, low, high in (index, reference))
    return TimedRisks(index=one, reference=two, level=0.95)


@given(CELLS, st.sampled_from(LEVELS))
def test_wilson_limits_give_newcombe_s_interval(cells: tuple[int, ...], level: float) -> None:
    """Fed with the Wilson limits of both risks the construction is Newcombe's hybrid score interval."""
    counts = counts_of(cells)
    limited = []
    for events, total in (
        (counts.index_events, counts.index_total),
        (counts.reference_events, counts.reference_total),
    ):
        wilson = given_interval(risk.wilson(events, total, level))
        limited.append(LimitedRisk(risk=events / total, low=wilson.low, high=wilson.high))
    found = given_interval(square_and_add(TimedRisks(index=limited[0], reference=limited[1], level=level)))
    expected = given_interval(newcombe(counts, level))
    assert (found.low, found.high) == pytest.approx((expected.low, expected.high), rel=1e-6, abs=1e-9)


def test_a_printed_pair_of_kaplan_meier_risks() -> None:
    """Invented: 9% (6 to 12) v 17% (13 to 21): -8 points, and the limits by hand: 5 points either way; ratio 0.53."""
    timed = _timed((0.09, 0.06, 0.12), (0.17, 0.13, 0.21))
    assert timed_difference(timed) == pytest.approx(-0.08)
    found = given_interval(square_and_add(timed))
    assert (found.low, found.high) == pytest.approx((-0.13, -0.03))
    ratio = given_interval(square_and_add_ratio(timed))
    low = 9 / 17 * math.exp(-math.hypot(math.log(9 / 6), math.log(21 / 17)))
    high = 9 / 17 * math.exp(math.hypot(math.log(12 / 9), math.log(17 / 13)))
    assert (ratio.low, ratio.high) == pytest.approx((low, high))


@given(LIMITED, LIMITED)
def test_the_difference_s_limits_stay_within_bounds_and_hold_it(one: LimitedRisk, two: LimitedRisk) -> None:
    """The interval holds the difference and never passes -1 or 1 (but for the last digit)."""
    timed = TimedRisks(index=one, reference=two, level=0.95)
    found = square_and_add(timed)
    if isinstance(found, Gap):
        assert found == Gap("no-width")
        return
    assert -1 - 1e-15 <= found.low <= timed_difference(timed) <= found.high <= 1 + 1e-15


@given(LIMITED, LIMITED)
def test_swapping_the_groups_mirrors(one: LimitedRisk, two: LimitedRisk) -> None:
    """The difference changes its sign, the ratio turns to its reciprocal, and so do the limits in turn."""
    there, back = (TimedRisks(index=first, reference=second, level=0.95) for first, second in ((one, two), (two, one)))
    ahead, behind = square_and_add(there), square_and_add(back)
    if not isinstance(ahead, Gap):
        found = given_interval(behind)
        assert (found.low, found.high) == pytest.approx((-ahead.high, -ahead.low), abs=1e-12)
    ahead, behind = square_and_add_ratio(there), square_and_add_ratio(back)
    if isinstance(ahead, Gap):
        assert behind == ahead
    elif 1e-200 < ahead.low <= ahead.high < 1e200:
        found = given_interval(behind)
        assert (found.low, found.high) == pytest.approx((1 / ahead.high, 1 / ahead.low), rel=1e-9)


@given(LIMITED, LIMITED)
def test_the_ratio_s_limits_hold_it(one: LimitedRisk, two: LimitedRisk) -> None:
    """Where there is an interval of the ratio it is ordered, holds the ratio, and stays above or at 0."""
    timed = TimedRisks(index=one, reference=two, level=0.95)
    found, ratio = square_and_add_ratio(timed), timed_ratio(timed)
    if isinstance(found, Gap):
        assert found.key in GAP_KEYS
    else:
        assert isinstance(ratio, float)
        assert 0 <= found.low <= ratio <= found.high


def test_a_limit_of_0_leaves_the_ratio_open_on_its_side() -> None:
    """A lower limit of 0 of the index risk gives a lower limit of 0, one of the reference risk no upper limit."""
    open_below = given_interval(square_and_add_ratio(_timed((0.1, 0.0, 0.2), (0.2, 0.1, 0.3))))
    assert open_below.low == 0
    assert 0.5 < open_below.high < math.inf
    open_above = given_interval(square_and_add_ratio(_timed((0.1, 0.05, 0.2), (0.2, 0.0, 0.3))))
    assert 0 < open_above.low < 0.5
    assert open_above.high == math.inf


@pytest.mark.parametrize(
    ("index", "reference", "ratio", "gap"),
    [
        ((0.0, 0.0, 0.1), (0.2, 0.1, 0.3), 0.0, Gap("endless-log")),
        ((0.2, 0.1, 0.3), (0.0, 0.0, 0.1), math.inf, Gap("endless-log")),
        ((0.0, 0.0, 0.1), (0.0, 0.0, 0.2), Gap("no-events"), Gap("no-events")),
    ],
)
def test_a_risk_of_0_leaves_the_ratio_without_an_interval(
    index: tuple[float, float, float], reference: tuple[float, float, float], ratio: float | Gap, gap: Gap
) -> None:
    """The estimate stands where it exists; its logarithm does not. The difference has its interval."""
    timed = _timed(index, reference)
    assert timed_ratio(timed) == ratio
    assert square_and_add_ratio(timed) == gap
    assert given_interval(square_and_add(timed)).low < timed_difference(timed)


@pytest.mark.parametrize(
    ("index", "key"),
    [
        ((0.1, 0.2, 0.3), "limits-disordered"),
        ((0.1, 0.05, 0.02), "limits-disordered"),
        ((0.1, -0.05, 0.2), "beyond-zero"),
        ((0.9, 0.8, 1.05), "beyond-one"),
        ((math.nan, 0.1, 0.2), "limits-disordered"),
    ],
)
def test_printed_limits_that_cannot_be_are_a_reason(index: tuple[float, float, float], key: str) -> None:
    """An estimate outside its limits, or limits where no risk lies; in either group, for both measures."""
    sound = (0.2, 0.1, 0.3)
    for timed in (_timed(index, sound), _timed(sound, index)):
        assert square_and_add(timed) == Gap(key)
        assert square_and_add_ratio(timed) == Gap(key)


def test_limits_without_width_are_a_reason() -> None:
    """Both risks printed as their own limits say nothing of chance."""
    timed = _timed((0.1, 0.1, 0.1), (0.2, 0.2, 0.2))
    assert square_and_add(timed) == Gap("no-width")
    assert square_and_add_ratio(timed) == Gap("no-width")


def test_another_level_than_the_printed_one_has_no_interval() -> None:
    """At the printed level, asked for or not, the interval is the same; at another one it is a gap."""
    timed = _timed((0.1, 0.05, 0.2), (0.2, 0.1, 0.3))
    for function in (square_and_add, square_and_add_ratio):
        assert function(timed) == function(timed, 0.95)
        assert function(timed, 0.9) == Gap("level-not-printed")
