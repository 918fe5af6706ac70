"""The headline of person-time: both rates, and so many events fewer or more."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, Interval, Rates
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, numbers
from fourcount.wording.gaps import gap_text
from fourcount.wording.person_time import per_units, unit_sum

EVENTS = "events"
NAMED_EVENTS = "events (“{words}”)"


def rates_headline(outcome: Outcome, figures: tuple[Figure, Figure, Figure], rates: Rates, choices: Choices) -> str:
    """``With usual care there were 17.1 events per 1,000 person-years, with night lights 9.2. That is 7.9 fewer``."""
    reference, index, difference = figures
    per = per_units(rates)
    first, second = (
        0.0 if isinstance(figure.estimate, Gap) else figure.estimate * per for figure in (reference, index)
    )
    groups = names.sentence_case(names.in_group(outcome, "reference")), names.in_group(outcome, "index")
    one, other = numbers.rate(first) if first else "no", numbers.rate(second) if second else "none"
    said = f"{groups[0]} there were {one} {_events(outcome)} per {unit_sum(per, outcome)}; {groups[1]} {other}."
    return f"{said} {_change(difference, per, choices)}"


def _events(outcome: Outcome) -> str:
    """Events, with the reader's words where there are any."""
    words = names.bare(outcome.event_words_text) or names.bare(outcome.event_heading_text)
    return NAMED_EVENTS.format(words=words) if words else EVENTS


def _change(difference: Figure, per: int, choices: Choices) -> str:
    estimate, interval = difference.estimate, difference.interval
    if isinstance(estimate, Gap):
        return gap_text(estimate)
    said = f"That is {numbers.rate(estimate * per)} {limits.side(estimate)}" if estimate else "There is no difference"
    if not isinstance(interval, Interval):
        return f"{said}. {gap_text(interval)}" if isinstance(interval, Gap) else f"{said}."
    level = f"({limits.interval_name(choices.level)})"
    reach = limits.rate_difference_interval(interval, estimate, per)
    if interval.low * estimate > 0 and interval.high * estimate > 0:
        few, many = reach.split(numbers.TO)
        return f"{said}, and could be as few as {few} or as many as {many} {level}."
    return f"{said}, and could be anything from {reach} {level}."
