"""One cell of a pasted block: a label, a count, a percentage, a result, or nothing."""

from __future__ import annotations

from collections.abc import Sequence

import msgspec

from fourcount.record.entry.figure_names import name_at
from fourcount.record.entry.pasted.quantities import CLOSING, OPENING, Phrases, Quantity
from fourcount.record.entry.pasted.vocabulary import PEOPLE, time_of_people
from fourcount.record.entry.tokens import Print, Token, as_sentence, take_apart, with_totals_joined

_LEAST_TOTAL = 10
_P_WORDS = ("p", "p-value")
_MOST_TOKENS = 150
_BLANKS = frozenset(("-", "--", "---", "\u00b7", "...", "..", ".", "na", "n/a", "nr", "ns", "none", "reference", "ref"))
_EVENT_NOUNS = frozenset(("events", "event", "deaths", "falls", "infections", "outcomes", "episodes", "with", "event"))
_NOT_A_LABEL = frozenset(("of", "out", "in", "per", "to", "n", "p", "ci", "and", "or", "percent", "the"))


class Cell(msgspec.Struct, frozen=True, kw_only=True):
    """What stands in one cell. ``total`` is from "(n = 412)"; ``result`` is a printed effect or p as text.

    ``limits`` says that the result is two limits alone; ``risk`` is the result as a percentage with its limits, where
    it may be one, ``counted`` a number with decimals before a count in brackets, if it is the percentage of that.
    """

    text: str = ""
    label: str = ""
    total: Token | None = None
    quantity: Quantity | None = None
    decimal: Token | None = None
    result: str = ""
    limits: bool = False
    risk: Quantity | None = None
    counted: Quantity | None = None

    @property
    def filled(self) -> bool:
        """Whether it holds a number of the table's body."""
        return self.quantity is not None or self.decimal is not None or bool(self.result)

    @property
    def empty(self) -> bool:
        return not (self.label or self.filled or self.total)

    @property
    def count(self) -> Token | None:
        """A whole number with nothing but a percentage beside it."""
        amount = self.amount
        return amount if amount and amount.whole is not None else None

    @property
    def amount(self) -> Token | None:
        """A count, or person-time, which may have decimals."""
        quantity = self.quantity
        return quantity.events if quantity and not quantity.complete else None

    @property
    def percent(self) -> Token | None:
        """A percentage that stands alone, or a number with decimals that may be one."""
        if self.quantity and self.quantity.events is None and not self.quantity.complete:
            return self.quantity.percent
        return self.decimal if self.decimal and 0 <= self.decimal.value <= 100 else None


def delimited_cell(text: str) -> list[Cell]:
    """The cells in what stands between two borders: mostly one; several where spaces part numbers within it."""
    text = text.strip(" \u00a0\t\"'*")
    printed = with_totals_joined(take_apart(text))
    tokens = printed.tokens
    if not tokens or text.casefold().strip() in _BLANKS or not any(_tells(token) for token in tokens):
        return [Cell(text=text)]
    numbers = sum(token.kind == "number" for token in tokens)
    if len(tokens) == numbers == 1 and tokens[0].whole is not None and not tokens[0].percent:
        return [Cell(text=tokens[0].text, quantity=Phrases(tokens, bare=True).quantity_at(0))]
    compound = len(tokens) > 2 and tokens[1].text == "-" and tokens[2].kind == "word"
    named = compound or (tokens[0].kind == "word" and (tokens[0].lower not in ("n", "p") or not numbers))
    bound = tokens[0].text in ("<", ">") and any(token.value > 1 for token in tokens)
    if bound or not numbers or (named and not _value_behind_colon(tokens)):
        return [_label(printed, 0, len(tokens))]
    if tokens[0].whole is not None and numbers == 1 and tokens[1:] and _counted_noun(tokens[1:]):
        return [Cell(text=text, quantity=Quantity(first=0, after=1, events=tokens[0]))]
    joined = _cells(as_sentence(printed))
    return joined if sum(cell.count is not None for cell in joined) < 2 else _cells(printed)


def _counted_noun(tokens: Sequence[Token]) -> bool:
    """Whether only words such as "events" or "patients" stand behind a number."""
    return all(token.lower in PEOPLE | _EVENT_NOUNS for token in tokens)


def _tells(token: Token) -> bool:
    return token.kind != "mark" or token.text in ("%", "+", "\u2713")


def _value_behind_colon(tokens: Sequence[Token]) -> bool:
    places = [place for place, token in enumerate(tokens[:-1]) if token.text == ":"]
    return any(tokens[place + 1].kind == "number" for place in places)


def row_cells(text: str) -> list[Cell]:
    """The cells of a line without borders: its label, then each number with what belongs to it."""
    return _cells(with_totals_joined(take_apart(text)))


