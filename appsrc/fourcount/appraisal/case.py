"""What a caution looks at, and the questions that several cautions ask."""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.appraisal.findings import (
    Conversion,
    Counts,
    Figure,
    Gap,
    Interval,
    Mark,
    PatientFindings,
    Probability,
    Range,
)
from fourcount.appraisal.measures import Figures, Table
from fourcount.record.outcome import Outcome

NO_EFFECT = {"risk_difference": 0.0, "risk_ratio": 1.0, "odds_ratio": 1.0}
"""The value of each measure of effect at which the two groups fare alike."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Case:
    """One outcome with the figures that its design supports."""

    outcome: Outcome
    table: Table
    figures: Figures
    test: Probability
    conversion: Conversion | Gap
    patient: PatientFindings | Gap
    marks: tuple[Mark, ...] = ()

    @property
    def counts(self) -> Counts:
        return self.table.counts

    @property
    def carried(self) -> PatientFindings | None:
        """The patient's findings where a starting risk was typed and an effect carried to it."""
        if isinstance(self.patient, Gap) or self.patient.baseline_from != "given":
            return None
        return self.patient


def straddles(interval: Interval | Range | Gap, no_effect: float) -> bool | None:
    """Whether no effect lies strictly inside the interval; None where the interval does not tell.

    A withheld limit is one at which a risk would pass 100%: an upper one lies beyond no effect.
    """
    if isinstance(interval, Gap) or isinstance(interval.low, Gap):
        return None
    beyond = isinstance(interval.high, Gap) or interval.high > no_effect
    return interval.low < no_effect and beyond


def excludes(figure: Figure | None, no_effect: float) -> bool | None:
    """Whether no effect lies strictly outside the figure's interval; None where there is no whole interval."""
    if figure is None or not isinstance(figure.interval, Interval):
        return None
    return figure.interval.low > no_effect or figure.interval.high < no_effect


def value(figure: Figure | None) -> float | None:
    """The estimate, or None where it is withheld."""
    if figure is None or isinstance(figure.estimate, Gap):
        return None
    return figure.estimate
