"""Limits held against their own estimate, without any counts. All figures are invented."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.appraisal.check import check_figures
from fourcount.appraisal.check.basis import Basis
from fourcount.appraisal.check.symmetry import slips, symmetric, triple_of
from fourcount.appraisal.findings import Finding
from fourcount.record.entry.readings import PrintedFigure
from fourcount.record.paper import Choices
from printed_figures import printed


def said(figure: PrintedFigure) -> tuple[Finding, ...]:
    return check_figures((figure,), Basis(), Choices()).figures[0].findings


@given(st.floats(0.1, 10), st.floats(0.05, 1.5), st.integers(2, 3))
def test_whatever_a_log_interval_prints_is_symmetric(estimate: float, half: float, decimals: int) -> None:
    """Rounding never makes limits of the log scale look uneven."""
    texts = (f"{x:.{decimals}f}" for x in (estimate, estimate * math.exp(-half), estimate * math.exp(half)))
    triple = triple_of(printed("hazard_ratio", *texts))
    assert triple is not None
    assert symmetric(triple)


@given(st.floats(-30, 30), st.floats(0.1, 20), st.integers(0, 2))
def test_whatever_a_plain_interval_prints_is_symmetric(estimate: float, half: float, decimals: int) -> None:
    """Nor those of differences."""
    texts = (f"{x:.{decimals}f}" for x in (estimate, estimate - half, estimate + half))
    triple = triple_of(printed("risk_difference", *texts, unit="percent"))
    assert triple is not None
    assert symmetric(triple)


@pytest.mark.parametrize(
    ("texts", "part", "mended"),
    [
        (("0.54", "0.37", "0.87"), "high", "0.78"),
        (("0.72", "0.55", "0.49"), "high", "0.94"),
        (("2.31", "1.42", "3.67"), "high", "3.76"),
        (("0.45", "0.37", "0.78"), "estimate", "0.54"),
    ],
)
def test_a_transposed_digit_is_named(texts: tuple[str, str, str], part: str, mended: str) -> None:
    """The exchange that makes the three even is among those offered."""
    triple = triple_of(printed("hazard_ratio", *texts))
    assert triple is not None
    if texts[2] == "0.49":
        assert [finding.key for finding in said(printed("hazard_ratio", *texts))] == ["limits-disordered"]
        return
    assert not symmetric(triple)
    assert (part, mended) in [(at, number.text) for at, number in slips(triple)]
    facts = said(printed("hazard_ratio", *texts))[0].facts
    assert facts[f"slip_{part}"] == mended


def test_uneven_limits_say_what_would_be_even() -> None:
    """Beside each limit stands the one that would go with it."""
    (finding,) = said(printed("odds_ratio", "0.60", "0.41", "0.95"))
    assert finding.key == "not-symmetric"
    assert finding.facts["mirrored_high"] == pytest.approx(0.36 / 0.41)
    assert finding.facts["mirrored_low"] == pytest.approx(0.36 / 0.95)


def test_even_limits_are_confirmed_where_nothing_else_can_be() -> None:
    """An effect without counts whose limits are even."""
    (finding,) = said(printed("hazard_ratio", "0.72", "0.55", "0.94"))
    assert (finding.key, finding.agrees) == ("symmetric", True)


def test_an_estimate_outside_its_limits() -> None:
    """Order comes before evenness."""
    assert [finding.key for finding in said(printed("risk_ratio", "0.54", "0.60", "0.80"))] == ["limits-disordered"]


def test_measures_without_a_scale_of_their_own_are_let_be() -> None:
    """A risk or a number needed has no reason to lie evenly."""
    assert said(printed("number_needed", "13", "8", "31")) == ()
    assert said(printed("risk", "9.2", "6.8", "12.4", unit="percent")) == ()


def test_a_limit_of_zero_digits_is_no_trouble() -> None:
    """A lower limit printed as 0.0 may be anything up to 0.05."""
    assert [finding.key for finding in said(printed("risk_ratio", "0.5", "0.0", "9.9"))] == ["symmetric"]
