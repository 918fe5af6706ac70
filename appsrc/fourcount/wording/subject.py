"""Of whom a patient's figures speak: the groups and the event, where carrying an effect turns them round."""

from __future__ import annotations

import msgspec

from fourcount.record.outcome import EffectOnly, Outcome, Pairs
from fourcount.wording import names

BECAME_CASES = "became cases"
DID_NOT = "did not"
PEOPLE_WHO = "people who {exposed}"
AMONG = "were among the “{cases}”"
NOT_AMONG = "were not"


def subject(outcome: Outcome) -> Outcome:
    """The outcome as a patient's words speak of it.

    A matched case-control study compares cases with controls by their exposure; carried to a patient, its odds ratio
    compares the exposed with the others by whether they become cases. An odds ratio is the same both ways.
    """
    if outcome.design != "matched" or not isinstance(outcome.table, Pairs | EffectOnly):
        return outcome
    by_case = (outcome.index_group == "first") == (outcome.counted == "left")
    exposed = msgspec.structs.replace(outcome, counted="left")
    with_, without = names.event_words(exposed), names.other_words(exposed)
    cases = names.label(msgspec.structs.replace(outcome, index_group="first"), "index")
    plain = cases.lower() in ("cases", "case")
    return msgspec.structs.replace(
        outcome,
        design="case-control",
        name_text="",
        first_label_text=PEOPLE_WHO.format(exposed=with_ if by_case else without),
        second_label_text=PEOPLE_WHO.format(exposed=without if by_case else with_),
        index_group="first",
        counted="left",
        left_heading_text="",
        right_heading_text="",
        left_words_text=BECAME_CASES if plain else AMONG.format(cases=cases),
        right_words_text=DID_NOT if plain else NOT_AMONG,
        left_welcome=False,
    )
