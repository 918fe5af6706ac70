"""At which risk a patient starts, as the page says it: of the side that was typed, over the study's own time."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import Gap, PatientFindings
from fourcount.wording import numbers, of_people, plain_texts, spans, starts
from fourcount.wording.plain_risks import PlainRisks, people_in_text, plain_risks

MOST_PEOPLE = 1_000_000_000
ROUND = (100, 1_000, 10_000)


class Told(NamedTuple):
    """Whether the page draws the complement of what was typed, and the words for what was typed, " who heal".

    Without such words (no plain ones for the welcome side) a start is told of the side that is drawn.
    """

    turned: bool
    who: str

    @property
    def as_typed(self) -> bool:
        """Whether a turned start is told of the welcome side, as the reader typed it."""
        return self.turned and bool(self.who)

    def risk(self, drawn: float) -> float:
        """The risk to tell where the page draws ``drawn``."""
        return 1 - drawn if self.as_typed else drawn


def lead(patient: PatientFindings, told: Told, people: int) -> str:
    """Who is drawn: people like the study's only where they are."""
    if _like_the_study(patient):
        return plain_texts.LIKE_THE_STUDY
    pattern = plain_texts.START_WELCOME if told.as_typed else plain_texts.START_AT
    return pattern.format(start=_start(patient, told, people))


def who(patient: PatientFindings, told: Told, people: int) -> str:
    """The same as a part of a head."""
    if _like_the_study(patient):
        return plain_texts.FOR_LIKE_THE_STUDY
    return plain_texts.FOR_START_AT.format(start=_start(patient, told, people))


def others(patient: PatientFindings, told: Told, people: int, index: str, reference: str) -> tuple[str, ...]:
    """The same effect at the low and the high starting risk, where the reader gave three."""
    lines = []
    for other in (patient.low, patient.high):
        risks = None if other is None or isinstance(other, Gap) else plain_risks(other, told.turned)
        if isinstance(other, PatientFindings) and risks is not None:
            of = people if _apart_at(risks, people) else people_in_text(risks)
            before, after = (of_people.affected(told.risk(risk), of) for risk in (risks.without, risks.with_))
            pattern = plain_texts.OTHER_START if other.other_span is None else plain_texts.OTHER_START_OVER
            line = pattern.format(
                start=_start(other, told, of),
                before=before,
                after=after,
                people=numbers.whole(of),
                index=index,
                reference=reference,
            )
            lines.append(line)
    return tuple(lines)


def _like_the_study(patient: PatientFindings) -> bool:
    """Whether these are people like the study's: at its own starting risk, over its own time, by whichever effect."""
    return starts.own(patient) and patient.other_span is None


def _start(patient: PatientFindings, told: Told, people: int) -> str:
    """ "12 in 100 over 12 months": the starting risk over the study's time, which is said where the page's is another.

    Nobody starts at a risk that is computed over another time.
    """
    risk = 1 - patient.baseline if told.turned and not told.as_typed else patient.baseline
    apart = patient.other_span is not None and patient.study_span is not None
    if apart:  # the picture's number of people suits the other time
        people = next((of for of in ROUND if _is_whole(risk * of)), people)
    while of_people.hidden(risk, people) and people < MOST_PEOPLE:
        people *= 10
    over = plain_texts.OVER.format(span=spans.duration(patient.study_span)) if apart and patient.study_span else ""
    return plain_texts.START.format(
        count=of_people.affected(risk, people),
        people=numbers.whole(people),
        who=told.who if told.as_typed else "",
        over=over,
    )


def _is_whole(number: float) -> bool:
    return abs(number - round(number)) < 1e-9 * max(number, 1)


def _apart_at(risks: PlainRisks, people: int) -> bool:
    """Whether whole numbers of so many people tell both risks, and apart from each other."""
    pair = (risks.without, risks.with_)
    told = not any(of_people.hidden(risk, people) for risk in pair)
    before, after = (numbers.people(risk, people) for risk in pair)
    return told and (before != after or risks.difference == 0)
