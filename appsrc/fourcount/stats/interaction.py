"""Whether two estimates with their intervals differ: the ratio of two ratios, the difference of two differences."""

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
    """The first ratio over the second with its interval; ``standard_error`` and ``z`` are of its logarithm."""

    ratio: float
    low: float
    high: float
    z: float
    p: float
    standard_error: float


@dataclass(frozen=True, kw_only=True, slots=True)
class DifferenceInteraction:
    """The first difference less the second with its interval."""

    difference: float
    low: float
    high: float
    z: float
    p: float
    standard_error: float


def ratio_of_ratios(first: Estimate, second: Estimate, level_of_both: float) -> Interaction | Gap:
    """The ratio of two independent ratios (two groups of people, two trials), its interval at the same level, and p.

    Each standard error is that of its own printed interval on the log scale. Source: Altman and Bland 2003,
    BMJ 326:219.
    """
    one = from_limits(*first, level_of_both, log_scale=True)
    two = from_limits(*second, level_of_both, log_scale=True)
    if isinstance(one, Gap):
        return one
    if isinstance(two, Gap):
        return two
    error = math.hypot(one.standard_error, two.standard_error)
    log_ratio = math.log(first[0]) - math.log(second[0])
    reach = quantile(level_of_both) * error
    return Interaction(
        ratio=first[0] / second[0],
        low=exponential(log_ratio - reach),
        high=exponential(log_ratio + reach),
        z=log_ratio / error,
        p=two_sided_p(log_ratio / error),
        standard_error=error,
    )


def difference_of_differences(first: Estimate, second: Estimate, level_of_both: float) -> DifferenceInteraction | Gap:
    """The same of two independent differences, on their own scale. Source: Altman and Bland 2003, BMJ 326:219."""
    one = from_limits(*first, level_of_both, log_scale=False)
    two = from_limits(*second, level_of_both, log_scale=False)
    if isinstance(one, Gap):
        return one
    if isinstance(two, Gap):
        return two
    error = math.hypot(one.standard_error, two.standard_error)
    difference = first[0] - second[0]
    reach = quantile(level_of_both) * error
    return DifferenceInteraction(
        difference=difference,
        low=difference - reach,
        high=difference + reach,
        z=difference / error,
        p=two_sided_p(difference / error),
        standard_error=error,
    )
