"""A sentence that tells pairs: "Of 100 pairs, in 12 both healed, in 21 only A, in 9 only B, in 58 neither"."""

from __future__ import annotations

from collections.abc import Iterator, Sequence

from fourcount.record.entry.pasted.vocabulary import ARTICLES, BE, PEOPLE
from fourcount.record.entry.readings import Pasted, PastedGroup
from fourcount.record.entry.tokens import Token
from fourcount.record.entry.word_list import words

_PAIRS = ("pairs", "twins", "couples", "sets")
_NEITHER = ("neither", "none")
_KEYS = ("both", "only", *_NEITHER)
_BETWEEN = frozenset((",", ";", "and", "but", ":", "."))
_NO_LABEL = ARTICLES | BE | frozenset(words("in only one pairs member members by and with of periods times"))


def pair_sentence(tokens: Sequence[Token]) -> Pasted | None:
    """The four counts, both, only one, only the other, neither; None unless all are told.

    They sum to the number of pairs where that is printed; where no pairs are named, that is doubted.
    """
    said = next((place for place, token in enumerate(tokens) if token.lower in _PAIRS), None)
    before = tokens[max(0, said - 3) : said] if said is not None else ()
    whole = next((token.whole for token in before if token.whole), None)
    clauses = list(_clauses(tokens, 0 if said is None else said + 1))
    both = [clause for clause in clauses if _says(clause, ("both",))]
    neither = [clause for clause in clauses if _says(clause, _NEITHER)]
    only = [clause for clause in clauses if _says(clause, ("only",))]
    if (len(both), len(only), len(neither)) != (1, 2, 1):
        return None
    counts = [_count(clause) for clause in (*both, *only, *neither)]
    if whole is not None and sum(count.whole or 0 for count in counts) != whole:
        return None
    texts = [count.text for count in counts]
    labels = _label(only[0]), _label(only[1])
    named = {word.casefold() for label in labels for word in label.split()}
    return Pasted(
        form="pairs",
        groups=(
            PastedGroup(left_text=texts[0], right_text=texts[1], label=labels[0]),
            PastedGroup(left_text=texts[2], right_text=texts[3], label=labels[1]),
        ),
        words=" ".join(
            token.text for token in both[0] if _is_told(token, "both") and token.lower not in named | PEOPLE
        ),
        ambiguous=() if whole is not None else ("pairs-or-groups",),
        source="sentence",
    )


def _clauses(tokens: Sequence[Token], start: int) -> Iterator[list[Token]]:
    """The tokens from a place on, parted so that each piece holds one whole number."""
    clause: list[Token] = []
    for token in tokens[start:]:
        ends = token.lower in _BETWEEN or token.text in _BETWEEN
        if ends and any(each.kind == "number" for each in clause):
            yield clause
            clause = []
        elif token.text == "," and not any(each.lower in _KEYS for each in clause):
            clause = []
        elif not ends:
            clause.append(token)
    yield clause


def _says(clause: Sequence[Token], words: Sequence[str]) -> bool:
    numbers = [token for token in clause if token.kind == "number"]
    return len(numbers) == 1 and numbers[0].whole is not None and any(token.lower in words for token in clause)


def _count(clause: Sequence[Token]) -> Token:
    return next(token for token in clause if token.kind == "number")


def _label(clause: Sequence[Token]) -> str:
    return " ".join(token.text for token in clause if _is_told(token, "only")).rstrip(".")


def _event(clause: Sequence[Token], named: set[str]) -> str:
    """What happened to both, without who they are."""
    return " ".join(token.text for token in clause if _is_told(token, "both") and token.lower not in named | PEOPLE)


def _is_told(token: Token, but: str) -> bool:
    return token.kind == "word" and token.lower != but and (token.lower not in _NO_LABEL or token.text == "A")
