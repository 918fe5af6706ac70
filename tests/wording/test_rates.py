"""Rates as digits: rounding, units, limits that never reach what they are not."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from forms import person_time
from fourcount.appraisal.findings import Interval, Rates
from fourcount.wording import limits, numbers
from fourcount.wording.axis import axis_words
from fourcount.wording.person_time import POWERS, per_units, unit, unit_sum


@pytest.mark.parametrize(
    ("rate", "text"),
    [
        (0.0, "0.0"), (9.2233, "9.2"), (17.11, "17.1"), (0.25, "0.25"), (0.0123, "0.012"), (0.95, "0.95"), (1.0, "1.0"),
        (999.94, "999.9"), (1234.5, "1,235"), (-7.89, "7.9"), (4.2e-9, "4.20×10⁻⁹"), (12.25, "12.3"),
    ],
)  # fmt: skip
def test_a_rate_has_one_decimal_and_two_digits_at_least(rate, text):
    """None from 1,000 on; halves go up; a difference is written as its size."""
    assert numbers.rate(rate) == text


@pytest.mark.parametrize(
    ("limit", "estimate", "text"),
    [(6.72, 9.2, "6.7"), (0.004, 9.2, "0.0040"), (0.0, 9.2, "0.0"), (9.24, 9.2, "9.24"), (float("inf"), 9.2, "∞")],
)
def test_a_limit_has_its_estimates_decimals_and_more_where_it_would_reach_none(limit, estimate, text):
    """Nor does it look like the estimate where it is not."""
    assert numbers.rate_limit(limit, estimate) == text


@given(st.floats(1e-12, 1e12))
def test_no_rate_looks_like_none(rate):
    """However small it is."""
    assert any(digit in "123456789" for digit in numbers.rate(rate))


@pytest.mark.parametrize(
    ("low", "high", "estimate", "text"),
    [
        (-0.0131, -0.0030, -0.0079, "3.0 to 13.1"),
        (-0.0131, 0.0030, -0.0079, "13.1 fewer to 3.0 more"),
        (-0.0020, 0.0020, 0.0, "2.0 fewer to 2.0 more"),
    ],
)
def test_each_limit_of_a_rate_difference_has_the_word_it_needs(low, high, estimate, text):
    """As a difference of risks has."""
    assert limits.rate_difference_interval(Interval(low=low, high=high), estimate, 1_000) == text


def test_rates_are_told_for_one_event_at_least():
    """The smaller rate that is not 0 decides; where nobody had an event, as if one had."""
    assert per_units(Rates(index_events=38, index_time=4120.0, reference_events=70, reference_time=4090.0)) == 1_000
    assert per_units(Rates(index_events=0, index_time=4120.0, reference_events=1, reference_time=50.0)) == 100
    assert per_units(Rates(index_events=0, index_time=4120.0, reference_events=0, reference_time=50.0)) == 10_000
    assert per_units(Rates(index_events=5, index_time=1.0, reference_events=1, reference_time=1e12)) == POWERS[-1]
    assert per_units(Rates(index_events=5, index_time=0.0, reference_events=0, reference_time=0.0)) == 1


@pytest.mark.parametrize(
    ("typed", "many", "one"),
    [
        ("person-years", "100 person-years", "person-year"),
        ("person-year", "100 person-years", "person-year"),
        ("patient years", "100 patient years", "patient year"),
        ("catheter days", "100 catheter days", "catheter day"),
        ("Personenjahre", "100 Personenjahre", "Personenjahre"),
        ("", "100 units of person-time", "unit of person-time"),
    ],
)
def test_the_unit_is_the_readers_own(typed, many, one):
    """In the plural, or of one without its s; another language's stays as it is."""
    outcome = person_time(unit=typed)
    assert unit_sum(100, outcome) == many
    assert unit_sum(1, outcome) == one
    assert unit(outcome) in many


def test_an_amount_of_time_is_written_as_it_was_typed():
    """Thousands parted, no trailing zeros, and never nothing for something."""
    assert [numbers.quantity(x) for x in (4120.0, 4120.5, 0.25, 412, 1e-9)] == [
        "4,120",
        "4,120.5",
        "0.25",
        "412",
        "1.00×10⁻⁹",
    ]


def test_the_axis_of_rates_names_its_ends():
    """Rates from nothing; differences with their words."""
    assert axis_words("rate", 25.0) == ("0", "", "25")
    assert axis_words("rate_difference", 1_500.0) == ("1,500 fewer", "0", "1,500 more")
