"""How precise a starting risk is: the scale on which it moves, counted or printed with limits."""

from __future__ import annotations

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats.normal import quantile
from fourcount.stats.propagation import StartLimits, limits_as_typed, limits_of_counts
from fourcount.stats.results import Gap, Interval
from fourcount.stats.risk import wilson
from tables import LEVELS

COUNTED = st.integers(5, 5000).flatmap(lambda total: st.tuples(st.integers(0, total), st.just(total)))


@settings(max_examples=150)
@given(counts=COUNTED, level=st.sampled_from(LEVELS))
def test_printed_wilson_limits_are_as_good_as_the_counts(counts: tuple[int, int], level: float) -> None:
    """A starting risk with Wilson's limits in print moves on the same scale as the counts behind it."""
    limits = wilson(*counts, level)
    assert isinstance(limits, Interval)
    value = counts[0] / counts[1]
    typed = limits_as_typed(value, limits.low, limits.high, level)
    assert isinstance(typed, StartLimits)
    own = limits_of_counts(*counts)
    assert isinstance(own, StartLimits)
    for z in (-3.0, -1.0, -0.1, 0.0, 0.1, 1.0, 2.5):
        assert typed.at(z) == pytest.approx(own.at(z), rel=1e-6, abs=1e-12)


@given(
    value=st.floats(0.01, 0.99), down=st.floats(0.01, 1), up=st.floats(0.01, 1), level=st.sampled_from(LEVELS)
)  # fmt: skip
def test_the_scale_runs_through_what_was_typed(value: float, down: float, up: float, level: float) -> None:
    """At 0 it is the value, at the level's z the limits, and it rises all the way within 0 to 1."""
    low, high = value * (1 - down), value + (1 - value) * up
    start = limits_as_typed(value, low, high, level)
    assert isinstance(start, StartLimits)
    z = quantile(level)
    assert start.at(0.0) == value
    assert start.at(-z) == pytest.approx(low, rel=1e-9, abs=1e-15)
    assert start.at(z) == pytest.approx(high, rel=1e-9)
    walked = [start.at(z * step / 10) for step in range(-20, 21)]
    assert walked == sorted(walked)
    assert walked[0] >= 0
    assert walked[-1] <= 1


def test_limits_that_bound_nothing_stand_on_their_side() -> None:
    """A printed limit of 0, or of 100%, is met at once on its side; a limit on the value moves nowhere."""
    open_below = limits_as_typed(0.02, 0.0, 0.05, 0.95)
    fixed_above = limits_as_typed(0.02, 0.01, 0.02, 0.95)
    everybody = limits_as_typed(0.9, 0.8, 1.0, 0.95)
    assert isinstance(open_below, StartLimits)
    assert isinstance(fixed_above, StartLimits)
    assert isinstance(everybody, StartLimits)
    assert open_below.at(-0.1) == 0.0
    assert fixed_above.at(2.0) == 0.02
    assert everybody.at(0.1) == 1.0
    none = limits_as_typed(0.0, 0.0, 0.03, 0.95)
    assert isinstance(none, StartLimits)
    assert none.at(-1.0) == 0.0
    assert none.at(quantile(0.95)) == pytest.approx(0.03)


@pytest.mark.parametrize(("value", "low", "high"), [(0.1, 0.2, 0.3), (0.1, 0.05, 0.08), (0.1, -0.1, 0.2), (0.9, 0.8, 1.1)])  # fmt: skip  # noqa: E501
def test_limits_that_do_not_hold_the_value_are_a_gap(value: float, low: float, high: float) -> None:
    """What was typed has to lie between its limits, and they within 0 to 1."""
    assert limits_as_typed(value, low, high, 0.95) == Gap("limits-disordered")


def test_what_gives_no_scale_is_a_gap() -> None:
    """Limits that fall together, and nobody counted."""
    assert limits_as_typed(0.1, 0.1, 0.1, 0.95) == Gap("no-width")
    assert limits_of_counts(0, 0) == Gap("empty-group")
