"""Outcomes of one paper: one more, a copy, another order, one less."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.record.editing.choosing import clear_table
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record

MOST_OUTCOMES = 200
"""No record holds more."""


def add_outcome(record: Record, place: int) -> Record:
    """An empty outcome behind the one at a place; with two hundred of them nothing happens.

    It is of the same study, so it takes from its neighbour what is the study's: design, groups and which is the index
    group, time span, people randomised, whether follow-up varied, the size of clusters, and the form of print. A table
    of strata keeps its labels. Nothing counted, printed or said of the patient goes along.
    """
    near = record.outcomes[_there(record, place)]
    emptied = clear_table(near)
    return _with_one_more(
        record,
        place,
        Outcome(
            table=emptied.table,
            design=near.design,
            first_label_text=near.first_label_text,
            second_label_text=near.second_label_text,
            span_text=near.span_text,
            index_group=near.index_group,
            layout=near.layout,
            follow_up_varied=near.follow_up_varied,
            paper_measure=near.paper_measure,
            adjusted_measure=near.adjusted_measure,
            first_randomised_text=near.first_randomised_text,
            second_randomised_text=near.second_randomised_text,
            cluster_size_text=near.cluster_size_text,
        ),
    )


def copy_outcome(record: Record, place: int) -> Record:
    """The outcome at a place once more, behind itself; with two hundred outcomes nothing happens."""
    return _with_one_more(record, place, record.outcomes[_there(record, place)])


def move_outcome(record: Record, place: int, to: int) -> Record:
    """The outcome at a place moved to another place; the others keep their order."""
    moved = record.outcomes[_there(record, place)]
    left = (*record.outcomes[:place], *record.outcomes[place + 1 :])
    _there(record, to)
    return replace(record, outcomes=(*left[:to], moved, *left[to:]))


def remove_outcome(record: Record, place: int) -> Record:
    """Take out the outcome at a place; the last one that is left is only emptied."""
    _there(record, place)
    left = (*record.outcomes[:place], *record.outcomes[place + 1 :])
    return replace(record, outcomes=left or (Outcome(),))


def _with_one_more(record: Record, place: int, outcome: Outcome) -> Record:
    if len(record.outcomes) >= MOST_OUTCOMES:
        return record
    return replace(record, outcomes=(*record.outcomes[: place + 1], outcome, *record.outcomes[place + 1 :]))


def _there(record: Record, place: int) -> int:
    if not 0 <= place < len(record.outcomes):
        raise IndexError(f"the record has no outcome at {place}")
    return place