def _cells(printed: Print) -> list[Cell]:
    printed = Print(printed.shown, printed.tokens[:_MOST_TOKENS])
    tokens = printed.tokens
    phrases = Phrases(tokens, bare=True)
    whole = phrases.quantity_at(0) if tokens else None
    start = 0 if whole and whole.complete else min(_body(tokens), _first_whole(phrases))
    found = _labels(printed, start) if start else []
    place = start
    while place < len(tokens):
        cell, after = _cell_at(printed, phrases, place)
        if cell:
            found.append(cell)
        place = after
    return found


def _body(tokens: Sequence[Token]) -> int:
    """The place at which the numbers of a line begin: behind the last word that can only be of its label."""
    start = 0
    for place, token in enumerate(tokens):
        before = tokens[place - 1] if place else token
        follows = tokens[place + 1] if place + 1 < len(tokens) else None
        heading = token.lower == "ci" and before.percent and (follows is None or follows.text in CLOSING)
        heading = heading or (token.lower == "p" and follows is None)
        if token.kind != "word" or (token.lower in _NOT_A_LABEL and not heading) or "value" in token.lower:
            continue
        unit = time_of_people(token.lower, tokens[place + 1].lower if place + 1 < len(tokens) else "")
        unit = unit or (place and time_of_people(before.lower, token.lower))
        if not (unit and any(each.kind == "number" for each in tokens[max(0, place - 2) : place])):
            start = place + 1
    while start < len(tokens) and tokens[start].text in (":", "=", ",", ")", "]", "|", "+", "-"):
        if tokens[start].text == "=" and tokens[start - 1].lower == "n":
            break
        start += 1
    return _past_total(tokens, start)


def _first_whole(phrases: Phrases) -> int:
    """The place of the first whole group, "12 deaths in 400 patients", which no label holds."""
    for place, token in enumerate(phrases.tokens):
        quantity = phrases.quantity_at(place) if token.kind == "number" else None
        if quantity and quantity.events and quantity.complete:
            return place
    return len(phrases.tokens)


def _past_total(tokens: Sequence[Token], start: int) -> int:
    """The place behind "(n = 412)" that follows a label at once."""
    place = start + (start < len(tokens) and tokens[start].text in OPENING)
    if start and place + 2 < len(tokens) and tokens[place].lower == "n" and tokens[place + 1].text == "=":
        place += 3
        while place < len(tokens) and tokens[place].text in (*CLOSING, ":"):
            place += 1
        return place
    return start


def _labels(printed: Print, after: int) -> list[Cell]:
    """The labels before a place; one that ends in "(n = 412)" ends there."""
    found = []
    start = 0
    for place in range(after):
        if printed.tokens[place].text in CLOSING and _total(printed.tokens[start : place + 1]):
            found.append(_label(printed, start, place + 1))
            start = place + 1
    for first, last in _named_results(printed.tokens, start, after) if start else [(start, after)]:
        found.append(_label(printed, first, last))
    return [cell for cell in found if cell.label or cell.total]


def _named_results(tokens: Sequence[Token], start: int, after: int) -> list[tuple[int, int]]:
    """The places of headings such as "OR (95% CI)" and "P value" that stand side by side behind those of groups."""
    begins = [place for place in range(start, after) if name_at(tokens, place) or tokens[place].lower in _P_WORDS]
    begins = [start, *(place for place in begins if place > start)]
    return [(one, two) for one, two in zip(begins, [*begins[1:], after], strict=True) if one < two]


def _label(printed: Print, start: int, after: int) -> Cell:
    text = printed.piece(start, after)
    tokens = printed.tokens[start:after]
    total = _total(tokens) or _people_in_brackets(tokens)
    if total:
        marks = [
            token.start
            for token in tokens
            if (token.lower == "n" or token.text in OPENING) and token.end <= total.start
        ]
        text = printed.shown[tokens[0].start : marks[-1]] if marks else text
    return Cell(text=text, label=" ".join(text.strip(" :=,;([|*\u2020\u00a0\n").split()), total=total)


def _total(tokens: Sequence[Token]) -> Token | None:
    """The number in "n = 412", or a number of people in brackets ("(412 patients)")."""
    for place in range(len(tokens) - 1):
        if tokens[place].lower == "n" and tokens[place + 1].text in ("=", ":"):
            number = tokens[place + 2] if place + 2 < len(tokens) else tokens[place]
            return number if number.whole else None
        if tokens[place].lower == "n" and tokens[place + 1].whole:
            return tokens[place + 1]
    return None


def _people_in_brackets(tokens: Sequence[Token]) -> Token | None:
    """The number in "(412 residents)"."""
    for place in range(1, len(tokens) - 1):
        opened = tokens[place - 1].text in OPENING and tokens[place].whole is not None
        closed = (
            tokens[place + 1].text in CLOSING
            and place + 2 == len(tokens)
            and (tokens[place].whole or 0) >= _LEAST_TOTAL
        )
        if opened and (closed or tokens[place + 1].lower in PEOPLE):
            return tokens[place]
    return None


