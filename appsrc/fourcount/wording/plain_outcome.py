"""One outcome said to a patient: so many without, so many with, the difference, and that nobody knows which people.

Whole people, one denominator, both frames, at about a sixth-grade reading level; no statistics. The unwelcome outcome
is counted throughout, so that benefits and harms on one page read alike: where the record counts a welcome one, both
risks are turned to their complements here.
"""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, PatientFindings
from fourcount.record.outcome import Certainty, Outcome
from fourcount.wording import carried, event_names, names, numbers, of_people, plain, plain_texts, spans, starts
from fourcount.wording.form import lacking
from fourcount.wording.gaps import gap_text, why_no_patient
from fourcount.wording.headline import choose
from fourcount.wording.patient import WHICH_PEOPLE, missing
from fourcount.wording.subject import subject


class Ends(NamedTuple):
    """Two limits, each None where it cannot be given."""

    low: float | None = None
    high: float | None = None


class PlainRisks(NamedTuple):
    """The two risks of the unwelcome outcome, with the limits of the difference and of the risk with."""

    without: float
    with_: float
    difference: float
    apart: Ends = Ends()
    with_ends: Ends = Ends()


class PlainSide(NamedTuple):
    """One group: "With usual care", "12 in 100", "(12%)", "fall", "88 in 100 do not fall"."""

    title: str
    number: str
    percent: str
    event: str
    other: str


class PlainWords(NamedTuple):
    """All that one outcome's page says. ``certainty`` is always there; what does not hold is ""."""

    title: str
    lead: str
    without: PlainSide
    with_: PlainSide
    event: str
    other: str
    avoided: str
    added: str
    summary: str
    which: str
    certainty: str
    open_: str
    range_: str
    relative: str
    other_starts: tuple[str, ...]
    study: str
    rounded: str
    turned: str
    sentence: str


def why_not(outcome: Outcome, findings: OutcomeFindings) -> str:
    """Why this outcome cannot be shown to a patient, in one sentence that names what is missing; "" where it can."""
    lacks = missing_items(subject(outcome))
    if lacks:
        return plain_texts.MISSING.format(items=_listed(lacks))
    patient = findings.patient
    if isinstance(patient, Gap):
        return why_no_patient(lacking(findings) or patient, findings.form, next(iter(findings.measures), ""))
    if isinstance(patient.with_.estimate, Gap):
        return carried.reason(patient.with_.estimate, patient, findings)
    return gap_text(patient.without.estimate) if isinstance(patient.without.estimate, Gap) else ""


def missing_items(outcome: Outcome) -> tuple[str, ...]:
    """What the reader has not named yet; without it nobody is shown a picture."""
    plainly = (outcome.plain_event_text if outcome.counts_left else outcome.plain_other_text).strip()
    lacks = [item for item in missing(outcome) if not (item == "the event" and plainly)]
    items = [plain_texts.ITEMS.get(item, item) for item in lacks]
    counted = plain.plain_said(outcome, plain.unwelcome_column(outcome))
    if not counted and plain_texts.ITEMS["the event"] not in items:
        items.insert(0, plain_texts.OTHER_OUTCOME)
    return tuple(items)


def plain_risks(patient: PatientFindings, turned: bool) -> PlainRisks | None:
    """Both risks of the unwelcome outcome from the same findings; None where one of them cannot be given."""
    without, with_, difference = patient.without.estimate, patient.with_.estimate, patient.difference.estimate
    if isinstance(without, Gap) or isinstance(with_, Gap) or isinstance(difference, Gap):
        return None
    apart, with_ends = _ends(patient.difference), _ends(patient.with_)
    if not turned:
        return PlainRisks(without, with_, difference, apart, with_ends)
    return PlainRisks(1 - without, 1 - with_, -difference, _turned(apart, 0.0), _turned(with_ends, 1.0))


def _ends(figure: Figure) -> Ends:
    """Both limits of a figure's interval."""
    interval = figure.interval
    if isinstance(interval, Gap):
        return Ends()
    low, high = (None if isinstance(end, Gap) else end for end in (interval.low, interval.high))
    return Ends(low, high)


def _turned(ends: Ends, whole: float) -> Ends:
    """The limits of the complement: of a difference (``whole`` 0) or of a risk (1)."""
    low, high = (None if end is None else whole - end for end in (ends.high, ends.low))
    return Ends(low, high)


def people_in_text(risks: PlainRisks) -> int:
    """The smallest round number of people whose whole numbers say what is so, where no picture says one."""
    return choose(risks.without, risks.with_, risks.difference).denominator


