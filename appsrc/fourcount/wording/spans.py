"""A patient's time span: the study's as it was typed, or the other one that the risks were carried to."""

from __future__ import annotations

from fourcount.appraisal.findings import PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.wording import names
from fourcount.wording.durations import duration

__all__ = ["carried_to", "duration", "of_the_start", "over", "within"]

CARRIED_TO = "carried to {other} as if hazards stayed constant"


def over(outcome: Outcome, patient: PatientFindings) -> str:
    """The patient's span under a figure: "over 5 years"."""
    return names.over_span(outcome) if patient.other_span is None else names.over(duration(patient.other_span))


def within(outcome: Outcome, patient: PatientFindings) -> str:
    """The patient's span after a verb: "within 5 years"."""
    if patient.other_span is None:
        return names.within_span(outcome)
    return names.within(duration(patient.other_span), outcome)


def carried_to(patient: PatientFindings) -> str:
    """``carried to 5 years as if hazards stayed constant``, or "" at the study's own span."""
    if patient.other_span is None or patient.study_span is None:
        return ""  # a rate is a risk over any span without being carried
    return CARRIED_TO.format(other=duration(patient.other_span))


def of_the_start(patient: PatientFindings) -> str:
    """`` over 12 months`` behind a starting risk that is carried to another span, else ""."""
    return f" over {duration(patient.study_span)}" if patient.other_span and patient.study_span else ""
