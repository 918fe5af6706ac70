"""What follows from one outcome of a record: figures, gaps and cautions, by key and without words."""

from __future__ import annotations

from fourcount.appraisal.findings.check import CheckFindings, FigureCheck, Finding, Fit, Match, Orientation
from fourcount.appraisal.findings.extras import (
    Clusters,
    EValues,
    Extras,
    Fragility,
    Losses,
    LossScenario,
    Recovered,
)
from fourcount.appraisal.findings.figures import (
    AnyNumberNeeded,
    Caution,
    Figure,
    NumberNeededRange,
    Probability,
    Range,
)
from fourcount.appraisal.findings.keys import (
    EFFECT_MEASURES,
    GAP_KEYS,
    MEASURES,
    PAIR_MEASURES,
    POOLED_MEASURES,
    RATE_MEASURES,
    TIMED_MEASURES,
)
from fourcount.appraisal.findings.outcome import Given, OutcomeFindings, Totals
from fourcount.appraisal.findings.patient import Carriable, CarriedEffect, Conversion, OwnLine, PatientFindings
from fourcount.appraisal.findings.strata import Homogeneity, Interaction, StrataFindings, StratumFindings
from fourcount.record.entry.readings import Mark, PrintedFigure
from fourcount.stats.number_needed import Kind, NumberNeeded, NumberNeededLimit
from fourcount.stats.results import Counts, Fact, Gap, Interval, PairCounts, Rates, TimedRisks

__all__ = [
    "EFFECT_MEASURES", "GAP_KEYS", "MEASURES", "PAIR_MEASURES", "POOLED_MEASURES", "RATE_MEASURES",
    "TIMED_MEASURES", "AnyNumberNeeded", "Carriable", "CarriedEffect", "Caution", "CheckFindings", "Clusters",
    "Conversion", "Counts", "EValues", "Extras", "Fact", "Figure", "FigureCheck", "Finding", "Fit", "Fragility",
    "Gap", "Given", "Homogeneity", "Interaction", "Interval", "Kind", "LossScenario", "Losses", "Mark", "Match",
    "NumberNeeded", "NumberNeededLimit", "NumberNeededRange", "Orientation", "OutcomeFindings", "OwnLine",
    "PairCounts", "PatientFindings", "PrintedFigure", "Probability", "Range", "Rates", "Recovered",
    "StrataFindings", "StratumFindings", "TimedRisks", "Totals",
]  # fmt: skip
