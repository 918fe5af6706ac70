"""What happens to people, said to a patient: the paper's past put into the present by a small, safe table.

"fell at least once" becomes "fall at least once", "was readmitted" becomes "are readmitted". Only verbs of the table
are turned; a phrase with any other verb in it stays as it was typed, since half of a sentence in each tense is worse
than a whole one in the past.
"""

from __future__ import annotations

import re

from fourcount.record.editing import count_other_outcome
from fourcount.record.outcome import Column, Outcome, PersonTime
from fourcount.wording import event_names, names

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

ALONE = (
    r"$|\w+ly\b|\d|(?:after|again|and|as|at|because|before|by|despite|during|for|from|in|on|once|or|over|since|soon"
    r"|sooner|to|twice|under|until|while|with|within|without)\b"
)
SOMETHING = r"(?:an?|any|at|both|more|no|one|some|the|their|two)\b|\d"
VERB_BEFORE = {
    **dict.fromkeys(("bled", "fainted", "healed", "relapsed", "survived", "worsened"), ALONE),
    **dict.fromkeys(("broke", "fractured", "missed"), SOMETHING),
    "left": r"(?:care|early|home|hospital|school|the|their|work)\b",
    "lost": r"(?!to\b)",
    "used": r"(?!to\b)",
}
"""What follows these words where they are verbs: "left the trial", not "left leg ulcer" nor "lost to follow-up"."""

BASES = frozenset(word for word in PRESENT.values() if word != "are")
DID_NOT = re.compile(r"^(?:did not|didn['’]t)\b(?P<rest>.*)$", re.IGNORECASE | re.DOTALL)
STAYS_AFTER_HAD = re.compile(r"^(?:been|not|never|already|gone|done|\w+(?:ed|en))\b", re.IGNORECASE)
"""After these "had" is half of another tense and no verb of its own."""

JOINED = re.compile(r"(\s+(?:and|or|and/or|but)\s+|,\s+(?:and\s+|or\s+)?)", re.IGNORECASE)
PAST = re.compile(r"^\w+ed$", re.IGNORECASE)


def present(words: str) -> str:
    """The phrase as it is said of people now; one that the table does not hold stays as typed."""
    return _turned(words) or words


def _turned(words: str) -> str | None:
    """The phrase in the present; None where the table does not hold all of its verbs."""
    if match := DID_NOT.match(words):
        return f"do not{match['rest']}"
    parts = JOINED.split(words)
    first = _verb(parts[0])
    if first is None:
        return None
    turned = [first]
    for joint, part in zip(parts[1::2], parts[2::2], strict=True):
        said = _verb(part)
        if said is None and PAST.match(part.split(" ", 1)[0]):
            return None  # a past that is not in the table: readers get one tense, the one typed
        turned += [joint, said or part]
    return "".join(turned)


def _verb(part: str) -> str | None:
    """One part of a phrase with its leading verb in the present; None where the table does not hold it."""
    verb, _, rest = part.partition(" ")
    verb = verb.lower()
    now = PRESENT.get(verb)
    if now is None or (verb == "had" and STAYS_AFTER_HAD.match(rest)):
        return None
    if verb in VERB_BEFORE and not re.match(VERB_BEFORE[verb], rest, re.IGNORECASE):
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


NEGATIVE = re.compile(
    r"^(?:(?:do|did|are|were|was|have|had|can|could) (?:not|no|never)|never|not)\b|^\w+n['’]t\b", re.IGNORECASE
)


def is_negative(said: str) -> bool:
    """Whether a phrase says what people lack, so that fewer of it would be a double negative."""
    return NEGATIVE.match(said) is not None


def plain_hint(outcome: Outcome, column: Column) -> str:
    """What is said of people of this column where the reader types nothing plainer; "" where it has no name."""
    hint = _hint(outcome, column)
    return hint if column == unwelcome_column(outcome) else _short(hint, plain_said(outcome, _beside(column)))


def plain_said(outcome: Outcome, column: Column) -> str:
    """What is said of people of this column: in the reader's plain words, else in the present; "" if unknown."""
    said = _typed(outcome, column) or _hint(outcome, column)
    if column == unwelcome_column(outcome):
        return said
    return _short(said, plain_said(outcome, _beside(column)))


def _hint(outcome: Outcome, column: Column) -> str:
    """A column's name in the present, else the lack of the other one's."""
    if column == "right" and isinstance(outcome.table, PersonTime):  # which has events and no other column
        typed = outcome.right_words_text.strip() or outcome.right_heading_text.strip()
        return present(names.other_words(outcome)) if typed else negated(_hint(outcome, "left"))
    viewed = outcome if outcome.counts_left == (column == "left") else count_other_outcome(outcome)
    if viewed.event_words_text.strip() or viewed.event_heading_text.strip():
        return _named(viewed)
    if viewed.other_words_text.strip() or viewed.other_heading_text.strip():
        return negated(_named(count_other_outcome(viewed)))
    return ""


def _named(outcome: Outcome) -> str:
    """The counted column in the present; a heading alone that is a verb is said as one, and not as a name."""
    heading = event_names.without_unit(names.bare(outcome.event_heading_text))
    said = None if outcome.event_words_text.strip() else _turned(heading)
    return said or present(names.event_words(outcome))


def _short(other: str, event: str) -> str:
    """The other frame without saying the event again: "do not", "are not"."""
    if other and other == negated(event) and is_negative(other):
        return " ".join(other.split(" ", 2)[:2])
    return other


def _typed(outcome: Outcome, column: Column) -> str:
    return names.bare(outcome.plain_event_text if column == "left" else outcome.plain_other_text)


def _beside(column: Column) -> Column:
    return "right" if column == "left" else "left"


def unwelcome_column(outcome: Outcome) -> Column:
    """The column that is counted on every page for patients: the unwelcome one, so that pictures compare."""
    return "right" if outcome.left_welcome else "left"


def says_the_other(outcome: Outcome, event: str, other: str) -> bool:
    """Whether the difference is said of the people who are not drawn as affected: the side that is said positively.

    "15 more heal" and not "15 fewer do not heal"; where both sides can be said, the welcome one of a welcome outcome.
    """
    if is_negative(event) != is_negative(other):
        return is_negative(event)
    return outcome.left_welcome


def is_turned(outcome: Outcome) -> bool:
    """Whether a page counts the other column than the record does: risks are then turned to their complements."""
    return outcome.welcome
