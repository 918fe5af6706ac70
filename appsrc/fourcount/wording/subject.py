"""Of whom a patient's figures speak: the groups and the event, where carrying an effect turns them round."""

from __future__ import annotations

import re

import msgspec

from fourcount.record.outcome import EffectOnly, Outcome, Pairs
from fourcount.wording import event_names, names

BECAME_CASES = "became cases"
DID_NOT = "did not"
PEOPLE_WHO = "people who {exposed}"
UNNAMED = tuple(PEOPLE_WHO.format(exposed=exposed) for exposed in ("were exposed", "were not exposed"))
"""Groups of which nobody has said what they had."""

CASES = re.compile(r"^cases? (?:of|with) |[\s,:(]*\bcases?\b[\s)]*$", re.IGNORECASE)
WAS = re.compile(r"^was\b")


def subject(outcome: Outcome) -> Outcome:
    """The outcome as a patient's words speak of it.

    A matched case-control study compares cases with controls by their exposure; carried to a patient, its odds ratio
    compares the exposed with the others by whether they become cases. An odds ratio is the same both ways.
    """
    if outcome.design != "matched" or not isinstance(outcome.table, Pairs | EffectOnly):
        return outcome
    by_case = (outcome.index_group == "first") == (outcome.counted == "left")
    exposed = msgspec.structs.replace(outcome, counted="left")
    had, lacked = names.event_words(exposed), names.other_words(exposed)
    with_, without = _people(had), _people(WAS.sub("was not", had) if lacked == DID_NOT and WAS.match(had) else lacked)
    return msgspec.structs.replace(
        outcome,
        name_text="",
        design="case-control",
        first_label_text=with_ if by_case else without,
        second_label_text=without if by_case else with_,
        index_group="first",
        counted="left",
        left_heading_text="",
        right_heading_text="",
        left_words_text=_became(names.label(msgspec.structs.replace(outcome, index_group="first"), "index")),
        right_words_text=DID_NOT,
        left_welcome=False,
    )


def _people(exposed: str) -> str:
    """``people who took NSAIDs``; of several people "was exposed" is "were exposed"."""
    return PEOPLE_WHO.format(exposed=WAS.sub("were", exposed))


def _became(label: str) -> str:
    """What happened to the cases, by what they are called: "hip fractures" is "had hip fractures"."""
    event = CASES.sub("", label)
    if not event:
        return BECAME_CASES
    return event_names.of_people(event) or names.NAMED_EVENT.format(heading=names.mid_sentence(event))
