"""The grammar of printed results: a name, an estimate, a level, two limits and a p, in the orders that print has."""

from __future__ import annotations

import re
from collections.abc import Sequence
from math import isinf

import msgspec

from fourcount.record.entry.figure_found import Figure
from fourcount.record.entry.figure_names import ADJUSTED, Name, name_at
from fourcount.record.entry.p_values import FoundP, p_at, statistic_at
from fourcount.record.entry.readings import PrintedNumber
from fourcount.record.entry.tokens import Token
from fourcount.record.entry.word_list import words

_OPENING = ("(", "[", "{")
_CLOSING = (")", "]", "}")
_BETWEEN = ("to", "through", "and", "till", "-", ",", ";", "/", "bis")
_FILLERS = frozenset(
    words(
        "with a an the of from ranging ranged range confidence credible interval intervals limits limit ci cis "
        "cri ui cl two-sided one-sided exact corresponding was is at level bootstrap bayesian robust"
    )
)
_INTERVAL_WORDS = (
    "ci",
    "cis",
    "c.i",
    "cri",
    "cl",
    "ui",
    "confidence",
    "credible",
    "uncertainty",
    "conf",
    "compatibility",
)
_TIME_WORDS = frozenset(
    words("second seconds minute minutes min hour hours h day days d week weeks wk month months mo year years yr yrs")
)
_USUAL_LEVELS = (80, 90, 95, 97.5, 98, 99, 99.9)
_RISKS = ("risk", "incidence", "mortality", "prevalence", "proportion")
_BEHIND_OR = frozenset(("for", "or", "per", "in", "among", "after", "comparing", "associated"))
_LONGEST_WAY = 14
_ENDLESS = ("inf", "infinity", "infinite", "nan")
_EXPONENT = re.compile("e[0-9]+|e-[0-9]+")


