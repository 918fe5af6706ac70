"""Intervals as text: both limits in one way of writing, with the words that each side needs."""

from __future__ import annotations

from collections.abc import Callable

from fourcount.appraisal.findings import AnyNumberNeeded, Gap, Interval, NumberNeededLimit, Range
from fourcount.wording import labels, numbers
from fourcount.wording.gaps import limit_text

AnyInterval = Interval | Range | Gap

ROUNDING = 1e-12
WITHHELD_ENDS = {
    "beyond-one": "past 100%",
    "formula-beyond-one": "past 100%",
    "beyond-zero": "below 0%",
    "carried-beyond-zero": "below 0%",
}
"""Where a withheld limit of a risk would lie, by the reason; nobody is to read it as unlimited."""

PASSING = {
    "beyond-one": "would pass 100%",
    "formula-beyond-one": "would pass 100%",
    "beyond-zero": "would fall below 0%",
    "carried-beyond-zero": "would fall below 0%",
}
"""What the risk would do at such a limit."""

OPEN_END = "an open end"
"""Such a limit of a difference or of a ratio: it is the risk that would pass an end, not they."""

A_WITHHELD_LIMIT = "a withheld limit"
LIMIT_NOT_GIVEN = "limit not given"
AT_THE_OTHER = "at the other limit the risk {passing}"
NO_OTHER = "the other limit is not given"
FEWER = "fewer"
MORE = "more"
LOWER = "lower"
HIGHER = "higher"


def side(difference: float) -> str:
    """The word for the side of a difference: fewer or more."""
    return FEWER if difference < 0 else MORE


def interval_name(level: float) -> str:
    """``95% interval``: no interval is said without its level."""
    return labels.INTERVAL_HEAD.format(level=numbers.level(level))


def needed_kind(needed: AnyNumberNeeded | Gap | None) -> str:
    """NNTB or NNTH; NNT where it is neither, or is not given."""
    return "NNT" if needed is None or isinstance(needed, Gap) or needed.kind == "neither" else needed.kind


def beyond(interval: AnyInterval, least: float, most: float) -> str:
    """Which ends lie outside of what is possible, as the bare textbook formula's can: "low", "high", "both" or ""."""
    if isinstance(interval, Gap):
        return ""
    below = not isinstance(interval.low, Gap) and interval.low < least - ROUNDING
    above = not isinstance(interval.high, Gap) and interval.high > most + ROUNDING
    if below and above:
        return "both"
    return "low" if below else "high" if above else ""


def percent_interval(interval: AnyInterval, estimate: float | Gap) -> str:
    """``13.8 to 21.1%``: limits with the decimals of the estimate."""
    if isinstance(interval, Gap):
        return ""

    def low(x: float) -> str:
        return numbers.percent_limit(x, x if isinstance(estimate, Gap) else estimate, sign="")

    def high(x: float) -> str:
        return numbers.percent_limit(x, x if isinstance(estimate, Gap) else estimate)

    first = low if not isinstance(interval.high, Gap) else high
    return f"{_limit(interval.low, first)}{numbers.TO}{_limit(interval.high, high)}"


def ratio_interval(interval: AnyInterval, estimate: float | Gap) -> str:
    """``0.37 to 0.78``: limits with the decimals of the estimate, more where they would reach 1."""
    if isinstance(interval, Gap):
        return ""

    def write(x: float) -> str:
        return numbers.ratio_limit(x, x if isinstance(estimate, Gap) else estimate)

    return f"{_open(interval.low, write)}{numbers.TO}{_open(interval.high, write)}"


def difference_interval(interval: AnyInterval, estimate: float | Gap) -> str:
    """Per 100: ``3.3 to 12.4`` on the estimate's side, else ``2.1 fewer to 5.0 more``."""

    def write(x: float) -> str:
        return numbers.hundred_limit(x, x if isinstance(estimate, Gap) else estimate)

    return sided(interval, estimate, write)


def rate_interval(interval: AnyInterval, estimate: float | Gap, per: int) -> str:
    """Rates for ``per`` units of person-time: ``6.5 to 12.7``; the bare formula’s limit below none has its sign."""
    if isinstance(interval, Gap):
        return ""

    def write(x: float) -> str:
        return f"{numbers.MINUS if x < 0 else ''}{_rate(x, estimate, per)}"

    return f"{_limit(interval.low, write)}{numbers.TO}{_limit(interval.high, write)}"


def rate_difference_interval(interval: AnyInterval, estimate: float | Gap, per: int) -> str:
    """As a difference per 100, for ``per`` units of person-time: ``2.1 fewer to 5.0 more``."""

    def write(x: float) -> str:
        return _rate(x, estimate, per)

    return sided(interval, estimate, write)


