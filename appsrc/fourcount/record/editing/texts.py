"""Text written into a record. It stays as typed, whatever its length; only what no file can hold is put right."""

from __future__ import annotations

from collections.abc import Container
from typing import TypeVar

from msgspec.structs import fields, replace

from fourcount.record.outcome import CELLS, EffectOnly, Outcome, Patient, Strata, Stratum
from fourcount.record.paper import Record

Word = TypeVar("Word", bound=str)

STRATUM_TEXTS = frozenset((*CELLS, "label_text"))
OWN_TEXTS = frozenset(("unit_text", "limits_level_text"))
"""Texts that only one form of print has."""


def _texts(kind: type[Outcome] | type[Patient] | type[Record]) -> frozenset[str]:
    return frozenset(field.name for field in fields(kind) if field.name.endswith("_text"))


OUTCOME_TEXTS = _texts(Outcome)
PATIENT_TEXTS = _texts(Patient)
RECORD_TEXTS = _texts(Record)


def edit_text(outcome: Outcome, field: str, text: str) -> Outcome:
    """Write into one of the outcome's text fields, a text of its table or a field of its patient.

    A stratum's field is named with its place, counted from 0: ``strata.2.first_left_text``.
    """
    text = storable(text)
    if field in CELLS or field in OWN_TEXTS:
        return replace(outcome, table=replace(outcome.table, **{_own(outcome, field): text}))
    if field.startswith("strata."):
        return _edit_stratum(outcome, field, text)
    if field in PATIENT_TEXTS:
        return replace(outcome, patient=replace(outcome.patient, **{field: text}))
    return replace(outcome, **{one_of(field, OUTCOME_TEXTS): text})


def edit_record_text(record: Record, field: str, text: str) -> Record:
    """Write into one of the text fields of the paper itself."""
    return replace(record, **{one_of(field, RECORD_TEXTS): storable(text)})


def typed_texts(outcome: Outcome) -> tuple[str, ...]:
    """All that was typed into the table's cells, blank cells left out."""
    if isinstance(outcome.table, Strata):
        cells = [getattr(stratum, field) for stratum in outcome.table.strata for field in CELLS]
    elif isinstance(outcome.table, EffectOnly):
        cells = []
    else:
        cells = [getattr(outcome.table, field) for field in CELLS]
    return tuple(text for text in cells if text.strip())


def storable(text: str) -> str:
    """The text with each lone surrogate as U+FFFD: UTF-8, and so a file, cannot hold one."""
    return text if text.isascii() else text.encode("utf-16-le", "surrogatepass").decode("utf-16-le", "replace")


def one_of(value: Word, allowed: Container[object]) -> Word:
    """The value, where it is one of the possible ones; ValueError otherwise."""
    if value not in allowed:
        raise ValueError(f"{value!r} is none of the possible values")
    return value


def _own(outcome: Outcome, field: str) -> str:
    return one_of(field, outcome.table.__struct_fields__)


def _edit_stratum(outcome: Outcome, field: str, text: str) -> Outcome:
    place_text, _, name = field.removeprefix("strata.").partition(".")
    strata: tuple[Stratum, ...] = outcome.table.strata if isinstance(outcome.table, Strata) else ()
    places = {str(place): place for place in range(len(strata))}
    place = places[one_of(place_text, places)]
    edited = replace(strata[place], **{one_of(name, STRATUM_TEXTS): text})
    return replace(outcome, table=replace(outcome.table, strata=(*strata[:place], edited, *strata[place + 1 :])))
