"""How many people each group has, where a sentence prints that apart from the counts."""

from __future__ import annotations

from collections.abc import Iterator, Sequence
from itertools import pairwise

import msgspec

from fourcount.record.entry.pasted.proportions import gives, may_be_of
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.pasted.vocabulary import COMPARATORS, NOT_COUNTED, PEOPLE, TIME_UNITS
from fourcount.record.entry.tokens import Token

_MOST = 12
_LONGEST_CLAUSE = 14
_OF_ALL = ("of", "among")
_STRONG_LEADS = frozenset(("of", "among", "assigned", "allocated", "randomised", "randomized", "enrolled", "analysed"))
_CLAUSE_WORDS = COMPARATORS | {"and", "but", "overall", "with"}
_LEADS = frozenset(("of", "among", "the", "assigned", "allocated", "randomised", "randomized", "and", "received"))


class Candidate(msgspec.Struct, frozen=True):
    """A whole number that may be a total; ``said`` where ``n =`` or a noun of people says so.

    ``led`` is one that opens a clause ("Of 412 patients with lamps, 38 fell"), ``strongly`` one that nobody would take
    for a count of events: "randomised 412", "of the 412", "n = 412".
    """

    place: int
    token: Token
    said: bool
    named: bool
    led: bool = False
    strongly: bool = False


def with_totals(
    tokens: Sequence[Token], first: Quantity, second: Quantity, taken: frozenset[int], end: int
) -> tuple[Quantity, Quantity, bool]:
    """Both quantities with totals as far as the text tells them, and whether only the percentages tell which.

    The places in which print puts totals are tried in order; one fits if no count is above it and every percentage is
    what the count gives.
    """
    found = _candidates(tokens, taken, (first, second))
    for totals, nearby in _ways(tokens, found, first, second, end):
        if first.events is None and totals[0] and not (totals[0].strongly or _of_each(tokens, totals[0].place)):
            continue
        if all(_fits(quantity, total) for quantity, total in zip((first, second), totals, strict=True)):
            one, two = (_given(quantity, total) for quantity, total in zip((first, second), totals, strict=True))
            return one, two, not nearby
    return first, second, False


def shared_total(tokens: Sequence[Token], first: Quantity, second: Quantity, taken: frozenset[int]) -> bool:
    """Whether both counts are printed as percentages of one and the same number: parts of one group."""
    if first.percent is None or second.percent is None or first.events is None or second.events is None:
        return False
    return any(
        _fits(first, candidate) and _fits(second, candidate)
        for candidate in _candidates(tokens, taken, (first, second))
    )


def _candidates(tokens: Sequence[Token], taken: frozenset[int], quantities: Sequence[Quantity]) -> list[Candidate]:
    inside = {place for quantity in quantities for place in range(quantity.first, quantity.after)}
    found = []
    for place, token in enumerate(tokens):
        if token.kind != "number" or not token.whole or token.percent or place in taken or place in inside:
            continue
        before = tokens[place - 1] if place else token
        behind = [each.lower for each in tokens[place + 1 : place + 4]]
        if behind and (behind[0] in TIME_UNITS or behind[0] in NOT_COUNTED or behind[0] in ("ci", "/")):
            continue
        if before.lower in NOT_COUNTED or before.text in ("/", "-", "<", ">") or before.lower == "aged":
            continue
        named = before.text == "=" or before.lower == "n"
        if 1900 <= token.whole < 2100 and len(token.text) == 4 and not (named or PEOPLE.intersection(behind)):
            continue
        said = named or bool(PEOPLE.intersection(behind)) or before.lower in _LEADS
        led = leads_clause(tokens, place)
        strongly = named or led or before.lower in _STRONG_LEADS
        strongly = strongly or (before.lower in ("the", "all") and place > 1 and tokens[place - 2].lower in _OF_ALL)
        found.append(Candidate(place, token, said, named, led, strongly))
    return found


def leads_clause(tokens: Sequence[Token], place: int) -> bool:
    """Whether a number is a total as in "Of 412 patients with lamps, ..." or "Of 88 treated and 90 untreated, ..."."""
    if _opens_clause(tokens, place):
        return _comma_behind(tokens, place)
    if not place or tokens[place - 1].lower != "and":
        return False
    for before in range(place - 2, max(-1, place - _LONGEST_CLAUSE), -1):
        if tokens[before].kind == "number":
            return _opens_clause(tokens, before) and _comma_behind(tokens, place)
        if tokens[before].kind == "mark" and tokens[before].text != "-":
            return False
    return False


