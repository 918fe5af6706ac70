"""Time spans and rates in one person as people write them."""

from __future__ import annotations

import pytest
from hypothesis import given

from fourcount.record.entry.duration import marks_of_study_span, read_duration
from fourcount.record.entry.person_rate import read_rate
from fourcount.record.entry.readings import Blank, Duration, RateReading, Unreadable
from nearly import ANY_TEXT, NEARLY

SPANS = [
    ("12 months", 12, "month"),
    ("12-month", 12, "month"),
    ("12mo", 12, "month"),
    ("12 mths.", 12, "month"),
    ("12 months' follow-up", 12, "month"),
    ("twelve months", 12, "month"),
    ("5 years", 5, "year"),
    ("1.5 years", 1.5, "year"),
    ("1,5 years", 1.5, "year"),
    ("1\u00b75 y", 1.5, "year"),
    (".5 yr", 0.5, "year"),
    ("over 2 yrs", 2, "year"),
    ("at 2 years", 2, "year"),
    ("a year", 1, "year"),
    ("in one year", 1, "year"),
    ("30-day", 30, "day"),
    ("1,000 days", 1000, "day"),
    ("1 000 days of follow-up", 1000, "day"),
    ("six weeks", 6, "week"),
    ("thirty-two weeks", 32, "week"),
    ("6 wk", 6, "week"),
    ("5\u00a0Years", 5, "year"),
    ("\u0661\u0662 months", 12, "month"),
    ("100 years", 100, "year"),
]
NO_SPANS = [
    ("12", "duration-without-unit"),
    ("1.5", "duration-without-unit"),
    ("0 years", "duration-not-above-zero"),
    ("-3 years", "duration-not-above-zero"),
    ("0.00000000001 days", "duration-not-above-zero"),
    ("101 years", "duration-too-long"),
    ("36,526 days", "duration-too-long"),
    ("9" * 350 + " days", "duration-too-long"),
    ("12 m", "not-a-duration"),
    ("median 2.3 years", "not-a-duration"),
    ("1 to 5 years", "not-a-duration"),
    ("up to 24 weeks", "not-a-duration"),
    ("2 years and 6 months", "not-a-duration"),
    ("1.2.3 years", "not-a-duration"),
    ("1e5 years", "not-a-duration"),
    ("years", "not-a-duration"),
    ("until discharge", "not-a-duration"),
    ("9" * 5000 + " years", "not-a-duration"),
]
RATES = [
    ("12 per 1,000 person-years", 0.012, "year"),
    ("12 per 1000 person years", 0.012, "year"),
    ("12/1000 py", 0.012, "year"),
    ("12/1,000 person-years", 0.012, "year"),
    ("12 in 1,000 women-years", 0.012, "year"),
    ("12 events per 1,000 patient-years", 0.012, "year"),
    ("12 in 1,000 a year", 0.012, "year"),
    ("12 per 1,000 people per year", 0.012, "year"),
    ("12 per 1,000/year", 0.012, "year"),
    ("1.2 per 100 patient-yrs", 0.012, "year"),
    ("1,2 per 100 PY", 0.012, "year"),
    ("1.2% per year", 0.012, "year"),
    ("1,2 % a year", 0.012, "year"),
    ("1.2 %/yr", 0.012, "year"),
    ("1.2 per cent per year", 0.012, "year"),
    ("0.012 per year", 0.012, "year"),
    ("0.4/month", 0.4, "month"),
    ("3 per person-year", 3, "year"),
    ("5 per 10,000 person-days", 0.0005, "day"),
    ("0 per 1,000 person-years", 0, "year"),
    ("38 in 4,120 person-years", 38 / 4120, "year"),
]
NO_RATES = [
    ("12", "rate-without-time"),
    ("12%", "rate-without-time"),
    ("12 per 1,000", "rate-without-time"),
    ("12 per 1,000 people", "rate-without-time"),
    ("-1 per year", "negative-rate"),
    ("9999999999 per year", "too-large"),
    ("1 per 9999999999 person-years", "too-large"),
    ("12 per 0 person-years", "not-a-rate"),
    ("1.2% per 100 person-years", "not-a-rate"),
    ("12% over 5 years", "not-a-rate"),
    ("12 1000 person-years", "not-a-rate"),
    ("5 per 1,000 catheter-days", "not-a-rate"),
    ("0.4 month", "not-a-rate"),
    ("often", "not-a-rate"),
    ("9" * 5000 + " per year", "not-a-rate"),
]


