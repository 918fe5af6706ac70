"""Two bars on one scale, drawn on demand and where no array can be."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.picture.bar_pair import Bar, bar_pair
from fourcount.picture.plan import plan
from fourcount.picture.scales import RISK_ENDS

RISKS = st.floats(0, 1)


@pytest.mark.parametrize(
    ("without", "with_", "top"),
    [(0.12, 0.06, 0.25), (0.95, 0.97, 1.0), (0.0, 0.0, 0.001), (0.00001, 0.00002, 0.001), (0.0, 1.0, 1.0)],
)
def test_bars_end_at_a_round_risk(without: float, with_: float, top: float) -> None:
    """The scale is the least round one that holds both risks; risks too small for icons still have bars."""
    assert bar_pair(plan(without, with_)).top == top


@given(RISKS, RISKS)
def test_lengths_are_the_risks_themselves(without: float, with_: float) -> None:
    """Nothing is rounded: a length is its risk as a share of the scale, the same scale for both."""
    pair = bar_pair(plan(without, with_))
    assert pair.top in RISK_ENDS
    assert pair.without.length * pair.top == pytest.approx(without)
    assert pair.with_.length * pair.top == pytest.approx(with_)
    assert max(pair.without.length, pair.with_.length) <= 1


def test_an_interval_has_its_own_stretch_of_the_second_bar() -> None:
    """12% against 6% (4 to 9%) on a scale to 25%; the first group has none."""
    pair = bar_pair(plan(0.12, 0.06, 0.04, 0.09))
    assert pair.without == Bar(length=0.12 / 0.25)
    assert pair.with_ == Bar(length=0.06 / 0.25, low=0.04 / 0.25, high=0.09 / 0.25)


def test_the_scale_holds_the_interval() -> None:
    """A limit beyond the round risk that would hold the estimates makes the scale longer, and is not cut."""
    pair = bar_pair(plan(0.12, 0.2, 0.1, 0.4))
    assert pair.top == 0.5
    assert pair.with_.high == pytest.approx(0.8)
