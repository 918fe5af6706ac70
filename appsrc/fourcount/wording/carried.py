"""A patient's figures one by one: so many people, how many more or fewer, the number needed, and why one is missing."""

from __future__ import annotations

from math import inf, isclose

from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Figure,
    Gap,
    OutcomeFindings,
    PatientFindings,
)
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers, of_people
from fourcount.wording.durations import duration
from fourcount.wording.gaps import gap_text, limit_text
from fourcount.wording.half_added import half_added
from fourcount.wording.headline import people_for

NOT_GIVEN = "not given"
ALIKE = 1e-12  # limits that only the last bits tell apart
NO_WIDTH_NEEDED = f"{numbers.INFINITY}{numbers.TO}{numbers.INFINITY}"
NO_CHANGE = "the same number"
CARRY_THE_ODDS = "the odds ratio can be carried instead"
ODDS_AVOID_IT = "carrying the odds ratio avoids it"
PAST_AN_END = ("beyond-one", "carried-beyond-zero")
"""Why no risk follows from an effect that is carried; odds never get there."""

OF_WHAT = {"odds_ratio": " (not the odds)", "hazard_ratio": " (not the hazard)", "rate_ratio": " (not the rate)"}
"""What another effect than a ratio of risks is about."""

NEVER_PAST = ("odds_ratio", "hazard_ratio", "rate_ratio")
"""Effects that no starting risk takes past 100%."""


def people_for_patient(patient: PatientFindings) -> int:
    """Where nothing can be drawn, the smallest round number of people whose whole numbers say what is so."""
    without = 0.0 if isinstance(patient.without.estimate, Gap) else patient.without.estimate
    with_, change = patient.with_.estimate, patient.difference.estimate
    if isinstance(with_, Gap) or isinstance(change, Gap):
        with_, change = without, 0.0
    return people_for(without, with_, change)


def count(figure: Figure, people: int) -> str:
    """``12 in 100``."""
    if isinstance(figure.estimate, Gap):
        return NOT_GIVEN
    return f"{of_people.affected(figure.estimate, people)} in {numbers.whole(people)}"


def bare_count(figure: Figure, people: int) -> str:
    """``12``, where a head says of how many."""
    return NOT_GIVEN if isinstance(figure.estimate, Gap) else of_people.affected(figure.estimate, people)


def percentage(figure: Figure, people: int) -> str:
    """The same share as a percentage with the same digits: 12% of 100, 1.2% of 1,000."""
    return "" if isinstance(figure.estimate, Gap) else of_people.percentage(figure.estimate, people)


def change(difference: Figure, people: int) -> str:
    """``6 fewer in 100``, from the difference itself."""
    if isinstance(difference.estimate, Gap):
        return ""
    if difference.estimate == 0:
        return f"The same number in {numbers.whole(people)}"
    return f"{bare_change(difference, people)} in {numbers.whole(people)}"


def bare_change(difference: Figure, people: int) -> str:
    """``6 fewer``, where a head says of how many."""
    change = difference.estimate
    if isinstance(change, Gap):
        return NOT_GIVEN
    return f"{of_people.apart(change, people)} {limits.side(change)}" if change else NO_CHANGE


def interval(patient: PatientFindings, choices: Choices, people: int) -> str:
    """``95% interval 3 to 8``, or "" where there is none."""
    interval = change_limits(patient.difference, people)
    return f"{limits.interval_name(choices.level)} {interval}" if interval else ""


def change_limits(difference: Figure, people: int) -> str:
    """``3 to 8`` people fewer or more, or "" where there is no interval."""
    if no_width(difference):
        return ""
    return limits.sided(difference.interval, difference.estimate, lambda x: of_people.apart(x, people))


def risk_limits(figure: Figure, people: int) -> str:
    """``4 to 9`` people with the event, or "" where there is no estimate or no interval."""
    interval = figure.interval
    if isinstance(interval, Gap) or isinstance(figure.estimate, Gap) or no_width(figure):
        return ""
    return numbers.TO.join(_end(limit, people) for limit in (interval.low, interval.high))


def no_width(figure: Figure) -> bool:
    """Whether both limits are one and the same, as at a starting risk of nobody: no interval worth the name."""
    if isinstance(figure.interval, Gap):
        return False
    low, high = figure.interval.low, figure.interval.high
    return low == high or (not isinstance(low, Gap) and not isinstance(high, Gap) and isclose(low, high, rel_tol=ALIKE))


