"""One outcome said to a patient: so many without, so many with, the difference, and that nobody knows which people.

Whole people, one denominator, both frames, at about a sixth-grade reading level; no statistics. The unwelcome outcome
is drawn throughout, so that benefits and harms on one page look alike; the difference is said of whichever side can be
said without a double negative.
"""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import PatientFindings
from fourcount.record.outcome import Certainty, Outcome
from fourcount.wording import event_names, names, numbers, of_people, plain, plain_starts, plain_texts, spans
from fourcount.wording.picture_sentence import WHICH_PEOPLE
from fourcount.wording.plain_groups import bounded, group_phrase, group_title
from fourcount.wording.plain_risks import PlainRisks
from fourcount.wording.subject import subject


class PlainSide(NamedTuple):
    """One group: "With usual care", "12 in 100", "(12%)", "fall", "88 in 100 do not"."""

    title: str
    number: str
    percent: str
    event: str
    other: str


class PlainWords(NamedTuple):
    """All that one outcome's page says; what does not hold is "".

    ``who`` goes behind the title where other pages beside this one show other people, in place of ``lead``.
    ``turned`` says which side is drawn where ``summary`` speaks of the other. ``open_``, ``rounded`` and ``doubt``
    belong to ``summary``. ``avoided`` and ``added`` stand in the key and claim no cause where there is a ``doubt``.
    ``certainty`` is always there.
    """

    title: str
    who: str
    lead: str
    turned: str
    without: PlainSide
    with_: PlainSide
    event: str
    other: str
    avoided: str
    added: str
    summary: str
    open_: str
    rounded: str
    doubt: str
    which: str
    certainty: str
    range_: str
    relative: str
    other_starts: tuple[str, ...]
    study: str

    def told(self, *, ranged: bool = False, printed: bool = False) -> str:
        """The whole page as one text, for those who hear it; with the range, and with what only print says."""
        sides = [
            f"{side.title}, {side.number} {side.percent} {side.event}, and {side.other}."
            for side in (self.without, self.with_)
        ]
        before = (f"{self.title}.", self.lead, self.turned, *sides, self.range_ if ranged else "")
        more = (self.relative, *self.other_starts) if printed else ()
        after = (self.summary, self.open_, self.rounded, self.doubt, self.which, self.certainty)
        parts = (*before, *after, *more, self.study)
        return " ".join(part for part in parts if part)


class Change(NamedTuple):
    """The difference as it is said: of which side, with which sign, and how many of how many people."""

    event: str
    difference: float
    people: int

    @property
    def way(self) -> str:
        """ "fewer", "more" or "same"."""
        return "fewer" if self.difference < 0 else "more" if self.difference > 0 else "same"

    @property
    def number(self) -> str:
        """So many, rounded from the difference itself and never taken from the rounded parts."""
        return of_people.apart(self.difference, self.people)


def plain_words(outcome: Outcome, patient: PatientFindings, risks: PlainRisks, people: int) -> PlainWords:
    """All words of one outcome that ``why_not`` lets through, of ``people`` people."""
    outcome, turned = subject(outcome), plain.is_turned(outcome)
    column = plain.unwelcome_column(outcome)
    event = bounded(plain.plain_said(outcome, column))
    other = bounded(plain.plain_said(outcome, "left" if column == "right" else "right") or plain_texts.DO_NOT)
    flips = plain.says_the_other(outcome, event, other)
    change = Change(other, -risks.difference, people) if flips else Change(event, risks.difference, people)
    index = group_phrase(outcome, "index")
    drawn = plain_texts.DRAWN.format(event=event) if flips else ""
    start = plain_starts.Told(turned, "" if plain.is_negative(other) else plain_texts.DRAWN.format(event=other))
    avoided, added = plain_texts.CHANGED_HERE if outcome.design in plain_texts.NOT_ALIKE else plain_texts.CHANGED
    return PlainWords(
        title=title(outcome, patient, event),
        who=plain_starts.who(patient, start, people),
        lead=plain_starts.lead(patient, start, people),
        turned=plain_texts.TURNED.format(event=event) if flips else "",
        without=_side(outcome, "reference", risks.without, people, event, other),
        with_=_side(outcome, "index", risks.with_, people, event, other),
        event=event,
        other=other,
        avoided=avoided,
        added=added,
        summary=_summary(change, index),
        open_=_open(risks),
        rounded="" if _adds_up(risks, people) else plain_texts.ROUNDED,
        doubt=_doubt(outcome, risks),
        which=WHICH_PEOPLE,
        certainty=certainty_text(outcome.certainty, change, index),
        range_=_range(risks, people, index, drawn),
        relative=_relative(risks, people, drawn),
        other_starts=plain_starts.others(patient, start, people, index, group_phrase(outcome, "reference")),
        study=_study(outcome, patient),
    )


def title(outcome: Outcome, patient: PatientFindings, event: str) -> str:
    """What the page is about, and over which time: "Falls in 12 months"."""
    name = event_names.without_unit(names.bare(outcome.name_text)) or plain_texts.HOW_MANY.format(event=event)
    return f"{bounded(name)} {span(outcome, patient)}".strip()


