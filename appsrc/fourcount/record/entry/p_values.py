"""P values as print has them: "P = 0.001", "p<.05", "P value of 0.03", "p = 1.2e-4"."""

from __future__ import annotations

import re
from collections.abc import Sequence
from typing import Literal

import msgspec

from fourcount.record.entry.readings import PrintedNumber
from fourcount.record.entry.tokens import Token

Relation = Literal["=", "<", ">"]

_P_WORDS = ("p", "p-value", "p-values")
_NOT_OF_AN_EFFECT = ("interaction", "trend", "heterogeneity", "noninferiority", "non-inferiority", "homogeneity")
_BETWEEN = ("value", "values", "of", "was", "is", "for", "the", "by", "less", "than", "=", ":", "<", ">")
_FARTHEST = 9
_STATISTICS = ("\u03c72", "\u03c7\u00b2", "chi2", "x2", "chi-square", "chi-squared", "z", "t", "f", "df", "d.f")
_EXPONENT = re.compile(r"e-([0-9]{1,3})")


class FoundP(msgspec.Struct, frozen=True):
    """A p with the place after it; ``own`` unless it is that of an interaction, a trend and the like."""

    relation: Relation
    number: PrintedNumber
    after: int
    own: bool


def p_at(tokens: Sequence[Token], place: int) -> FoundP | None:
    """The p that begins at a token, None where none does."""
    if tokens[place].lower not in _P_WORDS:
        return None
    own = True
    relation: Relation = "="
    for step in range(place + 1, min(place + _FARTHEST, len(tokens))):
        token = tokens[step]
        if token.kind == "number":
            number, after = _number(tokens, step)
            equal = any(each.text == "=" for each in tokens[place + 1 : step])
            told = number.decimals > 0 or relation != "=" or equal or number.value in (0, 1)
            return FoundP(relation, number, after, own) if told else None
        if token.lower in _NOT_OF_AN_EFFECT:
            own = False
        elif token.lower not in _BETWEEN:
            return None
        elif token.text in ("<", ">"):
            relation = "<" if token.text == "<" else ">"
        elif token.lower == "less":
            relation = "<"
    return None


def _number(tokens: Sequence[Token], place: int) -> tuple[PrintedNumber, int]:
    """The number at a place, with an exponent behind it ("1.2e-4", "1.2 x 10-4"), and the place after it."""
    token = tokens[place]
    following = [each.text.casefold() for each in tokens[place + 1 : place + 6]]
    digits, length = "", 0
    if following and (match := _EXPONENT.fullmatch(following[0])):
        digits, length = match[1], 1
    elif following[:2] in (["x", "10"], ["\u00d7", "10"]):
        rest = [text for text in following[2:] if text != "^"]
        length = 2 + (len(following) - 2 - len(rest))
        if rest[:1] == ["-"] and rest[1:2] and rest[1].isdecimal():
            digits, length = rest[1], length + 2
        elif rest and rest[0].startswith("-") and rest[0][1:].isdecimal():
            digits, length = rest[0][1:], length + 1
    if not digits or len(digits) > 3:
        return PrintedNumber(text=token.text, value=token.value, decimals=token.decimals), place + 1
    text = token.text + "".join(following[:length])
    value, decimals = token.value * 10.0 ** -int(digits), token.decimals + int(digits)
    return PrintedNumber(text=text, value=value, decimals=decimals), place + 1 + length


def statistic_at(tokens: Sequence[Token], place: int) -> int:
    """The place after a test statistic, "\u03c72 = 11.2" or "t(12) = 2.1", which is no result; 0 where none begins."""
    if tokens[place].lower not in _STATISTICS:
        return 0
    step = place + 1
    if [token.text for token in tokens[step : step + 1]] == ["("]:
        step += 3
    if step < len(tokens) and tokens[place].lower in _STATISTICS[:6] and tokens[step].kind == "number":
        return step + 1
    following = tokens[step : step + 2]
    return step + 2 if len(following) == 2 and following[0].text == "=" and following[1].kind == "number" else 0
