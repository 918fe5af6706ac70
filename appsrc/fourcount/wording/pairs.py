"""The two sides of pairs as sentences name them: cases and controls, the same people twice, or two groups."""

from __future__ import annotations

from fourcount.appraisal.discordant import pairs_that_differ
from fourcount.record.outcome import Outcome
from fourcount.wording import names

__all__ = ["only", "pairs_that_differ", "people_in", "person", "those_of", "who_differ"]

ONE_OF = {"case": "the case", "cases": "the case", "control": "the control", "controls": "the control"}


def person(outcome: Outcome, group: names.Group) -> str:
    """One side of a pair as somebody: "the case", or "the person with night lights"."""
    return _one_of(outcome, group) or f"the person {names.in_group(outcome, group)}"


def those_of(outcome: Outcome, group: names.Group) -> str:
    """Whose odds they are, behind "those": "of the control", or "with usual care"."""
    one = _one_of(outcome, group)
    return f"of {one}" if one else names.in_group(outcome, group)


def only(outcome: Outcome, group: names.Group) -> str:
    """One side alone, behind "only": "the case", "after", "with night lights"."""
    return _one_of(outcome, group) or names.in_group(outcome, group)


def who_differ(outcome: Outcome, number: int) -> str:
    """What the pairs that differ are called: of the same people before and after, those who changed."""
    if outcome.design == "before-after":
        return "person who changed" if number == 1 else "people who changed"
    return "pair that differs" if number == 1 else "pairs that differ"


def people_in(outcome: Outcome, group: names.Group, event: str) -> str:
    """People of one side with the event, in the order that reads: "had the event before", "with care had the event"."""
    where = names.in_group(outcome, group)
    return f"{event} {where}" if names.by_time(outcome) else f"{where} {event}"


def _one_of(outcome: Outcome, group: names.Group) -> str:
    """``the case``; "" where this is no matched study, or the side has a name of its own."""
    return ONE_OF.get(names.label(outcome, group).lower(), "") if outcome.design == "matched" else ""