def plain_words(outcome: Outcome, patient: PatientFindings, risks: PlainRisks, people: int) -> PlainWords:
    """All words of one outcome that ``why_not`` lets through, of ``people`` people."""
    outcome, turned = subject(outcome), plain.is_turned(outcome)
    column = plain.unwelcome_column(outcome)
    event = plain.plain_said(outcome, column)
    other = plain.plain_said(outcome, "left" if column == "right" else "right") or plain_texts.DO_NOT
    without = _side(outcome, "reference", risks.without, people, event, other)
    with_ = _side(outcome, "index", risks.with_, people, event, other)
    summary = _summary(risks, people, event)
    lead = _lead(patient, risks, people)
    index = names.in_group(outcome, "index")
    name = "" if turned or not outcome.counts_left else names.mid_sentence(names.outcome_name(outcome))
    adds = abs(numbers.people(risks.with_, people) - numbers.people(risks.without, people))
    words = PlainWords(
        title=title(outcome, patient, event),
        lead=lead,
        without=without,
        with_=with_,
        event=event,
        other=other,
        avoided=_changed(outcome, plain_texts.AVOIDED, plain_texts.FEWER, name) if risks.difference < 0 else "",
        added=_changed(outcome, plain_texts.ADDED, plain_texts.MORE, name) if risks.difference > 0 else "",
        summary=summary,
        which=WHICH_PEOPLE,
        certainty=certainty_text(outcome.certainty, risks.difference, event, index),
        open_=plain_texts.OPEN if _reaches_no_effect(risks) else "",
        range_=_range(risks, people, index),
        relative=_relative(risks, people),
        other_starts=_other_starts(patient, turned, people, index),
        study=_study(outcome, patient),
        rounded="" if adds == numbers.people(risks.difference, people) else plain_texts.ROUNDED,
        turned=plain_texts.TURNED.format(event=event) if turned else "",
        sentence="",
    )
    return words._replace(sentence=_sentence(words))


def title(outcome: Outcome, patient: PatientFindings, event: str) -> str:
    """What the page is about, and over which time: "Falls in 12 months"."""
    name = event_names.without_unit(names.bare(outcome.name_text)) or plain_texts.HOW_MANY.format(event=event)
    return f"{name} {span(outcome, patient)}".strip()


def span(outcome: Outcome, patient: PatientFindings) -> str:
    """The time with its preposition, "in 12 months": the other time span where one is asked for."""
    if patient.other_span is not None:
        return in_time(spans.duration(patient.other_span))
    return "" if _times_differ(outcome) else in_time(names.bare(outcome.span_text))


def in_time(text: str) -> str:
    """ "in 12 months"; a span that has a preposition of its own keeps it."""
    if not text or text.split(" ", 1)[0].lower() in names.PREPOSITIONS:
        return text
    return f"in {text}"


def _times_differ(outcome: Outcome) -> bool:
    """Whether people were counted who had been followed for different times."""
    return outcome.follow_up_varied and not isinstance(outcome.table, names.NOT_COUNTED)


def certainty_text(certainty: Certainty, difference: float, event: str, index: str) -> str:
    """How sure one can be, as the clinician rated it, never computed; said too where nobody rated it.

    The verbs are those of GRADE guidelines 26 (Santesso and colleagues 2020): a plain statement, "probably", "may",
    and that the evidence is very uncertain.
    """
    way = "fewer" if difference < 0 else "more" if difference > 0 else "same"
    said = plain_texts.CERTAINTY[certainty][way].format(event=event, index=index)
    return f"{plain_texts.CERTAINTY_NAMES[certainty]} {names.sentence_case(said)}".strip()


def _side(outcome: Outcome, group: names.Group, risk: float, people: int, event: str, other: str) -> PlainSide:
    everyone = numbers.whole(people)
    decimals = max(len(str(people)) - 3, 0)
    hidden = of_people.hidden(risk, people)
    percent = numbers.percent_whole(risk) if hidden else f"{numbers.fixed_percent(risk, decimals)}%"
    return PlainSide(
        title=names.sentence_case(names.in_group(outcome, group)),
        number=f"{of_people.affected(risk, people)} in {everyone}",
        percent=f"({percent})",
        event=event,
        other=f"{of_people.unaffected(risk, people)} in {everyone} {other}",
    )


def _summary(risks: PlainRisks, people: int, event: str) -> str:
    """The difference, rounded from itself and never taken from the rounded parts."""
    everyone = numbers.whole(people)
    if risks.difference == 0:
        return plain_texts.SAME.format(people=everyone, event=event)
    side = "fewer" if risks.difference < 0 else "more"
    number = of_people.apart(risks.difference, people)
    return plain_texts.CHANGE.format(number=number, side=side, people=everyone, event=event)


