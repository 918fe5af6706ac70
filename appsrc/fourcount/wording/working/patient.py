"""The working of one patient's figures: each formula with the reader's numbers in it, its source, what it assumes."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, CarriedEffect, Figure, Gap, OutcomeFindings, PatientFindings
from fourcount.record.entry.person_rate import read_rate
from fourcount.record.entry.readings import DAYS_IN, Proportion, RateReading
from fourcount.record.entry.risk import read_risk
from fourcount.record.entry.starting import read_share
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.entries.carrying import CARRYING
from fourcount.wording import limits, lines, numbers, starts
from fourcount.wording.basis import basis, range_note
from fourcount.wording.effects import carried_name, value_and_limits
from fourcount.wording.form import patient_choices
from fourcount.wording.gaps import gap_text
from fourcount.wording.labels import COLUMNS
from fourcount.wording.numbers import plain, quantity
from fourcount.wording.working.parts import SPACE, Row, Working, about, interval_label, reciprocal

PATIENT = "patient"
WITHOUT, WITH, DIFFERENCE = "Without", "With", "Difference"
STARTING = "Starting risk"
CARRIED = "Carried"
OWN = "the study’s own"
SAME = 1e-9
ENTRIES = {entry.key: entry for entry in CARRYING}
BY_EFFECT: dict[CarriedEffect, str] = {
    "risk_ratio": "carried-risk-ratio",
    "odds_ratio": "carried-odds-ratio",
    "hazard_ratio": "carried-hazard-ratio",
    "rate_ratio": "carried-rate-ratio",
    "risk_difference": "carried-difference",
}
FORMULAS: dict[CarriedEffect, str] = {
    "risk_ratio": "{q} × {e}",
    "odds_ratio": "{q} × {e}/(1 − {q} + {q} × {e})",
    "hazard_ratio": "1 − (1 − {q})^{e}",
    "rate_ratio": "1 − (1 − {q})^{e}",
    "risk_difference": "{q} + {e}",
}
ANOTHER_SPAN = "1 − (1 − {risk})^({to}/{from_}) = {result}"


def patient_working(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> Working:
    """What the patient's figures rest on, and how each came about; rows only where something was carried."""
    patient = findings.patient
    if isinstance(patient, Gap):
        return Working(title=COLUMNS["patient"], sentence=gap_text(patient), rows=())
    shown = patient_choices(findings, choices)
    sentence = " ".join(part for part in (basis(outcome, patient, shown), range_note(outcome, patient)) if part)
    rows = (*_starting(outcome, patient), *_risks(outcome, patient), *_intervals(patient, shown), *_entries(patient))
    return Working(title=COLUMNS["patient"], sentence=sentence, rows=rows)


def _starting(outcome: Outcome, patient: PatientFindings) -> list[Row]:
    """The starting risk, and the formula behind one that was not typed as a risk."""
    if starts.own(patient):
        return [(STARTING, f"{plain(patient.baseline)}, {OWN}")]
    if patient.start_from == "rate":
        return [(STARTING, _from_rate(outcome, patient))]
    if patient.start_from == "overall":
        return [(STARTING, plain(patient.baseline)), *_from_overall(outcome)]
    return [(STARTING, plain(patient.baseline))]


def _from_rate(outcome: Outcome, patient: PatientFindings) -> str:
    """``1 − exp(−0.012 × 10) = 0.1131``, the rate in years where it stands over a span in years."""
    rate, result = read_rate(outcome.patient.rate_text), plain(patient.baseline)
    span = patient.study_span or patient.other_span
    if not isinstance(rate, RateReading) or span is None:
        return result
    a_year = rate.value * DAYS_IN["year"] / DAYS_IN[rate.unit]
    return f"1 − exp(−{plain(a_year)} × {quantity(span.years)}) = {result}, the rate and the time in years"


