"""Outcomes of four plain counts, and what is copied of them: a letter, a listing, a sheet."""

from __future__ import annotations

import re
from datetime import date

import msgspec

from fourcount.appraisal.appraise import appraise
from fourcount.publish.listing import listing
from fourcount.publish.prose import prose
from fourcount.publish.sheet import Row, rows, tsv
from fourcount.record.outcome import CELLS, EventsAndOthers, Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording.example import worked_example

RECORD = worked_example()
OUTCOME = RECORD.outcomes[0]
NUMBER = re.compile(r"-?\d+(\.\d+)?(e[-+]?\d+)?|infinity")


def outcome_of(counts: tuple[int, ...], *, design: str = "trial", risk: str = "", label: str = "") -> Outcome:
    """An outcome of four plain counts, the reader's words all the same text."""
    words = dict.fromkeys(("name_text", "first_label_text", "second_label_text", "left_words_text", "span_text"), label)
    table = EventsAndOthers(**dict(zip(CELLS, map(str, counts), strict=True)))
    return msgspec.convert(
        {**words, "design": design, "table": msgspec.to_builtins(table), "patient": {"starting_risk_text": risk}},
        Outcome,
    )


def record_of(outcome: Outcome, choices: Choices | None = None) -> Record:
    return Record(title_text="A paper", outcomes=(outcome,), choices=choices or Choices())


def letter(outcome: Outcome, choices: Choices | None = None) -> str:
    record = record_of(outcome, choices)
    return prose(record, outcome, appraise(outcome, record.choices), version="9.9", today=date(2030, 5, 1))


def table_of(outcome: Outcome, choices: Choices | None = None) -> tuple[Row, ...]:
    record = record_of(outcome, choices)
    return rows(record, outcome, appraise(outcome, record.choices), version="9.9", today=date(2030, 5, 1))


def sheet_of(outcome: Outcome) -> str:
    return tsv(record_of(outcome), outcome, appraise(outcome, Choices()), version="9.9", today=date(2030, 5, 1))


def on_screen(outcome: Outcome, choices: Choices | None = None) -> str:
    chosen = choices or Choices()
    return listing(outcome, appraise(outcome, chosen), chosen)
