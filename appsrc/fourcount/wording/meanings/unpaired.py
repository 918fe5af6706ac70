"""What each measure of one unpaired table means in the reader's own words, and what it is not."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Counts, Figure, Gap, OutcomeFindings, PairCounts
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, lines, names, numbers
from fourcount.wording.form import given, measure_of
from fourcount.wording.lines.as_printed import risk_texts
from fourcount.wording.lines.pairs import whole_needed_of_pairs
from fourcount.wording.meanings.parts import estimate_of, given_estimate, no_interval, spanned, times, with_interval

COMPATIBLE_KINDS = "compatible with one fewer and with one more"
FROM_A_RISK = "from a risk of {risk}"
WITHIN_STRATA = "pooled over strata whose own risks differ"


def difference(outcome: Outcome, figure: Figure, _findings: OutcomeFindings, choices: Choices) -> str:
    """Per 100 and per 1,000; percentage points, not a relative reduction."""
    estimate, words = given_estimate(figure), names.event_words(outcome)
    groups = f"{names.in_group(outcome, 'index')} than {names.in_group(outcome, 'reference')}"
    if estimate == 0:
        same = f"{names.in_group(outcome, 'index')} as {names.in_group(outcome, 'reference')}"
        said = f"Per 100 people as many {spanned(words, outcome)} {same}"
        return f"{said}{with_interval('risk_difference', figure, choices)}.{no_interval(figure)}"
    said = f"Per 100 people {lines.estimate_text('risk_difference', figure)} {spanned(words, outcome)} {groups}"
    return (
        f"{said}{with_interval('risk_difference', figure, choices)}; per 1,000 that is {numbers.thousand(estimate)} "
        f"{limits.side(estimate)}. These are percentage points, not a percentage of the {names.risk_name(outcome)}."
        f"{no_interval(figure)}"
    )


def number_needed(outcome: Outcome, needed: AnyNumberNeeded, findings: OutcomeFindings, choices: Choices) -> str:
    """The number with its comparison, its time, the risk it starts from, and what it does not say."""
    groups = f"{names.in_group(outcome, 'index')} rather than {names.in_group(outcome, 'reference')}"
    span = names.over_span(outcome) or f"({lines.NO_SPAN})"
    interval = f"({limits.interval_name(choices.level)} {limits.number_needed_interval(needed)})"
    if needed.kind == "neither":
        return (
            "Both groups had the event equally often, so no number of people makes a difference of one "
            f"{interval}. An interval through infinity is {COMPATIBLE_KINDS}."
        )
    change = f"one {limits.side(estimate_of(_key('difference', findings), findings))}"
    people = _people_needed(needed, findings)
    through = f" The interval runs through infinity: {COMPATIBLE_KINDS}." if needed.through_infinity else ""
    event, withheld = names.event_words(outcome), limits.withheld_needed(needed)
    return (
        f"{needed.kind} {people} {interval}: for every {people} people {groups} {span}, {change} {event}, "
        f"on average{names.if_caused(outcome)}, {_start(outcome, findings)}.{through} "
        f"It does not say who it is, nor that the others gain or lose nothing.{f' {withheld}' if withheld else ''}"
    )


def risk_reference(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The reference group's risk from its counts."""
    return _risk("reference", outcome, figure, findings, choices)


