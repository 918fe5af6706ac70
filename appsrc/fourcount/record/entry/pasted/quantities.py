"""Counts, percentages, totals and person-time as print joins them: "38 of 412 patients (9.2%)", "9.2% (38/412)"."""

from __future__ import annotations

from collections.abc import Sequence
from itertools import pairwise

import msgspec

from fourcount.record.entry.pasted.proportions import gives
from fourcount.record.entry.pasted.vocabulary import (
    DETERMINERS,
    JOINERS,
    NOT_COUNTED,
    PEOPLE,
    TIME_UNITS,
    VERBS,
    time_of_people,
)
from fourcount.record.entry.tokens import Token
from fourcount.record.entry.word_list import words

OPENING = ("(", "[", "{")
CLOSING = (")", "]", "}")
_NOTHING = Token("mark", "", 0, 0)
_LINKS = frozenset(("of", "in", "among", "per", "on", "for", "from", "out", "during", "over", "by", "at", "under"))
_ROUND_BASES = (1, 10, 100, 1000, 10_000, 100_000, 1_000_000)
_NUMBERED = frozenset(words("week day month year visit cycle grade stage phase step part room question level session"))
_BEFORE_NUMBERED = frozenset(words("in at on by until from to of and or after before during through"))
_LARGEST = 10**9


class Quantity(msgspec.Struct, frozen=True, kw_only=True):
    """What print says of one group in one breath, with the places of its first token and after its last one."""

    first: int
    after: int
    events: Token | None = None
    total: Token | None = None
    percent: Token | None = None
    time: Token | None = None
    unit: str = ""
    low: Token | None = None
    high: Token | None = None
    level_text: str = ""

    @property
    def complete(self) -> bool:
        """Whether it needs nothing from elsewhere."""
        part = self.events or self.percent
        return part is not None and (self.total or self.time or self.low) is not None


