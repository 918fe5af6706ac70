"""An effect carried to a patient, and a line of the reader's own, as other programs read them."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, Interval, OwnLine, PatientFindings
from fourcount.publish.contract_figures import Json, figure_json, measure_json, pair_json, value_json, withheld_json
from fourcount.record.entry.digits import plain
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Outcome, Patient
from fourcount.wording import starts


def asked_of_a_patient(outcome: Outcome) -> bool:
    """Whether anything was typed or chosen for a patient."""
    patient = outcome.patient
    texts = (getattr(patient, name) for name in Patient.__struct_fields__ if name.endswith("_text"))
    return patient.effect != "usual" or any(plain(text) for text in texts)


def tells_of_a_patient(outcome: Outcome, patient: PatientFindings | Gap) -> bool:
    """Whether a patient's figures, or why there are none, belong beside the table's.

    They do where they were asked for, and where they are not the table's own: outside trials the usual effect is the
    paper's adjusted one.
    """
    apart = isinstance(patient, PatientFindings) and not starts.as_in_the_study(patient)
    return apart or asked_of_a_patient(outcome)


def patient_json(patient: PatientFindings | Gap) -> Json:
    """The effect at a starting risk; ``baseline`` is that risk over the study's own time span.

    ``risk_without`` is a bare number, and ``risk_without_interval`` its limits where it has any. The low and the high
    one of three starting risks stand under ``low`` and ``high`` in the same form.
    """
    if isinstance(patient, Gap):
        return withheld_json(patient)
    sides = {"low": patient.low, "high": patient.high}
    return {
        "baseline": patient.baseline,
        "effect": patient.effect,
        "risk_without": value_json(patient.without.estimate),
        "risk_with": figure_json(patient.with_),
        "difference": figure_json(patient.difference),
        "number_needed": measure_json(patient.number_needed),
        "risk_ratio": figure_json(patient.risk_ratio),
        "range_from": patient.range_from,
        "start_from": patient.start_from,
        "start_interval": pair_json(patient.start_interval),
        "start_level": patient.start_level,
        "risk_without_interval": _whole_interval(patient),
        "measure": patient.measure,
        "carried": figure_json(patient.carried),
        "adjusted": patient.adjusted,
        "adjusted_for": patient.adjusted_for,
        "level": patient.level,
        "study_span": _span(patient.study_span),
        "other_span": _span(patient.other_span),
        **({"rank": patient.rank} if patient.rank else {}),
        **{rank: patient_json(found) for rank, found in sides.items() if found is not None},
    }


def line_json(line: OwnLine | Gap) -> Json:
    """The reader's own line, and where the interval of its measure lies against it."""
    if isinstance(line, Gap):
        return withheld_json(line)
    found: Json = {
        "kind": line.kind,
        "measure": line.measure,
        "value": line.value,
        "lies": line.lies,
        "worse_side": line.worse_side,
        "level": line.level,
    }
    return found if line.p is None else {**found, "p": value_json(line.p), "method": line.method, "parted": line.parted}


def _whole_interval(patient: PatientFindings) -> object:
    """The limits of the risk without; one that is withheld by itself withholds the pair."""
    interval = patient.without.interval
    if isinstance(interval, Interval | Gap):
        return pair_json(interval)
    gap = interval.low if isinstance(interval.low, Gap) else interval.high
    return withheld_json(gap) if isinstance(gap, Gap) else None


def _span(span: Duration | None) -> object:
    """A time span as it was typed, and in years."""
    return None if span is None else {"value": span.value, "unit": span.unit, "years": span.years}
