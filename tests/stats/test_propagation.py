"""An effect and a starting risk of other people, propagated together."""

from __future__ import annotations

import math
from typing import Any

import numpy as np
import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st
from scipy.stats import norm
from statsmodels.stats.proportion import proportion_confint

from fourcount.stats.conversion import Effect, risk_with
from fourcount.stats.hazards import over_spans
from fourcount.stats.normal import quantile
from fourcount.stats.propagation import Limits, Propagated, StartLimits, limits_as_typed, limits_of_counts, propagated
from fourcount.stats.results import Gap, Interval
from tables import LEVELS

EFFECTS: tuple[Effect, ...] = ("risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio", "risk_difference")
RATIOS: tuple[Effect, ...] = ("risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio")
PEOPLE = st.integers(5, 5000)
PARTS = ("with_", "difference", "risk_ratio")


@st.composite
def effects(draw: Any) -> tuple[Effect, float, Interval]:
    """An effect with limits that need not lie symmetrically about it."""
    effect = draw(st.sampled_from(EFFECTS))
    below, above = draw(st.floats(0.01, 1.5)), draw(st.floats(0.01, 1.5))
    if effect == "risk_difference":
        estimate = draw(st.floats(-0.3, 0.3))
        return effect, estimate, Interval(low=estimate - below / 10, high=estimate + above / 10)
    estimate = draw(st.floats(0.1, 4))
    return effect, estimate, Interval(low=estimate * math.exp(-below), high=estimate * math.exp(above))


@st.composite
def counted(draw: Any) -> tuple[int, int]:
    """Events among people."""
    total = draw(PEOPLE)
    return draw(st.integers(0, total)), total


def given_one(found: Propagated | Gap) -> Propagated:
    """What was propagated, where it has to be."""
    assert isinstance(found, Propagated), found
    return found


def start_of(events: int, total: int) -> StartLimits:
    """A counted starting risk."""
    found = limits_of_counts(events, total)
    assert isinstance(found, StartLimits)
    return found


def circle(
    effect: Effect, estimate: float, interval: Interval, level: float, events: int, total: int
) -> dict[str, Any]:
    """The figures over a dense circle, by scipy's normal quantile and statsmodels' Wilson limits."""
    z = norm.isf((1 - level) / 2)
    angles = np.linspace(0, 2 * np.pi, 8001)
    z1, z2 = z * np.cos(angles), z * np.sin(angles)
    counts, people = np.full(z1.shape, events), np.full(z1.shape, total)
    lows, highs = proportion_confint(counts, people, alpha=2 * norm.sf(np.abs(z1)), method="wilson")
    start = np.where(z1 >= 0, highs, lows)
    if effect == "risk_difference":
        error = np.where(z2 >= 0, interval.high - estimate, estimate - interval.low) / z
        with_ = start + estimate + error * z2
        return {"with_": with_, "difference": estimate + error * z2}
    error = np.where(z2 >= 0, np.log(interval.high / estimate), np.log(estimate / interval.low)) / z
    value = estimate * np.exp(error * z2)
    if effect == "risk_ratio":
        with_ = start * value
    elif effect == "odds_ratio":
        odds = start / (1 - start) * value
        with_ = odds / (1 + odds)
    else:
        with_ = 1 - (1 - start) ** value
    return {"with_": with_, "difference": with_ - start, "risk_ratio": with_ / start}


