"""Effects carried to a starting risk."""

from __future__ import annotations

import math

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.stats.conversion import risk_ratio_from_odds_ratio, risk_with, unbounded_risk
from fourcount.stats.hazards import over_spans
from fourcount.stats.results import GAP_KEYS, Gap

RISKS = st.floats(1e-9, 1 - 1e-9)
RATIOS = st.floats(1e-6, 1e6)


@pytest.mark.parametrize(
    ("odds_ratio", "baseline", "risk_ratio"),
    [(0.6, 0.906, 0.941029), (3.0, 0.1, 2.5), (0.5, 0.5, 0.666667), (4, 0, 4), (4, 1, 1), (1, 0.37, 1)],
)
def test_zhang_and_yu(odds_ratio: float, baseline: float, risk_ratio: float) -> None:
    """Zhang and Yu 1998, JAMA 280:1690: their equation at a few points and at its edges."""
    assert risk_ratio_from_odds_ratio(odds_ratio, baseline) == pytest.approx(risk_ratio, abs=5e-7)


def test_the_handbook_carries_an_odds_ratio() -> None:
    """Cochrane Handbook 15.4.4: OR 0.73 at 30% is 62 fewer per 1000; RR 0.92 at 30% is 24 fewer."""
    by_odds, by_risk = risk_with("odds_ratio", 0.73, 0.3), risk_with("risk_ratio", 0.92, 0.3)
    assert isinstance(by_odds, float)
    assert isinstance(by_risk, float)
    assert round(1000 * (0.3 - by_odds)) == 62
    assert round(1000 * (0.3 - by_risk)) == 24


@settings(max_examples=100)
@given(odds_ratio=RATIOS, baseline=RISKS)
def test_both_ways_to_the_risk_are_one(odds_ratio: float, baseline: float) -> None:
    """The odds ratio's risk is the starting risk times its risk ratio, and the odds ratio comes back from it."""
    carried = risk_with("odds_ratio", odds_ratio, baseline)
    assert isinstance(carried, float)
    assert 0 < carried <= 1
    assert carried == pytest.approx(baseline * risk_ratio_from_odds_ratio(odds_ratio, baseline), rel=1e-13)
    if carried < 0.999:
        assert carried / (1 - carried) * (1 - baseline) / baseline == pytest.approx(odds_ratio, rel=1e-9)


def test_more_than_everybody_is_a_gap() -> None:
    """A risk ratio that asks for more than 100% gives no risk, and is never cut to 100%."""
    assert risk_with("risk_ratio", 3.0, 0.4) == Gap("beyond-one")
    assert risk_with("risk_ratio", math.inf, 0.4) == Gap("beyond-one")
    assert risk_with("risk_ratio", 2.5, 0.4) == 1.0
    assert "beyond-one" in GAP_KEYS


def test_the_last_bit_of_100_percent_is_no_excess() -> None:
    """Everybody against c of n: the ratio n/c times the risk c/n can pass 100% by a last bit, and is 100%."""
    ratio, baseline = 11 / 9, 9 / 11
    assert ratio * baseline > 1
    assert risk_with("risk_ratio", ratio, baseline) == 1.0


def test_the_last_bit_to_100_percent_is_none_over_a_shorter_span() -> None:
    """1/r times r is everybody, over a day as over a year; so is 0.9 and 0.1 more."""
    for events in range(1, 350):
        ratio = events / 350
        assert over_spans(unbounded_risk("risk_ratio", 1 / ratio, ratio), 1 / 365) == 1.0
    assert unbounded_risk("risk_difference", 0.1, 0.9) == 1.0


def test_infinite_effects() -> None:
    """A certain event: risk 1, risk ratio 1/P0; at a starting risk of 0 an infinite effect says nothing."""
    assert risk_with("odds_ratio", math.inf, 0.2) == 1.0
    assert risk_ratio_from_odds_ratio(math.inf, 0.2) == 5.0
    assert risk_ratio_from_odds_ratio(math.inf, 0.0) == math.inf
    for effect in ("odds_ratio", "risk_ratio"):
        assert risk_with(effect, math.inf, 0.0) == Gap("undetermined-at-baseline")


def test_an_effect_of_nothing() -> None:
    """A ratio of 0 brings any risk to 0, but says nothing as odds at a starting risk of 1."""
    assert risk_with("risk_ratio", 0.0, 0.3) == risk_with("odds_ratio", 0.0, 0.3) == 0.0
    assert risk_with("odds_ratio", 0.0, 1.0) == Gap("undetermined-at-baseline")
    assert risk_with("risk_ratio", 0.0, 1.0) == 0.0
    assert risk_with("odds_ratio", 0.7, 1.0) == 1.0
    assert risk_with("odds_ratio", 0.7, 0.0) == 0.0


def test_a_hazard_ratio_carried() -> None:
    """Altman and Andersen 1999, BMJ 319:1492 (from memory): HR 0.72 where 33% survive is one in 8.32 people."""
    with_ = risk_with("hazard_ratio", 0.72, 0.67)
    assert isinstance(with_, float)
    assert 1 / (0.67 - with_) == pytest.approx(8.32, abs=0.005)
    assert risk_with("rate_ratio", 0.72, 0.67) == with_


def test_a_difference_carried() -> None:
    """A difference kept constant is added; past 0 or 100% is a gap of its own, the last bit apart."""
    assert risk_with("risk_difference", -0.05, 0.2) == pytest.approx(0.15)
    assert risk_with("risk_difference", -0.25, 0.2) == Gap("carried-beyond-zero")
    assert risk_with("risk_difference", 0.85, 0.2) == Gap("beyond-one")
    assert risk_with("risk_difference", -0.3, 0.1 + 0.2) == pytest.approx(0.0, abs=1e-15)
    assert risk_with("risk_difference", 0.7, 0.1 + 0.2) == 1.0
    assert risk_with("risk_difference", -0.2, 0.3 - 0.1) == 0.0


def test_hazards_that_meet_nobody_or_everybody() -> None:
    """As for odds: without end from nobody, and of nothing from everybody, no risk follows."""
    for effect in ("hazard_ratio", "rate_ratio"):
        assert risk_with(effect, math.inf, 0.0) == Gap("undetermined-at-baseline")
        assert risk_with(effect, 0.0, 1.0) == Gap("undetermined-at-baseline")
        assert risk_with(effect, math.inf, 0.2) == 1.0
        assert risk_with(effect, 0.0, 0.2) == 0.0
        assert risk_with(effect, 0.5, 1.0) == 1.0


@settings(max_examples=100)
@given(start=RISKS, ratio=st.floats(0.05, 20))
def test_small_risks_are_carried_alike(start: float, ratio: float) -> None:
    """At a rare outcome risk, odds and hazard ratio lead to one risk; elsewhere they part in a fixed order."""
    found = [risk_with(effect, ratio, start) for effect in ("odds_ratio", "hazard_ratio")]
    odds, hazard = found
    assert isinstance(odds, float)
    assert isinstance(hazard, float)
    plain = start * ratio
    if start * max(ratio, 1) < 1e-4:
        assert odds == pytest.approx(plain, rel=3e-3)
        assert hazard == pytest.approx(plain, rel=3e-3)
    # A hazard ratio lies between: its risk ratio is nearer to 1 than the ratio itself, the odds ratio's nearer still.
    assert odds <= hazard + 1e-12 if ratio > 1 else hazard <= odds + 1e-12
