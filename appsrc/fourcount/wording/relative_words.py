"""The words of the picture of a relative figure: what it is in people first, then what the figure sounds like."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.record.outcome import Outcome
from fourcount.wording import limits, names, numbers, of_people
from fourcount.wording.patient import titles
from fourcount.wording.picture_words import USUAL_WORDS, Drawn, Said, people_of
from fourcount.wording.subject import subject

IN_PEOPLE = "What it is in people"
SOUNDS = "What the relative figure sounds like"
THE_SAME = "the same"
EVERYBODY = "all {people}"
FULL = "full length: the larger risk"
SENTENCE = (
    "In people: {reference} {without}, {index} {with_}, {difference}, drawn as bars of all {people} people. "
    "What the relative figure, {relative}, sounds like: the same two risks drawn as shares of the larger one."
)


class Panel(NamedTuple):
    """One pair of bars: its title, what stands over each bar, its value at the right, and the ends of its scale."""

    title: str
    labels: tuple[str, str]
    values: tuple[str, str]
    ends: tuple[str, str]


class RelativeWords(NamedTuple):
    """Both panels, and the whole in one sentence for those who do not see it."""

    people: Panel
    sounds: Panel
    sentence: str


def relative_words(outcome: Outcome, drawn: Drawn, said: Said = USUAL_WORDS) -> RelativeWords:
    """All words of the picture; somebody is affected without, or there would be no relative figure."""
    people = people_of(drawn)
    all_people = numbers.whole(people)
    counts = tuple(
        f"{of_people.affected(risk, people)} in {all_people}" for risk in (drawn.without_risk, drawn.with_risk)
    )
    without, with_ = counts
    without_title, with_title = titles(outcome)
    labels = (said.without_title or without_title, said.with_title or with_title)
    spoken = subject(outcome)
    relative = relative_change(drawn)
    return RelativeWords(
        people=Panel(IN_PEOPLE, labels, (without, with_), ("0", EVERYBODY.format(people=all_people))),
        sounds=Panel(SOUNDS, labels, ("", relative), ("0", FULL)),
        sentence=SENTENCE.format(
            reference=names.label_within(spoken, "reference"),
            index=names.label_within(spoken, "index"),
            without=without,
            with_=with_,
            difference=_difference(drawn, people),
            people=all_people,
            relative=relative,
        ),
    )


def relative_change(drawn: Drawn) -> str:
    """``46% lower``, from the risks themselves."""
    if drawn.with_risk == drawn.without_risk:
        return THE_SAME
    change = drawn.with_risk / drawn.without_risk - 1
    return f"{numbers.percent_whole(abs(change))} {limits.LOWER if change < 0 else limits.HIGHER}"


def _difference(drawn: Drawn, people: int) -> str:
    change = drawn.with_risk - drawn.without_risk
    if not change:
        return f"{THE_SAME} number"
    return f"{of_people.apart(change, people)} {limits.side(change)} in {numbers.whole(people)}"
