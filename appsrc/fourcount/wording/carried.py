"""A patient's figures one by one: so many people, how many more or fewer, the number needed, and why one is missing."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers, of_people
from fourcount.wording.gaps import gap_text, limit_text
from fourcount.wording.headline import choose

NOT_GIVEN = "not given"
CARRY_THE_ODDS = "The risk would pass 100% here; the odds ratio can be carried instead."


def denominator_for_text(patient: PatientFindings) -> int:
    """Where nothing can be drawn, the smallest round number of people whose whole numbers say what is so."""
    without = 0.0 if isinstance(patient.without.estimate, Gap) else patient.without.estimate
    with_, change = patient.with_.estimate, patient.difference.estimate
    if isinstance(with_, Gap) or isinstance(change, Gap):
        with_, change = without, 0.0
    return choose(without, with_, change).denominator


def count(figure: Figure, people: int) -> str:
    """``12 in 100``."""
    if isinstance(figure.estimate, Gap):
        return NOT_GIVEN
    return f"{of_people.affected(figure.estimate, people)} in {numbers.whole(people)}"


def percentage(figure: Figure, people: int) -> str:
    """The same share as a percentage with the same digits: 12% of 100, 1.2% of 1,000."""
    if isinstance(figure.estimate, Gap):
        return ""
    risk = figure.estimate
    if of_people.hidden(risk, people):
        return numbers.percent_whole(risk)
    return f"{numbers.fixed_percent(risk, len(str(people)) - 3)}%"


def change(difference: Figure, people: int) -> str:
    """``6 fewer in 100``, from the difference itself."""
    change = difference.estimate
    if isinstance(change, Gap):
        return ""
    if change == 0:
        return f"The same number in {numbers.whole(people)}"
    return f"{of_people.apart(change, people)} {limits.side(change)} in {numbers.whole(people)}"


def interval(patient: PatientFindings, choices: Choices, people: int) -> str:
    """``95% interval 3 to 8``, or "" where there is none."""

    def write(x: float) -> str:
        return of_people.apart(x, people)

    interval = limits.sided(patient.difference.interval, patient.difference.estimate, write)
    return f"{limits.interval_name(choices.level)} {interval}" if interval else ""


def number_needed(needed: AnyNumberNeeded | Gap, outcome: Outcome) -> str:
    """The number needed of this column, told apart from that of the study."""
    if isinstance(needed, Gap):
        return gap_text(needed)
    interval = limits.number_needed_interval(needed)
    value = f"{numbers.number_needed(needed.estimate)} ({interval})"
    return f"{limits.needed_kind(needed)} at this starting risk {value}{names.if_caused(outcome)}."


def reason(gap: Gap, patient: PatientFindings) -> str:
    """Why something is withheld here; where a carried risk ratio passes 100%, odds never do."""
    passes = gap.key == "beyond-one" and patient.range_from == "effect"
    return CARRY_THE_ODDS if passes else gap_text(gap)


def reasons(patient: PatientFindings) -> tuple[str, ...]:
    """Why the difference, its interval or one limit is not there, each reason once."""
    difference, interval = patient.difference, patient.difference.interval
    if isinstance(difference.estimate, Gap):
        return (reason(difference.estimate, patient),)
    if isinstance(interval, Gap):
        return (gap_text(interval),)
    return tuple(dict.fromkeys(limit_text(end) for end in (interval.low, interval.high) if isinstance(end, Gap)))
