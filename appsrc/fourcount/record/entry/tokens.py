"""Printed text taken apart: numbers, words and marks, as they come out of a paper.

Nothing is understood here. What a number is of is for those who read the tokens; they quote the text by its places,
so that what goes into a field is what was printed.
"""

from __future__ import annotations

import re
from collections.abc import Sequence
from math import inf
from typing import Literal

import msgspec

from fourcount.record.entry.digits import alike_in_ascii
from fourcount.record.entry.number_words import UNITS, spelled_number
from fourcount.record.entry.word_list import EVENT_NOUNS, words

Kind = Literal["number", "word", "mark", "break"]

LONGEST_TEXT = 6_000
"""Longer text is a document, not a table or a sentence. It also keeps every later step short."""

_LONGEST_NUMBER = 15
_NARROW = dict.fromkeys(map(ord, "\u2000\u2001\u2002\u2003\u2004\u2005\u2006\u2007\u2008\u2009\u200a\u202f"), "\u00a0")
_RAISED = dict.fromkeys(map(ord, "\u2219\u2022\u2027\u22c5\u30fb"), "\u00b7")
_UNSEEN = re.compile("[\u00ad\u061c\u200b-\u200f\u202a-\u202e\u2060-\u206f\ufeff]+")
_CONTROLS = re.compile("[\x00-\x08\x0e-\x1f\x7f-\x84\x86-\x9f\ud800-\udfff]")
_BREAKS = re.compile("\r\n|[\r\v\f\x85\u2028\u2029]")
_ONES = frozenset(
    words(
        "patient patients participant participants child children woman women man men person one infant infants adult "
        "adults resident residents"
    )
)
_NO_BREAK = "\ue000"

_TOKEN = re.compile(
    r"(?P<version>[0-9]+(?:\.[0-9]+){2,})"
    r"|(?P<number>(?:[1-9][0-9]{0,2}(?P<group>[,'\u00a0])[0-9]{3}(?:(?P=group)[0-9]{3})*(?![0-9])|[0-9]+)"
    r"(?:[.\u00b7][0-9]+|,(?:[0-9]{1,2}(?![0-9])|(?<=\b0,)[0-9]+))?|[.\u00b7][0-9]+)"
    r"|(?P<word>CI(?=[0-9]+[.\u00b7,][0-9])|[^\W\d_][^\W_]*(?:'[^\W_]+|-[^\W\d_][^\W_]*|-[0-9]+(?![0-9.\u00b7,]))*(?:(?<=s)'(?=\s)|\.)?)"
    r"|(?P<break>\n\s*|\t)"
    r"|(?P<mark>[^\s])"
)
_PERCENT = re.compile(r"[ \u00a0]?%|[ \u00a0\n]per(?:[ -]?cent)\b", re.IGNORECASE)
_DECIMAL = re.compile("[.\u00b7]")


class Token(msgspec.Struct, frozen=True):
    """One piece of printed text with its places in it, the sign of percent and a minus included in a number.

    ``whole`` is set for whole numbers without a sign, ``decimals`` counts the printed decimals. ``lower`` is the text
    in small letters, without the full stop of an abbreviation.
    """

    kind: Kind
    text: str
    start: int
    end: int
    lower: str = ""
    value: float = 0.0
    whole: int | None = None
    decimals: int = 0
    percent: bool = False


class Print(msgspec.Struct, frozen=True):
    """A printed text made ready: as shown, and the tokens of it, whose places are those in ``shown``."""

    shown: str
    tokens: tuple[Token, ...]

    def piece(self, first: int, after: int) -> str:
        """The text from one token up to, but without, another."""
        after = min(after, len(self.tokens))
        if first >= after:
            return ""
        return self.shown[self.tokens[first].start : self.tokens[after - 1].end].strip()


def presentable(text: str) -> str:
    """The text without characters that nobody sees: controls, joiners, marks of direction. Breaks become ``\\n``."""
    cut = _BREAKS.sub("\n", text[: LONGEST_TEXT + 1])
    return _CONTROLS.sub(" ", _UNSEEN.sub("", cut))


def take_apart(text: str) -> Print:
    """A printed text as tokens. Linear in its length, which is cut at ``LONGEST_TEXT``."""
    shown = presentable(text)
    return Print(shown, tuple(_with_spelled(_tokens(in_ascii(shown)))))


def as_sentence(printed: Print) -> Print:
    """The same without breaks of lines, and with thousands that a space bar's space parts ("10 418") as one number.

    Two numbers side by side mean nothing else in a sentence; in a table they are two cells.
    """
    found: list[Token] = []
    for token in printed.tokens:
        joined = _joined(printed, found, token)
        if joined:
            found[-1] = joined
        elif token.kind != "break":
            found.append(token)
    return Print(printed.shown, tuple(found))


def with_totals_joined(printed: Print) -> Print:
    """The same with thousands behind "n =" as one number though a space parts them ("n = 1 500")."""
    found: list[Token] = []
    for token in printed.tokens:
        joined = _joined(printed, found, token) if [each.text for each in found[-2:-1]] == ["="] else None
        if joined:
            found[-1] = joined
        else:
            found.append(token)
    return Print(printed.shown, tuple(found))


