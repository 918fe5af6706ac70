"""What a hand can choose: which group, which outcome, which design, and what holds for the whole paper."""

from __future__ import annotations

from typing import get_args

from msgspec.structs import replace

from fourcount.record.editing.for_patient import line_turned
from fourcount.record.editing.forms import in_form
from fourcount.record.editing.texts import one_of
from fourcount.record.outcome import (
    CELLS,
    DESIGNS,
    PAIRED_DESIGNS,
    PAPER_MEASURES,
    WHERE,
    Column,
    Counting,
    Design,
    EffectOnly,
    Layout,
    Outcome,
    Pairs,
    PaperMeasure,
    Patient,
    PersonTime,
    Strata,
    Stratum,
    Where,
)
from fourcount.record.paper import FAMILIES, HIGHEST_LEVEL, LOWEST_LEVEL, Choices, Family, Record


def swap_groups(outcome: Outcome) -> Outcome:
    """The other group becomes the index group. What was typed stays where it is; the own line changes sides."""
    return replace(line_turned(outcome), index_group="second" if outcome.index_group == "first" else "first")


def count_other_outcome(outcome: Outcome) -> Outcome:
    """The other column is counted. What was typed stays where it is, but for risks of the counted outcome.

    70% who heal are 30% who do not. So each starting risk, and an overall one, becomes its complement in the same style
    of writing, and the low one of three becomes the high one; text that gives no risk stays as it is. The reader's own
    line changes sides. A rate stays typed but is used no longer, since it is of the one event and says nothing of the
    other outcome: the starting risk is a risk again. Without one, counting twice gives an equal outcome. Person-time
    has events and no other outcome, so nothing happens there.
    """
    if isinstance(outcome.table, PersonTime):
        return outcome
    counted: Column = "right" if outcome.counted == "left" else "left"
    return replace(line_turned(outcome), counted=counted, patient=_of_the_other(_without_rate(outcome.patient)))


def _of_the_other(patient: Patient) -> Patient:
    """The patient with the risks of the other outcome."""
    texts = {
        "starting_risk_text": patient.starting_risk_text,
        "low_risk_text": patient.high_risk_text,
        "high_risk_text": patient.low_risk_text,
        "overall_risk_text": patient.overall_risk_text,
    }
    if not any(texts.values()):
        return patient
    from fourcount.record.entry.complement import complement_text  # the window starts without the readers

    return replace(patient, **{field: complement_text(text) if text else "" for field, text in texts.items()})


def _without_rate(patient: Patient) -> Patient:
    """The patient with a starting risk in place of a rate that has been typed."""
    return replace(patient, start_kind="one") if patient.start_kind == "rate" and patient.rate_text.strip() else patient


def clear_table(outcome: Outcome) -> Outcome:
    """Empty cells in the same form; words and choices stay. A form without cells loses the printed effect."""
    table = outcome.table
    if isinstance(table, EffectOnly):
        return replace(outcome, paper_text="")
    if isinstance(table, Strata):
        empty = tuple(Stratum(label_text=stratum.label_text) for stratum in table.strata)
        return replace(outcome, table=replace(table, strata=empty))
    return replace(outcome, table=replace(table, **dict.fromkeys(CELLS, "")))


def with_design(outcome: Outcome, design: Design) -> Outcome:
    """Choose the design. One whose people come in pairs is entered as pairs, any other one not.

    A printed effect without counts stays one in every design.
    """
    chosen = replace(outcome, design=one_of(design, DESIGNS))
    if isinstance(outcome.table, EffectOnly) or (design in PAIRED_DESIGNS) == isinstance(outcome.table, Pairs):
        return chosen
    return replace(in_form(chosen, "pairs" if design in PAIRED_DESIGNS else "events-and-others"), design=design)


def with_welcome(outcome: Outcome, welcome: bool) -> Outcome:
    """Say whether the counted outcome is a good one; the other outcome is its opposite."""
    return replace(outcome, left_welcome=bool(welcome) == outcome.counts_left)


def with_layout(outcome: Outcome, layout: Layout) -> Outcome:
    return replace(outcome, layout=one_of(layout, ("down", "across")))


def with_counting(outcome: Outcome, counting: Counting) -> Outcome:
    """Say whether the counts are of people or of events."""
    return replace(outcome, counting=one_of(counting, get_args(Counting)))


def with_follow_up_varied(outcome: Outcome, varied: bool) -> Outcome:
    """Say whether people were followed for different times."""
    return replace(outcome, follow_up_varied=bool(varied))


def with_where(outcome: Outcome, where: Where) -> Outcome:
    """Say where in the paper the numbers stand; empty for unsaid."""
    return replace(outcome, where=one_of(where, WHERE))


def with_paper_measure(outcome: Outcome, measure: PaperMeasure) -> Outcome:
    """Say what the paper calls its result, where the printed text does not."""
    return replace(outcome, paper_measure=one_of(measure, PAPER_MEASURES))


def with_adjusted_measure(outcome: Outcome, measure: PaperMeasure) -> Outcome:
    """Say what the paper calls its adjusted effect, where the printed text does not."""
    return replace(outcome, adjusted_measure=one_of(measure, PAPER_MEASURES))


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
    return replace(record, choices=replace(record.choices, family=one_of(family, FAMILIES)))


def with_level(record: Record, level: float) -> Record:
    """Choose the confidence level, a fraction from 0.80 to 0.999."""
    if not LOWEST_LEVEL <= level <= HIGHEST_LEVEL:
        raise ValueError(f"a level is a fraction from {LOWEST_LEVEL} to {HIGHEST_LEVEL}, not {level!r}")
    return replace(record, choices=replace(record.choices, level=float(level)))
