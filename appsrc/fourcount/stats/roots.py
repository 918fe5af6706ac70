"""Roots of increasing functions, found inside a bracket."""

from __future__ import annotations

from collections.abc import Callable

Curve = Callable[[float], tuple[float, float]]
"""A function's value and slope at a point."""

_CLOSE = 4.0 * 2.0**-52
_MOST_STEPS = 5000  # more than it takes to halve down to any double from any other


def increasing_root(curve: Curve, low: float, high: float, start: float) -> float:
    """Where an increasing curve passes 0, to the last few bits.

    The root lies between ``low`` and ``high``; neither end is evaluated, so the curve may be infinite there. A rough
    slope costs steps, and a slope of 0 stands for "not known"; only the last step takes the slope's size on trust.
    Newton's method, with the bracket drawn in at each step; a step that leaves the bracket, or that is not less
    than half of the last but one, gives way to halving the bracket (the safeguard of Dekker and Brent: Brent 1973,
    Algorithms for Minimization without Derivatives, chapter 4).
    """
    x = start if low < start < high else low + (high - low) / 2.0
    last_but_one = last = high - low
    for _ in range(_MOST_STEPS):
        value, slope = curve(x)
        if value == 0.0:
            return x
        low, high = (low, x) if value > 0.0 else (x, high)
        step = -value / slope if slope > 0.0 else high - low
        if abs(step) <= _CLOSE * abs(x):
            return x + step if low <= x + step <= high else x
        if not (low < x + step < high) or abs(step) > abs(last_but_one) / 2.0:
            step = low + (high - low) / 2.0 - x
        if x + step == x or high - low <= _CLOSE * abs(x):
            return x
        last_but_one, last = last, step
        x += step
    return x
