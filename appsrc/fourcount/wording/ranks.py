"""The low and the high of three starting risks, a line each beside the usual one."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.record.paper import Choices
from fourcount.wording import carried, names, numbers, of_people, starts
from fourcount.wording.gaps import gap_text

LOW, HIGH = "low", "high"
AT_RANK = "At the {rank} starting risk"


def rank_lines(findings: OutcomeFindings, choices: Choices, people: int) -> tuple[str, ...]:
    """``At the low starting risk of 5%: 5 in 100 without and 3 with, 2 fewer in 100 (95% interval 1 to 3).``"""
    usual = findings.patient
    if isinstance(usual, Gap):
        return ()
    found = ((LOW, usual.low), (HIGH, usual.high))
    return tuple(_line(rank, one, findings, choices, people) for rank, one in found if one is not None)


def _line(
    rank: str,
    patient: PatientFindings | Gap,
    findings: OutcomeFindings,
    choices: Choices,
    people: int,
) -> str:
    at = AT_RANK.format(rank=rank)
    if isinstance(patient, Gap):
        return f"{at}: {names.mid_sentence(gap_text(patient))}"
    at = f"{at} of {starts.value(patient)}"
    without, with_ = patient.without.estimate, patient.with_.estimate
    if isinstance(without, Gap) or isinstance(with_, Gap):
        return f"{at}: {names.mid_sentence(' '.join(carried.reasons(patient, findings)))}"
    change, interval = carried.change(patient.difference, people), carried.interval(patient, choices, people)
    counts = f"{of_people.affected(without, people)} in {numbers.whole(people)} without and "
    said = f"{at}: {counts}{of_people.affected(with_, people)} with, {names.mid_sentence(change)}"
    needed = "" if isinstance(patient.number_needed, Gap) else carried.needed_value(patient.number_needed)
    extra = carried.reasons(patient, findings)
    first = f"{said}{f' ({interval})' if interval else ''}{f'; {needed}' if needed else ''}."
    return " ".join((first, *extra))