def _cell_at(printed: Print, phrases: Phrases, place: int) -> tuple[Cell | None, int]:
    """The cell that begins at a token, and the place after it."""
    tokens = printed.tokens
    token = tokens[place]
    start = place if token.lower == "n" else place + 1
    total = _total(tokens[start : start + 3]) if token.lower == "n" or token.text in OPENING else None
    if total:
        after = tokens.index(total, start) + 1
        return Cell(text=printed.piece(place, after), total=total), after
    if token.lower == "p" or token.text in ("<", ">"):
        return _p(printed, place)
    if token.kind != "number":
        return None, place + 1
    result = _result(printed, phrases, place)
    if result:
        return result
    time = time_of_people(phrases.at(place + 1).lower, phrases.at(place + 2).lower)
    if phrases.at(place + 1).lower == "per" and phrases.at(place + 2).kind == "number":
        base = place + 3
        return Cell(text=token.text), base + time_of_people(phrases.at(base).lower, phrases.at(base + 1).lower)
    counted = _counted_behind(phrases, place)
    if counted:
        return Cell(text=printed.piece(place, counted.after), decimal=token, counted=counted), counted.after
    if token.whole is None and not token.percent and not time:
        return Cell(text=token.text, decimal=token), place + 1
    quantity = phrases.quantity_at(place)
    if time and not (quantity and quantity.complete):
        return _timed(printed, place, time), place + 1 + time
    if quantity is None:
        return None, place + 1
    return Cell(text=printed.piece(place, quantity.after), quantity=quantity), max(quantity.after, place + 1)


def _counted_behind(phrases: Phrases, place: int) -> Quantity | None:
    """``20.2 (41)``: a number with decimals and a count in brackets, a mean with a spread as well as a percentage."""
    token, inside = phrases.at(place), phrases.at(place + 2)
    decimal = token.decimals and not token.percent and 0 <= token.value <= 100
    if not decimal or phrases.at(place + 1).text not in OPENING or inside.whole is None or inside.percent:
        return None
    if phrases.at(place + 3).text not in CLOSING:
        return None
    return Quantity(first=place, after=place + 4, events=inside, percent=token)


def _timed(printed: Print, place: int, length: int) -> Cell:
    """Person-time alone in a cell, with its unit."""
    token = printed.tokens[place]
    unit = " ".join(each.text.rstrip(".") for each in printed.tokens[place + 1 : place + 1 + length])
    return Cell(text=token.text, quantity=Quantity(first=place, after=place + 1, events=token, unit=unit))


def _p(printed: Print, place: int) -> tuple[Cell | None, int]:
    for step in range(place, min(place + 4, len(printed.tokens))):
        if printed.tokens[step].kind == "number":
            text = printed.piece(place, step + 1)
            return Cell(text=text, result=text if text[:1] in "pP" else f"P {text}"), step + 1
    return None, place + 1


def _result(printed: Print, phrases: Phrases, place: int) -> tuple[Cell, int] | None:
    """``0.55 (0.30-0.99)``: an estimate with two limits that have decimals."""
    token = printed.tokens[place]
    opened = phrases.at(place + 1).text in OPENING
    if token.percent and token.value >= 0:
        return None
    at = place + 2 if opened else place + 1
    low, between, high = phrases.at(at), phrases.at(at + 1), phrases.at(at + 2)
    if _alone(token, phrases.at(place + 1), phrases.at(place + 2)):
        text = printed.piece(place, place + 3)
        return Cell(text=text, result=text, limits=True), place + 3
    limits = opened and low.kind == high.kind == "number" and between.lower in ("to", "-", ",", ";")
    if phrases.at(place + 1).text == "\u00b1" and phrases.at(place + 2).kind == "number":
        text = printed.piece(place, place + 3)
        return Cell(text=text, result=text), place + 3
    risk = 0 <= low.value <= token.value <= high.value <= 100
    if not limits or (token.whole is not None and not (low.decimals or high.decimals or risk)):
        return None
    after = at + 3 + (phrases.at(at + 3).text in CLOSING)
    text = printed.piece(place, after)
    quantity = Quantity(first=place, after=after, percent=token, low=low, high=high) if risk else None
    return Cell(text=text, result=text, risk=quantity), after


def _alone(low: Token, between: Token, high: Token) -> bool:
    """Whether two numbers with decimals are limits of an estimate in another cell: "0.46 to 0.91"."""
    numbers = high.kind == "number" and between.lower in ("to", "-") and low.value <= high.value
    return numbers and bool(low.decimals and high.decimals) and not low.percent