def _lead(patient: PatientFindings, risks: PlainRisks, people: int) -> str:
    """Who is drawn: people like the study's only where the starting risk is the study's own, over its own time."""
    if starts.as_in_the_study(patient):
        return plain_texts.LIKE_THE_STUDY
    return plain_texts.START_AT.format(count=of_people.affected(risks.without, people), people=numbers.whole(people))


def _changed(outcome: Outcome, pattern: str, neutral: str, name: str) -> str:
    """What the key calls the people between both groups; only where chance made these does anything avoid it."""
    if outcome.design not in names.WITH_DESIGNS:
        return neutral
    return pattern.format(name=f"{name} " if name and len(name) <= plain_texts.LONGEST_KEY else "")


def _reaches_no_effect(risks: PlainRisks) -> bool:
    """Whether the interval of the difference leaves open that there is none; a limit that is not there is no end."""
    low, high = risks.apart
    if (low is None and high is None) or risks.difference == 0:
        return False
    return (low is None or low <= 0) and (high is None or high >= 0)


def _range(risks: PlainRisks, people: int, index: str) -> str:
    """From how few to how many it may be in the group that is drawn beside the first; "" without both limits."""
    low, high = risks.with_ends
    if low is None or high is None:
        return ""
    ends = [of_people.affected(limit, people) for limit in (low, high)]
    said = plain_texts.RANGE.format(index=index, low=ends[0], high=ends[1], people=numbers.whole(people))
    return names.sentence_case(said)


def _relative(risks: PlainRisks, people: int) -> str:
    """The relative figure, which stands after the absolute ones alone."""
    if risks.without == 0 or risks.difference == 0:
        return ""
    share = abs(risks.with_ / risks.without - 1)
    word = "lower" if risks.difference < 0 else "higher"
    before, after = (of_people.affected(risk, people) for risk in (risks.without, risks.with_))
    percent = numbers.percent_whole(share)
    said = plain_texts.RELATIVE.format(
        before=before, after=after, people=numbers.whole(people), percent=percent, word=word
    )
    drawn = [numbers.people(risk, people) for risk in (risks.without, risks.with_)]
    same = drawn[0] and numbers.percent_whole(abs(drawn[1] / drawn[0] - 1)) == percent
    return said if same else f"{said} {plain_texts.BEFORE_ROUNDING}"


def _other_starts(patient: PatientFindings, turned: bool, people: int, index: str) -> tuple[str, ...]:
    """The same effect at the low and the high starting risk, where the reader gave three."""
    lines = []
    for other in (patient.low, patient.high):
        risks = None if other is None or isinstance(other, Gap) else plain_risks(other, turned)
        if risks is not None:
            of = people if _apart_at(risks, people) else people_in_text(risks)
            before, after = (of_people.affected(risk, of) for risk in (risks.without, risks.with_))
            line = plain_texts.OTHER_START.format(before=before, after=after, people=numbers.whole(of), index=index)
            lines.append(line)
    return tuple(lines)


def _apart_at(risks: PlainRisks, people: int) -> bool:
    """Whether whole numbers of so many people tell both risks, and apart from each other."""
    pair = (risks.without, risks.with_)
    told = not any(of_people.hidden(risk, people) for risk in pair)
    before, after = (numbers.people(risk, people) for risk in pair)
    return told and (before != after or risks.difference == 0)


def _study(outcome: Outcome, patient: PatientFindings) -> str:
    """What kind of study it was, where chance did not make the groups alike; and where times differed."""
    said = [plain_texts.STUDIES.get(outcome.design, "")]
    if _times_differ(outcome):
        said.append(plain_texts.VARIED.format(span=f" ({names.bare(outcome.span_text)})"))
    if patient.other_span is not None and patient.study_span is not None:
        ran, other = spans.duration(patient.study_span), spans.duration(patient.other_span)
        said.append(plain_texts.OTHER_SPAN.format(span=ran, other=other))
    return " ".join(part for part in said if part)


def _sentence(words: PlainWords) -> str:
    """The whole page as one text, for those who hear it."""
    sides = [
        f"{side.title}, {side.number} {side.percent} {side.event}, and {side.other}."
        for side in (words.without, words.with_)
    ]
    before = (f"{words.title}.", words.lead, *sides)
    parts = (*before, words.summary, words.which, words.certainty, words.open_, words.study, words.turned)
    return " ".join(part for part in parts if part)


def _listed(items: tuple[str, ...]) -> str:
    *before, last = items
    return f"{', '.join(before)} and {last}" if before else last
