"""What the heading of a column, or the label of a row, says that its numbers are."""

from __future__ import annotations

import re
from collections.abc import Callable
from itertools import pairwise
from typing import Literal

from fourcount.record.entry.pasted.vocabulary import PEOPLE, time_of_people
from fourcount.record.entry.word_list import words

Role = Literal["events", "total", "others", "percent", "time", "rate", "result", "p", "unknown"]

_WORD = re.compile(r"[^\W_]+(?:['-][^\W_]+)*|[%+\u2713]|(?<!\w)-(?!\w)")
_NUMBER_SHORT = re.compile(r"\b[Nn]os?\.")
_MEASURED = re.compile(
    r"\b(mean|median|average|sd|iqr|scores?|bmi|systolic|diastolic|pulse|ph|pco2|po2|temperature)\b|^age$",
    re.IGNORECASE,
)
_UNIT_BEHIND = re.compile(
    r"(?:[,(\[] ?| [-\u2013] )(years?|yrs?|months?|weeks?|days?|hours?|h|minutes?|min|kg|g|cm|mm|mm ?hg|kg/m.*|mg.*"
    r"|mmol.*|points?|units?|litres?|ml)[)\]]?$",
    re.IGNORECASE,
)
_TIME = re.compile(
    r"(at |after |before |by )?(baseline|follow-up|before|after|first visit|second visit|start|end"
    r"|(week|month|day|year|visit|hour)s? [0-9]+|[0-9]+ ?(weeks?|months?|days?|years?|hours?))( of .*)?"
    r"|january|february|march|april|may|june|july|august|september|october|november|december"
    r"|(pre|post)-?(test|treatment|intervention|op|operative)?|(before|after) .*",
    re.IGNORECASE,
)
_TOTAL = frozenset(
    words(
        "total totals n number all randomised randomized denominator size sample enrolled overall analysed analyzed "
        "treated assigned allocated tested assessed evaluated examined eligible included followed"
    )
)
_OTHERS = frozenset(
    words(
        "no not non without survived survivors survivor alive negative absent absence unaffected event-free well none "
        "nonevents non-events non-event never - failure-free remaining others living uninfected stable healthy "
        "relapse-free disease-free non-responders nonresponders non-cases noncases"
    )
)
_EVENTS = frozenset(
    words("events event yes with cases died deaths dead positive present affected responders diseased ill sick +")
)
_PERCENT = frozenset(words("% percent percentage risk proportion share prevalence"))
_RESULT = frozenset(
    words("rr or hr irr rd ratio difference ci effect relative estimate confidence odds hazard arr nnt aor ahr arr")
)
_EXPOSURES = frozenset(
    words("exposed unexposed non-exposed nonexposed vaccinated unvaccinated untreated smokers non-smokers nonsmokers")
)
_OTHER_P = frozenset(words("interaction trend heterogeneity"))
SEXES = frozenset(words("men women man woman boys girls boy girl males females male female"))
"""Words that name groups or strata as well as whom was counted."""
_SUMS = frozenset(words("total totals all overall both sum combined"))
_POSITIVE = frozenset(words("yes positive + present exposed pos improved better event"))
_NEGATIVE = frozenset(words("no negative - absent unexposed neg not non-exposed nonexposed without unimproved never"))


def role_of(text: str) -> Role:
    """The role that a heading tells, "unknown" where it is a name of something."""
    found = heading_words(text)
    said = set(found)
    if not said or said & _EXPOSURES:
        return "unknown"
    for role, holds in _RULES:
        if holds(found, said):
            return role
    return "unknown"


def _is_p(_: list[str], said: set[str]) -> bool:
    if "p" in said and said & _OTHER_P:
        return True
    return ("p" in said and said <= {"p", "value", "values", "for"}) or "p-value" in said


def _is_rate_of_time(found: list[str], said: set[str]) -> bool:
    return _has_time(found, said) and bool({"per", "rate"} & said)


def _has_time(found: list[str], said: set[str]) -> bool:
    if {"follow-up", "time"} & said and {"years", "months", "days"} & said:
        return True
    return any(time_of_people(one, two) for one, two in zip(found, [*found[1:], ""], strict=True))


def _is_result(found: list[str], said: set[str]) -> bool:
    if not _RESULT & said or said & {"without", "not"}:
        return False
    return len(said & _RESULT) > 1 or found[0] in _RESULT or bool({"ratio", "difference"} & said)


def _is_rate(_: list[str], said: set[str]) -> bool:
    return ("rate" in said or "per" in said) and "%" not in said


def _is_counted_percent(_: list[str], said: set[str]) -> bool:
    counts = {"n", "number", "events"} & said or ("no" in said and {"%", "of", "with"} & said)
    return bool(counts) and bool({"%", "with", "events", "affected", "event", "died"} & said) and "without" not in said


def _is_total(found: list[str], said: set[str]) -> bool:
    if said == {"no"}:
        return False
    numbered = {"n", "number", "of", "the", "in"}
    if said <= SEXES:
        return False
    people = numbered | {"no", "group"} | PEOPLE - {"cases", "controls", "survivors", "survivor"}
    if said <= people or {"at", "risk"} <= said:
        return True
    whole = bool(said & _TOTAL - numbered) if found[0] in numbered else found[0] in _TOTAL
    return whole and len(found) <= 4 and not said & _EVENTS


_RULES: tuple[tuple[Role, Callable[[list[str], set[str]], bool]], ...] = (
    ("p", _is_p),
    ("rate", _is_rate_of_time),
    ("time", _has_time),
    ("result", _is_result),
    ("rate", _is_rate),
    ("events", _is_counted_percent),
    ("percent", lambda _, said: "%" in said),
    ("total", _is_total),
    ("events", lambda found, said: found[0] in ("n", "number") and not _OTHERS & said - {"n", "number"}),
    ("others", lambda _, said: bool(_OTHERS & said)),
    ("percent", lambda _, said: bool(_PERCENT & said)),
    ("events", lambda _, said: bool(_EVENTS & said)),
)
"""What a heading has to hold for each role; the first rule that holds decides."""


def time_unit(text: str) -> str:
    """The unit of person-time in a heading such as "events/person-years", "" where it names none."""
    found = heading_words(text)
    if "per" in found[:-1] and found[found.index("per") + 1][:1].isdigit():
        return ""
    for one, two in pairwise([*found, ""]):
        if length := time_of_people(one, two):
            return one if length == 1 else f"{one} {two}"
    return ""


def is_measure(text: str) -> bool:
    """Whether a label is of something measured ("Age, years", "Pain score"), whose numbers are no counts."""
    if {"n", "no", "%", "number"} & set(heading_words(text)) or role_of(text) in ("time", "rate"):
        return False
    return bool(_MEASURED.search(text) or _UNIT_BEHIND.search(text))


def is_time(text: str) -> bool:
    """Whether a label is a point of time ("Baseline", "Week 12", "after 6 months")."""
    return bool(_TIME.fullmatch(text.strip(" :,.")))


def heading_words(text: str) -> list[str]:
    """The words of a heading in small letters; "No." is a number, "no" is not."""
    text = _NUMBER_SHORT.sub("number", text)
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