def _joined(printed: Print, found: Sequence[Token], token: Token) -> Token | None:
    """The number that two tokens with a space between them make, None where they are two numbers."""
    last = found[-1] if found else None
    spaced = last is not None and printed.shown[last.end : token.start] == " "
    if last is None or not spaced or not last.kind == token.kind == "number" or not _continues(last, token):
        return None
    text = printed.shown[last.start : token.start] + token.text
    whole = (last.whole or 0) * 1000 + (token.whole or 0)
    return Token("number", text, last.start, token.end, "", float(whole), whole, 0, token.percent)


def _continues(last: Token, token: Token) -> bool:
    if last.whole is None or token.whole is None or last.percent or last.text[0] == "0":
        return False
    head = len(last.text) <= 3 or " " in last.text
    return head and len(token.text) == 3 and last.whole < 10**9 and not last.lower


def in_ascii(shown: str) -> str:
    """Character for character in ASCII, but narrow and no-break spaces stay apart from a space bar's own."""
    if shown.isascii():
        return shown
    kept = shown.translate(_NARROW).translate(_RAISED).replace("\u00a0", _NO_BREAK)
    return alike_in_ascii(kept).replace(_NO_BREAK, "\u00a0").replace("\u2265", ">").replace("\u2264", "<")


def _tokens(text: str) -> list[Token]:
    found: list[Token] = []
    place = 0
    while match := _TOKEN.search(text, place):
        place = match.end()
        kind = match.lastgroup if match.lastgroup != "group" else "number"
        if kind == "number" and len(match[0]) <= _LONGEST_NUMBER:
            token, place = _number(match, text, found)
        elif kind == "mark" and match[0] == "\u221e":
            token = Token("number", match[0], match.start(), place, "", inf)
        elif kind == "mark" and match[0] == "-" and _is_sign(text, place, found):
            continue
        else:
            plain_kind: Kind = kind if kind in ("word", "mark", "break") else "word"  # type: ignore[assignment]
            token = Token(plain_kind, match[0], match.start(), place, match[0].casefold().rstrip("."))
        found.append(token)
    return found


def _is_sign(text: str, place: int, found: list[Token]) -> bool:
    """Whether a dash is a minus: a number follows at once, and none stands before it."""
    follows = text[place : place + 2]
    if not (follows[:1].isdecimal() or (follows[:1] in (".", "\u00b7", "\u221e") and follows != ".")):
        return False
    level = [each.lower for each in found[-2:-1]] == ["ci"] and found[-1].percent
    if level and text[place - 2].isspace():
        return True
    return not found or not (found[-1].kind == "number" or found[-1].text in (")", "]"))


def _number(match: re.Match[str], text: str, found: list[Token]) -> tuple[Token, int]:
    """The number at a match, with a minus before it and a sign of percent after it."""
    digits = match[0]
    start, end = match.start(), match.end()
    negative = text[start - 1 : start] == "-" and (not found or found[-1].end < start)
    group = match["group"]
    plain = digits.replace(group, "") if group else digits
    plain = _DECIMAL.sub(".", plain).replace(",", ".")
    decimals = len(plain.partition(".")[2])
    percent = _PERCENT.match(text, end)
    if percent:
        end = percent.end()
    value = float(plain)
    whole = int(plain) if "." not in plain and not negative else None
    start -= negative
    printed = text[start : match.end()]
    return Token("number", printed, start, end, "", -value if negative else value, whole, decimals, bool(percent)), end


def _none_of(tokens: list[Token], place: int) -> bool:
    """Whether "no" counts people or events: "No deaths occurred among 120 patients", not "no difference in 412"."""
    behind = tokens[place + 1 : place + 8]
    if not behind or behind[0].lower not in EVENT_NOUNS | _ONES:
        return False
    link = next((step for step, token in enumerate(behind) if token.lower in ("among", "in", "of")), len(behind))
    follows = [token for token in behind[link + 1 :] if token.lower != "the"][:1]
    return all(token.kind == "word" for token in behind[:link]) and bool(follows) and follows[0].kind == "number"


def _with_spelled(tokens: list[Token]) -> list[Token]:
    """The tokens with numbers in words ("thirty-two") as numbers."""
    found: list[Token] = []
    place = 0
    while place < len(tokens):
        token = tokens[place]
        if token.lower in ("none", "zero") and [each.lower for each in tokens[place + 1 : place + 2]] == ["of"]:
            found.append(Token("number", "0", token.start, token.end, token.lower, 0.0, 0))
            place += 1
            continue
        if token.text in ("No", "no") and _none_of(tokens, place):
            found.append(Token("number", "0", token.start, token.end, token.lower, 0.0, 0))
            place += 1
            continue
        if token.kind == "word" and token.lower.partition("-")[0] in UNITS:
            length, value = spelled_number([each.lower for each in tokens[place : place + 6]])
            if length:
                last = tokens[place + length - 1]
                text = str(value)
                found.append(Token("number", text, token.start, last.end, token.lower, float(value), value))
                place += length
                continue
        found.append(token)
        place += 1
    return found
