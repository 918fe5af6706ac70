"""What rates mean: events over person-time, never shares of people."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, OutcomeFindings, Rates
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, lines, names, numbers
from fourcount.wording.form import given
from fourcount.wording.meanings.parts import estimate_of, given_estimate, no_interval, times, with_interval
from fourcount.wording.person_time import per_units, time_in, unit_sum

NOT_PEOPLE = "A rate counts events over time; it is not a share of people."


def rate_reference(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The reference group's rate from its events and its person-time."""
    return _rate("reference", outcome, figure, findings, choices)


def rate_index(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The index group's rate from its events and its person-time."""
    return _rate("index", outcome, figure, findings, choices)


def difference(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """So many events fewer or more in so much person-time."""
    rates = _rates(findings)
    per = per_units(rates)
    index, reference = names.in_group(outcome, "index"), names.in_group(outcome, "reference")
    interval = with_interval("rate_difference", figure, choices, per)
    if given_estimate(figure) == 0:
        said = f"Per {unit_sum(per, outcome)} as many events {index} as {reference}"
    else:
        change = lines.estimate_text("rate_difference", figure, per)
        said = f"Per {unit_sum(per, outcome)} {change} events {index} than {reference}"
    return f"{said}{interval}. {NOT_PEOPLE}{no_interval(figure)}"


def ratio(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """How many times one rate the other is, and between which two."""
    estimate, per = given_estimate(figure), per_units(_rates(findings))
    relative = limits.relative(estimate, " of ")
    both = " and ".join(
        f"{numbers.rate(estimate_of(f'rate_{group}', findings) * per)} {names.in_group(outcome, group)}"
        for group in ("reference", "index")
    )
    return (
        f"{times('rate of events', outcome, numbers.ratio(estimate))}{with_interval('rate_ratio', figure, choices)}"
        f"{f': a {relative}' if relative else ''}. By itself it does not say how large the rate is: it was {both}, "
        f"per {unit_sum(per, outcome)}.{no_interval(figure)}"
    )


def _rate(group: names.Group, outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    rates = _rates(findings)
    per, index = per_units(rates), group == "index"
    events, time = (rates.index_events, rates.index_time) if index else (rates.reference_events, rates.reference_time)
    rate = numbers.rate(given_estimate(figure) * per)
    return (
        f"{names.sentence_case(names.in_group(outcome, group))}, {numbers.whole(events)} "
        f"{'event' if events == 1 else 'events'} in {time_in(time, outcome)}: {rate} per {unit_sum(per, outcome)}"
        f"{with_interval(f'rate_{group}', figure, choices, per)}. {NOT_PEOPLE}{no_interval(figure)}"
    )


def _rates(findings: OutcomeFindings) -> Rates:
    rates = given(findings)
    if not isinstance(rates, Rates):
        raise TypeError(findings.form)
    return rates
