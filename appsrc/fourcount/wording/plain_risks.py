"""The two risks that a patient is shown, always of the unwelcome outcome, so that benefits and harms read alike.

Where the record counts a welcome one, both risks are turned to their complements here.
"""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import Figure, Gap, PatientFindings
from fourcount.wording.headline import people_for


class Ends(NamedTuple):
    """Two limits, each None where it cannot be given."""

    low: float | None = None
    high: float | None = None


class PlainRisks(NamedTuple):
    """The two risks of the unwelcome outcome, with the limits of the difference and of the risk with."""

    without: float
    with_: float
    difference: float
    apart: Ends = Ends()
    with_ends: Ends = Ends()

    @property
    def open_ways(self) -> tuple[bool, bool]:
        """Whether the interval of a difference that is none reaches to fewer, and to more."""
        low, high = self.apart
        none = self.difference == 0
        return none and low is not None and low < 0, none and high is not None and high > 0

    @property
    def reach_no_effect(self) -> bool:
        """Whether the interval of the difference leaves open that there is none.

        A limit that is not there is no end.
        """
        low, high = self.apart
        if (low is None and high is None) or self.difference == 0:
            return False
        return (low is None or low <= 0) and (high is None or high >= 0)


def plain_risks(patient: PatientFindings, turned: bool) -> PlainRisks | None:
    """Both risks of the unwelcome outcome from the same findings; None where one of them cannot be given."""
    without, with_, difference = patient.without.estimate, patient.with_.estimate, patient.difference.estimate
    if isinstance(without, Gap) or isinstance(with_, Gap) or isinstance(difference, Gap):
        return None
    apart, with_ends = _ends(patient.difference), _ends(patient.with_)
    if not turned:
        return PlainRisks(without, with_, difference, apart, with_ends)
    return PlainRisks(1 - without, 1 - with_, -difference, _turned(apart, 0.0), _turned(with_ends, 1.0))


def people_in_text(risks: PlainRisks) -> int:
    """The smallest round number of people whose whole numbers say what is so, where no picture says one."""
    return people_for(risks.without, risks.with_, risks.difference)


def _ends(figure: Figure) -> Ends:
    """Both limits of a figure's interval."""
    interval = figure.interval
    if isinstance(interval, Gap):
        return Ends()
    low, high = (None if isinstance(end, Gap) else end for end in (interval.low, interval.high))
    return Ends(low, high)


def _turned(ends: Ends, whole: float) -> Ends:
    """The limits of the complement: of a difference (``whole`` 0) or of a risk (1)."""
    low, high = (None if end is None else whole - end for end in (ends.high, ends.low))
    return Ends(low, high)
