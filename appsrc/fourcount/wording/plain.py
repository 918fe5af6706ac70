"""What happens to people, said to a patient: the paper's past put into the present by a small, safe table.

"fell at least once" becomes "fall at least once", "was readmitted" becomes "are readmitted". Only verbs of the table
are turned; a phrase with any other verb in it stays as it was typed, since half of a sentence in each tense is worse
than a whole one in the past.
"""

from __future__ import annotations

import re

from fourcount.record.editing import count_other_outcome
from fourcount.record.outcome import Column, Outcome, PersonTime
from fourcount.wording import names

PRESENT = {
    "became": "become", "bled": "bleed", "broke": "break", "carried": "carry", "caught": "catch", "coughed": "cough",
    "delivered": "deliver", "developed": "develop", "died": "die", "drank": "drink", "experienced": "experience",
    "failed": "fail", "fainted": "faint", "felt": "feel", "fell": "fall", "finished": "finish", "fractured": "fracture",
    "gained": "gain", "gave": "give", "got": "get", "had": "have", "healed": "heal", "improved": "improve",
    "kept": "keep", "left": "leave", "lived": "live", "lost": "lose", "missed": "miss", "moved": "move",
    "needed": "need", "quit": "quit", "reached": "reach", "recovered": "recover", "relapsed": "relapse",
    "reported": "report", "required": "need", "responded": "respond", "returned": "return", "saw": "see",
    "slept": "sleep", "smoked": "smoke", "stayed": "stay", "stopped": "stop", "suffered": "suffer",
    "survived": "survive", "switched": "switch", "took": "take", "used": "use", "vomited": "vomit", "walked": "walk",
    "was": "are", "went": "go", "were": "are", "withdrew": "withdraw", "woke": "wake", "worsened": "get worse",
}  # fmt: skip
"""Verbs that studies count people by, and what is said of people now."""

BASES = frozenset(word for word in PRESENT.values() if word != "are")
DID_NOT = re.compile(r"^(?:did not|didn['’]t)\b(?P<rest>.*)$", re.IGNORECASE | re.DOTALL)
STAYS_AFTER_HAD = re.compile(r"^(?:been|not|never|already|gone|done|\w+(?:ed|en))\b", re.IGNORECASE)
"""After these "had" is half of another tense and no verb of its own."""

JOINED = re.compile(r"(\s+(?:and|or|and/or|but)\s+|,\s+(?:and\s+|or\s+)?)", re.IGNORECASE)
PAST = re.compile(r"^\w+ed$", re.IGNORECASE)


def present(words: str) -> str:
    """The phrase as it is said of people now; one that the table does not hold stays as typed."""
    if match := DID_NOT.match(words):
        return f"do not{match['rest']}"
    parts = JOINED.split(words)
    first = _verb(parts[0])
    if first is None:
        return words
    turned = [first]
    for joint, part in zip(parts[1::2], parts[2::2], strict=True):
        said = _verb(part)
        if said is None and PAST.match(part.split(" ", 1)[0]):
            return words  # a past that is not in the table: readers get one tense, the one typed
        turned += [joint, said or part]
    return "".join(turned)


def _verb(part: str) -> str | None:
    """One part of a phrase with its leading verb in the present; None where the table does not hold it."""
    verb, _, rest = part.partition(" ")
    now = PRESENT.get(verb.lower())
    if now is None or (verb.lower() == "had" and STAYS_AFTER_HAD.match(rest)):
        return None
    return f"{now} {rest}".rstrip()


def negated(said: str) -> str:
    """The lack of what ``present`` gave: "do not fall", "are not readmitted"; "" where that is not plain."""
    if said.startswith("do not "):
        return said.removeprefix("do not ")
    if len(JOINED.split(said)) > 1:
        return ""
    if said.startswith("are "):
        return f"are not {said.removeprefix('are ')}"
    if said.startswith("have no "):
        return f"have {said.removeprefix('have no ')}"
    return f"do not {said}" if said.split(" ", 1)[0] in BASES else ""


def plain_hint(outcome: Outcome, column: Column) -> str:
    """What is said of people of this column where the reader types nothing plainer; "" where it has no name."""
    if column == "right" and isinstance(outcome.table, PersonTime):  # which has events and no other column
        typed = outcome.right_words_text.strip() or outcome.right_heading_text.strip()
        return present(names.other_words(outcome)) if typed else negated(plain_hint(outcome, "left"))
    viewed = outcome if outcome.counts_left == (column == "left") else count_other_outcome(outcome)
    if viewed.event_words_text.strip() or viewed.event_heading_text.strip():
        return present(names.event_words(viewed))
    if viewed.other_words_text.strip() or viewed.other_heading_text.strip():
        return negated(present(names.other_words(viewed)))
    return ""


def plain_said(outcome: Outcome, column: Column) -> str:
    """What is said of people of this column: in the reader's plain words, else in the present; "" if unknown."""
    typed = outcome.plain_event_text if column == "left" else outcome.plain_other_text
    return names.bare(typed) or plain_hint(outcome, column)


def unwelcome_column(outcome: Outcome) -> Column:
    """The column that is counted on every page for patients: the unwelcome one, so that pictures compare."""
    return "right" if outcome.left_welcome else "left"


def is_turned(outcome: Outcome) -> bool:
    """Whether a page counts the other column than the record does: risks are then turned to their complements."""
    return outcome.welcome
