"""What the two groups of a sentence are called."""

from __future__ import annotations

import re
from collections.abc import Sequence

from fourcount.record.entry.pasted.quantities import CLOSING, OPENING, Quantity
from fourcount.record.entry.pasted.vocabulary import (
    ARTICLES,
    COMPARATORS,
    GROUP_NOUNS,
    INTRODUCERS,
    LINKING,
    PEOPLE,
    TIME_UNITS,
    VERBS,
)
from fourcount.record.entry.tokens import Print, Token

_MOST_WORDS = 9
_FAR = 3
_ALONE = ("without", "treated", "untreated")
_WITH = ("with", "without")
_JOINING = frozenset(("-", "/", "+", "&"))
_ALWAYS_STOP = COMPARATORS | VERBS | {"respectively", "who", "which", "that", "p", "n", "as"}
_BEFORE_LABELS = ARTICLES | {"their", "his", "her", "those"}
_SPANS = frozenset(("at", "within", "by", "over", "during", "after", "until", "through"))


class Labels:
    """A reader of labels in the tokens around quantities."""

    def __init__(self, printed: Print) -> None:
        self.printed = printed
        self.tokens = printed.tokens

    def of(self, first: Quantity, second: Quantity, start: int, end: int) -> tuple[str, str]:
        """Both labels, "" where none is told; ``start`` and ``end`` bound the sentence."""
        after = (
            self._behind_leading(first, start) or self.behind(first.after, second.first),
            self._behind_leading(second, first.after) or self.behind(second.after, end),
        )
        if all(after):
            return self._told_apart(*after)
        before = (self.ahead(first.first, start), self.ahead(second.first, first.after))
        if all(before):
            return self._told_apart(*before)
        if not after[0]:
            pair = self._both_behind(self._after_total(second), end) or self._both_ahead(start, first.first)
            if pair:
                return self._told_apart(*pair)
        if not all(after):
            compared = self._of_subjects(start, first.first) or self._behind_totals(first, second, end)
            if compared:
                return compared
        if not (after[1] or before[1]):
            return after[0], ""
        if not (after[0] or before[0]) and self.tokens[start].lower in PEOPLE:
            return self._told_apart(self.behind(start, first.first), after[1] or before[1])
        return self._told_apart(after[0] or before[0], after[1] or before[1])

    def _after_total(self, quantity: Quantity) -> int:
        """The place after a quantity, or after its total where that stands behind it."""
        total = quantity.total.start if quantity.total else -1
        behind = [place for place in range(quantity.after, len(self.tokens)) if self.tokens[place].start == total]
        return behind[0] + 1 if behind else quantity.after

    def _behind_leading(self, quantity: Quantity, start: int) -> str:
        """The label in "of the 320 women allocated to walking, 48 ..." and in "2.5% in the sock group (10/400)"."""
        total, events = quantity.total, quantity.events
        ahead = self.tokens[quantity.first]
        if events is not None and ahead == events and quantity.percent is not None:
            percent = next(
                (place for place in range(quantity.first, quantity.after) if self.tokens[place] == quantity.percent), 0
            )
            between = total is not None and ahead.start < total.start < self.tokens[percent].start
            if percent - quantity.first > _FAR and not between:
                return self.behind(quantity.first + 1, percent - 1)
        if total is None:
            return ""
        if ahead is quantity.percent and events is not None:
            counted = next(
                (place for place in range(quantity.first, quantity.after) if self.tokens[place] == events), 0
            )
            return (
                self.behind(quantity.first + 1, counted)
                if counted - quantity.first > 2 and self.tokens[counted - 1].text != "="
                else ""
            )
        if total.start >= ahead.start:
            return ""
        place = next((place for place in range(start, quantity.first) if self.tokens[place] == total), quantity.first)
        return self.behind(place + 1, quantity.first)

    def _of_subjects(self, start: int, end: int) -> tuple[str, str] | None:
        """Both labels in "patients in group A had a lower rate than patients in group B (16/500 v 29/499)"."""
        than = next(
            (place for place in range(start, end) if self.tokens[place].lower in ("than", "versus", "vs")), None
        )
        if than is None:
            return None
        bracket = next((place for place in range(than, end) if self.tokens[place].text in OPENING), end)
        verbs = [place for place in range(start, than) if self.tokens[place].lower in VERBS]
        pair = self._subject(start, verbs[0] if verbs else than), self._subject(than + 1, bracket)
        return pair if all(pair) else None

    def _subject(self, start: int, end: int) -> str:
        words = self.tokens[start:end]
        plain = 0 < len(words) <= _MOST_WORDS and all(word.kind == "word" for word in words)
        return self.behind(start, end) or (self._trimmed(start, end, None) if plain else "")

    def _behind_totals(self, first: Quantity, second: Quantity, end: int) -> tuple[str, str] | None:
        """Both labels in "we randomised 412 residents to night lights and 409 to usual care"."""
        places = {token.start: place for place, token in enumerate(self.tokens)}
        if first.total is None or second.total is None:
            return None
        one, two = places.get(first.total.start), places.get(second.total.start)
        if one is None or two is None or not one < two or first.first < one < first.after:
            return None
        if one > second.after and self.tokens[one - 1].text == "=":
            pair = self.ahead(one - 2, second.after), self.ahead(two - 2, one)
        else:
            pair = self.behind(one + 1, two), self.behind(two + 1, first.first if two < first.first else end)
            nouns = [token for place in (one, two) for token in self.tokens[place + 1 : place + 2]]
            if not any(pair) and len({noun.lower for noun in nouns} & PEOPLE) == 2:
                return nouns[0].text.rstrip("."), nouns[1].text.rstrip(".")
        return pair if all(pair) else None

    def _told_apart(self, first: str, second: str) -> tuple[str, str]:
        """Labels without the same "with" before both; "without" stays, and then so does its "with"."""
        labels = [first, second]
        for place, other in ((0, 1), (1, 0)):
            if labels[place].casefold().startswith("with ") and not re.match("without\\b", labels[other].casefold()):
                labels[place] = labels[place][5:]
        return labels[0], labels[1]

    def behind(self, place: int, end: int) -> str:
        """The label in "... patients (9.2%) assigned to the night-light group"."""
        bracketed = self._in_brackets(place, end)
        place = self._past_people(place, end)
        if bracketed or place >= end:
            return bracketed
        token = self.tokens[place]
        if token.text == ":" or token.lower not in INTRODUCERS:
            return self._apposition(place, end)
        kept = place if token.lower == "without" else None
        kept = place if token.lower in ("with", "not", "before", "after") and kept is None else kept
        while place < end and (self._leads(place, end)):
            if self.tokens[place].lower in (*_WITH, "not"):
                kept = place
            elif self.tokens[place].lower in INTRODUCERS and self.tokens[place].lower not in ("before", "after"):
                kept = None if kept is None or self.tokens[kept].lower not in ("not",) else kept
            place += 1
        return self._collected(place, end, kept) or (token.text.rstrip(".") if token.lower in _ALONE else "")

    def _in_brackets(self, place: int, end: int) -> str:
        """The label in "18% of 220 (new lens)"."""
        while place < end and self.tokens[place].lower in PEOPLE:
            place += 1
        if place >= end or self.tokens[place].text not in OPENING:
            return ""
        after = self._past_bracket(place, end) - 1
        inside = self.tokens[place + 1 : after]
        plain = 0 < len(inside) <= 5 and all(token.kind == "word" for token in inside)
        return self._trimmed(place + 1, after, None) if plain else ""

    def _leads(self, place: int, end: int) -> bool:
        """Whether a word only leads to the label, as in "in the group that was assigned to"."""
        word = self.tokens[place].lower
        following = self.tokens[place + 1] if place + 1 < end else None
        if word in GROUP_NOUNS:
            return following is not None and following.text != "A" and following.lower in INTRODUCERS | LINKING
        if word in INTRODUCERS | LINKING:
            return self.tokens[place].text != "A"
        return word in PEOPLE and following is not None and following.lower in INTRODUCERS

    def _past_people(self, place: int, end: int) -> int:
        """The place after brackets, percentages, nouns of people and "who were" behind a quantity."""
        while place < end:
            token = self.tokens[place]
            if token.text in OPENING:
                place = self._past_bracket(place, end)
            elif self._passes(token) or (self._introduces(place + 1, end) and self._may_introduce(token)):
                place += 1
            else:
                break
        return place

    def _passes(self, token: Token) -> bool:
        return token.text in CLOSING or token.percent or token.lower in PEOPLE or token.lower in LINKING

    def _may_introduce(self, token: Token) -> bool:
        """Whether a word or a comma may stand before "in the group"."""
        return token.text == "," or (token.kind == "word" and token.lower not in _STOPS_HERE)

    def _introduces(self, place: int, end: int) -> bool:
        return place < end and self.tokens[place].lower in INTRODUCERS

    def _past_bracket(self, place: int, end: int) -> int:
        depth = 0
        for step in range(place, end):
            depth += (self.tokens[step].text in OPENING) - (self.tokens[step].text in CLOSING)
            if depth == 0:
                return step + 1
        return end

    def _apposition(self, place: int, end: int) -> str:
        """The label in "61/118 stocking v 44/121 bandage"."""
        if self.tokens[place].kind != "word" or self.tokens[place].lower in _STOPS_HERE:
            return ""
        label = self._collected(place, end, None)
        return label if len(label.split()) <= 3 else ""

    def _collected(self, place: int, end: int, kept: int | None) -> str:
        """The words of a label from a place on, up to whatever ends it."""
        start = place
        while place < end and place - start < _MOST_WORDS and not self._ends(place, end, place == start):
            place += 1
        return self._trimmed(start, place, kept)

    def _ends(self, place: int, end: int, at_start: bool) -> bool:
        token = self.tokens[place]
        following = self.tokens[place + 1] if place + 1 < end else None
        if token.kind == "number":
            return token.percent or following is None or following.lower in PEOPLE or following.lower in TIME_UNITS
        if token.kind == "mark":
            inner = token.text in _JOINING and not at_start and following is not None and following.kind != "mark"
            return not inner
        if token.lower in _ALWAYS_STOP or (not at_start and token.lower in ("in", "of", "among", "for", "to")):
            return True
        if token.lower in _SPANS:
            return not at_start
        if token.lower in ("and", "or", "but"):
            return following is None or following.kind != "word" or following.lower in INTRODUCERS | LINKING | VERBS
        return place > 0 and self.tokens[place - 1].kind == "word" and self.tokens[place - 1].text.endswith(".")

    def _trimmed(self, start: int, after: int, kept: int | None) -> str:
        """A label without articles before it and "group" behind it."""
        while start < after and self.tokens[start].lower in _BEFORE_LABELS and self.tokens[start].text != "A":
            start += 1
        while start < after and self._is_noise(after - 1, start):
            after -= 1
        while start < after and self.tokens[after - 1].kind == "mark":
            after -= 1
        words = [token.lower for token in self.tokens[start:after] if token.kind == "word"]
        if not words or words[0] == "each":
            return ""
        lead = self.tokens[kept].text + " " if kept is not None else ""
        return (lead + self.printed.piece(start, after)).rstrip(".").replace("\n", " ")

    def _is_noise(self, place: int, start: int) -> bool:
        word = self.tokens[place].lower
        if word in GROUP_NOUNS:
            return place > start
        return word in ("and", "or", "the", "patients", "participants", "recipients", "alone.") and place > start

    def ahead(self, place: int, start: int) -> str:
        """The label in "in the night-light arm, 38 of 412" or "night lights: 38 of 412"."""
        place -= 1
        while place > start and (self.tokens[place].text in (",", ":", "=", "(", "[", "-") or self._is_verb(place)):
            place -= 1
        after = place + 1
        while place >= start and after - place <= _MOST_WORDS and self._belongs(place):
            place -= 1
        found = place + 1
        introduced = place >= start and self.tokens[place].lower in ("in", "with", "for", "among", "on", "without")
        colon = after < len(self.tokens) and self.tokens[after].text in (":", ",", "=")
        bare = after - found <= 4 and (place < start or self.tokens[place].text in (";", ",", ":", "(", "."))
        if not (introduced or colon or bare or (place >= 0 and self.tokens[place].lower in COMPARATORS | {"and"})):
            return ""
        kept = place if introduced and self.tokens[place].lower in _WITH else None
        return self._trimmed(found, after, kept)

    def _is_verb(self, place: int) -> bool:
        return self.tokens[place].lower in ("was", "were", "had", "by", "it", "is")

    def _belongs(self, place: int) -> bool:
        token = self.tokens[place]
        if token.kind == "mark":
            return token.text in _JOINING
        if token.kind == "number" or token.lower == "who":
            return token.kind == "word"
        stops = token.lower in COMPARATORS or token.lower in VERBS or token.lower in INTRODUCERS
        return not (stops or token.lower in ("and", "of", "to", "by", "or", "but"))

    def _both_behind(self, place: int, end: int) -> tuple[str, str] | None:
        """Both labels in "in the night-light and usual-care groups, respectively"."""
        place = self._past_people(place, end)
        if place >= end or self.tokens[place].lower not in INTRODUCERS:
            return None
        return self._split(place + 1, end)

    def _both_ahead(self, start: int, end: int) -> tuple[str, str] | None:
        """Both labels in "in the night-light and usual-care groups, 38 of 412 and 70 of 409 ..."."""
        for place in range(start, end):
            if self.tokens[place].lower in ("in", "with", "for", "among"):
                found = self._split(place + 1, end)
                if found:
                    return found
        return None

    def _lettered(self, place: int) -> bool:
        """Whether "group A" or "arm 1" begins here."""
        name = self.tokens[place + 1].text if place + 1 < len(self.tokens) else ""
        return self.tokens[place].lower in GROUP_NOUNS and len(name) == 1 and (name.isupper() or name.isdecimal())

    def _split(self, place: int, end: int) -> tuple[str, str] | None:
        border = None
        start = place
        while place < end and place - start < 2 * _MOST_WORDS:
            token = self.tokens[place]
            if token.lower in ("and", "versus", "vs", "v") and border is None:
                border = place
            elif (token.kind != "word" and token.text not in _JOINING) or token.lower in VERBS | {"respectively"}:
                break
            elif token.lower in ("groups", "arms", "cohorts"):
                place += 1
                break
            place += 1
        if border is None:
            return None
        while start < border and self.tokens[start].lower in ("to", *LINKING) and not self._lettered(start):
            start += 1
        second = border + 1 + (border + 1 < place and self.tokens[border + 1].lower == "in")
        pair = self._trimmed(start, border, None), self._trimmed(second, place, None)
        return pair if all(pair) else None


_STOPS_HERE = COMPARATORS | VERBS | INTRODUCERS | {"and", "or", "respectively", "by", "of", "but", "per"}


def sentence_bounds(tokens: Sequence[Token]) -> list[int]:
    """The places at which sentences end, the end of the text included."""
    ends = []
    for place, token in enumerate(tokens[:-1]):
        following = tokens[place + 1]
        stop = token.text == "." or (token.kind == "word" and token.text.endswith(".") and len(token.text) > 3)
        begins = following.text[:1].isupper() or (following.kind == "number" and following.lower != "")
        if stop and begins and token.lower not in ("vs", "v", "approx", "no"):
            ends.append(place + 1)
    return [*ends, len(tokens)]
