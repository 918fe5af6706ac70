"""The starting risk of the unexposed from the risk of all: the mixture has to come out again."""

from __future__ import annotations

import math

import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st

from fourcount.stats.conversion import Effect, risk_with
from fourcount.stats.overall_risk import starting_risk_from_overall
from fourcount.stats.results import Gap

RATIO_EFFECTS: tuple[Effect, ...] = ("risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio")
SHARES = st.floats(0.0, 1.0)
RISKS = st.floats(1e-7, 1 - 1e-7)


@settings(max_examples=300)
@given(measure=st.sampled_from(RATIO_EFFECTS), value=st.floats(1e-3, 1e3), start=RISKS, share=SHARES)
def test_the_starting_risk_comes_back(measure: Effect, value: float, start: float, share: float) -> None:
    """Mixed from a starting risk, the overall risk gives that starting risk again."""
    with_ = risk_with(measure, value, start)
    assume(isinstance(with_, float))
    assert isinstance(with_, float)
    overall = (1 - share) * start + share * with_
    assume(overall < 1 - 1e-9 and max(start, with_) < 1 - 1e-6)
    found = starting_risk_from_overall(measure, value, overall, share)
    assert isinstance(found, float), found
    again = risk_with(measure, value, found)
    assert isinstance(again, float)
    assert (1 - share) * found + share * again == pytest.approx(overall, rel=1e-9)
    if share < 0.99:
        assert found == pytest.approx(start, rel=1e-4)


@given(difference=st.floats(-0.9, 0.9), start=RISKS, share=SHARES)
def test_a_difference_comes_back(difference: float, start: float, share: float) -> None:
    """The same of a difference, which is taken off by its share."""
    assume(0 <= start + difference <= 1)
    overall = start + share * difference
    found = starting_risk_from_overall("risk_difference", difference, overall, share)
    assert found == pytest.approx(start, abs=1e-12)


@pytest.mark.parametrize("measure", [*RATIO_EFFECTS, "risk_difference"])
def test_nobody_exposed_is_the_overall_risk(measure: Effect) -> None:
    """Where nobody is exposed, and where the effect is none, all people start at the overall risk."""
    none = 0.0 if measure == "risk_difference" else 1.0
    assert starting_risk_from_overall(measure, 0.5, 0.2, 0.0) == 0.2
    assert starting_risk_from_overall(measure, none, 0.2, 0.3) == pytest.approx(0.2, rel=1e-14)


@pytest.mark.parametrize("measure", RATIO_EFFECTS)
def test_everybody_exposed_undoes_the_effect(measure: Effect) -> None:
    """Where everybody is exposed, the overall risk is the risk with."""
    found = starting_risk_from_overall(measure, 2.0, 0.3, 1.0)
    assert isinstance(found, float)
    assert risk_with(measure, 2.0, found) == pytest.approx(0.3, rel=1e-12)


@pytest.mark.parametrize("measure", RATIO_EFFECTS)
@pytest.mark.parametrize("share", [0.1, 0.5, 0.9])
def test_the_starting_risk_falls_as_the_effect_grows(measure: Effect, share: float) -> None:
    """The greater the risk of the exposed, the less is left for the unexposed."""
    found = [starting_risk_from_overall(measure, value, 0.05, share) for value in (0.2, 0.5, 1.0, 2.0, 5.0)]
    assert all(isinstance(one, float) for one in found)
    assert found == sorted(found, reverse=True)  # type: ignore[type-var]


def test_what_no_mixture_has_is_a_gap() -> None:
    """A risk of the exposed, or of the unexposed, beyond 0 or 100% is never cut to it."""
    assert starting_risk_from_overall("risk_ratio", 4.0, 0.9, 0.5) == Gap("beyond-one")
    assert starting_risk_from_overall("risk_ratio", 0.1, 0.9, 0.5) == Gap("beyond-one")
    assert starting_risk_from_overall("risk_difference", 0.3, 0.1, 0.5) == Gap("carried-beyond-zero")
    assert starting_risk_from_overall("risk_difference", -0.3, 0.1, 0.5) == Gap("carried-beyond-zero")
    assert starting_risk_from_overall("risk_difference", 0.3, 0.9, 0.5) == Gap("beyond-one")
    assert starting_risk_from_overall("odds_ratio", 0.0, 0.6, 0.5) == Gap("beyond-one")
    assert starting_risk_from_overall("hazard_ratio", 0.0, 0.6, 0.5) == Gap("beyond-one")
    assert starting_risk_from_overall("odds_ratio", 0.0, 0.3, 1.0) == Gap("beyond-one")


@pytest.mark.parametrize("share", [-0.1, 1.1])
def test_a_share_beyond_everybody_is_a_gap(share: float) -> None:
    """The share of people exposed lies from 0 to 1."""
    assert starting_risk_from_overall("odds_ratio", 2.0, 0.2, share) == Gap("prevalence-out-of-range")


def test_an_effect_of_nothing_or_without_end() -> None:
    """Without end all the exposed have the event; of nothing none of them; what stays open is said to be open."""
    assert starting_risk_from_overall("odds_ratio", math.inf, 0.4, 0.25) == pytest.approx(0.2)
    assert starting_risk_from_overall("hazard_ratio", math.inf, 0.4, 0.25) == pytest.approx(0.2)
    assert starting_risk_from_overall("odds_ratio", math.inf, 0.2, 0.25) == Gap("undetermined-at-baseline")
    assert starting_risk_from_overall("risk_ratio", math.inf, 0.2, 0.25) == Gap("undetermined-at-baseline")
    for measure in RATIO_EFFECTS:
        assert starting_risk_from_overall(measure, 0.0, 0.3, 0.25) == pytest.approx(0.4)
    assert starting_risk_from_overall("odds_ratio", 0.0, 0.0, 1.0) == Gap("undetermined-at-baseline")


@pytest.mark.parametrize("measure", ["odds_ratio", "hazard_ratio"])
@pytest.mark.parametrize("overall", [0.0, 1.0])
def test_nobody_and_everybody_with_the_event(measure: Effect, overall: float) -> None:
    """On these scales a risk of 0 or 100% in all is one in each part."""
    assert starting_risk_from_overall(measure, 3.0, overall, 0.4) == overall


@pytest.mark.parametrize("ratio", [1e-12, 1e12])
@pytest.mark.parametrize("measure", ["odds_ratio", "hazard_ratio"])
def test_extreme_effects_keep_the_mixture(measure: Effect, ratio: float) -> None:
    """The largest and smallest effects that can be typed still mix to the overall risk."""
    for overall in (1e-6, 0.3, 0.49):
        found = starting_risk_from_overall(measure, ratio, overall, 0.5)
        assert isinstance(found, float), found
        with_ = risk_with(measure, ratio, found)
        assert isinstance(with_, float)
        assert (found + with_) / 2 == pytest.approx(overall, rel=1e-4)


def test_a_starting_risk_of_all_but_nobody_is_a_gap() -> None:
    """Where the unexposed would have to be everybody to the last digit, no effect can be carried from there."""
    assert starting_risk_from_overall("hazard_ratio", 1e-12, 0.7, 0.5) == Gap("next-to-certain")
