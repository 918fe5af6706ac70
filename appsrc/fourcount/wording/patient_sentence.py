"""One patient in one sentence, in the named outcome's own terms, for a letter."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import carried, names, numbers, of_people
from fourcount.wording.form import shown_choices

AS_IN_THE_STUDY = "The study’s figures hold as they stand."


def patient_sentence(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """Without, with, the difference and the number needed; at the study's own risk these stand elsewhere already."""
    patient = findings.patient
    if isinstance(patient, Gap):
        return ""
    if patient.baseline_from == "reference":
        return AS_IN_THE_STUDY
    people, choices = carried.denominator_for_text(patient), shown_choices(findings, choices)
    span = names.within_span(outcome)
    first = (
        f"Of {numbers.whole(people)} people {names.in_group(outcome, 'reference')} "
        f"{_people(patient.without.estimate, people)} {names.event_words(outcome)}{f' {span}' if span else ''}"
    )
    index = names.in_group(outcome, "index")
    if isinstance(patient.with_.estimate, Gap):
        return f"{first}. {carried.reason(patient.with_.estimate, patient)}"
    second = f"of {numbers.whole(people)} {index} {_people(patient.with_.estimate, people)}"
    change, interval = carried.change(patient.difference, people), carried.interval(patient, choices, people)
    said = f"{first}, {second}: {change[:1].lower()}{change[1:]}{f' ({interval})' if interval else ''}"
    told = patient.number_needed == findings.measures.get("number_needed")  # a design without one has said so already
    needed = "" if told else carried.number_needed(patient.number_needed, outcome)
    return " ".join(part for part in (f"{said}.", needed, *carried.reasons(patient)) if part)


def _people(risk: float | Gap, people: int) -> str:
    return carried.NOT_GIVEN if isinstance(risk, Gap) else of_people.affected(risk, people)
