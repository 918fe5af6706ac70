"""Risks and confidence levels as a person types them."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.entry.level import read_level
from fourcount.record.entry.readings import Blank, Proportion, Unreadable
from fourcount.record.entry.risk import read_risk

ANY_TEXT = st.text(st.characters(exclude_categories=()), max_size=60)
NEARLY = st.text(st.sampled_from("0123456789 ,.%/-inofper\u00b7\u0663"), max_size=20)

RISKS = [
    ("12%", 0.12),
    ("12 %", 0.12),
    ("12", 0.12),
    ("12.5%", 0.125),
    ("12,5 %", 0.125),
    ("12\u00b75%", 0.125),
    ("12 per cent", 0.12),
    ("12 percent", 0.12),
    ("12 in 100", 0.12),
    ("12/100", 0.12),
    ("12 of 100", 0.12),
    ("12 out of 100", 0.12),
    ("12 per 1,000", 0.012),
    ("1,200 in 10 000", 0.12),
    ("1.5 in 1000", 0.0015),
    ("0.5%", 0.005),
    (".5%", 0.005),
    ("1%", 0.01),
    ("1.5", 0.015),
    ("1 in 1,000,000,000", 1e-9),
    ("1 in 8", 0.125),
    ("0", 0.0),
    ("0%", 0.0),
    ("-0%", 0.0),
    ("100%", 1.0),
    ("7/7", 1.0),
    ("\u0661\u0662\u066a", 0.12),
]

NO_RISKS = [
    ("0.12", "percent-or-fraction"),
    ("1", "percent-or-fraction"),
    (".5", "percent-or-fraction"),
    ("120%", "risk-out-of-range"),
    ("101", "risk-out-of-range"),
    ("-3%", "risk-out-of-range"),
    ("13 in 12", "risk-out-of-range"),
    ("0 in 0", "not-a-risk"),
    ("1 in 1,000,000,001", "not-a-risk"),
    ("12 in", "not-a-risk"),
    ("12-15%", "not-a-risk"),
    ("~12%", "not-a-risk"),
    ("high", "not-a-risk"),
    ("%", "not-a-risk"),
    ("1.2.3%", "not-a-risk"),
    ("9" * 5000, "not-a-risk"),
    ("1 in " + "9" * 300, "not-a-risk"),
]

LEVELS = [("95", 0.95), ("95%", 0.95), ("95 %", 0.95), ("0.95", 0.95), ("99.9", 0.999), ("99,9%", 0.999), ("80", 0.8)]

NO_LEVELS = [
    ("79.9", "level-out-of-range"),
    ("99.91%", "level-out-of-range"),
    ("100", "level-out-of-range"),
    ("0", "level-out-of-range"),
    ("1", "level-out-of-range"),
    ("0.95%", "level-out-of-range"),
    ("-95", "level-out-of-range"),
    ("9" * 350, "level-out-of-range"),
    ("9" * 5000, "not-a-level"),
    ("ninety-five", "not-a-level"),
    ("95 95", "not-a-level"),
]


@pytest.mark.parametrize(("text", "value"), RISKS)
def test_a_risk_is_read_as_people_write_it(text: str, value: float) -> None:
    """A percentage or so many in so many is the fraction nearest to it."""
    assert read_risk(text) == Proportion(value=value)


@pytest.mark.parametrize(("text", "key"), NO_RISKS)
def test_what_is_no_risk_is_refused_with_its_reason(text: str, key: str) -> None:
    """A bare number up to 1 is asked about, and nothing is moved into the range."""
    reading = read_risk(text)
    assert isinstance(reading, Unreadable)
    assert reading.key == key


@pytest.mark.parametrize(("text", "value"), LEVELS)
def test_a_level_is_read_as_people_write_it(text: str, value: float) -> None:
    """A confidence level is a percentage with or without its sign, or the fraction."""
    assert read_level(text) == Proportion(value=value)


@pytest.mark.parametrize(("text", "key"), NO_LEVELS)
def test_what_is_no_level_is_refused_with_its_reason(text: str, key: str) -> None:
    """Levels go from 80% to 99.9%."""
    reading = read_level(text)
    assert isinstance(reading, Unreadable)
    assert reading.key == key


def test_an_empty_field_is_blank() -> None:
    """Nothing typed is neither a risk nor a mistake."""
    assert (read_risk(" "), read_level("")) == (Blank(), Blank())


@given(ANY_TEXT | NEARLY)
def test_every_text_gets_an_answer(text: str) -> None:
    """Reading never raises; a risk lies from 0 to 1, a level from 0.8 to 0.999, and a reason quotes the text."""
    for reading, low, high in ((read_risk(text), 0, 1), (read_level(text), 0.8, 0.999)):
        assert isinstance(reading, Proportion | Blank | Unreadable)
        if isinstance(reading, Proportion):
            assert low <= reading.value <= high
        if isinstance(reading, Unreadable):
            assert 0 < len(str(reading.facts["text"])) <= 40


@given(st.integers(0, 10**6), st.integers(1, 10**6))
def test_so_many_in_so_many_is_their_quotient(part: int, whole: int) -> None:
    """The fraction is the correctly rounded quotient, or the text is refused where the part is larger."""
    reading = read_risk(f"{part:,} in {whole:,}")
    if part <= whole:
        assert reading == Proportion(value=part / whole)
    else:
        assert isinstance(reading, Unreadable)
