"""What a caution looks at, and the questions that several cautions ask."""

from __future__ import annotations

from dataclasses import dataclass, field

from fourcount.appraisal.findings import (
    Carriable,
    Conversion,
    Counts,
    Extras,
    Fact,
    Figure,
    Gap,
    Given,
    Interval,
    Mark,
    OwnLine,
    PatientFindings,
    Probability,
    Range,
    StrataFindings,
)
from fourcount.appraisal.losses import Randomised
from fourcount.appraisal.measures import Figures
from fourcount.record.outcome import Form, Outcome
from fourcount.record.paper import Choices

Facts = dict[str, Fact]
"""What a rule answers with: the facts for its sentence."""


def no_effect_of(measure: str) -> float:
    """The value of a measure of effect at which the two groups fare alike."""
    return 0.0 if measure.endswith("difference") else 1.0


@dataclass(frozen=True, kw_only=True, slots=True)
class ForTheReader:
    """What hangs on what the reader typed beside the table: a patient, and a line of their own."""

    conversion: Conversion | Gap
    patient: PatientFindings | Gap
    carriable: tuple[Carriable, ...] = ()
    line: OwnLine | Gap | None = None
    marks: tuple[Mark, ...] = ()


@dataclass(frozen=True, kw_only=True, slots=True)
class Case:
    """One outcome with the figures that its form and its design support.

    A rule that looks at ``counts`` is asked only of the forms that give them.
    """

    outcome: Outcome
    form: Form
    given: Given | Gap
    choices: Choices
    figures: Figures
    test: Probability | Gap
    reader: ForTheReader
    marks: tuple[Mark, ...] = ()
    extras: Extras = field(default_factory=Extras)
    strata: StrataFindings | Gap | None = None
    randomised: tuple[Randomised, ...] = ()

    @property
    def patient(self) -> PatientFindings | Gap:
        return self.reader.patient

    @property
    def counts(self) -> Counts:
        if not isinstance(self.given, Counts):
            raise TypeError(f"the form {self.form} has no four counts")
        return self.given

    @property
    def pooled(self) -> StrataFindings | None:
        """The strata, where there are any and the design does not refuse them."""
        return self.strata if isinstance(self.strata, StrataFindings) else None

    @property
    def carried(self) -> PatientFindings | None:
        """The patient's findings where they are not the study's own risks, but an effect carried to a starting risk."""
        if isinstance(self.patient, Gap) or self.patient.range_from == "table":
            return None
        return self.patient


def at_start(carried: PatientFindings) -> Facts:
    """The starting risk, and where it comes from unless it was typed: a computed one has other digits."""
    facts: Facts = {"baseline": carried.baseline}
    return facts if carried.start_from == "typed" else {**facts, "start": carried.start_from}


def straddles(interval: Interval | Range | Gap, no_effect: float) -> bool | None:
    """Whether no effect lies strictly inside the interval; None where the interval does not tell.

    An upper limit that is withheld since a risk would pass 100% lies beyond no effect; no other one tells.
    """
    if isinstance(interval, Gap) or isinstance(interval.low, Gap):
        return None
    if isinstance(interval.high, Gap) and interval.high.key != "beyond-one":
        return None
    beyond = isinstance(interval.high, Gap) or interval.high > no_effect
    return interval.low < no_effect and beyond


def side_of(figure: Figure | None, no_effect: float) -> int | None:
    """1 or -1 where the interval lies above or below no effect, 0 where it does not exclude it; None without one."""
    if figure is None or not isinstance(figure.interval, Interval):
        return None
    return (figure.interval.low > no_effect) - (figure.interval.high < no_effect)


def excludes(figure: Figure | None, no_effect: float) -> bool | None:
    """Whether no effect lies strictly outside the figure's interval; None where there is no whole interval."""
    side = side_of(figure, no_effect)
    return None if side is None else side != 0


def value(figure: Figure | None) -> float | None:
    """The estimate, or None where it is withheld."""
    if figure is None or isinstance(figure.estimate, Gap):
        return None
    return figure.estimate
