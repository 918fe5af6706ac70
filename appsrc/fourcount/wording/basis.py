"""What a patient's figures rest on: the starting risk, where it is from, and the effect carried to it."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, PatientFindings
from fourcount.record.outcome import EffectOnly, Outcome, Strata
from fourcount.wording import limits, names, numbers
from fourcount.wording.lines.as_printed import carried_texts

POOLED = "pooled "
ADJUSTED = "adjusted "
OWN_RISK = "At the study’s own starting {risk}."
GIVEN_RISK = "Starting risk {baseline}{source}, {effect} {value}{interval} kept constant."


def basis(outcome: Outcome, patient: PatientFindings) -> str:
    """One sentence without which nobody who gets a copy can check it."""
    carried = patient.carried
    if patient.baseline_from == "reference" or isinstance(carried.estimate, Gap):
        return OWN_RISK.format(risk=names.risk_name(outcome))
    value, interval = carried_texts(patient.effect, outcome, carried)
    source = " ".join(outcome.patient.starting_risk_source_text.split())
    return GIVEN_RISK.format(
        baseline=numbers.percent_given(patient.baseline),
        source=f" ({source})" if source else "",
        effect=f"{_whose(outcome)}{names.effect_name(outcome, patient.effect)}",
        value=value,
        interval="" if isinstance(carried.interval, Gap) else limits.bracketed(interval),
    )


def _whose(outcome: Outcome) -> str:
    """Which of several effects it is: the pooled one of strata, the adjusted one of a print."""
    if isinstance(outcome.table, Strata):
        return POOLED
    adjusted = isinstance(outcome.table, EffectOnly) and outcome.adjusted_for_text.strip()
    return ADJUSTED if adjusted else ""
