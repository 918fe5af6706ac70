"""What a hand can do to a record. Each action gives a new outcome or record and leaves the old one as it was.

Nothing else in the package replaces a field: ``msgspec.structs.replace`` checks no types, so what goes into it is
checked here. Text stays as typed, whatever its length; only what no file can hold is put right.
"""

from __future__ import annotations

from collections.abc import Container
from typing import TYPE_CHECKING, TypeVar

from msgspec.structs import fields, replace

from fourcount.record.outcome import (
    CELLS,
    DESIGNS,
    Column,
    Design,
    Effect,
    EventsAndOthers,
    EventsOfTotal,
    Layout,
    Outcome,
    Patient,
    Table,
)
from fourcount.record.paper import FAMILIES, HIGHEST_LEVEL, LOWEST_LEVEL, Choices, Family, Record

if TYPE_CHECKING:
    from fourcount.record.entry.readings import GroupCounts

Word = TypeVar("Word", bound=str)


def _texts(kind: type[Outcome] | type[Patient] | type[Record]) -> frozenset[str]:
    return frozenset(field.name for field in fields(kind) if field.name.endswith("_text"))


OUTCOME_TEXTS = _texts(Outcome)
PATIENT_TEXTS = _texts(Patient)
RECORD_TEXTS = _texts(Record)


def edit_text(outcome: Outcome, field: str, text: str) -> Outcome:
    """Write into one of the outcome's text fields, a cell of its table or a field of its patient."""
    text = _storable(text)
    if field in CELLS:
        return replace(outcome, table=replace(outcome.table, **{field: text}))
    if field in PATIENT_TEXTS:
        return replace(outcome, patient=replace(outcome.patient, **{field: text}))
    return replace(outcome, **{_one_of(field, OUTCOME_TEXTS): text})


def edit_record_text(record: Record, field: str, text: str) -> Record:
    """Write into one of the text fields of the paper itself."""
    return replace(record, **{_one_of(field, RECORD_TEXTS): _storable(text)})


def swap_groups(outcome: Outcome) -> Outcome:
    """The other group becomes the index group. What was typed stays where it is."""
    return replace(outcome, index_group="second" if outcome.index_group == "first" else "first")


def count_other_outcome(outcome: Outcome) -> Outcome:
    """The other column is counted. What was typed stays where it is, but for a starting risk.

    That is a risk of the counted outcome: 70% who heal are 30% who do not. So it becomes its complement in the same
    style of writing; text that gives no risk stays. Counting twice gives an equal risk.
    """
    counted: Column = "right" if outcome.counted == "left" else "left"
    patient = outcome.patient
    if patient.starting_risk_text:
        from fourcount.record.entry.complement import complement_text  # the window starts without the readers

        patient = replace(patient, starting_risk_text=complement_text(patient.starting_risk_text))
    return replace(outcome, counted=counted, patient=patient)


def in_form(outcome: Outcome, form: type[EventsAndOthers] | type[EventsOfTotal]) -> Outcome:
    """The same table in another form of print: ``38 · 374`` becomes ``38 of 412``, and back.

    A row whose two counts are known is converted: its left cell stays as typed (a blank one is filled), its right
    cell gets the number that belongs there. Any other row keeps its text, to be read in the new form.
    """
    if type(outcome.table) is form:
        return outcome
    from fourcount.record.entry.table import read_table  # the window starts without the readers

    reading = read_table(outcome.table)
    table: Table = form(**{field: getattr(outcome.table, field) for field in CELLS})
    table = _converted(table, reading.first, "first_left_text", "first_right_text")
    return replace(outcome, table=_converted(table, reading.second, "second_left_text", "second_right_text"))


def clear_table(outcome: Outcome) -> Outcome:
    """Four empty cells in the same form; words and choices stay."""
    return replace(outcome, table=type(outcome.table)())


def with_design(outcome: Outcome, design: Design) -> Outcome:
    return replace(outcome, design=_one_of(design, DESIGNS))


def with_welcome(outcome: Outcome, welcome: bool) -> Outcome:
    """Say whether the counted outcome is a good one; the other outcome is its opposite."""
    return replace(outcome, left_welcome=bool(welcome) == (outcome.counted == "left"))


def with_layout(outcome: Outcome, layout: Layout) -> Outcome:
    return replace(outcome, layout=_one_of(layout, ("down", "across")))


def with_effect(outcome: Outcome, effect: Effect) -> Outcome:
    """Choose the effect that is carried to the patient."""
    return replace(outcome, patient=replace(outcome.patient, effect=_one_of(effect, ("risk_ratio", "odds_ratio"))))


def with_outcome(record: Record, index: int, outcome: Outcome) -> Record:
    """The record with another outcome at a place that it has."""
    if not 0 <= index < len(record.outcomes):
        raise IndexError(f"the record has no outcome at {index}")
    outcomes = record.outcomes
    return replace(record, outcomes=(*outcomes[:index], outcome, *outcomes[index + 1 :]))


def with_choices(record: Record, choices: Choices) -> Record:
    """The same paper under other choices of intervals."""
    return replace(record, choices=choices)


def with_family(record: Record, family: Family) -> Record:
    return replace(record, choices=replace(record.choices, family=_one_of(family, FAMILIES)))


def with_level(record: Record, level: float) -> Record:
    """Choose the confidence level, a fraction from 0.80 to 0.999."""
    if not LOWEST_LEVEL <= level <= HIGHEST_LEVEL:
        raise ValueError(f"a level is a fraction from {LOWEST_LEVEL} to {HIGHEST_LEVEL}, not {level!r}")
    return replace(record, choices=replace(record.choices, level=float(level)))


def _converted(table: Table, counts: GroupCounts, left_field: str, right_field: str) -> Table:
    if counts.left is None or counts.right is None:
        return table
    from fourcount.record.entry.digits import plain

    right = counts.total if isinstance(table, EventsOfTotal) else counts.right
    left_text = getattr(table, left_field)
    return replace(table, **{left_field: left_text if plain(left_text) else str(counts.left), right_field: str(right)})


def _storable(text: str) -> str:
    """The text with each lone surrogate as U+FFFD: UTF-8, and so a file, cannot hold one."""
    return text if text.isascii() else text.encode("utf-16-le", "surrogatepass").decode("utf-16-le", "replace")


def _one_of(value: Word, allowed: Container[object]) -> Word:
    if value not in allowed:
        raise ValueError(f"{value!r} is none of the possible values")
    return value
