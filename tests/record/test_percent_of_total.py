"""Percentages of totals: the whole numbers that round to them."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.entry.percent import PrintedPercent, printed_percent, rounds_to
from fourcount.record.entry.percent_of_total import fitting_counts, written_percent
from fourcount.record.entry.readings import GroupCounts
from fourcount.record.entry.table import read_table
from fourcount.record.outcome import PercentOfTotal


def first(left, right):
    """The first group's counts and the marks as keys with what they are about."""
    reading = read_table(PercentOfTotal(first_left_text=left, first_right_text=right))
    return reading.first, [(mark.key, mark.field, mark.used) for mark in reading.marks]


@pytest.mark.parametrize(
    ("left", "right"), [("9.2%", "412"), ("9.2", "412"), ("9,2 %", "412"), ("9.2% of 412", ""), ("9.2% (n = 412)", "")]
)
def test_one_count_fits(left, right):
    """38 of 412 are 9.2%, and no other number of 412 is."""
    assert first(left, right) == (GroupCounts(left=38, right=374, total=412), [])


@pytest.mark.parametrize("text", ["38 (9.2%)", "38/412", "38 of 412 (9.2%)"])
def test_a_count_beside_its_percentage_is_the_count(text):
    """Then nothing has to be worked out."""
    assert first(text, "412") == (GroupCounts(left=38, right=374, total=412), [])


def test_of_several_the_nearest_is_taken_and_it_is_said():
    """7% of 412 may be 27 to 30 people; 28.84 is nearest 29."""
    counts, marks = first("7%", "412")
    assert (counts.left, marks) == (29, [("percent-several", "first_left_text", True)])
    (mark,) = read_table(PercentOfTotal(first_left_text="7%", first_right_text="412")).marks
    assert mark.facts == {"text": "7%", "total": 412, "value": 29, "counts": "27, 28, 29, 30"}
    (many,) = read_table(PercentOfTotal(first_left_text="0.5%", first_right_text="12,000")).marks
    assert many.facts["counts"] == "54 to 65"


def test_where_none_fits_the_nearest_is_taken_and_it_is_said():
    """9.3% of 50 would be 4.65 people; a tie goes to the smaller."""
    assert first("9.3%", "50") == (GroupCounts(left=5, right=45, total=50), [("percent-none", "first_left_text", True)])
    assert first("50%", "3")[0].left == 1


@pytest.mark.parametrize(
    ("text", "key"),
    [("<1%", "percent-below"), ("x", "not-a-percent"), ("101%", "risk-out-of-range"), ("12 in 100", "not-a-percent")],
)
def test_what_gives_no_percentage_is_marked(text, key):
    """And not used; the total stays."""
    assert first(text, "412") == (GroupCounts(total=412), [(key, "first_left_text", False)])


def test_totals_have_to_agree():
    """One in the cell and one beside it."""
    assert first("9.2% of 412", "411")[1] == [("total-disagrees", "first_left_text", False)]
    assert first("9.2%", "412/800")[1] == [("not-a-count", "first_right_text", False)]
    assert first("9.2%", "")[0] == GroupCounts()


@given(st.integers(0, 400), st.integers(0, 1000), st.integers(0, 2))
def test_the_fitting_counts_are_those_that_round_to_it(total, thousandths, decimals):
    """Every whole number is tried, halves up and to the even digit."""
    scale = 10**decimals
    percent = printed_percent(f"{thousandths * scale // 10 / scale:.{decimals}f}")
    assert percent is not None
    fitting = fitting_counts(percent, total)
    fits = [count for count in range(total + 1) if rounds_to(percent, count, total)]
    assert (fitting.low, fitting.high) == ((min(fits), max(fits)) if fits else (None, None))
    wanted = fits or range(total + 1)
    exact = percent.value * total / 100
    assert fitting.taken == min(wanted, key=lambda count: (abs(count - exact), count))


@given(st.integers(1, 10**9).flatmap(lambda total: st.tuples(st.integers(0, total), st.just(total))))
def test_a_written_percentage_gives_its_count_back(table):
    """However many people there are."""
    events, total = table
    percent = printed_percent(written_percent(events, total))
    assert isinstance(percent, PrintedPercent)
    fitting = fitting_counts(percent, total)
    assert (fitting.low, fitting.taken, fitting.high) == (events, events, events)
