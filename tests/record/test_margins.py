"""A line of the reader's own, typed on the scale of a difference or a ratio."""

from __future__ import annotations

from typing import get_args

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.entry.margin import read_margin
from fourcount.record.entry.readings import Blank, Unreadable
from fourcount.record.outcome import LineScale, LineSide
from nearly import ANY_TEXT, NEARLY

DIFFERENCES = [
    ("5 per 100", 0.05),
    ("5%", 0.05),
    ("5", 0.05),
    ("5 points", 0.05),
    ("5 percentage points", 0.05),
    ("5 %-points", 0.05),
    ("5 pp", 0.05),
    ("2,5 %", 0.025),
    ("0.5%", 0.005),
    ("1 in 20", 0.05),
    ("50/1,000", 0.05),
    ("100%", 1.0),
]
NO_DIFFERENCES = [
    ("0.05", "percent-or-fraction"),
    ("0", "margin-no-effect"),
    ("0%", "margin-no-effect"),
    ("120%", "margin-out-of-range"),
    ("21 in 20", "margin-out-of-range"),
    ("5% per 100", "not-a-margin"),
    ("5 per 0", "not-a-margin"),
    ("5 to 6%", "not-a-margin"),
    ("some", "not-a-margin"),
    ("9" * 5000, "not-a-margin"),
]


@pytest.mark.parametrize("side", get_args(LineSide))
@pytest.mark.parametrize(("text", "size"), DIFFERENCES)
def test_a_difference_lies_on_the_side_chosen(text: str, size: float, side: LineSide) -> None:
    """Index minus reference, so below 0 where fewer is meant."""
    assert read_margin(text, "risk_difference", side) == pytest.approx(-size if side == "fewer" else size)


@pytest.mark.parametrize(("text", "key"), NO_DIFFERENCES)
def test_what_is_no_difference_is_refused_with_its_reason(text: str, key: str) -> None:
    """No effect is no line, and a bare fraction is asked about."""
    reading = read_margin(text, "risk_difference", "more")
    assert isinstance(reading, Unreadable)
    assert reading.key == key


@pytest.mark.parametrize("text", ["5 fewer per 100", "5% fewer", "5 per 100 fewer", "-5%", "\u22125", "5 points lower"])
def test_a_word_or_a_sign_has_to_agree_with_the_side(text: str) -> None:
    """Neither is overruled by the other."""
    assert read_margin(text, "risk_difference", "fewer") == -0.05
    reading = read_margin(text, "risk_difference", "more")
    assert isinstance(reading, Unreadable)
    assert reading.key == "margin-not-more"


@pytest.mark.parametrize("text", ["5 more per 100", "+5%", "5 higher"])
def test_more_has_to_agree_likewise(text: str) -> None:
    """A plus is a word as well."""
    assert read_margin(text, "risk_difference", "more") == 0.05
    reading = read_margin(text, "risk_difference", "fewer")
    assert isinstance(reading, Unreadable)
    assert reading.key == "margin-not-fewer"


@pytest.mark.parametrize("scale", ["risk_ratio", "odds_ratio", "hazard_ratio"])
@pytest.mark.parametrize(
    ("text", "side", "value"),
    [
        ("0.80", "fewer", 0.8),
        ("1.25", "more", 1.25),
        ("1,25", "more", 1.25),
        ("RR 1.3", "more", 1.3),
        ("HR = 0.7", "fewer", 0.7),
        (".5", "fewer", 0.5),
        ("1.25", "fewer", "ratio-not-fewer"),
        ("0.8", "more", "ratio-not-more"),
        ("1", "more", "margin-no-effect"),
        ("1.00", "fewer", "margin-no-effect"),
        ("0", "fewer", "ratio-out-of-range"),
        ("-1.3", "more", "ratio-out-of-range"),
        ("9999999", "more", "ratio-out-of-range"),
        ("20%", "fewer", "not-a-ratio"),
        ("5 per 100", "fewer", "not-a-ratio"),
        ("0.8 (0.7 to 0.9)", "fewer", "not-a-ratio"),
    ],
)
def test_a_ratio_lies_where_it_lies(scale: LineScale, text: str, side: LineSide, value: float | str) -> None:
    """Below 1 on the side of fewer, above it on the other; the side chosen does not move it."""
    reading = read_margin(text, scale, side)
    assert (reading.key if isinstance(reading, Unreadable) else reading) == value


def test_an_empty_field_is_blank() -> None:
    """No line is typed yet."""
    assert read_margin(" ", "risk_ratio", "more") == Blank()


@given(ANY_TEXT | NEARLY, st.sampled_from(get_args(LineScale)), st.sampled_from(get_args(LineSide)))
def test_every_text_gets_an_answer(text: str, scale: LineScale, side: LineSide) -> None:
    """Reading never raises, and a line always lies on the side chosen, within what its scale holds."""
    reading = read_margin(text, scale, side)
    if isinstance(reading, float):
        no_effect = 0 if scale == "risk_difference" else 1
        assert (reading < no_effect) == (side == "fewer")
        assert reading != no_effect
        assert -1 <= reading <= 1 if scale == "risk_difference" else 0 < reading <= 1e6
