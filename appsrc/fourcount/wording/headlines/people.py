"""The headline in whole people: the reference group, the index group, and their difference with its interval."""

from __future__ import annotations

from fourcount.appraisal.findings import Counts, Figure, Gap, Interval, Range
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers, of_people
from fourcount.wording.gaps import gap_text
from fourcount.wording.headline import DO_NOT_ADD_UP, People, choose, limits_apart

FOLLOW_UP_VARIED = "Follow-up varied, so these counts are no risks{span}."
PAST_EVERYBODY = "The bare formula’s {level} interval reaches past 100 in 100, so it is not put into people."


def people_headline(outcome: Outcome, figures: tuple[Figure, Figure, Figure], choices: Choices) -> str:
    """The reference group's risk, the index group's and their difference, with the difference's interval."""
    interval, estimates = figures[2].interval, [figure.estimate for figure in figures]
    risk_reference, risk_index, gap = (x for x in estimates if not isinstance(x, Gap))
    people = choose(risk_reference, risk_index, gap, interval)
    counts = _about(risk_reference, people.denominator), _about(risk_index, people.denominator)
    second = f"{'also ' if gap == 0 else ''}{counts[1]}"
    said = (_twice if names.by_time(outcome) else _two_groups)(outcome, people.denominator, counts[0], second)
    rounding = "" if people.add_up else f" {DO_NOT_ADD_UP}"
    return f"{said} {_difference(gap, people, interval, choices)}{rounding}"


def counts_headline(outcome: Outcome, counts: Counts) -> str:
    """The counts alone, where people were followed for different times and the shares are no risks."""
    event, span = names.event_words(outcome), names.over(names.span(outcome))
    reference = f"{numbers.whole(counts.reference_events)} of {numbers.whole(counts.reference_total)} people"
    index = f"{numbers.whole(counts.index_events)} of {numbers.whole(counts.index_total)}"
    groups = names.in_group(outcome, "reference"), names.in_group(outcome, "index")
    said = f"{reference} {groups[0]} {event}; {index} {groups[1]}."
    return f"{said} {FOLLOW_UP_VARIED.format(span=f' {span}' if span else '')}"


def _two_groups(outcome: Outcome, people: int, reference: str, index: str) -> str:
    """``Of 100 people with usual care about 17 fell; of 100 with night lights about 9.``"""
    of, event = numbers.whole(people), _spanned(outcome)
    first = f"Of {of} people {names.in_group(outcome, 'reference')} {reference} {event}"
    return f"{first}; of {of} {names.in_group(outcome, 'index')} {index}."


def _twice(outcome: Outcome, people: int, reference: str, index: str) -> str:
    """The same people at two times: ``Of 100 people about 37 fell before and about 44 after.``"""
    first = f"Of {numbers.whole(people)} people {reference} {_spanned(outcome)} {names.in_group(outcome, 'reference')}"
    return f"{first} and {index} {names.in_group(outcome, 'index')}."


def _spanned(outcome: Outcome) -> str:
    span = names.within_span(outcome)
    return f"{names.event_words(outcome)} {span}" if span else names.event_words(outcome)


def _about(risk: float, people: int) -> str:
    """``about 17``; none and all only where they are."""
    if risk in (0.0, 1.0):
        return "all" if risk else "none"
    return f"about {of_people.affected(risk, people)}"


def _difference(difference: float, people: People, interval: Interval | Range | Gap, choices: Choices) -> str:
    """The difference and its interval in the same whole people."""
    said = f"That is {of_people.apart(difference, people.denominator)} {limits.side(difference)}"
    if isinstance(interval, Gap):
        return f"{said if difference else 'There is no interval'}. {gap_text(interval)}"
    low, high, level = interval.low, interval.high, f"({limits.interval_name(choices.level)})"
    if isinstance(low, Gap) or isinstance(high, Gap):
        return f"{said}."
    if limits.beyond(interval, -1.0, 1.0):
        return f"{said}. {PAST_EVERYBODY.format(level=numbers.level(choices.level))}"
    if low * difference > 0 and high * difference > 0:
        return f"{said}{_reach(interval, people, level)}."
    start = f"{said}, and could be" if difference else "The difference could be"
    return f"{start} anything from {_sided(low, people)} to {_sided(high, people)} {level}."


def _reach(interval: Interval | Range, people: People, level: str) -> str:
    """Both limits on the estimate's side, where whole people can tell them apart."""
    sizes = sorted(abs(x) for x in (interval.low, interval.high) if not isinstance(x, Gap))
    few, many = (of_people.apart(size, people.denominator) for size in sizes)
    if limits_apart(people.denominator, interval):
        return f", and could be as few as {few} or as many as {many} {level}"
    return "" if few == many else f", and could be from {few} to {many} {level}"


def _sided(limit: float, people: People) -> str:
    return f"{of_people.apart(limit, people.denominator)} {limits.side(limit)}" if limit else "none"
