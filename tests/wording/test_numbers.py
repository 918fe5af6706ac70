"""Rounding: the edges, one by one, and what must never be printed."""

from __future__ import annotations

import math
from decimal import ROUND_HALF_UP, Decimal

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.wording import numbers

fractions = st.floats(min_value=0, max_value=1)
ratios = st.floats(min_value=1e-6, max_value=1e9)


@pytest.mark.parametrize(
    ("fraction", "text"),
    [
        (0.0, "0.0%"),
        (1.0, "100.0%"),
        (38 / 412, "9.2%"),
        (70 / 409, "17.1%"),
        (9 / 2000, "0.45%"),
        (0.0125, "1.3%"),  # goes up although the float lies below it
        (9 / 12000, "0.075%"),
        (3 / 12000, "0.025%"),
        (0.0025, "0.25%"),
        (0.005, "0.50%"),
        (0.00996, "1.0%"),
        (0.00994, "0.99%"),
        (0.0004, "0.040%"),
        (0.00049, "0.049%"),
        (0.0005, "0.050%"),
        (0.000001, "0.00010%"),
        (1e-9, "<0.0001%"),
        (0.9994, "99.94%"),
        (0.99925, "99.93%"),
        (0.995, "99.50%"),
        (0.9899, "99.0%"),
        (0.9995, "99.95%"),
        (0.9997, "99.97%"),
        (0.9999999, ">99.9999%"),
        (-0.019, "−1.9%"),  # a Wald limit
    ],
)
def test_a_percentage_has_one_decimal_and_more_where_its_smaller_side_is_small(fraction, text):
    """9.2%, no space, half-up; two digits of a small risk; never 0.0% for somebody nor 100.0% for nearly all."""
    assert numbers.percent(fraction) == text


@pytest.mark.parametrize(
    ("x", "text"),
    [
        (0.0, "0"),
        (math.inf, "∞"),
        (1.0, "1.00"),
        (0.4921, "0.49"),
        (0.145, "0.15"),
        (0.10, "0.10"),
        (0.0996, "0.0996"),
        (0.09996, "0.10"),
        (0.00012345, "0.000123"),
        (1e-9, "1.00×10⁻⁹"),
        (4.2e-7, "4.20×10⁻⁷"),
        (0.000001, "0.00000100"),
        (9.994, "9.99"),
        (9.995, "10.0"),
        (12.34, "12.3"),
        (99.95, "100"),
        (123.4, "123"),
        (1234.5, "1,230"),
        (0.996, "0.996"),
        (0.9949, "0.99"),
        (0.9951, "0.995"),
        (1.004, "1.004"),
        (0.99997, "0.99997"),
        (1 - 1e-16, "1.00"),
    ],
)
def test_a_ratio_has_two_decimals_or_three_digits_and_is_1_only_where_it_is(x, text):
    """0.10 to 9.99 two decimals, otherwise three significant digits."""
    assert numbers.ratio(x) == text


@pytest.mark.parametrize(
    ("limit", "estimate", "text"),
    [
        (0.32, 0.4921, "0.32"),
        (0.996, 0.5, "0.996"),
        (0.001, 0.5, "0.0010"),
        (0.5, 0.996, "0.500"),
        (168.24, 12.34, "168.2"),
        (0.96, 12.34, "0.96"),
        (0.004, 12.34, "0.0040"),
        (1.4, 123.0, "1.4"),
        (12345.0, 9.0, "12,345.00"),
        (0.0, 0.5, "0"),
        (math.inf, 0.5, "∞"),
        (0.0768, 0.0, "0.0768"),
        (0.8, 4.2e-7, "0.80"),
        (4.2e-7, 0.5, "4.20×10⁻⁷"),
    ],
)
def test_a_limit_takes_the_decimals_of_its_estimate(limit, estimate, text):
    """More only where it would look like 1 or like 0."""
    assert numbers.ratio_limit(limit, estimate) == text


@pytest.mark.parametrize(
    ("p", "text"),
    [
        (0.0496, "0.050"),
        (0.0504, "0.050"),
        (0.0995, "0.10"),
        (0.00995, "0.010"),
        (0.00123, "0.0012"),
        (0.001, "0.0010"),
        (0.000999, "<0.001"),
        (0.0, "<0.001"),
        (0.34, "0.34"),
        (0.9949, "0.99"),
        (0.995, ">0.99"),
        (0.99999, ">0.99"),
        (1 - 1e-13, "1"),
        (1.0, "1"),
    ],
)
def test_a_p_value_has_two_significant_digits_between_its_two_floors(p, text):
    """Never 0.000, and 1 only where it is 1."""
    assert numbers.p_value(p) == text


def test_a_p_value_takes_its_own_sign():
    """p = 0.050, p < 0.001, p > 0.99."""
    assert [numbers.p_phrase(p) for p in (0.0496, 0.0001, 0.998)] == ["p = 0.050", "p < 0.001", "p > 0.99"]


@pytest.mark.parametrize(
    ("value", "text"),
    [(12.67, "13"), (20.00000000000001, "20"), (20.0001, "21"), (1.0, "1"), (1203.2, "1,204"), (math.inf, "∞")],
)
def test_a_number_needed_is_rounded_up_but_not_by_a_floats_noise(value, text):
    """Cochrane open learning, module 11-6: always up to the next whole number."""
    assert numbers.number_needed(value) == text


