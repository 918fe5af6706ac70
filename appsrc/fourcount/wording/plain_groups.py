"""What both groups are called on a page for patients: as a head over their people, and inside a sentence."""

from __future__ import annotations

from fourcount.record.outcome import Outcome
from fourcount.wording import names
from fourcount.wording.names import Group

AMONG = "among {people}"

LONGEST = 240
"""Characters of a name on a page: more would leave no room for the people."""


def bounded(text: str) -> str:
    """A name as far as a page has room for it; that it goes on is seen."""
    return text if len(text) <= LONGEST else f"{text[:LONGEST].rstrip()}…"


def group_title(outcome: Outcome, group: Group) -> str:
    """ "With usual care" where people were given it; elsewhere the label alone, which may be any noun."""
    label = names.label(outcome, group)
    given = outcome.design in names.WITH_DESIGNS and not _are_people(label)
    return bounded(names.sentence_case(names.in_group(outcome, group) if given else label))


def group_phrase(outcome: Outcome, group: Group) -> str:
    """ "with night lights": the group at the head of a sentence, or at its end."""
    label = names.label_within(outcome, group)
    return bounded(AMONG.format(people=label) if _are_people(label) else names.in_group(outcome, group))


def _are_people(label: str) -> bool:
    return label.lower().startswith(names.PEOPLE)
