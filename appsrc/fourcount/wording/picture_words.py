"""The words inside a picture: captions, key and note, which have to survive a screenshot.

Every number is computed from the risks, never from the icons that were drawn.
"""

from __future__ import annotations

from typing import Literal, NamedTuple, Protocol

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import names, numbers, of_people
from fourcount.wording.axis import axis_words
from fourcount.wording.form import patient_choices
from fourcount.wording.headline import people_for
from fourcount.wording.limits import interval_name
from fourcount.wording.patient import titles
from fourcount.wording.subject import subject

KeyState = Literal["affected", "added", "uncertain", "avoided", "others"]

LONGEST_KEY = 40
WELCOME_DRAWN = "Filled: people with the welcome outcome."
TOO_SMALL = "Too small to draw as people."
TOO_CLOSE = "A difference too small to draw as people."
ONE_IN_THE_LARGEST = 0.00005  # half an icon of ten thousand
MORE_PEOPLE = "{picture} shows {people} people, not 100."
EACH = {"two": "Each picture", "one": "The picture"}
BARS_FROM = 0.1
BARS = "So many of 1,000 are read more exactly as bars."
"""From 100 of 1,000 on readers of arrays made more errors than readers of bars (McCaffery and colleagues 2012)."""

BAR_END = "The bars run to {end}, not to 100%."
EITHER_WAY = "{words} either way"
OPEN = "not settled by the study"
INTERVAL_DRAWN = "{group}: {interval} {low} to {high} in {people}."
NO_INTERVAL = "The interval has no limit on one side here, so it is not drawn."


class Side(NamedTuple):
    """The captions of one group: its title, the count, the percentage, and the other frame."""

    title: str
    number: str
    percent: str
    other: str


class KeyEntry(NamedTuple):
    """One state of the key and what it means here."""

    state: KeyState
    text: str


class PictureWords(NamedTuple):
    """All words of a picture.

    ``key`` has every state that could be drawn; a picture shows the entries of those that are. ``note`` says a
    denominator other than 100, that the risks are too small to draw, or that bars are easier to read. ``lines`` belong
    below a picture that leaves the window. ``bar_ends`` are the ends of the scale on which the bars are drawn.
    """

    without: Side
    with_: Side
    key: tuple[KeyEntry, ...]
    note: str
    lines: tuple[str, ...] = ()
    bar_ends: tuple[str, str] = ("", "")


class Said(NamedTuple):
    """What a page calls things where it has words of its own; "" takes those of the window.

    ``turned`` says that people without the counted outcome are drawn as affected; ``event`` and ``other`` are then
    the words of that side.
    """

    event: str = ""
    other: str = ""
    without_title: str = ""
    with_title: str = ""
    avoided: str = ""
    added: str = ""
    uncertain: str = ""
    turned: bool = False


USUAL_WORDS = Said()


class Drawn(Protocol):
    """What words need to know of a plan."""

    @property
    def denominator(self) -> int | None: ...
    @property
    def without_risk(self) -> float: ...
    @property
    def with_risk(self) -> float: ...
    @property
    def low(self) -> float | None: ...
    @property
    def high(self) -> float | None: ...


class Asked(Protocol):
    """What words need to know of a picture's options."""

    @property
    def arrangement(self) -> str: ...
    @property
    def uncertainty(self) -> bool: ...


def people_of(drawn: Drawn) -> int:
    """Of how many people the captions speak: those drawn, else a round number that says what is so."""
    return drawn.denominator or people_for(drawn.without_risk, drawn.with_risk, drawn.with_risk - drawn.without_risk)


def picture_words(
    outcome: Outcome,
    findings: OutcomeFindings,
    choices: Choices,
    drawn: Drawn,
    asked: Asked,
    said: Said = USUAL_WORDS,
    bar_top: float = 1.0,
) -> PictureWords:
    """All words of a picture of two risks; ``bar_top`` is the risk at which its bars would be full."""
    people = people_of(drawn)
    level = interval_name(patient_choices(findings, choices).level)
    without_title, with_title = titles(outcome)
    outcome = subject(outcome)
    other = said.other or _other_words(outcome, said)
    low, _, high = axis_words("risk", bar_top)
    return PictureWords(
        without=_side(said.without_title or without_title, drawn.without_risk, people, other),
        with_=_side(said.with_title or with_title, drawn.with_risk, people, other),
        key=_key(outcome, asked, said),
        note=" ".join(part for part in _notes(outcome, drawn, asked, said, level, bar_top) if part),
        bar_ends=(low, high),
    )


