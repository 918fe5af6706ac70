"""What a patient's figures rest on: the starting risk, where it is from, the effect carried to it, the time span."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, Interval, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import USUAL_LEVEL, Choices
from fourcount.wording import carried, effects, names, spans, starts
from fourcount.wording.caution_texts import EFFECT_RANGE
from fourcount.wording.half_added import half_added

AT_OWN_RISK = "At {own}"
OWN_RANGE = "The interval is the study’s own."
BOTH_RANGE = "The interval holds the imprecision of both the starting risk and the {effect}."
OVERALL_RANGE = "The interval takes the overall risk and the share of people who have it as certain."
CONSTANT_RANGE = "A difference kept constant has the same interval at every starting risk."
HALF_ADDED = "The interval comes from counts with a half added, so it need not hold the estimate."
NOT_CRUDE = "These rest on the {effect}, not on the table’s crude counts alone."
USUAL = Choices(level=USUAL_LEVEL)


def basis(outcome: Outcome, patient: PatientFindings, choices: Choices = USUAL) -> str:
    """One sentence without which nobody who gets a copy can check it."""
    withheld = isinstance(patient.carried.estimate, Gap)
    if starts.as_in_the_study(patient) or withheld:
        return f"{_own(outcome)}."
    start = starts.given(outcome, patient, choices)
    if starts.own(patient):
        start = f"{_own(outcome)} of {starts.value(patient)}{spans.of_the_start(patient)}"
    effect = "" if patient.range_from == "table" else effects.kept_constant(outcome, patient)
    return f"{', '.join(part for part in (start, effect, spans.carried_to(patient)) if part)}."


def range_note(outcome: Outcome, patient: PatientFindings) -> str:
    """What the interval of the difference holds and what it leaves out; "" where there is no interval."""
    if isinstance(patient.difference.interval, Gap) or carried.no_width(patient.difference):
        return ""
    if patient.range_from == "table":
        return OWN_RANGE
    if patient.start_from == "overall":
        return OVERALL_RANGE
    if patient.effect == "risk_difference" and patient.other_span is None:
        return CONSTANT_RANGE if isinstance(patient.difference.interval, Interval) else ""
    if patient.range_from == "both":
        return BOTH_RANGE.format(effect=effects.carried_name(outcome, patient))
    return EFFECT_RANGE.format(baseline=starts.value(patient))


def half_added_note(patient: PatientFindings) -> str:
    """That the interval is that of altered counts, whose own estimate is another; "" where none is."""
    withheld = isinstance(patient.difference.interval, Gap) or patient.range_from == "table"
    return HALF_ADDED if not withheld and half_added(patient.carried) else ""


def not_crude_note(outcome: Outcome, patient: PatientFindings) -> str:
    """Why the figures at the study's own starting risk are not those of its counts; "" where they are."""
    if not starts.own(patient) or not patient.adjusted:
        return ""
    return NOT_CRUDE.format(effect=effects.carried_name(outcome, patient))


def _own(outcome: Outcome) -> str:
    return AT_OWN_RISK.format(own=starts.OWN.format(risk=names.risk_name(outcome)))