def span(outcome: Outcome, patient: PatientFindings) -> str:
    """The time with its preposition, "in 12 months": the other time span where one is asked for."""
    if patient.other_span is not None:
        return in_time(spans.duration(patient.other_span))
    return "" if _times_differ(outcome) else in_time(names.span(outcome))


def in_time(text: str) -> str:
    """ "in 12 months"; a span that has a preposition of its own keeps it."""
    if not text or text.split(" ", 1)[0].lower() in names.PREPOSITIONS:
        return text
    return f"in {text}"


def _times_differ(outcome: Outcome) -> bool:
    """Whether people were counted who had been followed for different times."""
    return outcome.follow_up_varied and not isinstance(outcome.table, names.NOT_COUNTED)


def certainty_text(certainty: Certainty, change: Change, index: str) -> str:
    """How sure one can be, as the clinician rated it, never computed; said too where nobody rated it.

    The verbs are those of GRADE guidelines 26 (Santesso and colleagues 2020): a plain statement, "probably", "may",
    and that the evidence is very uncertain.
    """
    said = plain_texts.CERTAINTY[certainty][change.way].format(event=change.event, index=index)
    return f"{plain_texts.CERTAINTY_NAMES[certainty]} {names.sentence_case(said)}".strip()


def _side(outcome: Outcome, group: names.Group, risk: float, people: int, event: str, other: str) -> PlainSide:
    everyone = numbers.whole(people)
    return PlainSide(
        title=group_title(outcome, group),
        number=f"{of_people.affected(risk, people)} in {everyone}",
        percent=f"({of_people.percentage(risk, people)})",
        event=event,
        other=f"{of_people.unaffected(risk, people)} in {everyone} {other}",
    )


def _summary(change: Change, index: str) -> str:
    """ "With night lights, 6 fewer of these 100 fall at least once." """
    everyone = numbers.whole(change.people)
    if change.difference == 0:
        return plain_texts.SAME.format(people=everyone, event=change.event)
    said = plain_texts.CHANGE.format(
        index=index, number=change.number, side=change.way, people=everyone, event=change.event
    )
    return names.sentence_case(said)


def _open(risks: PlainRisks) -> str:
    """What the study leaves open: no difference where there is one, and a difference where there is none."""
    if risks.reach_no_effect:
        return plain_texts.OPEN
    ways = risks.open_ways
    return plain_texts.OPEN_EITHER_WAY if all(ways) else plain_texts.OPEN_ONE_WAY if any(ways) else ""


def _doubt(outcome: Outcome, risks: PlainRisks) -> str:
    """That something else may be behind the difference, where chance did not make the groups alike."""
    why = plain_texts.NOT_ALIKE.get(outcome.design, "")
    if not why or risks.difference == 0:
        return f"{names.sentence_case(why)}." if why else ""
    return plain_texts.DOUBT.format(why=why)


def _adds_up(risks: PlainRisks, people: int) -> bool:
    """Whether the rounded parts lie as far apart as the rounded difference says."""
    apart = abs(numbers.people(risks.with_, people) - numbers.people(risks.without, people))
    return apart == numbers.people(risks.difference, people)


def _range(risks: PlainRisks, people: int, index: str, drawn: str) -> str:
    """From how few to how many it may be in the group that is drawn beside the first; "" without both limits."""
    low, high = risks.with_ends
    if low is None or high is None:
        return ""
    ends = [of_people.affected(limit, people) for limit in (low, high)]
    everyone = numbers.whole(people)
    said = plain_texts.RANGE.format(index=index, low=ends[0], high=ends[1], people=everyone, drawn=drawn)
    return names.sentence_case(said)


def _relative(risks: PlainRisks, people: int, drawn: str) -> str:
    """The relative figure, which stands after the absolute ones alone."""
    if risks.without == 0 or risks.difference == 0:
        return ""
    share = abs(risks.with_ / risks.without - 1)
    word = "lower" if risks.difference < 0 else "higher"
    before, after = (of_people.affected(risk, people) for risk in (risks.without, risks.with_))
    percent = numbers.percent_whole(share)
    rounded = [numbers.people(risk, people) for risk in (risks.without, risks.with_)]
    same = rounded[0] and numbers.percent_whole(abs(rounded[1] / rounded[0] - 1)) == percent
    pattern = plain_texts.RELATIVE if same else plain_texts.RELATIVE_UNROUNDED
    return pattern.format(
        before=before, after=after, people=numbers.whole(people), drawn=drawn, percent=percent, word=word
    )


def _study(outcome: Outcome, patient: PatientFindings) -> str:
    """Where people were followed for different times, and where the risks are over another time than the study's."""
    said = []
    if _times_differ(outcome):
        said.append(plain_texts.VARIED.format(span=f" ({names.span(outcome)})"))
    if patient.other_span is not None and patient.study_span is not None:
        ran, other = spans.duration(patient.study_span), spans.duration(patient.other_span)
        said.append(plain_texts.OTHER_SPAN.format(span=ran, other=other))
    return " ".join(said)
