"""The default family speaks with one voice about no effect."""

from __future__ import annotations

from collections.abc import Callable

from hypothesis import assume, example, given, settings
from hypothesis import strategies as st

from fourcount.stats import difference, odds, ratio
from fourcount.stats.association import n_minus_1
from fourcount.stats.results import Counts, Gap, Interval

Table = Callable[..., Counts]

CELL = st.integers(0, 50) | st.integers(0, 5) | st.sampled_from([10**5, 100_700, 10**9, 10**9 - 100_000])
CELLS = st.tuples(CELL, CELL, CELL, CELL).filter(lambda cells: cells[0] + cells[1] > 0 < cells[2] + cells[3])


@settings(max_examples=400)
@given(cells=CELLS, level=st.sampled_from((0.8, 0.9, 0.95, 0.99, 0.999)))
@example(cells=(0, 10, 0, 20), level=0.95)
@example(cells=(10, 0, 20, 0), level=0.95)
@example(cells=(10, 0, 0, 20), level=0.95)
@example(cells=(0, 10**9, 5, 10**9), level=0.95)
def test_difference_ratio_odds_ratio_and_p_agree_about_no_effect(
    table: Table, cells: tuple[int, ...], level: float
) -> None:
    """The three Miettinen-Nurminen intervals leave no effect out together, and just where the (N-1) p says so.

    Where there is nothing to test, none of them leaves it out.
    """
    counts = table(*cells)
    p = n_minus_1(counts)
    assert isinstance(p, float) or 0 in (counts.events, counts.non_events)
    assume(isinstance(p, Gap) or abs(p - (1 - level)) > 1e-9)  # on the border itself a last bit decides
    apart = []
    for method, no_effect in (
        (difference.miettinen_nurminen, 0),
        (ratio.miettinen_nurminen, 1),
        (odds.miettinen_nurminen, 1),
    ):
        interval = method(counts, level)
        assert isinstance(interval, Interval)
        apart.append(not interval.low <= no_effect <= interval.high)
    assert apart == [isinstance(p, float) and p < 1 - level] * 3


@settings(max_examples=100)
@given(cells=st.tuples(*[st.integers(1, 40)] * 4))
def test_they_meet_no_effect_at_the_level_of_p(table: Table, cells: tuple[int, ...]) -> None:
    """At the level 1 - p a limit of each of the three lies on no effect itself."""
    counts = table(*cells)
    p = n_minus_1(counts)
    assert isinstance(p, float)
    assume(0.001 < p < 0.9)
    for method, no_effect in ((ratio.miettinen_nurminen, 1.0), (odds.miettinen_nurminen, 1.0)):
        interval = method(counts, 1 - p)
        assert isinstance(interval, Interval)
        assert min(abs(interval.low - no_effect), abs(interval.high - no_effect)) < 1e-11
    interval = difference.miettinen_nurminen(counts, 1 - p)
    assert isinstance(interval, Interval)
    width = interval.high - interval.low
    assert min(abs(interval.low), abs(interval.high)) < 1e-11 * width
