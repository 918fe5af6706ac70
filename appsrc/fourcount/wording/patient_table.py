"""The patient's figures as a small table: a row for each starting risk, on one denominator, each with its range."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import carried, limits, names, numbers, spans, starts
from fourcount.wording.form import patient_choices
from fourcount.wording.gaps import gap_text
from fourcount.wording.patient import titles
from fourcount.wording.ranks import people_for_all

START = "Starting {risk}"
DIFFERENCE = "Difference"
NUMBER_NEEDED = "Number needed"
ROW = "{label}: {figures}."


class Row(NamedTuple):
    """One starting risk, or the heads of the columns; every cell is a text.

    Where one starting risk gives nothing, the reason stands under ``without`` and the other cells are empty.
    """

    label: str
    without: str
    with_: str
    difference: str
    number_needed: str


def patient_table(findings: OutcomeFindings, choices: Choices, denominator: int | None = None) -> list[Row]:
    """``12%: 12, 6 (4 to 9), 6 fewer (3 to 8), NNTB 19 (14 to 38)``: low, usual and high in this order, or the one row.

    All rows count the same number of people: ``denominator`` where it is given, a power of ten, and more only where
    one of the rows needs it. The intervals have the level that the head names.
    """
    usual = findings.patient
    if isinstance(usual, Gap):
        return []
    people, usual = people_for_all(usual, denominator), starts.at_one_level(usual, choices)
    ranked = (("low", usual.low), ("", usual), ("high", usual.high))
    return [_row(rank, one, findings, people) for rank, one in ranked if one is not None]


def patient_table_head(
    outcome: Outcome, findings: OutcomeFindings, choices: Choices, denominator: int | None = None
) -> Row:
    """What the columns are: ``With: night lights, in 100 (95% interval)``; another time span is named here too."""
    patient = findings.patient
    without, with_ = titles(outcome)
    start = START.format(risk=names.risk_name(outcome))
    if isinstance(patient, Gap):
        return Row(start, without, with_, DIFFERENCE, NUMBER_NEEDED)
    level = limits.interval_name(patient_choices(findings, choices).level)
    span = "" if patient.other_span is None else f", {spans.over(outcome, patient)}"
    counted = f"{span}, in {numbers.whole(people_for_all(patient, denominator))} ({level})"
    needed = f"{NUMBER_NEEDED} ({level})"
    return Row(start, f"{without}{counted}", f"{with_}{counted}", f"{DIFFERENCE}{counted}", needed)


def rows_sentence(rows: list[Row], head: Row) -> str:
    """The whole table read out: each cell behind its head, and a reason by itself."""
    return " ".join(ROW.format(label=row.label, figures=_read_out(row, head).removesuffix(".")) for row in rows)


def _read_out(row: Row, head: Row) -> str:
    if not row.with_:
        return row.without
    return ", ".join(f"{name}: {cell}" for name, cell in zip(head[1:], row[1:], strict=True) if cell)


def _row(rank: str, patient: PatientFindings | Gap, findings: OutcomeFindings, people: int) -> Row:
    if isinstance(patient, Gap):
        return Row(names.sentence_case(rank), gap_text(patient), "", "", "")
    label = names.sentence_case(starts.named(patient))
    without = _cell(carried.bare_count(patient.without, people), carried.risk_limits(patient.without, people))
    if isinstance(patient.with_.estimate, Gap):
        return Row(label, without, carried.reason(patient.with_.estimate, patient, findings), "", "")
    needed = patient.number_needed
    return Row(
        label,
        without,
        _cell(carried.bare_count(patient.with_, people), carried.risk_limits(patient.with_, people)),
        _cell(carried.bare_change(patient.difference, people), carried.change_limits(patient.difference, people)),
        carried.NOT_GIVEN if isinstance(needed, Gap) else carried.needed_value(needed),
    )


def _cell(value: str, interval: str) -> str:
    return f"{value}{limits.bracketed(interval)}"
