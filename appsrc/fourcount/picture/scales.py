"""Scales for the drawn strips: ends that hold what is shown, on round figures."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass
from math import floor, isfinite, log, log10

RISK_ENDS = (0.001, 0.0025, 0.005, 0.01, 0.025, 0.05, 0.1, 0.25, 0.5, 1.0)
DIFFERENCE_ENDS = (0.001, 0.0025, 0.005, 0.01, 0.025, 0.05, 0.1, 0.15, 0.25, 0.5, 1.0)
RATE_STEPS = (1.0, 1.5, 2.5, 5.0, 10.0)
RATIO_ENDS = (2.0, 4.0, 10.0, 50.0, 100.0)


@dataclass(frozen=True, kw_only=True, slots=True)
class Scale:
    """A strip's axis from ``low`` to ``high``; ``no_effect`` is the value to mark, or None for risks."""

    low: float
    high: float
    logarithmic: bool = False
    no_effect: float | None = None

    def place(self, value: float) -> float:
        """Where a value stands, 0 at ``low`` and 1 at ``high``; outside values fall outside 0 to 1."""
        if not self.logarithmic:
            return (value - self.low) / (self.high - self.low)
        if value <= 0:
            return -1.0
        return 2.0 if not isfinite(value) else log(value / self.low) / log(self.high / self.low)


def risk_scale(values: Iterable[float]) -> Scale:
    """From 0 to the least round risk that holds all of them."""
    top = max(values, default=0.0)
    return Scale(low=0.0, high=next((end for end in RISK_ENDS if top <= end), 1.0))


def difference_scale(values: Iterable[float]) -> Scale:
    """Symmetric about no difference, up to the least round difference that holds all of them."""
    reach = max((abs(value) for value in values), default=0.0)
    end = next((end for end in DIFFERENCE_ENDS if reach <= end), 1.0)
    return Scale(low=-end, high=end, no_effect=0.0)


def rate_scale(values: Iterable[float]) -> Scale:
    """From 0 to the least round rate that holds all of them, in the unit in which they are shown."""
    return Scale(low=0.0, high=_round_up(max((value for value in values if isfinite(value)), default=0.0)))


def rate_difference_scale(values: Iterable[float]) -> Scale:
    """Symmetric about no difference, up to the least round difference of rates that holds all of them."""
    end = _round_up(max((abs(value) for value in values if isfinite(value)), default=0.0))
    return Scale(low=-end, high=end, no_effect=0.0)


def _round_up(value: float) -> float:
    """The least of 1, 1.5, 2.5, 5 and 10 times a power of ten that holds a value; 1 for nothing."""
    if value <= 0:
        return 1.0
    power = 10.0 ** floor(log10(value))
    return next((step * power for step in RATE_STEPS if value <= step * power), 10 * power)


def ratio_scale(values: Iterable[float]) -> Scale:
    """Logarithmic and symmetric about 1; values beyond 100 and under 1/100 run off the end."""
    reach = max((max(v, 1 / v) for v in values if v > 0 and isfinite(v)), default=1.0)
    end = next((end for end in RATIO_ENDS if reach <= end), RATIO_ENDS[-1])
    return Scale(low=1 / end, high=end, logarithmic=True, no_effect=1.0)
