"""What the measures of pairs mean: only the pairs that differ tell the two sides apart."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, PairCounts
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, lines, names, numbers
from fourcount.wording import pairs as sides
from fourcount.wording.form import given, measure_of
from fourcount.wording.meanings.parts import (
    estimate_of,
    given_estimate,
    no_interval,
    spanned,
    times,
    with_interval,
)
from fourcount.wording.pairs import pairs_that_differ


def difference(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """Per 100 people on each side, and the pairs that make it."""
    estimate, event = given_estimate(figure), spanned(names.event_words(outcome), outcome)
    interval = with_interval("pair_difference", figure, choices)
    index, reference = names.in_group(outcome, "index"), names.in_group(outcome, "reference")
    if estimate == 0:
        said = f"Per 100 people as many {event} {index} as {reference}{interval}."
    else:
        said = (
            f"Per 100 people {lines.estimate_text('pair_difference', figure)} {event} {index} than {reference}"
            f"{interval}; per 1,000 that is {numbers.thousand(estimate)} {limits.side(estimate)}. "
            "These are percentage points, not a percentage of the risk."
        )
    return f"{said} {those_that_differ(outcome, findings)}{no_interval(figure)}"


def ratio(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """How many times one side's risk the other's is, and between which two."""
    estimate = given_estimate(figure)
    relative = limits.relative(estimate, " of ")
    return (
        f"{times('risk', outcome, numbers.ratio(estimate))}{with_interval('pair_ratio', figure, choices)}"
        f"{f': a {relative}' if relative else ''}. "
        f"By itself it does not say how large the risk is{_both_risks(outcome, findings)}.{no_interval(figure)}"
    )


def _both_risks(outcome: Outcome, findings: OutcomeFindings) -> str:
    """``: it was 35.0% with usual care and 25.0% with night lights``; "" where pairs without the event are unknown."""
    groups: tuple[names.Group, names.Group] = ("reference", "index")
    if any(isinstance(measure_of(f"pair_risk_{group}", findings), Gap) for group in groups):
        return ""
    risks = (
        f"{numbers.percent(estimate_of(f'pair_risk_{group}', findings))} {names.in_group(outcome, group)}"
        for group in groups
    )
    return f": it was {' and '.join(risks)}"


def risk_reference(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The reference side's risk from its counts."""
    return _risk("reference", outcome, figure, findings, choices)


def risk_index(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The index side's risk from its counts."""
    return _risk("index", outcome, figure, findings, choices)


def odds_ratio(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """In odds only, with the pairs that it rests on."""
    return (
        f"{odds_ratio_claim(outcome, figure, choices)}. {those_that_differ(outcome, findings)} "
        f"Odds are not shares of people, and this is no unpaired odds ratio.{no_interval(figure)}"
    )


def odds_ratio_claim(outcome: Outcome, figure: Figure, choices: Choices) -> str:
    """The odds ratio of the pairs in a sentence that speaks of odds and of nothing else, without its full stop."""
    event = spanned(names.event_words(outcome), outcome)
    if names.by_time(outcome):
        who = f"Within the same people, the odds that a person {event} {names.in_group(outcome, 'index')}"
    else:
        who = f"Within pairs, the odds that {sides.person(outcome, 'index')} {event}"
    return (
        f"{who} were {numbers.ratio(given_estimate(figure))} times those {sides.those_of(outcome, 'reference')}"
        f"{with_interval('pair_odds_ratio', figure, choices)}"
    )


def those_that_differ(outcome: Outcome, findings: OutcomeFindings) -> str:
    """``It rests on the 60 pairs that differ: in 20 the event came with night lights only, in 40 ...``."""
    pairs = pairs_that_differ(outcome, findings)
    if pairs is None:
        return ""
    of_index, of_reference = pairs
    which = sides.who_differ(outcome, of_index + of_reference)
    index, reference = sides.only(outcome, "index"), sides.only(outcome, "reference")
    first = f"the event came only {index}"
    if index.startswith("the "):  # one side of the pair, who does what the event says
        first = f"only {index} {names.event_words(outcome)}"
    return (
        f"It rests on the {numbers.whole(of_index + of_reference)} {which}: in {numbers.whole(of_index)} {first}, "
        f"in {numbers.whole(of_reference)} only {reference}."
    )


def _risk(group: names.Group, outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    pairs = given(findings)
    if not isinstance(pairs, PairCounts):
        raise TypeError(group)
    events = pairs.both + (pairs.index_only if group == "index" else pairs.reference_only)
    people = sides.people_in(outcome, group, spanned(names.event_words(outcome), outcome))
    return (
        f"{numbers.whole(events)} of {numbers.whole(pairs.total)} people {people}: "
        f"{numbers.percent(given_estimate(figure))}"
        f"{with_interval(f'pair_risk_{group}', figure, choices)}. "
        f"It is an average of these people, not one person’s own risk.{no_interval(figure)}"
    )
