"""From a printed interval to its standard error and p, and from a printed p to the interval.

All of it holds for an interval that reaches equally far to both sides, on the log scale for a ratio, as a textbook
interval does. The p is that of no effect: a ratio of 1, a difference of 0.
"""

from __future__ import annotations

import math
from dataclasses import dataclass

from fourcount.stats.log_scale import exponential
from fourcount.stats.normal import quantile, two_sided_p, z_of_p
from fourcount.stats.results import Gap, Interval


@dataclass(frozen=True, kw_only=True, slots=True)
class Recovery:
    """The standard error behind an interval (of the logarithm for a ratio), the estimate's z and its two-sided p."""

    standard_error: float
    z: float
    p: float


def from_limits(estimate: float, low: float, high: float, level: float, log_scale: bool) -> Recovery | Gap:
    """The standard error, z and p that belong to a printed interval: the error is its width over 2 z of the level.

    Source: Altman and Bland 2011, BMJ 343:d2304, with the normal tail in full instead of their approximation.
    """
    gap = _unsound((estimate, low, high), log_scale)
    if gap is not None:
        return gap
    if not low <= estimate <= high:
        return Gap("limits-disordered")
    width = _on_scale(high, log_scale) - _on_scale(low, log_scale)
    if width == 0.0:
        return Gap("no-width")
    error = width / (2.0 * quantile(level))
    z = _on_scale(estimate, log_scale) / error
    return Recovery(standard_error=error, z=z, p=two_sided_p(z))


def from_p(estimate: float, p: float, level: float, log_scale: bool) -> Interval | Gap:
    """The interval at this level that belongs to an estimate and its p, by the normal quantile in full.

    An estimate at no effect is 0 standard errors away whatever its error is, so its p tells nothing; nor does a p of 1.
    Source: Altman and Bland 2011, BMJ 343:d2090, with the normal quantile instead of their approximation.
    """
    return _interval(estimate, p, level, log_scale, approximate=False)


def approximate_p(z: float) -> float:
    """Altman and Bland's p of a z: exp(-0.717 z - 0.416 z^2). Source: Altman and Bland 2011, BMJ 343:d2304."""
    return math.exp(-0.717 * abs(z) - 0.416 * z * z)


def approximate_z(p: float) -> float:
    """Altman and Bland's z of a p: -0.862 + sqrt(0.743 - 2.404 ln p), not below 0 (it is -0.00002 at a p of 1).

    Source: Altman and Bland 2011, BMJ 343:d2090.
    """
    return max(0.0, math.sqrt(0.743 - 2.404 * math.log(p)) - 0.862)


def approximate_from_p(estimate: float, p: float, level: float, log_scale: bool) -> Interval | Gap:
    """The interval that belongs to an estimate and its p, by Altman and Bland's approximate z.

    Source: Altman and Bland 2011, BMJ 343:d2090.
    """
    return _interval(estimate, p, level, log_scale, approximate=True)


def _interval(estimate: float, p: float, level: float, log_scale: bool, *, approximate: bool) -> Interval | Gap:
    gap = _unsound((estimate,), log_scale)
    if gap is not None:
        return gap
    if not 0.0 < p <= 1.0:
        return Gap("p-out-of-range")
    centre = _on_scale(estimate, log_scale)
    if centre == 0.0 or p == 1.0:
        return Gap("estimate-at-no-effect")
    z = approximate_z(p) if approximate else z_of_p(p)
    if z == 0.0:
        return Gap("estimate-at-no-effect")
    reach = quantile(level) * abs(centre) / z
    if log_scale:
        return Interval(low=exponential(centre - reach), high=exponential(centre + reach))
    return Interval(low=centre - reach, high=centre + reach)


def _unsound(values: tuple[float, ...], log_scale: bool) -> Gap | None:
    if log_scale and min(values) <= 0.0:
        return Gap("not-positive")
    return None if all(math.isfinite(value) for value in values) else Gap("endless-limit")


def _on_scale(value: float, log_scale: bool) -> float:
    return math.log(value) if log_scale else value
