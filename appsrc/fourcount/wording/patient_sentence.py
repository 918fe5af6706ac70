"""One patient in a few sentences, in the named outcome's own terms, for a letter."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import carried, limits, names, numbers, of_people, spans, starts
from fourcount.wording.basis import OWN_RANGE, half_added_note, range_note
from fourcount.wording.form import patient_choices
from fourcount.wording.ranks import people_for_all, rank_lines
from fourcount.wording.subject import subject

AS_IN_THE_STUDY = "The study’s figures hold as they stand."


def patient_sentence(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """Without, with, the difference and the number needed; at the study's own risk these stand elsewhere already."""
    patient = findings.patient
    if isinstance(patient, Gap):
        return ""
    patient = starts.at_one_level(patient, choices)
    choices = patient_choices(findings, choices)
    people = people_for_all(patient)
    ranks = rank_lines(outcome, findings, choices, people)
    if starts.as_in_the_study(patient):
        return " ".join((AS_IN_THE_STUDY, *ranks))
    if isinstance(patient.with_.estimate, Gap):
        reason = carried.reason(patient.with_.estimate, patient, findings)
        return " ".join((f"{_without(outcome, patient, choices, people)}.", reason, *ranks))
    told = patient.number_needed == findings.measures.get("number_needed")  # a design without one has said so already
    needed = "" if told else carried.number_needed(patient.number_needed, outcome)
    repeated = patient.effect == "risk_ratio" and patient.other_span is None
    relative = "" if repeated else carried.relative_words(outcome, patient)
    note = range_note(outcome, patient)
    more = (*carried.reasons(patient, findings), "" if note == OWN_RANGE else note, half_added_note(patient), *ranks)
    return " ".join(part for part in (_compared(outcome, patient, choices, people), needed, relative, *more) if part)


def _compared(outcome: Outcome, patient: PatientFindings, choices: Choices, people: int) -> str:
    """``Of 100 people with usual care 12 fell, of 100 with night lights 6 (…): 6 fewer in 100 (…).``"""
    spoken, change = subject(outcome), names.mid_sentence(carried.change(patient.difference, people))
    group, number = names.in_group(spoken, "index"), _people(patient.with_, choices, people)
    by_time = names.by_time(spoken)
    second = f" and {number} {group}" if by_time else f", of {numbers.whole(people)} {group} {number}"
    interval = carried.interval(patient, choices, people)
    return f"{_without(outcome, patient, choices, people)}{second}: {change}{limits.bracketed(interval)}."


def _without(outcome: Outcome, patient: PatientFindings, choices: Choices, people: int) -> str:
    spoken = subject(outcome)
    event = " ".join(part for part in (names.event_words(spoken), spans.within(spoken, patient)) if part)
    group, number = names.in_group(spoken, "reference"), _people(patient.without, choices, people)
    of = f"Of {numbers.whole(people)} people"
    return f"{of} {number} {event} {group}" if names.by_time(spoken) else f"{of} {group} {number} {event}"


def _people(figure: Figure, choices: Choices, people: int) -> str:
    """``6 (95% interval 4 to 9)``."""
    if isinstance(figure.estimate, Gap):
        return carried.NOT_GIVEN
    interval = carried.risk_limits(figure, people)
    named = f"{limits.interval_name(choices.level)} {interval}" if interval else ""
    return f"{of_people.affected(figure.estimate, people)}{limits.bracketed(named)}"
