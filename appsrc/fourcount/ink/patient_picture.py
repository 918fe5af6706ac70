"""From the findings for one patient to their pictures, in one step."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.ink.picture import Picture
from fourcount.ink.relative_picture import RelativePicture
from fourcount.picture.bar_pair import bar_pair
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.picture.plan import Plan, plan
from fourcount.picture.relative import relative_plan
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording.picture_words import USUAL_WORDS, Said, picture_words
from fourcount.wording.relative_words import relative_words


def plan_of(patient: PatientFindings, turned: bool = False, uncertainty: bool = False) -> Plan | None:
    """The plan of both risks, or of their complements; None where one cannot be given."""
    without, with_ = patient.without.estimate, patient.with_.estimate
    if isinstance(without, Gap) or isinstance(with_, Gap):
        return None
    low, high = _limits(patient) if uncertainty else (None, None)
    if not turned:
        return plan(without, with_, low, high)
    return plan(1 - without, 1 - with_, None if high is None else 1 - high, None if low is None else 1 - low)


def picture_of(
    outcome: Outcome,
    findings: OutcomeFindings,
    choices: Choices,
    options: PictureOptions = USUAL,
    said: Said = USUAL_WORDS,
) -> Picture | None:
    """The picture of an outcome for its patient; None where there are no two risks to draw."""
    if isinstance(findings.patient, Gap):
        return None
    drawn = plan_of(findings.patient, said.turned, options.uncertainty)
    if drawn is None:
        return None
    words = picture_words(outcome, findings, choices, drawn, options, said, bar_pair(drawn).top)
    return Picture(drawn, words, options)


def relative_picture_of(
    outcome: Outcome, findings: OutcomeFindings, said: Said = USUAL_WORDS
) -> RelativePicture | None:
    """The picture of the relative figure; None where there is none, or no two risks."""
    drawn = None if isinstance(findings.patient, Gap) else plan_of(findings.patient, said.turned)
    lengths = relative_plan(drawn) if drawn else None
    if drawn is None or lengths is None:
        return None
    return RelativePicture(lengths, relative_words(outcome, drawn, said))


def _limits(patient: PatientFindings) -> tuple[float | None, float | None]:
    """Both limits of the risk with, each None where it cannot be given."""
    interval = patient.with_.interval
    if isinstance(interval, Gap):
        return None, None
    ends = (interval.low, interval.high)
    low, high = (None if isinstance(end, Gap) else end for end in ends)
    return low, high
