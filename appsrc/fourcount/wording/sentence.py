"""The sentences of "What it says": the headline, one for every measure, one for the p value."""

from __future__ import annotations

from fourcount.appraisal.findings import AnyNumberNeeded, Figure, Gap, Interval, OutcomeFindings, Range
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.methods import test
from fourcount.wording import limits, lines, meanings, names, numbers, of_people
from fourcount.wording.gaps import gap_text
from fourcount.wording.headline import DO_NOT_ADD_UP, People, choose, limits_apart

COMPATIBLE = "compatible with fewer and with more"
PAST_EVERYBODY = "The bare formula’s {level} interval reaches past 100 in 100, so it is not put into people."
NO_P = "There is no p: "
P_FOLLOWS = "The p value takes a moment and will follow."
MEANINGS = {
    "risk_difference": meanings.difference,
    "risk_reference": meanings.risk_reference,
    "risk_index": meanings.risk_index,
    "risk_ratio": meanings.risk_ratio,
    "other_risk_ratio": meanings.other_risk_ratio,
    "odds_ratio": meanings.odds_ratio,
    "odds_reference": meanings.odds_reference,
    "odds_index": meanings.odds_index,
}


def headline(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What the table says, in whole people: the one sentence above all lines."""
    if isinstance(findings.counts, Gap):
        return gap_text(findings.counts)
    if outcome.design == "case-control":
        return _odds_headline(outcome, findings, choices)
    figures = []
    for key in ("risk_difference", "risk_reference", "risk_index"):  # the difference's gap names the empty group
        figure = findings.measures[key]
        gap = figure if isinstance(figure, Gap) else figure.estimate
        if isinstance(gap, Gap):
            return gap_text(gap)
        figures += [figure] if isinstance(figure, Figure) else []
    difference, reference, index = figures
    return _people_headline(outcome, (reference, index, difference), choices)


def measure_sentence(key: str, outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What one measure means in this table, and what it is not; or why it is not given."""
    measure = findings.measures[key]
    if isinstance(findings.counts, Gap):
        return gap_text(findings.counts)
    if isinstance(measure, Gap):
        return gap_text(measure)
    if isinstance(measure, AnyNumberNeeded):
        return meanings.number_needed(outcome, measure, findings, choices)
    if isinstance(measure.estimate, Gap):
        if isinstance(measure.interval, Gap):
            return gap_text(measure.estimate)
        interval = f"{limits.interval_name(choices.level)} is {lines.interval_text(key, measure)}"
        return f"{gap_text(measure.estimate)} Its {interval}."
    return MEANINGS[key](outcome, measure, findings, choices)


def p_sentence(findings: OutcomeFindings) -> str:
    """The p of the family's own test with the test's name, and what it does not say."""
    probability = findings.test
    if isinstance(probability, Gap):
        return gap_text(probability)
    if isinstance(probability.p, Gap):
        return P_FOLLOWS if probability.p.key == "follows" else f"{NO_P}{_clause(gap_text(probability.p))}"
    return (
        f"{numbers.p_phrase(probability.p)} by the {test(probability.method).title} test of no association, two-sided. "
        "It does not say how large the effect is; the intervals do."
    )


def _clause(sentence: str) -> str:
    """A sentence that goes on behind a colon."""
    return sentence[:1].lower() + sentence[1:]


def p_line(findings: OutcomeFindings) -> lines.MeasureLine:
    """The p of the family's own test as a line of its own: one sentence, without figures beside it."""
    return lines.MeasureLine(key="test", name=p_sentence(findings))


def _odds_headline(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    figure = findings.measures["odds_ratio"]
    if isinstance(figure, Figure) and not isinstance(figure.estimate, Gap):
        return f"{meanings.odds_ratio_claim(outcome, figure, choices)}."
    return measure_sentence("odds_ratio", outcome, findings, choices)


def _people_headline(outcome: Outcome, figures: tuple[Figure, Figure, Figure], choices: Choices) -> str:
    """The reference group's risk, the index group's and their difference, with the difference's interval."""
    interval, estimates = figures[2].interval, [figure.estimate for figure in figures]
    risk_reference, risk_index, gap = (x for x in estimates if not isinstance(x, Gap))
    people = choose(risk_reference, risk_index, gap, interval)
    of = f"Of {numbers.whole(people.denominator)} people {names.in_group(outcome, 'reference')}"
    first = f"{of} {_about(risk_reference, people.denominator)} {names.event_words(outcome)}"
    span = names.within_span(outcome)
    second = (
        f"of {numbers.whole(people.denominator)} {names.in_group(outcome, 'index')} "
        f"{'also ' if gap == 0 else ''}{_about(risk_index, people.denominator)}"
    )
    rounding = "" if people.add_up else f" {DO_NOT_ADD_UP}"
    said = f"{first}{f' {span}' if span else ''}; {second}."
    return f"{said} {_difference(gap, people, interval, choices)}{rounding}"


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
    both = f": {COMPATIBLE}" if low < 0 < high else ""
    return f"{start} anything from {_sided(low, people)} to {_sided(high, people)} {level}{both}."


def _reach(interval: Interval | Range, people: People, level: str) -> str:
    """Both limits on the estimate's side, where whole people can tell them apart."""
    sizes = sorted(abs(x) for x in (interval.low, interval.high) if not isinstance(x, Gap))
    few, many = (of_people.apart(size, people.denominator) for size in sizes)
    if limits_apart(people.denominator, interval):
        return f", and could be as few as {few} or as many as {many} {level}"
    return "" if few == many else f", and could be from {few} to {many} {level}"


def _sided(limit: float, people: People) -> str:
    return f"{of_people.apart(limit, people.denominator)} {limits.side(limit)}" if limit else "none"
