"""The risk that a patient starts from: typed, or the reference group's own."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.appraisal.findings import Gap, Mark
from fourcount.appraisal.gating import Support
from fourcount.record.entry.readings import Blank, Proportion, Unreadable
from fourcount.record.entry.risk import read_risk
from fourcount.record.outcome import Outcome


class StartingRisk(msgspec.Struct, frozen=True, kw_only=True):
    """A risk as a fraction, and whether it was typed ("given") or is the table's own ("reference")."""

    value: float
    origin: Literal["reference", "given"]


Typed = Proportion | Blank | Unreadable


def typed_risk(outcome: Outcome) -> Typed:
    """What the field of the starting risk holds."""
    return read_risk(outcome.patient.starting_risk_text)


def marks_of(typed: Typed) -> tuple[Mark, ...]:
    """The mark of the field, where it holds text that gives no risk."""
    if not isinstance(typed, Unreadable):
        return ()
    return (Mark(field="starting_risk_text", key=typed.key, facts=typed.facts),)


def starting_risk(typed: Typed, reference_risk: float | Gap, support: Support) -> StartingRisk | Gap:
    """The typed risk; with an empty field the reference group's, where it is a risk of people at all."""
    if isinstance(typed, Unreadable):
        return Gap("baseline-unreadable")
    if isinstance(typed, Proportion):
        return StartingRisk(value=typed.value, origin="given")
    if not support.own_starting_risk:
        return Gap("case-control-needs-baseline")
    if isinstance(reference_risk, Gap):
        return Gap("no-starting-risk")
    return StartingRisk(value=reference_risk, origin="reference")
