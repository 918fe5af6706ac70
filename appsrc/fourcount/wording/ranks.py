"""The low and the high of three starting risks, a line each beside the usual one."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import carried, names, numbers, of_people, starts
from fourcount.wording.gaps import gap_text
from fourcount.wording.headline import ONE_PERSON
from fourcount.wording.subject import subject

LOW, HIGH = "low", "high"
AT_RANK = "At the {rank} starting risk"
MOST = 10**9


def people_for_all(patient: PatientFindings, denominator: int | None = None) -> int:
    """The one number of people by which low, usual and high are told.

    It is ``denominator`` where that is given, that of the picture, and ten times as many only where somebody would be
    nobody, nearly all all, or a difference less than one of them.
    """
    found = [one for one in (patient, patient.low, patient.high) if isinstance(one, PatientFindings)]
    people = denominator or max(carried.people_for_patient(one) for one in found)
    while people < MOST and not all(_told_by(one, people) for one in found if one is not patient):
        people *= 10
    return people


def _told_by(patient: PatientFindings, people: int) -> bool:
    risks = (patient.without.estimate, patient.with_.estimate)
    change = patient.difference.estimate
    whole = isinstance(change, Gap) or change == 0 or abs(change) * people >= ONE_PERSON
    return whole and not any(of_people.hidden(risk, people) for risk in risks if not isinstance(risk, Gap))


def rank_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices, people: int) -> tuple[str, ...]:
    """``At the low starting risk of 5%: 5 in 100 without and 3 with, 2 fewer in 100 (95% interval 1 to 3).``"""
    usual = findings.patient
    if isinstance(usual, Gap):
        return ()
    sides = _sides(subject(outcome))
    found = ((LOW, usual.low), (HIGH, usual.high))
    return tuple(_line(rank, one, sides, findings, choices, people) for rank, one in found if one is not None)


def _sides(outcome: Outcome) -> tuple[str, str]:
    """Without and with; of the same people at two times the times."""
    if outcome.design != "before-after":
        return "without", "with"
    return names.in_group(outcome, "reference"), names.in_group(outcome, "index")


def _line(
    rank: str,
    patient: PatientFindings | Gap,
    sides: tuple[str, str],
    findings: OutcomeFindings,
    choices: Choices,
    people: int,
) -> str:
    at = AT_RANK.format(rank=rank)
    if isinstance(patient, Gap):
        return f"{at}: {names.mid_sentence(gap_text(patient))}"
    at = f"{at} of {starts.value(patient)}"
    without, with_ = patient.without.estimate, patient.with_.estimate
    reasons = carried.reasons(patient, findings)
    if isinstance(without, Gap) or isinstance(with_, Gap):
        return f"{at}: {names.mid_sentence(' '.join(reasons))}"
    counts = of_people.affected(without, people), of_people.affected(with_, people)
    said = f"{counts[0]} in {numbers.whole(people)} {sides[0]} and {counts[1]} {sides[1]}"
    change, interval = carried.change(patient.difference, people), carried.interval(patient, choices, people)
    needed = "" if isinstance(patient.number_needed, Gap) else f"; {carried.needed_value(patient.number_needed)}"
    told = f"{at}: {said}, {names.mid_sentence(change)}{f' ({interval})' if interval else ''}{needed}."
    return " ".join((told, *reasons))
