"""What follows for one patient."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.appraisal.findings.figures import AnyNumberNeeded, Figure
from fourcount.record.entry.readings import Duration
from fourcount.record.paper import USUAL_LEVEL
from fourcount.stats.results import Gap, Interval

CarriedEffect = Literal["risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio", "risk_difference"]
StartFrom = Literal["reference", "typed", "rate", "overall"]
Rank = Literal["", "low", "usual", "high"]


class Conversion(msgspec.Struct, frozen=True, kw_only=True):
    """The odds ratio as a risk ratio at a starting risk (Zhang and Yu).

    At the table's own reference risk this is the table's own risk ratio with its direct interval and method.
    """

    baseline: float
    baseline_from: Literal["reference", "given"]
    risk_ratio: Figure


class Carriable(msgspec.Struct, frozen=True, kw_only=True):
    """One effect that this outcome can carry to a patient.

    ``effect`` is the kind of measure, ``measure`` the key under which its figure stands ("pooled_risk_ratio",
    "pair_odds_ratio", "hazard_ratio"). ``adjusted`` says that it is an adjusted effect that the paper prints, beside
    its counts or without any. ``adjusted_for`` is what for, as typed. ``level`` is that of the figure's interval, as a
    fraction: a printed one keeps its own.
    """

    effect: CarriedEffect
    measure: str
    figure: Figure
    adjusted: bool = False
    adjusted_for: str = ""
    level: float = USUAL_LEVEL


class PatientFindings(msgspec.Struct, frozen=True, kw_only=True):
    """The effect carried to one starting risk.

    ``without`` and ``with_`` are risks; ``without`` has an interval where the table's own reference group is the
    starting risk, or where the typed one has limits (else the Gap "bare-starting-risk"). ``difference`` is with minus
    without. ``range_from`` says what the range holds: "table" (the table's direct intervals), "effect" (the effect's
    limits at a bare starting risk) or "both" (the imprecision of effect and starting risk propagated). ``risk_ratio``
    is the relative figure at this starting risk, whatever effect was carried. A figure from the effect names the
    effect's method.

    ``start_from`` says where the starting risk comes from, ``start_interval`` its own limits as they were typed, or
    those of its counts, at ``start_level`` (None without limits). ``study_span`` and
    ``other_span`` are the study's time span and the one carried to, where another was asked for; ``baseline`` is the
    starting risk over the study's. ``rank`` is "low", "usual" or "high" of three starting risks; the usual one's
    findings hold those of the low and the high one, a Gap where one cannot be given. ``level`` is that of all
    other intervals here, that of ``without`` among them.
    """

    baseline: float
    baseline_from: Literal["reference", "given"]
    effect: CarriedEffect
    carried: Figure
    without: Figure
    with_: Figure
    difference: Figure
    number_needed: AnyNumberNeeded | Gap
    risk_ratio: Figure
    range_from: Literal["table", "effect", "both"]
    measure: str = ""
    adjusted: bool = False
    adjusted_for: str = ""
    start_from: StartFrom = "reference"
    start_interval: Interval | Gap = Gap("bare-starting-risk")
    start_level: float | None = None
    study_span: Duration | None = None
    other_span: Duration | None = None
    rank: Rank = ""
    low: PatientFindings | Gap | None = None
    high: PatientFindings | Gap | None = None
    level: float = USUAL_LEVEL


class OwnLine(msgspec.Struct, frozen=True, kw_only=True):
    """A line of the reader's own on one measure's scale, and where the measure's interval lies.

    ``value`` is on the scale of ``measure``: a difference is index minus reference (so 5 fewer per 100 is -0.05), a
    ratio as it is. ``lies`` is where the interval lies against the line, counted away from no effect on the line's own
    side: "beyond" (wholly past the line), "short" (wholly on the side of no effect) or "across". A margin on the worse
    side with the interval "short" of it is non-inferiority. ``p`` is
    one-sided, of the hypothesis that the effect is the margin's or worse, whichever side of no effect the margin lies
    on (Miettinen and Nurminen's statistic where there are counts), by the method ``method``; only a margin has one.
    ``parted`` says that p and interval tell different things of the margin, as those of different methods can.
    ``level`` is that of the interval.
    """

    kind: Literal["matters", "margin"]
    measure: str
    value: float
    lies: Literal["beyond", "short", "across"]
    worse_side: bool
    p: float | Gap | None = None
    method: str = ""
    parted: bool = False
    level: float = USUAL_LEVEL