@settings(max_examples=150, deadline=None)
@given(one=effects(), events=st.integers(1, 300), others=st.integers(1, 300), level=st.sampled_from(LEVELS))
def test_the_limits_are_the_ends_of_the_circle(
    one: tuple[Effect, float, Interval], events: int, others: int, level: float
) -> None:
    """Least and greatest over 8,001 points of the full circle, computed from libraries (Newcombe 2011)."""
    effect, estimate, interval = one
    found = given_one(propagated(effect, estimate, interval, level, start_of(events, events + others)))
    for name, values in circle(effect, estimate, interval, level, events, events + others).items():
        limits: Limits = getattr(found, name)
        if not isinstance(limits.low, Gap):
            assert limits.low == pytest.approx(values.min(), rel=1e-5, abs=1e-7)
            assert limits.low <= values.min() + 1e-9
        if not isinstance(limits.high, Gap):
            assert limits.high == pytest.approx(values.max(), rel=1e-5, abs=1e-7)
            assert limits.high >= values.max() - 1e-9
        if effect in ("odds_ratio", "hazard_ratio", "rate_ratio"):
            assert not isinstance(limits.low, Gap)
            assert not isinstance(limits.high, Gap)


@settings(max_examples=150, deadline=None)
@given(one=effects(), counts=counted(), level=st.sampled_from(LEVELS), spans=st.sampled_from([0.2, 1.0, 5.0]))
def test_every_range_holds_its_estimate(
    one: tuple[Effect, float, Interval], counts: tuple[int, int], level: float, spans: float
) -> None:
    """Risk with, difference and risk ratio at the two estimates lie within their limits, over any span."""
    effect, estimate, interval = one
    start = start_of(*counts)
    with_ = risk_with(effect, estimate, start.value)
    assume(isinstance(with_, float) and start.value > 0)
    assert isinstance(with_, float)
    found = given_one(propagated(effect, estimate, interval, level, start, spans))
    after, before = over_spans(with_, spans), over_spans(start.value, spans)
    for limits, value in ((found.with_, after), (found.difference, after - before), (found.risk_ratio, after / before)):
        assert isinstance(limits.low, Gap) or limits.low <= value + 1e-12 + 1e-12 * abs(value)
        assert isinstance(limits.high, Gap) or limits.high >= value - 1e-12 - 1e-12 * abs(value)


@settings(max_examples=100, deadline=None)
@given(one=effects(), counts=counted())
def test_wider_at_a_higher_level(one: tuple[Effect, float, Interval], counts: tuple[int, int]) -> None:
    """With intervals of the same errors, a higher level gives limits that lie no nearer."""
    effect, estimate, interval = one

    def at(level: float) -> Propagated | Gap:
        part = quantile(level) / quantile(0.95)
        if effect == "risk_difference":
            low, high = estimate - (estimate - interval.low) * part, estimate + (interval.high - estimate) * part
        else:
            low, high = estimate * (interval.low / estimate) ** part, estimate * (interval.high / estimate) ** part
        return propagated(effect, estimate, Interval(low=low, high=high), level, start_of(*counts))

    inner, outer = given_one(at(0.9)), given_one(at(0.99))
    for name in PARTS:
        narrow, wide = getattr(inner, name), getattr(outer, name)
        for near, far, sign in ((narrow.low, wide.low, 1), (narrow.high, wide.high, -1)):
            if not isinstance(near, Gap) and not isinstance(far, Gap):
                assert sign * far <= sign * near + 1e-12


@pytest.mark.parametrize("effect", EFFECTS)
def test_a_certain_starting_risk_leaves_the_effect_alone(effect: Effect) -> None:
    """Without imprecision of its own the limits are those of the effect at that risk (Cochrane Handbook 15.4.4)."""
    interval = Interval(low=-0.12, high=0.05) if effect == "risk_difference" else Interval(low=0.51, high=1.31)
    estimate = -0.04 if effect == "risk_difference" else 0.77
    start = StartLimits(value=0.2, below=math.inf, above=math.inf)
    found = given_one(propagated(effect, estimate, interval, 0.95, start))
    low, high = risk_with(effect, interval.low, 0.2), risk_with(effect, interval.high, 0.2)
    assert isinstance(low, float)
    assert isinstance(high, float)
    assert found.with_ == Limits(low=pytest.approx(low, rel=1e-14), high=pytest.approx(high, rel=1e-14))
    assert found.difference.low == pytest.approx(low - 0.2, rel=1e-12)
    assert found.difference.high == pytest.approx(high - 0.2, rel=1e-12)
    assert found.risk_ratio == Limits(low=pytest.approx(low / 0.2), high=pytest.approx(high / 0.2))


