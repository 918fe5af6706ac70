"""The rows of a sheet for one patient: what the figures rest on, then every figure, for each starting risk."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.publish.sheet_rows import Row, figure_row, measure_row, text_row
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import exports, labels, limits, numbers, starts
from fourcount.wording.basis import basis, range_note
from fourcount.wording.form import patient_choices, shown_choices
from fourcount.wording.gaps import gap_text


def patient_rows(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """Low, usual and high in this order; the study's own figures have their rows above already."""
    patient = findings.patient
    if isinstance(patient, Gap):
        return ()
    usual = () if starts.as_in_the_study(patient) else _rows(patient, outcome, findings, choices)
    return (
        *_ranked("low", patient.low, outcome, findings, choices),
        *usual,
        *_ranked("high", patient.high, outcome, findings, choices),
    )


def _ranked(
    rank: str, patient: PatientFindings | Gap | None, outcome: Outcome, findings: OutcomeFindings, choices: Choices
) -> tuple[Row, ...]:
    if patient is None:
        return ()
    if isinstance(patient, Gap):
        name = exports.PATIENT_RANK.format(column=labels.COLUMNS["patient"], rank=rank)
        return ((name, "", "", "", "", gap_text(patient)),)
    return _rows(patient, outcome, findings, choices)


def _rows(patient: PatientFindings, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    shown, patient = patient_choices(findings, choices), starts.at_one_level(patient, choices)
    start, names, needed = starts.named(patient), exports.PATIENT_ROWS, patient.number_needed
    key, form = patient.measure, findings.form

    def named(name: str) -> str:
        return exports.PATIENT.format(column=labels.COLUMNS["patient"], baseline=start, name=name)

    own_level = shown.level != shown_choices(findings, choices).level
    level = exports.LEVEL.format(level=numbers.level(shown.level)) if own_level else ""
    rests = (basis(outcome, patient, shown), range_note(outcome, patient), level)
    return (
        text_row(named(" ".join(part for part in rests if part))),
        figure_row(named(names["without"]), patient.without, key, form),
        figure_row(named(names["with"]), patient.with_, key, form),
        figure_row(named(names["difference"]), patient.difference, key, form),
        measure_row(named(limits.needed_kind(needed)), needed, key, form),
        figure_row(named(names["risk_ratio"]), patient.risk_ratio, key, form),
    )