def _end(limit: float | Gap, people: int) -> str:
    if isinstance(limit, Gap):
        return limits.WITHHELD_ENDS.get(limit.key, limits.A_WITHHELD_LIMIT)
    return of_people.affected(limit, people)


def number_needed(needed: AnyNumberNeeded | Gap, outcome: Outcome) -> str:
    """The number needed of this column, told apart from that of the study."""
    if isinstance(needed, Gap):
        return gap_text(needed)
    caused = "" if needed.estimate == inf else names.if_caused(outcome)
    return f"{limits.needed_kind(needed)} at this starting risk {_needed(needed)}{caused}."


def needed_value(needed: AnyNumberNeeded) -> str:
    """``NNTB 19 (14 to 38)``."""
    return f"{limits.needed_kind(needed)} {_needed(needed)}"


def _needed(needed: AnyNumberNeeded) -> str:
    value, interval = numbers.number_needed(needed.estimate), limits.number_needed_interval(needed)
    return value if interval == NO_WIDTH_NEEDED else f"{value}{limits.bracketed(interval)}"


def relative_words(outcome: Outcome, patient: PatientFindings) -> str:
    """The relative figure; none where nobody has the event either way, of whom no share can be more or fewer.

    It is one of risks, which is said where what is kept constant is something else, or is kept over another time.
    """
    if patient.without.estimate == 0.0 and patient.with_.estimate == 0.0:
        return ""
    over = "" if patient.other_span is None else f" over {duration(patient.other_span)}"
    kept = OF_WHAT.get(patient.effect, "")
    subject = f" the {names.risk_name(outcome)}{over}{kept} is" if over or kept else ""
    return relative(patient.risk_ratio, subject)


def relative(ratio: Figure, subject: str = "") -> str:
    """``In relative words 46% lower (22% to 63%).``; ``subject`` says what is lower."""
    if isinstance(ratio.estimate, Gap):
        return ""
    change = ratio.estimate - 1
    if change in (0.0, float("inf")):
        return ""
    word = limits.LOWER if change < 0 else limits.HIGHER
    interval = "" if half_added(ratio) else limits.bracketed(limits.relative_interval(ratio.interval, ratio.estimate))
    return f"In relative words{subject} {numbers.percent_whole(abs(change))} {word}{interval}."


def odds_can_be_carried(findings: OutcomeFindings) -> bool:
    """Whether there is an odds ratio to carry instead, which no starting risk takes past 100%."""
    return any(one.effect == "odds_ratio" and not isinstance(one.figure.estimate, Gap) for one in findings.carriable)


def reason(gap: Gap, patient: PatientFindings, findings: OutcomeFindings) -> str:
    """Why something is withheld here; where a carried risk ratio passes 100%, odds never do."""
    gap = _of_the_effect(gap, patient)
    return _offering(gap_text(gap), CARRY_THE_ODDS, gap, patient, findings)


def reasons(patient: PatientFindings, findings: OutcomeFindings) -> tuple[str, ...]:
    """Why the difference, its interval or one limit is not there, each reason once."""
    difference, interval = patient.difference, patient.difference.interval
    if isinstance(difference.estimate, Gap):
        return (reason(difference.estimate, patient, findings),)
    if isinstance(interval, Gap):
        return (_reason_of_limit(interval, patient, findings),)
    ends = (end for end in (interval.low, interval.high) if isinstance(end, Gap))
    return tuple(dict.fromkeys(_reason_of_limit(end, patient, findings) for end in ends))


def _reason_of_limit(gap: Gap, patient: PatientFindings, findings: OutcomeFindings) -> str:
    gap = _of_the_effect(gap, patient)
    return _offering(limit_text(gap), ODDS_AVOID_IT, gap, patient, findings)


def _of_the_effect(gap: Gap, patient: PatientFindings) -> Gap:
    """A limit below 0% is that of the effect where one is carried, and no bare formula's."""
    below = gap.key == "beyond-zero" and patient.range_from != "table"
    return Gap("carried-beyond-zero") if below else gap


def _offering(said: str, offer: str, gap: Gap, patient: PatientFindings, findings: OutcomeFindings) -> str:
    """The reason, with the odds ratio offered where it would help and there is one."""
    moves = 0.0 < patient.baseline < 1.0  # odds of nobody and of everybody stay
    helps = moves and patient.range_from != "table" and gap.key in PAST_AN_END and patient.effect not in NEVER_PAST
    return f"{said.removesuffix('.')}; {offer}." if helps and odds_can_be_carried(findings) else said
