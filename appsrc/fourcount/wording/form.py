"""What a table gives to compute with, whatever its form, and the level at which its intervals stand."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Figure,
    Gap,
    Given,
    OutcomeFindings,
    PatientFindings,
    PrintedFigure,
    StrataFindings,
    TimedRisks,
)
from fourcount.record.outcome import COUNTED_FORMS
from fourcount.record.paper import USUAL_LEVEL, Choices

NO_COUNTS = "not-counts"
SAID_ABOVE = ("recovered", "adjusted")


def given(findings: OutcomeFindings) -> Given | Gap:
    """The counts, pairs, rates, printed risks or printed effect, or why there are none yet."""
    counts = findings.counts
    if not isinstance(counts, Gap):
        return counts
    return counts if findings.form in COUNTED_FORMS else findings.given


def lacking(findings: OutcomeFindings) -> Gap | None:
    """Why nothing can be said of this table yet; None where something can.

    A table can lack a part and still say something: pairs that differ give their odds ratio without those that agree.
    """
    found = given(findings)
    if not isinstance(found, Gap) or any(not isinstance(measure, Gap) for measure in findings.measures.values()):
        return None
    return found


def level_of(findings: OutcomeFindings, choices: Choices) -> float:
    """The level of the intervals that are shown: the record's, or that of the print where only the print has any."""
    found = findings.given
    if isinstance(found, PrintedFigure):
        return found.level or USUAL_LEVEL
    return found.level if isinstance(found, TimedRisks) else choices.level


def patient_choices(findings: OutcomeFindings, choices: Choices) -> Choices:
    """The record's choices with the level of the patient's intervals, which a printed effect keeps."""
    patient = findings.patient
    if isinstance(patient, PatientFindings):
        return Choices(family=choices.family, level=patient.level)
    return shown_choices(findings, choices)


def opens_more(findings: OutcomeFindings) -> bool:
    """Whether anything stands under the fold that is not said above it already.

    The p of a printed interval is, and so is a typed adjusted effect.
    """
    if lacking(findings) is not None:
        return False
    if findings.form in COUNTED_FORMS or isinstance(findings.strata, StrataFindings):
        return True
    extras = findings.extras
    beside = (field for field in extras.__struct_fields__ if field not in SAID_ABOVE)
    return any(getattr(extras, field) is not None for field in beside)


def crude(findings: OutcomeFindings) -> OutcomeFindings:
    """The findings of all strata thrown together; the odds ratio that was converted there is the pooled one."""
    return msgspec.structs.replace(findings, conversion=Gap(NO_COUNTS))


def measure_of(key: str, findings: OutcomeFindings) -> Figure | AnyNumberNeeded | Gap:
    """A measure by its key, a pooled one included."""
    strata = findings.strata
    if strata is not None and not isinstance(strata, Gap) and key in strata.pooled:
        return strata.pooled[key]
    return findings.measures.get(key) or lacking(findings) or Gap(NO_COUNTS)


def shown_choices(findings: OutcomeFindings, choices: Choices) -> Choices:
    """The record's choices with the level at which this table's intervals stand."""
    return Choices(family=choices.family, level=level_of(findings, choices))
