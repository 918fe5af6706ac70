"""What a picture shows, in one sentence: both groups in both frames, and the change with its interval."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import carried, names, numbers, of_people, spans
from fourcount.wording.subject import subject

WHICH_PEOPLE = "We cannot say which people."


def picture_sentence(
    outcome: Outcome, findings: OutcomeFindings, patient: PatientFindings, choices: Choices, people: int
) -> str:
    """``Of 100 people with usual care 12 (12%) fell within 12 months and 88 did not; of 100 ...``"""
    spoken = subject(outcome)
    first = _first(spoken, patient, people)
    if isinstance(patient.with_.estimate, Gap):
        reason = carried.reason(patient.with_.estimate, patient, findings)
        return f"{first}. {names.sentence_case(names.in_group(spoken, 'index'))}: {names.mid_sentence(reason)}"
    change = names.mid_sentence(carried.change(patient.difference, people))
    interval = carried.interval(patient, choices, people)
    said = f"{first}; {_second(spoken, patient, people)}: {change}"
    return f"{said}{f', {interval}' if interval else ''}. {WHICH_PEOPLE}"


def others(figure: Figure, people: int, outcome: Outcome) -> str:
    """The other frame: ``88 did not fall``. It is what the rounded count leaves, so that the two make the whole."""
    if isinstance(figure.estimate, Gap):
        return ""
    return f"{of_people.unaffected(figure.estimate, people)} {names.other_words(outcome)}"


def _first(outcome: Outcome, patient: PatientFindings, people: int) -> str:
    group, count = names.in_group(outcome, "reference"), _affected(patient.without, people)
    event, unaffected = names.event_words(outcome), others(patient.without, people, outcome)
    event = " ".join(part for part in (event, spans.within(outcome, patient)) if part)
    if names.by_time(outcome):
        return f"Of {numbers.whole(people)} people {count} {event} {group} and {unaffected}"
    return f"Of {numbers.whole(people)} people {group} {count} {event} and {unaffected}"


def _second(outcome: Outcome, patient: PatientFindings, people: int) -> str:
    group, count = names.in_group(outcome, "index"), _affected(patient.with_, people)
    event, unaffected = names.event_words(outcome), others(patient.with_, people, outcome)
    if names.by_time(outcome):
        return f"{count} {event} {group} and {unaffected}"
    return f"of {numbers.whole(people)} {group} {count} {event} and {unaffected}"


def _affected(figure: Figure, people: int) -> str:
    """``12 (12%)``."""
    if isinstance(figure.estimate, Gap):
        return carried.NOT_GIVEN
    return f"{of_people.affected(figure.estimate, people)} ({carried.percentage(figure, people)})"
