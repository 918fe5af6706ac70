"""Whether two estimates with their intervals differ: the ratio of two ratios, the difference of two differences.

The two come from different people (two groups of one study, two trials), and each standard error is that of its own
interval, which reaches equally far to both sides, on the log scale for a ratio. Source: Altman and Bland 2003,
BMJ 326:219.
"""

from __future__ import annotations

import math
from dataclasses import dataclass

from fourcount.stats.log_scale import exponential
from fourcount.stats.normal import quantile, two_sided_p
from fourcount.stats.recovery import from_limits
from fourcount.stats.results import Gap

Estimate = tuple[float, float, float]
"""An estimate with its lower and upper limit."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Interaction:
    """The first ratio over the second, or the first difference less the second, with its interval and two-sided p.

    ``standard_error`` and ``z`` are of the logarithm for ratios.
    """

    estimate: float
    low: float
    high: float
    z: float
    p: float
    standard_error: float


def ratio_of_ratios(first: Estimate, second: Estimate, level_of_both: float) -> Interaction | Gap:
    """The ratio of two independent ratios, its interval at the same level, and the p of no difference."""
    return _set_against(first, second, level_of_both, log_scale=True)


def difference_of_differences(first: Estimate, second: Estimate, level_of_both: float) -> Interaction | Gap:
    """The same of two independent differences, on their own scale."""
    return _set_against(first, second, level_of_both, log_scale=False)


def _set_against(first: Estimate, second: Estimate, level: float, *, log_scale: bool) -> Interaction | Gap:
    one, two = (from_limits(*estimate, level, log_scale=log_scale) for estimate in (first, second))
    if isinstance(one, Gap):
        return one
    if isinstance(two, Gap):
        return two
    error = math.hypot(one.standard_error, two.standard_error)
    apart = math.log(first[0]) - math.log(second[0]) if log_scale else first[0] - second[0]
    low, high = apart - quantile(level) * error, apart + quantile(level) * error
    return Interaction(
        estimate=first[0] / second[0] if log_scale else apart,
        low=exponential(low) if log_scale else low,
        high=exponential(high) if log_scale else high,
        z=apart / error,
        p=two_sided_p(apart / error),
        standard_error=error,
    )
