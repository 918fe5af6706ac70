"""Text written into a record. It stays as typed, whatever its length; only what no file can hold is put right."""

from __future__ import annotations

from collections.abc import Container
from typing import TypeVar

from msgspec.structs import fields, replace

from fourcount.record.characters import storable
from fourcount.record.outcome import CELLS, PAPER_MEASURES, EffectOnly, Outcome, Patient, Strata, Stratum
from fourcount.record.paper import Record

Word = TypeVar("Word", bound=str)

STRATUM_TEXTS = frozenset((*CELLS, "label_text"))
OWN_TEXTS = frozenset(("unit_text", "limits_level_text"))
"""Texts that only one form of print has."""

MEASURES_OF = {"paper_text": "paper_measure", "adjusted_text": "adjusted_measure"}
"""What each printed effect is called."""


def _texts(kind: type[Outcome] | type[Patient] | type[Record]) -> frozenset[str]:
    return frozenset(field.name for field in fields(kind) if field.name.endswith("_text"))


OUTCOME_TEXTS = _texts(Outcome)
PATIENT_TEXTS = _texts(Patient)
RECORD_TEXTS = _texts(Record)


def edit_text(outcome: Outcome, field: str, text: str) -> Outcome:
    """Write into one of the outcome's text fields, a text of its table or a field of its patient.

    A stratum's field is named with its place, counted from 0: ``strata.2.first_left_text``. A printed effect that
    names its measure ("OR 0.49") settles what it is called, and it is called so when the name is edited away.
    """
    text = storable(text)
    if field in CELLS or field in OWN_TEXTS:
        return replace(outcome, table=replace(outcome.table, **{_own(outcome, field): text}))
    if field.startswith("strata."):
        return _edit_stratum(outcome, field, text)
    if field in PATIENT_TEXTS:
        return replace(outcome, patient=replace(outcome.patient, **{field: text}))
    edited = replace(outcome, **{one_of(field, OUTCOME_TEXTS): text})
    return _called_by_name(edited, field, text) if field in MEASURES_OF else edited


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


def _called_by_name(outcome: Outcome, field: str, text: str) -> Outcome:
    """The outcome with the first measure that a printed effect names, where it is one that can be chosen."""
    from fourcount.record.entry.figure_grammar import Grammar  # the window starts without the readers
    from fourcount.record.entry.tokens import LONGEST_TEXT, take_apart

    if len(text) > LONGEST_TEXT:
        return outcome
    names = (figure.name for figure in Grammar(take_apart(text).tokens, unnamed=False).figures())
    named = next((name.measure for name in names if name and name.measure in PAPER_MEASURES), None)
    return replace(outcome, **{MEASURES_OF[field]: named}) if named else outcome
