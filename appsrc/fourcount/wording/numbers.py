"""Numbers to digits: the one place where anything is rounded.

Halves go up. What is rounded is the float's first fifteen significant digits, those it holds for
certain, so that 0.0125 is 1.25% and rounds to 1.3%, whatever its binary tail says. Nothing that differs
from no effect, from 0 or from everybody is ever printed as if it did not: it takes more digits instead.

Percentages and differences per 100 have one decimal, and two significant digits where that is more
(0.075%): small risks differ by what one decimal would hide. A limit has its estimate's decimals, and one
more where it would otherwise look like the estimate and need not.
"""

from __future__ import annotations

import math

INFINITY = "∞"
MINUS = "−"
TO = " to "

PERCENT_DECIMALS = 1
RATIO_DECIMALS = 2
RATE_DECIMALS = 1
LARGE_RATE = 1000  # from here on a rate has no decimals
SMALL_FIGURES = 2  # significant digits at least of a small risk or difference
NEARLY_ALL_DECIMALS = 2  # of a percentage above 99
MOST_DECIMALS = 12
SMALLEST_PERCENT = 0.000001  # as a fraction: 0.0001%, below which only "less than that" is printed
SMALLEST_RATIO = 0.000001  # below it a ratio is written with a power of ten
SUPERSCRIPT = str.maketrans("-0123456789", "⁻⁰¹²³⁴⁵⁶⁷⁸⁹")
UNCERTAIN_PART = 1e-9  # taken off a number needed before it is rounded up: the float's own noise


def whole(n: int) -> str:
    """A whole number with its thousands parted: 1,204."""
    return f"{n:,}"


def fixed(x: float, decimals: int) -> str:
    """Half-up to so many decimals; negative decimals round to tens and hundreds. Never minus zero."""
    return _written(_scaled(x, decimals), decimals, negative=x < 0)


def people(risk: float, denominator: int) -> int:
    """How many whole people of ``denominator`` (a power of ten) a risk, or a difference's size, stands for."""
    return _scaled(risk, len(str(denominator)) - 1)


def percent(fraction: float) -> str:
    """A study's percentage: one decimal, two significant digits under 1%, two decimals above 99%, no space."""
    return percent_limit(fraction, fraction)


def percent_limit(fraction: float, estimate: float, sign: str = "%") -> str:
    """A limit of a risk, with the decimals of its estimate; ``sign`` is left out before " to "."""
    if 0 < fraction < SMALLEST_PERCENT:
        return f"<{_written(1, 4, negative=False)}{sign}"
    if 1 - SMALLEST_PERCENT < fraction < 1:
        return f">{_written(999_999, 4, negative=False)}{sign}"
    own = fraction if estimate in (0.0, 1.0) else estimate  # nobody and everybody have no digits to go by
    decimals = _kept_from_ends(fraction, _percent_decimals(own))
    return f"{fixed_percent(fraction, _apart_from_estimate(fraction, estimate, decimals))}{sign}"


def percent_given(fraction: float) -> str:
    """A risk as somebody typed it, 12% or 12.5%: two decimals, two significant digits, no trailing zeros."""
    if 0 < fraction < SMALLEST_PERCENT:
        return percent_limit(fraction, fraction)
    decimals = max(2, _percent_decimals(fraction))
    return f"{fixed_percent(fraction, decimals).rstrip('0').rstrip('.')}%"


def percent_whole(fraction: float) -> str:
    """A whole percentage for patients and for relative effects, with more digits only where it would say 0% or 100%."""
    if 0 < fraction < SMALLEST_PERCENT:
        return percent_limit(fraction, fraction)
    return f"{fixed_percent(fraction, _kept_from_ends(fraction, 0, figures=1))}%"


def fixed_percent(fraction: float, decimals: int) -> str:
    """A fraction in hundredths with so many decimals, without a sign of per cent."""
    return _written(_scaled(fraction, decimals + 2), decimals, negative=fraction < 0)


def hundred(difference: float) -> str:
    """The size of a risk difference per 100 people: one decimal, two significant digits where that is more."""
    return hundred_limit(difference, difference)


def hundred_limit(difference: float, estimate: float) -> str:
    """The size of a limit of a difference per 100 people, with the decimals of its estimate."""
    size = abs(difference)
    if 0 < size < SMALLEST_PERCENT:
        return f"<{_written(1, 4, negative=False)}"
    decimals = _small_decimals(abs(estimate) or size)
    if size and _scaled(size, decimals + 2) == 0:
        decimals = _small_decimals(size)
    return fixed_percent(size, _apart_from_estimate(difference, estimate, decimals))


