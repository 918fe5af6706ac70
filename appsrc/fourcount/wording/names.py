"""What things are called in a sentence: the reader's own words, or stand-ins where none were typed."""

from __future__ import annotations

from typing import TYPE_CHECKING, Literal

from fourcount.record.outcome import (
    Column,
    Design,
    Effect,
    EffectOnly,
    Outcome,
    Pairs,
    PersonTime,
    Position,
    RiskAtTime,
)
from fourcount.wording import event_names

if TYPE_CHECKING:
    from fourcount.appraisal.findings.patient import CarriedEffect

Group = Literal["index", "reference"]

WITH_DESIGNS = ("trial", "paired")  # people had what the group is called after
STAND_INS = {"index": "index group", "reference": "reference group"}
SIDES: dict[Design, dict[Position, str]] = {
    "matched": {"first": "cases", "second": "controls"},
    "before-after": {"first": "after", "second": "before"},
    "paired": {"first": "first side", "second": "second side"},
}
"""What the sides of pairs are by their design; the grid calls them so too."""

TIMES = ("before", "after", "during", "since", "at", "in", "on", "without", "with")
PEOPLE = "people "
WHO = "people who "
"""A label that begins so stands behind "people" as it is."""

EVENT_STAND_IN = "had the event"
COLUMN_STAND_INS: dict[Column, str] = {"left": EVENT_STAND_IN, "right": "did not have the event"}
"""What an unnamed column says, whichever of the two is counted: print puts the events left (common practice)."""

EXPOSED: dict[Column, str] = {"left": "was exposed", "right": "was not exposed"}
NAMED_EVENT = "had the event “{heading}”"
WITHOUT = "did not have the outcome “{outcome}”"
DID_NOT = "did not"
ALL_OTHERS = "all others"
VERBS = ("did", "had", "was", "were", "got")  # a heading that begins so is a sentence's words already
NOT_COUNTED = (Pairs, PersonTime, RiskAtTime, EffectOnly)
"""Tables whose figures are not shares of people who were followed alike."""

EFFECT_NAMES = {"odds_ratio": "odds ratio", "hazard_ratio": "hazard ratio", "rate_ratio": "rate ratio"}
"""Effects that are called the same in every design."""

PREPOSITIONS = ("within", "in", "at", "over", "after", "by", "during")


def bare(text: str) -> str:
    """Text on one line, without a closing full stop, which would end our sentence ("b.i.d." stays)."""
    text = " ".join(text.split())
    return text[:-1].rstrip() if text.endswith(".") and text.count(".") == 1 else text


def label(outcome: Outcome, group: Group) -> str:
    """The group's label as typed, or its stand-in."""
    text = outcome.index_label_text if group == "index" else outcome.reference_label_text
    return bare(text) or _stand_in(outcome, group)


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
    """A group after "people": "with usual care" in a trial or a crossover, elsewhere a form that fits any noun."""
    within = label_within(outcome, group)
    if outcome.design == "before-after":
        return within if _is_time(within) else f"in the period “{label(outcome, group)}”"
    if _by_case(outcome) and within.lower() in SIDES["matched"].values():
        return f"among {within}"
    if unnamed_side(outcome, group):
        return f"on the {within}"
    if not labelled(outcome, group):
        return f"in the {STAND_INS[group]}"
    if within.lower().startswith(WHO):
        return within[len(PEOPLE) :]
    if outcome.design in WITH_DESIGNS:
        return f"with {within}"
    return f"in the group “{label(outcome, group)}”"


def unnamed_side(outcome: Outcome, group: Group) -> bool:
    """Whether this is a side of pairs that nobody has named, and that the design has no name for."""
    return outcome.design == "paired" and isinstance(outcome.table, Pairs) and not labelled(outcome, group)


def by_time(outcome: Outcome) -> bool:
    """Whether both groups are the same people at two times, which a sentence puts behind the event: "fell before"."""
    groups: tuple[Group, Group] = ("index", "reference")
    return outcome.design == "before-after" and all(_is_time(label_within(outcome, group)) for group in groups)


def _is_time(label: str) -> bool:
    return label.split(" ", 1)[0].lower() in TIMES


def _by_case(outcome: Outcome) -> bool:
    return outcome.design == "matched" and isinstance(outcome.table, (Pairs, EffectOnly))


def _stand_in(outcome: Outcome, group: Group) -> str:
    """An unnamed group: its side where the design tells it."""
    sides = SIDES.get(outcome.design)
    if sides is None or (outcome.design != "before-after" and not isinstance(outcome.table, Pairs | EffectOnly)):
        return STAND_INS[group]
    return sides["first" if (group == "index") == (outcome.index_group == "first") else "second"]


def outcome_name(outcome: Outcome) -> str:
    """The outcome's name, which is the left column's; where the right one is counted, it says so."""
    name = event_names.without_unit(outcome.name_text.strip())
    return name if not name or outcome.counted == "left" else f"Not “{mid_sentence(name)}”"


