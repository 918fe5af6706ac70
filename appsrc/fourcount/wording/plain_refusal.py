"""Why an outcome cannot be shown to a patient yet, in one sentence that names what is missing."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.wording import carried, plain, plain_texts
from fourcount.wording.form import lacking
from fourcount.wording.gaps import gap_text
from fourcount.wording.patient import missing, missing_fields
from fourcount.wording.subject import subject


def why_not(outcome: Outcome, findings: OutcomeFindings) -> str:
    """Why this outcome cannot be shown to a patient; "" where it can.

    Names are asked for by their fields, figures as the table gives them.
    """
    lacks = missing_items(outcome)
    if lacks:
        return plain_texts.MISSING.format(items=_listed(lacks))
    patient = findings.patient
    if isinstance(patient, Gap):
        return gap_text(lacking(findings) or patient)
    if isinstance(patient.with_.estimate, Gap):
        return carried.reason(patient.with_.estimate, patient, findings)
    return gap_text(patient.without.estimate) if isinstance(patient.without.estimate, Gap) else ""


def missing_items(outcome: Outcome) -> tuple[str, ...]:
    """What the reader has not named yet; without it nobody is shown a picture."""
    spoken = subject(outcome)
    plainly = (spoken.plain_event_text if spoken.counts_left else spoken.plain_other_text).strip()
    lacks = [item for item in missing(outcome) if not (item == "the event" and plainly)]
    items = missing_fields(outcome, lacks)
    if not plain.plain_said(spoken, plain.unwelcome_column(spoken)) and "the event" not in lacks:
        return (plain_texts.OTHER_OUTCOME, *items)
    return items


def _listed(items: tuple[str, ...]) -> str:
    *before, last = items
    return f"{', '.join(before)} and {last}" if before else last
