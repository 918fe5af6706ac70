"""Risks through hazards that stay constant: over another time span, from a rate, and under a hazard ratio."""

from __future__ import annotations

import math


def risk_over(rate_per_year: float, years: float) -> float:
    """The risk of a first event within a time at a constant rate: 1 - exp(-r t). Common practice."""
    return -math.expm1(-rate_per_year * years)


def over_spans(risk: float, spans: float) -> float:
    """A risk over so many times its time span, the hazard being constant: 1 - (1 - risk)^spans.

    Nobody and everybody stay nobody and everybody. Common practice.
    """
    return 1.0 if risk == 1.0 else -math.expm1(math.log1p(-risk) * spans)


def risk_with_hazard(start: float, hazard_ratio: float) -> float:
    """The risk whose hazard is the ratio times that of the starting risk: 1 - (1 - q)^h.

    With S = 1 - q it is Altman and Andersen's S^h (1999, BMJ 319:1492). Certain (1) under an infinite ratio from a
    starting risk above 0; where a risk of 0 meets an infinite ratio, or a risk of 1 a ratio of 0, no risk follows, and
    ``conversion.risk_with`` says so.
    """
    if start == 1.0 or math.isinf(hazard_ratio):
        return 1.0
    return -math.expm1(hazard_ratio * math.log1p(-start))