def _opens_clause(tokens: Sequence[Token], place: int) -> bool:
    start = place - 1
    if start >= 0 and tokens[start].lower in ("the", "all", "these"):
        start -= 1
    if start < 0 or tokens[start].lower not in ("of", "among"):
        return False
    before = tokens[start - 1] if start else None
    return before is None or before.text in (".", ",", ";", ":") or before.lower in _CLAUSE_WORDS


def _comma_behind(tokens: Sequence[Token], place: int) -> bool:
    """Whether a comma ends the clause of a number, and a number follows soon behind it."""
    for step in range(place + 1, min(place + _LONGEST_CLAUSE, len(tokens) - 1)):
        token = tokens[step]
        if token.text == ",":
            return any(each.kind == "number" for each in tokens[step + 1 : step + 4])
        if token.text in (".", ";", ":") or (token.kind == "number" and tokens[step - 1].lower != "and"):
            return False
    return False


def _ways(
    tokens: Sequence[Token], found: Sequence[Candidate], first: Quantity, second: Quantity, end: int
) -> Iterator[tuple[tuple[Candidate | None, Candidate | None], bool]]:
    """Pairs of totals in the order in which they are believed, and whether they stand where totals usually do."""
    before = [each for each in found if each.place < first.first][-_MOST:]
    between = [each for each in found if first.after <= each.place < second.first][:_MOST]
    behind = [each for each in found if second.after <= each.place < end][:_MOST]
    after = [each for each in found if each.place >= second.after][:_MOST]
    near = (*behind, *before[::-1]) if first.events is not None else behind
    each_group = [each for each in near if _of_each(tokens, each.place, people=first.events is not None)]
    yield from (((each, each), each in behind) for each in each_group)
    own_first, own_second = first.total is not None, second.total is not None
    if own_first and own_second:
        yield (None, None), True
    for one in [None] if own_first else between:
        for two in [None] if own_second else behind:
            yield (one, two), True
    for one in [None] if own_first else before[::-1]:
        for two in [None] if own_second else between[::-1]:
            yield (one, two), one is None or one.place > first.first - 12
    if own_first or own_second:
        for one in after + before:
            yield ((None, one) if own_first else (one, None)), False
        return
    for group in (behind, before[::-1], after):
        yield from (
            (pair, group is behind or all(each.led for each in pair))
            for pair in _neighbours(group, backwards=group and group[0].place < first.first)
        )


def _of_each(tokens: Sequence[Token], place: int, *, people: bool = False) -> bool:
    """Whether a number is the total of both groups: "of 300 each"."""
    behind = [token.lower for token in tokens[place + 1 : place + 5]]
    behind = behind[1:] if people and behind[:1] and behind[0] in PEOPLE else behind
    return behind[:1] in (["each"], ["per"]) or behind[:2] in (["to", "each"], ["in", "each"])


def _neighbours(group: Sequence[Candidate], backwards: object) -> Iterator[tuple[Candidate, Candidate]]:
    for one, two in pairwise(group):
        yield (two, one) if backwards else (one, two)


def _fits(quantity: Quantity, total: Candidate | None) -> bool:
    if total is None:
        return quantity.total is not None
    if quantity.time is not None or quantity.low is not None:
        return False
    if quantity.events is None:
        return total.said and quantity.percent is not None and may_be_of(quantity.percent, total.token.whole or 0)
    if (quantity.events.whole or 0) > (total.token.whole or 0):
        return False
    if quantity.percent is None:
        return total.named or (total.led and total.place < quantity.first)
    return gives(quantity.percent, quantity.events.whole or 0, total.token.whole or 0)


def _given(quantity: Quantity, total: Candidate | None) -> Quantity:
    return quantity if total is None else msgspec.structs.replace(quantity, total=total.token)


def without_sums(quantities: Sequence[Quantity]) -> list[Quantity]:
    """The quantities without one that is the sum of the two behind or before it: that of both groups together."""
    for place, whole in enumerate(quantities):
        for others in (quantities[place + 1 : place + 3], quantities[max(0, place - 2) : place]):
            if len(others) == 2 and all(each.events and each.total for each in (whole, *others)):
                parts = [_wholes(each) for each in others]
                if _wholes(whole) == (parts[0][0] + parts[1][0], parts[0][1] + parts[1][1]):
                    return [each for each in quantities if each is not whole]
    return list(quantities)


def _wholes(quantity: Quantity) -> tuple[int, int]:
    return tuple(token.whole or 0 if token else 0 for token in (quantity.events, quantity.total))  # type: ignore[return-value]
