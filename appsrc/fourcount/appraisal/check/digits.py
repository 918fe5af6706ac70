"""Whether a number prints as the digits that a paper gives.

"1.50" has two decimals, and only what rounds to it there reproduces it: halves up, to the even digit, or as the nearest
double happens to lie, since all three are in use. Estimates are fractions of whole numbers and are compared exactly.
Limits are floats; a billionth of a unit of the last digit is allowed there, since an irrational limit lies on a tie by
rounding alone. A printed infinity is met by an infinite limit of its sign alone.
"""

from __future__ import annotations

import math
from decimal import ROUND_HALF_EVEN, Decimal
from fractions import Fraction

from fourcount.record.entry.readings import PrintedFigure, PrintedNumber, PrintedUnit

Number = Fraction | float

SCALES: dict[PrintedUnit, int] = {"one": 1, "percent": 100, "per-1000": 1000}
_HALF = Fraction(1, 2)
_TIE = 1e-9
FINE = 20
"""Units of the last digit that a number, or the way between limits, has to have."""
_LONGEST_SLIP = 8  # digits; longer numbers are not looked through


def scale_of(figure: PrintedFigure) -> int:
    """How many times a fraction is, on the scale on which this figure is printed."""
    return SCALES[figure.unit]


def units_in_one(printed: PrintedNumber) -> int:
    """How many units of the last printed digit make 1."""
    return int(10**printed.decimals)


def last_digits(printed: PrintedNumber) -> int:
    """The printed number in units of its last digit: 150 for "1.50"."""
    return round(printed.value * units_in_one(printed))


def coarse(printed: PrintedNumber) -> bool:
    """Whether a number has so few digits that one of them, or a fit by chance, says little."""
    return math.isfinite(printed.value) and abs(last_digits(printed)) < FINE


def rounds_to(value: Number, printed: PrintedNumber) -> bool:
    """Whether a value, on the printed scale, rounds to the printed digits."""
    if math.isinf(printed.value):
        return value == printed.value
    size = _in_units(value, printed)
    if size is None:
        return False
    units, below = abs(last_digits(printed)), math.floor(size)
    if _on_a_tie(size, below):
        return units in {below + 1, below + below % 2, _as_a_double(value, printed.decimals)}
    return units == math.floor(size + _HALF)


def _on_a_tie(size: Number, below: int) -> bool:
    if isinstance(size, Fraction):
        return size - below == _HALF
    return abs(size - below - 0.5) <= _TIE * max(1.0, size)


def _as_a_double(value: Number, decimals: int) -> int:
    """The units that a program prints which holds a half as a double: 0.075 lies below it, and comes out as 0.07."""
    return int(Decimal(abs(float(value))).scaleb(decimals).to_integral_value(ROUND_HALF_EVEN))


def cut_to(value: Number, printed: PrintedNumber) -> bool:
    """Whether the printed digits are those of the value, the rest left off: 0.539 as 0.53."""
    size = _in_units(value, printed)
    return size is not None and math.floor(size) == abs(last_digits(printed))


def within_one(value: Number, printed: PrintedNumber) -> bool:
    """Whether the rounded value differs from the printed one by one in the last digit, or by nothing."""
    if not _finite(value) or math.isinf(printed.value):
        return value == printed.value
    units = last_digits(printed)
    return abs(float(value * units_in_one(printed)) - units) <= 1.5 + _TIE * max(1.0, abs(units))


def exchanged(printed: PrintedNumber) -> tuple[PrintedNumber, ...]:
    """The print with two neighbouring digits exchanged, at each place where that changes it: 0.87 for 0.78."""
    if math.isinf(printed.value):
        return ()
    digits = str(abs(last_digits(printed))).zfill(printed.decimals + 1)
    if len(digits) > _LONGEST_SLIP:
        return ()
    sign = -1 if printed.value < 0 else 1
    return tuple(
        _of_units(sign * int(digits[:at] + digits[at + 1] + digits[at] + digits[at + 2 :]), printed.decimals)
        for at in range(len(digits) - 1)
        if digits[at] != digits[at + 1]
    )


def transposed(value: Number, printed: PrintedNumber) -> bool:
    """Whether the value rounds to the print with two neighbouring digits exchanged."""
    return any(rounds_to(value, other) for other in exchanged(printed))


def bounds(printed: PrintedNumber) -> tuple[float, float]:
    """The least and the greatest value that may stand behind the printed digits."""
    half = 0.5 / units_in_one(printed)
    return printed.value - half, printed.value + half


def _of_units(units: int, decimals: int) -> PrintedNumber:
    value = units / 10**decimals
    return PrintedNumber(text=f"{value:.{decimals}f}", value=value, decimals=decimals)


def _finite(value: Number) -> bool:
    return isinstance(value, Fraction) or math.isfinite(value)


def _in_units(value: Number, printed: PrintedNumber) -> Number | None:
    """The value's size in units of the last printed digit; None where its sign is not the printed one's."""
    if not _finite(value) or math.isinf(printed.value):
        return None
    units = last_digits(printed)
    if units and (value < 0) != (units < 0):
        return None
    if isinstance(value, Fraction):
        return abs(value) * units_in_one(printed)
    return abs(value) * units_in_one(printed)
