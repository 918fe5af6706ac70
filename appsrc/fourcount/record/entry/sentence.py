"""A pasted sentence, as a paper's text prints its result, as a table."""

from __future__ import annotations

from bisect import bisect_left, bisect_right
from collections.abc import Iterator, Sequence
from itertools import pairwise

import msgspec

from fourcount.record.entry.figure_names import name_at
from fourcount.record.entry.pasted.adjusted_for import adjusted_for
from fourcount.record.entry.pasted.doubts import PASTE_DOUBTS
from fourcount.record.entry.pasted.event_words import event_words, time_span
from fourcount.record.entry.pasted.labels import Labels, sentence_bounds
from fourcount.record.entry.pasted.pair_words import pair_sentence
from fourcount.record.entry.pasted.proportions import gives
from fourcount.record.entry.pasted.quantities import OPENING, Phrases, Quantity
from fourcount.record.entry.pasted.told_groups import agrees, form_of, of_own_total, pasted_group
from fourcount.record.entry.pasted.totals import leads_clause, shared_total, with_totals, without_sums
from fourcount.record.entry.pasted.vocabulary import (
    COMPARATORS,
    EVENT_NOUNS,
    GROUP_NOUNS,
    INTRODUCERS,
    LINKING,
    NOT_PEOPLE,
    PEOPLE,
    VERBS,
)
from fourcount.record.entry.printed import named_figures
from fourcount.record.entry.readings import Pasted
from fourcount.record.entry.tokens import LONGEST_TEXT, Print, as_sentence, take_apart
from fourcount.record.outcome import PAPER_MEASURES

__all__ = ["PASTE_DOUBTS", "read_sentence"]

_MOST_TOKENS = 1500
_MOST_NUMBERS = 200
_MOST_PAIRS = 12
_NEAR = 12
_GROUP_WORDS = GROUP_NOUNS | {"groups", "arms", "placebo", "respectively", "control"}


def read_sentence(text: str) -> Pasted | None:
    """What a sentence says of two groups, with the results printed beside it; None where it holds no table.

    Understood are counts of totals, percentages of totals, events in person-time, risks with limits, and results
    without counts. Longer text, such as an abstract, is searched for the first two counts that belong together.
    """
    if not any(character.isdecimal() for character in text[:LONGEST_TEXT]) or len(text) > LONGEST_TEXT:
        return None
    printed = as_sentence(take_apart(text))
    numbers = sum(token.kind == "number" for token in printed.tokens)
    if len(printed.tokens) > _MOST_TOKENS or not 1 < numbers <= _MOST_NUMBERS:
        return None
    return SentenceReader(printed).read()


