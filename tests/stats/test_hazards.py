"""Risks through constant hazards."""

from __future__ import annotations

import math

import mpmath
import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.stats.hazards import over_spans, risk_over, risk_with_hazard

RISKS = st.floats(1e-9, 1 - 1e-9)
SPANS = st.floats(0.05, 20)


@given(rate=st.floats(1e-9, 5), years=st.floats(0.01, 30))
def test_a_rate_gives_its_risk(rate: float, years: float) -> None:
    """1 - exp(-r t), against 50 digits, for the rarest rates too."""
    with mpmath.workdps(50):
        exact = 1 - mpmath.exp(-mpmath.mpf(rate) * mpmath.mpf(years))
    assert risk_over(rate, years) == pytest.approx(float(exact), rel=1e-14)


def test_nothing_happens_at_a_rate_of_0() -> None:
    """No events in any time give a risk of exactly 0."""
    assert risk_over(0.0, 10.0) == 0.0


@given(risk=RISKS, spans=SPANS)
def test_a_span_and_back(risk: float, spans: float) -> None:
    """Seen over another span and back again the risk is what it was, unless nearly everybody has the event."""
    there = over_spans(risk, spans)
    if there < 1 - 1e-6:
        assert over_spans(there, 1 / spans) == pytest.approx(risk, rel=1e-8)
    assert (there > risk) == (spans > 1) or there == pytest.approx(risk)


@given(risk=RISKS)
def test_spans_add_up(risk: float) -> None:
    """Who escapes three years has escaped three times one year."""
    assert 1 - over_spans(risk, 3) == pytest.approx((1 - risk) ** 3, abs=1e-14)


def test_one_year_seen_over_five() -> None:
    """40% v 20% at 1 year is 92% v 67% at 5 by constant hazards; carrying the ratio along would say 46%."""
    assert [round(100 * over_spans(risk, 5)) for risk in (0.4, 0.2)] == [92, 67]


@pytest.mark.parametrize("risk", [0.0, 1.0])
def test_nobody_and_everybody_stay(risk: float) -> None:
    """A risk of 0 or of 100% is so over every span."""
    assert over_spans(risk, 7) == over_spans(risk, 1 / 7) == risk


@given(start=RISKS, ratio=st.floats(0.01, 50))
def test_a_hazard_ratio_is_a_power_of_survival(start: float, ratio: float) -> None:
    """1 - (1-q)^h, against 50 digits (Altman and Andersen 1999, BMJ 319:1492)."""
    with mpmath.workdps(50):
        exact = 1 - (1 - mpmath.mpf(start)) ** mpmath.mpf(ratio)
    assert risk_with_hazard(start, ratio) == pytest.approx(float(exact), rel=1e-13)


def test_the_ends_of_a_hazard_ratio() -> None:
    """An infinite ratio makes the event certain, a ratio of 0 impossible, 1 leaves the risk as it is."""
    assert risk_with_hazard(0.2, math.inf) == 1.0
    assert risk_with_hazard(0.2, 0.0) == 0.0
    assert risk_with_hazard(0.2, 1.0) == pytest.approx(0.2, rel=1e-15)
    assert risk_with_hazard(1.0, 0.5) == 1.0
