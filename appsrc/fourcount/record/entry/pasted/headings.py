"""What the heading of a column, or the label of a row, says that its numbers are."""

from __future__ import annotations

import re
from typing import Literal

from fourcount.record.entry.pasted.vocabulary import PEOPLE, time_of_people
from fourcount.record.entry.word_list import words

Role = Literal["events", "total", "others", "percent", "time", "rate", "result", "p", "unknown"]

_WORD = re.compile(r"[^\W_]+(?:['-][^\W_]+)*|[%+\u2713]|(?<!\w)-(?!\w)")
_TOTAL = frozenset(
    words(
        "total totals n number all randomised randomized denominator size sample enrolled overall analysed analyzed treated assigned allocated tested"
    )
)
_OTHERS = frozenset(
    words(
        "no not non without survived survivors survivor alive negative absent absence unaffected event-free well none nonevents non-events non-event never - failure-free remaining others living uninfected stable"
    )
)
_EVENTS = frozenset(words("events event yes with cases died deaths dead positive present affected + responders"))
_PERCENT = frozenset(words("% percent percentage risk proportion share prevalence"))
_RESULT = frozenset(
    words("rr or hr irr rd ratio difference ci effect relative estimate confidence odds hazard arr nnt aor ahr arr")
)
_EXPOSURES = frozenset(
    words("exposed unexposed non-exposed nonexposed vaccinated unvaccinated untreated smokers non-smokers nonsmokers")
)
_SUMS = frozenset(words("total totals all overall both sum combined"))
_POSITIVE = frozenset(words("yes positive + present exposed pos improved better event"))
_NEGATIVE = frozenset(words("no negative - absent unexposed neg not non-exposed nonexposed without unimproved never"))


def role_of(text: str) -> Role:
    """The role that a heading tells, "unknown" where it is a name of something."""
    found = heading_words(text)
    if not found:
        return "unknown"
    said = set(found)
    if said & _EXPOSURES:
        return "unknown"
    if "p" in said and said <= {"p", "value", "values", "for"} or "p-value" in said:
        return "p"
    if any(time_of_people(one, two) for one, two in zip(found, [*found[1:], ""], strict=True)):
        return "rate" if {"per", "rate"} & said else "time"
    if {"follow-up", "time"} & said and {"years", "months", "days"} & said:
        return "time"
    if (
        _RESULT & said
        and not (said & {"without", "not"})
        and (len(said & _RESULT) > 1 or found[0] in _RESULT or "ratio" in said)
    ):
        return "result" if text.strip() != "or" else "unknown"
    if "rate" in said or "per" in said:
        return "rate"
    if "%" in said:
        return "events" if said & {"n", "no", "number", "events"} else "percent"
    if {"n", "no", "number"} & said and {"with", "events", "affected", "event", "died"} & said:
        return "events"
    if said <= {"n", "no", "number"} | {"of"} | PEOPLE or (
        found[0] in _TOTAL and len(found) <= 3 and not said & _EVENTS
    ):
        return "total" if not said == {"no"} else "others"
    if _OTHERS & said:
        return "others"
    if _PERCENT & said:
        return "percent"
    return "events" if _EVENTS & said else "unknown"


def heading_words(text: str) -> list[str]:
    """The words of a heading in small letters."""
    return [word.casefold() for word in _WORD.findall(text.replace("n/N", "n").replace("n (%)", "n %"))]


def is_sum(text: str) -> bool:
    """Whether a row or column is headed as that of both groups together."""
    found = heading_words(text)
    people = {"n", "patients", "participants", "people", "groups", "number"}
    return bool(found) and found[0] in _SUMS and set(found[1:]) <= people | _SUMS


def sign_of(text: str) -> int:
    """1 for "yes" and "exposed", -1 for "no" and "not exposed", 0 for anything else."""
    said = set(heading_words(text))
    return -1 if said & _NEGATIVE else int(bool(said & _POSITIVE))


def stem_of(text: str) -> str:
    """A heading without what makes it a yes or a no, to see whether two headings are of one thing."""
    return " ".join(
        word.removeprefix("un").removeprefix("non-")
        for word in heading_words(text)
        if word not in _POSITIVE | _NEGATIVE - {"unexposed"}
    )
