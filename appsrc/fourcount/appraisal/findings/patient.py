"""What follows for one patient."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.appraisal.findings.figures import AnyNumberNeeded, Figure
from fourcount.stats.results import Gap


class Conversion(msgspec.Struct, frozen=True, kw_only=True):
    """The odds ratio as a risk ratio at a starting risk (Zhang and Yu).

    At the table's own reference risk this is the table's own risk ratio with its direct interval and method.
    """

    baseline: float
    baseline_from: Literal["reference", "given"]
    risk_ratio: Figure


class PatientFindings(msgspec.Struct, frozen=True, kw_only=True):
    """The effect carried to one starting risk.

    ``without`` and ``with_`` are risks; ``without`` has an interval only where the table's own reference
    group is the starting risk (else the Gap "bare-starting-risk"). ``difference`` is with minus without.
    ``range_from`` says what the range holds: "table" (the table's direct intervals) or "effect" (the effect's
    limits at a bare starting risk). ``risk_ratio`` is the relative figure at this starting risk, whatever
    effect was carried. A figure from the effect names the effect's method.
    """

    baseline: float
    baseline_from: Literal["reference", "given"]
    effect: Literal["risk_ratio", "odds_ratio"]
    carried: Figure
    without: Figure
    with_: Figure
    difference: Figure
    number_needed: AnyNumberNeeded | Gap
    risk_ratio: Figure
    range_from: Literal["table", "effect"]