class Phrases:
    """A reader of quantities over tokens; ``busy`` are places that belong to a printed result already."""

    def __init__(self, tokens: Sequence[Token], busy: frozenset[int] = frozenset(), *, bare: bool = False) -> None:
        self.tokens = tokens
        self.busy = busy
        self.bare = bare

    def at(self, place: int) -> Token:
        return self.tokens[place] if 0 <= place < len(self.tokens) else _NOTHING

    def quantity_at(self, place: int) -> Quantity | None:
        """The quantity that begins at a number, None where the number is of something else."""
        token = self.at(place)
        if token.kind != "number" or token.value < 0 or not self._countable(place):
            return None
        if token.percent:
            return self._from_percent(place)
        if token.whole is None or token.whole > _LARGEST or self._of_no_people(place + 1):
            return None
        return self._of_total(place) or self._over_time(place) or self._with_percent(place)

    def _of_no_people(self, place: int) -> bool:
        """Whether the nouns behind a number say that it counts hours, doses and the like ("38 hours of 40")."""
        after = self._nouns(place, 3)
        if after == place:
            return False
        said = [self.at(step).lower for step in range(place, after + 1)]
        timed = any(time_of_people(one, two) for one, two in pairwise(said))
        return not timed and any(noun in TIME_UNITS or noun in NOT_COUNTED for noun in said[:-1])

    def _countable(self, place: int) -> bool:
        """Whether a number can be one of people: free, without a currency, a slash or a hyphen around it."""
        token, before, following = self.at(place), self.at(place - 1), self.at(place + 1)
        if self._is_numbered(place) or (before.lower == "per" and token.whole in _ROUND_BASES):
            return False
        if place in self.busy or before.text in ("$", "£", "€", "¥", "#", "±", "<", ">", "*", "^"):
            return False
        if before.text in ("/", "-") and before.end == token.start and self.at(place - 2).end == before.start:
            return self.at(place - 2).kind == "word" and before.text == "-"
        if ":" in (before.text, following.text) and self._is_clock(place):
            return False
        joined = following.text == "-" and following.start == token.end and self.at(place + 2).start == following.end
        return not (joined and not token.percent)

    def _is_numbered(self, place: int) -> bool:
        """Whether a number is a name, as in "in week 3 of 12", and not "at one year 38 of 412"."""
        named = self.at(place - 1).lower in _NUMBERED
        return named and (self.at(place - 2).kind == "mark" or self.at(place - 2).lower in _BEFORE_NUMBERED)

    def _is_clock(self, place: int) -> bool:
        """Whether a number is part of a time or a ratio such as 9:30."""
        for colon in (place - 1, place + 1):
            left, right = self.at(colon - 1), self.at(colon + 1)
            both = left.kind == right.kind == "number" and self.at(colon).text == ":"
            if both and left.end == self.at(colon).start and right.start == self.at(colon).end:
                return True
        return False

    def _of_total(self, place: int) -> Quantity | None:
        """``38/412``, ``38 of 412``, ``38 (9.2%) of the 412 patients``, with a percentage behind it or within."""
        events = self.at(place)
        link = place + 1
        percent, link = self._percent(self._nouns(link, 3), events, None, back=link)
        if self.at(noun := self._nouns(link, 2)).text == "/":
            link = noun
        if self.at(link).text == "/" and percent is None:
            total_place = link + 1
            if self.at(total_place + 1).text == "/" or self.at(place - 1).text == "/":
                return None
            spelled = time_of_people(self.at(total_place + 1).lower, self.at(total_place + 2).lower)
            if spelled and self.at(total_place).kind == "number":
                return self._timed(place, events, total_place, spelled)
        else:
            total_place = self._behind_of(link, noun=events)
            if not total_place:
                return None
        total = self.at(total_place)
        if not self._is_total(total_place, events):
            return None
        after = total_place + 1
        if percent is None:
            percent, after = self._percent(self._nouns(after, 4), events, total, back=after)
        return Quantity(first=place, after=after, events=events, total=total, percent=percent)

    def _behind_of(self, place: int, noun: Token) -> int:
        """The place of the number in "patients out of the 412", 0 where none follows."""
        place = self._nouns(place, 3)
        word = self.at(place).lower
        if word == "out":
            place, word = place + 1, self.at(place + 1).lower
        if word == "of" and self.at(place + 1).kind == "word" and self.at(place + 2).lower == "among":
            place, word = place + 2, "among"
        if word not in ("of", "among", "in", "from", "amongst", "per"):
            return 0
        place += 1
        for _ in range(3):
            if self.at(place).lower in DETERMINERS or (self.at(place).lower == "of" and word != "of"):
                place += 1
        people = self.at(self._adjectives(place + 1)).lower in PEOPLE
        if (word in ("in", "from", "per") and not people) or (word == "per" and self.at(place).whole in _ROUND_BASES):
            return 0
        return place if self.at(place).kind == "number" and noun.text else 0

    def _adjectives(self, place: int) -> int:
        """The place of a noun of people behind at most two other words ("older hospital patients")."""
        for step in range(3):
            if self.at(place + step).lower in PEOPLE:
                return place + step
        return place

    def _is_total(self, place: int, events: Token) -> bool:
        total, following = self.at(place), self.at(place + 1)
        if total.kind != "number" or total.whole is None or total.percent or place in self.busy:
            return False
        if following.lower in TIME_UNITS or following.lower in NOT_COUNTED or following.text == "/":
            return False
        if self.at(place - 1).lower != "of" and self._is_first_of_two(place):
            return False
        return (events.whole or 0) <= total.whole <= _LARGEST and total.whole > 0

    def _is_first_of_two(self, place: int) -> bool:
        """Whether a total is the first in "among 540 and 528 patients", which are of two groups."""
        second = place + 2
        if self.at(place + 1).lower != "and" or self.at(second).whole is None:
            return False
        if self.at(second + 1).lower in PEOPLE and self.at(place - 1).lower == "the":
            return True
        while self.at(second + 1).lower in PEOPLE:
            second += 1
        return self.at(second + 1).text in ("", ".", ",", ";", ")") or self.at(second + 1).lower == "respectively"

    def _over_time(self, place: int) -> Quantity | None:
        """``38 falls in 4,120 person-years``, ``38 events (4,120 person-years)``."""
        events = self.at(place)
        link = self._nouns(place + 1, 4)
        word = self.at(link)
        if word.lower in ("in", "during", "over", "per", "for", "across", "from", "/", "with") or word.text in (
            "(",
            "[",
            ",",
            ";",
        ):
            start = link + 1
            while self.at(start).lower in DETERMINERS or self.at(start).lower in ("of", "for", "in", "during", "over"):
                start += 1
            length = time_of_people(self.at(start + 1).lower, self.at(start + 2).lower)
            if self.at(start).kind == "number" and length:
                base = self.at(start).whole in _ROUND_BASES and self.at(start - 1).lower == "per"
                return None if base else self._timed(place, events, start, length)
        length = time_of_people(self.at(place + 1).lower, self.at(place + 2).lower)
        if length:
            return self._time_first(place, place + 1 + length)
        return None

    def _time_first(self, place: int, after: int) -> Quantity | None:
        """``4,120 person-years (38 falls)``."""
        number = after + 1
        if self.at(after).text not in OPENING or self.at(number).whole is None:
            return None
        unit = " ".join(token.text for token in self.tokens[place + 1 : after])
        close = self._nouns(number + 1, 3)
        if self.at(close).text not in CLOSING:
            return None
        return Quantity(first=place, after=close + 1, events=self.at(number), time=self.at(place), unit=unit)

    def _timed(self, place: int, events: Token, time: int, length: int) -> Quantity:
        unit = " ".join(token.text.rstrip(".") for token in self.tokens[time + 1 : time + 1 + length])
        return Quantity(first=place, after=time + 1 + length, events=events, time=self.at(time), unit=unit)

    def _with_percent(self, place: int) -> Quantity | None:
        """``38 (9.2%)``, ``38 patients (9.2%)``, whose total stands elsewhere."""
        events = self.at(place)
        percent, after = self._percent(self._nouns(place + 1, 4), events, None)
        if percent is None and self.at(place + 1).lower in VERBS:
            percent, after = self._percent(self._nouns(place + 2, 2), events, None)
        if percent is None:
            return Quantity(first=place, after=place + 1, events=events) if self.bare else None
        within = self.tokens[place:after]
        named = [two for one, two in zip(within, within[2:], strict=False) if one.lower == "n" and two.whole]
        total = named[0] if named and (events.whole or 0) <= (named[0].whole or 0) else None
        return Quantity(first=place, after=after, events=events, percent=percent, total=total)

    def _from_percent(self, place: int) -> Quantity:
        """``9.2% (38/412)``, ``9.2% of 412``, ``9% (95% CI 6 to 12)``, or a percentage alone."""
        percent = self.at(place)
        inner = place + 1
        opened = self.at(inner).text in (*OPENING, ",", ";")
        inner += opened
        while self.at(inner).lower in ("n", "n/n", "i.e", "or") or self.at(inner).text in ("=", "/"):
            inner += 1
        if opened and self.at(inner).kind == "number" and not self.at(inner).percent:
            counted = self._of_total(inner) or self._over_time(inner)
            if counted and self._gives(percent, counted.events, counted.total):
                return msgspec.structs.replace(counted, first=place, percent=percent)
            limited = self._limits(place, inner, percent)
            if limited:
                return limited
            close = self._nouns(inner + 1, 3)
            bracketed = self.at(place + 1).text in OPENING and self.at(close).text in CLOSING
            if self.at(inner).whole is not None and bracketed and self._countable(inner):
                return self._counted_percent(place, inner, close + 1)
        elif opened and (limited := self._limits(place, inner, percent)):
            return limited
        total = self._behind_of(place + 1, noun=percent)
        if total and self._is_total(total, Token("number", "0", 0, 0, "", 0.0, 0)):
            after = self._nouns(total + 1, 4)
            inside = self.at(after + 1)
            if self.at(after).text in OPENING and inside.whole is not None and self.at(after + 2).text in CLOSING:
                number = self.at(total)
                if self._gives(percent, inside, number):
                    return Quantity(first=place, after=after + 3, events=inside, total=number, percent=percent)
            return Quantity(first=place, after=total + 1, percent=percent, total=self.at(total))
        return Quantity(first=place, after=place + 1, percent=percent)

    def _counted_percent(self, place: int, inner: int, after: int) -> Quantity:
        """``9.2% (38)``, and ``9.2% (38) of 412``."""
        events, percent = self.at(inner), self.at(place)
        total = self._behind_of(after, noun=events)
        if total and self._is_total(total, events):
            return Quantity(first=place, after=total + 1, events=events, total=self.at(total), percent=percent)
        return Quantity(first=place, after=after, events=events, percent=percent)

    def _limits(self, start: int, place: int, percent: Token) -> Quantity | None:
        """A risk with two limits inside a bracket, behind "95% CI" or at once."""
        level = ""
        for _ in range(6):
            token = self.at(place)
            if token.kind == "number" and self.at(place + 1).lower in ("to", "-", ",", ";", "and"):
                low, high = token, self.at(place + 2)
                if high.kind != "number" or not 0 <= low.value <= high.value <= 100:
                    return None
                return Quantity(first=start, after=place + 3, percent=percent, low=low, high=high, level_text=level)
            interval = token.percent and self.at(place + 1).lower in ("ci", "confidence", "-")
            if not (interval or token.lower in ("ci", "confidence", "interval") or token.text in (",", ":", "=", "-")):
                return None
            level = f"{token.text}%" if interval else level
            place += 1
        return None

    def _percent(
        self, place: int, events: Token, total: Token | None, back: int | None = None
    ) -> tuple[Token | None, int]:
        """A percentage in brackets or behind a comma, and the place after it; without one, the place to go on from."""
        back = place if back is None else back
        token, inside = self.at(place), self.at(place + 1)
        if token.text in (",", ";", "-", ":") or (token.lower in ("or", "i.e") and inside.percent):
            fits = inside.percent and total is not None and self._gives(inside, events, total)
            return (inside, place + 2) if fits and place + 1 not in self.busy else (None, back)
        if token.percent and total is not None and self._gives(token, events, total):
            return token, place + 1
        if token.text not in OPENING:
            return None, back
        step = 2 if inside.text in ("=", "<") else 1
        inside = self.at(place + step)
        if inside.kind != "number" or inside.value > 100 or inside.value < 0 or place + step in self.busy:
            return None, back
        after = place + step + 1
        following = self.at(after)
        said = inside.percent and not self._level(place + step)
        unsaid = following.text in CLOSING and (
            self.bare if total is None else bool(inside.decimals or self.bare) and self._gives(inside, events, total)
        )
        if not (said or unsaid):
            return None, back
        if following.text in (";", ","):
            close = next((step for step in range(after, after + 12) if self.at(step).text in CLOSING), after - 1)
            return inside, close + 1
        return inside, after + (following.text in CLOSING)

    def _level(self, place: int) -> bool:
        step = 2 if self.at(place + 1).text == "-" else 1
        return self.at(place + step).lower in ("ci", "confidence", "credible", "cri")

    def _gives(self, percent: Token, events: Token | None, total: Token | None) -> bool:
        return events is None or total is None or gives(percent, events.whole or 0, total.whole or 0)

    def _nouns(self, place: int, most: int) -> int:
        """The place after at most so many words that say who or what was counted."""
        for _ in range(most):
            word = self.at(place)
            stops = word.lower in JOINERS or word.lower in _LINKS or word.lower in VERBS
            if word.kind != "word" or stops or word.text.endswith("."):
                break
            place += 1
        return place