def event_words(outcome: Outcome) -> str:
    """The counted event as the reader's sentence says it: "fell at least once"."""
    words, heading = bare(outcome.event_words_text), bare(outcome.event_heading_text)
    if words and event_names.without_unit(words) == words:
        return event_names.of_people(words) or words
    heading = words or heading  # words with a unit are the name of a table's row, not a sentence's
    return _headed(heading) if heading else _unnamed_event(outcome)


def other_words(outcome: Outcome) -> str:
    """The other outcome beside the counted one: "did not fall", or a bare "did not" where only the event is named."""
    name = _other_name(outcome)
    if name:
        return event_names.of_people(name) or name
    return DID_NOT if _event_name(outcome) else _stand_ins(outcome)[_other_column(outcome)]


def event_key(outcome: Outcome) -> str:
    """The counted event in a picture's key."""
    heading, words = bare(outcome.event_heading_text), bare(outcome.event_words_text)
    if heading:
        return event_names.without_unit(heading)
    return event_names.of_people(words) or words or _unnamed_event(outcome)


def other_key(outcome: Outcome) -> str:
    """The other outcome in a picture's key, beside that of the event; only of nouns is it said what people lack."""
    heading, words = bare(outcome.other_heading_text), bare(outcome.other_words_text)
    if heading:
        return event_names.without_unit(heading)
    if words:
        return event_names.of_people(words) or words
    event = _event_name(outcome)
    if event:
        return event_names.lacked_by(event) or ALL_OTHERS
    return _stand_ins(outcome)[_other_column(outcome)]


def _unnamed_event(outcome: Outcome) -> str:
    """The counted column without a name: as the lack of the other one if that is named, else by its place."""
    other = _other_name(outcome)
    if other:
        return event_names.lacked_by(other) or WITHOUT.format(outcome=other)
    return _stand_ins(outcome)[outcome.counted]


def _headed(heading: str) -> str:
    """A short name of the event where no words were typed: with a verb where it has one, or can only take one."""
    if heading.split(" ", 1)[0].lower() in VERBS:
        return heading
    return event_names.of_people(heading) or NAMED_EVENT.format(heading=event_names.without_unit(heading))


def _stand_ins(outcome: Outcome) -> dict[Column, str]:
    """What unnamed columns say: in a matched case-control study people were exposed or not."""
    return EXPOSED if outcome.design == "matched" else COLUMN_STAND_INS


def _event_name(outcome: Outcome) -> str:
    return bare(outcome.event_words_text) or bare(outcome.event_heading_text)


def _other_name(outcome: Outcome) -> str:
    return bare(outcome.other_words_text) or event_names.without_unit(bare(outcome.other_heading_text))


def _other_column(outcome: Outcome) -> Column:
    return "right" if outcome.counted == "left" else "left"


def span(outcome: Outcome) -> str:
    """The study's time span without a preposition where it is one, else as typed: "12 months", "median 2 years"."""
    typed = bare(outcome.span_text)
    if not typed:
        return ""
    from fourcount.wording.durations import span_said  # an empty window needs none of it

    return span_said(typed)


def within_span(outcome: Outcome) -> str:
    """The time span after a verb: "within 12 months", or "" where none was typed; a survey has no "within"."""
    return within(_common_span(outcome), outcome)


def within(span: str, outcome: Outcome) -> str:
    """A time span after a verb."""
    if not span or _begins_with_preposition(span):
        return span
    return f"({span})" if outcome.design == "survey" else f"within {span}"


def over_span(outcome: Outcome) -> str:
    """The time span under a figure: "over 12 months", or "" where none was typed; a survey's is when it was done."""
    return _common_span(outcome) if outcome.design == "survey" else over(_common_span(outcome))


def over(span: str) -> str:
    """A time span with its preposition."""
    return span if not span or _begins_with_preposition(span) else f"over {span}"


def _common_span(outcome: Outcome) -> str:
    """The time for which everybody was followed; counts of people followed for different times have none."""
    varied = outcome.follow_up_varied and not isinstance(outcome.table, NOT_COUNTED)
    return "" if varied else span(outcome)


def _begins_with_preposition(span: str) -> bool:
    return span.split(" ", 1)[0].lower() in PREPOSITIONS


def not_counted(outcome: Outcome) -> str:
    """The other outcome where it is only counted, not named."""
    return "not having the event" if outcome.counted == "left" else "having the event"


def if_caused(outcome: Outcome) -> str:
    """What a number needed supposes where the groups were not made alike by chance."""
    return "" if outcome.design == "trial" else ", if the difference is caused by it"


def risk_name(outcome: Outcome) -> str:
    """What a proportion of people is called: a survey finds a prevalence, not a risk."""
    return "prevalence" if outcome.design == "survey" else "risk"


def effect_name(outcome: Outcome, effect: Effect | CarriedEffect) -> str:
    """What an effect is called in this design: in a survey the ratio, or the difference, of two prevalences."""
    if effect == "risk_difference":
        return f"{risk_name(outcome)} difference"
    return EFFECT_NAMES.get(effect, f"{risk_name(outcome)} ratio")