def risk_index(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The index group's risk from its counts."""
    return _risk("index", outcome, figure, findings, choices)


def risk_ratio(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """How many times one risk the other is, and between which two risks."""
    estimate = given_estimate(figure)
    relative = limits.relative(estimate, " of ")
    said = f"{times(names.risk_name(outcome), outcome, numbers.ratio(estimate))}"
    return (
        f"{said}{with_interval('risk_ratio', figure, choices)}{f': a {relative}' if relative else ''}. "
        f"By itself it does not say how large the {names.risk_name(outcome)} is: {_two_risks(outcome, findings)}."
        f"{no_interval(figure)}"
    )


def other_risk_ratio(outcome: Outcome, figure: Figure, _findings: OutcomeFindings, choices: Choices) -> str:
    """The ratio with the other outcome counted; it is not the first one turned over."""
    said = times(
        f"{names.risk_name(outcome)} of {names.not_counted(outcome)}", outcome, numbers.ratio(given_estimate(figure))
    )
    return (
        f"{said}{with_interval('risk_ratio', figure, choices)}. It is not one divided by the first ratio."
        f"{no_interval(figure)}"
    )


def odds_ratio(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """In odds only; then what it is as a risk ratio at a named starting risk."""
    conversion = findings.conversion
    claim = odds_ratio_claim(outcome, figure, choices)
    if isinstance(conversion, Gap) or isinstance(conversion.risk_ratio.estimate, Gap):
        return f"{claim}; odds are events per non-event, not shares of all people.{no_interval(figure)}"
    converted = conversion.risk_ratio
    baseline = lines.baseline_text(conversion, outcome)
    interval = limits.bracketed(limits.ratio_interval(converted.interval, converted.estimate))
    ratio = numbers.ratio(conversion.risk_ratio.estimate)
    name = names.risk_name(outcome)
    meant = f"odds are not {name}s: at {baseline} this is a {name} ratio of {ratio}{interval}."
    return f"{claim}; {meant}{no_interval(figure)}"


def odds_ratio_claim(outcome: Outcome, figure: Figure, choices: Choices) -> str:
    """The odds ratio in a sentence that speaks of odds and of nothing else, without its full stop."""
    event = spanned(names.event_words(outcome), outcome)
    return (
        f"The odds that a person {names.in_group(outcome, 'index')} {event} were "
        f"{numbers.ratio(given_estimate(figure))} times those {names.in_group(outcome, 'reference')}"
        f"{with_interval('odds_ratio', figure, choices)}"
    )


def odds_reference(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The reference group's odds from its counts."""
    return _odds("reference", outcome, figure, findings, choices)


def odds_index(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The index group's odds from its counts."""
    return _odds("index", outcome, figure, findings, choices)


def _risk(group: names.Group, outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    events, total = _group_counts(group, findings)
    people = f"{numbers.whole(events)} of {numbers.whole(total)} people {names.in_group(outcome, group)}"
    return (
        f"{people} {spanned(names.event_words(outcome), outcome)}: {numbers.percent(given_estimate(figure))}"
        f"{with_interval(f'risk_{group}', figure, choices)}. "
        f"It is an average of these people, not one person’s own {names.risk_name(outcome)}.{no_interval(figure)}"
    )


def _odds(group: names.Group, outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    events, total = _group_counts(group, findings)
    return (
        f"{names.sentence_case(names.in_group(outcome, group))}: {numbers.whole(events)} with the event to "
        f"{numbers.whole(total - events)} without it, odds of {numbers.ratio(given_estimate(figure))}"
        f"{with_interval(f'odds_{group}', figure, choices)}. "
        f"Odds are events per non-event, not a share of all people.{no_interval(figure)}"
    )


def _group_counts(group: names.Group, findings: OutcomeFindings) -> tuple[int, int]:
    counts = _counts(findings)
    if group == "index":
        return counts.index_events, counts.index_total
    return counts.reference_events, counts.reference_total


def _two_risks(outcome: Outcome, findings: OutcomeFindings) -> str:
    return f"it was {_risk_in('reference', outcome, findings)} and {_risk_in('index', outcome, findings)}"


def _risk_in(group: names.Group, outcome: Outcome, findings: OutcomeFindings) -> str:
    """``17.1% with usual care``."""
    key = _key(f"risk_{group}", findings)
    figure = measure_of(key, findings)
    risk = numbers.percent(estimate_of(key, findings))
    if findings.form == "risk-at-time" and isinstance(figure, Figure):
        risk = risk_texts(group, outcome, figure)[0]
    return f"{risk} {names.in_group(outcome, group)}"


def _start(outcome: Outcome, findings: OutcomeFindings) -> str:
    """The risk that a number needed starts from; strata have no common one."""
    if findings.form == "strata":
        return WITHIN_STRATA
    return FROM_A_RISK.format(risk=_risk_in("reference", outcome, findings))


def _people_needed(needed: AnyNumberNeeded, findings: OutcomeFindings) -> str:
    """The number needed in whole people, from the whole counts where there are any."""
    found = given(findings)
    if isinstance(found, Counts) and findings.form != "strata":
        return lines.whole_needed(found)
    return whole_needed_of_pairs(found) if isinstance(found, PairCounts) else numbers.number_needed(needed.estimate)


def _key(measure: str, findings: OutcomeFindings) -> str:
    """A difference's or a risk's key in this form: that of pairs begins with "pair"."""
    if isinstance(given(findings), PairCounts):
        return f"pair_{measure}"
    if findings.form == "strata" and measure == "difference":
        return "pooled_risk_difference"
    return "risk_difference" if measure == "difference" else measure


def _counts(findings: OutcomeFindings) -> Counts:
    """The four counts of a table that is known to have them."""
    if isinstance(findings.counts, Gap):
        raise TypeError(findings.counts.key)
    return findings.counts