@pytest.mark.parametrize(("text", "value", "unit"), SPANS)
def test_a_span_is_read_as_people_write_it(text: str, value: float, unit: str) -> None:
    """One number and one unit, with what print puts around them."""
    assert read_duration(text) == Duration(value=value, unit=unit)  # type: ignore[arg-type]


@pytest.mark.parametrize(("text", "key"), NO_SPANS)
def test_what_is_no_single_span_is_refused_with_its_reason(text: str, key: str) -> None:
    """A number alone could be of any unit, and m is minutes as well as months."""
    reading = read_duration(text)
    assert isinstance(reading, Unreadable)
    assert reading.key == key


@pytest.mark.parametrize(("text", "value", "unit"), RATES)
def test_a_rate_is_read_as_people_write_it(text: str, value: float, unit: str) -> None:
    """Events in one person over one unit of time."""
    reading = read_rate(text)
    assert isinstance(reading, RateReading)
    assert (reading.value, reading.unit) == (pytest.approx(value, rel=1e-15), unit)


@pytest.mark.parametrize(("text", "key"), NO_RATES)
def test_what_is_no_rate_is_refused_with_its_reason(text: str, key: str) -> None:
    """Without a time it is a risk, and time of beds or catheters is no time of people."""
    reading = read_rate(text)
    assert isinstance(reading, Unreadable)
    assert reading.key == key


def test_an_empty_field_is_blank() -> None:
    """Nothing typed is neither a value nor a mistake."""
    assert (read_duration(" "), read_rate("\u200b")) == (Blank(), Blank())


@pytest.mark.parametrize(
    ("text", "years"), [("12 months", 1), ("365.25 days", 1), ("26 weeks", 26 * 7 / 365.25), ("18 months", 1.5)]
)
def test_spans_of_all_units_are_compared_in_years(text: str, years: float) -> None:
    """Twelve months are a year, exactly."""
    reading = read_duration(text)
    assert isinstance(reading, Duration)
    assert reading.years == pytest.approx(years, rel=1e-15)


@given(ANY_TEXT | NEARLY)
def test_every_text_gets_an_answer(text: str) -> None:
    """Reading never raises; a span has an end, a rate is not negative, and a reason quotes the text."""
    span, rate = read_duration(text), read_rate(text)
    assert isinstance(span, Duration | Blank | Unreadable)
    assert isinstance(rate, RateReading | Blank | Unreadable)
    if isinstance(span, Duration):
        assert 0 < span.years <= 100
    if isinstance(rate, RateReading):
        assert 0 <= rate.value <= 1e9
    assert all(len(str(each.facts["text"])) <= 40 for each in (span, rate) if isinstance(each, Unreadable))


@pytest.mark.parametrize(
    ("text", "key"),
    [("0 days", "duration-not-above-zero"), ("-3 days", "duration-not-above-zero"), ("101 years", "duration-too-long")],
)
def test_a_study_that_took_no_time_is_marked(text, key):
    """Such a span is not used; its mark says why."""
    (mark,) = marks_of_study_span(text)
    assert (mark.field, mark.key, mark.facts, mark.used) == ("span_text", key, {"text": text}, False)


@pytest.mark.parametrize("text", ["", "12 months", "30-day", "median 2 years", "12", "inpatient stay", "1 to 5 years"])
def test_words_in_place_of_a_study_span_are_no_mistake(text):
    """They are said as typed, though no risk can be carried from them to another span."""
    assert marks_of_study_span(text) == ()