def _side(title: str, risk: float, people: int, other: str) -> Side:
    return Side(
        title=title,
        number=f"{of_people.affected(risk, people)} in {numbers.whole(people)}",
        percent=f"({of_people.percentage(risk, people)})",
        other=f"{of_people.unaffected(risk, people)} {other}",
    )


def _other_words(outcome: Outcome, said: Said) -> str:
    return names.event_words(outcome) if said.turned else names.other_words(outcome)


def _key(outcome: Outcome, asked: Asked, said: Said) -> tuple[KeyEntry, ...]:
    event, other = names.event_key(outcome), names.other_key(outcome)
    event, other = (other, event) if said.turned else (event, other)
    event, other = said.event or event, said.other or other
    if asked.arrangement == "one":
        event, other = _either_way(event), _either_way(other)
    return (
        KeyEntry("affected", event),
        KeyEntry("added", said.added or _changed("added", outcome, said)),
        KeyEntry("uncertain", said.uncertain or OPEN),
        KeyEntry("avoided", said.avoided or _changed("avoided", outcome, said)),
        KeyEntry("others", other),
    )


def _either_way(words: str) -> str:
    """Of one picture for both groups; who is left when all states are named is that either way."""
    return words if words == names.ALL_OTHERS else EITHER_WAY.format(words=words)


def _changed(verb: str, outcome: Outcome, said: Said) -> str:
    """``falls avoided, on balance``: of a welcome outcome they are lost or gained."""
    if outcome.welcome and not said.turned:
        verb = {"avoided": "lost", "added": "gained"}[verb]
    named = outcome.counted == "left" and not said.turned
    name = names.mid_sentence(names.outcome_name(outcome)) if named else ""
    return f"{name} {verb}, on balance" if name and len(name) <= LONGEST_KEY else f"{verb}, on balance"


def _notes(outcome: Outcome, drawn: Drawn, asked: Asked, said: Said, level: str, bar_top: float) -> tuple[str, ...]:
    """What has to be said of the picture itself, whatever else stands on the page."""
    welcome = WELCOME_DRAWN if outcome.welcome and not said.turned and drawn.denominator else ""
    scale = ""
    if drawn.denominator is None:
        scale = TOO_CLOSE if too_close(drawn) else TOO_SMALL
    elif drawn.denominator != 100 and asked.arrangement in EACH:
        scale = MORE_PEOPLE.format(picture=EACH[asked.arrangement], people=numbers.whole(drawn.denominator))
    bars = drawn.denominator is None or asked.arrangement not in EACH
    ends = BAR_END.format(end=numbers.percent_given(bar_top)) if bars and bar_top < 1 else ""
    many = max(drawn.without_risk, drawn.with_risk) >= BARS_FROM and drawn.denominator == 1_000
    hint = BARS if many and asked.arrangement in EACH and said == USUAL_WORDS else ""
    return welcome, scale, hint, ends, _interval(outcome, drawn, asked, said, level)


def too_close(drawn: Drawn) -> bool:
    """Whether both risks could be drawn as people, and only the difference between them could not."""
    least = min(side for risk in (drawn.without_risk, drawn.with_risk) for side in (risk, 1 - risk))
    return least >= ONE_IN_THE_LARGEST


def _interval(outcome: Outcome, drawn: Drawn, asked: Asked, said: Said, level: str) -> str:
    if not asked.uncertainty:
        return ""
    if drawn.low is None or drawn.high is None:
        return NO_INTERVAL
    people = people_of(drawn)
    return INTERVAL_DRAWN.format(
        group=said.with_title or names.sentence_case(names.in_group(outcome, "index")),
        interval=level,
        low=of_people.affected(drawn.low, people),
        high=of_people.affected(drawn.high, people),
        people=numbers.whole(people),
    )