@pytest.mark.parametrize(
    ("difference", "hundred", "thousand"),
    [
        (-0.0789, "7.9", "79"),
        (0.0, "0.0", "0"),
        (-0.0005, "0.050", "0.50"),
        (0.005, "0.50", "5.0"),
        (0.00994, "0.99", "9.9"),
        (0.00996, "1.0", "10"),
        (0.000004, "0.00040", "0.0040"),
        (0.0004, "0.040", "0.40"),
        (1e-9, "<0.0001", "<0.001"),
        (0.4123, "41.2", "412"),
        (-1.0, "100.0", "1,000"),
    ],
)
def test_a_difference_is_a_size_per_100_and_per_1000(difference, hundred, thousand):
    """Its side is a word, so its size has no sign; 0.0 only where it is 0."""
    assert (numbers.hundred(difference), numbers.thousand(difference)) == (hundred, thousand)


@pytest.mark.parametrize(
    ("fraction", "given_text", "whole_text"),
    [
        (0.12, "12%", "12%"),
        (0.125, "12.5%", "13%"),
        (0.0025, "0.25%", "0.3%"),
        (0.003, "0.3%", "0.3%"),
        (0.0, "0%", "0%"),
        (1.0, "100%", "100%"),
        (0.1, "10%", "10%"),
        (0.995, "99.5%", "99.5%"),
        (0.00075, "0.075%", "0.08%"),
        (1e-9, "<0.0001%", "<0.0001%"),
    ],
)
def test_a_typed_risk_keeps_its_digits_and_a_patients_is_whole(fraction, given_text, whole_text):
    """12% stays 12%; a whole percentage takes digits only where it would say nobody or everybody."""
    assert (numbers.percent_given(fraction), numbers.percent_whole(fraction)) == (given_text, whole_text)


@pytest.mark.parametrize(
    ("x", "text"), [(-0.0789, "−0.0789"), (0.0, "0"), (1e-7, "0.00000010"), (12882.5, "12,882.5000"), (-math.inf, "−∞")]
)
def test_a_quantity_in_a_formula_has_four_decimals_and_a_true_minus(x, text):
    """A quantity that is not 0 does not print as 0."""
    assert numbers.plain(x) == text


@given(fractions, st.integers(min_value=0, max_value=6))
def test_rounding_is_half_up_as_decimal_has_it(x, decimals):
    """Against the standard library's decimal on the float's fifteen digits."""
    exact = Decimal(f"{x:.14e}").quantize(Decimal(1).scaleb(-decimals), rounding=ROUND_HALF_UP)
    assert numbers.fixed(x, decimals) == f"{exact:.{decimals}f}"


@pytest.mark.parametrize(
    ("limit", "estimate", "text"),
    [
        (0.006, 0.092, "0.6%"),
        (0.0004, 0.092, "0.040%"),
        (0.000395, 0.00075, "0.040%"),
        (0.00143, 0.00075, "0.143%"),
        (0.0038, 0.0, "0.38%"),
        (0.9962, 1.0, "99.62%"),
        (0.9997, 0.9, "99.97%"),
        (0.17091, 0.17115, "17.09%"),  # would print as 17.1% too
        (0.17141, 0.17115, "17.14%"),
        (0.17181, 0.17161, "17.2%"),  # 17.18% would look smaller than the 17.2% that it is above
        (0.17119, 0.17115, "17.12%"),
        (0.17115, 0.17115, "17.1%"),
    ],
)
def test_a_limit_of_a_risk_has_the_decimals_of_its_estimate(limit, estimate, text):
    """More where it would say nobody or all, and one more where it would look like the estimate and need not."""
    assert numbers.percent_limit(limit, estimate) == text


@pytest.mark.parametrize(
    ("limit", "estimate", "text"),
    [
        (-0.00109, -0.0005, "0.109"),
        (0.000078, -0.0005, "0.008"),
        (0.000078, -0.05, "0.0078"),
        (0.006, 0.05, "0.6"),
        (0.0004, 0.0, "0.040"),
        (-0.07862, -0.07891, "7.86"),
        (0.07862, -0.07891, "7.9"),  # its word tells it apart
    ],
)
def test_a_limit_of_a_difference_has_the_decimals_of_its_estimate(limit, estimate, text):
    """More where it would say no effect, and one more where it would look like the estimate and need not."""
    assert numbers.hundred_limit(limit, estimate) == text


@given(fractions, fractions)
def test_no_limit_looks_as_if_it_were_on_the_other_side_of_its_estimate(limit, estimate):
    """Printed, a limit is never above an estimate that it is below."""
    shown, beside = (
        float(text.strip("<>%")) for text in (numbers.percent_limit(limit, estimate), numbers.percent(estimate))
    )
    if limit < estimate:
        assert shown <= beside
    if limit > estimate:
        assert shown >= beside


@given(fractions)
def test_no_percentage_says_nobody_or_everybody_where_it_is_not(fraction):
    """Everything above 0 and under 100% keeps apart from both."""
    value = float(numbers.percent(fraction).strip("<>%"))
    assert (value > 0) == (fraction > 0)
    assert (value < 100) == (fraction < 1)


@given(ratios, ratios)
def test_no_limit_looks_like_1_or_crosses_it(limit, estimate):
    """Printed above 1, below 1 or at 1 as the limit itself is."""
    printed = float(numbers.ratio_limit(limit, estimate).replace(",", "").strip("<"))
    if abs(limit - 1) > 1e-11:
        assert (printed > 1) == (limit > 1)
        assert (printed < 1) == (limit < 1)
        assert printed > 0


@given(st.floats(min_value=0, max_value=1))
def test_no_p_value_prints_as_nothing_or_as_certainty(p):
    """0.000 and 1.0 never appear."""
    text = numbers.p_value(p)
    assert text in {"<0.001", ">0.99", "1"} or 0.001 <= float(text) <= 0.99
    assert (text == "1") == (p > 1 - 1e-12)


def test_nothing_prints_minus_zero():
    """A tiny negative quantity that rounds to nothing has no sign."""
    assert numbers.fixed(-0.0001, 1) == numbers.fixed(-0.0, 1) == "0.0"