class SentenceReader:
    """One sentence, or a few, while they are read."""

    def __init__(self, printed: Print) -> None:
        self.printed = printed
        self.tokens = printed.tokens
        found = named_figures(printed, "risk_ratio")
        self.figures = tuple(figure for figure, _ in found)
        self.spans = tuple(span for _, span in found)
        self.busy = frozenset(place for span in self.spans for place in range(*span))
        self.ends = sentence_bounds(self.tokens)

    def read(self) -> Pasted | None:
        """The first two quantities that make a table, else results alone, else None."""
        pairs = pair_sentence([token for place, token in enumerate(self.tokens) if place not in self.busy])
        if pairs:
            return msgspec.structs.replace(pairs, figures=self.figures, paper_text=self._paper_text())
        for bare in (False, True):
            found = self._quantities(bare=bare)
            quantities = without_sums(found)
            for first, second in self._pairs(quantities, bare=bare):
                pasted = self._table(first, second, quantities, bare=bare)
                if pasted and len(quantities) < len(found):
                    return msgspec.structs.replace(pasted, ambiguous=(*pasted.ambiguous, "total-left-out"))
                if pasted:
                    return pasted
        return self._effect_only()

    def _quantities(self, *, bare: bool) -> list[Quantity]:
        phrases = Phrases(self.tokens, self.busy, bare=bare)
        found: list[Quantity] = []
        place = 0
        while place < len(self.tokens):
            quantity = phrases.quantity_at(place) if self.tokens[place].kind == "number" else None
            if quantity and bare and quantity.events and self._is_total_already(place, quantity):
                quantity = None
            place = quantity.after if quantity else place + 1
            if quantity and not self._of_something_else(quantity) and not self._joined(found, quantity):
                found.append(self._with_count_before(quantity, found[-1].after if found else 0))
        return found

    def _is_total_already(self, place: int, quantity: Quantity) -> bool:
        """Whether a bare number is printed as a total: "n = 412", or "Of 412 patients with lamps, ..."."""
        bare = quantity.percent is None and not quantity.complete
        return self.tokens[place - 1].text == "=" or (bare and leads_clause(self.tokens, place))

    def _joined(self, found: list[Quantity], quantity: Quantity) -> bool:
        """Put a percentage that stands alone to the count that it is of, "38 of 412 on foam mattresses (9.2%)"."""
        percent = quantity.percent
        if found and self._is_percent_of(found[-1], quantity):
            ahead = found.pop()
            found.append(msgspec.structs.replace(quantity, first=ahead.first, percent=ahead.percent))
            return True
        if not found or percent is None or quantity.events or quantity.complete:
            return False
        last = found[-1]
        bracketed = self.tokens[quantity.first - 1].text in OPENING
        if last.events is None or last.total is None or last.percent is not None or quantity.first - last.after > _NEAR:
            return False
        if not (bracketed or gives(percent, last.events.whole or 0, last.total.whole or 0)):
            return False
        found[-1] = msgspec.structs.replace(last, percent=percent)
        return True

    def _of_something_else(self, quantity: Quantity) -> bool:
        """Whether the words around a number of a number say that it counts no people, or measures a test."""
        before = {token.lower for token in self.tokens[max(0, quantity.first - 6) : quantity.first]}
        near = {token.lower for token in self.tokens[quantity.first : quantity.after + 3]}
        if {"sensitivity", "specificity"} & (before | near):
            return True
        if quantity.percent is not None or quantity.time is not None:
            return False
        return bool(NOT_PEOPLE & (before | near)) or {"blood", "pressure"} <= before

    def _with_count_before(self, quantity: Quantity, start: int) -> Quantity:
        """A percentage in brackets with its count, "66 participants with the ring (22%)"."""
        alone = quantity.percent and not (quantity.events or quantity.time or quantity.low)
        if not alone or self.tokens[quantity.first - 1].text not in OPENING:
            return quantity
        for place in range(quantity.first - 2, max(start, quantity.first - _NEAR) - 1, -1):
            token = self.tokens[place]
            if token.kind == "mark" and token.text != "-":
                break
            if token.kind == "number":
                following = self.tokens[place + 1].lower
                counts = token.whole is not None and not token.percent and place not in self.busy
                whole = msgspec.structs.replace(quantity, first=place, events=token)
                if counts and following in PEOPLE | {"in", "with", "on"} and agrees(whole):
                    return whole
                break
        return quantity

    def _is_percent_of(self, ahead: Quantity, quantity: Quantity) -> bool:
        """Whether a percentage before a count is its own, "2.5% in the sock group (10/400)"."""
        alone = ahead.percent and not (ahead.events or ahead.complete) and quantity.percent is None
        if not alone or not (quantity.events and quantity.total) or quantity.first - ahead.after > _NEAR:
            return False
        whole = msgspec.structs.replace(quantity, percent=ahead.percent)
        return self.tokens[quantity.first - 1].text in OPENING and agrees(whole)

    def _pairs(self, quantities: Sequence[Quantity], *, bare: bool) -> Iterator[tuple[Quantity, Quantity]]:
        """Neighbours of one kind, complete ones first; not more of them than a reader would look at."""
        counted = [each for each in quantities if each.events or each.complete]
        percents = [each for each in quantities if not (each.events or each.low)]
        neighbours = [*pairwise(counted), *(pair for pair in pairwise(percents) if pair[0].percent and pair[1].percent)]
        fitting = [pair for pair in dict.fromkeys(neighbours) if self._alike(*pair)]
        if not bare:
            yield from [pair for pair in fitting if pair[0].complete and pair[1].complete][:_MOST_PAIRS]
        yield from [pair for pair in fitting if not (pair[0].complete and pair[1].complete)][:_MOST_PAIRS]

    def _alike(self, first: Quantity, second: Quantity) -> bool:
        """Whether two quantities are of one kind and in the same or in neighbouring sentences."""
        kinds = [(each.events is not None, each.time is not None, each.low is not None) for each in (first, second)]
        borders = bisect_right(self.ends, second.first) - bisect_left(self.ends, first.after)
        return kinds[0] == kinds[1] and borders <= 1

    def _table(self, first: Quantity, second: Quantity, quantities: Sequence[Quantity], *, bare: bool) -> Pasted | None:
        start = max((end for end in self.ends if end <= first.first), default=0)
        end = min(end for end in self.ends if end >= second.after)
        doubts: list[str] = []
        if not (first.complete and second.complete):
            taken = self.busy | {
                place
                for each in quantities
                if each.events or each.percent
                for place in range(each.first, each.after)
                if each not in (first, second) and not bare
            }
            first_full, second_full, by_percent = with_totals(self.tokens, first, second, taken, end)
            if first_full.complete and second_full.complete:
                doubts += ["totals-by-percent"] if by_percent else []
            elif bare or not self._counts_without_totals(first, second, taken, start, end):
                return None
            else:
                doubts.append("no-totals")
            first, second = first_full, second_full
        labels = Labels(self.printed).of(first, second, start, end)
        if not self._compared(first, second, labels, (start, end)):
            proven = first.complete and second.complete and first.percent and second.percent
            if not (proven or self._of_people(first, second)):
                return None
            if (first.total and first.total.whole) == (second.total and second.total.whole):
                return None
            doubts.append("not-compared")
        nested = first.events is not None and second.total is not None and first.events.whole == second.total.whole
        doubts += ["not-compared"] if nested and "not-compared" not in doubts else []
        return self._pasted((first, second), labels, (start, end), doubts, quantities)

    def _changed(self, first: Quantity, second: Quantity) -> bool:
        """Whether a count is said to go "from" one "to" the other."""
        return self.tokens[first.first - 1].lower == "from" and self.tokens[second.first - 1].lower == "to"

    def _of_people(self, first: Quantity, second: Quantity) -> bool:
        """Whether "1 of 96 and 14 of 98 children" stands there: two counts of people side by side."""
        between = [token.lower for token in self.tokens[first.after : second.first]]
        noun = self.tokens[second.after].lower if second.after < len(self.tokens) else ""
        return between == ["and"] and noun in PEOPLE and first.total is not None and second.total is not None

    def _counts_without_totals(
        self, first: Quantity, second: Quantity, taken: frozenset[int], start: int, end: int
    ) -> bool:
        """Whether counts with percentages are those of two groups though nobody says how large these are."""
        if first.events is None or second.events is None or not (first.percent and second.percent):
            return False
        labels = Labels(self.printed).of(first, second, start, end)
        if shared_total(self.tokens, first, second, taken) or not all(labels):
            return False
        return self._compared(first, second, labels, (start, end), strictly=True)

    def _compared(
        self,
        first: Quantity,
        second: Quantity,
        labels: tuple[str, str],
        bounds: tuple[int, int],
        *,
        strictly: bool = False,
    ) -> bool:
        """Whether anything says that the two are groups of one comparison."""
        between = {token.lower for token in self.tokens[first.after : second.first]}
        around = {token.lower for token in self.tokens[bounds[0] : bounds[1]]}
        effect = any(figure.measure in (*PAPER_MEASURES, "relative_reduction") for figure in self.figures)
        if of_own_total(first) and of_own_total(second):
            nested = first.events and second.total and first.events.whole == second.total.whole
            return not nested and (all(labels) or "respectively" in around)
        if COMPARATORS & between or _GROUP_WORDS & around or effect or (self.figures and all(labels)):
            return True
        if not strictly and self._changed(first, second) and first.percent and second.percent:
            return True
        if strictly or not all(labels):
            return False
        told = all(each.percent is not None and agrees(each) for each in (first, second))
        behind = {token.lower for token in self.tokens[second.after : bounds[1]]}
        ahead = {token.lower for token in self.tokens[bounds[0] : first.first]}
        noun = self.tokens[first.after]
        people = noun.kind != "word" or noun.lower in INTRODUCERS | PEOPLE | LINKING | VERBS
        return told or (people and bool(INTRODUCERS & between and INTRODUCERS & (behind | ahead)))

    def _pasted(
        self,
        pair: tuple[Quantity, Quantity],
        labels: tuple[str, str],
        bounds: tuple[int, int],
        doubts: list[str],
        quantities: Sequence[Quantity],
    ) -> Pasted:
        form = form_of(pair)
        words = event_words(self.printed, pair[0], pair[1], *bounds)
        words = "" if words and name_at(take_apart(words).tokens, 0) else words
        if any(each.percent and each.events and each.total and not agrees(each) for each in pair):
            doubts.append("percent-disagrees")
        others = [
            each
            for each in quantities
            if each.events and (each.complete or each.percent) and each.first not in (pair[0].first, pair[1].first)
        ]
        if others and not (pair[0].time and not others[0].time):
            doubts.append("more-counts")
        if self._changed(*pair):
            doubts.append("changed-count")
        return Pasted(
            form=form,
            groups=tuple(pasted_group(form, quantity, label) for quantity, label in zip(pair, labels, strict=True)),
            words="" if words.casefold() in (label.casefold() for label in labels) else words,
            unit=pair[0].unit or pair[1].unit,
            limits_level=pair[0].level_text or pair[1].level_text,
            span=time_span(self.printed, *bounds) or time_span(self.printed, 0, len(self.tokens)),
            figures=self.figures,
            paper_text=self._paper_text(),
            adjusted_for=adjusted_for(self.printed.shown) if any(each.adjusted for each in self.figures) else "",
            ambiguous=tuple(doubts),
            source="sentence",
        )

    def _effect_only(self) -> Pasted | None:
        """Results with limits and without counts ("adjusted hazard ratio, 0.72; 95% CI, 0.55 to 0.92")."""
        printed = (figure for figure in self.figures if figure.measure in PAPER_MEASURES)
        effects = tuple(figure for figure in printed if figure.low and figure.high)
        if not effects:
            return None
        doubts = ("counts-left-out",) if self._holds_counts() else ()
        return Pasted(
            form="effect-only",
            figures=self.figures,
            paper_text=self._paper_text(),
            adjusted_for=adjusted_for(self.printed.shown),
            ambiguous=doubts,
            source="sentence",
        )

    def _holds_counts(self) -> bool:
        """Whether a number of people or events stands there that no table was made of."""
        if any(each.events for each in self._quantities(bare=False)):
            return True
        counts = [place for place, token in enumerate(self.tokens) if token.whole and place not in self.busy]
        behind = [{token.lower for token in self.tokens[place + 1 : place + 3]} for place in counts]
        return any(words & (PEOPLE | EVENT_NOUNS) for words in behind)

    def _paper_text(self) -> str:
        """The printed results in one piece, or joined by "; " where other words stand between them."""
        pieces = [self.printed.piece(first, after) for first, after in self.spans]
        if (
            len(self.spans) > 1
            and self.spans[-1][1] - self.spans[0][0] <= sum(b - a for a, b in self.spans) + len(self.spans) * 2
        ):
            pieces = [self.printed.piece(self.spans[0][0], self.spans[-1][1])]
        return " ".join("; ".join(pieces).split())