def thousand(difference: float) -> str:
    """The size of a difference per 1,000 people: whole from 10 up, else two significant digits."""
    size = abs(difference)
    if 0 < size < SMALLEST_PERCENT:
        return f"<{_written(1, 3, negative=False)}"
    decimals = max(0, _significant_decimals(size, SMALL_FIGURES) - 3) if size else 0
    return _written(_scaled(size, decimals + 3), decimals, negative=False)


def ratio(x: float) -> str:
    """A ratio: two decimals from 0.10 to 9.99, otherwise three significant digits; 1.00 only where it is 1.

    Below one millionth the three digits stand before a power of ten: 4.20×10⁻⁷.
    """
    return ratio_limit(x, x)


def ratio_limit(x: float, estimate: float) -> str:
    """A limit of a ratio, with the decimals of its estimate, and more where that would reach 1 or 0."""
    if x == math.inf:
        return INFINITY
    if x <= 0:
        return f"{MINUS}{ratio_limit(-x, estimate)}" if x else "0"
    if x < SMALLEST_RATIO:
        return _tiny(x)
    if x == estimate:
        return fixed(x, _shown_ratio_decimals(x))
    own = _shown_ratio_decimals(x)
    decimals = max(_shown_ratio_decimals(estimate), 0) if SMALLEST_RATIO <= estimate < math.inf else own
    if _scaled(x, decimals) == 0:
        decimals = _significant_decimals(x, SMALL_FIGURES)
    return fixed(x, _apart_from_one(x, decimals))


def _tiny(x: float) -> str:
    """Three significant digits and their power of ten."""
    digits, power = f"{x:.2e}".split("e")
    return f"{digits}×10{str(int(power)).translate(SUPERSCRIPT)}"


def rate(x: float) -> str:
    """The size of a rate, or of a difference of rates, in the unit that is shown: one decimal, two digits at least."""
    return rate_limit(x, x)


def rate_limit(x: float, estimate: float) -> str:
    """The size of a limit of a rate, with the decimals of its estimate, more where it would reach no event."""
    size = abs(x)
    if size == math.inf:
        return INFINITY
    if 0 < size < SMALLEST_RATIO:
        return _tiny(size)
    own = abs(estimate) if 0 < abs(estimate) < math.inf else size
    decimals = _rate_decimals(own)
    if size and _scaled(size, decimals) == 0:
        decimals = _rate_decimals(size)
    return fixed(size, max(0, _apart_from_estimate(x, estimate, decimals, shift=0)))


def quantity(x: float) -> str:
    """An amount of person-time, or a mean, as it was typed: thousands parted, no trailing zeros."""
    if isinstance(x, int):
        return whole(x)
    digits = f"{x:,.6f}".rstrip("0").rstrip(".")
    return _tiny(x) if digits == "0" and x else digits


def p_value(p: float) -> str:
    """A p value: two significant digits down to ``<0.001``; ``>0.99`` where it would print 1 and is not."""
    if p < 0.001:
        return "<0.001"
    if p >= 1 or _scaled(p, 12) == 10**12:
        return "1"
    if p >= 0.995:
        return ">0.99"
    return fixed(p, _significant_decimals(p, 2))


def p_phrase(p: float) -> str:
    """A p value after its letter: ``p = 0.050``, ``p < 0.001``."""
    text = p_value(p)
    return f"p {text[0]} {text[1:]}" if text[0] in "<>" else f"p = {text}"


def number_needed(value: float) -> str:
    """A number needed, rounded up after a relative 1e-9 is taken off; no effect at all is infinity."""
    if value == math.inf:
        return INFINITY
    return whole(max(1, math.ceil(value * (1 - UNCERTAIN_PART))))


def level(fraction: float) -> str:
    """A confidence level as people say it: 95%, 99.9%."""
    return percent_given(fraction)


def plain(x: float, decimals: int = 4) -> str:
    """A quantity inside a formula, with a true minus sign; more decimals where it would print as 0."""
    if math.isinf(x):
        return INFINITY if x > 0 else f"{MINUS}{INFINITY}"
    size = abs(x)
    if size and _scaled(size, decimals) == 0:
        decimals = _significant_decimals(size, SMALL_FIGURES)
    return f"{MINUS if x < 0 else ''}{fixed(size, decimals)}" if size else "0"


