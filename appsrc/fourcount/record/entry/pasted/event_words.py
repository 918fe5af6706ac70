"""What a sentence says was counted."""

from __future__ import annotations

from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.pasted.vocabulary import (
    ARTICLES,
    BE,
    COMPARATORS,
    DETERMINERS,
    HAPPENED,
    INTRODUCERS,
    PEOPLE,
    SPAN_WORDS,
    TIME_UNITS,
    VERBS,
)
from fourcount.record.entry.tokens import Print

_MOST_WORDS = 10
_SAY_IT = frozenset(("healed", "resolved", "recurred", "failed", "persisted", "returned"))
_CHANGED = frozenset(("fell", "dropped", "improved"))
_TRAILING = frozenset(("in", "the", "at", "by", "within", "with", "after", "out", "of", "for", "a", "to"))
_AFTER_NOUNS = INTRODUCERS | HAPPENED | BE | {"of", "per", "out", "over", "during", "occurred"}
_NO_EVENT = frozenset(("was", "were", "is", "are", "been", "had", "has", "have", "received", "of", "did"))


def event_words(printed: Print, first: Quantity, second: Quantity, start: int, end: int) -> str:
    """The event in words: what stands before the first count ("falls occurred in") or the verb behind a count."""
    said = _before(printed, start, first.first) or _counted_noun(printed, first)
    said = said or _behind(printed, second.after, end) or _behind(printed, first.after, second.first)
    said = " ".join(said.split()).strip(" ,;:.")
    return said[0].lower() + said[1:] if len(said) > 1 and said[1].islower() else said


def time_span(printed: Print, start: int, end: int) -> str:
    """The time in "at 12 weeks" or "within 6 months", "" where no sentence says one."""
    tokens = printed.tokens
    for place in range(start, end - 2):
        number = place + 1 if tokens[place + 1].kind == "number" else place + 2
        if number + 1 >= end or tokens[place].lower not in SPAN_WORDS or tokens[number].kind != "number":
            continue
        if number == place + 2 and tokens[place + 1].lower not in ("the", "first", "about", "a"):
            continue
        unit = tokens[number + 1]
        hyphen = unit.text == "-" and number + 2 < end and tokens[number + 2].lower in TIME_UNITS
        if hyphen or unit.lower in TIME_UNITS:
            return printed.piece(number, number + (3 if hyphen else 2)).rstrip(".")
    return ""


def _before(printed: Print, start: int, end: int) -> str:
    """The subject before "occurred in", "was reported by" or a colon."""
    tokens = printed.tokens
    start = _past_opening(printed, start, end)
    for place in range(start, end):
        token = tokens[place]
        if token.text == ":" or token.lower in HAPPENED | _CHANGED or (token.lower in BE and place > start):
            subject = _subject(printed, start, place)
            if subject:
                verb = next((each.text for each in tokens[place : min(place + 3, end)] if each.lower in _SAY_IT), "")
                return f"{subject} {verb}".strip()
            if token.text != ":":
                return ""
        if token.kind == "number" or token.lower in COMPARATORS:
            return ""
    return ""


def _past_opening(printed: Print, start: int, end: int) -> int:
    """The place behind an opening such as "At 12 weeks," or "In the whole study,"."""
    tokens = printed.tokens
    if start < end and tokens[start].lower in SPAN_WORDS | {"there", "overall"}:
        for place in range(start, min(start + 8, end)):
            if tokens[place].text == ",":
                return place + 1
    return start


def _subject(printed: Print, start: int, after: int) -> str:
    tokens = printed.tokens
    while start < after and (tokens[start].lower in ARTICLES or tokens[start].text in (",", "(")):
        start += 1
    lower = [token.lower for token in tokens[start:after]]
    if (
        len(lower) > 3
        and "of" in lower[:4]
        and {"rate", "rates", "incidence", "proportion", "risk", "frequency"} & set(lower[:3])
    ):
        start += lower.index("of") + 1
    words = [token for token in tokens[start:after] if token.kind == "word"]
    while after > start and tokens[after - 1].lower in BE | {"also", "more", "less", "often", "frequently"}:
        after -= 1
    plain = (
        words
        and len(words) <= _MOST_WORDS
        and words[0].lower not in INTRODUCERS | DETERMINERS | {"there", "of", "we", "they", "it", "this", "these"}
    )
    if not plain or words[0].lower in PEOPLE | {"group", "overall"}:
        return ""
    return printed.piece(start, after)


def _counted_noun(printed: Print, quantity: Quantity) -> str:
    """The noun in "38 falls in 4,120 person-years"."""
    tokens = printed.tokens
    place = quantity.first + 1
    start = place
    while place < quantity.after and tokens[place].kind == "word" and tokens[place].lower not in _AFTER_NOUNS:
        place += 1
    noun = printed.piece(start, place)
    told = quantity.time is not None or (quantity.events is not None and quantity.events.lower == "no")
    return noun if noun and told and tokens[place - 1].lower not in PEOPLE else ""


def _behind(printed: Print, start: int, end: int) -> str:
    """The verb and what belongs to it in "... with night lights died"."""
    tokens = printed.tokens
    for place in range(start, end):
        token = tokens[place]
        if token.text in (".", ";"):
            return ""
        if (token.lower in VERBS and token.lower not in _NO_EVENT) or (token.lower == "had" and place + 1 < end):
            after = place + 1
            while after < end and after - place < _MOST_WORDS and tokens[after].kind == "word":
                if (
                    tokens[after].lower in COMPARATORS
                    or tokens[after - 1].text.endswith(".")
                    or tokens[after].lower == "and"
                ):
                    break
                after += 1
            while after > place + 1 and tokens[after - 1].lower in _TRAILING:
                after -= 1
            return printed.piece(place, after)
    return ""