@pytest.mark.parametrize("effect", RATIOS)
def test_it_shrinks_to_the_effects_limits_as_the_starting_risk_grows_certain(effect: Effect) -> None:
    """The more people the same starting risk was counted in, the narrower; in the end as the effect alone."""
    interval = Interval(low=0.51, high=0.94)
    widths = []
    for people in (20, 200, 2_000, 200_000, 10**9):
        found = given_one(propagated(effect, 0.69, interval, 0.95, start_of(people // 5, people)))
        assert not isinstance(found.difference.low, Gap)
        assert not isinstance(found.difference.high, Gap)
        widths.append(found.difference.high - found.difference.low)
    assert widths == sorted(widths, reverse=True)
    low, high = risk_with(effect, 0.51, 0.2), risk_with(effect, 0.94, 0.2)
    assert isinstance(low, float)
    assert isinstance(high, float)
    assert widths[-1] == pytest.approx(high - low, rel=1e-6)


@pytest.mark.parametrize("ratio", [0.4, 1.7])
def test_a_certain_effect_leaves_the_starting_risks_limits(ratio: float) -> None:
    """With a risk ratio that is certain, Newcombe's Wilson limits of 15/148 (1998) are multiplied by it."""
    interval = Interval(low=ratio, high=ratio)
    start = start_of(15, 148)
    found = given_one(propagated("risk_ratio", ratio, interval, 0.95, start))
    low, high = start.at(-quantile(0.95)), start.at(quantile(0.95))
    assert low == pytest.approx(0.0624, abs=5e-5)  # Newcombe 1998, Stat Med 17:857, Table I
    assert high == pytest.approx(0.1605, abs=5e-5)
    assert found.with_.low == pytest.approx(low * ratio, rel=1e-12)
    assert found.with_.high == pytest.approx(high * ratio, rel=1e-12)


def test_a_constant_difference_has_its_own_limits() -> None:
    """Whatever the starting risk, a difference kept constant is what the study says; the risks move with the start."""
    interval = Interval(low=-0.08, high=0.03)
    for counts in ((30, 100), (300, 1000)):
        found = given_one(propagated("risk_difference", -0.02, interval, 0.95, start_of(*counts)))
        assert found.difference.low == pytest.approx(-0.08, rel=1e-12)
        assert found.difference.high == pytest.approx(0.03, rel=1e-12)
        assert isinstance(found.with_.low, float)
        assert found.with_.low < 0.3 - 0.08


@settings(max_examples=100, deadline=None)
@given(counts=counted(), ratio=st.floats(0.1, 5), below=st.floats(0.05, 1), above=st.floats(0.05, 1))
def test_an_odds_ratio_mirrors_with_the_outcome(
    counts: tuple[int, int], ratio: float, below: float, above: float
) -> None:
    """Counting the other outcome turns the odds ratio over and changes the difference's sign, limits and all."""
    events, total = counts
    interval = Interval(low=ratio * math.exp(-below), high=ratio * math.exp(above))
    turned = Interval(low=1 / interval.high, high=1 / interval.low)
    one = given_one(propagated("odds_ratio", ratio, interval, 0.95, start_of(events, total)))
    other = given_one(propagated("odds_ratio", 1 / ratio, turned, 0.95, start_of(total - events, total)))
    assert isinstance(one.difference.low, float)
    assert isinstance(other.difference.high, float)
    assert one.difference.low == pytest.approx(-other.difference.high, abs=1e-9)
    assert one.with_.low == pytest.approx(1 - other.with_.high, abs=1e-9)  # type: ignore[operator]


def test_an_effect_outside_its_own_limits_is_a_gap() -> None:
    """Limits in the wrong place are no limits of this estimate."""
    found = propagated("risk_ratio", 2.0, Interval(low=0.5, high=1.5), 0.95, start_of(10, 100))
    assert found == Gap("limits-disordered")


def test_a_limit_past_everybody_is_a_gap_by_itself() -> None:
    """A risk ratio that would pass 100% at its upper end leaves the other limits; an odds ratio has all of them."""
    interval = Interval(low=1.1, high=2.4)
    found = given_one(propagated("risk_ratio", 1.6, interval, 0.95, start_of(50, 100)))
    assert found.with_.high == found.difference.high == Gap("beyond-one")
    assert isinstance(found.with_.low, float)
    assert isinstance(found.difference.low, float)
    assert found.risk_ratio == Limits(low=1.1, high=2.4)
    whole = given_one(propagated("odds_ratio", 1.6, interval, 0.95, start_of(50, 100)))
    assert isinstance(whole.difference.high, float)
    assert whole.with_.high < 1  # type: ignore[operator]


def test_a_difference_past_nobody_is_a_gap_by_itself() -> None:
    """A difference kept constant that would take the risk below 0 leaves its upper limit."""
    found = given_one(propagated("risk_difference", -0.03, Interval(low=-0.09, high=0.03), 0.95, start_of(4, 100)))
    assert found.with_.low == found.difference.low == Gap("carried-beyond-zero")
    assert found.difference.high == pytest.approx(0.03)


def test_an_estimate_without_a_logarithm_leaves_the_open_side_out() -> None:
    """A ratio of 0, or without end, has no way to its other limit: that side is a gap, the other one stands."""
    nothing = given_one(propagated("risk_ratio", 0.0, Interval(low=0.0, high=0.8), 0.95, start_of(20, 100)))
    assert nothing.with_.low == 0.0
    assert nothing.with_.high == nothing.difference.high == Gap("endless-log")
    assert nothing.difference.low == pytest.approx(-start_of(20, 100).at(quantile(0.95)), rel=1e-12)
    endless = given_one(propagated("odds_ratio", math.inf, Interval(low=1.7, high=math.inf), 0.95, start_of(20, 100)))
    assert endless.with_.high == 1.0
    assert endless.with_.low == endless.difference.low == Gap("endless-log")


def test_limits_without_end_go_as_far_as_risks_do() -> None:
    """An odds ratio without an upper limit goes up to everybody; a risk ratio passes 100% there."""
    interval = Interval(low=0.9, high=math.inf)
    start = start_of(20, 100)
    found = given_one(propagated("odds_ratio", 3.0, interval, 0.95, start))
    assert found.with_.high == 1.0
    assert found.difference.high == pytest.approx(1 - start.at(-quantile(0.95)), rel=1e-12)
    assert given_one(propagated("risk_ratio", 3.0, interval, 0.95, start)).with_.high == Gap("beyond-one")
    never = given_one(propagated("hazard_ratio", 0.5, Interval(low=0.0, high=2.0), 0.95, start))
    assert never.with_.low == 0.0
    assert never.difference.low == pytest.approx(-start.at(quantile(0.95)), rel=1e-12)


def test_nobody_and_everybody_to_start_from() -> None:
    """From nobody an effect without end says nothing on its side; else a risk of 0 or 100% is carried like any."""
    nobody, everybody = start_of(0, 50), start_of(50, 50)
    found = given_one(propagated("odds_ratio", 2.0, Interval(low=1.2, high=math.inf), 0.95, nobody))
    assert found.with_.high == Gap("undetermined-at-baseline")
    assert found.with_.low == 0.0
    plain = given_one(propagated("risk_ratio", 2.0, Interval(low=1.2, high=3.0), 0.95, nobody))
    assert plain.difference.low == 0.0
    assert plain.difference.high > 0  # type: ignore[operator]
    all_of_them = given_one(propagated("odds_ratio", 0.5, Interval(low=0.0, high=0.9), 0.95, everybody))
    assert all_of_them.with_.low == Gap("undetermined-at-baseline")
    assert all_of_them.with_.high == 1.0


def test_a_correction_moves_the_centre_along() -> None:
    """Where 1/2 was added, the interval's own centre is moved, which need not be the plain estimate."""
    interval = Interval(low=0.02, high=1.3, adjusted="half")
    found = given_one(propagated("odds_ratio", 0.0, interval, 0.95, start_of(200_000, 10**6)))
    low, high = risk_with("odds_ratio", 0.02, 0.2), risk_with("odds_ratio", 1.3, 0.2)
    assert found.with_.low == pytest.approx(low, rel=1e-3)
    assert found.with_.high == pytest.approx(high, rel=1e-3)


@settings(max_examples=100, deadline=None)
@given(one=effects(), counts=counted(), spans=st.floats(0.1, 8))
def test_another_span_changes_both_risks(
    one: tuple[Effect, float, Interval], counts: tuple[int, int], spans: float
) -> None:
    """The limits of each risk over another span are those of its own span, seen over the other."""
    effect, estimate, interval = one
    own = given_one(propagated(effect, estimate, interval, 0.95, start_of(*counts)))
    other = given_one(propagated(effect, estimate, interval, 0.95, start_of(*counts), spans))
    for value, seen in ((own.with_.low, other.with_.low), (own.with_.high, other.with_.high)):
        if isinstance(value, Gap):
            assert seen == value
        else:
            assert seen == pytest.approx(over_spans(value, spans), rel=1e-9, abs=1e-12)


@pytest.mark.parametrize("total", [1, 7, 10, 25, 201, 99_999])
def test_everybody_has_no_upper_limit_but_itself(total: int) -> None:
    """25 of 25 is 100% to the last bit, over a twelfth of the span too."""
    assert start_of(total, total).at(1.96) == 1.0


def test_where_risks_end_is_no_limit() -> None:
    """RR 1.4 (1.2 to 2.0) from 60% (57 to 74%) to five times the span: on both sides the risk with passes 100%.

    The least difference of those that are left would be 1 minus the risk without just where the risk with reaches 100%.
    """
    start = limits_as_typed(0.60, 0.57, 0.74, 0.95)
    assert isinstance(start, StartLimits)
    found = given_one(propagated("risk_ratio", 1.4, Interval(low=1.2, high=2.0), 0.95, start, 5.0))
    assert found.difference == found.risk_ratio == Limits(low=Gap("beyond-one"), high=Gap("beyond-one"))
    assert isinstance(found.with_.low, float)


def test_no_difference_at_nobody_takes_a_risk_below_zero() -> None:
    """A difference of exactly 0 (-8 to 8 points) from 1% (0 to 2%): no ratio lies at minus infinity."""
    start = limits_as_typed(0.01, 0.0, 0.02, 0.95)
    assert isinstance(start, StartLimits)
    found = given_one(propagated("risk_difference", 0.0, Interval(low=-0.08, high=0.08), 0.95, start))
    assert found.risk_ratio.low == Gap("carried-beyond-zero")


def test_the_difference_over_another_span_is_not_the_old_one() -> None:
    """40% v 20% at 1 year, carried by risk ratio from certain 40%, is 92% v 67% at 5 years, not 92% v 46%."""
    start = StartLimits(value=0.4, below=math.inf, above=math.inf)
    found = given_one(propagated("risk_ratio", 0.5, Interval(low=0.5, high=0.5), 0.95, start, 5.0))
    assert found.with_.low == pytest.approx(0.67232, abs=5e-6)
    assert found.difference.low == pytest.approx(-0.25, abs=5e-3)
    assert found.risk_ratio.low == pytest.approx(0.67232 / 0.92224, abs=1e-6)
