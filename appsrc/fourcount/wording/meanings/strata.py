"""What pooled measures mean, each beside the crude one."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, lines, names, numbers
from fourcount.wording.lines.strata import parting_note
from fourcount.wording.meanings import unpaired
from fourcount.wording.meanings.parts import given_estimate, no_interval, spanned, times, with_interval

WEIGHTED = "Each stratum is compared within itself, and the strata are weighed by their size"
SAME = "{measure} is taken to be the same in all of them"


def difference(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """Per 100 people within strata, and crude."""
    claim = difference_claim(outcome, figure, choices)
    return f"{claim}. {_rest('pooled_risk_difference', 'the difference', figure, findings)}"


def difference_claim(outcome: Outcome, figure: Figure, choices: Choices) -> str:
    """The pooled difference in a sentence without its full stop."""
    event = spanned(names.event_words(outcome), outcome)
    index, reference = names.in_group(outcome, "index"), names.in_group(outcome, "reference")
    change = lines.estimate_text("pooled_risk_difference", figure)
    comparison = "than" if given_estimate(figure) else "as"
    amount = change if given_estimate(figure) else "as many"
    interval = with_interval("pooled_risk_difference", figure, choices)
    return f"Within strata, per 100 people {amount} {event} {index} {comparison} {reference}{interval}"


def risk_ratio(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """The ratio within strata, and crude."""
    estimate, name = given_estimate(figure), names.risk_name(outcome)
    said = times(f"{name} within strata", outcome, numbers.ratio(estimate))
    relative = limits.relative(estimate, " of ")
    claim = f"{said}{with_interval('pooled_risk_ratio', figure, choices)}{f': a {relative}' if relative else ''}"
    return f"{claim}. {_rest('pooled_risk_ratio', 'the ratio', figure, findings)}"


def odds_ratio(outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """In odds only, and crude."""
    return f"{odds_ratio_claim(outcome, figure, choices)}. {_rest('pooled_odds_ratio', 'it', figure, findings)}"


def odds_ratio_claim(outcome: Outcome, figure: Figure, choices: Choices) -> str:
    """The pooled odds ratio in odds and nothing else, without its full stop."""
    claim = unpaired.odds_ratio_claim(outcome, figure, choices)
    return f"Within strata, {claim[:1].lower()}{claim[1:]}"


def crude_text(key: str, findings: OutcomeFindings) -> str:
    """``Crude, without strata, it is 0.62 (…)`` of a pooled measure; "" where the crude one is not given."""
    crude = findings.measures.get(key.removeprefix("pooled_"))
    if not isinstance(crude, Figure) or isinstance(crude.estimate, Gap):
        return ""
    unit = " per 100" if key == "pooled_risk_difference" else ""
    interval = "" if isinstance(crude.interval, Gap) else limits.bracketed(lines.interval_text(key, crude))
    return f"Crude, without strata, it is {lines.estimate_text(key, crude)}{unit}{interval}."


def _rest(key: str, measure: str, figure: Figure, findings: OutcomeFindings) -> str:
    """How it is pooled, the crude figure, and what is to be thought where the two part."""
    note = parting_note(key, findings)
    parts = (
        f"{WEIGHTED}; {SAME.format(measure=measure)}.",
        crude_text(key, findings),
        f"The pooled figure {note}." if note else "",
        no_interval(figure).strip(),
    )
    return " ".join(part for part in parts if part)
