"""Where a patient starts: the starting risk, its limits, and where it comes from."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings import Figure, Gap, PatientFindings
from fourcount.record.entry.readings import Blank, Proportion, RiskReading, Unreadable
from fourcount.record.entry.risk import read_risk
from fourcount.record.entry.starting import read_share, read_starting_risk
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers, spans
from fourcount.wording.subject import subject

OWN = "the study’s own starting {risk}"
SHARE = "Share of people {group}"
OWN_ROW = "the study’s own"
FROM_RATE = "from {rate}{over}"
FROM_OVERALL = "from an overall risk of {overall}, {share} of people {group}"


def own(patient: PatientFindings) -> bool:
    """Whether the patient starts at the study's own risk, and so is like the people in the study, by any effect."""
    return patient.baseline_from == "reference"


def as_in_the_study(patient: PatientFindings) -> bool:
    """Whether the patient's figures are the study's, so that all of them stand elsewhere already."""
    return own(patient) and patient.range_from == "table" and patient.other_span is None


def value(patient: PatientFindings) -> str:
    """The starting risk over the study's span: as it was typed, or with one decimal where it is worked out."""
    typed = patient.start_from == "typed"
    return numbers.percent_given(patient.baseline) if typed else numbers.percent(patient.baseline)


def named(patient: PatientFindings) -> str:
    """``12%``, ``low, 5%``, ``the study’s own, 17.1%``; over the study's span where the figures are over another."""
    name = OWN_ROW if own(patient) else patient.rank
    risk = f"{value(patient)}{spans.of_the_start(patient)}"
    return f"{name}, {risk}" if name else risk


def at_one_level(patient: PatientFindings, choices: Choices) -> PatientFindings:
    """The patient with the intervals that have one level.

    The study's own starting risk has an interval at the level chosen for the table; beside an effect that keeps the
    level of its print it is left out, since one head names one level.
    """
    if not own(patient) or patient.range_from != "effect" or patient.level == choices.level:
        return patient
    bare = Figure(estimate=patient.without.estimate, interval=Gap("bare-starting-risk"), method="")
    return msgspec.structs.replace(patient, without=bare)


def share_name(outcome: Outcome) -> str:
    """``Share of people with night lights``: whose share goes with an overall risk."""
    return SHARE.format(group=names.in_group(subject(outcome), "index"))


def given(outcome: Outcome, patient: PatientFindings, choices: Choices) -> str:
    """``Starting risk 12% over 12 months (24 of 200, 95% interval 8.2 to 17.2%; a register)``."""
    what = " ".join(part for part in (patient.rank, "starting risk", value(patient)) if part)
    source = names.bare(outcome.patient.starting_risk_source_text)
    reading = _reading(outcome, patient)
    precise = ", ".join(part for part in (_counted(reading), _interval(patient, reading, choices)) if part)
    inside = "; ".join(part for part in (_worked_out(outcome, patient), precise, source) if part)
    return f"{names.sentence_case(what)}{spans.of_the_start(patient)}{limits.bracketed(inside)}"


def _worked_out(outcome: Outcome, patient: PatientFindings) -> str:
    """From which rate, or from which overall risk, a starting risk follows."""
    typed = outcome.patient
    if patient.start_from == "rate":
        span = None if patient.study_span and patient.other_span else patient.study_span or patient.other_span
        over = f" over {spans.duration(span)}" if span else ""
        return FROM_RATE.format(rate=names.bare(typed.rate_text), over=over)
    if patient.start_from == "overall":
        overall = _as_risk(read_risk(typed.overall_risk_text), typed.overall_risk_text)
        share = _as_risk(read_share(typed.exposed_share_text), typed.exposed_share_text)
        return FROM_OVERALL.format(overall=overall, share=share, group=names.in_group(subject(outcome), "index"))
    return ""


def _as_risk(reading: Proportion | Blank | Unreadable, text: str) -> str:
    """``30%`` for whatever way it was typed in."""
    return numbers.percent_given(reading.value) if isinstance(reading, Proportion) else names.bare(text)


def _reading(outcome: Outcome, patient: PatientFindings) -> RiskReading | None:
    """What was typed as this starting risk."""
    if own(patient) or patient.start_from in ("rate", "overall"):
        return None
    typed = outcome.patient
    text = {"low": typed.low_risk_text, "high": typed.high_risk_text}.get(patient.rank, typed.starting_risk_text)
    reading = read_starting_risk(text)
    return reading if isinstance(reading, RiskReading) else None


def _counted(reading: RiskReading | None) -> str:
    if reading is None or reading.events is None or reading.total is None:
        return ""
    return f"{numbers.whole(reading.events)} of {numbers.whole(reading.total)}"


def _interval(patient: PatientFindings, reading: RiskReading | None, choices: Choices) -> str:
    """Limits as they were typed, at their own level; those of counts at the level chosen."""
    interval = patient.start_interval
    if isinstance(interval, Gap):
        return ""
    if reading is None or reading.low is None:
        return f"{limits.interval_name(choices.level)} {limits.percent_interval(interval, patient.baseline)}"
    low, high = numbers.percent_given(interval.low).removesuffix("%"), numbers.percent_given(interval.high)
    return f"{limits.interval_name(reading.level)} {low}{numbers.TO}{high}"
