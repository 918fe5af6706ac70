"""What things are called in a sentence: the reader's own words, or stand-ins where none were typed."""

from __future__ import annotations

from typing import Literal

from fourcount.record.outcome import Outcome

Group = Literal["index", "reference"]

STAND_INS = {"index": "index group", "reference": "reference group"}
EVENT_STAND_IN = "had the event"
OTHER_STAND_IN = "did not have the event"
WITHOUT = "did not have the outcome “{outcome}”"
PREPOSITIONS = ("within", "in", "at", "over", "after", "by", "during")


def label(outcome: Outcome, group: Group) -> str:
    """The group's label exactly as typed, or its stand-in."""
    text = outcome.index_label_text if group == "index" else outcome.reference_label_text
    return text.strip() or STAND_INS[group]


def label_within(outcome: Outcome, group: Group) -> str:
    """The label inside a sentence."""
    return mid_sentence(label(outcome, group))


def mid_sentence(text: str) -> str:
    """Text inside a sentence: the first word loses its capital if that is its only one ("Usual", not "ACE")."""
    first = text.split(" ", 1)[0]
    stem = first.replace("-", "").replace("'", "").replace("’", "")
    plain = len(stem) > 1 and stem.isalpha() and stem[0].isupper() and stem[1:].islower()
    return text[0].lower() + text[1:] if plain else text


def sentence_case(text: str) -> str:
    """Text at the beginning of a sentence."""
    return text[:1].upper() + text[1:]


def labelled(outcome: Outcome, group: Group) -> bool:
    """Whether the reader named this group."""
    return bool((outcome.index_label_text if group == "index" else outcome.reference_label_text).strip())


def in_group(outcome: Outcome, group: Group) -> str:
    """A group after "people": "with usual care" in a trial, elsewhere a form that fits any noun."""
    if not labelled(outcome, group):
        return f"in the {STAND_INS[group]}"
    if outcome.design == "trial":
        return f"with {label_within(outcome, group)}"
    return f"in the group “{label(outcome, group)}”"


def event_words(outcome: Outcome) -> str:
    """The counted event as the reader's sentence says it: "fell at least once"."""
    words = outcome.event_words_text.strip()
    heading = outcome.event_heading_text.strip()
    if words or heading:
        return words or f"{EVENT_STAND_IN} “{heading}”"
    other = outcome.other_words_text.strip() or outcome.other_heading_text.strip()
    return WITHOUT.format(outcome=other) if other else EVENT_STAND_IN


def other_words(outcome: Outcome) -> str:
    """The other outcome as a sentence says it: "did not fall"."""
    named = outcome.other_words_text.strip() or outcome.other_heading_text.strip()
    if named:
        return named
    return "did not" if outcome.event_words_text.strip() else OTHER_STAND_IN


def other_words_alone(outcome: Outcome) -> str:
    """The other outcome where it is the one that is counted, and a bare "did not" would say nothing."""
    named = outcome.other_words_text.strip() or outcome.other_heading_text.strip()
    event = outcome.event_words_text.strip() or outcome.event_heading_text.strip()
    return named or (WITHOUT.format(outcome=event) if event else OTHER_STAND_IN)


def event_key(outcome: Outcome) -> str:
    """The counted event in a picture's key."""
    return outcome.event_heading_text.strip() or outcome.event_words_text.strip() or EVENT_STAND_IN


def other_key(outcome: Outcome) -> str:
    """The other outcome in a picture's key."""
    return outcome.other_heading_text.strip() or outcome.other_words_text.strip() or OTHER_STAND_IN


def within_span(outcome: Outcome) -> str:
    """The time span after a verb: "within 12 months", or "" where none was typed; a survey has no "within"."""
    span = outcome.span_text.strip()
    if not span or _begins_with_preposition(span):
        return span
    return f"({span})" if outcome.design == "survey" else f"within {span}"


def over_span(outcome: Outcome) -> str:
    """The time span under a figure: "over 12 months", or "" where none was typed."""
    span = outcome.span_text.strip()
    return span if not span or _begins_with_preposition(span) else f"over {span}"


def _begins_with_preposition(span: str) -> bool:
    return span.split(" ", 1)[0].lower() in PREPOSITIONS


def risk_name(outcome: Outcome) -> str:
    """What a proportion of people is called: a survey finds a prevalence, not a risk."""
    return "prevalence" if outcome.design == "survey" else "risk"