def _from_overall(outcome: Outcome) -> list[Row]:
    overall, share = read_risk(outcome.patient.overall_risk_text), read_share(outcome.patient.exposed_share_text)
    if not isinstance(overall, Proportion) or not isinstance(share, Proportion):
        return []
    return [("Solved from", f"P = {plain(overall.value)}, s = {plain(share.value)}")]


def _risks(outcome: Outcome, patient: PatientFindings) -> list[Row]:
    """Risk without, risk with, their difference and the number needed, each from the ones before it."""
    rows: list[Row] = []
    if patient.range_from != "table":
        value, interval = value_and_limits(outcome, patient)
        rows.append((CARRIED, f"{carried_name(outcome, patient)} {value}{limits.bracketed(interval)}"))
    without, with_, change = patient.without.estimate, patient.with_.estimate, patient.difference.estimate
    if patient.other_span is not None and not isinstance(without, Gap):
        rows.append((WITHOUT, _over(patient.baseline, without, patient)))
    rows.append((WITH, _with(patient)))
    if isinstance(without, Gap) or isinstance(with_, Gap) or isinstance(change, Gap):
        return rows
    rows.append((DIFFERENCE, f"{plain(with_)} − {plain(without)} = {plain(change)}"))
    needed = patient.number_needed
    if isinstance(needed, AnyNumberNeeded):
        rows.append(("Number needed", reciprocal(abs(change), numbers.number_needed(needed.estimate))))
    return rows


def _with(patient: PatientFindings) -> str:
    """The formula of the effect with the numbers in it; over another span the risk at the study's span first."""
    effect, with_ = patient.carried.estimate, patient.with_.estimate
    if isinstance(with_, Gap):
        return gap_text(with_)
    if patient.range_from == "table" or isinstance(effect, Gap):
        own = f"{plain(with_)}, {OWN}"
        return own if patient.other_span is None else plain(with_)
    e = f"({plain(effect)})" if effect < 0 else plain(effect)
    formula = FORMULAS[patient.effect].format(q=plain(patient.baseline), e=e)
    if patient.other_span is None:
        return f"{formula} = {plain(with_)}"
    return f"{formula}, then over the other span {plain(with_)}"


def _over(risk: float, result: float, patient: PatientFindings) -> str:
    """``1 − (1 − 0.12)^(5/1) = 0.4723``."""
    from_, to = patient.study_span, patient.other_span
    if from_ is None or to is None:
        return plain(result)
    years = {"from_": quantity(from_.years), "to": quantity(to.years)}
    return ANOTHER_SPAN.format(risk=plain(risk), result=plain(result), **years)


def _intervals(patient: PatientFindings, choices: Choices) -> list[Row]:
    """The limits of each figure."""
    figures: tuple[tuple[str, str, Figure], ...] = (
        (WITHOUT, "risk_reference", patient.without),
        (WITH, "risk_index", patient.with_),
        (f"{DIFFERENCE}, per 100", "risk_difference", patient.difference),
        ("Risk ratio", "risk_ratio", patient.risk_ratio),
    )
    rows = [
        (name, f"{lines.estimate_text(key, figure)} ({lines.interval_text(key, figure)})")
        for name, key, figure in figures
        if not isinstance(figure.interval, Gap) and not isinstance(figure.estimate, Gap)
    ]
    return [SPACE, ("", f"{interval_label(choices.level)}:"), *rows] if rows else []


def _entries(patient: PatientFindings) -> list[Row]:
    """Every calculation that led here, with its source."""
    own = patient.range_from == "table"
    keys = (
        {"rate": "risk-from-rate", "overall": "starting-risk-overall"}.get(patient.start_from, ""),
        "" if own else BY_EFFECT[patient.effect],
        "other-span" if patient.other_span is not None else "",
        "propagated" if patient.range_from == "both" else "",
        "risk-ratio-from-odds-ratio" if patient.effect == "odds_ratio" and not own else "",
    )
    return [row for key in keys if key in ENTRIES for row in (SPACE, *about(ENTRIES[key]))]