def sided(interval: AnyInterval, estimate: float | Gap, write: Callable[[float], str]) -> str:
    """An interval of sizes, smaller first where both are on the estimate's side; else each with its word."""
    if isinstance(interval, Gap):
        return ""
    low, high = interval.low, interval.high
    # A withheld limit lies beyond all risks: below no effect if it is the lower one, above it if the upper one.
    ends = (-1.0 if isinstance(low, Gap) else low, 1.0 if isinstance(high, Gap) else high)
    if not isinstance(estimate, Gap) and estimate and all(x * estimate >= 0 for x in ends):
        first, second = (low, high) if estimate > 0 else (high, low)
        return f"{_open(first, write)}{numbers.TO}{_open(second, write)}"

    def with_word(x: float) -> str:
        return f"{write(x)} {side(x)}" if x else write(x)

    return f"{_open(low, with_word)}{numbers.TO}{_open(high, with_word)}"


def number_needed_interval(needed: AnyNumberNeeded) -> str:
    """``9 to 31``, or ``NNTB 12 to ∞ to NNTH 40`` where the difference's interval holds no effect.

    Of a limit that is not given it says why: ``up to 28; at the other limit the risk would pass 100%``.
    """
    low, high = needed.low, needed.high
    if isinstance(low, Gap) and isinstance(high, Gap):
        return ""
    if needed.through_infinity:
        return _through_infinity(needed)
    if isinstance(low, Gap):
        return f"up to {_value(high)}; {_other(low)}"
    if isinstance(high, Gap):
        return f"from {_value(low)}; {_other(high)}"
    if needed.kind == low.kind == high.kind:
        return f"{numbers.number_needed(low.value)}{numbers.TO}{numbers.number_needed(high.value)}"
    return f"{_needed(low)}{numbers.TO}{_needed(high)}"


def _through_infinity(needed: AnyNumberNeeded) -> str:
    """``NNTB 12 to ∞ to NNTH 40``; of a withheld limit the kind alone: ``NNTB 3 to ∞ to NNTH, limit not given``."""
    low, high = needed.low, needed.high
    near = "NNTH" if needed.kind == "NNTH" else "NNTB"
    far = "NNTB" if needed.kind == "NNTH" else "NNTH"
    first = f"{near}, {LIMIT_NOT_GIVEN}," if isinstance(low, Gap) else _needed(low)
    last = f"{far}, {LIMIT_NOT_GIVEN}" if isinstance(high, Gap) else _needed(high)
    return numbers.TO.join((first, numbers.INFINITY, last))


def withheld_needed(needed: AnyNumberNeeded) -> str:
    """Why one limit of a number needed is not given, or ""."""
    return " ".join(dict.fromkeys(limit_text(limit) for limit in (needed.low, needed.high) if isinstance(limit, Gap)))


def relative(ratio: float, link: str = " ") -> str:
    """A ratio as a relative reduction or increase ("relative reduction 46%"); "" where it is 1 or infinite."""
    if ratio in (1.0, float("inf")):
        return ""
    name = "relative reduction" if ratio < 1 else "relative increase"
    return f"{name}{link}{numbers.percent_whole(abs(1 - ratio))}"


def relative_interval(interval: AnyInterval, ratio: float) -> str:
    """``22% to 63%`` where both limits are on the ratio's side, else ``5% lower to 10% higher``."""
    if isinstance(interval, Gap):
        return ""
    low, high = interval.low, interval.high
    ends = [x - 1 for x in (low, high) if not isinstance(x, Gap)]
    if ratio != 1 and all(x * (ratio - 1) >= 0 for x in ends):
        first, second = (low, high) if ratio > 1 else (high, low)
        return f"{_open(first, _part)}{numbers.TO}{_open(second, _part)}"

    def with_word(x: float) -> str:
        return f"{_part(x)} {LOWER if x < 1 else HIGHER}" if x != 1 else _part(x)

    return f"{_open(low, with_word)}{numbers.TO}{_open(high, with_word)}"


def bracketed(text: str) -> str:
    """An interval behind its estimate, in brackets, if there is one."""
    return f" ({text})" if text else ""


def _rate(x: float, estimate: float | Gap, per: int) -> str:
    return numbers.rate_limit(x * per, (x if isinstance(estimate, Gap) else estimate) * per)


def _part(ratio: float) -> str:
    return numbers.INFINITY if ratio == float("inf") else numbers.percent_whole(abs(1 - ratio))


def _limit(limit: float | Gap, write: Callable[[float], str]) -> str:
    return WITHHELD_ENDS.get(limit.key, A_WITHHELD_LIMIT) if isinstance(limit, Gap) else write(limit)


def _open(limit: float | Gap, write: Callable[[float], str]) -> str:
    """A limit of a difference or a ratio; where the risk would pass an end, there is none."""
    return OPEN_END if isinstance(limit, Gap) and limit.key in WITHHELD_ENDS else _limit(limit, write)


def _other(limit: Gap) -> str:
    return AT_THE_OTHER.format(passing=PASSING[limit.key]) if limit.key in PASSING else NO_OTHER


def _value(limit: NumberNeededLimit | Gap) -> str:
    return LIMIT_NOT_GIVEN if isinstance(limit, Gap) else numbers.number_needed(limit.value)


def _needed(limit: NumberNeededLimit | Gap) -> str:
    kind = "" if isinstance(limit, Gap) or limit.kind == "neither" else f"{limit.kind} "
    return f"{kind}{_value(limit)}"
