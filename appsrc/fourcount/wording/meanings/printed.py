"""What a printed effect says by itself, and what two printed risks say: all from the print, nothing from counts."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, PrintedFigure
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, names, pairs
from fourcount.wording.form import given
from fourcount.wording.lines.as_printed import effect_texts, risk_texts
from fourcount.wording.meanings.parts import given_estimate, no_interval, spanned, times
from fourcount.wording.printed import PER_UNIT, adjusted_words, paper_measure_name

TURNED = ", here turned round"
UNCHECKED = "There are no counts to check it against"
NO_RISKS = "by itself it does not say how large the {risk}s are"
NO_RATES = "by itself it does not say how large the rates are"
NO_START = "by itself it does not say from which {risk}"
NO_SHARES = "odds are not shares of people"
NO_RISK_RATIO = "it compares rates from moment to moment: it is no {risk} ratio"


def effect(key: str, outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The printed effect in a sentence, and that nothing here stands behind it but the print."""
    printed = given(findings)
    if not isinstance(printed, PrintedFigure):
        raise TypeError(key)
    name = paper_measure_name(key, outcome)
    article = "an" if name.startswith("odds") else "a"
    adjusted = adjusted_words(outcome, printed)
    claim = _claim(key, outcome, figure, findings, choices)
    but = _but(key).format(risk=names.risk_name(outcome))
    turned = TURNED if (outcome.index_group == "second") != (outcome.counted == "right") else ""
    return f"The paper prints {article} {name}{adjusted}{turned}: {claim}. {UNCHECKED}, and {but}.{no_interval(figure)}"


def risk(group: names.Group, outcome: Outcome, figure: Figure, choices: Choices) -> str:
    """A risk at a time, as printed."""
    estimate, interval = risk_texts(group, outcome, figure)
    level = "" if isinstance(figure.interval, Gap) else f" ({limits.interval_name(choices.level)} {interval})"
    return (
        f"{estimate} of people {names.in_group(outcome, group)} "
        f"{spanned(names.event_words(outcome), outcome)}{level}, as printed: "
        f"an estimate that allows for people followed for different times.{no_interval(figure)}"
    )


def risk_reference(outcome: Outcome, figure: Figure, _findings: OutcomeFindings, choices: Choices) -> str:
    """The reference group's printed risk."""
    return risk("reference", outcome, figure, choices)


def risk_index(outcome: Outcome, figure: Figure, _findings: OutcomeFindings, choices: Choices) -> str:
    """The index group's printed risk."""
    return risk("index", outcome, figure, choices)


def _claim(key: str, outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """What the effect says, in lower case and without its full stop; of an odds ratio in odds only."""
    estimate, limits_text = effect_texts(key, outcome, figure, findings)
    named = f" ({limits.interval_name(choices.level)} {limits_text})"
    interval = "" if isinstance(figure.interval, Gap) else named
    index, reference = names.in_group(outcome, "index"), names.in_group(outcome, "reference")
    if key == "odds_ratio":
        event = spanned(names.event_words(outcome), outcome)
        if outcome.design == "matched":
            who, those = pairs.person(outcome, "index"), pairs.those_of(outcome, "reference")
            return f"within pairs, the odds that {who} {event} were {estimate} times those {those}{interval}"
        return f"the odds that a person {index} {event} were {estimate} times those {reference}{interval}"
    if key == "hazard_ratio":
        return (
            f"at any moment, among people who have not had the event yet, its rate {index} was "
            f"{estimate} times that {reference}{interval}"
        )
    if key in ("risk_ratio", "rate_ratio"):
        name = names.risk_name(outcome) if key == "risk_ratio" else "rate of events"
        said = times(name, outcome, estimate)
        return f"{said[:1].lower()}{said[1:]}{interval}"
    printed = given(findings)
    per = PER_UNIT[printed.unit] if isinstance(printed, PrintedFigure) else 1
    people = "100 people" if key == "risk_difference" else f"{per:,} of person-time"
    event = spanned(names.event_words(outcome), outcome) if key == "risk_difference" else "events"
    if given_estimate(figure) == 0:
        return f"per {people} as many {event} {index} as {reference}{interval}"
    return f"per {people} {estimate} {event} {index} than {reference}{interval}"


def _but(key: str) -> str:
    """What the effect by itself does not say."""
    return {
        "odds_ratio": NO_SHARES,
        "risk_ratio": NO_RISKS,
        "hazard_ratio": NO_RISK_RATIO,
        "rate_ratio": NO_RATES,
        "risk_difference": NO_START,
        "rate_difference": NO_RATES,
    }[key]
