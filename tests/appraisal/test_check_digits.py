"""Which values print as which digits."""

from __future__ import annotations

import math
from decimal import ROUND_HALF_EVEN, ROUND_HALF_UP, Decimal
from fractions import Fraction

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.appraisal.check.digits import bounds, cut_to, exchanged, rounds_to, transposed, within_one
from printed_figures import number


@pytest.mark.parametrize(
    ("value", "text", "fits"),
    [
        (Fraction(3, 2), "1.50", True),
        (Fraction(1504, 1000), "1.50", True),
        (Fraction(1505, 1000), "1.50", True),  # a tie, to the even digit
        (Fraction(1505, 1000), "1.51", True),  # the same tie, half up
        (Fraction(1515, 1000), "1.51", True),  # the nearest double lies below the half
        (Fraction(3, 8), "0.37", False),  # a double itself: half up and half to even both give 0.38
        (Fraction(1515, 1000), "1.52", True),
        (Fraction(1506, 1000), "1.50", False),
        (Fraction(1506, 1000), "1.5", True),
        (Fraction(-79, 10), "-7.9", True),
        (Fraction(-79, 10), "7.9", False),
        (Fraction(-1, 1000), "0.00", True),
        (Fraction(539, 1000), "0.53", False),
        (0.7805, "0.78", True),
        (0.785, "0.78", True),
        (0.785, "0.79", True),
        (0.7851, "0.78", False),
        (math.inf, "9.9", False),
    ],
)
def test_digits_are_respected(value: Fraction | float, text: str, fits: bool) -> None:
    """As many decimals as are printed, halves up, to the even digit or as doubles print, nothing else."""
    assert rounds_to(value, number(text)) is fits


@given(st.integers(-(10**6), 10**6), st.integers(1, 10**4), st.integers(0, 3))
def test_the_ways_of_rounding_count_and_no_other(above: int, below: int, decimals: int) -> None:
    """Exactly what decimal arithmetic rounds half up or half to even, or what the double at a half prints as."""
    value = Fraction(above, below)
    step = Decimal(1).scaleb(-decimals)
    exact = Decimal(above) / Decimal(below)
    ways = {exact.quantize(step, rounding) for rounding in (ROUND_HALF_UP, ROUND_HALF_EVEN)}
    if (exact / step) % 1 in (Decimal("0.5"), Decimal("-0.5")):
        ways.add(Decimal(f"{above / below:.{decimals}f}"))
    for neighbour in {way + step * away for way in ways for away in (-1, 0, 1)}:
        assert rounds_to(value, number(str(neighbour + 0))) is (neighbour in ways)


def test_digits_cut_off_are_told_from_rounded_ones() -> None:
    """0.539 is 0.54 when rounded and 0.53 when cut."""
    assert cut_to(0.539, number("0.53"))
    assert not cut_to(0.539, number("0.54"))
    assert not cut_to(-0.539, number("0.53"))


def test_one_in_the_last_digit() -> None:
    """0.539 may be 0.53, 0.54 or 0.55 after rounding on the way, not 0.56."""
    assert [within_one(0.539, number(text)) for text in ("0.52", "0.53", "0.54", "0.55", "0.56")] == [
        False,
        True,
        True,
        True,
        False,
    ]


def test_exchanged_digits() -> None:
    """Neighbouring digits change places wherever that changes the number."""
    assert [other.text for other in exchanged(number("0.87"))] == ["8.07", "0.78"]
    assert [other.text for other in exchanged(number("1.10"))] == ["1.01"]
    assert transposed(0.7806, number("0.87"))
    assert not transposed(0.7806, number("0.88"))


@given(st.integers(-(10**5), 10**5), st.integers(0, 4))
def test_bounds_hold_what_rounds_so(units: int, decimals: int) -> None:
    """The bounds lie half a unit off, and the number itself is among what rounds to it."""
    printed = number(f"{units / 10**decimals:.{decimals}f}")
    least, most = bounds(printed)
    assert least < printed.value < most
    assert rounds_to(printed.value, printed)


@pytest.mark.parametrize(("text", "fits"), [("0.38", True), ("0.37", False), ("0.36", False)])
def test_a_float_on_a_tie_rounds_up_or_to_the_even_digit(text: str, fits: bool) -> None:
    """3/8 to two decimals is 0.38 both ways; 0.37 leaves a digit off. An even digit below the tie is taken: 0.12."""
    assert rounds_to(0.375, number(text)) is fits
    assert rounds_to(0.125, number("0.12"))
    assert rounds_to(Fraction(75, 1000), number("0.07"))  # the double nearest to 0.075 lies below it
    assert rounds_to(Fraction(75, 1000), number("0.08"))
    assert rounds_to(0.125, number("0.13"))