def _scaled(x: float, places: int) -> int:
    """The size of x times 10 to the power of ``places``, a whole number, halves up."""
    mantissa, exponent = f"{abs(x):.14e}".split("e")
    digits = int(mantissa.replace(".", ""))
    power = int(exponent) - 14 + places
    if power >= 0:
        return digits * int(10**power)
    unit: int = 10**-power
    return (2 * digits + unit) // (2 * unit)


def _written(scaled: int, decimals: int, *, negative: bool) -> str:
    """A whole number of 10^-decimals with its point, its thousands and its sign."""
    sign = MINUS if negative and scaled else ""
    if decimals <= 0:
        return f"{sign}{scaled * 10**-decimals:,}"
    before, after = divmod(scaled, 10**decimals)
    return f"{sign}{before:,}.{after:0{decimals}d}"


def _significant_decimals(x: float, figures: int) -> int:
    """How many decimals show x with so many significant digits, a carry (0.0995 to 0.10) included."""
    magnitude = int(f"{abs(x):.14e}".split("e")[1])
    decimals = figures - 1 - magnitude
    return decimals - 1 if _scaled(x, decimals) == 10**figures else decimals


def _percent_decimals(fraction: float) -> int:
    """Decimals of a study's percentage, by the smaller of its two sides."""
    left = 1 - fraction
    if left >= 0.01 or left < SMALLEST_PERCENT:
        return _small_decimals(abs(fraction))
    return max(
        PERCENT_DECIMALS,
        min(NEARLY_ALL_DECIMALS, _significant_decimals(left, SMALL_FIGURES) - 2),
        _significant_decimals(left, 1) - 2,
    )


def _small_decimals(size: float) -> int:
    """Decimals of a share or a difference in hundredths: one, and two significant digits where that is more."""
    if size < SMALLEST_PERCENT:
        return PERCENT_DECIMALS
    return max(PERCENT_DECIMALS, _significant_decimals(size, SMALL_FIGURES) - 2)


def _kept_from_ends(fraction: float, decimals: int, figures: int = SMALL_FIGURES) -> int:
    """More decimals of a percentage where somebody would become nobody, or nearly all would become all."""
    shown = _scaled(fraction, decimals + 2)
    if shown == 0 and abs(fraction) >= SMALLEST_PERCENT:
        return _significant_decimals(fraction, figures) - 2
    if shown == 10 ** (decimals + 2) and abs(1 - fraction) >= SMALLEST_PERCENT:
        return _significant_decimals(1 - fraction, 1) - 2
    return decimals


def _apart_from_estimate(limit: float, estimate: float, decimals: int, shift: int = 2) -> int:
    """One decimal more where a limit would print as the estimate does, if it then lies on its own side of it.

    ``shift`` is 2 where hundredths are printed of the numbers given.
    """
    if limit == estimate or limit * estimate <= 0:
        return decimals
    shown = _scaled(estimate, decimals + shift)
    finer = _scaled(limit, decimals + shift + 1) - 10 * shown
    apart = finer > 0 if abs(limit) > abs(estimate) else finer < 0
    return decimals + 1 if _scaled(limit, decimals + shift) == shown and apart else decimals


def _rate_decimals(size: float) -> int:
    """Decimals of a rate: one from 1 to 1,000, none from there on, two significant digits below 1."""
    if size >= LARGE_RATE or size == 0:
        return 0 if size else RATE_DECIMALS
    return max(RATE_DECIMALS, _significant_decimals(size, SMALL_FIGURES))


def _ratio_decimals(x: float) -> int:
    if 0.09995 <= x < 9.995:
        return RATIO_DECIMALS
    return _significant_decimals(x, 3)


def _shown_ratio_decimals(x: float) -> int:
    return _apart_from_one(x, _ratio_decimals(x))


def _apart_from_one(x: float, decimals: int) -> int:
    """The first number of decimals at which x does not look like 1, unless it is 1."""
    while decimals < MOST_DECIMALS and decimals >= 0 and _scaled(x, decimals) == 10**decimals:
        if _scaled(x, MOST_DECIMALS) == 10**MOST_DECIMALS:
            return RATIO_DECIMALS
        decimals += 1
    return decimals