class Grammar:
    """A reader of results over tokens; ``leftover`` are the numbers that it took for nothing."""

    def __init__(self, tokens: Sequence[Token], *, unnamed: bool) -> None:
        self.tokens = tokens
        self.unnamed = unnamed
        self.leftover: list[Token] = []

    def figures(self) -> list[Figure]:
        """All results in reading order. Every step goes forward, so the work is linear in the text."""
        found: list[Figure] = []
        name: tuple[int, Name] | None = None
        level: float | None = None
        place = 0
        while place < len(self.tokens):
            if name and place - name[0] > _LONGEST_WAY:
                name = None
            if named := self._name(place):
                name = (self._adjusted_from(place), named)
                place += named.length
            elif level_found := self.level_at(place):
                level, place = level_found
                name = name and (place, name[1])
            elif p_found := p_at(self.tokens, place):
                place = self._take_p(found, place, p_found)
            elif after := statistic_at(self.tokens, place):
                place = after
            elif self._begins_figure(place, name is not None):
                figure = self._figure(place, name)
                figure.level = figure.level or level
                if figure.name is None and figure.low and figure.unit == "one" and found and found[-1].name:
                    figure.name = msgspec.structs.replace(found[-1].name, adjusted=False)
                name, level, place = None, None, figure.after
                if found and figure.bare:
                    self.leftover.append(self.tokens[figure.first])
                else:
                    found.append(figure)
            else:
                endless = self._endless(place)
                name = None if endless else name
                place = endless or self._skipped(place)
        return found

    def _skipped(self, place: int) -> int:
        """The place after a token that is taken for nothing; a number other than a length of time is noted."""
        counts = self._at(place + 1).lower not in _TIME_WORDS and self._at(place - 1).lower != "per"
        if self.tokens[place].kind == "number" and counts:
            self.leftover.append(self.tokens[place])
        return place + 1

    def _endless(self, place: int) -> int | None:
        """The place after an estimate that is no finite number, its bracket included: "inf (0 to inf)", "1e999"."""
        token, following = self.tokens[place], self._at(place + 1)
        after = place + 1
        if token.kind == "number" and following.start == token.end and _EXPONENT.fullmatch(following.lower):
            after += 1
        elif token.lower not in _ENDLESS and not isinf(token.value):
            return None
        self.leftover.append(token)
        if self._at(after).text not in _OPENING:
            return after
        close = (step for step in range(after, min(after + _LONGEST_WAY, len(self.tokens))))
        return next((step + 1 for step in close if self.tokens[step].text in _CLOSING), after)

    def _name(self, place: int) -> Name | None:
        name = name_at(self.tokens, place)
        if name and self._at(place - 1).lower in ("log", "ln", "loge", "logarithm"):
            return msgspec.structs.replace(name, measure=None)
        if name is None and self.unnamed and self.tokens[place].lower in _RISKS:
            return Name("risk", 1)
        if name and self.tokens[place].text == "OR":
            following = self._at(place + 1)
            if following.kind == "word" and following.lower not in _FILLERS | _BEHIND_OR:
                return None
        return name

    def _adjusted_from(self, place: int) -> int:
        """The place of "adjusted" before a name, or of the name itself."""
        return next((step for step in (place - 2, place - 1) if self._at(step).lower in ADJUSTED), place)

    def _begins_figure(self, place: int, named: bool) -> bool:
        """Whether an estimate stands here: a number, not of a length of time, nor a count of a total."""
        token, following = self.tokens[place], self._at(place + 1)
        exponent = following.start == token.end and _EXPONENT.fullmatch(following.lower)
        if token.kind != "number" or not (named or self.unnamed) or isinf(token.value) or exponent:
            return False
        if following.lower in _TIME_WORDS or following.text == "/" or following.lower in ("of", "patients"):
            return False
        if self._at(place - 1).text in ("/", "<", ">") or (named and self._at(place - 1).lower == "per"):
            return False
        return not (self._at(place - 1).lower in ("of",) and not named)

    def _figure(self, place: int, name: tuple[int, Name] | None) -> Figure:
        figure = Figure(name[0] if name else place, name[1] if name else None)
        token = self.tokens[place]
        figure.start = place
        figure.estimate = self._printed(figure, token)
        figure.unit = "percent" if token.percent else "one"
        place = self._unit(figure, place + 1)
        figure.after = place
        opened = False
        while place < len(self.tokens):
            token = self.tokens[place]
            if token.text in _OPENING and (close := self._unbounded(figure, place)):
                place = figure.after = close
            elif level := self.level_at(place):
                figure.level, figure.after = level
                opened, place = True, figure.after
            elif (p := p_at(self.tokens, place)) and figure.p is None:
                place = self._take_p([figure], place, p)
            elif figure.low is None and token.kind == "number" and (after := self._limits(figure, place, opened)):
                place = figure.after = after
            elif token.text in _CLOSING:
                place = figure.after = place + 1
            elif self._passes(place):
                opened = opened or token.text in _OPENING or token.lower in _INTERVAL_WORDS
                place += 1
            else:
                break
        self._close(figure)
        return figure

    def _commas(self, place: int) -> int:
        """0 where a number near a place, before any p, has a decimal point; 2 where one has a decimal comma; else 1."""
        found = 1
        for step, token in enumerate(self.tokens[place : place + _LONGEST_WAY], place):
            if token.lower in ("p", "p-value") or token.text == ";":
                break
            if token.decimals and not self.level_at(step):
                if "," not in token.text:
                    return 0
                found = 2
        return found

    def _printed(self, figure: Figure, token: Token) -> PrintedNumber:
        """A number of a figure; in a ratio a comma is a decimal one, as no ratio is printed with thousands."""
        if token.decimals or token.text.count(",") != 1:
            return printed_number(token)
        ratio = figure.name is not None and figure.name.measure is not None and figure.name.measure.endswith("ratio")
        commas = self._commas(figure.start)
        if not commas or not (ratio or commas > 1):
            return printed_number(token)
        head, _, digits = token.text.partition(",")
        return PrintedNumber(text=token.text, value=float(f"{head}.{digits}"), decimals=len(digits))

    def _unbounded(self, figure: Figure, place: int) -> int | None:
        """The place after "(NNTB 8 to infinity to NNTH 31)", limits that are two ranges; None for anything else."""
        if figure.measure_or("risk_ratio") != "number_needed":
            return None
        within = range(place, min(place + 14, len(self.tokens)))
        close = next((step for step in within if self.tokens[step].text in _CLOSING), None)
        if close is None or not any(self._at(step).text in ("\u221e", "infinity") for step in range(place, close)):
            return None
        figure.one_limit = "\u221e"
        return close + 1

    def _passes(self, place: int) -> bool:
        token = self.tokens[place]
        if self._name(place) or token.text == "-":
            return False
        return token.kind == "break" or token.text in (*_OPENING, ",", ";", ":", "=") or token.lower in _FILLERS

    def _limits(self, figure: Figure, place: int, opened: bool) -> int | None:
        """The place after two limits that begin here, None where there are none; one alone is kept as such."""
        token, between, second = self.tokens[place], self._at(place + 1), self._at(place + 2)
        estimate = figure.estimate
        if between.lower in _BETWEEN and second.kind == "number" and not self.level_at(place + 2):
            if not opened and not (estimate and token.value <= estimate.value <= second.value):
                return None
            figure.low, figure.high = self._printed(figure, token), self._printed(figure, second)
            if token.percent or second.percent:
                figure.unit = "percent"
            return self._unit(figure, place + 3)
        before = self._at(place - 1)
        alone = before.text in (*_OPENING, ",", ";", ":") or before.lower in _INTERVAL_WORDS
        if between.kind == "number" and not opened and estimate and token.value <= estimate.value <= between.value:
            figure.low, figure.high = printed_number(token), printed_number(between)
            return place + 2
        if not opened or not alone or between.text not in (*_CLOSING, ""):
            return None
        if "," in token.text and token.decimals and estimate and "," not in estimate.text:
            low, _, high = token.text.partition(",")
            figure.low, figure.high = _whole(low), _whole(high)
            return place + 1
        figure.one_limit = token.text
        return place + 1

    def _unit(self, figure: Figure, place: int) -> int:
        """The place after "percentage points" or "per 1,000 person-years", if one of these stands here."""
        following = [self._at(place + step).lower for step in range(4)]
        if following[0] in ("percentage", "percent", "%") and following[1].startswith("point"):
            figure.unit = "percent"
            return place + 2
        if following[0] in ("-", "percentage-point", "percentage-points", "points", "pp"):
            if following[0] == "-" and not following[1].startswith("percentage"):
                return place
            figure.unit = "percent"
            return place + (1 if following[0] != "-" else 3)
        return self._so_many(figure, place, following)

    def _so_many(self, figure: Figure, place: int, following: Sequence[str]) -> int:
        """ "7 per 1,000", "3 fewer in 100 patients"."""
        skip = 1 if following[0] in ("fewer", "more", "events", "cases") else 0
        number = self._at(place + skip + 1)
        if following[skip] not in ("per", "in") or number.kind != "number" or number.whole not in (100, 1000):
            return place
        figure.unit = "percent" if number.whole == 100 else "per-1000"
        place += skip + 2
        while self._at(place).lower in ("person-years", "person", "patient-years", "patients", "people", "years"):
            place += 1
        return place

    def level_at(self, place: int) -> tuple[float, int] | None:
        """A level that begins here ("95% CI", "95 percent confidence interval", "CI 95%") and the place after it."""
        token, following = self.tokens[place], self._at(place + 1)
        if token.kind == "number" and token.value >= 0:
            step = 2 if following.text == "-" else 1
            if self._at(place + step).lower in _INTERVAL_WORDS:
                return token.value / 100, place + step + 1
        if token.lower.startswith("ci") and token.lower[2:].isdecimal() and following.text == "%":
            return float(token.lower[2:]) / 100, place + 2
        usual = following.kind == "number" and following.percent and following.value in _USUAL_LEVELS
        if usual and token.lower in _INTERVAL_WORDS and self._at(place + 2).lower not in ("to", "-"):
            return following.value / 100, place + 2
        return None

    def _take_p(self, found: list[Figure], place: int, p: FoundP) -> int:
        """Give a p to the result before it, or make it one of its own."""
        after = p.after
        if not p.own:
            return after
        if found and found[-1].p is not None and not self.unnamed:
            return after
        apart = found and any(token.kind == "number" for token in self.tokens[found[-1].after : place])
        if not found or found[-1].p is not None or (apart and not self.unnamed):
            found.append(Figure(place, None))
        figure = found[-1]
        figure.p, figure.p_relation, figure.after = p.number, p.relation, after
        self._close(figure)
        return figure.after

    def _close(self, figure: Figure) -> None:
        """Take in the bracket that closes one opened within the figure, and leave out one opened before it."""
        within = self.tokens[figure.first : figure.after]
        depth = sum(token.text in _OPENING for token in within) - sum(token.text in _CLOSING for token in within)
        while depth > 0 and self._at(figure.after).text in _CLOSING:
            figure.after, depth = figure.after + 1, depth - 1
        while depth < 0 and self.tokens[figure.after - 1].text in _CLOSING:
            figure.after, depth = figure.after - 1, depth + 1

    def _at(self, place: int) -> Token:
        return self.tokens[place] if 0 <= place < len(self.tokens) else _NOTHING


_NOTHING = Token("mark", "", 0, 0)


def printed_number(token: Token) -> PrintedNumber:
    """A token as a number of print; a minus of any kind stands as "-" in its text."""
    return PrintedNumber(text=token.text, value=token.value, decimals=token.decimals)


def _whole(text: str) -> PrintedNumber:
    return PrintedNumber(text=text, value=float(text), decimals=0)
